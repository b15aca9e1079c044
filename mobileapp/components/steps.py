"""The way from one step of a setup to any other: nothing blocks, filled steps feed later ones."""

import flet as ft

from mobileapp import theme
from mobileapp.components.actions import Handler, word_action
from mobileapp.texts import Texts

STEPS = ("sag", "bounce", "rebound", "trail", "balance")


def steps(setup: str, here: str, texts: Texts) -> ft.Control:
    """Return the other steps of a setup.

    Args:
        setup: its key.
        here: the step on the screen.
        texts: words.
    """
    go = ft.context.page.navigate

    def to(step: str) -> Handler:
        return lambda: go(f"/{step}/{setup}")

    return ft.Column(
        spacing=0,
        controls=[
            ft.Text(texts("steps"), size=theme.SMALL, color=theme.QUIET),
            ft.Row(
                wrap=True,
                spacing=theme.GAP,
                run_spacing=theme.GAP,
                controls=[
                    word_action(texts(f"steps.{step}"), to(step), key=step)
                    for step in STEPS
                    if step != here
                ],
            ),
        ],
    )
