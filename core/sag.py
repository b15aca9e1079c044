"""Sag: what was read, and what it tells about load and spring.

Sag of one end needs nothing but a travel and a reading, and already gives a frequency:

    >>> from core.sag import frequency_from_sag, share_of_travel
    >>> from core.uncertainty import Measured
    >>> from core.units import MM
    >>> from core.unknown import common_fork
    >>> share = share_of_travel(Measured(30 * MM, 1 * MM), Measured(150 * MM, 1 * MM))
    >>> f"{100 * share.value:.0f} %, {100 * share.low:.1f} to {100 * share.high:.1f} %"
    '20 %, 18.7 to 21.3 %'
    >>> swing = frequency_from_sag(common_fork(150 * MM), Measured(30 * MM, 1 * MM))
    >>> f"{swing.value:.2f} Hz, {swing.low:.2f} to {swing.high:.2f} Hz"
    '3.13 Hz, 2.61 to 3.57 Hz'
"""

from collections.abc import Sequence
from typing import Final

import numpy as np

from core.checks import Quantity, finite, positive, require
from core.errors import Note
from core.geometry import Place, WheelPath, to_shaft
from core.parts import Part, propagate_parts
from core.springs import Spring, loaded_frequency
from core.uncertainty import Estimate, Measured, mean_reading, propagate
from core.unknown import UNKNOWN_SPRING

READING_SD: Final = 0.001  # [m] an O-ring against a tape; common practice, no source
USUAL: Final = (0.08, 0.45)  # [-] of travel; outside, a slip is likelier than a setup


def sag_share(reading: Quantity, travel: Quantity) -> Quantity:
    """Return sag as a share of travel, x/T.

    Args:
        reading: x, how far it has sunk [m], positive and less than T.
        travel: T, full travel or stroke of where it was read [m], positive.

    Returns:
        The share [-], between 0 and 1, shapes broadcast.

    Raises:
        InvalidInputError: code ``not_finite``, ``not_positive`` or ``sag_range``.
    """
    positive("reading", reading)
    positive("travel", travel)
    require(np.less(reading, travel), "sag_range", "reading", travel_m=travel)
    return reading / travel


def sag_depth(share: Quantity, travel: Quantity) -> Quantity:
    """Return how deep a share of travel is, the inverse of `sag_share`.

    Args:
        share: x/T [-], more than 0 and less than 1.
        travel: T, full travel or stroke of where it is read [m], positive.

    Returns:
        x [m], shapes broadcast.

    Raises:
        InvalidInputError: code ``not_finite``, ``not_positive`` or ``sag_range``.
    """
    positive("share", share)
    positive("travel", travel)
    require(np.less(share, 1.0), "sag_range", "share", travel_m=travel)
    return share * travel


def mean_sag(readings: Sequence[float], reading_sd: float = READING_SD) -> Measured:
    """Return repeated readings of one sag as one; see `core.uncertainty.mean_reading`.

    Args:
        readings: at least one, all taken the same way [m].
        reading_sd: standard deviation of a single one [m].

    Returns:
        Their mean with its standard deviation [m].

    Raises:
        InvalidInputError: code ``no_readings``, ``not_finite``, ``negative`` or ``not_positive``.
    """
    for reading in readings:
        positive("reading", reading)
    return mean_reading(readings, reading_sd)


def share_of_travel(reading: Measured, travel: Measured) -> Estimate:
    """Return sag as a share of travel with its 95 % interval.

    Args:
        reading: x, how far it has sunk [m].
        travel: T, full travel or stroke of where it was read [m].

    Returns:
        x/T [-].

    Raises:
        InvalidInputError: as `sag_share`.
        NoSolutionError: code ``too_uncertain``.
    """
    return propagate(sag_share, reading, travel)


def sag_notes(share: float) -> tuple[Note, ...]:
    """Return what to say about a sag.

    Args:
        share: of the travel [-].

    Returns:
        Note ``sag_unusual`` below 8 and above 45 %, or nothing.

    Raises:
        InvalidInputError: code ``not_finite``.
    """
    finite("share", share)
    return () if USUAL[0] <= share <= USUAL[1] else (Note("sag_unusual"),)


def frequency_from_sag(
    path: WheelPath | Part[WheelPath],
    reading: Measured,
    place: Place = "shaft",
    spring: Spring | Part[Spring] = UNKNOWN_SPRING,
) -> Estimate:
    """Return the natural frequency of the loaded bike from its sag, without its mass.

    Args:
        path: of the wheel.
        reading: how far it has sunk [m], positive.
        place: where that was read.
        spring: if nothing is known of it, the interval allows for all common ones.

    Returns:
        f, undamped [Hz]; see `core.springs.loaded_frequency`.

    Raises:
        InvalidInputError: a quantity isn't finite or is outside its range.
        NoSolutionError: code ``topped_out``, ``unstable`` or ``too_uncertain``.
    """

    def swing(spring: Spring, path: WheelPath, read: Quantity) -> Quantity:
        return loaded_frequency(spring, path, to_shaft(path, positive("reading", read), place))

    return propagate_parts(swing, spring, path, reading)
