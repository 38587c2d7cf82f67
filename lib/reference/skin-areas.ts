import type { Provenance } from '@/lib/reference/sourced';

/** An area of skin that one nerve alone usually supplies. `nerve` is a part of the nerve's name. */
export interface SkinArea extends Provenance {
  readonly nerve: string;
  readonly area: string;
}

const anatomy: Provenance = { source: 'memory', citation: 'Standard anatomy, from memory' };

/**
 * Where sensation is examined for a nerve: the area that overlaps least with its neighbours.
 *
 * Method: one row for each nerve as anatomy usually has it; overlap and variants are not shown.
 *
 * @returns rows of a part of the nerve's name and the area, each with its origin
 * @source from memory (standard anatomy)
 * @accuracy not measured; tests/lib/reference/skin-areas.test.ts checks the form of each row only
 * @example
 * skinAreas.find((row) => row.nerve === 'ulnar')?.area // => 'Little finger'
 */
export const skinAreas: readonly SkinArea[] = [
  { nerve: 'ulnar', area: 'Little finger', ...anatomy },
  { nerve: 'median', area: 'Tip of the index finger', ...anatomy },
  { nerve: 'radial', area: 'First web space, back of the hand', ...anatomy },
  { nerve: 'axillary', area: 'Outer side of the shoulder', ...anatomy },
  { nerve: 'musculocutaneous', area: 'Outer side of the forearm', ...anatomy },
  { nerve: 'femoral', area: 'Front of the thigh', ...anatomy },
  { nerve: 'fibular', area: 'Back of the foot', ...anatomy },
  { nerve: 'tibial', area: 'Sole of the foot', ...anatomy },
  { nerve: 'sural', area: 'Outer edge of the foot', ...anatomy },
];
