import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st
from numpy.testing import assert_allclose
from scipy import constants
from scipy.integrate import solve_ivp

from core.atmosphere import (
    AIR_GAS_CONSTANT,
    EARTH_RADIUS,
    HIGHEST,
    LAPSE_RATE,
    LOWEST,
    SEA_LEVEL_TEMPERATURE,
    pressure_at,
)
from core.constants import STANDARD_GRAVITY, STANDARD_PRESSURE
from core.errors import InvalidInputError

altitudes = st.floats(LOWEST, HIGHEST).map(lambda altitude: round(altitude, 3))


def weigh_the_air(altitude):
    """Pressure by adding up the weight of the air, layer by layer, from sea level."""

    def weight(height, pressure):
        gravity = STANDARD_GRAVITY * (EARTH_RADIUS / (EARTH_RADIUS + height)) ** 2
        geopotential = EARTH_RADIUS * height / (EARTH_RADIUS + height)
        temperature = SEA_LEVEL_TEMPERATURE - LAPSE_RATE * geopotential
        return -pressure * gravity / (AIR_GAS_CONSTANT * temperature)

    with np.errstate(under="ignore"):  # scipy's own step control
        run = solve_ivp(weight, (0.0, altitude), [STANDARD_PRESSURE], rtol=1e-10, atol=1e-6)
    return run.y[0, -1]


@given(altitude=altitudes)
def test_pressure_is_the_weight_of_the_air_above(altitude):
    assert_allclose(pressure_at(altitude), weigh_the_air(altitude), rtol=1e-8)


@given(altitude=st.floats(LOWEST, HIGHEST - 1.0), step=st.floats(0.01, 1.0))
def test_pressure_falls_with_altitude(altitude, step):
    assert pressure_at(altitude + step) < pressure_at(altitude)


def test_gas_constant_is_that_of_air():
    # Molar mass of ISO 2533. Its molar gas constant, 8.31432, is 17 ppm less than today's.
    assert_allclose(AIR_GAS_CONSTANT, constants.R / 28.964420e-3, rtol=2e-5)


@pytest.mark.parametrize("altitude", [LOWEST - 0.1, HIGHEST + 0.1, 8848 * 3.2808, -1e9])
def test_altitude_outside_the_layer_is_refused(altitude):
    with pytest.raises(InvalidInputError) as caught:
        pressure_at(altitude)
    assert caught.value.code == "altitude_range"
    assert caught.value.data == {"altitude_m": altitude}


def test_element_at_fault_is_named():
    with pytest.raises(InvalidInputError) as caught:
        pressure_at(np.array([0.0, 20_000.0, np.float64(500.0)]))
    assert caught.value.where.tolist() == [False, True, False]
    assert caught.value.data == {"altitude_m": 20_000.0}
