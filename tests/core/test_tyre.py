import numpy as np
from hypothesis import given
from hypothesis import strategies as st
from numpy.testing import assert_allclose
from scipy.linalg import eigh
from scipy.optimize import brentq

from core.oscillator import TURN, frequency_from_stiffness
from core.tyre import (
    membrane_stiffness,
    series_stiffness,
    tyre_frequency_factor,
    wheel_hop_frequency,
)

wheel_rates = st.floats(2e3, 1e4)
tyres = st.floats(8e4, 2e5)


def two_masses(wheel_rate, tyre_stiffness, body, wheel):
    """Both natural frequencies of body and wheel together, lower first."""
    stiffness = [[wheel_rate, -wheel_rate], [-wheel_rate, wheel_rate + tyre_stiffness]]
    squares = eigh(stiffness, np.diag([body, wheel]), eigvals_only=True)
    return np.sqrt(squares) / TURN


@given(wheel_rate=wheel_rates, tyre=tyres, body=st.floats(30, 80), wheel=st.floats(2.5, 5))
def test_frequencies_agree_with_both_masses_together(wheel_rate, tyre, body, wheel):
    bounce, hop = two_masses(wheel_rate, tyre, body, wheel)
    alone = frequency_from_stiffness(wheel_rate, body)
    # The wheel's mass, neglected: its effect is of the order (k_w/k_t)² m_u/m.
    assert_allclose(alone * tyre_frequency_factor(wheel_rate, tyre), bounce, rtol=2e-3)
    # The body at rest, assumed: it moves by about m_u/m of the wheel's swing, times k_w/k_t.
    assert_allclose(wheel_hop_frequency(wheel_rate, tyre, wheel), hop, rtol=2e-3)


@given(wheel_rate=wheel_rates, tyre=tyres)
def test_series_stiffness_shares_a_force_between_two_springs(wheel_rate, tyre):
    force = 500.0
    assert_allclose(force / series_stiffness(wheel_rate, tyre), force / wheel_rate + force / tyre)
    assert series_stiffness(wheel_rate, tyre) == series_stiffness(tyre, wheel_rate)
    factor = tyre_frequency_factor(wheel_rate, tyre)
    assert_allclose(factor**2, series_stiffness(wheel_rate, tyre) / wheel_rate)


@given(wheel_rate=wheel_rates)
def test_hard_tyre_changes_nothing(wheel_rate):
    assert_allclose(tyre_frequency_factor(wheel_rate, 1e12), 1.0, atol=1e-8)
    assert_allclose(series_stiffness(wheel_rate, 1e12), wheel_rate, rtol=1e-7)


@given(
    pressure=st.floats(1e5, 3e5),
    wheel_radius=st.floats(0.3, 0.4),
    tyre_radius=st.floats(0.02, 0.04),
)
def test_membrane_is_a_torus_pressed_flat(pressure, wheel_radius, tyre_radius):
    # Where the undeformed torus dips below the ground, pressure bears: integrate that area.
    deflection = 1e-4

    def half_length(across):
        """Half the length of the dipping part at a distance from the middle."""
        radius = wheel_radius - tyre_radius + np.sqrt(tyre_radius**2 - across**2)
        ground = wheel_radius - deflection
        return np.sqrt(max(radius**2 - ground**2, 0.0))

    edge = brentq(
        lambda across: tyre_radius - np.sqrt(tyre_radius**2 - across**2) - deflection,
        0.0,
        tyre_radius,
    )
    angle = np.linspace(0.0, np.pi / 2, 401)  # denser towards the edge, where it is steep
    across = edge * np.sin(angle)
    length = [half_length(position) for position in across]
    area = 4.0 * np.trapezoid(length, across)
    # The flat ellipse is the first term in z; at 0.1 mm the rest is about z/ρ.
    assert_allclose(
        membrane_stiffness(pressure, wheel_radius, tyre_radius),
        pressure * area / deflection,
        rtol=5e-3,
    )
