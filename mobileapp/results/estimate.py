"""From an estimate in SI to a reading in a unit, rounded as its ± demands."""

from typing import Final

from core.uncertainty import Estimate, decimals_for
from mobileapp.format import Reading, number
from mobileapp.units import UNITS

# Above this, the two halves of an interval are too unequal for one ±.
_LOPSIDED: Final = 1.5  # [-]


def reading(
    estimate: Estimate, unit: str, *, comma: bool = False, most_decimals: int | None = None
) -> Reading:
    """Return an estimate as shown.

    Args:
        estimate: in SI.
        unit: key of `mobileapp.units.UNITS`.
        comma: whether decimals follow a comma.
        most_decimals: worth reading, however small the ±; it is left out if it shows no more.
    """
    shown = estimate.in_unit(UNITS[unit].size)
    decimals = decimals_for(shown)
    if decimals is not None and most_decimals is not None:
        decimals = min(decimals, most_decimals)
        if round(shown.low, decimals) == round(shown.high, decimals):
            return Reading(number(shown.value, decimals, comma=comma), unit)
    if decimals is None:
        return Reading(number(shown.value, UNITS[unit].decimals, comma=comma), unit)

    def text(value: float) -> str:
        return number(value, decimals, comma=comma)

    below, above = shown.value - shown.low, shown.high - shown.value
    if max(below, above) > _LOPSIDED * min(below, above):
        return Reading(text(shown.value), unit, f"({text(shown.low)} – {text(shown.high)})")
    return Reading(text(shown.value), unit, f"± {text(shown.half_width)}")
