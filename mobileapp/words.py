"""Sentences about records that several screens need."""

from datetime import datetime

from mobileapp.records import Setup
from mobileapp.texts import Texts


def setup_label(setup: Setup, texts: Texts) -> str:
    """Return what a setup is called, or when it was made."""
    when = datetime.fromisoformat(setup.made).strftime("%Y-%m-%d %H:%M")
    return setup.label or texts("setup.unnamed", when=when)
