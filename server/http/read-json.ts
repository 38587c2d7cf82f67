import { failure } from '@/server/failure';
import { largestBodyBytes } from '@/server/http/guard-request';
import { problemOf, type ContractIssue } from '@/server/http/problem-of';

/** A contract: it reads an unknown value, or throws with the issues it found. */
export interface Contract<Value> {
  parse(value: unknown): Value;
}

/** The body of a request as its contract reads it; fails with the field and a sentence. */
export async function readJson<Value>(request: Request, contract: Contract<Value>): Promise<Value> {
  const value = await parseBody(request);
  try {
    return contract.parse(value);
  } catch (thrown) {
    if (typeof thrown !== 'object' || thrown === null || !('issues' in thrown)) throw thrown;
    const { field, message } = problemOf(thrown.issues as readonly ContractIssue[]);
    throw failure('bad-request', 'bad-request', message, field);
  }
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
