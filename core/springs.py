"""What all springs have in common, and what follows from it at the wheel.

A spring's force is F = scale × g(s) − offset: a shape g, which only depends on how it is built, and
a scale, which a person sets: the rate of a coil, the pressure of air. What needs the shape alone
(frequency, the change of pressure for a change of sag) needs neither mass nor bore.
"""

from abc import ABC, abstractmethod

import numpy as np

from core.checks import SMALLEST, FloatArray, Quantity, positive, require
from core.constants import STANDARD_GRAVITY
from core.errors import NoSolutionError
from core.geometry import WheelPath, force_at_wheel, rate_at_wheel
from core.oscillator import TURN, frequency_from_stiffness
from core.roots import rising_root


class Spring(ABC):
    """A spring along its shaft.

    F = A g(s) − B,  k = A g'(s),  k_vib = n k

    with A the scale, g the shape, B the offset and n the exponent.
    """

    @property
    @abstractmethod
    def scale(self) -> Quantity:
        """A, what a person sets."""

    @property
    @abstractmethod
    def offset(self) -> Quantity:
        """B, a force that doesn't depend on the stroke [N]."""

    @property
    @abstractmethod
    def exponent(self) -> Quantity:
        """How much stiffer it is for quick movements, n [-]; 1 for steel."""

    @property
    @abstractmethod
    def end(self) -> Quantity:
        """The shaft stroke beyond which it can't be used [m]; may be infinite."""

    @abstractmethod
    def shape(self, stroke: Quantity) -> Quantity:
        """Return the shape g.

        Args:
            stroke: of the shaft [m], 0 to `end`.
        """

    @abstractmethod
    def slope(self, stroke: Quantity) -> Quantity:
        """Return the shape's slope g'.

        Args:
            stroke: of the shaft [m], 0 to `end`.
        """

    def force(self, stroke: Quantity) -> Quantity:
        """Return the static force, F = A g(s) − B.

        Args:
            stroke: s [m], 0 to `end`.

        Returns:
            F along the shaft [N], shapes broadcast.

        Raises:
            InvalidInputError: the stroke isn't finite, is negative or beyond the end.
        """
        return self.scale * self.shape(stroke) - self.offset

    def rate(self, stroke: Quantity) -> Quantity:
        """Return the static rate, k = dF/ds = A g'(s).

        Args:
            stroke: s [m], 0 to `end`.

        Returns:
            k along the shaft [N/m], shapes broadcast.

        Raises:
            InvalidInputError: the stroke isn't finite, is negative or beyond the end.
        """
        return self.scale * self.slope(stroke)

    def vibration_rate(self, stroke: Quantity) -> Quantity:
        """Return the rate that a quick movement about a static stroke feels, n k.

        Args:
            stroke: s [m], 0 to `end`.

        Returns:
            Rate along the shaft [N/m], shapes broadcast.

        Raises:
            InvalidInputError: the stroke isn't finite, is negative or beyond the end.
        """
        return self.exponent * self.rate(stroke)


def wheel_load(spring: Spring, path: WheelPath, stroke: Quantity) -> Quantity:
    """Return the load at the wheel that a spring carries, W = F/φ.

    Args:
        spring: the spring.
        path: of its wheel.
        stroke: s, of the shaft [m].

    Returns:
        W, vertical [N], shapes broadcast; the wheel's own weight isn't part of it.

    Raises:
        InvalidInputError: the stroke isn't finite, is negative or beyond spring or path.
    """
    return force_at_wheel(spring.force(stroke), path.leverage(stroke))


def static_wheel_rate(spring: Spring, path: WheelPath, stroke: Quantity) -> Quantity:
    """Return the vertical rate at the wheel for slow movements; see `core.geometry.rate_at_wheel`.

    Args:
        spring: the spring.
        path: of its wheel.
        stroke: s, of the shaft [m].

    Returns:
        k_w [N/m], shapes broadcast.

    Raises:
        InvalidInputError: the stroke isn't finite, is negative or beyond spring or path.
    """
    force, leverage = spring.force(stroke), path.leverage(stroke)
    return rate_at_wheel(spring.rate(stroke), force, leverage, path.leverage_slope)


def vibration_wheel_rate(spring: Spring, path: WheelPath, stroke: Quantity) -> Quantity:
    """Return the vertical rate at the wheel for quick movements about a static stroke.

    Only the spring's own rate gets steeper; the geometric term stays.

    Args:
        spring: the spring.
        path: of its wheel.
        stroke: s, of the shaft [m].

    Returns:
        k_w [N/m], shapes broadcast.

    Raises:
        InvalidInputError: the stroke isn't finite, is negative or beyond spring or path.
    """
    force, leverage = spring.force(stroke), path.leverage(stroke)
    return rate_at_wheel(spring.vibration_rate(stroke), force, leverage, path.leverage_slope)


def loaded_frequency(spring: Spring, path: WheelPath, stroke: Quantity) -> Quantity:
    """Return the natural frequency of a bike at its sag, without its mass.

    f = (1/2π) √(g₀ k_w / W)

    with k_w the wheel rate for quick movements, W the load at the wheel at this sag and g₀
    standard gravity: what the spring carries tells the mass. Exact for small swings of a rigid
    mass on this wheel; swings of ±20 % of the stroke are 1 to 3 % quicker.

    Args:
        spring: the spring; its scale doesn't matter where it has no offset.
        path: of its wheel.
        stroke: s, of the shaft at sag [m].

    Returns:
        f, undamped [Hz], shapes broadcast.

    Raises:
        NoSolutionError: code ``topped_out`` where the spring carries nothing, ``unstable`` where
            the linkage gives way faster than the spring gets harder.
        InvalidInputError: the stroke isn't finite, is negative or beyond spring or path.

    Source: f = √(k/m)/2π with m = W/g₀; any vibration text.
    """
    load = wheel_load(spring, path, stroke)
    require(np.greater(load, SMALLEST), "topped_out", "stroke", NoSolutionError)
    rate = _stable(vibration_wheel_rate(spring, path, stroke))
    frequency: Quantity = np.sqrt(STANDARD_GRAVITY * rate / load) / TURN
    return frequency


def frequency_with_mass(
    spring: Spring, path: WheelPath, stroke: Quantity, mass: Quantity
) -> Quantity:
    """Return the natural frequency of a known mass on a spring, f = (1/2π) √(k_w / m).

    Args:
        spring: the spring, with its true scale.
        path: of its wheel.
        stroke: s, of the shaft at sag [m].
        mass: m that this wheel's spring carries, without the wheel itself [kg], positive.

    Returns:
        f, undamped [Hz], shapes broadcast.

    Raises:
        NoSolutionError: code ``unstable``.
        InvalidInputError: a quantity isn't finite or is outside its range.
    """
    return frequency_from_stiffness(_stable(vibration_wheel_rate(spring, path, stroke)), mass)


def stroke_under(spring: Spring, path: WheelPath, load: Quantity) -> Quantity:
    """Return the shaft stroke at which a spring carries a load.

    The root of F(s)/φ(s) = W between extended and bottomed, the inverse of `wheel_load`.

    Args:
        spring: the spring.
        path: of its wheel.
        load: W at the wheel [N], positive.

    Returns:
        s [m], shapes broadcast.

    Raises:
        NoSolutionError: code ``topped_out`` where even the extended spring carries more,
            ``bottomed`` where the full stroke carries less.
        InvalidInputError: code ``not_finite`` or ``not_positive``.
    """
    positive("load", load)
    reach = np.minimum(path.full_stroke, spring.end)
    above_top = np.greater_equal(load, wheel_load(spring, path, 0.0 * reach))
    above_bottom = np.greater(load, wheel_load(spring, path, reach))
    require(above_top, "topped_out", error=NoSolutionError)
    require(np.logical_not(above_bottom), "bottomed", error=NoSolutionError)

    def surplus(stroke: FloatArray) -> tuple[FloatArray, FloatArray]:
        force, leverage = spring.force(stroke), path.leverage(stroke)
        rate = rate_at_wheel(spring.rate(stroke), force, leverage, path.leverage_slope)
        carried = force_at_wheel(force, leverage)
        return np.asarray(carried - load), np.asarray(rate * leverage)  # by stroke, not by travel

    low, high = np.broadcast_arrays(0.0 * load, reach)
    stroke: Quantity = rising_root(surplus, low, high)[()]
    return stroke


def _stable(rate: Quantity) -> Quantity:
    """Return a wheel rate after checking that it holds anything up."""
    require(np.greater(rate, 0.0), "unstable", "stroke", NoSolutionError)
    return rate
