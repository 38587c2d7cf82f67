import Link from 'next/link';

import { Cell } from '@/app/_ui/table';
import type { CaseLine } from '@/lib/contracts/http/replies';
import { clockTime, durationWords } from '@/lib/text/format';

const stateNames = { planned: 'Planned', open: 'Open', closed: 'Closed' } as const;
const link = 'inline-flex min-h-9 items-center font-semibold text-stain underline underline-offset-4';

interface CaseRowProps {
  readonly row: CaseLine;
  readonly nowMs: number;
  readonly isHospitalShown: boolean;
}

/** One case of the list. */
export function CaseRow({ row, nowMs, isHospitalShown }: CaseRowProps) {
  const ageMs = nowMs - Date.parse(row.lastEntryAt);
  const home = row.status === 'closed' ? `/cases/${row.caseId}/record` : `/cases/${row.caseId}/log`;
  return (
    <tr>
      <Cell>
        <Link href={home} prefetch={false} className="inline-flex min-h-9 items-center font-bold hover:underline">{row.title}</Link>
      </Cell>
      <Cell>{row.side === 'left' ? 'Left' : 'Right'}</Cell>
      <Cell>{row.theatre}</Cell>
      {isHospitalShown ? <Cell>{row.hospitalName}</Cell> : null}
      <Cell className={row.status === 'open' ? 'font-bold' : 'text-second'}>{stateNames[row.status]}</Cell>
      <Cell isNumeric>{lastEntryTime(row, ageMs)}</Cell>
      <Cell isNumeric className="text-second">{ageWords(ageMs)}</Cell>
      <Cell className="font-mono whitespace-nowrap text-second">{row.reference}</Cell>
      <Cell>
        <span className="flex justify-end gap-5">
          <Link href={`/cases/${row.caseId}/log`} prefetch={false} className={link} aria-label={`Log of ${row.title}, ${row.reference}`}>Log</Link>
          <Link href={`/cases/${row.caseId}/record`} prefetch={false} className={link} aria-label={`Record of ${row.title}, ${row.reference}`}>Record</Link>
        </span>
      </Cell>
    </tr>
  );
}

function lastEntryTime(row: CaseLine, ageMs: number): string {
  const time = clockTime(row.lastEntryAt, row.timeZone);
  if (ageMs < 12 * 3_600_000) return time;
  const day = new Intl.DateTimeFormat('en-GB', { timeZone: row.timeZone, day: 'numeric', month: 'short' }).format(new Date(row.lastEntryAt));
  return `${day.replace(' ', '\u00a0')}, ${time}`;
}

function ageWords(ageMs: number): string {
  return ageMs < 48 * 3_600_000 ? durationWords(ageMs) : `${Math.floor(ageMs / 86_400_000)}\u00a0days`;
}
