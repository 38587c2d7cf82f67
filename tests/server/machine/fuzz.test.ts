import fc from 'fast-check';
import { afterAll, beforeAll, expect, it } from 'vitest';

import { commit, planCaseAs } from '@/tests/server/house/client';
import { openTestHouse, type TestHouse } from '@/tests/server/house/open-test-house';

import { arbitraryOfSchema, type JsonSchema } from './arbitrary-of-schema';
import { tokenOf } from './token-of';

const requestCount = 1_000;

interface Description {
  readonly paths: Readonly<Record<string, Readonly<Record<string, Operation>>>>;
  readonly components: { readonly schemas: Readonly<Record<string, JsonSchema>> };
}
interface Operation {
  readonly operationId: string;
  readonly parameters: readonly { readonly name: string; readonly in: 'path' | 'query'; readonly schema: JsonSchema }[];
  readonly requestBody?: { readonly content: Readonly<Record<string, { readonly schema: JsonSchema }>> };
}

let house: TestHouse;
let description: Description;
let token: string;
/** Several: a case that was closed on the way takes little more. */
const ownCaseIds: string[] = [];
let foreignCaseId: string;

beforeAll(async () => {
  house = await openTestHouse();
  ({ token } = await tokenOf(house, 'desk@demo.example'));
  for (let count = 0; count < 12; count += 1) {
    const caseId = await planCaseAs(house, 'desk@demo.example');
    await commit(house, 'desk@demo.example', caseId, { name: 'open-case', clockOffsetMs: null });
    ownCaseIds.push(caseId);
  }
  foreignCaseId = await planCaseAs(house, 'desk@other.example');
  description = (await (await fetch(`${house.url}/api/openapi.json`)).json()) as Description;
});
afterAll(() => house.close());

/** A request that the description allows, or one that is spoilt: a field too many, another value, no body, bytes. */
function requests(): fc.Arbitrary<{ method: string; path: string; body: string | null }> {
  const find = (ref: string) => description.components.schemas[ref.split('/').at(-1)!]!;
  const operations = Object.entries(description.paths).flatMap(([path, methods]) => Object.entries(methods).map(([method, operation]) => ({ path, method, operation })));
  const caseIds = fc.oneof({ weight: 6, arbitrary: fc.constantFrom(...ownCaseIds) }, fc.constant(foreignCaseId), fc.uuid(), fc.constantFrom('..', '%00', "'", 'null', '0'));
  // One arbitrary for each operation, made once.
  const perOperation = operations.map(({ path, method, operation }) => {
    const schema = operation.requestBody?.content['application/json']?.schema;
    const right = schema === undefined ? fc.constant(null) : arbitraryOfSchema(schema, find).map((value) => JSON.stringify(value));
    const current = fc.tuple(right, fc.constantFrom('wrist', 'below-elbow', 'above-elbow')).map(([text, siteId]) => meant(text, siteId));
    const spoilt = fc.tuple(right, fc.nat(), fc.constantFrom('null', '-1', '""', '[]', '{}', '1e309', '"\\u0000"')).map(([text, at, value]) => spoil(text, at, value));
    const body = fc.oneof({ weight: 4, arbitrary: current }, right, spoilt, fc.json(), fc.constant(null));
    const query = operation.parameters.filter((one) => one.in === 'query').map(({ name, schema: of }) => fc.oneof(arbitraryOfSchema(of, find), fc.string({ maxLength: 5 })).map((value) => `${name}=${encodeURIComponent(String(value))}`));
    const drawn = fc.tuple(caseIds, fc.uuid(), body, fc.tuple(...query)).map(([caseId, screenId, text, words]) => ({
      method: method.toUpperCase(),
      path: `${path.replace('{caseId}', caseId).replace('{screenId}', screenId)}${words.length === 0 ? '' : `?${words.join('&')}`}`,
      body: schema === undefined ? null : text,
    }));
    // Commands are what changes a case: most of the tries go there.
    return { weight: operation.operationId === 'giveCommand' ? 12 : 1, arbitrary: drawn };
  });
  return fc.oneof(...perOperation);
}

/** The same request with a time of now and with names that the case has: it reaches what decides. */
function meant(text: string | null, siteId: string): string | null {
  const names = { eventAt: new Date().toISOString(), siteId, channelId: 'adm', electrodeId: 'surface', family: 'through-skin', nerveId: 'ulnar' };
  return Object.entries(names).reduce<string | null>((so, [name, value]) => so?.replace(new RegExp(`"${name}":"[^"]*"`, 'g'), `"${name}":"${value}"`) ?? null, text);
}

function spoil(text: string | null, at: number, value: string): string | null {
  const places = [...(text ?? '').matchAll(/:(?:"[^"]*"|[\d.-]+|true|false|null)/g)];
  const place = places[at % Math.max(places.length, 1)];
  return text === null || place === undefined ? text : `${text.slice(0, place.index)}:${value}${text.slice(place.index + place[0].length)}`;
}

async function rows(): Promise<Record<string, number>> {
  const counted = ['entries', 'cases', 'people', 'memberships', 'access_tokens', 'sessions', 'case_identities', 'case_assignments'].map(async (table) => {
    const [row] = (await house.admin(table).count('* as count')) as { count: string }[];
    return [table, Number(row?.count)] as const;
  });
  return Object.fromEntries(await Promise.all(counted));
}

it(`${requestCount} requests drawn from the description: no fault, a sentence for each refusal, and nothing changed beyond what was acknowledged`, async () => {
  const before = await rows();
  const foreignBefore = await house.admin('entries').where({ case_id: foreignCaseId });
  const statuses: Record<number, number> = {};
  let entryCount = 0;
  let plannedCount = 0;
  for (const { method, path, body } of fc.sample(requests(), { numRuns: requestCount, seed: 7 })) {
    const response = await fetch(house.url + path, { method, body, headers: { authorization: `Bearer ${token}`, connection: 'close', ...(body === null ? {} : { 'content-type': 'application/json' }) } });
    const text = await response.text();
    statuses[response.status] = (statuses[response.status] ?? 0) + 1;
    expect({ method, path, body, status: response.status, text }).toMatchObject({ status: expect.toSatisfy((status: number) => status < 500) as unknown });
    if (response.status >= 400 && text.startsWith('{')) expect((JSON.parse(text) as { message: string }).message).toMatch(/^[A-Z].{5,}/);
    if (response.status !== 200 || method !== 'POST' || path.endsWith('/screens')) continue;
    const { entries } = JSON.parse(text) as { entries: unknown[] };
    entryCount += entries.length;
    if (path === '/api/cases') plannedCount += 1;
  }
  const after = await rows();
  expect(after).toEqual({
    ...before,
    entries: before.entries! + entryCount,
    cases: before.cases! + plannedCount,
    case_identities: before.case_identities! + plannedCount,
    case_assignments: before.case_assignments! + plannedCount,
  });
  expect(await house.admin('entries').where({ case_id: foreignCaseId })).toEqual(foreignBefore);
  console.log(`machine: ${requestCount} requests, statuses ${JSON.stringify(statuses)}, ${entryCount} entries acknowledged`);
  // The control: the requests reached the case, else nothing was tried.
  expect(entryCount).toBeGreaterThan(20);
  expect(Object.keys(statuses)).toEqual(expect.arrayContaining(['200', '400', '404']));
}, 180_000);
