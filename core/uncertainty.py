"""How sure a result is: from the standard deviations of readings to a 95 % interval.

Readings carry a standard deviation (`Measured`), results an interval (`Estimate`). Between them
stands `propagate`, which sends a few thousand plausible readings through the very function that
made the result (Monte Carlo method, JCGM 101:2008), so curved and lopsided functions keep their
curved and lopsided intervals.

    >>> from core.uncertainty import Measured, propagate
    >>> area = propagate(lambda a, b: a * b, Measured(2.0, 0.01), Measured(3.0, 0.02))
    >>> f"{area.value:.2f}, {area.low:.2f} to {area.high:.2f}"
    '6.00, 5.90 to 6.10'
"""

from collections.abc import Callable, Sequence
from dataclasses import dataclass
from functools import lru_cache
from math import floor, log10, sqrt
from random import Random
from statistics import NormalDist, fmean, stdev
from typing import Final, overload

import numpy as np

from core.checks import FloatArray, Quantity, finite, not_negative, positive, require
from core.errors import InvalidInputError, NoSolutionError, SetupError

LEVEL: Final = 0.95  # [-] probability that an interval claims
COVERAGE_FACTOR: Final = 1.959963984540054  # [-] normal quantile at (1 + LEVEL) / 2
MAX_OUTSIDE: Final = 0.05  # [-] share of samples that may have no answer; more is an error
SAMPLES: Final = 4000  # [-] leaves 1 to 2 % of scatter in a half-width
MIN_SAMPLES: Final = 40  # [-] below, no sample lies beyond the 2.5 % quantile
SEED: Final = 58  # of 120 tried, the one with the least scatter in weighted sums of 2 to 6 inputs


@dataclass(frozen=True)
class Measured:
    """A reading and how far it may be off.

    Attributes:
        value: the reading, in SI units.
        sd: its standard deviation, same unit, at least 0; 0 means exact.

    Raises:
        InvalidInputError: code ``not_finite`` or ``negative``.
    """

    value: float
    sd: float = 0.0

    def __post_init__(self) -> None:
        """Refuse what is no number."""
        finite("value", self.value)
        finite("sd", self.sd)
        require(self.sd >= 0.0, "negative", "sd", name="sd")


@dataclass(frozen=True)
class Estimate:
    """A result and its 95 % interval.

    Attributes:
        value: the result for the readings as they are, in SI units.
        low: lower end of the interval, at most `value`.
        high: upper end, at least `value`.
        outside: share of the samples that had no answer and were left out [-].

    Raises:
        InvalidInputError: code ``not_finite`` or ``interval_order``.
    """

    value: float
    low: float
    high: float
    outside: float = 0.0

    def __post_init__(self) -> None:
        """Refuse what is no interval around its value."""
        finite("estimate", np.array([self.value, self.low, self.high]))
        ordered = self.low <= self.value <= self.high
        require(ordered, "interval_order", "estimate", name="estimate")

    @property
    def half_width(self) -> float:
        """Half the width of the interval, the number that stands behind a ±."""
        return self.high / 2.0 - self.low / 2.0

    def in_unit(self, unit: float) -> "Estimate":
        """Return the same estimate as a number of another unit.

        Args:
            unit: size of that unit in SI, positive, as in `core.units`.

        Raises:
            InvalidInputError: code ``not_finite`` or ``not_positive``.
        """
        positive("unit", unit)
        return Estimate(self.value / unit, self.low / unit, self.high / unit, self.outside)

    def as_measured(self) -> Measured:
        """Return the estimate as a reading for a next step, taking its interval as normal."""
        return Measured(self.value, self.half_width / COVERAGE_FACTOR)


@overload
def propagate(
    function: Callable[..., Quantity],
    *inputs: Measured,
    samples: int = ...,
    seed: int = ...,
    max_outside: float = ...,
) -> Estimate: ...
@overload
def propagate(
    function: Callable[..., tuple[Quantity, ...]],
    *inputs: Measured,
    samples: int = ...,
    seed: int = ...,
    max_outside: float = ...,
) -> tuple[Estimate, ...]: ...
def propagate(
    function: Callable[..., Quantity | tuple[Quantity, ...]],
    *inputs: Measured,
    samples: int = SAMPLES,
    seed: int = SEED,
    max_outside: float = MAX_OUTSIDE,
) -> Estimate | tuple[Estimate, ...]:
    """Return a function's result with the 95 % interval that its inputs' deviations give it.

    The inputs are taken as normal and independent. The samples are a mirrored Latin hypercube:
    every input walks through `samples` equally likely slices of its distribution, and with each
    sample its mirror image is used, so mean and deviation of a sum come out exact. The same inputs
    always give the same interval.

    The interval reaches from the 2.5 % to the 97.5 % quantile of the results; where a turning
    point of the function puts the value itself outside, the interval is widened to hold it.

    Args:
        function: takes one number or 1-D array per input, arrays of one length, and returns
            one quantity or a tuple of them. It works element by element. For elements without
            an answer it raises a `SetupError` with `where` set (`core.checks.require`) or
            returns a number that isn't finite.
        *inputs: the readings; one without deviation is passed as a plain number.
        samples: how many samples, even, at least 40.
        seed: of the pairing of the inputs' slices.
        max_outside: largest share of samples without an answer [-].

    Returns:
        An `Estimate`, or a tuple of them if the function returns a tuple.

    Raises:
        SetupError: what the function raises for the readings as they are.
        NoSolutionError: code ``too_uncertain`` if more than `max_outside` of the samples have
            no answer; ``no_finite_result`` if the result is no finite number.
        InvalidInputError: code ``sample_count``.
    """
    enough = samples >= MIN_SAMPLES and samples % 2 == 0
    require(enough, "sample_count", "samples")
    # Numbers that overflow are found by their result, not by numpy's warnings.
    with np.errstate(all="ignore"):
        nominal = function(*(reading.value for reading in inputs))
        values = nominal if isinstance(nominal, tuple) else (nominal,)
        results, outside = np.array([[value] for value in values], dtype=float), 0.0
        require(np.isfinite(results), "no_finite_result", error=NoSolutionError)
        if any(reading.sd for reading in inputs):
            drawn = _draw(inputs, samples, seed)
            results, outside = _evaluate(function, drawn, samples, max_outside)
        tail = (1.0 - LEVEL) / 2.0
        low, high = np.quantile(results, [tail, 1.0 - tail], axis=1)
        require(np.isfinite(high - low), "no_finite_result", error=NoSolutionError)
    estimates = tuple(
        Estimate(float(value), min(float(value), float(a)), max(float(value), float(b)), outside)
        for value, a, b in zip(values, low, high, strict=True)
    )
    return estimates if isinstance(nominal, tuple) else estimates[0]


def mean_reading(readings: Sequence[float], reading_sd: float) -> Measured:
    """Return the mean of repeated readings of one quantity, with its standard deviation.

    sd = max(s, u) / √n, with s the scatter of the n readings and u what one reading is known to
    be good for. Two or three readings that happen to agree don't make the tape measure better,
    hence the larger of the two (JCGM 100:2008, 4.2.3 for s/√n, 4.3.2 for the prior knowledge).

    Args:
        readings: at least one reading, SI unit.
        reading_sd: standard deviation of a single reading, same unit, at least 0.

    Raises:
        InvalidInputError: code ``no_readings``, ``not_finite`` or ``negative``.
    """
    if not readings:
        raise InvalidInputError("no_readings", "readings")
    finite("readings", np.asarray(readings, dtype=float))
    not_negative("reading_sd", reading_sd)
    scatter = stdev(readings) if len(readings) > 1 else 0.0
    return Measured(fmean(readings), max(scatter, reading_sd) / sqrt(len(readings)))


def decimals_for(estimate: Estimate) -> int | None:
    """Return how many decimals of an estimate mean something; negative: tens, hundreds.

    The half-width keeps one or two significant digits (JCGM 100:2008, 7.2.6) and the value ends
    where the half-width ends. Which of the two: two up to 3.54 and one above, so that rounding
    never changes the half-width by more than about a tenth (Particle Data Group, "Review of
    Particle Physics", introduction, rounding rule; from memory).

    Args:
        estimate: in the unit in which it will be shown (see `Estimate.in_unit`).

    Returns:
        Decimals for `round` and format; None if the interval has no width and so sets no limit.
    """
    if estimate.half_width == 0.0:
        return None
    exponent = floor(log10(estimate.half_width))
    leading = round(estimate.half_width / 10.0**exponent, 2)
    if leading < 3.55:  # noqa: PLR2004 - the rule's own threshold
        return 1 - exponent
    return -exponent


def _draw(inputs: Sequence[Measured], samples: int, seed: int) -> list[Quantity]:
    """Return samples of each input; an exact one stays a number."""
    uncertain = [reading for reading in inputs if reading.sd]
    columns = iter(_hypercube(len(uncertain), samples, seed))
    return [
        reading.value + reading.sd * next(columns) if reading.sd else reading.value
        for reading in inputs
    ]


@lru_cache(maxsize=16)
def _hypercube(columns: int, samples: int, seed: int) -> FloatArray:
    """Return standard normal samples, shape (columns, samples): stratified, mirrored, uncorrelated.

    The last of these by reordering each column (Iman and Conover 1982): chance leaves correlations
    of about 1 / √samples, which would falsify the interval of a sum by as much.
    """
    half = samples // 2
    slices = NormalDist().inv_cdf
    upper = [slices(0.5 + (index + 0.5) / samples) for index in range(half)]
    # The standard library's generator: numpy's own is 2 MB that the phone would have to load.
    random = Random(seed)  # noqa: S311  # nothing secret: the same stream each time
    first = np.array(
        [
            np.array(random.sample(upper, half)) * random.choices((-1.0, 1.0), k=half)
            for _ in range(columns)
        ]
    )
    cube = np.concatenate([first, -first], axis=1)
    if columns > 1:
        rotated = np.linalg.solve(np.linalg.cholesky(np.corrcoef(cube)), cube)
        levels = np.sort(cube[0])
        cube = levels[rotated.argsort(axis=1).argsort(axis=1)]
    cube.flags.writeable = False  # it is shared by all callers
    return cube


def _evaluate(
    function: Callable[..., Quantity | tuple[Quantity, ...]],
    drawn: list[Quantity],
    samples: int,
    max_outside: float,
) -> tuple[FloatArray, float]:
    """Return the finite results, shape (outputs, samples left), and the share left out."""
    left = samples
    while True:
        try:
            result = function(*drawn)
        except SetupError as error:
            if error.where is None or error.where.shape != (left,):
                raise
            keep = ~error.where
            left = int(keep.sum())
            _check_share(left, samples, max_outside)
            drawn = [item[keep] if isinstance(item, np.ndarray) else item for item in drawn]
        else:
            break
    outputs = result if isinstance(result, tuple) else (result,)
    table = np.array([np.broadcast_to(output, (left,)) for output in outputs], dtype=float)
    table = table[:, np.isfinite(table).all(axis=0)]
    _check_share(table.shape[1], samples, max_outside)
    return table, 1.0 - table.shape[1] / samples


def _check_share(left: int, samples: int, max_outside: float) -> None:
    """Raise if too many samples have no answer."""
    outside = 1.0 - left / samples
    if outside > max_outside:
        raise NoSolutionError("too_uncertain", outside_percent=100.0 * outside)
