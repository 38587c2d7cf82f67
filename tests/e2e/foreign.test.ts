import type { Browser } from 'playwright-core';
import { Client } from 'pg';
import { v7 as newId } from 'uuid';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';

import { ulnarAtElbow } from '@/lib/reference/templates/ulnar-at-elbow';
import { envelope, send } from '@/tests/server/house/client';
import { connectViewer } from '@/tests/server/house/viewer';
import { launchChromium } from '@/tests/support/chromium';
import { demoSession } from '@/tests/support/demo-session';
import { DeskPerson } from '@/tests/support/desk-person';
import { HttpDesk } from '@/tests/support/http-desk';
import { startProduct, type Product } from '@/tests/support/start-product';

let product: Product;
let browser: Browser;
let owner: HttpDesk;
const title = 'Left ulnar nerve, of one hospital only';

beforeAll(async () => {
  product = await startProduct();
  browser = await launchChromium();
  owner = await HttpDesk.plan(product, { ...ulnarAtElbow, theatre: 'Theatre 1', title });
  await owner.openForBaseline();
});
afterAll(async () => {
  await browser.close();
  await product.stop();
});

const pages = ['log', 'record'] as const;
const routes: readonly (readonly [method: string, path: string, body?: () => unknown])[] = [
  ['GET', ''],
  ['GET', '/entries'],
  ['GET', '/screens'],
  ['POST', '/commands', () => envelope({ name: 'send-message', text: 'Hello' })],
  ['POST', '/screens', () => ({ code: 'ACDEFH', isConfirmed: false })],
  ['DELETE', `/screens/${newId()}`],
];

/** What each page, route and socket of the case says to this person: status, and the word of the live channel. */
async function doorsFor(email: string): Promise<readonly (readonly [door: string, answer: unknown])[]> {
  const cookie = await demoSession(product, email);
  const answers: (readonly [string, unknown])[] = [];
  for (const page of pages) answers.push([page, (await send(product, 'GET', `/cases/${owner.caseId}/${page}`, { cookie })).status]);
  for (const [method, path, body] of routes) {
    const reply = await send(product, method, `/api/cases/${owner.caseId}${path}`, { cookie, ...(body === undefined ? {} : { body: body() }) });
    answers.push([`${method} ${path}`, reply.status]);
  }
  for (const kind of ['desk', 'follow'] as const) {
    const viewer = await connectViewer(product, { cookie, viewer: kind });
    const reply = await viewer.follow(owner.caseId);
    answers.push([`socket ${kind}`, reply.kind === 'refused' ? reply.code : reply.kind]);
    viewer.close();
  }
  const { cases } = (await send(product, 'GET', '/api/cases', { cookie })).body as { cases: readonly { caseId: string }[] };
  answers.push(['list', cases.some((row) => row.caseId === owner.caseId)]);
  return answers;
}

/** Assigns a demo person to the case, as a later settings page will. */
async function assign(email: string, role: string): Promise<void> {
  const client = new Client({ connectionString: product.database.adminUrl });
  await client.connect();
  await client.query(
    `insert into case_assignments (hospital_id, case_id, person_id, role)
     select c.hospital_id, c.id, p.id, $3 from cases c, people p where c.id = $1 and p.email = $2`,
    [owner.caseId, email, role],
  );
  await client.end();
}

const everywhere404 = [
  ['log', 404], ['record', 404], ['GET ', 404], ['GET /entries', 404], ['GET /screens', 404],
  ['POST /commands', 404], ['POST /screens', 404], [routes.at(-1)?.slice(0, 2).join(' '), 404],
  ['socket desk', 'not-found'], ['socket follow', 'not-found'], ['list', false],
];

describe('an open case', () => {
  test.each(['desk@other.example', 'admin@demo.example', 'surgeon@demo.example', 'physician@demo.example', 'reviewer@demo.example'])('is not there for %s: 404 at every page, route and socket', async (email) => {
    expect(await doorsFor(email)).toEqual(everywhere404);
  });

  test('the control: its own neurophysiologist comes in everywhere', async () => {
    const answers = new Map(await doorsFor('desk@demo.example'));
    expect(['log', 'record', 'GET ', 'GET /entries', 'GET /screens', 'POST /commands'].map((door) => answers.get(door))).toEqual([200, 200, 200, 200, 200, 200]);
    expect([answers.get('socket desk'), answers.get('list')]).toEqual(['entries', true]);
  });

  test('shows a person of the other hospital the page of nothing, without a word of the case', async () => {
    const person = await DeskPerson.openSignedIn(browser, product.url, 'desk@other.example');
    person.watched.expectError(/status of 404/);
    for (const page of pages) {
      await person.goTo(`/cases/${owner.caseId}/${page}`);
      await person.page.getByRole('heading', { name: 'Not found' }).waitFor();
      expect(await person.page.content()).not.toContain('of one hospital only');
    }
    await person.goTo('/cases');
    await person.page.getByRole('heading', { name: 'No case yet' }).waitFor();
    expect(person.watched.errors()).toEqual([]);
    await person.close();
  });
});

describe('a person of the hospital with a part in the case', () => {
  test.each([['surgeon@demo.example', 'surgeon'], ['physician@demo.example', 'physician']] as const)('%s reads it and writes no run', async (email, role) => {
    await assign(email, role);
    const answers = new Map(await doorsFor(email));
    expect(['log', 'record', 'GET ', 'GET /entries'].map((door) => answers.get(door))).toEqual([200, 200, 200, 200]);
    const cookie = await demoSession(product, email);
    for (const command of [envelope({ name: 'change-phase', phase: 'monitoring', reason: null }), envelope({ name: 'close-case', text: null })]) {
      expect((await send(product, 'POST', `/api/cases/${owner.caseId}/commands`, { cookie, body: command })).status).toBe(404);
    }
    // A message is the physician's to send, never the surgeon's.
    expect(answers.get('POST /commands')).toBe(role === 'physician' ? 200 : 404);
  });

  test('the surgeon\'s page of the case has no control that writes', async () => {
    const surgeon = await DeskPerson.openSignedIn(browser, product.url, 'surgeon@demo.example');
    await surgeon.goTo(`/cases/${owner.caseId}/log`);
    await surgeon.page.getByText(/^Read only/).waitFor();
    for (const name of ['Log run', 'Phase', 'Accept baseline', 'Close case', 'Pair a wall', 'Told']) expect([name, await surgeon.button(name).count()]).toEqual([name, 0]);
    await surgeon.page.keyboard.press('l');
    expect(await surgeon.page.getByRole('dialog').count()).toBe(0);
    expect(surgeon.watched.errors()).toEqual([]);
    await surgeon.close();
  });
});

describe('the case once it is closed', () => {
  test('is open to the reviewer to read, without the patient, and still not to the administrator', async () => {
    await owner.give({ name: 'close-case', text: null });
    const answers = new Map(await doorsFor('reviewer@demo.example'));
    expect(['record', 'GET ', 'GET /entries', 'POST /commands'].map((door) => answers.get(door))).toEqual([200, 200, 200, 404]);
    const cookie = await demoSession(product, 'reviewer@demo.example');
    const head = await send(product, 'GET', `/api/cases/${owner.caseId}`, { cookie });
    expect(head.body).toMatchObject({ role: 'reviewer', mayWrite: false, patientLabel: null, recordNumber: null });
    expect(await doorsFor('admin@demo.example')).toEqual(everywhere404);
    expect(await doorsFor('desk@other.example')).toEqual(everywhere404);
  });
});
