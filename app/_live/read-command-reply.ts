import { commandMessageReplySchema } from '@/lib/contracts/channel/messages';
import type { CommandReply } from '@/lib/contracts/http/replies';

/** Codes that say "not now", not "no": the same command is sent again. */
const passingCodes: ReadonlySet<string> = new Set(['not-saved', 'not-reachable', 'too-many', 'not-signed-in']);

/** An answer to a command; null when it decides nothing and the command must be sent again. */
export function readCommandReply(answer: unknown): CommandReply | null {
  const read = commandMessageReplySchema.safeParse(answer);
  if (!read.success) return null;
  return read.data.kind === 'refused' && passingCodes.has(read.data.code) ? null : read.data;
}
