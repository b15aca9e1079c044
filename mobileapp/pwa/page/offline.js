// Keeping the app on the device: progress, readiness and updates, for the page and for Python.
//
// The service worker (sw.js) does the keeping. It is registered after the first paint, so that the
// files the page needs come first; the worker then finds them in the browser's own cache.

import { onPython, toPython } from "./python.js";
import { offline } from "./status.js";

const MB = 1e6;
const UPDATE_EVERY_MS = 60 * 60 * 1000;
const MOST_PATIENCE_MS = 10 * 60 * 1000;

let started = false;
let waiting; // the service worker of a newer release
let last; // what Python was told last, for when it asks
let patience = 5_000; // [ms] until the next attempt after a broken connection; doubles each time

export function keepOffline() {
  if (started) return;
  started = true;
  register().catch((error) => report("failed", { reason: "error", details: String(error) }));
}

async function register() {
  if (!isSecureContext) return report("failed", { reason: "insecure" });
  if (!navigator.serviceWorker) return report("failed", { reason: "unsupported" });
  const { serviceWorker } = navigator;
  let controlled = Boolean(serviceWorker.controller);
  serviceWorker.addEventListener("message", ({ data }) => hear(data));
  serviceWorker.addEventListener("controllerchange", () => {
    if (controlled) location.reload(); // another tab asked for the newer release
    controlled = true; // else the first release has just taken this page into its care
  });
  addEventListener("online", tryAgain);
  const registration = await keep();
  setInterval(() => registration.update().catch(() => {}), UPDATE_EVERY_MS);
}

/** Have the service worker keep whatever isn't kept yet. */
async function keep() {
  const registration = await navigator.serviceWorker.register("sw.js", { updateViaCache: "none" });
  const follow = (worker) => {
    if (!worker) return;
    worker.onstatechange = () => {
      if (worker.state === "installed" && registration.active) announce(worker);
      if (worker.state === "activated") report("ready");
    };
  };
  registration.onupdatefound = () => follow(registration.installing);
  follow(registration.installing);
  if (registration.waiting) announce(registration.waiting);
  registration.active?.postMessage({ kind: "complete?" });
  return registration;
}

function tryAgain() {
  if (last?.state === "failed") keep().catch(() => {});
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
  if (kind === "not kept") {
    report("failed", { reason: full ? "full" : "network" });
    if (full) return;
    setTimeout(tryAgain, patience);
    patience = Math.min(2 * patience, MOST_PATIENCE_MS);
  }
}

/** Load the page again, with the newer release if one waits. */
export function startAfresh() {
  if (!waiting) return location.reload();
  waiting.addEventListener("statechange", () => location.reload());
  waiting.postMessage({ kind: "take over" });
}

function report(state, more = {}) {
  offline(state);
  last = { kind: "offline", state, ...more };
  toPython(last);
}

onPython("offline?", () => last && toPython(last));
onPython("update", startAfresh);
onPython("persist", () => navigator.storage?.persist?.());
