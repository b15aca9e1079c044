"""Where records are kept: one text a key, and nothing lost that was acknowledged.

`open_store` gives the right one for where the app runs. The rest of the app knows the interface
only, so a sturdier store can take its place.
"""

from typing import Protocol

from mobileapp import browser


class StoreError(Exception):
    """The device did not keep, or not give back, what it was asked to.

    Attributes:
        code: key of the sentence in `mobileapp.texts`: ``store.full`` or ``store.failed``.
    """

    def __init__(self, code: str, details: str = "") -> None:
        super().__init__(details or code)
        self.code = code


class Store(Protocol):
    """Texts by key."""

    async def read_all(self) -> dict[str, str]:
        """Return everything that is kept."""

    async def put(self, key: str, text: str) -> None:
        """Keep a text under a key; when this returns, it is on the device."""

    async def remove(self, key: str) -> None:
        """Forget a key; nothing happens if it isn't there."""


async def open_store() -> Store:
    """Return the store of this device.

    Raises:
        StoreError: the browser offers no storage, as some do in private windows.
    """
    if browser.in_browser:
        from mobileapp.store.indexed_db import IndexedDbStore  # noqa: PLC0415 - browser only

        return await IndexedDbStore.open()
    from mobileapp.store.memory import MemoryStore  # noqa: PLC0415 - development only

    return MemoryStore()
