"""Contrast and sizes of the look, as promised for gloves and glare."""

from dataclasses import asdict

import pytest

from mobileapp import theme
from mobileapp.theme import DARK, SUN, contrast

GROUNDS = ("paper", "card", "band")


def test_contrast_agrees_with_known_values():
    """WCAG 2.2: black on white has 21:1; #767676 on white is the well-known edge of 4.5:1."""
    assert contrast("#000000", "#FFFFFF") == pytest.approx(21)
    assert contrast("#767676", "#FFFFFF") == pytest.approx(4.54, abs=0.01)


@pytest.mark.parametrize("palette", [SUN, DARK], ids=["sun", "dark"])
class TestPalette:
    @pytest.mark.parametrize("ground", GROUNDS)
    def test_readings_have_ten_to_one(self, palette, ground):
        assert contrast(palette.ink, asdict(palette)[ground]) >= 10

    @pytest.mark.parametrize("text", ["quiet", "accent", "alarm"])
    @pytest.mark.parametrize("ground", ["paper", "card"])
    def test_all_other_text_has_seven_to_one(self, palette, text, ground):
        colours = asdict(palette)
        assert contrast(colours[text], colours[ground]) >= 7

    def test_text_on_the_accent_has_seven_to_one(self, palette):
        assert contrast(palette.on_accent, palette.accent) >= 7

    def test_edges_can_be_seen(self, palette):
        """WCAG 2.2, 1.4.11: at least 3:1 for the edge of what can be touched."""
        assert contrast(palette.line, palette.card) >= 3


def test_what_is_touched_is_large_enough():
    assert theme.MAIN_ACTION >= 64
    assert theme.TOUCH >= 48
    assert theme.GAP >= 8
