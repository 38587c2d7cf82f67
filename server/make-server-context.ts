import type { Logger } from 'pino';

import type { Database } from '@/db/connection';
import { makeCaseMemory } from '@/server/cases/case-memory';
import { makeCaseQueue } from '@/server/cases/case-queue';
import type { ServerContext } from '@/server/server-context';

/** What differs between a server, a test and a second process. */
export interface ContextParts {
  readonly database: Database;
  readonly log: Logger;
  readonly publicUrl: string;
  readonly secret: string;
  readonly isDemo: boolean;
  readonly nowMs?: () => number;
  readonly onCommitted?: ServerContext['onCommitted'];
  readonly onRevoked?: ServerContext['onRevoked'];
}

/** A context with a memory and a queue of its own: what one process has. */
export function makeServerContext(parts: ContextParts): ServerContext {
  return {
    nowMs: Date.now,
    onCommitted: () => undefined,
    onRevoked: () => undefined,
    ...parts,
    memory: makeCaseMemory(parts.database.feed),
    queue: makeCaseQueue(),
  };
}
