import type { CaseState } from '@/lib/case/case-state';
import type { NerveLineView } from '@/lib/chart/nerve-line';
import { nerveLineView } from '@/lib/chart/nerve-line-view';
import { notMonitoredView } from '@/lib/chart/not-monitored-view';
import type { TheatreKind } from '@/lib/text/theatre-line';

const notMonitored: readonly TheatreKind[] = ['set-up', 'paused', 'take-down'];

/**
 * The nerves that are drawn of a case: those at risk and those with an open alert; none once the case is closed.
 * In take-down they are outlines also under an open alert, because monitoring has ended.
 *
 * @param lead the state that leads the screen
 * @param nowMs time of the picture, Unix ms
 * @returns nerve lines, as outlines while nothing is monitored
 * @source product rule (nerve line)
 * @accuracy tests/lib/chart/shown-nerves.test.ts
 * @example
 * shownNerves(state, 'stable', nowMs).map((view) => view.nerveId) // => ['ulnar']
 */
export function shownNerves(state: CaseState, lead: TheatreKind, nowMs: number): readonly NerveLineView[] {
  if (lead === 'closed') return [];
  const isNotMonitored = state.phase === 'take-down' || notMonitored.includes(lead);
  return state.plan.nerves
    .filter((nerve) => nerve.role === 'at-risk' || state.incidents[nerve.id] !== undefined)
    .map((nerve) => nerveLineView(state, nerve.id, nowMs))
    .map((view) => (isNotMonitored ? notMonitoredView(view) : view));
}
