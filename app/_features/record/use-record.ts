import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';

import { readWholeLog, type LogProgress } from '@/app/_features/record/read-whole-log';
import { readCaseHead } from '@/app/_live/api';
import { caseCourse, type CaseCourse } from '@/lib/case/course/case-course';
import type { CaseHeadReply, WireEntry } from '@/lib/contracts/http/replies';

/** A record that is there, or how far it has come, or why it does not come. */
export type RecordFetch =
  | { readonly kind: 'fetching'; readonly progress: LogProgress | null }
  | { readonly kind: 'failed'; readonly message: string }
  | { readonly kind: 'there'; readonly head: CaseHeadReply; readonly entries: readonly WireEntry[]; readonly course: CaseCourse };

/** The head of a case, its whole log, and what follows from it: computed once, after the page has said that it is. */
export function useRecord(caseId: string): RecordFetch {
  const [progress, setProgress] = useState<LogProgress | null>(null);
  const head = useQuery({ queryKey: ['case-head', caseId], queryFn: () => readCaseHead(caseId) });
  const log = useQuery({
    queryKey: ['whole-log', caseId],
    queryFn: async () => {
      const entries = await readWholeLog(caseId, setProgress);
      await painted();
      return { entries, course: caseCourse(entries) };
    },
    staleTime: 30_000,
  });
  const failure = head.error ?? log.error;
  if (failure !== null) return { kind: 'failed', message: failure.message };
  if (head.data === undefined || log.data === undefined) return { kind: 'fetching', progress };
  return { kind: 'there', head: head.data, ...log.data };
}

/** Until the browser has drawn what it was told last. */
function painted(): Promise<void> {
  return new Promise((resolve) => setTimeout(resolve));
}
