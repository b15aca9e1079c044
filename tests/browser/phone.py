"""A phone in a test: a small touch window, driven by what a screen reader would see."""

import time

PHONE = {
    "viewport": {"width": 390, "height": 844},
    "has_touch": True,
    "is_mobile": True,
    "device_scale_factor": 2,
    "locale": "en-GB",
    "timezone_id": "Europe/Vienna",
}
STARTED = "html:not([data-app=starting])"
PATIENCE_S = 10
START_MS = 60_000
OFFLINE_MS = 120_000


class Phone:
    """One page with the app.

    Attributes:
        page: Playwright's page.
        address: of the app.
        foreign: addresses of requests to any other origin.
        errors: what the page reported as an error.
    """

    def __init__(self, context, address):
        self.context = context
        self.address = address
        self.page = context.new_page()
        self.foreign = []
        self.errors = []
        self.page.on("request", self._note_request)
        self.page.on("pageerror", lambda error: self.errors.append(str(error)))
        self._touch = context.new_cdp_session(self.page)

    def _note_request(self, request):
        if not request.url.startswith((self.address, "data:", "blob:")):
            self.foreign.append(request.url)

    def open(self, route=""):
        """Load the app and wait until it shows a screen."""
        self.page.goto(self.address + route)
        return self.started()

    def reload(self):
        """Load the app again."""
        self.page.reload()
        return self.started()

    def started(self):
        """Wait until the app shows a screen, and make it readable for screen readers."""
        self.page.wait_for_selector(STARTED, state="attached", timeout=START_MS)
        assert self.state("app") == "usable", self.page.locator("#failure").text_content()
        button = self.page.locator("flt-semantics-placeholder")
        button.wait_for(state="attached")
        button.evaluate("element => element.click()")
        self.page.locator("flt-semantics").first.wait_for(state="attached")
        return self

    def state(self, name):
        """Return what <html data-…> says."""
        return self.page.locator("html").get_attribute(f"data-{name}")

    def offline_ready(self):
        """Wait until the app says that it needs no network."""
        self.page.wait_for_selector(
            "html:not([data-offline=preparing])", state="attached", timeout=OFFLINE_MS
        )
        assert self.state("offline") == "ready"
        return self

    def button(self, name):
        """Return a button by its name."""
        return self.page.get_by_role("button", name=name, exact=True).first

    def press(self, name):
        """Press a button."""
        self.button(name).dispatch_event("click")

    def type_into(self, name, text, nth=0):
        """Type into the field of a name."""
        field = self.page.get_by_role("textbox", name=name, exact=True).nth(nth)
        field.focus()
        field.fill(text)

    def sees(self, text):
        """Wait until a text can be seen or heard."""
        self._wait_until(lambda: text in self.words(), f"{text!r} is not on the screen")

    def sees_not(self, text):
        """Wait until a text is gone."""
        self._wait_until(lambda: text not in self.words(), f"{text!r} is still on the screen")

    def words(self):
        """Return everything that a screen reader could read."""
        return self.page.locator("flt-semantics-host").aria_snapshot()

    def _wait_until(self, true, otherwise):
        end = time.monotonic() + PATIENCE_S
        while not true():
            assert time.monotonic() < end, f"{otherwise}:\n{self.words()}"
            time.sleep(0.1)

    def tap(self, x, y, at=None):
        """Touch the glass, at a time [s] of the browser's own event clock if one is given."""
        stamp = {} if at is None else {"timestamp": at}
        point = {"touchPoints": [{"x": x, "y": y}], "type": "touchStart", **stamp}
        self._touch.send("Input.dispatchTouchEvent", point)
        self._touch.send("Input.dispatchTouchEvent", {"type": "touchEnd", "touchPoints": []})

    def tap_along(self, x, y, intervals):
        """Tap with exact intervals [s] between the events' times, at about that speed."""
        start = time.time()
        at = start
        self.tap(x, y, at)
        for interval in intervals:
            at += interval
            time.sleep(max(0.0, at - time.time()))
            self.tap(x, y, at)
