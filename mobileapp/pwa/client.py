"""Flet's web client, the part of it that the app asks for.

Left at home: the second renderer and its variants, debug symbols, fonts for formulas and for
icons that we don't use, scripts for audio and video, and the client's own service worker, which
would unregister ours.
"""

from collections.abc import Mapping
from pathlib import Path

from mobileapp.pwa.fonts import ICON_FONT, TEXT_FONT, font_manifest, icon_font, own_fonts
from mobileapp.pwa.icon_names import used_icons
from mobileapp.pwa.scripts import without_source_map
from mobileapp.pwa.wheel import read_folder

FOLDER = "flet_web/web/"

# Who renders with which: Flutter's loader takes the smaller one where the browser brings
# Chromium's own text and image code (`Intl.v8BreakIterator`, `Intl.Segmenter`, `ImageDecoder`).
ENGINES = {"canvaskit/chromium/": "chromium", "canvaskit/": "other"}

_TAKEN = (
    "main.dart.js",
    "flutter.js",
    "canvaskit/canvaskit.js",
    "canvaskit/canvaskit.wasm",
    "canvaskit/chromium/canvaskit.js",
    "canvaskit/chromium/canvaskit.wasm",
    "assets/AssetManifest.bin",
    "assets/AssetManifest.bin.json",
    "assets/packages/wakelock_plus/assets/no_sleep.js",
    "assets/shaders/ink_sparkle.frag",
    "assets/shaders/stretch_effect.frag",
    f"assets/{TEXT_FONT}",
)


def build_client(flet_web: Path, sources: Mapping[str, bytes]) -> dict[str, bytes]:
    """Give the client's files by path, with the icons that `sources` use.

    Args:
        flet_web: the wheel that holds the client.
        sources: our Python text by path.
    """
    whole = read_folder(flet_web, FOLDER)
    client = {path: whole[path] for path in _TAKEN}
    client["flutter.js"] = without_source_map(client["flutter.js"])
    client["assets/FontManifest.json"] = font_manifest()
    client[f"assets/{ICON_FONT}"] = icon_font(whole[f"assets/{ICON_FONT}"], used_icons(sources))
    client |= {f"assets/{path}": content for path, content in own_fonts().items()}
    return client
