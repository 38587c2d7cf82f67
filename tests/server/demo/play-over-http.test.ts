import { afterAll, beforeAll, describe, expect, test } from 'vitest';

import { caseHeadReplySchema } from '@/lib/contracts/http/replies';
import { playDemo, type Demo } from '@/server/demo/play-demo';
import type { Scenario } from '@/server/demo/scenario';
import { neuroma } from '@/server/demo/scenarios/neuroma';
import { relaxant } from '@/server/demo/scenarios/relaxant';
import { ulnar } from '@/server/demo/scenarios/ulnar';
import { send } from '@/tests/server/house/client';
import { openTestHouse, type TestHouse } from '@/tests/server/house/open-test-house';
import { tokenOf } from '@/tests/server/machine/token-of';

let house: TestHouse;
let people: Demo['people'];

beforeAll(async () => {
  house = await openTestHouse();
  const as = async (email: string) => ({ authorization: `Bearer ${(await tokenOf(house, email)).token}` });
  people = { desk: await as('desk@demo.example'), physician: await as('physician@demo.example') };
});
afterAll(() => house.close());

const entriesOf = (caseId: string) => house.admin('entries').where({ case_id: caseId }).orderBy('seq').select('kind', 'command_id', 'command_part');

async function play(scenario: Scenario, options: Partial<Demo> = {}) {
  const lines: string[] = [];
  const caseId = await playDemo({ url: house.url, people, scenario, speed: 1000, stop: new AbortController().signal, print: (line) => void lines.push(line), ...options });
  return { caseId, lines };
}

describe('a demo over the public interface', () => {
  test('the default case is played to its close, every command committed once', { timeout: 120_000 }, async () => {
    const { caseId, lines } = await play(ulnar);
    const entries = await entriesOf(caseId);
    expect(entries.at(-1)).toMatchObject({ kind: 'case.closed' });
    // Each act of the scenario and the planning is one command; what a run raises belongs to the command of the run.
    expect(new Set(entries.map((entry) => entry.command_id)).size).toBe(ulnar.moments.length + 1);
    expect(entries.filter((entry) => entry.kind === 'run.logged')).toHaveLength(ulnar.moments.filter(({ command }) => command.name === 'log-run').length);
    expect(entries.filter((entry) => entry.command_part === 0)).toHaveLength(ulnar.moments.length + 1);
    expect(lines.filter((line) => /Refused|Left out/.test(line))).toEqual([]);
    expect(lines[0]).toContain(`${house.url}/cases/${caseId}`);
    expect(lines[0]).toContain(`${house.url}/screen`);
    expect(lines.some((line) => /^\d\d:\d\d:\d\d {2}.*Nerve lifted, risk step.*→ {2}wall: Not tested since nerve lifted/.test(line))).toBe(true);
    expect(lines.at(-1)).toMatch(/is closed with \d+ entries/);
  });

  test('surgeon and physician see the case from its planning on, others do not', { timeout: 120_000 }, async () => {
    const stop = new AbortController();
    stop.abort();
    const { caseId } = await play(ulnar, { stop: stop.signal });
    const status = async (email: string) => (await send(house, 'GET', `/api/cases/${caseId}`, { cookie: await house.cookieOf(email) })).status;
    expect(await Promise.all(['desk@demo.example', 'surgeon@demo.example', 'physician@demo.example', 'desk@other.example'].map(status))).toEqual([200, 200, 200, 404]);
    const head = await send(house, 'GET', `/api/cases/${caseId}`, { cookie: await house.cookieOf('desk@demo.example') });
    expect(caseHeadReplySchema.parse(head.body)).toMatchObject({ patientLabel: 'Invented patient, adult', recordNumber: 'DEMO-ULNAR' });
  });

  test('lost answers and busy answers leave one entry for each command', { timeout: 120_000 }, async () => {
    let count = 0;
    const sent: string[] = [];
    const reach: typeof fetch = async (input, init) => {
      const isCommand = init?.method === 'POST' && String(input).endsWith('/commands');
      if (!isCommand) return fetch(input, init);
      count += 1;
      sent.push(String(init?.body));
      // The first of three never arrives, the answer of the second is lost, the third is answered "busy" though it was taken.
      if (count % 4 === 1) throw new TypeError('fetch failed');
      const response = await fetch(input, init);
      if (count % 4 === 2) throw new TypeError('terminated');
      return count % 4 === 3 ? new Response('{}', { status: 503 }) : response;
    };
    const short: Scenario = { ...neuroma, moments: neuroma.moments.slice(0, 5) };
    const { caseId, lines } = await play(short, { reach });
    const entries = await entriesOf(caseId);
    expect(sent.length).toBeGreaterThan(short.moments.length);
    expect(new Set(sent).size).toBe(short.moments.length);
    expect(new Set(entries.map((entry) => entry.command_id)).size).toBe(short.moments.length + 1);
    expect(lines.filter((line) => line.includes('Refused'))).toEqual([]);
  });

  test('a stop ends it between two acts and says how the case stands', { timeout: 120_000 }, async () => {
    const stop = new AbortController();
    const lines: string[] = [];
    const print = (line: string) => {
      lines.push(line);
      if (line.includes('Alert, ulnar')) stop.abort();
    };
    const { caseId } = await play(relaxant, { stop: stop.signal, print });
    expect((await entriesOf(caseId)).at(-1)).toMatchObject({ kind: 'alert.raised' });
    expect(lines.at(-1)).toMatch(/Stopped\. Case \S+ stays open, phase monitoring, with \d+ entries; still open: (alert ulnar-1, notice median-1|notice median-1, alert ulnar-1)\./);
  });
});
