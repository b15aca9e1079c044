"""Where things are on the machine that builds."""

from pathlib import Path

from platformdirs import user_cache_path

PWA = Path(__file__).resolve().parent
CHECKOUT = PWA.parent.parent
PAGE = PWA / "page"
ASSETS = CHECKOUT / "assets"
DEFAULT_SITE = CHECKOUT / ".build" / "site"


def cache() -> Path:
    """Give the folder that survives between builds: downloads, byte code, compressed files."""
    return user_cache_path("sag-and-bounce", appauthor=False)
