"""Where numpy for the browser comes from: the one place to change.

No numpy wheel for the browser is published under numpy's own name yet. A published wheel carries
Pyodide's numpy build unchanged; that one member is taken, checked and kept, the rest is thrown
away. The hash is the one that Pyodide's own lock file lists for this build (`pyodide-lock.json`
of the npm package `pyodide` 314.0.2 to 314.0.4). Once numpy publishes its own, a line in
`pins.txt` replaces this module.
"""

import tempfile
import zipfile
from hashlib import sha256
from pathlib import Path

from mobileapp.pwa.inputs import download, is_intact, keep, read_pins
from mobileapp.pwa.paths import PWA, cache
from mobileapp.pwa.problem import BuildProblem
from mobileapp.pwa.progress import say

MEMBER = "open_webui/frontend/pyodide/numpy-2.4.3-cp314-cp314-pyemscripten_2026_0_wasm32.whl"
MEMBER_SHA256 = "0cad9c1b91f0082e4f959bc0e0bf5835a2efbba6ab3b1e9d1fe6e7e564cca98e"


def fetch_numpy() -> Path:
    """Give numpy's wheel for the browser from the cache, downloading it the first time.

    Raises:
        BuildProblem: the download failed, or its content is not the pinned one.
    """
    kept = cache() / "inputs" / f"{MEMBER_SHA256}.whl"
    if is_intact(kept, MEMBER_SHA256):
        return kept
    say("Downloading numpy for the browser (106 MB, once; 3 MB of it are kept) …")
    with tempfile.TemporaryDirectory() as name:
        folder = Path(name)
        # The carrier is for an older Python than the browser's; it is only unpacked, never run.
        download(read_pins(PWA / "pins_numpy.txt"), folder, "--ignore-requires-python")
        (carrier,) = folder.glob("*.whl")
        wheel = folder / "numpy.whl"
        wheel.write_bytes(_member(carrier))
        keep(wheel, MEMBER_SHA256)
    return kept


def _member(carrier: Path) -> bytes:
    with zipfile.ZipFile(carrier) as archive:
        content = archive.read(MEMBER)
    if sha256(content).hexdigest() != MEMBER_SHA256:
        raise BuildProblem("numpy for the browser differs from its pinned SHA-256; not built.")
    return content
