/*
 * Keeps the desk's client shell, so that a reload without a server works. Hand-written and versioned.
 *
 * Pages: network first, the kept copy after 2 s or when the server does not answer. Only pages that asked to be kept
 * (their HTML holds nothing of a case) are kept, each under its own address: the address of one case never answers for
 * another. A kept page keeps its own headers, and with them the nonce that its own scripts carry.
 * Hashed files under /_next/static/: cache first. Everything else, /api and /socket.io before all, is not touched.
 */
const version = 1;
const pagesName = `fascicle-pages-${version}`;
const assetsName = `fascicle-assets-${version}`;
const listsName = `fascicle-lists-${version}`;
const cacheNames = [pagesName, assetsName, listsName];
const quickMs = 2000;
const mostPages = 5;

self.addEventListener('install', () => self.skipWaiting());

self.addEventListener('activate', (event) => {
  event.waitUntil(
    (async () => {
      const names = await caches.keys();
      await Promise.all(names.filter((name) => name.startsWith('fascicle-') && !cacheNames.includes(name)).map((name) => caches.delete(name)));
      await self.clients.claim();
    })(),
  );
});

self.addEventListener('fetch', (event) => {
  const { request } = event;
  const url = new URL(request.url);
  if (request.method !== 'GET' || url.origin !== self.location.origin) return;
  if (isNeverKept(url.pathname)) return;
  if (request.mode === 'navigate') event.respondWith(openPage(request, url.pathname));
  else if (isAsset(url.pathname)) event.respondWith(openAsset(request, url));
});

self.addEventListener('message', (event) => {
  const message = event.data;
  if (message?.kind === 'keep-page') event.waitUntil(keepAndTell(message, event.source));
  if (message?.kind === 'forget-pages') event.waitUntil(Promise.all([caches.delete(pagesName), caches.delete(listsName)]));
});

function isNeverKept(path) {
  return path === '/api' || path.startsWith('/api/') || path.startsWith('/socket.io');
}

function isAsset(path) {
  return path.startsWith('/_next/static/');
}

async function openPage(request, path) {
  const kept = await (await caches.open(pagesName)).match(path);
  const answer = fetch(request);
  if (kept === undefined) return answer.catch(() => noLinkPage());
  // A late answer that fails must not be an unhandled error once the kept page was shown.
  const usable = answer.then((response) => (response.status >= 500 ? kept : response)).catch(() => kept);
  const late = new Promise((resolve) => setTimeout(() => resolve(kept), quickMs));
  return Promise.race([usable, late]);
}

async function openAsset(request, url) {
  const cache = await caches.open(assetsName);
  const kept = await cache.match(url.pathname + url.search);
  if (kept !== undefined) return kept;
  return fetch(request);
}

/** The page shows whether it is kept: a desk that will not load without a link must say so while there is one. */
async function keepAndTell({ path, assets }, page) {
  const isKept = await keepPage(path, assets).then(
    () => true,
    () => hasPage(path),
  );
  page?.postMessage({ kind: 'page-kept', path, isKept });
}

/** Whether a copy from before is there: it answers a reload, whatever kept the newer one from being stored. */
async function hasPage(path) {
  return typeof path === 'string' && (await (await caches.open(pagesName)).match(path)) !== undefined;
}

/** Fetches the page and everything its HTML, its styles and its first run need; swaps it in only when all of it is there. */
async function keepPage(path, loadedAssets) {
  if (typeof path !== 'string' || !path.startsWith('/') || isNeverKept(path)) throw new Error('Not kept: no path of a page');
  const response = await fetch(path, { credentials: 'same-origin', redirect: 'error', headers: { accept: 'text/html' } });
  if (!response.ok || !(response.headers.get('content-type') ?? '').startsWith('text/html')) throw new Error(`Not kept: ${path} answered ${response.status}`);
  const html = await response.clone().text();
  const named = html.match(/\/_next\/static\/[A-Za-z0-9_\-./~%()[\]@]+\.(?:js|css|woff2)(?:\?[A-Za-z0-9_\-=&.]*)?/g) ?? [];
  const given = Array.isArray(loadedAssets) ? loadedAssets.filter((one) => typeof one === 'string' && isAsset(one)) : [];
  const assets = [...new Set([...named, ...given])];
  const cache = await caches.open(assetsName);
  const stored = await Promise.all(assets.map((asset) => keepAsset(cache, asset)));
  const fonts = [...new Set(stored.flatMap((one) => one.fonts))].filter((font) => !assets.includes(font));
  await Promise.all(fonts.map((font) => keepAsset(cache, font)));
  await (await caches.open(listsName)).put(path, new Response(JSON.stringify({ keptAt: Date.now(), assets: [...assets, ...fonts] })));
  await (await caches.open(pagesName)).put(path, response);
  await prune();
}

/** Stores one hashed file unless it is there; tells the fonts that a style sheet names. */
async function keepAsset(cache, asset) {
  let response = await cache.match(asset);
  if (response === undefined) {
    response = await fetch(asset, { credentials: 'same-origin' });
    if (!response.ok) throw new Error(`Not kept: ${asset} answered ${response.status}`);
    await cache.put(asset, response.clone());
  }
  if (!new URL(asset, self.location.origin).pathname.endsWith('.css')) return { fonts: [] };
  const css = await response.clone().text();
  const base = new URL(asset, self.location.origin);
  const urls = [...css.matchAll(/url\(["']?([^"')]+)["']?\)/g)].map((found) => new URL(found[1], base));
  return { fonts: urls.filter((url) => url.origin === self.location.origin && isAsset(url.pathname)).map((url) => url.pathname + url.search) };
}

/** Keeps the newest pages, and no file that none of them needs. */
async function prune() {
  const [pages, lists, assets] = await Promise.all([caches.open(pagesName), caches.open(listsName), caches.open(assetsName)]);
  const known = await Promise.all(
    (await lists.keys()).map(async (request) => ({ request, ...(await (await lists.match(request)).json()) })),
  );
  known.sort((one, other) => other.keptAt - one.keptAt);
  for (const { request } of known.slice(mostPages)) await Promise.all([pages.delete(request), lists.delete(request)]);
  const needed = new Set(known.slice(0, mostPages).flatMap((one) => one.assets));
  for (const request of await assets.keys()) {
    const url = new URL(request.url);
    if (!needed.has(url.pathname + url.search)) await assets.delete(request);
  }
}

async function noLinkPage() {
  const kept = (await (await caches.open(pagesName)).keys()).map((request) => new URL(request.url).pathname);
  const links = kept.map((path) => `<li><a href="${encodeURI(path)}">${encodeURI(path)}</a></li>`).join('');
  const list = links === '' ? '' : `<p>Kept on this computer:</p><ul>${links}</ul>`;
  const html = `<!doctype html><html lang="en-GB"><head><meta charset="utf-8"><title>No link · Fascicle</title></head><body><h1>No link to the server</h1><p>This page is not kept on this computer. Nothing here is live.</p>${list}</body></html>`;
  return new Response(html, {
    status: 503,
    headers: { 'content-type': 'text/html; charset=utf-8', 'content-security-policy': "default-src 'none'; base-uri 'none'; frame-ancestors 'none'" },
  });
}
