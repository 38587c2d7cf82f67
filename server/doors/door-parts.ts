import type { RateLimit } from '@/server/auth/rate-limit';
import type { Presence } from '@/server/cases/presence';
import type { RequestSource } from '@/server/fascicle-global';
import type { ServerContext } from '@/server/server-context';
import type { EventLoopWatch } from '@/server/telemetry/event-loop';

/** What the doors reach. */
export interface DoorParts {
  readonly context: ServerContext;
  readonly presence: Presence;
  readonly loop: EventLoopWatch;
  /** How often a machine may ask for a pairing code, and a person may try one. */
  readonly pairingLimit: RateLimit;
  /** How often one token of a program may ask. */
  readonly tokenLimit: RateLimit;
}

/** One door: from an input and its source to an answer, with cookies to set where there are any. */
export type Door<Input, Answer> = (parts: DoorParts, input: Input, source: RequestSource) => Promise<Answer | Answered<Answer>>;

/** An answer that sets cookies. */
export interface Answered<Answer> {
  readonly isAnswered: true;
  readonly answer: Answer;
  readonly cookies: readonly string[];
}
