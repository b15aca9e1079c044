"""The bounce test: the phone is one big button."""

import time
from typing import TYPE_CHECKING

import flet as ft

from mobileapp import browser, theme
from mobileapp.components.actions import icon_action, main_action
from mobileapp.components.words import alarm, figure
from mobileapp.shared import use_app
from mobileapp.tapping import Tapping
from mobileapp.texts import Texts

if TYPE_CHECKING:  # it needs numpy, which arrives after the first paint
    from mobileapp.results.bounce import BounceView


@ft.component
def BounceScreen() -> ft.View:
    """Tap along to a bouncing rider."""
    app = use_app()
    key = ft.use_route_params()["key"]
    tapping, set_tapping = ft.use_state(Tapping)
    latest = ft.use_ref(tapping)
    wakelock = ft.use_ref(ft.Wakelock)
    haptics = ft.use_ref(ft.HapticFeedback)

    async def awake() -> None:
        browser.taps.start()
        await wakelock.current.enable()

    async def rest() -> None:
        browser.taps.stop()
        await wakelock.current.disable()

    ft.use_effect(awake, dependencies=[], cleanup=rest)

    kept = app.setup(key).bounce
    view = (
        app.bounce_view(tapping.run() if tapping.seen else kept) if tapping.seen or kept else None
    )
    finished = view is not None and (view.state == "done" or not tapping.seen)

    async def tap(event: ft.TapEvent) -> None:
        if finished:
            return
        at = event.global_position
        latest.current = latest.current.tapped(browser.taps.take(at.x, at.y), time.monotonic())
        set_tapping(latest.current)
        run = latest.current.run()
        seen = app.bounce_view(run)
        if seen and seen.state == "done":
            app.save_bounce(key, run)
        await haptics.current.heavy_impact()

    def again() -> None:
        latest.current = Tapping()
        set_tapping(latest.current)
        app.save_bounce(key, None)

    return ft.View(
        route=f"/bounce/{key}",
        bgcolor=theme.PAPER,
        padding=0,
        controls=[
            ft.SafeArea(
                expand=True,
                content=ft.Column(
                    expand=True,
                    spacing=0,
                    horizontal_alignment=ft.CrossAxisAlignment.STRETCH,
                    controls=[
                        _bar(app.texts, lambda: ft.context.page.navigate("/")),
                        *[alarm(app.texts(code)) for code in app.trouble],
                        _reading(app.texts, view, len(tapping.seen)),
                        *(
                            [_after(app.texts, again)]
                            if finished
                            else [_pad(app.texts, tap, len(tapping.seen))]
                        ),
                    ],
                ),
            )
        ],
    )


def _bar(texts: Texts, back: object) -> ft.Control:
    return ft.Row(
        height=theme.MAIN_ACTION,
        controls=[
            icon_action(texts("back"), ft.Icons.ARROW_BACK, back),
            ft.Text(texts("bounce.title"), size=theme.TITLE, weight=ft.FontWeight.BOLD),
        ],
    )


def _reading(texts: Texts, view: "BounceView | None", taps: int) -> ft.Control:
    if view is None:
        lines = [ft.Text(texts("bounce.pad.first"), size=theme.BODY, color=theme.QUIET)]
    else:
        lines = [
            *([figure(view.frequency, theme.HUGE)] if view.frequency else []),
            ft.Text(view.voice, size=theme.TITLE, weight=ft.FontWeight.BOLD, color=theme.INK),
            *([ft.Text(view.reason, size=theme.BODY, color=theme.INK)] if view.reason else []),
            ft.Text(
                f"{texts('bounce.taps', count=str(taps))}: {view.counts}" if taps else view.counts,
                size=theme.SMALL,
                color=theme.QUIET,
            ),
        ]
    return ft.Semantics(
        live_region=True,
        content=ft.Container(
            padding=theme.MARGIN, content=ft.Column(controls=lines, spacing=theme.GAP)
        ),
    )


def _pad(texts: Texts, tap: object, taps: int) -> ft.Control:
    # Two looks in turn: each tap is seen.
    filled = taps % 2 == 0
    return ft.Container(
        expand=True,
        padding=theme.GAP,
        content=ft.Semantics(
            label=texts("bounce.pad"),
            button=True,
            container=True,
            expand=True,
            content=ft.GestureDetector(
                on_tap_down=tap,
                expand=True,
                content=ft.Container(
                    bgcolor=theme.ACCENT if filled else theme.BAND,
                    border_radius=2 * theme.CORNER,
                    border=ft.Border.all(4, theme.ACCENT),
                    alignment=ft.Alignment.CENTER,
                    content=ft.Text(
                        texts("bounce.pad"),
                        size=theme.LARGE * 2 // 3,
                        weight=ft.FontWeight.BOLD,
                        text_align=ft.TextAlign.CENTER,
                        color=theme.ON_ACCENT if filled else theme.INK,
                    ),
                ),
            ),
        ),
    )


def _after(texts: Texts, again: object) -> ft.Control:
    return ft.Container(
        padding=theme.MARGIN,
        content=ft.Column(
            horizontal_alignment=ft.CrossAxisAlignment.STRETCH,
            spacing=theme.MARGIN,
            controls=[
                ft.Text(texts("bounce.rhythm"), size=theme.BODY, color=theme.QUIET),
                main_action(texts("bounce.again"), ft.Icons.REPLAY, again, calls=False),
            ],
        ),
    )
