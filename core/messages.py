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
    # Uncertainty
    "too_uncertain": (
        "Within their ±, {outside_percent} of the readings allow no answer: measure more closely."
    ),
    "no_finite_result": "These numbers are too large or too small to compute with: check units.",
    "interval_order": "{name} must run from low over value to high.",
    "sample_count": "The number of samples must be even and at least 40.",
    "no_readings": "Enter at least one reading.",
    # Atmosphere
    "altitude_range": "Altitude {altitude_m} is outside −500 to 11 000 m: check the unit.",
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
    """Return a value as text with the SI unit that the last part of its key names."""
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
