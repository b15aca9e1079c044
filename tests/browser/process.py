"""Chromium as a process of our own: to be killed like a phone whose battery is empty, slowed down
like an old one, or left alone by the tools that otherwise watch it.
"""

import atexit
import json
import os
import signal
import subprocess
import threading
import time
from contextlib import contextmanager
from urllib.request import Request, urlopen

from tests.browser.chromium import ARGUMENTS, find_chromium

PATIENCE_S = 180
SLICE_S = 0.020


class BrowserProcess:
    """A running Chromium with a profile that outlives it.

    Attributes:
        endpoint: address of its remote control.
    """

    def __init__(self, profile):
        port = profile / "DevToolsActivePort"
        port.unlink(missing_ok=True)
        self._process = subprocess.Popen(
            [
                find_chromium(),
                *ARGUMENTS,
                *("--headless", "--window-size=390,844", "--remote-debugging-port=0"),
                *(f"--user-data-dir={profile}", "about:blank"),
            ],
            stdout=subprocess.DEVNULL,
            stderr=subprocess.DEVNULL,
            start_new_session=True,  # so that all its processes are one group
        )
        atexit.register(self.kill)
        self.endpoint = f"http://127.0.0.1:{_first_line(port)}"

    def visit(self, address, title):
        """Open a tab, wait until its title has a beginning, close it, and return the title.

        No debugger is attached meanwhile. Under one, Chromium reads the client's script of ten
        megabytes twice over, only to know its line numbers: more than a second.
        """
        tab = json.loads(self._ask(f"new?{address}", "PUT"))["id"]
        end = time.monotonic() + PATIENCE_S
        while not (shown := self._title(tab)).startswith(title):
            if time.monotonic() > end:
                raise RuntimeError(f"{address} shows {shown!r} and not {title!r}.")
            time.sleep(0.3)
        self._ask(f"close/{tab}")
        time.sleep(0.5)
        return shown

    def kill(self):
        """End all of it at once, without notice."""
        atexit.unregister(self.kill)
        self._signal(signal.SIGKILL)
        self._process.wait()

    @contextmanager
    def slowed(self, factor):
        """Let it run only 1/factor of the time: page, workers and drawing alike.

        Chromium's own throttling slows the page alone, not its workers, where Python runs.
        """
        stop = threading.Event()
        thread = threading.Thread(target=self._slow_down, args=(factor, stop), daemon=True)
        thread.start()
        try:
            yield
        finally:
            stop.set()
            thread.join()

    def _slow_down(self, factor, stop):
        while not stop.is_set():
            began = time.monotonic()
            time.sleep(SLICE_S)
            ran = time.monotonic() - began  # on a busy machine a sleep takes longer
            self._signal(signal.SIGSTOP)
            time.sleep(ran * (factor - 1))
            self._signal(signal.SIGCONT)

    def _signal(self, number):
        os.killpg(self._process.pid, number)

    def _title(self, tab):
        return next(page["title"] for page in json.loads(self._ask("list")) if page["id"] == tab)

    def _ask(self, what, method="GET"):
        request = Request(f"{self.endpoint}/json/{what}", method=method)  # noqa: S310 - our own browser
        with urlopen(request, timeout=PATIENCE_S) as answer:  # noqa: S310 - likewise
            return answer.read()


def _first_line(file):
    """Wait for a file, and return its first line."""
    end = time.monotonic() + PATIENCE_S
    while time.monotonic() < end:
        if file.exists() and (text := file.read_text("ascii")):
            return text.splitlines()[0]
        time.sleep(0.05)
    raise RuntimeError(f"Chromium has not written {file} within {PATIENCE_S} s.")
