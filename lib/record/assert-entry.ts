import type { Entry } from './entry';
import { AUTHOR_FORM, ENTRY_FORM, type FieldForm } from './entry-form';

/**
 * Asserts that a value has exactly the fields of an entry, each in its form.
 *
 * Looks at the envelope only: the body is any JSON object, because kinds are for ever and older programs must be able to
 * hash entries of newer kinds. Does not look at the chain: `verifyChain` does.
 *
 * @param value what was read from bytes or is about to be chained; not modified
 * @returns nothing; the value is an `Entry` afterwards
 * @throws {RangeError} with the field, its value and what is allowed
 * @source house rule
 * @example assertEntry(JSON.parse(text))
 */
export function assertEntry(value: unknown): asserts value is Entry {
  assertForm(value, ENTRY_FORM, 'entry');
  assertForm((value as { author: unknown }).author, AUTHOR_FORM, 'author');
}

function assertForm(value: unknown, form: Readonly<Record<string, FieldForm>>, name: string): void {
  if (typeof value !== 'object' || value === null || Array.isArray(value)) throw new RangeError(`${name} is not an object.`);
  const fields = new Map<string, unknown>(Object.entries(value));
  for (const [field, [check, allowed]] of Object.entries(form)) {
    if (!fields.has(field)) throw new RangeError(`${name}.${field} is missing; allowed is ${allowed}.`);
    if (!check(fields.get(field))) throw new RangeError(`${name}.${field} is ${shown(fields.get(field))}; allowed is ${allowed}.`);
  }
  for (const field of fields.keys()) {
    if (!Object.hasOwn(form, field)) throw new RangeError(`${name}.${field} is not a field of an ${name}.`);
  }
}

function shown(value: unknown): string {
  return (JSON.stringify(value) ?? typeof value).slice(0, 80);
}
