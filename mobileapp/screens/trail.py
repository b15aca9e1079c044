"""Trail: the day's bumps and speeds, and what each end makes of them."""

from functools import partial
from typing import TYPE_CHECKING

import flet as ft

from mobileapp import theme
from mobileapp.components.actions import icon_action, main_action, opener
from mobileapp.components.curves import curves
from mobileapp.components.frame import card, screen
from mobileapp.components.stepper import Change, Stepper
from mobileapp.components.steps import steps
from mobileapp.components.table import table
from mobileapp.components.words import alarm, body, title
from mobileapp.format import typed
from mobileapp.shared import use_app
from mobileapp.state import AppState
from mobileapp.trail_plan import Bump

if TYPE_CHECKING:  # results need numpy, which arrives after the first paint
    from collections.abc import Callable

    from mobileapp.results.trail import BumpView
    from mobileapp.results.trail import Numbers as EndNumbers


@ft.component
def TrailScreen() -> ft.View:
    """The day's trail, for one setup."""
    app = use_app()
    key = ft.use_route_params()["key"]
    go = ft.context.page.navigate
    plan = app.trail(key)

    def speed(field: str) -> ft.Control:
        return Stepper(
            app.texts(f"trail.{field}"),
            app.in_units(getattr(plan, field), "speed"),
            Change(app.save_speeds, (key,), field),
            app.texts,
            key=field,
        )

    return screen(
        f"/trail/{key}",
        app.texts("trail.title"),
        [
            *[alarm(app.texts(code)) for code in app.trouble],
            body(app.texts("trail.how")),
            card(speed("slowest"), speed("fastest")),
            *[_bump(app, key, index) for index in range(len(plan.bumps))],
            main_action(
                app.texts("trail.add"),
                ft.Icons.ADD,
                lambda: app.save_trail(key, app.trail(key).with_another()),
                calls=False,
            ),
            steps(key, "trail", app.texts),
        ],
        back=(app.texts("back"), lambda: go("/")),
    )


def _bump(app: AppState, setup: str, index: int) -> ft.Control:
    """One row of bumps, and what each end makes of it."""
    plan = app.trail(setup)
    bump = plan.bumps[index]
    view = app.bump_view(setup, bump)
    count = str(index + 1)

    heading = ft.Row(
        controls=[
            ft.Container(title(app.texts("trail.bump", count=count)), expand=True),
            *(
                [
                    icon_action(
                        app.texts("trail.remove", count=count),
                        ft.Icons.DELETE_OUTLINE,
                        lambda: app.save_trail(setup, app.trail(setup).without(index)),
                        theme.QUIET,
                    )
                ]
                if len(plan.bumps) > 1
                else []
            ),
        ]
    )
    return card(
        heading,
        *[
            Stepper(
                app.texts(f"trail.{field}"),
                app.in_units(getattr(bump, field), quantity),
                Change(app.save_bump, (setup, index), field),
                app.texts,
                key=field,
            )
            for field, quantity in (("spacing", "distance"), ("height", "length"))
        ],
        *_result(app, setup, bump, view),
        key=f"bump{index}",
    )


def _result(app: AppState, setup: str, bump: Bump, view: "BumpView | None") -> list[ft.Control]:
    if view is None:
        return [body(app.texts("app.loading"))]
    if view.missing:
        return [alarm(view.missing)]
    return [
        *[
            ft.Text(sentence, size=theme.BODY, weight=ft.FontWeight.BOLD, color=theme.INK)
            for sentence in view.sentences.values()
        ],
        curves(view, app.units["speed"], app.texts),
        *[
            Numbers(
                f"{app.texts(f'sag.{end}')}: {app.texts('trail.numbers')}",
                _speeds(app, setup),
                partial(app.bump_numbers, setup, end, bump),
                key=end,
            )
            for end in view.sentences
        ],
    ]


def _speeds(app: AppState, setup: str) -> list[str]:
    plan = app.trail(setup)
    return [
        app.texts("trail.at", speed=f"{typed(speed.value, speed.unit)} {speed.unit}")
        for speed in (app.in_units(speed, "speed") for speed in (plan.slowest, plan.fastest))
    ]


@ft.component
def Numbers(name: str, speeds: list[str], load: "Callable[[], EndNumbers]") -> ft.Control:
    """The numbers of one end, once someone asks for them."""
    is_open, set_open = ft.use_state(False)  # noqa: FBT003 - Flet's own signature
    controls = [opener(name, lambda: set_open(not is_open), is_open=is_open)]
    if is_open:
        numbers = load()
        controls += [
            table(("", *speeds), [(row.name, row.slow, row.fast) for row in numbers.rows]),
            *[body(note) for note in numbers.notes],
        ]
    return ft.Column(controls, horizontal_alignment=ft.CrossAxisAlignment.STRETCH)
