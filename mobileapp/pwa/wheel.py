"""Read the wheels of a build."""

import zipfile
from pathlib import Path


def read_wheel(wheel: Path) -> dict[str, bytes]:
    """Give every file of a wheel, contents by path."""
    return read_folder(wheel, "")


def read_folder(wheel: Path, folder: str) -> dict[str, bytes]:
    """Give the files of one folder of a wheel, contents by path below it."""
    with zipfile.ZipFile(wheel) as archive:
        return {
            name.removeprefix(folder): archive.read(name)
            for name in archive.namelist()
            if name.startswith(folder) and not name.endswith("/")
        }
