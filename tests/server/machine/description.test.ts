import { readdirSync, readFileSync } from 'node:fs';

import { parse, validate } from '@apidevtools/swagger-parser';
import { describe, expect, it } from 'vitest';

import { apiTable } from '@/lib/contracts/http/api-table';
import { openapiDocument } from '@/lib/contracts/http/openapi-document';

/** Routes that no program needs: a browser signs in, a wall asks for its code, a page shows the demo people. */
const notForPrograms = ['/api/auth/{...nextauth}', '/api/demo-people', '/api/openapi.json', '/api/reauthenticate', '/api/screen'];

const routes = readdirSync('app/api', { recursive: true, encoding: 'utf8' }).filter((file) => file.endsWith('route.ts'));
const served = routes.flatMap((file) => {
  const path = `/api/${file.replace(/\/?route\.ts$/, '').replace(/\[([^\]]+)\]/g, '{$1}')}`;
  const methods = [...readFileSync(`app/api/${file}`, 'utf8').matchAll(/export (?:async )?function (GET|POST|DELETE)/g)].map(([, method]) => method!.toLowerCase());
  return notForPrograms.includes(path) ? [] : methods.map((method) => `${method} ${path}`);
});

describe('openapiDocument', () => {
  it('is a valid OpenAPI 3.1 document', async () => {
    await expect(validate(structuredClone(openapiDocument()) as never)).resolves.toMatchObject({ openapi: '3.1.0' });
    const broken = { ...structuredClone(openapiDocument()), paths: { 'no-slash': {} } };
    await expect(validate(broken as never)).rejects.toThrow();
    await expect(parse(structuredClone(openapiDocument()) as never)).resolves.toBeDefined();
  });

  it('describes each route that is served to programs, and none that is not', () => {
    expect(apiTable.map(({ method, path }) => `${method} ${path}`).sort()).toEqual(served.sort());
  });

  it('names every route that it leaves out', () => {
    const paths = routes.map((file) => `/api/${file.replace(/\/?route\.ts$/, '').replace(/\[([^\]]+)\]/g, '{$1}')}`);
    expect(notForPrograms.filter((path) => !paths.includes(path))).toEqual([]);
  });
});
