import type { Channel } from '@/lib/alert/nerve-plan';
import type { CaseState } from '@/lib/case/case-state';

/**
 * The channel a nerve's line is drawn from.
 *
 * Method: the channel of the first path of the nerve's open notice or alert, so that the picture shows what the words
 * speak of; else the first channel of the plan with a path from this nerve. The other channels are in the log.
 *
 * @param state the case; not modified
 * @param nerveId a nerve of the plan
 * @returns the channel; null when the nerve has no path
 * @source house rule
 * @accuracy tests/lib/chart/nerve-line-view.test.ts
 * @example
 * shownChannel(state, 'ulnar')?.name // => 'ADM'
 */
export function shownChannel(state: CaseState, nerveId: string): Channel | null {
  const paths = state.plan.paths.filter((path) => path.nerveId === nerveId);
  const alertPath = state.incidents[nerveId]?.pathIds[0];
  const wanted = paths.find((path) => path.id === alertPath)?.channelId;
  const candidates = state.plan.channels.filter((channel) => paths.some((path) => path.channelId === channel.id));
  return candidates.find((channel) => channel.id === wanted) ?? candidates[0] ?? null;
}
