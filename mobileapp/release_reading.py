"""A release test as read at one end: pushed down, let go, watched.

A test is kept with the clicks it was made at, so that two of them tell how much a click does.
"""

from collections.abc import Mapping
from dataclasses import dataclass
from typing import Any, Final, Literal

from mobileapp.record_fields import check, pair, to_amount
from mobileapp.units import Amount

Way = Literal["ruler", "film", "not_passed"]
WAYS: Final[tuple[Way, ...]] = ("ruler", "film", "not_passed")
RATES: Final = (60, 120, 240)  # [1/s] frames of common phone cameras
MOST_TRIES: Final = 20
FIRST_PUSH: Final = Amount(40, "mm")  # what a hand pushes easily; common practice, no source
NO_OVERSHOOT: Final = Amount(0, "mm")
NO_FRAMES: Final = Amount(0, "frames")


@dataclass(frozen=True)
class ReleaseReading:
    """One release test.

    Attributes:
        way: how far it overshot by ruler, how long it took by film, or that it didn't pass the
            sag mark at all.
        push: from the sag mark down to where it was let go.
        overshoot: from the mark up to the turning point; 0 if not read yet.
        frames: from letting go to passing the mark; 0 if not read yet.
        rate: frames per second of the camera.
        clicks: of rebound, counted open from fully closed; None if not counted.
    """

    way: Way = "ruler"
    push: Amount = FIRST_PUSH
    overshoot: Amount = NO_OVERSHOOT
    frames: Amount = NO_FRAMES
    rate: int = 240
    clicks: Amount | None = None


def to_record(reading: ReleaseReading) -> dict[str, Any]:
    """Return a reading as JSON has it."""
    return {
        "way": reading.way,
        "push": pair(reading.push),
        "overshoot": pair(reading.overshoot),
        "frames": pair(reading.frames),
        "rate": reading.rate,
        "clicks": pair(reading.clicks),
    }


def from_record(record: Mapping[str, Any]) -> ReleaseReading:
    """Return the reading that JSON has.

    Raises:
        RecordError: it isn't one.
    """
    check(record["way"] in WAYS and record["rate"] in RATES)
    clicks = record["clicks"]
    return ReleaseReading(
        record["way"],
        to_amount(record["push"]),
        to_amount(record["overshoot"]),
        to_amount(record["frames"]),
        record["rate"],
        None if clicks is None else to_amount(clicks),
    )
