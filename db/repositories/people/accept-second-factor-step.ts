import type { Handle } from '@/db/connection';

/** Takes the time step of a right code; false when that code, or a later one, was used before. */
export async function acceptSecondFactorStep(handle: Handle, personId: string, step: number): Promise<boolean> {
  const { rows } = await handle.raw<{ rows: { accepted: boolean }[] }>('select accept_second_factor_step(?, ?) as accepted', [personId, step]);
  return rows[0]?.accepted === true;
}
