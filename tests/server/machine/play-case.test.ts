import { v7 as newId } from 'uuid';
import { afterAll, beforeAll, expect, it } from 'vitest';

import { ulnarAtElbow } from '@/lib/reference/templates/ulnar-at-elbow';
import { openTestHouse, type TestHouse } from '@/tests/server/house/open-test-house';
import { adm } from '@/tests/support/ulnar-case';

import { makeClient, type MachineClient } from './make-client';
import { tokenOf } from './token-of';

let house: TestHouse;
let client: MachineClient;

beforeAll(async () => {
  house = await openTestHouse();
  const { token } = await tokenOf(house, 'desk@demo.example');
  const description = (await (await fetch(`${house.url}/api/openapi.json`)).json()) as object;
  client = await makeClient(description, { url: house.url, token });
});
afterAll(() => house.close());

type Committed = { kind: string; caseId: string; entries: { kind: string; eventAt: string; body: Record<string, unknown> }[] };

/** Twenty minutes ago and on: a program may log afterwards. */
const beginMs = Date.now() - 20 * 60_000;
let passedMs = 0;
const moment = () => new Date(beginMs + (passedMs += 5_000)).toISOString();

async function give(caseId: string, command: object): Promise<Committed> {
  const { status, body } = await client.giveCommand!(caseId, { commandId: newId(), eventAt: moment(), command });
  expect({ command, status, body }).toMatchObject({ status: 200, body: { kind: 'committed' } });
  return body as Committed;
}

function run(siteId: string, purpose: string, share: number) {
  const site = ulnarAtElbow.nerves.flatMap(({ sites }) => sites).find(({ id }) => id === siteId)!;
  const { defaultPulseWidthUs, defaultFamily, electrodes } = ulnarAtElbow;
  return {
    name: 'log-run',
    run: {
      siteId, electrodeId: electrodes[0]!.id, family: defaultFamily, purpose, intensityMa: site.defaultIntensityMa, pulseWidthUs: defaultPulseWidthUs,
      isSupramaximal: true, maximalResponseMa: null, readings: [{ channelId: 'adm', reading: adm(siteId as 'wrist', share) }], note: null,
    },
  };
}

it('a client made from the description alone plays a case from the plan to its close, with event times in the past', async () => {
  const session = await client.readSession!();
  expect(session).toMatchObject({ status: 200, body: { memberships: [{ role: 'neurophysiologist' }] } });
  const planned = await client.planCase!({
    commandId: newId(), eventAt: moment(), plan: { ...ulnarAtElbow, theatre: 'Theatre 1' }, identity: { patientLabel: 'Invented patient', recordNumber: 'DEMO-7' },
  });
  expect(planned.status).toBe(200);
  const { caseId } = planned.body as Committed;
  await give(caseId, { name: 'open-case', clockOffsetMs: null });
  await give(caseId, { name: 'confirm-timeout', side: ulnarAtElbow.side, text: null });
  await give(caseId, { name: 'change-phase', phase: 'baseline', reason: null });
  for (const site of ['wrist', 'above-elbow']) for (let count = 0; count < 3; count += 1) await give(caseId, run(site, 'baseline', 1));
  await give(caseId, { name: 'log-condition', condition: { kind: 'train-of-four', count: 4, ratio: 0.95 }, reportedBy: 'Anaesthetist' });
  await give(caseId, { name: 'log-condition', condition: { kind: 'tourniquet', isUp: false, pressureMmHg: null }, reportedBy: 'Nurse' });
  await give(caseId, { name: 'accept-baseline', family: ulnarAtElbow.defaultFamily, electrodeId: ulnarAtElbow.electrodes[0]!.id, reason: 'Logged afterwards' });
  await give(caseId, { name: 'change-phase', phase: 'monitoring', reason: null });
  await give(caseId, run('above-elbow', 'check', 0.4));
  const confirmed = await give(caseId, run('above-elbow', 'check', 0.38));
  const raised = confirmed.entries.find(({ kind }) => kind === 'alert.raised');
  expect(raised?.body).toMatchObject({ nerveId: 'ulnar', worstPercentOfBaseline: expect.closeTo(38, 0) as unknown });
  const alertId = raised!.body.alertId as string;
  const refused = await client.giveCommand!(caseId, { commandId: newId(), eventAt: moment(), command: { name: 'close-case', text: null } });
  expect(refused).toMatchObject({ status: 409, body: { kind: 'refused', code: 'alert-open' } });
  await give(caseId, { name: 'tell-alert', alertId, whom: 'Surgeon', how: 'Aloud', words: 'Ulnar at 38 per cent of baseline' });
  await give(caseId, { name: 'end-alert', alertId, outcome: 'none', cause: 'undetermined', text: null });
  await give(caseId, { name: 'close-case', text: null });
  const log = await client.readEntries!(caseId, { after: 0, limit: 500 });
  const { entries } = log.body as Committed;
  expect(entries.map(({ kind }) => kind)).toEqual(expect.arrayContaining(['case.planned', 'baseline.accepted', 'notice.raised', 'alert.raised', 'alert.told', 'alert.ended', 'case.closed']));
  expect(entries.every(({ eventAt }) => Date.parse(eventAt) < beginMs + 20 * 60_000)).toBe(true);
});
