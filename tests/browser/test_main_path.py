"""The main path as a person walks it, with the numbers checked against formulas and true times."""

import re
from itertools import pairwise
from math import pi, sin, sqrt

import pytest

PAD = (195, 650)  # a place on the tap pad


def shown_reading(words, unit):
    """The first reading of a unit on the screen: value and ±."""
    found = re.search(rf"([\d.]+) ± ([\d.]+) {unit}", words)
    assert found, words
    return float(found[1]), float(found[2])


def test_sag_is_read_and_kept_without_a_network(phone, server, screenshot):
    phone.offline_ready()
    server.kill()
    phone.press("Measure sag")
    phone.type_into("Sag reading", "32,5")
    phone.sees("inside the usual 18 to 25 %")
    screenshot(phone, "sag")
    percent, percent_range = shown_reading(phone.words(), "%")
    assert percent == pytest.approx(100 * 32.5 / 150, abs=0.1)
    # One millimetre (SD) of reading and of travel, 1.96 SDs: error propagation by hand.
    assert percent_range == pytest.approx(
        1.96 * 100 * sqrt((1 / 150) ** 2 + (32.5 / 150**2) ** 2), abs=0.1
    )
    frequency, frequency_range = shown_reading(phone.words(), "Hz")
    # f = √(g/δ) / 2π, the handbook's relation, along the fork at 65° and for common springs.
    static = sqrt(9.80665 / (0.0325 * sin(65 * pi / 180))) / (2 * pi)
    assert abs(frequency - static) < frequency_range
    phone.reload()
    phone.press("Back")
    phone.sees("Front 21.7 ± 1.3 %")
    server.start()


def test_impossible_sag_gets_a_sentence_at_the_field(phone):
    phone.press("Measure sag")
    phone.type_into("Sag reading", "150")
    phone.sees("Sag can't reach the full travel of 150 mm.")
    phone.type_into("Sag reading", "abc")
    phone.sees("That isn't a number.")
    phone.type_into("Sag reading", "30")
    phone.sees("20.0 ± 1.3 %")


def test_a_bounce_is_timed_by_touches_at_known_times(phone, server, screenshot):
    phone.offline_ready()
    server.kill()
    phone.press("Time a bounce")
    phone.sees("Tap at every bottom")
    early_or_late = (0.01, -0.015, 0.02, -0.01, 0.005, -0.02, 0.015, 0.01, -0.015, 0.02, -0.005)
    ideal = [0.46 * beat + jitter for beat, jitter in enumerate(early_or_late)]
    phone.tap_along(*PAD, [later - earlier for earlier, later in pairwise(ideal)])
    phone.sees("Done. Saved.")
    screenshot(phone, "bounce-done")
    phone.sees_not("The browser gives no exact tap times here")
    frequency, half_width = shown_reading(phone.words(), "Hz")
    assert frequency == pytest.approx(1 / 0.46, abs=half_width)
    assert half_width < 0.03 * frequency
    phone.reload()
    assert shown_reading(phone.words(), "Hz") == (frequency, half_width)
    phone.press("Back")
    phone.sees(f"Bounce {frequency:.3f}".rstrip("0"))
    server.start()


def test_a_deleted_setup_comes_back(phone):
    phone.press("Measure sag")
    phone.type_into("Sag reading", "30")
    phone.sees("20.0 ± 1.3 %")
    phone.press("Back")
    phone.sees("Front 20.0 ± 1.3 %")
    (delete,) = [
        name
        for name in phone.page.get_by_role("button").all_inner_texts()
        if name.startswith("Delete")
    ]
    phone.press(delete)
    phone.sees("Nothing saved yet.")
    phone.reload()
    phone.sees("Nothing saved yet.")


def test_undo_brings_a_setup_back(phone):
    phone.press("Measure sag")
    phone.type_into("Sag reading", "30")
    phone.sees("20.0 ± 1.3 %")
    phone.press("Back")
    phone.page.get_by_role("button", name=re.compile("^Delete")).dispatch_event("click")
    phone.sees("Deleted “Setup of")
    phone.press("Undo")
    phone.sees("Front 20.0 ± 1.3 %")
    phone.reload()
    phone.sees("Front 20.0 ± 1.3 %")
