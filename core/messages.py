"""The sentences of the core, by code.

A placeholder is named after a quantity with its SI unit (``{travel_m}``); `sentence` fills it
through ``show``, so the app can put the same sentence in millimetres or inches. Each sentence
says what is wrong and what to do next.
"""

from collections.abc import Callable, Mapping
from typing import Final

MESSAGES: Final[dict[str, str]] = {
    # Inputs in general
    "not_finite": "{name} is not a number: enter it again.",
    "not_positive": "{name} must be greater than zero.",
    "negative": "{name} must not be negative.",
    "beyond_any_bike": "{name} is far beyond anything on a bike: check the unit.",
    # Uncertainty
    "too_uncertain": (
        "Within their ±, {outside_percent} of the readings allow no answer: measure more closely."
    ),
    "no_finite_result": "These numbers are too large or too small to compute with: check units.",
    "interval_order": "{name} must run from low over value to high.",
    "sample_count": "The number of samples must be even and at least 40.",
    "no_readings": "Enter at least one reading.",
    # Oscillator
    "undamped_resonance": (
        "Without damping the movement at resonance grows without limit: enter a damping ratio."
    ),
    "not_underdamped": "A damping ratio of {damping_ratio} swings no more: it must be below 1.",
    "overshoot_range": (
        "The overshoot must be more than nothing and less than the push: measure both from the "
        "sag mark. No overshoot at all means a damping ratio of about 0.8 or more."
    ),
    # Rebound
    "too_quick": (
        "It passed the mark sooner than this spring can throw it even without damping: count the "
        "frames again, or check the frequency."
    ),
    "passes_late": (
        "It passed the mark so late that it hardly passed at all: enter that it did not pass."
    ),
    "friction_range": (
        "Friction holds the wheel against at least half of the push: push further, and have seals "
        "and bushings looked at."
    ),
    "friction_stops_it": (
        "With this much friction it should have stopped before the mark: read the two-sided sag "
        "and the frames again."
    ),
    "timing_too_coarse": (
        "A time that is good to ±{timing_s} cannot tell slow rebound from fast here: film it at "
        "120 frames per second or more, or measure how far it overshoots the sag mark."
    ),
    "overshoot_beyond_sag": (
        "The overshoot reaches the sag of {sag_m}, so the suspension topped out: push less far."
    ),
    "friction_unknown": (
        "Friction is not measured, so the damping ratio may read too high (by about 0.05 for each "
        "20th of the push that friction holds): read the sag from both sides."
    ),
    "damping_open_low": "The readings cannot exclude hardly any damping at all.",
    "damping_open_high": "The readings cannot tell how much more damping there is.",
    "band_order": "The band must run from a lower to a higher damping ratio, both below 1.",
    "damping_target": "The damping ratio to aim at must lie between 0 and 1.",
    "clicks_no_effect": (
        "The two settings cannot be told apart within their ±: try two that lie further apart."
    ),
    "clicks_wrong_way": (
        "There was more damping with the adjuster further open: check that clicks are counted "
        "from fully closed, and that the two readings are not swapped."
    ),
    "clicks_step": (
        "The target lies far outside the two settings tried: make this step, measure again."
    ),
    "adjuster_end": "The adjuster ends before the target: have the damper looked at or retuned.",
    # Trail
    "residual_range": "The share of a bump that may be left must lie between 0 and 1.",
    "crossover_order": "The crossover must run from a lower to a higher shaft speed.",
    "packing_indication": (
        "Recovery between bumps is an indication only: it holds for more than three bumps per "
        "swing of the body and a rebound damping ratio of at least 0.5."
    ),
    "wheel_leaves_ground": (
        "At this speed the wheel cannot follow the bumps and leaves the ground at their crests: "
        "mean position and recovery are indications only."
    ),
    "wheel_may_leave_ground": "Within the ± the wheel may leave the ground at the crests.",
    "stroke_bottoms": (
        "The stroke needs more than the {room_m} of travel left: the suspension would bottom out."
    ),
    "stroke_tops_out": (
        "The stroke needs more than the {room_m} that it can extend: the suspension would top out."
    ),
    "damping_uneven": (
        "Rebound and compression damping differ by more than 4 to 1: amplitudes may be off by "
        "more than 5 percent."
    ),
    # Balance
    "sag_band_order": "A sag target must run from a lower to a higher share of the travel.",
    # Atmosphere
    "altitude_range": "Altitude {altitude_m} is outside −500 to 11 000 m: check the unit.",
    # Bounce test
    "taps_not_increasing": "Taps must come in the order in which they were made.",
    "too_many_taps": "A bounce test has at most 500 taps: start again.",
    "taps_every": "Tap at every bottom or at every second one.",
    "bounce_few_taps": "Tap at every bottom.",
    "bounce_more_taps": "Steady so far: {more} more taps.",
    "bounce_wide": "A few more taps make it sure.",
    "bounce_unclear": "The beat count is unclear: tap each bottom, once.",
    "bounce_no_rhythm_yet": "The rhythm isn't clear yet: let the bike set it.",
    "bounce_restart": "There was a pause: counting from the restart.",
    "bounce_done": "That is enough.",
    "bounce_unsteady": "The taps have no steady rhythm: let the bike set it, then start again.",
    "bounce_accidents": "Too many missed or doubled taps: start again, one tap a bottom.",
    "bounce_frequency": "No bike bounces like that: tap at every bottom, and start again.",
    "bounce_no_success": "Thirty taps and still unsure: rest, then start again.",
    # Geometry and springs
    "head_angle": "A head angle lies between 55 and 80 degrees from the horizontal.",
    "leverage": "A leverage lies between 0.5 and 6 (wheel travel per shock stroke).",
    "progression": "A progression lies between -50 and 60 %.",
    "beyond_travel": (
        "Sag must lie between nothing and the full {full_m}: check whether shaft or wheel was read."
    ),
    "stroke_disagrees": (
        "Travel, leverage and stroke disagree: the stroke should be {follows_m}, not {printed_m}."
    ),
    "coil_binds": "The coil touches before this sag: use a longer or stiffer one.",
    "coil_shape": "The mean diameter must be more than two wires: outer diameter less one wire.",
    "air_end": "That is at the very end of the air spring, where no formula holds.",
    "area_ratio": "The negative side has half to all of the piston's area.",
    "exponent": "The exponent of air lies between 1 and 1.4.",
    "joined_at": "The chambers join near full extension: within a quarter of the chamber's length.",
    "steepness": "The steepness of a spring lies between 0.1 and 10; that of a coil is 1.",
    "temperature": "That temperature is no riding weather: check the unit.",
    "no_pressure_left": "No pressure would be left on the gauge: check the readings.",
    "hose_filled": (
        "The reading dropped because the pump's hose filled; the hiss on taking it off is the "
        "hose's air. Set the pressure with the pump attached."
    ),
    "pressure_lost": (
        "More air is gone than the pump's hose explains: don't ride it before the leak is found."
    ),
    "topped_out": (
        "The spring carries more than the load even when extended: reduce pressure or preload."
    ),
    "bottomed": "The spring can't carry the load within its stroke: stiffer spring, more pressure.",
    "unstable": "At this sag the linkage would give way under the spring: check the leverage.",
    # Sag and the change to make
    "sag_range": (
        "Sag must lie between nothing and the travel of {travel_m}: check whether shaft or wheel "
        "was read."
    ),
    "sag_unusual": "Outside the usual range: check the units, and where it was read.",
    "sag_swapped": "Settled from above is the smaller sag: readings swapped, or the mark moved.",
    "high_friction": "High friction: bushings, seals or posture. Read from both sides.",
    "no_pressure": "No pressure is low enough for this sag: change the spring or the target.",
    "above_limit": "The pressure is already above the printed maximum of {limit_pa}: let air out.",
    "beyond_limit": (
        "The target needs more than the printed maximum of {limit_pa}. Never go beyond it: a "
        "volume spacer or another spring is needed."
    ),
    "limit_unknown": "Check this against the maximum printed on the unit before you pump.",
    "limit_near": (
        "The ± reaches past the printed maximum of {limit_pa}: stop there, whatever the sag."
    ),
    "large_step": "A large change: make this much, measure again, and go on from there.",
    "within_doubt": "Sag and target can't be told apart within the ±: leave it, or read again.",
    "equalise": (
        "After the change cycle slowly through the first third of travel a few times, wait a "
        "minute, then measure."
    ),
    "no_coil_fits": "No coil at hand reaches the target with little preload; this is the nearest.",
    "readings_too_close": (
        "The two pressures are too close to tell the chamber's length: go on from the latest "
        "reading, by one more small step."
    ),
    "no_chamber": (
        "These readings don't tell the chamber's length: go on from the latest one, by one more "
        "small step."
    ),
}

_SUFFIX_UNITS: Final = {
    "m": "m",
    "pa": "Pa",
    "npm": "N/m",
    "n": "N",
    "kg": "kg",
    "hz": "Hz",
    "s": "s",
    "mps": "m/s",
    "deg": "°",
    "percent": "%",
}


def show_si(key: str, value: float | str) -> str:
    """Return a value as text with the SI unit that the last part of its key names.

    Args:
        key: name of the quantity, its unit at the end (``travel_m``).
        value: the quantity; text stays as it is.
    """
    if isinstance(value, str):
        return value
    unit = _SUFFIX_UNITS.get(key.rpartition("_")[2])
    return f"{value:.4g} {unit}" if unit else f"{value:.4g}"


def sentence(
    code: str,
    data: Mapping[str, float | str],
    show: Callable[[str, float | str], str] = show_si,
) -> str:
    """Return the sentence for a code with its data filled in.

    Args:
        code: a key of `MESSAGES`.
        data: values for the placeholders, by name.
        show: turns a placeholder's name and value into text.

    Raises:
        KeyError: unknown code or missing data: a bug in the caller, not in a person's input.
    """
    return MESSAGES[code].format(**{key: show(key, value) for key, value in data.items()})
