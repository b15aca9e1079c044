"""What the bounce screen shows: words, numbers, and where each beat stands on the strip."""

from itertools import pairwise

import pytest

from mobileapp.records import BounceRun
from mobileapp.results.bounce import STRIP_PERIODS, bounce_view
from mobileapp.texts import Texts

PERIOD = 0.5  # [s]
ENGLISH = Texts("en")


def steady(count, *, left_out=(), extra=(), jitter=(0.0, 0.012, -0.009, 0.004)):
    """Taps along to a rider with a small, repeating error; some left out, some added."""
    beats = [
        beat * PERIOD + jitter[beat % len(jitter)] for beat in range(count) if beat not in left_out
    ]
    return BounceRun(tuple(sorted([*beats, *extra])))


def kinds(view):
    return [mark.kind for mark in sorted(view.strip, key=lambda mark: mark.place)]


def test_a_steady_series_is_done_and_says_so():
    view = bounce_view(steady(12), ENGLISH)
    assert view.state == "done"
    assert view.voice == "Done. Saved."
    assert view.reason == "That is enough."
    assert float(view.frequency.value) == pytest.approx(1 / PERIOD, rel=0.02)
    assert view.counts == {"used": "10 used", "warm_up": "2 to get going"}


def test_one_tap_stands_at_the_start():
    view = bounce_view(BounceRun((0.0,)), ENGLISH)
    assert [mark.place for mark in view.strip] == [0.0]
    assert view.frequency is None


def test_a_missed_beat_stands_where_it_was_due():
    view = bounce_view(steady(10, left_out=(6,)), ENGLISH)
    assert kinds(view) == ["warm_up"] * 2 + ["used"] * 4 + ["missed"] + ["used"] * 3
    places = sorted(mark.place for mark in view.strip)
    spacing = [later - earlier for earlier, later in pairwise(places)]
    assert spacing == pytest.approx([1 / STRIP_PERIODS] * 9, abs=0.05 / STRIP_PERIODS)
    assert view.counts["missed"] == "1 missed"


def test_a_double_is_marked_and_not_used():
    view = bounce_view(steady(10, extra=(2.61,)), ENGLISH)
    assert kinds(view).count("doubled") == 1
    assert view.counts["doubled"] == "1 doubled"


def test_a_long_series_shows_its_latest_beats():
    view = bounce_view(steady(40), ENGLISH)
    places = [mark.place for mark in view.strip]
    assert max(places) == pytest.approx(1.0)
    assert min(places) >= 0.0
    assert len(places) == pytest.approx(STRIP_PERIODS + 1, abs=1)


def test_every_second_bottom_is_half_of_them():
    run = steady(12)
    every, second = (bounce_view(BounceRun(run.taps, n), ENGLISH).frequency for n in (1, 2))
    assert float(second.value) == pytest.approx(2 * float(every.value), rel=0.01)


def test_what_was_kept_before_it_was_done_says_so():
    view = bounce_view(steady(6), ENGLISH, kept=True)
    assert view.voice == "Saved as it is."
    assert view.frequency is not None


def test_a_missing_tap_clock_is_told():
    run = steady(12)
    assert bounce_view(run, ENGLISH).notes == ()
    assert len(bounce_view(BounceRun(run.taps, page_clock=False), ENGLISH).notes) == 1


def test_german_speaks_german():
    view = bounce_view(steady(6), Texts("de"))
    assert view.reason == "Bisher gleichmäßig: noch 4 Tipper."
    assert "," in view.frequency.value
