import { describe, expect, it } from 'vitest';

import { wallEntry } from '@/lib/contracts/channel/wall-entry';
import type { WireEntry } from '@/lib/contracts/http/replies';

/** A committed entry of any kind. */
function entry(kind: string, body: Record<string, unknown> | null): WireEntry {
  const hash = 'a'.repeat(64);
  return {
    format: 1, hospitalId: 'h', caseId: 'c', seq: 7, previousHash: hash, hash, kind, kindVersion: 1, commandId: 'k', commandPart: 0, commandDigest: hash,
    eventAt: '2027-03-14T10:41:20.000Z', recordedAt: '2027-03-14T10:41:20.000Z', author: { id: 'person-1', role: 'neurophysiologist', displayName: 'Neurophysiologist' }, body,
  };
}

const typed = 'Words that someone typed';
const readings = [{ channelId: 'adm', reading: { kind: 'not-read' } }];

/** Every place where a person may type freely and that no wall shows. */
const withheld: readonly (readonly [string, Record<string, unknown>])[] = [
  ['case.planned', { reference: typed, identityCommitment: typed, plan: { procedure: 'Transposition', trap: typed } }],
  ['plan.revised', { plan: { procedure: 'Transposition', trap: typed } }],
  ['timeout.confirmed', { side: 'left', text: typed }],
  ['run.logged', { siteId: 'wrist', readings, note: typed }],
  ['run.corrected', { runSeq: 3, run: { siteId: 'wrist', readings, note: typed }, reason: typed }],
  ['baseline.accepted', { family: 'exposed', reason: typed }],
  ['condition.logged', { condition: { kind: 'other', text: typed }, reportedBy: typed }],
  ['condition.logged', { condition: { kind: 'relaxant', text: typed }, reportedBy: null }],
  ['distances.measured', { nerveId: 'ulnar', positions: [], reason: typed }],
  ['alert.told', { alertId: 'ulnar-1', whom: typed, how: typed, words: typed }],
  ['alert.read-back', { alertId: 'ulnar-1', words: typed }],
  ['alert.acted', { alertId: 'ulnar-1', action: typed }],
  ['alert.ended', { alertId: 'ulnar-1', outcome: 'full', cause: 'surgical', text: typed }],
  ['alert.raised', { alertId: 'ulnar-1', aFieldOfALaterVersion: typed }],
  ['message.sent', { text: typed }],
  ['case.closed', { text: typed }],
  ['a.kind-of-a-later-version', { text: typed }],
];

describe('wallEntry', () => {
  it.each(withheld)('keeps what was typed into %s from the wall', (kind, body) => {
    expect(JSON.stringify(wallEntry(entry(kind, body)))).not.toContain(typed);
  });

  it('leaves what a wall shows as it is', () => {
    const run = { siteId: 'wrist', readings };
    expect(wallEntry(entry('run.corrected', { runSeq: 3, run: { ...run, note: null }, reason: typed })).body).toEqual({ runSeq: 3, run });
    expect(wallEntry(entry('run.corrected', { runSeq: 3, run: null, reason: typed })).body).toEqual({ runSeq: 3, run: null });
    expect(wallEntry(entry('phase.changed', { phase: 'paused', reason: 'Position' })).body).toEqual({ phase: 'paused', reason: 'Position' });
    const condition = { kind: 'train-of-four', count: 3, ratio: null };
    expect(wallEntry(entry('condition.logged', { condition, reportedBy: typed })).body).toEqual({ condition });
  });

  it('keeps number, times and hashes, and of the author the role only', () => {
    const before = entry('message.sent', { text: typed });
    expect(wallEntry(before)).toEqual({ ...before, author: { id: '', role: 'neurophysiologist', displayName: '' }, commandDigest: '', body: null });
  });
});
