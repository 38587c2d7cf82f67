import { describe, expect, test } from 'vitest';

import { nerveStatus } from '@/lib/case/nerve-status';
import type { EntryDraft } from '@/lib/case/entry-bodies';
import { neuroma } from '@/server/demo/scenarios/neuroma';
import { relaxant } from '@/server/demo/scenarios/relaxant';
import { scenarios } from '@/server/demo/scenarios/scenarios';
import { tourniquet } from '@/server/demo/scenarios/tourniquet';
import { tumour } from '@/server/demo/scenarios/tumour';
import { ulnar } from '@/server/demo/scenarios/ulnar';
import { playAtOnce, type PlayedAct, type PlayedCase } from '@/tests/server/demo/play-at-once';

/** Every notice and alert with what was done about it, in order: "alert.raised ulnar-2". */
function incidentsOf({ acts }: PlayedCase): readonly string[] {
  return acts
    .flatMap(({ drafts }) => drafts)
    .flatMap((draft) => ('alertId' in draft.body ? [`${draft.kind} ${draft.body.alertId}${draft.kind === 'alert.ended' ? ` ${draft.body.outcome} ${draft.body.cause}` : ''}`] : []));
}

const handled = (alertId: string) => [`alert.told ${alertId}`, `alert.read-back ${alertId}`];

const courses = {
  ulnar: [
    'notice.raised ulnar-1', 'notice.raised median-1', 'notice.settled ulnar-1', 'notice.settled median-1',
    'notice.raised ulnar-2', 'alert.raised ulnar-2', ...handled('ulnar-2'), 'alert.located ulnar-2', 'alert.acted ulnar-2', 'alert.recovered ulnar-2', 'alert.ended ulnar-2 full surgical',
  ],
  // What does not come back inside its limits is never called recovered: the alert is ended as partial.
  tumour: [
    'notice.raised common-fibular-1', 'alert.raised common-fibular-1', ...handled('common-fibular-1'), 'alert.located common-fibular-1', 'alert.acted common-fibular-1',
    'alert.ended common-fibular-1 partial surgical',
  ],
  neuroma: [],
  relaxant: [
    'notice.raised ulnar-1', 'notice.raised median-1', 'alert.raised ulnar-1', ...handled('ulnar-1'), 'alert.worsened ulnar-1', 'alert.acted ulnar-1',
    'notice.settled median-1', 'alert.recovered ulnar-1', 'alert.ended ulnar-1 full anaesthetic',
  ],
  tourniquet: [
    'notice.raised common-fibular-1', 'alert.raised common-fibular-1', ...handled('common-fibular-1'), 'alert.located common-fibular-1', 'alert.acted common-fibular-1',
    'alert.recovered common-fibular-1', 'alert.ended common-fibular-1 full tourniquet',
  ],
} as const;

describe.each([1, 20, 1000])('at speed %d', (speed) => {
  test.each(scenarios.map((scenario) => [scenario.name, scenario] as const))('the %s case takes its course and is closed', (name, scenario) => {
    const played = playAtOnce(scenario, speed);
    expect(incidentsOf(played)).toEqual(courses[name as keyof typeof courses]);
    expect(played.script.state).toMatchObject({ status: 'closed', phase: 'take-down', incidents: {} });
    expect(played.script.state.advice.every((advice) => advice.confirmedAt !== null)).toBe(true);
    expect(Object.values(played.script.state.baselines).filter((baseline) => baseline.isProvisional)).toEqual([]);
  });
});

test('each case takes 8 to 40 minutes at speed 1 and every wait for a repeat is kept', () => {
  for (const { moments } of scenarios) {
    const minutes = moments.reduce((sum, moment) => sum + moment.afterSeconds, 0) / 60;
    expect(minutes).toSatisfy((value: number) => value >= 8 && value <= 40);
  }
});

/** The wall after the n-th act of this kind that fits. */
function wallAfter({ acts }: PlayedCase, fits: (draft: EntryDraft) => boolean, count = 1): PlayedAct['view'] {
  const found = acts.filter(({ drafts }) => drafts.some(fits))[count - 1];
  if (found === undefined) throw new Error('The case has no such act.');
  return found.view;
}
const isStep = (stepId: string) => (draft: EntryDraft) => draft.kind === 'step.logged' && draft.body.stepId === stepId;
const isKind = (kind: EntryDraft['kind'], alertId?: string) => (draft: EntryDraft) => draft.kind === kind && (alertId === undefined || ('alertId' in draft.body && draft.body.alertId === alertId));

describe('the wall of the ulnar case', () => {
  const played = playAtOnce(ulnar);
  const after = (fits: (draft: EntryDraft) => boolean, count = 1) => wallAfter(played, fits, count);

  test('asks for tests and is calm only when every site was tested', () => {
    expect(after(isKind('case.opened')).lead).toMatchObject({ kind: 'set-up', headline: 'Set-up' });
    expect(after(isKind('phase.changed')).lead).toMatchObject({ kind: 'no-baseline', detail: 'Baseline at 0 of 4 sites.' });
    expect(after(isKind('baseline.accepted')).lead).toMatchObject({ kind: 'not-tested', headline: 'Not tested since baseline' });
    expect(after(isStep('incision')).lead).toMatchObject({ kind: 'stable', headline: 'Stable', isCalm: true });
    expect(after(isStep('nerve-lifted')).lead).toMatchObject({ headline: 'Not tested since nerve lifted', isCalm: false });
    expect(after(isStep('sling-sutured')).lead).toMatchObject({ headline: 'Not tested since sling sutured' });
  });

  test('says how much later the cold nerve is, and the control too', () => {
    expect(after(isKind('notice.raised', 'ulnar-1')).lead).toMatchObject({ kind: 'notice', priority: 'medium', headline: expect.stringMatching(/^Ulnar later by 0\.4[4-6]\sms$/) as string });
    expect(after(isKind('notice.raised', 'median-1')).others).toContainEqual(expect.objectContaining({ headline: expect.stringMatching(/^Control later by 0\.(59|60|61)\sms$/) as string }));
    expect(after(isKind('notice.settled', 'median-1')).lead).toMatchObject({ kind: 'stable' });
  });

  test('flashes for the alert until the surgeon is told, then says where it is and that it is back', () => {
    expect(after(isKind('notice.raised', 'ulnar-2')).lead).toMatchObject({ kind: 'notice', headline: expect.stringMatching(/^Ulnar at 4[2-4]\s%/) as string, detail: expect.stringContaining('after nerve lifted') as string });
    expect(after(isKind('alert.raised', 'ulnar-2')).lead).toMatchObject({ kind: 'alert', priority: 'high', isFlashing: true, headline: expect.stringMatching(/^Ulnar at (39|40|41)\s% of baseline$/) as string });
    expect(after(isKind('alert.told', 'ulnar-2')).lead).toMatchObject({ kind: 'alert', isFlashing: false });
    expect(after(isKind('alert.located', 'ulnar-2')).lead.detail).toMatch(/^Between above and below elbow\. /);
    expect(after(isKind('alert.recovered', 'ulnar-2')).lead).toMatchObject({ kind: 'recovered', priority: 'low' });
  });

  test('asks for distances after the transposition, and no velocity is given before they are measured', () => {
    expect(after(isStep('nerve-transposed')).footer).toContain('Distances to be measured again');
    expect(after(isKind('distances.measured')).footer).not.toContain('Distances to be measured again');
    const judged = played.acts.filter(({ heading }) => heading === 'Nerve transposed').flatMap(({ drafts }) => drafts).filter((draft) => draft.kind === 'run.judged');
    const across = judged.flatMap(({ body }) => body.segments).filter((segment) => segment.proximalSiteId === 'above-elbow' && segment.channelId === 'adm');
    expect(across[0]?.velocity).toEqual({ kind: 'not-computable', reason: expect.stringMatching(/^(spans-risk-step|distances-not-measured)$/) as string });
    expect(across.some(({ velocity }) => velocity.kind === 'not-computable' && velocity.reason === 'distances-not-measured')).toBe(true);
    expect(across.at(-1)?.velocity).toMatchObject({ kind: 'velocity', distanceMm: 88, isShort: false });
  });

  test('ends with take-down and close', () => {
    expect(after(isKind('phase.changed'), 3).lead).toMatchObject({ kind: 'take-down', isCalm: false });
    expect(after(isKind('case.closed')).lead).toMatchObject({ kind: 'closed', headline: expect.stringMatching(/^Case closed 10:2\d$/) as string, detail: 'Not monitored.' });
  });
});

describe('the wall of the other cases', () => {
  test('relaxant: an alert leads, and that muscle responses cannot be judged stands beside it until the control is back', () => {
    const played = playAtOnce(relaxant);
    const train = (count: number, ratio: number | null) => (draft: EntryDraft) => draft.kind === 'condition.logged' && draft.body.condition.kind === 'train-of-four' && draft.body.condition.count === count && draft.body.condition.ratio === ratio;
    const lost = wallAfter(played, train(1, null));
    expect(lost.lead).toMatchObject({ kind: 'alert', headline: 'No ulnar response' });
    expect(lost.others.map(({ headline }) => headline)).toEqual(['Muscle responses cannot be judged', 'No control response']);
    const back = wallAfter(played, isKind('notice.settled', 'median-1'));
    expect(back.others.map(({ headline }) => headline)).not.toContain('Muscle responses cannot be judged');
    expect(wallAfter(played, isKind('alert.ended')).lead).toMatchObject({ kind: 'stable' });
  });

  test('tourniquet: the cuff is said from the first minute, and the fall is not between the sites', () => {
    const played = playAtOnce(tourniquet);
    const isUp = (draft: EntryDraft) => draft.kind === 'condition.logged' && draft.body.condition.kind === 'tourniquet' && draft.body.condition.isUp;
    expect(wallAfter(played, isUp).lead).toMatchObject({ kind: 'tourniquet-up', isCalm: false });
    expect(wallAfter(played, isKind('alert.raised')).others.map(({ headline }) => headline)).toContainEqual(expect.stringMatching(/^Tourniquet up 2\d\smin$/));
    expect(wallAfter(played, isKind('alert.located')).lead.detail).toMatch(/^Not between the tested sites\. /);
    expect(wallAfter(played, isKind('alert.ended')).lead).toMatchObject({ kind: 'stable' });
  });

  test('tumour: the fibular part falls alone, comes back in part, and the wall carries that its baseline was set after a loss', () => {
    const played = playAtOnce(tumour);
    expect(wallAfter(played, isKind('alert.raised')).lead).toMatchObject({ nerveId: 'common-fibular', headline: expect.stringMatching(/^Common fibular part at 3[2-4]\s% of baseline$/) as string });
    expect(wallAfter(played, isKind('alert.ended')).lead).toMatchObject({ nerveId: 'common-fibular', kind: 'watch', isCalm: false });
    expect(wallAfter(played, isStep('closure')).footer).toContainEqual(expect.stringMatching(/^Baseline set after −3[1-5]\s%$/));
  });

  test('neuroma: calm rests on the healthy segment; the response across is not recorded before neurolysis and is after it', () => {
    const played = playAtOnce(neuroma);
    const across = played.acts.flatMap(({ drafts }) => drafts).flatMap((draft) => (draft.kind === 'run.logged' ? draft.body.readings.filter(({ channelId }) => channelId === 'hook-below' && draft.body.siteId === 'above-neuroma') : []));
    const kinds = across.map(({ reading }) => reading.kind);
    expect(kinds.slice(0, kinds.indexOf('measured')).every((kind) => kind === 'absent')).toBe(true);
    expect(kinds.slice(kinds.indexOf('measured')).every((kind) => kind === 'measured')).toBe(true);
    expect(across.map(({ reading }) => (reading.kind === 'absent' ? reading.highestIntensityMa : 0))).toContain(20);
    expect(wallAfter(played, isStep('neurolysis')).lead).toMatchObject({ headline: 'Not tested since neurolysis' });
    expect(wallAfter(played, isStep('closure')).lead).toMatchObject({ kind: 'stable' });
    const median = played.script.state.plan.nerves[0]!;
    expect(nerveStatus(played.script.state, median, played.script.nowMs).setAfterPercent).toBeNull();
  });
});
