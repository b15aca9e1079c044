"""What the balance screen shows."""

from dataclasses import replace

import pytest

from core.balance import Change, SagVerdict, Verdict
from mobileapp.records import SagReading, new_setup
from mobileapp.release_reading import ReleaseReading
from mobileapp.results.balance import _STEPS, balance_view
from mobileapp.texts import LANGUAGES, Texts
from mobileapp.units import Amount

ENGLISH = Texts("en")


def sag(share):
    return SagReading(Amount(150, "mm"), Amount(150 * share, "mm"), "wheel")


def setup_with(front=0.21, rear=0.28):
    return (
        new_setup("k")
        .with_sag("front", replace(sag(front), place="shaft"))
        .with_sag("rear", sag(rear))
    )


def test_nothing_measured_asks_for_sag():
    view = balance_view(new_setup("k"), ENGLISH)
    assert view.first == ENGLISH("balance.do.measure_sag")
    assert view.step == "sag"
    assert [verdict for _, verdict in view.sag] == ["not measured"] * 2


def test_sag_off_its_target_comes_first():
    view = balance_view(setup_with(front=0.10), ENGLISH)
    assert view.first == ENGLISH("balance.do.front_sag")
    assert view.sag[0] == ("Front", "too little")


def test_frequencies_compare_as_the_square_root_of_deflections():
    frequency, damping = balance_view(setup_with(), ENGLISH).ratios
    # f ∝ 1/√δ, with the fork's travel turned upright at 65°: sin 65° = 0.906.
    assert float(frequency.reading.value) == pytest.approx(
        (0.28 / (0.21 * 0.9063)) ** 0.5, abs=0.01
    )
    low, value, high = frequency.interval
    assert low < value < high
    assert damping.reading is None


def test_measured_rebound_is_compared():
    setup = setup_with()
    for end, overshoot in (("front", 12), ("rear", 2)):
        reading = ReleaseReading(overshoot=Amount(overshoot, "mm"))
        setup = setup.with_release(end, reading, new=True)
    damping = balance_view(setup, ENGLISH).ratios[1]
    assert damping.verdict == ENGLISH("balance.damped.rear_higher")


@pytest.mark.parametrize("language", LANGUAGES)
def test_every_verdict_has_words(language):
    texts = Texts(language)
    for change in Change.__args__:
        assert texts(f"balance.do.{change}")
        assert _STEPS[change]
    for verdict in SagVerdict.__args__:
        assert texts(f"balance.sag.{verdict}")
    for verdict in Verdict.__args__:
        assert texts(f"balance.is.{verdict}")
        assert texts(f"balance.damped.{verdict}")
