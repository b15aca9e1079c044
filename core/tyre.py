"""The tyre as a second spring under the first, and the wheel that hops between the two."""

from math import pi

import numpy as np

from core.checks import Quantity, positive
from core.oscillator import frequency_from_stiffness


def series_stiffness(wheel_rate: Quantity, tyre_stiffness: Quantity) -> Quantity:
    """Return the stiffness of suspension and tyre one above the other, k_w k_t / (k_w + k_t).

    Args:
        wheel_rate: k_w, of the suspension at the wheel [N/m], positive.
        tyre_stiffness: k_t [N/m], positive.

    Returns:
        Stiffness [N/m], less than either, shapes broadcast.

    Raises:
        InvalidInputError: a quantity isn't finite or isn't positive.
    """
    wheel_rate = positive("wheel_rate", wheel_rate)
    tyre_stiffness = positive("tyre_stiffness", tyre_stiffness)
    return wheel_rate * tyre_stiffness / (wheel_rate + tyre_stiffness)


def tyre_frequency_factor(wheel_rate: Quantity, tyre_stiffness: Quantity) -> Quantity:
    """Return the factor by which the tyre lowers the natural frequency, √(k_t / (k_t + k_w)).

    0.96 to 0.99 on a mountain bike. The mass of the wheel, left out here, changes it by less
    than a tenth of a percent.

    Args:
        wheel_rate: k_w, of the suspension at the wheel [N/m], positive.
        tyre_stiffness: k_t [N/m], positive.

    Returns:
        Factor [-], less than 1, shapes broadcast.

    Raises:
        InvalidInputError: a quantity isn't finite or isn't positive.
    """
    ratio = positive("wheel_rate", wheel_rate) / positive("tyre_stiffness", tyre_stiffness)
    factor: Quantity = 1.0 / np.sqrt(1.0 + ratio)
    return factor


def wheel_hop_frequency(
    wheel_rate: Quantity, tyre_stiffness: Quantity, wheel_mass: Quantity
) -> Quantity:
    """Return the frequency at which the wheel hops under a body at rest, √((k_w + k_t) / m_u) / 2π.

    Args:
        wheel_rate: k_w, of the suspension at the wheel [N/m], positive.
        tyre_stiffness: k_t [N/m], positive.
        wheel_mass: m_u, of wheel, tyre and what moves with them [kg], positive.

    Returns:
        Frequency [Hz], about 23 to 43 on a mountain bike, shapes broadcast.

    Raises:
        InvalidInputError: a quantity isn't finite or isn't positive.
    """
    stiffness = positive("wheel_rate", wheel_rate) + positive("tyre_stiffness", tyre_stiffness)
    return frequency_from_stiffness(stiffness, wheel_mass)


def membrane_stiffness(
    pressure: Quantity, wheel_radius: Quantity, tyre_radius: Quantity
) -> Quantity:
    """Return an estimate of the tyre's vertical stiffness, k_t = 2π p √(R ρ).

    A thin-walled torus pressed flat: the contact ellipse of half axes √(2 R z) and √(2 ρ z) bears
    the pressure, F = p π 2 z √(R ρ). The casing's own stiffness comes on top, the rim's width and
    a small deflection work the other way; good to perhaps 30 %.

    Args:
        pressure: p, gauge [Pa], positive.
        wheel_radius: R, outer radius of the tyre [m], positive.
        tyre_radius: ρ, half the tyre's width [m], positive.

    Returns:
        Stiffness [N/m], shapes broadcast.

    Raises:
        InvalidInputError: a quantity isn't finite or isn't positive.

    Source: geometry of the contact ellipse; from memory, no edition.
    """
    width = np.sqrt(positive("wheel_radius", wheel_radius) * positive("tyre_radius", tyre_radius))
    stiffness: Quantity = 2.0 * pi * positive("pressure", pressure) * width
    return stiffness
