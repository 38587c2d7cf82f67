import type { Logger } from 'pino';

import type { Database } from '@/db/connection';
import type { CaseMemory } from '@/server/cases/case-memory';
import type { CaseQueue } from '@/server/cases/case-queue';
import type { WireEntry } from '@/lib/contracts/http/replies';

/** What the composition root hands to commands, queries and the live channel. */
export interface ServerContext {
  readonly database: Database;
  readonly log: Logger;
  readonly nowMs: () => number;
  readonly publicUrl: string;
  readonly secret: string;
  readonly isDemo: boolean;
  readonly memory: CaseMemory;
  readonly queue: CaseQueue;
  /** Told after the commit, in the order of the log of each case. */
  readonly onCommitted: (caseId: string, entries: readonly WireEntry[]) => void;
  /** Told when a session or a wall lost its right, so that its sockets close at once. */
  readonly onRevoked: (of: { readonly sessionId: string } | { readonly screenId: string }, reason: 'revoked' | 'signed-out') => void;
}
