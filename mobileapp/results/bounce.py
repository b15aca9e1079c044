"""A bounce test in progress: the frequency so far, and whether to go on."""

from dataclasses import dataclass
from typing import Literal

from core import estimate_bounce
from core.uncertainty import Estimate
from mobileapp.format import Reading
from mobileapp.records import BounceRun
from mobileapp.results.estimate import reading
from mobileapp.texts import Texts

State = Literal["keep_going", "done", "start_again"]


@dataclass(frozen=True)
class BounceView:
    """What the bounce screen shows.

    Attributes:
        state: what to do.
        voice: the same in words.
        reason: why, in words; empty if there is nothing to add.
        frequency: so far, with ±, or None.
        counts: taps used, missed and doubled, in words.
    """

    state: State
    voice: str
    reason: str
    frequency: Reading | None
    counts: str


def bounce_view(run: BounceRun, texts: Texts) -> BounceView:
    """Return what to show for the taps so far."""
    result = estimate_bounce(run.taps, taps_every=run.taps_every)
    frequency = None
    if result.frequency_hz is not None:
        estimate = Estimate(result.frequency_hz, result.low_hz, result.high_hz)
        frequency = reading(estimate, "Hz", comma=texts.comma)
    return BounceView(
        state=result.state,
        voice=texts(f"bounce.{result.state}"),
        reason=result.reason,
        frequency=frequency,
        counts=texts(
            "bounce.beats",
            used=str(result.used),
            missed=str(result.missed),
            doubled=str(result.doubled),
        ),
    )
