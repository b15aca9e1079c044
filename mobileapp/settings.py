"""What a person chose once, for all setups."""

import json
from dataclasses import asdict, dataclass
from typing import Final, Literal, get_args

from mobileapp.record_fields import RecordError, check
from mobileapp.units import SYSTEMS

KEY: Final = "settings"
FORMAT: Final = 1

Appearance = Literal["sun", "dark", "auto"]
APPEARANCES: Final[tuple[Appearance, ...]] = get_args(Appearance)
AUTO: Final = "auto"


@dataclass(frozen=True)
class Settings:
    """The choices.

    Attributes:
        units: key of `mobileapp.units.SYSTEMS`.
        appearance: dark on light for the sun, light on dark, or as the device has it.
        language: key of `mobileapp.texts.LANGUAGES`, or ``auto`` for the browser's.
    """

    units: str = "mixed"
    appearance: Appearance = "sun"
    language: str = AUTO


def to_json(settings: Settings) -> str:
    """Return the choices as text."""
    return json.dumps({"format": FORMAT, **asdict(settings)})


def from_json(text: str) -> Settings:
    """Return the choices that a text holds.

    Raises:
        RecordError: it holds none, or those of a newer version.
    """
    try:
        record = json.loads(text)
        check(record.pop("format") <= FORMAT, "record.newer")
        settings = Settings(**record)
        check(settings.units in SYSTEMS and settings.appearance in APPEARANCES)
        check(isinstance(settings.language, str))
    except (ValueError, TypeError, KeyError, AttributeError) as error:
        raise error if isinstance(error, RecordError) else RecordError("record.damaged") from error
    return settings
