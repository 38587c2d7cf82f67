'use client';

import { useRef } from 'react';

import { LeadBand } from '@/app/_features/theatre/lead-band';
import { NerveLines } from '@/app/_features/theatre/nerve-lines';
import { OtherLines } from '@/app/_features/theatre/other-lines';
import { useWallType } from '@/app/_features/theatre/use-wall-type';
import { WallHeader } from '@/app/_features/theatre/wall-header';
import type { WallSettings } from '@/app/_features/theatre/wall-settings';
import type { NerveLineView } from '@/lib/chart/nerve-line';
import type { TheatreView } from '@/lib/text/theatre-line';

export interface TheatrePictureProps {
  readonly place: string;
  readonly procedure: string;
  readonly clock: string;
  readonly isLive: boolean;
  readonly view: TheatreView;
  readonly nerves: readonly NerveLineView[];
  readonly settings: WallSettings;
}

/** The whole wall of one case: place, lead, other lines, nerves, facts. It never scrolls and has no control. */
export function TheatrePicture({ place, procedure, clock, isLive, view, nerves, settings }: TheatrePictureProps) {
  const root = useRef<HTMLDivElement>(null);
  const contents = JSON.stringify([place, procedure, view, nerves]);
  const type = useWallType(root, settings, contents);
  return (
    <div ref={root} className="wall">
      <WallHeader place={place} procedure={procedure} clock={clock} isLive={isLive} />
      <LeadBand line={view.lead} />
      <OtherLines lines={view.others} />
      <div className="grid min-h-0 flex-1 px-(--edge-room) py-[0.5em] text-(length:--needed)">
        <NerveLines views={nerves} textPx={type.neededPx} hasAges={type.hasAges} emphasis={type.emphasis} />
      </div>
      {view.footer.length === 0 ? null : (
        <footer className="border-t border-rule px-(--edge-room) py-[0.55em] text-(length:--needed) leading-[1.2] text-second">
          <ul className="flex flex-wrap gap-x-[1.4em] gap-y-[0.2em]">
            {view.footer.map((fact) => (
              <li key={fact}>{fact}</li>
            ))}
          </ul>
        </footer>
      )}
    </div>
  );
}
