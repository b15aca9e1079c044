"""The chart of what gets through against speed, for both ends, readable in the sun.

The ends differ by dashes and are named below; the library is imported when the first chart is
drawn, because it arrives after the app's first screen.
"""

from importlib import import_module
from typing import TYPE_CHECKING, Final

import flet as ft

from mobileapp import theme
from mobileapp.texts import Texts

if TYPE_CHECKING:  # it needs numpy, which arrives after the first paint
    from mobileapp.results.trail import BumpView, Curve

_HEIGHT: Final = 240
_DASHES: Final = {"front": None, "rear": [10, 6]}
_LEGEND: Final = {"front": ft.Icons.HORIZONTAL_RULE, "rear": ft.Icons.MORE_HORIZ}


def curves(view: "BumpView", speed_unit: str, texts: Texts) -> ft.Control:
    """Draw the curves of a row of bumps."""
    charts = import_module("flet_charts")

    def line(points: list[tuple[float, float]], width: int, **more: object) -> ft.BaseControl:
        return charts.LineChartData(
            points=[charts.LineChartDataPoint(x, y) for x, y in points],
            stroke_width=width,
            point=False,
            **more,
        )

    def label(value: float, text: str) -> ft.BaseControl:
        words = ft.Text(text, size=theme.SMALL, color=theme.INK)
        return charts.ChartAxisLabel(value=value, label=words)

    top = view.top
    chart = charts.LineChart(
        height=_HEIGHT,
        interactive=False,
        min_x=0,
        max_x=view.fastest_shown,
        min_y=0,
        max_y=top,
        animation=ft.Animation(0),
        border=ft.Border.all(2, theme.LINE),
        left_axis=charts.ChartAxis(
            label_size=60, labels=[label(mark, f"{100 * mark:.0f} %") for mark in view.marks]
        ),
        bottom_axis=charts.ChartAxis(
            label_size=32, labels=[label(speed, f"{speed:.0f}") for speed in view.band]
        ),
        data_series=[
            line([(0, 1), (view.fastest_shown, 1)], 1, color=theme.QUIET),
            *[line([(x, 0), (x, top)], 2, color=theme.ACCENT) for x in view.band],
            *[
                line(list(curve.points), 4, color=theme.INK, dash_pattern=_DASHES[curve.end])
                for curve in view.curves
            ],
        ],
    )
    return ft.Column(
        spacing=theme.GAP,
        controls=[
            ft.Semantics(
                label=texts("trail.chart"),
                image=True,
                container=True,
                exclude_semantics=True,
                content=chart,
            ),
            ft.Row(
                wrap=True,
                spacing=theme.MARGIN,
                controls=[
                    *[_named(curve, texts) for curve in view.curves],
                    ft.Text(speed_unit, size=theme.SMALL, color=theme.QUIET),
                ],
            ),
        ],
    )


def _named(curve: "Curve", texts: Texts) -> ft.Control:
    return ft.Row(
        key=curve.end,
        tight=True,
        spacing=4,
        controls=[
            ft.Icon(_LEGEND[curve.end], color=theme.INK),
            ft.Text(texts(f"sag.{curve.end}"), size=theme.SMALL, color=theme.QUIET),
        ],
    )
