"""Sag without friction: settled from above, then let up from below.

load on the spring
  W + F ┤- - - - - - - - - - ●  let up from below: friction adds to the load
  W     ┤- - - - - - - ╱- - -
  W − F ┤- - - - - ●- - - - -   settled from above: friction carries a part
        └──────────┴────┴────┴──> sag

One reading alone lies anywhere between the two; friction is what keeps it there.
"""

from dataclasses import dataclass
from math import sqrt
from typing import Final

from core.checks import Quantity, not_negative, positive, require
from core.errors import Note
from core.geometry import Place, WheelPath, from_shaft, to_shaft
from core.parts import Part, propagate_parts
from core.springs import Spring, stroke_under, wheel_load
from core.uncertainty import Estimate, Measured
from core.unknown import UNKNOWN_SPRING

HIGH_FRICTION: Final = 0.2  # [-] of the load; above, one reading says little; common practice


@dataclass(frozen=True)
class TwoSided:
    """Sag without friction, and the friction.

    Attributes:
        sag: at which the load would rest without friction, where the readings were taken [m].
        friction: as a share of the load [-]; its interval may reach below zero.
        notes: what a person should know about it.
    """

    sag: Estimate
    friction: Estimate
    notes: tuple[Note, ...] = ()


def two_sided_sag(
    path: WheelPath | Part[WheelPath],
    settled: Measured,
    let_up: Measured,
    place: Place = "shaft",
    spring: Spring | Part[Spring] = UNKNOWN_SPRING,
) -> TwoSided:
    """Return friction and friction-free sag from two readings.

    W₁ = W − F,  W₂ = W + F  ⇒  W = (W₁ + W₂)/2,  F/W = (W₂ − W₁)/(W₂ + W₁)

    with W₁ and W₂ what the spring carries at the two readings, F the friction at the wheel. For a
    coil without preload on a constant leverage the friction-free sag is the mean of the two. What
    isn't known of the spring matters little for the sag and more for the friction.

    Args:
        path: of the wheel.
        settled: sag after settling in gently from above [m], the smaller one.
        let_up: sag after pushing down and letting up gently [m].
        place: where both were read.
        spring: if nothing is known of it, the intervals allow for all common ones.

    Raises:
        InvalidInputError: code ``sag_swapped`` if the first reading is the larger one, or a
            reading is outside its range.
        NoSolutionError: code ``topped_out`` or ``too_uncertain``.
    """
    require(settled.value <= let_up.value, "sag_swapped", "settled")

    def rest(
        spring: Spring, path: WheelPath, above: Quantity, below: Quantity
    ) -> tuple[Quantity, Quantity]:
        low, high = (
            wheel_load(spring, path, to_shaft(path, positive("sag", reading), place))
            for reading in (above, below)
        )
        stroke = stroke_under(spring, path, (low + high) / 2.0)
        return from_shaft(path, stroke, place), (high - low) / (high + low)

    sag, friction = propagate_parts(rest, spring, path, settled, let_up)
    notes = (Note("high_friction"),) if friction.value > HIGH_FRICTION else ()
    return TwoSided(sag, friction, notes)


def one_sided_sd(settled: Quantity, let_up: Quantity) -> Quantity:
    """Return how far a single reading may be off where friction holds a bike between two limits.

    sd = (x₂ − x₁) / (2 √3), of a uniform distribution (JCGM 100:2008, 4.3.7)

    Args:
        settled: x₁, the smaller sag [m].
        let_up: x₂, the larger one [m].

    Returns:
        Standard deviation [m], shapes broadcast.

    Raises:
        InvalidInputError: code ``not_finite``, ``negative`` or ``sag_swapped``.
    """
    band = not_negative("let_up", let_up) - not_negative("settled", settled)
    require(band >= 0.0, "sag_swapped", "settled")
    return band / (2.0 * sqrt(3.0))
