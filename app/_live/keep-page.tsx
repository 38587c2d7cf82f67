'use client';

import { useEffect } from 'react';

import { useLiveStore } from '@/app/_live/live-store';
import { tellServiceWorker } from '@/app/_live/service-worker';

/**
 * Keeps the page it stands on, so that it loads without a link. Only for client shells: a page whose HTML holds anything
 * of a case must not carry this.
 */
export function KeepPage() {
  useEffect(() => {
    if (!('serviceWorker' in navigator)) {
      useLiveStore.setState({ isPageKept: false });
      return;
    }
    const path = location.pathname;
    const hear = (event: MessageEvent<unknown>) => {
      const isKept = readAnswer(event.data, path);
      if (isKept !== null) useLiveStore.setState({ isPageKept: isKept });
    };
    // Without a worker the desk still works as long as there is a link; it says that it is not kept.
    const onLoad = () => void keep(path).catch(() => useLiveStore.setState({ isPageKept: false }));
    navigator.serviceWorker.addEventListener('message', hear);
    if (document.readyState === 'complete') onLoad();
    else window.addEventListener('load', onLoad, { once: true });
    return () => {
      navigator.serviceWorker.removeEventListener('message', hear);
      window.removeEventListener('load', onLoad);
      useLiveStore.setState({ isPageKept: null });
    };
  }, []);
  return null;
}

async function keep(path: string): Promise<void> {
  await navigator.serviceWorker.register('/service-worker.js', { scope: '/' });
  await navigator.serviceWorker.ready;
  const loaded = performance.getEntriesByType('resource').map((entry) => new URL(entry.name));
  const assets = loaded.filter((url) => url.origin === location.origin && url.pathname.startsWith('/_next/static/')).map((url) => url.pathname + url.search);
  await tellServiceWorker({ kind: 'keep-page', path, assets });
}

function readAnswer(answer: unknown, path: string): boolean | null {
  const isOurs = typeof answer === 'object' && answer !== null && 'kind' in answer && answer.kind === 'page-kept' && 'path' in answer && answer.path === path;
  return isOurs && 'isKept' in answer ? answer.isKept === true : null;
}
