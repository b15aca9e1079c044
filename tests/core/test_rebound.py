"""The release test against an integrator that knows nothing of its formulas."""

import numpy as np
import pytest
from hypothesis import assume, given
from hypothesis import strategies as st
from numpy.testing import assert_allclose
from scipy.integrate import solve_ivp

from core.errors import InvalidInputError, NoSolutionError
from core.oscillator import TURN, free_response, overshoot_from_damping
from core.rebound import (
    LATEST_PHASE,
    crossing_time,
    damping_from_crossing,
    damping_from_phase,
    damping_from_release,
    phase_range,
    settling_time,
    wheel_return_time,
)

frequencies = st.floats(0.8, 5.0)
dampings = st.just(0.0) | st.floats(1e-6, 0.9)
frictions = st.floats(0.001, 0.2)


def release(frequency, damping_ratio, friction_share):
    """Crossing time and overshoot of a release from 1, friction holding from below.

    Coulomb friction points against the motion, so during the whole extension it is a constant
    force towards the compressed side.
    """
    natural = TURN * frequency

    def motion(_, state):
        position, speed = state
        drive = -(natural**2) * (position - friction_share)
        return speed, drive - 2 * damping_ratio * natural * speed

    def at_mark(_, state):
        return state[0]

    def turning(time, state):
        return state[1] if time > 0 else -1.0

    at_mark.direction, turning.direction, turning.terminal = -1, 1, True
    with np.errstate(all="ignore"):  # scipy's own step control
        run = solve_ivp(
            motion,
            (0, 4 / frequency),
            (1.0, 0.0),
            events=(at_mark, turning),
            rtol=1e-10,
            atol=1e-12,
            max_step=0.05 / frequency,
        )
    return run.t_events[0], -run.y[0, -1]


@given(frequency=frequencies, damping_ratio=dampings)
def test_crossing_time_is_a_zero_of_the_free_response(frequency, damping_ratio):
    time = crossing_time(frequency, damping_ratio)
    assert abs(free_response(time, frequency, damping_ratio)) < 1e-9
    before = free_response(np.linspace(0, 0.999, 50) * time, frequency, damping_ratio)
    assert (before > 0).all()


@given(frequency=frequencies, damping_ratio=st.just(0.0) | st.floats(1e-6, 0.999))
def test_crossing_and_damping_are_inverse(frequency, damping_ratio):
    time = crossing_time(frequency, damping_ratio)
    assume(TURN * frequency * time < LATEST_PHASE)
    # At ζ = 0 rounding may put the time just below the range; a part in 10¹² more is enough.
    assert_allclose(damping_from_crossing(time * (1 + 1e-12), frequency), damping_ratio, atol=1e-10)


@given(frequency=frequencies, share=st.floats(0.02, 0.95), friction_share=frictions)
def test_damping_from_a_release_with_friction(frequency, share, friction_share):
    # Up to nearly the damping that would stop it at the mark.
    damping_ratio = share * damping_from_phase(phase_range(friction_share)[1], friction_share)
    crossings, overshoot = release(frequency, damping_ratio, friction_share)
    assert_allclose(
        damping_from_crossing(crossings[0], frequency, friction_share), damping_ratio, atol=1e-6
    )
    assert_allclose(damping_from_release(1.0, overshoot, friction_share), damping_ratio, atol=1e-6)


@given(share=st.floats(0.0, 0.99), friction_share=frictions)
def test_friction_looks_like_damping_unless_taken_out(share, friction_share):
    earliest, latest = phase_range(friction_share)
    phase = earliest + round(share, 6) * (latest - earliest)
    assert damping_from_phase(phase, friction_share) <= damping_from_phase(phase) + 1e-12


@given(first=st.floats(1.58, 90.0), step=st.floats(0.001, 5.0))
def test_passing_later_means_more_damping(first, step):
    assert damping_from_phase(first) < damping_from_phase(first + step) < 1.0


@given(friction_share=st.just(0.0) | st.floats(1e-6, 0.49))
def test_ends_of_the_phase_range_have_answers(friction_share):
    earliest, latest = phase_range(friction_share)
    assert 0.0 <= damping_from_phase(earliest, friction_share) < 1e-6
    at_rest = damping_from_phase(latest, friction_share)
    if friction_share:
        # Comes to rest at the mark: its overshoot is the friction's own.
        dead_band = friction_share / (1 - friction_share)
        assert_allclose(overshoot_from_damping(at_rest), dead_band, rtol=1e-5)
    else:
        assert at_rest > 0.99


@given(frequency=frequencies, friction_share=frictions)
def test_ends_of_the_phase_range_are_those_of_real_releases(frequency, friction_share):
    earliest, latest = phase_range(friction_share)
    undamped, _ = release(frequency, 0.0, friction_share)
    assert_allclose(TURN * frequency * undamped[0], earliest, rtol=1e-6)
    _, overshoot = release(frequency, damping_from_phase(latest, friction_share), friction_share)
    assert abs(overshoot) < 1e-6


def test_solver_needs_only_its_quick_steps(monkeypatch):
    monkeypatch.setattr("core.rebound._HALVINGS", 0)
    phase = np.linspace(1.65, 6.0, 500)
    for friction_share in (0.0, 0.01, 0.05):
        inside = phase < 0.98 * phase_range(friction_share)[1]
        damping_ratio = damping_from_phase(phase[inside], friction_share)
        shifted = friction_share + (1 - friction_share) * free_response(
            phase[inside] / TURN, 1.0, damping_ratio
        )
        assert_allclose(shifted, 0.0, atol=1e-12)


def test_solution_is_exact_for_arrays_of_all_sizes():
    phase = np.linspace(1.5708, 90.0, 5000).reshape(50, 100)
    damping_ratio = damping_from_phase(phase)
    assert damping_ratio.shape == (50, 100)
    again = TURN * crossing_time(1.0, damping_ratio)
    assert_allclose(again, phase, rtol=1e-9)


@pytest.mark.parametrize(
    ("time", "friction_share", "error", "code"),
    [
        (0.12, 0.0, NoSolutionError, "too_quick"),
        (0.126, 0.05, NoSolutionError, "too_quick"),
        (8.0, 0.0, NoSolutionError, "passes_late"),
        (0.5, 0.1, NoSolutionError, "friction_stops_it"),
        (0.2, 0.5, InvalidInputError, "friction_range"),
        (0.2, -0.1, InvalidInputError, "negative"),
        (0.0, 0.0, InvalidInputError, "not_positive"),
    ],
)
def test_crossing_without_an_answer_is_named(time, friction_share, error, code):
    with pytest.raises(error) as caught:
        damping_from_crossing(time, 2.0, friction_share)
    assert caught.value.code == code


@pytest.mark.parametrize(
    ("overshoot", "friction", "code"),
    [
        (0.0, 0.0, "overshoot_range"),
        (-0.001, 0.002, "overshoot_range"),
        (0.041, 0.0, "overshoot_range"),
        (0.037, 0.002, "overshoot_range"),
        (0.01, 0.02, "friction_range"),
        (0.01, -0.001, "negative"),
    ],
)
def test_release_without_an_answer_is_named(overshoot, friction, code):
    with pytest.raises(InvalidInputError) as caught:
        damping_from_release(0.04, overshoot, friction)
    assert caught.value.code == code


@given(frequency=frequencies, damping_ratio=st.floats(0.05, 20.0))
def test_settling_time_is_that_of_the_slowest_pole(frequency, damping_ratio):
    natural = TURN * frequency
    poles = np.roots([1.0, 2 * damping_ratio * natural, natural**2])
    slowest = -1.0 / poles.real.max()
    # The general root finder loses half its digits where the poles meet at ζ = 1.
    assert_allclose(settling_time(frequency, damping_ratio), slowest, rtol=1e-6)


def test_settling_is_quickest_at_critical_damping():
    damping_ratio = np.linspace(0.5, 1.5, 101)
    times = settling_time(2.0, damping_ratio)
    assert damping_ratio[times.argmin()] == 1.0


@given(frequency=frequencies, damping_ratio=st.floats(20.0, 200.0))
def test_strong_damping_moves_body_and_wheel_alike(frequency, damping_ratio):
    assert_allclose(
        settling_time(frequency, damping_ratio),
        wheel_return_time(frequency, damping_ratio),
        rtol=1e-3,
    )


@given(frequency=frequencies, damping_ratio=st.floats(0.05, 3.0))
def test_wheel_returns_as_a_spring_and_damper_alone(frequency, damping_ratio):
    time = wheel_return_time(frequency, damping_ratio)
    spring, damper = (TURN * frequency) ** 2, 2 * damping_ratio * TURN * frequency
    with np.errstate(under="ignore"):  # scipy's own step control
        run = solve_ivp(lambda _, x: -spring / damper * x, (0, time), [1.0], rtol=1e-10, atol=1e-12)
    assert_allclose(run.y[0, -1], np.exp(-1.0), rtol=1e-8)
