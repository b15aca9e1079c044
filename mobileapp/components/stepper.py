"""A value that a thumb sets: tap for one step, hold for many, or type it."""

import asyncio
from collections.abc import Callable
from dataclasses import dataclass
from typing import Final

import flet as ft

from mobileapp import theme
from mobileapp.components.words import alarm
from mobileapp.format import NotANumberError, parse, typed
from mobileapp.texts import Texts
from mobileapp.units import Amount, step_from

_REPEAT_S: Final = 0.08
_FASTER_AFTER: Final = 12  # repeats; then each is five steps


@dataclass(frozen=True)
class Change:
    """What a stepper does with a new value: it saves one field of something.

    Unlike two lambdas, two changes of the same field are equal, so a stepper whose value stays
    needn't render again.

    Attributes:
        save: keeps it, as ``save(*where, field=amount)``.
        where: what the field belongs to.
        field: its name.
    """

    save: Callable[..., None]
    where: tuple[object, ...]
    field: str

    def __call__(self, amount: Amount) -> None:
        """Save a new value."""
        self.save(*self.where, **{self.field: amount})


@ft.memo
@ft.component
def Stepper(
    name: str,
    amount: Amount,
    on_change: Change,
    texts: Texts,
    error: str | None = None,
) -> ft.Control:
    """A named value between less and more.

    Args:
        name: what it is.
        amount: its value and unit.
        on_change: gets the new value, in the same unit.
        texts: words.
        error: a sentence about the value, or None.
    """
    draft, set_draft = ft.use_state("")
    wrong, set_wrong = ft.use_state(None)
    latest = ft.use_ref(amount)
    latest.current = amount
    holding = ft.use_ref(lambda: False)

    def step(steps: int) -> None:
        set_draft("")
        set_wrong(None)
        changed = step_from(latest.current, steps)
        latest.current = changed
        on_change(changed)

    async def hold(direction: int) -> None:
        holding.current = True
        repeats = 0
        while holding.current:
            step(direction * (5 if repeats > _FASTER_AFTER else 1))
            repeats += 1
            await asyncio.sleep(_REPEAT_S)

    def release() -> None:
        holding.current = False

    def type_in(event: ft.Event[ft.TextField]) -> None:
        set_draft(event.control.value)
        try:
            value = parse(event.control.value)
        except NotANumberError:
            set_wrong(texts("input.not_a_number"))
            return
        set_wrong(None)
        on_change(Amount(value, amount.unit))

    def button(label: str, icon: ft.IconData, direction: int) -> ft.Control:
        async def start(_event: object) -> None:
            await hold(direction)

        return ft.Semantics(
            label=label,
            button=True,
            container=True,
            content=ft.GestureDetector(
                on_tap=lambda: step(direction),
                on_long_press_start=start,
                on_long_press_end=release,
                content=ft.Container(
                    width=theme.MAIN_ACTION,
                    height=theme.MAIN_ACTION,
                    border_radius=theme.CORNER,
                    bgcolor=theme.PAPER,
                    border=ft.Border.all(2, theme.ACCENT),
                    alignment=ft.Alignment.CENTER,
                    content=ft.Icon(icon, color=theme.ACCENT, size=32),
                ),
            ),
        )

    shown = draft or typed(amount.value, amount.unit, comma=texts.comma)
    return ft.Column(
        spacing=theme.GAP,
        controls=[
            ft.Text(f"{name}, {amount.unit}", size=theme.SMALL, color=theme.QUIET),
            ft.Row(
                spacing=theme.GAP,
                controls=[
                    button(texts("stepper.less", name=name), ft.Icons.REMOVE, -1),
                    ft.Container(
                        expand=True,
                        height=theme.MAIN_ACTION,
                        border=ft.Border.all(1, theme.LINE),
                        border_radius=theme.CORNER,
                        alignment=ft.Alignment.CENTER,
                        content=ft.TextField(
                            value=shown,
                            # The name above is for the eye; this one is for screen readers.
                            label=name,
                            label_style=ft.TextStyle(size=1, color=ft.Colors.TRANSPARENT),
                            on_change=type_in,
                            on_blur=lambda: set_draft(""),
                            keyboard_type=ft.KeyboardType.NUMBER,
                            text_align=ft.TextAlign.CENTER,
                            text_size=30,
                            border=ft.InputBorder.NONE,
                            content_padding=0,
                        ),
                    ),
                    button(texts("stepper.more", name=name), ft.Icons.ADD, 1),
                ],
            ),
            *([alarm(wrong or error)] if wrong or error else []),
        ],
    )
