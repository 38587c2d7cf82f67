import type { Handle } from '@/db/connection';
import { readAppendError } from '@/db/append-error';
import type { SealedEntry } from '@/lib/record/entry';

// The columns are read from the bytes by the database itself; "offset 0" keeps it from parsing them once per column.
const APPEND = `
  insert into entries (
    hospital_id, case_id, seq, format, kind, kind_version, command_id, command_part, command_digest, event_at, recorded_at,
    author_id, author_role, author_display_name, body, previous_hash, hash, bytes)
  select (e->>'hospitalId')::uuid, (e->>'caseId')::uuid, (e->>'seq')::bigint, (e->>'format')::smallint,
    e->>'kind', (e->>'kindVersion')::integer, e->>'commandId', (e->>'commandPart')::integer, decode(e->>'commandDigest', 'hex'),
    (e->>'eventAt')::timestamptz, (e->>'recordedAt')::timestamptz,
    e#>>'{author,id}', e#>>'{author,role}', e#>>'{author,displayName}', e->'body', decode(e->>'previousHash', 'hex'), hash, bytes
  from (
    select given.*, convert_from(given.bytes, 'UTF8')::jsonb as e
    from unnest(?::bytea[], ?::bytea[]) with ordinality as given (bytes, hash, place) offset 0
  ) as read
  order by place`;

/**
 * Appends entries of one case: one statement, all or none. The primary key (case, seq) is the lock; throws AppendError
 * with kind `clash`, `repeat` or `refused`. Never "on conflict do nothing": what was not written must be known.
 */
export async function insertEntries(handle: Handle, sealed: readonly SealedEntry[]): Promise<void> {
  if (sealed.length === 0) return;
  const bytes = sealed.map((one) => Buffer.from(one.bytes));
  const hashes = sealed.map((one) => Buffer.from(one.hash, 'hex'));
  try {
    await handle.raw(APPEND, [bytes, hashes]);
  } catch (error) {
    throw readAppendError(error);
  }
}
