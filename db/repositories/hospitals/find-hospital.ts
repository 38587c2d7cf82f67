import type { Handle } from '@/db/connection';

/** A hospital by name, with the time zone its screens show. */
export interface Hospital {
  readonly hospitalId: string;
  readonly name: string;
  readonly timeZone: string;
}

/** The hospital, or null when it is not one of those that are set. */
export async function findHospital(handle: Handle, hospitalId: string): Promise<Hospital | null> {
  const row = await handle('hospitals').where({ id: hospitalId }).first<Hospital | undefined>('id as hospitalId', 'name', 'time_zone as timeZone');
  return row ?? null;
}
