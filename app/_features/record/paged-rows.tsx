'use client';

import { useState, type ReactNode } from 'react';

import { usePrintWhole } from '@/app/_features/record/use-print-whole';
import { Button } from '@/app/_ui/button';

const rowsPerPage = 150;

interface PagedRowsProps<Row> {
  readonly rows: readonly Row[];
  /** What the rows are called: "runs". */
  readonly noun: string;
  /** Starts again at the first page when it changes: the filter. */
  readonly filterKey: string;
  readonly children: (shown: readonly Row[]) => ReactNode;
}

/** A long list in pages, so that thousands of rows do not stop the browser. On paper all rows stand. */
export function PagedRows<Row>({ rows, noun, filterKey, children }: PagedRowsProps<Row>) {
  const isPrinting = usePrintWhole();
  const [place, setPlace] = useState({ filterKey, page: 0 });
  const pageCount = Math.max(1, Math.ceil(rows.length / rowsPerPage));
  const page = place.filterKey === filterKey ? Math.min(place.page, pageCount - 1) : 0;
  const from = page * rowsPerPage;
  const shown = isPrinting ? rows : rows.slice(from, from + rowsPerPage);
  const turn = (by: number) => setPlace({ filterKey, page: page + by });
  return (
    <>
      {children(shown)}
      {pageCount === 1 || isPrinting ? null : (
        <div className="mt-3 flex flex-wrap items-center gap-4 print:hidden">
          <Button disabled={page === 0} onClick={() => turn(-1)}>{`Earlier ${noun}`}</Button>
          <p role="status" className="text-second">{`${from + 1} to ${from + shown.length} of ${rows.length} ${noun}`}</p>
          <Button disabled={page === pageCount - 1} onClick={() => turn(1)}>{`Later ${noun}`}</Button>
        </div>
      )}
    </>
  );
}
