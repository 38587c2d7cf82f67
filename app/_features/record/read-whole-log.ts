import { readEntries } from '@/app/_live/api';
import type { WireEntry } from '@/lib/contracts/http/replies';

const pageLength = 500;

/** How much of a log has come. */
export interface LogProgress {
  readonly count: number;
  readonly total: number;
}

/** Every entry of a case, oldest first, page by page; says after each page how much has come. */
export async function readWholeLog(caseId: string, onProgress: (progress: LogProgress) => void): Promise<readonly WireEntry[]> {
  const entries: WireEntry[] = [];
  for (;;) {
    const page = await readEntries(caseId, entries.at(-1)?.seq ?? 0, pageLength);
    entries.push(...page.entries);
    onProgress({ count: entries.length, total: page.headSeq });
    if (!page.hasMore || page.entries.length === 0) return entries;
  }
}
