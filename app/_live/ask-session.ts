import { readSession } from '@/app/_live/api';
import { ApiFailure } from '@/app/_live/api-failure';
import type { SessionAnswer } from '@/app/_live/desk-identity';

const answerWithinMs = 1500;

/** Who is signed in, from the server; "no answer" soon, because a desk without a link must still start. */
export async function askSession(): Promise<SessionAnswer> {
  try {
    const { personId, displayName } = await readSession({ timeoutMs: answerWithinMs });
    return { kind: 'person', personId, displayName };
  } catch (cause) {
    return { kind: cause instanceof ApiFailure && cause.kind === 'not-signed-in' ? 'nobody' : 'no-answer' };
  }
}
