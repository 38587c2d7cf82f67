import { ApiFailure } from '@/app/_live/api-failure';
import type { Contract } from '@/lib/contracts/contract';
import { failureReplySchema } from '@/lib/contracts/http/replies';

/** How to ask. */
export interface Question {
  readonly method?: 'GET' | 'POST' | 'DELETE';
  readonly body?: unknown;
  readonly timeoutMs?: number;
}

const defaultTimeoutMs = 10_000;

/**
 * One request to the server, its answer read by its contract.
 * @throws {ApiFailure} for every other end, with a sentence
 */
export async function askServer<Answer>(path: string, contract: Contract<Answer>, question: Question = {}): Promise<Answer> {
  const { isOk, value } = await fetchJson(path, question);
  if (!isOk) throw failureOf(value);
  const read = contract.safeParse(value);
  if (!read.success) throw new ApiFailure('unreadable', 'newer-version', 'Newer version: this page cannot read the answer. Load the page again.');
  return read.data;
}

async function fetchJson(path: string, question: Question): Promise<{ isOk: boolean; value: unknown }> {
  const { method = 'GET', body, timeoutMs = defaultTimeoutMs } = question;
  try {
    const response = await fetch(path, {
      method,
      credentials: 'same-origin',
      cache: 'no-store',
      signal: AbortSignal.timeout(timeoutMs),
      ...(body === undefined ? {} : { body: JSON.stringify(body), headers: { 'content-type': 'application/json' } }),
    });
    const value: unknown = await response.json().catch(() => null);
    return { isOk: response.ok, value };
  } catch {
    throw new ApiFailure('no-link', 'no-link', 'No answer: the server was not reached. Check the link, then try again.');
  }
}

function failureOf(value: unknown): ApiFailure {
  const read = failureReplySchema.safeParse(value);
  if (read.success) return new ApiFailure(read.data.kind, read.data.code, read.data.message, read.data.field);
  return new ApiFailure('unreadable', 'unreadable', 'No answer that this page can read. Try again.');
}
