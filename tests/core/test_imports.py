"""The core runs anywhere: it imports the standard library and numpy, and nothing else."""

import ast
import sys
from pathlib import Path

import pytest

import core

CORE = Path(core.__file__).parent
ALLOWED = set(sys.stdlib_module_names) | {"numpy", "core"}


def imported_names(source):
    """Top-level names of every import in a source text, wherever it stands."""
    for node in ast.walk(ast.parse(source)):
        if isinstance(node, ast.Import):
            yield from (alias.name.partition(".")[0] for alias in node.names)
        elif isinstance(node, ast.ImportFrom):
            yield node.module.partition(".")[0] if node.level == 0 else "core"


@pytest.mark.parametrize("path", sorted(CORE.rglob("*.py")), ids=lambda path: path.stem)
def test_imports_only_the_standard_library_and_numpy(path):
    assert set(imported_names(path.read_text("utf-8"))) <= ALLOWED


def test_a_foreign_import_would_be_seen():
    hidden = "def f():\n    from scipy.stats import norm\n    import flet.core as ft\n"
    assert set(imported_names(hidden)) == {"scipy", "flet"}
