import { BELL_CHANNEL, RINGS_PER_PAYLOAD, writePayload, type Ring } from '@/db/bell';
import type { Handle } from '@/db/connection';

/** Wakes the readers in every process. After the commit and on another connection: inside a transaction it makes all commits queue. */
export async function ringBell(handle: Handle, rings: readonly Ring[]): Promise<void> {
  for (let start = 0; start < rings.length; start += RINGS_PER_PAYLOAD) {
    await handle.raw('select pg_notify(?, ?)', [BELL_CHANNEL, writePayload(rings.slice(start, start + RINGS_PER_PAYLOAD))]);
  }
}
