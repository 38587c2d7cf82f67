import { createHash } from 'node:crypto';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { commandDigest } from '@/lib/record/command-digest';
import { entryHash } from '@/lib/record/entry-hash';
import { sealEntry } from '@/lib/record/seal-entry';
import { jsonBody, unchained } from './record-arbitraries';

const sha256 = (...parts: readonly (string | Uint8Array)[]) => {
  const hash = createHash('sha256');
  for (const part of parts) hash.update(part);
  return hash.digest('hex');
};

describe('entryHash', () => {
  test('is SHA-256 of the prefix and the bytes, as node:crypto computes it', () => {
    fc.assert(
      fc.property(fc.uint8Array({ maxLength: 300 }), (bytes) => {
        expect(entryHash(bytes)).toBe(sha256('fascicle-entry-1\n', bytes));
      }),
    );
  });

  test('of a whole entry covers every field: changing any one changes it', () => {
    const entry = sealEntry({ ...unchained(1, 'case.planned'), body: { side: 'left' }, format: 1, seq: 1, previousHash: '0'.repeat(64) }).entry;
    const changed: Readonly<Record<string, unknown>> = {
      hospitalId: '018f0000-0000-7000-8000-00000000000b',
      caseId: '018f0000-0000-7000-8000-0000000000c2',
      seq: 2,
      previousHash: 'f'.repeat(64),
      kind: 'case.opened',
      kindVersion: 2,
      commandId: 'repeat/ulnar-1/3',
      commandPart: 1,
      commandDigest: 'cd'.repeat(32),
      eventAt: '2027-03-14T10:00:01.001Z',
      recordedAt: '2027-03-14T10:00:01.001Z',
      author: { ...entry.author, displayName: 'Another' },
      body: { side: 'right' },
    };
    expect(Object.keys(changed).sort()).toEqual(Object.keys(entry).filter((field) => field !== 'format').sort());
    const hashes = Object.entries(changed).map(([field, value]) => sealEntry({ ...entry, [field]: value }).hash);
    expect(new Set([sealEntry(entry).hash, ...hashes]).size).toBe(hashes.length + 1);
  });
});

describe('sealEntry', () => {
  test('hashes the bytes that it hands over, for any body', () => {
    fc.assert(
      fc.property(jsonBody, (body) => {
        const sealed = sealEntry({ ...unchained(1, 'case.planned'), body: body as never, format: 1, seq: 1, previousHash: '0'.repeat(64) });
        expect(sealed.hash).toBe(sha256('fascicle-entry-1\n', sealed.bytes));
      }),
    );
  });
});

describe('commandDigest', () => {
  test('is SHA-256 of its own prefix and the canonical command', () => {
    expect(commandDigest({ name: 'open-case', clockOffsetMs: null })).toBe(sha256('fascicle-command-1\n', '{"clockOffsetMs":null,"name":"open-case"}'));
  });

  test('is the same for the same command written in another order, and another for another command', () => {
    expect(commandDigest({ a: 1, b: 2 })).toBe(commandDigest({ b: 2, a: 1 }));
    expect(commandDigest({ a: 1, b: 2 })).not.toBe(commandDigest({ a: 2, b: 1 }));
  });
});
