"""Rebound at one end: how strongly it is damped, which way to turn, and about how far."""

from dataclasses import dataclass
from typing import Final, Literal

from core.clicks import TriedSetting, clicks_for_damping
from core.errors import NoSolutionError, SetupError
from core.rebound import settling_time, wheel_return_time
from core.release import (
    ONE_OVERSHOOT,
    Damping,
    advise,
    damping_by_overshoot,
    damping_by_time,
    damping_if_not_passed,
    time_from_frames,
)
from core.uncertainty import Estimate, Measured, propagate
from core.units import MM
from mobileapp.format import Reading
from mobileapp.records import End, Setup
from mobileapp.release_reading import ReleaseReading
from mobileapp.results.estimate import reading as shown
from mobileapp.results.frequency import end_frequency
from mobileapp.results.told import told
from mobileapp.texts import Texts

READING_SD: Final = 1.0 * MM  # [m] of a push or an overshoot beside a mark; common practice

Turn = Literal["close", "keep", "open", "measure"]


@dataclass(frozen=True)
class ReboundView:
    """What the rebound screen shows of one end.

    Attributes:
        missing: what to read first, or why it can't be so; if it's there, nothing else is shown.
        damping: damping ratio with ±; None where only a bound is known.
        bound: the bound in words; empty where the ratio is known.
        interval: low, value and high on a scale from 0 to 1 [-].
        band: of “one overshoot, then settle”, likewise.
        turn: which way to turn the adjuster.
        advice: the same in words.
        sure: whether the ± leaves no doubt, in words.
        times: how quickly body and wheel come to rest, if the frequency is known, in words.
        clicks: what two tried settings tell, in words; empty with fewer.
        notes: further sentences.
    """

    missing: str = ""
    damping: Reading | None = None
    bound: str = ""
    interval: tuple[float, float, float] = (0.0, 0.0, 1.0)
    band: tuple[float, float] = ONE_OVERSHOOT
    turn: Turn = "measure"
    advice: str = ""
    sure: str = ""
    times: tuple[str, ...] = ()
    clicks: str = ""
    notes: tuple[str, ...] = ()


def rebound_view(setup: Setup, end: End, texts: Texts) -> ReboundView:
    """Return what to show for the latest release test of an end."""
    tries = setup.releases.get(end, ())
    reading = setup.release(end)
    missing = _missing(setup, end, reading)
    if missing:
        return ReboundView(missing=texts(missing))
    try:
        damping = damping_of(setup, end, reading)
    except SetupError as error:
        return ReboundView(missing=told(error, texts))
    advice = advise(damping)
    ratio = damping.ratio
    return ReboundView(
        damping=ratio and shown(ratio, "", comma=texts.comma),
        bound="" if ratio else texts("rebound.at_least", ratio=_text(damping.at_least, texts)),
        interval=(ratio.low, ratio.value, ratio.high) if ratio else (damping.at_least, 1.0, 1.0),
        turn=advice.turn,
        advice=texts(f"rebound.turn.{advice.turn}"),
        sure=texts("rebound.sure" if advice.sure else "rebound.unsure"),
        times=_times(setup, end, ratio, texts),
        clicks=_clicks(setup, end, tries, texts),
        notes=tuple(told(note, texts) for note in damping.notes),
    )


def _missing(setup: Setup, end: End, reading: ReleaseReading) -> str:
    if reading.way == "film" and reading.frames.value <= 0:
        return "rebound.missing.frames"
    if reading.way == "film" and end_frequency(setup, end) is None:
        return "rebound.missing.frequency"
    if reading.way != "film" and reading.push.value <= 0:
        return "rebound.missing.push"
    if reading.way == "ruler" and reading.overshoot.value <= 0:
        return "rebound.missing.overshoot"
    return ""


def damping_of(setup: Setup, end: End, reading: ReleaseReading) -> Damping:
    """Return the damping that a release test of an end tells.

    Raises:
        SetupError: it tells none, with the sentence why.
    """
    if reading.way == "film":
        frequency = end_frequency(setup, end)
        if frequency is None:
            raise NoSolutionError("no_readings", "frequency")
        time = time_from_frames([reading.frames.value], reading.rate)
        return damping_by_time(time, frequency.measured)
    if reading.way == "not_passed":
        return damping_if_not_passed(reading.push.si)
    return damping_by_overshoot(
        Measured(reading.push.si, READING_SD), Measured(reading.overshoot.si, READING_SD)
    )


def _times(setup: Setup, end: End, ratio: Estimate | None, texts: Texts) -> tuple[str, ...]:
    frequency = end_frequency(setup, end)
    if frequency is None or ratio is None or ratio.low <= 0:
        return ()
    times = (("settled", settling_time), ("returned", wheel_return_time))
    try:
        estimates = [
            (name, propagate(time, frequency.measured, ratio.as_measured())) for name, time in times
        ]
    except SetupError:  # the ± reaches down to no damping at all, which never settles
        return ()
    return tuple(
        texts(f"rebound.{name}", time=str(shown(time, "s", comma=texts.comma)))
        for name, time in estimates
    )


def _clicks(setup: Setup, end: End, tries: tuple[ReleaseReading, ...], texts: Texts) -> str:
    """Return what the two latest settings tell of the next one."""
    counted = [reading for reading in tries if reading.clicks]
    if len(counted) < 2 or counted[-1] is not tries[-1]:  # noqa: PLR2004 - a line needs two points
        return ""
    before, now = counted[-2:]
    try:
        settings = [
            TriedSetting(reading.clicks.value, ratio.as_measured())
            for reading in (before, now)
            if (ratio := damping_of(setup, end, reading).ratio)
        ]
        if len(settings) < 2:  # noqa: PLR2004 - likewise
            return ""
        advice = clicks_for_damping(*settings)
    except SetupError as error:
        return told(error, texts)
    direction = "keep" if advice.turn == 0 else "open" if advice.turn > 0 else "close"
    said = texts(
        f"rebound.clicks.{direction}", turn=str(abs(advice.turn)), clicks=str(advice.clicks)
    )
    return " ".join([said, *[told(note, texts) for note in advice.notes]])


def _text(ratio: float, texts: Texts) -> str:
    return f"{ratio:.1f}".replace(".", "," if texts.comma else ".")
