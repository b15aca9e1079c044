"""Paths of both wheels against numerical integration and differences."""

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st
from numpy.testing import assert_allclose
from scipy.integrate import quad

from core.errors import InvalidInputError
from core.geometry import Fork, force_at_wheel, from_shaft, rate_at_wheel, to_shaft
from core.linkage import Linkage, stroke_disagreement
from core.units import DEGREE, MM
from tests.core.strategies import forks, linkages, paths, progressions, shares, whole_way


@given(path=linkages, share=shares)
def test_stroke_is_the_integral_of_one_over_leverage(path, share):
    travel = share * path.travel
    slope = (path.end - path.start) / path.travel
    stroke, _ = quad(lambda x: 1 / (path.start + slope * x), 0, travel, epsabs=1e-14)
    assert_allclose(path.shaft_stroke(travel), stroke, rtol=1e-10)
    assert_allclose(path.leverage(stroke), path.start + slope * travel, rtol=1e-10)


@given(path=paths, share=whole_way)
def test_wheel_and_shaft_are_inverse(path, share):
    stroke = share * path.full_stroke
    assert_allclose(path.shaft_stroke(path.wheel_travel(stroke)), stroke, rtol=1e-9, atol=1e-15)
    for place in ("shaft", "wheel"):
        back = to_shaft(path, from_shaft(path, stroke, place), place)
        assert_allclose(back, stroke, rtol=1e-9, atol=1e-15)


@given(path=paths, share=shares)
def test_leverage_is_the_derivative_of_travel(path, share):
    stroke, step = share * path.full_stroke, 1e-6
    difference = path.wheel_travel(stroke + step) - path.wheel_travel(stroke - step)
    assert_allclose(path.leverage(stroke), difference / (2 * step), rtol=1e-7)
    ahead, behind = (path.leverage(stroke + sign * step) for sign in (1, -1))
    slope = (ahead - behind) / difference
    assert_allclose(path.leverage_slope, slope, rtol=1e-6, atol=1e-6)


@given(travel=st.floats(0.1, 0.2), stroke=st.floats(0.05, 0.07), progression=progressions)
def test_linkage_from_stroke_has_that_stroke_travel_and_progression(travel, stroke, progression):
    path = Linkage.from_stroke(travel, stroke, progression)
    assert_allclose(path.full_stroke, stroke, rtol=1e-12)
    assert_allclose(path.wheel_travel(stroke), travel, rtol=1e-12)
    assert_allclose(1 - path.end / path.start, progression, atol=1e-12)


@given(size=st.floats(0.5, 2.0), share=shares)
def test_twice_the_bike_has_twice_the_stroke(size, share):
    small, large = (Linkage(k * 0.15, 3.0, 2.5) for k in (1.0, size))
    travel = share * 0.15
    assert_allclose(large.shaft_stroke(size * travel), size * small.shaft_stroke(travel))


@given(share=whole_way)
def test_without_progression_leverage_is_constant(share):
    path = Linkage.from_stroke(0.15, 0.06, 0.0)
    assert_allclose(path.leverage(share * 0.06), 2.5, rtol=1e-15)
    assert_allclose(path.wheel_travel(share * 0.06), share * 0.15, rtol=1e-14)
    almost = Linkage.from_stroke(0.15, 0.06, 2e-8)  # on the other side of the series' limit
    assert_allclose(almost.wheel_travel(share * 0.06), share * 0.15, rtol=3e-8)


@pytest.mark.parametrize("progression", [1.01e-8, 0.99e-8, -1.01e-8, -0.99e-8])
def test_series_and_formula_meet(progression):
    path = Linkage.from_stroke(0.15, 0.06, progression)
    assert_allclose(path.start, 2.5 * (1 + progression / 2), rtol=1e-15)
    assert_allclose(path.full_stroke, 0.06, rtol=1e-15)


@given(path=forks)
def test_fork_is_shorter_by_the_sine(path):
    assert_allclose(path.wheel_travel(path.full_stroke), path.full_stroke * np.sin(path.head_angle))
    assert path.leverage_slope == 0.0


@given(path=paths, share=shares, force=st.floats(0.0, 3e3), rate=st.floats(1e3, 1e5))
def test_wheel_rate_is_the_derivative_of_wheel_force(path, share, force, rate):
    stroke, step = share * path.full_stroke, 1e-7

    def load(stroke_there):
        return force_at_wheel(force + rate * (stroke_there - stroke), path.leverage(stroke_there))

    difference = load(stroke + step) - load(stroke - step)
    travel = path.wheel_travel(stroke + step) - path.wheel_travel(stroke - step)
    found = rate_at_wheel(rate, force, path.leverage(stroke), path.leverage_slope)
    assert_allclose(found, difference / travel, rtol=1e-5, atol=1.0)


@given(path=paths, share=st.floats(0.01, 0.99))
def test_virtual_work(path, share):
    # What the shaft takes up is what the wheel gives, over the whole way.
    full = share * path.full_stroke

    def given_at_wheel(stroke):
        return force_at_wheel(1e4 * stroke, path.leverage(stroke)) * path.leverage(stroke)

    work, _ = quad(given_at_wheel, 0, full)
    assert_allclose(work, 1e4 * full**2 / 2, rtol=1e-9)


def test_stroke_that_does_not_fit_is_told():
    path = Linkage.from_stroke(150 * MM, 55 * MM, 0.15)
    assert stroke_disagreement(path, 55 * MM) is None
    assert stroke_disagreement(path, 55.5 * MM) is None  # within rounding
    note = stroke_disagreement(path, 57.5 * MM)
    assert note.code == "stroke_disagrees"
    assert_allclose([note.data["follows_m"], note.data["printed_m"]], [0.055, 0.0575])
    # The arithmetic mean of the leverages misses the stroke; from_stroke doesn't.
    mean = 150 / 55
    naive = Linkage(150 * MM, mean * (1 + 0.2), mean * (1 - 0.2))
    assert stroke_disagreement(naive, 55 * MM).code == "stroke_disagrees"


def test_edges_of_what_a_bike_has_are_allowed():
    assert Fork(0.15, 55 * DEGREE).head_angle < Fork(0.15, 80 * DEGREE).head_angle
    assert Linkage(0.15, 0.5, 6.0).leverage_slope > 0 > Linkage(0.15, 6.0, 0.5).leverage_slope
    for progression in (-0.5, 0.6):
        assert Linkage.from_stroke(0.15, 0.06, progression).full_stroke == pytest.approx(0.06)


@pytest.mark.parametrize(
    ("make", "field", "code"),
    [
        (lambda: Fork(0.15, 54.9 * DEGREE), "head_angle", "head_angle"),
        (lambda: Fork(0.15, 80.1 * DEGREE), "head_angle", "head_angle"),
        (lambda: Fork(0.15, np.nan), "head_angle", "not_finite"),
        (lambda: Fork(0.0, 65 * DEGREE), "full_stroke", "not_positive"),
        (lambda: Linkage(-0.15, 3, 2), "travel", "not_positive"),
        (lambda: Linkage(0.15, 0.49, 2), "start", "leverage"),
        (lambda: Linkage(0.15, 3, 6.1), "end", "leverage"),
        (lambda: Linkage(0.15, 3, np.inf), "end", "not_finite"),
        (lambda: Linkage.from_stroke(0.15, 0.055, 1.0), "progression", "progression"),
        (lambda: Linkage.from_stroke(0.15, 0.055, -0.6), "progression", "progression"),
        (lambda: Linkage.from_stroke(0.15, 0.0, 0.1), "stroke", "not_positive"),
        (lambda: Linkage.from_stroke(0.15, 0.012, 0.1), "start", "leverage"),
        (lambda: stroke_disagreement(Linkage(0.15, 3, 2), 0.0), "stroke", "not_positive"),
    ],
)
def test_what_no_bike_has_is_refused(make, field, code):
    with pytest.raises(InvalidInputError) as caught:
        make()
    assert (caught.value.code, caught.value.field) == (code, field)


@pytest.mark.parametrize("path", [Fork(0.15, 65 * DEGREE), Linkage(0.15, 3.0, 2.5)])
@pytest.mark.parametrize("place", ["shaft", "wheel"])
def test_readings_stay_within_the_travel(path, place):
    full = from_shaft(path, path.full_stroke, place)
    assert_allclose(to_shaft(path, full, place), path.full_stroke)  # bottomed: still there
    with pytest.raises(InvalidInputError) as caught:
        to_shaft(path, np.array([0.5, 1.001, 0.1]) * full, place)
    assert caught.value.code == "beyond_travel"
    assert caught.value.where.tolist() == [False, True, False]
    assert "beyond_travel" in {
        _code(lambda: from_shaft(path, 1.001 * path.full_stroke, place)),
        _code(lambda: path.leverage(1.001 * path.full_stroke)),
    }
    assert _code(lambda: to_shaft(path, -1e-9, place)) == "negative"
    assert _code(lambda: to_shaft(path, np.nan, place)) == "not_finite"


def _code(call):
    with pytest.raises(InvalidInputError) as caught:
        call()
    return caught.value.code
