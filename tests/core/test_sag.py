"""From readings to share, friction and frequency."""

import numpy as np
import pytest
from hypothesis import assume, given
from hypothesis import strategies as st
from numpy.testing import assert_allclose

from core.coil import Coil
from core.errors import InvalidInputError, NoSolutionError
from core.geometry import Fork
from core.linkage import Linkage
from core.oscillator import frequency_from_deflection
from core.parts import Part
from core.sag import (
    READING_SD,
    frequency_from_sag,
    mean_sag,
    sag_depth,
    sag_notes,
    sag_share,
    share_of_travel,
)
from core.springs import stroke_under, wheel_load
from core.two_sided import HIGH_FRICTION, one_sided_sd, two_sided_sag
from core.uncertainty import Measured, propagate
from core.units import DEGREE, MM
from core.unknown import common_fork, common_linkage
from tests.core.strategies import ends

FORK = Fork(150 * MM, 65 * DEGREE)
REAR = Linkage.from_stroke(150 * MM, 55 * MM, 0.15)
MILLIMETRE = 1 * MM


@given(share=st.floats(0.01, 0.99), travel=st.floats(0.04, 0.2))
def test_share_and_depth_are_inverse(share, travel):
    assert_allclose(sag_share(sag_depth(share, travel), travel), share)


def test_share_carries_both_deviations():
    share = share_of_travel(Measured(30 * MM, MILLIMETRE), Measured(150 * MM, 2 * MM))
    assert_allclose(share.value, 0.2)
    expected = 1.96 * 0.2 * np.hypot(1 / 30, 2 / 150)  # relative deviations in quadrature
    assert_allclose(share.half_width, expected, rtol=0.01)


@pytest.mark.parametrize(("share", "codes"), [(0.0799, ["sag_unusual"]), (0.08, []), (0.25, [])])
def test_unusual_sag_is_told(share, codes):
    assert [note.code for note in sag_notes(share)] == codes
    assert [note.code for note in sag_notes(0.53 - share)] == codes


def test_repeated_readings_are_averaged():
    mean = mean_sag([30 * MM, 33 * MM, 30 * MM])
    assert_allclose(mean.value, 31 * MM)
    assert_allclose(mean.sd, np.sqrt(3) * MM / np.sqrt(3))  # their scatter, by √n
    assert_allclose(mean_sag([30 * MM]).sd, READING_SD)
    assert_allclose(mean_sag([30 * MM, 30 * MM]).sd, READING_SD / np.sqrt(2))


@pytest.mark.parametrize(
    ("call", "code"),
    [
        (lambda: sag_share(0.151, 0.15), "sag_range"),
        (lambda: sag_share(0.15, 0.15), "sag_range"),
        (lambda: sag_share(0.0, 0.15), "not_positive"),
        (lambda: sag_share(np.nan, 0.15), "not_finite"),
        (lambda: sag_share(0.03, 0.0), "not_positive"),
        (lambda: sag_depth(1.0, 0.15), "sag_range"),
        (lambda: sag_depth(0.0, 0.15), "not_positive"),
        (lambda: sag_notes(np.nan), "not_finite"),
        (lambda: mean_sag([]), "no_readings"),
        (lambda: mean_sag([0.03, -0.03]), "not_positive"),
        (lambda: one_sided_sd(0.033, 0.027), "sag_swapped"),
        (lambda: frequency_from_sag(FORK, Measured(0.16, 0.001)), "beyond_travel"),
        (lambda: frequency_from_sag(FORK, Measured(0.0, 0.001)), "not_positive"),
        (lambda: frequency_from_sag(REAR, Measured(0.16), "wheel"), "beyond_travel"),
        (lambda: two_sided_sag(FORK, Measured(0.033), Measured(0.027)), "sag_swapped"),
        (lambda: two_sided_sag(FORK, Measured(0.0), Measured(0.027)), "not_positive"),
    ],
)
def test_what_cannot_be_read_is_refused(call, code):
    with pytest.raises(InvalidInputError) as caught:
        call()
    assert caught.value.code == code


def test_sag_that_could_be_none_is_too_uncertain():
    with pytest.raises(NoSolutionError) as caught:
        frequency_from_sag(FORK, Measured(1 * MM, MILLIMETRE))
    assert caught.value.code == "too_uncertain"


def test_first_screen_of_a_fork():
    # Nothing known but travel and reading: the static deflection, and what isn't known in the ±.
    swing = frequency_from_sag(common_fork(150 * MM), Measured(30 * MM, MILLIMETRE))
    deflection = frequency_from_deflection(30 * MM * np.sin(65 * DEGREE))
    assert_allclose(swing.value / deflection, np.sqrt(1.07))
    relative = np.hypot(0.16 / 1.07 / 2, 1 / 30 / 2)  # of f ~ √(m/x), head angle left out
    assert_allclose(swing.half_width, 1.96 * relative * swing.value, rtol=0.05)


def test_first_screen_of_a_rear_wheel():
    # Read at the shaft or at the wheel: the same bike, nearly the same answer.
    rear = common_linkage(150 * MM, 55 * MM)
    at_wheel = REAR.wheel_travel(16 * MM)
    by_shaft = frequency_from_sag(rear, Measured(16 * MM, 0.3 * MM))
    by_wheel = frequency_from_sag(rear, Measured(at_wheel, 0.8 * MM), "wheel")
    assert_allclose(by_shaft.value, by_wheel.value, rtol=1e-12)
    # Without the shock's stroke the reading at the wheel still does.
    unknown = frequency_from_sag(common_linkage(150 * MM), Measured(at_wheel, 0.8 * MM), "wheel")
    assert_allclose(unknown.value, by_wheel.value, rtol=0.01)
    assert_allclose(unknown.half_width, by_wheel.half_width, rtol=0.1)
    # At the shaft it does not: an unknown leverage widens the interval.
    guessed = frequency_from_sag(common_linkage(150 * MM), Measured(16 * MM, 0.3 * MM))
    assert guessed.half_width > 1.02 * by_shaft.half_width


def test_what_is_known_narrows_the_interval():
    reading = Measured(16 * MM, 0.3 * MM)
    unknown = frequency_from_sag(common_linkage(150 * MM, 55 * MM), reading)
    coil = frequency_from_sag(common_linkage(150 * MM, 55 * MM), reading, spring=Coil(8e4, 2 * MM))
    exact = frequency_from_sag(REAR, reading, spring=Part.of(Coil, 8e4, Measured(2 * MM)))
    assert exact.half_width < coil.half_width < 0.5 * unknown.half_width


@given(end=ends(), share=st.floats(0.1, 0.4), friction=st.floats(0.01, 0.2))
def test_two_sided_readings_give_back_load_and_friction(end, share, friction):
    path, spring = end
    load = wheel_load(spring, path, share * path.full_stroke)
    assume(load > 1.0)
    try:
        above, below = (stroke_under(spring, path, (1 + s * friction) * load) for s in (-1, 1))
    except NoSolutionError:  # friction alone holds it up
        assume(False)  # noqa: FBT003 - hypothesis' own signature
    assume(above > 1e-4)
    found = two_sided_sag(path, Measured(above), Measured(below), spring=spring)
    assert_allclose(found.sag.value, share * path.full_stroke, rtol=1e-8)
    assert_allclose(found.friction.value, friction, rtol=1e-7)


def test_two_sided_at_the_wheel_is_two_sided_at_the_shaft():
    at_wheel = [Measured(REAR.wheel_travel(s)) for s in (14 * MM, 17 * MM)]
    by_wheel = two_sided_sag(REAR, *at_wheel, "wheel", Coil(8e4))
    by_shaft = two_sided_sag(REAR, Measured(14 * MM), Measured(17 * MM), "shaft", Coil(8e4))
    assert_allclose(by_wheel.sag.value, REAR.wheel_travel(by_shaft.sag.value))
    assert_allclose(by_wheel.friction.value, by_shaft.friction.value)


def test_friction_of_an_unknown_spring_is_less_sure_than_its_sag():
    readings = Measured(27 * MM), Measured(33 * MM)
    found = two_sided_sag(common_fork(150 * MM), *readings)
    assert_allclose(found.sag.value, 30 * MM, rtol=2e-3)
    assert found.sag.half_width < 0.05 * MM
    # Friction follows the steepness: a tenth of 1.07 ± 0.31.
    assert_allclose(found.friction.value, 0.107, atol=1e-3)
    assert_allclose(found.friction.half_width, 0.031, atol=1e-3)
    assert not found.notes


def test_high_friction_is_told():
    close, far = (
        two_sided_sag(FORK, Measured(low * MM), Measured(high * MM), spring=Coil(8e4))
        for low, high in ((24.1, 36), (23.9, 36))
    )
    assert close.friction.value < HIGH_FRICTION < far.friction.value
    assert not close.notes
    assert [note.code for note in far.notes] == ["high_friction"]


def test_equal_readings_mean_no_friction():
    found = two_sided_sag(FORK, *(Measured(30 * MM, MILLIMETRE),) * 2, spring=Coil(8e4))
    assert_allclose(found.friction.value, 0.0, atol=1e-12)
    assert found.friction.low < 0.0 < found.friction.high


@given(low=st.floats(0.01, 0.03), band=st.floats(1e-4, 0.01))
def test_one_reading_of_two_sided_sag(low, band):
    # The standard deviation of a uniform distribution, by its own samples.
    spread = np.linspace(low, low + band, 100_001).std()
    assert_allclose(one_sided_sd(low, low + band), spread, rtol=1e-4)


def test_no_sag_at_all_is_a_limit_too():
    assert_allclose(one_sided_sd(0.0, 0.0), 0.0)
    assert_allclose(one_sided_sd(0.0, 12 * MM), np.sqrt(12) * MM)


def test_intervals_are_repeatable():
    reading = Measured(30 * MM, MILLIMETRE)
    first, second = (frequency_from_sag(common_fork(150 * MM), reading) for _ in range(2))
    assert first == second
    assert propagate(lambda x: x, reading).low < reading.value
