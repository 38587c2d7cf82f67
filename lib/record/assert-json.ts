/**
 * Asserts that a value is plain JSON, so that nothing is dropped or rewritten on its way into the bytes.
 *
 * Refuses what JSON.stringify would drop or change in silence (undefined, functions, symbols, NaN, Infinity, dates and
 * other classes), text that UTF-8 cannot hold (a lone surrogate) and NUL, which PostgreSQL's text and jsonb cannot hold.
 * −0 passes and is written 0, as RFC 8785 asks. Does not bound depth or size: the contracts do.
 *
 * @param value the value to look at; not modified
 * @param path where the value stands, for the sentence
 * @returns nothing
 * @throws {RangeError} at the first part that is not plain JSON, with its path
 * @source RFC 8785 §3.2.2 (numbers, strings); the refusal of NUL is a house rule
 * @example assertJson({ onsetMs: 3.2 }, 'body')
 */
export function assertJson(value: unknown, path: string): void {
  if (value === null || typeof value === 'boolean') return;
  if (typeof value === 'number') return assertFinite(value, path);
  if (typeof value === 'string') return assertText(value, path);
  if (Array.isArray(value)) {
    for (let index = 0; index < value.length; index += 1) assertJson(value[index], `${path}[${index}]`);
    return;
  }
  if (typeof value !== 'object') throw new RangeError(`${path} is ${typeof value}; an entry holds JSON only.`);
  const prototype: unknown = Object.getPrototypeOf(value);
  if (prototype !== Object.prototype && prototype !== null) throw new RangeError(`${path} is not a plain object; an entry holds JSON only.`);
  if (Object.getOwnPropertySymbols(value).length > 0) throw new RangeError(`${path} has a symbol for a key; an entry holds JSON only.`);
  for (const [key, part] of Object.entries(value)) {
    assertText(key, `A key of ${path}`);
    assertJson(part, `${path}.${key}`);
  }
}

function assertFinite(value: number, path: string): void {
  if (!Number.isFinite(value)) throw new RangeError(`${path} is ${value}; only finite numbers are allowed.`);
}

function assertText(text: string, path: string): void {
  if (!text.isWellFormed()) throw new RangeError(`${path} has a lone surrogate; only well-formed Unicode is allowed.`);
  if (text.includes('\u0000')) throw new RangeError(`${path} has a NUL character; the database cannot hold it.`);
}
