import type { Handle } from '@/db/connection';
import type { Entry } from '@/lib/record/entry';

/** Every column of an entry as text, so that nothing is rounded on the way to its comparison. */
export interface StoredColumns {
  readonly seq: string;
  readonly hospital_id: string;
  readonly case_id: string;
  readonly format: string;
  readonly kind: string;
  readonly kind_version: string;
  readonly command_id: string;
  readonly command_part: string;
  readonly command_digest: string;
  readonly event_at: string;
  readonly recorded_at: string;
  readonly author_id: string;
  readonly author_role: string;
  readonly author_display_name: string;
  readonly previous_hash: string;
  readonly hash: string;
  readonly bytes: Buffer;
}

const COLUMNS = `seq::text, hospital_id::text, case_id::text, format::text, kind, kind_version::text, command_id, command_part::text,
  encode(command_digest, 'hex') as command_digest, (extract(epoch from event_at) * 1000)::text as event_at,
  (extract(epoch from recorded_at) * 1000)::text as recorded_at, author_id, author_role, author_display_name,
  encode(previous_hash, 'hex') as previous_hash, encode(hash, 'hex') as hash, bytes`;

/** A batch of a case's rows after a number. */
export async function storedColumnsAfter(handle: Handle, caseId: string, seq: number, limit: number): Promise<StoredColumns[]> {
  const { rows } = await handle.raw<{ rows: StoredColumns[] }>(
    `select ${COLUMNS} from entries where case_id = ? and seq > ? order by entries.seq limit ?`,
    [caseId, seq, limit],
  );
  return rows;
}

/** The first column that differs from the entry in the bytes, as a sentence, or null. The body is compared by `firstWrongBody`. */
export function columnProblem(row: StoredColumns, entry: Entry): string | null {
  const expected: Readonly<Record<Exclude<keyof StoredColumns, 'bytes' | 'hash' | 'event_at' | 'recorded_at'>, string>> = {
    seq: String(entry.seq),
    hospital_id: entry.hospitalId,
    case_id: entry.caseId,
    format: String(entry.format),
    kind: entry.kind,
    kind_version: String(entry.kindVersion),
    command_id: entry.commandId,
    command_part: String(entry.commandPart),
    command_digest: entry.commandDigest,
    author_id: entry.author.id,
    author_role: entry.author.role,
    author_display_name: entry.author.displayName,
    previous_hash: entry.previousHash,
  };
  for (const [column, value] of Object.entries(expected)) {
    const stored = row[column as keyof typeof expected];
    if (stored !== value) return `Its column ${column} is ${JSON.stringify(stored)}, but its bytes say ${JSON.stringify(value)}.`;
  }
  if (Number(row.event_at) !== Date.parse(entry.eventAt)) return `Its column event_at is not ${entry.eventAt}, as its bytes say.`;
  if (Number(row.recorded_at) !== Date.parse(entry.recordedAt)) return `Its column recorded_at is not ${entry.recordedAt}, as its bytes say.`;
  return null;
}
