"""The standard atmosphere.

Source: ISO 2533:1975, "Standard Atmosphere", table of pressure against geometric altitude (the same
below 32 km as the U.S. Standard Atmosphere, 1976).
"""

import pytest
from numpy.testing import assert_allclose

from core.atmosphere import EARTH_RADIUS, pressure_at
from core.units import PSI


@pytest.mark.parametrize(
    ("altitude", "pressure"),
    [
        (0.0, 101_325.0),
        (500.0, 95_461.3),
        (1000.0, 89_876.3),
        (1500.0, 84_559.7),
        (2000.0, 79_501.4),
        (2500.0, 74_691.7),
        (3000.0, 70_121.1),
    ],
)
def test_pressure_at_geometric_altitude(altitude, pressure):
    # The table's last digit is 10 Pa in its upper half, 0.1 Pa here: a pascal leaves room for both.
    assert_allclose(pressure_at(altitude), pressure, atol=1.0)


def test_geopotential_altitude_is_told_apart():
    geometric = EARTH_RADIUS * 3000.0 / (EARTH_RADIUS - 3000.0)
    assert_allclose(pressure_at(geometric), 70_108.5, atol=1.0)


@pytest.mark.parametrize(
    ("altitude", "psi"), [(1000.0, 1.66), (2000.0, 3.17), (2500.0, 3.86), (3000.0, 4.53)]
)
def test_gauge_gains_what_the_air_loses(altitude, psi):
    assert_allclose((pressure_at(0.0) - pressure_at(altitude)) / PSI, psi, atol=5e-3)
