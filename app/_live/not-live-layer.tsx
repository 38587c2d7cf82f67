'use client';

import { useEffect, useRef, type ReactNode } from 'react';

import { checkThatCounts, useLiveStore } from '@/app/_live/live-store';
import { liveForMs } from '@/app/_live/pulse-reader';
import { useIsLive } from '@/app/_live/use-is-live';
import { serverNowMs } from '@/app/_live/use-now';

/** Full until 99.5 %, so that nothing shows through before its time; no delay: a waiting animation is not on the compositor. */
const keyframes: Keyframe[] = [
  { opacity: 0, offset: 0 },
  { opacity: 0, offset: 0.995 },
  { opacity: 1, offset: 1 },
];

/**
 * What covers a picture that is not live. Always in the page and visible at first; each check of the database that this
 * case's feed holds restarts a 3 s compositor animation at the age of that check. A blocked page cannot hold it back.
 */
export function NotLiveLayer({ caseId, className, children }: { readonly caseId: string; readonly className?: string; readonly children: ReactNode }) {
  const layer = useRef<HTMLDivElement>(null);
  const isLive = useIsLive(caseId);
  useEffect(() => {
    const animation = layer.current?.animate(keyframes, { duration: liveForMs, fill: 'both' });
    if (animation === undefined) return;
    const restart = (checkedAt: string | null) => {
      animation.currentTime = checkedAt === null ? liveForMs : layerTimeMs(checkedAt);
      animation.play();
      // Playing from the very end would start over, as if a check had come.
      if (checkedAt === null || layerTimeMs(checkedAt) >= liveForMs) animation.finish();
    };
    let held = checkThatCounts(useLiveStore.getState().feeds[caseId]);
    restart(held);
    const unsubscribe = useLiveStore.subscribe((store) => {
      const checkedAt = checkThatCounts(store.feeds[caseId]);
      if (checkedAt === held) return;
      held = checkedAt;
      restart(checkedAt);
    });
    return () => {
      unsubscribe();
      animation.cancel();
    };
  }, [caseId]);
  return (
    <div ref={layer} className={className} data-live={isLive ? 'yes' : 'no'} aria-hidden={isLive} style={{ opacity: 1, pointerEvents: 'none' }}>
      {children}
    </div>
  );
}

/** Where in its 3 s the layer stands for a check of this age. */
function layerTimeMs(checkedAt: string): number {
  return Math.min(Math.max(serverNowMs() - Date.parse(checkedAt), 0), liveForMs);
}
