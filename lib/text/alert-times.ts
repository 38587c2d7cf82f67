import type { CaseState, Incident } from '@/lib/case/case-state';
import { pathIdOf } from '@/lib/case/keys';
import type { RunBody } from '@/lib/case/run-body';
import { clockTime } from '@/lib/text/format';

/** One moment of an alert; null while it has not come. */
export interface AlertTime {
  readonly name: string;
  readonly time: string | null;
}

/**
 * The course of an open notice or alert in its moments.
 *
 * Method: copies the times of the log. The retest is the first test of a path of the alert after the surgeon's action, or
 * after telling while no action is logged; only the newest runs are held, so an old one may be a later test than the first.
 *
 * @param timeZone IANA zone of the theatre
 * @returns rows in the order in which they usually come
 * @source trade's own words: told, read back, surgeon's action, retest
 * @accuracy whole seconds, cut; tests/lib/text/alert-times.test.ts
 * @example
 * alertTimes(state, incident, 'UTC')[0] // => { name: 'First bad', time: '10:41:00' }
 */
export function alertTimes(state: CaseState, incident: Incident, timeZone: string): readonly AlertTime[] {
  const time = (at: string | null) => (at === null ? null : clockTime(at, timeZone, { seconds: true }));
  return [
    { name: 'Last good', time: time(incident.lastGoodAt) },
    { name: 'First bad', time: time(incident.firstBadAt) },
    { name: 'Raised', time: time(incident.raisedAt) },
    { name: 'Painted on a wall', time: time(incident.paintedAt) },
    { name: 'Told', time: time(incident.toldAt) },
    { name: 'Read back', time: time(incident.readBackAt) },
    { name: 'Surgeon’s action', time: time(incident.actedAt) },
    { name: 'Retest', time: time(retestAt(state, incident)) },
  ];
}

function retestAt(state: CaseState, incident: Incident): string | null {
  const after = incident.actedAt ?? incident.toldAt;
  if (after === null) return null;
  const isRetest = ({ siteId, readings }: RunBody) =>
    readings.some(({ channelId, reading }) => incident.badPathIds.includes(pathIdOf(siteId, channelId)) && (reading.kind === 'measured' || reading.kind === 'absent'));
  const times = state.runs.filter(({ at, run }) => at > after && isRetest(run)).map(({ at }) => at);
  return times.sort()[0] ?? null;
}
