import { commandMessageSchema } from '@/lib/contracts/channel/messages';
import type { CommandReply } from '@/lib/contracts/http/replies';
import { readSessionById } from '@/server/auth/read-session';
import { giveCommand } from '@/server/commands/give-command';
import { isFailure, notSaved, notSignedIn } from '@/server/failure';
import { problemOf } from '@/server/http/problem-of';
import type { LiveSocket } from '@/server/live/live-socket';
import type { ServerContext } from '@/server/server-context';

/** A command over the channel: the same contract, policy and answer as over HTTP. */
export async function giveCommandMessage(context: ServerContext, socket: LiveSocket, message: unknown): Promise<CommandReply> {
  const read = commandMessageSchema.safeParse(message);
  if (!read.success) return { kind: 'refused', code: 'bad-request', ...problemOf(read.error.issues) };
  try {
    const { sessionId } = socket.data;
    const signedIn = sessionId === null ? null : await readSessionById(context, sessionId);
    if (signedIn === null) throw notSignedIn();
    const { caseId, ...request } = read.data;
    return await giveCommand(context, signedIn, caseId, request);
  } catch (cause) {
    if (!isFailure(cause)) context.log.error({ err: cause }, 'A command over the channel met a fault.');
    const { code, message: sentence, field } = (isFailure(cause) ? cause : notSaved()).reply;
    return { kind: 'refused', code, message: sentence, field };
  }
}
