"""Published swings: deflection and frequency, wavy roads, a damper, the overshoot table.

Sources:
    [1] S. S. Rao, "Mechanical Vibrations": "Vehicle moving on a rough road" (base excitation,
        chapter 3) and "Shock absorber for a motorcycle" (chapter 2). From memory, recomputed; the
        book's own rounded figures are given beside ours.
    [2] Handbook relation for a mass resting on a spring, f = 15.76 / √δ with δ in millimetres and
        3.13 / √δ in inches, e.g. C. M. Harris (ed.), "Shock and Vibration Handbook". From memory.
    [3] Percent overshoot of a second-order system against damping ratio, as tabulated in control
        texts, e.g. K. Ogata, "Modern Control Engineering", transient response. From memory,
        recomputed.
    [4] Transmissibility 1 at r = √2 for every damping: any vibration text, e.g. [1], chapter 9.
    [5] scipy.signal, the library's transfer functions and step responses.
"""

import numpy as np
import pytest
from numpy.testing import assert_allclose
from scipy import signal

from core.oscillator import (
    TURN,
    damping_coefficient,
    damping_from_overshoot,
    free_response,
    frequency_from_deflection,
    frequency_from_stiffness,
    logarithmic_decrement,
    overshoot_from_damping,
    peak_after_impulse,
    stiffness_from_frequency,
    transmissibility,
    undamped_frequency,
)
from core.units import INCH, KMH, MM
from core.waves import forcing_frequency, sine_peaks

EXACT = 1e-5  # relative: all digits of the value recomputed from the source

# [1] Vehicle moving on a rough road.
MASS, STIFFNESS, DAMPING_RATIO = 1200.0, 400e3, 0.5
SPEED, SPACING, AMPLITUDE = 20 * KMH, 6.0, 0.05


@pytest.mark.parametrize(
    ("deflection", "frequency", "handbook", "digits"),
    [
        (1 * MM, 15.7609, 15.76, 5e-3),
        (1 * INCH, 3.12726, 3.13, 5e-3),
        (40 * MM, 2.49201, 15.76 / np.sqrt(40.0), 1e-3),
    ],
)
def test_frequency_of_a_deflection(deflection, frequency, handbook, digits):
    found = frequency_from_deflection(deflection)
    assert_allclose(found, frequency, rtol=EXACT)
    assert_allclose(found, handbook, atol=digits)  # [2], half a unit of its last digit


def test_vehicle_on_a_wavy_road():
    natural = frequency_from_stiffness(STIFFNESS, MASS)
    forcing = forcing_frequency(SPEED, SPACING)
    ratio = forcing / natural
    motion = transmissibility(ratio, DAMPING_RATIO)
    assert_allclose(TURN * forcing, 5.81776, rtol=EXACT)
    assert_allclose(TURN * natural, 18.2574, rtol=EXACT)
    assert_allclose(ratio, 0.318652, rtol=EXACT)
    assert_allclose(motion, 1.10096, rtol=EXACT)
    assert_allclose(motion * AMPLITUDE, 0.0550481, rtol=EXACT)
    # [1] rounds to 1.10 and 0.055 m.
    assert_allclose([motion, motion * AMPLITUDE], [1.10, 0.055], rtol=5e-3)


def test_vehicle_on_a_wavy_road_by_transfer_function():
    damping = damping_coefficient(DAMPING_RATIO, frequency_from_stiffness(STIFFNESS, MASS), MASS)
    _, response = signal.freqs(
        [damping, STIFFNESS], [MASS, damping, STIFFNESS], [TURN * SPEED / SPACING]
    )
    assert_allclose(abs(response[0]), 1.100963, rtol=1e-6)  # [5]
    ratio = forcing_frequency(SPEED, SPACING) / frequency_from_stiffness(STIFFNESS, MASS)
    assert_allclose(transmissibility(ratio, DAMPING_RATIO), abs(response[0]), rtol=1e-12)


def test_motorcycle_damper():
    mass, damped_period, per_half_swing = 200.0, 2.0, 0.25
    damping_ratio = damping_from_overshoot(per_half_swing)
    frequency = undamped_frequency(1 / damped_period, damping_ratio)
    assert_allclose(logarithmic_decrement(damping_ratio), 2.77259, rtol=EXACT)
    assert_allclose(damping_ratio, 0.403713, rtol=EXACT)
    assert_allclose(TURN * frequency, 3.43386, rtol=EXACT)
    stiffness = stiffness_from_frequency(frequency, mass)
    damping = damping_coefficient(damping_ratio, frequency, mass)
    assert_allclose(stiffness, 2358.28, rtol=EXACT)
    assert_allclose(damping, 554.518, rtol=EXACT)
    # [1] carries four digits and rounds on the way: ζ 0.404, k 2358 N/m, c 554.5 N s/m.
    assert_allclose([damping_ratio, stiffness, damping], [0.404, 2358.0, 554.5], rtol=1e-3)


def test_motorcycle_damper_hit_so_that_it_peaks_at_250_mm():
    damping_ratio = damping_from_overshoot(0.25)
    frequency = undamped_frequency(0.5, damping_ratio)
    peak, time = peak_after_impulse(1.42926, frequency, damping_ratio)
    assert_allclose(peak, 0.25, rtol=EXACT)
    assert_allclose(time, 0.367720, rtol=EXACT)


@pytest.mark.parametrize(
    ("damping_ratio", "percent"),
    [
        (0.1, 72.925),
        (0.2, 52.662),
        (0.3, 37.233),
        (0.4, 25.383),
        (0.5, 16.303),
        (0.6, 9.478),
        (0.7, 4.599),
        (0.8, 1.516),
    ],
)
def test_overshoot_table(damping_ratio, percent):
    # [3], to the last digit of the table.
    assert_allclose(100 * overshoot_from_damping(damping_ratio), percent, atol=1e-3)
    assert_allclose(damping_from_overshoot(percent / 100), damping_ratio, atol=1e-4)


def test_overshoot_of_a_step():
    time = np.linspace(0, 10, 20001)
    system = signal.TransferFunction([1.0], [1.0, 0.6, 1.0])  # ω = 1, ζ = 0.3
    with np.errstate(under="ignore"):  # scipy's matrix exponential
        _, response = signal.step(system, T=time)
    assert_allclose(response.max() - 1, 0.372326, atol=1e-5)  # [5]
    assert_allclose(overshoot_from_damping(0.3), 0.372326, atol=1e-6)
    # A step of the target is a release seen from the other side.
    assert_allclose(1 - free_response(time, 1 / TURN, 0.3), response, atol=1e-9)


@pytest.mark.parametrize("damping_ratio", [0.1, 0.5])
def test_filtering_begins_at_the_square_root_of_two(damping_ratio):
    assert_allclose(transmissibility(np.sqrt(2.0), damping_ratio), 1.0, rtol=1e-12)  # [4]


def test_peaks_of_a_sine():
    velocity, acceleration = sine_peaks(10 * MM, 3.0)  # ω A and ω² A, e.g. [1], chapter 1
    assert_allclose(velocity, 188.496 * MM, rtol=EXACT)
    assert_allclose(acceleration, 3.55306, rtol=EXACT)
    assert_allclose(acceleration / 9.80665, 0.362311, rtol=EXACT)
