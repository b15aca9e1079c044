"""Front against rear: whether the two ends go together, and what to change first.

A verdict is only given where the 95 % interval bears it; otherwise it is ``"unclear"``, and a
second reading helps more than a turn of any knob.
"""

from dataclasses import dataclass, replace
from typing import Final, Literal, TypeAlias

from core.checks import Quantity, positive, require
from core.uncertainty import Estimate, Measured, propagate

Position: TypeAlias = Literal["inside", "below", "above", "unclear"]
SagVerdict: TypeAlias = Literal["on_target", "too_little", "too_much", "unclear"]
Verdict: TypeAlias = Literal["balanced", "front_higher", "rear_higher", "unclear"]
Change: TypeAlias = Literal[
    "front_sag",
    "rear_sag",
    "frequency",
    "damping",
    "measure_sag",
    "measure_rebound",
    "measure_again",
    "nothing",
]

FREQUENCY_BAND: Final = (1.0, 1.3)  # [-] front over rear; follows from common sag targets
DAMPING_BAND: Final = (0.75, 1.35)  # [-] front over rear rebound; common practice, no source


@dataclass(frozen=True)
class EndState:
    """What is known about one end.

    Attributes:
        sag_target: lowest and highest share of the travel wanted [-].
        sag: share of the travel [-]; None if not measured.
        frequency: undamped natural frequency [Hz]; None if not known.
        rebound: damping ratio in rebound [-]; None if not measured.

    Raises:
        InvalidInputError: code ``sag_band_order``.
    """

    sag_target: tuple[float, float]
    sag: Measured | None = None
    frequency: Measured | None = None
    rebound: Measured | None = None

    def __post_init__(self) -> None:
        """Refuse a target that runs backwards."""
        require(0.0 < self.sag_target[0] < self.sag_target[1] < 1.0, "sag_band_order", "sag_target")


@dataclass(frozen=True)
class Comparison:
    """Front over rear.

    Attributes:
        ratio: with its 95 % interval [-].
        verdict: ``"balanced"``, ``"front_higher"``, ``"rear_higher"``, or ``"unclear"``.
    """

    ratio: Estimate
    verdict: Verdict


@dataclass(frozen=True)
class Balance:
    """How the two ends go together.

    Attributes:
        front_sag: against its target; None if not measured.
        rear_sag: against its target; None if not measured.
        frequency: front over rear; None unless both are known.
        damping: front over rear; None unless both are known.
        first: what to change, or measure, first.
    """

    front_sag: SagVerdict | None
    rear_sag: SagVerdict | None
    frequency: Comparison | None
    damping: Comparison | None
    first: Change


def compare_ends(front: EndState, rear: EndState) -> Balance:
    """Return how front and rear go together and what to change first.

    Sag comes first, because it sets the ride height and with it everything else; of two ends off
    their targets, the one that is further off. Then frequency, then damping, which must be set
    again after any change of spring (common practice, no source).

    Args:
        front: what is known about the front.
        rear: what is known about the rear.

    Raises:
        InvalidInputError: a quantity isn't positive.
        NoSolutionError: ``too_uncertain`` if a deviation reaches zero.
    """
    front_sag, rear_sag = _sag_verdict(front), _sag_verdict(rear)
    frequency = _compare(front.frequency, rear.frequency, FREQUENCY_BAND)
    damping = _compare(front.rebound, rear.rebound, DAMPING_BAND)
    off_target: list[tuple[float, Change]] = []
    if front_sag in _CLEARLY_OFF:
        off_target.append((_miss(front), "front_sag"))
    if rear_sag in _CLEARLY_OFF:
        off_target.append((_miss(rear), "rear_sag"))
    balance = Balance(front_sag, rear_sag, frequency, damping, "nothing")
    first = max(off_target)[1] if off_target else _first_besides_sag(balance)
    return replace(balance, first=first)


def _sag_verdict(end: EndState) -> SagVerdict | None:
    """Return how the sag of an end stands against its target."""
    if end.sag is None:
        return None
    positive("sag", end.sag.value)
    position = _position(propagate(lambda sag: sag, end.sag), end.sag_target)
    verdicts: dict[Position, SagVerdict] = {
        "inside": "on_target",
        "below": "too_little",
        "above": "too_much",
        "unclear": "unclear",
    }
    return verdicts[position]


def _compare(
    front: Measured | None, rear: Measured | None, band: tuple[float, float]
) -> Comparison | None:
    """Return front over rear and whether it lies in a band."""
    if front is None or rear is None:
        return None
    ratio = propagate(_ratio, front, rear)
    verdicts: dict[Position, Verdict] = {
        "inside": "balanced",
        "below": "rear_higher",
        "above": "front_higher",
        "unclear": "unclear",
    }
    return Comparison(ratio, verdicts[_position(ratio, band)])


def _ratio(front: Quantity, rear: Quantity) -> Quantity:
    """Return front over rear."""
    return positive("front", front) / positive("rear", rear)


def _position(estimate: Estimate, band: tuple[float, float]) -> Position:
    """Return where an estimate lies; outside the band only if all of its interval does."""
    low, high = band
    if low <= estimate.value <= high:
        return "inside"
    if estimate.high < low:
        return "below"
    return "above" if estimate.low > high else "unclear"


def _miss(end: EndState) -> float:
    """Return how far the sag of an end is outside its target, as a share of the travel."""
    if end.sag is None:
        return 0.0
    low, high = end.sag_target
    return max(low - end.sag.value, end.sag.value - high, 0.0)


def _first_besides_sag(balance: Balance) -> Change:
    """Return what to do first where no sag is clearly off its target."""
    sags = (balance.front_sag, balance.rear_sag)
    frequency = balance.frequency and balance.frequency.verdict
    damping = balance.damping and balance.damping.verdict
    steps: tuple[tuple[bool, Change], ...] = (
        (None in sags, "measure_sag"),
        ("unclear" in sags, "measure_again"),
        (frequency in _CLEARLY_UNLIKE, "frequency"),
        (damping in _CLEARLY_UNLIKE, "damping"),
        ("unclear" in (frequency, damping), "measure_again"),
        (damping is None, "measure_rebound"),
    )
    return next((change for applies, change in steps if applies), "nothing")


_CLEARLY_OFF: Final = ("too_little", "too_much")
_CLEARLY_UNLIKE: Final = ("front_higher", "rear_higher")
