import type { Handle } from '@/db/connection';

/** A theatre of a hospital. */
export interface Theatre {
  readonly hospitalId: string;
  readonly theatreId: string;
  readonly name: string;
}

/** Theatres of the hospitals that are set, by name. */
export async function theatresOf(handle: Handle): Promise<Theatre[]> {
  return handle('theatres').orderBy(['hospital_id', 'name']).select<Theatre[]>('hospital_id as hospitalId', 'id as theatreId', 'name');
}
