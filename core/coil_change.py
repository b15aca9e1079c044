"""The coil and preload that bring a bike from the sag that was read to the sag that is wanted.

The load stays the same, so the new coil must carry at the new sag what the old one carries now.
Preload first, because it only takes a turn of a collar; another coil if that isn't enough.

    >>> from core.coil import Coil
    >>> from core.coil_change import change_coil
    >>> from core.uncertainty import Measured
    >>> from core.units import LBF_PER_INCH, MM
    >>> from core.unknown import common_linkage
    >>> change = change_coil(
    ...     common_linkage(150 * MM, 55 * MM),
    ...     Coil(400 * LBF_PER_INCH, preload=1 * MM),
    ...     reading=Measured(21 * MM, 0.5 * MM),
    ...     wanted=16.5 * MM,
    ...     rates=[rate * LBF_PER_INCH for rate in (350, 450, 500, 550)],
    ... )
    >>> change.state, f"{change.rate / LBF_PER_INCH:.0f} lbf/in, {change.preload / MM:.1f} mm"
    ('coil', '500 lbf/in, 1.3 mm')
    >>> f"sag {change.sag.value / MM:.1f} mm ± {change.sag.half_width / MM:.1f}"
    'sag 16.5 mm ± 1.3'
"""

from collections.abc import Sequence
from dataclasses import dataclass, replace
from math import inf
from typing import Final, Literal, TypeAlias

from core.checks import Quantity, not_negative, positive
from core.coil import Coil
from core.errors import NoSolutionError, Note
from core.geometry import Place, WheelPath, from_shaft, to_shaft
from core.parts import Part, nominal, propagate_parts
from core.springs import loaded_frequency, stroke_under, wheel_load
from core.uncertainty import COVERAGE_FACTOR, Estimate, Measured

SNUG: Final = 0.0005  # [m] least preload, so that nothing rattles; common practice, no source
LARGEST_PRELOAD: Final = 0.10  # [-] of the stroke; beyond, change the coil; common practice
RATE_SD: Final = 0.02  # [-] of a coil's rate against its marking; no source

CoilState: TypeAlias = Literal["leave", "preload", "coil", "nearest"]


@dataclass(frozen=True)
class CoilChange:
    """A change of coil or preload.

    Attributes:
        state: ``"leave"`` it: sag and target can't be told apart; ``"preload"`` alone does it;
            ``"coil"``: change to this one; ``"nearest"``: none at hand reaches the target within
            the usual preload, this one comes nearest.
        rate: of the coil to use [N/m].
        preload: to set [m].
        needed_rate: that would reach the target with the preload as it is now [N/m].
        needed_preload: that would reach it with the coil to use [m]; below zero if it is too stiff.
        sag: to expect, where it was read [m].
        frequency: undamped, to expect there [Hz].
        notes: what a person should know.
    """

    state: CoilState
    rate: float
    preload: float
    needed_rate: Estimate
    needed_preload: Estimate
    sag: Estimate
    frequency: Estimate
    notes: tuple[Note, ...]


def rate_for_stroke(
    coil: Coil, path: WheelPath, stroke: Quantity, wanted: Quantity, preload: Quantity
) -> Quantity:
    """Return the rate of the coil on which the same load sinks to another stroke.

    k₂ = k₁ (s₁ + p₁)/(s₂ + p₂) · φ₂/φ₁

    Args:
        coil: the one that is in, with its rate k₁ and preload p₁.
        path: of its wheel.
        stroke: s₁, of the shaft as read [m], positive.
        wanted: s₂, of the shaft as wanted [m], positive.
        preload: p₂, of the new coil [m], at least 0.

    Returns:
        k₂ [N/m], shapes broadcast.

    Raises:
        InvalidInputError: a quantity isn't finite or is outside its range; ``coil_binds``.

    Source: equal load F(s)/φ(s) at both strokes.
    """
    force = _force_for_stroke(coil, path, stroke, wanted)
    return force / (wanted + not_negative("preload", preload))


def preload_for_stroke(
    coil: Coil, path: WheelPath, stroke: Quantity, wanted: Quantity, rate: Quantity
) -> Quantity:
    """Return the preload with which a coil brings the same load to another stroke.

    p₂ = k₁ (s₁ + p₁)/k₂ · φ₂/φ₁ − s₂

    Args:
        coil: the one that is in, with its rate k₁ and preload p₁.
        path: of its wheel.
        stroke: s₁, of the shaft as read [m], positive.
        wanted: s₂, of the shaft as wanted [m], positive.
        rate: k₂, of the coil to use [N/m], positive.

    Returns:
        p₂ [m], shapes broadcast; below zero where that coil is too stiff for the target.

    Raises:
        InvalidInputError: a quantity isn't finite or is outside its range; ``coil_binds``.

    Source: equal load F(s)/φ(s) at both strokes.
    """
    force = _force_for_stroke(coil, path, stroke, wanted)
    return force / positive("rate", rate) - wanted


def _force_for_stroke(coil: Coil, path: WheelPath, stroke: Quantity, wanted: Quantity) -> Quantity:
    """Return the spring force that carries at another stroke what a coil carries now."""
    leverage = path.leverage(positive("stroke", stroke))
    turned = path.leverage(positive("wanted", wanted)) / leverage
    return coil.force(stroke) * turned


def change_coil(
    path: WheelPath | Part[WheelPath],
    coil: Coil,
    reading: Measured,
    wanted: float,
    rates: Sequence[float] = (),
    *,
    place: Place = "shaft",
    rate_sd: float = RATE_SD,
) -> CoilChange:
    """Return the coil and preload for a wanted sag.

    The coil that is in stays in if its preload can do it. Else, of the rates at hand, the one that
    needs the least preload; and if none reaches the target, the one that comes nearest.

    Args:
        path: of the wheel.
        coil: the one that is in, with its preload, of single numbers.
        reading: sag with it [m].
        wanted: sag that is wanted, read at the same place [m].
        rates: of the other coils at hand [N/m]; empty for preload alone.
        place: where sag is read.
        rate_sd: standard deviation of a coil's rate, as a share of what is marked on it [-].

    Raises:
        InvalidInputError: code ``beyond_travel``, ``coil_binds``; a quantity isn't finite or isn't
            positive.
        NoSolutionError: code ``topped_out`` or ``bottomed`` where no coil at hand carries the load
            within its stroke; ``unstable``, ``too_uncertain``.
    """

    def own_preload(path: WheelPath, read: Quantity) -> Quantity:
        stroke, goal = (to_shaft(path, sag, place) for sag in (read, wanted))
        return preload_for_stroke(coil, path, stroke, goal, coil.spring_rate)

    own = propagate_parts(own_preload, path, reading)
    if own.low <= coil.preload <= own.high:
        choice = _Choice("leave", coil, (Note("within_doubt"),))
    else:
        choice = _choose(nominal(path), coil, reading, (wanted, place), rates)
    new = choice.coil
    same = new.spring_rate == coil.spring_rate

    def expect(
        path: WheelPath, read: Quantity, old_share: Quantity, other_share: Quantity
    ) -> tuple[Quantity, ...]:
        stroke, goal = (to_shaft(path, sag, place) for sag in (read, wanted))
        old = replace(coil, spring_rate=coil.spring_rate * old_share)
        fitted = replace(new, spring_rate=new.spring_rate * (old_share if same else other_share))
        rest = stroke_under(fitted, path, wheel_load(old, path, stroke))
        return (
            rate_for_stroke(old, path, stroke, goal, coil.preload),
            preload_for_stroke(old, path, stroke, goal, fitted.spring_rate),
            from_shaft(path, rest, place),
            loaded_frequency(fitted, path, rest),
        )

    marked = Measured(1.0, rate_sd)
    needed_rate, needed_preload, sag, frequency = propagate_parts(
        expect, path, reading, marked, marked
    )
    return CoilChange(
        state=choice.state,
        rate=float(new.spring_rate),
        preload=float(new.preload),
        needed_rate=needed_rate,
        needed_preload=needed_preload,
        sag=sag,
        frequency=frequency,
        notes=choice.notes,
    )


@dataclass(frozen=True)
class _Choice:
    """Which coil to use, with its preload, and why."""

    state: CoilState
    coil: Coil
    notes: tuple[Note, ...] = ()


def _choose(
    path: WheelPath,
    coil: Coil,
    reading: Measured,
    target: tuple[float, Place],
    rates: Sequence[float],
) -> _Choice:
    """Return the coil at hand that comes to the target, with the preload for it."""
    wanted, place = target
    stroke, goal = (to_shaft(path, sag, place) for sag in (reading.value, wanted))
    load = wheel_load(coil, path, stroke)
    most = LARGEST_PRELOAD * float(path.full_stroke)

    def fit(rate: float) -> tuple[float, float, Coil]:
        """Return by how much a coil misses the target, the preload that it needs, and it."""
        needed = float(preload_for_stroke(coil, path, stroke, goal, rate))
        fitted = Coil(rate, min(max(needed, SNUG), most))
        try:
            sag = from_shaft(path, stroke_under(fitted, path, load), place)
        except NoSolutionError:
            return inf, needed, fitted
        miss = abs(float(sag) - wanted)
        return (miss if miss > _ROUNDING else 0.0), needed, fitted

    own = fit(float(coil.spring_rate))
    best = min([own, *map(fit, rates)], key=lambda candidate: candidate[:2])
    if own[0] == 0.0:
        best = own
    if best[0] > COVERAGE_FACTOR * reading.sd + _ROUNDING:
        data = {"rate_npm": float(best[2].spring_rate)}
        return _Choice("nearest", best[2], (Note("no_coil_fits", data),))
    return _Choice("preload" if best is own else "coil", best[2])


_ROUNDING: Final = 1e-7  # [m] of a solved sag
