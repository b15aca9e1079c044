"""Use the time in which the client still loads: import what the screens are about to need.

Flet imports each control when its name is first used, some forty modules for the first screen.
Python in the browser is ready well before the client is, so the names that our own modules use are
looked up then, one at a time, until the client asks for its first screen. What that screen needs
is imported by making it; more would only delay it.
"""

import asyncio
import importlib.util
import sys
from collections.abc import Callable, Iterator
from types import CodeType

import flet as ft

OURS = "mobileapp."


async def warm_up(client_is_loading: Callable[[], bool]) -> None:
    """Import the parts of Flet that our modules, imported so far, name.

    Args:
        client_is_loading: tells whether there is still time.
    """
    for module in [name for name in sys.modules if name.startswith(OURS)]:
        for name in _names(_code(module)):
            if not client_is_loading():
                return
            if name in ft.__all__:
                getattr(ft, name)
                await asyncio.sleep(0)  # lets the client's messages in


def _code(module: str) -> CodeType:
    spec = importlib.util.find_spec(module)
    return spec.loader.get_code(module)


def _names(code: CodeType) -> Iterator[str]:
    """Yield every name that code and the functions inside it look up."""
    yield from code.co_names
    for constant in code.co_consts:
        if isinstance(constant, CodeType):
            yield from _names(constant)
