'use client';

import { useEffect, useState } from 'react';

import { useLiveStore } from '@/app/_live/live-store';

/** Now on the server's clock, ms since 1970, as far as it was measured. */
export const serverNowMs = (): number => Date.now() + useLiveStore.getState().link.offsetMs;

/** Now on the server's clock, renewed every interval. Zero before hydration: a server's time is no browser's time. */
export function useNow(intervalMs = 1000): number {
  const [nowMs, setNowMs] = useState(0);
  useEffect(() => {
    const renew = () => setNowMs(serverNowMs());
    const first = setTimeout(renew, 0);
    const timer = setInterval(renew, intervalMs);
    return () => {
      clearTimeout(first);
      clearInterval(timer);
    };
  }, [intervalMs]);
  return nowMs;
}
