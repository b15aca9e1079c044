"""The release test as done at the trailhead: readings with their ± in, damping with its ± out.

`core.rebound` holds the mechanics; here it meets frames, rulers and the people who read them.
"""

from collections.abc import Sequence
from dataclasses import dataclass
from math import sqrt
from typing import Final, Literal

import numpy as np

from core.checks import Quantity, positive, require
from core.errors import InvalidInputError, NoSolutionError, Note
from core.oscillator import TURN, damping_from_overshoot
from core.rebound import (
    damping_from_crossing,
    damping_from_phase,
    damping_from_release,
    overshoot_ratio,
    phase_range,
)
from core.uncertainty import COVERAGE_FACTOR, Estimate, Measured, mean_reading, propagate

HARDLY_ANY: Final = 0.02  # [-] a damping ratio below makes no difference on a bike
LEAST_OVERSHOOT: Final = 1e-12  # [-] end of the scale: ζ = 0.994
ILL_DETERMINED: Final = 0.9  # [-] a damping ratio above can only be told to be above
VISIBLE_OVERSHOOT: Final = 0.001  # [m] less isn't seen beside a mark; common practice, no source
HAND_TIMING_SD: Final = 0.03 * sqrt(2.0)  # [s] 30 ms at each end of the time; common practice
COARSEST_TIMING: Final = 0.3  # [rad] of ω t; more leaves ζ unknown by ±0.5 where ζ is small
FRAME_SD: Final = 1.0 / sqrt(6.0)  # [frames] two ends, each anywhere within its frame
ONE_OVERSHOOT: Final = (0.35, 0.6)
"""Damping ratios of "one overshoot, then settle": after a push of 40 mm it overshoots by 12 to
4 mm and swings back by 4 mm to nothing. The rule is common practice, the ratios are computed."""


@dataclass(frozen=True)
class Damping:
    """What one release test tells about damping.

    Attributes:
        state: ``"measured"``, or ``"at_least"`` where the reading only excludes less damping.
        ratio: damping ratio with its 95 % interval [-]; None in the state ``"at_least"``.
        at_least: lowest damping ratio that the reading allows [-].
        notes: what a person should know about it.
    """

    state: Literal["measured", "at_least"]
    ratio: Estimate | None
    at_least: float
    notes: tuple[Note, ...] = ()


@dataclass(frozen=True)
class ReboundAdvice:
    """Which way to turn the rebound adjuster.

    Attributes:
        turn: ``"close"`` for more damping, ``"open"`` for less, ``"keep"``, or ``"measure"``
            where the reading only excludes less damping than the band has.
        sure: whether all of the 95 % interval says so.
    """

    turn: Literal["close", "keep", "open", "measure"]
    sure: bool


def time_from_frames(frames: Sequence[float], frames_per_second: float) -> Measured:
    """Return the time between two pictures of a film from counts of frames.

    The standard deviation of one count is 1/√6 frame: either end falls anywhere within a frame.

    Args:
        frames: counts of the same release, or of repeated ones, each positive [-].
        frames_per_second: of the camera, not of the slowed playback [Hz], positive.

    Returns:
        Mean time with its standard deviation [s].

    Raises:
        InvalidInputError: a number isn't positive; ``no_readings``.
    """
    mean = mean_reading(frames, FRAME_SD)
    rate = positive("frames_per_second", frames_per_second)
    return Measured(float(positive("frames", mean.value) / rate), float(mean.sd / rate))


def damping_by_time(
    time: Measured,
    frequency: Measured,
    friction_share: Measured | None = None,
) -> Damping:
    """Return the damping ratio from the time between release and passing the sag mark.

    The frequency must be that of the load in the test: without its rider a bike swings faster.
    Its deviation usually decides: 5 % of frequency move ζ = 0.3 by 0.056, a frame at 240 per
    second by 0.012. Time by hand is refused: at 2 Hz its ± is as wide as the whole scale.

    Args:
        time: from the release to passing the friction-free sag mark [s].
        frequency: undamped natural frequency [Hz].
        friction_share: friction in terms of the push, x_f / p [-]; None if not known.

    Raises:
        InvalidInputError: a quantity isn't finite or is outside its range; ``friction_range``.
        NoSolutionError: ``timing_too_coarse``; ``too_quick``, ``passes_late``,
            ``friction_stops_it`` for the readings as they are.
    """
    share = friction_share or Measured(0.0)
    damping_from_crossing(time.value, frequency.value, share.value)
    coarse = TURN * frequency.value * time.sd > COARSEST_TIMING
    if coarse:
        raise NoSolutionError("timing_too_coarse", "time", timing_s=COVERAGE_FACTOR * time.sd)
    ratio = propagate(_censored_by_time, time, frequency, share)
    return _told(ratio, friction_known=friction_share is not None)


def damping_by_overshoot(
    push: Measured,
    overshoot: Measured,
    friction_deflection: Measured | None = None,
    sag: float | None = None,
) -> Damping:
    """Return the damping ratio from a push and how far it overshoots the sag mark.

    Args:
        push: from the friction-free sag mark down to the release [m].
        overshoot: from the mark up to the turning point [m].
        friction_deflection: half the difference of the two-sided sag [m]; None if not known.
        sag: of the load in the test [m], to notice a suspension that topped out.

    Raises:
        InvalidInputError: a quantity isn't finite or is outside its range; ``friction_range``,
            ``overshoot_range``, ``overshoot_beyond_sag``.
    """
    deflection = friction_deflection or Measured(0.0)
    damping_from_release(push.value, overshoot.value, deflection.value)
    if sag is not None and overshoot.value >= positive("sag", sag):
        raise InvalidInputError("overshoot_beyond_sag", "overshoot", sag_m=sag)
    ratio = propagate(_censored_by_overshoot, push, overshoot, deflection)
    return _told(ratio, friction_known=friction_deflection is not None)


def damping_if_not_passed(push: float, visible: float = VISIBLE_OVERSHOOT) -> Damping:
    """Return what is known when the wheel came back to the sag mark without passing it.

    Less damping than that of the smallest visible overshoot would have shown. Friction may also
    have held the wheel short of the mark.

    Args:
        push: from the sag mark down to the release [m], more than `visible`.
        visible: smallest overshoot that would have been seen [m], positive.

    Raises:
        InvalidInputError: a quantity isn't finite or isn't positive; ``overshoot_range``.
    """
    seen = positive("visible", visible) / positive("push", push)
    require(np.less(seen, 1.0), "overshoot_range", "visible")
    bound = float(damping_from_overshoot(seen))
    return Damping("at_least", None, bound, (Note("friction_unknown"),))


def advise(damping: Damping, band: tuple[float, float] = ONE_OVERSHOOT) -> ReboundAdvice:
    """Return which way to turn the rebound adjuster to come into a band of damping ratios.

    Args:
        damping: of the release test.
        band: lowest and highest damping ratio wanted [-].

    Raises:
        InvalidInputError: ``band_order``.
    """
    low, high = band
    require(0.0 < low < high < 1.0, "band_order", "band")
    if damping.ratio is None:
        above = damping.at_least > high
        return ReboundAdvice("open" if above else "measure", sure=above)
    ratio = damping.ratio
    if ratio.value < low:
        return ReboundAdvice("close", sure=ratio.high < low)
    if ratio.value > high:
        return ReboundAdvice("open", sure=ratio.low > high)
    return ReboundAdvice("keep", sure=low <= ratio.low and ratio.high <= high)


def _told(ratio: Estimate, *, friction_known: bool) -> Damping:
    """Return the damping that a ratio and its interval tell."""
    notes = [] if friction_known else [Note("friction_unknown")]
    if ratio.value > ILL_DETERMINED:
        return Damping("at_least", None, min(ratio.low, ILL_DETERMINED), tuple(notes))
    if ratio.low < HARDLY_ANY:
        notes.append(Note("damping_open_low"))
    if ratio.high > ILL_DETERMINED:
        notes.append(Note("damping_open_high"))
    return Damping("measured", ratio, ratio.low, tuple(notes))


# Around a reading that has an answer, some plausible readings have none: a frame less, and it
# would have passed too quickly even for ζ = 0. Those count as the end of the scale that they lie
# beyond. An interval between quantiles only asks how many lie there, not how far, so it stays
# right; an end of it on the end of the scale is told as a note.


def _censored_by_time(time: Quantity, frequency: Quantity, friction_share: Quantity) -> Quantity:
    """Return `damping_from_phase` of the phase, or of the end of the scale beyond which it is."""
    share = np.maximum(friction_share, 0.0)
    return damping_from_phase(np.clip(TURN * frequency * time, *phase_range(share)), share)


def _censored_by_overshoot(push: Quantity, overshoot: Quantity, friction: Quantity) -> Quantity:
    """Return `damping_from_overshoot` of the ratio, or of the end of the scale."""
    ratio = overshoot_ratio(push, overshoot, np.maximum(friction, 0.0))
    return damping_from_overshoot(np.clip(ratio, LEAST_OVERSHOOT, 1.0))
