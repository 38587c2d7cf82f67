import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';

import { describe, expect, it } from 'vitest';

import { knownKinds } from '@/lib/case/known-kinds';
import { UnknownKindError, upcast } from '@/lib/case/upcast';
import type { WireEntry } from '@/lib/contracts/http/replies';
import { sealEntry } from '@/lib/record/seal-entry';
import type { Entry } from '@/lib/record/entry';
import { verifyChain } from '@/lib/record/verify-chain';
import { everyKindCase } from '@/tests/lib/case/every-kind';
import { replayedFacts } from '@/tests/lib/case/replayed-facts';

const folder = path.resolve(import.meta.dirname, 'fixtures');
const logs = readdirSync(folder).filter((name) => name.startsWith('frozen-log-')).map((name) => {
  const { facts, entries } = JSON.parse(readFileSync(path.join(folder, name), 'utf8')) as { facts: unknown; entries: WireEntry[] };
  return [name, facts, entries] as const;
});

/** The entry as it was hashed: without the hash that travels beside it. */
function sealed({ hash: _hash, ...entry }: WireEntry) {
  return sealEntry(entry as Entry);
}

describe('the frozen logs', () => {
  it('there is one', () => expect(logs.length).toBeGreaterThan(0));

  it.each(logs)('%s keeps its bytes and its chain', (_name, _facts, entries) => {
    const again = entries.map(sealed);
    expect(again.map(({ hash }) => hash)).toEqual(entries.map(({ hash }) => hash));
    expect(verifyChain(again)).toEqual({ ok: true, count: entries.length });
  });

  it.each(logs)('%s replays to the facts it was written with', (_name, facts, entries) => {
    expect(JSON.parse(JSON.stringify(replayedFacts(entries)))).toEqual(facts);
  });

  it('the newest holds every entry kind', () => {
    const kinds = new Set(logs.at(-1)![2].map((entry) => entry.kind));
    expect([...kinds].sort()).toEqual(Object.keys(knownKinds).sort());
  });

  it('a changed body is found by its hash and by the facts', () => {
    const entries = structuredClone(logs.at(-1)![2]) as WireEntry[];
    const notice = entries.find((entry) => entry.kind === 'notice.raised')!;
    Object.assign(notice.body!, { finding: 'response-lost' });
    expect(sealed(notice).hash).not.toBe(notice.hash);
    expect(JSON.parse(JSON.stringify(replayedFacts(entries)))).not.toEqual(logs.at(-1)![1]);
  });
});

describe('the case with every kind', () => {
  it('decide gives every entry kind', () => {
    const kinds = new Set(everyKindCase().entries.map((entry) => entry.kind));
    expect(Object.keys(knownKinds).filter((kind) => !kinds.has(kind))).toEqual([]);
  });
});

describe('upcast', () => {
  const entry = { ...logs.at(-1)![2][0]! };
  it.each([
    ['a kind it does not know', { kind: 'run.dreamt' }],
    ['a kind named like what every object has', { kind: 'toString' }],
    ['a version it does not know', { kindVersion: 2 }],
    ['a kind it does not know although it may not read the body', { kind: 'run.dreamt', body: null }],
    ['a version that never was', { kindVersion: 0 }],
  ])('upcast throws at %s', (_case, change) => {
    expect(() => upcast({ ...entry, ...change })).toThrow(UnknownKindError);
  });

  it('upcast gives null for a body that is not for this viewer', () => expect(upcast({ ...entry, body: null })).toBeNull());
});
