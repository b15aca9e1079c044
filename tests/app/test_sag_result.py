"""What the sag screen shows, against formulas and by its sentences."""

from math import pi, sin, sqrt

import pytest

from mobileapp.records import SagReading
from mobileapp.results.sag import sag_view
from mobileapp.texts import Texts
from mobileapp.units import Amount

EN = Texts("en")


def fork(sag, travel=150.0, unit="mm"):
    return sag_view("front", SagReading(Amount(travel, unit), Amount(sag, unit)), EN)


def test_a_fork_reading_becomes_per_cent_and_frequency():
    view = fork(30.0)
    assert str(view.percent) == "20.0 ± 1.3 %"
    # Handbook relation f = 15.76 / √δ for δ in mm, along a fork at 65°, for springs between a
    # coil (1.0) and air (1.08).
    static = 15.76 / sqrt(30 * sin(65 * pi / 180))
    assert static <= float(view.frequency.value) <= 1.08 * static


def test_inches_give_the_same_as_millimetres():
    assert str(fork(30 / 25.4, 150 / 25.4, "in").percent) == str(fork(30.0).percent)


def test_a_shock_reading_needs_the_wheel_travel_for_a_frequency():
    without = sag_view("rear", SagReading(Amount(55, "mm"), Amount(16, "mm")), EN)
    assert str(without.percent) == "29 ± 4 %"
    assert without.frequency is None
    assert EN("sag.frequency.unknown") in without.notes
    known = SagReading(Amount(55, "mm"), Amount(16, "mm"), "shaft", Amount(150, "mm"))
    at_wheel = SagReading(Amount(150, "mm"), Amount(16 / 55 * 150, "mm"), "wheel")
    views = sag_view("rear", known, EN), sag_view("rear", at_wheel, EN)
    values = [float(view.frequency.value) for view in views]
    assert values[0] == pytest.approx(values[1], rel=0.01)


@pytest.mark.parametrize(
    ("sag", "travel", "sentence"),
    [
        (0.0, 150.0, "No sag yet."),
        (-1.0, 150.0, "Sag can't be below zero."),
        (150.0, 150.0, "Sag can't reach the full travel of 150 mm."),
        (30.0, 0.0, "Travel must be more than zero."),
    ],
)
def test_impossible_readings_get_a_sentence(sag, travel, sentence):
    view = fork(sag, travel)
    assert view.error.startswith(sentence)
    assert view.percent is None


@pytest.mark.parametrize(
    ("sag", "verdict"), [(10.0, "below"), (30.0, "inside"), (60.0, "above"), (38.5, "about at")]
)
def test_the_verdict_respects_the_range(sag, verdict):
    assert fork(sag).verdict.startswith(verdict)


def test_what_cannot_be_read_closely_enough_has_no_frequency():
    view = fork(1.0)
    assert view.percent is not None
    assert view.frequency is None
    assert EN("sag.frequency.too_small") in view.notes
