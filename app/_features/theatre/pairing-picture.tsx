'use client';

import { useRef } from 'react';

import { useWallType } from '@/app/_features/theatre/use-wall-type';
import type { WallSettings } from '@/app/_features/theatre/wall-settings';
import { Mark } from '@/app/_ui/mark';

interface PairingPictureProps {
  /** Null while the server has not answered. */
  readonly pairing: { readonly code: string; readonly words: string } | null;
  /** What was before, when a case ended on this wall: "Case closed 11:58". */
  readonly ended: string | null;
  /** Why there is no code, in a sentence; null when there is nothing to say. */
  readonly problem: string | null;
  readonly settings: WallSettings;
}

/** A wall that belongs to no case: it says so, shows its code and the two words, and nothing that could look calm. */
export function PairingPicture({ pairing, ended, problem, settings }: PairingPictureProps) {
  const root = useRef<HTMLElement>(null);
  useWallType(root, settings, JSON.stringify([pairing, ended, problem]));
  return (
    <main ref={root} className="wall">
      <header className="flex items-center gap-[0.5em] border-b border-rule px-(--edge-room) py-[0.55em] text-(length:--needed) font-bold">
        <span className="[&>svg]:size-[1.25em]"><Mark sizePx={44} /></span>
        Fascicle
      </header>
      <div className="flex flex-1 flex-col justify-evenly gap-[0.8em] px-(--edge-room) py-[0.6em] text-(length:--needed) leading-[1.25]">
        <div>
          <h1 className="text-(length:--headline) leading-[1.06] font-bold">{ended ?? 'Not paired'}</h1>
          <p className="mt-[0.3em] text-second">{ended === null ? 'This screen shows no case' : 'Not monitored. This screen shows no case any more'}</p>
        </div>
        {pairing === null ? (
          <p className="text-second">{problem ?? 'Asking for a code'}</p>
        ) : (
          <dl className="flex flex-wrap items-end gap-x-[2.5em] gap-y-[0.6em]">
            <div>
              <dt className="text-second">Code</dt>
              <dd className="font-mono text-[calc(var(--headline)*1.5)] leading-none font-bold whitespace-nowrap">
                {pairing.code.slice(0, 3)}<span className="inline-block w-[0.35em]" />{pairing.code.slice(3)}
              </dd>
            </div>
            <div>
              <dt className="text-second">Words</dt>
              <dd className="text-(length:--headline) leading-[1.1] font-bold">{pairing.words}</dd>
            </div>
          </dl>
        )}
        <p className="text-balance">At the desk: pair a wall, type the code, and read the two words aloud. Both sides must show the same words.</p>
      </div>
      <footer className="border-t border-rule px-(--edge-room) py-[0.55em] text-(length:--needed) leading-[1.25] text-balance text-second">
        An aid for qualified staff, not a certified medical device. It states findings and gives no advice: local protocols
        and licensed judgement come first.
      </footer>
    </main>
  );
}
