"""Constants and units against the committee's values, as carried by the library.

Sources: scipy.constants (CODATA; exact unit definitions); standard gravity: 3rd CGPM (1901); the
inch and the pound: international yard and pound agreement (1959).
"""

import pytest
from numpy.testing import assert_allclose
from scipy import constants as reference

from core import constants, units

ROUNDING = 1e-15  # relative: the same exact definitions, multiplied in another order


@pytest.mark.parametrize(
    ("ours", "theirs"),
    [
        (constants.STANDARD_GRAVITY, reference.g),
        (constants.STANDARD_PRESSURE, reference.atm),
        (constants.CELSIUS_ZERO, reference.zero_Celsius),
        (constants.REFERENCE_TEMPERATURE, reference.convert_temperature(20.0, "C", "K")),
        (units.MM, reference.milli),
        (units.INCH, reference.inch),
        (units.POUND, reference.pound),
        (units.BAR, reference.bar),
        (units.N_PER_MM, 1 / reference.milli),
        (units.LBF, reference.lbf),
        (units.LBF_PER_INCH, reference.lbf / reference.inch),
        (units.PSI, reference.psi),
        (units.KMH, reference.kmh),
        (units.MPH, reference.mph),
    ],
)
def test_agrees_with_the_library(ours, theirs):
    assert_allclose(ours, theirs, rtol=ROUNDING)


@pytest.mark.parametrize(
    ("value", "unit", "expected"),
    [
        (units.LBF_PER_INCH, units.N_PER_MM, 0.175126835),
        (units.PSI, 1.0, 6894.75729),
        (units.BAR, units.PSI, 14.5037738),
        (constants.STANDARD_PRESSURE, units.PSI, 14.6959488),
    ],
)
def test_handbook_figures(value, unit, expected):
    assert_allclose(value / unit, expected, rtol=1e-8)
