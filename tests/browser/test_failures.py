"""What a person sees when something is wrong: a sentence, never a blank page."""

import shutil

import pytest

from tests.browser.chromium import ARGUMENTS, find_chromium
from tests.browser.phone import PHONE, START_MS, Phone
from tests.browser.site import Server


@pytest.fixture
def damaged(site, tmp_path):
    """A copy of the app, to be damaged, and its server."""
    folder = tmp_path / "site"
    shutil.copytree(site, folder, ignore=shutil.ignore_patterns("*.br", "*.gz"))
    server = Server(folder)
    yield server
    server.kill()


def failure(context, server):
    page = context.new_page()
    page.goto(server.address)
    page.wait_for_selector("html[data-app=failed]", state="attached", timeout=START_MS)
    return page.locator("#failure").inner_text()


@pytest.mark.parametrize(
    ("part", "sentence"),
    [
        ("app.pack", "Python did not start."),
        ("worker.js", "Python did not start."),
        ("python/pyodide.asm.wasm", "Python did not start."),
        ("client/main.dart.js", "A part of the app did not load"),
    ],
)
def test_a_missing_part_is_told(context, damaged, part, sentence):
    next(damaged.folder.glob(f"r/*/{part}")).unlink()
    told = failure(context, damaged)
    assert sentence in told
    assert "What you saved on this device is untouched." in told


def test_an_address_that_cannot_go_offline_says_so(chromium, site):
    # A name of another machine, as a phone would use; plain http makes it insecure.
    server = Server(site)
    browser = chromium.browser_type.launch(
        executable_path=find_chromium(),
        args=[*ARGUMENTS, "--host-resolver-rules=MAP phone.test 127.0.0.1"],
    )
    context = browser.new_context(**PHONE)
    phone = Phone(context, server.address.replace("localhost", "phone.test")).open()
    phone.sees("This address can't work offline")
    assert phone.state("offline") == "failed"
    phone.press("Measure sag")
    phone.sees("Fork travel")
    browser.close()
    server.kill()
