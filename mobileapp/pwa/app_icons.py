"""The app's icons, all drawn from assets/icon.svg."""

from dataclasses import dataclass

from resvg_py import svg_to_bytes

from mobileapp.pwa.paths import ASSETS

PETROL = "#004D4A"
DRAWING = ASSETS / "icon.svg"


@dataclass(frozen=True)
class Icon:
    """One size of the icon.

    The drawing keeps to the inner 80 % that no mask may cut (W3C Web Application Manifest,
    "maskable"), and its ground fills the square, so the same picture serves both purposes.
    """

    path: str
    pixels: int
    purpose: str


ICONS = (
    Icon("icons/icon-192.png", 192, "any"),
    Icon("icons/icon-512.png", 512, "any"),
    Icon("icons/maskable-192.png", 192, "maskable"),
    Icon("icons/maskable-512.png", 512, "maskable"),
)

# Not in the manifest: what iOS puts on the home screen, and the browser's tab.
_OTHERS = (Icon("icons/apple-touch-180.png", 180, "any"),)


def app_icons() -> dict[str, bytes]:
    """Draw all icons; contents by path."""
    drawing = DRAWING.read_text(encoding="utf-8")
    icons = {
        icon.path: bytes(svg_to_bytes(svg_string=drawing, width=icon.pixels, height=icon.pixels))
        for icon in (*ICONS, *_OTHERS)
    }
    icons["icons/icon.svg"] = DRAWING.read_bytes()
    return icons
