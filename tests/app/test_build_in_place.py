"""The command line around a build: whatever goes wrong, one sentence and no half-made site."""

import errno
import json
import os
import socket
import subprocess
import sys
from pathlib import Path

import pytest

from mobileapp.pwa import build as build_module
from mobileapp.pwa import command
from mobileapp.pwa.build import build, is_current
from mobileapp.pwa.files import write_whole
from mobileapp.pwa.paths import CHECKOUT
from mobileapp.pwa.problem import BuildProblem
from mobileapp.pwa.release import assemble
from mobileapp.pwa.sources import fingerprint


def small_site(text=b"hello"):
    root = {"index.html": text, "sw.js": b"const FILES = {{files}};"}
    return assemble(root, {"boot.js": b"// {{release}}"}, "1.0", fingerprint())


@pytest.fixture
def small(monkeypatch):
    """Builds take milliseconds: the site is three files."""
    monkeypatch.setattr(build_module, "make_site", small_site)
    monkeypatch.setattr(build_module, "compressed", lambda _: {})


def contents(folder):
    return {p: p.read_bytes() for p in sorted(folder.rglob("*")) if p.is_file()}


def fails_while_writing(error):
    def write_tree(folder, files):
        for name, content in list(files.items())[:2]:
            write_whole(folder / name, content)
        raise error

    return write_tree


def run(capsys, *arguments):
    code = command.main(arguments)
    return code, capsys.readouterr().err


@pytest.mark.usefixtures("small")
def test_a_build_lies_in_its_folder_and_nothing_beside_it(tmp_path):
    out = tmp_path / "deep" / "site"
    build(out)
    assert json.loads((out / "release.json").read_text())["files"]
    assert {path.name for path in out.parent.iterdir()} == {"site"}


@pytest.mark.usefixtures("small")
@pytest.mark.parametrize(
    ("error", "said"),
    [
        (OSError(errno.ENOSPC, os.strerror(errno.ENOSPC), "some/file"), "The disk is full"),
        (OSError(errno.EIO, os.strerror(errno.EIO)), "Input/output error"),
        (BuildProblem("It broke."), "It broke."),
        (KeyboardInterrupt(), "Stopped."),
    ],
)
def test_a_failed_build_leaves_the_earlier_one_untouched(
    tmp_path, monkeypatch, capsys, error, said
):
    out = tmp_path / "site"
    build(out)
    before = contents(out)
    monkeypatch.setattr(build_module, "make_site", lambda: small_site(b"newer"))
    monkeypatch.setattr(build_module, "write_tree", fails_while_writing(error))
    code, shown = run(capsys, "build", "--out", str(out))
    assert code > 0
    assert shown.startswith(said)
    assert shown.count("\n") == 1
    assert contents(out) == before
    assert {path.name for path in tmp_path.iterdir()} == {"site"}


@pytest.mark.usefixtures("small")
def test_a_first_build_that_fails_leaves_nothing_to_serve(tmp_path, monkeypatch, capsys):
    out = tmp_path / "site"
    full = OSError(errno.ENOSPC, os.strerror(errno.ENOSPC))
    monkeypatch.setattr(build_module, "write_tree", fails_while_writing(full))
    assert command.main(["build", "--out", str(out)]) == 1
    assert not list(tmp_path.iterdir())
    capsys.readouterr()
    code, shown = run(capsys, "serve", "--site", str(out))
    assert code == 1
    assert shown.startswith(f"There is no build in {out}")


@pytest.mark.usefixtures("small")
def test_a_folder_with_other_things_in_it_is_never_replaced(tmp_path, capsys):
    (tmp_path / "photos").mkdir()
    (tmp_path / "photos" / "bike.jpg").write_bytes(b"dear")
    code, shown = run(capsys, "build", "--out", str(tmp_path / "photos"))
    assert code == 1
    assert "holds something else than a build" in shown
    assert (tmp_path / "photos" / "bike.jpg").read_bytes() == b"dear"


@pytest.mark.usefixtures("small")
def test_an_out_that_cannot_be_a_folder_is_one_sentence(tmp_path, capsys):
    (tmp_path / "file").write_text("in the way")
    code, shown = run(capsys, "build", "--out", str(tmp_path / "file" / "site"))
    assert code == 1
    assert shown.count("\n") == 1
    assert "file" in shown


@pytest.mark.usefixtures("small")
def test_a_build_is_made_again_only_when_its_sources_changed(tmp_path, monkeypatch):
    out = tmp_path / "site"
    assert not is_current(out)
    build(out)
    assert is_current(out)
    monkeypatch.setattr(build_module, "fingerprint", lambda: "another")
    assert not is_current(out)


@pytest.mark.usefixtures("small")
def test_a_site_that_lost_a_file_is_not_served(tmp_path, capsys):
    out = tmp_path / "site"
    build(out)
    (out / "index.html").write_bytes(b"cut")
    code, shown = run(capsys, "serve", "--site", str(out))
    assert code == 1
    assert "damaged at index.html" in shown


@pytest.mark.usefixtures("small")
def test_a_port_in_use_is_one_sentence(tmp_path, capsys):
    build(tmp_path / "site")
    with socket.create_server(("127.0.0.1", 0)) as other:
        port = str(other.getsockname()[1])
        code, shown = run(capsys, "serve", "--site", str(tmp_path / "site"), "--port", port)
    assert code == 1
    assert shown == f"Port {port} is in use by another program; choose one with --port.\n"


def test_a_page_without_its_files_is_one_sentence(tmp_path, monkeypatch):
    monkeypatch.setattr(build_module, "PAGE", tmp_path)
    with pytest.raises(BuildProblem, match=r"lacks index\.html and sw\.js"):
        build_module._page()  # noqa: SLF001  # the step alone; a whole build takes longer


@pytest.mark.parametrize("port", ["-1", "65536", "eighty"])
def test_a_port_that_is_none_is_refused_by_name(port):
    done = subprocess.run(
        [sys.executable, "-m", "mobileapp", "serve", "--port", port],
        cwd=CHECKOUT,
        capture_output=True,
        text=True,
        check=False,
    )
    assert done.returncode == 2
    assert f"'{port}' is not a port" in done.stderr or "expected one argument" in done.stderr
    assert "Traceback" not in done.stderr


def test_half_a_file_is_never_seen(tmp_path):
    path = tmp_path / "file"
    write_whole(path, b"first")
    with pytest.raises(TypeError):
        write_whole(path, "not bytes")
    assert path.read_bytes() == b"first"
    assert [p.name for p in Path(tmp_path).iterdir()] == ["file"]
