import { describe, expect, test } from 'vitest';

import { findLosses, type LogRow } from './find-losses';

const log: readonly LogRow[] = [
  { seq: 1, commandId: 'plan', commandPart: 0 },
  { seq: 2, commandId: 'first', commandPart: 0 },
  { seq: 3, commandId: 'first', commandPart: 1 },
  { seq: 4, commandId: 'second', commandPart: 0 },
];
const answered = [
  { commandId: 'first', seq: 2 },
  { commandId: 'second', seq: 4 },
];
const nothing = { missing: [], renumbered: [], duplicated: [], reordered: [], gaps: [] };

// The controls: an oracle that cannot say no proves nothing about the kills.
describe('findLosses', () => {
  test('finds nothing where every acknowledged command stands at its number', () => {
    expect(findLosses(answered, log)).toEqual(nothing);
  });

  test('finds an acknowledged command that is not in the log', () => {
    expect(findLosses([...answered, { commandId: 'third', seq: 5 }], log)).toMatchObject({ missing: ['third'] });
  });

  test('finds a number that changed, a doubled part, a broken order and a gap', () => {
    expect(findLosses([{ commandId: 'first', seq: 3 }], log)).toMatchObject({ renumbered: ['first'] });
    expect(findLosses(answered, [...log, { seq: 5, commandId: 'second', commandPart: 0 }])).toMatchObject({ duplicated: ['second#0'] });
    expect(findLosses([...answered].reverse(), log)).toMatchObject({ reordered: ['first'] });
    expect(findLosses(answered, log.filter((row) => row.seq !== 3))).toMatchObject({ gaps: [4] });
  });
});
