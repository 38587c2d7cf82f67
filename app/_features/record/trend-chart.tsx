'use client';

import { CartesianGrid, Line, LineChart, ReferenceLine, XAxis, YAxis } from 'recharts';

import { useElementWidth } from '@/app/_ui/use-element-width';
import { TrendKey, trendDash, TrendMark } from '@/app/_features/record/trend-marks';
import type { NerveTrend, TrendStep } from '@/app/_features/record/trend-points';
import { timeTicks } from '@/app/_features/record/time-ticks';
import { clockTime } from '@/lib/text/format';

interface TrendChartProps {
  readonly trend: NerveTrend;
  readonly steps: readonly TrendStep[];
  readonly limitPercent: number;
  readonly timeZone: string;
}

const heightRem = 16.25;
const leastTopPercent = 120;

/** One nerve over time: a line for each required path, the limit dotted, alerts as triangles, risk steps as uprights. */
export function TrendChart({ trend, steps, limitPercent, timeZone }: TrendChartProps) {
  const { ref, widthPx, remPx } = useElementWidth();
  const percents = trend.lines.flatMap((line) => line.points.map((point) => point.percent));
  const times = trend.lines.flatMap((line) => line.points.map((point) => point.atMs));
  const from = Math.min(...times);
  const to = Math.max(...times, from + 60_000);
  const top = Math.max(leastTopPercent, Math.ceil(Math.max(...percents) / 20) * 20);
  const ticks = timeTicks(from, to);
  const time = (atMs: number) => clockTime(new Date(atMs).toISOString(), timeZone, { seconds: ticks.hasSeconds });
  const low = Math.min(...percents);
  const label = `${trend.nerveName}: ${percents.length} compared runs from ${time(from)} to ${time(to)}, lowest ${Math.round(low)} % of baseline`;
  return (
    <figure className="mt-3">
      <figcaption className="flex flex-wrap items-baseline gap-x-6 gap-y-1">
        <span className="font-semibold">{trend.nerveName}</span>
        <TrendKey names={trend.lines.map((line) => line.name)} />
      </figcaption>
      <div ref={ref} role="img" aria-label={label} className="h-65">
        {widthPx === null ? null : (
          <LineChart width={widthPx} height={heightRem * remPx} margin={{ top: 1.5 * remPx, right: 1.25 * remPx, bottom: 0.25 * remPx, left: 0 }} accessibilityLayer={false}>
            <CartesianGrid vertical={false} stroke="var(--rule)" />
            <XAxis type="number" dataKey="atMs" domain={[from, to]} scale="time" ticks={[...ticks.atMs]} interval={0} tickFormatter={time} stroke="var(--edge)" tick={{ fill: 'var(--second)', fontSize: 0.8125 * remPx }} allowDuplicatedCategory={false} />
            <YAxis type="number" domain={[0, top]} ticks={[0, 50, 100]} width={3 * remPx} stroke="var(--edge)" tick={{ fill: 'var(--second)', fontSize: 0.8125 * remPx }} />
            <ReferenceLine y={limitPercent} stroke="var(--second)" strokeDasharray="2 5" label={{ value: `limit ${limitPercent} %, custom`, position: 'insideBottomRight', fill: 'var(--second)', fontSize: 0.75 * remPx }} />
            {steps.filter((step) => step.atMs >= from && step.atMs <= to).map((step) => (
              <ReferenceLine key={step.atMs} x={step.atMs} stroke="var(--edge)" label={{ value: step.label, position: 'top', fill: 'var(--second)', fontSize: 0.75 * remPx }} />
            ))}
            {trend.lines.map((line, index) => (
              <Line
                key={line.pathId}
                data={[...line.points]}
                dataKey="percent"
                name={line.name}
                stroke="var(--ink)"
                strokeWidth={1.75}
                {...trendDash(index)}
                isAnimationActive={false}
                dot={(dot: { readonly cx?: number; readonly cy?: number; readonly index?: number; readonly payload?: { readonly isAlert?: boolean } }) => (
                  <TrendMark key={`${line.pathId}-${dot.index ?? 0}`} x={dot.cx ?? 0} y={dot.cy ?? 0} lineIndex={index} isAlert={dot.payload?.isAlert === true} />
                )}
              />
            ))}
          </LineChart>
        )}
      </div>
    </figure>
  );
}
