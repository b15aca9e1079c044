"""Numbers to text and back."""

import pytest
from hypothesis import given
from hypothesis import strategies as st

from core.uncertainty import Estimate
from mobileapp.format import NotANumberError, number, parse, typed
from mobileapp.results.estimate import reading
from mobileapp.units import UNITS


@pytest.mark.parametrize(
    ("text", "value"), [("27,5", 27.5), ("27.5", 27.5), (" 30 ", 30), ("−2", -2), ("1e2", 100)]
)
def test_decimal_comma_and_point_are_both_understood(text, value):
    assert parse(text) == value


@pytest.mark.parametrize("text", ["", "abc", "1,2,3", "nan", "inf", "1_000", "9" * 13, "12 mm"])
def test_what_is_no_number_is_refused(text):
    with pytest.raises(NotANumberError):
        parse(text)


@given(st.text())
def test_any_text_is_a_finite_number_or_refused(text):
    try:
        value = parse(text)
    except NotANumberError:
        return
    assert abs(value) < 1e12


@given(st.floats(0, 9999).map(lambda value: round(value, 2)))
def test_what_was_typed_can_be_typed_again(value):
    text = typed(value, "in")
    assert parse(text) == value
    assert parse(typed(value, "in", comma=True)) == value


@pytest.mark.parametrize(
    ("estimate", "unit", "shown"),
    [
        (Estimate(0.2173, 0.204, 0.2306), "%", "21.7 ± 1.3 %"),
        (Estimate(2.4961, 2.47, 2.5222), "Hz", "2.496 ± 0.026 Hz"),
        (Estimate(0.0324, 0.0274, 0.0374), "mm", "32 ± 5 mm"),
        (Estimate(2.9, 2.8, 3.4), "Hz", "2.90 (2.80 – 3.40) Hz"),
        (Estimate(0.03, 0.03, 0.03), "mm", "30.0 mm"),
    ],
)
def test_results_are_rounded_as_their_interval_demands(estimate, unit, shown):
    assert str(reading(estimate, unit)) == shown


@given(st.floats(-1e6, 1e6), st.integers(-3, 5))
def test_no_number_is_written_as_minus_zero(value, decimals):
    text = number(value, decimals)
    assert "-" not in text
    if not text.strip("0."):
        assert not text.startswith("−")


def test_each_unit_has_decimals():
    assert all(unit.decimals >= 0 and unit.step > 0 for unit in UNITS.values())
