"""Finding a Chromium to test with, and getting one where that is possible."""

import os
import shutil
import subprocess
import sys
from functools import cache
from pathlib import Path

from playwright.sync_api import Error

# A quiet browser: no sandbox (tests may run as root), no calls home of its own.
ARGUMENTS = [
    "--no-sandbox",
    "--disable-gpu",
    "--disable-quic",
    "--no-first-run",
    "--disable-background-networking",
    "--disable-component-update",
    "--disable-sync",
]
NAMES = ("chromium", "chromium-browser", "google-chrome", "google-chrome-stable", "chrome")
HOW = (
    "The browser tests need Chromium. Install it (Debian, Ubuntu: `apt-get install chromium`; "
    "elsewhere: `python -m playwright install chromium`) or name its program in the environment "
    "variable CHROMIUM, then run the tests again."
)


@cache
def find_chromium():
    """Return the path of a Chromium: named, installed, Playwright's own, or newly installed.

    Raises:
        RuntimeError: there is none, and none can be had; says how a person gets one.
    """
    for attempt in (_named, _installed, _own, _download, _package):
        if path := attempt():
            return path
    raise RuntimeError(HOW)


def _named():
    return os.environ.get("CHROMIUM")


def _installed():
    return next(filter(None, map(shutil.which, NAMES)), None)


def _own():
    """Ask in a process of its own: Playwright starts only once in one."""
    ask = (
        "from playwright.sync_api import sync_playwright as start\n"
        "with start() as playwright: print(playwright.chromium.executable_path)"
    )
    done = subprocess.run([sys.executable, "-c", ask], check=True, capture_output=True, text=True)
    path = done.stdout.strip()
    return path if Path(path).exists() else None


def _download():
    """Let Playwright download its own, where its host can be reached."""
    command = [sys.executable, "-m", "playwright", "install", "chromium"]
    done = subprocess.run(command, check=False, capture_output=True, timeout=600)
    return _own() if done.returncode == 0 else None


def _package():
    """Install the system's package, where we may."""
    if not shutil.which("apt-get") or os.geteuid() != 0:
        return None
    for arguments in (["update"], ["install", "-y", "--no-install-recommends", "chromium"]):
        subprocess.run(["apt-get", *arguments], check=False, capture_output=True, timeout=900)
    return _installed()


def launch(playwright):
    """Start a Chromium."""
    try:
        return playwright.chromium.launch(executable_path=find_chromium(), args=ARGUMENTS)
    except Error as error:
        raise RuntimeError(f"Chromium did not start: {error}. {HOW}") from error
