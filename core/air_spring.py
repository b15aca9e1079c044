"""Air springs with a negative chamber that fills itself from the positive one.

        ┌───────────────────────────┬───────────────┐
        │ positive, A (L − s)       │ negative,     │
        │                    piston │ r A (Ln + s)  ├─ shaft, stroke s to the left
        └───────────────────────────┴───────────────┘

Near full extension a port joins the two chambers and makes them equal. Static states are
isothermal, because the air has time to give its heat away; vibrations are polytropic.
"""

from dataclasses import dataclass
from typing import Final

import numpy as np

from core.checks import Quantity, finite, not_negative, positive, require
from core.constants import STANDARD_PRESSURE
from core.springs import Spring

NEAR_END: Final = 0.95  # [-] of the chamber's length; beyond, leftovers that the model lacks rule
EXPONENTS: Final = (1.0, 1.4)  # [-] isothermal to adiabatic, of two-atomic gases
AREA_RATIOS: Final = (0.5, 1.0)  # [-] of anything built


@dataclass(frozen=True)
class Chambers:
    """How an air spring is built: everything but its pressure and its bore.

    g(s) = 1/(1 − s/L) − ρ/(1 + s/Ln)

    g'(s) = 1/(L (1 − s/L)²) + ρ/(Ln (1 + s/Ln)²)

    ρ = r (1 + sₚ/Ln)/(1 − sₚ/L)

    With ρ < 1 the spring pushes even when extended, with ρ > 1 it sinks in a little under no load
    at all. Air that is sealed in a fork's lower legs isn't part of the model.

    Attributes:
        length: L, volume of the positive chamber per area of the piston [m].
        negative_length: Ln, likewise of the negative chamber per its own area [m].
        area_ratio: r, area of the negative side, which lacks the rod's, per that of the piston
            [-], 0.5 to 1.
        exponent: n of quick changes of state [-], 1 to 1.4.
        joined_at: sₚ, shaft stroke at which the port joins the chambers [m], 0 to L/4.

    Raises:
        InvalidInputError: code ``not_finite``, ``not_positive``, ``negative``, ``area_ratio``,
            ``exponent`` or ``joined_at``.

    Source: derived here from Boyle's law for both chambers, equal at sₚ.
    """

    length: Quantity
    negative_length: Quantity
    area_ratio: Quantity = 1.0
    exponent: Quantity = 1.3
    joined_at: Quantity = 0.0

    def __post_init__(self) -> None:
        """Refuse what can't be built."""
        positive("length", self.length)
        positive("negative_length", self.negative_length)
        finite("area_ratio", self.area_ratio)
        finite("exponent", self.exponent)
        for code, value, (low, high) in (
            ("area_ratio", self.area_ratio, AREA_RATIOS),
            ("exponent", self.exponent, EXPONENTS),
        ):
            require(np.less_equal(low, value) & np.less_equal(value, high), code, code)
        not_negative("joined_at", self.joined_at)
        require(np.less_equal(self.joined_at, self.length / 4.0), "joined_at", "joined_at")

    @property
    def end(self) -> Quantity:
        """The shaft stroke at which the model ends [m]."""
        return NEAR_END * self.length

    @property
    def negative_filling(self) -> Quantity:
        """The force of the negative chamber per that of the positive one, extended: ρ [-]."""
        fuller = 1.0 + self.joined_at / self.negative_length
        return self.area_ratio * fuller / (1.0 - self.joined_at / self.length)

    def shape(self, stroke: Quantity) -> Quantity:
        """Return g, the force per piston area and filling pressure.

        Args:
            stroke: s [m], 0 to `end`.

        Returns:
            g [-], 1 − ρ or more, shapes broadcast.

        Raises:
            InvalidInputError: code ``not_finite``, ``negative`` or ``air_end``.
        """
        squeezed, drawn = self._volume_ratios(stroke)
        return 1.0 / squeezed - self.negative_filling / drawn

    def slope(self, stroke: Quantity) -> Quantity:
        """Return g', the rate per piston area and filling pressure.

        Args:
            stroke: s [m], 0 to `end`.

        Returns:
            g' [1/m], shapes broadcast.

        Raises:
            InvalidInputError: code ``not_finite``, ``negative`` or ``air_end``.
        """
        squeezed, drawn = self._volume_ratios(stroke)
        negative_side = self.negative_filling / (self.negative_length * drawn**2)
        return 1.0 / (self.length * squeezed**2) + negative_side

    def _volume_ratios(self, stroke: Quantity) -> tuple[Quantity, Quantity]:
        """Return both chambers' volumes as shares of those at full extension."""
        not_negative("stroke", stroke)
        require(np.less_equal(stroke, self.end), "air_end", "stroke")
        return 1.0 - stroke / self.length, 1.0 + stroke / self.negative_length


@dataclass(frozen=True)
class AirSpring(Spring):
    """An air spring at a pressure.

    F = A [(P + P_a) g(s) − (1 − r) P_a]

    with P_a the pressure of the air outside, which pushes on the rod's share of the piston.

    Attributes:
        chambers: how it is built.
        pressure: P, on the gauge, with the shaft extended [Pa].
        area: A of the piston [m²]; leave it at 1 where only ratios of forces matter.
        ambient: P_a [Pa]; see `core.atmosphere.pressure_at`.

    Raises:
        InvalidInputError: code ``not_finite`` or ``not_positive``.
    """

    chambers: Chambers
    pressure: Quantity
    area: Quantity = 1.0
    ambient: Quantity = STANDARD_PRESSURE

    def __post_init__(self) -> None:
        """Refuse what holds no air."""
        positive("pressure", self.pressure)
        positive("area", self.area)
        positive("ambient", self.ambient)

    @property
    def scale(self) -> Quantity:
        """The filling, A (P + P_a) [N]."""
        return self.area * (self.pressure + self.ambient)

    @property
    def offset(self) -> Quantity:
        """What the air outside pushes on the rod, A (1 − r) P_a [N]."""
        return self.area * (1.0 - self.chambers.area_ratio) * self.ambient

    @property
    def exponent(self) -> Quantity:
        """The polytropic exponent n [-].

        About an isothermal state each chamber follows P ∝ V⁻ⁿ, which makes each one's rate, and so
        their sum, exactly n times the isothermal one.
        """
        return self.chambers.exponent

    @property
    def end(self) -> Quantity:
        """The shaft stroke at which the model ends [m]."""
        return self.chambers.end

    def shape(self, stroke: Quantity) -> Quantity:
        """Return the shape g; see `Chambers.shape`.

        Args:
            stroke: s [m], 0 to `end`.

        Returns:
            g [-], shapes broadcast.

        Raises:
            InvalidInputError: code ``not_finite``, ``negative`` or ``air_end``.
        """
        return self.chambers.shape(stroke)

    def slope(self, stroke: Quantity) -> Quantity:
        """Return the shape's slope g'; see `Chambers.slope`.

        Args:
            stroke: s [m], 0 to `end`.

        Returns:
            g' [1/m], shapes broadcast.

        Raises:
            InvalidInputError: code ``not_finite``, ``negative`` or ``air_end``.
        """
        return self.chambers.slope(stroke)
