import { describe, expect, test } from 'vitest';
import { assertEntry } from '@/lib/record/assert-entry';
import { parseEntry } from '@/lib/record/parse-entry';
import { chainOf } from './record-arbitraries';

const first = chainOf('case.planned')[0];
const good = { ...first?.entry };

describe('assertEntry', () => {
  test('takes an entry', () => {
    expect(() => assertEntry(good)).not.toThrow();
  });

  test('takes exactly 120 characters of command id and refuses 121', () => {
    expect(() => assertEntry({ ...good, commandId: 'x'.repeat(120) })).not.toThrow();
    expect(() => assertEntry({ ...good, commandId: 'x'.repeat(121) })).toThrow('allowed is 1 to 120 characters');
  });

  const refused: readonly (readonly [field: string, value: unknown])[] = [
    ['format', 2],
    ['format', '1'],
    ['hospitalId', '018F0000-0000-7000-8000-00000000000A'],
    ['caseId', 'ulnar'],
    ['seq', 0],
    ['seq', 1.5],
    ['seq', '1'],
    ['previousHash', '0'.repeat(63)],
    ['previousHash', 'G'.repeat(64)],
    ['kind', 'planned'],
    ['kind', 'Case.planned'],
    ['kindVersion', 0],
    ['kindVersion', 2 ** 31],
    ['commandId', ''],
    ['commandPart', -1],
    ['commandDigest', null],
    ['eventAt', '2027-03-14T10:00:00Z'],
    ['eventAt', '2027-02-30T10:00:00.000Z'],
    ['recordedAt', '2027-03-14T10:00:00.000+00:00'],
    ['author', []],
    ['body', null],
    ['body', []],
  ];
  test.each(refused)('refuses %s = %j with the field and what is allowed', (field, value) => {
    expect(() => assertEntry({ ...good, [field]: value })).toThrow(new RegExp(`^entry\\.${field} is .+; allowed is .+\\.$`));
  });

  test('refuses a field that is missing, and one that is not of an entry', () => {
    const { kind: _kind, ...without } = good;
    expect(() => assertEntry(without)).toThrow('entry.kind is missing');
    expect(() => assertEntry({ ...good, mood: 'calm' })).toThrow('entry.mood is not a field of an entry.');
    expect(() => assertEntry({ ...good, author: { ...good.author, email: 'desk@demo.example' } })).toThrow('author.email is not a field of an author.');
  });
});

describe('parseEntry', () => {
  test('reads back what was sealed', () => {
    expect(parseEntry(first?.bytes ?? new Uint8Array())).toEqual(good);
  });

  test('refuses bytes that are not UTF-8, not JSON, or begin with a byte order mark', () => {
    for (const bytes of [Uint8Array.of(0xff, 0xfe), new TextEncoder().encode('{"format":1'), Uint8Array.of(0xef, 0xbb, 0xbf, 0x7b, 0x7d)]) {
      expect(() => parseEntry(bytes)).toThrow(new RangeError('The bytes are not JSON in UTF-8.'));
    }
  });
});
