"""The day's bumps, at a speed, for one end of the bike: what reaches the rider, and what works.

>>> from core.trail import Bumps, End, ride
>>> from core.uncertainty import Measured
>>> braking_bumps = Bumps(spacing=Measured(1.0, 0.1), height=Measured(0.05, 0.01))
>>> fork = End(Measured(2.6, 0.1), compression=Measured(0.2, 0.05), rebound=Measured(0.5, 0.05))
>>> passage = ride(braking_bumps, Measured(6.0), fork)
>>> passage.regime, f"{passage.transmissibility.value:.2f}"
('filters', '0.41')
"""

from dataclasses import dataclass
from typing import Final, Literal, TypeAlias

import numpy as np

from core.checks import Quantity, positive, require
from core.errors import Note
from core.oscillator import stroke_ratio, transmissibility
from core.packing import packed_share, packing_notes, recovered_share
from core.rebound import wheel_return_time
from core.uncertainty import Estimate, Measured, propagate
from core.uneven import least_contact, mean_damping, mean_drop
from core.waves import FILTERING_RATIO, forcing_frequency, sine_peaks

Regime: TypeAlias = Literal["follows", "resonates", "filters"]
Circuit: TypeAlias = Literal["low", "crossover", "high"]

FOLLOWING_RATIO: Final = 0.5**0.5  # [-] below, the body goes with the ground, hardly magnified
DIRECT: Final = Measured(1.0)  # [-] the shaft moves as the wheel does
WHEEL_SHARE: Final = 0.1  # [-] wheel, tyre and lower legs over the mass carried; common practice
FORK_CROSSOVER: Final = (0.1, 0.5)  # [m/s] of the fork; common practice, definitions differ
SHOCK_CROSSOVER: Final = (0.05, 0.3)  # [m/s] of the shock's shaft; likewise
WIDEST_DAMPING: Final = 4.0  # [-] rebound over compression; beyond, the mean is off by over 5 %
FASTEST: Final = 30.0  # [m/s] nobody rides repeated bumps faster
SPEED_STEPS: Final = 600  # [-] in the search for the first loss of contact; 0.05 m/s each


@dataclass(frozen=True)
class Bumps:
    """A row of similar bumps.

    Attributes:
        spacing: crest to crest [m].
        height: trough to crest [m].
    """

    spacing: Measured
    height: Measured


@dataclass(frozen=True)
class End:
    """One end of the bike, in the terms that riding over bumps needs.

    Attributes:
        frequency: undamped natural frequency with the rider on [Hz].
        compression: damping ratio in compression [-].
        rebound: damping ratio in rebound [-].
        leverage: vertical wheel travel over shaft travel at sag [-]; for a fork the sine of its
            head angle.
        wheel_share: mass moving with the wheel over the mass it carries [-].
        crossover: shaft speeds between which low- and high-speed circuits share the work [m/s].
        sag: at the wheel [m]; None if not known.
        travel: of the wheel [m]; None if not known.

    Raises:
        InvalidInputError: ``crossover_order``.
    """

    frequency: Measured
    compression: Measured
    rebound: Measured
    leverage: Measured = DIRECT
    wheel_share: float = WHEEL_SHARE
    crossover: tuple[float, float] = FORK_CROSSOVER
    sag: float | None = None
    travel: float | None = None

    def __post_init__(self) -> None:
        """Refuse a crossover that runs backwards."""
        require(0.0 < self.crossover[0] < self.crossover[1], "crossover_order", "crossover")


@dataclass(frozen=True)
class Passage:
    """What happens to one end over a row of bumps at one speed, with 95 % intervals.

    Attributes:
        forcing: bumps per second [Hz].
        frequency_ratio: bumps per swing of the body [-].
        transmissibility: movement of the body over that of the ground [-].
        mean_drop: how much lower it rides than standing still [m], negative: higher.
        recovered: share of its way that the wheel is back when the next bump comes [-].
        packed: compression left by all earlier bumps, in strokes of one bump [-].
        wheel_speed: peak vertical speed of a wheel that follows the ground [m/s].
        wheel_acceleration: its peak vertical acceleration [m/s²].
        stroke: amplitude of the suspension's movement at the wheel [m].
        shaft_speed: peak speed of the shaft [m/s].
        shaft_acceleration: peak acceleration of the shaft [m/s²].
        contact: least force between wheel and ground, in static loads [-].
        regime: ``"follows"`` the ground, ``"resonates"``, or ``"filters"``.
        circuit: ``"low"`` or ``"high"`` speed circuit, or their ``"crossover"``.
        notes: what a person should know about it.
    """

    forcing: Estimate
    frequency_ratio: Estimate
    transmissibility: Estimate
    mean_drop: Estimate
    recovered: Estimate
    packed: Estimate
    wheel_speed: Estimate
    wheel_acceleration: Estimate
    stroke: Estimate
    shaft_speed: Estimate
    shaft_acceleration: Estimate
    contact: Estimate
    regime: Regime
    circuit: Circuit
    notes: tuple[Note, ...]


def ride(bumps: Bumps, speed: Measured, end: End) -> Passage:
    """Return what a row of bumps does to one end of the bike at a speed.

    Args:
        bumps: spacing and height.
        speed: along the ground [m/s].
        end: frequency, damping, leverage.

    Raises:
        InvalidInputError: a quantity isn't finite or is outside its range.
        NoSolutionError: ``too_uncertain`` if deviations reach zero or below.
    """

    def motion(*drawn: Quantity) -> tuple[Quantity, ...]:
        spacing, height, ground_speed, frequency, compression, rebound, leverage = drawn
        amplitude = positive("height", height) / 2.0
        forcing = forcing_frequency(ground_speed, spacing)
        ratio = forcing / positive("frequency", frequency)
        damping = mean_damping(compression, rebound)
        stroke = amplitude * stroke_ratio(ratio, damping)
        interval, return_time = 1.0 / forcing, wheel_return_time(frequency, rebound)
        contact = least_contact(
            amplitude,
            forcing,
            frequency=frequency,
            compression=compression,
            rebound=rebound,
            wheel_share=end.wheel_share,
        )
        return (
            forcing,
            ratio,
            transmissibility(ratio, damping),
            amplitude * mean_drop(ratio, compression, rebound),
            recovered_share(interval, return_time),
            packed_share(interval, return_time),
            *sine_peaks(amplitude, forcing),
            stroke,
            *sine_peaks(stroke / positive("leverage", leverage), forcing),
            contact,
        )

    (
        forcing,
        ratio,
        passed_on,
        drop,
        recovered,
        packed,
        wheel_speed,
        wheel_acceleration,
        stroke,
        shaft_speed,
        shaft_acceleration,
        contact,
    ) = propagate(
        motion,
        bumps.spacing,
        bumps.height,
        speed,
        end.frequency,
        end.compression,
        end.rebound,
        end.leverage,
    )
    return Passage(
        forcing=forcing,
        frequency_ratio=ratio,
        transmissibility=passed_on,
        mean_drop=drop,
        recovered=recovered,
        packed=packed,
        wheel_speed=wheel_speed,
        wheel_acceleration=wheel_acceleration,
        stroke=stroke,
        shaft_speed=shaft_speed,
        shaft_acceleration=shaft_acceleration,
        contact=contact,
        regime=regime_at(ratio.value),
        circuit=circuit_at(shaft_speed.value, end.crossover),
        notes=(
            *packing_notes(ratio.value, end.rebound.value),
            *_contact_notes(contact),
            *_room_notes(end, stroke.value, drop.value),
            *_damping_notes(end),
        ),
    )


def regime_at(frequency_ratio: float) -> Regime:
    """Return what the body does at a ratio of forcing to natural frequency.

    Args:
        frequency_ratio: r [-], positive.

    Raises:
        InvalidInputError: a quantity isn't finite or isn't positive.
    """
    positive("frequency_ratio", frequency_ratio)
    if frequency_ratio > FILTERING_RATIO:
        return "filters"
    return "resonates" if frequency_ratio > FOLLOWING_RATIO else "follows"


def circuit_at(shaft_speed: float, crossover: tuple[float, float]) -> Circuit:
    """Return which damping circuit does the work at a peak shaft speed.

    Over a row of bumps compression and rebound reach the same peak speed, so the answer holds
    for both directions.

    Args:
        shaft_speed: peak [m/s], positive.
        crossover: shaft speeds between which the circuits share the work [m/s].

    Raises:
        InvalidInputError: a quantity isn't finite or isn't positive.
    """
    positive("shaft_speed", shaft_speed)
    if shaft_speed < crossover[0]:
        return "low"
    return "high" if shaft_speed > crossover[1] else "crossover"


def following_limit(bumps: Bumps, end: End) -> float | None:
    """Return the lowest speed at which the wheel leaves the ground on a row of bumps.

    Args:
        bumps: spacing and height.
        end: frequency, damping, wheel share.

    Returns:
        Speed [m/s], to 0.05; None if the wheel follows up to `FASTEST`.

    Raises:
        InvalidInputError: a quantity isn't finite or is outside its range.
    """
    speeds = np.linspace(FASTEST / SPEED_STEPS, FASTEST, SPEED_STEPS)
    contact = least_contact(
        positive("height", bumps.height.value) / 2.0,
        forcing_frequency(speeds, bumps.spacing.value),
        frequency=end.frequency.value,
        compression=end.compression.value,
        rebound=end.rebound.value,
        wheel_share=end.wheel_share,
    )
    lost = np.flatnonzero(np.less_equal(contact, 0.0))
    return float(speeds[lost[0]]) if lost.size else None


def _contact_notes(contact: Estimate) -> tuple[Note, ...]:
    """Return a note where the wheel leaves the ground, or may."""
    if contact.value <= 0.0:
        return (Note("wheel_leaves_ground"),)
    return (Note("wheel_may_leave_ground"),) if contact.low <= 0.0 else ()


def _room_notes(end: End, stroke: float, drop: float) -> tuple[Note, ...]:
    """Return notes where the stroke doesn't fit into the travel."""
    notes = []
    if end.sag is not None and stroke - drop > end.sag:
        notes.append(Note("stroke_tops_out", {"room_m": end.sag}))
    if end.sag is not None and end.travel is not None and stroke + drop > end.travel - end.sag:
        notes.append(Note("stroke_bottoms", {"room_m": end.travel - end.sag}))
    return tuple(notes)


def _damping_notes(end: End) -> tuple[Note, ...]:
    """Return a note where compression and rebound differ too much for their mean."""
    weaker, stronger = sorted((end.compression.value, end.rebound.value))
    return (Note("damping_uneven"),) if stronger > WIDEST_DAMPING * weaker else ()
