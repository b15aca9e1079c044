"""How fast a whole setup is, 4000 samples for every result, beside the same work with scipy.

    python -m tests.bench.setup_speed [ROUNDS]

The setup: sag share and frequency of both ends, friction from a two-sided reading, the change of
pressure in front with the sag and frequency to expect, the change of coil behind likewise. Both
sides draw the same number of samples and solve the same balances of load; the other side takes
what a person would reach for: `scipy.stats.qmc` for the samples and scipy's vectorised root finder.
"""

import sys
from statistics import median
from time import perf_counter

import numpy as np
from scipy.optimize import elementwise
from scipy.stats import norm, qmc

from core.coil import Coil
from core.coil_change import change_coil
from core.pressure_change import change_pressure
from core.sag import frequency_from_sag, share_of_travel
from core.two_sided import two_sided_sag
from core.uncertainty import SAMPLES, Measured
from core.units import LBF_PER_INCH, MM, PSI
from core.unknown import common_fork, common_linkage

GRAVITY, OUTSIDE = 9.80665, 101_325.0


def ours():
    """The setup by this project's core."""
    fork, rear = common_fork(150 * MM), common_linkage(150 * MM, 55 * MM)
    front_sag, rear_sag = Measured(34 * MM, 1 * MM), Measured(19 * MM, 0.5 * MM)
    coil = Coil(400 * LBF_PER_INCH, 1 * MM)
    share_of_travel(front_sag, Measured(150 * MM, 1 * MM))
    share_of_travel(rear_sag, Measured(55 * MM, 0.5 * MM))
    frequency_from_sag(fork, front_sag)
    frequency_from_sag(rear, rear_sag, spring=coil)
    two_sided_sag(fork, Measured(31 * MM, 1 * MM), Measured(37 * MM, 1 * MM))
    front = change_pressure(fork, Measured(75 * PSI, 1 * PSI), front_sag, 30 * MM, 120 * PSI)
    rates = [rate * LBF_PER_INCH for rate in (350, 450, 500)]
    back = change_coil(rear, coil, rear_sag, 16.5 * MM, rates)
    return [front.needed, front.sag, front.frequency, back.needed_rate, back.sag, back.frequency]


def draw(columns):
    """Standard normal samples by scipy's Latin hypercube."""
    return norm.ppf(qmc.LatinHypercube(columns, seed=1).random(SAMPLES)).T


def interval(results):
    return np.quantile(results, [0.025, 0.975])


def theirs():
    """The same work with scipy, written out."""
    found = []
    for mean, sd, travel, travel_sd in ((34, 1, 150, 1), (19, 0.5, 55, 0.5)):
        a, b = draw(2)
        found.append(interval((mean + sd * a) / (travel + travel_sd * b)))
    # Frequency of the fork, of an unknown spring; friction from two readings.
    read, angle, steep = draw(3)
    angle, steep = np.radians(65 + 1.5 * angle), 1.07 + 0.16 * steep
    deflection = (34 + read) * MM * np.sin(angle)
    found.append(interval(np.sqrt(steep * GRAVITY / deflection) / (2 * np.pi)))
    above, below, steep = draw(3)
    above, below, steep = (31 + above) * MM, (37 + below) * MM, 1.07 + 0.16 * steep
    load = (above**steep + below**steep) / 2
    found.append(interval((below**steep - above**steep) / (2 * load)))
    rest = elementwise.find_root(lambda s, m, w: s**m - w, (1e-6, 150 * MM), args=(steep, load)).x
    found.append(interval(rest))
    return [*found, *fork_by_scipy(), *coil_by_scipy()]


def fork_by_scipy():
    samples = draw(8)
    read, gauge = (34 + samples[0]) * MM, (75 + samples[1]) * PSI
    sine = np.sin(np.radians(65 + 1.5 * samples[2]))
    share = norm.cdf(samples[3:])
    stroke = 150 * MM
    length = stroke * 1.3 * (2.0 / 1.3) ** share[0]
    negative = stroke * 0.2 * 5.0 ** share[1]
    ratio, n, joined = 0.85 + 0.15 * share[2], 1.2 + 0.2 * share[3], 0.05 * stroke * share[4]
    filling = ratio * (1 + joined / negative) / (1 - joined / length)

    def shape(s, length, negative, filling):
        return 1 / (1 - s / length) - filling / (1 + s / negative)

    chambers = (length, negative, filling)
    rod = (1 - ratio) * OUTSIDE
    force = (gauge + OUTSIDE) * shape(read, *chambers) - rod
    needed = (force + rod) / shape(30 * MM, *chambers) - OUTSIDE
    inside = gauge + (np.median(needed) - 75 * PSI) + OUTSIDE

    def surplus(s, inside, force, *chambers):
        return inside * shape(s, *chambers) - force

    goal = force + rod
    sag = elementwise.find_root(surplus, (0.0, stroke), args=(inside, goal, *chambers)).x
    slope = 1 / (length * (1 - sag / length) ** 2)
    slope = slope + filling / (negative * (1 + sag / negative) ** 2)
    frequency = np.sqrt(GRAVITY * n * inside * slope / sine / force) / (2 * np.pi)
    return [interval(needed), interval(sag), interval(frequency)]


def coil_by_scipy():
    read, progression, marked = draw(3)
    read, progression = (19 + 0.5 * read) * MM, 0.15 + 0.07 * progression
    rate = 400 * LBF_PER_INCH * (1 + 0.02 * marked)
    start = -150 / 55 * np.log1p(-progression) / progression
    slope = -start * progression / (150 * MM)

    def leverage(s):
        return start * np.exp(slope * s)

    first = rate * (read + 1 * MM)
    own = np.sqrt(GRAVITY * (rate - first * slope) / leverage(read) / first) / (2 * np.pi)
    force = first * leverage(16.5 * MM) / leverage(read)
    needed, preload = force / (17.5 * MM), np.median(force / rate) - 16.5 * MM

    def surplus(s, rate, start, slope, load):
        return rate * (s + preload) / (start * np.exp(slope * s)) - load

    args = (rate, start, slope, first / leverage(read))
    sag = elementwise.find_root(surplus, (0.0, 55 * MM), args=args).x
    carried = rate * (sag + preload)
    frequency = np.sqrt(GRAVITY * (rate - carried * slope) / leverage(sag) / carried) / (2 * np.pi)
    return [interval(own), interval(needed), interval(sag), interval(frequency)]


def compare():
    """Largest difference between the intervals of both sides, as a share of their width."""
    pairs = zip(ours(), [*theirs()[-7:-4], *theirs()[-3:]], strict=True)
    return max(
        max(abs(mine.low - low), abs(mine.high - high)) / (high - low)
        for mine, (low, high) in pairs
    )


def seconds(*works, rounds):
    """Median time of each work; in turns, so that a busy machine slows them alike."""
    times = [[] for _ in works]
    for _ in range(rounds):
        for work, of_work in zip(works, times, strict=True):
            start = perf_counter()
            work()
            of_work.append(perf_counter() - start)
    return map(median, times)


def main(rounds=15):
    print(f"intervals differ by at most {100 * compare():.1f} % of their width")
    mine, other = seconds(ours, theirs, rounds=rounds)
    print(f"this core {1e3 * mine:.1f} ms, scipy {1e3 * other:.1f} ms, ratio {mine / other:.2f}")


if __name__ == "__main__":
    main(*map(int, sys.argv[1:]))
