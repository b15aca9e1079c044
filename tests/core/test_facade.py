"""The façade: what it promises is there, and nothing heavy comes with it."""

import subprocess
import sys

import pytest

import core


@pytest.mark.parametrize("name", core.__all__)
def test_every_name_is_there(name):
    assert getattr(core, name).__module__.startswith("core.")


def test_an_unknown_name_is_an_attribute_error():
    with pytest.raises(AttributeError, match="no attribute 'spoke_tension'"):
        core.spoke_tension  # noqa: B018 - asking for it is the test


def test_units_and_errors_come_without_numpy():
    code = "import sys, core.units, core.errors, core.messages; sys.exit('numpy' in sys.modules)"
    assert subprocess.run([sys.executable, "-c", code], check=False).returncode == 0
