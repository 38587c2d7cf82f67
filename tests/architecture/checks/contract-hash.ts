import { createHash } from 'node:crypto';
import { readdirSync } from 'node:fs';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';

import { z } from 'zod';

/** JSON text with the keys of every object in order, so that a moved line changes nothing. */
export function orderedJson(value: unknown): string {
  if (Array.isArray(value)) return `[${value.map(orderedJson).join(',')}]`;
  if (value === null || typeof value !== 'object') return JSON.stringify(value) ?? 'null';
  const entries = Object.entries(value).sort(([a], [b]) => (a < b ? -1 : 1));
  return `{${entries.map(([key, part]) => `${JSON.stringify(key)}:${orderedJson(part)}`).join(',')}}`;
}

/** SHA-256 of the shapes of all named schemas, as JSON Schema of what is accepted. */
export function contractHash(schemas: Readonly<Record<string, z.ZodType>>): string {
  const shapes = Object.entries(schemas).map(([name, schema]) => [name, z.toJSONSchema(schema, { io: 'input', unrepresentable: 'any' })]);
  return createHash('sha256').update(orderedJson(Object.fromEntries(shapes))).digest('hex');
}

/** Every schema that lib/contracts hands out, named by file and export. */
export async function contractSchemas(): Promise<Readonly<Record<string, z.ZodType>>> {
  const schemas: Record<string, z.ZodType> = {};
  for (const folder of ['http', 'channel']) {
    for (const file of readdirSync(`lib/contracts/${folder}`).filter((name) => name.endsWith('.ts')).sort()) {
      const path = `lib/contracts/${folder}/${file}`;
      const exported = (await import(pathToFileURL(join(process.cwd(), path)).href)) as Record<string, unknown>;
      for (const [name, value] of Object.entries(exported)) {
        if (value instanceof z.ZodType) schemas[`${path} ${name}`] = value;
      }
    }
  }
  return schemas;
}
