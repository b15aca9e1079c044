"""From sag to rebound, trail and balance without a network, with the numbers checked."""

import re
from math import log, pi, sqrt

import pytest


def test_a_setup_is_walked_through_to_its_balance(phone, server, screenshot):
    phone.offline_ready()
    server.kill()
    phone.press("Measure sag")
    phone.type_into("Sag reading", "32")
    phone.sees("21.3 ± 1.3 %")
    phone.type_into("Sag reading", "16", nth=1)
    phone.sees("29 ± 4 %")

    phone.press("Rebound")
    phone.type_into("Overshoot, above the sag mark", "14")
    phone.sees("Close rebound: more damping")
    screenshot(phone, "rebound")
    damping = re.search(r"Damping ratio ([\d.]+) ±", phone.words())[1]
    # ζ = −ln R / √(π² + ln² R) with R overshoot over push: the logarithmic decrement.
    ratio = log(14 / 40)
    assert float(damping) == pytest.approx(-ratio / sqrt(pi**2 + ratio**2), abs=0.01)
    phone.press("Rear")
    phone.type_into("Overshoot, above the sag mark", "7")
    phone.sees("Keep it: one overshoot, then settle")

    phone.press("Trail")
    phone.sees("Front: around")
    screenshot(phone, "trail")
    resonant = float(re.search(r"Front: around ([\d.]+) km/h", phone.words())[1])
    # Near resonance the bumps come at the bike's own frequency, about 2.9 Hz, 1.5 m apart.
    assert resonant == pytest.approx(2.9 * 1.5 * 3.6, rel=0.1)

    phone.press("Balance")
    phone.sees("Frequency, front over rear")
    screenshot(phone, "balance")
    phone.reload()
    phone.sees("Frequency, front over rear")
    phone.press("Back")
    phone.sees("Front 21.3 ± 1.3 % · Rear 29 ± 4 %")
    server.start()
