"""No silent NaN, infinity or clamp: springs, paths and changes made of any numbers at all.

`test_whole_input_space` does the same for functions of plain numbers. A setup has so many of them
that nonsense in each would never get past the first refusal: here one in twenty is nonsense, the
others are plausible, and the draw is a seeded random one.
"""

import os
from dataclasses import fields, is_dataclass
from random import Random

import numpy as np
import pytest

from core.air_pressure import judge_drop
from core.air_spring import AirSpring, Chambers
from core.chamber_length import chambers_from_readings
from core.coil import Coil, unmarked_coil
from core.coil_change import change_coil, preload_for_stroke, rate_for_stroke
from core.errors import SetupError
from core.geometry import Fork, from_shaft, to_shaft
from core.linkage import Linkage, stroke_disagreement
from core.pressure_change import change_pressure, pressure_for_stroke
from core.sag import frequency_from_sag, mean_sag, sag_notes, share_of_travel
from core.springs import (
    frequency_with_mass,
    loaded_frequency,
    static_wheel_rate,
    stroke_under,
    vibration_wheel_rate,
    wheel_load,
)
from core.two_sided import two_sided_sag
from core.uncertainty import Measured
from core.unknown import PowerSpring, common_chambers, common_fork, common_linkage
from tests.core.test_whole_input_space import SPECIAL

SETUPS = 5000 if os.environ.get("HYPOTHESIS_PROFILE") == "deep" else 300
NONSENSE = 0.05  # [-] share of the numbers


class Draw:
    """Numbers and parts for one setup."""

    def __init__(self, seed):
        self.random = Random(seed)  # noqa: S311 - nothing secret, and repeatable

    def number(self, low, high):
        if self.random.random() > NONSENSE:
            return self.random.uniform(low, high)
        far = 10.0 ** self.random.uniform(-320, 308)
        return self.random.choice((*SPECIAL, low, high, far, -far))

    def depth(self):
        return self.number(1e-3, 0.05)

    def gauge(self):
        return self.number(2e5, 2e6)

    def ambient(self):
        return self.number(6e4, 1.1e5)

    def rate(self):
        return self.number(3e4, 2e5)

    def place(self):
        return self.random.choice(("shaft", "wheel"))

    def reading(self, value):
        return Measured(value, self.number(0.0, 0.05) * min(abs(value), 1.0))

    def path(self):
        kind, travel = self.random.randrange(3), self.number(0.08, 0.2)
        if kind == 0:
            return Fork(travel, self.number(0.96, 1.39))
        if kind == 1:
            return Linkage(travel, self.number(0.5, 6.0), self.number(0.5, 6.0))
        return Linkage.from_stroke(travel, self.number(0.04, 0.08), self.number(-0.5, 0.6))

    def part(self):
        return self.random.choice(
            (common_fork(0.15), common_linkage(0.15), common_linkage(0.15, 0.055))
        )

    def chambers(self):
        return Chambers(
            length=self.number(0.06, 0.4),
            negative_length=self.number(0.01, 0.2),
            area_ratio=self.number(0.5, 1.0),
            exponent=self.number(1.0, 1.4),
            joined_at=self.number(0.0, 0.01),
        )

    def coil(self):
        return Coil(self.rate(), self.number(0.0, 0.01))

    def spring(self):
        kind = self.random.randrange(3)
        if kind == 0:
            return self.coil()
        if kind == 1:
            return PowerSpring(self.number(0.5, 2.0))
        return AirSpring(self.chambers(), self.gauge(), self.number(5e-4, 1.0), self.ambient())


def on_path(draw):
    path, depth = draw.path(), draw.depth()
    places = [f(path, depth, draw.place()) for f in (to_shaft, from_shaft)]
    return *places, path.leverage(depth), path.leverage_slope, path.full_stroke


def on_spring(draw):
    spring, depth = draw.spring(), draw.depth()
    return spring.force(depth), spring.rate(depth), spring.vibration_rate(depth)


def changed_pressure(draw):
    return change_pressure(
        draw.part(),
        draw.reading(draw.gauge()),
        draw.reading(draw.depth()),
        draw.depth(),
        draw.random.choice((None, draw.gauge())),
        place=draw.place(),
        chambers=draw.random.choice((None, draw.chambers())),
        ambient=draw.ambient(),
    )


def changed_coil(draw):
    return change_coil(
        draw.part(),
        draw.coil(),
        draw.reading(draw.depth()),
        draw.depth(),
        [draw.rate() for _ in range(draw.random.randrange(4))],
        place=draw.place(),
        rate_sd=draw.number(0.0, 0.05),
    )


CASES = {
    "path": on_path,
    "spring": on_spring,
    "load": lambda d: wheel_load(d.spring(), d.path(), d.depth()),
    "static rate": lambda d: static_wheel_rate(d.spring(), d.path(), d.depth()),
    "vibration rate": lambda d: vibration_wheel_rate(d.spring(), d.path(), d.depth()),
    "frequency": lambda d: loaded_frequency(d.spring(), d.path(), d.depth()),
    "frequency with mass": lambda d: frequency_with_mass(
        d.spring(), d.path(), d.depth(), d.number(5.0, 100.0)
    ),
    "stroke under": lambda d: stroke_under(d.spring(), d.path(), d.number(1.0, 3e3)),
    "pressure": lambda d: pressure_for_stroke(
        d.chambers(), d.path(), d.gauge(), d.depth(), d.depth(), ambient=d.ambient()
    ),
    "rate": lambda d: rate_for_stroke(d.coil(), d.path(), d.depth(), d.depth(), d.depth()),
    "preload": lambda d: preload_for_stroke(d.coil(), d.path(), d.depth(), d.depth(), d.rate()),
    "chambers": lambda d: chambers_from_readings(
        d.chambers(), d.path(), (d.gauge(), d.gauge()), (d.depth(), d.depth()), d.ambient()
    ),
    "share": lambda d: share_of_travel(d.reading(d.depth()), d.reading(d.number(0.04, 0.2))),
    "mean sag": lambda d: mean_sag([d.depth(), d.depth()], d.depth()),
    "notes": lambda d: sag_notes(d.number(0.0, 1.0)),
    "sag": lambda d: frequency_from_sag(d.part(), d.reading(d.depth()), d.place()),
    "sag, known": lambda d: frequency_from_sag(
        d.path(), d.reading(d.depth()), d.place(), d.spring()
    ),
    "two-sided": lambda d: two_sided_sag(
        d.part(), d.reading(d.depth()), d.reading(d.depth()), d.place()
    ),
    "change of pressure": changed_pressure,
    "change of coil": changed_coil,
    "unmarked coil": lambda d: unmarked_coil(
        d.number(5e-3, 0.015), d.number(0.035, 0.06), d.number(3.0, 12.0)
    ),
    "common chambers": lambda d: common_chambers(d.depth()).nominal,
    "common linkage": lambda d: common_linkage(d.number(0.08, 0.2), d.depth()).nominal,
    "disagreement": lambda d: stroke_disagreement(Linkage(0.15, 3.0, 2.5), d.depth()),
    "drop": lambda d: judge_drop(
        d.reading(d.gauge()), d.reading(d.gauge()), d.reading(d.number(1e-5, 3e-4))
    ),
}


def numbers(result):
    """Every number in a result, however deep."""
    if isinstance(result, tuple):
        for item in result:
            yield from numbers(item)
    elif is_dataclass(result):
        for field in fields(result):
            yield from numbers(getattr(result, field.name))
    elif isinstance(result, float | np.ndarray):
        yield result


def answered(call):
    """Tell whether there is an answer; fail on one that isn't finite, and on any other error."""
    try:
        with np.errstate(all="raise", under="ignore"):
            result = call()
    except SetupError:
        return False
    assert all(np.isfinite(number).all() for number in numbers(result))
    return True


@pytest.mark.parametrize("case", CASES)
def test_any_setup_gets_finite_answers_or_a_named_error(case):
    answers = sum(answered(lambda i=i: CASES[case](Draw(f"{case} {i}"))) for i in range(SETUPS))
    assert 0.03 * SETUPS < answers < SETUPS  # the search goes past the refusals, and meets some


def test_numbers_are_found_however_deep():
    change = change_coil(common_linkage(0.15, 0.055), Coil(7e4), Measured(0.016, 3e-4), 0.0165)
    assert len(list(numbers((change, (1.0, np.ones(2)))))) > 15
    with pytest.raises(AssertionError):
        answered(lambda: (1.0, (np.array([1.0, np.nan]),)))
    assert answered(lambda: 1.0)
    assert not answered(lambda: Coil(-1.0))
