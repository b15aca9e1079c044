"""Parts of a bike that are only known so far, and results that carry that doubt.

A `Part` is how to build something and the readings to build it from. `propagate_parts` builds it
anew for each plausible set of readings:

    >>> from core.linkage import Linkage
    >>> from core.parts import Part, propagate_parts
    >>> from core.uncertainty import Measured
    >>> rear = Part.of(Linkage.from_stroke, 0.150, 0.055, Measured(0.15, 0.05))
    >>> sag = propagate_parts(lambda path, s: path.wheel_travel(s), rear, Measured(0.0165, 0.0005))
    >>> f"{1e3 * sag.value:.1f} mm, {1e3 * sag.low:.1f} to {1e3 * sag.high:.1f} mm"
    '47.6 mm, 44.4 to 51.0 mm'
"""

from collections.abc import Callable
from dataclasses import dataclass
from typing import Any, Generic, TypeVar, overload

from core.checks import Quantity
from core.uncertainty import Estimate, Measured, propagate

Thing = TypeVar("Thing")
Built_co = TypeVar("Built_co", covariant=True)


@dataclass(frozen=True)
class Part(Generic[Built_co]):
    """A part of a bike as far as it is known.

    Attributes:
        build: makes it from one number per reading, or from one array per reading.
        readings: what it is built from.
    """

    build: Callable[..., Built_co]
    readings: tuple[Measured, ...]

    @classmethod
    def of(cls, build: Callable[..., Built_co], *readings: Measured | float) -> "Part[Built_co]":
        """Return a part; a plain number is an exact reading.

        Args:
            build: makes it from one number per reading, or from one array per reading.
            *readings: what to build it from, in the order of its parameters.

        Raises:
            InvalidInputError: code ``not_finite``.
        """
        return cls(build, tuple(as_measured(reading) for reading in readings))

    @property
    def nominal(self) -> Built_co:
        """The part as the readings have it."""
        return self.build(*(reading.value for reading in self.readings))


def as_measured(reading: Measured | float) -> Measured:
    """Return a reading; a plain number is an exact one.

    Args:
        reading: any reading.

    Raises:
        InvalidInputError: code ``not_finite``.
    """
    return reading if isinstance(reading, Measured) else Measured(reading)


def nominal(thing: Thing | Part[Thing]) -> Thing:
    """Return a thing as the readings have it, whether it is a `Part` or known exactly.

    Args:
        thing: a part, or the thing itself.
    """
    return thing.nominal if isinstance(thing, Part) else thing


@overload
def propagate_parts(function: Callable[..., Quantity], *things: object) -> Estimate: ...
@overload
def propagate_parts(
    function: Callable[..., tuple[Quantity, ...]], *things: object
) -> tuple[Estimate, ...]: ...
def propagate_parts(
    function: Callable[..., Quantity | tuple[Quantity, ...]],
    *things: object,
) -> Estimate | tuple[Estimate, ...]:
    """Return a function's result with the 95 % interval that its parts and readings give it.

    Args:
        function: takes one argument for each thing: of a `Part` what it builds, of a `Measured` a
            number or an array, of anything else the thing itself.
        *things: parts, readings, and what is known exactly.

    Returns:
        As `core.uncertainty.propagate`, which does the work.

    Raises:
        SetupError: as `core.uncertainty.propagate` does.
    """
    parts = [_as_part(thing) for thing in things]

    def assembled(*numbers: Quantity) -> Any:  # noqa: ANN401 - one quantity or several
        left = iter(numbers)
        built = [part.build(*(next(left) for _ in part.readings)) for part in parts]
        return function(*built)

    readings = (reading for part in parts for reading in part.readings)
    result: Estimate | tuple[Estimate, ...] = propagate(assembled, *readings)
    return result


def _as_part(thing: object) -> Part[Any]:
    """Return a reading, or what is known exactly, as a part."""
    if isinstance(thing, Part):
        return thing
    if isinstance(thing, Measured):
        return Part(lambda number: number, (thing,))
    return Part(lambda: thing, ())
