"""The change of pressure that brings a bike from the sag that was read to the sag that is wanted.

The load stays the same, so the spring must carry at the new sag what it carries now. How it is
built decides how much pressure that takes. That is rarely known, so the answer carries a ±, goes
in steps that are not too large, and starts anew from each reading.

    >>> from core.parts import Part
    >>> from core.pressure_change import change_pressure
    >>> from core.uncertainty import Measured
    >>> from core.units import MM, PSI
    >>> from core.unknown import common_fork
    >>> change = change_pressure(
    ...     common_fork(150 * MM),
    ...     pressure=Measured(75 * PSI, 1 * PSI),
    ...     reading=Measured(34 * MM, 1 * MM),
    ...     wanted=30 * MM,
    ...     limit=120 * PSI,
    ... )
    >>> change.state, f"{change.set_to / PSI:.0f} psi ± {change.needed.half_width / PSI:.0f}"
    ('set', '85 psi ± 6')
    >>> f"sag {change.sag.value / MM:.0f} mm ± {change.sag.half_width / MM:.0f}"
    'sag 30 mm ± 2'
"""

from dataclasses import dataclass
from math import copysign
from typing import Final, Literal, TypeAlias

import numpy as np

from core.air_spring import AirSpring, Chambers
from core.checks import Quantity, positive, require
from core.constants import STANDARD_PRESSURE
from core.errors import InvalidInputError, NoSolutionError, Note
from core.geometry import Place, WheelPath, from_shaft, to_shaft
from core.parts import Part, nominal, propagate_parts
from core.springs import loaded_frequency, stroke_under, wheel_load
from core.uncertainty import Estimate, Measured
from core.unknown import common_chambers

LARGEST_STEP: Final = 0.15  # [-] of the pressure now; beyond, the unknown chambers mislead

PressureState: TypeAlias = Literal["leave", "set", "step", "beyond_limit"]


@dataclass(frozen=True)
class PressureChange:
    """A change of pressure.

    Attributes:
        state: ``"leave"`` it: sag and target can't be told apart; ``"set"`` it; ``"step"``: too
            far for one go, set this and measure again; ``"beyond_limit"``: the target needs more
            than the printed maximum.
        set_to: on the gauge [Pa]; never above the printed maximum.
        change: from now to there [Pa].
        needed: on the gauge for the target [Pa]; not an advice where it passes the maximum.
        needed_change: from now to there [Pa].
        sag: to expect at `set_to`, where it was read [m].
        frequency: undamped, to expect there [Hz].
        notes: what a person should know.
    """

    state: PressureState
    set_to: float
    change: float
    needed: Estimate
    needed_change: Estimate
    sag: Estimate
    frequency: Estimate
    notes: tuple[Note, ...]


def pressure_for_stroke(
    chambers: Chambers,
    path: WheelPath,
    pressure: Quantity,
    stroke: Quantity,
    wanted: Quantity,
    *,
    ambient: Quantity = STANDARD_PRESSURE,
) -> Quantity:
    """Return the gauge pressure at which the same load sinks to another stroke.

    P₂ = [((P₁ + Pₐ) g(s₁) − (1 − r) Pₐ) φ₂/φ₁ + (1 − r) Pₐ] / g(s₂) − Pₐ

    with g the shape of the chambers, r their ratio of areas, φ the leverage.

    Args:
        chambers: of the spring.
        path: of its wheel.
        pressure: P₁, on the gauge [Pa], positive.
        stroke: s₁, of the shaft as read [m], positive.
        wanted: s₂, of the shaft as wanted [m], positive.
        ambient: Pₐ, outside [Pa], positive.

    Returns:
        P₂ on the gauge [Pa], shapes broadcast.

    Raises:
        NoSolutionError: code ``topped_out`` where the spring carries nothing at one of the
            strokes, ``no_pressure`` where the target needs less than no pressure.
        InvalidInputError: a quantity isn't finite or is outside its range.

    Source: equal load F(s)/φ(s) of an isothermal spring at both strokes.
    """
    positive("stroke", stroke)
    positive("wanted", wanted)
    load = wheel_load(AirSpring(chambers, pressure, ambient=ambient), path, stroke)
    shape = chambers.shape(wanted)
    carries = np.greater(load, 0.0) & np.greater(shape, _LEAST_SHAPE)
    require(carries, "topped_out", "wanted", NoSolutionError)
    rod = (1.0 - chambers.area_ratio) * ambient
    gauge = (load * path.leverage(wanted) + rod) / shape - ambient
    require(np.greater(gauge, 0.0), "no_pressure", "wanted", NoSolutionError)
    return gauge


def change_pressure(
    path: WheelPath | Part[WheelPath],
    pressure: Measured,
    reading: Measured,
    wanted: float,
    limit: float | None,
    *,
    place: Place = "shaft",
    chambers: Chambers | Part[Chambers] | None = None,
    ambient: float = STANDARD_PRESSURE,
) -> PressureChange:
    """Return the change of pressure for a wanted sag.

    Always give the latest pressure and the reading that was taken at it: the nearer they are to
    the target, the less it matters what isn't known of the spring.

    Args:
        path: of the wheel.
        pressure: on the gauge now [Pa].
        reading: sag at that pressure [m].
        wanted: sag that is wanted, read at the same place [m].
        limit: the maximum printed on the unit [Pa], or None where it can't be read.
        place: where sag is read.
        chambers: of the spring; None for what is common.
        ambient: pressure outside [Pa]; see `core.atmosphere.pressure_at`.

    Raises:
        InvalidInputError: code ``above_limit`` where the pressure is beyond the limit already;
            ``beyond_travel``; a quantity isn't finite or isn't positive.
        NoSolutionError: code ``topped_out``, ``bottomed``, ``no_pressure``, ``unstable`` or
            ``too_uncertain``.
    """
    positive("pressure", pressure.value)
    if limit is not None and pressure.value > positive("limit", limit):
        raise InvalidInputError("above_limit", "pressure", limit_pa=limit)
    full_stroke = float(nominal(path).full_stroke)
    known = (chambers or common_chambers(full_stroke), path, pressure, reading)

    def need(
        chambers: Chambers, path: WheelPath, now: Quantity, read: Quantity
    ) -> tuple[Quantity, Quantity]:
        stroke, goal = (to_shaft(path, sag, place) for sag in (read, wanted))
        gauge = pressure_for_stroke(chambers, path, now, stroke, goal, ambient=ambient)
        return gauge, gauge - now

    needed, needed_change = propagate_parts(need, *known)
    state, set_to, notes = _decide(pressure.value, needed, needed_change, limit)

    def expect(
        chambers: Chambers, path: WheelPath, now: Quantity, read: Quantity
    ) -> tuple[Quantity, Quantity]:
        before = AirSpring(chambers, now, ambient=ambient)
        after = AirSpring(chambers, now + (set_to - pressure.value), ambient=ambient)
        load = wheel_load(before, path, to_shaft(path, read, place))
        stroke = stroke_under(after, path, load)
        return from_shaft(path, stroke, place), loaded_frequency(after, path, stroke)

    sag, frequency = propagate_parts(expect, *known)
    change = set_to - pressure.value
    return PressureChange(state, set_to, change, needed, needed_change, sag, frequency, notes)


def _decide(
    now: float, needed: Estimate, needed_change: Estimate, limit: float | None
) -> tuple[PressureState, float, tuple[Note, ...]]:
    """Return what to do, the pressure to set, and what to say about it."""
    if needed_change.low <= 0.0 <= needed_change.high:
        return "leave", now, (Note("within_doubt"),)
    notes = [Note("equalise")]
    if limit is None:
        notes.append(Note("limit_unknown"))
    largest = LARGEST_STEP * now
    too_far = abs(needed_change.value) > largest
    goal = now + copysign(largest, needed_change.value) if too_far else needed.value
    state: PressureState = "step" if too_far else "set"
    if limit is not None and needed.value > limit:
        notes.insert(0, Note("beyond_limit", {"limit_pa": limit}))
        state, too_far, goal = "beyond_limit", goal < limit, min(goal, limit)
    if too_far:
        notes.append(Note("large_step"))
    elif limit is not None and goal < limit < needed.high:
        notes.append(Note("limit_near", {"limit_pa": limit}))
    return state, goal, tuple(notes)


_LEAST_SHAPE: Final = 1e-6  # [-] a spring that gives less carries nothing
