"""What records are made of: numbers with their units and short texts, checked as they are read."""

import math
from typing import Any, Final

from mobileapp.units import UNITS, Amount

_LONGEST_TEXT: Final = 200  # [characters]


class RecordError(ValueError):
    """A text that isn't a record of ours, or one of a newer format.

    Attributes:
        code: key of the sentence in `mobileapp.texts`.
    """

    def __init__(self, code: str) -> None:
        super().__init__(code)
        self.code = code


def pair(amount: Amount | None) -> list[float | str] | None:
    """Return an amount as JSON has it."""
    return None if amount is None else [amount.value, amount.unit]


def to_amount(value_and_unit: Any) -> Amount:  # noqa: ANN401 - straight from JSON
    """Return the amount that JSON has."""
    value, unit = value_and_unit
    check(unit in UNITS)
    return Amount(to_number(value), unit)


def to_number(value: Any) -> float:  # noqa: ANN401 - straight from JSON
    """Return a finite number."""
    check(isinstance(value, int | float) and not isinstance(value, bool) and math.isfinite(value))
    return float(value)


def to_text(value: Any) -> str:  # noqa: ANN401 - straight from JSON
    """Return a text that isn't endless."""
    check(isinstance(value, str) and len(value) <= _LONGEST_TEXT)
    return str(value)


def check(valid: bool, code: str = "record.damaged") -> None:  # noqa: FBT001 - reads as a sentence
    """Refuse what is no record of ours."""
    if not valid:
        raise RecordError(code)
