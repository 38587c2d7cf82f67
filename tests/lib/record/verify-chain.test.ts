import { createHash } from 'node:crypto';
import { describe, expect, test } from 'vitest';
import { chainEntries } from '@/lib/record/chain-entries';
import { EMPTY_HEAD, type SealedEntry } from '@/lib/record/entry';
import { verifyChain } from '@/lib/record/verify-chain';
import type { StoredEntry } from '@/lib/record/verify-entry';
import { chainOf, unchained } from './record-arbitraries';

const kinds = ['case.planned', 'case.opened', 'run.logged', 'case.closed'];

/** A stored entry with other text, hashed again, as someone with the database's password could. */
function rewritten(one: SealedEntry | undefined, change: (text: string) => string): StoredEntry {
  const bytes = Buffer.from(change(Buffer.from(one?.bytes ?? []).toString('utf8')), 'utf8');
  return { bytes: new Uint8Array(bytes), hash: createHash('sha256').update('fascicle-entry-1\n').update(bytes).digest('hex') };
}

function replaced(chain: readonly StoredEntry[], seq: number, one: StoredEntry): StoredEntry[] {
  return chain.map((stored, index) => (index === seq - 1 ? one : stored));
}

describe('verifyChain', () => {
  test('passes an untouched case', () => {
    expect(verifyChain(chainOf(...kinds))).toEqual({ ok: true, count: 4 });
  });

  test('finds each single flipped bit of a case at its entry', () => {
    const chain = chainOf('case.planned', 'run.logged');
    const missed: string[] = [];
    for (const [index, { bytes, hash }] of chain.entries()) {
      for (let bit = 0; bit < bytes.length * 8; bit += 1) {
        const flipped = Uint8Array.from(bytes);
        flipped[bit >> 3] = (flipped[bit >> 3] ?? 0) ^ (1 << (bit & 7));
        const verdict = verifyChain(replaced(chain, index + 1, { bytes: flipped, hash }));
        if (verdict.ok || verdict.seq !== index + 1) missed.push(`entry ${index + 1}, bit ${bit}`);
      }
    }
    expect(missed).toEqual([]);
  });

  test('finds an entry that is missing, twice or out of order, at its number', () => {
    const chain = chainOf(...kinds);
    const [a, b, c, d] = chain as [SealedEntry, SealedEntry, SealedEntry, SealedEntry];
    expect(verifyChain([a, c, d])).toMatchObject({ ok: false, seq: 2, problem: 'It says that it is number 3, but 2 is next.' });
    expect(verifyChain([a, b, b, c, d])).toMatchObject({ ok: false, seq: 3 });
    expect(verifyChain([a, c, b, d])).toMatchObject({ ok: false, seq: 2 });
    expect(verifyChain([b, c, d])).toMatchObject({ ok: false, seq: 1 });
    expect(verifyChain([])).toEqual({ ok: false, seq: 1, problem: 'It is missing: the case has no entries.' });
  });

  test('finds an entry that was edited and hashed again where the next one no longer follows', () => {
    const chain = chainOf(...kinds);
    const edited = rewritten(chain[1], (text) => text.replace('"step":1', '"step":9'));
    expect(verifyChain(replaced(chain, 2, edited))).toMatchObject({ ok: false, seq: 3, problem: expect.stringMatching(/^It follows hash/) as string });
  });

  test.each([
    ['a space', (text: string) => text.replace('{"author"', '{ "author"')],
    ['a key that stands twice', (text: string) => text.replace('"seq":1', '"seq":7,"seq":1')],
    ['a number written otherwise', (text: string) => text.replace('"seq":1', '"seq":1.0')],
    ['another order of keys', (text: string) => text.replace('"kind":"case.planned","kindVersion":1', '"kindVersion":1,"kind":"case.planned"')],
  ])('finds bytes that are not canonical: %s', (_name, change) => {
    const changed = rewritten(chainOf('case.planned')[0], change);
    expect(verifyChain([changed])).toMatchObject({ ok: false, seq: 1, problem: expect.stringMatching(/not in canonical form/) as string });
  });

  test('finds an unknown format and a field that is not of an entry', () => {
    const [first] = chainOf('case.planned');
    expect(verifyChain([rewritten(first, (text) => text.replace('"format":1', '"format":2'))])).toMatchObject({
      ok: false, seq: 1, problem: 'Its bytes are no entry: entry.format is 2; allowed is 1, the only format that this version knows.',
    });
    expect(verifyChain([rewritten(first, (text) => text.replace('"format":1', '"extra":0,"format":1'))])).toMatchObject({ ok: false, seq: 1 });
  });

  test('finds a time that goes back and takes an equal one', () => {
    const [first] = chainEntries(EMPTY_HEAD, [unchained(9, 'case.planned')]);
    const head = { seq: 1, hash: first?.hash ?? '' };
    const after = (n: number) => verifyChain([first as SealedEntry, ...chainEntries(head, [unchained(n, 'case.opened')])]);
    expect(after(9)).toEqual({ ok: true, count: 2 });
    expect(after(8)).toMatchObject({ ok: false, seq: 2, problem: expect.stringMatching(/^It was recorded at/) as string });
  });

  test('finds an entry of another case or hospital though its chain fits', () => {
    const [first] = chainOf('case.planned') as [SealedEntry];
    const other = { caseId: '018f0000-0000-7000-8000-0000000000c2', hospitalId: '018f0000-0000-7000-8000-00000000000b' };
    for (const [field, id] of Object.entries(other)) {
      const graft = chainEntries({ seq: 1, hash: first.hash }, [{ ...unchained(2, 'case.opened'), [field]: id }]);
      expect(verifyChain([first, ...graft])).toMatchObject({ ok: false, seq: 2, problem: expect.stringContaining(id) as string });
    }
  });

  test('holds the grammar: planned first and once, only addenda after the seal', () => {
    expect(verifyChain(chainOf('case.opened'))).toMatchObject({ ok: false, seq: 1 });
    expect(verifyChain(chainOf('case.planned', 'case.planned'))).toMatchObject({ ok: false, seq: 2 });
    expect(verifyChain(chainOf('case.planned', 'case.sealed', 'addendum.written', 'addendum.written'))).toEqual({ ok: true, count: 4 });
    expect(verifyChain(chainOf('case.planned', 'case.sealed', 'addendum.written', 'run.logged'))).toEqual({
      ok: false, seq: 4, problem: 'It is run.logged, but after case.sealed only addenda may follow.',
    });
    expect(verifyChain(chainOf('case.planned', 'case.sealed', 'case.sealed'))).toMatchObject({ ok: false, seq: 3 });
  });
});
