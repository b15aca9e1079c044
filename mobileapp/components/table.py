"""A small table: a name and its values, row under row."""

from collections.abc import Sequence

import flet as ft

from mobileapp import theme

_NAME_SHARE = 4
_VALUE_SHARE = 3


def table(head: Sequence[str], rows: Sequence[Sequence[str]]) -> ft.Control:
    """Return a table.

    Args:
        head: what each column is, or nothing; the first one holds names.
        rows: of texts, as many as there are columns.
    """
    return ft.Column(
        spacing=0,
        horizontal_alignment=ft.CrossAxisAlignment.STRETCH,
        controls=[
            *([_row(head, theme.QUIET)] if head else []),
            *[_row(row, theme.INK) for row in rows],
        ],
    )


def _row(cells: Sequence[str], colour: ft.ColorValue) -> ft.Control:
    # Read as one: a screen reader says the name with its values.
    return ft.MergeSemantics(
        content=ft.Container(
            padding=ft.Padding.symmetric(vertical=theme.GAP),
            border=ft.Border.only(bottom=ft.BorderSide(1, theme.LINE)),
            content=ft.Row(
                spacing=theme.GAP,
                vertical_alignment=ft.CrossAxisAlignment.START,
                controls=[
                    ft.Text(
                        cell,
                        size=theme.SMALL,
                        color=colour if column else theme.QUIET,
                        expand=_VALUE_SHARE if column else _NAME_SHARE,
                    )
                    for column, cell in enumerate(cells)
                ],
            ),
        )
    )
