'use client';

import { CaseRecord } from '@/app/_features/record/case-record';
import { useRecord } from '@/app/_features/record/use-record';
import { NoticeBar } from '@/app/_ui/notice-bar';
import { Skeleton } from '@/app/_ui/skeleton';

/** The record of a case: what follows from its entries, and every entry as it was committed. */
export function RecordPage({ caseId }: { readonly caseId: string }) {
  const record = useRecord(caseId);
  switch (record.kind) {
    case 'failed':
      return <NoticeBar tone="strong">{record.message}</NoticeBar>;
    case 'fetching':
      return (
        <div className="mx-auto w-full max-w-7xl px-6 py-8">
          <p role="status" className="mb-4 text-second">
            {record.progress === null ? 'Fetching the record' : `${record.progress.count} of ${record.progress.total} entries are here`}
          </p>
          <Skeleton label="Fetching the record" rows={9} />
        </div>
      );
    case 'there':
      return <CaseRecord head={record.head} entries={record.entries} course={record.course} />;
  }
}
