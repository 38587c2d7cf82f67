const uuid = /^[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12}$/;
const hash = /^[0-9a-f]{64}$/;
const kind = /^[a-z][a-z0-9-]*(\.[a-z][a-z0-9-]*)+$/;
const moment = /^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}:\d{2}\.\d{3}Z$/;

const isUuid = (value: unknown) => typeof value === 'string' && uuid.test(value);
const isHash = (value: unknown) => typeof value === 'string' && hash.test(value);
const isKind = (value: unknown) => typeof value === 'string' && value.length <= 60 && kind.test(value);
const isText = (max: number) => (value: unknown) => typeof value === 'string' && value.length >= 1 && value.length <= max;
const isCount = (from: number, to: number) => (value: unknown) => Number.isSafeInteger(value) && Number(value) >= from && Number(value) <= to;
const isObject = (value: unknown) => typeof value === 'object' && value !== null && !Array.isArray(value);
const isMoment = (value: unknown) =>
  typeof value === 'string' && moment.test(value) && !Number.isNaN(Date.parse(value)) && new Date(value).toISOString() === value;

const MOMENT = 'RFC 3339 in UTC with milliseconds';
const HASH = '64 lower-case hexadecimal digits';

/** What a field may hold: the check, and what the sentence says is allowed. */
export type FieldForm = readonly [check: (value: unknown) => boolean, allowed: string];

/** Largest `kindVersion` and `commandPart`: what the columns of the database hold. */
const LARGEST_COLUMN = 2_147_483_647;

/** Form of every field of an entry. @source house rule */
export const ENTRY_FORM: Readonly<Record<string, FieldForm>> = {
  format: [(value) => value === 1, '1, the only format that this version knows'],
  hospitalId: [isUuid, 'a UUID in lower case'],
  caseId: [isUuid, 'a UUID in lower case'],
  seq: [isCount(1, Number.MAX_SAFE_INTEGER), 'a whole number from 1'],
  previousHash: [isHash, HASH],
  kind: [isKind, 'words such as run.logged, up to 60 characters'],
  kindVersion: [isCount(1, LARGEST_COLUMN), 'a whole number from 1'],
  commandId: [isText(120), '1 to 120 characters'],
  commandPart: [isCount(0, LARGEST_COLUMN), 'a whole number from 0'],
  commandDigest: [isHash, HASH],
  eventAt: [isMoment, MOMENT],
  recordedAt: [isMoment, MOMENT],
  author: [isObject, 'an object with id, role and displayName'],
  body: [isObject, 'a JSON object'],
};

/** Form of every field of an author. @source house rule */
export const AUTHOR_FORM: Readonly<Record<string, FieldForm>> = {
  id: [isText(120), '1 to 120 characters'],
  role: [isText(60), '1 to 60 characters'],
  displayName: [isText(200), '1 to 200 characters'],
};
