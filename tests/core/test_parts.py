"""Parts that are only known so far, and what to assume where nobody knows."""

import numpy as np
import pytest
from numpy.testing import assert_allclose

from core.air_spring import AirSpring
from core.errors import InvalidInputError
from core.geometry import Fork
from core.linkage import Linkage
from core.parts import Part, as_measured, nominal, propagate_parts
from core.sag import frequency_from_sag
from core.springs import loaded_frequency
from core.uncertainty import Estimate, Measured, propagate
from core.units import BAR, DEGREE, MM
from core.unknown import (
    AIR_PRESSURE,
    AREA_RATIO,
    EXPONENT,
    HEAD_ANGLE,
    JOINED_SHARE,
    LENGTH_SHARE,
    MEAN_LEVERAGE,
    NEGATIVE_SHARE,
    PROGRESSION,
    STEEPNESS,
    UNKNOWN_SPRING,
    common_air_spring,
    common_chambers,
    common_fork,
    common_linkage,
)

STROKE = 150 * MM


def test_a_part_is_built_from_its_readings():
    part = Part.of(Fork, Measured(0.15, 0.001), 65 * DEGREE)
    assert part.readings == (Measured(0.15, 0.001), Measured(65 * DEGREE, 0.0))
    assert part.nominal == nominal(part) == nominal(Fork(0.15, 65 * DEGREE))
    assert as_measured(3.0) == Measured(3.0, 0.0)


def test_parts_readings_and_exact_things_go_together():
    fork = Part.of(Fork, 0.15, Measured(65 * DEGREE, 1.5 * DEGREE))
    reading = Measured(30 * MM, 1 * MM)
    found = propagate_parts(
        lambda path, read, scale: scale * path.wheel_travel(read), fork, reading, 2.0
    )
    by_hand = propagate(
        lambda angle, read: 2.0 * read * np.sin(angle), Measured(65 * DEGREE, 1.5 * DEGREE), reading
    )
    assert found == by_hand
    exact = propagate_parts(lambda path: path.wheel_travel(0.03), Fork(0.15, 65 * DEGREE))
    assert exact.low == exact.value == exact.high


def test_several_results_share_their_samples():
    part = Part.of(lambda x: x, Measured(2.0, 0.1))
    one, other = propagate_parts(lambda x: (x, 3.0 * x), part)
    assert_allclose(other.low, 3 * one.low)
    assert isinstance(one, Estimate)


def test_two_parts_are_independent():
    first, second = (Part.of(lambda x: x, Measured(0.0, 1.0)) for _ in range(2))
    difference = propagate_parts(lambda a, b: a - b, first, second)
    # 4000 samples leave up to 2 % (one standard deviation) in a half-width.
    assert_allclose(difference.half_width, 1.96 * np.sqrt(2), rtol=0.05)


def test_common_chambers_stay_within_what_is_common():
    part = common_chambers(STROKE)
    drawn = part.build(*np.random.default_rng(1).standard_normal((5, 4000)) * 3.0)
    for value, (low, high), unit in (
        (drawn.length, LENGTH_SHARE, STROKE),
        (drawn.negative_length, NEGATIVE_SHARE, STROKE),
        (drawn.area_ratio, AREA_RATIO, 1.0),
        (drawn.exponent, EXPONENT, 1.0),
        (drawn.joined_at, JOINED_SHARE, STROKE),
    ):
        assert low * unit < value.min() < value.max() < high * unit
    middle = part.nominal
    assert_allclose(middle.length, np.sqrt(1.3 * 2.0) * STROKE)
    assert_allclose(middle.negative_length, np.sqrt(0.2) * STROKE)
    assert_allclose([middle.area_ratio, middle.exponent], [0.925, 1.3])
    # A spring that neither pushes much when extended nor sinks in under no load.
    assert_allclose(middle.negative_filling, 1.0, atol=0.02)


def test_common_chambers_are_equally_likely_anywhere():
    part = common_chambers(STROKE)
    drawn = part.build(*np.random.default_rng(2).standard_normal((5, 40_000)))
    share = (drawn.exponent - EXPONENT[0]) / (EXPONENT[1] - EXPONENT[0])
    assert_allclose(
        np.quantile(share, [0.1, 0.25, 0.5, 0.75, 0.9]), [0.1, 0.25, 0.5, 0.75, 0.9], atol=0.02
    )
    logarithm = np.log(drawn.negative_length / STROKE / NEGATIVE_SHARE[0]) / np.log(5.0)
    assert_allclose(np.quantile(logarithm, [0.1, 0.5, 0.9]), [0.1, 0.5, 0.9], atol=0.02)


@pytest.mark.parametrize(
    ("share", "least"), [(0.15, 0.85), (0.2, 0.92), (0.25, 0.92), (0.35, 0.92)]
)
@pytest.mark.parametrize("pressure", [5 * BAR, 12 * BAR])
def test_unknown_spring_covers_common_air_springs(share, pressure, least):
    """The interval of the unknown spring holds nearly all common air springs, and the coil."""
    fork = common_fork(STROKE).nominal
    stroke = share * STROKE
    chambers = common_chambers(STROKE)
    drawn = chambers.build(*np.random.default_rng(3).standard_normal((5, 20_000)))
    frequencies = loaded_frequency(AirSpring(drawn, pressure), fork, stroke)
    unknown = propagate_parts(lambda spring: loaded_frequency(spring, fork, stroke), UNKNOWN_SPRING)
    held = (unknown.low < frequencies) & (frequencies < unknown.high)
    assert held.mean() > least
    coil = unknown.value / np.sqrt(UNKNOWN_SPRING.readings[0].value)
    assert unknown.low < coil < unknown.high


def test_common_air_springs():
    known = common_air_spring(STROKE, 5 * BAR, 0.8 * BAR)
    assert known.nominal == AirSpring(common_chambers(STROKE).nominal, 5 * BAR, ambient=0.8 * BAR)
    assert known.readings[1:] == common_chambers(STROKE).readings
    # Without the pressure the frequency is as good as with it.
    unsure, sure = (
        frequency_from_sag(common_fork(STROKE), Measured(30 * MM), spring=spring)
        for spring in (common_air_spring(STROKE), common_air_spring(STROKE, 8 * BAR))
    )
    assert_allclose(unsure.value, sure.value)
    assert_allclose(unsure.half_width, sure.half_width, rtol=0.03)
    # Nothing but air is hardly more than nothing: its chambers decide.
    anything = frequency_from_sag(common_fork(STROKE), Measured(30 * MM))
    assert_allclose([unsure.low, unsure.high], [anything.low, anything.high], rtol=0.04)


def test_defaults_are_as_documented():
    # Common practice, no source.
    assert_allclose([HEAD_ANGLE.value / DEGREE, HEAD_ANGLE.sd / DEGREE], [65.0, 1.5])
    assert Measured(0.15, 0.07) == PROGRESSION
    assert Measured(2.6, 0.2) == MEAN_LEVERAGE
    assert Measured(8 * BAR, 2 * BAR) == AIR_PRESSURE
    assert Measured(1.07, 0.16) == STEEPNESS
    assert common_linkage(0.15).readings[1] == MEAN_LEVERAGE
    assert common_fork(0.15).readings[1] == HEAD_ANGLE
    assert common_air_spring(0.15).readings[0] == AIR_PRESSURE
    assert UNKNOWN_SPRING.readings == (STEEPNESS,)


def test_common_linkages():
    known = common_linkage(150 * MM, 55 * MM).nominal
    assert known == Linkage.from_stroke(150 * MM, 55 * MM, PROGRESSION.value)
    guessed = common_linkage(150 * MM).nominal
    assert_allclose(150 * MM / guessed.full_stroke, 2.6)
    assert_allclose(1 - guessed.end / guessed.start, PROGRESSION.value)
    assert common_linkage(150 * MM, 55 * MM, 0.3).nominal.end < known.end


def test_common_fork():
    assert common_fork(0.16).nominal == Fork(0.16, 65 * DEGREE)
    steep = common_fork(Measured(0.1, 0.001), 69 * DEGREE)
    assert steep.nominal == Fork(0.1, 69 * DEGREE)
    assert steep.readings[0].sd == 0.001


def test_a_stroke_of_nothing_is_refused():
    with pytest.raises(InvalidInputError) as caught:
        common_chambers(0.0)
    assert caught.value.code == "not_positive"
