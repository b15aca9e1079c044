"""All words of the app, by key and language.

    >>> from mobileapp.texts import Texts
    >>> Texts("en")("home.deleted", label="Oak 3")
    'Deleted “Oak 3”'

A key names the screen and the thing: ``sag.front``. A placeholder is filled with text that is
ready to show, units included. The core's sentences are found by its codes under ``core.``.
"""

from collections.abc import Mapping
from dataclasses import dataclass
from typing import Final

from core.messages import MESSAGES
from mobileapp.texts import de, en

_CORE: Final = {f"core.{code}": sentence for code, sentence in MESSAGES.items()}
LANGUAGES: Final[Mapping[str, Mapping[str, str]]] = {
    "en": {**_CORE, **en.TEXTS},
    "de": {**_CORE, **de.TEXTS},
}
NAMES: Final = {"en": "English", "de": "Deutsch"}


@dataclass(frozen=True)
class Texts:
    """The words of one language.

    Attributes:
        language: key of `LANGUAGES`; another one speaks English.
    """

    language: str

    def __call__(self, key: str, /, **data: str) -> str:
        """Return a text with its placeholders filled.

        Raises:
            KeyError: unknown key or missing data: a bug in the caller.
        """
        return LANGUAGES.get(self.language, LANGUAGES["en"])[key].format(**data)

    @property
    def comma(self) -> bool:
        """Whether decimals follow a comma."""
        return self.language == "de"
