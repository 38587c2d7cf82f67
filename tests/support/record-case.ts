import { absent, type CaseBuilder, clock } from '@/tests/support/case-builder';
import { adm, apb, fdiAt, openedCase, testAll, ulnarSites } from '@/tests/support/ulnar-case';

const channels = ['adm', 'fdi'] as const;

/**
 * A whole ulnar case of an invented arm, closed: baselines, a notice that settles, a nerve lifted, an alert that gets
 * worse, is handled and recovers, a pause, a run at a low current, a typing error corrected, a late entry, advice,
 * transposition with new distances, closing tests, examinations.
 */
export function recordCase(): CaseBuilder {
  const script = openedCase();
  examine(script, 'before-operation', 4);
  script.at('10:05').give({ name: 'change-phase', phase: 'baseline', reason: null });
  baseline(script);
  script.at('10:12').step('incision');
  testAll(script.at('10:14'), channels, 0.99);
  script.wait(2000).run('median-wrist', { apb: apb(0.99) });
  testAll(script.at('10:18:30'), channels, 0.98);
  script.at('10:21').run('wrist', { adm: adm('wrist', 0.97, 0.35), fdi: fdiAt('wrist', 0.97, 0.35) });
  script.wait(14_000).run('wrist', { adm: adm('wrist', 0.98, 0.05), fdi: fdiAt('wrist', 0.98, 0.05) });
  script.at('10:24').give({ name: 'change-phase', phase: 'paused', reason: 'Microscope brought in' });
  script.at('10:27:30').give({ name: 'change-phase', phase: 'monitoring', reason: null });
  testAll(script.at('10:28'), channels, 0.97);
  alert(script);
  closing(script);
  return script;
}

function baseline(script: CaseBuilder): void {
  for (const site of ulnarSites) {
    for (const share of [0.98, 1, 1.02]) script.wait(6000).run(site, { adm: adm(site, share), fdi: fdiAt(site, share) }, { purpose: 'baseline' });
  }
  for (const share of [0.97, 1, 1.03]) script.wait(6000).run('median-wrist', { apb: apb(share) }, { purpose: 'baseline' });
  script.give({ name: 'log-condition', condition: { kind: 'train-of-four', count: 4, ratio: 0.95 }, reportedBy: 'anaesthetist' });
  script.give({ name: 'log-condition', condition: { kind: 'limb-temperature', temperatureC: 32.4 }, reportedBy: null });
  script.wait(20_000).give({ name: 'accept-baseline', family: 'through-skin', electrodeId: 'surface', reason: null });
  const baselineSeq = script.seq;
  script.wait(5000).give({ name: 'change-phase', phase: 'monitoring', reason: null });
  script.wait(90_000).give({ name: 'confirm-baseline', baselineSeq, text: 'Good traces' }, { role: 'physician' });
}

function alert(script: CaseBuilder): void {
  script.at('10:31:20').step('nerve-lifted');
  script.at('10:31:55').run('above-elbow', { adm: adm('above-elbow', 0.47, 1.1), fdi: fdiAt('above-elbow', 0.5, 1.1) });
  script.at('10:32:12').run('above-elbow', { adm: adm('above-elbow', 0.38, 1.38), fdi: fdiAt('above-elbow', 0.41, 1.38) });
  painted(script, 'ulnar-2', 400);
  script.at('10:32:21').give({ name: 'tell-alert', alertId: 'ulnar-2', whom: 'Surgeon', how: 'aloud', words: 'Ulnar at 38 per cent of baseline, repeated' });
  script.at('10:32:26').give({ name: 'read-back-alert', alertId: 'ulnar-2', words: 'Ulnar 38 per cent, letting go' });
  script.at('10:32:40').give({ name: 'act-on-alert', alertId: 'ulnar-2', action: 'Traction released' });
  script.at('10:32:58').run('below-elbow', { adm: adm('below-elbow', 0.98, 0.01), fdi: fdiAt('below-elbow', 0.97) });
  script.at('10:33:40').run('above-elbow', { adm: absent(25), fdi: fdiAt('above-elbow', 0.06, 2.1) });
  painted(script, 'ulnar-2', 350);
  script.at('10:34:55').give({ name: 'tell-alert', alertId: 'ulnar-2', whom: 'Surgeon', how: 'aloud', words: 'Ulnar lost from above the elbow' });
  script.at('10:35:05').give({ name: 'give-advice', text: 'Test below the elbow and the control too' }, { role: 'physician' });
  script.at('10:35:30').give({ name: 'confirm-advice', adviceSeq: script.seq, text: 'Done now' });
  script.at('10:35:41').run('median-wrist', { apb: apb(0.99) });
  script.at('10:36').give({ name: 'act-on-alert', alertId: 'ulnar-2', action: 'Nerve laid back' });
  for (const [minute, share] of [['10:37', 0.44], ['10:39', 0.84], ['10:41', 0.88]] as const) {
    script.at(minute).run('above-elbow', { adm: adm('above-elbow', share, 0.2), fdi: fdiAt('above-elbow', share, 0.2) });
    script.wait(15_000).run('axilla', { adm: adm('axilla', share, 0.2), fdi: fdiAt('axilla', share, 0.2) });
  }
  script.at('10:43').give({ name: 'send-message', text: 'Back at 88 per cent, lifted too far' });
  script.at('10:43:20').give({ name: 'end-alert', alertId: 'ulnar-2', outcome: 'full', cause: 'surgical', text: 'Lifted too far' });
}

function painted(script: CaseBuilder, alertId: string, afterMs: number): void {
  const entrySeq = script.seq;
  script.wait(afterMs).give({ name: 'note-painted', alertId, entrySeq, screenId: 'wall-1', paintedAt: new Date(script.nowMs).toISOString() });
}

function closing(script: CaseBuilder): void {
  script.at('10:46').run('wrist', { adm: adm('wrist', 0.62) }, { intensityMa: 8, isSupramaximal: false });
  script.at('10:47').run('wrist', { adm: adm('wrist', 0.97), fdi: fdiAt('wrist', 0.96) });
  script.at('10:48').run('below-elbow', { adm: adm('below-elbow', 0.09), fdi: fdiAt('below-elbow', 0.95) });
  const runSeq = script.state.runs.at(-1)?.seq ?? 0;
  script.at('10:48:40').give({ name: 'correct-run', runSeq, run: script.runBody('below-elbow', { adm: adm('below-elbow', 0.96), fdi: fdiAt('below-elbow', 0.95) }), reason: 'Typed 0.83 for 8.83' });
  script.at('10:52').step('nerve-transposed');
  const positions = [0, 150, 236, 446].map((positionMm, index) => ({ siteId: ulnarSites[index] ?? '', positionMm }));
  script.at('10:54').give({ name: 'measure-distances', nerveId: 'ulnar', positions, reason: 'Nerve transposed' });
  testAll(script.at('10:55'), channels, 0.93);
  script.wait(2000).run('median-wrist', { apb: apb(1) });
  script.at('10:58').give({ name: 'log-condition', condition: { kind: 'mean-pressure', pressureMmHg: 78 }, reportedBy: 'anaesthetist' }, { eventAt: clock('10:50') });
  script.at('10:59').step('closure');
  for (const site of ulnarSites) script.wait(8000).run(site, { adm: adm(site, 0.94), fdi: fdiAt(site, 0.93) }, { purpose: 'closing' });
  script.at('11:03').give({ name: 'change-phase', phase: 'take-down', reason: null });
  script.at('11:10').give({ name: 'close-case', text: 'Handed over to recovery' });
}

function examine(script: CaseBuilder, when: 'before-operation' | 'after-operation', grade: number): void {
  const muscles = [{ muscle: 'First dorsal interosseous', grade }, { muscle: 'Abductor digiti minimi', grade }];
  script.give({ name: 'record-examination', examination: { when, examinedBy: 'surgeon', muscles, sensation: [{ area: 'Little finger', finding: 'reduced' }], text: null } });
}
