/** Most characters a headline of the theatre screen may have to be read from 3 m at state size. House rule. */
export const headlineLength = 44;

/**
 * The first of some headlines that fits the theatre screen.
 * @param candidates from the fullest to the shortest; not modified
 * @returns the first within `headlineLength` characters, else the last
 * @source house rule
 * @accuracy exact; tests/lib/text/fit-headline.test.ts
 * @example
 * fitHeadline(['Common fibular: not tested since posterior retractor', 'Common fibular: not tested']) // => 'Common fibular: not tested'
 */
export function fitHeadline(candidates: readonly string[]): string {
  return candidates.find((text) => text.length <= headlineLength) ?? candidates.at(-1) ?? '';
}
