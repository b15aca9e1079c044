"""Strict numbers and a repeatable search for every test of the core.

The search for counter-examples takes the same road each time. For a longer one on new roads:
``HYPOTHESIS_PROFILE=deep python -m pytest tests/core``.
"""

import os

import numpy as np
import pytest
from hypothesis import settings

# A busy machine is no fault of the code: no deadline.
settings.register_profile("repeatable", deadline=None, derandomize=True)
settings.register_profile("deep", deadline=None, max_examples=3000)
settings.load_profile(os.environ.get("HYPOTHESIS_PROFILE", "repeatable"))


@pytest.fixture(autouse=True)
def strict_floating_point():
    """numpy's floating-point trouble is an error."""
    with np.errstate(all="raise"):
        yield
