import { textWidth } from '@/lib/chart/text-width';

/**
 * A name cut so that it fits, ended by an ellipsis.
 *
 * Method: whole characters are taken from the end until the estimate of `textWidth` fits; a space before the ellipsis
 * goes too. One character and the ellipsis always stay, also where they do not fit. Two names may become equal.
 *
 * @param text the full name
 * @param sizePx font size in px
 * @param roomPx width there is, in px
 * @returns the name itself where it fits, else its beginning with "…"
 * @source house rule
 * @accuracy tests/lib/chart/shorten-text.test.ts
 * @example
 * shortenText('Above elbow', 10, 46) // => 'Above…'
 */
export function shortenText(text: string, sizePx: number, roomPx: number): string {
  if (textWidth(text, sizePx, false) <= roomPx) return text;
  const characters = [...text];
  for (let kept = characters.length - 1; kept > 1; kept -= 1) {
    const short = `${characters.slice(0, kept).join('').trimEnd()}…`;
    if (textWidth(short, sizePx, false) <= roomPx) return short;
  }
  return `${characters[0] ?? ''}…`;
}
