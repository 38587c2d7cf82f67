import type { Provenance } from '@/lib/reference/sourced';

/** What tape and markers are taken to err by (one standard deviation each), with the origin. */
export interface MeasurementErrors extends Provenance {
  readonly distanceErrorMm: number;
  readonly markerErrorMs: number;
}

/**
 * The errors assumed for tape and marker where the case's rules give no others.
 *
 * Method: one standard deviation of a distance along the nerve and of one onset mark. They do not
 * cover a wrong take-off point, a moved electrode or a response from another nerve.
 *
 * @returns the errors in mm and ms with their origin
 * @source house rule: a tape read to 2 mm and a marker set to 0.05 ms, the step that is customary for onset marks
 * @accuracy not measured; both are assumptions and are shown as such
 * @example
 * measurementErrors.markerErrorMs // => 0.05
 */
export const measurementErrors: MeasurementErrors = {
  distanceErrorMm: 2,
  markerErrorMs: 0.05,
  source: 'house',
  citation: 'Assumed: a tape read to 2 mm, an onset marked to 0.05 ms',
};
