"""The frequency of one end, from the best that a setup has."""

from dataclasses import dataclass
from typing import Final, Literal

from core import estimate_bounce
from core.uncertainty import COVERAGE_FACTOR, Estimate, Measured
from mobileapp.records import BounceRun, End, Setup
from mobileapp.results.sag import frequency_from_sag

RIDER_SD: Final = 0.05  # [-] a rider can hold a rhythm up to a tenth off; two of these

Source = Literal["sag", "bounce"]


@dataclass(frozen=True)
class EndFrequency:
    """The frequency of one end.

    Attributes:
        measured: with its standard deviation [Hz].
        source: what it comes from.
    """

    measured: Measured
    source: Source


def end_frequency(setup: Setup, end: End) -> EndFrequency | None:
    """Return the frequency of an end with its rider, or None if nothing tells it.

    Sag goes first: it sees one end, while a bounce moves both.
    """
    from_sag = frequency_from_sag(end, setup.sag.get(end))
    if from_sag:
        return EndFrequency(from_sag.as_measured(), "sag")
    bounce = bounce_frequency(setup.bounce)
    return bounce and EndFrequency(bounce, "bounce")


def bounce_frequency(run: BounceRun | None) -> Measured | None:
    """Return the bike's frequency as a bounce test tells it, the rider's freedom included."""
    if run is None:
        return None
    result = estimate_bounce(run.taps, taps_every=run.taps_every)
    if result.frequency_hz is None:
        return None
    shown = Estimate(result.frequency_hz, result.low_hz, result.high_hz)
    tapping, rider = shown.half_width / COVERAGE_FACTOR, RIDER_SD * shown.value
    return Measured(shown.value, (tapping**2 + rider**2) ** 0.5)
