const monoEm = 0.64;
const wideEm = 1.03;

const sansEms: readonly (readonly [RegExp, number])[] = [
  [/[ ijl.,:;'’‘|!()\u00a0]/, 0.34],
  [/[frtI\-/[\]]/, 0.43],
  [/[a-ln-vx-z]/, 0.61],
  [/[0-9+−±×=]/, 0.66],
  [/[A-LN-VX-Z]/, 0.77],
];

/**
 * Room to keep for a line of text in the faces of the product, never less than what is drawn.
 *
 * Method: each character counts the widest of its class in the bold cut; characters outside the classes count a full em
 * and a little more. It overestimates by a tenth to a fifth, so that texts placed by it never touch. Kerning and
 * fallback faces are not known to it.
 *
 * @param text one line
 * @param sizePx font size in px, above 0
 * @param isMono true for the monospaced face
 * @returns width in px, 0 for an empty text
 * @source advance widths of Atkinson Hyperlegible Next and Mono, weights 400 and 700, read from the font files
 *   (1,000 units per em: mono 632, widest bold lower-case letter other than m and w 607, widest capital other than M and W 756)
 * @accuracy tests/lib/chart/text-width.test.ts
 * @example
 * textWidth('38 %', 10, true) // => 25.6
 */
export function textWidth(text: string, sizePx: number, isMono: boolean): number {
  let em = 0;
  for (const character of text) em += isMono ? monoWidth(character) : sansWidth(character);
  return Math.round(em * sizePx * 100) / 100;
}

function monoWidth(character: string): number {
  return (character.codePointAt(0) ?? 0) < 0x250 || '−–…’‘“”'.includes(character) ? monoEm : wideEm;
}

function sansWidth(character: string): number {
  return sansEms.find(([characters]) => characters.test(character))?.[1] ?? wideEm;
}
