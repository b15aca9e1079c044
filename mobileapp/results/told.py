"""What the core says, in the person's words and units."""

from collections.abc import Mapping
from typing import Final

from core.errors import Note, SetupError
from mobileapp.format import number
from mobileapp.texts import Texts
from mobileapp.units import SYSTEMS, UNITS, Quantity

# By the end of a placeholder's name, which tells its SI unit.
_QUANTITIES: Final[dict[str, Quantity]] = {
    "m": "length",
    "pa": "pressure",
    "npm": "rate",
    "kg": "mass",
    "mps": "speed",
}


def told(said: Note | SetupError, texts: Texts, units: Mapping[str, str] = SYSTEMS["mixed"]) -> str:
    """Return the sentence of a note or an error of the core.

    Args:
        said: with its numbers in SI.
        texts: words.
        units: unit symbols by quantity.
    """
    data = {key: _shown(key, value, texts, units) for key, value in said.data.items()}
    return texts(f"core.{said.code}", **data)


def _shown(key: str, value: float | str, texts: Texts, units: Mapping[str, str]) -> str:
    if isinstance(value, str):
        return value
    quantity = _QUANTITIES.get(key.rpartition("_")[2])
    if quantity is None:
        return f"{value:.3g}".replace(".", "," if texts.comma else ".")
    unit = UNITS[units[quantity]]
    return f"{number(value / unit.size, unit.decimals, comma=texts.comma)} {unit.symbol}"
