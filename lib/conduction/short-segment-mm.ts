import type { Sourced } from '@/lib/reference/sourced';

/**
 * Below this distance a velocity is marked short and never alerts alone.
 *
 * Method: at 80 mm a tape error of 2 mm with mark errors of 0.05 ms makes about 5 % of the
 * velocity, and half of that distance doubles it. The limit does not make a longer segment exact.
 *
 * @returns the limit in mm with its origin; a distance equal to the limit is not short
 * @source house rule, inside the span of two papers named from memory: 100 mm (Maynard and Stolov 1972,
 *   Arch Phys Med Rehabil 53:362) and about 60 mm with later equipment (Landau et al. 2003, Muscle Nerve 27:570)
 * @accuracy the error at each distance is tested in tests/reference/velocity-error.test.ts
 * @example
 * shortSegmentMm.value // => 80
 */
export const shortSegmentMm: Sourced<number> = {
  value: 80,
  source: 'house',
  citation: 'Custom, between 100 mm (Maynard and Stolov 1972) and 60 mm (Landau 2003), both from memory',
};
