import type { CommandRequest } from '@/lib/contracts/http/commands';
import type { CommandReply } from '@/lib/contracts/http/replies';
import { actionForCommand } from '@/lib/policy/action-for-command';
import { roleOfRule } from '@/lib/policy/rules';
import { commandDigest } from '@/lib/record/command-digest';
import type { SignedIn } from '@/server/auth/read-session';
import { appendCommand, repeatReply, type AllowedCommand } from '@/server/commands/append-command';
import { endScreens } from '@/server/commands/end-screens';
import { eventTimeProblem } from '@/server/commands/event-time-problem';
import { openCase } from '@/server/queries/open-case';
import type { ServerContext } from '@/server/server-context';

/** A person's command to a case: let in by the policy, decided, committed, and only then answered. */
export async function giveCommand(context: ServerContext, signedIn: SignedIn, caseId: string, request: CommandRequest): Promise<CommandReply> {
  const { session, actor } = signedIn;
  const { commandId, eventAt, command } = request;
  const opened = await openCase(context, actor, { caseId, action: actionForCommand(command.name), what: null, isForAppend: true });
  const allowed: AllowedCommand = {
    caseId,
    hospitalId: opened.row.hospitalId,
    commandId,
    commandDigest: commandDigest({ authorId: session.personId, eventAt, command }),
    eventAt,
    author: { id: session.personId, role: roleOfRule(opened.rule) ?? 'person', displayName: session.displayName },
    command,
  };
  const problem = eventTimeProblem(eventAt, context.nowMs(), Date.parse(opened.state.plannedAt));
  // What is in the log already was in time when it came, however late its answer is asked for again.
  const repeated = problem === null ? null : await repeatReply(context, allowed);
  if (problem !== null && repeated === null) throw problem;
  const reply = repeated ?? (await appendCommand(context, allowed));
  if (command.name === 'close-case' && reply.kind === 'committed') await endScreens(context, opened.row.hospitalId, caseId);
  return reply;
}
