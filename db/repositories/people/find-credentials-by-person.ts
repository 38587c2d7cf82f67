import type { Handle } from '@/db/connection';
import { CREDENTIAL_COLUMNS, type Credentials } from './credentials';

/** Credentials of a person who is signed in and gives them again, or null. */
export async function findCredentialsByPerson(handle: Handle, personId: string): Promise<Credentials | null> {
  const { rows } = await handle.raw<{ rows: Credentials[] }>(`select ${CREDENTIAL_COLUMNS} from credentials_by_person(?)`, [personId]);
  return rows[0] ?? null;
}
