// Keeps the built pages of the pre-bid sheet for use without signal. The build puts FILES (their addresses) and BUILD
// (a name that changes with them) above these lines. What the API answers is never kept here.
const CACHE = `panelgap ${BUILD}`;
const PAGE = '/';
/** A weak signal may never answer; then the kept page stands in. */
const PATIENCE_MS = 4000;

self.addEventListener('install', (event) => event.waitUntil(keepFiles()));
self.addEventListener('activate', (event) => event.waitUntil(forgetOlder()));
self.addEventListener('fetch', (event) => {
  const { request } = event;
  const { origin, pathname } = new URL(request.url);
  if (request.method !== 'GET' || origin !== self.location.origin || pathname.startsWith('/api/')) return;
  event.respondWith(request.mode === 'navigate' ? page(request) : file(request));
});

async function keepFiles() {
  const cache = await caches.open(CACHE);
  await cache.addAll([PAGE, ...FILES]);
  await self.skipWaiting();
}

/** The build before stays: a page that was opened before an update still finds its own files. */
async function forgetOlder() {
  const names = await caches.keys();
  const others = names.filter((name) => name.startsWith('panelgap ') && name !== CACHE);
  await Promise.all(others.slice(0, -1).map((name) => caches.delete(name)));
  await self.clients.claim();
}

/** The newest page that can be had: every address of ours is the same one. */
async function page(request) {
  try {
    const reply = await fetch(request, { signal: AbortSignal.timeout(PATIENCE_MS) });
    if (reply.status < 500) return reply;
  } catch {
    // No signal: the kept one.
  }
  return (await caches.match(PAGE, { cacheName: CACHE })) ?? Response.error();
}

/** Files are named by their content, so a kept one is the right one. */
async function file(request) {
  return (await caches.match(request, { ignoreVary: true })) ?? fetch(request);
}
