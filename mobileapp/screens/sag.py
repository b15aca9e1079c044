"""Sag: one reading at each end, and what it means."""

from typing import TYPE_CHECKING

import flet as ft

from mobileapp import theme
from mobileapp.components.actions import main_action
from mobileapp.components.choice import choice
from mobileapp.components.frame import card, screen
from mobileapp.components.gauge import gauge
from mobileapp.components.stepper import Change, Stepper
from mobileapp.components.steps import steps
from mobileapp.components.words import alarm, body, figure, title
from mobileapp.pictures.o_ring import o_ring_on_fork, o_ring_on_shock
from mobileapp.records import ENDS, PLACES, End
from mobileapp.shared import use_app
from mobileapp.state import AppState

if TYPE_CHECKING:  # it needs numpy, which arrives after the first paint
    from mobileapp.results.sag import SagView

_PICTURES = {"front": o_ring_on_fork, "rear": o_ring_on_shock}


@ft.component
def SagScreen() -> ft.View:
    """Sag of one setup."""
    app = use_app()
    key = ft.use_route_params()["key"]
    go = ft.context.page.navigate
    return screen(
        f"/sag/{key}",
        app.texts("sag.title"),
        [
            *[alarm(app.texts(code)) for code in app.trouble],
            body(app.texts("sag.how")),
            *[_end(app, key, end) for end in ENDS],
            body(app.texts("sag.maker")),
            main_action(app.texts("sag.next"), ft.Icons.TOUCH_APP, lambda: go(f"/bounce/{key}")),
            steps(key, "sag", app.texts),
        ],
        back=(app.texts("back"), lambda: go("/")),
    )


def _end(app: AppState, setup: str, end: End) -> ft.Control:
    """The reading of one end, and its result."""
    entered = app.reading(setup, end)
    view = app.sag_view(setup, end)
    at_shock = end == "rear" and entered.place == "shaft"

    def stepper(name: str, field: str, error: str | None = None) -> ft.Control:
        return Stepper(
            name,
            app.in_units(getattr(entered, field), "length"),
            Change(app.save_reading, (setup, end), field),
            app.texts,
            error,
            key=field,
        )

    return card(
        title(app.texts(f"sag.{end}")),
        *([_place(app, setup, entered.place)] if end == "rear" else []),
        stepper(app.texts(f"sag.travel.{'fork' if end == 'front' else entered.place}"), "travel"),
        *([stepper(app.texts("sag.wheel_travel"), "wheel_travel")] if at_shock else []),
        stepper(app.texts("sag.reading"), "sag", view.error if view else None),
        *(_result(app, end, view) if view and view.percent else []),
        *([] if view or entered.place == "wheel" else [_picture(app, end)]),
        *([] if app.calculator else [body(app.texts("app.loading"))]),
        key=end,
    )


def _place(app: AppState, setup: str, place: str) -> ft.Control:
    return choice(
        app.texts("sag.place"),
        [(key, app.texts(f"sag.place.{key}")) for key in PLACES],
        place,
        lambda key: app.save_place(setup, key),
    )


def _picture(app: AppState, end: End) -> ft.Control:
    """Show where to read, until something has been read."""
    return _PICTURES[end](app.texts(f"sag.picture.{end}"))


def _result(app: AppState, end: End, view: "SagView") -> list[ft.Control]:
    label = app.texts(
        "sag.gauge", end=app.texts(f"sag.{end}"), percent=str(view.percent), band=view.verdict
    )
    return [
        figure(view.percent, theme.HUGE),
        gauge(view.share, view.band, label),
        ft.Text(view.verdict, size=theme.BODY, color=theme.INK),
        *([body(app.texts("sag.frequency")), figure(view.frequency)] if view.frequency else []),
        *[body(note) for note in view.notes],
    ]
