"""Compressed twins of the built files, for hosts that can send them.

`main.dart.js.br` and `main.dart.js.gz` stand beside `main.dart.js`. A host that doesn't know
them still serves the app, only with more bytes. Brotli's best setting takes about two
seconds a megabyte, so its results are kept between builds under the content's hash.
"""

import gzip
from collections.abc import Callable, Mapping
from concurrent.futures import ThreadPoolExecutor
from hashlib import sha256

import brotli

from mobileapp.pwa.kept import kept
from mobileapp.pwa.progress import say

# Already compressed, or too small to gain.
_AS_THEY_ARE = (".png", ".woff2", ".gz", ".br")
_SMALLEST = 512

# Files that take long enough for the person who waits to want to hear of them.
_WORTH_A_LINE = 1_000_000

# A gzip file stores a time; zero says "none".
_NO_TIME = 0


def _brotli(content: bytes) -> bytes:
    return bytes(brotli.compress(content, quality=11, lgwin=24))


def _gzip(content: bytes) -> bytes:
    return gzip.compress(content, compresslevel=9, mtime=_NO_TIME)


_WAYS: dict[str, Callable[[bytes], bytes]] = {".br": _brotli, ".gz": _gzip}


def compressed(files: Mapping[str, bytes]) -> dict[str, bytes]:
    """Give the compressed twins by path, for those files that become smaller."""
    worth = [
        path
        for path, content in files.items()
        if len(content) > _SMALLEST and not path.endswith(_AS_THEY_ARE)
    ]
    # Large ones first, so that the last to finish is a small one.
    worth.sort(key=lambda path: -len(files[path]))
    jobs = [(path, ending) for path in worth for ending in _WAYS]

    def compress(job: tuple[str, str]) -> bytes:
        path, ending = job
        content = files[path]

        def make() -> bytes:
            twin = _WAYS[ending](content)
            if len(content) > _WORTH_A_LINE:
                say(f"  {path}{ending}: {len(content) / 1e6:.1f} to {len(twin) / 1e6:.1f} MB")
            return twin

        return kept("compressed", f"{sha256(content).hexdigest()}{ending}", make)

    with ThreadPoolExecutor() as threads:
        twins = zip(jobs, threads.map(compress, jobs), strict=True)
        return {
            path + ending: twin for (path, ending), twin in twins if len(twin) < len(files[path])
        }
