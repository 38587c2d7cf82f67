import { expect, test } from 'vitest';

import { initialState } from '@/lib/case/initial-state';
import { readSnapshot, writeSnapshot } from '@/server/cases/state-snapshot';

const caseId = '0192f0c1-0000-7000-8000-00000000000a';
const hash = 'a'.repeat(64);
const kept = { state: { ...initialState(caseId), seq: 500, hash }, head: { seq: 500, hash, recordedAt: '2027-03-14T10:41:20.000Z' } };
const snapshot = writeSnapshot('0192f0c1-0000-7000-8000-00000000000b', kept);

test('readSnapshot gives back what was written', () => {
  expect(readSnapshot(snapshot)).toEqual(kept);
});

test('readSnapshot passes over one that is broken or says something else than its row: the log is read instead', () => {
  const broken = ['', '{"state":', 'null', '[]', '{}', '{"state":{"seq":500}}', '{"head":{"seq":500}}'].map((text) => ({ ...snapshot, bytes: new TextEncoder().encode(text) }));
  const others = [{ ...snapshot, seq: 501 }, writeSnapshot('h', { ...kept, head: { ...kept.head, hash: 'b'.repeat(64) } })];
  expect([...broken, ...others].map(readSnapshot)).toEqual(Array.from({ length: 9 }, () => null));
});
