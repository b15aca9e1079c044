"""A setup in a line or two, as lists show it."""

from mobileapp.records import ENDS, Setup
from mobileapp.results.bounce import bounce_view
from mobileapp.results.sag import sag_view
from mobileapp.texts import Texts


def summary(setup: Setup, texts: Texts) -> tuple[str, ...]:
    """Return the results of a setup, one line for sag and one for the bounce."""
    lines = []
    sag = [
        f"{texts(f'sag.{end}')} {view.percent}"
        for end in ENDS
        if end in setup.sag and (view := sag_view(end, setup.sag[end], texts)).percent
    ]
    if sag:
        lines.append(" · ".join(sag))
    if setup.bounce:
        frequency = bounce_view(setup.bounce, texts).frequency
        if frequency:
            lines.append(f"{texts('bounce.title')} {frequency}")
    return tuple(lines)
