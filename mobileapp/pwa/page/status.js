// Where the page stands, for people and for tools:
//
//   <html data-app="starting | usable | failed" data-offline="preparing | ready | failed">

const root = document.documentElement;
const element = (id) => document.getElementById(id);

/** Show on the splash what is going on, and how far it is (0 to 1) where that is known. */
export function doing(sentence, share) {
  element("doing").textContent = sentence;
  if (share !== undefined) element("progress").value = Math.min(share, 1);
}

/** The app's first usable screen is painted: the splash has done its work. */
export function usable() {
  if (root.dataset.app !== "starting") return;
  root.dataset.app = "usable";
  element("splash").hidden = true;
}

/** Nothing that a person could use is there, or will be. Show why, and what to do. */
export function failed(what, next, details, again) {
  if (root.dataset.app === "failed") return;
  root.dataset.app = "failed";
  element("failure-what").textContent = what;
  element("failure-next").textContent = `${next} What you saved on this device is untouched.`;
  element("failure-details").textContent = `Release {{release}}\n${details ?? ""}`;
  element("failure-again").addEventListener("click", again);
  element("splash").hidden = true;
  element("failure").hidden = false;
}

/** Tell whether it is safe to drive out of the network's reach: preparing, ready or failed. */
export function offline(state) {
  root.dataset.offline = state;
}

export const appState = () => root.dataset.app;
