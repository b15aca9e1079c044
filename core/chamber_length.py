"""How long a positive chamber is, from two pressures and the sag at each.

Tempting, and ill-conditioned: a wrong idea of the negative chamber, or a millimetre's error in a
reading, and the answer is far off or doesn't exist. So it is only believed where the readings bear
it. Otherwise one more small step from the latest reading does as well (`core.pressure_change`).
"""

from dataclasses import replace
from typing import Final

import numpy as np

from core.air_spring import AREA_RATIOS, NEAR_END, Chambers
from core.checks import Quantity, finite, positive, require
from core.constants import STANDARD_PRESSURE
from core.errors import NoSolutionError
from core.geometry import WheelPath

BELIEVABLE: Final = (1.05, 4.0)  # [-] L per full stroke; outside, a reading is at fault
LEAST_CHANGE: Final = 0.15  # [-] of the pressure; with less, the readings' errors decide
LONGEST: Final = 1000.0  # [-] L per stroke; beyond, the chamber might as well be endless


def chamber_length(
    first_pressure: Quantity,
    second_pressure: Quantity,
    first_stroke: Quantity,
    second_stroke: Quantity,
    *,
    negative_length: Quantity,
    area_ratio: Quantity = 1.0,
    leverage_ratio: Quantity = 1.0,
    ambient: Quantity = STANDARD_PRESSURE,
) -> Quantity:
    """Return the length of the positive chamber that explains two readings under one load.

    P₁ g(s₁) − B = λ (P₂ g(s₂) − B),  g(s) = 1/(1 − s/L) − r/(1 + s/Ln),  B = (1 − r) Pₐ

    with absolute pressures P, which is quadratic in L. The chambers are taken as joined at full
    extension.

    Args:
        first_pressure: on the gauge [Pa], positive.
        second_pressure: on the gauge [Pa], positive.
        first_stroke: s₁, of the shaft as read at the first pressure [m], positive.
        second_stroke: s₂, at the second one [m], positive.
        negative_length: Ln [m], positive.
        area_ratio: r [-], 0.5 to 1.
        leverage_ratio: λ = φ(s₁)/φ(s₂) [-], positive.
        ambient: Pₐ, outside [Pa], positive.

    Returns:
        L [m], shapes broadcast.

    Raises:
        InvalidInputError: a quantity isn't finite or is outside its range.
        NoSolutionError: code ``no_chamber`` where no length explains the readings, or two do.

    Source: equal load of an isothermal spring at both readings.
    """
    low, high = AREA_RATIOS
    within = np.less_equal(low, finite("area_ratio", area_ratio)) & np.less_equal(area_ratio, high)
    require(within, "area_ratio", "area_ratio")
    ambient, negative = positive("ambient", ambient), positive("negative_length", negative_length)
    ratio = positive("leverage_ratio", leverage_ratio)
    s1, s2 = positive("first_stroke", first_stroke), positive("second_stroke", second_stroke)
    p1 = positive("first_pressure", first_pressure) + ambient
    p2 = ratio * (positive("second_pressure", second_pressure) + ambient)
    rest = p1 * area_ratio / (1.0 + s1 / negative) - p2 * area_ratio / (1.0 + s2 / negative)
    rest = rest + (1.0 - area_ratio) * ambient * (1.0 - ratio)
    # p1 L/(L − s1) − p2 L/(L − s2) = rest, times (L − s1)(L − s2):
    square, linear = p1 - p2 - rest, p2 * s1 - p1 * s2 + rest * (s1 + s2)
    constant = -rest * s1 * s2
    inner = linear**2 - 4.0 * square * constant
    require(np.greater_equal(inner, 0.0), "no_chamber", None, NoSolutionError)
    middle = -(linear + np.copysign(np.sqrt(inner), linear)) / 2.0
    deeper = np.maximum(s1, s2)
    roots = [
        _admissible(numerator, denominator, deeper)
        for numerator, denominator in ((middle, square), (constant, middle))
    ]
    one = np.isfinite(roots[0]) ^ np.isfinite(roots[1])
    require(one, "no_chamber", None, NoSolutionError)
    length: Quantity = np.where(np.isfinite(roots[0]), *roots)[()]
    return length


def chambers_from_readings(
    assumed: Chambers,
    path: WheelPath,
    pressures: tuple[float, float],
    strokes: tuple[float, float],
    ambient: float = STANDARD_PRESSURE,
) -> Chambers:
    """Return chambers whose length two readings tell, where it can be believed.

    Args:
        assumed: what is assumed of the rest, `core.unknown.common_chambers` for want of better.
        path: of the wheel.
        pressures: on the gauge, at the two readings [Pa].
        strokes: of the shaft, as read at them [m].
        ambient: outside [Pa].

    Returns:
        The assumed chambers with the positive one's length as it follows, joined at full extension.

    Raises:
        InvalidInputError: a quantity isn't finite or is outside its range.
        NoSolutionError: code ``readings_too_close`` where the pressures differ by less than 15 %,
            ``no_chamber`` where the length doesn't exist or is not between 1.05 and 4 strokes.
    """
    lower, higher = sorted(float(positive("pressures", pressure)) for pressure in pressures)
    far = higher - lower > LEAST_CHANGE * lower
    require(far, "readings_too_close", "pressures", NoSolutionError)
    leverages = [path.leverage(stroke) for stroke in strokes]
    length = chamber_length(
        *pressures,
        *strokes,
        negative_length=assumed.negative_length,
        area_ratio=assumed.area_ratio,
        leverage_ratio=leverages[0] / leverages[1],
        ambient=ambient,
    )
    share = length / path.full_stroke
    low, high = BELIEVABLE
    believable = np.less(low, share) & np.less(share, high)
    require(believable, "no_chamber", "strokes", NoSolutionError)
    return replace(assumed, length=length, joined_at=0.0)


def _admissible(numerator: Quantity, denominator: Quantity, stroke: Quantity) -> Quantity:
    """Return a root numerator/denominator, or infinity where no chamber has that length."""
    numerator, denominator = np.broadcast_arrays(numerator, denominator)
    # Compared without dividing: the denominator may be nothing.
    length, divisor = numerator * np.sign(denominator), np.abs(denominator)
    fits = (length * NEAR_END > stroke * divisor) & (length < LONGEST * stroke * divisor)
    root: Quantity = np.where(fits, length / np.where(fits, divisor, 1.0), np.inf)
    return root
