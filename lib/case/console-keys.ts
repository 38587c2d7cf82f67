/**
 * Keys of the log console itself. A site or step of a plan never takes one of them.
 *
 * Method: one letter does one thing for the whole case, so that a hand that does not look is right.
 * Digits belong to the sites, and only while the site group has the focus.
 *
 * @returns rows of key and the action that stands on its button
 * @source house rule
 * @accuracy exact; tests/lib/reference/templates/templates.test.ts
 * @example
 * consoleKeys.t // => 'Told'
 */
export const consoleKeys = {
  a: 'Surgeon’s action',
  b: 'Read back',
  c: 'Condition',
  e: 'End',
  m: 'Message',
  n: 'No response',
  o: 'Other step',
  r: 'Same settings',
  s: 'Site',
  t: 'Told',
  u: 'Correct last run',
  v: 'Advice confirmed',
} as const satisfies Readonly<Record<string, string>>;

/** A key of the console. */
export type ConsoleKey = keyof typeof consoleKeys;

/**
 * Whether the console uses this key itself.
 * @param key one character or the browser's name of a key
 * @returns true when it does
 * @source house rule
 */
export function isConsoleKey(key: string): key is ConsoleKey {
  return Object.hasOwn(consoleKeys, key);
}
