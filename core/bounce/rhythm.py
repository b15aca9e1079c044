"""The period of numbered taps, and how sure it is.

Two things make taps uneven: the finger is early or late (jitter, which the next tap forgets), and
the rider's own rhythm wanders (which all later taps remember). Ordinary regression knows only the
first and claims far too much. Here both have a share, neither is known, and the result is averaged
over what the taps say about them.
"""

from dataclasses import dataclass
from typing import Final

import numpy as np

from core.checks import FloatArray

TYPICAL_JITTER: Final = 0.024  # [s] of a tap around its beat; from habit, no source
JITTER_FACTOR: Final = 1.7  # [-] one standard deviation up or down, on a log scale
JITTERS: Final = TYPICAL_JITTER * JITTER_FACTOR ** np.linspace(-2.0, 2.0, 7)  # [s]
WANDERS: Final = np.array([0.0, 0.01, 0.02, 0.03, 0.045, 0.06])  # [-] of the period, per beat
TYPICAL_WANDER: Final = 0.035  # [-] of the period, per beat
NEGLIGIBLE: Final = -40.0  # [nats] what is that much less likely has no weight

_JITTER, _WANDER = (axis.ravel() for axis in np.meshgrid(JITTERS, WANDERS, indexing="ij"))
_LOG_PRIOR: Final = (
    -0.5 * (np.log(_JITTER / TYPICAL_JITTER) / np.log(JITTER_FACTOR)) ** 2
    - 0.5 * (_WANDER / TYPICAL_WANDER) ** 2
)


@dataclass(frozen=True)
class Rhythm:
    """A period and its standard deviation, both [s]."""

    period: float
    sd: float


def measure_rhythm(beats: FloatArray, times: FloatArray) -> Rhythm:
    """Return the period of taps of known beats by generalised least squares.

    t = a + P n + e,  cov(eᵢ, eⱼ) = σ² δᵢⱼ + (w P)² min(nᵢ, nⱼ)

    with t the tap times [s], n the beat numbers, P the period [s], σ the jitter [s], w the
    wander of the period per beat [-] and δ the Kronecker delta. For every pair of a grid of σ and w
    P̂ = (XᵀS⁻¹X)⁻¹XᵀS⁻¹t is found; the pairs are weighted with their restricted likelihood and a
    prior, and the mean and the total variance of that mixture are returned.

    Args:
        beats: beat numbers, increasing from any start; shape (taps,), at least three.
        times: of the taps [s]; same shape.

    Source: generalised least squares: A. C. Aitken 1935; restricted likelihood: Patterson and
    Thompson 1971; jitter and wander: the two-level model of Wing and Kristofferson 1973. All from
    memory.
    """
    number = beats - beats[0]
    slope = float((times[-1] - times[0]) / number[-1])
    shared = np.minimum.outer(number, number)
    covariance = (
        _JITTER[:, None, None] ** 2 * np.eye(len(times))
        + (_WANDER[:, None, None] * slope) ** 2 * shared
    )
    # With the rough line taken out, the numbers stay small and the squares exact.
    design = np.stack([np.ones_like(number), number], axis=1)
    left = times - times[0] - slope * number
    whitener = np.linalg.cholesky(covariance)
    columns = np.column_stack([design, left])
    white = np.linalg.solve(whitener, np.broadcast_to(columns, (len(whitener), *columns.shape)))
    white_design, white_left = white[..., :2], white[..., 2]
    normal = np.einsum("gti,gtj->gij", white_design, white_design)
    moment = np.einsum("gti,gt->gi", white_design, white_left)
    solution = np.linalg.solve(normal, moment[..., None])[..., 0]
    misfit = (white_left**2).sum(axis=1) - (moment * solution).sum(axis=1)
    log_volume = 2 * np.log(np.diagonal(whitener, axis1=1, axis2=2)).sum(axis=1)
    determinant = normal[:, 0, 0] * normal[:, 1, 1] - normal[:, 0, 1] ** 2
    log_weight = _LOG_PRIOR - 0.5 * (misfit + log_volume + np.log(determinant))
    behind = log_weight - log_weight.max()
    weight = np.where(behind > NEGLIGIBLE, np.exp(np.maximum(behind, NEGLIGIBLE)), 0.0)
    weight /= weight.sum()
    corrections = solution[:, 1]
    correction = float(weight @ corrections)
    variance = normal[:, 0, 0] / determinant + (corrections - correction) ** 2
    return Rhythm(slope + correction, float(np.sqrt(weight @ variance)))
