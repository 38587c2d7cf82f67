import { beforeAll, describe, expect, it } from 'vitest';
import { z } from 'zod';

import { contractVersion } from '@/lib/contracts/contract-version';
import { contractHash, contractSchemas, orderedJson } from '@/tests/architecture/checks/contract-hash';

/**
 * The contract as it stands. Who changes a message raises `contractVersion`, adds its line there, and puts both here:
 * an open desk or wall of the version before must be told to reload, never misread.
 */
const ratchet = { version: 5, hash: '9225b1c1b0ed5ad136cb51054cd830e4d14cb38923b2cc9fbf258a9f81585379' };

describe('the contracts', () => {
  let schemas: Readonly<Record<string, z.ZodType>> = {};
  beforeAll(async () => {
    schemas = await contractSchemas();
  });

  it('are what the version says', () => {
    expect({ version: contractVersion, hash: contractHash(schemas) }).toEqual(ratchet);
  });

  it('hold the messages of both ways', () => {
    const names = Object.keys(schemas);
    expect(names.filter((name) => name.startsWith('lib/contracts/http/')).length).toBeGreaterThan(5);
    expect(names.filter((name) => name.startsWith('lib/contracts/channel/')).length).toBeGreaterThan(3);
  });
});

describe('the hash of a contract', () => {
  const run = z.strictObject({ onsetMs: z.number().min(0.1), note: z.string().nullable() });
  const hash = contractHash({ run });

  it.each([
    ['a new field', z.strictObject({ onsetMs: z.number().min(0.1), note: z.string().nullable(), site: z.string() })],
    ['a lost field', z.strictObject({ onsetMs: z.number().min(0.1) })],
    ['another limit', z.strictObject({ onsetMs: z.number().min(0.2), note: z.string().nullable() })],
    ['another type', z.strictObject({ onsetMs: z.string(), note: z.string().nullable() })],
    ['a field that may be absent', z.strictObject({ onsetMs: z.number().min(0.1).optional(), note: z.string().nullable() })],
    ['unknown keys let in', z.object({ onsetMs: z.number().min(0.1), note: z.string().nullable() })],
  ])('changes with %s', (_what, other) => expect(contractHash({ run: other })).not.toBe(hash));

  it('changes with the name of a message, not with the order of its fields', () => {
    expect(contractHash({ other: run })).not.toBe(hash);
    expect(contractHash({ run: z.strictObject({ note: z.string().nullable(), onsetMs: z.number().min(0.1) }) })).not.toBe('');
    expect(orderedJson({ b: [1, { d: null, c: 'x' }], a: true })).toBe('{"a":true,"b":[1,{"c":"x","d":null}]}');
  });
});
