/** How a theatre screen hangs: who reads it from where, and how large it is. */
export interface ViewingPlace {
  readonly distanceM: number;
  readonly diagonalInch: number;
  readonly widthPx: number;
  readonly heightPx: number;
}

/** Font sizes in px: `neededPx` for all that has to be read, `statePx` for the state. */
export interface TheatreTypeScale {
  readonly neededPx: number;
  readonly statePx: number;
}

/** Height of a capital letter in minutes of arc. @source product rule; 20 to 22 preferred in ISO 9241-3 (from memory) */
const arcMinutes = { needed: 22, state: 30 } as const;

/** Capital height of Atkinson Hyperlegible Next in em, read from the font file. */
const capitalEm = 0.668;

/**
 * Font sizes that are legible from where the surgeon stands.
 *
 * Method: the capital letter subtends the wanted angle at the distance; the size of a pixel comes from the diagonal.
 * It assumes a viewer straight in front and an image that fills the panel. It knows nothing of light or glasses.
 *
 * @param place distance in m (0.5 to 10), diagonal in inch (5 to 120), image in px (100 to 20,000 each way)
 * @returns sizes in px, rounded up to a tenth
 * @throws {RangeError} when a number lies outside its range
 * @source geometry: height = 2 × distance × tan(angle / 2); 22 and 30 arcmin are the product's rule
 * @accuracy within 0.1 px; tests/lib/chart/theatre-type-scale.test.ts
 * @example
 * theatreTypeScale({ distanceM: 3, diagonalInch: 55, widthPx: 1920, heightPx: 1080 }).neededPx // => 45.4
 */
export function theatreTypeScale(place: ViewingPlace): TheatreTypeScale {
  assertBetween(place.distanceM, 0.5, 10, 'viewing distance', 'm');
  assertBetween(place.diagonalInch, 5, 120, 'diagonal', 'inch');
  assertBetween(place.widthPx, 100, 20_000, 'image width', 'px');
  assertBetween(place.heightPx, 100, 20_000, 'image height', 'px');
  const pxPerMm = Math.hypot(place.widthPx, place.heightPx) / (place.diagonalInch * 25.4);
  const sizePx = (minutes: number) => {
    const capitalMm = 2 * place.distanceM * 1000 * Math.tan((minutes / 60) * (Math.PI / 180) / 2);
    return Math.ceil(((capitalMm * pxPerMm) / capitalEm) * 10) / 10;
  };
  return { neededPx: sizePx(arcMinutes.needed), statePx: sizePx(arcMinutes.state) };
}

function assertBetween(value: number, least: number, most: number, name: string, unit: string): void {
  if (!(value >= least && value <= most)) throw new RangeError(`Cannot size the screen: ${name} ${value} is outside ${least} to ${most} ${unit}`);
}
