"""Many small files in one, in the order of their names.

    bytes 0 to 3    length n of the index, unsigned, little-endian
    bytes 4 to n+3  index, JSON: {"root": "/lib/…", "files": [["flet/__init__.pyc", 412], …]}
    the rest        the files' contents, one after the other, in the order of the index

The Python worker makes the folders and writes each content below `root` as a view of the pack
(`FS.writeFile(path, view, {canOwn: true})`): nothing is copied, inflated or installed. One large
file also compresses better than its parts and is one request.
"""

import json
from collections.abc import Mapping

ROOT = "/lib/python3.14/site-packages"

_LENGTH_BYTES = 4


def pack(files: Mapping[str, bytes], root: str = ROOT) -> bytes:
    """Put `files`, contents by relative path, into one pack to be unpacked at `root`."""
    names = sorted(files)
    index = {"root": root, "files": [[name, len(files[name])] for name in names]}
    head = json.dumps(index, separators=(",", ":")).encode()
    return b"".join(
        [len(head).to_bytes(_LENGTH_BYTES, "little"), head, *(files[name] for name in names)]
    )


def unpack(content: bytes) -> dict[str, bytes]:
    """Give the files of a pack, contents by relative path."""
    start = _LENGTH_BYTES + int.from_bytes(content[:_LENGTH_BYTES], "little")
    files = {}
    for name, length in json.loads(content[_LENGTH_BYTES:start])["files"]:
        files[name] = content[start : start + length]
        start += length
    return files
