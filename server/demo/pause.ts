import { setTimeout as wait } from 'node:timers/promises';

/** Waits, or ends at once when the demo is stopped. */
export async function pause(ms: number, stop: AbortSignal): Promise<void> {
  try {
    await wait(ms, undefined, { signal: stop });
  } catch (error) {
    if (!stop.aborted) throw error;
  }
}
