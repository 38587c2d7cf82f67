import type { Handle } from '@/db/connection';

/** Which of these sessions are still live: open sockets are swept against this. */
export async function liveSessionIds(handle: Handle, sessionIds: readonly string[]): Promise<Set<string>> {
  const { rows } = await handle.raw<{ rows: { id: string }[] }>(
    'select id from sessions where id = any(?::uuid[]) and revoked_at is null and expires_at > now()',
    [[...sessionIds]],
  );
  return new Set(rows.map((row) => row.id));
}
