import { randomInt } from 'node:crypto';

/** Letters for the check: a prime number of them, none taken for a digit. */
const checkLetters = 'ABCDEFGHJKLMNPRSTUVWXYZ';

/**
 * Check letter of a reference's digits. Different weights below a prime modulus find every single wrong digit and every
 * exchange of two.
 */
export function checkLetterOf(digits: string): string {
  const sum = [...digits].reduce((total, digit, index) => total + Number(digit) * (index + 2), 0);
  return checkLetters.charAt(sum % checkLetters.length);
}

/** A new human reference: two digits of the year, five drawn at random, a check letter, as in 27-40218-K. */
export function newCaseReference(nowMs: number): string {
  const year = String(new Date(nowMs).getUTCFullYear() % 100).padStart(2, '0');
  const drawn = String(randomInt(100_000)).padStart(5, '0');
  return `${year}-${drawn}-${checkLetterOf(year + drawn)}`;
}
