"""The app's entry: sets the page up and hands over to `mobileapp.app`."""

import asyncio

import flet as ft

from mobileapp import browser, theme
from mobileapp.app import App
from mobileapp.state import AppState


async def main(page: ft.Page) -> None:
    """Show the app on a page."""
    state = AppState()
    page.title = state.texts("app.name")
    page.theme = theme.theme(theme.SUN)
    page.dark_theme = theme.theme(theme.DARK)
    page.on_resize = lambda: state.turned(page)
    state.turned(page)
    await state.start()
    state.dress(page)
    page.render_views(App, lambda: state)
    browser.mark_usable()
    asyncio.create_task(state.follow_page())  # noqa: RUF006 - lives as long as the page


if __name__ == "__main__":
    ft.run(main)
