import { noteRead } from '@/db/repositories/reads/note-read';
import type { CaseState } from '@/lib/case/case-state';
import { paintedMessageSchema } from '@/lib/contracts/channel/messages';
import { decideAccess } from '@/lib/policy/decide-access';
import type { Actor } from '@/lib/policy/actor';
import { commandDigest } from '@/lib/record/command-digest';
import { appendCommand } from '@/server/commands/append-command';
import { eventTimeProblem } from '@/server/commands/event-time-problem';
import { isFailure, notSaved } from '@/server/failure';
import type { Answer, LiveSocket } from '@/server/live/live-socket';
import type { ServerContext } from '@/server/server-context';

type Wall = Extract<Actor, { kind: 'screen' }>;
/** What a wall says of one alert that it shows. */
interface Painted {
  readonly caseId: string;
  readonly seq: number;
  readonly alertId: string;
  readonly paintedAt: string;
}

const noted: Answer = { kind: 'noted' };
const notOwn = refused('bad-request', 'Not noted: a wall confirms what it painted of its own case only.');

/**
 * A wall says that something was painted. The first wall that shows the newest word of an alert is an entry of the case;
 * whatever else a wall shows is only answered.
 */
export async function notePainted(context: ServerContext, socket: LiveSocket, message: unknown): Promise<Answer> {
  const read = paintedMessageSchema.safeParse(message);
  const { visitor } = socket.data;
  if (!read.success || visitor.kind !== 'screen') return notOwn;
  const { alertId, ...said } = read.data;
  try {
    if (!(await isOwnCase(context, visitor, said.caseId))) return notOwn;
    return alertId === null ? noted : await notePaintedAlert(context, visitor, { ...said, alertId });
  } catch (cause) {
    if (!isFailure(cause)) context.log.error({ err: cause, caseId: said.caseId, screenId: visitor.screenId }, 'What a wall painted was not noted.');
    const { code, message: sentence } = (isFailure(cause) ? cause : notSaved()).reply;
    return refused(code, sentence);
  }
}

async function isOwnCase({ database }: ServerContext, wall: Wall, caseId: string): Promise<boolean> {
  const { hospitalId, screenId } = wall;
  if (decideAccess(wall, 'confirm-paint', { kind: 'case', hospitalId, caseId, status: 'open', assignments: [] }).isAllowed) return true;
  await noteRead(database.app, { hospitalId, personId: null, screenId, caseId, what: 'confirm-paint', outcome: 'denied', rule: 'no-rule' });
  return false;
}

async function notePaintedAlert(context: ServerContext, { hospitalId, screenId, caseId }: Wall, { seq, alertId, paintedAt }: Painted): Promise<Answer> {
  let kept = await context.memory.load(caseId);
  if (seq > kept.head.seq) kept = await context.memory.catchUp(caseId);
  if (seq > kept.head.seq) return refused('bad-request', `Not noted: the log of this case has no entry ${seq}.`);
  if (!isNews(kept.state, alertId, seq)) return noted;
  const problem = eventTimeProblem(paintedAt, context.nowMs(), Date.parse(kept.state.plannedAt));
  if (problem !== null) throw problem;
  const command = { name: 'note-painted', alertId, entrySeq: seq, screenId, paintedAt } as const;
  const author = { id: screenId, role: 'screen', displayName: 'Theatre screen' } as const;
  // The id comes from the fact: sent again, or by two walls at once, it is one entry. "Nothing to log" is as good.
  await appendCommand(context, { caseId, hospitalId, commandId: `painted/${alertId}/${seq}`, commandDigest: commandDigest(command), eventAt: paintedAt, author, command });
  return noted;
}

/** What this process knows of the case reaches to what the wall shows, so what it says is not news here is none. */
function isNews({ incidents }: CaseState, alertId: string, seq: number): boolean {
  const incident = Object.values(incidents).find((open) => open.alertId === alertId);
  return incident !== undefined && incident.paintedAt === null && seq >= incident.raisedSeq;
}

function refused(code: string, message: string): Answer {
  return { kind: 'refused', code, message, field: null };
}
