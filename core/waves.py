r"""Evenly spaced bumps as a wave: how fast they come, and at what speed the bike answers how.

    height  __       __       __
        ↕  /  \__   /  \__   /  \__
          |--------|
           spacing

The ground is taken as a sine of half the height in amplitude. Rounder bumps are close to that;
square edges add faster movements that are not in it.
"""

from typing import Final

import numpy as np

from core.checks import Quantity, not_negative, positive
from core.oscillator import TURN

FILTERING_RATIO: Final = 2.0**0.5  # [-] above, less of the bump reaches the body than there is


def forcing_frequency(speed: Quantity, spacing: Quantity) -> Quantity:
    """Return how many bumps come per second, f = v / λ.

    Args:
        speed: v, along the ground [m/s], positive.
        spacing: λ, crest to crest [m], positive.

    Returns:
        Frequency [Hz], shapes broadcast.

    Raises:
        InvalidInputError: a quantity isn't finite or isn't positive.
    """
    return positive("speed", speed) / positive("spacing", spacing)


def peak_response_ratio(damping_ratio: Quantity) -> Quantity:
    """Return the frequency ratio at which most of a bump reaches the body.

    r = √[2 / (1 + √(1 + 8 ζ²))], where `core.oscillator.transmissibility` peaks: 1 without
    damping, 0.96 at ζ = 0.3.

    Args:
        damping_ratio: ζ, mean of compression and rebound [-], at least 0.

    Returns:
        Forcing over natural frequency [-], same shape.

    Raises:
        InvalidInputError: a quantity isn't finite or is negative.
    """
    root = np.hypot(1.0, 8.0**0.5 * not_negative("damping_ratio", damping_ratio))
    ratio: Quantity = np.sqrt(2.0 / (1.0 + root))
    return ratio


def resonant_speed(
    spacing: Quantity, frequency: Quantity, damping_ratio: Quantity = 0.0
) -> Quantity:
    """Return the speed at which these bumps rock the bike most, v = r λ f_n.

    Args:
        spacing: λ, crest to crest [m], positive.
        frequency: f_n, undamped [Hz], positive.
        damping_ratio: ζ, mean of compression and rebound [-], at least 0; decides
            r (`peak_response_ratio`).

    Returns:
        Speed [m/s], shapes broadcast.

    Raises:
        InvalidInputError: a quantity isn't finite or is outside its range.
    """
    spacing, frequency = positive("spacing", spacing), positive("frequency", frequency)
    return peak_response_ratio(damping_ratio) * spacing * frequency


def filtering_speed(spacing: Quantity, frequency: Quantity) -> Quantity:
    """Return the speed above which less of the bumps reaches the body than there is.

    v = √2 λ f_n, whatever the damping.

    Args:
        spacing: λ, crest to crest [m], positive.
        frequency: f_n, undamped [Hz], positive.

    Returns:
        Speed [m/s], shapes broadcast.

    Raises:
        InvalidInputError: a quantity isn't finite or isn't positive.
    """
    return FILTERING_RATIO * positive("spacing", spacing) * positive("frequency", frequency)


def sine_peaks(amplitude: Quantity, frequency: Quantity) -> tuple[Quantity, Quantity]:
    """Return the peak velocity ω A and acceleration ω² A of a sine, with ω = 2π f.

    Args:
        amplitude: A, half the height from trough to crest [m], positive.
        frequency: f [Hz], positive.

    Returns:
        Peak velocity [m/s] and peak acceleration [m/s²], shapes broadcast.

    Raises:
        InvalidInputError: a quantity isn't finite or isn't positive.
    """
    angular = TURN * positive("frequency", frequency)
    velocity = angular * positive("amplitude", amplitude)
    return velocity, angular * velocity
