'use client';

import { useEffect } from 'react';

import { tellServiceWorker } from '@/app/_live/service-worker';

/**
 * Keeps the page it stands on, so that it loads without a link. Only for client shells: a page whose HTML holds anything
 * of a case must not carry this.
 */
export function KeepPage() {
  useEffect(() => {
    if (!('serviceWorker' in navigator)) return;
    const keep = async () => {
      await navigator.serviceWorker.register('/service-worker.js', { scope: '/' });
      await navigator.serviceWorker.ready;
      const loaded = performance.getEntriesByType('resource').map((entry) => new URL(entry.name));
      const assets = loaded.filter((url) => url.origin === location.origin && url.pathname.startsWith('/_next/static/')).map((url) => url.pathname + url.search);
      await tellServiceWorker({ kind: 'keep-page', path: location.pathname, assets });
    };
    // Without a worker the desk still works as long as there is a link.
    const onLoad = () => void keep().catch(() => undefined);
    if (document.readyState === 'complete') onLoad();
    else window.addEventListener('load', onLoad, { once: true });
    return () => window.removeEventListener('load', onLoad);
  }, []);
  return null;
}
