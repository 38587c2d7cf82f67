import type { Handle } from '@/db/connection';
import { assignmentsOf } from '@/db/repositories/cases/assignments-of';
import { findCase, type CaseRow } from '@/db/repositories/cases/find-case';
import { noteRead } from '@/db/repositories/reads/note-read';
import { withinHospitals } from '@/db/within-hospitals';
import type { CaseState } from '@/lib/case/case-state';
import type { Action } from '@/lib/policy/action';
import type { Actor, Role } from '@/lib/policy/actor';
import { decideAccess } from '@/lib/policy/decide-access';
import type { CaseResource } from '@/lib/policy/resource';
import type { KeptCase } from '@/server/cases/kept-case';
import { notFound } from '@/server/failure';
import type { ServerContext } from '@/server/server-context';

/** Someone who may be let in to a case. */
export type Visitor = Extract<Actor, { kind: 'person' | 'screen' }>;

/** A case that the policy opened to an actor. */
export interface OpenedCase {
  readonly row: CaseRow;
  readonly resource: CaseResource;
  readonly state: CaseState;
  readonly rule: string;
}

/** What is asked of a case; `what` goes into the audit of reads and is null where nothing is read. */
export interface Asked {
  readonly caseId: string;
  readonly action: Action;
  readonly what: string | null;
  /** An entry is appended on what is found: its number is the lock, so a case that is behind may let its writer in. */
  readonly isForAppend?: true;
}

type Context = Pick<ServerContext, 'database' | 'memory'>;

/**
 * The one door to a case for people and walls. Fails with the same "not found" for a case that is not there, that is
 * another hospital's, or that the policy does not open; a refusal and every read leave a row in the audit.
 */
export async function openCase(context: Context, actor: Visitor, asked: Asked): Promise<OpenedCase> {
  const hospitalIds = hospitalsOf(actor);
  const first = hospitalIds[0];
  if (first === undefined) throw notFound();
  const found = await withinHospitals(context.database.app, hospitalIds, (transaction) => findWithAssignments(transaction, asked.caseId));
  if (found === null) return refuse(context, actor, asked, first);
  const { row, assignments } = found;
  const decide = ({ state }: KeptCase) => {
    const resource: CaseResource = { kind: 'case', hospitalId: row.hospitalId, caseId: row.id, status: state.status, assignments };
    return { state, resource, decision: decideAccess(actor, asked.action, resource) };
  };
  const early = asked.isForAppend ? decide(await context.memory.load(row.id)) : null;
  const { state, resource, decision } = early?.decision.isAllowed === true ? early : decide(await context.memory.catchUp(row.id));
  if (!decision.isAllowed) return refuse(context, actor, asked, row.hospitalId);
  if (asked.what !== null) {
    await noteRead(context.database.app, { ...reader(actor, asked, row.hospitalId), what: asked.what, outcome: 'allowed', rule: decision.rule });
  }
  return { row, resource, state, rule: decision.rule };
}

/** The hospitals in whose name an actor reads. */
export function hospitalsOf(actor: Visitor): string[] {
  return actor.kind === 'screen' ? [actor.hospitalId] : [...new Set(actor.memberships.map((membership) => membership.hospitalId))];
}

async function findWithAssignments(transaction: Handle, caseId: string) {
  const row = await findCase(transaction, caseId);
  if (row === null) return null;
  const assigned = await assignmentsOf(transaction, row.id);
  return { row, assignments: assigned.map(({ personId, role }) => ({ personId, role: role as Role })) };
}

async function refuse(context: Context, actor: Visitor, asked: Asked, hospitalId: string): Promise<never> {
  await noteRead(context.database.app, { ...reader(actor, asked, hospitalId), what: asked.what ?? asked.action, outcome: 'denied', rule: 'no-rule' });
  throw notFound();
}

function reader(actor: Visitor, asked: Asked, hospitalId: string) {
  const isPerson = actor.kind === 'person';
  return { hospitalId, caseId: asked.caseId, personId: isPerson ? actor.personId : null, screenId: isPerson ? null : actor.screenId };
}
