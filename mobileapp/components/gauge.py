"""Sag drawn as it is read: a shaft out of its seal, the usual band on it, the O-ring's place."""

import flet as ft

from mobileapp import theme
from mobileapp.components.along import PARTS, along

_SCALE = 0.5  # [-] share of travel at the far end; sag beyond it is no setup
_SHAFT = 44  # [px]
_RING = 12  # [px]


def gauge(share: float, band: tuple[float, float], label: str) -> ft.Control:
    """Draw sag.

    Args:
        share: sag as a share of travel [-].
        band: the usual band, likewise.
        label: the same in words, for those who don't see it.
    """
    low, high = (_parts(edge) for edge in band)
    ring = _parts(share)
    return ft.Semantics(
        label=label,
        image=True,
        container=True,
        exclude_semantics=True,
        content=ft.Row(
            spacing=0,
            vertical_alignment=ft.CrossAxisAlignment.CENTER,
            controls=[
                # the seal that the O-ring was pushed against
                ft.Container(width=16, height=_SHAFT + 20, bgcolor=theme.INK, border_radius=4),
                ft.Stack(
                    expand=True,
                    height=_SHAFT + 20,
                    alignment=ft.Alignment.CENTER_LEFT,
                    controls=[
                        ft.Container(
                            height=_SHAFT,
                            bgcolor=theme.PAPER,
                            border=ft.Border.all(2, theme.LINE),
                            border_radius=ft.BorderRadius.only(top_right=8, bottom_right=8),
                        ),
                        along(
                            low,
                            ft.Container(
                                height=_SHAFT - 4,
                                bgcolor=theme.BAND,
                                border=ft.Border.symmetric(
                                    horizontal=ft.BorderSide(0),
                                    vertical=ft.BorderSide(2, theme.ACCENT),
                                ),
                            ),
                            high - low,
                            PARTS - high,
                        ),
                        along(
                            ring,
                            ft.Container(
                                width=_RING,
                                height=_SHAFT + 16,
                                bgcolor=theme.INK,
                                border_radius=_RING / 2,
                            ),
                            0,
                            PARTS - ring,
                        ),
                    ],
                ),
            ],
        ),
    )


def _parts(share: float) -> int:
    return round(min(share / _SCALE, 1.0) * PARTS)
