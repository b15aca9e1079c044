"""Placing things along a line whose length the screen decides."""

from typing import Final

import flet as ft

PARTS: Final = 1000  # that a whole line has


def along(before: int, control: ft.Container, width: int, after: int) -> ft.Control:
    """Place a control along a line.

    Args:
        before: parts of the line before it.
        control: to be placed.
        width: parts that it takes; 0 keeps its own width.
        after: parts of the line after it.
    """
    control.expand = width or None
    gaps = (ft.Container(expand=before or None), ft.Container(expand=after or None))
    return ft.Row(spacing=0, controls=[gaps[0], control, gaps[1]])
