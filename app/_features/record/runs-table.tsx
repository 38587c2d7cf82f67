import { LateWords } from '@/app/_features/record/late-words';
import type { RunLine } from '@/app/_features/record/run-lines';
import { joinClasses } from '@/app/_ui/join-classes';
import { Cell, HeadCell, Table } from '@/app/_ui/table';
import { clockTime } from '@/lib/text/format';

const versionNames = { run: '', original: 'original', correction: 'correction', withdrawal: 'withdrawal' } as const;

/** Runs line by line, oldest first: one line for each channel. */
export function RunsTable({ lines, timeZone }: { readonly lines: readonly RunLine[]; readonly timeZone: string }) {
  if (lines.length === 0) return <p className="py-6 text-second">No run of this kind</p>;
  return (
    <Table caption="Runs">
      <thead>
        <tr>
          <HeadCell isNumeric>No.</HeadCell>
          <HeadCell isNumeric>Time</HeadCell>
          <HeadCell>Site</HeadCell>
          <HeadCell>Current</HeadCell>
          <HeadCell>Channel</HeadCell>
          <HeadCell>Reading</HeadCell>
          <HeadCell isNumeric>% of baseline</HeadCell>
          <HeadCell isNumeric>Onset, change</HeadCell>
          <HeadCell>Remark</HeadCell>
        </tr>
      </thead>
      <tbody>{lines.map((line) => <Line key={line.key} line={line} timeZone={timeZone} />)}</tbody>
    </Table>
  );
}

function Line({ line, timeZone }: { readonly line: RunLine; readonly timeZone: string }) {
  const { isFirst, run, version } = line;
  return (
    <tr>
      <Cell isNumeric className="text-second">{isFirst ? version.seq : ''}</Cell>
      <Cell isNumeric>{isFirst ? clockTime(run.at, timeZone, { seconds: true }) : ''}</Cell>
      <Cell>
        {isFirst ? line.site : ''}
        {isFirst && line.versionName !== 'run' ? <span className="ml-2 text-sm font-semibold">{versionNames[line.versionName]}</span> : null}
        {isFirst && line.versionName !== 'correction' ? <LateWords lateMs={run.lateMs} /> : null}
      </Cell>
      <Cell className="whitespace-nowrap text-second">{isFirst ? line.current : ''}</Cell>
      <Cell>{line.channel}</Cell>
      <Cell className={joinClasses('whitespace-nowrap', line.versionName === 'original' && 'line-through')}>{line.reading}</Cell>
      <Cell isNumeric className={joinClasses(line.isPastLimit && 'font-bold')}>{line.percent}</Cell>
      <Cell isNumeric>{line.onset}</Cell>
      <Cell className="min-w-40 text-second">{line.remark}</Cell>
    </tr>
  );
}
