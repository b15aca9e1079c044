"""The look: an instrument for bright sun. Every colour, size and type size of the app is here.

Screens name colours by their part (`ft.Colors.PRIMARY`, …); this module says what the parts look
like in the sun and in the dark. Text has a contrast of at least 7:1, readings of at least 10:1.
"""

from dataclasses import dataclass
from typing import Final

import flet as ft


@dataclass(frozen=True)
class Palette:
    """The colours of one appearance, as #rrggbb.

    Attributes:
        paper: behind everything.
        card: behind what belongs together.
        ink: readings and headings.
        quiet: explanations.
        accent: what can be done; the one colour that calls.
        on_accent: on top of it.
        band: where a reading should lie.
        line: edges; never carries meaning alone.
        alarm: what is wrong.
    """

    paper: str
    card: str
    ink: str
    quiet: str
    accent: str
    on_accent: str
    band: str
    line: str
    alarm: str


SUN: Final = Palette(
    paper="#F7F5EF",
    card="#FFFFFF",
    ink="#14181A",
    quiet="#3B4244",
    accent="#004D4A",
    on_accent="#FFFFFF",
    band="#BFE0DA",
    line="#8C8A80",
    alarm="#7A1C00",
)
DARK: Final = Palette(
    paper="#0F1312",
    card="#1B2120",
    ink="#F5F3EC",
    quiet="#C9CFCC",
    accent="#7FD6CD",
    on_accent="#06201E",
    band="#173B38",
    line="#7C8683",
    alarm="#FFB59B",
)

# Parts of the palette by Flet's names for them, for use in screens.
PAPER: Final = ft.Colors.SURFACE
CARD: Final = ft.Colors.SURFACE_CONTAINER
INK: Final = ft.Colors.ON_SURFACE
QUIET: Final = ft.Colors.ON_SURFACE_VARIANT
ACCENT: Final = ft.Colors.PRIMARY
ON_ACCENT: Final = ft.Colors.ON_PRIMARY
BAND: Final = ft.Colors.PRIMARY_CONTAINER
LINE: Final = ft.Colors.OUTLINE
ALARM: Final = ft.Colors.ERROR

# Sizes, all in logical pixels:
MAIN_ACTION: Final = 72  # height of what the thumb does most, at least 64
TOUCH: Final = 56  # everything else that can be touched, at least 48
GAP: Final = 8  # between two things to touch
MARGIN: Final = 16
WIDEST: Final = 560  # of a column of text and controls
CORNER: Final = 14

# Type sizes, likewise:
HUGE: Final = 58  # "21.7" at 200 % still fits a screen 320 wide
LARGE: Final = 44
TITLE: Final = 22
BODY: Final = 18
SMALL: Final = 16

FONT: Final = "B612"


def theme(palette: Palette) -> ft.Theme:
    """Return Flet's theme for a palette."""
    return ft.Theme(
        font_family=FONT,
        color_scheme=ft.ColorScheme(
            primary=palette.accent,
            on_primary=palette.on_accent,
            primary_container=palette.band,
            on_primary_container=palette.ink,
            secondary=palette.accent,
            on_secondary=palette.on_accent,
            secondary_container=palette.band,
            on_secondary_container=palette.ink,
            surface=palette.paper,
            on_surface=palette.ink,
            on_surface_variant=palette.quiet,
            surface_container=palette.card,
            surface_container_low=palette.card,
            surface_container_high=palette.card,
            surface_container_highest=palette.card,
            outline=palette.line,
            outline_variant=palette.line,
            error=palette.alarm,
            on_error=palette.paper,
            inverse_surface=palette.ink,
            on_inverse_surface=palette.paper,
            inverse_primary=palette.band,
        ),
    )


def bold(size: float) -> ft.TextStyle:
    """Return the style of words on buttons, which don't take the theme's typeface by themselves."""
    return ft.TextStyle(size=size, weight=ft.FontWeight.BOLD, font_family=FONT)


def contrast(one: str, other: str) -> float:
    """Return the contrast ratio of two colours, 1 to 21.

    C = (L₁ + 0.05) / (L₂ + 0.05), with L₁ and L₂ the relative luminances, the lighter one first.

    Source: WCAG 2.2, definitions of contrast ratio and relative luminance.
    """
    lighter, darker = sorted((_luminance(one), _luminance(other)), reverse=True)
    return (lighter + 0.05) / (darker + 0.05)


def _luminance(colour: str) -> float:
    def linear(channel: int) -> float:
        share = channel / 255
        return share / 12.92 if share <= 0.04045 else ((share + 0.055) / 1.055) ** 2.4  # noqa: PLR2004 - sRGB's own numbers

    red, green, blue = (linear(int(colour[start : start + 2], 16)) for start in (1, 3, 5))
    return 0.2126 * red + 0.7152 * green + 0.0722 * blue
