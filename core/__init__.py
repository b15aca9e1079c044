"""Mechanics of sag, springs, frequency and rebound for suspension set-up."""

from core.bounce import BounceEstimate, estimate_bounce

__all__ = ["BounceEstimate", "estimate_bounce"]
