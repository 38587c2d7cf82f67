import { z } from 'zod';

/** Also what turns the direction of writing: it would show the digits of a value in another order than they were typed. */
const controlCharacter = /[\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f-\u009f\u2028-\u202e\u2066-\u2069]/;

/**
 * Text of a person: well-formed Unicode without control characters, trimmed.
 * @param max most characters allowed, 1 or more
 * @returns a schema of 1 to `max` characters
 * @source house rule
 */
export const boundedText = (max: number) =>
  z
    .string()
    .trim()
    .min(1, 'Empty: at least one character is needed')
    .max(max, `Too long: at most ${max} characters are allowed`)
    .refine((text) => text.isWellFormed(), 'Broken character: text must be well-formed Unicode')
    .refine((text) => !controlCharacter.test(text), 'Control character: only printable text is allowed');

/** Short fixed name of a site, channel, path, step or nerve. */
export const slug = z.string().regex(/^[a-z0-9]+(?:-[a-z0-9]+)*$/, 'Not a slug: lower-case letters, digits and single hyphens').max(40);

/** Path id: site slug, slash, channel slug. */
export const pathSlug = z.string().regex(/^[a-z0-9-]{1,40}\/[a-z0-9-]{1,40}$/, 'Not a path: a site, a slash and a channel');

/** Alert id: nerve slug and ordinal. */
export const alertSlug = z.string().regex(/^[a-z0-9-]{1,40}-[1-9][0-9]{0,4}$/, 'Not an alert id: a nerve and a number, as in ulnar-1');

/** A moment: RFC 3339 in UTC with milliseconds. */
export const moment = z
  .string()
  .regex(/^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}:\d{2}\.\d{3}Z$/, 'Not a time: RFC 3339 in UTC with milliseconds, as in 2027-03-14T10:41:20.000Z')
  .refine((text) => !Number.isNaN(Date.parse(text)) && new Date(text).toISOString() === text, 'Not a time: no such day or hour');

/** UUID in any version, lower case. */
export const uuid = z.string().regex(/^[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12}$/, 'Not a UUID');
