// Starts the app: Python and the client side by side, then the keeping for offline use.

import { startClient } from "./client.js";
import { keepOffline, startAfresh } from "./offline.js";
import { showProgress } from "./progress.js";
import { onPython, onWorkerError } from "./python.js";
import "./sound.js";
import { appState, failed, usable } from "./status.js";
import "./taps.js";

const RELOAD = "Check the connection, then try again.";

function fail(what, next, details) {
  failed(what, next, details, startAfresh);
  keepOffline(); // a repaired release may be waiting, and "try again" then takes it
}

onWorkerError(({ message }) => {
  // Later errors concern one action, not the app.
  if (appState() === "starting") fail("Python did not start.", RELOAD, message);
});
onPython("failed", ({ what, next, details }) => fail(what, next ?? RELOAD, details));
onPython("usable", async () => {
  // The packets of the first screen were posted before this message; two frames later it shows.
  await nextFrame();
  await nextFrame();
  usable();
  keepOffline();
});

startClient().catch((error) =>
  fail("A part of the app did not load, or this browser lacks WebAssembly.", RELOAD, String(error)),
);

showProgress(() => fail("The app has not started: nothing arrives any more.", RELOAD, ""));

// WebKit restores this page from its back/forward cache with a stopped picture. What was entered
// is saved, so starting afresh loses nothing.
addEventListener("pageshow", (event) => {
  if (event.persisted && navigator.vendor.startsWith("Apple")) location.reload();
});

function nextFrame() {
  return new Promise((resolve) => {
    requestAnimationFrame(resolve);
    setTimeout(resolve, 100); // a page in the background paints no frames
  });
}
