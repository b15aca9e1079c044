"""A mass on a spring with a damper: how fast it swings, how far it overshoots, what it passes on.

One end of a bike is described by two numbers: its natural frequency f_n, and its damping ratio ζ
(0 swings for ever, 1 only just comes back without swinging). r is the ratio of a forcing
frequency to f_n. Everything here is linear; `core.rebound` and `core.trail` add friction and
dampers that differ in compression and rebound.

Source: S. S. Rao, "Mechanical Vibrations", chapters 2 and 3 (free and base-excited vibration), from
memory, recomputed.
"""

from math import pi
from typing import Final

import numpy as np

from core.checks import SMALLEST, FloatArray, Quantity, not_negative, positive, require
from core.constants import STANDARD_GRAVITY
from core.errors import NoSolutionError

TURN: Final = 2.0 * pi  # [rad]


def frequency_from_deflection(deflection: Quantity) -> Quantity:
    """Return the natural frequency of a mass that rests on a linear spring.

    f_n = √(g₀ / δ) / 2π

    δ deflection by the mass's own weight, g₀ standard gravity. No mass is needed: a heavier one
    deflects the spring more.

    Args:
        deflection: δ [m], positive.

    Returns:
        Frequency [Hz], same shape.

    Raises:
        InvalidInputError: a quantity isn't finite or isn't positive.
    """
    frequency: Quantity = np.sqrt(STANDARD_GRAVITY / positive("deflection", deflection)) / TURN
    return frequency


def deflection_from_frequency(frequency: Quantity) -> Quantity:
    """Return the static deflection of a linear spring, δ = g₀ / (2π f_n)².

    Args:
        frequency: f_n [Hz], positive.

    Returns:
        Deflection [m], same shape.

    Raises:
        InvalidInputError: a quantity isn't finite or isn't positive.
    """
    return STANDARD_GRAVITY / (TURN * positive("frequency", frequency)) ** 2


def frequency_from_stiffness(stiffness: Quantity, mass: Quantity) -> Quantity:
    """Return the undamped natural frequency, f_n = √(k / m) / 2π.

    Args:
        stiffness: k [N/m], positive.
        mass: m [kg], positive.

    Returns:
        Frequency [Hz], shapes broadcast.

    Raises:
        InvalidInputError: a quantity isn't finite or isn't positive.
    """
    ratio = positive("stiffness", stiffness) / positive("mass", mass)
    frequency: Quantity = np.sqrt(ratio) / TURN
    return frequency


def stiffness_from_frequency(frequency: Quantity, mass: Quantity) -> Quantity:
    """Return the stiffness under a mass that swings at a frequency, k = m (2π f_n)².

    Args:
        frequency: f_n, undamped [Hz], positive.
        mass: m [kg], positive.

    Returns:
        Stiffness [N/m], shapes broadcast.

    Raises:
        InvalidInputError: a quantity isn't finite or isn't positive.
    """
    return positive("mass", mass) * (TURN * positive("frequency", frequency)) ** 2


def damping_coefficient(damping_ratio: Quantity, frequency: Quantity, mass: Quantity) -> Quantity:
    """Return the damper's force per speed, c = 2 ζ m 2π f_n.

    Args:
        damping_ratio: ζ [-], at least 0.
        frequency: f_n, undamped [Hz], positive.
        mass: m [kg], positive.

    Returns:
        Damping coefficient [N s/m], shapes broadcast.

    Raises:
        InvalidInputError: a quantity isn't finite or is outside its range.
    """
    damping_ratio = not_negative("damping_ratio", damping_ratio)
    natural = TURN * positive("frequency", frequency)
    return 2.0 * damping_ratio * positive("mass", mass) * natural


def damped_frequency(frequency: Quantity, damping_ratio: Quantity) -> Quantity:
    """Return the frequency of free, decaying swings, f_d = f_n √(1 − ζ²).

    Args:
        frequency: f_n, undamped [Hz], positive.
        damping_ratio: ζ [-], 0 up to but not including 1.

    Returns:
        Frequency [Hz], shapes broadcast.

    Raises:
        InvalidInputError: a quantity isn't finite or is outside its range.
        NoSolutionError: code ``not_underdamped``: nothing swings.
    """
    return positive("frequency", frequency) * _damped_share(damping_ratio)


def undamped_frequency(frequency: Quantity, damping_ratio: Quantity) -> Quantity:
    """Return the undamped frequency behind swings that were timed, f_n = f_d / √(1 − ζ²).

    Args:
        frequency: f_d, of the decaying swings [Hz], positive.
        damping_ratio: ζ [-], 0 up to but not including 1.

    Returns:
        Frequency [Hz], shapes broadcast.

    Raises:
        InvalidInputError: a quantity isn't finite or is outside its range.
        NoSolutionError: code ``not_underdamped``: nothing swings.
    """
    return positive("frequency", frequency) / _damped_share(damping_ratio)


def overshoot_from_damping(damping_ratio: Quantity) -> Quantity:
    """Return how far a released mass overshoots, as a share of the push.

    R = exp(−π ζ / √(1 − ζ²))

    R is also the ratio of each half swing to the one before it, whatever the frequency.

    Args:
        damping_ratio: ζ [-], 0 up to but not including 1.

    Returns:
        Overshoot R [-], 1 down to 0, same shape.

    Raises:
        InvalidInputError: a quantity isn't finite or is outside its range.
        NoSolutionError: code ``not_underdamped``: nothing overshoots.
    """
    with np.errstate(under="ignore"):  # next to ζ = 1: zero is the answer
        overshoot: Quantity = np.exp(-pi * damping_ratio / _damped_share(damping_ratio))
    return overshoot


def damping_from_overshoot(overshoot: Quantity) -> Quantity:
    """Return the damping ratio from the overshoot, which needs neither clock nor frequency.

    ζ = −ln R / √(π² + ln² R), the inverse of `overshoot_from_damping`.

    Args:
        overshoot: R, overshoot as a share of the push [-], more than 0 and at most 1.

    Returns:
        Damping ratio [-], same shape.

    Raises:
        InvalidInputError: code ``not_finite`` or ``overshoot_range``.
    """
    within = np.less(0.0, overshoot) & np.less_equal(overshoot, 1.0)
    require(within, "overshoot_range", "overshoot")
    decay = np.abs(np.log(overshoot))
    damping_ratio: Quantity = decay / np.hypot(pi, decay)
    return damping_ratio


def logarithmic_decrement(damping_ratio: Quantity) -> Quantity:
    """Return the natural logarithm of the ratio of two successive swings, 2π ζ / √(1 − ζ²).

    Args:
        damping_ratio: ζ [-], 0 up to but not including 1.

    Returns:
        Logarithmic decrement [-], same shape.

    Raises:
        InvalidInputError: a quantity isn't finite or is outside its range.
        NoSolutionError: code ``not_underdamped``: nothing swings.
    """
    return TURN * damping_ratio / _damped_share(damping_ratio)


def free_response(time: Quantity, frequency: Quantity, damping_ratio: Quantity) -> Quantity:
    """Return the position after a release from rest, as a share of the push.

    h(t) = e^(−ζ ω t) [cos ω_d t + (ζ ω / ω_d) sin ω_d t], with ω = 2π f_n, ω_d = ω √(1 − ζ²)

    1 is where it was let go, 0 the sag mark, negative past it. For ζ > 1 the sine and cosine turn
    into their hyperbolic sisters; both forms meet at ζ = 1 in e^(−ω t) (1 + ω t).

    Args:
        time: t since the release [s], at least 0.
        frequency: f_n, undamped [Hz], positive.
        damping_ratio: ζ [-], at least 0.

    Returns:
        Position [-], between −1 and 1, shapes broadcast.

    Raises:
        InvalidInputError: a quantity isn't finite or is outside its range.
    """
    phase = TURN * positive("frequency", frequency) * not_negative("time", time)
    damping_ratio = not_negative("damping_ratio", damping_ratio)
    # Poles −ζ ± √(ζ² − 1), a complex pair when it swings. With the slower pole taken out in front
    # nothing overflows, and the quotient stays exact where the two poles meet.
    root = np.sqrt(np.asarray(damping_ratio, dtype=complex) ** 2 - 1.0)
    slow = -1.0 / (damping_ratio + root)
    spread = -2.0 * root * phase
    with np.errstate(under="ignore"):  # long settled: zero is the answer
        apart = np.abs(spread) > SMALLEST
        quotient = np.divide(np.expm1(spread), spread, out=np.ones_like(spread), where=apart)
        position = np.exp(slow * phase) * (1.0 - slow * phase * quotient)
    share: FloatArray = position.real
    return share[()]


def peak_after_impulse(
    speed: Quantity, frequency: Quantity, damping_ratio: Quantity
) -> tuple[Quantity, Quantity]:
    """Return how far a mass at rest on its spring goes when it is hit, and when it gets there.

    x = (v / ω) exp(−ζ a / √(1 − ζ²)) at t = a / (ω √(1 − ζ²)), with a = arccos ζ, ω = 2π f_n

    Args:
        speed: v, just after the hit [m/s], positive.
        frequency: f_n, undamped [Hz], positive.
        damping_ratio: ζ [-], 0 up to but not including 1.

    Returns:
        Displacement [m] and time [s], shapes broadcast.

    Raises:
        InvalidInputError: a quantity isn't finite or is outside its range.
        NoSolutionError: code ``not_underdamped``.
    """
    share = _damped_share(damping_ratio)
    natural = TURN * positive("frequency", frequency)
    angle = np.arccos(damping_ratio)
    peak = positive("speed", speed) / natural * np.exp(-damping_ratio * angle / share)
    return peak, angle / (natural * share)


def transmissibility(frequency_ratio: Quantity, damping_ratio: Quantity) -> Quantity:
    """Return how much of a wavy road reaches the sprung mass.

    T = √[(1 + (2 ζ r)²) / ((1 − r²)² + (2 ζ r)²)]

    1 at r = 0 and, whatever the damping, at r = √2, where filtering begins. Below √2 damping
    helps, above it hurts.

    Args:
        frequency_ratio: r, forcing over natural frequency [-], positive.
        damping_ratio: ζ [-], at least 0.

    Returns:
        Amplitude of the mass over amplitude of the road [-], shapes broadcast.

    Raises:
        InvalidInputError: a quantity isn't finite or is outside its range.
        NoSolutionError: code ``undamped_resonance`` at r = 1 with ζ = 0.
    """
    frequency_ratio, damping = _ratio_and_damping(frequency_ratio, damping_ratio)
    motion: Quantity = np.hypot(1.0, damping) / np.hypot(1.0 - frequency_ratio**2, damping)
    return motion


def stroke_ratio(frequency_ratio: Quantity, damping_ratio: Quantity) -> Quantity:
    """Return how far the suspension moves on a wavy road, Z/Y = r² / √[(1 − r²)² + (2 ζ r)²].

    Args:
        frequency_ratio: r, forcing over natural frequency [-], positive.
        damping_ratio: ζ [-], at least 0.

    Returns:
        Amplitude of the stroke over amplitude of the road [-], shapes broadcast.

    Raises:
        InvalidInputError: a quantity isn't finite or is outside its range.
        NoSolutionError: code ``undamped_resonance`` at r = 1 with ζ = 0.
    """
    frequency_ratio, damping = _ratio_and_damping(frequency_ratio, damping_ratio)
    stroke: Quantity = frequency_ratio**2 / np.hypot(1.0 - frequency_ratio**2, damping)
    return stroke


def _damped_share(damping_ratio: Quantity) -> Quantity:
    """Return √(1 − ζ²) after checking that something swings."""
    not_negative("damping_ratio", damping_ratio)
    swings = np.less(damping_ratio, 1.0)
    field = "damping_ratio"
    require(swings, "not_underdamped", field, NoSolutionError, damping_ratio=damping_ratio)
    share: Quantity = np.sqrt((1.0 - damping_ratio) * (1.0 + damping_ratio))
    return share


def _ratio_and_damping(
    frequency_ratio: Quantity, damping_ratio: Quantity
) -> tuple[Quantity, Quantity]:
    """Return r and 2 ζ r after checking that the response is finite."""
    frequency_ratio = positive("frequency_ratio", frequency_ratio)
    damping_ratio = not_negative("damping_ratio", damping_ratio)
    bounded = np.not_equal(frequency_ratio, 1.0) | np.greater(damping_ratio, SMALLEST)
    require(bounded, "undamped_resonance", "damping_ratio", NoSolutionError)
    return frequency_ratio, 2.0 * damping_ratio * frequency_ratio
