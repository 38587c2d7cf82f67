'use client';

import type { SendOutcome } from '@/app/_live/live-client';
import type { GivenCommand } from '@/app/_live/read-command';
import { tabClient } from '@/app/_live/tab-client';

/**
 * Keeps a command in this browser, then sends it in its order. Answers with the server's reply when it comes within 4 s,
 * else `waiting`: the command is kept and goes up by itself, however often the page is loaded again.
 * `eventAtMs` is on the server's clock, as `useNow` tells it; now when it is left out.
 */
export async function sendCommand(caseId: string, command: GivenCommand, options: { readonly eventAtMs?: number } = {}): Promise<SendOutcome> {
  return (await tabClient()).send(caseId, command, options.eventAtMs);
}

/** Removes a refused command that its author has read. */
export async function dismissRefused(commandId: string): Promise<void> {
  await (await tabClient()).queue.dismiss(commandId);
}
