"""The frame that all screens share: a bar with the way back, and one column of content."""

import flet as ft

from mobileapp import theme
from mobileapp.components.actions import Handler, icon_action


def screen(
    route: str,
    title: str,
    controls: list[ft.Control],
    *,
    back: tuple[str, Handler] | None = None,
    actions: list[ft.Control] | None = None,
) -> ft.View:
    """Return a screen.

    Args:
        route: its address.
        title: in the bar.
        controls: the column, from top to bottom.
        back: label and handler of the way back; None at home.
        actions: at the right end of the bar.
    """
    return ft.View(
        route=route,
        bgcolor=theme.PAPER,
        padding=0,
        scroll=ft.ScrollMode.AUTO,
        horizontal_alignment=ft.CrossAxisAlignment.CENTER,
        appbar=ft.AppBar(
            leading=icon_action(back[0], ft.Icons.ARROW_BACK, back[1]) if back else None,
            automatically_imply_leading=False,
            title=ft.Text(title, size=theme.TITLE, weight=ft.FontWeight.BOLD, color=theme.INK),
            actions=actions or [],
            bgcolor=theme.PAPER,
            elevation_on_scroll=0,
            toolbar_height=theme.MAIN_ACTION,
        ),
        controls=[
            ft.SafeArea(
                content=ft.Container(
                    padding=ft.Padding.only(
                        left=theme.MARGIN, right=theme.MARGIN, bottom=2 * theme.MARGIN
                    ),
                    width=theme.WIDEST,
                    content=ft.Column(
                        controls=controls,
                        spacing=theme.MARGIN,
                        horizontal_alignment=ft.CrossAxisAlignment.STRETCH,
                    ),
                ),
            )
        ],
    )


def card(*controls: ft.Control, key: str | None = None) -> ft.Control:
    """Return a card around what belongs together."""
    return ft.Container(
        key=key,
        bgcolor=theme.CARD,
        border=ft.Border.all(1, theme.LINE),
        border_radius=theme.CORNER,
        padding=theme.MARGIN,
        content=ft.Column(
            controls=list(controls),
            spacing=theme.GAP,
            horizontal_alignment=ft.CrossAxisAlignment.STRETCH,
        ),
    )
