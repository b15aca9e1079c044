"""From tap times to the bounce frequency, and to what the person should do next."""

from collections.abc import Sequence
from dataclasses import dataclass
from typing import Final, Literal

import numpy as np

from core.bounce.numbering import BoolArray, IntArray, number_beats
from core.bounce.rhythm import Rhythm, measure_rhythm
from core.checks import FloatArray, finite, require
from core.errors import Note
from core.uncertainty import COVERAGE_FACTOR

State = Literal["keep_going", "done", "start_again"]
Role = Literal["used", "warm_up", "doubled", "outlier", "before_pause"]

HOLD_OFF: Final = 0.15  # [s] a finger can't tap twice sooner on purpose
PAUSE: Final = 3.6  # [periods] a longer gap is a pause, not missed beats
WARM_UP: Final = 2  # taps; the first bounces are slower until the rhythm is found
MINIMUM_USED: Final = 8  # taps; with six, one result in a thousand was grossly wrong
WANTED_HALF_WIDTH: Final = 0.03  # [-] of the frequency
CLEAR_MARGIN: Final = 3.0  # [nats] e³ = 20 times likelier than any other numbering
FREQUENCIES: Final = (0.8, 4.5)  # [Hz] no bike bounces slower, no finger follows faster
CLEAR_RHYTHM: Final = 4.5  # [nats] lets at most one rhythmless series in fifty pass
MOST_ACCIDENTS: Final = 0.4  # [-] of the beats
UNSTEADY: Final = 0.15  # [-] of the period: standard deviation about the beat
MOST_TAPS: Final = 30  # without success
LONGEST_SERIES: Final = 500  # taps; a bounce test takes a dozen
OUTLIER_SDS: Final = 3.5
OUTLIER_LEAST: Final = 0.06  # [s] nearer taps are never outliers
MAD_TO_SD: Final = 1.4826  # [-] of a normal distribution: 1 / Φ⁻¹(3/4)
TAPS_EVERY: Final = (1, 2)


@dataclass(frozen=True)
class BounceEstimate:
    """What a series of taps says so far.

    Attributes:
        state: ``keep_going``, ``done`` or ``start_again``.
        note: why, with a stable code.
        frequency_hz: bounce frequency [Hz]; None while the taps can't carry one.
        low_hz: lower end of its 95 % interval [Hz], or None.
        high_hz: upper end [Hz], or None.
        used: taps the result rests on.
        missed: beats without a tap.
        doubled: taps beyond the first of a beat.
        outliers: taps too far from any beat.
        roles: what became of each tap.
        beats: beat number of each tap, counted from the first one of its series; None where it
            belongs to no beat.
        after_pause: whether taps before a pause were set aside.
    """

    state: State
    note: Note
    frequency_hz: float | None
    low_hz: float | None
    high_hz: float | None
    used: int
    missed: int
    doubled: int
    outliers: int
    roles: tuple[Role, ...]
    beats: tuple[int | None, ...]
    after_pause: bool

    @property
    def reason(self) -> str:
        """Why the state is what it is, as an English sentence."""
        return str(self.note)


def estimate_bounce(
    tap_times_s: Sequence[float] | FloatArray, taps_every: int = 1
) -> BounceEstimate:
    """Return the bounce frequency that a series of taps shows, and whether to go on tapping.

    The taps are freed of doubles within 0.15 s, cut at pauses (the longest part counts) and of
    their first two, numbered (`core.bounce.numbering`), freed of outliers, and their period P is
    measured with its standard deviation s (`core.bounce.rhythm`):

        f = m / P,  95 % interval m / (P ± 1.96 s)

    with m the bounces per tap. The interval holds the statistical error only: a rider can hold a
    rhythm up to a tenth away from the bike's own frequency.

    Args:
        tap_times_s: of all taps so far [s], increasing, any origin; shape (taps,), at most 500.
        taps_every: tapped at every bottom (1) or at every second one (2).

    Raises:
        InvalidInputError: code ``not_finite``, ``taps_not_increasing``, ``too_many_taps`` or
            ``taps_every``.
    """
    times = np.asarray(tap_times_s, dtype=float).ravel()
    finite("tap_times_s", times)
    require(np.diff(times) >= 0, "taps_not_increasing", "tap_times_s")
    require(len(times) <= LONGEST_SERIES, "too_many_taps", "tap_times_s")
    require(taps_every in TAPS_EVERY, "taps_every", "taps_every")
    series = _Series(times)
    if len(series.counted) <= WARM_UP + 1:
        return series.result("keep_going", "bounce_few_taps", None, taps_every)
    return _judge(series, taps_every)


class _Series:
    """One series of taps on its way through the stages; roles are noted as they are found."""

    def __init__(self, times: FloatArray) -> None:
        self.times = times
        self.roles: list[Role] = ["used"] * len(times)
        self.beats: list[int | None] = [None] * len(times)
        self.missed = 0
        self.margin = 0.0
        self.evidence = 0.0
        self.residuals = np.zeros(0)
        self.after_pause = False
        self.counted = self._without_pauses(self._without_early_doubles())

    def _without_early_doubles(self) -> IntArray:
        kept: list[int] = []
        for index, time in enumerate(self.times):
            if kept and time - self.times[kept[-1]] < HOLD_OFF:
                self.roles[index] = "doubled"
            else:
                kept.append(index)
        return np.array(kept, dtype=np.int64)

    def _without_pauses(self, kept: IntArray) -> IntArray:
        if len(kept) <= WARM_UP:
            return kept
        gaps = np.diff(self.times[kept])
        ends = np.flatnonzero(gaps > PAUSE * np.median(gaps)) + 1
        parts = np.split(kept, ends)
        # Of two equally long parts the later one counts.
        longest = max(range(len(parts)), key=lambda part: (len(parts[part]), part))
        for part, indices in enumerate(parts):
            if part != longest:
                self.set_roles(indices, "before_pause")
        self.after_pause = len(parts) > 1
        return parts[longest]

    def set_roles(self, indices: IntArray, role: Role) -> None:
        """Note what became of some taps."""
        for index in indices:
            self.roles[index] = role

    def measure(self) -> Rhythm:
        """Number the taps that count and measure their period."""
        self.set_roles(self.counted[:WARM_UP], "warm_up")
        counted = self.counted[WARM_UP:]
        numbering = number_beats(self.times[counted])
        self.margin = numbering.margin
        self.evidence = numbering.evidence
        self.set_roles(counted[~numbering.kept], "doubled")
        taps, beats = counted[numbering.kept], numbering.beats[numbering.kept]
        inside, self.residuals = _inside(beats.astype(float), self.times[taps])
        self.set_roles(taps[~inside], "outlier")
        taps, beats = taps[inside], beats[inside]
        self.missed = int(beats[-1] - beats[0] + 1 - len(beats))
        for index, beat in zip(taps, beats, strict=True):
            self.beats[index] = int(beat)
        return measure_rhythm(beats.astype(float), self.times[taps])

    def is_clear(self) -> bool:
        """Return whether the numbering stands out from all others and from no rhythm."""
        return self.margin >= CLEAR_MARGIN and self.evidence >= CLEAR_RHYTHM

    def count(self, role: Role) -> int:
        """Return how many taps have a role."""
        return self.roles.count(role)

    def result(
        self, state: State, code: str, rhythm: Rhythm | None, taps_every: int, **data: float
    ) -> BounceEstimate:
        """Put everything found so far together."""
        low, frequency, high = (
            (None, None, None) if rhythm is None else _interval(rhythm, taps_every)
        )
        measured = rhythm is not None
        return BounceEstimate(
            state=state,
            note=Note(code, data),
            frequency_hz=frequency,
            low_hz=low,
            high_hz=high,
            used=self.count("used") if measured else 0,
            missed=self.missed,
            doubled=self.count("doubled"),
            outliers=self.count("outlier"),
            roles=tuple(self.roles),
            beats=tuple(self.beats),
            after_pause=self.after_pause,
        )


def _judge(series: _Series, taps_every: int) -> BounceEstimate:
    """Measure, and decide what to do next."""
    rhythm = series.measure()
    half_width = COVERAGE_FACTOR * rhythm.sd / rhythm.period
    used = series.count("used")
    accidents = series.missed + series.count("doubled") + series.count("outlier")
    enough = used >= MINIMUM_USED
    lowest, highest = FREQUENCIES
    frequency = taps_every / rhythm.period
    wide = half_width >= WANTED_HALF_WIDTH
    strange = not lowest <= frequency <= highest
    unsteady = series.residuals.std() > UNSTEADY * rhythm.period
    too_many = accidents > MOST_ACCIDENTS * (used + accidents)
    unclear = series.margin < CLEAR_MARGIN
    # A result is shown once taps and numbering can carry it, whether or not it is final.
    shown = None if unclear or used < MINIMUM_USED // 2 else rhythm
    # The first line that applies decides.
    lines: tuple[tuple[bool, State, str, Rhythm | None], ...] = (
        (enough and unsteady, "start_again", "bounce_unsteady", None),
        (len(series.counted) >= MINIMUM_USED and too_many, "start_again", "bounce_accidents", None),
        (enough and strange, "start_again", "bounce_frequency", None),
        (enough and series.is_clear() and not wide, "done", "bounce_done", rhythm),
        (len(series.times) >= MOST_TAPS, "start_again", "bounce_no_success", None),
        (series.after_pause, "keep_going", "bounce_restart", shown),
        (not enough, "keep_going", "bounce_more_taps", shown),
        (unclear, "keep_going", "bounce_unclear", None),
        (not series.is_clear(), "keep_going", "bounce_no_rhythm_yet", shown),
        (True, "keep_going", "bounce_wide", shown),
    )
    state, code, carried = next(line[1:] for line in lines if line[0])
    data = {"more": float(MINIMUM_USED - used)} if code == "bounce_more_taps" else {}
    return series.result(state, code, carried, taps_every, **data)


def _inside(beats: FloatArray, times: FloatArray) -> tuple[BoolArray, FloatArray]:
    """Return which taps lie near their beat, and the residuals of those that do [s]."""
    slope, start = np.polyfit(beats, times, 1) if len(beats) > 1 else (0.0, times[0])
    residuals = times - start - slope * beats
    from_middle = np.abs(residuals - np.median(residuals))
    limit = max(OUTLIER_SDS * MAD_TO_SD * float(np.median(from_middle)), OUTLIER_LEAST)
    inside = from_middle <= limit
    return inside, residuals[inside]


def _interval(rhythm: Rhythm, taps_every: int) -> tuple[float | None, float | None, float | None]:
    """Return low, frequency and high [Hz]; nothing if the interval has no upper end."""
    spread = COVERAGE_FACTOR * rhythm.sd
    if spread >= rhythm.period:
        return None, None, None
    return (
        taps_every / (rhythm.period + spread),
        taps_every / rhythm.period,
        taps_every / (rhythm.period - spread),
    )
