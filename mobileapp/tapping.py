"""A bounce test while it is being tapped."""

from dataclasses import dataclass
from typing import Final

from mobileapp.records import BounceRun

TAPS_EVERY: Final = (1, 2)  # every bottom, or every second one of a quick bounce


@dataclass(frozen=True)
class Tapping:
    """The taps so far, each by two clocks.

    Attributes:
        stamps: the browser's own times [s], None where it had none for a tap.
        seen: when the app saw the tap, by its own clock [s].
        taps_every: tapping at every bottom (1) or every second one (2).
    """

    stamps: tuple[float | None, ...] = ()
    seen: tuple[float, ...] = ()
    taps_every: int = 1

    def tapped(self, stamp: float | None, seen: float) -> "Tapping":
        """Return the test with one more tap."""
        return Tapping((*self.stamps, stamp), (*self.seen, seen), self.taps_every)

    def run(self) -> BounceRun:
        """Return the test with times from its first tap.

        The two clocks start at different times and can't be mixed: one missing stamp, and the
        app's own clock counts for all taps.
        """
        stamped = tuple(stamp for stamp in self.stamps if stamp is not None)
        page_clock = len(stamped) == len(self.stamps)
        times = stamped if page_clock else self.seen
        return BounceRun(
            tuple(round(time - times[0], 6) for time in times), self.taps_every, page_clock
        )
