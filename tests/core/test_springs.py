"""Springs and what they do at the wheel, against differences, integrators and a root finder."""

import numpy as np
import pytest
from hypothesis import assume, given
from hypothesis import strategies as st
from numpy.testing import assert_allclose
from scipy.integrate import quad, solve_ivp
from scipy.optimize import brentq

from core.air_spring import NEAR_END, AirSpring, Chambers
from core.coil import (
    CHROME_SILICON,
    COILS_SD,
    DIAMETER_SD,
    WIRE_SD,
    Coil,
    coil_rate,
    unmarked_coil,
)
from core.constants import STANDARD_GRAVITY
from core.errors import InvalidInputError, NoSolutionError
from core.geometry import Fork
from core.linkage import Linkage
from core.oscillator import frequency_from_deflection
from core.roots import rising_root
from core.springs import (
    frequency_with_mass,
    loaded_frequency,
    static_wheel_rate,
    stroke_under,
    vibration_wheel_rate,
    wheel_load,
)
from core.uncertainty import Measured
from core.units import BAR, DEGREE, LBF_PER_INCH, MM
from core.unknown import PowerSpring
from tests.core.strategies import air_springs_for, ends, linkages, shares

FORK = Fork(150 * MM, 65 * DEGREE)
REAR = Linkage.from_stroke(150 * MM, 55 * MM, 0.15)
CHAMBERS = Chambers(240 * MM, 60 * MM, 0.9, 1.3, 3 * MM)
AIR = AirSpring(CHAMBERS, 5 * BAR, area=1e-3)
SHOCK = AirSpring(Chambers(90 * MM, 25 * MM, 0.9, 1.35, 1 * MM), 12 * BAR, area=1.1e-3)
COIL = Coil(450 * LBF_PER_INCH, preload=2 * MM)


def work(spring, stroke):
    """Work that a spring takes up on the way."""
    return quad(spring.force, 0, stroke, epsabs=1e-13)[0]


@given(end=ends(), share=shares)
def test_rate_is_the_derivative_of_force(end, share):
    path, spring = end
    stroke, step = share * path.full_stroke, 1e-6
    difference = spring.force(stroke + step) - spring.force(stroke - step)
    assert_allclose(spring.rate(stroke), difference / (2 * step), rtol=1e-6)
    assert_allclose(spring.vibration_rate(stroke), spring.exponent * spring.rate(stroke))


@given(end=ends(), share=shares)
def test_wheel_rate_is_the_derivative_of_wheel_load(end, share):
    path, spring = end
    stroke, step = share * path.full_stroke, 1e-6
    ahead, behind = stroke + step, stroke - step
    force = wheel_load(spring, path, ahead) - wheel_load(spring, path, behind)
    travel = path.wheel_travel(ahead) - path.wheel_travel(behind)
    assert_allclose(static_wheel_rate(spring, path, stroke), force / travel, rtol=1e-5)


@given(end=ends(), share=shares)
def test_stroke_and_load_are_inverse(end, share):
    path, spring = end
    stroke = share * path.full_stroke
    load = wheel_load(spring, path, stroke)
    assume(load > 1.0)
    found = stroke_under(spring, path, load)
    assert_allclose(found, stroke, rtol=1e-9)
    by_brent = brentq(
        lambda s: wheel_load(spring, path, s) - load, 0, min(path.full_stroke, spring.end)
    )
    assert_allclose(found, by_brent, rtol=1e-9, atol=1e-12)


@given(end=ends(), share=shares)
def test_arrays_give_what_their_elements_give(end, share):
    path, spring = end
    strokes = share * path.full_stroke * np.array([0.5, 1.0, 1.5])
    loads = wheel_load(spring, path, strokes)
    assume((loads > 1.0).all())
    for function, values in (
        (loaded_frequency, strokes),
        (static_wheel_rate, strokes),
        (stroke_under, loads),
    ):
        single = [function(spring, path, float(value)) for value in values]
        assert_allclose(function(spring, path, values), single, rtol=1e-9)


@given(end=ends(), share=shares, factor=st.floats(1.001, 1.2))
def test_more_load_means_more_sag(end, share, factor):
    path, spring = end
    load = wheel_load(spring, path, share * path.full_stroke)
    assume(load > 1.0 and load * factor < wheel_load(spring, path, 0.8 * path.full_stroke))
    assert stroke_under(spring, path, load * factor) > stroke_under(spring, path, load)


@given(end=ends(), share=shares, mass=st.floats(20.0, 60.0))
def test_mass_that_the_spring_carries_gives_the_same_frequency(end, share, mass):
    path, spring = end
    stroke = share * path.full_stroke
    load = wheel_load(spring, path, stroke)
    assume(load > 1.0)
    carried = load / STANDARD_GRAVITY
    expected = loaded_frequency(spring, path, stroke)
    assert_allclose(frequency_with_mass(spring, path, stroke, carried), expected)
    # Another mass at the same sag: by the square root of their ratio.
    other = frequency_with_mass(spring, path, stroke, mass)
    assert_allclose(other, expected * np.sqrt(carried / mass))


@pytest.mark.parametrize(
    ("path", "spring"), [(FORK, AIR), (REAR, SHOCK), (FORK, COIL), (REAR, COIL)]
)
def test_frequency_of_small_swings(path, spring):
    """A mass released a hair above its sag, gas and leverage in full, against the formula."""
    stroke = 0.3 * path.full_stroke
    load = wheel_load(spring, path, stroke)
    mass, rest = load / STANDARD_GRAVITY, path.wheel_travel(stroke)

    def spring_force(here):
        if not isinstance(spring, AirSpring):
            return spring.force(here)
        # Each chamber follows P V^n = const from its isothermal state at rest.
        chambers, inside = spring.chambers, spring.pressure + spring.ambient
        n, volume = chambers.exponent, chambers.length - stroke
        positive = inside * chambers.length / volume * (volume / (chambers.length - here)) ** n
        volume = chambers.negative_length + stroke
        filled = inside * chambers.negative_filling * chambers.negative_length / volume
        negative = filled * (volume / (chambers.negative_length + here)) ** n
        return spring.area * (positive - negative) - spring.offset

    def motion(_, state):
        here = path.shaft_stroke(rest + state[0])
        return state[1], (load - spring_force(here) / path.leverage(here)) / mass

    def passing(_, state):
        return state[0]

    passing.direction = -1
    hair = 1e-4 * rest
    with np.errstate(all="ignore"):  # scipy's own step control
        run = solve_ivp(motion, (0, 3), (hair, 0.0), events=passing, rtol=1e-10, atol=1e-14)
    measured = 1 / np.diff(run.t_events[0]).mean()
    assert_allclose(loaded_frequency(spring, path, stroke), measured, rtol=1e-5)


@given(path=linkages, share=shares, preload=st.floats(1e-4, 5e-3))
def test_coil_scales(path, share, preload):
    # Frequency depends on the shape alone: not on the rate.
    stroke = share * path.full_stroke
    soft, hard = Coil(5e4, preload), Coil(9e4, preload)
    assert_allclose(*(loaded_frequency(coil, path, stroke) for coil in (soft, hard)))
    assert_allclose(hard.force(stroke) / soft.force(stroke), 9 / 5)
    # Preload carries a part of the load without adding to the rate.
    assert loaded_frequency(soft, path, stroke) < loaded_frequency(Coil(5e4), path, stroke)


@given(share=shares)
def test_coil_on_a_constant_leverage_swings_as_its_deflection(share):
    path = Linkage.from_stroke(0.15, 0.06, 0.0)
    expected = frequency_from_deflection(share * 0.15)
    assert_allclose(loaded_frequency(Coil(6e4), path, share * 0.06), expected)


@given(share=shares)
def test_long_chambers_make_a_coil(share):
    # With L and Ln far beyond the stroke force grows linearly: g → s (1/L + 1/Ln).
    stroke = share * FORK.full_stroke
    long = AirSpring(Chambers(1e4, 1e4, 1.0, 1.0), 5 * BAR)
    as_coil = Coil(long.rate(0.0))
    assert_allclose(long.force(stroke), as_coil.force(stroke), rtol=1e-4)
    assert_allclose(
        loaded_frequency(long, FORK, stroke), loaded_frequency(as_coil, FORK, stroke), rtol=1e-4
    )


@given(share=shares, n=st.floats(1.0, 1.4))
def test_exponent_leaves_the_geometric_term_alone(share, n):
    stroke = share * REAR.full_stroke
    slow, quick = (AirSpring(Chambers(0.09, 0.03, 1.0, k), 12 * BAR) for k in (1.0, n))
    difference = vibration_wheel_rate(quick, REAR, stroke) - static_wheel_rate(slow, REAR, stroke)
    expected = (n - 1) * slow.rate(stroke) / REAR.leverage(stroke) ** 2
    assert_allclose(difference, expected, rtol=1e-9, atol=1e-8)


@given(spring=air_springs_for(FORK), share=shares, factor=st.floats(0.5, 2.0))
def test_air_spring_scales(spring, share, factor):
    chambers = spring.chambers
    stroke = share * FORK.full_stroke
    # A piston of twice the area gives twice the force, and the same frequency.
    wide = AirSpring(chambers, spring.pressure, factor * spring.area, spring.ambient)
    assert_allclose(wide.force(stroke), factor * spring.force(stroke))
    # A spring of twice the length gives the same force at twice the stroke.
    long = Chambers(
        factor * chambers.length,
        factor * chambers.negative_length,
        chambers.area_ratio,
        chambers.exponent,
        factor * chambers.joined_at,
    )
    assert_allclose(long.shape(factor * stroke), chambers.shape(stroke), rtol=1e-9, atol=1e-12)
    assert_allclose(factor * long.slope(factor * stroke), chambers.slope(stroke))


@given(spring=air_springs_for(FORK))
def test_chambers_are_equal_where_they_are_joined(spring):
    chambers = spring.chambers
    joined = chambers.joined_at
    positive = 1 / (1 - joined / chambers.length)
    negative = chambers.negative_filling / chambers.area_ratio
    negative /= 1 + joined / chambers.negative_length
    assert_allclose(positive, negative)  # the same pressure on both sides
    # There the piston feels the rod's share of the air inside, less that of the air outside.
    rod = (1 - chambers.area_ratio) * spring.area
    inside = (spring.pressure + spring.ambient) * positive
    assert_allclose(spring.force(joined), rod * (inside - spring.ambient), atol=1e-9)


def test_joined_later_is_joined_at_the_start_of_a_shorter_spring():
    # The same metal described from where the chambers are joined.
    joined = 5 * MM
    later = AirSpring(Chambers(240 * MM, 60 * MM, 0.9, 1.3, joined), 5 * BAR)
    filled = (later.pressure + later.ambient) * 240 / 235 - later.ambient
    shorter = AirSpring(Chambers(235 * MM, 65 * MM, 0.9, 1.3), filled)
    for stroke in np.array([10, 40, 120]) * MM:
        assert_allclose(later.force(stroke), shorter.force(stroke - joined))
        assert_allclose(later.rate(stroke), shorter.rate(stroke - joined))
    assert later.force(0.0) < 0.0  # it sinks in a little under no load


def test_altitude_changes_only_what_pushes_on_the_rod():
    low, high = 101_325.0, 74_691.7
    for ratio, changes in ((1.0, 0.0), (0.9, 0.1)):
        chambers = Chambers(240 * MM, 60 * MM, ratio)
        below = AirSpring(chambers, 5 * BAR, ambient=low)
        above = AirSpring(chambers, 5 * BAR + low - high, ambient=high)
        gain = above.force(45 * MM) - below.force(45 * MM)
        assert_allclose(gain, changes * (low - high), atol=1e-6)


@given(end=ends(), share=shares)
def test_work_at_the_shaft_is_work_at_the_wheel(end, share):
    path, spring = end
    stroke = share * path.full_stroke
    at_wheel, _ = quad(lambda s: wheel_load(spring, path, s) * path.leverage(s), 0, stroke)
    assert_allclose(at_wheel, work(spring, stroke), rtol=1e-8, atol=1e-9)


@given(steepness=st.floats(0.7, 1.5), share=shares)
def test_power_spring_swings_by_the_root_of_its_steepness(steepness, share):
    stroke = share * FORK.full_stroke
    found = loaded_frequency(PowerSpring(steepness), FORK, stroke)
    deflection = frequency_from_deflection(FORK.wheel_travel(stroke))
    assert_allclose(found, np.sqrt(steepness) * deflection)


@pytest.mark.parametrize("spring", [COIL, AIR])
def test_what_cannot_be_carried_is_told(spring):
    top, bottom = (wheel_load(spring, FORK, share * FORK.full_stroke) for share in (0.0, 1.0))
    for load, code in ((0.999 * top, "topped_out"), (1.001 * bottom, "bottomed")):
        if load > 0:
            with pytest.raises(NoSolutionError) as caught:
                stroke_under(spring, FORK, np.array([0.3 * bottom, load]))
            assert caught.value.code == code
            assert caught.value.where.tolist() == [False, True]
    assert_allclose(stroke_under(spring, FORK, bottom), FORK.full_stroke, rtol=1e-9)


def test_full_preload_at_the_top():
    load = wheel_load(COIL, REAR, 0.0)
    assert_allclose(stroke_under(COIL, REAR, load), 0.0, atol=1e-12)


def test_no_frequency_without_load():
    self_sagging = AirSpring(Chambers(240 * MM, 60 * MM, 1.0, 1.3, 5 * MM), 5 * BAR)
    for stroke in (0.0, 2 * MM):
        with pytest.raises(NoSolutionError) as caught:
            loaded_frequency(self_sagging, FORK, stroke)
        assert caught.value.code == "topped_out"


def test_linkage_that_gives_way_is_told():
    # Leverage that grows from 1 to 6 outruns a much preloaded coil.
    path = Linkage(0.15, 1.0, 6.0)
    for call in (
        lambda: loaded_frequency(Coil(5e4, 0.04), path, 0.01),
        lambda: frequency_with_mass(Coil(5e4, 0.04), path, 0.01, 40.0),
    ):
        with pytest.raises(NoSolutionError) as caught:
            call()
        assert caught.value.code == "unstable"


@pytest.mark.parametrize(
    ("make", "code"),
    [
        (lambda: Coil(0.0), "not_positive"),
        (lambda: Coil(5e4, -1e-6), "negative"),
        (lambda: Coil(5e4, 0.0, 0.0), "not_positive"),
        (lambda: Coil(5e4, 0.0, 0.05).force(0.0501), "coil_binds"),
        (lambda: Coil(5e4).force(-1e-9), "negative"),
        (lambda: Coil(5e4).rate(np.nan), "not_finite"),
        (lambda: Chambers(0.0, 0.06), "not_positive"),
        (lambda: Chambers(0.24, -0.06), "not_positive"),
        (lambda: Chambers(0.24, 0.06, 0.49), "area_ratio"),
        (lambda: Chambers(0.24, 0.06, 1.01), "area_ratio"),
        (lambda: Chambers(0.24, 0.06, 1.0, 0.99), "exponent"),
        (lambda: Chambers(0.24, 0.06, 1.0, 1.41), "exponent"),
        (lambda: Chambers(0.24, 0.06, 1.0, 1.3, -0.001), "negative"),
        (lambda: Chambers(0.24, 0.06, 1.0, 1.3, 0.061), "joined_at"),
        (lambda: CHAMBERS.shape(0.2281), "air_end"),
        (lambda: CHAMBERS.slope(-0.001), "negative"),
        (lambda: AirSpring(CHAMBERS, 0.0), "not_positive"),
        (lambda: AirSpring(CHAMBERS, 5 * BAR, 0.0), "not_positive"),
        (lambda: AirSpring(CHAMBERS, 5 * BAR, ambient=0.0), "not_positive"),
        (lambda: PowerSpring(0.09), "steepness"),
        (lambda: PowerSpring(10.1), "steepness"),
        (lambda: PowerSpring(1.1).slope(0.0), "not_positive"),
        (lambda: coil_rate(77e9, 0.01, 0.02, 6), "coil_shape"),
        (lambda: stroke_under(COIL, REAR, 0.0), "not_positive"),
        (lambda: loaded_frequency(COIL, REAR, 0.06), "beyond_travel"),
    ],
)
def test_what_is_no_spring_is_refused(make, code):
    with pytest.raises(InvalidInputError) as caught:
        make()
    assert caught.value.code == code


def test_springs_end():
    assert Coil(5e4).end == np.inf
    assert Coil(5e4, free_stroke=0.05).end == 0.05
    assert_allclose([CHAMBERS.end, AIR.end], NEAR_END * 240 * MM)
    assert PowerSpring(0.1).end == PowerSpring(10.0).end == np.inf
    # A coil that touches before the shock bottoms is the end of it.
    short = Coil(5e4, free_stroke=0.04)
    with pytest.raises(NoSolutionError) as caught:
        stroke_under(short, REAR, 1.01 * wheel_load(short, REAR, 0.04))
    assert caught.value.code == "bottomed"


def test_unmarked_coil_is_known_to_about_twelve_per_cent():
    rate = unmarked_coil(12.5 * MM, 49.5 * MM, 5.5)
    assert_allclose(rate.value, coil_rate(77e9, 12.5 * MM, 49.5 * MM, 5.5))
    # Relative deviations of k = G d⁴/(8 D³ n) added in quadrature, times two.
    parts = (0.02, 4 * 0.05 / 12.5, 3 * 0.5 / 49.5, 0.25 / 5.5)
    expected = 1.96 * np.sqrt(np.square(parts).sum())
    assert_allclose(rate.half_width / rate.value, expected, rtol=0.03)
    assert 0.11 < expected < 0.13


def test_what_calipers_leave_open():
    # Common practice, no source; the modulus from memory.
    assert Measured(77e9, 1.54e9) == CHROME_SILICON
    assert (WIRE_SD, DIAMETER_SD, COILS_SD) == (0.05 * MM, 0.5 * MM, 0.25)


@given(
    low=st.floats(-5.0, -0.1),
    high=st.floats(0.1, 5.0),
    root=st.sampled_from([-0.09, -1e-6, 0.0, 0.05]),
)
def test_rising_root_of_awkward_functions(low, high, root):
    def awkward(position):
        # Flat on one side, steep on the other; the slope misleads Newton's method on purpose.
        away = position - root
        return np.where(away > 0, away, np.expm1(30 * away)), np.full_like(away, 1e-3)

    edges = [np.full(2, edge) for edge in (low, high)]
    assert_allclose(rising_root(awkward, *edges), root, atol=1e-11)


def test_rising_root_without_slope():
    def step_like(position):
        return np.cbrt(position - 0.3), np.zeros_like(position)

    assert_allclose(rising_root(step_like, np.zeros(3), np.ones(3)), 0.3, atol=1e-12)
