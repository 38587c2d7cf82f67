import { readEntries } from '@/app/_live/api';
import type { WireEntry } from '@/lib/contracts/http/replies';

const pageLength = 500;

/** Every entry of a case, oldest first, page by page. */
export async function readWholeLog(caseId: string): Promise<readonly WireEntry[]> {
  const entries: WireEntry[] = [];
  for (;;) {
    const page = await readEntries(caseId, entries.at(-1)?.seq ?? 0, pageLength);
    entries.push(...page.entries);
    if (!page.hasMore || page.entries.length === 0) return entries;
  }
}
