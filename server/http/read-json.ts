import { failure } from '@/server/failure';
import { largestBodyBytes } from '@/server/http/guard-request';
import { problemOf, type ContractIssue } from '@/server/http/problem-of';

/** A contract: anything that reads an unknown value and says what is wrong with it. */
export interface Contract<Value> {
  safeParse(value: unknown): { success: true; data: Value } | { success: false; error: { issues: readonly ContractIssue[] } };
}

/** The body of a request as its contract reads it; fails with the field and a sentence. */
export async function readJson<Value>(request: Request, contract: Contract<Value>): Promise<Value> {
  const read = contract.safeParse(await parseBody(request));
  if (read.success) return read.data;
  const { field, message } = problemOf(read.error.issues);
  throw failure('bad-request', 'bad-request', message, field);
}

async function parseBody(request: Request): Promise<unknown> {
  const bytes = new Uint8Array(await request.arrayBuffer());
  if (bytes.length > largestBodyBytes) throw failure('bad-request', 'too-large', `Too large: ${bytes.length} bytes came, at most ${largestBodyBytes} are allowed.`);
  try {
    return JSON.parse(new TextDecoder('utf-8', { fatal: true }).decode(bytes));
  } catch {
    throw failure('bad-request', 'not-json', 'Not JSON: the body must be one JSON object in UTF-8.');
  }
}
