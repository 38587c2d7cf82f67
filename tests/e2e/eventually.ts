import { expect } from 'vitest';

/** Expects something to become true of what is read again and again; a busy machine may take its time. */
export function eventually<Value>(read: () => Value | Promise<Value>): ReturnType<typeof expect.poll<Value>> {
  return expect.poll(read, { timeout: 15_000, interval: 50 });
}
