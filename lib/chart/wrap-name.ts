/**
 * A name on two lines, broken at the space that makes them most equal.
 *
 * Method: lengths are counted in characters. A name of one word stays on one line; it never breaks inside a word.
 *
 * @param name the full name
 * @returns one or two lines, top first
 * @source house rule
 * @accuracy tests/lib/chart/wrap-name.test.ts
 * @example
 * wrapName('Above elbow') // => ['Above', 'elbow']
 */
export function wrapName(name: string): readonly string[] {
  const words = name.split(' ');
  if (words.length < 2) return [name];
  const breaks = words.slice(1).map((_, index) => [words.slice(0, index + 1).join(' '), words.slice(index + 1).join(' ')] as const);
  return breaks.reduce((best, lines) => (longer(lines) < longer(best) ? lines : best));
}

function longer(lines: readonly [string, string]): number {
  return Math.max(lines[0].length, lines[1].length);
}
