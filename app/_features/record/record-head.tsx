'use client';

import { useEffect } from 'react';

import type { CaseCourse } from '@/lib/case/course/case-course';
import type { CaseHeadReply, WireEntry } from '@/lib/contracts/http/replies';

interface RecordHeadProps {
  readonly head: CaseHeadReply;
  readonly entries: readonly WireEntry[];
  readonly course: CaseCourse;
}

/** What the record is of, whether it is complete, and what it is not. The reference goes to the head of each printed page. */
export function RecordHead({ head, entries, course }: RecordHeadProps) {
  const { final, late, times } = course;
  const patient = [head.patientLabel, head.recordNumber].filter((text) => text !== null).join(', ');
  useEffect(() => {
    const { style } = document.documentElement;
    style.setProperty('--record-reference', JSON.stringify(`${head.reference}, ${final.plan.title}`));
    return () => void style.removeProperty('--record-reference');
  }, [head.reference, final.plan.title]);
  return (
    <header>
      {final.status === 'closed' ? null : (
        <p role="status" className="mb-4 border-2 border-ink px-4 py-2 font-bold">
          {final.status === 'planned' ? 'Not opened: this case has a plan and no record yet' : `Not closed: the record is still being written. It stands at entry ${final.seq}`}
        </p>
      )}
      <h1 className="text-3xl font-bold">{final.plan.title}</h1>
      <p className="mt-1 text-second">{`${head.hospitalName}, ${final.plan.theatre}, ${dayOf(times.openedAt ?? times.plannedAt, head.timeZone)}. ${final.status === 'closed' ? 'Closed' : 'Not closed'}. Reference ${head.reference}.${patient === '' ? '' : ` ${patient}.`}`}</p>
      <p className="mt-1 text-second">{`${entries.length} entries, ${final.runCount} runs${late.length === 0 ? '' : `, ${late.length} ${late.length === 1 ? 'entry' : 'entries'} received late`}. Times of ${head.timeZone}.`}</p>
      <p className="mt-1 text-sm text-second">An aid for qualified staff, not a certified medical device. Local protocols and licensed judgement come first.</p>
    </header>
  );
}

function dayOf(moment: string | null, timeZone: string): string {
  if (moment === null) return '';
  return new Intl.DateTimeFormat('en-GB', { timeZone, day: 'numeric', month: 'long', year: 'numeric' }).format(new Date(moment));
}
