"""No silent NaN, infinity or warning: every number gets a finite answer or a named error.

Every public function of the core that takes and returns quantities is tried with every kind of
float, most of them nonsense, and with arrays that hold one bad element.
"""

import importlib
import inspect
import math
import pkgutil

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st

import core
from core.checks import Quantity
from core.errors import SetupError

SPECIAL = (0.0, -0.0, 1.0, -1.0, 0.5, 2.0**0.5, math.nan, math.inf, -math.inf, 5e-324, 1e308, 1e-12)
anything = st.sampled_from(SPECIAL) | st.floats() | st.floats(-2.0, 2.0) | st.floats(0.0, 1e3)
plausible = st.floats(1e-3, 1e3)


def functions_of_quantities():
    """Public functions of the core whose parameters are all quantities."""
    for info in pkgutil.iter_modules(core.__path__, "core."):
        module = importlib.import_module(info.name)
        for name, function in inspect.getmembers(module, inspect.isfunction):
            if name.startswith("_") or function.__module__ != module.__name__:
                continue
            parameters = inspect.signature(function).parameters.values()
            if parameters and all(parameter.annotation == Quantity for parameter in parameters):
                yield pytest.param(function, id=f"{module.__name__}.{name}")


FUNCTIONS = list(functions_of_quantities())


def call(function, values):
    """Call a function with its parameters by name; vanishing small results may become zero."""
    names = inspect.signature(function).parameters
    with np.errstate(all="raise", under="ignore"):
        result = function(**dict(zip(names, values, strict=True)))
    return result if isinstance(result, tuple) else (result,)


def test_the_search_finds_the_functions():
    found = {parameter.id for parameter in FUNCTIONS}
    assert {"core.atmosphere.pressure_at", "core.rebound.damping_from_crossing"} <= found


@pytest.mark.parametrize("function", FUNCTIONS)
@given(data=st.data())
def test_any_number_gets_a_finite_answer_or_a_named_error(function, data):
    count = len(inspect.signature(function).parameters)
    values = [data.draw(anything | plausible) for _ in range(count)]
    try:
        results = call(function, values)
    except SetupError:
        return
    assert all(np.isfinite(result) for result in results)


@pytest.mark.parametrize("function", FUNCTIONS)
@given(data=st.data())
def test_an_array_gives_what_its_elements_give(function, data):
    count = len(inspect.signature(function).parameters)
    rows = data.draw(st.lists(st.tuples(*[plausible | st.floats(0, 1)] * count), min_size=2))
    singles, good = [], []
    for row in rows:
        try:
            singles.append(call(function, row))
        except SetupError:
            continue
        good.append(row)
    columns = np.array(rows, dtype=float).T
    if len(good) == len(rows):
        together = call(function, columns)
        for index, single in enumerate(singles):
            for whole, one in zip(together, single, strict=True):
                assert math.isclose(whole[index], one, rel_tol=1e-9, abs_tol=1e-12)
    else:
        with pytest.raises(SetupError) as caught:
            call(function, columns)
        # The elements at fault are named, and none that is fine.
        assert caught.value.where.any()
        assert not any(
            rows[index] in good
            for index in np.flatnonzero(np.broadcast_to(caught.value.where, len(rows)))
        )
