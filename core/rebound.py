"""How strongly rebound is damped, from pushing the bike down and letting go.

    compressed  1 |*
                  |  *
                  |    *
      sag mark  0 |------*-----------*--*--*----  ζ ≈ 0.4: one overshoot, then settled
                  |        *       *
     overshoot −R |          *  *
                  +------|----------------------> time
                      crossing

Two readings tell the damping ratio ζ: the time from the release to passing the sag mark (a film,
frame by frame), or how far it goes past the mark (a ruler). From the release to the top of the
overshoot the wheel only extends, so both see the rebound damper alone.

Friction holds the wheel with a constant force. In units of stroke, x_f = F_f / k, it moves the
mark that the swing is about by x_f towards the compressed side: friction looks like damping
unless it is taken out.
"""

from math import inf, pi
from typing import Final

import numpy as np

from core.checks import FloatArray, Quantity, bounded, finite, not_negative, positive, require
from core.errors import NoSolutionError
from core.oscillator import TURN, damped_frequency, damping_from_overshoot

LATEST_PHASE: Final = 100.0  # [rad] of ω t; a later crossing means ζ > 0.9995: it didn't pass


def crossing_time(frequency: Quantity, damping_ratio: Quantity) -> Quantity:
    """Return when a released wheel first passes the sag mark, without friction.

    t = (π/2 + arcsin ζ) / (ω √(1 − ζ²)), with ω = 2π f_n

    Args:
        frequency: f_n, undamped, of the load on the bike in the test [Hz], positive.
        damping_ratio: ζ [-], 0 up to but not including 1.

    Returns:
        Time since the release [s], shapes broadcast.

    Raises:
        InvalidInputError: a quantity isn't finite or is outside its range.
        NoSolutionError: code ``not_underdamped``: it never passes.

    Source: first zero of the free response, e.g. Rao, "Mechanical Vibrations", 2.6.
    """
    swing = TURN * damped_frequency(frequency, damping_ratio)
    time: Quantity = (pi / 2.0 + np.arcsin(damping_ratio)) / swing
    return time


def damping_from_crossing(
    time: Quantity, frequency: Quantity, friction_share: Quantity = 0.0
) -> Quantity:
    """Return the damping ratio from the time to pass the sag mark.

    With ζ = cos ψ and U = 2π f_n t the wheel is at the mark when

    sin(U sin ψ + ψ) + e sin ψ exp(U cos ψ) = 0, with e = s / (1 − s)

    s share of the push that friction holds. Without friction U runs from π/2 (ζ = 0) to infinity
    (ζ → 1), so a crossing never means ζ ≥ 1; above ζ = 0.9 a little time decides much.

    Args:
        time: t from the release to passing the friction-free sag mark [s], positive.
        frequency: f_n, undamped, of the load on the bike in the test [Hz], positive.
        friction_share: s = x_f / push [-], 0 up to but not including ½.

    Returns:
        Damping ratio [-], shapes broadcast.

    Raises:
        InvalidInputError: a quantity isn't finite or is outside its range; ``friction_range``.
        NoSolutionError: ``too_quick`` (ζ < 0), ``passes_late`` (U > 100), ``friction_stops_it``.
    """
    phase = TURN * positive("frequency", frequency) * positive("time", time)
    return damping_from_phase(phase, friction_share)


def damping_from_phase(phase: Quantity, friction_share: Quantity = 0.0) -> Quantity:
    """Return the damping ratio from the phase U = 2π f_n t at which the sag mark is passed.

    `damping_from_crossing` tells the equation.

    Args:
        phase: U [rad], within `phase_range`.
        friction_share: s = x_f / push [-], 0 up to but not including ½.

    Returns:
        Damping ratio [-], shapes broadcast.

    Raises:
        InvalidInputError: ``not_finite``, ``negative``, ``friction_range``.
        NoSolutionError: ``too_quick``, ``passes_late``, ``friction_stops_it``.
    """
    earliest, latest = phase_range(friction_share)
    finite("phase", phase)
    require(np.greater_equal(phase, earliest), "too_quick", "time", NoSolutionError)
    require(np.less_equal(phase, LATEST_PHASE), "passes_late", "time", NoSolutionError)
    reaches = np.less_equal(phase, latest)
    require(reaches, "friction_stops_it", "friction_share", NoSolutionError)
    dead_band = friction_share / (1.0 - friction_share)
    angle = _crossing_angle(*np.broadcast_arrays(phase, dead_band, _angle_at_rest(dead_band)))
    damping_ratio: FloatArray = np.cos(angle)
    return damping_ratio[()]


def phase_range(friction_share: Quantity) -> tuple[Quantity, Quantity]:
    """Return the earliest and latest phase U = 2π f_n t at which the mark can be passed.

    The earliest belongs to ζ = 0, arccos(−e) with e = s / (1 − s). The latest belongs to the
    damping that comes to rest at the mark, π / √(1 − ζ²) with an overshoot of e; at most 100.

    Args:
        friction_share: s = x_f / push [-], 0 up to but not including ½.

    Returns:
        Earliest and latest phase [rad], same shape.

    Raises:
        InvalidInputError: ``not_finite``, ``negative``, ``friction_range``.
    """
    _check_friction(friction_share)
    dead_band = friction_share / (1.0 - friction_share)
    earliest: Quantity = np.arccos(-dead_band)
    at_rest = pi / np.maximum(np.sin(_angle_at_rest(dead_band)), pi / LATEST_PHASE)
    latest: Quantity = np.maximum(earliest, at_rest)  # they meet, but for rounding, at s = ½
    return earliest, latest


def damping_from_release(
    push: Quantity, overshoot: Quantity, friction_deflection: Quantity = 0.0
) -> Quantity:
    """Return the damping ratio from a push and how far it overshoots the sag mark.

    R = (o + x_f) / (p − x_f), then ζ = −ln R / √(π² + ln² R)

    Args:
        push: p, from the friction-free sag mark down to the release [m], positive.
        overshoot: o, from the mark up to the turning point [m], positive and less than p.
        friction_deflection: x_f = F_f / k, half the difference of the two-sided sag [m].

    Returns:
        Damping ratio [-], shapes broadcast.

    Raises:
        InvalidInputError: a quantity isn't finite or is outside its range; ``friction_range``;
            ``overshoot_range`` if there is none, or more than friction alone would leave.
    """
    ratio = overshoot_ratio(push, overshoot, friction_deflection)
    require(np.greater(overshoot, 0.0), "overshoot_range", "overshoot")
    return damping_from_overshoot(ratio)


def overshoot_ratio(
    push: Quantity, overshoot: Quantity, friction_deflection: Quantity = 0.0
) -> Quantity:
    """Return the overshoot as a share of the push with friction taken out, (o + x_f) / (p − x_f).

    Args:
        push: p, from the friction-free sag mark down to the release [m], positive.
        overshoot: o, from the mark up to the turning point [m].
        friction_deflection: x_f = F_f / k, half the difference of the two-sided sag [m].

    Returns:
        Ratio [-], shapes broadcast.

    Raises:
        InvalidInputError: a quantity isn't finite or is outside its range; ``friction_range``.
    """
    push = positive("push", push)
    friction_deflection = not_negative("friction_deflection", friction_deflection)
    _check_friction(friction_deflection / push)
    return (bounded("overshoot", overshoot) + friction_deflection) / (push - friction_deflection)


def settling_time(frequency: Quantity, damping_ratio: Quantity) -> Quantity:
    """Return the time in which the body's swing, or its slow return, shrinks to 37 %.

    τ = 1 / (ζ ω) up to ζ = 1, above τ = (ζ + √(ζ² − 1)) / ω, with ω = 2π f_n

    Args:
        frequency: f_n, undamped [Hz], positive.
        damping_ratio: ζ [-], positive.

    Returns:
        Time constant of the slowest part of the motion [s], shapes broadcast.

    Raises:
        InvalidInputError: a quantity isn't finite or isn't positive.
    """
    natural = TURN * positive("frequency", frequency)
    damping_ratio = positive("damping_ratio", damping_ratio)
    above = np.sqrt(np.maximum(damping_ratio - 1.0, 0.0) * (damping_ratio + 1.0))
    time: Quantity = np.where(
        np.less(damping_ratio, 1.0), 1.0 / damping_ratio, damping_ratio + above
    )[()]
    return time / natural


def wheel_return_time(frequency: Quantity, damping_ratio: Quantity) -> Quantity:
    """Return the time constant with which a wheel alone comes back after a bump.

    τ = c / k = 2 ζ / ω, with ω = 2π f_n

    The wheel is light, so spring and damper alone set its pace; the body above hardly moves.

    Args:
        frequency: f_n, undamped [Hz], positive.
        damping_ratio: ζ of rebound [-], positive.

    Returns:
        Time constant [s], shapes broadcast: 63 % of the way is back after it.

    Raises:
        InvalidInputError: a quantity isn't finite or isn't positive.
    """
    natural = TURN * positive("frequency", frequency)
    return 2.0 * positive("damping_ratio", damping_ratio) / natural


def _check_friction(friction_share: Quantity) -> None:
    """Refuse friction that holds half the push or more: the swing would end before the mark."""
    not_negative("friction_share", friction_share)
    require(np.less(friction_share, 0.5), "friction_range", "friction_share")


def _angle_at_rest(dead_band: Quantity) -> Quantity:
    """Return ψ of the damping whose overshoot e ends exactly at the sag mark."""
    with np.errstate(divide="ignore"):  # no friction: every damping below 1 passes
        angle: Quantity = np.arctan2(pi, -np.log(dead_band))
    return angle


def _crossing_angle(phase: FloatArray, dead_band: FloatArray, slowest: FloatArray) -> FloatArray:
    """Return ψ of the damping that brings the wheel to the mark at a phase.

    Newton's method, kept inside a bracket that shrinks with every step: less damping (larger ψ)
    passes earlier, so whether the mark is passed already tells on which side the solution lies.
    """
    low, high = slowest, np.full_like(phase, pi / 2.0)
    angle = np.clip(pi / (1.0 + phase), low, high)  # exact for strong damping, safe for weak
    for step in range(_NEWTON_STEPS + _HALVINGS):
        sine, cosine = np.sin(angle), np.cos(angle)
        growth = dead_band * np.exp(phase * cosine)
        miss = np.sin(phase * sine + angle) + sine * growth
        passed = (phase * sine >= pi) | (miss <= 0.0)
        low, high = np.where(passed, low, angle), np.where(passed, angle, high)
        slope = np.cos(phase * sine + angle) * (phase * cosine + 1.0)
        slope = slope + growth * (cosine - phase * sine**2)
        proposed = angle - np.divide(miss, slope, out=np.full_like(miss, inf), where=slope != 0.0)
        # A step within rounding may fall just out of the bracket: that is no reason to halve it.
        solved = np.abs(proposed - angle) <= _ANGLE_TOLERANCE
        if solved.all():
            return angle
        inside = (low < proposed) & (proposed < high) & (step < _NEWTON_STEPS)
        stepped = np.where(inside, proposed, low + (high - low) / 2.0)
        angle = np.where(solved, angle, stepped)
    return angle


_NEWTON_STEPS: Final = 12  # most solutions need 5
_HALVINGS: Final = 50  # 2⁻⁵⁰ of the bracket, the resolution of a float
_ANGLE_TOLERANCE: Final = 1e-14  # [rad] adds as little to ζ
