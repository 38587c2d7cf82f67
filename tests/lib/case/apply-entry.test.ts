import { describe, expect, it } from 'vitest';

import { applyEntry } from '@/lib/case/apply-entry';
import { initialState } from '@/lib/case/initial-state';
import { wallEntry } from '@/lib/contracts/channel/wall-entry';
import { theatreView } from '@/lib/text/theatre-view';
import { everyKindCase } from '@/tests/lib/case/every-kind';

const script = everyKindCase();
const first = script.entries[0]!;
const start = initialState(first.caseId);

describe('applyEntry', () => {
  it('applyEntry carries number and hash', () => {
    expect(applyEntry(start, first)).toMatchObject({ seq: 1, hash: first.hash });
    expect(script.state).toMatchObject({ seq: script.entries.length, hash: script.entries.at(-1)!.hash });
  });

  it.each([
    ['a gap', script.entries[1]!],
    ['a repeat', { ...first, seq: 0 }],
    ['another beginning', { ...first, previousHash: 'f'.repeat(64) }],
  ] as const)('applyEntry refuses %s', (_case, entry) => {
    expect(() => applyEntry(start, entry)).toThrow(RangeError);
  });

  it('applyEntry refuses an entry of a fork', () => {
    const state = applyEntry(start, first);
    expect(() => applyEntry(state, { ...script.entries[1]!, previousHash: 'f'.repeat(64) })).toThrow('its previous hash is not the one held');
  });

  it('applyEntry moves only number and hash where the body is not for this viewer', () => {
    const state = applyEntry(start, first);
    const next = { ...script.entries[1]!, body: null };
    expect(applyEntry(state, next)).toEqual({ ...state, seq: 2, hash: next.hash });
  });

  it('applyEntry does not modify state or entry', () => {
    const frozen = (value: unknown): unknown => {
      if (typeof value === 'object' && value !== null) Object.values(Object.freeze(value)).forEach(frozen);
      return value;
    };
    let state = start;
    for (const entry of structuredClone(script.entries)) {
      frozen(state);
      frozen(entry);
      state = applyEntry(state, entry);
    }
    expect(state).toEqual(script.state);
  });

  it('applyEntry gives a wall the same screen at every entry as a person, without any name or note', () => {
    let person = start;
    let wall = start;
    for (const entry of script.entries) {
      person = applyEntry(person, entry);
      wall = applyEntry(wall, JSON.parse(JSON.stringify(wallEntry(entry))) as typeof entry);
      const nowMs = Date.parse(entry.recordedAt) + 500;
      expect(theatreView(wall, nowMs, 'UTC')).toEqual(theatreView(person, nowMs, 'UTC'));
    }
    const stream = JSON.stringify(script.entries.map(wallEntry));
    for (const secret of ['K7-0001', 'cccc', 'person-1', 'Arm on the table', 'Typed 2.6', 'Agree, focal', 'Handed over', 'Side and patient', 'Anaesthetist', 'Ulnar at 38 per cent']) {
      expect(JSON.stringify(script.entries)).toContain(secret);
      expect(stream).not.toContain(secret);
    }
  });
});
