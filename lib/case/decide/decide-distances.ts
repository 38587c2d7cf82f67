import type { CaseState } from '@/lib/case/case-state';
import type { CaseCommand, Refusal } from '@/lib/case/commands';
import { draft } from '@/lib/case/decide/draft';
import type { EntryDraft } from '@/lib/case/entry-bodies';

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
  const ordered = ids.map((id) => command.positions.find((row) => row.siteId === id)?.positionMm ?? 0);
  const isRising = ordered.every((position, index) => index === 0 || position > (ordered[index - 1] ?? 0));
  if (!isRising) {
    return { code: 'sites-disordered', message: 'Sites out of order: positions must rise from proximal to distal, in mm' };
  }
  return [draft('distances.measured', { nerveId: command.nerveId, positions: command.positions, reason: command.reason })];
}
