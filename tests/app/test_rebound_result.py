"""What the rebound screen shows, against the free response of a damped oscillator."""

from math import exp, pi, sqrt

import pytest

from mobileapp.records import Setup, from_json, new_setup, to_json
from mobileapp.release_reading import ReleaseReading
from mobileapp.results.rebound import rebound_view
from mobileapp.texts import LANGUAGES, Texts
from mobileapp.units import Amount

ENGLISH = Texts("en")


def setup_with(*tries: ReleaseReading, **more) -> Setup:
    setup = new_setup("k")
    for reading in tries:
        setup = setup.with_release("front", reading, new=True)
    for end, sag in more.items():
        setup = setup.with_sag(end, sag)
    return setup


def by_ruler(damping_ratio, clicks=None, push=40):
    """The overshoot of a damping ratio: R = exp(−πζ/√(1−ζ²)), any textbook on vibrations."""
    ratio = exp(-pi * damping_ratio / sqrt(1 - damping_ratio**2))
    return ReleaseReading(
        push=Amount(push, "mm"),
        overshoot=Amount(push * ratio, "mm"),
        clicks=None if clicks is None else Amount(clicks, "clicks"),
    )


@pytest.mark.parametrize(("ratio", "turn"), [(0.2, "close"), (0.45, "keep"), (0.7, "open")])
def test_an_overshoot_tells_damping_and_which_way_to_turn(ratio, turn):
    view = rebound_view(setup_with(by_ruler(ratio)), "front", ENGLISH)
    assert float(view.damping.value) == pytest.approx(ratio, abs=0.01)
    assert view.turn == turn
    assert view.advice == ENGLISH(f"rebound.turn.{turn}")
    low, value, high = view.interval
    assert low < value < high
    assert value == pytest.approx(ratio)


def test_nothing_read_yet_asks_for_it():
    view = rebound_view(setup_with(ReleaseReading()), "front", ENGLISH)
    assert view.missing == ENGLISH("rebound.missing.overshoot")
    assert view.damping is None


def test_a_film_without_a_frequency_says_where_to_get_one():
    film = ReleaseReading(way="film", frames=Amount(40, "frames"))
    view = rebound_view(setup_with(film), "front", ENGLISH)
    assert view.missing == ENGLISH("rebound.missing.frequency")


def test_a_film_with_a_frequency_tells_damping():
    film = ReleaseReading(way="film", frames=Amount(40, "frames"))
    setup = setup_with(film)
    setup = setup.with_sag(
        "front", setup.reading("front").__class__(Amount(160, "mm"), Amount(40, "mm"))
    )
    view = rebound_view(setup, "front", ENGLISH)
    # 40 frames at 240/s are 1/6 s; at 2.7 Hz that is U = 2.8 rad, between ζ = 0.6 and 0.7.
    assert 0.5 < float(view.damping.value) < 0.75
    assert len(view.times) == 2


def test_what_did_not_pass_is_a_bound():
    view = rebound_view(setup_with(ReleaseReading(way="not_passed")), "front", ENGLISH)
    assert view.damping is None
    assert view.bound == "at least 0.8"
    assert view.turn == "open"


def test_an_overshoot_beyond_the_push_is_refused_with_a_sentence():
    wrong = ReleaseReading(push=Amount(40, "mm"), overshoot=Amount(45, "mm"))
    view = rebound_view(setup_with(wrong), "front", ENGLISH)
    assert "less than the push" in view.missing


def test_two_settings_tell_the_clicks_between():
    # ζ falls by the same share with each click: 0.8 at 2, 0.25 at 10; the middle of the band,
    # √(0.35 × 0.6) = 0.46, lies 3.8 clicks from the first.
    view = rebound_view(setup_with(by_ruler(0.8, 2), by_ruler(0.25, 10)), "front", ENGLISH)
    assert view.clicks.startswith("By the two settings: close 4, to 6 clicks from closed.")


def test_swapped_clicks_are_noticed():
    view = rebound_view(setup_with(by_ruler(0.25, 2), by_ruler(0.8, 10)), "front", ENGLISH)
    assert "swapped" in view.clicks


def test_one_setting_tells_no_clicks():
    assert rebound_view(setup_with(by_ruler(0.3, 4)), "front", ENGLISH).clicks == ""


def test_tries_survive_being_kept():
    setup = setup_with(by_ruler(0.3, 4), ReleaseReading(way="film", rate=120))
    assert from_json(to_json(setup)) == setup


@pytest.mark.parametrize("turn", ["close", "open", "keep", "measure"])
@pytest.mark.parametrize("language", LANGUAGES)
def test_every_turn_has_words(turn, language):
    assert Texts(language)(f"rebound.turn.{turn}")
