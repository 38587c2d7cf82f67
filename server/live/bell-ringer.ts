import type { Ring } from '@/db/bell';
import { ringBell } from '@/db/repositories/entries/ring-bell';
import type { ServerContext } from '@/server/server-context';

/** Tells other processes that logs have grown: coalesced, after the commit, and harmless when it is lost. */
export interface BellRinger {
  ring(caseId: string, seq: number): void;
}

/** While one bell is under way the next ones gather: one number per case, the highest. */
export function makeBellRinger({ database, log }: Pick<ServerContext, 'database' | 'log'>): BellRinger {
  let waiting = new Map<string, number>();
  let isRinging = false;

  async function ringAll(): Promise<void> {
    if (isRinging) return;
    isRinging = true;
    try {
      while (waiting.size > 0) {
        const rings: Ring[] = [...waiting].map(([caseId, seq]) => ({ caseId, seq }));
        waiting = new Map();
        await ringBell(database.app, rings);
      }
    } catch (cause) {
      log.warn({ err: cause }, 'The bell was not rung; other processes see the entries by their poll.');
    } finally {
      isRinging = false;
    }
  }

  return {
    ring(caseId, seq) {
      waiting.set(caseId, Math.max(waiting.get(caseId) ?? 0, seq));
      void ringAll();
    },
  };
}
