"""What can be tapped."""

from collections.abc import Callable

import flet as ft

from mobileapp import theme

Handler = Callable[[], object]


def main_action(
    label: str, icon: ft.IconData, on_click: Handler, *, calls: bool = True
) -> ft.Control:
    """One of the few things a screen is for.

    Args:
        label: what it does.
        icon: its sign.
        on_click: does it.
        calls: filled with the accent; at most one or two on a screen.
    """
    kind = ft.FilledButton if calls else ft.OutlinedButton
    return kind(
        content=label,
        icon=icon,
        on_click=on_click,
        style=ft.ButtonStyle(
            # At least `theme.MAIN_ACTION` high, and more for larger text.
            padding=(theme.MAIN_ACTION - theme.TITLE) / 2,
            shape=ft.RoundedRectangleBorder(radius=theme.CORNER),
            text_style=theme.bold(theme.TITLE),
            icon_size=theme.TITLE + 6,
            side=ft.BorderSide(2, theme.ACCENT),
        ),
    )


def icon_action(
    label: str, icon: ft.IconData, on_click: Handler, color: ft.ColorValue = theme.ACCENT
) -> ft.Control:
    """A sign alone; its label is for screen readers."""
    return ft.MergeSemantics(
        content=ft.Semantics(
            label=label,
            content=ft.IconButton(
                icon,
                on_click=on_click,
                icon_color=color,
                icon_size=theme.TITLE + 6,
                width=theme.TOUCH,
                height=theme.TOUCH,
            ),
        )
    )


def word_action(
    label: str,
    on_click: Handler | None = None,
    *,
    url: str | None = None,
    key: str | None = None,
) -> ft.Control:
    """A word that does something, or leads to another page."""
    return ft.TextButton(
        key=key,
        content=label,
        on_click=on_click,
        url=url,
        height=theme.TOUCH,
        style=ft.ButtonStyle(text_style=theme.bold(theme.BODY), color=theme.ACCENT),
    )


def opener(label: str, on_click: Handler, *, is_open: bool) -> ft.Control:
    """A word that shows what is below it, or hides it again."""
    return ft.Semantics(
        expanded=is_open,
        content=ft.TextButton(
            content=label,
            icon=ft.Icons.EXPAND_LESS if is_open else ft.Icons.EXPAND_MORE,
            on_click=on_click,
            height=theme.TOUCH,
            style=ft.ButtonStyle(text_style=theme.bold(theme.BODY), color=theme.ACCENT),
        ),
    )
