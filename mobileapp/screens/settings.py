"""Settings: units, appearance, language."""

from dataclasses import replace

import flet as ft

from mobileapp.components.choice import choice
from mobileapp.components.frame import card, screen
from mobileapp.components.words import body
from mobileapp.settings import APPEARANCES, AUTO, Settings
from mobileapp.shared import use_app
from mobileapp.texts import NAMES
from mobileapp.units import SYSTEMS


@ft.component
def SettingsScreen() -> ft.View:
    """Choices for all setups."""
    app = use_app()
    go = ft.context.page.navigate
    page = ft.context.page

    def save(**changes: str) -> None:
        app.save_settings(replace(app.settings, **changes))
        app.dress(page)

    def options(field: str, keys: list[str]) -> list[tuple[str, str]]:
        return [(key, app.texts(f"settings.{field}.{key}")) for key in keys]

    now: Settings = app.settings
    languages = [(AUTO, app.texts("settings.language.auto")), *NAMES.items()]
    return screen(
        "/settings",
        app.texts("settings.title"),
        [
            card(
                choice(
                    app.texts("settings.units"),
                    options("units", list(SYSTEMS)),
                    now.units,
                    lambda key: save(units=key),
                ),
                body(app.texts(f"settings.about.{now.units}")),
            ),
            card(
                choice(
                    app.texts("settings.appearance"),
                    options("appearance", list(APPEARANCES)),
                    now.appearance,
                    lambda key: save(appearance=key),
                ),
            ),
            card(
                choice(
                    app.texts("settings.language"),
                    languages,
                    now.language,
                    lambda key: save(language=key),
                ),
            ),
        ],
        back=(app.texts("back"), lambda: go("/")),
    )
