// Keeping the app on the device: progress, readiness and updates, for the page and for Python.
//
// The service worker (sw.js) does the keeping. It is registered after the first paint, so that the
// files the page needs come first; the worker then finds them in the browser's own cache.

import { onPython, toPython } from "./python.js";
import { appState, doing, offline } from "./status.js";

const MB = 1e6;
const UPDATE_EVERY_MS = 60 * 60 * 1000;

let started = false;
let waiting; // the service worker of a newer release
let last; // what Python was told last, for when it asks

export function keepOffline() {
  if (started) return;
  started = true;
  register().catch((error) => report("failed", { reason: "error", details: String(error) }));
}

async function register() {
  if (!isSecureContext) return report("failed", { reason: "insecure" });
  if (!navigator.serviceWorker) return report("failed", { reason: "unsupported" });
  const { serviceWorker } = navigator;
  const hadController = Boolean(serviceWorker.controller);
  serviceWorker.addEventListener("message", ({ data }) => hear(data));
  serviceWorker.addEventListener("controllerchange", () => {
    if (hadController) location.reload(); // another tab asked for the newer release
  });
  const registration = await serviceWorker.register("sw.js", { updateViaCache: "none" });
  if (registration.waiting) announce(registration.waiting);
  const follow = (worker) =>
    worker?.addEventListener("statechange", () => {
      if (worker.state === "installed" && registration.active) announce(worker);
      if (worker.state === "activated") report("ready");
    });
  registration.addEventListener("updatefound", () => follow(registration.installing));
  follow(registration.installing);
  if (registration.active) registration.active.postMessage({ kind: "complete?" });
  setInterval(() => registration.update().catch(() => {}), UPDATE_EVERY_MS);
}

/** A newer release is complete and waits. */
function announce(worker) {
  waiting = worker;
  toPython({ kind: "update" });
}

function hear({ kind, release, done, total, full }) {
  // Of another release than this page's only the end matters, and that is announced elsewhere.
  if (release !== "{{release}}") return;
  if (kind === "keeping" && document.documentElement.dataset.offline !== "ready") {
    report("preparing", { done: done / MB, total: total / MB });
  }
  if (kind === "kept" && navigator.serviceWorker.controller) report("ready");
  if (kind === "not kept") report("failed", { reason: full ? "full" : "network" });
}

function report(state, more = {}) {
  offline(state);
  last = { kind: "offline", state, ...more };
  toPython(last);
}

onPython("offline?", () => last && toPython(last));
onPython("update", () => {
  waiting?.addEventListener("statechange", () => location.reload());
  waiting?.postMessage({ kind: "take over" });
});
onPython("persist", () => navigator.storage?.persist?.());

// Before the first paint, on a first visit, show how much has arrived.
if (!navigator.serviceWorker?.controller) showProgress();

async function showProgress() {
  const { files } = await (await fetch("release.json")).json();
  const chromium = "v8BreakIterator" in Intl;
  const total = files
    .filter(({ path }) => !path.includes(chromium ? "canvaskit/canvaskit" : "canvaskit/chromium"))
    .filter(({ path }) => !path.includes("late.pack") && !path.startsWith("screenshots/"))
    .reduce((sum, { bytes }) => sum + bytes, 0);
  let arrived = 0;
  const show = (bytes) => {
    arrived = Math.min(arrived + bytes, total);
    if (appState() !== "starting") return;
    doing(`Loading ${(arrived / MB).toFixed(0)} of ${(total / MB).toFixed(0)} MB`, arrived / total);
  };
  onPython("loaded", ({ bytes }) => show(bytes));
  new PerformanceObserver((list) =>
    show(list.getEntries().reduce((sum, entry) => sum + entry.decodedBodySize, 0)),
  ).observe({ type: "resource", buffered: true });
}
