"""Coil springs: marked, preloaded, and unmarked."""

from dataclasses import dataclass
from math import inf
from typing import Final

import numpy as np

from core.checks import Quantity, not_negative, positive, require
from core.springs import Spring
from core.uncertainty import Estimate, Measured, propagate

# Shear moduli from memory: chrome silicon, of which most coils are; music wire has 79 to 82 GPa,
# titanium 41 to 44 GPa.
CHROME_SILICON: Final = Measured(77e9, 0.02 * 77e9)  # [Pa]

# How well calipers and an eye read a coil that sits on a shock; common practice, no source.
WIRE_SD: Final = 0.05e-3  # [m]
DIAMETER_SD: Final = 0.5e-3  # [m]
COILS_SD: Final = 0.25  # [-] where a coil leaves its seat is hard to see

SLIMMEST: Final = 2.0  # [-] mean diameter per wire; a tighter coil can't be wound


@dataclass(frozen=True)
class Coil(Spring):
    """A coil spring with preload.

    F = k (s + p)

    so the scale is k and the shape s + p.

    Attributes:
        spring_rate: k [N/m], positive.
        preload: p, how far the spring is compressed with the shaft extended [m], at least 0.
        free_stroke: shaft stroke at which its coils touch [m]; infinite if that is beyond the
            shock's own.

    Raises:
        InvalidInputError: code ``not_finite``, ``not_positive`` or ``negative``.
    """

    spring_rate: Quantity
    preload: Quantity = 0.0
    free_stroke: float = inf

    def __post_init__(self) -> None:
        """Refuse what is no spring."""
        positive("spring_rate", self.spring_rate)
        not_negative("preload", self.preload)
        require(self.free_stroke > 0.0, "not_positive", "free_stroke", name="free_stroke")

    @property
    def scale(self) -> Quantity:
        """The rate k [N/m]."""
        return self.spring_rate

    @property
    def offset(self) -> float:
        """No force but the spring's [N]."""
        return 0.0

    @property
    def exponent(self) -> float:
        """1 [-]: steel is as stiff for quick movements as for slow ones."""
        return 1.0

    @property
    def end(self) -> float:
        """The shaft stroke at which the coils touch [m]."""
        return self.free_stroke

    def shape(self, stroke: Quantity) -> Quantity:
        """Return the shape, g = s + p.

        Args:
            stroke: s [m], 0 to where the coils touch.

        Returns:
            g [m], shapes broadcast.

        Raises:
            InvalidInputError: code ``not_finite``, ``negative`` or ``coil_binds``.
        """
        return self._usable(stroke) + self.preload

    def slope(self, stroke: Quantity) -> Quantity:
        """Return the shape's slope, g' = 1.

        Args:
            stroke: s [m], 0 to where the coils touch.

        Returns:
            1 [-], shapes broadcast.

        Raises:
            InvalidInputError: code ``not_finite``, ``negative`` or ``coil_binds``.
        """
        return 1.0 + 0.0 * (self._usable(stroke) + self.preload)

    def _usable(self, stroke: Quantity) -> Quantity:
        """Return a stroke after checking that the coils don't touch."""
        not_negative("stroke", stroke)
        require(np.less_equal(stroke, self.free_stroke), "coil_binds", "stroke")
        return stroke


def coil_rate(
    shear_modulus: Quantity, wire: Quantity, mean_diameter: Quantity, active_coils: Quantity
) -> Quantity:
    """Return the rate of a coil spring from its dimensions.

    k = G d⁴ / (8 D³ n)

    Args:
        shear_modulus: G [Pa].
        wire: d, diameter of the wire [m].
        mean_diameter: D, outer diameter less one wire [m], more than two wires.
        active_coils: n, coils that don't rest on the seats [-].

    Returns:
        k [N/m], shapes broadcast.

    Raises:
        InvalidInputError: code ``not_finite``, ``not_positive`` or ``coil_shape``.

    Source: standard law of helical springs, e.g. Shigley's Mechanical Engineering Design, chapter
    on springs (from memory). Its curvature correction, 3 % at D/d = 4, isn't applied: makers mark
    their springs by this law.
    """
    positive("shear_modulus", shear_modulus)
    positive("wire", wire)
    positive("mean_diameter", mean_diameter)
    positive("active_coils", active_coils)
    require(np.greater(mean_diameter, SLIMMEST * wire), "coil_shape", "mean_diameter")
    return shear_modulus * wire**4 / (8.0 * mean_diameter**3 * active_coils)


def unmarked_coil(
    wire: float, mean_diameter: float, active_coils: float, shear_modulus: Measured = CHROME_SILICON
) -> Estimate:
    """Return the rate of an unmarked coil, with what calipers and a count leave open.

    About ±12 % in all: too much to tell neighbouring 25 or 50 lbf/in steps apart. A coil of known
    rate does better.

    Args:
        wire: d, diameter of the wire without its paint [m].
        mean_diameter: D, outer diameter less one wire [m].
        active_coils: n, coils that don't rest on the seats [-].
        shear_modulus: G [Pa].

    Returns:
        k [N/m].

    Raises:
        InvalidInputError: as `coil_rate`.
    """
    return propagate(
        coil_rate,
        shear_modulus,
        Measured(wire, WIRE_SD),
        Measured(mean_diameter, DIAMETER_SD),
        Measured(active_coils, COILS_SD),
    )
