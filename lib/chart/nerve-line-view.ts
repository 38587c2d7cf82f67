import type { Channel, Nerve } from '@/lib/alert/nerve-plan';
import type { CaseState } from '@/lib/case/case-state';
import { distalSegment } from '@/lib/chart/distal-segment';
import { nerveLineDescription } from '@/lib/chart/nerve-line-description';
import { nerveLineSegment } from '@/lib/chart/nerve-line-segment';
import { nerveLineSite } from '@/lib/chart/nerve-line-site';
import type { NerveLineEnd, NerveLineSegment, NerveLineView } from '@/lib/chart/nerve-line';
import { shownChannel } from '@/lib/chart/shown-channel';

/** Where a channel without a place on this nerve is drawn: this far beyond the last site. @source house rule */
const endBeyondMm = 60;

/**
 * One nerve with all that its line shows, as the case stands now.
 *
 * Method: sites from proximal to distal, each with its response; segments between neighbours, and one more from the
 * last site to the channel when the channel lies beyond it. All is seen from one channel (`shownChannel`). Distances are
 * those of the plan, also while they are void after a transposition; the velocities then say so.
 *
 * @param state the case; not modified
 * @param nerveId a nerve of the plan
 * @param nowMs time of the picture, Unix ms
 * @returns the view; without sites for an unknown nerve or one without a path
 * @source product rule (nerve line)
 * @accuracy tests/lib/chart/nerve-line-view.test.ts, values computed by hand
 * @example
 * nerveLineView(state, 'ulnar', nowMs).sites[1]?.text // => '38 %'
 */
export function nerveLineView(state: CaseState, nerveId: string, nowMs: number): NerveLineView {
  const nerve = state.plan.nerves.find((candidate) => candidate.id === nerveId);
  const channel = shownChannel(state, nerveId);
  if (nerve === undefined || channel === null) {
    return { nerveId, nerveName: nerve?.name ?? nerveId, sites: [], segments: [], end: null, description: 'No path is planned' };
  }
  const sites = nerve.sites.map((site) => nerveLineSite(state, nerve, site, channel.id, nowMs));
  const end = endOf(nerve, channel);
  const view = { nerveId, nerveName: nerve.name, sites, segments: segmentsOf(state, nerve, channel, end, nowMs), end };
  return { ...view, description: nerveLineDescription(view) };
}

function endOf(nerve: Nerve, channel: Channel): NerveLineEnd | null {
  const last = nerve.sites.at(-1);
  if (last === undefined) return null;
  const isOnNerve = channel.nerveId === nerve.id && channel.positionMm > last.positionMm;
  return {
    caption: channel.kind === 'muscle' ? 'Muscle' : 'Nerve',
    name: channel.name,
    positionMm: isOnNerve ? channel.positionMm : last.positionMm + endBeyondMm,
  };
}

function segmentsOf(state: CaseState, nerve: Nerve, channel: Channel, end: NerveLineEnd | null, nowMs: number): readonly NerveLineSegment[] {
  const last = nerve.sites.at(-1);
  const between = nerve.sites.flatMap((proximal, index) => {
    const distal = nerve.sites[index + 1];
    return distal === undefined ? [] : [nerveLineSegment(state, nerve, proximal, distal, channel.id, nowMs)];
  });
  return last === undefined || end === null ? between : [...between, distalSegment(state, nerve, last, channel.id, end.positionMm, nowMs)];
}
