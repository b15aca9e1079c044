"""The local server: what a browser gets, and what nobody gets."""

import gzip
import http.client
import threading

import brotli
import pytest

from mobileapp.pwa.command import HOST
from mobileapp.pwa.policy import CONTENT_SECURITY_POLICY
from mobileapp.pwa.server import make_server

SCRIPT = b"self.addEventListener('fetch', () => {});\n" * 50


@pytest.fixture(scope="module")
def site(tmp_path_factory):
    folder = tmp_path_factory.mktemp("served") / "site"
    (folder / "r" / "abc" / "python").mkdir(parents=True)
    (folder.parent / "secret.txt").write_text("outside")
    (folder / "index.html").write_text("<!doctype html>")
    (folder / "sw.js").write_bytes(SCRIPT)
    worker = folder / "r" / "abc" / "worker.js"
    worker.write_bytes(SCRIPT)
    worker.with_name("worker.js.br").write_bytes(brotli.compress(SCRIPT))
    worker.with_name("worker.js.gz").write_bytes(gzip.compress(SCRIPT))
    for name in ("a.wasm", "a.mjs", "a.pack", "a.zip", "a.json"):
        (folder / "r" / "abc" / "python" / name).write_bytes(b"x")
    (folder / "manifest.webmanifest").write_text("{}")
    return folder


@pytest.fixture(scope="module")
def port(site):
    with make_server(site, "127.0.0.1", 0) as server:
        thread = threading.Thread(target=server.serve_forever)
        thread.start()
        yield server.server_port
        server.shutdown()
        thread.join()


@pytest.fixture
def connection(port):
    connection = http.client.HTTPConnection("127.0.0.1", port, timeout=5)
    yield connection
    connection.close()


def ask(connection, path, method="GET", **headers):
    connection.request(method, path, headers={k.replace("_", "-"): v for k, v in headers.items()})
    response = connection.getresponse()
    return response, response.read()


@pytest.mark.parametrize(
    ("path", "kind"),
    [
        ("/", "text/html; charset=utf-8"),
        ("/sw.js", "text/javascript; charset=utf-8"),
        ("/r/abc/python/a.mjs", "text/javascript; charset=utf-8"),
        ("/r/abc/python/a.wasm", "application/wasm"),
        ("/r/abc/python/a.pack", "application/octet-stream"),
        ("/r/abc/python/a.json?v=1", "application/json"),
        ("/manifest.webmanifest", "application/manifest+json"),
    ],
)
def test_types_are_those_that_browsers_insist_on(connection, path, kind):
    response, _ = ask(connection, path)
    assert response.status == 200
    assert response.headers["Content-Type"] == kind


@pytest.mark.parametrize(
    ("accepted", "encoding", "unpack"),
    [
        ("gzip, deflate, br, zstd", "br", brotli.decompress),
        ("gzip;q=1.0, br;q=0", "gzip", gzip.decompress),
        ("BR", "br", brotli.decompress),
        ("identity", None, bytes),
        ("", None, bytes),
    ],
)
def test_compressed_twins_go_to_those_who_accept_them(connection, accepted, encoding, unpack):
    response, body = ask(connection, "/r/abc/worker.js", Accept_Encoding=accepted)
    assert response.headers["Content-Encoding"] == encoding
    assert response.headers["Vary"] == "Accept-Encoding"
    assert response.headers["Content-Type"] == "text/javascript; charset=utf-8"
    assert unpack(body) == SCRIPT


def test_a_file_without_twins_is_sent_as_it_is(connection):
    response, body = ask(connection, "/sw.js", Accept_Encoding="br, gzip")
    assert response.headers["Content-Encoding"] is None
    assert body == SCRIPT


@pytest.mark.parametrize("path", ["/", "/sw.js", "/r/abc/worker.js"])
def test_the_policy_is_on_the_page_and_on_workers(connection, path):
    response, _ = ask(connection, path)
    assert response.headers["Content-Security-Policy"] == CONTENT_SECURITY_POLICY
    assert response.headers["X-Content-Type-Options"] == "nosniff"
    assert response.headers["Referrer-Policy"] == "no-referrer"


def test_the_policy_names_no_other_origin():
    assert "://" not in CONTENT_SECURITY_POLICY
    assert "*" not in CONTENT_SECURITY_POLICY
    assert "'unsafe-eval'" not in CONTENT_SECURITY_POLICY
    script = next(p for p in CONTENT_SECURITY_POLICY.split("; ") if p.startswith("script-src"))
    assert script == "script-src 'self' 'wasm-unsafe-eval'"


@pytest.mark.parametrize(
    ("path", "kept"),
    [
        ("/", "no-cache"),
        ("/sw.js", "no-cache"),
        ("/manifest.webmanifest", "no-cache"),
        ("/r/abc/worker.js", "public, max-age=31536000, immutable"),
    ],
)
def test_only_a_release_is_kept_for_good(connection, path, kept):
    response, _ = ask(connection, path)
    assert response.headers["Cache-Control"] == kept


@pytest.mark.parametrize(
    "path",
    [
        "/r",
        "/r/",
        "/r/abc/",
        "/absent.js",
        "/../secret.txt",
        "/r/../../secret.txt",
        "/%2e%2e/secret.txt",
        "/r/abc/..%2f..%2f..%2fsecret.txt",
        "/..%5csecret.txt",
        "//secret.txt",
        "/a%00b",
    ],
)
def test_there_is_nothing_but_the_files(connection, path):
    response, body = ask(connection, path)
    assert response.status == 404
    assert b"outside" not in body


def test_head_is_get_without_the_body(connection):
    got, body = ask(connection, "/sw.js")
    head, nothing = ask(connection, "/sw.js", method="HEAD")
    assert nothing == b""
    assert head.headers["Content-Length"] == got.headers["Content-Length"] == str(len(body))


def test_nothing_can_be_written(connection):
    response, _ = ask(connection, "/index.html", method="PUT")
    assert response.status == 501


def test_by_default_only_this_machine_is_served():
    assert HOST == "127.0.0.1"
