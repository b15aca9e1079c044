"""The licences of everything carried, on one page that the app links to."""

from collections.abc import Mapping
from html import escape
from pathlib import Path

from mobileapp.pwa.inputs import Pin
from mobileapp.pwa.paths import ASSETS
from mobileapp.pwa.wheel import read_folder, read_wheel

# Parts that come inside other wheels and don't bring their licence text with them.
_RUNTIME = (
    "Pyodide, the Python runtime for browsers, is under the Mozilla Public License 2.0; its "
    "source is at github.com/pyodide/pyodide, and the licence's text is at "
    "mozilla.org/MPL/2.0 and among the web client's licences. It is built with Emscripten "
    "(MIT and University of Illinois/NCSA licences)."
)
_FONT = "Roboto and Material Icons are under the Apache License 2.0, printed among flet's licences."

_PAGE = """<!doctype html>
<html lang="en">
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<title>Licences of what Sag &amp; Bounce carries</title>
<style>
body {{ max-width: 48rem; margin: auto; padding: 1rem; font: 1rem/1.5 system-ui, sans-serif }}
pre {{ white-space: pre-wrap; font-size: .85rem }}
</style>
<h1>Licences</h1>
<p>Sag &amp; Bounce stands on the work of others. Here is what it carries, and on which terms.
The web client's own long list is <a href="client.txt">on a page of its own</a>.</p>
{sections}
"""


def notices(wheels: Mapping[str, Path], pins: Mapping[str, Pin]) -> dict[str, bytes]:
    """Give the licence pages by path.

    Args:
        wheels: the carried wheels by name.
        pins: what is known of them by name, where there is a pin.
    """
    sections = [
        _section("Python and its standard library", _read("python.txt")),
        _section("Pyodide", _RUNTIME),
        _section("Fonts", _FONT, *_font_licences()),
    ]
    for name, wheel in sorted(wheels.items()):
        title = str(pins[name]) if name in pins else name
        sections.append(_section(title, *_licences(wheel)))
    page = _PAGE.format(sections="\n".join(sections))
    client = read_folder(wheels["flet-web"], "flet_web/web/assets/")["NOTICES"]
    return {"index.html": page.encode(), "client.txt": client}


def _section(title: str, *texts: str) -> str:
    bodies = "\n".join(f"<pre>{escape(text.strip())}</pre>" for text in texts)
    return f"<h2>{escape(title)}</h2>\n{bodies}"


def _licences(wheel: Path) -> list[str]:
    """Give the licence texts of a wheel, or what its metadata says where it has none."""
    files = read_wheel(wheel)
    texts = [
        content.decode(errors="replace")
        for path, content in sorted(files.items())
        if ".dist-info/" in path
        and any(word in path.rpartition("/")[2].upper() for word in ("LICEN", "COPYING", "NOTICE"))
    ]
    if texts:
        return texts
    (metadata,) = (files[path] for path in files if path.endswith(".dist-info/METADATA"))
    head = metadata.decode(errors="replace").partition("\n\n")[0]
    return ["\n".join(line for line in head.splitlines() if "icense" in line)]


def _read(name: str) -> str:
    return (ASSETS / "licences" / name).read_text(encoding="utf-8")


def _font_licences() -> list[str]:
    return [
        f"{path.stem}\n\n{path.read_text(encoding='utf-8')}"
        for path in sorted((ASSETS / "fonts").glob("*.txt"))
    ]
