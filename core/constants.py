"""Physical constants, each with its unit and source on its line."""

from typing import Final

STANDARD_GRAVITY: Final = 9.80665  # [m/s²] exact; 3rd CGPM (1901), ISO 80000-3
STANDARD_PRESSURE: Final = 101_325.0  # [Pa] sea level; ISO 2533:1975
CELSIUS_ZERO: Final = 273.15  # [K] exact; ISO 80000-5
REFERENCE_TEMPERATURE: Final = 293.15  # [K] 20 °C, at which pressures are compared here
