"""Setups as text: there and back, and what is refused."""

import json

import pytest
from hypothesis import given
from hypothesis import strategies as st

from mobileapp.records import (
    FORMAT,
    BounceRun,
    RecordError,
    SagReading,
    Setup,
    from_json,
    new_setup,
    to_json,
)
from mobileapp.units import UNITS, Amount

amounts = st.builds(Amount, st.floats(-1e9, 1e9), st.sampled_from(sorted(UNITS)))
readings = st.builds(
    SagReading, amounts, amounts, st.sampled_from(["shaft", "wheel"]), st.none() | amounts
)
runs = st.builds(
    BounceRun,
    st.lists(st.floats(0, 1e4), max_size=60).map(tuple),
    st.sampled_from([1, 2]),
    st.booleans(),
)
setups = st.builds(
    Setup,
    key=st.text(max_size=20),
    made=st.datetimes().map(lambda when: when.isoformat()),
    label=st.text(max_size=200),
    sag=st.dictionaries(st.sampled_from(["front", "rear"]), readings),
    bounce=st.none() | runs,
    shown=st.lists(st.text(max_size=60), max_size=3).map(tuple),
)


@given(setups)
def test_a_setup_survives_being_kept(setup):
    assert from_json(to_json(setup)) == setup


def broken(**changes):
    record = json.loads(to_json(new_setup().with_sag("front", READING)))
    return json.dumps(record | changes)


READING = SagReading(Amount(150, "mm"), Amount(32.5, "mm"))


@pytest.mark.parametrize(
    ("text", "code"),
    [
        ("", "record.damaged"),
        ("null", "record.damaged"),
        ("[" * 100_000, "record.damaged"),
        ("{}", "record.damaged"),
        (broken(format=FORMAT + 1), "record.newer"),
        (broken(format=0), "record.damaged"),
        (broken(format="1"), "record.damaged"),
        (broken(kind="bike"), "record.damaged"),
        (broken(made="yesterday"), "record.damaged"),
        (broken(label="x" * 201), "record.damaged"),
        (broken(label=None), "record.damaged"),
        (broken(sag={"front": {}}), "record.damaged"),
        (to_json(new_setup().with_sag("front", READING)).replace("32.5", "NaN"), "record.damaged"),
        (
            to_json(new_setup().with_sag("front", READING)).replace('"mm"', '"cubit"'),
            "record.damaged",
        ),
        (broken(bounce={"taps": [0] * 501, "every": 1, "page_clock": True}), "record.damaged"),
        (broken(bounce={"taps": [0], "every": 3, "page_clock": True}), "record.damaged"),
    ],
)
def test_what_is_no_setup_is_refused_by_name(text, code):
    with pytest.raises(RecordError) as refusal:
        from_json(text)
    assert refusal.value.code == code


@given(st.text())
def test_any_text_is_a_setup_or_refused(text):
    with pytest.raises(RecordError):
        from_json(text)


@given(setups, st.data())
def test_a_setup_cut_short_is_refused(setup, data):
    text = to_json(setup)
    with pytest.raises(RecordError):
        from_json(text[: data.draw(st.integers(0, len(text) - 1))])


def test_the_place_of_a_reading_changes_travel_but_not_the_number():
    at_shock = SagReading(Amount(55, "mm"), Amount(16, "mm"), "shaft", Amount(150, "mm"))
    at_wheel = at_shock.at("wheel")
    assert (at_wheel.travel, at_wheel.sag) == (Amount(150, "mm"), Amount(16, "mm"))
    assert at_wheel.at("shaft").wheel_travel == Amount(150, "mm")
    assert at_shock.at("shaft") is at_shock


def test_keys_are_random():
    assert len({new_setup().key for _ in range(100)}) == 100
