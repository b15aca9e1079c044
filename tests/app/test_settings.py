"""What a person chose once."""

import pytest

from mobileapp.record_fields import RecordError
from mobileapp.settings import APPEARANCES, Settings, from_json, to_json
from mobileapp.state import AppState
from mobileapp.units import SYSTEMS, Amount


@pytest.mark.parametrize("units", SYSTEMS)
@pytest.mark.parametrize("appearance", APPEARANCES)
def test_settings_survive_being_kept(units, appearance):
    settings = Settings(units, appearance, "de")
    assert from_json(to_json(settings)) == settings


@pytest.mark.parametrize(
    ("text", "code"),
    [
        ("", "record.damaged"),
        ("[]", "record.damaged"),
        ('{"format": 1, "units": "furlongs"}', "record.damaged"),
        ('{"format": 1, "appearance": "pink"}', "record.damaged"),
        ('{"format": 1, "unknown": 1}', "record.damaged"),
        ('{"format": 1, "language": 5}', "record.damaged"),
        ('{"format": 2, "units": "metric"}', "record.newer"),
    ],
)
def test_what_is_no_settings_is_refused(text, code):
    with pytest.raises(RecordError) as caught:
        from_json(text)
    assert caught.value.code == code


def test_values_are_shown_in_the_chosen_unit_and_stay_as_typed():
    state = AppState(settings=Settings(units="imperial"))
    typed = Amount(150, "mm")
    shown = state.in_units(typed, "length")
    assert shown.unit == "in"
    assert shown.value == pytest.approx(5.9055, abs=1e-4)
    assert typed == Amount(150, "mm")
    back = AppState(settings=Settings(units="metric"))
    assert back.in_units(typed, "length") == typed


def test_a_chosen_language_goes_before_the_browsers():
    assert AppState(settings=Settings(language="de")).texts("undo") == "Rückgängig"
    assert AppState().texts("undo") == "Undo"
