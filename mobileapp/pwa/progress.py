"""Say what takes time while it takes it."""

import sys
from collections.abc import Iterator
from contextlib import contextmanager
from time import monotonic


def say(text: str) -> None:
    """Print one line at once, also when the output is a pipe."""
    sys.stdout.write(text + "\n")
    sys.stdout.flush()


@contextmanager
def step(what: str) -> Iterator[None]:
    """Announce a step, then how long it took."""
    say(f"{what} …")
    began = monotonic()
    yield
    say(f"  done in {monotonic() - began:.1f} s")
