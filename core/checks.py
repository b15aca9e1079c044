"""Range checks shared by all topics: one way to refuse an input, for scalars and arrays alike.

An error raised here knows which elements of an array are at fault (`SetupError.where`). That is
how `core.uncertainty.propagate` can drop the few samples of a broad distribution that fall
outside a function's domain, count them, and go on with the others.
"""

from typing import Final, TypeAlias

import numpy as np
from numpy.typing import ArrayLike, NDArray

from core.errors import InvalidInputError, SetupError

FloatArray: TypeAlias = NDArray[np.float64]
Quantity: TypeAlias = float | FloatArray
"""A number or an array of numbers; functions of several quantities broadcast them."""

SMALLEST: Final = 1e-12  # [SI unit] a positive quantity below is a slip, not a bicycle's
LARGEST: Final = 1e12  # [SI unit] likewise above; products of several stay far from overflow


def require(
    valid: ArrayLike,
    code: str,
    field: str | None = None,
    error: type[SetupError] = InvalidInputError,
    **data: Quantity | str,
) -> None:
    """Raise an error unless a condition holds everywhere.

    Args:
        valid: the condition, a boolean or an array of them.
        code: key of `core.messages.MESSAGES`.
        field: name of the parameter to look at first.
        error: class to raise.
        **data: the numbers of the sentence in SI; of an array, the first one at fault is told.

    Raises:
        SetupError: of the class `error`, with `where` set to the elements at fault.
    """
    fault = np.logical_not(valid)
    if not fault.any():
        return
    told = {
        key: item if isinstance(item, str) else _first(item, fault) for key, item in data.items()
    }
    raised = error(code, field, **told)
    raised.where = fault
    raise raised


def finite(name: str, value: Quantity) -> Quantity:
    """Return a quantity after checking that it is a finite number everywhere.

    Args:
        name: the parameter's name, for the message.
        value: any quantity.

    Raises:
        InvalidInputError: code ``not_finite``.
    """
    require(np.isfinite(value), "not_finite", name, name=name)
    return value


def bounded(name: str, value: Quantity) -> Quantity:
    """Return a quantity of either sign after checking that its size is one of a bike's.

    Args:
        name: the parameter's name, for the message.
        value: any quantity up to `LARGEST` of its SI unit, either sign.

    Raises:
        InvalidInputError: code ``not_finite`` or ``beyond_any_bike``.
    """
    finite(name, value)
    require(np.less_equal(np.abs(value), LARGEST), "beyond_any_bike", name, name=name)
    return value


def positive(name: str, value: Quantity) -> Quantity:
    """Return a quantity after checking that it is finite and greater than zero everywhere.

    Args:
        name: the parameter's name, for the message.
        value: any quantity; between `SMALLEST` and `LARGEST` of its SI unit.

    Raises:
        InvalidInputError: code ``not_finite``, ``not_positive`` or ``beyond_any_bike``.
    """
    bounded(name, value)
    require(np.greater(value, 0.0), "not_positive", name, name=name)
    require(np.greater_equal(value, SMALLEST), "beyond_any_bike", name, name=name)
    return value


def not_negative(name: str, value: Quantity) -> Quantity:
    """Return a quantity after checking that it is finite and at least zero everywhere.

    Args:
        name: the parameter's name, for the message.
        value: any quantity up to `LARGEST` of its SI unit.

    Raises:
        InvalidInputError: code ``not_finite``, ``negative`` or ``beyond_any_bike``.
    """
    bounded(name, value)
    require(np.greater_equal(value, 0.0), "negative", name, name=name)
    return value


def _first(item: Quantity, fault: NDArray[np.bool_]) -> float:
    """Return the first element at fault."""
    return float(np.broadcast_to(item, fault.shape)[fault][0])
