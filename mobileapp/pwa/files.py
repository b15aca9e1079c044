"""Write files whole or not at all."""

import tempfile
from collections.abc import Mapping
from pathlib import Path


def write_whole(path: Path, content: bytes) -> None:
    """Write beside `path` and move into place, so nobody ever sees half of it."""
    path.parent.mkdir(parents=True, exist_ok=True)
    beside = None
    try:
        with tempfile.NamedTemporaryFile(dir=path.parent, delete=False) as file:
            beside = Path(file.name)
            file.write(content)
        beside.replace(path)
    except BaseException:
        if beside is not None:
            beside.unlink(missing_ok=True)
        raise


def write_tree(folder: Path, files: Mapping[str, bytes]) -> None:
    """Write contents by relative path below `folder`."""
    for name, content in files.items():
        path = folder / name
        path.parent.mkdir(parents=True, exist_ok=True)
        path.write_bytes(content)
