'use client';

import type { KeyboardEvent } from 'react';

import { focusHome } from '@/app/_ui/focus-home';
import { joinClasses } from '@/app/_ui/join-classes';
import { Kbd } from '@/app/_ui/kbd';
import type { Nerve } from '@/lib/alert/nerve-plan';

interface SiteGroupProps {
  readonly nerves: readonly Nerve[];
  readonly siteId: string;
  /** `isByKey`: a digit chose it, the hand goes on to the readings. */
  readonly onChoose: (siteId: string, isByKey: boolean) => void;
}

/** Where the nerve is stimulated. Only while it has the focus does a digit choose a site. */
export function SiteGroup({ nerves, siteId, onChoose }: SiteGroupProps) {
  const sites = nerves.flatMap((nerve) => nerve.sites);
  const handleKey = (event: KeyboardEvent) => {
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    const byDigit = /^\d$/.test(event.key) ? sites.find((site) => site.hotkey === event.key) : undefined;
    const step = { ArrowRight: 1, ArrowDown: 1, ArrowLeft: -1, ArrowUp: -1 }[event.key];
    if (byDigit !== undefined) {
      event.preventDefault();
      onChoose(byDigit.id, true);
    } else if (step !== undefined) {
      event.preventDefault();
      const index = sites.findIndex((site) => site.id === siteId);
      const next = sites[(index + step + sites.length) % sites.length];
      if (next !== undefined) onChoose(next.id, false);
    }
  };
  return (
    <div role="radiogroup" aria-label="Site" onKeyDown={handleKey} className="flex flex-wrap gap-x-5 gap-y-2">
      {nerves.map((nerve) => (
        <div key={nerve.id} className="flex min-w-0 flex-wrap items-center gap-x-3 gap-y-1">
          <p className="text-sm text-second">{nerve.name}</p>
          <div className="flex flex-wrap gap-1.5">
            {nerve.sites.map((site) => (
              <button
                key={site.id}
                type="button"
                role="radio"
                aria-checked={site.id === siteId}
                {...(site.id === siteId ? focusHome : {})}
                aria-keyshortcuts={site.hotkey ?? undefined}
                tabIndex={site.id === siteId ? 0 : -1}
                onClick={() => onChoose(site.id, false)}
                className={joinClasses(
                  'inline-flex min-h-9 items-center gap-2 rounded border px-2.5 pointer-coarse:min-h-11',
                  site.id === siteId ? 'border-2 border-stain bg-raised-more font-bold' : 'border-edge hover:bg-raised-more',
                )}
              >
                {site.name}
                {site.hotkey === null ? null : <span aria-hidden="true"><Kbd>{site.hotkey}</Kbd></span>}
              </button>
            ))}
          </div>
        </div>
      ))}
    </div>
  );
}
