import { nonBreakingSpace } from '@/lib/text/format';

const unit = '%|m/s|ms|mA|mV|µV|mmHg|mm|min|°C|s|h';

/** What never stands on two lines, as the spaces in it: number and unit, count and its whole, a time and what it is the time of. */
const wholes: readonly RegExp[] = [
  / (?=[−+]?\d)/g,
  new RegExp(`(?<=\\d) (?=(?:${unit})(?![\\p{L}\\d]))`, 'gu'),
  /(?<=\d) (?=of\s\d)|(?<=\d\sof\s\d+) (?=sites?\b)/g,
  /(?<=\p{L}) (?=\p{L}+\s\d\d:\d\d)/gu,
];

/**
 * A sentence of the wall whose facts stay whole when it takes several lines.
 *
 * Method: only spaces change, into ones that do not break: before a number, between number and unit, inside "4 of 4
 * sites", and between a time and up to two words of the same clause before it, as in "Last good 11:22". It does not know
 * how wide the wall is.
 *
 * @param text a sentence
 * @returns the same words
 * @source house rule: a number is read with its word
 * @accuracy exact; tests/lib/text/theatre-wrap.test.ts
 * @example
 * theatreWrap('Last good 11:22') // => 'Last good 11:22'
 */
export function theatreWrap(text: string): string {
  return wholes.reduce((kept, spaces) => kept.replaceAll(spaces, nonBreakingSpace), text);
}
