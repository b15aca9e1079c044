"""What the core says when it cannot or should not answer.

Every message has a code, which is stable, and data in SI units, which a caller may show in the
person's own units and language. The English sentences live in `core.messages`.
"""

from collections.abc import Mapping
from dataclasses import dataclass, field
from typing import TYPE_CHECKING

from core.messages import sentence

if TYPE_CHECKING:  # a sentence needs no numpy, which the app loads only after its first screen
    import numpy as np
    from numpy.typing import NDArray


class SetupError(ValueError):
    """Base of all errors of the core: no answer exists for these inputs.

    Attributes:
        code: stable name of the situation, a key of `core.messages.MESSAGES`.
        field: name of the parameter to look at first, or None when it is their combination.
        data: the numbers in the sentence, in SI units; each key ends in its unit (`travel_m`).
        where: of array inputs, the elements at fault; None where the error doesn't tell.
    """

    where: "NDArray[np.bool_] | None" = None

    def __init__(self, code: str, field: str | None = None, **data: float | str) -> None:
        super().__init__(sentence(code, data))
        self.code = code
        self.field = field
        self.data = data


class InvalidInputError(SetupError):
    """One input is outside its valid range, or inputs contradict each other."""


class NoSolutionError(SetupError):
    """The inputs are valid, but the physics has no answer to the question."""


@dataclass(frozen=True)
class Note:
    """Something a person should know about a result that does exist.

    Attributes:
        code: stable name, a key of `core.messages.MESSAGES`.
        data: the numbers in the sentence, in SI units; each key ends in its unit.
    """

    code: str
    data: Mapping[str, float | str] = field(default_factory=dict)

    def __str__(self) -> str:
        """Return the English sentence, numbers in SI units."""
        return sentence(self.code, self.data)
