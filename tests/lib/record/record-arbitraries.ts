import fc from 'fast-check';
import { chainEntries, type UnchainedEntry } from '@/lib/record/chain-entries';
import { EMPTY_HEAD, type SealedEntry } from '@/lib/record/entry';

const hospitalId = '018f0000-0000-7000-8000-00000000000a';
const caseId = '018f0000-0000-7000-8000-0000000000c1';

/** An entry without its place; entry n is recorded n seconds after ten o'clock. */
export function unchained(n: number, kind: string, body: object = {}): UnchainedEntry {
  const at = new Date(Date.UTC(2027, 2, 14, 10, 0, n)).toISOString();
  return {
    hospitalId,
    caseId,
    kind,
    kindVersion: 1,
    commandId: `018f0000-0000-7000-8000-${String(n).padStart(12, '0')}`,
    commandPart: 0,
    commandDigest: 'ab'.repeat(32),
    eventAt: at,
    recordedAt: at,
    author: { id: '018f0000-0000-7000-8000-0000000000f1', role: 'neurophysiologist', displayName: 'Neurophysiologist' },
    body,
  };
}

/** A case of these kinds, chained from its beginning. */
export function chainOf(...kinds: readonly string[]): SealedEntry[] {
  return chainEntries(EMPTY_HEAD, kinds.map((kind, index) => unchained(index + 1, kind, { step: index })));
}

/** Any well-formed text that the database can hold. */
export const databaseText = fc.string({ unit: 'binary' }).filter((text) => !text.includes('\u0000'));

/** Any JSON object that an entry may carry. */
export const jsonBody = fc.dictionary(
  databaseText,
  fc.letrec((tie) => ({
    value: fc.oneof(
      { depthSize: 'small' },
      fc.constant(null),
      fc.boolean(),
      fc.double({ noNaN: true, noDefaultInfinity: true }),
      databaseText,
      fc.array(tie('value'), { maxLength: 4 }),
      fc.dictionary(databaseText, tie('value'), { maxKeys: 4 }),
    ),
  })).value,
  { maxKeys: 5 },
);
