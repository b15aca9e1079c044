"""The built app on a server that can be killed: being offline means that nobody answers."""

import re
import subprocess
import sys
import time
from urllib.error import URLError
from urllib.request import urlopen


class Server:
    """`python -m mobileapp serve` in a process of its own.

    Attributes:
        address: of the app, with a slash at the end.
    """

    def __init__(self, folder, port=0):
        self.folder = folder
        self.port = port
        self.process = None
        self.start()

    @property
    def address(self):
        return f"http://localhost:{self.port}/"

    def start(self):
        """Serve, on the same port as before; returns when it answers."""
        self.process = subprocess.Popen(
            [
                *(sys.executable, "-m", "mobileapp", "serve"),
                *("--site", str(self.folder), "--port", str(self.port)),
            ],
            stdout=subprocess.PIPE,
            text=True,
        )
        for line in self.process.stdout:
            if found := re.search(r"localhost:(\d+)/", line):
                self.port = int(found[1])
                self._wait()
                return
        raise RuntimeError("the server did not start")

    def kill(self):
        """Be gone, connections and all."""
        self.process.kill()
        self.process.wait()
        self.process.stdout.close()

    def _wait(self):
        for _ in range(100):
            try:
                urlopen(self.address, timeout=5).close()  # noqa: S310 - our own server
            except URLError:
                time.sleep(0.05)
            else:
                return
        raise RuntimeError(f"{self.address} does not answer")
