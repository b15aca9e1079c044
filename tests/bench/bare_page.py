"""The page to be compared with: Flet and numpy as they come, published without any work of ours.

It is put together from the wheels that our build uses: the upstream web client with its loader and
its Python worker, and one archive with the packages and a small app, as `flet publish` makes it.
Three things are kinder to it than a real one: the packages are inside, so that nothing has to be
installed at each start; nothing is asked of other hosts; and its server allows caching for ever and
sends everything compressed.
"""

import importlib.util
import io
import sys
import tarfile
import tempfile
from multiprocessing import get_context
from pathlib import Path

from mobileapp.pwa.compress import compressed
from mobileapp.pwa.files import write_tree
from mobileapp.pwa.inputs import fetch, read_pins
from mobileapp.pwa.numpy_wheel import fetch_numpy
from mobileapp.pwa.policy import FOREVER
from mobileapp.pwa.server import SiteHandler, make_server
from mobileapp.pwa.wheel import read_folder, read_wheel

PACKAGES = ("flet", "msgpack", "repath", "six", "numpy")

# What a newcomer would write. The last line reports the first screen, as our own app does.
APP = """
import flet as ft
import numpy as np
from js import BroadcastChannel

def main(page):
    page.title = "Bare"
    sag = ft.TextField(label="Sag", value="30")
    page.add(ft.Text("Sag"), sag, ft.Text(f"{np.sqrt(9.80665 / 0.03):.2f}"), ft.Button("Save"))
    BroadcastChannel.new("bare").postMessage("usable")

ft.run(main)
"""


def make_bare_page(folder, script):
    """Write the page with another script element into an empty folder, with compressed twins."""
    wheels = {**fetch(read_pins()), "numpy": fetch_numpy()}
    files = read_folder(wheels["flet-web"], "flet_web/web/")
    files["index.html"] = _index(wheels["flet-web"], files["index.html"], script)
    files["app.tar.gz"] = _archive(wheels)
    write_tree(folder, files | compressed(files))


def _index(flet_web, index, script):
    """Fill the page's settings in with upstream's own function."""
    with tempfile.TemporaryDirectory() as name:
        function = Path(name) / "patch_index.py"
        function.write_bytes(read_folder(flet_web, "flet_web/")["patch_index.py"])
        spec = importlib.util.spec_from_file_location("patch_index", function)
        upstream = importlib.util.module_from_spec(spec)
        sys.dont_write_bytecode, before = True, sys.dont_write_bytecode
        spec.loader.exec_module(upstream)
        sys.dont_write_bytecode = before
        page = Path(name) / "index.html"
        page.write_bytes(index)
        upstream.patch_index_html(
            str(page),
            base_href="/",
            pyodide=True,
            pyodide_script_path="main.py",
            app_package_url="app.tar.gz",
            no_cdn=True,
        )
        # Upstream's own value for a runtime inside fails in its worker: it lacks the "./".
        script += '<script>flet.pyodideUrl = "./pyodide/pyodide.mjs";</script></head>'
        return page.read_text("utf-8").replace("</head>", script, 1).encode()


def _archive(wheels):
    files = {"main.py": APP.encode()}
    for name in PACKAGES:
        content = read_wheel(wheels[name])
        files |= {f"__pypackages__/{path}": content[path] for path in content}
    target = io.BytesIO()
    with tarfile.open(fileobj=target, mode="w:gz") as archive:
        for path, content in files.items():
            member = tarfile.TarInfo(path)
            member.size = len(content)
            archive.addfile(member, io.BytesIO(content))
    return target.getvalue()


class _BareHandler(SiteHandler):
    """Upstream's page runs inline scripts, which our policy forbids."""

    def send_header(self, name, value):
        if name == "Cache-Control":
            value = FOREVER
        if name != "Content-Security-Policy":
            super().send_header(name, value)


def _serve(folder, port_known):
    with make_server(folder, "127.0.0.1", 0) as server:
        server.RequestHandlerClass = lambda *given: _BareHandler(folder, *given)
        port_known.send(server.server_port)
        server.serve_forever()


class BareServer:
    """The bare page on a server in a process of its own.

    Attributes:
        address: of the page, with a slash at the end.
    """

    def __init__(self, folder):
        here, there = get_context("spawn").Pipe()
        self._process = get_context("spawn").Process(
            target=_serve, args=(folder, there), daemon=True
        )
        self._process.start()
        self.address = f"http://localhost:{here.recv()}/"

    def kill(self):
        """Be gone."""
        self._process.kill()
        self._process.join()
