import { LateWords } from '@/app/_features/record/late-words';
import type { RecordRow } from '@/app/_features/record/record-rows';
import { Badge } from '@/app/_ui/badge';
import { joinClasses } from '@/app/_ui/join-classes';
import { Cell, HeadCell, Table } from '@/app/_ui/table';
import { lateMsOf } from '@/lib/case/course/late-after-ms';
import { clockTime } from '@/lib/text/format';

const shownHashCharacters = 10;

/** The entries, oldest first: number, time, what, by whom, and the head of the hash. */
export function EntriesTable({ rows, timeZone }: { readonly rows: readonly RecordRow[]; readonly timeZone: string }) {
  if (rows.length === 0) return <p className="py-6 text-second">No entry of this kind with these words</p>;
  return (
    <Table caption="Entries of the record">
      <thead>
        <tr>
          <HeadCell isNumeric>No.</HeadCell>
          <HeadCell>Time</HeadCell>
          <HeadCell>Entry</HeadCell>
          <HeadCell>By</HeadCell>
          <HeadCell>Hash</HeadCell>
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <tr key={row.seq} id={`entry-${row.seq}`}>
            <Cell isNumeric className="text-second">{row.seq}</Cell>
            <Cell className="font-mono whitespace-nowrap">{clockTime(row.eventAt, timeZone, { seconds: true })}</Cell>
            <Cell>
              {row.mark === null ? null : <span className="mr-2 inline-block align-baseline"><Badge priority={row.mark === 'alert' ? 'high' : 'medium'}>{row.mark === 'alert' ? 'Alert' : 'Notice'}</Badge></span>}
              <span className={joinClasses(row.correctedBy !== null && 'text-second line-through')}>{row.sentence}</span>
              {row.correctedBy === null ? null : <a href={`#entry-${row.correctedBy}`} className="ml-2 font-semibold text-stain underline underline-offset-4">{`corrected by entry ${row.correctedBy}`}</a>}
              <LateWords lateMs={lateMsOf(row)} />
            </Cell>
            <Cell className="whitespace-nowrap text-second">{row.author}</Cell>
            <Cell className="font-mono whitespace-nowrap text-second" title={row.hash}>{row.hash.slice(0, shownHashCharacters)}</Cell>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
