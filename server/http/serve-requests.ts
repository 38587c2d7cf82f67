import { randomBytes } from 'node:crypto';
import type { IncomingMessage, ServerResponse } from 'node:http';
import type { Logger } from 'pino';

import { addressHeader } from '@/server/http/address-header';
import type { AllowedOrigins } from '@/server/http/allowed-origins';
import { clientAddress } from '@/server/http/client-address';
import { guardRequest } from '@/server/http/guard-request';
import { mayBeStored, securityHeaders } from '@/server/http/security-headers';

/** Headers a client may not set, because something behind this door believes them. */
const neverFromClients = [
  addressHeader,
  'content-security-policy',
  'content-security-policy-report-only',
  'x-middleware-subrequest',
  'x-nonce',
  'x-forwarded-for',
  'x-forwarded-host',
  'x-forwarded-proto',
  'x-forwarded-port',
  'next-action',
];

type Handle = (request: IncomingMessage, response: ServerResponse) => Promise<void>;

/** Puts guard, nonce and headers around the handler that writes the pages. */
export function serveRequests(options: { allowed: AllowedOrigins; publicUrl: string; isDevelopment: boolean; log: Logger; handle: Handle }) {
  return (request: IncomingMessage, response: ServerResponse): void => {
    const address = clientAddress(request, options.publicUrl);
    for (const name of neverFromClients) delete request.headers[name];
    request.headers[addressHeader] = address;
    const path = (request.url ?? '/').split('?')[0] ?? '/';
    const headers = securityHeaders({ nonce: randomBytes(18).toString('base64'), publicUrl: options.publicUrl, isDevelopment: options.isDevelopment });
    for (const [name, value] of Object.entries(headers)) response.setHeader(name, value);
    if (!mayBeStored(path)) keepUnstored(response);
    request.headers['content-security-policy'] = headers['content-security-policy'];
    const refused = guardRequest({ method: request.method ?? '', path, headers: request.headers }, options.allowed);
    if (refused !== null) return answer(response, refused.status, refused.body);
    options.handle(request, response).catch((cause: unknown) => {
      options.log.error({ err: cause, path }, 'A request could not be answered.');
      if (response.headersSent) return response.destroy();
      answer(response, 503, { kind: 'not-saved', code: 'fault', message: 'Not answered: the server met a fault and wrote it to its log. Try again.', field: null });
    });
  };
}

/** Next sets its own cache header late; ours must be the last word on everything that may hold a case. */
function keepUnstored(response: ServerResponse): void {
  response.setHeader('cache-control', 'no-store');
  const [setHeader, appendHeader] = [response.setHeader.bind(response), response.appendHeader.bind(response)];
  response.setHeader = (name, value) => setHeader(name, name.toLowerCase() === 'cache-control' ? 'no-store' : value);
  response.appendHeader = (name, value) => (name.toLowerCase() === 'cache-control' ? response : appendHeader(name, value));
}

/** Answers without reading the body; the connection ends, because bytes of that body may still come. */
function answer(response: ServerResponse, status: number, body: unknown): void {
  response.statusCode = status;
  response.setHeader('content-type', 'application/json; charset=utf-8');
  response.setHeader('connection', 'close');
  response.end(JSON.stringify(body));
}
