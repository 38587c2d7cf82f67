import { entriesAfter } from '@/db/repositories/entries/entries-after';
import { headOf } from '@/db/repositories/entries/head-of';
import { apiLimits } from '@/lib/contracts/http/api-limits';
import type { EntriesReply, WireEntry } from '@/lib/contracts/http/replies';
import { wallEntry } from '@/lib/contracts/channel/wall-entry';
import { EMPTY_HEAD } from '@/lib/record/entry';
import { toWireEntry } from '@/server/cases/to-wire-entry';
import { openCase, type Visitor } from '@/server/queries/open-case';
import type { ServerContext } from '@/server/server-context';

/** Largest page of a log, in entries. */
export const largestPage = apiLimits.pageEntries;

/** Which page of which log. */
export interface PageAsked {
  readonly caseId: string;
  readonly after: number;
  readonly limit: number;
}

/** A page of a case's log for a visitor whom the policy lets in. */
export async function caseEntries(context: ServerContext, visitor: Visitor, asked: PageAsked): Promise<EntriesReply> {
  await openCase(context, visitor, { caseId: asked.caseId, action: 'see-case', what: 'entries' });
  return readPage(context, visitor, asked);
}

/** The page itself, cut to what this kind of visitor may read. Only for a case that was opened to the visitor. */
export async function readPage(context: Pick<ServerContext, 'database'>, visitor: Visitor, asked: PageAsked): Promise<EntriesReply> {
  const { feed } = context.database;
  const head = (await headOf(feed, asked.caseId)) ?? EMPTY_HEAD;
  const limit = Math.min(asked.limit, largestPage);
  const page = await entriesAfter(feed, asked.caseId, asked.after, limit);
  const entries = page.map(toWireEntry).map(forVisitor(visitor));
  const last = entries.at(-1);
  if (last === undefined || last.seq <= head.seq) {
    return { entries, headSeq: head.seq, headHash: head.hash, hasMore: last !== undefined && last.seq < head.seq };
  }
  // The log grew between the two reads.
  return { entries, headSeq: last.seq, headHash: last.hash, hasMore: page.length === limit };
}

/** A wall reads numbers, hashes and what the allow-list holds; a person reads all. */
function forVisitor(visitor: Visitor): (entry: WireEntry) => WireEntry {
  return visitor.kind === 'screen' ? wallEntry : (entry) => entry;
}
