"""Python for the browser: the interpreter, its standard library, the packages and our code."""

import io
import json
import zipfile
from collections.abc import Mapping
from dataclasses import dataclass
from pathlib import Path

from mobileapp.pwa.bytecode import compile_all
from mobileapp.pwa.carried import (
    package_file_is_carried,
    stdlib_module_is_carried,
    without_documentation,
)
from mobileapp.pwa.icon_names import keep_used_icons
from mobileapp.pwa.pack import pack
from mobileapp.pwa.scripts import without_source_map
from mobileapp.pwa.wheel import read_folder, read_wheel

RUNTIME_FOLDER = "flet_web/web/pyodide/"
STDLIB = "python_stdlib.zip"
LOCK = "pyodide-lock.json"

# Loaded after the first paint: what no first screen needs and is large.
LATE = ("flet-charts", "numpy")

# A zip file stores times; this is the earliest it can express.
_NO_TIME = (1980, 1, 1, 0, 0, 0)


@dataclass(frozen=True)
class Python:
    """The interpreter's folder by file name, and the two packs."""

    runtime: Mapping[str, bytes]
    app_pack: bytes
    late_pack: bytes


def build_python(wheels: Mapping[str, Path], ours: Mapping[str, bytes]) -> Python:
    """Make everything of Python that the browser gets.

    Args:
        wheels: the carried wheels by name.
        ours: our Python text by path.
    """
    runtime = read_folder(wheels["flet-web"], RUNTIME_FOLDER)
    stdlib = _stdlib_sources(runtime[STDLIB])
    packages = {
        name: {
            path: without_documentation(path, content)
            for path, content in read_wheel(wheel).items()
            if package_file_is_carried(path)
        }
        for name, wheel in wheels.items()
        if name != "flet-web"
    }
    first = {p: c for name in packages if name not in LATE for p, c in packages[name].items()}
    late = {p: c for name in packages if name in LATE for p, c in packages[name].items()}
    # Three runs, so that what one of them makes never depends on what another compiled before.
    compiled_stdlib = compile_all(stdlib, runtime)
    compiled = compile_all(_only_python(first | late), runtime)
    compiled_ours = compile_all(ours, runtime)

    def ready(files: Mapping[str, bytes]) -> dict[str, bytes]:
        return {
            path + "c" * path.endswith(".py"): compiled[path + "c"] if path.endswith(".py") else raw
            for path, raw in files.items()
        }

    return Python(
        runtime={
            "pyodide.mjs": without_source_map(runtime["pyodide.mjs"]),
            "pyodide.asm.mjs": runtime["pyodide.asm.mjs"],
            "pyodide.asm.wasm": runtime["pyodide.asm.wasm"],
            STDLIB: _stored_zip(compiled_stdlib),
            LOCK: _lock_without_packages(runtime[LOCK]),
        },
        app_pack=pack(keep_used_icons(ready(first), ours) | compiled_ours),
        late_pack=pack(ready(late)),
    )


def _stdlib_sources(archive: bytes) -> dict[str, bytes]:
    with zipfile.ZipFile(io.BytesIO(archive)) as file:
        return {name: file.read(name) for name in file.namelist() if stdlib_module_is_carried(name)}


def _only_python(files: Mapping[str, bytes]) -> dict[str, bytes]:
    return {path: content for path, content in files.items() if path.endswith(".py")}


def _stored_zip(files: Mapping[str, bytes]) -> bytes:
    """Zip without compressing: the transfer compresses better, and the phone needn't inflate."""
    target = io.BytesIO()
    with zipfile.ZipFile(target, "w", zipfile.ZIP_STORED) as archive:
        for name in sorted(files):
            archive.writestr(zipfile.ZipInfo(name, _NO_TIME), files[name])
    return target.getvalue()


def _lock_without_packages(lock: bytes) -> bytes:
    """Keep what names the interpreter, and offer nothing to install."""
    return json.dumps({"info": json.loads(lock)["info"], "packages": {}}).encode()
