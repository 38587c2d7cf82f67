import type { Nerve, Site } from '@/lib/alert/nerve-plan';
import type { CaseState } from '@/lib/case/case-state';
import type { CaseEntry } from '@/lib/case/entry-bodies';

type PlanEntry = CaseEntry & { kind: 'case.planned' | 'plan.revised' | 'distances.measured' };

/** Takes over a plan, a revised plan or newly measured distances. @returns the state after it @source house rule */
export function evolvePlan(state: CaseState, entry: PlanEntry): CaseState {
  switch (entry.kind) {
    case 'case.planned':
      // A wall does not receive the reference.
      return { ...state, plan: entry.body.plan, reference: entry.body.reference ?? '', plannedAt: entry.eventAt, phaseAt: entry.eventAt };
    case 'plan.revised':
      // Its positions were measured for it.
      return { ...state, plan: entry.body.plan, distancesVoidSince: {} };
    case 'distances.measured': {
      const { nerveId, positions } = entry.body;
      const nerves = state.plan.nerves.map((nerve) => (nerve.id === nerveId ? moved(nerve, positions) : nerve));
      const { [nerveId]: voidSince, ...others } = state.distancesVoidSince;
      // What was measured before the step that voids it arrived late, and stays void.
      const isVoid = voidSince !== undefined && voidSince > entry.eventAt;
      return { ...state, plan: { ...state.plan, nerves }, distancesVoidSince: isVoid ? state.distancesVoidSince : others };
    }
  }
}

function moved(nerve: Nerve, positions: readonly { siteId: string; positionMm: number }[]): Nerve {
  const positionOf = (site: Site) => positions.find((row) => row.siteId === site.id)?.positionMm ?? site.positionMm;
  const sites = nerve.sites.map((site) => ({ ...site, positionMm: positionOf(site) }));
  return { ...nerve, sites: sites.sort((first, second) => first.positionMm - second.positionMm) };
}
