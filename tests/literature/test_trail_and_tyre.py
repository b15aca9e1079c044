"""Uneven damping over a wave, and a tyre under a spring.

Sources:
    [1] scipy.integrate.solve_ivp, steady motion with the real, uneven damper.
    [2] scipy.linalg.eigh, body and wheel together.
    [3] Springs in series: any mechanics text.
    [4] Common practice, no source: a mountain bike's wheel hops at 23 to 43 Hz; its tyre has
        80 to 150 N/mm.
"""

import numpy as np
import pytest
from numpy.testing import assert_allclose
from scipy.integrate import solve_ivp
from scipy.linalg import eigh

from core.oscillator import TURN, transmissibility
from core.tyre import (
    membrane_stiffness,
    series_stiffness,
    tyre_frequency_factor,
    wheel_hop_frequency,
)
from core.uneven import mean_damping, mean_drop
from core.units import BAR, MM, N_PER_MM

EXACT = 1e-5  # relative: all digits given


def test_uneven_damping_at_resonance():
    compression, rebound = 0.2, 0.4

    def motion(time, state):
        speed = np.cos(time) - state[1]
        damper = 2 * (compression if speed > 0 else rebound) * speed
        return state[1], np.sin(time) - state[0] + damper

    time = 12 * TURN + np.linspace(0, TURN, 721)
    with np.errstate(under="ignore"):  # scipy's own step control
        run = solve_ivp(motion, (0, time[-1]), (0, 0), t_eval=time, rtol=1e-9, atol=1e-11)
    position = run.y[0, :-1]
    passed_on = abs(2 * np.mean(position * np.exp(-1j * time[:-1])))
    assert_allclose([passed_on, position.mean()], [1.935, -0.2129], atol=2e-3)  # [1]
    linear = transmissibility(1.0, mean_damping(compression, rebound))
    drop = mean_drop(1.0, compression, rebound)
    assert_allclose([linear, drop], [1.9437, 0.2122], atol=5e-5)
    # The linear model's error, found by such integrations: 1.4 % and 2.3 % at most.
    assert_allclose(linear, passed_on, rtol=0.014)
    assert_allclose(drop, -position.mean(), rtol=0.023)


@pytest.mark.parametrize(("ratio", "drop"), [(1.0, 0.21), (2.0, 0.31), (4.0, 0.54)])
def test_drop_grows_with_speed(ratio, drop):
    assert_allclose(mean_drop(ratio, 0.2, 0.4), drop, atol=6e-3)


def test_tyre_in_series():
    wheel_rate, tyre = 5 * N_PER_MM, 140 * N_PER_MM
    assert_allclose(series_stiffness(wheel_rate, tyre), 4.82759 * N_PER_MM, rtol=EXACT)  # [3]
    factor = tyre_frequency_factor(wheel_rate, tyre)
    assert_allclose(factor, 0.982607, rtol=EXACT)
    body, wheel = 40.0, 4.0
    stiffness = [[wheel_rate, -wheel_rate], [-wheel_rate, wheel_rate + tyre]]
    bounce = np.sqrt(eigh(stiffness, np.diag([body, wheel]), eigvals_only=True)[0])
    assert_allclose(factor * np.sqrt(wheel_rate / body), bounce, rtol=1e-3)  # [2]


@pytest.mark.parametrize(
    ("tyre", "percent"),
    [(100, (-1.5, -2.4, -3.8)), (140, (-1.1, -1.7, -2.7)), (180, (-0.8, -1.4, -2.2))],
)
def test_tyre_lowers_the_frequency(tyre, percent):
    factor = tyre_frequency_factor(np.array([3.0, 5.0, 8.0]) * N_PER_MM, tyre * N_PER_MM)
    assert_allclose(100 * (factor - 1), percent, atol=0.05)


def test_wheel_hop_of_mountain_bikes():
    soft = wheel_hop_frequency(3 * N_PER_MM, 100 * N_PER_MM, 5.0)
    hard = wheel_hop_frequency(8 * N_PER_MM, 180 * N_PER_MM, 2.5)
    assert_allclose([soft, hard], [23, 43], atol=1.0)  # [4]


@pytest.mark.parametrize(("pressure", "stiffness"), [(1.2, 81), (1.5, 101), (1.8, 121), (2.2, 148)])
def test_membrane_estimate(pressure, stiffness):
    found = membrane_stiffness(pressure * BAR, 370 * MM, 31 * MM)
    assert_allclose(found, stiffness * N_PER_MM, atol=0.5 * N_PER_MM)
