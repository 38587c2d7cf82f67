'use client';

import { timelineLayout, type TimelinePlace } from '@/app/_features/record/timeline-layout';
import { useDrawnWidth } from '@/app/_features/record/use-drawn-width';
import type { AlertMoment } from '@/lib/text/alert-moments';
import { clockTime } from '@/lib/text/format';
import { secondsWords } from '@/lib/text/span-words';

interface AlertTimelineProps {
  readonly moments: readonly AlertMoment[];
  readonly timeZone: string;
}

/** A moment with its words. */
interface Mark {
  readonly place: TimelinePlace;
  readonly lines: readonly string[];
  readonly time: string;
  readonly since: string;
  readonly isRaise: boolean;
}

/** The course of an alert on a true time axis: first bad, raised, painted, told, read back, action, tested again, end. */
export function AlertTimeline({ moments, timeZone }: AlertTimelineProps) {
  const { ref, widthPx, remPx } = useDrawnWidth();
  const atMs = moments.map((moment) => Date.parse(moment.at));
  const first = atMs[0] ?? 0;
  const time = (at: string) => clockTime(at, timeZone, { seconds: true });
  const label = moments.map((moment) => `${moment.names.join(', ')} ${time(moment.at)}`).join('; ');
  const layout = widthPx === null ? null : timelineLayout(atMs, widthPx, remPx);
  const marks = moments.map((moment, index): Mark => ({
    place: layout?.places[index] ?? { tickPx: 0, labelPx: 0 },
    lines: layout?.isUpright === true ? moment.names : moment.names.flatMap(inTwoLines),
    time: time(moment.at),
    since: index === 0 ? '' : `+${secondsWords((atMs[index] ?? first) - first)}`,
    isRaise: moment.isRaise,
  }));
  return (
    <div ref={ref} className="mt-4">
      {layout === null || widthPx === null ? null : layout.isUpright ? (
        <Upright marks={marks} widthPx={widthPx} heightPx={layout.lengthPx} remPx={remPx} label={label} />
      ) : (
        <Lying marks={marks} widthPx={widthPx} remPx={remPx} label={label} />
      )}
    </div>
  );
}

/** A long name in two lines, where columns are narrow. */
function inTwoLines(name: string): readonly string[] {
  const cut = name.indexOf(' ');
  return name.length > 12 && cut > 0 ? [name.slice(0, cut), name.slice(cut + 1)] : [name];
}

interface DrawingProps {
  readonly marks: readonly Mark[];
  readonly widthPx: number;
  readonly remPx: number;
  readonly label: string;
}

function Lying({ marks, widthPx, remPx, label }: DrawingProps) {
  const lines = Math.max(...marks.map((mark) => mark.lines.length));
  const line = remPx * 1.15;
  const heightPx = remPx * 3.4 + line * (lines + 1.3);
  const axis = remPx;
  return (
    <svg role="img" aria-label={label} width={widthPx} height={heightPx} viewBox={`0 0 ${widthPx} ${heightPx}`} className="block max-w-full">
      <line x1={marks[0]?.place.tickPx} x2={marks.at(-1)?.place.tickPx} y1={axis} y2={axis} stroke="var(--ink)" strokeWidth={1.5} />
      {marks.map(({ place, lines: names, time, since, isRaise }) => (
        <g key={time}>
          <polyline points={`${place.tickPx},${axis} ${place.tickPx},${axis + remPx * 0.5} ${place.labelPx},${remPx * 2.6}`} fill="none" stroke="var(--edge)" />
          <MomentMark x={place.tickPx} y={axis} isRaise={isRaise} />
          <text x={place.labelPx} y={remPx * 3.5} textAnchor="middle" fontSize={remPx * 0.8125} className="font-mono" fill="var(--ink)">{time}</text>
          {names.map((name, index) => (
            <text key={`${index}-${name}`} x={place.labelPx} y={remPx * 3.5 + line * (index + 1)} textAnchor="middle" fontSize={remPx * 0.8125} fontWeight={isRaise ? 700 : 400} fill="var(--ink)">{name}</text>
          ))}
          <text x={place.labelPx} y={remPx * 3.5 + line * (names.length + 1)} textAnchor="middle" fontSize={remPx * 0.8125} className="font-mono" fill="var(--second)">{since}</text>
        </g>
      ))}
    </svg>
  );
}

function Upright({ marks, widthPx, heightPx, remPx, label }: DrawingProps & { readonly heightPx: number }) {
  const axis = remPx;
  return (
    <svg role="img" aria-label={label} width={widthPx} height={heightPx} viewBox={`0 0 ${widthPx} ${heightPx}`} className="block max-w-full">
      <line y1={marks[0]?.place.tickPx} y2={marks.at(-1)?.place.tickPx} x1={axis} x2={axis} stroke="var(--ink)" strokeWidth={1.5} />
      {marks.map(({ place, lines, time, since, isRaise }) => (
        <g key={time}>
          <polyline points={`${axis},${place.tickPx} ${axis + remPx * 0.5},${place.tickPx} ${remPx * 2.4},${place.labelPx}`} fill="none" stroke="var(--edge)" />
          <MomentMark x={axis} y={place.tickPx} isRaise={isRaise} />
          <text x={remPx * 2.7} y={place.labelPx - remPx * 0.1} fontSize={remPx * 0.8125} fill="var(--ink)">
            <tspan className="font-mono">{time}</tspan>
            <tspan className="font-mono" dx={remPx * 0.6} fill="var(--second)">{since}</tspan>
          </text>
          <text x={remPx * 2.7} y={place.labelPx + remPx * 0.85} fontSize={remPx * 0.8125} fontWeight={isRaise ? 700 : 400} fill="var(--ink)">{lines.join(', ')}</text>
        </g>
      ))}
    </svg>
  );
}

function MomentMark({ x, y, isRaise }: { readonly x: number; readonly y: number; readonly isRaise: boolean }) {
  if (isRaise) return <path d={`M${x} ${y - 8}l8 14h-16Z`} fill="var(--high)" />;
  return <circle cx={x} cy={y} r={4} fill="var(--ground)" stroke="var(--ink)" strokeWidth={1.75} />;
}
