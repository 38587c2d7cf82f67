'use client';

import { useRef } from 'react';

import { LeadBand } from '@/app/_features/theatre/lead-band';
import { NerveLines } from '@/app/_features/theatre/nerve-lines';
import { OtherLines } from '@/app/_features/theatre/other-lines';
import { useWallType } from '@/app/_features/theatre/use-wall-type';
import { WallHeader } from '@/app/_features/theatre/wall-header';
import type { WallSettings } from '@/app/_features/theatre/wall-settings';
import { PriorityMark } from '@/app/_ui/priority-mark';
import type { NerveLineView } from '@/lib/chart/nerve-line';
import type { TheatreView } from '@/lib/text/theatre-line';
import { theatreWrap } from '@/lib/text/theatre-wrap';

export interface TheatrePictureProps {
  readonly place: string;
  readonly procedure: string;
  readonly clock: string;
  readonly isLive: boolean;
  /** "Desk not connected since 10:40"; null while it is connected. */
  readonly deskWords: string | null;
  readonly view: TheatreView;
  readonly nerves: readonly NerveLineView[];
  readonly settings: WallSettings;
}

/**
 * The whole wall of one case: place, lead, other lines, nerves, the missing desk, facts. It never scrolls and has no
 * control. The desk is about the link, not about the nerve: it stands last and never makes an alert smaller.
 */
export function TheatrePicture({ place, procedure, clock, isLive, deskWords, view, nerves, settings }: TheatrePictureProps) {
  const root = useRef<HTMLElement>(null);
  const link = useRef<HTMLParagraphElement>(null);
  const sites = nerves.map((nerve) => nerve.sites.map((site) => [site.name, site.text]));
  const segments = nerves.map((nerve) => nerve.segments.map((segment) => segment.text));
  const type = useWallType(root, settings, JSON.stringify([place, procedure, deskWords, view, sites, segments]), link);
  return (
    <main ref={root} className="wall">
      <WallHeader place={place} procedure={procedure} clock={clock} isLive={isLive} />
      <div aria-live="assertive" className={nerves.length === 0 ? 'flex flex-1 flex-col justify-center' : undefined}>
        <LeadBand line={view.lead} />
      </div>
      <OtherLines lines={view.others} />
      {nerves.length === 0 ? null : <NerveLines views={nerves} widthPx={type.roomPx} textPx={type.neededPx} hasAges={type.hasAges} emphasis={type.emphasis} />}
      {deskWords === null ? null : (
        <p ref={link} className="flex border-t border-rule px-(--edge-room) py-[0.45em] text-(length:--needed) leading-[1.2]">
          <strong className="inline-flex items-center gap-[0.4em] border-[0.08em] border-low px-[0.4em] text-low">
            <PriorityMark kind="low" className="size-[0.8em] shrink-0" />
            {theatreWrap(deskWords)}
          </strong>
        </p>
      )}
      {view.footer.length === 0 || type.factCount === 0 ? null : (
        <footer className="border-t border-rule px-(--edge-room) py-[0.55em] text-(length:--needed) leading-[1.2] text-second">
          <ul className="flex flex-wrap gap-x-[1.4em] gap-y-[0.2em]">
            {view.footer.slice(0, type.factCount).map((fact) => (
              <li key={fact}>{theatreWrap(fact)}</li>
            ))}
          </ul>
        </footer>
      )}
    </main>
  );
}
