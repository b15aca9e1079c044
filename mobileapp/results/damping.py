"""The damping of one end: as a release test measured it, or as most bikes have it."""

from dataclasses import dataclass
from typing import Final

from core.errors import SetupError
from core.uncertainty import Measured
from mobileapp.records import End, Setup
from mobileapp.results.rebound import damping_of

# Damping ratios of trail bikes; common practice, no source.
USUAL_REBOUND: Final = Measured(0.45, 0.1)  # [-]
COMPRESSION_SHARE: Final = 0.4  # [-] of rebound
COMPRESSION_SD: Final = 0.1  # [-] of rebound


@dataclass(frozen=True)
class EndDamping:
    """Damping ratios of one end.

    Attributes:
        compression: never measured here [-].
        rebound: measured, or as usual [-].
        measured: whether rebound was measured.
    """

    compression: Measured
    rebound: Measured
    measured: bool


def end_damping(setup: Setup, end: End) -> EndDamping:
    """Return the damping of an end."""
    rebound, measured = USUAL_REBOUND, False
    if end in setup.releases:
        try:
            ratio = damping_of(setup, end, setup.release(end)).ratio
        except SetupError:
            ratio = None
        if ratio and ratio.low > 0:
            rebound, measured = ratio.as_measured(), True
    compression = Measured(COMPRESSION_SHARE * rebound.value, COMPRESSION_SD * rebound.value)
    return EndDamping(compression, rebound, measured)
