"""Uncertainty and rounding as the guides of the Joint Committee for Guides in Metrology do them.

Sources (from memory):
    [1] JCGM 100:2008 (GUM), 7.2.6 and 7.2.2: rounding of a result; 4.2.3: mean of readings.
    [2] JCGM 101:2008, 9.2.2: sum of four standard normal quantities; 95 % interval [−3.92, 3.92].
    [3] scipy.stats, exact distributions.
"""

import numpy as np
import pytest
from numpy.testing import assert_allclose
from scipy import stats

from core.uncertainty import Estimate, Measured, decimals_for, mean_reading, propagate


@pytest.mark.parametrize(
    ("value", "half_width", "shown"),
    [
        (10.057_62, 0.027, "10.058"),  # [1] 7.2.6, in ohms
        (100.021_47, 0.000_35, "100.02147"),  # [1] 7.2.2, in grams
        (29.97, 0.96, "30.0"),  # ± 1.0
        (86.8597, 3.4, "86.9"),
        (86.8597, 3.9, "87"),
        (1234.0, 87.0, "1230"),
    ],
)
def test_value_ends_where_its_uncertainty_ends(value, half_width, shown):
    decimals = decimals_for(Estimate(value, value - half_width, value + half_width))
    assert f"{round(value, decimals):.{max(decimals, 0)}f}" == shown


def test_sum_of_four_normal_quantities():
    total = propagate(lambda *parts: sum(parts), *[Measured(0.0, 1.0)] * 4)
    assert total.value == 0.0
    # [2]; four standard errors of a quantile from 4,000 samples, see SAMPLES.
    assert_allclose([total.low, total.high], [-3.92, 3.92], rtol=0.06)


def test_squared_reading():
    # [3]: (X/σ)² of a normal X is non-central chi-squared.
    estimate = propagate(np.square, Measured(1.0, 0.2))
    expected = stats.ncx2.ppf([0.025, 0.975], 1, 25.0) * 0.04
    assert_allclose([estimate.low, estimate.high], expected, rtol=0.06)


def test_mean_of_ten_readings():
    readings = np.array([30.1, 29.4, 30.8, 30.2, 29.9, 30.5, 29.7, 30.0, 30.3, 29.6])
    mean = mean_reading(list(readings), 0.0)
    assert_allclose(mean.value, readings.mean())
    assert_allclose(mean.sd, stats.sem(readings))  # [1] 4.2.3
