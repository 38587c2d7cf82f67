import { z } from 'zod';

import { contractVersion } from '@/lib/contracts/contract-version';
import { apiLimits } from '@/lib/contracts/http/api-limits';
import { apiShapes, apiTable, type ApiOperation, type ApiShape } from '@/lib/contracts/http/api-table';

const caution =
  'Fascicle is an aid for qualified staff, not a certified medical device. It states findings and never says what to do. Local protocols and licensed judgement come first. ' +
  'A program that logs runs is answerable for what it logs like the person whose token it carries; nothing that was logged can be removed, only corrected.';

const limits = `Limits: ${apiLimits.requestsPerSecond} requests a second and ${apiLimits.requestsAtOnce} at once for one token, ${apiLimits.bodyBytes} bytes in a body, ${apiLimits.pageEntries} entries in a page of a log, ${apiLimits.listedCases} cases in a list. Times are RFC 3339 in UTC with milliseconds; an event may lie in the past, back to the planning of its case, and 2 s ahead at most.`;

const failures: Readonly<Record<number, string>> = {
  400: 'Something in the request is wrong: which field, which value, what is allowed. Nothing was changed',
  401: 'No token, or one that is wrong, expired or revoked',
  404: 'There is no such thing for this person',
  411: 'The length of the body was not told before it was sent',
  413: `The body is larger than ${apiLimits.bodyBytes} bytes`,
  429: 'Too many requests; the sentence says how many are allowed',
  503: 'Not saved: the database did not answer. It is safe to send the same again',
};

/**
 * The interface for programs as an OpenAPI 3.1 document, made from the schemas that the server itself reads with.
 *
 * @returns a new document; JSON values only
 * @source OpenAPI Specification 3.1.0; JSON Schema 2020-12
 * @accuracy tests/server/machine: a client made from it alone plays a case
 * @example
 * openapiDocument().openapi // => '3.1.0'
 */
export function openapiDocument() {
  return {
    openapi: '3.1.0',
    info: { title: 'Fascicle', version: String(contractVersion), description: `${caution} ${limits}` },
    servers: [{ url: '/' }],
    security: [{ token: [] }],
    paths: paths(),
    components: { securitySchemes: { token: { type: 'http', scheme: 'bearer', description: 'Printed by: npm run token -- --for EMAIL' } }, schemas: shapes() },
  };
}

function shapes(): Record<string, unknown> {
  const registry = z.registry<{ id: string }>();
  for (const [id, schema] of Object.entries(apiShapes)) registry.add(schema, { id });
  const { schemas } = z.toJSONSchema(registry, { io: 'input', unrepresentable: 'any', uri: refTo });
  return Object.fromEntries(Object.entries(schemas).map(([name, { $schema: _dialect, $id: _id, ...schema }]) => [name, schema]));
}

function refTo(name: string): string {
  return `#/components/schemas/${name}`;
}

function paths(): Record<string, Record<string, unknown>> {
  const byPath: Record<string, Record<string, unknown>> = {};
  for (const operation of apiTable) byPath[operation.path] = { ...byPath[operation.path], [operation.method]: described(operation) };
  return byPath;
}

function described({ operationId, path, summary, request, reply, query, isOpen, mayConflict }: ApiOperation) {
  const parts = [...path.matchAll(/\{(\w+)\}/g)].map(([, name]) => ({ name, in: 'path', required: true, schema: { type: 'string', format: 'uuid' } }));
  const words = Object.entries(query).map(([name, part]) => ({ name, in: 'query', description: part.words, schema: plain(z.toJSONSchema(part.schema)) }));
  const failing = Object.entries(failures).filter(([status]) => !isOpen || status === '503');
  const conflict = { 409: { description: 'It cannot be done as things stand, with the reason. Nothing was changed', content: json('FailureReply') } };
  return {
    operationId,
    summary,
    ...(isOpen ? { security: [] } : {}),
    parameters: [...parts, ...words],
    ...(request === null ? {} : { requestBody: { required: true, content: json(request) } }),
    responses: {
      200: { description: 'Done', content: json(reply) },
      ...(mayConflict ? conflict : {}),
      ...Object.fromEntries(failing.map(([status, description]) => [status, { description, content: json('FailureReply') }])),
    },
  };
}

function plain({ $schema: _dialect, ...schema }: Record<string, unknown>): Record<string, unknown> {
  return schema;
}

function json(shape: ApiShape) {
  return { 'application/json': { schema: { $ref: refTo(shape) } } };
}
