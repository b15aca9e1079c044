// The Python worker, and the line between it and Flet's client.
//
// The worker starts with the page, long before the client asks for it; what the client sends before
// Python is there waits in the worker. Two kinds of messages travel: the client's packets, which are
// byte arrays, and ours, which are objects {kind, …}.

const worker = new Worker(new URL("worker.js", import.meta.url), { type: "module" });
worker.postMessage({ kind: "start", documentUrl: document.URL });

const listeners = new Map();
let toClient; // there before the first packet: Python speaks only when spoken to

worker.onmessage = ({ data }) => {
  if (data.kind === undefined) toClient(data);
  else listeners.get(data.kind)?.(data);
};

/** Call `listener` with each of the worker's messages of a kind. */
export function onPython(kind, listener) {
  listeners.set(kind, listener);
}

/** Call `listener` when the worker itself can't run. */
export function onWorkerError(listener) {
  worker.onerror = listener;
}

export function toPython(message) {
  worker.postMessage(message);
}

// What Flet's client calls, by these names: once to connect, then for each packet.
globalThis.jsConnect = async (_app, _args, onPacket) => {
  toClient = onPacket;
};
globalThis.jsSend = async (_app, packet) => worker.postMessage(packet, [packet.buffer]);
globalThis.jsDisconnect = async () => {};
