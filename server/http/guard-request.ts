import type { IncomingHttpHeaders } from 'node:http';

import { apiLimits } from '@/lib/contracts/http/api-limits';
import type { FailureReply } from '@/lib/contracts/http/replies';
import { isBearer } from '@/server/auth/access-token';
import type { AllowedOrigins } from '@/server/http/allowed-origins';

/** Largest body of a request, in bytes. */
export const largestBodyBytes = apiLimits.bodyBytes;

/** Why a request is not passed on. */
export interface GuardRefusal {
  readonly status: number;
  readonly body: FailureReply;
}

/** What the guard looks at. */
export interface GuardedRequest {
  readonly method: string;
  readonly path: string;
  readonly headers: IncomingHttpHeaders;
}

/** Looks at a request before anyone reads its body: who is asked, from where, how much, in which form. */
export function guardRequest(request: GuardedRequest, allowed: AllowedOrigins): GuardRefusal | null {
  const host = request.headers.host ?? '';
  if (!allowed.hosts.has(host.toLowerCase())) {
    return refusal(400, 'wrong-host', `Wrong host: this server does not answer for "${shown(host)}".`);
  }
  if (request.method === 'GET' || request.method === 'HEAD') return null;
  const isApi = request.path.startsWith('/api/');
  if (!isApi || !['POST', 'DELETE'].includes(request.method)) {
    return refusal(405, 'wrong-method', `Wrong method: ${shown(request.method)} is not allowed here.`);
  }
  return (isFromProgram(request) ? null : originRefusal(request.headers, allowed)) ?? bodyRefusal(request);
}

/** A program with a token has no page; no other site can make a browser send that header without asking first, which is refused. */
function isFromProgram({ path, headers }: GuardedRequest): boolean {
  return isBearer(headers.authorization) && headers.origin === undefined && !path.startsWith('/api/auth/');
}

/** A write must say where it comes from, and it must be one of our own pages. */
function originRefusal(headers: IncomingHttpHeaders, allowed: AllowedOrigins): GuardRefusal | null {
  const origin = headers.origin;
  if (origin === undefined) return refusal(400, 'no-origin', 'Origin missing: writes are accepted from the pages of this server only.');
  if (!isAllowedOrigin(origin, allowed)) return refusal(400, 'foreign-origin', `Foreign origin: writes from "${shown(origin)}" are not accepted.`);
  const site = headers['sec-fetch-site'];
  if (site !== undefined && site !== 'same-origin') return refusal(400, 'foreign-origin', 'Foreign origin: writes are accepted from the pages of this server only.');
  return null;
}

function bodyRefusal({ method, path, headers }: GuardedRequest): GuardRefusal | null {
  if (headers['transfer-encoding'] !== undefined) return refusal(411, 'no-length', 'Length missing: the size of the body must be told before it is sent.');
  const length = Number(headers['content-length'] ?? '0');
  if (!Number.isSafeInteger(length) || length < 0) return refusal(400, 'no-length', 'Length missing: the size of the body must be told before it is sent.');
  if (length > largestBodyBytes) return refusal(413, 'too-large', `Too large: ${length} bytes came, at most ${largestBodyBytes} are allowed.`);
  if (method === 'DELETE') return length === 0 ? null : refusal(400, 'body-not-allowed', 'Body not allowed: this request takes none.');
  const wanted = path.startsWith('/api/auth/') ? 'application/x-www-form-urlencoded' : 'application/json';
  const type = (headers['content-type'] ?? '').split(';')[0]?.trim().toLowerCase();
  return type === wanted ? null : refusal(400, 'wrong-type', `Wrong content type: "${shown(type ?? '')}" came, ${wanted} is allowed.`);
}

/** Whether an Origin header names this server: exact, so neither "null" nor a sub-domain nor a suffix passes. */
export function isAllowedOrigin(origin: string | undefined, allowed: AllowedOrigins): boolean {
  return origin !== undefined && allowed.origins.has(origin);
}

function refusal(status: number, code: string, message: string): GuardRefusal {
  return { status, body: { kind: 'bad-request', code, message, field: null } };
}

function shown(text: string): string {
  return text.replace(/[^\x20-\x7e]/g, '?').slice(0, 80);
}
