"""A store that forgets when the program ends: for development and tests."""


class MemoryStore:
    """Texts in a dictionary."""

    def __init__(self) -> None:
        self.texts: dict[str, str] = {}

    async def read_all(self) -> dict[str, str]:
        """Return everything that is kept."""
        return dict(self.texts)

    async def put(self, key: str, text: str) -> None:
        """Keep a text under a key."""
        self.texts[key] = text

    async def remove(self, key: str) -> None:
        """Forget a key."""
        self.texts.pop(key, None)
