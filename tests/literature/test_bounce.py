"""The bounce estimator against references of its own.

1. Ordinary least squares: variance of a slope, any statistics text (from memory); here scipy.
2. Cramér-Rao bound for the period of equidistant beats with normal jitter, which for a linear
   model with normal errors is that same variance: sd(f) = f² σ √(12 / (N (N² − 1))), with σ the
   jitter [s] and N the number of taps (from memory).
"""

import numpy as np
import pytest
from scipy import stats

from core import estimate_bounce
from core.bounce.rhythm import measure_rhythm


def clean_taps(taps=30, frequency=2.0, jitter=0.03, seed=11):
    beats = np.arange(taps, dtype=float)
    return beats, beats / frequency + np.random.default_rng(seed).normal(0, jitter, taps)


def test_bound_of_ten_taps():
    """Source 2: N = 10, σ = 30 ms, f = 2 Hz give 0.660578 %."""
    bound = 2.0 * 0.03 * np.sqrt(12 / (10 * (10**2 - 1)))
    assert bound == pytest.approx(0.00660578, rel=1e-5)


def test_the_mixture_lies_between_regression_and_mean_interval():
    """Source 1: jitter alone asks for least squares, wander alone for the mean interval."""
    beats, times = clean_taps()
    slope = stats.linregress(beats, times).slope
    mean = (times[-1] - times[0]) / (len(times) - 1)
    period = measure_rhythm(beats, times).period
    assert min(slope, mean) <= period <= max(slope, mean)
    assert period == pytest.approx(slope, rel=0.005)


def test_the_error_comes_near_the_bound():
    """Source 2, on taps with jitter alone: RMSE at most 15 % above the bound of the same taps."""
    errors = []
    for seed in range(400):
        beats, times = clean_taps(taps=10, seed=seed)
        errors.append(measure_rhythm(beats, times).period * 2.0 - 1.0)
    assert np.sqrt(np.mean(np.square(errors))) < 1.15 * 0.00660578


def test_theil_sen_agrees_on_clean_taps():
    """Source: scipy.stats.theilslopes, with its own 95 % interval."""
    beats, times = clean_taps()
    slope, _, low, high = stats.theilslopes(times, beats)
    period = measure_rhythm(beats, times).period
    assert low < period < high
    assert period == pytest.approx(slope, rel=0.005)


def test_a_worked_series():
    """Fourteen taps with one miss and one double at 2 Hz; worked by an earlier implementation."""
    taps = [0, 0.512, 0.982, 1.525, 1.993, 2.503, 3.515, 4.009, 4.486, 4.576, 5.02, 5.495, 5.989]
    result = estimate_bounce([*taps, 6.508])
    assert result.state == "done"
    assert result.frequency_hz == pytest.approx(1.999, abs=0.003)
    half_width = (result.high_hz - result.low_hz) / 2 / result.frequency_hz
    assert half_width == pytest.approx(0.0115, abs=0.002)
    assert (result.used, result.missed, result.doubled) == (11, 1, 1)
