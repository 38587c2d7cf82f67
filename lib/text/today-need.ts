import type { TheatreKind } from '@/lib/text/theatre-line';

/**
 * How much a case needs the person who follows several, the most first. Calm is last.
 * @source house rule: what nobody was told of comes first; what cannot be seen comes before what can be seen to be less
 */
export const todayNeeds = [
  'alert-not-told',
  'cannot-be-judged',
  'alert-told',
  'not-live',
  'notice',
  'message-waits',
  'not-stable',
  'desk-away',
  'advice-or-baseline-waits',
  'not-monitored',
  'calm',
] as const;

/** One of them. */
export type TodayNeed = (typeof todayNeeds)[number];

const needOfKind: { readonly [K in TheatreKind]: TodayNeed } = {
  alert: 'alert-told',
  'cannot-be-judged': 'cannot-be-judged',
  notice: 'notice',
  recovered: 'not-stable',
  withdrawn: 'not-stable',
  watch: 'not-stable',
  'not-compared': 'not-stable',
  'not-monitorable': 'not-stable',
  'not-tested': 'not-stable',
  'tourniquet-up': 'not-stable',
  'no-baseline': 'not-monitored',
  'set-up': 'not-monitored',
  paused: 'not-monitored',
  'take-down': 'not-monitored',
  closed: 'not-monitored',
  improved: 'calm',
  stable: 'calm',
};

/** What can make a case need somebody beside its state. */
export interface NeedFacts {
  readonly kinds: readonly TheatreKind[];
  readonly hasUntoldAlert: boolean;
  readonly isLive: boolean;
  readonly hasMessageForViewer: boolean;
  readonly isDeskConnected: boolean;
  readonly hasOpenTask: boolean;
}

/**
 * The greatest need of a case.
 *
 * Method: every need that holds, the first of the list. A case that is not live keeps the alert it was last seen with and
 * is never calm.
 *
 * @param facts what stands on the screen of the case and what waits; not modified
 * @returns one of `todayNeeds`
 * @source house rule
 * @accuracy exact; tests/lib/text/today-line.test.ts
 * @example
 * todayNeed({ ...quiet, isLive: false }) // => 'not-live'
 */
export function todayNeed(facts: NeedFacts): TodayNeed {
  const holding: TodayNeed[] = facts.kinds.map((kind) => needOfKind[kind]);
  if (facts.hasUntoldAlert) holding.push('alert-not-told');
  if (!facts.isLive) holding.push('not-live');
  if (facts.hasMessageForViewer) holding.push('message-waits');
  if (!facts.isDeskConnected) holding.push('desk-away');
  if (facts.hasOpenTask) holding.push('advice-or-baseline-waits');
  return todayNeeds.find((need) => holding.includes(need)) ?? 'not-live';
}
