"""How far the wheel moves when a spring's shaft does.

    rear, by linkage                      front, along the steering axis

       frame o──╮                               ╱ θ
                │ shaft stroke s               ╱←── shaft stroke s
       ─────────o── swing arm                 o
                o wheel travel x, vertical    wheel travel x = s sin θ, vertical

Both are a `WheelPath` (the rear one in `core.linkage`). Its variable is the shaft stroke, from
fully extended; the leverage is the wheel's movement per movement of the shaft, φ = dx/ds. A
hardtail's rear has no spring, so it has no path either.
"""

from dataclasses import dataclass
from math import pi
from typing import Final, Literal, Protocol, TypeAlias

import numpy as np

from core.checks import Quantity, bounded, finite, not_negative, positive, require

Place: TypeAlias = Literal["shaft", "wheel"]
"""Where a reading was taken: along the shaft, or vertically at the wheel."""

HEAD_ANGLES: Final = (55.0 * pi / 180.0, 80.0 * pi / 180.0)  # [rad] of anything one rides

ROUNDING: Final = 1e-9  # [-] of a full stroke, lost between wheel and shaft and back


class WheelPath(Protocol):
    """How shaft stroke and wheel travel belong together."""

    @property
    def full_stroke(self) -> Quantity:
        """The shaft stroke from fully extended to bottomed [m]."""

    @property
    def leverage_slope(self) -> Quantity:
        """How the leverage changes along the wheel's travel, dφ/dx [1/m]."""

    def wheel_travel(self, stroke: Quantity) -> Quantity:
        """Return the vertical wheel travel.

        Args:
            stroke: of the shaft [m], 0 to the full stroke.
        """

    def shaft_stroke(self, travel: Quantity) -> Quantity:
        """Return the shaft stroke, the inverse of `wheel_travel`.

        Args:
            travel: of the wheel, vertical [m].
        """

    def leverage(self, stroke: Quantity) -> Quantity:
        """Return the leverage φ = dx/ds [-].

        Args:
            stroke: of the shaft [m], 0 to the full stroke.
        """


@dataclass(frozen=True)
class Fork:
    """A telescopic fork.

    x = s sin θ,  φ = sin θ

    with θ the head angle from the horizontal. Taken as given: the frame keeps its pitch, the ground
    pushes straight up, no brake, no friction.

    Attributes:
        full_stroke: the fork's travel as it is printed, along the steering axis [m].
        head_angle: θ [rad], 55 to 80 degrees.

    Raises:
        InvalidInputError: code ``not_finite``, ``not_positive`` or ``head_angle``.

    Source: geometry; the force follows from it by virtual work.
    """

    full_stroke: Quantity
    head_angle: Quantity

    def __post_init__(self) -> None:
        """Refuse what no bike has."""
        positive("full_stroke", self.full_stroke)
        finite("head_angle", self.head_angle)
        low, high = HEAD_ANGLES
        within = np.less_equal(low, self.head_angle) & np.less_equal(self.head_angle, high)
        require(within, "head_angle", "head_angle")

    @property
    def leverage_slope(self) -> Quantity:
        """0 [1/m]: the leverage of a fork doesn't change."""
        return 0.0

    def wheel_travel(self, stroke: Quantity) -> Quantity:
        """Return the vertical wheel travel, x = s sin θ.

        Args:
            stroke: s along the steering axis [m], 0 to the full stroke.

        Returns:
            x [m], shapes broadcast.

        Raises:
            InvalidInputError: code ``not_finite``, ``negative`` or ``beyond_travel``.
        """
        travel: Quantity = within_travel(stroke, self.full_stroke) * np.sin(self.head_angle)
        return travel

    def shaft_stroke(self, travel: Quantity) -> Quantity:
        """Return the stroke along the steering axis, s = x / sin θ.

        Args:
            travel: x, vertical [m], 0 to where the full stroke takes the wheel.

        Returns:
            s [m], shapes broadcast.

        Raises:
            InvalidInputError: code ``not_finite``, ``negative`` or ``beyond_travel``.
        """
        stroke: Quantity = not_negative("travel", travel) / np.sin(self.head_angle)
        return within_travel(stroke, self.full_stroke)

    def leverage(self, stroke: Quantity) -> Quantity:
        """Return the leverage, φ = sin θ at any stroke.

        Args:
            stroke: along the steering axis [m], 0 to the full stroke.

        Returns:
            φ [-], shapes broadcast.

        Raises:
            InvalidInputError: code ``not_finite``, ``negative`` or ``beyond_travel``.
        """
        leverage: Quantity = np.sin(self.head_angle) + 0.0 * within_travel(stroke, self.full_stroke)
        return leverage


def to_shaft(path: WheelPath, reading: Quantity, place: Place) -> Quantity:
    """Return a reading as shaft stroke, wherever it was taken.

    Args:
        path: of the wheel.
        reading: how far it has sunk [m], at least 0.
        place: ``"shaft"`` or ``"wheel"``.

    Returns:
        s [m], shapes broadcast.

    Raises:
        InvalidInputError: code ``not_finite``, ``negative`` or ``beyond_travel``.
    """
    if place == "wheel":
        return path.shaft_stroke(reading)
    return within_travel(reading, path.full_stroke)


def from_shaft(path: WheelPath, stroke: Quantity, place: Place) -> Quantity:
    """Return a shaft stroke as it is read at a place, the inverse of `to_shaft`.

    Args:
        path: of the wheel.
        stroke: s [m], at least 0.
        place: ``"shaft"`` or ``"wheel"``.

    Returns:
        How far it has sunk there [m], shapes broadcast.

    Raises:
        InvalidInputError: code ``not_finite``, ``negative`` or ``beyond_travel``.
    """
    if place == "wheel":
        return path.wheel_travel(stroke)
    return within_travel(stroke, path.full_stroke)


def force_at_wheel(spring_force: Quantity, leverage: Quantity) -> Quantity:
    """Return the vertical force at the wheel, W = F / φ.

    Args:
        spring_force: F along the shaft [N].
        leverage: φ [-], positive.

    Returns:
        W [N], shapes broadcast.

    Raises:
        InvalidInputError: code ``not_finite``, ``not_positive`` or ``beyond_any_bike``.

    Source: virtual work, F ds = W dx.
    """
    return bounded("spring_force", spring_force) / positive("leverage", leverage)


def rate_at_wheel(
    spring_rate: Quantity, spring_force: Quantity, leverage: Quantity, leverage_slope: Quantity
) -> Quantity:
    """Return the vertical rate at the wheel.

    k_w = dW/dx = k/φ² − F b/φ²

    The second, geometric term is there even if the spring's rate is zero: a falling leverage makes
    the wheel stiffer by what the force is worth, about 4 % on a common linkage.

    Args:
        spring_rate: k along the shaft [N/m].
        spring_force: F along the shaft [N].
        leverage: φ [-], positive.
        leverage_slope: b = dφ/dx [1/m].

    Returns:
        k_w [N/m], shapes broadcast.

    Raises:
        InvalidInputError: code ``not_finite``, ``not_positive`` or ``beyond_any_bike``.

    Source: derivative of W = F/φ along the wheel's travel, with dF/dx = k/φ and dφ/dx = b.
    """
    geometric = bounded("spring_force", spring_force) * bounded("leverage_slope", leverage_slope)
    return (bounded("spring_rate", spring_rate) - geometric) / positive("leverage", leverage) ** 2


def within_travel(depth: Quantity, full: Quantity) -> Quantity:
    """Return a stroke or travel after checking that it lies between extended and bottomed.

    Args:
        depth: how far it has sunk [m], at least 0.
        full: the full stroke or travel [m].

    Returns:
        The depth as it came, a rounding error above the full stroke included.

    Raises:
        InvalidInputError: code ``not_finite``, ``negative`` or ``beyond_travel``.
    """
    not_negative("sag", depth)
    within = np.less_equal(depth, full * (1.0 + ROUNDING))
    require(within, "beyond_travel", "sag", full_m=full)
    return depth
