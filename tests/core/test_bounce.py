"""The bounce estimator: clean taps, accidents, what it refuses, and what must not matter."""

import numpy as np
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from core import estimate_bounce
from core.errors import InvalidInputError
from tests.core import tap_streams as streams


def beats(count, period, jitter=0.008, seed=3):
    """Taps on every beat, a little uneven."""
    return np.arange(count) * period + np.random.default_rng(seed).normal(0, jitter, count)


def test_steady_taps_are_enough_after_ten():
    result = estimate_bounce(beats(10, 0.5))
    assert result.state == "done"
    assert result.used == 8
    assert result.low_hz < 2.0 < result.high_hz


def test_even_perfect_taps_have_a_width():
    result = estimate_bounce(np.arange(10) * 0.5)
    assert result.frequency_hz == pytest.approx(2.0, rel=1e-9)
    assert result.high_hz - result.low_hz > 0.01


@pytest.mark.parametrize("count", range(11))
def test_it_asks_for_more_until_eight_taps_are_used(count):
    result = estimate_bounce(beats(count, 0.5))
    assert result.state == ("done" if count >= 10 else "keep_going")
    assert len(result.roles) == len(result.beats) == count


def test_a_missed_beat_is_counted():
    taps = np.delete(beats(12, 0.5), 6)
    result = estimate_bounce(taps)
    assert (result.state, result.missed, result.doubled) == ("done", 1, 0)
    assert result.frequency_hz == pytest.approx(2.0, rel=0.01)
    numbers = [beat for beat in result.beats if beat is not None]
    assert numbers == [0, 1, 2, 3, 5, 6, 7, 8, 9]


@pytest.mark.parametrize("late", [0.06, 0.10, 0.14, 0.18, 0.22, 0.25])
def test_a_doubled_tap_is_set_aside_however_late(late):
    taps = beats(13, 0.6)
    result = estimate_bounce(np.sort(np.append(taps, taps[6] + late)))
    assert (result.state, result.missed, result.doubled) == ("done", 0, 1)
    assert result.roles[7] == "doubled"
    assert result.frequency_hz == pytest.approx(1 / 0.6, rel=0.01)


def test_after_a_pause_it_counts_from_the_restart():
    taps = np.concatenate([beats(5, 0.5), 5.0 + beats(8, 0.5)])
    result = estimate_bounce(taps)
    assert result.after_pause
    assert result.note.code == "bounce_restart"
    assert result.roles[:5] == ("before_pause",) * 5
    assert estimate_bounce(np.append(taps, 9.0 + beats(2, 0.5))).state == "done"


def test_tapping_every_second_bottom_doubles_the_frequency():
    every = estimate_bounce(beats(12, 0.6))
    second = estimate_bounce(beats(12, 0.6), taps_every=2)
    assert second.frequency_hz == pytest.approx(2 * every.frequency_hz)
    assert second.high_hz == pytest.approx(2 * every.high_hz)


@pytest.mark.parametrize(
    ("taps", "code"),
    [
        (beats(12, 1.6), "bounce_frequency"),
        (beats(12, 0.2, jitter=0.003), "bounce_frequency"),
        (np.cumsum([0.3, 0.9, 0.35, 1.1, 0.3, 0.5, 1.2, 0.3, 0.8, 0.45, 1.0, 0.6] * 3), None),
    ],
)
def test_it_says_start_again_and_why(taps, code):
    result, _ = streams.tap_until_told(taps, estimate_bounce)
    assert result.state == "start_again"
    assert result.frequency_hz is None
    assert result.reason.endswith(".")
    if code:
        assert result.note.code == code


@pytest.mark.parametrize(
    ("taps", "every", "code"),
    [
        ([0.0, 1.0, np.nan], 1, "not_finite"),
        ([0.0, 1.0, 0.5], 1, "taps_not_increasing"),
        (np.arange(501.0), 1, "too_many_taps"),
        ([0.0, 1.0], 3, "taps_every"),
    ],
)
def test_what_is_no_series_of_taps_is_refused(taps, every, code):
    with pytest.raises(InvalidInputError) as refusal:
        estimate_bounce(taps, taps_every=every)
    assert refusal.value.code == code


taps_of_any_kind = st.lists(st.floats(0.0, 3.0), max_size=60).map(np.cumsum)


@settings(deadline=None)
@given(taps_of_any_kind)
def test_any_series_gets_a_finite_answer(taps):
    result = estimate_bounce(taps)
    numbers = (result.low_hz, result.frequency_hz, result.high_hz)
    assert all(number is None for number in numbers) or (0 < numbers[0] < numbers[1] < numbers[2])
    assert (result.state == "done") <= (result.used >= 8)
    assert result.used == 0 or result.used == result.roles.count("used")


@settings(deadline=None)
@given(st.integers(0, 2**32 - 1), st.floats(-1e5, 1e6))
def test_when_the_clock_started_does_not_matter(seed, start):
    taps, _ = streams.mixed(np.random.default_rng(seed), 14)
    here, there = estimate_bounce(taps), estimate_bounce(taps + start)
    assert (here.state, here.roles, here.beats) == (there.state, there.roles, there.beats)
    if here.frequency_hz:
        assert there.frequency_hz == pytest.approx(here.frequency_hz, rel=1e-6)


@settings(deadline=None)
@given(st.integers(0, 2**32 - 1))
def test_later_taps_only_add(seed):
    """The estimator has no memory: asked after each tap or once at the end, it says the same."""
    taps, _ = streams.mixed(np.random.default_rng(seed), 14)
    assert estimate_bounce(list(taps)) == estimate_bounce(tuple(taps))
