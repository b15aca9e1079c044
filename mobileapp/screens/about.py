"""Cautions, privacy and licences."""

import flet as ft

from mobileapp import browser
from mobileapp.components.actions import word_action
from mobileapp.components.frame import card, screen
from mobileapp.components.words import body, title
from mobileapp.shared import use_app

_CAUTIONS = ("pressure", "air", "manual", "damage", "test", "ride")


@ft.component
def AboutScreen() -> ft.View:
    """About the app."""
    app = use_app()
    go = ft.context.page.navigate
    return screen(
        "/about",
        app.texts("about.title"),
        [
            title(app.texts("about.cautions")),
            card(*[body(app.texts(f"about.caution.{caution}")) for caution in _CAUTIONS]),
            body(app.texts("about.privacy")),
            word_action(app.texts("about.notices"), url=browser.notices_address()),
        ],
        back=(app.texts("back"), lambda: go("/")),
    )
