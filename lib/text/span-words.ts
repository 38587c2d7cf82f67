import { durationWords, nonBreakingSpace } from '@/lib/text/format';

const secondsUpToMs = 600_000;

/**
 * How long something took, in seconds up to ten minutes.
 * @param ms ms, 0 or more
 * @returns "15 s", "108 s", then "12 min"
 * @source trade's practice: intervals of an alert are told in seconds (common practice)
 * @accuracy cut to the unit shown; tests/lib/text/record-sentences.test.ts
 * @example
 * secondsWords(108_000) // => '108 s'
 */
export function secondsWords(ms: number): string {
  return ms < secondsUpToMs ? `${Math.floor(ms / 1000)}${nonBreakingSpace}s` : durationWords(ms);
}

/**
 * A sum of time, in minutes and seconds below an hour.
 * @param ms ms, 0 or more
 * @returns "24 s", "2 min 4 s", "1 h 12 min"
 * @source house rule
 * @accuracy cut to the unit shown; tests/lib/text/record-sentences.test.ts
 * @example
 * spanWords(124_000) // => '2 min 4 s'
 */
export function spanWords(ms: number): string {
  const seconds = Math.floor(ms / 1000);
  if (seconds < 60 || seconds >= 3600 || seconds % 60 === 0) return durationWords(ms);
  return `${durationWords(ms)} ${seconds % 60}${nonBreakingSpace}s`;
}
