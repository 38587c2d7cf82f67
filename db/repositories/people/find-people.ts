import type { Handle } from '@/db/connection';

/** A person as colleagues see them. */
export interface PersonName {
  readonly personId: string;
  readonly email: string;
  readonly displayName: string;
}

/** People by id, as far as they share a hospital with the reader. */
export async function findPeople(handle: Handle, personIds: readonly string[]): Promise<PersonName[]> {
  return handle('people').whereIn('id', personIds).select<PersonName[]>('id as personId', 'email', 'display_name as displayName');
}
