import type { Incident } from '@/lib/case/case-state';
import { clockTime } from '@/lib/text/format';

/**
 * What people did about a notice or alert so far, each with its time.
 * @param timeZone IANA zone of the theatre
 * @returns "Not told yet" or "Told 10:42, read back 10:43", without a full stop
 * @source trade's own words: told, read back, surgeon's action
 * @accuracy whole minutes, cut; tests/lib/text/today-line.test.ts
 * @example
 * handlingWords(incident, 'UTC') // => 'Told 10:42, read back 10:43'
 */
export function handlingWords(incident: Incident, timeZone: string): string {
  const done = [
    incident.toldAt === null ? 'Not told yet' : `Told ${clockTime(incident.toldAt, timeZone)}`,
    incident.readBackAt === null ? null : `read back ${clockTime(incident.readBackAt, timeZone)}`,
    incident.actedAt === null ? null : `${incident.action ?? 'action'} ${clockTime(incident.actedAt, timeZone)}`,
    incident.recoveredAt === null ? null : `back ${clockTime(incident.recoveredAt, timeZone)}`,
  ];
  return done.filter((words) => words !== null).join(', ');
}
