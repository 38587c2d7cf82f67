import type { TodayLine } from '@/lib/text/today-line';

/**
 * A case of which nothing was received yet: known from the list of cases alone, and never calm.
 * @param caseId the case
 * @param place its theatre
 * @returns a line that says so
 * @source product rule: the default is no data
 * @accuracy tests/lib/text/today-line.test.ts
 * @example
 * unseenLine(caseId, 'Theatre 3').need // => 'not-live'
 */
export function unseenLine(caseId: string, place: string): TodayLine {
  return {
    caseId,
    place,
    need: 'not-live',
    since: '',
    isLive: false,
    mark: 'outline',
    priority: null,
    isCalm: false,
    headline: 'Not live yet',
    why: 'Nothing of this case was received yet.',
    handling: null,
    others: [],
    phase: 'Phase not known',
    tested: 'Last test not known',
    desk: 'Desk not known',
    people: 'Who is connected not known',
    tasks: [],
  };
}
