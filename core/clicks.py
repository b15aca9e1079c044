"""From two tried rebound settings to the click that should fit."""

from dataclasses import dataclass
from math import inf, sqrt
from typing import Final

import numpy as np

from core.checks import Quantity, not_negative, positive, require
from core.errors import InvalidInputError, NoSolutionError, Note
from core.release import ONE_OVERSHOOT
from core.uncertainty import Estimate, Measured, propagate

TARGET: Final = sqrt(ONE_OVERSHOOT[0] * ONE_OVERSHOOT[1])  # [-] the band's middle, by ratio
LARGEST_STEP: Final = 1.0  # [-] of the span between the two settings, beyond the nearer one


@dataclass(frozen=True)
class TriedSetting:
    """A rebound setting and the damping that the release test showed with it.

    Attributes:
        clicks: position, counted open from fully closed [-], at least 0.
        damping_ratio: ζ with its standard deviation [-], positive.

    Raises:
        InvalidInputError: code ``not_finite``, ``negative`` or ``not_positive``.
    """

    clicks: float
    damping_ratio: Measured

    def __post_init__(self) -> None:
        """Refuse positions and dampings that don't exist."""
        not_negative("clicks", self.clicks)
        positive("damping_ratio", self.damping_ratio.value)


@dataclass(frozen=True)
class ClickAdvice:
    """The setting to try next.

    Attributes:
        clicks: position to set, counted open from fully closed [-], a whole number.
        turn: clicks from the second setting tried: positive opens, negative closes [-].
        fitting: where the target lies, with its 95 % interval [-], whether reachable or not.
        notes: what a person should know about it.
    """

    clicks: int
    turn: int
    fitting: Estimate
    notes: tuple[Note, ...] = ()


def clicks_for_damping(
    first: TriedSetting,
    second: TriedSetting,
    target: float = TARGET,
    available: int | None = None,
) -> ClickAdvice:
    """Return the click that should give a damping ratio, judged from two tried settings.

    n = n₁ + (n₂ − n₁) ln(ζ / ζ₁) / ln(ζ₂ / ζ₁)

    n clicks from closed, ζ damping ratio. Each click changes the opening by about the same
    share, so the logarithm of damping runs straighter in clicks than damping itself does (common
    practice of needle adjusters, no source). A step reaches at most as far beyond the two
    settings as they lie apart: the next test corrects the line.

    Args:
        first: a setting tried.
        second: another, the one that is on the bike now.
        target: damping ratio wanted [-], more than 0 and less than 1.
        available: clicks from fully closed to fully open [-]; None if not known.

    Raises:
        InvalidInputError: ``clicks_wrong_way`` if damping clearly rose with opening;
            ``damping_target`` for a target out of range.
        NoSolutionError: ``clicks_no_effect`` if the settings, or their dampings within their ±,
            are the same.
    """
    require(0.0 < target < 1.0, "damping_target", "target")
    gain = propagate(_log_ratio, first.damping_ratio, second.damping_ratio)
    apart = second.clicks - first.clicks
    if apart == 0.0 or gain.low <= 0.0 <= gain.high:
        raise NoSolutionError("clicks_no_effect", "clicks")
    if apart * gain.value > 0.0:
        raise InvalidInputError("clicks_wrong_way", "clicks")

    def fit(first_damping: Quantity, second_damping: Quantity) -> Quantity:
        gone = _log_ratio(first_damping, target) / _log_ratio(first_damping, second_damping)
        return first.clicks + apart * gone

    fitting = propagate(fit, first.damping_ratio, second.damping_ratio)
    tried = sorted((first.clicks, second.clicks))
    span = LARGEST_STEP * abs(apart)
    notes = []
    goal: float = round(fitting.value)
    if not tried[0] - span <= goal <= tried[1] + span:
        notes.append(Note("clicks_step"))
        goal = min(max(goal, tried[0] - span), tried[1] + span)
    if available is not None:
        not_negative("available", available)
    end = inf if available is None else available
    if not 0.0 <= goal <= end:
        notes.append(Note("adjuster_end"))
        goal = min(max(goal, 0.0), end)
    clicks = round(goal)
    return ClickAdvice(clicks, round(clicks - second.clicks), fitting, tuple(notes))


def _log_ratio(first: Quantity, second: Quantity) -> Quantity:
    """Return ln(second / first) of two damping ratios."""
    ratio: Quantity = np.log(positive("damping_ratio", second) / positive("damping_ratio", first))
    return ratio
