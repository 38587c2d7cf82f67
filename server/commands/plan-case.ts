import { createHash, randomBytes } from 'node:crypto';

import { assignPerson } from '@/db/repositories/cases/assign-person';
import { insertCase } from '@/db/repositories/cases/insert-case';
import { insertIdentity } from '@/db/repositories/cases/insert-identity';
import { insertEntries } from '@/db/repositories/entries/insert-entries';
import { withinHospitals } from '@/db/within-hospitals';
import { decide } from '@/lib/case/decide';
import { initialState } from '@/lib/case/initial-state';
import { planProblem } from '@/lib/case/plan-problem';
import type { PlanCaseRequest } from '@/lib/contracts/http/commands';
import type { CommandReply } from '@/lib/contracts/http/replies';
import { chainEntries } from '@/lib/record/chain-entries';
import { commandDigest } from '@/lib/record/command-digest';
import { EMPTY_HEAD, type SealedEntry } from '@/lib/record/entry';
import type { SignedIn } from '@/server/auth/read-session';
import { newCaseReference } from '@/server/commands/case-reference';
import { eventTimeProblem } from '@/server/commands/event-time-problem';
import { hospitalForPlan } from '@/server/commands/hospital-for-plan';
import { identityCommitment } from '@/server/commands/identity-commitment';
import type { Planning } from '@/server/commands/planning';
import { teamForPlan } from '@/server/commands/team-for-plan';
import { repeatedPlanning } from '@/server/commands/repeated-planning';
import { toWireEntry } from '@/server/cases/to-wire-entry';
import { failure, notSaved } from '@/server/failure';
import type { ServerContext } from '@/server/server-context';

const mostReferences = 20;

/** Plans a case: row, identity, the planner's assignment and the first entry, all or none. A repeat gives the same case. */
export async function planCase(context: ServerContext, signedIn: SignedIn, request: PlanCaseRequest): Promise<CommandReply> {
  const hospitalId = await hospitalForPlan(context, signedIn, { theatre: request.plan.theatre, hospitalId: request.hospitalId });
  const problem = planProblem(request.plan);
  if (problem !== null) throw failure('bad-request', 'plan-inconsistent', problem, 'plan');
  const team = await teamForPlan(context, hospitalId, request);
  const caseId = caseIdFor(signedIn.session.personId, request);
  const digest = commandDigest({ authorId: signedIn.session.personId, eventAt: request.eventAt, name: 'plan-case', plan: request.plan, team: request.team ?? [], ...(request.hospitalId === undefined ? {} : { hospitalId: request.hospitalId }) });
  const planning: Planning = { caseId, hospitalId, digest, request, team };
  return context.queue.run(caseId, async () => {
    const repeated = await repeatedPlanning(context, signedIn, planning);
    if (repeated !== null) return repeated;
    const timeProblem = eventTimeProblem(request.eventAt, context.nowMs());
    if (timeProblem !== null) throw timeProblem;
    for (let attempt = 0; attempt < mostReferences; attempt += 1) {
      const sealed = await tryPlan(context, signedIn, planning);
      if (sealed === null) continue;
      const entries = sealed.map(toWireEntry);
      context.onCommitted(caseId, entries);
      return { kind: 'committed', caseId, entries };
    }
    context.log.error({ hospitalId }, 'No free case reference was drawn.');
    throw notSaved();
  });
}

/** One try with one drawn reference; null when the hospital has that reference already. */
async function tryPlan(context: ServerContext, { session }: SignedIn, planning: Planning): Promise<SealedEntry[] | null> {
  const { caseId, hospitalId, request } = planning;
  const salt = randomBytes(32);
  const reference = newCaseReference(context.nowMs());
  const sealed = firstEntry(context, session, planning, { reference, identityCommitment: identityCommitment(request.identity, salt) });
  try {
    await withinHospitals(context.database.app, [hospitalId], async (transaction) => {
      await insertCase(transaction, { hospitalId, id: caseId, reference, plannedBy: session.personId });
      await insertIdentity(transaction, { hospitalId, caseId, salt, ...request.identity });
      await assignPerson(transaction, { hospitalId, caseId, personId: session.personId, role: 'neurophysiologist' });
      for (const { personId, role } of planning.team) await assignPerson(transaction, { hospitalId, caseId, personId, role });
      await insertEntries(transaction, sealed);
    });
    return sealed;
  } catch (cause) {
    if (isReferenceTaken(cause)) return null;
    context.log.error({ err: cause, caseId }, 'A case was not planned.');
    throw notSaved();
  }
}

function firstEntry(
  context: ServerContext,
  session: SignedIn['session'],
  { caseId, hospitalId, digest, request, team }: Planning,
  named: { reference: string; identityCommitment: string },
): SealedEntry[] {
  const decision = decide(initialState(caseId), { name: 'plan-case', plan: request.plan, ...named, ...(team.length === 0 ? {} : { team }) }, { eventAt: request.eventAt, nowMs: context.nowMs() });
  if (decision.kind === 'refused') throw failure('bad-request', decision.refusal.code, decision.refusal.message, 'plan');
  return chainEntries(
    EMPTY_HEAD,
    decision.drafts.map((draft, part) => ({
      hospitalId,
      caseId,
      kind: draft.kind,
      kindVersion: draft.kindVersion,
      commandId: request.commandId,
      commandPart: part,
      commandDigest: digest,
      eventAt: request.eventAt,
      recordedAt: new Date(context.nowMs()).toISOString(),
      author: { id: session.personId, role: 'neurophysiologist', displayName: session.displayName },
      body: draft.body as never,
    })),
  );
}

/**
 * The case's id follows from person, command and time, so that a repeat meets the same case and nobody can choose an id.
 * In the form of a UUIDv7: the time first, then what is drawn.
 */
function caseIdFor(personId: string, { commandId, eventAt }: PlanCaseRequest): string {
  const time = Date.parse(eventAt).toString(16).padStart(12, '0').slice(-12);
  const drawn = createHash('sha256').update(`fascicle-case ${personId} ${commandId} ${eventAt}`).digest('hex');
  const variant = (8 + (Number.parseInt(drawn.charAt(4), 16) & 3)).toString(16);
  return `${time.slice(0, 8)}-${time.slice(8)}-7${drawn.slice(0, 3)}-${variant}${drawn.slice(5, 8)}-${drawn.slice(8, 20)}`;
}

function isReferenceTaken(cause: unknown): boolean {
  return cause instanceof Error && 'constraint' in cause && cause.constraint === 'cases_hospital_id_reference_key';
}
