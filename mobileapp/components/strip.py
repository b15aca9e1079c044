"""The strip of beats: each tap where it fell in time, each missed beat where it was due.

Kinds differ by shape and are named below: a disc was used, a ring got the rider going, a cross is
missing, a square came twice, a triangle fell off the beat.
"""

from collections.abc import Mapping, Sequence
from typing import TYPE_CHECKING, Final

import flet as ft

from mobileapp import theme

if TYPE_CHECKING:  # it needs numpy, which arrives after the first paint
    from mobileapp.results.bounce import Kind, Mark

_HEIGHT: Final = 36
_SIGNS: Final[Mapping["Kind", tuple[ft.IconData, int]]] = {
    "used": (ft.Icons.CIRCLE, 20),
    "warm_up": (ft.Icons.CIRCLE_OUTLINED, 20),
    "missed": (ft.Icons.CLOSE, 24),
    "doubled": (ft.Icons.STOP, 24),
    "outlier": (ft.Icons.CHANGE_HISTORY, 22),
}


def strip(marks: Sequence["Mark"], counts: Mapping["Kind", str], label: str) -> ft.Control:
    """Draw the beats.

    Args:
        marks: taps and missed beats.
        counts: how many of each kind there are, in words.
        label: the same in one sentence, for those who don't see it.
    """
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
                    controls=[
                        ft.Container(
                            alignment=ft.Alignment.CENTER,
                            left=0,
                            right=0,
                            height=_HEIGHT,
                            content=ft.Container(height=2, bgcolor=theme.LINE),
                        ),
                        *[_mark(mark) for mark in marks],
                    ],
                ),
                ft.Row(
                    wrap=True,
                    spacing=theme.MARGIN,
                    run_spacing=0,
                    controls=[
                        ft.Row(
                            key=kind,
                            tight=True,
                            spacing=4,
                            controls=[
                                _sign(kind),
                                ft.Text(words, size=theme.SMALL, color=theme.QUIET),
                            ],
                        )
                        for kind, words in counts.items()
                    ],
                ),
            ],
        ),
    )


def _mark(mark: "Mark") -> ft.Control:
    return ft.Container(
        key=mark.key,
        left=0,
        right=0,
        height=_HEIGHT,
        alignment=ft.Alignment(2 * mark.place - 1, 0),
        content=_sign(mark.kind),
    )


def _sign(kind: "Kind") -> ft.Control:
    icon, size = _SIGNS[kind]
    return ft.Icon(icon, size=size, color=theme.ALARM if kind == "missed" else theme.INK)
