import type { Handle } from '@/db/connection';

/** Every case id there is, also of entries whose case row is gone, on the feed. */
export async function caseIdsToVerify(feed: Handle): Promise<string[]> {
  const { rows } = await feed.raw<{ rows: { id: string }[] }>('select id from cases union select case_id from entries order by 1');
  return rows.map((row) => row.id);
}
