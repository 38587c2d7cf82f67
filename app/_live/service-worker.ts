'use client';

/** What a page asks of the service worker. */
export type WorkerMessage = { readonly kind: 'keep-page'; readonly path: string; readonly assets: readonly string[] } | { readonly kind: 'forget-pages' };

/** Sends a message to the service worker, where the browser has one (https or loopback only). */
export async function tellServiceWorker(message: WorkerMessage): Promise<void> {
  if (typeof navigator === 'undefined' || !('serviceWorker' in navigator)) return;
  const registration = await navigator.serviceWorker.getRegistration();
  const worker = registration?.active ?? registration?.waiting ?? registration?.installing;
  worker?.postMessage(message);
}
