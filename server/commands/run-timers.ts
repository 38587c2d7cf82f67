import { openCases } from '@/db/read-models/open-cases';
import { dueTimers } from '@/lib/case/due-timers';
import { decideAccess } from '@/lib/policy/decide-access';
import { commandDigest } from '@/lib/record/command-digest';
import { appendCommand } from '@/server/commands/append-command';
import type { ServerContext } from '@/server/server-context';

const author = { id: 'timer', role: 'timer', displayName: 'Timer of the server' } as const;

/** Gives every command of time that has come due in any open case. Ids come from the facts, so that many processes act once. */
export async function runTimers(context: ServerContext): Promise<number> {
  let given = 0;
  for (const { caseId, hospitalId } of await openCases(context.database.feed)) {
    const { state } = await context.memory.load(caseId);
    if (dueTimers(state, context.nowMs()).length === 0) continue;
    // What looks due here may have been answered by an entry of another process.
    const caughtUp = await context.memory.catchUp(caseId);
    const resource = { kind: 'case', hospitalId, caseId, status: caughtUp.state.status, assignments: [] } as const;
    if (!decideAccess({ kind: 'timer' }, 'run-timer', resource).isAllowed) continue;
    for (const { commandId, eventAt, command } of dueTimers(caughtUp.state, context.nowMs())) {
      await appendCommand(context, { caseId, hospitalId, commandId, commandDigest: commandDigest(command), eventAt, author, command });
      given += 1;
    }
  }
  return given;
}
