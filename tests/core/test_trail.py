"""Riding over bumps, against an integrator with the real, uneven damper."""

from dataclasses import fields, replace

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st
from numpy.testing import assert_allclose
from scipy.integrate import solve_ivp
from scipy.optimize import minimize_scalar
from scipy.signal import lfilter

from core.constants import STANDARD_GRAVITY
from core.errors import InvalidInputError, NoSolutionError
from core.oscillator import TURN, stroke_ratio, transmissibility
from core.packing import interval_for, packed_share, packing_notes, recovered_share
from core.rebound import wheel_return_time
from core.trail import (
    FASTEST,
    FOLLOWING_RATIO,
    FORK_CROSSOVER,
    SHOCK_CROSSOVER,
    WHEEL_SHARE,
    Bumps,
    End,
    circuit_at,
    following_limit,
    regime_at,
    ride,
)
from core.uncertainty import Estimate, Measured
from core.uneven import least_contact, mean_damping, mean_drop
from core.waves import (
    filtering_speed,
    forcing_frequency,
    peak_response_ratio,
    resonant_speed,
    sine_peaks,
)

frequencies = st.floats(1.2, 4.0)
spacings = st.floats(0.3, 6.0)
speeds = st.floats(1.0, 15.0)
dampings = st.floats(0.05, 1.0)
ratios = st.floats(0.1, 8.0)

BRAKING_BUMPS = Bumps(spacing=Measured(1.0, 0.05), height=Measured(0.02, 0.002))
FORK = End(Measured(2.6, 0.1), compression=Measured(0.25, 0.03), rebound=Measured(0.5, 0.03))


def steady(ratio, compression, rebound, wheel_share=WHEEL_SHARE):
    """Amplitude, drop and least contact per metre of ground, integrated to the steady state.

    Unit natural frequency; contact is linear in the amplitude, so its loss per metre is told.
    """

    def damper(speed):
        return 2.0 * np.where(speed > 0.0, compression, rebound) * speed

    def motion(time, state):
        position, speed = state
        stroke = np.sin(ratio * time) - position
        return speed, stroke + damper(ratio * np.cos(ratio * time) - speed)

    period = TURN / ratio
    settled = np.ceil(8.0 / min(compression, rebound) / period) * period
    time = settled + np.linspace(0.0, period, 721)
    with np.errstate(all="ignore"):  # scipy's own step control
        run = solve_ivp(motion, (0.0, time[-1]), (0.0, 0.0), t_eval=time, rtol=1e-8, atol=1e-10)
    position, speed = run.y
    phasor = 2.0 * np.mean(position[:-1] * np.exp(-1j * ratio * time[:-1]))
    ground = np.sin(ratio * time)
    stroke_speed = ratio * np.cos(ratio * time) - speed
    force = ground - position + damper(stroke_speed) - wheel_share * ratio**2 * ground
    return abs(phasor), -position[:-1].mean(), -force.min()


@pytest.mark.parametrize("ratio", [0.3, 0.7, 1.0, 1.3, 2.0, 4.0])
@pytest.mark.parametrize(
    # Damping, then the errors found for the linear model: amplitude, drop, both relative.
    ("compression", "rebound", "amplitude_error", "drop_error"),
    [(0.3, 0.3, 1e-4, 0.0), (0.2, 0.4, 0.014, 0.023), (0.15, 0.6, 0.044, 0.078)],
)
def test_uneven_damper_against_integration(
    ratio, compression, rebound, amplitude_error, drop_error
):
    amplitude, drop, lifting = steady(ratio, compression, rebound)
    damping = mean_damping(compression, rebound)
    assert_allclose(transmissibility(ratio, damping), amplitude, rtol=amplitude_error)
    assert_allclose(mean_drop(ratio, compression, rebound), drop, rtol=drop_error, atol=1e-4)
    # Force over static load per metre, back to the units of the integration.
    contact = least_contact(
        1e-3,
        ratio / TURN,
        frequency=1.0 / TURN,
        compression=compression,
        rebound=rebound,
        wheel_share=WHEEL_SHARE,
    )
    found = (1.0 - contact) * STANDARD_GRAVITY * (1.0 + WHEEL_SHARE) / 1e-3
    # The neglected harmonics add to the force: 10 % at 4 : 1, 4 % at 2 : 1.
    assert_allclose(found, lifting, rtol=max(3.0 * amplitude_error, 1e-3))


@given(speed=speeds, spacing=spacings, factor=st.floats(0.1, 10.0))
def test_only_the_ratio_of_speed_and_spacing_counts(speed, spacing, factor):
    assert_allclose(
        forcing_frequency(factor * speed, factor * spacing),
        forcing_frequency(speed, spacing),
        rtol=1e-12,
    )


@given(spacing=spacings, frequency=frequencies, damping_ratio=dampings)
def test_resonant_speed_is_where_most_reaches_the_body(spacing, frequency, damping_ratio):
    def minus_passed_on(speed):
        ratio = forcing_frequency(speed, spacing) / frequency
        return -transmissibility(ratio, damping_ratio)

    peak = minimize_scalar(
        minus_passed_on,
        bounds=(0.2 * spacing * frequency, 1.2 * spacing * frequency),
        method="bounded",
        options={"xatol": 1e-9},
    )
    assert_allclose(resonant_speed(spacing, frequency, damping_ratio), peak.x, rtol=1e-5)


@given(spacing=spacings, frequency=frequencies, damping_ratio=dampings)
def test_filtering_speed_passes_everything_on(spacing, frequency, damping_ratio):
    speed = filtering_speed(spacing, frequency)
    ratio = forcing_frequency(speed, spacing) / frequency
    assert_allclose(transmissibility(ratio, damping_ratio), 1.0, rtol=1e-12)


@given(spacing=spacings, frequency=frequencies)
def test_resonant_speed_without_damping_has_one_bump_a_swing(spacing, frequency):
    assert_allclose(resonant_speed(spacing, frequency), spacing * frequency)


@given(lower=dampings, step=st.floats(0.01, 1.0))
def test_damping_lowers_the_peak_and_its_speed(lower, step):
    assert peak_response_ratio(lower + step) < peak_response_ratio(lower) < 1.0
    assert peak_response_ratio(0.0) == 1.0


@given(amplitude=st.floats(1e-3, 0.2), frequency=st.floats(0.5, 30.0))
def test_sine_peaks_are_those_of_its_derivatives(amplitude, frequency):
    phase = np.linspace(0.0, TURN, 4001)
    velocity, acceleration = sine_peaks(amplitude, frequency)
    step = (phase[1] - phase[0]) / (TURN * frequency)
    speed = np.gradient(amplitude * np.sin(phase), step)
    assert_allclose(speed.max(), velocity, rtol=1e-5)
    assert_allclose(np.gradient(speed, step)[2:-2].max(), acceleration, rtol=1e-5)


@given(ratio=ratios, compression=dampings, rebound=dampings)
def test_drop_is_downwards_exactly_if_rebound_is_stronger(ratio, compression, rebound):
    drop = mean_drop(ratio, compression, rebound)
    assert np.sign(drop) == np.sign(rebound - compression)
    assert_allclose(drop, -mean_drop(ratio, rebound, compression), rtol=1e-12)


@given(
    forcing=st.floats(0.5, 20.0),
    frequency=frequencies,
    damping_ratio=dampings,
    wheel_share=st.floats(0.0, 0.5),
)
def test_contact_with_an_even_damper_is_that_of_the_inertias(
    forcing, frequency, damping_ratio, wheel_share
):
    # The ground bears what accelerates body and wheel: another road to the same force.
    ratio = forcing / frequency
    body = (1 + 2j * damping_ratio * ratio) / (1 - ratio**2 + 2j * damping_ratio * ratio)
    inertia = 0.01 * (TURN * forcing) ** 2 * abs(body + wheel_share)
    contact = least_contact(
        0.01,
        forcing,
        frequency=frequency,
        compression=damping_ratio,
        rebound=damping_ratio,
        wheel_share=wheel_share,
    )
    assert_allclose(
        contact, 1 - inertia / (STANDARD_GRAVITY * (1 + wheel_share)), rtol=1e-9, atol=1e-9
    )


@given(elapsed=st.floats(0.1, 25.0), return_time=st.floats(0.01, 0.5))
def test_packing_is_the_sum_of_all_that_earlier_bumps_left(elapsed, return_time):
    interval = elapsed * return_time
    decay = np.exp(-elapsed)
    bumps = np.ones(400)
    levels = lfilter([decay], [1.0, -decay], bumps)
    assert_allclose(packed_share(interval, return_time), levels[-1], rtol=1e-9)
    assert_allclose(recovered_share(interval, return_time), 1.0 - decay, rtol=1e-9)


@given(packed=st.floats(0.001, 1.0), return_time=st.floats(0.01, 0.5))
def test_packing_and_its_interval_are_inverse(packed, return_time):
    interval = interval_for(packed, return_time)
    assert_allclose(packed_share(interval, return_time), packed, rtol=1e-9)


@given(interval=st.floats(0.02, 2.0), return_time=st.floats(0.01, 0.5))
def test_slower_rebound_packs_more_and_recovers_less(interval, return_time):
    slower = 1.5 * return_time
    assert packed_share(interval, slower) > packed_share(interval, return_time)
    assert recovered_share(interval, slower) <= recovered_share(interval, return_time)


def test_all_of_a_bump_may_be_left():
    assert_allclose(interval_for(1.0, 0.1), 0.1 * np.log(2.0))


@pytest.mark.parametrize("packed", [0.0, -0.1, 1.1, np.nan])
def test_rest_that_cannot_be_left_is_refused(packed):
    with pytest.raises(InvalidInputError):
        interval_for(packed, 0.1)


@pytest.mark.parametrize(
    ("ratio", "rebound", "trusted"),
    [(3.2, 0.8, True), (3.2, 0.5, True), (3.0, 0.8, False), (3.2, 0.49, False)],
)
def test_packing_says_where_it_is_an_indication(ratio, rebound, trusted):
    assert (packing_notes(ratio, rebound) == ()) is trusted


def test_passage_holds_what_the_parts_say():
    speed = Measured(6.0, 0.3)
    passage = ride(BRAKING_BUMPS, speed, FORK)
    ratio = 6.0 / 2.6
    assert_allclose(passage.forcing.value, 6.0)
    assert_allclose(passage.frequency_ratio.value, ratio)
    assert_allclose(passage.transmissibility.value, transmissibility(ratio, 0.375))
    assert_allclose(passage.mean_drop.value, 0.01 * mean_drop(ratio, 0.25, 0.5))
    assert_allclose(passage.stroke.value, 0.01 * stroke_ratio(ratio, 0.375))
    return_time = wheel_return_time(2.6, 0.5)
    assert_allclose(passage.packed.value, packed_share(1 / 6, return_time))
    assert_allclose(passage.recovered.value, recovered_share(1 / 6, return_time))
    assert_allclose(
        [passage.wheel_speed.value, passage.wheel_acceleration.value], sine_peaks(0.01, 6.0)
    )
    assert_allclose(
        [passage.shaft_speed.value, passage.shaft_acceleration.value],
        sine_peaks(passage.stroke.value, 6.0),
    )
    estimates = [
        getattr(passage, field.name) for field in fields(passage) if field.type is Estimate
    ]
    assert len(estimates) == 12
    assert all(estimate.low < estimate.value < estimate.high for estimate in estimates)
    assert (passage.regime, passage.circuit) == ("filters", "crossover")


def test_shaft_of_a_rear_shock_moves_less_than_the_wheel():
    rear = replace(FORK, leverage=Measured(2.7, 0.05), crossover=SHOCK_CROSSOVER)
    passage = ride(BRAKING_BUMPS, Measured(6.0), rear)
    direct = ride(BRAKING_BUMPS, Measured(6.0), FORK)
    assert_allclose(passage.shaft_speed.value, direct.shaft_speed.value / 2.7)
    assert_allclose(passage.wheel_speed.value, direct.wheel_speed.value)


def codes(passage):
    return {note.code for note in passage.notes}


def test_notes_tell_the_limits_of_the_answer():
    slow = ride(BRAKING_BUMPS, Measured(6.0, 0.3), FORK)
    assert codes(slow) == {"packing_indication"}
    fast = ride(BRAKING_BUMPS, Measured(10.0, 0.3), FORK)
    assert codes(fast) == {"wheel_may_leave_ground"}
    too_fast = ride(BRAKING_BUMPS, Measured(14.0, 0.3), FORK)
    assert codes(too_fast) == {"wheel_leaves_ground"}


def test_notes_tell_when_travel_or_damping_do_not_fit():
    high = replace(BRAKING_BUMPS, height=Measured(0.1))
    resonant = Measured(2.5)
    out = ride(high, resonant, replace(FORK, sag=0.03))
    assert {"room_m": 0.03} in [note.data for note in out.notes if note.code == "stroke_tops_out"]
    down = ride(high, resonant, replace(FORK, sag=0.07, travel=0.1))
    (room,) = [note.data["room_m"] for note in down.notes if note.code == "stroke_bottoms"]
    assert_allclose(room, 0.03)
    roomy = ride(high, resonant, replace(FORK, sag=0.2, travel=0.5))
    assert not codes(roomy) & {"stroke_tops_out", "stroke_bottoms"}
    uneven = ride(BRAKING_BUMPS, resonant, replace(FORK, compression=Measured(0.1)))
    assert "damping_uneven" in codes(uneven)


@pytest.mark.parametrize(
    ("ratio", "regime"),
    [
        (0.3, "follows"),
        (FOLLOWING_RATIO, "follows"),
        (1.0, "resonates"),
        (1.41, "resonates"),
        (1.42, "filters"),
    ],
)
def test_regimes(ratio, regime):
    assert regime_at(ratio) == regime


@pytest.mark.parametrize(
    ("speed", "circuit"),
    [(0.09, "low"), (0.1, "crossover"), (0.5, "crossover"), (0.51, "high")],
)
def test_circuits_of_a_fork(speed, circuit):
    assert circuit_at(speed, FORK_CROSSOVER) == circuit


@pytest.mark.parametrize(
    ("speed", "circuit"),
    [(0.04, "low"), (0.05, "crossover"), (0.3, "crossover"), (0.31, "high")],
)
def test_circuits_of_a_shock(speed, circuit):
    assert circuit_at(speed, SHOCK_CROSSOVER) == circuit


def test_defaults_are_a_forks():
    # Common practice, no source: 3 to 5 kg move with a wheel that carries 30 to 50 kg.
    assert 3 / 50 < FORK.wheel_share < 5 / 30
    assert FORK.crossover == FORK_CROSSOVER
    assert FORK.leverage == Measured(1.0)


def test_wheel_leaves_the_ground_at_the_following_limit():
    limit = following_limit(BRAKING_BUMPS, FORK)
    assert ride(BRAKING_BUMPS, Measured(limit), FORK).contact.value <= 0.0
    assert ride(BRAKING_BUMPS, Measured(limit - 0.051), FORK).contact.value > 0.0
    higher = replace(BRAKING_BUMPS, height=Measured(0.03))
    assert following_limit(higher, FORK) < limit


def test_wheel_follows_gentle_waves_at_any_speed():
    gentle = Bumps(spacing=Measured(20.0), height=Measured(0.02))
    assert following_limit(gentle, FORK) is None
    assert ride(gentle, Measured(FASTEST), FORK).contact.value > 0.0


def test_end_without_rebound_damping_is_refused():
    undamped = replace(FORK, rebound=Measured(0.0))
    with pytest.raises(InvalidInputError) as caught:
        ride(BRAKING_BUMPS, Measured(6.0), undamped)
    assert caught.value.code == "not_positive"


def test_damping_that_may_be_none_is_too_uncertain():
    vague = replace(FORK, rebound=Measured(0.3, 0.3))
    with pytest.raises(NoSolutionError) as caught:
        ride(BRAKING_BUMPS, Measured(6.0), vague)
    assert caught.value.code == "too_uncertain"


@pytest.mark.parametrize("crossover", [(0.5, 0.1), (0.0, 0.1), (0.1, np.nan)])
def test_crossover_that_runs_backwards_is_refused(crossover):
    with pytest.raises(InvalidInputError) as caught:
        replace(FORK, crossover=crossover)
    assert caught.value.code == "crossover_order"


@pytest.mark.parametrize("field", ["spacing", "height"])
def test_bumps_without_size_are_refused(field):
    flat = replace(BRAKING_BUMPS, **{field: Measured(0.0)})
    for call in (lambda: ride(flat, Measured(6.0), FORK), lambda: following_limit(flat, FORK)):
        with pytest.raises(InvalidInputError) as caught:
            call()
        assert (caught.value.code, caught.value.field) == ("not_positive", field)
