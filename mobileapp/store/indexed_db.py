"""Records in the browser's own database, IndexedDB, one entry each.

A transaction is reported as complete only after the browser has flushed it to the disk
(``durability: "strict"``), and only then `put` returns.
"""

import asyncio
from collections.abc import Callable
from typing import Any, Final

from js import Object, indexedDB
from pyodide.ffi import create_once_callable, to_js

from mobileapp.store import StoreError

_DATABASE: Final = "sag-and-bounce"
_VERSION: Final = 1
_RECORDS: Final = "records"


class IndexedDbStore:
    """Texts in one object store of one database."""

    def __init__(self, database: Any) -> None:  # noqa: ANN401 - a JavaScript object
        self._database = database

    @classmethod
    async def open(cls) -> "IndexedDbStore":
        """Open the database, and make it on the first visit.

        Raises:
            StoreError: the browser refuses.
        """
        try:
            request = indexedDB.open(_DATABASE, _VERSION)
        except Exception as error:
            raise StoreError("store.failed", str(error)) from error
        request.onupgradeneeded = create_once_callable(
            lambda _event: request.result.createObjectStore(_RECORDS)
        )
        await _settled(request, "onsuccess", "onerror")
        return cls(request.result)

    async def read_all(self) -> dict[str, str]:
        """Return everything that is kept."""
        records = self._transaction("readonly").objectStore(_RECORDS)
        keys, texts = records.getAllKeys(), records.getAll()
        await _settled(texts, "onsuccess", "onerror")
        return dict(zip(keys.result.to_py(), texts.result.to_py(), strict=True))

    async def put(self, key: str, text: str) -> None:
        """Keep a text under a key; when this returns, it is on the device."""
        await self._write(lambda records: records.put(text, key))

    async def remove(self, key: str) -> None:
        """Forget a key."""
        await self._write(lambda records: records.delete(key))

    async def _write(self, act: Callable[[Any], object]) -> None:
        transaction = self._transaction("readwrite")
        act(transaction.objectStore(_RECORDS))
        await _settled(transaction, "oncomplete", "onabort")

    def _transaction(self, mode: str) -> Any:  # noqa: ANN401 - a JavaScript object
        options = to_js({"durability": "strict"}, dict_converter=Object.fromEntries)
        return self._database.transaction(_RECORDS, mode, options)


async def _settled(request: Any, good: str, bad: str) -> None:  # noqa: ANN401 - a JavaScript object
    """Return once a request or transaction has reported its good end.

    Raises:
        StoreError: it reported the bad one.
    """
    end: asyncio.Future[None] = asyncio.get_running_loop().create_future()

    def fail(_event: object) -> None:
        name = request.error.name if request.error else ""
        code = "store.full" if name == "QuotaExceededError" else "store.failed"
        end.set_exception(StoreError(code, str(name)))

    setattr(request, good, create_once_callable(lambda _event: end.set_result(None)))
    setattr(request, bad, create_once_callable(fail))
    await end
