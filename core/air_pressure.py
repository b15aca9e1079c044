"""What a shock pump's gauge shows, and why it shows something else a day or a summit later."""

from typing import Final

import numpy as np

from core.checks import Quantity, positive, require
from core.constants import STANDARD_PRESSURE
from core.errors import NoSolutionError, Note
from core.uncertainty import Measured, propagate

TEMPERATURES: Final = (210.0, 420.0)  # [K] of any weather, and of any damper that still works
HOSE: Final = Measured(3e-6, 0.5e-6)  # [m³] of a shock pump's hose and gauge; no source


def pressure_after(
    pressure: Quantity,
    temperature_before: Quantity,
    temperature_after: Quantity,
    ambient_before: Quantity = STANDARD_PRESSURE,
    ambient_after: Quantity = STANDARD_PRESSURE,
) -> Quantity:
    """Return what the gauge shows after a sealed spring got warmer, colder, or higher up.

    P₂ = (P₁ + Pₐ₁) T₂/T₁ − Pₐ₂

    With altitude alone only the gauge changes: the air inside stays as it is, and with it the
    spring, but for what the outside pushes on the rod. Setting the number from the valley again
    would make it softer.

    Args:
        pressure: P₁, on the gauge before [Pa], positive.
        temperature_before: T₁, of the air inside [K].
        temperature_after: T₂ [K].
        ambient_before: Pₐ₁, outside [Pa]; see `core.atmosphere.pressure_at`.
        ambient_after: Pₐ₂ [Pa].

    Returns:
        P₂ on the gauge [Pa], shapes broadcast.

    Raises:
        InvalidInputError: code ``not_finite``, ``not_positive`` or ``temperature``.
        NoSolutionError: code ``no_pressure_left``.

    Source: ideal gas of constant volume.
    """
    for name, temperature in (
        ("temperature_before", temperature_before),
        ("temperature_after", temperature_after),
    ):
        low, high = TEMPERATURES
        within = np.less_equal(low, temperature) & np.less_equal(temperature, high)
        require(within, "temperature", name)
    inside = positive("pressure", pressure) + positive("ambient_before", ambient_before)
    ambient_after = positive("ambient_after", ambient_after)
    gauge = inside * (temperature_after / temperature_before) - ambient_after
    require(np.greater(gauge, 0.0), "no_pressure_left", "pressure", NoSolutionError)
    return gauge


def hose_drop(pressure: Quantity, volume: Quantity, hose: Quantity) -> Quantity:
    """Return how much the gauge falls when a pump's empty hose fills from the spring.

    ΔP = P V_h / (V + V_h)

    It isn't a leak, and the hiss when the pump comes off is the hose's air, not the spring's.

    Args:
        pressure: P, on the gauge before [Pa], positive.
        volume: V, of the spring's positive chamber [m³], positive.
        hose: V_h, of hose and gauge [m³], positive.

    Returns:
        ΔP [Pa], shapes broadcast.

    Raises:
        InvalidInputError: code ``not_finite``, ``not_positive`` or ``beyond_any_bike``.

    Source: Boyle's law; the hose is at the pressure outside before, so gauge pressures do.
    """
    volume, hose = positive("volume", volume), positive("hose", hose)
    return positive("pressure", pressure) * (hose / (volume + hose))


def judge_drop(
    before: Measured, after: Measured, volume: Measured, hose: Measured = HOSE
) -> Note | None:
    """Return why the gauge shows less when the pump is put on again.

    Args:
        before: pressure that was set [Pa].
        after: pressure that is read now [Pa].
        volume: of the spring's positive chamber [m³]; about 60 ml of a shock, 200 ml of a fork.
        hose: of hose and gauge [m³].

    Returns:
        Note ``pressure_lost`` where the drop is clearly more than the hose explains,
        ``hose_filled`` where the hose may explain it, None where there is no clear drop.

    Raises:
        InvalidInputError: code ``not_finite``, ``not_positive`` or ``beyond_any_bike``.
        NoSolutionError: code ``too_uncertain``.
    """

    def drops(
        before: Quantity, after: Quantity, volume: Quantity, hose: Quantity
    ) -> tuple[Quantity, Quantity]:
        drop = positive("before", before) - positive("after", after)
        return drop, drop - hose_drop(before, volume, hose)

    drop, unexplained = propagate(drops, before, after, volume, hose)
    if unexplained.low > 0.0:
        return Note("pressure_lost")
    return Note("hose_filled") if drop.low > 0.0 else None
