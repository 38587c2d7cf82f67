import type { Handle } from '@/db/connection';
import { CREDENTIAL_COLUMNS, type Credentials } from './credentials';

/** The invented people of a demo, for its sign-in page; none in a database that is not a demo. */
export async function demoPeople(handle: Handle): Promise<Credentials[]> {
  const { rows } = await handle.raw<{ rows: Credentials[] }>(`select ${CREDENTIAL_COLUMNS} from demo_people()`);
  return rows;
}
