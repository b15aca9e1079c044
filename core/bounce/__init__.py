"""The bounce test: from taps at the bottoms of a bouncing bike to its loaded frequency."""

from core.bounce.estimate import BounceEstimate, estimate_bounce

__all__ = ["BounceEstimate", "estimate_bounce"]
