"""numpy's floating-point trouble is an error here too."""

import numpy as np
import pytest


@pytest.fixture(autouse=True)
def strict_floating_point():
    with np.errstate(all="raise"):
        yield
