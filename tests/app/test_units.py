"""Units: sizes against scipy's table, and values that never drift."""

import pytest
from hypothesis import given
from hypothesis import strategies as st
from scipy import constants

from mobileapp.units import SYSTEMS, UNITS, Amount, step_from

SIZES = {
    "mm": constants.milli,
    "in": constants.inch,
    "ft": constants.foot,
    "psi": constants.psi,
    "bar": constants.bar,
    "lbf/in": constants.lbf / constants.inch,
    "lb": constants.pound,
    "km/h": constants.kmh,
    "mph": constants.mph,
    "°": constants.degree,
}
values = st.floats(0, 1e6)
units = st.sampled_from(sorted(UNITS))


@pytest.mark.parametrize("symbol", SIZES)
def test_sizes_agree_with_scipys_constants(symbol):
    assert UNITS[symbol].size == pytest.approx(SIZES[symbol], rel=1e-12)


def test_each_system_has_a_known_unit_for_each_quantity():
    for system in SYSTEMS.values():
        assert system.keys() == SYSTEMS["mixed"].keys()
        assert set(system.values()) <= UNITS.keys()


@given(values, units, st.lists(units))
def test_a_value_shown_in_other_units_comes_back_as_typed(value, unit, others):
    amount = Amount(value, unit)
    for other in others:
        amount.value_in(other)
    assert amount.value_in(unit) == value


@given(st.floats(0, 1e4), units, st.integers(1, 50))
def test_steps_stay_on_the_grid_and_go_back(value, unit, steps):
    grid = step_from(Amount(value, unit), 1)
    there = step_from(grid, steps)
    assert step_from(there, -steps).value == pytest.approx(grid.value, abs=1e-6)
    assert there.value > grid.value


@given(st.floats(0, 10), units)
def test_steps_end_at_zero(value, unit):
    assert step_from(Amount(value, unit), -10_000).value == 0
