import { v7 as newId } from 'uuid';

import { caseHeadReplySchema, commandReplySchema, peopleReplySchema, sessionReplySchema, type SessionReply } from '@/lib/contracts/http/replies';
import type { Answer, CaseClient, Credentials } from '@/server/demo/case-client';
import type { DemoAuthor, Scenario } from '@/server/demo/scenario';
import { SetupFailure } from '@/server/setup/setup-failure.mjs';

/** A case that was planned for a demo. */
export interface DemoCase {
  readonly caseId: string;
  readonly reference: string;
  readonly timeZone: string;
}

/** Plans the case as the desk, with surgeon and physician in its team. */
export async function planDemoCase(client: CaseClient, people: Readonly<Record<DemoAuthor, Credentials>>, { plan, identity }: Scenario): Promise<DemoCase> {
  const desk = wanted(await client.ask({ method: 'GET', path: '/api/session', as: people.desk }, sessionReplySchema));
  const physician = wanted(await client.ask({ method: 'GET', path: '/api/session', as: people.physician }, sessionReplySchema));
  const hospitalId = hospitalOf(desk);
  const surgeons = wanted(await client.ask({ method: 'GET', path: '/api/people', as: people.desk }, peopleReplySchema)).people.filter((one) => one.role === 'surgeon' && one.hospitalId === hospitalId);
  const team = [{ personId: physician.personId, role: 'physician' as const }, ...surgeons.slice(0, 1).map(({ personId }) => ({ personId, role: 'surgeon' as const }))];
  const body = { commandId: newId(), eventAt: new Date().toISOString(), plan, hospitalId, team, identity };
  const planned = wanted(await client.ask({ method: 'POST', path: '/api/cases', as: people.desk, body }, commandReplySchema));
  if (planned.kind === 'refused') throw new SetupFailure('unexpected', `The case could not be planned. ${planned.message}.`);
  const head = wanted(await client.ask({ method: 'GET', path: `/api/cases/${planned.caseId}`, as: people.desk }, caseHeadReplySchema));
  return { caseId: planned.caseId, reference: head.reference, timeZone: head.timeZone };
}

function hospitalOf(desk: SessionReply): string {
  const membership = desk.memberships.find((one) => one.role === 'neurophysiologist');
  if (membership === undefined) throw new SetupFailure('unexpected', `${desk.email} is neurophysiologist of no hospital and cannot plan a case.`);
  return membership.hospitalId;
}

function wanted<Body>(answer: Answer<Body>): Body {
  if (answer.isOk) return answer.body;
  throw new SetupFailure('unexpected', `The demo cannot begin. ${answer.refusal.message.replace(/\.$/, '')}.`);
}
