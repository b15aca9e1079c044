"""A small server for the built folder, on this machine.

It does what a good static host does: right types, compressed twins for those who accept them,
lasting caches for releases, the security headers, no listing of folders.
"""

import errno
import posixpath
from functools import partial
from http import HTTPStatus
from http.server import BaseHTTPRequestHandler, ThreadingHTTPServer
from pathlib import Path
from urllib.parse import unquote, urlsplit

from mobileapp.pwa.policy import SECURITY, cache_control
from mobileapp.pwa.problem import BuildProblem

_TYPES = {
    ".css": "text/css; charset=utf-8",
    ".html": "text/html; charset=utf-8",
    ".js": "text/javascript; charset=utf-8",
    ".json": "application/json",
    ".mjs": "text/javascript; charset=utf-8",
    ".otf": "font/otf",
    ".png": "image/png",
    ".svg": "image/svg+xml",
    ".ttf": "font/ttf",
    ".txt": "text/plain; charset=utf-8",
    ".wasm": "application/wasm",
    ".webmanifest": "application/manifest+json",
    ".woff2": "font/woff2",
    ".zip": "application/zip",
}
_OTHER_TYPE = "application/octet-stream"

# Best first.
_TWINS = (("br", ".br"), ("gzip", ".gz"))

_CHUNK_BYTES = 1 << 18


class SiteHandler(BaseHTTPRequestHandler):
    """Answer GET and HEAD from one folder."""

    protocol_version = "HTTP/1.1"
    server_version = "SagAndBounce"
    sys_version = ""

    def __init__(self, folder: Path, *args: object) -> None:
        self._folder = folder
        super().__init__(*args)

    def do_GET(self) -> None:
        """Send a file."""
        self._answer(with_body=True)

    def do_HEAD(self) -> None:
        """Send a file's headers."""
        self._answer(with_body=False)

    def log_message(self, *_: object) -> None:
        """Stay quiet: the terminal shows the address to open, not each request."""

    def _answer(self, *, with_body: bool) -> None:
        path = _site_path(self.path)
        file = self._folder / path if path is not None else None
        if file is None or not file.is_file():
            self._refuse(with_body=with_body)
            return
        encoding, sent = self._twin(file)
        with sent.open("rb") as content:
            size = sent.stat().st_size
            self.send_response(HTTPStatus.OK)
            self.send_header("Content-Type", _TYPES.get(file.suffix, _OTHER_TYPE))
            self.send_header("Content-Length", str(size))
            self.send_header("Cache-Control", cache_control(path or ""))
            self.send_header("Vary", "Accept-Encoding")
            if encoding:
                self.send_header("Content-Encoding", encoding)
            for name, value in SECURITY.items():
                self.send_header(name, value)
            self.end_headers()
            while with_body and (chunk := content.read(_CHUNK_BYTES)):
                self.wfile.write(chunk)

    def _twin(self, file: Path) -> tuple[str | None, Path]:
        """Choose the compressed twin that the browser accepts, if there is one."""
        accepted = _accepted(self.headers.get("Accept-Encoding", ""))
        for encoding, ending in _TWINS:
            twin = file.with_name(file.name + ending)
            if encoding in accepted and twin.is_file():
                return encoding, twin
        return None, file

    def _refuse(self, *, with_body: bool) -> None:
        body = b"There is nothing at this address.\n"
        self.send_response(HTTPStatus.NOT_FOUND)
        self.send_header("Content-Type", "text/plain; charset=utf-8")
        self.send_header("Content-Length", str(len(body)))
        self.send_header("Cache-Control", "no-store")
        self.end_headers()
        if with_body:
            self.wfile.write(body)


class _Server(ThreadingHTTPServer):
    daemon_threads = True
    request_queue_size = 64  # a first visit opens several connections at once

    def handle_error(self, request: object, client_address: object) -> None:
        """Say nothing when a browser hangs up early, which it may."""


def make_server(folder: Path, host: str, port: int) -> ThreadingHTTPServer:
    """Open a server for `folder`; port 0 takes any free one.

    Raises:
        BuildProblem: the port is taken, or may not be opened.
    """
    try:
        return _Server((host, port), partial(SiteHandler, folder))
    except OSError as error:
        if error.errno == errno.EADDRINUSE:
            raise BuildProblem(
                f"Port {port} is in use by another program; choose one with --port."
            ) from error
        raise BuildProblem(f"Cannot serve on {host}:{port} ({error.strerror}).") from error


def _site_path(target: str) -> str | None:
    """Give the path below the site's root that a request means, or None if it means no file."""
    path = unquote(urlsplit(target).path)
    if path.endswith("/"):
        path += "index.html"
    path = path.removeprefix("/")
    # What is not in its simplest form tries to climb out or hide; backslashes are Windows' slashes.
    if posixpath.normpath(path) != path or path.startswith(("/", "..")) or "\\" in path:
        return None
    return None if "\0" in path else path


def _accepted(header: str) -> set[str]:
    """Give the encodings that an Accept-Encoding header allows (RFC 9110, 12.5.3)."""
    allowed = set()
    for item in header.split(","):
        name, _, weight = item.replace(" ", "").partition(";q=")
        if weight.strip("0.") or not weight:
            allowed.add(name.lower())
    return allowed
