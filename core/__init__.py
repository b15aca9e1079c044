"""Mechanics of sag, springs, frequency and rebound for suspension set-up.

The names below are the whole of it for everyday use; each is loaded when it is first asked for, so
that units, errors and messages are there at once, before numpy is. All quantities are in SI units.

A fork has sunk 32 mm of 150, and ten taps were made at the bottoms of a bounce:

    >>> import core
    >>> from core.units import DEGREE, MM
    >>> read, travel = core.Measured(32 * MM, 1 * MM), core.Measured(150 * MM)
    >>> sag = core.propagate(core.sag_share, read, travel)
    >>> f"{sag.value:.0%}, {sag.low:.0%} to {sag.high:.0%}"
    '21%, 20% to 23%'
    >>> fork, coil = core.Fork(150 * MM, 65 * DEGREE), core.Coil(8000.0)
    >>> f"{core.loaded_frequency(coil, fork, 32 * MM):.2f} Hz"
    '2.93 Hz'
    >>> taps = [0.00, 0.43, 0.85, 1.29, 1.70, 2.13, 2.57, 2.98, 3.41, 3.84]
    >>> bounce = core.estimate_bounce(taps)
    >>> f"{bounce.state}: {bounce.frequency_hz:.2f} Hz"
    'done: 2.35 Hz'
"""

from importlib import import_module
from typing import TYPE_CHECKING, Final

if TYPE_CHECKING:
    from core.air_pressure import hose_drop, judge_drop, pressure_after
    from core.air_spring import AirSpring, Chambers
    from core.atmosphere import pressure_at
    from core.balance import Balance, Comparison, EndState, compare_ends
    from core.bounce import BounceEstimate, estimate_bounce
    from core.clicks import ClickAdvice, TriedSetting, clicks_for_damping
    from core.coil import Coil, coil_rate, unmarked_coil
    from core.coil_change import CoilChange, change_coil, preload_for_stroke, rate_for_stroke
    from core.errors import InvalidInputError, NoSolutionError, Note, SetupError
    from core.geometry import Fork, WheelPath
    from core.linkage import Linkage, stroke_disagreement
    from core.oscillator import (
        damped_frequency,
        damping_coefficient,
        damping_from_overshoot,
        deflection_from_frequency,
        free_response,
        frequency_from_deflection,
        frequency_from_stiffness,
        overshoot_from_damping,
        peak_after_impulse,
        stiffness_from_frequency,
        stroke_ratio,
        transmissibility,
        undamped_frequency,
    )
    from core.packing import interval_for, packed_share, recovered_share
    from core.parts import Part, propagate_parts
    from core.pressure_change import PressureChange, change_pressure, pressure_for_stroke
    from core.rebound import (
        crossing_time,
        damping_from_crossing,
        damping_from_release,
        settling_time,
        wheel_return_time,
    )
    from core.release import (
        Damping,
        ReboundAdvice,
        advise,
        damping_by_overshoot,
        damping_by_time,
        damping_if_not_passed,
        time_from_frames,
    )
    from core.sag import (
        frequency_from_sag,
        mean_sag,
        sag_depth,
        sag_notes,
        sag_share,
        share_of_travel,
    )
    from core.springs import (
        Spring,
        frequency_with_mass,
        loaded_frequency,
        static_wheel_rate,
        stroke_under,
        vibration_wheel_rate,
        wheel_load,
    )
    from core.trail import Bumps, End, Passage, following_limit, ride
    from core.two_sided import TwoSided, one_sided_sd, two_sided_sag
    from core.tyre import (
        membrane_stiffness,
        series_stiffness,
        tyre_frequency_factor,
        wheel_hop_frequency,
    )
    from core.uncertainty import Estimate, Measured, decimals_for, mean_reading, propagate
    from core.uneven import least_contact, mean_damping, mean_drop
    from core.unknown import common_air_spring, common_chambers, common_fork, common_linkage
    from core.waves import (
        filtering_speed,
        forcing_frequency,
        peak_response_ratio,
        resonant_speed,
        sine_peaks,
    )

__all__ = [
    "AirSpring",
    "Balance",
    "BounceEstimate",
    "Bumps",
    "Chambers",
    "ClickAdvice",
    "Coil",
    "CoilChange",
    "Comparison",
    "Damping",
    "End",
    "EndState",
    "Estimate",
    "Fork",
    "InvalidInputError",
    "Linkage",
    "Measured",
    "NoSolutionError",
    "Note",
    "Part",
    "Passage",
    "PressureChange",
    "ReboundAdvice",
    "SetupError",
    "Spring",
    "TriedSetting",
    "TwoSided",
    "WheelPath",
    "advise",
    "change_coil",
    "change_pressure",
    "clicks_for_damping",
    "coil_rate",
    "common_air_spring",
    "common_chambers",
    "common_fork",
    "common_linkage",
    "compare_ends",
    "crossing_time",
    "damped_frequency",
    "damping_by_overshoot",
    "damping_by_time",
    "damping_coefficient",
    "damping_from_crossing",
    "damping_from_overshoot",
    "damping_from_release",
    "damping_if_not_passed",
    "decimals_for",
    "deflection_from_frequency",
    "estimate_bounce",
    "filtering_speed",
    "following_limit",
    "forcing_frequency",
    "free_response",
    "frequency_from_deflection",
    "frequency_from_sag",
    "frequency_from_stiffness",
    "frequency_with_mass",
    "hose_drop",
    "interval_for",
    "judge_drop",
    "least_contact",
    "loaded_frequency",
    "mean_damping",
    "mean_drop",
    "mean_reading",
    "mean_sag",
    "membrane_stiffness",
    "one_sided_sd",
    "overshoot_from_damping",
    "packed_share",
    "peak_after_impulse",
    "peak_response_ratio",
    "preload_for_stroke",
    "pressure_after",
    "pressure_at",
    "pressure_for_stroke",
    "propagate",
    "propagate_parts",
    "rate_for_stroke",
    "recovered_share",
    "resonant_speed",
    "ride",
    "sag_depth",
    "sag_notes",
    "sag_share",
    "series_stiffness",
    "settling_time",
    "share_of_travel",
    "sine_peaks",
    "static_wheel_rate",
    "stiffness_from_frequency",
    "stroke_disagreement",
    "stroke_ratio",
    "stroke_under",
    "time_from_frames",
    "transmissibility",
    "two_sided_sag",
    "tyre_frequency_factor",
    "undamped_frequency",
    "unmarked_coil",
    "vibration_wheel_rate",
    "wheel_hop_frequency",
    "wheel_load",
    "wheel_return_time",
]

_NAMES: Final = {
    "core.air_pressure": "hose_drop judge_drop pressure_after",
    "core.air_spring": "AirSpring Chambers",
    "core.atmosphere": "pressure_at",
    "core.balance": "Balance Comparison EndState compare_ends",
    "core.bounce": "BounceEstimate estimate_bounce",
    "core.clicks": "ClickAdvice TriedSetting clicks_for_damping",
    "core.coil": "Coil coil_rate unmarked_coil",
    "core.coil_change": "CoilChange change_coil preload_for_stroke rate_for_stroke",
    "core.errors": "InvalidInputError NoSolutionError Note SetupError",
    "core.geometry": "Fork WheelPath",
    "core.linkage": "Linkage stroke_disagreement",
    "core.oscillator": (
        "damped_frequency "
        "damping_coefficient "
        "damping_from_overshoot "
        "deflection_from_frequency "
        "free_response "
        "frequency_from_deflection "
        "frequency_from_stiffness "
        "overshoot_from_damping "
        "peak_after_impulse "
        "stiffness_from_frequency "
        "stroke_ratio "
        "transmissibility "
        "undamped_frequency "
    ),
    "core.packing": "interval_for packed_share recovered_share",
    "core.parts": "Part propagate_parts",
    "core.pressure_change": "PressureChange change_pressure pressure_for_stroke",
    "core.rebound": (
        "crossing_time damping_from_crossing damping_from_release settling_time wheel_return_time "
    ),
    "core.release": (
        "Damping "
        "ReboundAdvice "
        "advise "
        "damping_by_overshoot "
        "damping_by_time "
        "damping_if_not_passed "
        "time_from_frames "
    ),
    "core.sag": "frequency_from_sag mean_sag sag_depth sag_notes sag_share share_of_travel",
    "core.springs": (
        "Spring "
        "frequency_with_mass "
        "loaded_frequency "
        "static_wheel_rate "
        "stroke_under "
        "vibration_wheel_rate "
        "wheel_load "
    ),
    "core.trail": "Bumps End Passage following_limit ride",
    "core.two_sided": "TwoSided one_sided_sd two_sided_sag",
    "core.tyre": ("membrane_stiffness series_stiffness tyre_frequency_factor wheel_hop_frequency "),
    "core.uncertainty": "Estimate Measured decimals_for mean_reading propagate",
    "core.uneven": "least_contact mean_damping mean_drop",
    "core.unknown": "common_air_spring common_chambers common_fork common_linkage",
    "core.waves": (
        "filtering_speed forcing_frequency peak_response_ratio resonant_speed sine_peaks "
    ),
}
_MODULES: Final = {name: module for module, names in _NAMES.items() for name in names.split()}


def __getattr__(name: str) -> object:
    """Load a name of the façade from its module."""
    if name not in _MODULES:
        raise AttributeError(f"module {__name__!r} has no attribute {name!r}")
    return getattr(import_module(_MODULES[name]), name)
