"""Where sag is read: from the seal to the O-ring, on the fork's tube and on the shock's shaft."""

import flet as ft

from mobileapp import theme
from mobileapp.pictures.pen import WIDTH, arrow, box, dot, line, picture

_HEIGHT = 132
_AXIS = 66  # of both, from the top


def o_ring_on_fork(label: str) -> ft.Control:
    """A fork leg lying on its side: crown, tube, O-ring, seal, lower leg, axle."""
    return picture(
        label,
        _HEIGHT,
        [
            box((0, _AXIS - 30), (28, 60), theme.QUIET),
            box((28, _AXIS - 18), (132, 36), theme.PAPER),
            box((160, _AXIS - 26), (96, 52), theme.QUIET),
            dot((258, _AXIS), 16, theme.INK),
            dot((258, _AXIS), 6, theme.PAPER),
            _seal(160),
            _ring(96),
            _reading(96, 158),
        ],
    )


def o_ring_on_shock(label: str) -> ft.Control:
    """A shock lying on its side: eye, body, seal, O-ring, shaft, eye."""
    return picture(
        label,
        _HEIGHT,
        [
            dot((14, _AXIS), 14, theme.INK),
            dot((14, _AXIS), 5, theme.PAPER),
            box((26, _AXIS - 30), (114, 60), theme.QUIET),
            box((140, _AXIS - 14), (112, 28), theme.PAPER),
            dot((WIDTH - 14, _AXIS), 14, theme.INK),
            dot((WIDTH - 14, _AXIS), 5, theme.PAPER),
            _seal(132),
            _ring(196),
            _reading(142, 196),
        ],
    )


def _seal(at: float) -> list:
    return box((at, _AXIS - 34), (10, 68), theme.INK)


def _ring(at: float) -> list:
    return box((at - 5, _AXIS - 26), (10, 52), theme.ACCENT, theme.ACCENT, 5)


def _reading(left: float, right: float) -> list:
    """The length to read, below, with a line down from either end."""
    level = _AXIS + 54
    return [
        *line((left, _AXIS + 34), (left, level + 8), theme.ACCENT),
        *line((right, _AXIS + 38), (right, level + 8), theme.ACCENT),
        *arrow((left, level), (right, level), both=True),
    ]
