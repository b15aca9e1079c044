"""The whole build: from pinned wheels and our sources to a folder that any static host can serve.

The folder is made beside its final place and moved there in one step; what interrupts a build
leaves the earlier folder as it was.
"""

import json
import shutil
import tempfile
import tomllib
from collections.abc import Mapping
from contextlib import suppress
from pathlib import Path
from typing import Any

from mobileapp.pwa.app_icons import app_icons
from mobileapp.pwa.client import build_client
from mobileapp.pwa.compress import compressed
from mobileapp.pwa.files import write_tree
from mobileapp.pwa.inputs import fetch, read_pins
from mobileapp.pwa.manifest import manifest, screenshots
from mobileapp.pwa.notices import notices
from mobileapp.pwa.numpy_wheel import fetch_numpy
from mobileapp.pwa.paths import CHECKOUT, PAGE
from mobileapp.pwa.problem import BuildProblem
from mobileapp.pwa.progress import say, step
from mobileapp.pwa.python import build_python
from mobileapp.pwa.release import LIST, assemble
from mobileapp.pwa.sources import app_sources, fingerprint

# The page's files that stay at the site's root; the others belong to their release.
_AT_ROOT = ("index.html", "sw.js")


def build(out: Path) -> None:
    """Build the site into `out`.

    Raises:
        BuildProblem: `out` is something else than an earlier build, or a step failed.
        OSError: the disk is full or `out` can't be written.
    """
    _refuse_to_overwrite(out)
    site = make_site()
    total = sum(map(len, site.values()))
    with step(f"Compressing {total / 1e6:.0f} MB for the transfer (slow the first time)"):
        twins = compressed(site)
    _put_in_place(out, site | twins)
    say(f"Built {out}: {len(site)} files.")


def is_current(out: Path) -> bool:
    """Tell whether `out` holds a build of exactly the present sources and pins."""
    if not (out / LIST).exists():
        return False
    return bool(_list(out)["sources"] == fingerprint())


def check_complete(site: Path) -> None:
    """Make sure that a folder is a build with all its files.

    Raises:
        BuildProblem: it is not.
    """
    if not (site / LIST).exists():
        raise BuildProblem(f"There is no build in {site}; run `python -m mobileapp build` first.")
    for entry in _list(site)["files"]:
        file = site / entry["path"]
        if not file.is_file() or file.stat().st_size != entry["bytes"]:
            raise BuildProblem(
                f"The build in {site} is damaged at {entry['path']}; "
                "delete the folder and build again."
            )


def make_site() -> dict[str, bytes]:
    """Make every file of the site, contents by path, without the compressed twins."""
    mark = fingerprint()  # first: a change made while we build must not pass for built
    pins = read_pins()
    wheels = {**fetch(pins), "numpy": fetch_numpy()}
    sources = app_sources()
    with step("Compiling Python for the browser"):
        python = build_python(wheels, sources)
    with step("Assembling the web client"):
        client = build_client(wheels["flet-web"], sources)
    page = _page()
    shots = screenshots()
    root = {path: page.pop(path) for path in _AT_ROOT}
    root |= app_icons() | shots
    root["manifest.webmanifest"] = manifest(shots)
    inside = page | {"app.pack": python.app_pack, "late.pack": python.late_pack}
    inside |= _below("client/", client) | _below("python/", python.runtime)
    inside |= _below("notices/", notices(wheels, {pin.name: pin for pin in pins}))
    return assemble(root, inside, _version(), mark)


def _page() -> dict[str, bytes]:
    page = {
        str(path.relative_to(PAGE)): path.read_bytes()
        for path in sorted(PAGE.rglob("*"))
        if path.is_file() and "__pycache__" not in path.parts
    }
    if missing := [path for path in _AT_ROOT if path not in page]:
        raise BuildProblem(f"The page lacks {' and '.join(missing)}, expected in {PAGE}.")
    return page


def _below(folder: str, files: Mapping[str, bytes]) -> dict[str, bytes]:
    return {folder + path: content for path, content in files.items()}


def _version() -> str:
    project = tomllib.loads((CHECKOUT / "pyproject.toml").read_text(encoding="utf-8"))
    return str(project["project"]["version"])


def _list(site: Path) -> dict[str, Any]:
    return json.loads((site / LIST).read_text(encoding="utf-8"))


def _refuse_to_overwrite(out: Path) -> None:
    if out.exists() and not (out / LIST).exists() and (not out.is_dir() or any(out.iterdir())):
        raise BuildProblem(f"{out} holds something else than a build; name another folder.")


def _put_in_place(out: Path, files: Mapping[str, bytes]) -> None:
    """Write a complete folder beside `out`, then swap it in."""
    out.parent.mkdir(parents=True, exist_ok=True)
    beside = Path(tempfile.mkdtemp(prefix=f".{out.name}-", dir=out.parent))
    try:
        fresh = beside / "fresh"
        fresh.mkdir()
        write_tree(fresh, files)
        with suppress(FileNotFoundError):
            out.rename(beside / "old")
        fresh.rename(out)
    finally:
        shutil.rmtree(beside, ignore_errors=True)
