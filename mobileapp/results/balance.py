"""Front against rear: what goes together, and what to do first."""

from dataclasses import dataclass
from typing import Final, Literal

from core.balance import DAMPING_BAND, FREQUENCY_BAND, Comparison, EndState, compare_ends
from core.errors import SetupError
from mobileapp.format import Reading
from mobileapp.records import End, Setup
from mobileapp.results.damping import end_damping
from mobileapp.results.estimate import reading as shown
from mobileapp.results.sag import BANDS, frequency_from_sag, share_of_travel
from mobileapp.results.told import told
from mobileapp.texts import Texts

SCALE: Final = 2.0  # [-] front over rear at the right end of the scale

Step = Literal["sag", "rebound", "balance"]
_STEPS: Final[dict[str, Step]] = {
    "front_sag": "sag",
    "rear_sag": "sag",
    "frequency": "sag",
    "damping": "rebound",
    "measure_sag": "sag",
    "measure_rebound": "rebound",
    "measure_again": "sag",
    "nothing": "balance",
}


@dataclass(frozen=True)
class Ratio:
    """Front over rear.

    Attributes:
        name: of what.
        reading: with ±; None if an end isn't measured.
        verdict: in words.
        interval: low, value and high on a scale from 0 to 1 [-].
        band: where it should lie, likewise.
    """

    name: str
    reading: Reading | None
    verdict: str
    interval: tuple[float, float, float] = (0.0, 0.0, 0.0)
    band: tuple[float, float] = (0.0, 0.0)


@dataclass(frozen=True)
class BalanceView:
    """What the balance screen shows.

    Attributes:
        first: what to do first, in words.
        step: where that is done.
        sag: name of the end, its sag against the target in words.
        ratios: frequency and damping, front over rear.
        missing: why there is nothing else.
    """

    first: str = ""
    step: Step = "balance"
    sag: tuple[tuple[str, str], ...] = ()
    ratios: tuple[Ratio, ...] = ()
    missing: str = ""


def balance_view(setup: Setup, texts: Texts) -> BalanceView:
    """Return how the ends of a setup go together."""
    try:
        balance = compare_ends(_state(setup, "front"), _state(setup, "rear"))
    except SetupError as error:
        return BalanceView(missing=told(error, texts))
    sag = (("front", balance.front_sag), ("rear", balance.rear_sag))
    return BalanceView(
        first=texts(f"balance.do.{balance.first}"),
        step=_STEPS[balance.first],
        sag=tuple(
            (texts(f"sag.{end}"), texts(f"balance.sag.{verdict}" if verdict else "balance.unknown"))
            for end, verdict in sag
        ),
        ratios=(
            _ratio("frequency", "is", balance.frequency, FREQUENCY_BAND, texts),
            _ratio("damping", "damped", balance.damping, DAMPING_BAND, texts),
        ),
    )


def _state(setup: Setup, end: End) -> EndState:
    # The bounce moves both ends at once, so only sag tells their frequencies apart.
    frequency = frequency_from_sag(end, setup.sag.get(end))
    damping = end_damping(setup, end)
    return EndState(
        BANDS[end],
        share_of_travel(setup.sag.get(end)),
        frequency and frequency.as_measured(),
        damping.rebound if damping.measured else None,
    )


def _ratio(
    name: str, verdicts: str, comparison: Comparison | None, band: tuple[float, float], texts: Texts
) -> Ratio:
    title = texts(f"balance.{name}")
    if comparison is None:
        return Ratio(title, None, texts("balance.unknown"))
    ratio = comparison.ratio
    return Ratio(
        title,
        shown(ratio, "", comma=texts.comma),
        texts(f"balance.{verdicts}.{comparison.verdict}"),
        (ratio.low / SCALE, ratio.value / SCALE, ratio.high / SCALE),
        (band[0] / SCALE, band[1] / SCALE),
    )
