"""Docstrings of the core tell the truth about arguments, attributes and sources of errors."""

import importlib
import inspect
import pkgutil
import re

import pytest

import core

MODULES = [
    importlib.import_module(info.name)
    for info in pkgutil.iter_modules(core.__path__, "core.")
    if not info.ispkg
]


def public_members(kind):
    """Public classes or functions, each where it is defined."""
    for module in MODULES:
        for name, member in inspect.getmembers(module, kind):
            if member.__module__ == module.__name__ and not name.startswith("_"):
                yield pytest.param(member, id=f"{module.__name__}.{name}")


def methods():
    """Public methods and functions that take arguments of their own."""
    for parameter in public_members(inspect.isclass):
        (owner,) = parameter.values
        for name, member in inspect.getmembers(owner, inspect.isfunction):
            if not name.startswith("_") and member.__module__ == owner.__module__:
                yield pytest.param(member, id=f"{parameter.id}.{name}")


FUNCTIONS = [*public_members(inspect.isfunction), *methods()]


def documented(member, section):
    """Names listed in a section of a Google-style docstring, in order."""
    text = (inspect.getdoc(member) or "") + "\n"
    found = re.search(rf"^{section}:\n((?:    .*\n|\n)*)", text, re.MULTILINE)
    if not found:
        return []
    return re.findall(r"^    \*{0,2}(\w+)(?: \([^)]*\))?:", found.group(1), re.MULTILINE)


@pytest.mark.parametrize("function", FUNCTIONS)
def test_documented_arguments_are_the_signature(function):
    signature = [name for name in inspect.signature(function).parameters if name != "self"]
    assert documented(function, "Args") == signature


@pytest.mark.parametrize("record", list(public_members(inspect.isclass)))
def test_documented_attributes_are_the_fields(record):
    fields = list(getattr(record, "__dataclass_fields__", ()))
    if fields:
        assert documented(record, "Attributes") == fields


@pytest.mark.parametrize("function", FUNCTIONS)
def test_errors_raised_in_sight_are_documented(function):
    raised = set(re.findall(r"raise (\w+Error)\(", inspect.getsource(function)))
    assert raised <= set(documented(function, "Raises"))


def test_a_wrong_docstring_would_be_seen():
    def scale(value, factor):
        """Return a product.

        Args:
            value: first [m].
            size: second [-].

        Raises:
            ValueError: never.
        """
        return value * factor

    assert documented(scale, "Args") == ["value", "size"]
    assert documented(scale, "Raises") == ["ValueError"]
