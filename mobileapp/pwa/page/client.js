// Flet's web client, a Flutter program: where its parts are, and how it starts.

const folder = new URL("client/", import.meta.url).href;

// What the client reads about itself, under this name.
globalThis.flet = {
  pyodide: true,
  multiView: false,
  noCdn: true,
  webSocketEndpoint: "",
  entrypointBaseUrl: folder,
  assetBase: folder,
  routeUrlStrategy: "hash",
};

const settings = {
  renderer: "canvaskit",
  entrypointBaseUrl: folder,
  assetBase: folder,
  canvasKitBaseUrl: `${folder}canvaskit/`,
  // The service worker keeps one variant and decides by the first of these (sw.js). The second is
  // missing only where there are no service workers either: at insecure addresses.
  canvasKitVariant: "v8BreakIterator" in Intl && "ImageDecoder" in self ? "chromium" : "full",
  // Glyphs that our fonts lack stay missing; no other origin is asked for them.
  fontFallbackBaseUrl: `${folder}assets/fonts/`,
};

// The client looks at the languages the browser asks for and stops at what isn't one. A bare
// system without any names "C".
const languages = navigator.languages.filter((name) => /^[a-z]{2,3}\b/i.test(name));
if (languages.length < navigator.languages.length) {
  Object.defineProperty(navigator, "languages", { value: languages.length ? languages : ["en"] });
  Object.defineProperty(navigator, "language", { value: navigator.languages[0] });
}

// The client adds a script of an animation library from another origin, used or not. The policy
// of this page would refuse it; not asking is quieter.
document.body.append = (...children) => {
  const ours = children.filter(({ src }) => !src || new URL(src).origin === location.origin);
  return Element.prototype.append.apply(document.body, ours);
};

/** Load and run the client; resolves when it runs, rejects when a part of it is missing. */
export async function startClient() {
  await loadScript(`${folder}flutter.js`);
  const missing = new Promise((_, reject) => {
    // The client's own loader waits for ever for a script that doesn't come.
    addEventListener("error", ({ target }) => target.src && reject(new Error(target.src)), true);
  });
  await Promise.race([missing, run()]);
}

async function run() {
  const { _flutter: flutter } = globalThis;
  flutter.buildConfig = {
    builds: [{ compileTarget: "dart2js", renderer: "canvaskit", mainJsPath: "main.dart.js" }],
  };
  await new Promise((resolve, reject) => {
    flutter.loader
      .load({
        config: settings,
        onEntrypointLoaded: (entry) =>
          entry
            .initializeEngine(settings)
            .then((engine) => engine.runApp())
            .then(resolve, reject),
      })
      .catch(reject);
  });
}

function loadScript(source) {
  return new Promise((resolve, reject) => {
    const script = document.createElement("script");
    script.src = source;
    script.onload = resolve;
    script.onerror = () => reject(new Error(`${source} did not load`));
    document.head.append(script);
  });
}
