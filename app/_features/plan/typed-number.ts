/**
 * What a field for a number holds: the number that was typed, or else the typed text itself, so that a mistake can be
 * named. A comma counts as a point.
 */
export function typedNumber(typed: unknown): number | string {
  if (typeof typed === 'number') return typed;
  const text = String(typed ?? '').trim();
  return /^-?(\d+\.?\d*|\.\d+)$/.test(text.replace(',', '.')) ? Number(text.replace(',', '.')) : text;
}

/** The sentence of a mistake, with the value that was typed: what is wrong, with which value, what is allowed. */
export function mistakeSentence(message: string, value: unknown): string {
  const rest = message.charAt(0).toLowerCase() + message.slice(1);
  if (typeof value === 'number' && !Number.isNaN(value)) return `${value}: ${rest}`;
  if (typeof value !== 'string' || !message.startsWith('Not a number')) return message;
  return value.trim() === '' ? message.replace('Not a number', 'Empty') : `“${value.slice(0, 20)}” is ${rest}`;
}
