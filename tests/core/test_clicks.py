import numpy as np
import pytest
from hypothesis import assume, given
from hypothesis import strategies as st
from numpy.testing import assert_allclose

from core.clicks import TARGET, TriedSetting, clicks_for_damping
from core.errors import InvalidInputError, NoSolutionError
from core.release import ONE_OVERSHOOT
from core.uncertainty import Measured


def tried(clicks, damping_ratio, sd=0.02):
    return TriedSetting(clicks, Measured(damping_ratio, sd))


def codes(advice):
    return [note.code for note in advice.notes]


def test_target_is_inside_the_band():
    assert ONE_OVERSHOOT[0] < TARGET < ONE_OVERSHOOT[1]


@given(
    slope=st.floats(0.03, 0.2),
    first=st.integers(2, 12),
    second=st.integers(2, 12),
    target=st.integers(0, 14),
)
def test_needle_that_is_straight_in_the_logarithm_is_found_exactly(slope, first, second, target):
    assume(abs(first - second) >= 2)

    def damping(clicks):
        return 0.8 * np.exp(-slope * clicks)

    advice = clicks_for_damping(
        tried(first, damping(first), 1e-6), tried(second, damping(second), 1e-6), damping(target)
    )
    assert_allclose(advice.fitting.value, target, atol=1e-6)
    assert advice.turn == advice.clicks - second
    span = abs(first - second)
    if min(first, second) - span < target < max(first, second) + span:
        assert (advice.clicks, codes(advice)) == (target, [])


@given(damping=st.floats(0.2, 0.7), target=st.floats(0.2, 0.7))
def test_order_of_trying_does_not_matter_for_the_position(damping, target):
    pair = tried(4, damping * 1.3, 0.005), tried(8, damping, 0.005)
    there = clicks_for_damping(*pair, target)
    back = clicks_for_damping(*reversed(pair), target)
    assert_allclose(there.fitting.value, back.fitting.value, atol=1e-9)
    assert_allclose(there.clicks, back.clicks, atol=1)  # a half may round either way
    assert codes(there) == codes(back)


def test_far_target_is_approached_in_a_step():
    advice = clicks_for_damping(tried(4, 0.9), tried(6, 0.8), 0.3)
    assert advice.fitting.value > 20
    assert (advice.clicks, advice.turn) == (8, 2)
    assert codes(advice) == ["clicks_step"]
    closing = clicks_for_damping(tried(10, 0.3, 0.005), tried(8, 0.33, 0.005), 0.8)
    assert (closing.clicks, closing.turn, codes(closing)) == (6, -2, ["clicks_step"])


def test_adjuster_ends():
    opened = clicks_for_damping(tried(6, 0.7), tried(10, 0.55), 0.45, available=12)
    assert (opened.clicks, opened.turn, codes(opened)) == (12, 2, ["adjuster_end"])
    closed = clicks_for_damping(tried(4, 0.3), tried(1, 0.4), 0.5)
    assert (closed.clicks, closed.turn, codes(closed)) == (0, -1, ["adjuster_end"])


@pytest.mark.parametrize(
    "pair",
    [
        (tried(6, 0.5), tried(6, 0.7)),
        (tried(4, 0.5), tried(8, 0.5)),
        (tried(4, 0.52), tried(8, 0.5)),
        (tried(4, 0.7, 0.1), tried(8, 0.5, 0.1)),
    ],
)
def test_settings_that_cannot_be_told_apart_have_no_answer(pair):
    with pytest.raises(NoSolutionError) as caught:
        clicks_for_damping(*pair)
    assert caught.value.code == "clicks_no_effect"


def test_damping_that_rises_with_opening_is_refused():
    with pytest.raises(InvalidInputError) as caught:
        clicks_for_damping(tried(4, 0.4), tried(8, 0.6))
    assert caught.value.code == "clicks_wrong_way"


@pytest.mark.parametrize("target", [0.0, 1.0, -0.5, np.nan])
def test_target_outside_the_scale_is_refused(target):
    with pytest.raises(InvalidInputError) as caught:
        clicks_for_damping(tried(4, 0.7), tried(8, 0.5), target)
    assert caught.value.code == "damping_target"


@pytest.mark.parametrize(
    ("clicks", "damping_ratio", "code"),
    [(-1, 0.5, "negative"), (np.nan, 0.5, "not_finite"), (3, 0.0, "not_positive")],
)
def test_setting_that_does_not_exist_is_refused(clicks, damping_ratio, code):
    with pytest.raises(InvalidInputError) as caught:
        tried(clicks, damping_ratio)
    assert caught.value.code == code
