"""The day's trail: its repeated bumps, and the speeds they are ridden at."""

from collections.abc import Mapping
from dataclasses import dataclass, replace
from typing import Any, Final

from mobileapp.record_fields import check, pair, to_amount
from mobileapp.units import Amount

MOST_BUMPS: Final = 8


@dataclass(frozen=True)
class Bump:
    """A row of similar bumps.

    Attributes:
        spacing: crest to crest.
        height: trough to crest.
    """

    spacing: Amount
    height: Amount


# Braking bumps and a brisk trail: common sizes, no source; a thumb steps away from them.
FIRST_BUMP: Final = Bump(Amount(1.5, "m"), Amount(60, "mm"))
FIRST_SPEEDS: Final = (Amount(10, "km/h"), Amount(25, "km/h"))


@dataclass(frozen=True)
class TrailPlan:
    """What will be ridden.

    Attributes:
        slowest: speed at which the bumps are ridden at least.
        fastest: and at most.
        bumps: rows of them, at least one.
    """

    slowest: Amount = FIRST_SPEEDS[0]
    fastest: Amount = FIRST_SPEEDS[1]
    bumps: tuple[Bump, ...] = (FIRST_BUMP,)

    def with_bump(self, index: int, bump: Bump) -> "TrailPlan":
        """Return the plan with a row of bumps replaced."""
        return replace(self, bumps=(*self.bumps[:index], bump, *self.bumps[index + 1 :]))

    def with_another(self) -> "TrailPlan":
        """Return the plan with one more row, like the last one."""
        return replace(self, bumps=(*self.bumps, self.bumps[-1])[:MOST_BUMPS])

    def without(self, index: int) -> "TrailPlan":
        """Return the plan with a row taken away; the last one stays."""
        rest = (*self.bumps[:index], *self.bumps[index + 1 :])
        return replace(self, bumps=rest or self.bumps)


def to_record(plan: TrailPlan) -> dict[str, Any]:
    """Return a plan as JSON has it."""
    return {
        "speeds": [pair(plan.slowest), pair(plan.fastest)],
        "bumps": [[pair(bump.spacing), pair(bump.height)] for bump in plan.bumps],
    }


def from_record(record: Mapping[str, Any]) -> TrailPlan:
    """Return the plan that JSON has.

    Raises:
        RecordError: it isn't one.
    """
    slowest, fastest = record["speeds"]
    bumps = tuple(
        Bump(to_amount(spacing), to_amount(height)) for spacing, height in record["bumps"]
    )
    check(0 < len(bumps) <= MOST_BUMPS)
    return TrailPlan(to_amount(slowest), to_amount(fastest), bumps)
