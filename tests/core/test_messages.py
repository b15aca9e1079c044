"""Every sentence has a use, and every situation a sentence."""

import ast
from pathlib import Path
from string import Formatter

import pytest

import core
from core.messages import MESSAGES, show_si

SOURCES = [
    path for path in sorted(Path(core.__file__).parent.rglob("*.py")) if path.stem != "messages"
]
RAISERS = {"InvalidInputError": 0, "NoSolutionError": 0, "Note": 0, "require": 1}


def calls():
    """Calls that name a situation, each with its code."""
    for path in SOURCES:
        for node in ast.walk(ast.parse(path.read_text("utf-8"))):
            name = getattr(getattr(node, "func", None), "id", None)
            if isinstance(node, ast.Call) and name in RAISERS:
                argument = node.args[RAISERS[name]] if len(node.args) > RAISERS[name] else None
                if isinstance(argument, ast.Constant):
                    yield argument.value, node, f"{path.name}:{node.lineno}"


def test_every_situation_has_a_sentence():
    unknown = [(code, place) for code, _, place in calls() if code not in MESSAGES]
    assert not unknown


def test_every_sentence_has_a_use():
    constants = {
        node.value
        for path in SOURCES
        for node in ast.walk(ast.parse(path.read_text("utf-8")))
        if isinstance(node, ast.Constant)
    }
    assert set(MESSAGES) <= constants


@pytest.mark.parametrize("code", sorted(MESSAGES))
def test_sentence_is_one(code):
    text = MESSAGES[code]
    assert text[0].isupper() or text[0] == "{"
    assert text.endswith(".")
    placeholders = [name for _, name, _, _ in Formatter().parse(text) if name is not None]
    assert all(placeholders)


def test_data_is_shown_with_the_unit_of_its_key():
    assert show_si("travel_m", 0.15) == "0.15 m"
    assert show_si("share_percent", 12.345) == "12.35 %"
    assert show_si("damping_ratio", 0.31) == "0.31"
    assert show_si("name", "sag") == "sag"
