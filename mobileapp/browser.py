"""The line to the page: the only module that knows the app may run inside a browser.

Outside of one (a plain Flet server during development, tests) everything here exists and does
nothing, so no other module has to ask.
"""

import json
from collections import deque
from collections.abc import Callable
from contextvars import copy_context
from dataclasses import dataclass
from functools import partial
from importlib import import_module
from typing import Any, Final, Literal

try:
    _bridge: Any = import_module("page_bridge")  # made by pwa/page/worker.js
except ImportError:
    _bridge = None

in_browser: Final = _bridge is not None

OfflineState = Literal["preparing", "ready", "failed"]


@dataclass(frozen=True)
class Offline:
    """Whether the app is kept on this device.

    Attributes:
        state: ``ready`` once it starts without a network.
        done: megabytes kept so far.
        total: megabytes to keep.
        reason: of a failure: ``insecure``, ``unsupported``, ``full``, ``network`` or ``error``.
    """

    state: OfflineState = "preparing"
    done: float = 0.0
    total: float = 0.0
    reason: str | None = None


class TapClock:
    """The browser's own times of touches, matched to taps by position."""

    _NEAR: Final = 16.0  # [px] a third of a fingertip; Flet's positions are off by up to 3
    _LATE: Final = 1.0  # [s] a touch that was no tap until then never will be

    def __init__(self) -> None:
        self._stamps: deque[tuple[float, float, float]] = deque()

    def start(self) -> None:
        """Ask the page to stamp touches from now on."""
        self._stamps.clear()
        _post("taps", on=True)

    def stop(self) -> None:
        """Let the page rest."""
        _post("taps", on=False)

    def take(self, x: float, y: float) -> float | None:
        """Return when the earliest touch not yet taken near a position happened [s].

        Times count from the page's own start, so only their differences mean something. None if
        the page has stamped no such touch; the caller then needs a clock of its own, and a wider ±.
        """
        for stamp in self._stamps:
            seconds, stamp_x, stamp_y = stamp
            if abs(stamp_x - x) <= self._NEAR and abs(stamp_y - y) <= self._NEAR:
                self._stamps.remove(stamp)
                return seconds
        return None

    def add(self, seconds: float, x: float, y: float) -> None:
        """Note a stamp from the page."""
        while self._stamps and seconds - self._stamps[0][0] > self._LATE:
            self._stamps.popleft()
        self._stamps.append((seconds, x, y))


taps: Final = TapClock()
offline_state = Offline()
_offline_listener: Callable[[Offline], None] | None = None
_update_listener: Callable[[], None] | None = None
_update_waits = False


def mark_usable() -> None:
    """Tell the page that the first usable screen has been sent."""
    _post("usable")


def mark_failed(what: str, details: str = "") -> None:
    """Replace the page by the sentence of a failure that leaves nothing to use."""
    _post("failed", what=what, details=details)


async def late_ready() -> None:
    """Return once the modules that aren't needed for the first paint can be imported."""
    if _bridge is not None:
        await _bridge.late()


def on_offline(listener: Callable[[Offline], None]) -> None:
    """Call `listener` whenever the keeping for offline use moves on; at once if it has."""
    global _offline_listener  # noqa: PLW0603 - one page, one listener
    _offline_listener = _here(listener)
    _post("offline?")


def on_update(listener: Callable[[], None]) -> None:
    """Call `listener` when a newer release is complete and waits; at once if one does."""
    global _update_listener  # noqa: PLW0603 - one page, one listener
    _update_listener = _here(listener)
    if _update_waits:
        listener()


def apply_update() -> None:
    """Let the waiting release take over; the page then loads anew."""
    _post("update")


def sound(cue: Literal["tap", "done", "again"]) -> None:
    """Make a cue heard."""
    _post("sound", name=cue)


def keep_storage() -> None:
    """Ask the browser not to delete this site's storage when space runs short."""
    _post("persist")


def language() -> str:
    """Return the browser's preferred language, as a two-letter code."""
    if _bridge is None:
        return "en"
    return str(import_module("js").navigator.language)[:2].lower()


def _here(listener: Callable[..., None]) -> Callable[..., None]:
    """Return a listener that runs in the caller's context; a message brings none of its own."""
    return partial(copy_context().run, listener)


def notices_address() -> str:
    """Return where the licences of the software inside are, beside the worker's own script."""
    if _bridge is None:
        return ""
    return str(import_module("js").URL.new("notices/index.html", _worker_address()).href)


def _worker_address() -> str:
    return str(import_module("js").location.href)


def _post(kind: str, **value: object) -> None:
    if _bridge is not None:
        from pyodide.ffi import to_js  # noqa: PLC0415 - exists in the browser only

        _bridge.post(kind, to_js(value, dict_converter=import_module("js").Object.fromEntries))


def _hear(text: str) -> None:
    """Act on one message from the page."""
    global offline_state, _update_waits  # noqa: PLW0603 - one page, one state
    message = json.loads(text)
    match message["kind"]:
        case "tap":
            taps.add(message["seconds"], message["x"], message["y"])
        case "offline":
            offline_state = Offline(
                message["state"],
                message.get("done", 0.0),
                message.get("total", 0.0),
                message.get("reason"),
            )
            if _offline_listener:
                _offline_listener(offline_state)
        case "update":
            _update_waits = True
            if _update_listener:
                _update_listener()


if _bridge is not None:
    from pyodide.ffi import create_proxy  # exists in the browser only

    _bridge.listen(create_proxy(_hear))
