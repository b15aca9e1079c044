"""Numbers as a person reads and types them."""

import math
from dataclasses import dataclass
from typing import Final

from mobileapp.units import UNITS

_MINUS: Final = "\N{MINUS SIGN}"
_LONGEST_NUMBER: Final = 12  # [characters]


class NotANumberError(ValueError):
    """A typed text that is no finite number."""


@dataclass(frozen=True)
class Reading:
    """A result ready for the screen.

    Attributes:
        value: the number alone, for large figures.
        unit: its unit.
        range: how sure it is: “± 0.7”, or “2.6 to 3.4” where it is lopsided; empty if exact.
    """

    value: str
    unit: str
    range: str = ""

    def __str__(self) -> str:
        """Return the whole of it on one line."""
        number = f"{self.value} {self.range}".strip()
        return f"{number} {self.unit}".strip()


def parse(text: str) -> float:
    """Return the number in a typed text; a decimal comma is as good as a point.

    Raises:
        NotANumberError: there is no finite number in it.
    """
    plain = text.strip().replace(",", ".").replace(_MINUS, "-").replace("_", "?")
    try:
        number = float(plain)
    except ValueError:
        number = math.nan
    if len(plain) > _LONGEST_NUMBER or not math.isfinite(number):
        raise NotANumberError(text)
    return number


def number(value: float, decimals: int, *, comma: bool = False) -> str:
    """Return a number with fixed decimals; negative decimals round to tens, hundreds."""
    rounded = round(value, decimals)
    text = f"{abs(rounded):.{max(decimals, 0)}f}"
    if rounded < 0:
        text = _MINUS + text
    return text.replace(".", ",") if comma else text


def typed(value: float, unit: str, *, comma: bool = False) -> str:
    """Return a typed value as it was typed, or as near as its unit's decimals show."""
    decimals = UNITS[unit].decimals
    if round(value, decimals) == value:
        text = f"{value:.{decimals}f}"
        text = text.rstrip("0").rstrip(".") if "." in text else text
    else:
        text = f"{value:.{decimals}f}"
    return text.replace(".", ",") if comma else text
