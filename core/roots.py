"""Where a rising function passes zero, for many functions at once."""

from collections.abc import Callable
from typing import Final

import numpy as np

from core.checks import FloatArray

_STEPS: Final = 60  # halvings alone leave 2⁻⁶⁰ of the bracket; Newton's method needs 4 to 8
_NEWTON_STEPS: Final = 12
_TOLERANCE: Final = 1e-13  # [-] of the bracket


def rising_root(
    function: Callable[[FloatArray], tuple[FloatArray, FloatArray]],
    low: FloatArray,
    high: FloatArray,
) -> FloatArray:
    """Return where a function passes zero from below.

    Newton's method, kept inside a bracket that shrinks with every step, by halves where a step
    would leave it.

    Args:
        function: takes an array of positions, returns its values and its slopes there.
        low: positions at which it is at most zero.
        high: positions at which it is at least zero, of the same shape.

    Returns:
        Positions between low and high, of the same shape.
    """
    position, close = (low + high) / 2.0, _TOLERANCE * (high - low)
    for step in range(_STEPS):
        value, slope = function(position)
        below = value < 0.0
        low, high = np.where(below, position, low), np.where(below, high, position)
        middle = (low + high) / 2.0
        rising = (slope > 0.0) & (step < _NEWTON_STEPS)
        newton = value / np.where(rising, slope, 1.0)
        proposed = np.where(rising, position - newton, middle)
        # A step within rounding may fall just out of the bracket: that is no reason to halve it.
        solved = np.abs(proposed - position) <= close
        if solved.all():
            break
        inside = (low < proposed) & (proposed < high)
        position = np.where(solved, position, np.where(inside, proposed, middle))
    return position
