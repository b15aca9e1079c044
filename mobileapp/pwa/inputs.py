"""The pinned wheels a build is made of: downloaded once, checked every time.

`pins.txt` names each wheel by version and SHA-256. pip fetches what is missing, for the browser's
platform, and refuses anything that differs; what it brings is kept under its hash in the user's
cache, and hashed again before each build, so a damaged cache is noticed and fetched anew.
"""

import errno
import os
import re
import subprocess
import sys
import tempfile
from collections.abc import Iterable
from dataclasses import dataclass
from hashlib import file_digest
from pathlib import Path

from mobileapp.pwa.files import write_whole
from mobileapp.pwa.paths import PWA, cache
from mobileapp.pwa.problem import BuildProblem
from mobileapp.pwa.progress import say

PINS = PWA / "pins.txt"

# The interface that Pyodide 314 offers to compiled wheels.
BROWSER = (
    *("--platform", "pyemscripten_2026_0_wasm32"),
    *("--implementation", "cp"),
    *("--python-version", "3.14"),
    *("--abi", "cp314"),
    *("--abi", "none"),
)

_PIN = re.compile(r"(?P<name>[\w-]+)==(?P<version>\S+) --hash=sha256:(?P<sha256>[0-9a-f]{64})")


@dataclass(frozen=True)
class Pin:
    """One wheel: its name and version, and the only content accepted for it."""

    name: str
    version: str
    sha256: str

    def __str__(self) -> str:
        """Read as people write it: name and version."""
        return f"{self.name} {self.version}"

    @property
    def requirement(self) -> str:
        """Give the line that pip understands."""
        return f"{self.name}=={self.version} --hash=sha256:{self.sha256}"

    @property
    def kept(self) -> Path:
        """Give the wheel's place in the cache, whether it is there or not."""
        return cache() / "inputs" / f"{self.sha256}.whl"


def read_pins(path: Path = PINS) -> list[Pin]:
    """Read a file of pins; a line that is neither a pin nor a comment is a mistake."""
    pins = []
    for line in path.read_text(encoding="utf-8").splitlines():
        if not line or line.startswith("#"):
            continue
        match = _PIN.fullmatch(line)
        if match is None:
            raise BuildProblem(f"{path.name} has a line that pins nothing: {line!r}.")
        pins.append(Pin(**match.groupdict()))
    return pins


def fetch(pins: Iterable[Pin]) -> dict[str, Path]:
    """Give the wheel of each pin by name, downloading those that are not in the cache.

    Raises:
        BuildProblem: a download failed or brought something else than what is pinned.
    """
    pins = list(pins)
    missing = [pin for pin in pins if not is_intact(pin.kept, pin.sha256)]
    if missing:
        say(f"Downloading {', '.join(map(str, missing))} …")
        with tempfile.TemporaryDirectory() as folder:
            download(missing, Path(folder), *BROWSER)
            for wheel in Path(folder).glob("*.whl"):
                keep(wheel, _digest(wheel))
        for pin in missing:
            if not pin.kept.exists():
                raise BuildProblem(f"pip brought no wheel for {pin}; nothing was built.")
    return {pin.name: pin.kept for pin in pins}


def download(pins: Iterable[Pin], folder: Path, *options: str) -> None:
    """Let pip download the wheels of `pins`, and nothing else, into `folder`."""
    requirements = folder / "pins.txt"
    requirements.write_text("".join(f"{pin.requirement}\n" for pin in pins), encoding="utf-8")
    command = [
        *(sys.executable, "-m", "pip", "download"),
        *("--disable-pip-version-check", "--no-input", "--no-deps", "--only-binary=:all:"),
        *("--require-hashes", "-r", str(requirements), "-d", str(folder), *options),
    ]
    done = subprocess.run(command, stderr=subprocess.PIPE, text=True, check=False)  # noqa: S603
    if done.returncode:
        raise BuildProblem(_reason(done.stderr, pins))


def keep(wheel: Path, sha256: str) -> None:
    """Put a checked wheel into the cache under its hash, in one step."""
    write_whole(cache() / "inputs" / f"{sha256}.whl", wheel.read_bytes())


def is_intact(path: Path, sha256: str) -> bool:
    """Tell whether `path` exists and holds exactly the expected bytes."""
    return path.exists() and _digest(path) == sha256


def _digest(path: Path) -> str:
    with path.open("rb") as file:
        return file_digest(file, "sha256").hexdigest()


def _reason(pip_said: str, pins: Iterable[Pin]) -> str:
    """Condense pip's complaint to one sentence."""
    names = ", ".join(map(str, pins))
    if "DO NOT MATCH THE HASHES" in pip_said:
        return (
            f"A download of {names} differs from its pinned SHA-256, so nothing was built; "
            "try again, and if it stays so, don't trust the source."
        )
    if os.strerror(errno.ENOSPC) in pip_said:
        return f"The disk is full: no room to download {names}."
    errors = [line for line in pip_said.splitlines() if line.startswith("ERROR:")]
    said = errors[-1].removeprefix("ERROR:").strip() if errors else "pip gave no reason"
    return f"Could not download {names} ({said}); check the connection and try again."
