/** What the caller decides about a nerve line: its width, its type, its weight, and whether ages are shown. */
export interface NerveLineOptions {
  readonly widthPx: number;
  readonly textPx: number;
  readonly hasAges: boolean;
  /** How much thicker than usual the nerve is drawn, 1 to 3; a wall with room shows more nerve. */
  readonly emphasis?: number;
}

/** All lengths of a nerve line, in px. */
export interface NerveLineSizes extends NerveLineOptions {
  readonly valuePx: number;
  readonly lineHeightPx: number;
  readonly thicknessPx: number;
  readonly leastThicknessPx: number;
  readonly radiusPx: number;
  readonly strokePx: number;
  readonly dashPx: number;
  readonly gapPx: number;
  readonly labelGapPx: number;
}

/**
 * Every length of a nerve line follows from the size of its type, so that it looks alike at 300 px and at 3,800 px.
 *
 * Method: fixed multiples, except that a narrow line gets no thicker than a thirtieth of its width.
 *
 * @param options width (200 to 8,000) and type (6 to 400) in px
 * @returns lengths in px
 * @throws {RangeError} when a length lies outside its range
 * @source house rule
 * @accuracy tests/lib/chart/nerve-line-scene.test.ts
 * @example
 * nerveLineSizes({ widthPx: 900, textPx: 15, hasAges: true }).thicknessPx // => 12
 */
export function nerveLineSizes(options: NerveLineOptions): NerveLineSizes {
  assertBetween(options.widthPx, 200, 8000, 'width in px');
  assertBetween(options.textPx, 6, 400, 'type in px');
  assertBetween(options.emphasis ?? 1, 1, 3, 'emphasis');
  const thicknessPx = Math.min(options.textPx * 0.8 * (options.emphasis ?? 1), options.widthPx / 30);
  return {
    ...options,
    valuePx: options.textPx * 1.3,
    lineHeightPx: options.textPx * 1.22,
    thicknessPx,
    leastThicknessPx: Math.max(1.5, thicknessPx * 0.1),
    radiusPx: thicknessPx * 0.5,
    strokePx: thicknessPx * 0.19,
    dashPx: Math.max(4, options.textPx * 0.95),
    gapPx: Math.max(1.5, options.textPx * 0.2),
    labelGapPx: options.textPx * 0.65,
  };
}

function assertBetween(value: number, least: number, most: number, name: string): void {
  if (!(value >= least && value <= most)) throw new RangeError(`Cannot draw the nerve line: ${name} ${value} is outside ${least} to ${most}`);
}
