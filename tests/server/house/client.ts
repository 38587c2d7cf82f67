import { v7 as newId } from 'uuid';

import type { PersonCommand } from '@/lib/contracts/http/commands';
import type { CommandReply, WireEntry } from '@/lib/contracts/http/replies';
import { ulnarAtElbow } from '@/lib/reference/templates/ulnar-at-elbow';

import type { TestHouse } from './open-test-house';

/** An answer over HTTP. */
export interface HttpAnswer {
  readonly status: number;
  readonly body: unknown;
  readonly headers: Headers;
}

/** Sends a request as a page of the product would, or with what the test puts in its place. */
export async function send(house: Pick<TestHouse, 'url'>, method: string, path: string, options: { cookie?: string; body?: unknown; headers?: Record<string, string> } = {}): Promise<HttpAnswer> {
  const isText = typeof options.body === 'string' || options.body instanceof Uint8Array;
  const headers = {
    ...(method === 'GET' ? {} : { origin: house.url, 'content-type': 'application/json' }),
    ...(options.cookie === undefined ? {} : { cookie: options.cookie }),
    ...options.headers,
  };
  const body = options.body === undefined ? null : isText ? (options.body as string) : JSON.stringify(options.body);
  const response = await fetch(house.url + path, { method, headers, body, redirect: 'manual' });
  const text = await response.text();
  return { status: response.status, body: text.startsWith('{') ? JSON.parse(text) : text, headers: response.headers };
}

/** A request that plans a case in a demo theatre. */
export function planRequest(title = 'Left ulnar nerve, transposition') {
  return {
    commandId: newId(),
    eventAt: new Date().toISOString(),
    plan: { ...ulnarAtElbow, theatre: 'Theatre 1', title },
    identity: { patientLabel: 'Invented patient', recordNumber: 'DEMO-1' },
  };
}

/** Plans a case as this person and gives its id. */
export async function planCaseAs(house: TestHouse, email: string): Promise<string> {
  const { status, body } = await send(house, 'POST', '/api/cases', { cookie: await house.cookieOf(email), body: planRequest() });
  if (status !== 200) throw new Error(`Planning answered ${status}: ${JSON.stringify(body)}`);
  return (body as CommandReply & { kind: 'committed' }).caseId;
}

/** A command in a new envelope. */
export function envelope(command: PersonCommand, eventAt = new Date().toISOString()) {
  return { commandId: newId(), eventAt, command };
}

/** Gives a command over HTTP. */
export async function give(house: TestHouse, email: string, caseId: string, request: ReturnType<typeof envelope>): Promise<HttpAnswer> {
  return send(house, 'POST', `/api/cases/${caseId}/commands`, { cookie: await house.cookieOf(email), body: request });
}

/** Gives a command that must be committed; the entries it wrote. */
export async function commit(house: TestHouse, email: string, caseId: string, command: PersonCommand): Promise<WireEntry[]> {
  const { status, body } = await give(house, email, caseId, envelope(command));
  if (status !== 200) throw new Error(`${command.name} answered ${status}: ${JSON.stringify(body)}`);
  return (body as CommandReply & { kind: 'committed' }).entries;
}

/** A run with a measured response on each named channel. */
export function runCommand(siteId: string, amplitudeUv = 8_000, purpose: 'baseline' | 'check' = 'check'): PersonCommand {
  return {
    name: 'log-run',
    run: {
      siteId,
      electrodeId: 'surface',
      family: 'exposed',
      purpose,
      intensityMa: 20,
      pulseWidthUs: 200,
      isSupramaximal: true,
      maximalResponseMa: null,
      readings: [{ channelId: 'adm', reading: { kind: 'measured', onsetMs: 6.2, amplitudeUv, durationMs: 5.5 } }],
      note: null,
    },
  };
}
