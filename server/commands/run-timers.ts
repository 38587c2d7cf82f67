import { openCases, type OpenCase } from '@/db/read-models/open-cases';
import { dueTimers } from '@/lib/case/due-timers';
import { decideAccess } from '@/lib/policy/decide-access';
import { commandDigest } from '@/lib/record/command-digest';
import { appendCommand } from '@/server/commands/append-command';
import type { ServerContext } from '@/server/server-context';

const author = { id: 'timer', role: 'timer', displayName: 'Timer of the server' } as const;

/**
 * Gives every command of time that has come due in any open case. Ids come from the facts, so that many processes act
 * once. A case whose timers fail, because its log is newer than this program, holds up no other.
 */
export async function runTimers(context: ServerContext): Promise<number> {
  let given = 0;
  for (const open of await openCases(context.database.feed)) {
    try {
      given += await runTimersOf(context, open);
    } catch (cause) {
      context.log.warn({ err: cause, caseId: open.caseId }, 'Timers of a case did not run; the next second tries again.');
    }
  }
  return given;
}

async function runTimersOf(context: ServerContext, { caseId, hospitalId }: OpenCase): Promise<number> {
  const { state } = await context.memory.load(caseId);
  if (dueTimers(state, context.nowMs()).length === 0) return 0;
  // What looks due here may have been answered by an entry of another process.
  const caughtUp = await context.memory.catchUp(caseId);
  const resource = { kind: 'case', hospitalId, caseId, status: caughtUp.state.status, assignments: [] } as const;
  if (!decideAccess({ kind: 'timer' }, 'run-timer', resource).isAllowed) return 0;
  const due = dueTimers(caughtUp.state, context.nowMs());
  for (const { commandId, eventAt, command } of due) {
    await appendCommand(context, { caseId, hospitalId, commandId, commandDigest: commandDigest(command), eventAt, author, command });
  }
  return due.length;
}
