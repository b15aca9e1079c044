"""A new release: it waits, takes over whole when told, and leaves saved data alone."""

import pytest

from tests.browser.releases import next_release, release_of
from tests.browser.site import Server


@pytest.fixture
def changing_server(site, tmp_path):
    """A server whose folder a test may exchange."""
    folder = tmp_path / "site"
    folder.symlink_to(site)
    server = Server(folder)
    yield server
    server.kill()


@pytest.fixture
def server(changing_server):
    return changing_server


def exchange(server, site):
    """Serve another folder at the same address."""
    server.kill()
    server.folder.unlink()
    server.folder.symlink_to(site)
    server.start()


def look_for_update(phone):
    phone.page.evaluate(
        "navigator.serviceWorker.getRegistration().then((registration) => registration.update())"
    )


def test_a_new_release_waits_until_it_is_wanted(phone, server, site, tmp_path):
    phone.offline_ready()
    first = release_of(phone)
    phone.press("Measure sag")
    phone.type_into("Sag reading", "30")
    phone.sees("20.0 ± 1.3 %")
    phone.press("Back")
    exchange(server, next_release(site, tmp_path / "next"))
    look_for_update(phone)
    phone.sees("A new version is ready.")
    phone.reload()
    assert release_of(phone) == first
    phone.sees("A new version is ready.")
    with phone.page.expect_navigation():
        phone.press("Update")
    phone.started()
    assert release_of(phone) != first
    phone.sees("Front 20.0 ± 1.3 %")
    server.kill()
    phone.reload()
    assert release_of(phone) != first
    server.start()


def test_an_incomplete_release_is_never_installed(phone, server, site, tmp_path):
    phone.offline_ready()
    first = release_of(phone)
    broken = next_release(site, tmp_path / "next")
    (changed,) = broken.glob("r/*/style.css")
    changed.write_bytes(changed.read_bytes()[::-1])  # not what the list says
    exchange(server, broken)
    look_for_update(phone)
    phone.page.wait_for_timeout(3000)
    phone.sees_not("A new version is ready.")
    server.kill()
    phone.reload()
    assert release_of(phone) == first
    phone.sees("Ready offline")
    server.start()


def test_an_update_fetches_only_what_changed(phone, server, site, tmp_path):
    phone.offline_ready()
    exchange(server, next_release(site, tmp_path / "next"))
    fetched = []
    phone.context.on("request", lambda request: fetched.append(request.url))
    look_for_update(phone)
    phone.sees("A new version is ready.")
    assert not [url for url in fetched if "main.dart.js" in url or url.endswith(".wasm")]
    assert [url for url in fetched if url.endswith("style.css")]
