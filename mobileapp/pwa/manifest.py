"""The web app manifest: what an installed app is called and looks like."""

import json
import struct
from collections.abc import Mapping

from mobileapp.pwa.app_icons import ICONS, PETROL
from mobileapp.pwa.paths import ASSETS

PAPER = "#F7F5EF"


def screenshots() -> dict[str, bytes]:
    """Give the screenshots of the install dialogue by their path."""
    folder = ASSETS / "screenshots"
    return {f"screenshots/{path.name}": path.read_bytes() for path in sorted(folder.glob("*.png"))}


def manifest(shots: Mapping[str, bytes]) -> bytes:
    """Give the manifest; every address is relative to it, so any sub-path will do."""
    return json.dumps(
        {
            "id": "./",
            "name": "Sag & Bounce",
            "short_name": "Sag & Bounce",
            "description": "Set up a mountain bike's suspension at the trailhead, without signal.",
            "lang": "en",
            "dir": "ltr",
            "start_url": "./",
            "scope": "./",
            "display": "standalone",
            "orientation": "any",
            "theme_color": PETROL,
            "background_color": PAPER,
            "categories": ["sports", "utilities"],
            "icons": [
                {
                    "src": icon.path,
                    "sizes": f"{icon.pixels}x{icon.pixels}",
                    "type": "image/png",
                    "purpose": icon.purpose,
                }
                for icon in ICONS
            ],
            "screenshots": [_screenshot(path, content) for path, content in shots.items()],
        },
        indent=1,
    ).encode()


def _screenshot(path: str, content: bytes) -> dict[str, str]:
    # A PNG's width and height follow its first chunk's name (PNG specification, 11.2.2 IHDR).
    width, height = struct.unpack(">II", content[16:24])
    return {
        "src": path,
        "sizes": f"{width}x{height}",
        "type": "image/png",
        "form_factor": "wide" if width > height else "narrow",
    }
