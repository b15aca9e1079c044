"""All words in all languages, and nothing but words that the app's typeface can show."""

import re
from pathlib import Path
from string import Formatter

import pytest
from fontTools.ttLib import TTFont

from mobileapp.pwa.paths import ASSETS, CHECKOUT
from mobileapp.texts import LANGUAGES, NAMES, Texts, de, en

CORE_KEYS = {key for key in LANGUAGES["en"] if key.startswith("core.")}


def placeholders(text):
    return {name for _, name, _, _ in Formatter().parse(text) if name}


@pytest.mark.parametrize("language", LANGUAGES)
def test_every_language_has_every_text_with_the_same_placeholders(language):
    english = LANGUAGES["en"]
    other = LANGUAGES[language]
    assert other.keys() == english.keys()
    for key, text in english.items():
        assert placeholders(other[key]) == placeholders(text), key


def test_german_translates_everything_that_english_says():
    assert de.TEXTS.keys() >= en.TEXTS.keys()


@pytest.mark.parametrize("language", LANGUAGES)
@pytest.mark.parametrize("face", ["B612-Regular.ttf", "B612-Bold.ttf"])
def test_the_typeface_has_every_character(language, face):
    known = TTFont(ASSETS / "fonts" / face).getBestCmap()
    used = {letter for text in LANGUAGES[language].values() for letter in text}
    assert {letter for letter in used if ord(letter) not in known} == set()


def test_every_text_asked_for_exists():
    sources = [path for path in (CHECKOUT / "mobileapp").rglob("*.py") if "pwa" not in path.parts]
    asked = {
        key
        for path in sources
        for key in re.findall(r'texts\(\s*"([a-z_.]+)"', Path(path).read_text("utf-8"))
    }
    assert asked - LANGUAGES["en"].keys() == set()


def test_an_unknown_language_is_answered_in_english():
    assert Texts("xx")("undo") == "Undo"
    assert set(NAMES) == set(LANGUAGES)
