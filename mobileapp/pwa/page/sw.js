// Keeps one release of the app on the device, whole, and serves only that.
//
// Install fetches every file of the list and lets the browser check it against its hash; one bad
// file and nothing is installed. What has arrived stays in the release's cache, so that the next
// attempt goes on from there. A new release waits until the person asks for it. Activation deletes
// all other releases.

const RELEASE = "{{release}}";
const CACHE = `release-${RELEASE}`;
const AT_ONCE = 4; // downloads side by side, for connections on which every answer takes its time
const LIST = "kept-files"; // a cache entry: what the release consists of, for its successor

// Which of two variants of the renderer the client will ask for; client.js decides likewise.
const ENGINE = "v8BreakIterator" in Intl ? "chromium" : "other";
const FILES = {{files}}.filter(({ engine }) => engine === null || engine === ENGINE);

const SCOPE = self.registration.scope;

// The page is kept under the folder's own address: some hosts redirect index.html to it, and a
// redirected response is no answer to a navigation.
const address = (path) => new URL(path === "index.html" ? "./" : path, SCOPE).href;
const byAddress = new Map(FILES.map((file) => [address(file.path), file]));
const TOTAL = FILES.reduce((sum, file) => sum + file.bytes, 0);

self.addEventListener("install", (event) => event.waitUntil(keepAll()));
self.addEventListener("activate", (event) =>
  // A page that isn't claimed doesn't count as open, and a newer release would not wait for it.
  event.waitUntil(dropOthers().then(() => self.clients.claim())),
);
self.addEventListener("fetch", (event) => event.respondWith(answer(event.request)));
self.addEventListener("message", (event) => {
  if (event.data.kind === "take over") self.skipWaiting();
  if (event.data.kind === "complete?") event.waitUntil(keepAll().catch(() => {}));
});

/** Bring the cache to hold every file of the list, telling all pages how far it is. */
async function keepAll() {
  const cache = await caches.open(CACHE);
  const present = new Set((await cache.keys()).map((request) => request.url));
  const missing = FILES.filter(({ path }) => !present.has(address(path)));
  const earlier = missing.length ? await earlierFiles() : new Map();
  let done = TOTAL - missing.reduce((sum, file) => sum + file.bytes, 0);
  const keepNext = async () => {
    for (let file; (file = missing.shift()); ) {
      const url = address(file.path);
      await cache.put(url, await obtain(file, url, earlier));
      done += file.bytes;
      await tell({ kind: "keeping", done, total: TOTAL });
    }
  };
  try {
    await Promise.all(Array.from({ length: AT_ONCE }, keepNext));
    await cache.put(address(LIST), Response.json(FILES));
    await tell({ kind: "kept" });
  } catch (error) {
    missing.length = 0;
    await tell({ kind: "not kept", full: error.name === "QuotaExceededError", done, total: TOTAL });
    throw error;
  }
}

/** A file's response: from an earlier release where that had the same bytes, else fetched. */
async function obtain(file, url, earlier) {
  const known = await earlier.get(file.integrity)?.();
  if (known) {
    // A response remembers its address, and scripts import relative to it: give it a new one.
    return new Response(await known.blob(), { headers: known.headers });
  }
  // Below r/ an address never changes its content, so what the page has just loaded may be used.
  const cache = file.path.startsWith("r/") ? "default" : "no-cache";
  const response = await fetch(url, { integrity: file.integrity, cache });
  if (!response.ok) throw new Error(`${file.path}: ${response.status}`);
  return response;
}

/** Where to find a file of an earlier, complete release, by its hash. */
async function earlierFiles() {
  const found = new Map();
  for (const name of await caches.keys()) {
    if (name === CACHE || !name.startsWith("release-")) continue;
    const cache = await caches.open(name);
    const list = await cache.match(address(LIST));
    for (const { path, integrity } of list ? await list.json() : []) {
      found.set(integrity, () => cache.match(address(path)));
    }
  }
  return found;
}

async function dropOthers() {
  for (const name of await caches.keys()) {
    if (name !== CACHE && name.startsWith("release-")) await caches.delete(name);
  }
}

async function answer(request) {
  const url = new URL(request.url);
  if (url.origin !== location.origin) return Response.error();
  const plain = url.href.split(/[?#]/)[0];
  // An address below the folder that means nothing would break the page's relative ones.
  const known = plain === SCOPE || byAddress.has(plain);
  if (request.mode === "navigate" && !known) return Response.redirect(SCOPE);
  const cache = await caches.open(CACHE);
  const kept = await cache.match(plain, { ignoreVary: true });
  if (kept) return kept;
  // Reached when the browser has thrown the cache away, and for the few files that aren't kept.
  try {
    return await fetch(request);
  } catch {
    return request.mode === "navigate" ? gone() : Response.error();
  }
}

function gone() {
  const page = `<!doctype html>
<html lang="en" data-app="failed" data-offline="failed">
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<title>Sag &amp; Bounce</title>
<p>This browser has deleted the app's files. Open this page once with a connection to load them
again. What you saved is kept apart from them.</p>
<p><a href="${SCOPE}">Try again</a></p>`;
  return new Response(page, {
    status: 503,
    headers: { "Content-Type": "text/html; charset=utf-8" },
  });
}

async function tell(message) {
  const pages = await self.clients.matchAll({ includeUncontrolled: true, type: "window" });
  for (const page of pages) page.postMessage({ ...message, release: RELEASE });
}
