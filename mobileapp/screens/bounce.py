"""The bounce test: the phone is one big button."""

import time
from collections.abc import Callable
from typing import TYPE_CHECKING

import flet as ft

from mobileapp import browser, theme
from mobileapp.components.actions import Handler, icon_action, main_action, word_action
from mobileapp.components.choice import choice
from mobileapp.components.steps import steps
from mobileapp.components.strip import strip
from mobileapp.components.words import alarm, body, figure
from mobileapp.format import Reading
from mobileapp.pictures.swing import when_to_tap
from mobileapp.shared import use_app
from mobileapp.tapping import TAPS_EVERY, Tapping
from mobileapp.texts import Texts

if TYPE_CHECKING:  # it needs numpy, which arrives after the first paint
    from mobileapp.results.bounce import BounceView

_NOT_YET = Reading("– –", "Hz")


@ft.component
def BounceScreen() -> ft.View:
    """Tap along to a bouncing rider."""
    app = use_app()
    key = ft.use_route_params()["key"]
    tapping, set_tapping = ft.use_state(Tapping)
    latest = ft.use_ref(tapping)
    haptics = ft.use_ref(ft.HapticFeedback)

    taps = len(tapping.seen)
    kept = app.setup(key).bounce
    view = app.bounce_view(tapping.run() if taps else kept, kept=not taps)
    over = kept is not None if not taps else view is not None and view.state != "keep_going"

    _use_tap_clock(running=not over)

    def change(changed: Tapping) -> None:
        latest.current = changed
        set_tapping(changed)

    async def tap(event: ft.TapEvent) -> None:
        if over:
            return
        at = event.global_position
        change(latest.current.tapped(browser.taps.take(at.x, at.y), time.monotonic()))
        run = latest.current.run()
        judged = app.bounce_view(run)
        if judged and judged.state == "done":
            app.save_bounce(key, run)
        _sound(judged)
        await haptics.current.heavy_impact()

    def keep() -> None:
        app.save_bounce(key, tapping.run())
        change(Tapping())

    def again() -> None:
        change(Tapping(taps_every=tapping.taps_every))
        app.save_bounce(key, None)

    if over:
        told = [
            _reading(app.texts, view),
            *_after(app.texts, view, again),
            steps(key, "bounce", app.texts),
        ]
    elif taps:
        told = [_reading(app.texts, view)]
    else:
        told = _before(
            app.texts, tapping.taps_every, lambda every: change(Tapping(taps_every=every))
        )
    return ft.View(
        route=f"/bounce/{key}",
        bgcolor=theme.PAPER,
        padding=0,
        controls=[
            ft.SafeArea(
                expand=True,
                content=_stretched(
                    ft.Column,
                    _bar(app.texts, keep if not over and view and view.frequency else None),
                    *[alarm(app.texts(code)) for code in app.trouble],
                    _stretched(
                        ft.Row if app.landscape else ft.Column,
                        _told(told),
                        *([] if over else [_pad(app.texts, tap, tapping)]),
                    ),
                ),
            )
        ],
    )


def _use_tap_clock(*, running: bool) -> None:
    """While a test runs, have taps timed by the page, and the screen awake."""
    wakelock = ft.use_ref(ft.Wakelock)

    async def start() -> None:
        if running:
            browser.taps.start()
            await wakelock.current.enable()

    async def stop() -> None:
        browser.taps.stop()
        await wakelock.current.disable()

    ft.use_effect(start, dependencies=[running], cleanup=stop)


def _sound(view: "BounceView | None") -> None:
    """Make it heard that the test is over."""
    if view and view.state != "keep_going":
        browser.sound("done" if view.state == "done" else "again")


def _stretched(kind: type[ft.Row | ft.Column], *controls: ft.Control) -> ft.Control:
    """Stack parts that fill all the room there is."""
    box = kind(controls=list(controls), expand=True, spacing=0)
    stretch = ft.CrossAxisAlignment.STRETCH
    if kind is ft.Row:
        box.vertical_alignment = stretch
    else:
        box.horizontal_alignment = stretch
    return box


def _told(controls: list[ft.Control]) -> ft.Control:
    # A fixed share of the screen: the pad must not move under the finger.
    return ft.Container(
        key="told",
        expand=1,
        padding=theme.MARGIN,
        content=ft.Column(
            controls=controls,
            spacing=theme.MARGIN,
            scroll=ft.ScrollMode.AUTO,
            horizontal_alignment=ft.CrossAxisAlignment.STRETCH,
        ),
    )


def _bar(texts: Texts, keep: Handler | None) -> ft.Control:
    go = ft.context.page.navigate
    title = ft.Text(texts("bounce.title"), size=theme.TITLE, weight=ft.FontWeight.BOLD, expand=True)
    return ft.Row(
        height=theme.TOUCH,
        controls=[
            icon_action(texts("back"), ft.Icons.ARROW_BACK, lambda: go("/")),
            title,
            *([word_action(texts("bounce.keep"), keep)] if keep else []),
        ],
    )


def _before(texts: Texts, taps_every: int, choose: Callable[[int], None]) -> list[ft.Control]:
    return [
        body(texts("bounce.pad.first")),
        choice(
            texts("bounce.every"),
            [(str(every), texts(f"bounce.every.{every}")) for every in TAPS_EVERY],
            str(taps_every),
            lambda every: choose(int(every)),
        ),
        when_to_tap(texts("bounce.picture")),
    ]


def _reading(texts: Texts, view: "BounceView | None") -> ft.Control:
    if view is None:
        return body(texts("app.loading"))
    counts = texts("bounce.beats", counts=", ".join(view.counts.values()))
    return ft.Semantics(
        live_region=True,
        content=ft.Column(
            spacing=theme.GAP,
            horizontal_alignment=ft.CrossAxisAlignment.STRETCH,
            controls=[
                figure(view.frequency or _NOT_YET, theme.HUGE),
                ft.Text(view.voice, size=theme.TITLE, weight=ft.FontWeight.BOLD, color=theme.INK),
                ft.Text(view.reason, size=theme.BODY, color=theme.INK),
                strip(view.strip, view.counts, counts),
            ],
        ),
    )


def _pad(texts: Texts, tap: object, tapping: Tapping) -> ft.Control:
    # Two looks in turn: each tap is seen.
    filled = len(tapping.seen) % 2 == 0
    name = texts("bounce.pad" if tapping.taps_every == 1 else "bounce.pad.2")
    return ft.Container(
        key="pad",
        expand=1,
        padding=theme.GAP,
        content=ft.Semantics(
            label=name,
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
                        name,
                        size=theme.LARGE * 2 // 3,
                        weight=ft.FontWeight.BOLD,
                        text_align=ft.TextAlign.CENTER,
                        color=theme.ON_ACCENT if filled else theme.INK,
                    ),
                ),
            ),
        ),
    )


def _after(texts: Texts, view: "BounceView | None", again: Handler) -> list[ft.Control]:
    useful = view is not None and view.frequency is not None
    return [
        *([body(texts("bounce.rhythm"))] if useful else []),
        *[body(note) for note in (view.notes if view else ())],
        main_action(texts("bounce.again"), ft.Icons.REPLAY, again, calls=not useful),
    ]
