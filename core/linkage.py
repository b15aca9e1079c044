"""A rear linkage: how its leverage changes on the way, and what follows for stroke and travel."""

from dataclasses import dataclass
from typing import Final

import numpy as np

from core.checks import Quantity, finite, positive, require
from core.errors import Note
from core.geometry import within_travel

LEVERAGES: Final = (0.5, 6.0)  # [-] of anything one rides
PROGRESSIONS: Final = (-0.5, 0.6)  # [-] likewise
DISAGREEMENT: Final = 0.01  # [-] of the stroke; less is the maker's rounding


@dataclass(frozen=True)
class Linkage:
    """A rear linkage whose leverage changes linearly along the wheel's travel.

    φ(x) = φ₀ + b x,  b = (φ₁ − φ₀) / T

    Integrating ds = dx/φ gives the stroke, and from it everything as a function of the stroke:

    s = ln(φ(x)/φ₀) / b,  φ(s) = φ₀ exp(b s),  x(s) = φ₀ (exp(b s) − 1) / b

    with T the full wheel travel, φ₀ and φ₁ the leverage at its start and end.

    Attributes:
        travel: T, vertical [m].
        start: φ₀ [-], 0.5 to 6.
        end: φ₁ [-], 0.5 to 6.

    Raises:
        InvalidInputError: code ``not_finite``, ``not_positive`` or ``leverage``.

    Source: derived here; a leverage that is linear in wheel travel is the common first
    approximation of measured linkage curves (common practice, no source).
    """

    travel: Quantity
    start: Quantity
    end: Quantity

    def __post_init__(self) -> None:
        """Refuse what no bike has."""
        positive("travel", self.travel)
        for name, leverage in (("start", self.start), ("end", self.end)):
            finite(name, leverage)
            low, high = LEVERAGES
            within = np.less_equal(low, leverage) & np.less_equal(leverage, high)
            require(within, "leverage", name)

    @classmethod
    def from_stroke(cls, travel: Quantity, stroke: Quantity, progression: Quantity) -> "Linkage":
        """Return the linkage with a travel, a stroke and a progression.

        φ₀ = −(T/S) ln(1 − p)/p,  φ₁ = φ₀ (1 − p)

        with S the full stroke and p = (φ₀ − φ₁)/φ₀. T/S is the logarithmic mean of the two
        leverages; taking it for their arithmetic mean would miss the stroke by up to 2 %.

        Args:
            travel: T, vertical [m].
            stroke: S, of the shock [m].
            progression: p [-], −0.5 to 0.6; 0 for a constant leverage, negative for one that
                grows.

        Raises:
            InvalidInputError: code ``not_finite``, ``not_positive``, ``progression`` or
                ``leverage``.
        """
        positive("travel", travel)
        positive("stroke", stroke)
        finite("progression", progression)
        low, high = PROGRESSIONS
        within = np.less_equal(low, progression) & np.less_equal(progression, high)
        require(within, "progression", "progression")
        start = travel / stroke * _log1p_over(-progression)
        return cls(travel, start, start * (1.0 - progression))

    @property
    def leverage_slope(self) -> Quantity:
        """Slope b = dφ/dx [1/m], negative where the leverage falls towards the end."""
        return (self.end - self.start) / self.travel

    @property
    def full_stroke(self) -> Quantity:
        """The full shaft stroke, S = T ln(φ₁/φ₀) / (φ₁ − φ₀) [m]."""
        return self.travel / self.start * _log1p_over(self.end / self.start - 1.0)

    def wheel_travel(self, stroke: Quantity) -> Quantity:
        """Return the vertical wheel travel, x = φ₀ (exp(b s) − 1) / b.

        Args:
            stroke: s [m], 0 to the full stroke.

        Returns:
            x [m], shapes broadcast.

        Raises:
            InvalidInputError: code ``not_finite``, ``negative`` or ``beyond_travel``.
        """
        stroke = within_travel(stroke, self.full_stroke)
        return self.start * stroke * _expm1_over(self.leverage_slope * stroke)

    def shaft_stroke(self, travel: Quantity) -> Quantity:
        """Return the shaft stroke, s = ln(1 + b x/φ₀) / b.

        Args:
            travel: x, vertical [m], 0 to the full travel.

        Returns:
            s [m], shapes broadcast.

        Raises:
            InvalidInputError: code ``not_finite``, ``negative`` or ``beyond_travel``.
        """
        travel = within_travel(travel, self.travel)
        return travel / self.start * _log1p_over(self.leverage_slope * travel / self.start)

    def leverage(self, stroke: Quantity) -> Quantity:
        """Return the leverage, φ = φ₀ exp(b s).

        Args:
            stroke: s [m], 0 to the full stroke.

        Returns:
            φ [-], shapes broadcast.

        Raises:
            InvalidInputError: code ``not_finite``, ``negative`` or ``beyond_travel``.
        """
        stroke = within_travel(stroke, self.full_stroke)
        leverage: Quantity = self.start * np.exp(self.leverage_slope * stroke)
        return leverage


def stroke_disagreement(linkage: Linkage, stroke: float) -> Note | None:
    """Return what to say where a linkage doesn't have the stroke that is printed on its shock.

    `Linkage.from_stroke` makes one that has it.

    Args:
        linkage: of single numbers.
        stroke: printed on the shock [m].

    Returns:
        Note ``stroke_disagrees``, or None if they agree within 1 %.

    Raises:
        InvalidInputError: code ``not_finite`` or ``not_positive``.
    """
    positive("stroke", stroke)
    follows = float(linkage.full_stroke)
    if abs(follows / stroke - 1.0) <= DISAGREEMENT:
        return None
    return Note("stroke_disagrees", {"follows_m": follows, "printed_m": stroke})


def _expm1_over(exponent: Quantity) -> Quantity:
    """Return (exp(z) − 1)/z, 1 at z = 0."""
    tiny = np.abs(exponent) < _TINY
    ratio: Quantity = np.where(
        tiny, 1.0 + exponent / 2.0, np.expm1(exponent) / np.where(tiny, 1.0, exponent)
    )[()]
    return ratio


def _log1p_over(change: Quantity) -> Quantity:
    """Return ln(1 + z)/z, 1 at z = 0."""
    tiny = np.abs(change) < _TINY
    ratio: Quantity = np.where(
        tiny, 1.0 - change / 2.0, np.log1p(change) / np.where(tiny, 1.0, change)
    )[()]
    return ratio


_TINY: Final = 1e-8  # [-] below, the series' next term is lost in rounding
