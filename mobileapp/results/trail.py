"""The day's bumps at the day's speeds: what each end makes of them, in words and numbers."""

from collections.abc import Mapping
from dataclasses import dataclass
from itertools import chain
from math import sin
from typing import Final

import numpy as np

from core.errors import SetupError
from core.oscillator import transmissibility
from core.trail import (
    FORK_CROSSOVER,
    SHOCK_CROSSOVER,
    Bumps,
    Passage,
    following_limit,
    regime_at,
    ride,
)
from core.trail import End as EndTerms
from core.uncertainty import Estimate, Measured
from core.uneven import mean_damping
from core.waves import filtering_speed, forcing_frequency, resonant_speed
from mobileapp.format import number
from mobileapp.records import ENDS, End, Setup
from mobileapp.results.damping import end_damping
from mobileapp.results.estimate import reading as shown
from mobileapp.results.frequency import end_frequency
from mobileapp.results.sag import HEAD_ANGLE
from mobileapp.results.told import told
from mobileapp.texts import Texts
from mobileapp.trail_plan import Bump, TrailPlan
from mobileapp.units import UNITS

SPACING_SD: Final = 0.1  # [-] of it: paced out; common practice, no source
HEIGHT_SD: Final = 0.15  # [-] of it: judged by eye beside a tape; likewise
REAR_LEVERAGE: Final = Measured(2.6, 0.3)  # [-] where the bike's isn't known; likewise
CHART_POINTS: Final = 40
CHART_REACH: Final = 1.4  # [-] of the fastest speed
CHART_MARKS: Final = (0.0, 0.5, 1.0, 1.5, 2.0)  # [-]
CHART_TOP: Final = 2.2  # [-] transmissibility; what lies above is off the paper


@dataclass(frozen=True)
class Row:
    """One quantity at the slowest and the fastest speed.

    Attributes:
        name: what it is.
        slow: its reading at the slowest speed.
        fast: likewise at the fastest.
    """

    name: str
    slow: str
    fast: str


@dataclass(frozen=True)
class Numbers:
    """What one end makes of a row of bumps, with its ±.

    Attributes:
        rows: the quantities.
        notes: further sentences, what was assumed among them.
    """

    rows: tuple[Row, ...]
    notes: tuple[str, ...]


@dataclass(frozen=True)
class Curve:
    """Transmissibility of one end against speed.

    Attributes:
        end: front or rear.
        points: speed in the person's unit, transmissibility [-].
    """

    end: End
    points: tuple[tuple[float, float], ...]


@dataclass(frozen=True)
class BumpView:
    """What the trail screen shows of one row of bumps.

    Attributes:
        sentences: what each end makes of it, in plain words.
        curves: for the chart.
        fastest_shown: right end of the chart, in the person's unit.
        band: slowest and fastest speed of the day, likewise.
        top: upper end of the chart [-].
        marks: along its upright axis [-].
        missing: why there is nothing else.
    """

    sentences: Mapping[End, str]
    curves: tuple[Curve, ...] = ()
    fastest_shown: float = 0.0
    band: tuple[float, float] = (0.0, 0.0)
    top: float = CHART_TOP
    marks: tuple[float, ...] = CHART_MARKS
    missing: str = ""


@dataclass(frozen=True)
class _Day:
    """A row of bumps, the day's speeds, and how to tell of them."""

    row: Bumps
    plan: TrailPlan
    texts: Texts
    units: Mapping[str, str]

    @classmethod
    def of(cls, plan: TrailPlan, bump: Bump, texts: Texts, units: Mapping[str, str]) -> "_Day":
        """Return the day with the ± of what was paced out and judged."""
        spacing, height = bump.spacing.si, bump.height.si
        row = Bumps(Measured(spacing, SPACING_SD * spacing), Measured(height, HEIGHT_SD * height))
        return cls(row, plan, texts, units)

    def speed(self, value: float) -> str:
        """Return a speed [m/s] in words."""
        unit = UNITS[self.units["speed"]]
        return f"{number(value / unit.size, unit.decimals, comma=self.texts.comma)} {unit.symbol}"


def bump_view(setup: Setup, bump: Bump, texts: Texts, units: Mapping[str, str]) -> BumpView:
    """Return what to show for a row of bumps at the day's speeds."""
    plan = setup.trail or TrailPlan()
    if min(bump.spacing.si, bump.height.si, plan.slowest.si) <= 0:
        return BumpView({}, missing=texts("trail.missing.zero"))
    if plan.slowest.si >= plan.fastest.si:
        return BumpView({}, missing=texts("trail.missing.order"))
    known = {end: terms for end in ENDS if (terms := _terms(setup, end))}
    if not known:
        return BumpView({}, missing=texts("trail.missing.frequency"))
    day = _Day.of(plan, bump, texts, units)
    speed = UNITS[units["speed"]].size
    reach = CHART_REACH * plan.fastest.si
    return BumpView(
        {end: _sentence(end, terms, day) for end, terms in known.items()},
        tuple(_curve(end, terms, day.row, reach, speed) for end, terms in known.items()),
        reach / speed,
        (plan.slowest.si / speed, plan.fastest.si / speed),
    )


def bump_numbers(
    setup: Setup, end: End, bump: Bump, texts: Texts, units: Mapping[str, str]
) -> Numbers:
    """Return the numbers of one end for a row of bumps at the day's speeds.

    They take longer than the sentence, so they are worked out when someone asks for them.
    """
    plan = setup.trail or TrailPlan()
    terms = _terms(setup, end)
    if terms is None:
        return Numbers((), (texts("trail.missing.frequency"),))
    day = _Day.of(plan, bump, texts, units)
    try:
        slow, fast = (
            ride(day.row, Measured(speed.si), terms) for speed in (plan.slowest, plan.fastest)
        )
    except SetupError as error:
        return Numbers((), (told(error, texts, units),))
    notes = [told(note, texts, units) for note in chain(slow.notes, fast.notes)]
    if not end_damping(setup, end).measured:
        notes.append(texts("trail.assumed.rebound"))
    notes.append(texts("trail.assumed.compression"))
    return Numbers(_rows(slow, fast, day), tuple(dict.fromkeys(notes)))


def _terms(setup: Setup, end: End) -> EndTerms | None:
    """Return an end in the core's terms, or None if its frequency isn't known."""
    frequency = end_frequency(setup, end)
    if frequency is None:
        return None
    damping = end_damping(setup, end)
    leverage = Measured(sin(HEAD_ANGLE.value), 0.01) if end == "front" else REAR_LEVERAGE
    return EndTerms(
        frequency.measured,
        damping.compression,
        damping.rebound,
        leverage,
        crossover=FORK_CROSSOVER if end == "front" else SHOCK_CROSSOVER,
    )


def _sentence(end: End, terms: EndTerms, day: _Day) -> str:
    texts = day.texts
    damping = float(mean_damping(terms.compression.value, terms.rebound.value))
    spacing, frequency = day.row.spacing.value, terms.frequency.value
    slow, fast = (
        float(forcing_frequency(speed.si, spacing)) / frequency
        for speed in (day.plan.slowest, day.plan.fastest)
    )
    sentence = texts(
        f"trail.says.{regime_at(slow)}_{regime_at(fast)}",
        end=texts(f"sag.{end}"),
        resonant=day.speed(float(resonant_speed(spacing, frequency, damping))),
        filtering=day.speed(float(filtering_speed(spacing, frequency))),
        percent=number(100 * float(transmissibility(fast, damping)), 0),
        fast=day.speed(day.plan.fastest.si),
    )
    limit = following_limit(day.row, terms)
    if limit is None or limit > day.plan.fastest.si:
        return sentence
    return f"{sentence} {texts('trail.lifts', speed=day.speed(limit))}"


def _rows(slow: Passage, fast: Passage, day: _Day) -> tuple[Row, ...]:
    texts, length = day.texts, day.units["length"]

    def row(name: str, unit: str, *estimates: Estimate) -> Row:
        most = UNITS[unit].decimals
        readings = (
            shown(estimate, unit, comma=texts.comma, most_decimals=most) for estimate in estimates
        )
        cells = (f"{reading.value} {reading.range}".strip() for reading in readings)
        return Row(f"{texts(f'trail.row.{name}')}, {unit}", *cells)

    return (
        row("forcing", "Hz", slow.forcing, fast.forcing),
        row("through", "%", slow.transmissibility, fast.transmissibility),
        row("drop", length, slow.mean_drop, fast.mean_drop),
        row("recovered", "%", slow.recovered, fast.recovered),
        row("packed", "%", slow.packed, fast.packed),
        row("stroke", length, slow.stroke, fast.stroke),
        row("wheel_speed", "m/s", slow.wheel_speed, fast.wheel_speed),
        row("wheel_acceleration", "g", slow.wheel_acceleration, fast.wheel_acceleration),
        row("shaft_speed", "m/s", slow.shaft_speed, fast.shaft_speed),
        Row(
            texts("trail.row.circuit"),
            texts(f"trail.circuit.{slow.circuit}"),
            texts(f"trail.circuit.{fast.circuit}"),
        ),
        row("contact", "%", slow.contact, fast.contact),
    )


def _curve(end: End, terms: EndTerms, row: Bumps, reach: float, unit: float) -> Curve:
    speeds = np.linspace(reach / CHART_POINTS, reach, CHART_POINTS)
    ratios = forcing_frequency(speeds, row.spacing.value) / terms.frequency.value
    damping = mean_damping(terms.compression.value, terms.rebound.value)
    passed_on = np.minimum(transmissibility(ratios, damping), CHART_TOP)
    points = zip((speeds / unit).tolist(), passed_on.tolist(), strict=True)
    return Curve(end, tuple(points))
