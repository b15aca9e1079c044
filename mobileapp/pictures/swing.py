"""Movement drawn over time: when to tap, and what an overshoot is."""

from math import cos, exp, pi

import flet as ft

from mobileapp import theme
from mobileapp.pictures.pen import WIDTH, arrow, curve, dot, line, picture

_FINENESS = 2  # [px] between two points of a curve


def when_to_tap(label: str) -> ft.Control:
    """A bounce, with a finger's dot at each of its bottoms."""
    middle, swing, period = 40, 26, 70

    def height(x: float) -> float:
        return middle - swing * cos(2 * pi * x / period)

    bottoms = [(x, height(x)) for x in (35, 105, 175, 245)]
    return picture(
        label,
        112,
        [
            curve([(x, height(x)) for x in range(0, WIDTH + 1, _FINENESS)], theme.INK),
            *[dot(bottom, 9) for bottom in bottoms],
            *[arrow((x, 108), (x, y + 16)) for x, y in bottoms],
        ],
    )


def release(label: str, *, damping_ratio: float = 0.4, push: float = 70.0) -> ft.Control:
    """A wheel let go: from the push up past the sag mark, over, and back to it."""
    mark, period, start = 60, 150, 30

    def height(x: float) -> float:
        angle = 2 * pi * (x - start) / period
        return mark + push * exp(-damping_ratio * angle) * cos(angle)

    return picture(
        label,
        140,
        [
            line((0, mark), (WIDTH, mark), theme.LINE, dashes=[6, 6]),
            curve([(0, mark + push), (start, mark + push)], theme.QUIET),
            curve([(x, height(x)) for x in range(start, WIDTH + 1, _FINENESS)], theme.INK),
            dot((start + period / 4, mark), 8),
            arrow((start + period / 2, mark), (start + period / 2, height(start + period / 2))),
            arrow((12, mark), (12, mark + push - 4), both=True),
        ],
    )
