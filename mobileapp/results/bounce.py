"""A bounce test in progress: the frequency so far, whether to go on, and its beats as a picture."""

from dataclasses import dataclass
from functools import lru_cache
from itertools import pairwise
from statistics import median
from typing import Final, Literal

from core import BounceEstimate, estimate_bounce
from core.uncertainty import Estimate
from mobileapp.format import Reading
from mobileapp.records import BounceRun
from mobileapp.results.estimate import reading
from mobileapp.texts import Texts

State = Literal["keep_going", "done", "start_again"]
Kind = Literal["used", "warm_up", "missed", "doubled", "outlier"]
KINDS: Final[tuple[Kind, ...]] = ("used", "warm_up", "missed", "doubled", "outlier")

STRIP_PERIODS: Final = 11  # [-] length of the strip of beats, in taps of a steady rhythm


@dataclass(frozen=True)
class Mark:
    """One tap, or one beat without a tap, on the strip of beats.

    Attributes:
        key: names it from one tap to the next.
        place: along the strip, 0 at its left end, 1 at its right end [-].
        kind: what became of it.
    """

    key: str
    place: float
    kind: Kind


@dataclass(frozen=True)
class BounceView:
    """What the bounce screen shows.

    Attributes:
        state: what to do.
        voice: the same in words.
        reason: why, in words; empty if there is nothing to add.
        frequency: so far, with ±, or None.
        strip: the latest taps and missed beats.
        counts: how many there are of each kind, in words; kinds without any are left out.
        notes: further sentences.
    """

    state: State
    voice: str
    reason: str
    frequency: Reading | None
    strip: tuple[Mark, ...]
    counts: dict[Kind, str]
    notes: tuple[str, ...] = ()


@lru_cache(maxsize=64)  # a screen and the list at home ask for the same
def bounce_view(run: BounceRun, texts: Texts, *, kept: bool = False) -> BounceView:
    """Return what to show for the taps so far.

    Args:
        run: the taps.
        texts: words.
        kept: whether the test is over and kept, whatever it came to.
    """
    result = estimate_bounce(run.taps, taps_every=run.taps_every)
    frequency = None
    if result.frequency_hz is not None:
        estimate = Estimate(result.frequency_hz, result.low_hz, result.high_hz)
        frequency = reading(estimate, "Hz", comma=texts.comma)
    early = kept and result.state != "done"
    return BounceView(
        state=result.state,
        voice=texts("bounce.kept" if early else f"bounce.{result.state}"),
        reason=_reason(result, texts),
        frequency=frequency,
        strip=_strip(run, result),
        counts=_counts(result, texts),
        notes=() if run.page_clock else (texts("bounce.no_clock"),),
    )


def _reason(result: BounceEstimate, texts: Texts) -> str:
    data = {key: f"{value:g}" for key, value in result.note.data.items()}
    return texts(f"core.{result.note.code}", **data)


def _counts(result: BounceEstimate, texts: Texts) -> dict[Kind, str]:
    numbers = {kind: result.roles.count(kind) for kind in KINDS} | {"missed": result.missed}
    return {
        kind: texts(f"bounce.beats.{kind}", count=str(numbers[kind]))
        for kind in KINDS
        if numbers[kind]
    }


def _strip(run: BounceRun, result: BounceEstimate) -> tuple[Mark, ...]:
    """Place the latest taps and the beats missed between them; time runs to the right."""
    taps = run.taps
    gaps = [later - earlier for earlier, later in pairwise(taps)]
    rhythm = result.frequency_hz and run.taps_every / result.frequency_hz
    length = STRIP_PERIODS * (rhythm or (median(gaps) if gaps else 0.0) or 1.0)
    start = max(taps[0], taps[-1] - length)
    marks = [
        Mark(f"tap{index}", (time - start) / length, role)
        for index, (time, role) in enumerate(zip(taps, result.roles, strict=True))
        if time >= start and role != "before_pause"
    ]
    on_beat = [
        (time, beat) for time, beat in zip(taps, result.beats, strict=True) if beat is not None
    ]
    for (time, beat), (next_time, next_beat) in pairwise(on_beat):
        for missed in range(beat + 1, next_beat):
            due = time + (next_time - time) * (missed - beat) / (next_beat - beat)
            if due >= start:
                marks.append(Mark(f"beat{missed}", (due - start) / length, "missed"))
    return tuple(marks)
