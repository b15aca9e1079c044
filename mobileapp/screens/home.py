"""Home: the two actions that need nothing, and everything saved."""

import flet as ft

from mobileapp import browser, theme
from mobileapp.components.actions import icon_action, main_action, word_action
from mobileapp.components.frame import card, screen
from mobileapp.components.words import alarm, body, title
from mobileapp.records import Setup, new_key
from mobileapp.shared import use_app
from mobileapp.state import AppState
from mobileapp.words import setup_label


@ft.component
def HomeScreen() -> ft.View:
    """Home."""
    app = use_app()
    go = ft.context.page.navigate
    return screen(
        "/",
        app.texts("home.title"),
        [
            *[alarm(app.texts(code)) for code in app.trouble],
            *_update(app),
            main_action(
                app.texts("home.sag"), ft.Icons.STRAIGHTEN, lambda: go(f"/sag/{new_key()}")
            ),
            main_action(
                app.texts("home.bounce"), ft.Icons.TOUCH_APP, lambda: go(f"/bounce/{new_key()}")
            ),
            _offline(app),
            title(app.texts("home.saved")),
            *_undo(app),
            *[_saved(app, setup) for setup in app.setups],
            *([] if app.setups else [body(app.texts("home.none"))]),
        ],
        actions=[
            icon_action(app.texts("settings.title"), ft.Icons.TUNE, lambda: go("/settings")),
            icon_action(app.texts("home.about"), ft.Icons.INFO_OUTLINE, lambda: go("/about")),
        ],
    )


def _saved(app: AppState, setup: Setup) -> ft.Control:
    label = setup_label(setup, app.texts)
    go = ft.context.page.navigate
    # What was measured last is where one goes on.
    place = "sag" if setup.sag or not setup.bounce else "bounce"
    return ft.Container(
        key=setup.key,
        bgcolor=theme.CARD,
        border=ft.Border.all(1, theme.LINE),
        border_radius=theme.CORNER,
        content=ft.Row(
            spacing=0,
            controls=[
                ft.Semantics(
                    label=app.texts("home.open", label=label),
                    button=True,
                    container=True,
                    expand=True,
                    content=ft.Container(
                        padding=theme.MARGIN,
                        ink=True,
                        border_radius=theme.CORNER,
                        on_click=lambda: go(f"/{place}/{setup.key}"),
                        content=ft.Column(
                            spacing=4,
                            controls=[
                                ft.Text(label, size=theme.SMALL, color=theme.QUIET),
                                *[
                                    ft.Text(line, size=theme.BODY, color=theme.INK)
                                    for line in setup.shown
                                ],
                            ],
                        ),
                    ),
                ),
                icon_action(
                    app.texts("home.delete", label=label),
                    ft.Icons.DELETE_OUTLINE,
                    lambda: app.delete(setup.key),
                    theme.QUIET,
                ),
            ],
        ),
    )


def _undo(app: AppState) -> list[ft.Control]:
    if app.deleted is None:
        return []
    label = setup_label(app.deleted, app.texts)
    return [
        card(
            ft.Row(
                controls=[
                    ft.Text(
                        app.texts("home.deleted", label=label),
                        size=theme.BODY,
                        color=theme.INK,
                        expand=True,
                    ),
                    word_action(app.texts("undo"), app.undelete),
                ]
            ),
            key="undo",
        )
    ]


def _update(app: AppState) -> list[ft.Control]:
    if not app.update_waits:
        return []
    return [
        card(
            ft.Row(
                controls=[
                    ft.Text(
                        app.texts("update.waits"), size=theme.BODY, color=theme.INK, expand=True
                    ),
                    word_action(app.texts("update.apply"), browser.apply_update),
                ]
            ),
            key="update",
        )
    ]


def _offline(app: AppState) -> ft.Control:
    offline = app.offline
    if offline.state == "ready":
        sign, text = ft.Icons.OFFLINE_PIN, app.texts("offline.ready")
    elif offline.state == "failed":
        sign, text = ft.Icons.CLOUD_OFF, app.texts(f"offline.{offline.reason}")
    elif offline.total:
        sign, text = (
            ft.Icons.DOWNLOADING,
            app.texts(
                "offline.preparing", done=f"{offline.done:.0f}", total=f"{offline.total:.0f}"
            ),
        )
    else:
        sign, text = ft.Icons.DOWNLOADING, app.texts("offline.starting")
    return ft.Semantics(
        live_region=True,
        content=ft.Row(
            controls=[
                ft.Icon(sign, color=theme.ACCENT),
                ft.Text(text, size=theme.BODY, color=theme.QUIET, expand=True),
            ]
        ),
    )
