"""Units at the edge: what a person types and reads, and its size in SI.

A value stays as it was typed (`Amount`), so it comes back exactly in its own unit however often
it was shown in another one.
"""

import math
from dataclasses import dataclass
from typing import Final, Literal

from core import units as si
from core.constants import STANDARD_GRAVITY


@dataclass(frozen=True)
class Unit:
    """One unit and how it is stepped through by thumb.

    Attributes:
        symbol: as written after a number.
        size: in SI.
        step: change of one tap on a stepper, in this unit.
        decimals: of a value that has no ± to round by.
    """

    symbol: str
    size: float
    step: float
    decimals: int = 0


UNITS: Final = {
    unit.symbol: unit
    for unit in (
        Unit("mm", si.MM, 1.0, 1),
        Unit("in", si.INCH, 0.05, 2),
        Unit("m", 1.0, 0.1, 2),
        Unit("ft", 12 * si.INCH, 0.5, 1),
        Unit("psi", si.PSI, 1.0, 0),
        Unit("bar", si.BAR, 0.1, 1),
        Unit("N/mm", si.N_PER_MM, 1.0, 1),
        Unit("lbf/in", si.LBF_PER_INCH, 25.0, 0),
        Unit("kg", 1.0, 1.0, 0),
        Unit("lb", si.POUND, 1.0, 0),
        Unit("km/h", si.KMH, 1.0, 0),
        Unit("mph", si.MPH, 1.0, 0),
        Unit("m/s", 1.0, 0.5, 1),
        Unit("g", STANDARD_GRAVITY, 0.1, 1),
        Unit("°", si.DEGREE, 0.5, 1),
        Unit("%", 0.01, 1.0, 0),
        Unit("Hz", 1.0, 0.1, 1),
        Unit("s", 1.0, 0.1, 1),
        Unit("frames", 1.0, 1.0, 0),
        Unit("clicks", 1.0, 1.0, 0),
        Unit("", 1.0, 0.01, 2),
    )
}

_ON_GRID: Final = 1e-6  # [steps] nearer than this, a value is on the grid

Quantity = Literal["length", "distance", "pressure", "rate", "mass", "speed"]

# What a guide has in hand: metric tape and scales, but pumps in psi and coils in lbf/in.
SYSTEMS: Final[dict[str, dict[Quantity, str]]] = {
    "mixed": {
        "length": "mm",
        "distance": "m",
        "pressure": "psi",
        "rate": "lbf/in",
        "mass": "kg",
        "speed": "km/h",
    },
    "metric": {
        "length": "mm",
        "distance": "m",
        "pressure": "bar",
        "rate": "N/mm",
        "mass": "kg",
        "speed": "km/h",
    },
    "imperial": {
        "length": "in",
        "distance": "ft",
        "pressure": "psi",
        "rate": "lbf/in",
        "mass": "lb",
        "speed": "mph",
    },
}


@dataclass(frozen=True)
class Amount:
    """A value as it was typed.

    Attributes:
        value: the number.
        unit: a key of `UNITS`.
    """

    value: float
    unit: str

    @property
    def si(self) -> float:
        """The value in SI."""
        return self.value * UNITS[self.unit].size

    def value_in(self, unit: str) -> float:
        """Return the value in another unit; in its own, exactly as typed."""
        if unit == self.unit:
            return self.value
        return self.si / UNITS[unit].size


def step_from(amount: Amount, steps: int) -> Amount:
    """Return the value some steps further, on the unit's grid and not below zero."""
    step = UNITS[amount.unit].step
    places = amount.value / step
    # From between two grid points the first step goes to the next one.
    start = math.floor(places + _ON_GRID) if steps > 0 else math.ceil(places - _ON_GRID)
    return Amount(round(max(start + steps, 0) * step, 6), amount.unit)
