'use client';

import { memo, useMemo } from 'react';

import { useLogCase } from '@/app/_features/log/log-context';
import type { LogRow, RunRow } from '@/app/_features/log/log-row-model';
import { logRows } from '@/app/_features/log/log-rows';
import { Toned } from '@/app/_features/log/toned';
import { joinClasses } from '@/app/_ui/join-classes';
import { Cell, HeadCell } from '@/app/_ui/table';
import { upcast } from '@/lib/case/upcast';
import { clockTime } from '@/lib/text/format';

const mostRows = 300;

/** The log, newest first; the last 300 lines here, all of them in the record. */
export function LogTable() {
  const { caseId, entries, waitingEntries, state, timeZone } = useLogCase();
  const known = useMemo(() => entries.map(upcast).filter((entry) => entry !== null), [entries]);
  const committedSeq = known.at(-1)?.seq ?? 0;
  const rows = useMemo(() => logRows([...known, ...waitingEntries], state.plan, timeZone, committedSeq), [known, waitingEntries, state.plan, timeZone, committedSeq]);
  return (
    <div role="region" aria-label="Log" tabIndex={0} className="min-h-60 flex-1 overflow-auto outline-offset-[-2px]">
      <table className="w-full border-collapse text-left">
        <caption className="sr-only">Log, newest first</caption>
        <thead className="sticky top-0 bg-ground">
          <tr>
            <HeadCell className="pl-5">Time</HeadCell>
            <HeadCell>Site</HeadCell>
            <HeadCell>Recorded at</HeadCell>
            <HeadCell isNumeric>mA</HeadCell>
            <HeadCell isNumeric>Onset ms</HeadCell>
            <HeadCell isNumeric>Change</HeadCell>
            <HeadCell isNumeric>Amplitude mV</HeadCell>
            <HeadCell isNumeric>% of baseline</HeadCell>
            <HeadCell isNumeric>m/s</HeadCell>
            <HeadCell className="pr-5">Note</HeadCell>
          </tr>
        </thead>
        <tbody>
          {rows.slice(0, mostRows).map((row) => <LogLine key={row.key} row={row} timeZone={timeZone} />)}
        </tbody>
      </table>
      {rows.length === 0 ? <p className="px-5 py-4 text-second">The first entry stands here once it is logged</p> : null}
      {rows.length > mostRows ? (
        <p className="px-5 py-3 text-second">{'Older lines are in the '}<a href={`/cases/${caseId}/record`} className="text-stain underline underline-offset-4">record</a></p>
      ) : null}
    </div>
  );
}

const LogLine = memo(function LogLine({ row, timeZone }: { readonly row: LogRow; readonly timeZone: string }) {
  const time = clockTime(row.at, timeZone, { seconds: true });
  if (row.kind === 'run') return <RunLine row={row} time={time} />;
  return (
    <tr className="slides-in bg-raised">
      <Cell className="pl-5 font-mono whitespace-nowrap text-second">{time}</Cell>
      <Cell colSpan={9} className="pr-5">{row.isWaiting ? `${row.text} (waiting)` : row.text}</Cell>
    </tr>
  );
});

function RunLine({ row, time }: { readonly row: RunRow; readonly time: string }) {
  const struck = row.isCorrected ? 'text-second line-through' : '';
  const note = [row.isWaiting && row.isFirst ? 'waiting' : '', row.note].filter((part) => part !== '').join(', ');
  return (
    <tr className="slides-in">
      <Cell className="pl-5 font-mono whitespace-nowrap text-second">{row.isFirst ? time : ''}</Cell>
      <Cell className={joinClasses('whitespace-nowrap', struck)}>{row.isFirst ? row.siteName : <span className="sr-only">{row.siteName}</span>}</Cell>
      <Cell className={struck}>{row.channelName}</Cell>
      <Cell isNumeric className={struck}>{row.intensity}</Cell>
      <Cell isNumeric className={struck}>{row.onset}</Cell>
      <Cell isNumeric className={struck}><Toned tone={row.changeTone}>{row.change}</Toned></Cell>
      <Cell isNumeric className={struck}>{row.amplitude}</Cell>
      <Cell isNumeric className={struck}><Toned tone={row.percentTone}>{row.percent}</Toned></Cell>
      <Cell isNumeric className={struck}><Toned tone={row.velocityTone}>{row.velocity}</Toned></Cell>
      <Cell className="pr-5 text-sm">{note}</Cell>
    </tr>
  );
}
