'use client';

import { useRef } from 'react';

import { LeadBand } from '@/app/_features/theatre/lead-band';
import { NerveLines } from '@/app/_features/theatre/nerve-lines';
import { OtherLines } from '@/app/_features/theatre/other-lines';
import { useWallType } from '@/app/_features/theatre/use-wall-type';
import { WallHeader } from '@/app/_features/theatre/wall-header';
import type { WallSettings } from '@/app/_features/theatre/wall-settings';
import type { NerveLineView } from '@/lib/chart/nerve-line';
import type { TheatreLine, TheatreView } from '@/lib/text/theatre-line';

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

/** The whole wall of one case: place, lead, other lines, nerves, facts. It never scrolls and has no control. */
export function TheatrePicture({ place, procedure, clock, isLive, deskWords, view, nerves, settings }: TheatrePictureProps) {
  const root = useRef<HTMLElement>(null);
  const sites = nerves.map((nerve) => nerve.sites.map((site) => [site.name, site.text]));
  const segments = nerves.map((nerve) => nerve.segments.map((segment) => segment.text));
  const type = useWallType(root, settings, JSON.stringify([place, procedure, deskWords, view, sites, segments]));
  return (
    <main ref={root} className="wall">
      <WallHeader place={place} procedure={procedure} clock={clock} isLive={isLive} />
      <div aria-live="assertive">
        <LeadBand line={view.lead} />
      </div>
      <OtherLines lines={deskWords === null ? view.others : [...view.others, deskLine(deskWords)]} />
      <NerveLines views={nerves} widthPx={type.roomPx} textPx={type.neededPx} hasAges={type.hasAges} emphasis={type.emphasis} />
      {view.footer.length === 0 || type.factCount === 0 ? null : (
        <footer className="border-t border-rule px-(--edge-room) py-[0.55em] text-(length:--needed) leading-[1.2] text-second">
          <ul className="flex flex-wrap gap-x-[1.4em] gap-y-[0.2em]">
            {view.footer.slice(0, type.factCount).map((fact) => (
              <li key={fact}>{fact}</li>
            ))}
          </ul>
        </footer>
      )}
    </main>
  );
}

/** The missing desk is about the link, not about the nerve; it stands last, outlined as low. */
function deskLine(words: string): TheatreLine {
  return { kind: 'watch', priority: 'low', isCalm: false, isFlashing: false, nerveId: null, headline: words, detail: '' };
}
