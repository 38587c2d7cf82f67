'use client';

import { useSyncExternalStore } from 'react';

/** What a wall is taken for before the browser has said its size. */
const usualSize = '1920x1080';

function onResize(listener: () => void): () => void {
  window.addEventListener('resize', listener);
  return () => window.removeEventListener('resize', listener);
}

function onFonts(listener: () => void): () => void {
  document.fonts.addEventListener('loadingdone', listener);
  return () => document.fonts.removeEventListener('loadingdone', listener);
}

/** Whether the faces have arrived: words take another room in them than in their stand-ins. */
export function useFontStatus(): string {
  return useSyncExternalStore(onFonts, () => document.fonts.status, () => 'loading');
}

/** Width and height of the window in px; never so small that no type could be chosen for it. */
export function useWindowSize(): { readonly widthPx: number; readonly heightPx: number } {
  const size = useSyncExternalStore(onResize, () => `${window.innerWidth}x${window.innerHeight}`, () => usualSize);
  const [widthPx = 1920, heightPx = 1080] = size.split('x').map((length) => Math.max(240, Number(length)));
  return { widthPx, heightPx };
}
