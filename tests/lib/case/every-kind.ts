import { absent, CaseBuilder } from '@/tests/support/case-builder';
import { adm, apb, fdiAt, testAll, ulnarSites } from '@/tests/support/ulnar-case';
import { ulnarAtElbow } from '@/lib/reference/templates/ulnar-at-elbow';

const team = [{ personId: '01890000-0000-7000-8000-000000000009', role: 'physician', displayName: 'Supervising physician' }] as const;
const examination = {
  when: 'before-operation',
  examinedBy: 'Surgeon',
  muscles: [{ muscle: 'First dorsal interosseous', grade: 4 }],
  sensation: [{ area: 'Little finger', finding: 'reduced' }],
  text: null,
} as const;

/** A whole case in which every entry kind stands at least once: a left ulnar nerve, lifted, changed, back, changed again, closed. */
export function everyKindCase(): CaseBuilder {
  const script = new CaseBuilder(ulnarAtElbow);
  script.give({ name: 'plan-case', plan: ulnarAtElbow, reference: 'K7-0001', identityCommitment: 'c'.repeat(64), team });
  script.give({ name: 'record-examination', examination });
  script.give({ name: 'revise-plan', plan: { ...ulnarAtElbow, theatre: 'Theatre 3' } });
  script.at('10:01').give({ name: 'open-case', clockOffsetMs: 12 });
  script.wait(1000).give({ name: 'confirm-timeout', side: 'left', text: 'Side and patient confirmed by all' });
  script.wait(1000).give({ name: 'change-phase', phase: 'baseline', reason: null });
  baseline(script.at('10:05'));
  script.at('10:30').give({ name: 'change-phase', phase: 'monitoring', reason: null });
  testAll(script, ['adm', 'fdi']);
  script.at('10:34').run('wrist', { adm: { kind: 'unusable', reason: 'cautery' }, fdi: { kind: 'not-read' } });
  settledNotice(script);
  script.at('10:41:20').step('nerve-lifted');
  alertCourse(script);
  withdrawn(script);
  script.at('10:58').step('nerve-transposed');
  const positions = [0, 150, 240, 450].map((positionMm, index) => ({ siteId: ulnarSites[index]!, positionMm }));
  script.wait(1000).give({ name: 'measure-distances', nerveId: 'ulnar', positions, reason: 'Nerve transposed' });
  script.wait(1000).give({ name: 'send-message', text: 'Agree, focal at the elbow' });
  script.wait(1000).give({ name: 'give-advice', text: 'Test below the elbow too' });
  script.wait(1000).give({ name: 'confirm-advice', adviceSeq: script.state.seq, text: null });
  script.at('11:10').give({ name: 'change-phase', phase: 'take-down', reason: null });
  script.at('11:20').give({ name: 'close-case', text: 'Handed over to recovery' });
  return script;
}

function baseline(script: CaseBuilder): void {
  for (const site of ulnarSites) {
    for (let count = 0; count < 3; count += 1) script.wait(5000).run(site, { adm: adm(site), fdi: fdiAt(site) }, { purpose: 'baseline', note: 'Arm on the table' });
  }
  script.wait(5000).run('median-wrist', { apb: apb() }, { purpose: 'baseline' });
  script.give({ name: 'log-condition', condition: { kind: 'train-of-four', count: 4, ratio: 0.95 }, reportedBy: 'Anaesthetist' });
  script.give({ name: 'log-condition', condition: { kind: 'tourniquet', isUp: false, pressureMmHg: null }, reportedBy: 'Nurse' });
  script.wait(5000).give({ name: 'accept-baseline', family: 'through-skin', electrodeId: 'surface', reason: null });
  script.give({ name: 'confirm-baseline', baselineSeq: script.state.seq, text: null });
}

function settledNotice(script: CaseBuilder): void {
  script.at('10:36').run('wrist', { adm: adm('wrist', 1, 0.35) });
  script.wait(9000).run('wrist', { adm: adm('wrist', 0.99) });
}

function alertCourse(script: CaseBuilder): void {
  script.at('10:41:55').run('above-elbow', { adm: adm('above-elbow', 0.47, 1.33) });
  script.at('10:42:12').run('above-elbow', { adm: adm('above-elbow', 0.38, 1.38) });
  script.give({ name: 'note-painted', alertId: 'ulnar-2', entrySeq: script.state.seq, screenId: 'screen-1', paintedAt: new Date(script.nowMs).toISOString() });
  script.wait(9000).give({ name: 'tell-alert', alertId: 'ulnar-2', whom: 'Surgeon', how: 'Aloud', words: 'Ulnar at 38 per cent of baseline' });
  script.wait(4000).give({ name: 'read-back-alert', alertId: 'ulnar-2', words: 'Ulnar at 38 per cent' });
  script.wait(4000).give({ name: 'act-on-alert', alertId: 'ulnar-2', action: 'Traction released' });
  script.at('10:42:49').run('below-elbow', { adm: adm('below-elbow', 0.98, 0.01) });
  script.at('10:44').run('above-elbow', { adm: absent(18) });
  for (const share of [0.8, 0.92]) script.wait(60_000).run('above-elbow', { adm: adm('above-elbow', share, 0.1) });
  script.wait(1000).give({ name: 'end-alert', alertId: 'ulnar-2', outcome: 'full', cause: 'surgical', text: 'Lifted too far' });
}

function withdrawn(script: CaseBuilder): void {
  script.at('10:50').run('axilla', { adm: adm('axilla', 0.3) });
  const runSeq = script.state.runs.at(-1)!.seq;
  script.at('10:51:40').timers();
  script.give({ name: 'correct-run', runSeq, run: script.runBody('axilla', { adm: adm('axilla', 0.93) }), reason: 'Typed 2.6 for 8.0' });
}
