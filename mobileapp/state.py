"""What the app knows while it runs, and how it is kept.

Screens read this and call its methods; they re-render when something in it is replaced. Every
change of a setup is written to the device at once, in the background, one after the other.
"""

import asyncio
from dataclasses import dataclass, field, replace
from typing import TYPE_CHECKING, Final

import flet as ft

from mobileapp import browser, settings
from mobileapp.records import (
    BounceRun,
    End,
    Place,
    RecordError,
    SagReading,
    Setup,
    from_json,
    new_setup,
    to_json,
)
from mobileapp.release_reading import NO_FRAMES, NO_OVERSHOOT
from mobileapp.settings import AUTO, Settings
from mobileapp.store import Store, StoreError, open_store
from mobileapp.texts import Texts
from mobileapp.trail_plan import Bump, TrailPlan
from mobileapp.units import SYSTEMS, Amount, Quantity

if TYPE_CHECKING:  # they need numpy, which arrives after the first paint
    from mobileapp.results.balance import BalanceView
    from mobileapp.results.bounce import BounceView
    from mobileapp.results.rebound import ReboundView
    from mobileapp.results.sag import SagView
    from mobileapp.results.trail import BumpView, Numbers

RECORD_PREFIX: Final = "setup/"


@ft.observable
@dataclass
class AppState:
    """The running app.

    Attributes:
        settings: what the person chose for all setups.
        setups: newest first.
        offline: whether the app starts without a network.
        update_waits: whether a newer release can take over.
        calculator: whether numpy is there.
        trouble: keys of sentences about records and saving that a person must see.
        deleted: the setup deleted last, while it can be brought back.
        landscape: whether the screen is wider than high.
    """

    settings: Settings = Settings()  # noqa: RUF009 - frozen
    setups: tuple[Setup, ...] = ()
    offline: browser.Offline = field(default_factory=browser.Offline)
    update_waits: bool = False
    calculator: bool = False
    trouble: tuple[str, ...] = ()
    deleted: Setup | None = None
    landscape: bool = False

    @property
    def texts(self) -> Texts:
        """The words of the person's language."""
        language = self.settings.language
        return Texts(browser.language() if language == AUTO else language)

    @property
    def units(self) -> dict[Quantity, str]:
        """Unit symbols by quantity."""
        return SYSTEMS[self.settings.units]

    def in_units(self, amount: Amount, quantity: Quantity) -> Amount:
        """Return an amount in the person's unit; what is kept stays as it was typed."""
        unit = self.units[quantity]
        return Amount(amount.value_in(unit), unit)

    def dress(self, page: ft.Page) -> None:
        """Give a page the chosen appearance."""
        page.theme_mode = {
            "sun": ft.ThemeMode.LIGHT,
            "dark": ft.ThemeMode.DARK,
            "auto": ft.ThemeMode.SYSTEM,
        }[self.settings.appearance]
        page.update()

    async def start(self) -> None:
        """Open the store and read what is in it."""
        self._unsaved: dict[str, str | None] = {}
        self._writing: asyncio.Task[None] | None = None
        self._store: Store | None = None
        try:
            self._store = await open_store()
            texts = await self._store.read_all()
        except StoreError as error:
            self._report(error.code)
            return
        setups = []
        for key, text in texts.items():
            try:
                if key.startswith(RECORD_PREFIX):
                    setups.append(from_json(text))
                elif key == settings.KEY:
                    self.settings = settings.from_json(text)
            except RecordError as error:
                self._report(error.code)
        self.setups = tuple(sorted(setups, key=lambda setup: setup.made, reverse=True))

    def turned(self, page: ft.Page) -> None:
        """Note how the phone is held."""
        self.landscape = (page.width or 0) > (page.height or 0)

    async def follow_page(self) -> None:
        """Hear of offline use and updates, and get the calculator."""
        browser.on_offline(lambda offline: setattr(self, "offline", offline))
        browser.on_update(lambda: setattr(self, "update_waits", True))
        await browser.late_ready()
        self.calculator = True
        for setup in self.setups:
            if not setup.shown:  # edited before the calculator was there
                self.save(setup)

    def setup(self, key: str) -> Setup:
        """Return the setup of a key, a new one if it isn't kept yet."""
        return next((setup for setup in self.setups if setup.key == key), None) or new_setup(key)

    def reading(self, key: str, end: End) -> SagReading:
        """Return the sag reading of an end, or the first guess to step away from."""
        return self.setup(key).reading(end)

    def sag_view(self, key: str, end: End) -> "SagView | None":
        """Return what to show for a reading; None while there is nothing to calculate."""
        setup = self.setup(key)
        if not self.calculator or end not in setup.sag:
            return None
        from mobileapp.results.sag import sag_view  # noqa: PLC0415 - numpy comes late

        return sag_view(end, setup.sag[end], self.texts)

    def bounce_view(self, run: BounceRun | None, *, kept: bool = False) -> "BounceView | None":
        """Return what to show for taps; None without any, or while the calculator isn't there."""
        if not self.calculator or run is None:
            return None
        from mobileapp.results.bounce import bounce_view  # noqa: PLC0415 - numpy comes late

        return bounce_view(run, self.texts, kept=kept)

    def rebound_view(self, key: str, end: End) -> "ReboundView | None":
        """Return what to show for a release test; None while the calculator isn't there."""
        if not self.calculator:
            return None
        from mobileapp.results.rebound import rebound_view  # noqa: PLC0415 - numpy comes late

        return rebound_view(self.setup(key), end, self.texts)

    def balance_view(self, key: str) -> "BalanceView | None":
        """Return how the ends go together; None while the calculator isn't there."""
        if not self.calculator:
            return None
        from mobileapp.results.balance import balance_view  # noqa: PLC0415 - numpy comes late

        return balance_view(self.setup(key), self.texts)

    def bump_view(self, key: str, bump: Bump) -> "BumpView | None":
        """Return what to show for a row of bumps; None while the calculator isn't there."""
        if not self.calculator:
            return None
        from mobileapp.results.trail import bump_view  # noqa: PLC0415 - numpy comes late

        return bump_view(self.setup(key), bump, self.texts, self.units)

    def bump_numbers(self, key: str, end: End, bump: Bump) -> "Numbers":
        """Return the numbers behind what `bump_view` says of an end."""
        from mobileapp.results.trail import bump_numbers  # noqa: PLC0415 - numpy comes late

        return bump_numbers(self.setup(key), end, bump, self.texts, self.units)

    def trail(self, key: str) -> TrailPlan:
        """Return the day's trail, or the first guess to step away from."""
        return self.setup(key).trail or TrailPlan()

    def save_trail(self, key: str, plan: TrailPlan) -> None:
        """Keep the day's trail with a setup."""
        self.save(replace(self.setup(key), trail=plan))

    def save_speeds(self, key: str, **changes: Amount) -> None:
        """Change the day's speeds, and keep them."""
        self.save_trail(key, replace(self.trail(key), **changes))

    def save_bump(self, key: str, index: int, **changes: Amount) -> None:
        """Change a row of bumps, and keep it."""
        plan = self.trail(key)
        self.save_trail(key, plan.with_bump(index, replace(plan.bumps[index], **changes)))

    def save_reading(self, key: str, end: End, **changes: Amount) -> None:
        """Change values of a reading, and keep it."""
        self.save(self.setup(key).with_sag(end, replace(self.reading(key, end), **changes)))

    def save_place(self, key: str, place: Place) -> None:
        """Change where the rear was read."""
        self.save(self.setup(key).with_sag("rear", self.reading(key, "rear").at(place)))

    def save_release(self, key: str, end: End, **changes: object) -> None:
        """Change values of the latest release test, and keep it."""
        setup = self.setup(key)
        self.save(setup.with_release(end, replace(setup.release(end), **changes)))

    def begin_release(self, key: str, end: End) -> None:
        """Begin another release test at an end, read the same way."""
        setup = self.setup(key)
        fresh = replace(setup.release(end), overshoot=NO_OVERSHOOT, frames=NO_FRAMES)
        self.save(setup.with_release(end, fresh, new=True))

    def save_bounce(self, key: str, run: BounceRun | None) -> None:
        """Keep a bounce test with its setup; None takes it away."""
        self.save(replace(self.setup(key), bounce=run))

    def save(self, setup: Setup) -> None:
        """Replace or add a setup, and keep it."""
        setup = self._summarised(setup)
        others = tuple(other for other in self.setups if other.key != setup.key)
        self.setups = tuple(sorted((setup, *others), key=lambda kept: kept.made, reverse=True))
        self._write(RECORD_PREFIX + setup.key, to_json(setup))

    def save_settings(self, chosen: Settings) -> None:
        """Change the settings, and keep them."""
        self.settings = chosen
        self._write(settings.KEY, settings.to_json(chosen))

    def delete(self, key: str) -> None:
        """Take a setup away; `undelete` brings it back."""
        self.deleted = self.setup(key)
        self.setups = tuple(setup for setup in self.setups if setup.key != key)
        self._write(RECORD_PREFIX + key, None)

    def undelete(self) -> None:
        """Bring the setup deleted last back."""
        if self.deleted:
            self.save(self.deleted)
            self.deleted = None

    def _summarised(self, setup: Setup) -> Setup:
        if not self.calculator:
            return setup
        from mobileapp.results.summary import summary  # noqa: PLC0415 - numpy comes late

        return replace(setup, shown=summary(setup, self.texts))

    def _write(self, key: str, text: str | None) -> None:
        self._unsaved[key] = text
        if self._writing is None or self._writing.done():
            self._writing = asyncio.create_task(self._write_all())

    async def _write_all(self) -> None:
        while self._unsaved and self._store:
            key, text = next(iter(self._unsaved.items()))
            try:
                if text is None:
                    await self._store.remove(key)
                else:
                    await self._store.put(key, text)
            except StoreError as error:
                self._report(error.code)
                return
            if self._unsaved.get(key) == text:
                del self._unsaved[key]

    def _report(self, code: str) -> None:
        if code not in self.trouble:
            self.trouble = (*self.trouble, code)
