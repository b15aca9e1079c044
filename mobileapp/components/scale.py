"""A result on a scale: its ± as a bar, its value as a disc, the wanted band behind."""

import flet as ft

from mobileapp import theme
from mobileapp.components.along import PARTS, along

_HEIGHT = 48  # [px]
_DISC = 22  # [px]


def scale(
    interval: tuple[float, float, float],
    band: tuple[float, float],
    ends: tuple[str, str],
    label: str,
) -> ft.Control:
    """Draw a result.

    Args:
        interval: low, value and high, from 0 at the left end to 1 at the right one [-].
        band: where it should lie, likewise.
        ends: what the left and the right end mean.
        label: the whole in words, for those who don't see it.
    """
    low, value, high = interval
    return ft.Semantics(
        label=label,
        image=True,
        container=True,
        exclude_semantics=True,
        content=ft.Column(
            spacing=4,
            controls=[
                ft.Stack(
                    height=_HEIGHT,
                    alignment=ft.Alignment.CENTER_LEFT,
                    controls=[
                        ft.Container(
                            height=_HEIGHT - 12,
                            bgcolor=theme.PAPER,
                            border=ft.Border.all(2, theme.LINE),
                            border_radius=8,
                        ),
                        _from_to(
                            *band,
                            ft.Container(
                                height=_HEIGHT - 16,
                                bgcolor=theme.BAND,
                                border=ft.Border.symmetric(
                                    horizontal=ft.BorderSide(0),
                                    vertical=ft.BorderSide(2, theme.ACCENT),
                                ),
                            ),
                        ),
                        _from_to(low, high, ft.Container(height=6, bgcolor=theme.INK)),
                        ft.Container(
                            left=0,
                            right=0,
                            height=_HEIGHT,
                            alignment=ft.Alignment(2 * min(max(value, 0.0), 1.0) - 1, 0),
                            content=ft.Container(
                                width=_DISC,
                                height=_DISC,
                                border_radius=_DISC / 2,
                                bgcolor=theme.INK,
                            ),
                        ),
                    ],
                ),
                ft.Row(
                    alignment=ft.MainAxisAlignment.SPACE_BETWEEN,
                    controls=[ft.Text(end, size=theme.SMALL, color=theme.QUIET) for end in ends],
                ),
            ],
        ),
    )


def _from_to(low: float, high: float, control: ft.Container) -> ft.Control:
    start, end = (round(min(max(place, 0.0), 1.0) * PARTS) for place in (low, high))
    return along(start, control, max(end - start, 1), PARTS - end)
