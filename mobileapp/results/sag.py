"""Sag at one end: per cent, the band it lies in, and the frequency that follows."""

from dataclasses import dataclass
from functools import lru_cache
from typing import Final, Literal

import numpy as np

from core.checks import Quantity
from core.errors import NoSolutionError
from core.oscillator import frequency_from_deflection
from core.uncertainty import Estimate, Measured, propagate
from core.units import DEGREE, MM
from mobileapp.format import Reading, number, typed
from mobileapp.records import End, SagReading
from mobileapp.results.estimate import reading as shown
from mobileapp.texts import Texts

READING_SD: Final = 1.0 * MM  # [m] an O-ring against a tape; common practice, no source
TRAVEL_SD: Final = 1.0 * MM  # [m] printed travel against real travel; common practice, no source
HEAD_ANGLE: Final = Measured(65 * DEGREE, 1.5 * DEGREE)  # [rad] where the bike's isn't known

# The springs' own share in the frequency when nothing is known of them: a coil gives 1, air with
# common chambers 1.06 with a standard deviation of 0.06 (see core.air_spring).
SPRING_FACTOR: Final = Measured(1.04, 0.05)  # [-]

# Trail riding; common practice, no source.
BANDS: Final[dict[End, tuple[float, float]]] = {"front": (0.18, 0.25), "rear": (0.25, 0.30)}
USUAL: Final = (0.08, 0.45)  # [-] outside of it, a slip is likelier than a setup

Place = Literal["within", "below", "above", "open"]


@dataclass(frozen=True)
class SagView:
    """What the sag screen shows of one end.

    Attributes:
        error: a sentence for the reading's field, or None; if there is one, nothing else is shown.
        percent: sag with ±.
        share: sag as a share of travel [-], for the gauge.
        band: the usual band [-], low and high.
        verdict: where the reading lies in it, in words.
        frequency: the frequency that follows from the deflection, or None.
        notes: further sentences.
    """

    error: str | None = None
    percent: Reading | None = None
    share: float = 0.0
    band: tuple[float, float] = (0.0, 0.0)
    verdict: str = ""
    frequency: Reading | None = None
    notes: tuple[str, ...] = ()


@lru_cache(maxsize=64)  # a screen and the list at home ask for the same
def sag_view(end: End, entered: SagReading, texts: Texts) -> SagView:
    """Return what to show for a reading."""
    error = _error(entered, texts)
    if error:
        return SagView(error=error)
    sag = Measured(entered.sag.si, READING_SD)
    travel = Measured(entered.travel.si, TRAVEL_SD)
    share = propagate(lambda s, t: s / t, sag, travel)
    low, high = BANDS[end]
    limits = {"low": number(100 * low, 0), "high": number(100 * high, 0)}
    notes = []
    if not USUAL[0] <= share.value <= USUAL[1]:
        notes.append(texts("sag.unusual"))
    try:
        frequency = _frequency(end, entered, sag, travel)
        if frequency is None:
            notes.append(texts("sag.frequency.unknown"))
    except NoSolutionError:
        frequency = None
        notes.append(texts("sag.frequency.too_small"))
    return SagView(
        percent=shown(share, "%", comma=texts.comma),
        share=share.value,
        band=(low, high),
        verdict=texts(f"sag.band.{_place(share, low, high)}", **limits),
        frequency=frequency and shown(frequency, "Hz", comma=texts.comma),
        notes=tuple(notes),
    )


def share_of_travel(entered: SagReading | None) -> Measured | None:
    """Return sag as a share of travel, or None if nothing possible has been read."""
    if entered is None or not 0 < entered.sag.si < entered.travel.si:
        return None
    sag, travel = Measured(entered.sag.si, READING_SD), Measured(entered.travel.si, TRAVEL_SD)
    return propagate(lambda s, t: s / t, sag, travel).as_measured()


def frequency_from_sag(end: End, entered: SagReading | None) -> Estimate | None:
    """Return the frequency that a reading of sag tells, or None if it tells none."""
    if entered is None or entered.travel.value <= 0 or not 0 < entered.sag.si < entered.travel.si:
        return None
    sag, travel = Measured(entered.sag.si, READING_SD), Measured(entered.travel.si, TRAVEL_SD)
    try:
        return _frequency(end, entered, sag, travel)
    except NoSolutionError:
        return None


def _error(entered: SagReading, texts: Texts) -> str | None:
    if entered.travel.value <= 0:
        return texts("sag.error.travel")
    if entered.sag.value < 0:
        return texts("sag.error.negative")
    if entered.sag.value == 0:
        return texts("sag.error.zero")
    if entered.sag.si >= entered.travel.si:
        unit = entered.travel.unit
        travel = f"{typed(entered.travel.value, unit, comma=texts.comma)} {unit}"
        return texts("sag.error.beyond", travel=travel)
    return None


def _place(share: Estimate, low: float, high: float) -> Place:
    """Tell where an interval lies; one that reaches over an edge is open unless its value is in."""
    if low <= share.value <= high:
        return "within"
    if share.high < low:
        return "below"
    return "above" if share.low > high else "open"


def _frequency(end: End, entered: SagReading, sag: Measured, travel: Measured) -> Estimate | None:
    """Return the frequency of the wheel's static deflection, if that is known."""
    if end == "front":

        def of_fork(sag: Quantity, angle: Quantity, factor: Quantity) -> Quantity:
            return factor * frequency_from_deflection(sag * np.sin(angle))

        return propagate(of_fork, sag, HEAD_ANGLE, SPRING_FACTOR)
    if entered.place == "wheel":
        return propagate(lambda s, f: f * frequency_from_deflection(s), sag, SPRING_FACTOR)
    if entered.wheel_travel is None or entered.wheel_travel.value <= 0:
        return None

    def of_shock(sag: Quantity, stroke: Quantity, travel: Quantity, factor: Quantity) -> Quantity:
        return factor * frequency_from_deflection(sag / stroke * travel)

    wheel_travel = Measured(entered.wheel_travel.si, TRAVEL_SD)
    return propagate(of_shock, sag, travel, wheel_travel, SPRING_FACTOR)
