import type { Handle } from '@/db/connection';

/** A person as colleagues see them. */
export interface PersonName {
  readonly personId: string;
  readonly email: string;
  readonly displayName: string;
}

/** People with a role in a hospital now, by name: whom a case can be assigned to. */
export async function membersOf(handle: Handle, hospitalId: string, role: string): Promise<PersonName[]> {
  return handle('memberships as m')
    .join('people as p', 'p.id', 'm.person_id')
    .where({ 'm.hospital_id': hospitalId, 'm.role': role })
    .whereNull('m.revoked_at')
    .orderBy('p.display_name')
    .select<PersonName[]>('p.id as personId', 'p.email', 'p.display_name as displayName');
}
