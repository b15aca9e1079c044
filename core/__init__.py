"""Mechanics of sag, springs, frequency and rebound for suspension set-up.

The names below are the whole of it for everyday use; each is loaded when it is first asked for, so
that units, errors and messages are there at once, before numpy is.
"""

from importlib import import_module
from typing import TYPE_CHECKING

if TYPE_CHECKING:
    from core.bounce import BounceEstimate, estimate_bounce

__all__ = ["BounceEstimate", "estimate_bounce"]

_MODULES = {"BounceEstimate": "core.bounce", "estimate_bounce": "core.bounce"}


def __getattr__(name: str) -> object:
    """Load a name of the façade from its module."""
    if name not in _MODULES:
        raise AttributeError(f"module {__name__!r} has no attribute {name!r}")
    return getattr(import_module(_MODULES[name]), name)
