import type { Handle } from '@/db/connection';

/** Which of these walls are still bound: open sockets of walls are swept against this, on the feed, for all hospitals. */
export async function liveScreenIds(feed: Handle, screenIds: readonly string[]): Promise<Set<string>> {
  const { rows } = await feed.raw<{ rows: { id: string }[] }>(
    'select id from wall_screens where id = any(?::uuid[]) and paired_at is not null and revoked_at is null and ended_at is null',
    [[...screenIds]],
  );
  return new Set(rows.map((row) => row.id));
}
