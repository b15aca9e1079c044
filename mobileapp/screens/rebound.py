"""Rebound: push down, let go, read how it came back, and hear which way to turn."""

from typing import TYPE_CHECKING

import flet as ft

from mobileapp import theme
from mobileapp.components.actions import main_action
from mobileapp.components.choice import choice
from mobileapp.components.frame import card, screen
from mobileapp.components.scale import scale
from mobileapp.components.stepper import Change, Stepper
from mobileapp.components.steps import steps
from mobileapp.components.words import alarm, body, figure, title
from mobileapp.pictures.swing import release
from mobileapp.records import ENDS, End
from mobileapp.release_reading import RATES, WAYS
from mobileapp.shared import use_app
from mobileapp.state import AppState
from mobileapp.units import Amount

if TYPE_CHECKING:  # it needs numpy, which arrives after the first paint
    from mobileapp.results.rebound import ReboundView

_NOT_COUNTED = Amount(0, "clicks")
_LENGTHS = ("push", "overshoot")
_READ = {"ruler": ("push", "overshoot"), "film": ("frames",), "not_passed": ("push",)}


@ft.component
def ReboundScreen() -> ft.View:
    """Release tests of one setup."""
    app = use_app()
    key = ft.use_route_params()["key"]
    end, set_end = ft.use_state("front")
    go = ft.context.page.navigate
    return screen(
        f"/rebound/{key}",
        app.texts("rebound.title"),
        [
            *[alarm(app.texts(code)) for code in app.trouble],
            body(app.texts("rebound.how")),
            choice(
                app.texts("rebound.end"),
                [(one, app.texts(f"sag.{one}")) for one in ENDS],
                end,
                set_end,
            ),
            _end(app, key, end),
            steps(key, "rebound", app.texts),
        ],
        back=(app.texts("back"), lambda: go("/")),
    )


def _end(app: AppState, setup: str, end: End) -> ft.Control:
    """The latest release test of one end, and its result."""
    kept = app.setup(setup)
    reading = kept.release(end)
    view = app.rebound_view(setup, end) if end in kept.releases else None

    def stepper(field: str) -> ft.Control:
        amount = getattr(reading, field) or _NOT_COUNTED
        return Stepper(
            app.texts(f"rebound.{field}"),
            app.in_units(amount, "length") if field in _LENGTHS else amount,
            Change(app.save_release, (setup, end), field),
            app.texts,
            key=field,
        )

    return ft.Column(
        key=end,
        spacing=theme.MARGIN,
        horizontal_alignment=ft.CrossAxisAlignment.STRETCH,
        controls=[
            card(
                choice(
                    app.texts("rebound.way"),
                    [(way, app.texts(f"rebound.way.{way}")) for way in WAYS],
                    reading.way,
                    lambda way: app.save_release(setup, end, way=way),
                ),
                *[stepper(field) for field in _READ[reading.way]],
                *_about(app, setup, end, reading.way),
                stepper("clicks"),
            ),
            *_result(app, setup, end, view),
        ],
    )


def _about(app: AppState, setup: str, end: End, way: str) -> list[ft.Control]:
    """What one way of reading asks or explains beside its numbers."""
    if way == "ruler":
        return [release(app.texts("rebound.picture"))]
    if way == "not_passed":
        return [body(app.texts("rebound.not_passed"))]
    rate = app.setup(setup).release(end).rate
    return [
        choice(
            app.texts("rebound.rate"),
            [(str(one), str(one)) for one in RATES],
            str(rate),
            lambda one: app.save_release(setup, end, rate=int(one)),
        ),
        body(app.texts("rebound.hand")),
    ]


def _result(app: AppState, setup: str, end: End, view: "ReboundView | None") -> list[ft.Control]:
    if not app.calculator:
        return [body(app.texts("app.loading"))]
    if view is None:
        return []
    if view.missing:
        return [alarm(view.missing)]
    ratio = str(view.damping) if view.damping else view.bound
    return [
        card(
            title(view.advice),
            body(view.sure),
            body(app.texts("rebound.damping")),
            *([figure(view.damping)] if view.damping else [title(view.bound)]),
            scale(
                view.interval,
                view.band,
                (app.texts("rebound.scale.low"), app.texts("rebound.scale.high")),
                app.texts("rebound.scale", ratio=ratio),
            ),
            *([title(view.clicks)] if view.clicks else []),
            *[body(time) for time in view.times],
            *[body(note) for note in view.notes],
        ),
        main_action(
            app.texts("rebound.again"),
            ft.Icons.REPLAY,
            lambda: app.begin_release(setup, end),
            calls=False,
        ),
        body(app.texts("rebound.tries", count=str(len(app.setup(setup).releases[end])))),
    ]
