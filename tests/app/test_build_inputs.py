"""Downloads: pinned, checked, kept; and what is said when one fails.

pip works here on a folder of made-up wheels, never on the network.
"""

import subprocess
import tomllib
import zipfile
from hashlib import sha256

import flet
import pytest

from mobileapp.pwa import inputs, numpy_wheel
from mobileapp.pwa.inputs import Pin, fetch, read_pins
from mobileapp.pwa.paths import CHECKOUT
from mobileapp.pwa.problem import BuildProblem


def make_wheel(
    folder, name="springy", *, version="1.0", content="RATE = 1\n", needs="", member=None
):
    """Write the smallest wheel that pip takes, and give its pin."""
    stem = name.replace("-", "_")
    about = f"{stem}-{version}.dist-info"
    wheel = folder / f"{stem}-{version}-py3-none-any.whl"
    with zipfile.ZipFile(wheel, "w") as archive:
        archive.writestr(member or f"{stem}.py", content)
        archive.writestr(
            f"{about}/METADATA", f"Metadata-Version: 2.1\nName: {name}\nVersion: {version}\n{needs}"
        )
        archive.writestr(
            f"{about}/WHEEL", "Wheel-Version: 1.0\nRoot-Is-Purelib: true\nTag: py3-none-any\n"
        )
        archive.writestr(f"{about}/RECORD", "")
    return Pin(name, version, sha256(wheel.read_bytes()).hexdigest())


@pytest.fixture
def shelf(tmp_path, monkeypatch):
    """A folder that is all the index pip knows, and a cache of its own."""
    folder = tmp_path / "shelf"
    folder.mkdir()
    monkeypatch.setenv("PIP_CONFIG_FILE", "/dev/null")
    monkeypatch.setenv("PIP_NO_INDEX", "1")
    monkeypatch.setenv("PIP_FIND_LINKS", str(folder))
    monkeypatch.setenv("XDG_CACHE_HOME", str(tmp_path / "cache"))
    monkeypatch.setattr(inputs, "cache", lambda: tmp_path / "cache")
    monkeypatch.setattr(numpy_wheel, "cache", lambda: tmp_path / "cache")
    return folder


def test_a_download_is_kept_and_not_fetched_again(shelf):
    pin = make_wheel(shelf)
    kept = fetch([pin])["springy"]
    assert sha256(kept.read_bytes()).hexdigest() == pin.sha256
    (shelf / "springy-1.0-py3-none-any.whl").unlink()
    assert fetch([pin])["springy"] == kept


def test_a_damaged_cache_is_fetched_anew(shelf):
    pin = make_wheel(shelf)
    kept = fetch([pin])["springy"]
    kept.write_bytes(kept.read_bytes()[:-1])
    assert sha256(fetch([pin])["springy"].read_bytes()).hexdigest() == pin.sha256


def test_another_content_than_pinned_is_refused_and_not_kept(shelf, tmp_path):
    pin = make_wheel(shelf)
    make_wheel(shelf, content="RATE = 2\n")
    with pytest.raises(BuildProblem, match=r"springy 1\.0 differs from its pinned SHA-256"):
        fetch([pin])
    assert not list((tmp_path / "cache").rglob("*.whl"))


def test_a_missing_network_is_one_sentence(shelf):
    absent = Pin("springy", "1.0", "0" * 64)
    with pytest.raises(
        BuildProblem, match=r"Could not download springy 1\.0 .*check the conn"
    ) as e:
        fetch([absent])
    assert "\n" not in str(e.value)
    assert not list(shelf.iterdir())


def test_a_disk_that_fills_up_while_pip_downloads_is_one_sentence(shelf, monkeypatch):
    pin = make_wheel(shelf)
    # What pip 26 ends with when its temporary folder is full, a traceback before it.
    said = "ERROR: Exception:\nTraceback ...\nOSError: [Errno 28] No space left on device\n"
    failed = subprocess.CompletedProcess([], 2, stderr=said)
    monkeypatch.setattr(subprocess, "run", lambda *_, **__: failed)
    with pytest.raises(BuildProblem, match=r"^The disk is full: no room to download springy"):
        fetch([pin])


def test_a_line_that_pins_nothing_is_refused(tmp_path):
    pins = tmp_path / "pins.txt"
    pins.write_text("# fine\nspringy>=1.0\n")
    with pytest.raises(BuildProblem, match=r"pins nothing: 'springy>=1\.0'"):
        read_pins(pins)


def test_every_carried_wheel_is_pinned_to_one_version_and_content():
    pins = read_pins()
    assert {pin.name for pin in pins} >= {"flet", "flet-charts", "flet-web", "msgpack"}
    assert len({pin.name for pin in pins}) == len(pins)


def test_the_carried_flet_is_the_one_that_the_project_is_written_with():
    project = tomllib.loads((CHECKOUT / "pyproject.toml").read_text("utf-8"))["project"]
    pins = {f"{pin.name}=={pin.version}" for pin in read_pins()}
    written_with = {line for line in project["dependencies"] if line.startswith("flet")}
    assert written_with
    assert written_with <= pins
    assert {pin.version for pin in read_pins() if pin.name.startswith("flet")} == {flet.__version__}


@pytest.fixture
def carrier(shelf, monkeypatch):
    """A made-up wheel with a made-up numpy inside, pinned as the real one is."""

    def make(numpy):
        pin = make_wheel(
            shelf,
            "open-webui",
            version="0.12.4",
            content=numpy,
            needs="Requires-Python: <3.13,>=3.11\n",
            member=numpy_wheel.MEMBER,
        )
        monkeypatch.setattr(numpy_wheel, "read_pins", lambda _: [pin])

    return make


def test_only_numpy_is_kept_of_the_wheel_that_carries_it(carrier, monkeypatch, tmp_path):
    carrier(b"numpy")
    monkeypatch.setattr(numpy_wheel, "MEMBER_SHA256", sha256(b"numpy").hexdigest())
    assert numpy_wheel.fetch_numpy().read_bytes() == b"numpy"
    assert len(list((tmp_path / "cache").rglob("*.whl"))) == 1


def test_another_numpy_than_pinned_is_refused_and_not_kept(carrier, tmp_path):
    carrier(b"not numpy")
    with pytest.raises(BuildProblem, match="numpy for the browser differs"):
        numpy_wheel.fetch_numpy()
    assert not list((tmp_path / "cache").rglob("*.whl"))
