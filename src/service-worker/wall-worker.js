// The service worker of a wall: Angular's own, which keeps the page and the tracker's files (ngsw-config.json), and before it the pictures
// that the wall's page keeps (src/app/wall/kept-showing.ts). Pictures never change under their address, so what is kept is right.
const pictureCache = 'oriel-wall-pictures';
const pictures = '/api/wall/images/';

self.addEventListener('fetch', (event) => {
  const { method, url } = event.request;
  const { pathname } = new URL(url);
  if (!pathname.startsWith('/api/')) return;
  event.stopImmediatePropagation();
  // What only the server can answer goes there straight: Angular's worker would hold it until all it keeps is fetched.
  if (method !== 'GET' || !pathname.startsWith(pictures)) return;
  event.respondWith(caches.match(event.request, { cacheName: pictureCache, ignoreVary: true }).then((kept) => kept ?? fetch(event.request)));
});

importScripts('./ngsw-worker.js');
