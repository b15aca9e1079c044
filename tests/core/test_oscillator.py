import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st
from numpy.testing import assert_allclose
from scipy.integrate import solve_ivp
from scipy.signal import freqs

from core.constants import STANDARD_GRAVITY
from core.errors import InvalidInputError, NoSolutionError
from core.oscillator import (
    TURN,
    damped_frequency,
    damping_coefficient,
    damping_from_overshoot,
    deflection_from_frequency,
    free_response,
    frequency_from_deflection,
    frequency_from_stiffness,
    logarithmic_decrement,
    overshoot_from_damping,
    peak_after_impulse,
    stiffness_from_frequency,
    stroke_ratio,
    transmissibility,
    undamped_frequency,
)

frequencies = st.floats(0.5, 10.0)
masses = st.floats(1.0, 200.0)
deflections = st.floats(1e-3, 0.3)
underdamped = st.floats(0.01, 0.95)
dampings = st.floats(0.01, 5.0)
ratios = st.floats(0.01, 30.0)


def integrate(time, frequency, damping_ratio, start):
    """Free motion by a general integrator, starting at position and speed."""
    natural = TURN * frequency

    def motion(_, state):
        position, speed = state
        return speed, -(natural**2) * position - 2 * damping_ratio * natural * speed

    with np.errstate(under="ignore"):  # scipy's own step control
        return solve_ivp(motion, (0, time), start, rtol=1e-10, atol=1e-12).y[:, -1]


@given(deflection=deflections)
def test_deflection_and_frequency_are_inverse(deflection):
    there = frequency_from_deflection(deflection)
    assert_allclose(deflection_from_frequency(there), deflection, rtol=1e-12)


@given(deflection=deflections, mass=masses)
def test_deflection_and_stiffness_tell_the_same_frequency(deflection, mass):
    stiffness = mass * STANDARD_GRAVITY / deflection
    assert_allclose(
        frequency_from_stiffness(stiffness, mass), frequency_from_deflection(deflection), rtol=1e-12
    )
    assert_allclose(
        stiffness_from_frequency(frequency_from_deflection(deflection), mass), stiffness, rtol=1e-12
    )


@given(deflection=deflections, factor=st.floats(1.1, 20.0))
def test_four_times_the_deflection_is_half_the_frequency(deflection, factor):
    assert_allclose(
        frequency_from_deflection(factor**2 * deflection),
        frequency_from_deflection(deflection) / factor,
        rtol=1e-12,
    )


@given(frequency=frequencies, damping_ratio=underdamped)
def test_damped_and_undamped_frequency_are_inverse(frequency, damping_ratio):
    damped = damped_frequency(frequency, damping_ratio)
    assert damped < frequency
    assert_allclose(undamped_frequency(damped, damping_ratio), frequency, rtol=1e-12)


@given(damping_ratio=st.just(0.0) | st.floats(1e-6, 0.99))
def test_damping_and_overshoot_are_inverse(damping_ratio):
    overshoot = overshoot_from_damping(damping_ratio)
    assert_allclose(damping_from_overshoot(overshoot), damping_ratio, rtol=1e-9, atol=1e-15)


@given(lower=underdamped, step=st.floats(1e-3, 0.04))
def test_more_damping_overshoots_less(lower, step):
    assert overshoot_from_damping(lower + step) < overshoot_from_damping(lower)


def test_overshoot_at_the_ends_of_the_scale():
    assert overshoot_from_damping(0.0) == 1.0
    assert overshoot_from_damping(1.0 - 1e-15) < 1e-100
    assert damping_from_overshoot(1.0) == 0.0
    assert_allclose(damping_from_overshoot(1e-300), 1.0, atol=2e-5)


@given(damping_ratio=underdamped)
def test_decrement_is_that_of_two_half_swings(damping_ratio):
    swing = overshoot_from_damping(damping_ratio) ** 2
    assert_allclose(logarithmic_decrement(damping_ratio), -np.log(swing), rtol=1e-12)


@given(time=st.floats(0.001, 1.0), frequency=st.floats(0.5, 4.0), damping_ratio=dampings)
def test_free_response_agrees_with_integration(time, frequency, damping_ratio):
    expected = integrate(time, frequency, damping_ratio, (1.0, 0.0))[0]
    assert_allclose(free_response(time, frequency, damping_ratio), expected, atol=1e-7)


@given(phase=st.just(0.0) | st.floats(1e-3, 20.0), step=st.floats(1e-12, 1e-9))
def test_free_response_runs_smoothly_through_critical_damping(phase, step):
    time = phase / TURN
    critical = np.exp(-phase) * (1.0 + phase)
    around = free_response(time, 1.0, np.array([1.0 - step, 1.0, 1.0 + step]))
    assert_allclose(around, critical, rtol=1e-6, atol=1e-12)


@given(frequency=frequencies, damping_ratio=underdamped)
def test_free_response_turns_at_the_overshoot(frequency, damping_ratio):
    half_swing = 0.5 / damped_frequency(frequency, damping_ratio)
    assert_allclose(
        free_response(half_swing, frequency, damping_ratio),
        -overshoot_from_damping(damping_ratio),
        rtol=1e-9,
        atol=1e-15,
    )


def test_undamped_free_response_is_a_cosine():
    time = np.linspace(0, 2, 50)
    assert_allclose(free_response(time, 1.5, 0.0), np.cos(TURN * 1.5 * time), atol=1e-12)


@given(speed=st.floats(0.1, 5.0), frequency=st.floats(1.0, 5.0), damping_ratio=underdamped)
def test_peak_after_impulse_is_where_integration_stops_moving(speed, frequency, damping_ratio):
    peak, time = peak_after_impulse(speed, frequency, damping_ratio)
    position, left = integrate(time, frequency, damping_ratio, (0.0, speed))
    assert_allclose(position, peak, rtol=1e-6)
    assert abs(left) < 1e-6 * speed


@given(frequency=frequencies, damping_ratio=dampings, ratio=ratios, mass=masses)
def test_transmissibility_is_that_of_the_transfer_function(frequency, damping_ratio, ratio, mass):
    stiffness = stiffness_from_frequency(frequency, mass)
    damping = damping_coefficient(damping_ratio, frequency, mass)
    forcing = TURN * ratio * frequency
    _, response = freqs([damping, stiffness], [mass, damping, stiffness], [forcing])
    assert_allclose(transmissibility(ratio, damping_ratio), abs(response[0]), rtol=1e-9)
    _, stroke = freqs([-mass, 0.0, 0.0], [mass, damping, stiffness], [forcing])
    assert_allclose(stroke_ratio(ratio, damping_ratio), abs(stroke[0]), rtol=1e-9)


@given(damping_ratio=dampings)
def test_filtering_begins_at_the_square_root_of_two(damping_ratio):
    assert transmissibility(np.sqrt(2.0) * 0.999, damping_ratio) > 1.0
    assert transmissibility(np.sqrt(2.0) * 1.001, damping_ratio) < 1.0


@given(lower=dampings, step=st.floats(0.01, 1.0), ratio=ratios)
def test_damping_helps_below_the_square_root_of_two_and_hurts_above(lower, step, ratio):
    more, less = transmissibility(ratio, lower + step), transmissibility(ratio, lower)
    if abs(ratio - np.sqrt(2.0)) > 1e-3:
        assert (more < less) == (ratio < np.sqrt(2.0))


@given(damping_ratio=dampings)
def test_slow_waves_pass_unchanged_and_hardly_move_the_suspension(damping_ratio):
    assert_allclose(transmissibility(1e-6, damping_ratio), 1.0, atol=1e-9)
    assert stroke_ratio(1e-6, damping_ratio) < 1e-11


@pytest.mark.parametrize("function", [transmissibility, stroke_ratio])
@pytest.mark.parametrize("damping_ratio", [0.0, 1e-300])
def test_undamped_resonance_has_no_answer(function, damping_ratio):
    with pytest.raises(NoSolutionError) as caught:
        function(np.array([0.5, 1.0, 2.0]), damping_ratio)
    assert caught.value.code == "undamped_resonance"
    assert caught.value.where.tolist() == [False, True, False]


@pytest.mark.parametrize("damping_ratio", [1.0, 1.5])
def test_what_does_not_swing_has_no_swings(damping_ratio):
    for function in (overshoot_from_damping, logarithmic_decrement):
        with pytest.raises(NoSolutionError) as caught:
            function(damping_ratio)
        assert caught.value.code == "not_underdamped"
        assert caught.value.data == {"damping_ratio": damping_ratio}


@pytest.mark.parametrize("overshoot", [0.0, -0.1, 1.0001, 40.0])
def test_overshoot_outside_nothing_and_all_is_refused(overshoot):
    with pytest.raises(InvalidInputError) as caught:
        damping_from_overshoot(overshoot)
    assert caught.value.code == "overshoot_range"
