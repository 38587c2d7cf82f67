import type { AlertCourse } from '@/lib/case/course/alert-course';
import type { AlertRound } from '@/lib/case/course/alert-round';
import { actionNames } from '@/lib/text/action-names';

/** One moment of an alert with all that happened in it. */
export interface AlertMoment {
  readonly at: string;
  readonly names: readonly string[];
  /** The alert was raised or got worse in it. */
  readonly isRaise: boolean;
}

const raiseNames: { readonly [K in AlertRound['kind']]: string } = { notice: 'Notice', alert: 'Alert', worse: 'Alert worse' };
const endNames = { ended: actionNames.ended, settled: 'Settled', withdrawn: 'Withdrawn' } as const;

/**
 * The moments of a notice or alert in the order of their times, those of one second together.
 * @param alert its course
 * @returns moments, oldest first; never empty
 * @source common practice for the times of an alert
 * @accuracy exact; tests/lib/text/alert-moments.test.ts
 * @example
 * alertMoments(alert)[0]?.names // => ['First bad']
 */
export function alertMoments(alert: AlertCourse): readonly AlertMoment[] {
  const single: (readonly [string | null, string])[] = [
    [alert.firstBadAt, 'First bad'],
    ...alert.rounds.flatMap(momentsOfRound),
    [alert.recoveredAt, 'Back inside limits'],
    [alert.end?.at ?? null, alert.end === null ? '' : endNames[alert.end.kind]],
  ];
  const moments = new Map<string, string[]>();
  for (const [at, name] of single) {
    if (at === null) continue;
    const second = `${at.slice(0, 19)}.000Z`;
    const names = moments.get(second) ?? [];
    if (!names.includes(name)) names.push(name);
    moments.set(second, names);
  }
  const raises = Object.values(raiseNames).slice(1);
  return [...moments].sort(([first], [second]) => (first < second ? -1 : 1)).map(([at, names]) => ({ at, names, isRaise: names.some((name) => raises.includes(name)) }));
}

function momentsOfRound(round: AlertRound): readonly (readonly [string | null, string])[] {
  return [
    [round.raisedAt, raiseNames[round.kind]],
    [round.paintedAt, 'Painted'],
    [round.told?.at ?? null, actionNames.told],
    [round.readBack?.at ?? null, actionNames.readBack],
    [round.acted?.at ?? null, actionNames.acted],
    [round.retestAt, 'Tested again'],
  ];
}
