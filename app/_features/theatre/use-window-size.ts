'use client';

import { useSyncExternalStore } from 'react';

/** What a wall is taken for before the browser has said its size. */
const usualSize = '1920x1080';

function onResize(listener: () => void): () => void {
  window.addEventListener('resize', listener);
  return () => window.removeEventListener('resize', listener);
}

let arrivals = 0;

function onFonts(listener: () => void): () => void {
  const count = () => {
    arrivals += 1;
    listener();
  };
  document.fonts.addEventListener('loadingdone', count);
  return () => document.fonts.removeEventListener('loadingdone', count);
}

/** Grows whenever a face has arrived: words take another room in it than in its stand-in. */
export function useFontArrivals(): number {
  return useSyncExternalStore(onFonts, () => arrivals, () => 0);
}

/** Width and height of the window in px; never so small that no type could be chosen for it. */
export function useWindowSize(): { readonly widthPx: number; readonly heightPx: number } {
  const size = useSyncExternalStore(onResize, () => `${window.innerWidth}x${window.innerHeight}`, () => usualSize);
  const [widthPx = 1920, heightPx = 1080] = size.split('x').map((length) => Math.max(240, Number(length)));
  return { widthPx, heightPx };
}
