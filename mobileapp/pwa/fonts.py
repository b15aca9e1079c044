"""The client's fonts: text, and only the icons in use.

Our own fonts are `assets/fonts/*.ttf`; the app names them by their family.
"""

import io
import json
from collections.abc import Iterable

from fontTools import subset
from fontTools.ttLib import TTFont

from mobileapp.pwa.icon_names import CLIENT_ICONS
from mobileapp.pwa.paths import ASSETS
from mobileapp.pwa.problem import BuildProblem

ICON_FONT = "fonts/MaterialIcons-Regular.otf"
TEXT_FONT = "fonts/roboto.woff2"

# What the client loads at start. Its own list also has formula fonts and a second icon set.
_CLIENT_FONTS = [
    {"family": "MaterialIcons", "fonts": [{"asset": ICON_FONT}]},
    {"family": "Roboto", "fonts": [{"asset": TEXT_FONT}]},
]


def font_manifest() -> bytes:
    """Give the client's FontManifest.json."""
    families: dict[str, list[dict[str, str | int]]] = {}
    for path, content in own_fonts().items():
        font = TTFont(io.BytesIO(content))
        family = str(font["name"].getBestFamilyName())
        weight = int(font["OS/2"].usWeightClass)
        families.setdefault(family, []).append({"asset": path, "weight": weight})
    ours = [{"family": family, "fonts": fonts} for family, fonts in families.items()]
    return json.dumps(_CLIENT_FONTS + ours).encode()


def icon_font(whole: bytes, used: Iterable[str]) -> bytes:
    """Cut the icon font down to the icons `used` and those the client draws itself.

    Raises:
        BuildProblem: an icon has no glyph by its name in the font.
    """
    font = TTFont(io.BytesIO(whole), recalcTimestamp=False)
    glyphs = set(font.getGlyphOrder())
    wanted = {}
    for icon in CLIENT_ICONS | set(used):
        wanted[icon] = next((name for name in _glyph_names(icon) if name in glyphs), None)
    nameless = sorted(icon for icon, glyph in wanted.items() if glyph is None)
    if nameless:
        raise BuildProblem(f"The icon font has no glyph named {', '.join(nameless)}.")
    options = subset.Options()
    options.desubroutinize = True
    subsetter = subset.Subsetter(options)
    subsetter.populate(glyphs=[glyph for glyph in wanted.values() if glyph])
    subsetter.subset(font)
    target = io.BytesIO()
    font.save(target)
    return target.getvalue()


def own_fonts() -> dict[str, bytes]:
    """Give our own fonts by their path in the client's assets."""
    return {
        f"fonts/{path.name}": path.read_bytes()
        for path in sorted((ASSETS / "fonts").glob("*"))
        if path.suffix in {".ttf", ".otf"}
    }


def _glyph_names(icon: str) -> list[str]:
    name = icon.lower()
    return [name, f"{name}_baseline", f"_{name}", f"_{name}_baseline"]
