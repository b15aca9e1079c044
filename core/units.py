"""Factors from the trade's units to SI: ``75 * PSI`` is a pressure in pascals.

The core computes in SI only. These factors are for its callers: a notebook, the app, a test.
"""

from math import pi
from typing import Final

from core.constants import STANDARD_GRAVITY

MM: Final = 1e-3  # [m]
INCH: Final = 0.0254  # [m] exact; international yard and pound agreement (1959)
POUND: Final = 0.45359237  # [kg] exact; same agreement
BAR: Final = 1e5  # [Pa] exact; ISO 80000-4
N_PER_MM: Final = 1e3  # [N/m]
LBF: Final = POUND * STANDARD_GRAVITY  # [N] exact: pound × standard gravity
LBF_PER_INCH: Final = LBF / INCH  # [N/m] 175.126 835
PSI: Final = LBF / INCH**2  # [Pa] 6 894.757 29
DEGREE: Final = pi / 180  # [rad]
KMH: Final = 1 / 3.6  # [m/s]
MPH: Final = 1609.344 / 3600  # [m/s] exact: the mile is 1760 yards of 0.9144 m
