import type { Handle } from '@/db/connection';
import { CREDENTIAL_COLUMNS, type Credentials } from './credentials';

/** Credentials of the person with this address, in any case of letters, or null. */
export async function findCredentialsByEmail(handle: Handle, email: string): Promise<Credentials | null> {
  const { rows } = await handle.raw<{ rows: Credentials[] }>(`select ${CREDENTIAL_COLUMNS} from credentials_by_email(?)`, [email]);
  return rows[0] ?? null;
}
