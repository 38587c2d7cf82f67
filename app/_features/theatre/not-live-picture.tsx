'use client';

import { useRef } from 'react';

import { useWallType } from '@/app/_features/theatre/use-wall-type';
import type { WallSettings } from '@/app/_features/theatre/wall-settings';
import { joinClasses } from '@/app/_ui/join-classes';
import { PriorityMark } from '@/app/_ui/priority-mark';
import { pastHeadline, staysLarge } from '@/lib/text/past-headline';
import { stateMark } from '@/lib/text/state-mark';
import type { TheatreLine } from '@/lib/text/theatre-line';
import { theatreWrap } from '@/lib/text/theatre-wrap';

interface NotLivePictureProps {
  readonly place: string;
  readonly procedure: string;
  /** Why, in a sentence. True also when it is read much later: it holds no running number. */
  readonly reason: string;
  /** Time of the last checked state as "10:44:07"; null before the first. */
  readonly lastLive: string | null;
  /** The states shown then, worst first; empty before the first. */
  readonly lines: readonly TheatreLine[];
  readonly settings: WallSettings;
}

/**
 * The wall when it is not live: hatched, in the past tense with its time. No clock: a picture that stands still must
 * not carry one. An alert that was open keeps its mark and its size.
 */
export function NotLivePicture({ place, procedure, reason, lastLive, lines, settings }: NotLivePictureProps) {
  const root = useRef<HTMLElement>(null);
  useWallType(root, settings, JSON.stringify([place, procedure, reason, lines]));
  return (
    <section ref={root} aria-label="Not live" className="wall wall-hatched">
      <header className="flex flex-wrap items-baseline gap-x-[0.8em] border-b border-rule bg-ground px-(--edge-room) py-[0.45em] text-(length:--needed) leading-[1.15]">
        <p className="text-(length:--state) font-bold">{place}</p>
        <p className="min-w-0 flex-1 basis-[8em] text-second">{procedure}</p>
      </header>
      <div className="flex flex-1 flex-col justify-center gap-[1em] px-(--edge-room) py-[0.8em] text-(length:--needed)">
        <div>
          <h1 className="text-(length:--headline) leading-[1.06] font-bold">Not live</h1>
          <p className="mt-[0.4em] leading-[1.25] text-pretty">{reason}</p>
        </div>
        <ul className="flex flex-col gap-[0.6em]">
          {lines.map((line) => (
            <li key={`${line.kind}-${line.nerveId ?? ''}-${line.headline}`} className={joinClasses('flex items-center gap-[0.5em]', staysLarge(line) ? 'text-(length:--headline) leading-[1.06] font-bold' : 'text-second')}>
              {line.priority === null ? null : <PriorityMark kind={stateMark(line)} className="size-[0.95em] shrink-0" />}
              <span className="min-w-0 text-balance wrap-anywhere">{theatreWrap(pastHeadline(line))}</span>
            </li>
          ))}
        </ul>
        <p className="leading-[1.25] text-second">{lastLive === null ? 'Nothing was shown yet' : `State at ${lastLive}. It may have changed.`}</p>
      </div>
    </section>
  );
}
