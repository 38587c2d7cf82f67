import { velocityDigits } from '@/lib/text/velocity-digits';

/** A space that does not break, between a number and its unit. */
export const nonBreakingSpace = '\u00a0';
const minus = '\u2212';

/**
 * A clock time in the theatre's zone, 24 h.
 * @param moment RFC 3339 in UTC
 * @param timeZone IANA zone
 * @param options `seconds` adds the seconds
 * @returns "10:41" or "10:41:20"
 * @source house rule: local time, seconds where they matter
 * @accuracy whole minutes or seconds, cut, not rounded; tests/lib/text/format.test.ts
 * @example
 * clockTime('2027-03-14T09:41:20.000Z', 'Europe/Berlin') // => '10:41'
 */
export function clockTime(moment: string, timeZone: string, options: { readonly seconds?: boolean } = {}): string {
  return new Intl.DateTimeFormat('en-GB', {
    timeZone,
    hour: '2-digit',
    minute: '2-digit',
    ...(options.seconds === true ? { second: '2-digit' } : {}),
    hourCycle: 'h23',
  }).format(new Date(moment));
}

/**
 * A number with a true minus sign and fixed digits.
 * @param value a finite number in any unit
 * @param digits digits after the point
 * @returns "−0.50"
 * @source house rule: a minus sign is a minus sign
 * @accuracy rounds half away from zero at the last digit
 * @example
 * decimal(-0.5, 2) // => '−0.50'
 */
export function decimal(value: number, digits: number): string {
  const text = Math.abs(value).toFixed(digits);
  return value < 0 && Number(text) !== 0 ? `${minus}${text}` : text;
}

/** A change: with its sign, plus included. @param value a finite change in any unit @param digits digits after the point @returns "+1.40", "−62", "0" @source house rule @example signed(1.4, 2) // => '+1.40' */
export function signed(value: number, digits: number): string {
  const text = decimal(value, digits);
  return value > 0 && Number(text) !== 0 ? `+${text}` : text;
}

/** A whole percentage. @param value in percent @returns "38 %" with a space that does not break @source house rule @example percent(37.6) // => '38 %' */
export function percent(value: number): string {
  return `${decimal(Math.round(value), 0)}${nonBreakingSpace}%`;
}

/** A time to 0.01 ms. @param value in ms @returns "9.71 ms" @source house rule @example milliseconds(9.71) // => '9.71 ms' */
export function milliseconds(value: number): string {
  return `${decimal(value, 2)}${nonBreakingSpace}ms`;
}

/** An amplitude kept in µV as the screen shows it for muscle. @returns "3.5 mV" @source house rule @example millivolts(3500) // => '3.5 mV' */
export function millivolts(amplitudeUv: number): string {
  return `${decimal(amplitudeUv / 1000, 1)}${nonBreakingSpace}mV`;
}

/** A velocity in whole m/s, with one digit when very slow. @param value in m/s @returns "31 m/s", "3.5 m/s" @source house rule @example metresPerSecond(31.4) // => '31 m/s' */
export function metresPerSecond(value: number): string {
  return `${decimal(value, velocityDigits(value))}${nonBreakingSpace}m/s`;
}

/**
 * A span of time in words.
 * @param ms ms, 0 or more
 * @returns "24 s", "12 min", "1 h 12 min"
 * @source house rule
 * @accuracy cut to the unit shown, so a screen never claims more than has passed
 * @example
 * durationWords(72 * 60_000) // => '1 h 12 min'
 */
export function durationWords(ms: number): string {
  const seconds = Math.max(0, Math.floor(ms / 1000));
  if (seconds < 60) return `${seconds}${nonBreakingSpace}s`;
  const minutes = Math.floor(seconds / 60);
  if (minutes < 60) return `${minutes}${nonBreakingSpace}min`;
  return `${Math.floor(minutes / 60)}${nonBreakingSpace}h ${minutes % 60}${nonBreakingSpace}min`;
}
