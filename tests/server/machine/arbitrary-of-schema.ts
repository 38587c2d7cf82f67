import fc from 'fast-check';

/** A JSON schema as an interface's description holds it, as far as its arbitrary needs it. */
export interface JsonSchema {
  readonly $ref?: string;
  readonly type?: string | readonly string[];
  readonly const?: unknown;
  readonly enum?: readonly unknown[];
  readonly anyOf?: readonly JsonSchema[];
  readonly oneOf?: readonly JsonSchema[];
  readonly allOf?: readonly JsonSchema[];
  readonly properties?: Readonly<Record<string, JsonSchema>>;
  readonly required?: readonly string[];
  readonly 'items'?: JsonSchema;
  readonly minItems?: number;
  readonly maxItems?: number;
  readonly minLength?: number;
  readonly maxLength?: number;
  readonly pattern?: string;
  readonly minimum?: number;
  readonly maximum?: number;
  readonly exclusiveMinimum?: number;
  readonly exclusiveMaximum?: number;
}

/** Lists are kept short: long ones are tried by hand elsewhere. */
const longestList = 3;

/** Values that a schema allows, as far as the schema says it. Throws at what it does not know rather than skip it. */
export function arbitraryOfSchema(schema: JsonSchema, find: (ref: string) => JsonSchema): fc.Arbitrary<unknown> {
  const of = (inner: JsonSchema) => arbitraryOfSchema(inner, find);
  if (schema.$ref !== undefined) return of(find(schema.$ref));
  if ('const' in schema) return fc.constant(schema.const);
  if (schema.enum !== undefined) return fc.constantFrom(...schema.enum);
  const choices = schema.anyOf ?? schema.oneOf;
  if (choices !== undefined) return fc.oneof(...choices.map(of));
  if (schema.allOf !== undefined) return fc.tuple(...schema.allOf.map(of)).map((parts) => Object.assign({}, ...(parts as object[])) as unknown);
  if (Array.isArray(schema.type)) return fc.oneof(...(schema.type as string[]).map((type) => of({ ...schema, type })));
  switch (schema.type) {
    case 'object':
      return objects(schema, of);
    case 'array':
      return fc.array(of(schema.items ?? {}), { minLength: schema.minItems ?? 0, maxLength: Math.max(schema.minItems ?? 0, Math.min(schema.maxItems ?? longestList, longestList)) });
    case 'string':
      return strings(schema);
    case 'integer':
      return fc.integer({ min: lowest(schema), max: highest(schema) });
    case 'number':
      return fc.double({ min: lowest(schema), max: highest(schema), noNaN: true });
    case 'boolean':
      return fc.boolean();
    case 'null':
      return fc.constant(null);
    case undefined:
      return fc.jsonValue({ maxDepth: 1 });
    default:
      throw new Error(`No arbitrary for a schema of type ${String(schema.type)}`);
  }
}

function objects(schema: JsonSchema, of: (inner: JsonSchema) => fc.Arbitrary<unknown>): fc.Arbitrary<unknown> {
  const fields = Object.fromEntries(Object.entries(schema.properties ?? {}).map(([name, inner]) => [name, of(inner)]));
  return fc.record(fields, { requiredKeys: (schema.required ?? []).filter((name) => name in fields) });
}

function strings({ pattern, minLength = 0, maxLength = 60 }: JsonSchema): fc.Arbitrary<string> {
  const drawn = pattern === undefined ? fc.string({ minLength, maxLength: Math.min(maxLength, minLength + 60) }) : fc.stringMatching(new RegExp(pattern));
  return drawn.map((text) => text.slice(0, maxLength));
}

function lowest({ minimum, exclusiveMinimum }: JsonSchema): number {
  return Math.max(minimum ?? -1_000_000, exclusiveMinimum ?? -1_000_000, -Number.MAX_SAFE_INTEGER);
}

function highest({ maximum, exclusiveMaximum }: JsonSchema): number {
  return Math.min(maximum ?? 1_000_000, exclusiveMaximum ?? 1_000_000, Number.MAX_SAFE_INTEGER);
}
