"""Which address shows which screen."""

from collections.abc import Callable

import flet as ft

from mobileapp.screens.about import AboutScreen
from mobileapp.screens.balance import BalanceScreen
from mobileapp.screens.bounce import BounceScreen
from mobileapp.screens.home import HomeScreen
from mobileapp.screens.rebound import ReboundScreen
from mobileapp.screens.sag import SagScreen
from mobileapp.screens.settings import SettingsScreen
from mobileapp.screens.trail import TrailScreen
from mobileapp.shared import StateContext
from mobileapp.state import AppState


@ft.component
def App(get_state: Callable[[], AppState]) -> ft.Control:
    """The whole app: one view on top of another, as the address says.

    It gets a function, not the state itself: it needn't render again when the state changes, only
    the screens need to.
    """
    return StateContext(
        get_state(),
        lambda: ft.Router(
            [
                ft.Route(
                    component=HomeScreen,
                    children=[
                        ft.Route(path="about", component=AboutScreen),
                        ft.Route(path="settings", component=SettingsScreen),
                        ft.Route(path="sag/:key", component=SagScreen),
                        ft.Route(path="bounce/:key", component=BounceScreen),
                        ft.Route(path="rebound/:key", component=ReboundScreen),
                        ft.Route(path="trail/:key", component=TrailScreen),
                        ft.Route(path="balance/:key", component=BalanceScreen),
                    ],
                )
            ],
            not_found=HomeScreen,
            manage_views=True,
        ),
    )
