import { entriesAfter } from '@/db/repositories/entries/entries-after';
import { wallEntry } from '@/lib/contracts/channel/wall-entry';
import type { WireEntry } from '@/lib/contracts/http/replies';
import type { ChainHead } from '@/lib/record/entry';
import { toWireEntry } from '@/server/cases/to-wire-entry';
import { roomOf, type LiveServer } from '@/server/live/live-socket';
import { largestPage } from '@/server/queries/case-entries';
import type { ServerContext } from '@/server/server-context';

/** Sends committed entries to the viewers of their case: each once, in order, whoever wrote them. */
export interface Pump {
  /** Someone follows this case, having read up to this number; it counts only where nobody followed before. */
  watch(caseId: string, readSeq: number): void;
  /** Nobody here follows it any more. */
  unwatch(caseId: string): void;
  /** Entries this process has just committed, or met as a repeat. */
  publish(caseId: string, entries: readonly WireEntry[]): void;
  /** The log of a case has this head: read and send what was not sent yet. */
  reach(caseId: string, headSeq: number): Promise<void>;
}

type Context = Pick<ServerContext, 'database' | 'log'>;

/** One reader per case and process; viewers of one kind share one message. `onClosed` is told after the close was sent. */
export function makePump(context: Context, io: LiveServer, onClosed: (caseId: string) => void): Pump {
  const sent = new Map<string, number>();
  const reading = new Set<string>();

  function send(caseId: string, entries: readonly WireEntry[]): void {
    const last = entries.at(-1);
    if (last === undefined) return;
    sent.set(caseId, last.seq);
    io.to(roomOf(caseId, 'person')).emit('entries', { caseId, entries: [...entries] });
    io.to(roomOf(caseId, 'screen')).emit('entries', { caseId, entries: entries.map(wallEntry) });
    if (entries.some(({ kind }) => kind === 'case.closed')) onClosed(caseId);
  }

  async function reach(caseId: string, headSeq: ChainHead['seq']): Promise<void> {
    if (reading.has(caseId)) return;
    reading.add(caseId);
    try {
      for (let from = sent.get(caseId); from !== undefined && from < headSeq; from = sent.get(caseId)) {
        const page = await entriesAfter(context.database.feed, caseId, from, largestPage);
        // Someone may have published meanwhile: only what is new goes out.
        const after = sent.get(caseId);
        if (after === undefined || page.length === 0) return;
        send(caseId, page.filter(({ entry }) => entry.seq > after).map(toWireEntry));
      }
    } finally {
      reading.delete(caseId);
    }
  }

  return {
    watch(caseId, readSeq) {
      // Others who follow it may not have what the newcomer has just read: the newcomer drops what comes twice.
      if (!sent.has(caseId)) sent.set(caseId, readSeq);
    },
    unwatch: (caseId) => void sent.delete(caseId),
    publish(caseId, entries) {
      const after = sent.get(caseId);
      const [first, last] = [entries[0], entries.at(-1)];
      if (after === undefined || first === undefined || last === undefined || last.seq <= after) return;
      if (first.seq <= after + 1) return send(caseId, entries.filter(({ seq }) => seq > after));
      // Entries of another process stand between: the log is read, never guessed.
      reach(caseId, last.seq).catch((cause: unknown) => context.log.warn({ err: cause, caseId }, 'The log could not be read for viewers; the next poll tries again.'));
    },
    reach,
  };
}
