// The Python worker: the interpreter, our packs of compiled modules, and the app's main function.
//
// Nothing is installed or compiled here. The packs' format is told in pwa/pack.py.

import { loadPyodide } from "./python/pyodide.mjs";

const here = (path) => new URL(path, import.meta.url);
const tell = (message) => self.postMessage(message);

// Everything Python needs from the page, importable there as `page_bridge`; see browser.py.
let toApp = () => {};
let clientIsLoading = true; // until it sends its first packet
let lateStarted;
const bridge = {
  post: (kind, value) => tell({ kind, ...value }),
  listen: (callback) => (toApp = callback),
  late: () => (lateStarted ??= load("late.pack").then(unpack)),
  client_is_loading: () => clientIsLoading,
};

// Under this name Flet's own connection leaves its functions for us to call.
const flet = {};
let early = []; // the client's packets until Python listens

self.onmessage = ({ data }) => {
  if (data.kind === "start") {
    flet.documentUrl = data.documentUrl;
    start().catch(explain);
  } else if (data.kind !== undefined) {
    toApp(JSON.stringify(data));
  } else {
    clientIsLoading = false;
    if (early) early.push(data);
    else flet.send(data);
  }
};

new PerformanceObserver((list) => {
  const bytes = list.getEntries().reduce((sum, entry) => sum + entry.decodedBodySize, 0);
  tell({ kind: "loaded", bytes });
}).observe({ type: "resource", buffered: true });

let pyodide;

// The interpreter waits for ever for a part of its own that is missing or damaged, and tells nobody.
const instantiate = WebAssembly.instantiateStreaming;
WebAssembly.instantiateStreaming = (source, imports) =>
  instantiate.call(WebAssembly, source, imports).catch((error) => {
    explain(error);
    throw error;
  });

async function start() {
  const pack = load("app.pack");
  pyodide = await loadPyodide({
    indexURL: here("python/").href,
    stdout: (line) => console.log(line),
    stderr: (line) => console.error(line),
  });
  pyodide.registerJsModule("flet_js", flet);
  pyodide.registerJsModule("page_bridge", bridge);
  unpack(await pack);
  pyodide.runPython("import flet; from mobileapp.main import main; flet.run(main)");
  await flet.start_connection((packet) => {
    const bytes = packet.toJs();
    self.postMessage(bytes, [bytes.buffer]);
  });
  early.forEach((packet) => flet.send(packet));
  early = undefined;
  pyodide
    .runPythonAsync(
      "import mobileapp.warm_up, page_bridge\n" +
        "await mobileapp.warm_up.warm_up(page_bridge.client_is_loading)",
    )
    .catch(explain);
}

async function load(name) {
  const response = await fetch(here(name));
  if (!response.ok) throw new Error(`${name}: ${response.status}`);
  return new Uint8Array(await response.arrayBuffer());
}

function unpack(pack) {
  const length = new DataView(pack.buffer).getUint32(0, true);
  const { root, files } = JSON.parse(new TextDecoder().decode(pack.subarray(4, 4 + length)));
  const made = new Set();
  let from = 4 + length;
  for (const [path, size] of files) {
    const target = `${root}/${path}`;
    const folder = target.slice(0, target.lastIndexOf("/"));
    if (!made.has(folder)) pyodide.FS.mkdirTree(folder);
    made.add(folder);
    pyodide.FS.writeFile(target, pack.subarray(from, from + size), { canOwn: true });
    from += size;
  }
  // Python has looked into these folders before they were filled.
  pyodide.runPython("import sys; sys.path_importer_cache.clear()");
}

function explain(error) {
  tell({ kind: "failed", what: "Python did not start.", details: String(error).slice(0, 2000) });
}
