"""How screens reach the app's state."""

import flet as ft

from mobileapp.state import AppState

StateContext: ft.ContextProvider[AppState | None] = ft.create_context(None)


def use_app() -> AppState:
    """Return the app's state; the calling component re-renders when it changes."""
    state = ft.use_context(StateContext)
    assert state is not None  # noqa: S101 - `App` provides it to every screen
    return state
