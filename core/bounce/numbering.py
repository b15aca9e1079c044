"""Which beat does each tap belong to?

    taps    |    |   |      |   ||   |
    beats   0    1   2  ·   4   5    6      beat 3 was missed, beat 5 was tapped twice

Everything depends on this. One beat counted wrong in ten is an error of a tenth, far more than
unsteady fingers cause. So whole numberings compete: each trial period numbers all taps at once,
and the numbering that needs the fewest accidents to explain the taps wins. How clearly it wins is
part of the result; and so is how clearly it beats the view that there is no rhythm at all.
"""

from dataclasses import dataclass
from math import lgamma, log, log1p, pi
from typing import Final

import numpy as np
from numpy.typing import NDArray

from core.checks import FloatArray

IntArray = NDArray[np.int64]
BoolArray = NDArray[np.bool_]

TRIALS: Final = 29
TRIAL_RANGE: Final = (0.55, 1.25)  # [-] of the median interval; misses only lengthen intervals
ROUNDS: Final = 4  # of fitting and numbering again; changes end after two or three

# What an accident costs, in nats: how unlikely it is. From habit with tapping people, no source.
MISSED_COST: Final = 2.7  # ln(1 / 0.07): one beat in fifteen is missed
DOUBLED_SHARE: Final = 0.1  # [-] one tap in ten is a double, anywhere within its beat
TYPICAL_JITTER: Final = 0.025  # [s] of a tap around its beat
VARIANCE_SHAPE: Final = 2.0  # [-] how firmly typical scatters are believed: not very
TYPICAL_SCATTER: Final = 0.35  # [-] of the intervals of a tapper without rhythm, on a log scale
RIVAL_DISTANCE: Final = 0.06  # [-] numberings with nearer periods are the same to a rider


@dataclass(frozen=True)
class Numbering:
    """The best numbering of a series of taps.

    Attributes:
        beats: beat number of each tap, from 0; shape (taps,).
        kept: False for the second tap of a beat; shape (taps,).
        margin: how much likelier it is than the best numbering of another period [nats].
        evidence: how much likelier it is than intervals of no rhythm [nats].
    """

    beats: IntArray
    kept: BoolArray
    margin: float
    evidence: float


def number_beats(times: FloatArray) -> Numbering:
    """Return the likeliest numbering of taps.

    For each trial period P the taps are numbered by rounding, a line t = a + P n is fitted through
    them, they are numbered again from the line, and so on. The cost of the outcome is

        C = −ln p(r) + 2.7 missed + ln(10 P) doubled

    with p(r) the probability density of the residuals r about the line, normal with an unknown
    variance around (25 ms)² (`_cost_of_scatter`); `missed` the beats without a tap; and
    `doubled` the taps beyond the first of a beat, which may fall anywhere in the period P [s].

    Args:
        times: of the taps [s], increasing, at least three; shape (taps,).
    """
    median = float(np.median(np.diff(times)))
    periods = median * np.geomspace(*TRIAL_RANGE, TRIALS)
    starts = np.full(TRIALS, times[0])
    for _ in range(ROUNDS):
        beats, kept = _assign(times, starts, periods)
        starts, periods, residuals = _fit(times, beats, kept)
    costs = _costs(beats, kept, residuals, periods)
    best = int(np.argmin(costs))
    rivals = np.abs(periods / periods[best] - 1.0) > RIVAL_DISTANCE
    margin = float(costs[rivals].min() - costs[best]) if rivals.any() else np.inf
    evidence = _cost_of_no_rhythm(times) - float(costs[best])
    return Numbering(beats[best] - beats[best].min(), kept[best], margin, evidence)


def _cost_of_no_rhythm(times: FloatArray) -> float:
    """Return the cost of independent log-normal intervals of unknown mean and variance [nats]."""
    logs = np.log(np.diff(times))
    spread = float(((logs - logs.mean()) ** 2).sum())
    return float(logs.sum()) + _cost_of_scatter(spread, len(logs) - 1, TYPICAL_SCATTER)


def _assign(
    times: FloatArray, starts: FloatArray, periods: FloatArray
) -> tuple[IntArray, BoolArray]:
    """Number the taps for every trial; of two taps on one beat, the nearer one is kept."""
    places = (times - starts[:, None]) / periods[:, None]
    beats = np.rint(places).astype(np.int64)
    away = np.abs(places - beats)
    kept = np.ones(beats.shape, dtype=bool)
    # Taps are in order, so doubles of a beat are neighbours; each pair drops its farther one.
    same = np.diff(beats, axis=1) == 0
    later_is_farther = away[:, 1:] >= away[:, :-1]
    kept[:, 1:] &= ~(same & later_is_farther)
    kept[:, :-1] &= ~(same & ~later_is_farther)
    return beats, kept


def _fit(
    times: FloatArray, beats: IntArray, kept: BoolArray
) -> tuple[FloatArray, FloatArray, FloatArray]:
    """Fit a line through the kept taps of every trial; the residuals of others are 0."""
    weights = kept.astype(float)
    count = weights.sum(axis=1)
    mean_beat = (weights * beats).sum(axis=1) / count
    mean_time = (weights * times).sum(axis=1) / count
    from_mean = beats - mean_beat[:, None]
    spread = (weights * from_mean**2).sum(axis=1)
    slope = (weights * from_mean * (times - mean_time[:, None])).sum(axis=1)
    # A trial that puts all taps on one beat has no slope; its cost rules it out.
    periods = np.where(spread > 0, slope / np.where(spread > 0, spread, 1.0), np.ptp(times))
    starts = mean_time - periods * mean_beat
    residuals = weights * (times - starts[:, None] - periods[:, None] * beats)
    return starts, periods, residuals


def _costs(
    beats: IntArray, kept: BoolArray, residuals: FloatArray, periods: FloatArray
) -> FloatArray:
    count = kept.sum(axis=1)
    doubled = beats.shape[1] - count
    missed = np.ptp(beats, axis=1) + 1 - count
    squares = (residuals**2).sum(axis=1)
    fit = [
        _cost_of_scatter(spread, freedom, TYPICAL_JITTER)
        for spread, freedom in zip(squares.tolist(), (count - 2).tolist(), strict=True)
    ]
    costs: FloatArray = (
        np.array(fit) + MISSED_COST * missed + np.log(periods / DOUBLED_SHARE) * doubled
    )
    return costs


def _cost_of_scatter(squares: float, freedom: int, typical: float) -> float:
    """Return −ln of the density of normal deviations whose variance isn't known [nats].

    −ln p = (α + ν/2) ln(1 + Q / 2β) + ν/2 ln(2π β) + ln Γ(α) − ln Γ(α + ν/2),  β = α σ₀²

    with Q the sum of squares, ν its degrees of freedom, σ₀ the typical deviation and α the shape of
    the inverse-gamma distribution that the variance is given.

    Source: Bayesian linear regression with a conjugate prior, any textbook; from memory.
    """
    half = max(freedom, 0) / 2
    scale = VARIANCE_SHAPE * typical**2
    return (
        (VARIANCE_SHAPE + half) * log1p(squares / (2 * scale))
        + half * log(2 * pi * scale)
        + lgamma(VARIANCE_SHAPE)
        - lgamma(VARIANCE_SHAPE + half)
    )
