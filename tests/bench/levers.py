"""What makes the start fast, one lever each, and the site without it.

Each lever is undone in a copy of the built site, so that its gain is measured and not remembered. A
change to the page that makes a text here stale stops the bench instead of measuring nothing.
"""

from mobileapp.pwa.carried import package_file_is_carried
from mobileapp.pwa.inputs import fetch, read_pins
from mobileapp.pwa.pack import pack
from mobileapp.pwa.python import LATE, RUNTIME_FOLDER, STDLIB
from mobileapp.pwa.sources import app_sources
from mobileapp.pwa.wheel import read_folder, read_wheel

STARTED_BY_THE_PAGE = """\
const worker = new Worker(new URL("worker.js", import.meta.url), { type: "module" });
worker.postMessage({ kind: "start", documentUrl: document.URL });
"""
STARTED_BY_THE_CLIENT = """\
const asked = [];
const worker = { postMessage: (...message) => asked.push(message) };
function startWorker() {
  const real = new Worker(new URL("worker.js", import.meta.url), { type: "module" });
  real.onmessage = worker.onmessage;
  real.onerror = worker.onerror;
  worker.postMessage = (...message) => real.postMessage(...message);
  real.postMessage({ kind: "start", documentUrl: document.URL });
  asked.forEach((message) => real.postMessage(...message));
}
"""


def python_after_the_client(_site, release):
    script = release / "python.js"
    _exchange(script, STARTED_BY_THE_PAGE, STARTED_BY_THE_CLIENT)
    _exchange(script, "  toClient = onPacket;\n", "  toClient = onPacket;\n  startWorker();\n")


def everything_before_the_first_paint(_site, release):
    script = release / "worker.js"
    _exchange(
        script,
        "  unpack(await pack);\n",
        '  const late = load("late.pack");\n  unpack(await pack);\n  unpack(await late);\n'
        "  lateStarted = Promise.resolve();\n",
    )
    _exchange(script, '"import flet; from', '"import numpy, flet_charts, flet; from')


def compiled_on_the_phone(_site, release):
    wheels = fetch(read_pins())
    sources = app_sources()
    for name, wheel in wheels.items():
        if name not in (*LATE, "flet-web"):
            content = read_wheel(wheel)
            sources |= {path: content[path] for path in content if package_file_is_carried(path)}
    (release / "app.pack").write_bytes(pack(sources))


def compressed_standard_library(_site, release):
    archive = read_folder(fetch(read_pins())["flet-web"], RUNTIME_FOLDER)[STDLIB]
    (release / "python" / STDLIB).write_bytes(archive)


def responses_wrapped_anew(site, _release):
    _exchange(
        site / "sw.js",
        "if (kept) return kept;",
        "if (kept) return new Response(kept.body, { headers: kept.headers });",
    )


LEVERS = {
    "Python starts with the page, not after the client": python_after_the_client,
    "numpy and charts after the first paint": everything_before_the_first_paint,
    "byte code made at build": compiled_on_the_phone,
    "fewer modules, not deflated, in the standard library": compressed_standard_library,
    "responses served as they came": responses_wrapped_anew,
}


def undo(lever, site, release):
    """Undo a lever in the files of a site and in its release's own folder."""
    LEVERS[lever](site, release)


def _exchange(file, old, new):
    text = file.read_text("utf-8")
    assert text.count(old) == 1, f"{file.name} no longer holds once: {old}"
    file.write_text(text.replace(old, new), "utf-8")
