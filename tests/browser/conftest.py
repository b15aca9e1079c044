"""The built app and a phone to use it with."""

from pathlib import Path

import pytest
from playwright.sync_api import sync_playwright

from mobileapp.pwa.command import build_if_needed
from mobileapp.pwa.paths import DEFAULT_SITE
from tests.browser.chromium import launch
from tests.browser.phone import PHONE, Phone
from tests.browser.site import Server

SCREENSHOTS = Path(__file__).parent.parent.parent / ".screenshots"


@pytest.fixture(scope="session")
def site():
    """The folder of the built app, built now if it is not up to date."""
    build_if_needed(DEFAULT_SITE)
    return DEFAULT_SITE


@pytest.fixture
def server(site):
    """The app on a server of its own."""
    running = Server(site)
    yield running
    running.kill()


@pytest.fixture(scope="session")
def chromium():
    """A real Chromium."""
    with sync_playwright() as playwright:
        browser = launch(playwright)
        yield browser
        browser.close()


@pytest.fixture
def context(chromium):
    """A fresh profile: nothing kept, nothing saved."""
    fresh = chromium.new_context(**PHONE)
    yield fresh
    fresh.close()


@pytest.fixture
def phone(context, server):
    """A phone with the app open for the first time."""
    device = Phone(context, server.address).open()
    yield device
    assert device.foreign == []
    assert device.errors == []


@pytest.fixture
def screenshot():
    """Save a picture of a phone's screen for people to look at."""
    SCREENSHOTS.mkdir(exist_ok=True)
    return lambda phone, name: phone.page.screenshot(path=SCREENSHOTS / f"{name}.png")
