"""How long the app takes to start: ``python -m tests.bench.start [RUNS]``.

From navigation to `data-app="usable"`, beside a bare page of Flet and numpy that the same build
makes from a main function of five lines: for a first visit, warm with the server, and with the
server gone. Medians of RUNS, and the bytes to keep, in Chromium on this machine.
"""

import shutil
import subprocess
import sys
import tempfile
import time
from pathlib import Path
from statistics import median

from playwright.sync_api import sync_playwright

from tests.browser.chromium import launch
from tests.browser.phone import OFFLINE_MS, PHONE, START_MS, STARTED
from tests.browser.site import Server

CHECKOUT = Path(__file__).parent.parent.parent
BARE = '''"""A bare page: Flet, numpy, and one number."""

import flet as ft

from mobileapp import browser


async def main(page: ft.Page) -> None:
    await browser.late_ready()
    import numpy as np

    page.add(ft.Text(f"{np.sqrt(2.0):.3f}"))
    browser.mark_usable()
'''


def build(folder, name, main=None):
    """Build a copy of the checkout, with another main function if one is given."""
    copy = folder / name
    listing = subprocess.run(
        ["git", "ls-files"], cwd=CHECKOUT, check=True, capture_output=True, text=True
    )
    for path in listing.stdout.splitlines():
        (copy / path).parent.mkdir(parents=True, exist_ok=True)
        shutil.copy(CHECKOUT / path, copy / path)
    if main:
        (copy / "mobileapp" / "main.py").write_text(main, "utf-8")
    out = folder / f"{name}-site"
    command = [sys.executable, "-m", "mobileapp", "build", "--out", str(out)]
    subprocess.run(command, cwd=copy, check=True, stdout=subprocess.DEVNULL)
    return out


def start_s(page, address):
    """Return the seconds from navigation to usable."""
    begun = time.perf_counter()
    page.goto(address, wait_until="commit")
    page.wait_for_selector(STARTED, state="attached", timeout=START_MS)
    assert page.locator("html[data-app=usable]").count(), page.locator("#failure").text_content()
    return time.perf_counter() - begun


def visit(browser, site):
    """Return first, warm and offline start [s]."""
    server = Server(site)
    context = browser.new_context(**PHONE)
    page = context.new_page()
    first = start_s(page, server.address)
    page.wait_for_selector("html[data-offline=ready]", state="attached", timeout=OFFLINE_MS)
    start_s(page, server.address)  # the first start from the kept files compiles their code
    warm = start_s(page, server.address)
    server.kill()
    offline = start_s(page, server.address)
    context.close()
    return first, warm, offline


def main():
    runs = int(sys.argv[1]) if len(sys.argv) > 1 else 7
    with tempfile.TemporaryDirectory() as name, sync_playwright() as playwright:
        folder = Path(name)
        sites = {"ours": build(folder, "ours"), "bare": build(folder, "bare", BARE)}
        wire = {
            name: sum(
                path.stat().st_size
                for path in site.rglob("*.br")
                if "canvaskit/canvaskit" not in str(path)
            )
            for name, site in sites.items()
        }
        browser = launch(playwright)
        figures = {name: [] for name in sites}
        for _ in range(runs):  # in turn, so that a busy machine is busy for both
            for kind, site in sites.items():
                figures[kind].append(visit(browser, site))
        browser.close()
    print(f"medians of {runs} [s]   first visit   warm   offline   all kept, brotli [MB]")
    medians = {
        kind: [median(column) for column in zip(*rows, strict=True)]
        for kind, rows in figures.items()
    }
    for kind, (first, warm, offline) in medians.items():
        print(f"{kind:18} {first:12.2f} {warm:8.2f} {offline:8.2f} {wire[kind] / 1e6:12.2f}")
    ratios = [ours / bare for ours, bare in zip(medians["ours"], medians["bare"], strict=True)]
    print(f"{'ours / bare':18} {ratios[0]:12.2f} {ratios[1]:8.2f} {ratios[2]:8.2f}")


if __name__ == "__main__":
    main()
