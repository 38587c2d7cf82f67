import { describe, expect, it } from 'vitest';

import type { CaseEntry, EntryBodies, EntryDraft, EntryKind } from '@/lib/case/entry-bodies';
import { ulnarAtElbow } from '@/lib/reference/templates/ulnar-at-elbow';
import { entrySentence } from '@/lib/text/entry-sentence';

const entryOf = (draft: EntryDraft): CaseEntry => ({
  ...draft,
  seq: 9,
  eventAt: '2027-03-14T10:41:55.000Z',
  recordedAt: '2027-03-14T10:41:55.100Z',
  commandId: '00000000-0000-4000-8000-000000000000',
  author: { id: 'p', role: 'neurophysiologist', displayName: 'Neurophysiologist' },
});

/** The sentence with plain spaces, so that the expected text can be typed. */
const say = <K extends EntryKind>(kind: K, body: EntryBodies[K]) =>
  entrySentence(entryOf({ kind, kindVersion: 1, body } as EntryDraft), ulnarAtElbow, 'Europe/London').replaceAll('\u00a0', ' ');

const run: EntryBodies['run.logged'] = {
  siteId: 'above-elbow',
  electrodeId: 'surface',
  family: 'through-skin',
  purpose: 'check',
  intensityMa: 18,
  pulseWidthUs: 200,
  isSupramaximal: true,
  maximalResponseMa: null,
  readings: [
    { channelId: 'adm', reading: { kind: 'measured', onsetMs: 9.71, amplitudeUv: 3500, durationMs: null } },
    { channelId: 'fdi', reading: { kind: 'absent', highestIntensityMa: 25 } },
    { channelId: 'apb', reading: { kind: 'not-read' } },
  ],
  note: null,
};

const evidence: EntryBodies['alert.raised'] = {
  alertId: 'ulnar-1',
  nerveId: 'ulnar',
  runSeq: 7,
  pathIds: ['above-elbow/adm'],
  finding: 'amplitude-fall',
  worstPercentOfBaseline: 38.4,
  location: { kind: 'not-known', nextSiteId: 'below-elbow' },
  lastGoodAt: '2027-03-14T10:39:02.000Z',
  firstBadAt: '2027-03-14T10:41:55.000Z',
  stepsBetween: ['nerve lifted'],
  judgeVersion: 1,
  isRepeated: true,
};

describe('entrySentence', () => {
  it('says a run with its stimulus, its responses, no response with its current, and what was not read', () => {
    expect(say('run.logged', run)).toBe(
      'Run at above elbow, 18.0 mA × 200 µs, supramaximal: ADM onset 9.71 ms, 3.5 mV; FDI no response up to 25.0 mA; APB not read',
    );
  });

  it('says a judgement with % of baseline, the change with a true sign, and why a path was not compared', () => {
    const change = {
      percentOfBaseline: 38.4, amplitudeChangePercent: -61.6, amplitudeErrorPercent: 8, isScatterAssumed: true,
      onsetChangeMs: 1.38, onsetChangePercent: 16.6, onsetErrorMs: 0.07, durationChangePercent: null, durationErrorPercent: null,
    };
    const sentence = say('run.judged', {
      runSeq: 7,
      judgeVersion: 1,
      paths: [
        { kind: 'compared', pathId: 'above-elbow/adm', current: 'equal', change, findings: [] },
        { kind: 'compared', pathId: 'above-elbow/fdi', current: 'equal', change: { ...change, percentOfBaseline: null, onsetChangeMs: -0.2 }, findings: [] },
        { kind: 'not-compared', pathId: 'above-elbow/apb', reason: 'not-read' },
      ],
      segments: [],
    });
    expect(sentence).toBe('Run 7 judged: ADM 38 % of baseline, onset +1.38 ms; FDI amplitude not compared, onset −0.20 ms');
  });

  it('keeps a correction beside what it corrects, with its reason', () => {
    expect(say('run.corrected', { runSeq: 7, run: null, reason: 'Wrong site typed' })).toBe('Correction: run 7 withdrawn. Wrong site typed');
    expect(say('run.corrected', { runSeq: 7, run, reason: 'Marker moved' })).toMatch(/^Correction of run 7: Run at above elbow.*Reason: Marker moved$/);
  });

  it('says notice and alert with the paths, last good, first seen and the steps between', () => {
    const words = 'ulnar: amplitude down, 38 % of baseline, ADM from above elbow. Last good 10:39, first seen 10:41, after nerve lifted';
    expect(say('alert.raised', evidence)).toBe(`Alert, ${words}. Confirmed`);
    expect(say('alert.raised', { ...evidence, isRepeated: false })).toBe(`Alert, ${words}. Not repeated`);
    expect(say('notice.raised', { ...evidence, repeatDueAt: null })).toBe(`Notice, ${words}. Repeat at the same current`);
    expect(say('alert.worsened', { ...evidence, worsening: ['lost', 'another-muscle'] })).toBe(`Alert worse, ulnar: lost, another muscle. ${words.slice(7)}`);
    expect(say('notice.raised', { ...evidence, lastGoodAt: null, stepsBetween: [], repeatDueAt: null })).toContain('No good run before it, first seen 10:41');
  });

  it.each([
    ['alert.located', { alertId: 'ulnar-1', runSeq: 8, location: { kind: 'segment', proximalSiteId: 'above-elbow', distalSiteId: 'below-elbow' } }, 'Alert located, ulnar: between above and below elbow'],
    ['alert.located', { alertId: 'ulnar-1', runSeq: 8, location: { kind: 'outside' } }, 'Alert located, ulnar: not between the tested sites'],
    ['alert.recovered', { alertId: 'ulnar-1', runSeq: 9, percentOfBaseline: 93.2 }, 'Back inside its limits, ulnar: 93 % of baseline. Alert open until it is ended'],
    ['alert.withdrawn', { alertId: 'ulnar-1', runSeq: 7 }, 'Alert withdrawn, ulnar: run 7 was corrected'],
    ['notice.settled', { alertId: 'ulnar-1', runSeq: 8 }, 'Notice settled, ulnar: run 8 was inside the limits'],
    ['alert.told', { alertId: 'ulnar-1', whom: 'surgeon', how: 'aloud', words: 'Ulnar, half of baseline.' }, 'Told, ulnar: surgeon, aloud: “Ulnar, half of baseline.”'],
    ['alert.read-back', { alertId: 'ulnar-1', words: null }, 'Read back, ulnar'],
    ['alert.acted', { alertId: 'ulnar-1', action: 'traction released' }, 'Surgeon’s action, ulnar: traction released'],
    ['alert.ended', { alertId: 'ulnar-1', outcome: 'partial', cause: 'surgical', text: null }, 'End, ulnar: partial recovery, cause surgical'],
  ] as const)('says %s with the name of its button', (kind, body, sentence) => {
    expect(say(kind, body as EntryBodies[typeof kind])).toBe(sentence);
  });

  it.each([
    ['case.planned', { reference: 'F27-ABCD-K', identityCommitment: 'x', plan: ulnarAtElbow }, 'Case planned: Ulnar nerve at the elbow, transposition, left side, Theatre, reference F27-ABCD-K'],
    ['plan.revised', { plan: ulnarAtElbow }, 'Plan revised: 2 nerves, 5 sites, 3 channels'],
    ['case.opened', { clockOffsetMs: 40 }, 'Case opened'],
    ['case.opened', { clockOffsetMs: -2100 }, 'Case opened. Desk clock 2.1 s ahead of the server'],
    ['case.opened', { clockOffsetMs: null }, 'Case opened. Desk clock not compared with the server'],
    ['timeout.confirmed', { side: 'left', text: 'With the anaesthetist' }, 'Time-out: patient and left side confirmed. With the anaesthetist'],
    ['phase.changed', { phase: 'paused', reason: 'Imaging' }, 'Phase: paused. Imaging'],
    ['condition.logged', { condition: { kind: 'train-of-four', count: 3, ratio: null }, reportedBy: 'anaesthetist' }, 'Train-of-four 3 of 4, as reported by anaesthetist'],
    ['step.logged', { stepId: 'nerve-transposed', label: 'Nerve transposed', since: 'nerve transposed', isRisk: true, voidsDistances: true }, 'Nerve transposed, risk step. Distances void until measured again'],
    ['distances.measured', { nerveId: 'ulnar', positions: [{ siteId: 'axilla', positionMm: 0 }, { siteId: 'wrist', positionMm: 452.5 }], reason: null }, 'Distances of ulnar measured: axilla 0 mm, wrist 452.5 mm'],
    ['message.sent', { text: 'Inch it at 10 mm' }, 'Message: Inch it at 10 mm'],
    ['case.closed', { text: null }, 'Case closed'],
  ] as const)('says %s in one plain sentence', (kind, body, sentence) => {
    expect(say(kind, body as unknown as EntryBodies[typeof kind])).toBe(sentence);
  });

  it('says that a baseline is provisional, why it was accepted and after which loss it was set', () => {
    const body = { family: 'through-skin', electrodeId: 'surface', runSeqs: [4], pathIds: ['wrist/adm', 'wrist/fdi'], isOpening: false, isProvisional: true, reason: 'Cuff stays up', setAfterPercent: -62, values: [] } as const;
    expect(say('baseline.accepted', body)).toBe(
      'Working baseline accepted provisionally: through the skin, Surface, 1 cm², 2 paths from 1 run. Reason: Cuff stays up. Set after −62 %',
    );
  });
});
