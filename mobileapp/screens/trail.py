"""Trail: the day's bumps and speeds, and what each end makes of them."""

from dataclasses import replace
from functools import partial
from typing import TYPE_CHECKING

import flet as ft

from mobileapp import theme
from mobileapp.components.actions import icon_action, main_action
from mobileapp.components.curves import curves
from mobileapp.components.frame import card, screen
from mobileapp.components.stepper import Stepper
from mobileapp.components.steps import steps
from mobileapp.components.table import table
from mobileapp.components.words import alarm, body, title
from mobileapp.format import typed
from mobileapp.shared import use_app
from mobileapp.state import AppState
from mobileapp.units import Amount

if TYPE_CHECKING:  # it needs numpy, which arrives after the first paint
    from mobileapp.results.trail import BumpView, EndView


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
            getattr(plan, field),
            lambda amount: app.save_trail(key, replace(app.trail(key), **{field: amount})),
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
            *[BumpCard(app, key, index, key=f"bump{index}") for index in range(len(plan.bumps))],
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


@ft.component
def BumpCard(app: AppState, setup: str, index: int) -> ft.Control:
    """One row of bumps, and what each end makes of it."""
    plan = app.trail(setup)
    bump = plan.bumps[index]
    view = app.bump_view(setup, bump)
    count = str(index + 1)

    def change(field: str, amount: Amount) -> None:
        now = app.trail(setup)
        app.save_trail(setup, now.with_bump(index, replace(now.bumps[index], **{field: amount})))

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
                getattr(bump, field),
                partial(change, field),
                app.texts,
                key=field,
            )
            for field in ("spacing", "height")
        ],
        *_result(app, setup, view),
    )


def _result(app: AppState, setup: str, view: "BumpView | None") -> list[ft.Control]:
    if view is None:
        return [body(app.texts("app.loading"))]
    if view.missing:
        return [alarm(view.missing)]
    return [
        *[
            ft.Text(end.sentence, size=theme.BODY, weight=ft.FontWeight.BOLD, color=theme.INK)
            for end in view.ends.values()
        ],
        curves(view, app.units["speed"], app.texts),
        *[_numbers(app, setup, end, numbers) for end, numbers in view.ends.items()],
    ]


def _numbers(app: AppState, setup: str, end: str, view: "EndView") -> ft.Control:
    plan = app.trail(setup)
    speeds = [
        app.texts("trail.at", speed=f"{typed(speed.value, speed.unit)} {speed.unit}")
        for speed in (plan.slowest, plan.fastest)
    ]
    return ft.ExpansionTile(
        key=end,
        title=f"{app.texts(f'sag.{end}')}: {app.texts('trail.numbers')}",
        tile_padding=0,
        controls=[
            table(
                ("", *speeds),
                [(row.name, row.slow, row.fast) for row in view.rows],
            ),
            *[body(note) for note in view.notes],
        ],
    )
