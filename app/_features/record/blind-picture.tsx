'use client';

import type { ReactNode } from 'react';

import { timeTicks } from '@/app/_features/record/time-ticks';
import { useDrawnWidth } from '@/app/_features/record/use-drawn-width';
import type { BlindInterval, BlindTimes } from '@/lib/case/course/blind-times';
import { clockTime } from '@/lib/text/format';
import { blindRows } from '@/lib/text/record-blind-words';
import { spanWords } from '@/lib/text/span-words';

interface BlindPictureProps {
  readonly blind: BlindTimes;
  /** Risk steps with their times. */
  readonly steps: readonly { readonly atMs: number; readonly label: string }[];
  readonly timeZone: string;
}

/** When nothing could be seen: one bar for each cause over the monitoring time, risk steps as uprights. */
export function BlindPicture({ blind, steps, timeZone }: BlindPictureProps) {
  const { ref, widthPx, remPx } = useDrawnWidth();
  const rows = blindRows(blind.whole, blind.monitoringMs);
  const [from, to] = [blind.monitored[0]?.fromMs ?? 0, blind.monitored.at(-1)?.toMs ?? 0];
  const ticks = timeTicks(from, Math.max(to, from + 1));
  const time = (atMs: number) => clockTime(new Date(atMs).toISOString(), timeZone, { seconds: ticks.hasSeconds });
  const label = `Blind time from ${time(from)} to ${time(to)}: ${rows.map((row) => `${row.name} ${spanWords(row.ms)}`).join(', ')}`;
  const rowPx = remPx * 2.75;
  const heightPx = rowPx * (rows.length + 1) + remPx * 1.5;
  const edge = remPx;
  const x = (atMs: number) => edge + ((atMs - from) / Math.max(1, to - from)) * ((widthPx ?? 0) - 2 * edge);
  return (
    <div ref={ref} className="mt-2">
      {widthPx === null ? null : (
        <svg role="img" aria-label={label} width={widthPx} height={heightPx} viewBox={`0 0 ${widthPx} ${heightPx}`} className="block max-w-full">
          {steps.filter(({ atMs }) => atMs >= from && atMs <= to).map(({ atMs, label: name }) => (
            <line key={`${name}-${atMs}`} x1={x(atMs)} x2={x(atMs)} y1={0} y2={heightPx - remPx * 1.5} stroke="var(--edge)" strokeDasharray="2 3" />
          ))}
          <Bar name="Monitored" sum={spanWords(blind.monitoringMs)} y={0} rowPx={rowPx} remPx={remPx} edge={edge} right={widthPx - edge}>
            {blind.monitored.map(({ fromMs, toMs }) => <rect key={fromMs} x={x(fromMs)} width={Math.max(1, x(toMs) - x(fromMs))} y={rowPx * 0.55} height={remPx * 0.75} fill="none" stroke="var(--ink)" />)}
          </Bar>
          {rows.map((row, index) => (
            <Bar key={row.cause} name={row.name} sum={spanWords(row.ms)} y={rowPx * (index + 1)} rowPx={rowPx} remPx={remPx} edge={edge} right={widthPx - edge}>
              <line x1={edge} x2={widthPx - edge} y1={rowPx * (index + 1.55) + remPx * 0.375} y2={rowPx * (index + 1.55) + remPx * 0.375} stroke="var(--rule)" />
              {blind.whole.intervals.filter((one) => one.cause === row.cause).map((one: BlindInterval) => (
                <rect key={one.fromMs} x={x(one.fromMs)} width={Math.max(1.5, x(one.toMs) - x(one.fromMs))} y={rowPx * (index + 1.55)} height={remPx * 0.75} fill="var(--ink)" />
              ))}
            </Bar>
          ))}
          {ticks.atMs.map((atMs) => (
            <text key={atMs} x={x(atMs)} y={heightPx - remPx * 0.3} textAnchor="middle" fontSize={remPx * 0.8125} className="font-mono" fill="var(--second)">{time(atMs)}</text>
          ))}
        </svg>
      )}
    </div>
  );
}

interface BarProps {
  readonly name: string;
  readonly sum: string;
  readonly y: number;
  readonly rowPx: number;
  readonly remPx: number;
  readonly edge: number;
  readonly right: number;
  readonly children: ReactNode;
}

function Bar({ name, sum, y, rowPx, remPx, edge, right, children }: BarProps) {
  return (
    <g>
      <text x={edge} y={y + rowPx * 0.4} fontSize={remPx * 0.875} fill="var(--ink)">
        {name}
      </text>
      <text x={right} y={y + rowPx * 0.4} textAnchor="end" fontSize={remPx * 0.875} className="font-mono" fill="var(--second)">{sum}</text>
      {children}
    </g>
  );
}
