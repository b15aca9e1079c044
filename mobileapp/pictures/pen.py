"""The few strokes that all drawings are made of, and the sheet they stand on."""

from collections.abc import Iterable
from itertools import chain
from typing import Final

import flet as ft
import flet.canvas as cv

from mobileapp import theme

Shapes = list[cv.Shape]

WIDTH: Final = 280  # fits the narrowest phone
FINE: Final = 2
BOLD: Final = 4
_HEAD: Final = 7  # of an arrow


def picture(label: str, height: int, shapes: Iterable[Shapes]) -> ft.Control:
    """Return a drawing, `WIDTH` wide, in the middle of its column.

    Args:
        label: the same in words, for those who don't see it.
        height: of the drawing.
        shapes: in the order they are drawn.
    """
    return ft.Semantics(
        label=label,
        image=True,
        container=True,
        content=ft.Row(
            alignment=ft.MainAxisAlignment.CENTER,
            controls=[cv.Canvas(width=WIDTH, height=height, shapes=list(chain(*shapes)))],
        ),
    )


def line(
    start: tuple[float, float],
    end: tuple[float, float],
    colour: ft.ColorValue = theme.INK,
    width: float = FINE,
    dashes: list[float] | None = None,
) -> Shapes:
    """A straight stroke."""
    return [cv.Line(*start, *end, paint=_stroke(colour, width, dashes))]


def curve(
    points: Iterable[tuple[float, float]],
    colour: ft.ColorValue = theme.INK,
    width: float = BOLD,
) -> Shapes:
    """A stroke through points that lie close together."""
    (first, *others) = points
    path = [cv.Path.MoveTo(*first), *[cv.Path.LineTo(*point) for point in others]]
    return [cv.Path(path, paint=_stroke(colour, width))]


def box(
    corner: tuple[float, float],
    size: tuple[float, float],
    fill: ft.ColorValue,
    edge: ft.ColorValue | None = theme.INK,
    radius: float = 4,
) -> Shapes:
    """A filled rectangle with an edge, or without one."""
    filled = cv.Rect(*corner, *size, border_radius=radius, paint=_fill(fill))
    if edge is None:
        return [filled]
    return [filled, cv.Rect(*corner, *size, border_radius=radius, paint=_stroke(edge, FINE))]


def dot(centre: tuple[float, float], radius: float, colour: ft.ColorValue = theme.ACCENT) -> Shapes:
    """A disc."""
    return [cv.Circle(*centre, radius, paint=_fill(colour))]


def arrow(
    start: tuple[float, float],
    end: tuple[float, float],
    colour: ft.ColorValue = theme.ACCENT,
    *,
    both: bool = False,
) -> Shapes:
    """An upright or level stroke with a head at its end, or at both."""
    heads = _head(start, end, colour) + (_head(end, start, colour) if both else [])
    return line(start, end, colour, BOLD) + heads


def _head(start: tuple[float, float], end: tuple[float, float], colour: ft.ColorValue) -> Shapes:
    (x1, y1), (x2, y2) = start, end
    back = _HEAD if (x1, y1) < (x2, y2) else -_HEAD
    sides = (
        [(x2 - _HEAD, y2 - back), (x2 + _HEAD, y2 - back)]
        if x1 == x2
        else [(x2 - back, y2 - _HEAD), (x2 - back, y2 + _HEAD)]
    )
    return curve([sides[0], end, sides[1]], colour)


def _fill(colour: ft.ColorValue) -> ft.Paint:
    return ft.Paint(color=colour, style=ft.PaintingStyle.FILL)


def _stroke(colour: ft.ColorValue, width: float, dashes: list[float] | None = None) -> ft.Paint:
    return ft.Paint(
        color=colour,
        style=ft.PaintingStyle.STROKE,
        stroke_width=width,
        stroke_cap=ft.StrokeCap.ROUND,
        stroke_join=ft.StrokeJoin.ROUND,
        stroke_dash_pattern=dashes,
    )
