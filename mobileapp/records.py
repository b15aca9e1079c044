"""What is kept: setups with the readings they were made from, and their JSON form.

Each record is one JSON object that names its format and kind. Values stay as they were typed,
with their unit; results are computed again from them. A record of a newer format is refused
and left as it is.
"""

import json
import secrets
from collections.abc import Mapping
from dataclasses import dataclass, field, replace
from datetime import UTC, datetime
from typing import Any, Final, Literal

from mobileapp.record_fields import RecordError, check, pair, to_amount, to_number, to_text
from mobileapp.release_reading import MOST_TRIES, ReleaseReading
from mobileapp.release_reading import from_record as release_from_record
from mobileapp.release_reading import to_record as release_to_record
from mobileapp.trail_plan import TrailPlan
from mobileapp.trail_plan import from_record as trail_from_record
from mobileapp.trail_plan import to_record as trail_to_record
from mobileapp.units import Amount

FORMAT: Final = 1
KIND: Final = "setup"

_LONGEST_RECORD: Final = 65_536  # [characters] a setup with 200 taps needs a tenth of it
_MOST_TAPS: Final = 500

End = Literal["front", "rear"]
ENDS: Final[tuple[End, End]] = ("front", "rear")
Place = Literal["shaft", "wheel"]
PLACES: Final[tuple[Place, Place]] = ("shaft", "wheel")


@dataclass(frozen=True)
class SagReading:
    """Sag as read at one end.

    Attributes:
        travel: full travel of where it was read: fork or shock stroke, or wheel travel.
        sag: how far the loaded bike has sunk.
        place: read at the shaft (fork stanchion, shock shaft) or at the wheel.
        wheel_travel: of a rear reading at the shaft, the wheel's full travel, if known.
    """

    travel: Amount
    sag: Amount
    place: Place = "shaft"
    wheel_travel: Amount | None = None

    def at(self, place: Place) -> "SagReading":
        """Return the same number, read at another place."""
        if place == self.place:
            return self
        if place == "wheel":
            return replace(self, place=place, travel=self.wheel_travel or self.travel)
        stroke = FIRST_READINGS["rear"].travel
        return replace(self, place=place, travel=stroke, wheel_travel=self.travel)


# A first guess that a thumb can step away from: common sizes, no source.
FIRST_READINGS: Final[dict[End, SagReading]] = {
    "front": SagReading(Amount(150, "mm"), Amount(0, "mm")),
    "rear": SagReading(Amount(55, "mm"), Amount(0, "mm"), "shaft", Amount(150, "mm")),
}


@dataclass(frozen=True)
class BounceRun:
    """One timed bounce test.

    Attributes:
        taps: times of the taps [s], from the first one.
        taps_every: tapped at every bottom (1) or every second one (2).
        page_clock: whether the browser's own event times were to be had.
    """

    taps: tuple[float, ...]
    taps_every: int = 1
    page_clock: bool = True


@dataclass(frozen=True)
class Setup:
    """One bike set up for one person, as far as it got.

    Attributes:
        key: random, unique.
        made: when it was begun, ISO 8601 with the offset from UTC.
        label: what the person calls it.
        sag: readings by end.
        bounce: the last bounce test that was kept.
        shown: the results as they were shown last, in words, for lists.
        releases: release tests by end, the latest one last.
        trail: the day's bumps and speeds, if they were entered.
    """

    key: str
    made: str
    label: str = ""
    sag: Mapping[End, SagReading] = field(default_factory=dict)
    bounce: BounceRun | None = None
    shown: tuple[str, ...] = ()
    releases: Mapping[End, tuple[ReleaseReading, ...]] = field(default_factory=dict)
    trail: TrailPlan | None = None

    def reading(self, end: End) -> SagReading:
        """Return the sag reading of an end, or the first guess to step away from."""
        return self.sag.get(end, FIRST_READINGS[end])

    def with_sag(self, end: End, reading: SagReading) -> "Setup":
        """Return the setup with a reading replaced."""
        return replace(self, sag={**self.sag, end: reading})

    def release(self, end: End) -> ReleaseReading:
        """Return the latest release test of an end, or the first guess to step away from."""
        return self.releases.get(end, (ReleaseReading(),))[-1]

    def with_release(self, end: End, reading: ReleaseReading, *, new: bool = False) -> "Setup":
        """Return the setup with the latest release test of an end replaced, or with a new one."""
        tries = self.releases.get(end, ())
        tries = (*(tries if new else tries[:-1]), reading)[-MOST_TRIES:]
        return replace(self, releases={**self.releases, end: tries})


def new_key() -> str:
    """Return a random key."""
    return secrets.token_hex(8)


def new_setup(key: str | None = None) -> Setup:
    """Begin a setup, now."""
    return Setup(key or new_key(), datetime.now(UTC).astimezone().isoformat(timespec="seconds"))


def to_json(setup: Setup) -> str:
    """Return a setup as text."""
    record: dict[str, Any] = {
        "format": FORMAT,
        "kind": KIND,
        "key": setup.key,
        "made": setup.made,
        "label": setup.label,
        "sag": {
            end: {
                "travel": pair(reading.travel),
                "sag": pair(reading.sag),
                "place": reading.place,
                "wheel_travel": pair(reading.wheel_travel),
            }
            for end, reading in setup.sag.items()
        },
        "shown": list(setup.shown),
        "releases": {
            end: [release_to_record(reading) for reading in tries]
            for end, tries in setup.releases.items()
        },
    }
    if setup.bounce:
        record["bounce"] = {
            "taps": list(setup.bounce.taps),
            "every": setup.bounce.taps_every,
            "page_clock": setup.bounce.page_clock,
        }
    if setup.trail:
        record["trail"] = trail_to_record(setup.trail)
    return json.dumps(record, ensure_ascii=False, separators=(",", ":"))


def from_json(text: str) -> Setup:
    """Return the setup that a text holds.

    Raises:
        RecordError: code ``record.damaged`` or ``record.newer``.
    """
    if len(text) > _LONGEST_RECORD:
        raise RecordError("record.damaged")
    try:
        record = json.loads(text)
        check(record["format"] <= FORMAT, "record.newer")
        return _setup(record)
    except RecordError:
        raise
    except (ValueError, TypeError, KeyError, AttributeError, RecursionError) as error:
        raise RecordError("record.damaged") from error


def _setup(record: Mapping[str, Any]) -> Setup:
    check(record["kind"] == KIND and record["format"] >= 1)
    datetime.fromisoformat(record["made"])
    return Setup(
        key=to_text(record["key"]),
        made=record["made"],
        label=to_text(record["label"]),
        sag={end: _sag(record["sag"][end]) for end in ENDS if end in record["sag"]},
        bounce=_bounce(record["bounce"]) if "bounce" in record else None,
        shown=tuple(to_text(line) for line in record["shown"]),
        releases=_releases(record.get("releases", {})),  # setups of the first days have none
        trail=trail_from_record(record["trail"]) if "trail" in record else None,
    )


def _sag(reading: Mapping[str, Any]) -> SagReading:
    check(reading["place"] in PLACES)
    wheel_travel = reading["wheel_travel"]
    return SagReading(
        to_amount(reading["travel"]),
        to_amount(reading["sag"]),
        reading["place"],
        None if wheel_travel is None else to_amount(wheel_travel),
    )


def _releases(record: Mapping[str, Any]) -> Mapping[End, tuple[ReleaseReading, ...]]:
    releases = {
        end: tuple(release_from_record(reading) for reading in record[end])
        for end in ENDS
        if end in record
    }
    check(all(0 < len(tries) <= MOST_TRIES for tries in releases.values()))
    return releases


def _bounce(run: Mapping[str, Any]) -> BounceRun:
    taps = tuple(to_number(tap) for tap in run["taps"])
    check(len(taps) <= _MOST_TAPS and run["every"] in (1, 2))
    return BounceRun(taps, run["every"], bool(run["page_clock"]))
