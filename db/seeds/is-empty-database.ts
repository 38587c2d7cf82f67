import type { Handle } from '@/db/connection';

/** Whether no hospital and no person stands in the database: only then may a demo be put into it. */
export async function isEmptyDatabase(admin: Handle): Promise<boolean> {
  const { rows } = await admin.raw<{ rows: { empty: boolean }[] }>(
    'select not exists (select from hospitals) and not exists (select from people) as empty',
  );
  return rows[0]?.empty === true;
}
