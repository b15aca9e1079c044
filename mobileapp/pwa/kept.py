"""Results that are slow to make, kept between builds under the hash of what they are made of."""

from collections.abc import Callable
from hashlib import sha256

from mobileapp.pwa.files import write_whole
from mobileapp.pwa.paths import cache


def kept(kind: str, key: str, make: Callable[[], bytes]) -> bytes:
    """Give the kept result for `key`, or make and keep it.

    Each result is stored behind its own SHA-256; one that no longer matches is made again.
    """
    place = cache() / kind / key
    if place.exists():
        stored = place.read_bytes()
        digest, content = stored[:32], stored[32:]
        if sha256(content).digest() == digest:
            return content
    content = make()
    write_whole(place, sha256(content).digest() + content)
    return content
