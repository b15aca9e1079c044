"""How long the app takes to start: ``python -m tests.bench.start [RUNS] [--levers]``.

Times go from navigation to the frame that shows the first usable screen, by the page's own clock,
beside a bare published page of Flet and numpy (bare_page.py), on this machine, in turn, so that a
busy machine is busy for both. The bare page can't work offline; its best case, everything in the
browser's cache and the server beside it, is set against ours from the kept files with the server
gone. Both also with the whole browser slowed to a quarter, and ours with 1,000 setups saved.

With --levers, ours again with one thing undone that makes it fast, each in turn (levers.py).
"""

import argparse
import json
import shutil
import tempfile
from pathlib import Path
from statistics import median, quantiles

from playwright.sync_api import sync_playwright

from mobileapp.pwa.command import build_if_needed
from mobileapp.pwa.paths import DEFAULT_SITE
from tests.bench.bare_page import BareServer, make_bare_page
from tests.bench.levers import LEVERS, undo
from tests.bench.many import save_many
from tests.browser.process import BrowserProcess
from tests.browser.releases import list_anew
from tests.browser.site import Server

GOAL = 0.35
SLOWER = 4
MANY = 1000
WARM_UPS = 2  # the first start from a cache compiles, the second finds it compiled
STOPWATCH = (Path(__file__).parent / "stopwatch.js").read_text("utf-8")


class Visitor:
    """A browser of its own that visits one address again and again."""

    def __init__(self, profile, address):
        profile.mkdir()
        self.browser = BrowserProcess(profile)
        self.address = address

    def start(self, title="usable"):
        """Load the page in a new tab; return the times of usable and of the first paint [s]."""
        shown = self.browser.visit(self.address, title)
        return [float(word) / 1000 for word in shown.split()[-2:]]


def measured(folder, lever=None):
    """Make a copy of the built site that tells its times, with one lever undone if one is named."""
    shutil.copytree(DEFAULT_SITE, folder, ignore=shutil.ignore_patterns("*.br", "*.gz"))
    release = json.loads((folder / "release.json").read_text("utf-8"))["release"]
    with (folder / "r" / release / "status.js").open("a", encoding="utf-8") as script:
        script.write(STOPWATCH)
    if lever:
        undo(lever, folder, folder / "r" / release)
    list_anew(folder)
    return folder


def ours_offline(folder, lever=None, fill=None):
    """Visit our site, kill its server, and return the visitor and the first visit's times."""
    server = Server(measured(folder / "site", lever))
    visitor = Visitor(folder / "profile", server.address)
    first = visitor.start("usable ready")
    if fill:
        fill(visitor)
    server.kill()
    for _ in range(WARM_UPS):
        visitor.start()
    return visitor, first


def in_turn(visitors, runs):
    """Let visitors start in turn; return the times to usable of each."""
    times = {name: [] for name in visitors}
    for _ in range(runs):
        for name, visitor in visitors.items():
            times[name].append(visitor.start()[0])
    return times


def slowly(visitors, runs):
    """The same with the browsers slowed down."""
    times = {name: [] for name in visitors}
    for _ in range(runs):
        for name, visitor in visitors.items():
            with visitor.browser.slowed(SLOWER):
                times[name].append(visitor.start()[0])
    return times


def show(name, times):
    low, *_, high = quantiles(times, n=10, method="inclusive")
    print(f"{name:58} {median(times):6.2f}  ({low:.2f} to {high:.2f})", flush=True)


def show_ratio(times):
    ratio = median(times["ours, offline"]) / median(times["bare page, warm cache"])
    print(f"{'ratio':58} {ratio:6.2f}  (goal: at most {GOAL})", flush=True)


def compare(folder, runs):
    (folder / "bare").mkdir()
    make_bare_page(folder / "bare", f"<script>{STOPWATCH}</script>")
    server = BareServer(folder / "bare")
    bare = Visitor(folder / "bare-profile", server.address)
    bare_first, *_ = [bare.start() for _ in range(1 + WARM_UPS)]
    ours, ours_first = ours_offline(folder / "ours")
    print(
        f"First visit, server on this machine, nothing compressed for ours [s]: "
        f"usable {ours_first[0]:.2f}, bare page {bare_first[0]:.2f}; splash {ours_first[1]:.2f}"
    )
    print(f"\n{f'Navigation to usable [s], median of {runs}':58}         (10 to 90 %)")
    visitors = {"bare page, warm cache": bare, "ours, offline": ours}
    for measure, note in ((in_turn, ""), (slowly, ", 4x slower")):
        times = measure(visitors, runs)
        for name in visitors:
            show(name + note, times[name])
        show_ratio(times)
    bare.browser.kill()
    ours.browser.kill()
    server.kill()


def compare_many(folder, runs):
    def fill(visitor):
        with sync_playwright() as playwright:
            watched = playwright.chromium.connect_over_cdp(visitor.browser.endpoint)
            save_many(watched.contexts[0], visitor.address, MANY)
            watched.close()

    visitor, _ = ours_offline(folder / "many", fill=fill)
    show(f"ours, offline, {MANY} setups saved", in_turn({"": visitor}, runs)[""])
    visitor.browser.kill()


def compare_levers(folder, runs):
    print("\nOurs with one thing undone:")
    for number, lever in enumerate(LEVERS):
        visitor, _ = ours_offline(folder / f"lever-{number}", lever)
        show(f"not: {lever}", in_turn({"": visitor}, runs)[""])
        visitor.browser.kill()


def main():
    parser = argparse.ArgumentParser(prog="python -m tests.bench.start")
    parser.add_argument("runs", nargs="?", type=int, default=7)
    parser.add_argument("--levers", action="store_true", help="also measure each lever's gain")
    options = parser.parse_args()
    build_if_needed(DEFAULT_SITE)
    with tempfile.TemporaryDirectory() as name:
        compare(Path(name), options.runs)
        compare_many(Path(name), options.runs)
        if options.levers:
            compare_levers(Path(name), options.runs)


if __name__ == "__main__":
    main()
