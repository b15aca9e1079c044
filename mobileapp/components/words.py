"""Text in the app's sizes."""

import flet as ft

from mobileapp import theme
from mobileapp.format import Reading


def title(text: str) -> ft.Control:
    """A heading within a screen."""
    return ft.Semantics(
        header=True,
        content=ft.Text(text, size=theme.TITLE, weight=ft.FontWeight.BOLD, color=theme.INK),
    )


def body(text: str) -> ft.Text:
    """A sentence."""
    return ft.Text(text, size=theme.BODY, color=theme.QUIET)


def alarm(text: str) -> ft.Control:
    """A sentence about what is wrong, with a sign so that it isn't colour alone."""
    return ft.Semantics(
        live_region=True,
        content=ft.Row(
            vertical_alignment=ft.CrossAxisAlignment.START,
            controls=[
                ft.Icon(ft.Icons.WARNING_AMBER, color=theme.ALARM),
                ft.Text(text, size=theme.BODY, color=theme.ALARM, expand=True),
            ],
        ),
    )


def figure(reading: Reading, size: int = theme.LARGE) -> ft.Control:
    """A reading in large figures, its unit smaller beside it and its ± below."""
    return ft.Semantics(
        label=str(reading),
        container=True,
        exclude_semantics=True,
        content=ft.Column(
            spacing=0,
            controls=[
                ft.Text(
                    spans=[
                        ft.TextSpan(reading.value, _figures(size)),
                        ft.TextSpan(f" {reading.unit}", _figures(size // 2)),
                    ]
                ),
                ft.Text(reading.range, size=theme.TITLE, color=theme.INK),
            ],
        ),
    )


def _figures(size: int) -> ft.TextStyle:
    return ft.TextStyle(size=size, weight=ft.FontWeight.BOLD, color=theme.INK)
