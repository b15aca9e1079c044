"""How long the app takes to answer an input: ``python -m tests.bench.answer [INPUTS]``.

From the press of a button, or a touch of the tap pad, to the first frame in which the screen says
something else, per screen, in Chromium on this machine, without a network. The screen is read
through the semantics tree, so its cost is part of each time.
"""

import sys
import time

import numpy as np
from playwright.sync_api import sync_playwright

from mobileapp.pwa.command import build_if_needed
from mobileapp.pwa.paths import DEFAULT_SITE
from tests.browser.chromium import launch
from tests.browser.phone import PHONE, Phone
from tests.browser.site import Server

GOAL_MS = 100
PAUSE_S = 0.4  # between inputs, so that each finds the app idle
WARM_UP = 3  # inputs that aren't counted: the first one imports numpy

# Does something, and resolves with the milliseconds until the screen's words differ.
WATCH = """
(act) => new Promise((resolve, reject) => {
  const host = document.querySelector("flt-semantics-host");
  const words = () => [...host.querySelectorAll("*")].map((node) =>
    (node.getAttribute("aria-label") ?? "") + (node.children.length ? "" : node.textContent)
  ).join("|");
  const before = words();
  const begun = performance.now();
  act();
  const look = () => {
    if (words() !== before) resolve(performance.now() - begun);
    else if (performance.now() - begun > 5000) reject(new Error("no answer"));
    else requestAnimationFrame(look);
  };
  requestAnimationFrame(look);
})
"""
PRESS = f"""
(name) => ({WATCH})(() =>
  [...document.querySelectorAll("flt-semantics[role=button]")].find(
    (node) => (node.getAttribute("aria-label") ?? node.textContent) === name
  ).click()
)
"""
TOUCH = f"""
([x, y]) => ({WATCH})(() => {{
  const view = document.querySelector("flutter-view");
  const touch = {{
    bubbles: true, clientX: x, clientY: y, pointerId: 7, pointerType: "touch", isPrimary: true,
  }};
  view.dispatchEvent(new PointerEvent("pointerdown", {{ ...touch, buttons: 1 }}));
  view.dispatchEvent(new PointerEvent("pointerup", touch));
}})
"""
PAD = (195, 650)


def answers(phone, script, argument, count):
    """Return the times of some inputs [ms]."""
    times = []
    for _ in range(WARM_UP + count):
        times.append(phone.page.evaluate(script, argument))
        time.sleep(PAUSE_S)
    return times[WARM_UP:]


def measure(phone, count):
    """Yield each screen's name with its times."""
    phone.press("Measure sag")
    phone.type_into("Sag reading", "30")
    phone.type_into("Sag reading", "16", nth=1)
    phone.sees("29 ± 4 %")
    yield "sag", answers(phone, PRESS, "Fork travel: more", count)
    phone.press("Rebound")
    phone.type_into("Overshoot, above the sag mark", "4")
    phone.sees("Damping ratio")
    yield "rebound", answers(phone, PRESS, "Overshoot, above the sag mark: more", count)
    phone.press("Trail")
    phone.sees("Front: ")
    yield "trail", answers(phone, PRESS, "Spacing: more", count)
    phone.press("Bounce")
    phone.sees("Tap at every bottom")
    yield "bounce", answers(phone, TOUCH, PAD, min(count, 5))  # ten taps end a test


def main():
    """Measure and print."""
    count = int(sys.argv[1]) if len(sys.argv) > 1 else 20
    build_if_needed(DEFAULT_SITE)
    server = Server(DEFAULT_SITE)
    with sync_playwright() as playwright:
        browser = launch(playwright)
        phone = Phone(browser.new_context(**PHONE), server.address).open().offline_ready()
        server.kill()
        print(f"{'screen':10}{'p50':>8}{'p95':>8}   [ms], goal: p95 at most {GOAL_MS}")
        for screen, times in measure(phone, count):
            median, late = np.quantile(times, [0.5, 0.95])
            print(f"{screen:10}{median:8.0f}{late:8.0f}")
        browser.close()


if __name__ == "__main__":
    main()
