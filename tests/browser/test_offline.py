"""The app without a network: it starts and works, every time."""

import json

from tests.browser.chromium import ARGUMENTS, find_chromium
from tests.browser.phone import PHONE, Phone


def test_it_starts_without_the_server_again_and_again(phone, server):
    phone.offline_ready()
    server.kill()
    for _ in range(3):
        phone.reload()
    phone.sees("Ready offline")
    server.start()


def test_a_new_tab_starts_without_the_server(phone, context, server):
    phone.offline_ready()
    server.kill()
    other = Phone(context, server.address).open()
    other.press("Measure sag")
    other.sees("Fork travel")
    server.start()


def test_everything_served_is_on_the_list_with_its_hash(site):
    listed = {entry["path"] for entry in json.loads((site / "release.json").read_text())["files"]}
    present = {str(path.relative_to(site)) for path in site.rglob("*") if path.is_file()}
    twins = {path for path in present if path.endswith((".br", ".gz"))}
    assert present - twins == listed | {"sw.js", "release.json"}


def test_the_browser_would_install_it(chromium, server, tmp_path):
    # Chromium installs nothing from the private profiles that other tests use.
    context = chromium.browser_type.launch_persistent_context(
        tmp_path, executable_path=find_chromium(), args=ARGUMENTS, **PHONE
    )
    phone = Phone(context, server.address).open().offline_ready()
    devtools = context.new_cdp_session(phone.page)
    assert devtools.send("Page.getInstallabilityErrors")["installabilityErrors"] == []
    manifest = devtools.send("Page.getAppManifest")
    assert manifest["errors"] == []
    assert json.loads(manifest["data"])["id"] == "./"
    context.close()


def test_the_policy_forbids_other_origins(phone):
    blocked = phone.page.evaluate(
        "fetch('https://example.org/').then(() => false, () => true)",
    )
    assert blocked
    assert [url for url in phone.foreign if "example.org" in url] == phone.foreign
    phone.foreign.clear()


def test_the_licences_are_reachable(phone):
    phone.offline_ready()
    phone.press("About and cautions")
    phone.sees("Never exceed the pressure printed on the unit.")
    with phone.context.expect_page() as opened:
        phone.button("Licences of the software inside").dispatch_event("click")
    opened.value.wait_for_load_state()
    assert "SIL OPEN FONT LICENSE" in opened.value.content()
