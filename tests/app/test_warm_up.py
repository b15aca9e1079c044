"""Importing ahead while the client loads: nothing is left for later, nothing delays the screen."""

import asyncio
import subprocess
import sys
from concurrent.futures import ThreadPoolExecutor
from itertools import count

from mobileapp.warm_up import warm_up

AHEAD = """
import asyncio, sys
import mobileapp.main
from mobileapp.warm_up import warm_up
asyncio.run(warm_up(lambda: True))
before = set(sys.modules)
import flet as ft
from mobileapp import theme
theme.theme(theme.SUN)
ft.Container, ft.Column, ft.Text, ft.TextField, ft.Semantics
print(sorted(set(sys.modules) - before))
"""


def test_what_the_screens_name_is_there_afterwards():
    # A process of its own, because other tests have imported it all.
    done = subprocess.run([sys.executable, "-c", AHEAD], check=True, capture_output=True, text=True)
    assert done.stdout.strip() == "[]"


def test_it_stops_when_the_client_asks():
    asked = count()
    # In a thread of its own: the browser tests keep a loop running in this one.
    with ThreadPoolExecutor() as pool:
        pool.submit(asyncio.run, warm_up(lambda: next(asked) < 3)).result()
    assert next(asked) == 4
