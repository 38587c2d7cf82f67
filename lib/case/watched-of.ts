import type { Nerve } from '@/lib/alert/nerve-plan';
import type { CaseState } from '@/lib/case/case-state';
import { isAbnormal } from '@/lib/case/is-abnormal';

/** Something that moved on a nerve, as its newest comparable run or pair shows it. */
export interface Watched {
  readonly at: string;
  /** null where a time moved, not the amplitude. */
  readonly percentOfBaseline: number | null;
  /** Past a limit, not only watched: what an ended alert left behind. */
  readonly isPastLimit: boolean;
  readonly isLost: boolean;
}

/**
 * The worst that moved on a nerve: on every path of it, required or not, and on every segment.
 * @param state the case
 * @param nerve one of its nerves
 * @returns past a limit before watched, then the lowest amplitude; null when nothing moved
 * @source product rule: stable must be earned; ending an alert does not bring the nerve back
 * @accuracy exact; tests/lib/case/nerve-status.test.ts
 * @example
 * watchedOf(state, ulnar) // => null
 */
export function watchedOf(state: CaseState, nerve: Nerve): Watched | null {
  const ofPaths = state.plan.paths
    .filter((path) => path.nerveId === nerve.id)
    .map((path) => state.paths[path.id]?.compared ?? null)
    .filter((record) => record !== null)
    .filter((record) => record.findings.length > 0)
    .map(({ at, change, findings }) => ({
      at,
      percentOfBaseline: change.percentOfBaseline,
      isPastLimit: isAbnormal(findings),
      isLost: findings.some((finding) => finding.kind === 'response-lost'),
    }));
  const ofSegments = Object.values(state.segments)
    .filter((segment) => segment.nerveId === nerve.id && segment.findings.length > 0)
    .map(({ proximalAt, distalAt }) => ({
      at: proximalAt > distalAt ? proximalAt : distalAt,
      percentOfBaseline: null,
      isPastLimit: true,
      isLost: false,
    }));
  return [...ofPaths, ...ofSegments].reduce<Watched | null>((worst, one) => (worst === null || isWorse(one, worst) ? one : worst), null);
}

function isWorse(one: Watched, other: Watched): boolean {
  if (one.isPastLimit !== other.isPastLimit) return one.isPastLimit;
  return (one.percentOfBaseline ?? 100) < (other.percentOfBaseline ?? 100);
}
