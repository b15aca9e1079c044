"""Which Material icons the app uses, found by reading our own code.

An icon has to be written out as `Icons.NAME`; a name put together at run time would not be seen,
and its glyph would be missing on the phone.
"""

import ast
import json
from collections.abc import Mapping

from mobileapp.pwa.problem import BuildProblem

ICONS_FILE = "flet/controls/material/icons.json"

# Drawn by the client itself: ticks, menus, back and close buttons, pickers.
CLIENT_ICONS = frozenset(
    """
    ARROW_BACK ARROW_BACK_IOS_NEW_ROUNDED ARROW_DROP_DOWN ARROW_DROP_UP ARROW_UPWARD CANCEL CHECK
    CHEVRON_LEFT CHEVRON_RIGHT CLEAR CLOSE EDIT_OUTLINED ERROR EXPAND_MORE KEYBOARD_ARROW_DOWN
    KEYBOARD_ARROW_UP MENU MORE_HORIZ MORE_VERT REMOVE SEARCH
    """.split()  # noqa: SIM905  # a paragraph reads better than a line a name
)


def used_icons(sources: Mapping[str, bytes]) -> set[str]:
    """Give the names of all icons that `sources` (Python text by path) mention."""
    return {
        node.attr
        for content in sources.values()
        for node in ast.walk(ast.parse(content))
        if isinstance(node, ast.Attribute) and _ends_in_icons(node.value) and node.attr.isupper()
    }


def keep_used_icons(files: Mapping[str, bytes], sources: Mapping[str, bytes]) -> dict[str, bytes]:
    """Cut Flet's table of icon numbers down to the icons that `sources` use.

    Raises:
        BuildProblem: an icon is used that the table doesn't have.
    """
    numbers = json.loads(files[ICONS_FILE])
    used = used_icons(sources)
    unknown = used - numbers.keys()
    if unknown:
        raise BuildProblem(f"No such icon: {', '.join(sorted(unknown))}.")
    few = {name: numbers[name] for name in sorted(used)}
    return {**files, ICONS_FILE: json.dumps(few).encode()}


def _ends_in_icons(node: ast.expr) -> bool:
    return (isinstance(node, ast.Name) and node.id == "Icons") or (
        isinstance(node, ast.Attribute) and node.attr == "Icons"
    )
