import type { Path } from '@/lib/alert/nerve-plan';
import type { CaseState, ComparedRecord } from '@/lib/case/case-state';

/** All muscle responses are gone, those of the control included. */
export interface CannotBeJudged {
  readonly since: string;
  readonly trainOfFourAt: string | null;
}

/**
 * Whether muscle responses can be judged at all.
 *
 * Method: every muscle path of the nerves at risk that was compared is lost now, at least one of them, and every
 * muscle path of a control nerve is lost too. A control that is present or untested is no such case.
 *
 * @param state the case
 * @returns since when, and when the train-of-four was last measured; null when responses can be judged
 * @source product rule: all muscle paths lost, control included
 * @accuracy tests/lib/text/theatre-view.test.ts
 * @example
 * cannotBeJudged(state) // => null
 */
export function cannotBeJudged(state: CaseState): CannotBeJudged | null {
  const atRisk = comparedOf(state, 'at-risk');
  const control = comparedOf(state, 'control');
  if (atRisk.length === 0 || control.length === 0) return null;
  if (![...atRisk, ...control].every(isLost)) return null;
  const since = [...atRisk, ...control].map((record) => record.lostAt).reduce((latest, at) => (at > latest ? at : latest));
  return { since, trainOfFourAt: state.conditions['train-of-four']?.at ?? null };
}

/** Comparable records of the muscle paths, each with the time its nerve was first found changed: testing again does not start it anew. */
function comparedOf(state: CaseState, role: 'at-risk' | 'control'): readonly (ComparedRecord & { readonly lostAt: string })[] {
  return state.plan.paths
    .filter((path) => isMuscle(state, path) && roleOf(state, path) === role)
    .flatMap((path) => {
      const record = state.paths[path.id]?.compared ?? null;
      return record === null ? [] : [{ ...record, lostAt: state.incidents[path.nerveId]?.firstBadAt ?? record.at }];
    });
}

function isMuscle(state: CaseState, path: Path): boolean {
  return state.plan.channels.find((channel) => channel.id === path.channelId)?.kind === 'muscle';
}

function roleOf(state: CaseState, path: Path): string | undefined {
  return state.plan.nerves.find((nerve) => nerve.id === path.nerveId)?.role;
}

function isLost(record: ComparedRecord): boolean {
  return record.findings.some((finding) => finding.kind === 'response-lost');
}
