"""A release and the return of a wheel, against the library's integrator.

Source: scipy.integrate.solve_ivp; the damped free vibration itself as in S. S. Rao, "Mechanical
Vibrations", chapter 2 (from memory).
"""

import numpy as np
import pytest
from numpy.testing import assert_allclose
from scipy.integrate import solve_ivp
from scipy.signal import lfilter

from core.oscillator import TURN
from core.packing import interval_for, packed_share
from core.rebound import (
    crossing_time,
    damping_from_crossing,
    damping_from_release,
    phase_range,
    settling_time,
    wheel_return_time,
)
from core.release import FRAME_SD
from core.uncertainty import Measured, propagate
from core.units import MM

EXACT = 1e-5  # relative: all digits given


def let_go(frequency, damping_ratio, duration):
    """Integrated release from 1, with the time of first passing zero."""
    natural = TURN * frequency

    def motion(_, state):
        return state[1], -(natural**2) * state[0] - 2 * damping_ratio * natural * state[1]

    def passing(_, state):
        return state[0]

    with np.errstate(under="ignore"):  # scipy's own step control
        return solve_ivp(motion, (0, duration), (1.0, 0.0), events=passing, rtol=1e-11, atol=1e-13)


def test_first_crossing():
    crossing = let_go(2.0, 0.3, 0.5).t_events[0][0]
    assert_allclose(crossing, 0.156453, rtol=EXACT)
    assert_allclose(crossing_time(2.0, 0.3), crossing, rtol=1e-9)
    assert_allclose(damping_from_crossing(crossing, 2.0), 0.3, rtol=1e-9)


def test_phase_at_the_first_crossing():
    damping_ratio = np.linspace(0.0, 0.9, 10)
    phase = [1.571, 1.679, 1.809, 1.966, 2.163, 2.418, 2.768, 3.285, 4.163, 6.173]
    crossing = [let_go(1 / TURN, ratio, 10.0).t_events[0][0] for ratio in damping_ratio]
    assert_allclose(crossing, phase, atol=5e-4)  # half a unit of the last digit
    assert_allclose(crossing_time(1 / TURN, damping_ratio), crossing, rtol=1e-9)


@pytest.mark.parametrize(
    ("damping_ratio", "frame", "five_percent"),
    [(0.2, 0.015, 0.064), (0.3, 0.012, 0.056), (0.5, 0.007, 0.041), (0.7, 0.003, 0.025)],
)
def test_frames_matter_less_than_the_frequency(damping_ratio, frame, five_percent):
    # Standard deviations that a film at 240 frames per second, and 5 % of frequency, give at 2 Hz.
    time = crossing_time(2.0, damping_ratio)
    film = propagate(damping_from_crossing, Measured(time, FRAME_SD / 240), Measured(2.0))
    spring = propagate(damping_from_crossing, Measured(time), Measured(2.0, 0.1))
    assert_allclose(film.as_measured().sd, frame, atol=1e-3)
    assert_allclose(spring.as_measured().sd, five_percent, atol=3e-3)  # lopsided


def test_nothing_passes_sooner_than_a_quarter_swing_without_damping():
    assert_allclose(phase_range(0.0)[0], np.pi / 2, rtol=1e-15)


def test_settling_and_return():
    assert_allclose(settling_time(2.0, 0.3), 0.265258, rtol=EXACT)
    assert_allclose(wheel_return_time(2.0, 0.3), 0.0477465, rtol=EXACT)


def test_slow_return_above_critical_damping():
    # ω = 1: after the fast part has gone, the rest shrinks by e in one time constant.
    run = let_go(1 / TURN, 2.0, 30.0)
    late = run.t > 15.0
    slope = np.polyfit(run.t[late], np.log(run.y[0, late]), 1)[0]
    assert_allclose(-1 / slope, 3.73205, rtol=EXACT)
    assert_allclose(settling_time(1 / TURN, 2.0), 2 + np.sqrt(3), rtol=1e-12)


@pytest.mark.parametrize(("elapsed", "packed"), [(1.0, 0.582), (2.0, 0.156518), (3.0, 0.052)])
def test_packing(elapsed, packed):
    decay = np.exp(-elapsed)
    level = lfilter([decay], [1.0, -decay], np.ones(60))[-1]
    assert_allclose(packed_share(elapsed, 1.0), level, rtol=1e-12)
    assert_allclose(level, packed, atol=5e-4 if elapsed != 2.0 else 5e-7)


@pytest.mark.parametrize(("packed", "elapsed"), [(0.05, 3.04), (0.10, 2.40), (0.20, 1.79)])
def test_time_to_recover(packed, elapsed):
    assert_allclose(interval_for(packed, 1.0), elapsed, atol=5e-3)  # last digit given


@pytest.mark.parametrize(
    ("friction", "by_overshoot", "by_crossing"),
    [(2 * MM, (0.046, 0.066), (0.051, 0.055)), (4 * MM, (0.098, 0.15), (0.10, 0.15))],
)
def test_friction_reads_as_damping(friction, by_overshoot, by_crossing):
    # A push of 40 mm: what friction adds to ζ = 0.2 to 0.4 if nobody takes it out.
    push = 40 * MM
    for damping_ratio in (0.2, 0.3, 0.4):
        natural = TURN * 2.0

        def motion(_, state, damping_ratio=damping_ratio, natural=natural):
            drive = -(natural**2) * (state[0] - friction)
            return state[1], drive - 2 * damping_ratio * natural * state[1]

        def passing(_, state):
            return state[0]

        with np.errstate(under="ignore"):  # scipy's own step control
            run = solve_ivp(
                motion,
                (0, 0.3),
                (push, 0.0),
                events=passing,
                max_step=1e-3,
                rtol=1e-10,
                atol=1e-12,
            )
        overshoot = -run.y[0].min()
        crossing = run.t_events[0][0]
        added = damping_from_release(push, overshoot) - damping_ratio
        assert by_overshoot[0] - 1e-3 < added < by_overshoot[1] + 1e-3
        added = damping_from_crossing(crossing, 2.0) - damping_ratio
        assert by_crossing[0] - 1e-3 < added < by_crossing[1] + 1e-3
        assert_allclose(
            damping_from_crossing(crossing, 2.0, friction / push), damping_ratio, rtol=1e-6
        )
