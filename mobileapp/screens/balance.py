"""Balance: front against rear, and what to do first."""

from typing import TYPE_CHECKING

import flet as ft

from mobileapp import theme
from mobileapp.components.actions import main_action
from mobileapp.components.frame import card, screen
from mobileapp.components.scale import scale
from mobileapp.components.steps import steps
from mobileapp.components.table import table
from mobileapp.components.words import alarm, body, figure, title
from mobileapp.shared import use_app
from mobileapp.state import AppState

if TYPE_CHECKING:  # it needs numpy, which arrives after the first paint
    from mobileapp.results.balance import BalanceView, Ratio


@ft.component
def BalanceScreen() -> ft.View:
    """The ends of one setup beside each other."""
    app = use_app()
    key = ft.use_route_params()["key"]
    go = ft.context.page.navigate
    view = app.balance_view(key)
    return screen(
        f"/balance/{key}",
        app.texts("balance.title"),
        [
            *[alarm(app.texts(code)) for code in app.trouble],
            *([body(app.texts("app.loading"))] if view is None else _compared(app, key, view)),
            steps(key, "balance", app.texts),
        ],
        back=(app.texts("back"), lambda: go("/")),
    )


def _compared(app: AppState, key: str, view: "BalanceView") -> list[ft.Control]:
    go = ft.context.page.navigate
    if view.missing:
        return [alarm(view.missing)]
    lead = []
    if view.step != "balance":
        label = app.texts(f"steps.{view.step}")
        lead = [main_action(label, ft.Icons.ARROW_FORWARD, lambda: go(f"/{view.step}/{key}"))]
    return [
        card(body(app.texts("balance.first")), title(view.first), *lead),
        card(title(app.texts("balance.sag")), table((), view.sag)),
        *[_ratio(ratio) for ratio in view.ratios],
        body(app.texts("balance.practice")),
    ]


def _ratio(ratio: "Ratio") -> ft.Control:
    if ratio.reading is None:
        return card(title(ratio.name), body(ratio.verdict), key=ratio.name)
    return card(
        title(ratio.name),
        figure(ratio.reading),
        scale(ratio.interval, ratio.band, ("0", "2"), f"{ratio.name} {ratio.reading}"),
        ft.Text(ratio.verdict, size=theme.BODY, weight=ft.FontWeight.BOLD, color=theme.INK),
        key=ratio.name,
    )
