'use client';

import { pageKeptWords, type PageKeptWords } from '@/app/_features/log/page-kept-words';
import { useLiveStore } from '@/app/_live/live-store';

/** Whether the page this stands on would come back after a reload without a link. */
export function usePageKept(): PageKeptWords {
  const isPageKept = useLiveStore((store) => store.isPageKept);
  const isStorageDurable = useLiveStore((store) => store.isStorageDurable);
  // On the server nothing is known of the browser: as good as not answered yet.
  if (typeof window === 'undefined') return pageKeptWords({ isPageKept: null, isStorageDurable: true, isSecure: true, canKeepPages: true });
  return pageKeptWords({ isPageKept, isStorageDurable, isSecure: window.isSecureContext, canKeepPages: 'serviceWorker' in navigator });
}
