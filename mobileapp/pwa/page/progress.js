// What the splash shows while the app starts: how much has arrived, and when nothing does.

import { onPython } from "./python.js";
import { appState, doing } from "./status.js";

const MB = 1e6;
const SLOW_AFTER_MS = 30_000;
const STOPPED_AFTER_MS = 300_000;

let lastArrival = performance.now();
let arrived = 0;
let total;

/** Show progress until the app is usable; call `stopped` when nothing has come for very long. */
export function showProgress(stopped) {
  onPython("loaded", ({ bytes }) => more(bytes));
  new PerformanceObserver((list) =>
    more(list.getEntries().reduce((sum, entry) => sum + entry.decodedBodySize, 0)),
  ).observe({ type: "resource", buffered: true });
  // From the kept files it takes a moment, and figures would only flicker.
  if (!navigator.serviceWorker?.controller) findTotal().catch(() => {});
  watch(stopped);
}

async function findTotal() {
  const { files } = await (await fetch("release.json")).json();
  const other = "v8BreakIterator" in Intl ? "canvaskit/canvaskit" : "canvaskit/chromium";
  const afterwards = [other, "late.pack", "screenshots/", "notices/", "icons/"];
  total = files
    .filter(({ path }) => !afterwards.some((part) => path.includes(part)))
    .reduce((sum, { bytes }) => sum + bytes, 0);
  more(0);
}

function more(bytes) {
  lastArrival = performance.now();
  arrived += bytes;
  if (!total || appState() !== "starting") return;
  const shown = Math.min(arrived, total);
  doing(`Loading ${(shown / MB).toFixed(0)} of ${(total / MB).toFixed(0)} MB`, shown / total);
}

function watch(stopped) {
  const timer = setInterval(() => {
    if (appState() !== "starting") return clearInterval(timer);
    const waited = performance.now() - lastArrival;
    if (waited > STOPPED_AFTER_MS) {
      clearInterval(timer);
      stopped();
    } else if (waited > SLOW_AFTER_MS) {
      doing("This takes longer than usual. A slow connection needs patience; else load it again.");
    }
  }, 1000);
}
