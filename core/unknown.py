"""What to assume where nobody knows: parts with a spread that covers what is common.

None of the numbers here has a published source. They are common practice, or chosen wide enough to
hold what is on sale; each result that rests on them shows it in its ±.
"""

from dataclasses import dataclass
from math import inf, pi
from typing import Final

import numpy as np

from core.air_spring import AirSpring, Chambers
from core.checks import Quantity, finite, not_negative, positive, require
from core.constants import STANDARD_PRESSURE
from core.geometry import Fork
from core.linkage import Linkage
from core.parts import Part, as_measured
from core.springs import Spring
from core.uncertainty import Measured

HEAD_ANGLE: Final = Measured(65.0 * pi / 180.0, 1.5 * pi / 180.0)  # [rad]
PROGRESSION: Final = Measured(0.15, 0.07)  # [-] of a rear linkage
MEAN_LEVERAGE: Final = Measured(2.6, 0.2)  # [-] of a rear linkage
AIR_PRESSURE: Final = Measured(8e5, 2e5)  # [Pa] gauge; of a frequency it decides less than 1 %

# Limits between which anything is taken as equally likely, lengths by ratio.
LENGTH_SHARE: Final = (1.3, 2.0)  # [-] L per full stroke
NEGATIVE_SHARE: Final = (0.2, 1.0)  # [-] Ln per full stroke; matters most
AREA_RATIO: Final = (0.85, 1.0)  # [-] r
EXPONENT: Final = (1.2, 1.4)  # [-] n; conduction theory gives 1.32 to 1.39, mixing lowers it
JOINED_SHARE: Final = (0.0, 0.05)  # [-] sₚ per full stroke

STEEPNESS: Final = Measured(1.07, 0.16)  # [-] 1 for a coil, 0.8 to 1.4 for air with these chambers
STEEPNESSES: Final = (0.1, 10.0)  # [-] of any spring


@dataclass(frozen=True)
class PowerSpring(Spring):
    """A spring of which no more is known than how steep it is at its sag.

    F = A s^m

    Its frequency is √m times that of a coil without preload at the same sag, so m stands for all
    that a real spring's chambers, preload and exponent do there.

    Attributes:
        steepness: m, by how many per cent the force grows for one per cent of stroke [-], 0.1 to
            10.

    Raises:
        InvalidInputError: code ``not_finite`` or ``steepness``.
    """

    steepness: Quantity

    def __post_init__(self) -> None:
        """Refuse what is no spring."""
        finite("steepness", self.steepness)
        low, high = STEEPNESSES
        within = np.less_equal(low, self.steepness) & np.less_equal(self.steepness, high)
        require(within, "steepness", "steepness")

    @property
    def scale(self) -> float:
        """1: unknown, and of no matter."""
        return 1.0

    @property
    def offset(self) -> float:
        """No other force [N]."""
        return 0.0

    @property
    def exponent(self) -> float:
        """1 [-]: what quick movements add is part of the steepness."""
        return 1.0

    @property
    def end(self) -> float:
        """It has none [m]."""
        return inf

    def shape(self, stroke: Quantity) -> Quantity:
        """Return the shape, g = s^m.

        Args:
            stroke: s [m], at least 0.

        Returns:
            g, shapes broadcast.

        Raises:
            InvalidInputError: code ``not_finite``, ``negative`` or ``beyond_any_bike``.
        """
        shape: Quantity = np.power(not_negative("stroke", stroke), self.steepness)
        return shape

    def slope(self, stroke: Quantity) -> Quantity:
        """Return the shape's slope, g' = m s^(m − 1).

        Args:
            stroke: s [m], positive.

        Returns:
            g', shapes broadcast.

        Raises:
            InvalidInputError: code ``not_finite``, ``not_positive`` or ``beyond_any_bike``.
        """
        steep: Quantity = np.power(positive("stroke", stroke), self.steepness - 1.0)
        return self.steepness * steep


UNKNOWN_SPRING: Final = Part.of(PowerSpring, STEEPNESS)
"""A spring of which not even is known whether it is a coil or air."""


def common_chambers(stroke: float) -> Part[Chambers]:
    """Return the chambers of an air spring of which only the full stroke is known.

    Args:
        stroke: the full shaft stroke [m], positive.

    Raises:
        InvalidInputError: code ``not_finite`` or ``not_positive``.
    """
    positive("stroke", stroke)

    def build(*unit_normals: Quantity) -> Chambers:
        length, negative, ratio, exponent, joined = (_share(normal) for normal in unit_normals)
        return Chambers(
            stroke * _by_ratio(LENGTH_SHARE, length),
            stroke * _by_ratio(NEGATIVE_SHARE, negative),
            _between(AREA_RATIO, ratio),
            _between(EXPONENT, exponent),
            stroke * _between(JOINED_SHARE, joined),
        )

    return Part(build, (Measured(0.0, 1.0),) * 5)


def common_air_spring(
    stroke: float, pressure: Measured | float = AIR_PRESSURE, ambient: float = STANDARD_PRESSURE
) -> Part[AirSpring]:
    """Return an air spring of which only the full stroke is known, and perhaps the pressure.

    Args:
        stroke: the full shaft stroke [m], positive.
        pressure: on the gauge [Pa].
        ambient: pressure outside [Pa].

    Raises:
        InvalidInputError: code ``not_finite`` or ``not_positive``.
    """
    chambers = common_chambers(stroke)

    def build(pressure: Quantity, *unit_normals: Quantity) -> AirSpring:
        return AirSpring(chambers.build(*unit_normals), pressure, ambient=ambient)

    return Part(build, (as_measured(pressure), *chambers.readings))


def common_fork(travel: Measured | float, head_angle: Measured | float = HEAD_ANGLE) -> Part[Fork]:
    """Return a fork of which only the travel is known.

    Args:
        travel: as it is printed, along the steering axis [m].
        head_angle: from the horizontal [rad].

    Raises:
        InvalidInputError: code ``not_finite``.
    """
    return Part.of(Fork, travel, head_angle)


def common_linkage(
    travel: Measured | float,
    stroke: Measured | float | None = None,
    progression: Measured | float = PROGRESSION,
) -> Part[Linkage]:
    """Return a rear linkage of which only the travel, or travel and stroke, are known.

    Args:
        travel: of the wheel, vertical [m].
        stroke: of the shock [m]; with None, what is common for the travel.
        progression: (φ₀ − φ₁)/φ₀ [-].

    Raises:
        InvalidInputError: code ``not_finite``.
    """
    if stroke is not None:
        return Part.of(Linkage.from_stroke, travel, stroke, progression)

    def build(travel: Quantity, leverage: Quantity, progression: Quantity) -> Linkage:
        return Linkage.from_stroke(travel, travel / leverage, progression)

    return Part.of(build, travel, MEAN_LEVERAGE, progression)


def _share(normal: Quantity) -> Quantity:
    """Return the share of a normal distribution below a value; within 0.01, and never quite 1."""
    share: Quantity = 1.0 / (1.0 + np.exp(-1.702 * normal))
    return share


def _between(limits: tuple[float, float], share: Quantity) -> Quantity:
    """Return the number at a share of the way between limits."""
    return limits[0] + (limits[1] - limits[0]) * share


def _by_ratio(limits: tuple[float, float], share: Quantity) -> Quantity:
    """Return the number at a share of the way between the limits' logarithms."""
    return limits[0] * (limits[1] / limits[0]) ** share
