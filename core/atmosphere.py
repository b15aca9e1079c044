"""Air pressure at altitude: what a shock pump's gauge doesn't show and an air spring feels."""

from typing import Final

import numpy as np

from core.checks import Quantity, finite, require
from core.constants import STANDARD_GRAVITY, STANDARD_PRESSURE

EARTH_RADIUS: Final = 6_356_766.0  # [m] nominal, for the fall of gravity with height; ISO 2533
SEA_LEVEL_TEMPERATURE: Final = 288.15  # [K] 15 °C; ISO 2533
LAPSE_RATE: Final = 0.0065  # [K/m] of geopotential altitude, up to 11 km; ISO 2533
AIR_GAS_CONSTANT: Final = 287.05287  # [J/(kg K)] dry air; ISO 2533
LOWEST: Final = -500.0  # [m] below any shore on Earth
HIGHEST: Final = 11_000.0  # [m] end of the layer with that lapse rate

_EXPONENT: Final = STANDARD_GRAVITY / (AIR_GAS_CONSTANT * LAPSE_RATE)  # 5.255 88


def pressure_at(altitude: Quantity) -> Quantity:
    """Return the pressure of the standard atmosphere at an altitude.

    p = p₀ (1 − β H / T₀)^(g₀ / (R β)), with H = r h / (r + h)

    h geometric altitude (what maps and phones show), H geopotential altitude, r nominal radius of
    the Earth, p₀ = 101 325 Pa, T₀ = 288.15 K, β = 6.5 K/km, R gas constant of dry air, g₀ standard
    gravity. Weather moves the real pressure by up to about 4 %, altitude by 30 % at 3000 m.

    Args:
        altitude: above mean sea level [m], −500 to 11 000; any shape.

    Returns:
        Absolute pressure [Pa], same shape.

    Raises:
        InvalidInputError: code ``not_finite`` or ``altitude_range``.

    Source: ISO 2533:1975, Standard Atmosphere, 2.3 and 2.6 (section numbers from memory).
    """
    finite("altitude", altitude)
    within = np.less_equal(LOWEST, altitude) & np.less_equal(altitude, HIGHEST)
    require(within, "altitude_range", "altitude", altitude_m=altitude)
    geopotential = EARTH_RADIUS * altitude / (EARTH_RADIUS + altitude)
    ratio = 1.0 - LAPSE_RATE * geopotential / SEA_LEVEL_TEMPERATURE
    pressure: Quantity = STANDARD_PRESSURE * ratio**_EXPONENT
    return pressure
