import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { adm, monitoredUlnar } from '@/tests/support/ulnar-case';

/** A run above the elbow: past the limit or not, and whether the desk that logged it had no link. */
interface LoggedRun {
  readonly isBad: boolean;
  readonly isOffline: boolean;
}

const startMs = Date.parse('2027-03-14T10:41:00.000Z');
const loggedRuns = fc.array(fc.record({ isBad: fc.boolean(), isOffline: fc.boolean() }), { minLength: 2, maxLength: 6 });

/** Plays runs made 20 s apart; those of the desk without a link arrive, in order, a minute after the last. */
function play(runs: readonly LoggedRun[], isLinkLost: boolean) {
  const script = monitoredUlnar();
  const atMs = (index: number) => startMs + 20_000 * index;
  const log = (index: number) => {
    script.run('above-elbow', { adm: adm('above-elbow', runs[index]!.isBad ? 0.38 : 1) }, {}, { eventAt: new Date(atMs(index)).toISOString() });
  };
  const isLate = (index: number) => isLinkLost && runs[index]!.isOffline;
  runs.forEach((_run, index) => {
    script.nowMs = atMs(index);
    if (!isLate(index)) log(index);
  });
  script.nowMs = atMs(runs.length - 1) + 60_000;
  runs.forEach((_run, index) => {
    if (isLate(index)) log(index);
  });
  return script;
}

describe('decide, two desks of which one had no link', () => {
  it('decide lets no order of arrival hide an alert that the order of the stimuli raised', () => {
    fc.assert(
      fc.property(loggedRuns, (runs) => {
        const inTime = play(runs, false).state.incidents['ulnar'];
        fc.pre(inTime?.level === 'alert');
        expect(play(runs, true).state.incidents['ulnar']).toBeDefined();
      }),
      { numRuns: 150 },
    );
  });
});
