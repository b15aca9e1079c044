"""Our own files that a build reads, and their fingerprint."""

from hashlib import sha256
from pathlib import Path

from mobileapp.pwa.paths import ASSETS, CHECKOUT, PAGE, PWA

# The build's own Python and the command line stay on this machine.
_AT_HOME = (PWA, PWA.parent / "__main__.py")


def app_sources() -> dict[str, bytes]:
    """Give our Python that runs in the browser: contents by path, `core/bounce.py`."""
    return {
        str(path.relative_to(CHECKOUT)): path.read_bytes()
        for package in ("core", "mobileapp")
        for path in sorted((CHECKOUT / package).rglob("*.py"))
        if not any(path.is_relative_to(place) for place in _AT_HOME)
    }


def fingerprint() -> str:
    """Give one hash over everything of ours that a build depends on.

    The pins are among it, so two builds with the same fingerprint carry the same bytes.
    """
    digest = sha256()
    for path in _watched():
        digest.update(f"{path.relative_to(CHECKOUT)}\0".encode())
        digest.update(sha256(path.read_bytes()).digest())
    return digest.hexdigest()


def _watched() -> list[Path]:
    files = [CHECKOUT / "pyproject.toml"]
    for folder in (CHECKOUT / "core", PWA.parent, PAGE, ASSETS):
        files += [path for path in folder.rglob("*") if path.is_file()]
    return sorted({path for path in files if "__pycache__" not in path.parts})
