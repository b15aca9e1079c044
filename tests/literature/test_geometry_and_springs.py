"""Linkages, forks, coils, air springs and their change against handbooks and scipy.

Sources:
    [1] Shigley's Mechanical Engineering Design, chapter on helical springs: the law of the rate,
        and its first worked example (from memory; recomputed).
    [2] scipy.integrate.quad, of ds = dx/φ along the wheel's travel.
    [3] scipy.integrate.solve_ivp, small swings of a mass on the real, curved force.
    [4] scipy.optimize.brentq, of the balance of loads.
    [5] scipy.stats, and samples of numpy's generator.
    [6] Ideal gas law and Boyle's law; any physics text.
    [7] ISO 2533:1975, pressures at altitude.
    [8] f = 15.76/√δ, δ in millimetres: handbook relation of static deflection and frequency.
    [9] Plain algebra or trigonometry, done by hand.
"""

import numpy as np
import pytest
from numpy.testing import assert_allclose
from scipy.integrate import quad, solve_ivp
from scipy.optimize import brentq

from core.air_pressure import hose_drop, pressure_after
from core.air_spring import AirSpring, Chambers
from core.chamber_length import chamber_length
from core.coil import Coil, coil_rate
from core.coil_change import preload_for_stroke, rate_for_stroke
from core.constants import CELSIUS_ZERO, STANDARD_GRAVITY
from core.geometry import Fork
from core.linkage import Linkage
from core.oscillator import TURN
from core.pressure_change import pressure_for_stroke
from core.springs import (
    loaded_frequency,
    static_wheel_rate,
    stroke_under,
    vibration_wheel_rate,
    wheel_load,
)
from core.two_sided import one_sided_sd, two_sided_sag
from core.uncertainty import Measured
from core.units import BAR, DEGREE, INCH, LBF_PER_INCH, MM, N_PER_MM, PSI

EXACT = 1e-5  # relative: all digits given
STEEP = Linkage(150 * MM, 3.0, 2.5)
PROGRESSIVE = Linkage.from_stroke(150 * MM, 55 * MM, 0.15)
FORK = Fork(150 * MM, 65 * DEGREE)
LEVEL = Linkage(150 * MM, 1.0, 1.0)  # a leverage of one all the way


@pytest.mark.parametrize(
    ("shear_modulus", "wire", "diameter", "coils", "rate"),
    [(79.3e9, 10, 50, 8, 99.1250), (77.2e9, 8.8, 46, 7.5, 79.2726)],
)
def test_rate_of_a_helical_spring(shear_modulus, wire, diameter, coils, rate):
    # [1], the law, with common moduli of music wire and chrome silicon.
    found = coil_rate(shear_modulus, wire * MM, diameter * MM, coils)
    assert_allclose(found, rate * N_PER_MM, rtol=EXACT)


def test_rates_in_pounds_per_inch():
    assert_allclose(99.1250 * N_PER_MM / LBF_PER_INCH, 566.018, rtol=EXACT)
    assert_allclose(79.2726 * N_PER_MM / LBF_PER_INCH, 452.658, rtol=EXACT)


def test_worked_example_of_a_helical_spring():
    # [1]: music wire of 0.037 in, G 11.85 Mpsi, mean diameter 0.400 in, 10.5 active coils.
    found = coil_rate(11.85e6 * PSI, 0.037 * INCH, 0.400 * INCH, 10.5)
    assert_allclose(found / LBF_PER_INCH, 4.13, atol=0.005)


def test_curvature_correction_that_is_left_out():
    # [1]: dividing by 1 + 1/(2 C²) with C = D/d would take off 3 % at C = 4.
    assert_allclose(1 - 1 / (1 + 1 / (2 * 4.0**2)), 0.030, atol=5e-4)


def test_stroke_of_a_linkage():
    def stroke(travel):
        return quad(lambda x: 1 / (3.0 - 0.5 * x / (150 * MM)), 0, travel)[0]  # [2]

    assert_allclose(stroke(150 * MM), 54.6965 * MM, rtol=EXACT)
    assert_allclose(STEEP.full_stroke, 54.6965 * MM, rtol=EXACT)
    assert_allclose(stroke(45 * MM), 15.3880 * MM, rtol=EXACT)
    assert_allclose(STEEP.shaft_stroke(45 * MM), 15.3880 * MM, rtol=EXACT)
    assert_allclose(STEEP.leverage(STEEP.shaft_stroke(45 * MM)), 2.85, rtol=1e-12)  # [9]


def test_wheel_force_and_rate_of_a_linkage():
    coil, stroke, step = Coil(80 * N_PER_MM), STEEP.shaft_stroke(45 * MM), 1e-7
    assert_allclose(wheel_load(coil, STEEP, stroke), 431.944, rtol=EXACT)
    rate = static_wheel_rate(coil, STEEP, stroke)
    assert_allclose(rate, 10.3544 * N_PER_MM, rtol=EXACT)
    ahead, behind = (STEEP.shaft_stroke(45 * MM + sign * step) for sign in (1, -1))
    difference = wheel_load(coil, STEEP, ahead) - wheel_load(coil, STEEP, behind)
    assert_allclose(rate, difference / (2 * step), rtol=1e-6)
    assert_allclose(loaded_frequency(coil, STEEP, stroke), 2.44022, rtol=EXACT)


def test_linkage_from_stroke_and_progression():
    assert_allclose([PROGRESSIVE.start, PROGRESSIVE.end], [2.95489, 2.51166], rtol=EXACT)
    slope = (PROGRESSIVE.end - PROGRESSIVE.start) / PROGRESSIVE.travel
    by_quad = quad(lambda x: 1 / (PROGRESSIVE.start + slope * x), 0, 45 * MM)[0]  # [2]
    assert_allclose(by_quad, 15.5823 * MM, rtol=EXACT)
    assert_allclose(PROGRESSIVE.shaft_stroke(45 * MM), 15.5823 * MM, rtol=EXACT)


@pytest.mark.parametrize(("progression", "miss"), [(0.15, 0.12), (0.3, 0.58), (0.4, 1.19)])
def test_arithmetic_mean_of_the_leverages_misses_the_stroke(progression, miss):
    start = 150 / 55 / (1 - progression / 2)  # [9]
    naive = Linkage(150 * MM, start, start * (1 - progression))
    assert_allclose(naive.full_stroke / MM - 55, miss, atol=0.005)


@pytest.mark.parametrize(("progression", "percent"), [(0.15, 31.7), (0.3, 33.8)])
def test_sag_at_the_shaft_is_more_at_the_wheel(progression, percent):
    path = Linkage.from_stroke(150 * MM, 55 * MM, progression)
    assert_allclose(100 * path.wheel_travel(0.3 * 55 * MM) / (150 * MM), percent, atol=0.05)


def test_geometric_term_of_a_coil():
    stroke = PROGRESSIVE.shaft_stroke(0.3 * 150 * MM)
    whole = static_wheel_rate(Coil(80 * N_PER_MM), PROGRESSIVE, stroke)
    without = 80 * N_PER_MM / PROGRESSIVE.leverage(stroke) ** 2
    assert_allclose(100 * (1 - without / whole), 4.4, atol=0.05)


def test_fork_at_65_degrees():
    assert_allclose(FORK.leverage(0.0), 0.906308, rtol=EXACT)  # [9], sine
    rate = static_wheel_rate(Coil(8 * N_PER_MM), FORK, 30 * MM)
    assert_allclose(rate / (8 * N_PER_MM), 1.21744, rtol=EXACT)
    found = loaded_frequency(Coil(8 * N_PER_MM), FORK, 30 * MM)
    assert_allclose(found, 3.02261, rtol=EXACT)
    assert_allclose(found, 15.7609 / np.sqrt(30 * 0.906308), rtol=EXACT)  # [8]


@pytest.mark.parametrize(("degrees", "factor"), [(62, 1.283), (66, 1.198), (70, 1.132)])
def test_vertical_rate_of_forks(degrees, factor):
    fork = Fork(150 * MM, degrees * DEGREE)
    assert_allclose(static_wheel_rate(Coil(1e4), fork, 0.03) / 1e4, factor, atol=5e-4)  # [9]


def test_shape_of_an_air_spring():
    chambers = Chambers(1.6, 0.4, exponent=1.0)
    assert_allclose(chambers.shape(0.3), 0.659341, rtol=EXACT)
    assert_allclose(chambers.slope(0.3), 1.76307, rtol=EXACT)
    # Frequency against that of the static deflection, isothermal and polytropic.
    ratio = np.sqrt(0.3 * chambers.slope(0.3) / chambers.shape(0.3))
    assert_allclose([ratio, np.sqrt(1.3) * ratio], [0.895655, 1.02120], rtol=EXACT)


def test_small_swings_on_an_air_spring():
    # Stroke, chambers and deflection in shares of a metre, gravity and mass of 1.
    chambers = Chambers(1.6, 0.4, exponent=1.3)
    spring = AirSpring(chambers, 5 * BAR)
    load = float(wheel_load(spring, Linkage(1.0, 1.0, 1.0), 0.3))
    mass, inside = load / STANDARD_GRAVITY, spring.pressure + spring.ambient

    def motion(_, state):
        squeezed, drawn = 1.6 - 0.3 - state[0], 0.4 + 0.3 + state[0]
        positive = inside * 1.6 / 1.3 * (1.3 / squeezed) ** 1.3
        negative = inside * 0.4 / 0.7 * (0.7 / drawn) ** 1.3
        return state[1], (load - positive + negative) / mass

    def passing(_, state):
        return state[0]

    passing.direction = -1
    with np.errstate(all="ignore"):  # scipy's own step control
        run = solve_ivp(motion, (0, 8), (1e-4, 0), events=passing, rtol=1e-9, atol=1e-12)
    measured = 1 / np.diff(run.t_events[0]).mean()  # [3]
    deflection = np.sqrt(STANDARD_GRAVITY / 0.3) / TURN
    assert_allclose(measured / deflection, 1.02120, rtol=1e-3)
    found = loaded_frequency(spring, Linkage(1.0, 1.0, 1.0), 0.3)
    assert_allclose(found / deflection, 1.02120, rtol=EXACT)


@pytest.mark.parametrize(
    ("length", "negative", "ratios"),
    [
        (1.3, 0.2, (0.838, 0.826, 0.826, 0.837, 0.856)),
        (1.3, 1.0, (1.000, 1.008, 1.019, 1.034, 1.053)),
        (1.6, 0.5, (0.934, 0.926, 0.923, 0.925, 0.932)),
        (2.0, 0.2, (0.808, 0.782, 0.766, 0.759, 0.759)),
        (2.0, 1.0, (0.975, 0.972, 0.971, 0.972, 0.976)),
    ],
)
def test_frequency_of_air_against_static_deflection(length, negative, ratios):
    # √(s g'/g) by the shape's formula with r = 1 and n = 1, to the last digit. [9]
    share = np.array([0.15, 0.20, 0.25, 0.30, 0.35])
    spring = AirSpring(Chambers(length, negative, exponent=1.0), 5 * BAR)
    level = Linkage(1.0, 1.0, 1.0)
    deflection = np.sqrt(STANDARD_GRAVITY / share) / TURN
    assert_allclose(loaded_frequency(spring, level, share) / deflection, ratios, atol=6e-4)


@pytest.mark.parametrize(("progression", "ratio"), [(0.0, 1.021), (0.15, 1.058), (0.3, 1.102)])
def test_progression_raises_the_frequency_of_air(progression, ratio):
    path = Linkage.from_stroke(150 * MM, 55 * MM, progression)
    spring = AirSpring(Chambers(1.6 * 55 * MM, 0.4 * 55 * MM), 12 * BAR)
    stroke = 0.3 * 55 * MM
    deflection = np.sqrt(STANDARD_GRAVITY / path.wheel_travel(stroke)) / TURN
    assert_allclose(loaded_frequency(spring, path, stroke) / deflection, ratio, atol=6e-4)


def test_rod_against_the_air_outside():
    spring = AirSpring(Chambers(1.6, 0.4, 0.9), 12 * BAR)
    assert_allclose(spring.force(0.3), 922_245, rtol=EXACT)  # per m² of piston
    # With the shaft extended what is left is the gauge pressure on the rod.
    assert_allclose(spring.force(0.0), 0.1 * 12 * BAR)


@pytest.mark.parametrize(
    ("gauge", "force", "frequency"), [(3, 3.7, -1.8), (6, 2.1, -1.0), (12, 1.1, -0.5)]
)
def test_what_ignoring_the_air_outside_costs(gauge, force, frequency):
    spring = AirSpring(Chambers(1.6, 0.4, 0.9), gauge * BAR)
    ignored = spring.force(0.3) + spring.offset
    assert_allclose(100 * (ignored / spring.force(0.3) - 1), force, atol=0.05)
    assert_allclose(100 * (np.sqrt(spring.force(0.3) / ignored) - 1), frequency, atol=0.05)


def test_pressure_from_35_to_30_mm():
    chambers = Chambers(240 * MM, 60 * MM)
    found = pressure_for_stroke(chambers, FORK, 75 * PSI, 35 * MM, 30 * MM)
    assert_allclose(found / PSI, 86.8597, rtol=EXACT)  # [9]

    def surplus(gauge):
        loads = (
            wheel_load(AirSpring(chambers, pressure), FORK, stroke)
            for pressure, stroke in ((75 * PSI, 35 * MM), (gauge, 30 * MM))
        )
        return next(loads) - next(loads)

    assert_allclose(found, brentq(surplus, 10 * PSI, 300 * PSI), rtol=1e-9)  # [4]


def test_chamber_length_from_two_readings():
    gauges, strokes = np.array([75, 87.27418]) * PSI, np.array([35, 30]) * MM
    found = chamber_length(*gauges, *strokes, negative_length=60 * MM)

    def surplus(length):
        shape = 1 / (1 - strokes / length) - 1 / (1 + strokes / (60 * MM))
        return np.diff((gauges + 101_325) * shape)[0]

    assert_allclose(brentq(surplus, 160 * MM, 500 * MM, xtol=1e-12), 210 * MM, rtol=1e-3)  # [4]
    assert_allclose(found, 210.000 * MM, rtol=1e-3)


def test_coil_from_18_to_16_and_a_half_mm():
    coil, wanted = Coil(450 * LBF_PER_INCH, 2 * MM), 16.5 * MM
    rate = rate_for_stroke(coil, LEVEL, 18 * MM, wanted, 2 * MM)
    assert_allclose(rate / LBF_PER_INCH, 486.486, rtol=EXACT)  # [9]
    stock = Coil(500 * LBF_PER_INCH, 2 * MM)
    sag = stroke_under(stock, LEVEL, wheel_load(coil, LEVEL, 18 * MM))
    assert_allclose(sag, 16.000 * MM, rtol=EXACT)
    # What the stock coil needs instead of 2 mm: 450 · 20/500 − 16.5 = 1.5. [9]
    preload = preload_for_stroke(coil, LEVEL, 18 * MM, wanted, stock.spring_rate)
    assert_allclose(preload, 1.5 * MM, rtol=1e-9)


def test_coil_from_18_to_16_and_a_half_mm_on_a_linkage():
    coil = Coil(450 * LBF_PER_INCH, 2 * MM)
    rate = rate_for_stroke(coil, PROGRESSIVE, 18 * MM, 16.5 * MM, 2 * MM)
    assert_allclose(rate / LBF_PER_INCH, 488.648, rtol=EXACT)
    stock, load = Coil(500 * LBF_PER_INCH, 2 * MM), wheel_load(coil, PROGRESSIVE, 18 * MM)
    by_brent = brentq(lambda s: wheel_load(stock, PROGRESSIVE, s) - load, 0, 50 * MM)  # [4]
    assert_allclose(by_brent, 16.1013 * MM, rtol=EXACT)
    assert_allclose(stroke_under(stock, PROGRESSIVE, load), 16.1013 * MM, rtol=EXACT)


def test_sag_of_27_and_33_mm():
    readings = Measured(27 * MM, 1 * MM), Measured(33 * MM, 1 * MM)
    found = two_sided_sag(LEVEL, *readings, spring=Coil(8 * N_PER_MM))
    assert_allclose([found.sag.value, found.friction.value], [30 * MM, 0.1], rtol=1e-9)  # [9]
    drawn = np.random.default_rng(5).normal((27.0, 33.0), 1.0, (200_000, 2))  # [5]
    middle, share = drawn.mean(axis=1), (drawn[:, 1] - drawn[:, 0]) / drawn.sum(axis=1)
    assert_allclose([middle.std(), share.std()], [0.7071, 0.0236], rtol=0.02)
    deviations = [found.sag.as_measured().sd / MM, found.friction.as_measured().sd]
    assert_allclose(deviations, [0.7071, 0.0236], rtol=0.02)
    assert_allclose(one_sided_sd(27 * MM, 33 * MM), 1.7 * MM, atol=0.05 * MM)


def test_sag_of_27_and_33_mm_on_air():
    spring = AirSpring(Chambers(240 * MM, 60 * MM), 5 * BAR)
    found = two_sided_sag(LEVEL, Measured(27 * MM), Measured(33 * MM), spring=spring)
    assert_allclose(found.sag.value, 29.96 * MM, atol=0.005 * MM)
    assert_allclose(found.friction.value, 0.081, atol=5e-4)


def test_a_spring_set_at_20_degrees_and_ridden_at_35():
    warm = pressure_after(12 * BAR, 20 + CELSIUS_ZERO, 35 + CELSIUS_ZERO)
    assert_allclose(warm, 12.6659 * BAR, rtol=EXACT)  # [6]


@pytest.mark.parametrize(("gauge", "percent"), [(12, 3.70), (5, 4.1), (1.6, 5.6)])
def test_ten_degrees_warmer(gauge, percent):
    warm = pressure_after(gauge * BAR, 20 + CELSIUS_ZERO, 30 + CELSIUS_ZERO)
    assert_allclose(100 * (warm / (gauge * BAR) - 1), percent, atol=0.05)  # [6]


@pytest.mark.parametrize(
    ("outside", "psi"),
    [(89876.3, 1.66), (79501.4, 3.17), (74691.7, 3.86), (70121.1, 4.53)],
)
def test_gauge_on_a_summit(outside, psi):
    # [7]: at 1000, 2000, 2500, 3000 m; the same whatever was set.
    for gauge in (5 * BAR, 12 * BAR):
        shown = pressure_after(gauge, 293.15, 293.15, 101_325, outside)
        assert_allclose((shown - gauge) / PSI, psi, atol=0.005)


@pytest.mark.parametrize(("gauge", "percent"), [(5, 4.4), (12, 2.0)])
def test_setting_the_valley_number_on_a_summit(gauge, percent):
    chambers = Chambers(240 * MM, 60 * MM)
    valley = AirSpring(chambers, gauge * BAR).force(45 * MM)
    summit = AirSpring(chambers, gauge * BAR, ambient=74691.7).force(45 * MM)  # [7], 2500 m
    assert_allclose(100 * (1 - summit / valley), percent, atol=0.06)


@pytest.mark.parametrize(
    ("volume", "hose", "percent"),
    [(60, 4, 6.25), (60, 2, 3.2), (60, 4, 6.3), (200, 2, 1.0), (200, 4, 2.0)],
)
def test_a_hose_filling(volume, hose, percent):
    drop = hose_drop(12 * BAR, volume * 1e-6, hose * 1e-6)
    assert_allclose(100 * drop / (12 * BAR), percent, atol=0.051)  # [6]


def test_a_hose_of_4_ml_on_a_shock_of_60_ml():
    assert_allclose(hose_drop(12 * BAR, 60e-6, 4e-6) / (12 * BAR), 0.0625, rtol=EXACT)  # [6]


def test_vibration_is_exactly_n_times_the_static_rate():
    # Central difference of the polytropic force about an isothermal state of both chambers.
    spring, step = AirSpring(Chambers(0.24, 0.06, 0.9, 1.3), 5 * BAR), 1e-7
    inside, here = spring.pressure + spring.ambient, 0.045

    def force(stroke):
        squeezed, drawn = 0.24 - here, 0.06 + here
        positive = inside * 0.24 / squeezed * (squeezed / (0.24 - stroke)) ** 1.3
        negative = inside * 0.06 / drawn * (drawn / (0.06 + stroke)) ** 1.3
        return positive - 0.9 * negative

    difference = (force(here + step) - force(here - step)) / (2 * step)
    assert_allclose(spring.vibration_rate(here), difference, rtol=1e-7)
    assert_allclose(vibration_wheel_rate(spring, LEVEL, here), difference, rtol=1e-7)
