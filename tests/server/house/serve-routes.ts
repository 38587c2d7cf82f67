import type { IncomingMessage, ServerResponse } from 'node:http';

import * as caseRoute from '@/app/api/cases/[caseId]/route';
import * as commandsRoute from '@/app/api/cases/[caseId]/commands/route';
import * as entriesRoute from '@/app/api/cases/[caseId]/entries/route';
import * as screenOfCaseRoute from '@/app/api/cases/[caseId]/screens/[screenId]/route';
import * as screensRoute from '@/app/api/cases/[caseId]/screens/route';
import * as casesRoute from '@/app/api/cases/route';
import * as demoPeopleRoute from '@/app/api/demo-people/route';
import * as healthRoute from '@/app/api/health/route';
import * as openapiRoute from '@/app/api/openapi.json/route';
import * as peopleRoute from '@/app/api/people/route';
import * as reauthenticateRoute from '@/app/api/reauthenticate/route';
import * as screenRoute from '@/app/api/screen/route';
import * as sessionRoute from '@/app/api/session/route';

type Params = Record<string, string>;
type Handler = (request: Request, place: { params: Promise<never> }) => Promise<Response>;

/** The product's own routes on their own addresses, without the pages around them. */
const routes: readonly (readonly [RegExp, object])[] = [
  [/^\/api\/cases$/, casesRoute],
  [/^\/api\/cases\/(?<caseId>[^/]+)$/, caseRoute],
  [/^\/api\/cases\/(?<caseId>[^/]+)\/entries$/, entriesRoute],
  [/^\/api\/cases\/(?<caseId>[^/]+)\/commands$/, commandsRoute],
  [/^\/api\/cases\/(?<caseId>[^/]+)\/screens$/, screensRoute],
  [/^\/api\/cases\/(?<caseId>[^/]+)\/screens\/(?<screenId>[^/]+)$/, screenOfCaseRoute],
  [/^\/api\/session$/, sessionRoute],
  [/^\/api\/people$/, peopleRoute],
  [/^\/api\/openapi\.json$/, openapiRoute],
  [/^\/api\/screen$/, screenRoute],
  [/^\/api\/reauthenticate$/, reauthenticateRoute],
  [/^\/api\/demo-people$/, demoPeopleRoute],
  [/^\/api\/health$/, healthRoute],
];

/** What Next does with a request for a route, as far as the routes can tell. */
export async function serveRoutes(incoming: IncomingMessage, outgoing: ServerResponse): Promise<void> {
  const url = new URL(incoming.url ?? '/', `http://${incoming.headers.host}`);
  const chunks: Buffer[] = [];
  for await (const chunk of incoming) chunks.push(chunk as Buffer);
  const found = routes.map(([pattern, route]) => [pattern.exec(url.pathname), route] as const).find(([match]) => match !== null);
  const handler = found?.[1][incoming.method as never] as Handler | undefined;
  if (found === undefined || handler === undefined) {
    outgoing.statusCode = found === undefined ? 404 : 405;
    outgoing.end();
    return;
  }
  const headers = new Headers(Object.entries(incoming.headers).map(([name, value]): [string, string] => [name, String(value)]));
  const body = ['GET', 'HEAD'].includes(incoming.method ?? '') ? null : Buffer.concat(chunks);
  const params = { ...found[0]?.groups } as Params;
  const response = await handler(new Request(url, { method: incoming.method ?? 'GET', headers, body }), { params: Promise.resolve(params as never) });
  outgoing.statusCode = response.status;
  for (const [name, value] of response.headers) outgoing.appendHeader(name, value);
  outgoing.end(Buffer.from(await response.arrayBuffer()));
}
