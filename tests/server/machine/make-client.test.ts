import { createServer, type IncomingHttpHeaders } from 'node:http';
import type { AddressInfo } from 'node:net';

import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { arbitraryOfSchema, type JsonSchema } from './arbitrary-of-schema';
import { makeClient } from './make-client';

const body = { type: 'object', properties: { amplitudeUv: { type: 'number', minimum: 0, maximum: 9 }, note: { anyOf: [{ type: 'string', maxLength: 3 }, { type: 'null' }] } }, required: ['amplitudeUv'] } as const;
const json = (schema: object) => ({ 'application/json': { schema } });
const description = {
  openapi: '3.1.0',
  info: { title: 'Trial', version: '1' },
  security: [{ bearer: [] }],
  components: { securitySchemes: { bearer: { type: 'http', scheme: 'bearer' } } },
  paths: {
    '/api/trials/{trialId}': {
      post: {
        operationId: 'giveTrial',
        parameters: [{ name: 'trialId', in: 'path', required: true, schema: { type: 'string' } }],
        requestBody: { required: true, content: json(body) },
        responses: { 200: { description: 'Taken', content: json({ type: 'object' }) }, 400: { description: 'Refused', content: json({ type: 'object' }) } },
      },
    },
  },
};

async function listening(status: number) {
  const asked: { path: string | undefined; headers: IncomingHttpHeaders; body: string }[] = [];
  const server = createServer((request, response) => {
    let text = '';
    request.on('data', (chunk) => (text += String(chunk)));
    request.on('end', () => {
      asked.push({ path: request.url, headers: request.headers, body: text });
      response.writeHead(status, { 'content-type': 'application/json' }).end(JSON.stringify({ said: status }));
    });
  });
  await new Promise<void>((tell) => server.listen(0, '127.0.0.1', tell));
  return { asked, url: `http://127.0.0.1:${(server.address() as AddressInfo).port}`, stop: () => server.close() };
}

describe('makeClient', () => {
  it.each([200, 400])('sends path, token and body as described, and answers %i with its body', async (status) => {
    const server = await listening(status);
    const client = await makeClient(description, { url: server.url, token: 'secret' });
    expect(await client.giveTrial?.('t-1', { amplitudeUv: 3 })).toEqual({ status, body: { said: status } });
    server.stop();
    expect(server.asked).toMatchObject([{ path: '/api/trials/t-1', body: '{"amplitudeUv":3}', headers: { authorization: 'Bearer secret' } }]);
  });
});

describe('arbitraryOfSchema', () => {
  it('draws what the schema allows, in every form of it', () => {
    const drawn = fc.sample(arbitraryOfSchema(body as JsonSchema, () => ({})), 300) as { amplitudeUv: number; note?: string | null }[];
    expect(drawn.filter(({ amplitudeUv }) => !(amplitudeUv >= 0 && amplitudeUv <= 9))).toEqual([]);
    expect(drawn.filter(({ note }) => typeof note === 'string' && note.length > 3)).toEqual([]);
    for (const form of [undefined, null, 'string']) expect(drawn.some(({ note }) => note === form || typeof note === form)).toBe(true);
  });

  it('throws at a type that it does not know', () => {
    expect(() => arbitraryOfSchema({ type: 'moon' }, () => ({}))).toThrow('moon');
  });
});
