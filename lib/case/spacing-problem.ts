import { bounds } from '@/lib/units/bounds';
import { resolutions } from '@/lib/units/resolutions';
import { roundTo } from '@/lib/units/round-to';

/**
 * What is wrong with the places of the sites of a nerve, as a sentence.
 * @param nerveName name of the nerve
 * @param positionsMm positions in mm in the order of the sites; not modified
 * @returns a sentence when they do not rise, or two lie nearer than the least distance of a velocity; else null
 * @source house rule: see `bounds.distanceMm`
 * @accuracy exact; tests/lib/case/plan-problem.test.ts
 * @example
 * spacingProblem('Ulnar', [0, 150]) // => null
 */
export function spacingProblem(nerveName: string, positionsMm: readonly number[]): string | null {
  const steps = positionsMm.slice(1).map((position, index) => roundTo(position - (positionsMm[index] ?? 0), resolutions.distanceMm));
  if (steps.some((stepMm) => stepMm <= 0)) return `Sites of ${nerveName} out of order: positions must rise from proximal to distal, in mm`;
  const nearest = steps.find((stepMm) => stepMm < bounds.distanceMm.min);
  if (nearest === undefined) return null;
  return `Sites of ${nerveName} too near: two lie ${nearest} mm apart, ${bounds.distanceMm.min} mm at least is allowed`;
}
