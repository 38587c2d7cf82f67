import type { CaseState } from '@/lib/case/case-state';
import type { CaseCommand, Refusal } from '@/lib/case/commands';
import { draft } from '@/lib/case/decide/draft';
import type { EntryDraft } from '@/lib/case/entry-bodies';
import { spacingProblem } from '@/lib/case/spacing-problem';
import { resolutions } from '@/lib/units/resolutions';
import { roundTo } from '@/lib/units/round-to';

/** Takes over distances measured again on one nerve, all its sites at once. @returns drafts or a refusal @source product rule */
export function decideDistances(state: CaseState, command: CaseCommand & { name: 'measure-distances' }): readonly EntryDraft[] | Refusal {
  const nerve = state.plan.nerves.find((candidate) => candidate.id === command.nerveId);
  if (nerve === undefined) {
    const known = state.plan.nerves.map((candidate) => candidate.id).join(', ');
    return { code: 'nerve-unknown', message: `Nerve unknown: ${command.nerveId}. The plan has ${known}` };
  }
  const ids = nerve.sites.map((site) => site.id);
  const given = command.positions.map((row) => row.siteId);
  if (given.length !== ids.length || ids.some((id) => !given.includes(id))) {
    return { code: 'sites-missing', message: `Sites missing: each site of the nerve needs its position (${ids.join(', ')})` };
  }
  const positions = command.positions.map((row) => ({ ...row, positionMm: roundTo(row.positionMm, resolutions.distanceMm) }));
  const ordered = ids.map((id) => positions.find((row) => row.siteId === id)?.positionMm ?? 0);
  const problem = spacingProblem(nerve.name, ordered);
  if (problem !== null) return { code: 'sites-disordered', message: problem };
  return [draft('distances.measured', { nerveId: command.nerveId, positions, reason: command.reason })];
}
