import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { chainEntries } from '@/lib/record/chain-entries';
import { EMPTY_HEAD } from '@/lib/record/entry';
import { verifyChain } from '@/lib/record/verify-chain';
import { jsonBody, unchained } from './record-arbitraries';

describe('chainEntries', () => {
  test('numbers from the head and puts each entry on the one before', () => {
    const chained = chainEntries({ seq: 41, hash: 'e'.repeat(64) }, [unchained(1, 'step.logged'), unchained(2, 'step.logged')]);
    expect(chained.map(({ entry }) => [entry.seq, entry.previousHash])).toEqual([
      [42, 'e'.repeat(64)],
      [43, chained[0]?.hash],
    ]);
  });

  test('begins a case at 1 after 64 zeros', () => {
    const [first] = chainEntries(EMPTY_HEAD, [unchained(1, 'case.planned')]);
    expect([first?.entry.seq, first?.entry.previousHash]).toEqual([1, '0'.repeat(64)]);
  });

  test('takes an equal time and refuses a lower one, also against the head', () => {
    const at = unchained(5, 'step.logged').recordedAt;
    expect(chainEntries({ seq: 1, hash: 'e'.repeat(64), recordedAt: at }, [unchained(5, 'step.logged')])).toHaveLength(1);
    expect(() => chainEntries({ seq: 1, hash: 'e'.repeat(64), recordedAt: at }, [unchained(4, 'step.logged')])).toThrow(/may not be lower/);
    expect(() => chainEntries(EMPTY_HEAD, [unchained(2, 'case.planned'), unchained(1, 'step.logged')])).toThrow(/may not be lower/);
  });

  test('gives a chain that verifies, whole or appended in two halves, for any bodies', () => {
    fc.assert(
      fc.property(fc.array(jsonBody, { minLength: 1, maxLength: 8 }), fc.nat(8), (bodies, cut) => {
        const drafts = bodies.map((body, index) => unchained(index + 1, index === 0 ? 'case.planned' : 'step.logged', body));
        const whole = chainEntries(EMPTY_HEAD, drafts);
        const begun = chainEntries(EMPTY_HEAD, drafts.slice(0, cut));
        const last = begun.at(-1);
        const rest = chainEntries(last === undefined ? EMPTY_HEAD : { seq: last.entry.seq, hash: last.hash }, drafts.slice(cut));
        expect([...begun, ...rest].map(({ hash }) => hash)).toEqual(whole.map(({ hash }) => hash));
        expect(verifyChain(whole)).toEqual({ ok: true, count: bodies.length });
      }),
    );
  });
});
