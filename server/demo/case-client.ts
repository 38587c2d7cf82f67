import type { Contract } from '@/lib/contracts/contract';
import { failureReplySchema, type FailureReply } from '@/lib/contracts/http/replies';
import { SetupFailure } from '@/server/setup/setup-failure.mjs';
import { pause } from '@/server/demo/pause';

/** Headers that let a person in: those of a token. */
export type Credentials = Readonly<Record<string, string>>;

/** A question to the public interface, on behalf of one person. */
export interface Question {
  readonly method: 'GET' | 'POST';
  readonly path: string;
  readonly as: Credentials;
  readonly body?: object;
}

/** The answer in the form of its contract, or the server's refusal with its sentence. */
export type Answer<Wanted> = { readonly isOk: true; readonly body: Wanted } | { readonly isOk: false; readonly refusal: Pick<FailureReply, 'code' | 'message'> };

/** Waits between repeats of the same request, in ms; the last one goes on until patience ends. House rule. */
const waitsMs = [200, 500, 1_000, 2_000, 5_000];
const patienceMs = 60_000;
/** One request may take so long before it is sent again. House rule. */
const requestMs = 10_000;

/** Asks the server at one address. What may not have arrived is sent again as it was: a command carries its id. */
export class CaseClient {
  constructor(
    readonly url: string,
    private readonly stop: AbortSignal,
    private readonly reach: typeof fetch = fetch,
  ) {}

  async ask<Wanted>(question: Question, contract: Contract<Wanted>): Promise<Answer<Wanted>> {
    const giveUpAtMs = Date.now() + patienceMs;
    for (let count = 0; ; count += 1) {
      const response = await this.send(question);
      if (response !== null && response.status !== 503 && response.status !== 429) return readAnswer(response, contract);
      const problem = response === null ? `${this.url} does not answer` : `${this.url} answers ${response.status}`;
      if (Date.now() > giveUpAtMs) throw new SetupFailure('unexpected', `${problem}; the demo gave up after ${patienceMs / 1000} s. Start the server with "npm start" and the demo again.`);
      await pause(waitsMs[Math.min(count, waitsMs.length - 1)] ?? 0, this.stop);
      this.stop.throwIfAborted();
    }
  }

  private async send({ method, path, as, body }: Question): Promise<{ status: number; text: string } | null> {
    const headers = { ...as, ...(body === undefined ? {} : { 'content-type': 'application/json' }) };
    try {
      const response = await this.reach(this.url + path, { method, headers, body: body === undefined ? null : JSON.stringify(body), redirect: 'manual', signal: AbortSignal.timeout(requestMs) });
      return { status: response.status, text: await response.text() };
    } catch {
      return null;
    }
  }
}

function readAnswer<Wanted>({ status, text }: { status: number; text: string }, contract: Contract<Wanted>): Answer<Wanted> {
  const body = parsed(text);
  if (status === 200) return { isOk: true, body: contract.parse(body) };
  const failure = failureReplySchema.safeParse(body);
  const refusal = failure.success ? failure.data : { code: 'unknown', message: `The server answered ${status}` };
  return { isOk: false, refusal };
}

function parsed(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return null;
  }
}
