import type { Handle } from '@/db/connection';
import { findCase } from '@/db/repositories/cases/find-case';
import type { Entry } from '@/lib/record/entry';
import type { ChainVerdict } from '@/lib/record/verify-chain';
import { CHAIN_START, verifyEntry, type ChainPosition } from '@/lib/record/verify-entry';
import { firstWrongBody } from './first-wrong-body';
import { columnProblem, storedColumnsAfter, type StoredColumns } from './stored-columns';

const BATCH = 500;

type Reading = { position: ChainPosition; entries: Entry[]; problem: string | null };

/**
 * Verifies a case as it is stored: chain, grammar, and every column against the bytes it was read from.
 * Reads in batches. A tail that was cut off, or a whole case that was removed, shows only against a head kept elsewhere.
 */
export async function verifyCase(handle: Handle, caseId: string, batch: number = BATCH): Promise<ChainVerdict> {
  let position = CHAIN_START;
  for (;;) {
    const rows = await storedColumnsAfter(handle, caseId, position.seq, batch);
    const read = readBatch(rows, caseId, position);
    const wrongBody = read.entries.length === 0 ? null : await firstWrongBody(handle, caseId, read.entries);
    if (wrongBody !== null) return { ok: false, seq: wrongBody, problem: 'Its column body is not what its bytes say.' };
    if (read.problem !== null) return { ok: false, seq: read.position.seq + 1, problem: read.problem };
    position = read.position;
    if (rows.length < batch) return endOf(handle, caseId, position);
  }
}

function readBatch(rows: readonly StoredColumns[], caseId: string, before: ChainPosition): Reading {
  let position = before;
  const entries: Entry[] = [];
  for (const row of rows) {
    const next = position.seq + 1;
    if (Number(row.seq) !== next) return { position, entries, problem: `It is missing: after entry ${position.seq} stands entry ${row.seq}.` };
    const verdict = verifyEntry(row, position);
    if (!verdict.ok) return { position, entries, problem: verdict.problem };
    const problem = columnProblem(row, verdict.entry);
    if (problem !== null) return { position, entries, problem };
    entries.push(verdict.entry);
    position = verdict.position;
  }
  return { position, entries, problem: before.seq === 0 && rows.length === 0 ? `It is missing: case ${caseId} has no entries.` : null };
}

async function endOf(handle: Handle, caseId: string, position: ChainPosition): Promise<ChainVerdict> {
  const row = await findCase(handle, caseId);
  if (row === null) return { ok: false, seq: 1, problem: `There is no case ${caseId} that it could belong to.` };
  if (row.hospitalId !== position.hospitalId) return { ok: false, seq: 1, problem: `The case's row names hospital ${row.hospitalId}, but its entries another.` };
  return { ok: true, count: position.seq };
}
