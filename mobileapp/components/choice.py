"""A choice between a few words, all in sight."""

from collections.abc import Callable

import flet as ft

from mobileapp import theme


def choice(
    name: str,
    options: list[tuple[str, str]],
    chosen: str,
    on_change: Callable[[str], None],
) -> ft.Control:
    """Return a named choice.

    Args:
        name: what is chosen.
        options: keys and words.
        chosen: key of the present one; it is filled and ticked.
        on_change: gets the key of another one.
    """
    return ft.Column(
        spacing=theme.GAP,
        controls=[
            ft.Text(name, size=theme.SMALL, color=theme.QUIET),
            ft.Row(
                spacing=theme.GAP,
                intrinsic_height=True,
                vertical_alignment=ft.CrossAxisAlignment.STRETCH,
                controls=[_option(key, word, key == chosen, on_change) for key, word in options],
            ),
        ],
    )


def _option(
    key: str,
    word: str,
    chosen: bool,  # noqa: FBT001 - private
    on_change: Callable[[str], None],
) -> ft.Control:
    return ft.Semantics(
        key=key,
        button=True,
        selected=chosen,
        container=True,
        expand=True,
        content=ft.Container(
            # No fixed height: words grow with the person's text size.
            padding=ft.Padding.symmetric(horizontal=theme.GAP, vertical=theme.MARGIN),
            border_radius=theme.CORNER,
            border=ft.Border.all(2, theme.ACCENT),
            bgcolor=theme.ACCENT if chosen else theme.PAPER,
            alignment=ft.Alignment.CENTER,
            ink=True,
            on_click=lambda: on_change(key),
            content=ft.Row(
                alignment=ft.MainAxisAlignment.CENTER,
                spacing=theme.GAP,
                controls=[
                    *([ft.Icon(ft.Icons.CHECK, color=theme.ON_ACCENT)] if chosen else []),
                    ft.Text(
                        word,
                        expand=True,
                        expand_loose=True,
                        text_align=ft.TextAlign.CENTER,
                        size=theme.BODY,
                        weight=ft.FontWeight.BOLD,
                        color=theme.ON_ACCENT if chosen else theme.ACCENT,
                    ),
                ],
            ),
        ),
    )
