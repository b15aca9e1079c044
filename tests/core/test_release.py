import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st
from numpy.testing import assert_allclose

from core.errors import InvalidInputError, NoSolutionError
from core.oscillator import overshoot_from_damping
from core.rebound import crossing_time, damping_from_crossing
from core.release import (
    FRAME_SD,
    HAND_TIMING_SD,
    ILL_DETERMINED,
    ONE_OVERSHOOT,
    VISIBLE_OVERSHOOT,
    Damping,
    advise,
    damping_by_overshoot,
    damping_by_time,
    damping_if_not_passed,
    time_from_frames,
)
from core.uncertainty import COVERAGE_FACTOR, Estimate, Measured

NO_FRICTION = Measured(0.0)
PUSH = Measured(0.04, 0.001)


def codes(damping):
    return [note.code for note in damping.notes]


def test_a_frame_count_is_as_good_as_two_uniform_ends():
    random = np.random.default_rng(5)
    ends = random.uniform(-0.5, 0.5, (2, 200_000))
    assert_allclose((ends[0] - ends[1]).std(), FRAME_SD, rtol=0.01)


def test_time_from_frames():
    time = time_from_frames([37, 38, 39], 240.0)
    assert_allclose(time.value, 38 / 240)
    assert_allclose(time.sd, 1.0 / np.sqrt(3) / 240)  # their scatter is more than a frame's
    assert_allclose(time_from_frames([38], 240.0).sd, FRAME_SD / 240)


@pytest.mark.parametrize(
    ("frames", "rate", "code"),
    [([], 240.0, "no_readings"), ([0], 240.0, "not_positive"), ([38], 0.0, "not_positive")],
)
def test_frames_without_a_time_are_refused(frames, rate, code):
    with pytest.raises(InvalidInputError) as caught:
        time_from_frames(frames, rate)
    assert caught.value.code == code


@given(damping_ratio=st.floats(0.05, 0.85), frequency=st.floats(1.5, 3.5))
def test_film_finds_the_damping_back(damping_ratio, frequency):
    time = crossing_time(frequency, damping_ratio)
    found = damping_by_time(
        Measured(time, FRAME_SD / 240), Measured(frequency, 0.03 * frequency), NO_FRICTION
    )
    assert found.state == "measured"
    assert_allclose(found.ratio.value, damping_ratio, rtol=1e-9)
    assert found.ratio.low <= damping_ratio <= found.ratio.high
    assert found.at_least == found.ratio.low


def test_film_takes_friction_out():
    share = 0.05
    # Where a release with ζ = 0.3 and friction passes the mark, from `core.rebound` itself.
    times = np.linspace(0.13, 0.2, 7001)
    time = np.interp(0.3, damping_from_crossing(times, 2.0, share), times)
    found = damping_by_time(Measured(time, 0.002), Measured(2.0), Measured(share, 0.01))
    assert_allclose(found.ratio.value, 0.3, atol=1e-6)
    # Each alone, from the slope of the inverse, and both together.
    by_time, by_friction = (
        (damping_from_crossing(time + 2 * late, 2.0, share + 2 * more) - 0.3) / 2
        for late, more in ((0.002, 0.0), (0.0, 0.01))
    )
    expected = np.hypot(by_time, by_friction)
    assert_allclose(found.ratio.as_measured().sd, expected, rtol=0.1)  # curved a little


def test_hand_timing_is_30_ms_at_either_end():
    assert_allclose(HAND_TIMING_SD, np.hypot(0.03, 0.03))


@given(damping_ratio=st.floats(0.05, 0.7))
def test_overshoot_finds_the_damping_back(damping_ratio):
    overshoot = Measured(0.04 * overshoot_from_damping(damping_ratio), 0.001)
    found = damping_by_overshoot(PUSH, overshoot, NO_FRICTION)
    assert_allclose(found.ratio.value, damping_ratio, rtol=1e-9)
    assert codes(found) in ([], ["damping_open_low"], ["damping_open_high"])


@pytest.mark.parametrize("damping_ratio", [0.3, 0.5])
def test_interval_covers_what_readings_give(damping_ratio):
    # A thousand people measure the same bike; the claimed interval must catch about 95 %.
    random = np.random.default_rng(11)
    caught = 0
    for _ in range(1000):
        push = Measured(random.normal(0.04, 0.001), 0.001)
        true_overshoot = 0.04 * overshoot_from_damping(damping_ratio)
        overshoot = Measured(random.normal(true_overshoot, 0.001), 0.001)
        ratio = damping_by_overshoot(push, overshoot, NO_FRICTION).ratio
        caught += ratio.low <= damping_ratio <= ratio.high
    assert 930 <= caught <= 970  # three standard errors of a binomial around 950


def test_friction_not_measured_is_told():
    assert codes(damping_by_overshoot(PUSH, Measured(0.012, 0.001))) == ["friction_unknown"]
    assert codes(damping_by_time(Measured(0.156, 0.002), Measured(2.0, 0.05))) == [
        "friction_unknown"
    ]


@pytest.mark.parametrize("friction", [0.002, 0.004])
def test_friction_reads_as_less_damping_when_measured(friction):
    raw = damping_by_overshoot(PUSH, Measured(0.012, 0.001))
    corrected = damping_by_overshoot(PUSH, Measured(0.012, 0.001), Measured(friction, 0.0003))
    assert corrected.ratio.value < raw.ratio.value


def test_hardly_damped_release_has_an_open_lower_end():
    found = damping_by_time(time_from_frames([31], 240.0), Measured(2.0, 0.1), NO_FRICTION)
    assert codes(found) == ["damping_open_low"]
    assert 0.0 <= found.ratio.low < 0.02 < found.ratio.high


def test_barely_visible_overshoot_has_an_open_upper_end():
    found = damping_by_overshoot(PUSH, Measured(0.001, 0.001), NO_FRICTION)
    assert codes(found) == ["damping_open_high"]
    assert found.ratio.high > ILL_DETERMINED


def test_late_crossing_only_tells_a_least_damping():
    found = damping_by_time(Measured(0.6, 0.005), Measured(2.0, 0.1), NO_FRICTION)
    assert (found.state, found.ratio) == ("at_least", None)
    assert 0.85 < found.at_least <= ILL_DETERMINED


@given(push=st.floats(0.01, 0.1))
def test_not_passing_means_at_least_the_damping_of_the_least_visible_overshoot(push):
    found = damping_if_not_passed(push)
    assert found.state == "at_least"
    assert_allclose(overshoot_from_damping(found.at_least), VISIBLE_OVERSHOOT / push, rtol=1e-9)


@pytest.mark.parametrize(("push", "visible"), [(0.001, 0.001), (0.02, 0.03)])
def test_push_that_is_no_more_than_visible_tells_nothing(push, visible):
    with pytest.raises(InvalidInputError) as caught:
        damping_if_not_passed(push, visible)
    assert caught.value.code == "overshoot_range"


@given(damping_ratio=st.floats(0.0, 0.6), frequency=st.floats(1.5, 4.0))
def test_hand_timing_is_refused_with_its_reason(damping_ratio, frequency):
    time = crossing_time(frequency, round(damping_ratio, 3)) * 1.001
    with pytest.raises(NoSolutionError) as caught:
        damping_by_time(Measured(time, HAND_TIMING_SD), Measured(frequency))
    assert caught.value.code == "timing_too_coarse"
    assert_allclose(caught.value.data["timing_s"], COVERAGE_FACTOR * HAND_TIMING_SD)
    assert "film" in str(caught.value)


def test_thirty_frames_per_second_are_just_good_enough():
    found = damping_by_time(time_from_frames([5], 30.0), Measured(2.0, 0.05), NO_FRICTION)
    assert found.ratio.half_width > 0.15


def test_overshoot_beyond_sag_means_topping_out():
    with pytest.raises(InvalidInputError) as caught:
        damping_by_overshoot(PUSH, Measured(0.012, 0.001), sag=0.012)
    assert caught.value.code == "overshoot_beyond_sag"
    assert damping_by_overshoot(PUSH, Measured(0.012, 0.001), sag=0.013).state == "measured"


def reading(value, low, high):
    return Damping("measured", Estimate(value, low, high), low)


@pytest.mark.parametrize(
    ("damping", "turn", "sure"),
    [
        (reading(0.2, 0.15, 0.25), "close", True),
        (reading(0.3, 0.2, 0.4), "close", False),
        (reading(0.45, 0.4, 0.5), "keep", True),
        (reading(0.45, 0.3, 0.6), "keep", False),
        (reading(0.45, 0.4, 0.7), "keep", False),
        (reading(0.65, 0.55, 0.75), "open", False),
        (reading(0.75, 0.65, 0.85), "open", True),
        (Damping("at_least", None, 0.76), "open", True),
        (Damping("at_least", None, 0.5), "measure", False),
    ],
)
def test_advice(damping, turn, sure):
    advice = advise(damping)
    assert (advice.turn, advice.sure) == (turn, sure)


@pytest.mark.parametrize("band", [(0.6, 0.35), (0.0, 0.5), (0.5, 0.5), (0.5, 1.0), (np.nan, 0.5)])
def test_band_that_runs_backwards_is_refused(band):
    with pytest.raises(InvalidInputError) as caught:
        advise(reading(0.45, 0.4, 0.5), band)
    assert caught.value.code == "band_order"


def test_band_is_that_of_one_overshoot_after_a_push_of_40_mm():
    # The trade's rule in millimetres; computed, as the rule itself has no numbers.
    first = 40.0 * overshoot_from_damping(np.array(ONE_OVERSHOOT))
    assert_allclose(first, [12.4, 3.8], atol=0.05)
    back = first * overshoot_from_damping(np.array(ONE_OVERSHOOT))
    assert_allclose(back, [3.8, 0.4], atol=0.05)
