"""Simulated tap streams: people who tap along to a bouncing bike, well and badly."""

import numpy as np

JITTERS = (0.010, 0.020, 0.030, 0.045)  # [s]
WANDERS = (0.0, 0.01, 0.02, 0.04)  # [-] of the period


def steady(random, taps, frequency, jitter, wander, *, walk=False):
    """Taps on every beat.

    Args:
        random: numpy generator.
        taps: how many.
        frequency: mean bounce frequency [Hz].
        jitter: SD of a tap around its beat [s].
        wander: SD of the period: of each beat, or after ten beats if `walk` [-].
        walk: the period itself walks at random instead of scattering about its mean.
    """
    if walk:
        drift = np.cumsum(random.normal(0, wander / np.sqrt(10), taps))
        periods = np.maximum(1 + drift, 0.2) / frequency
    else:
        periods = np.maximum(1 + random.normal(0, wander, taps), 0.2) / frequency
    beats = np.concatenate([[0.0], np.cumsum(periods[:-1])])
    return np.sort(beats + random.normal(0, jitter, taps))


def dirty(random, taps, frequency, jitter, wander, *, latest_double=0.14, walk=False):
    """Taps with a slow start, 7 % missed, and 5 % doubled 60 ms to `latest_double` late."""
    times = steady(random, taps + 6, frequency, jitter, wander, walk=walk)
    stretch = np.abs(random.normal([0.12, 0.06], [0.05, 0.03])) / frequency
    times[2:] += stretch[1]
    times[1:] += stretch[0]
    kept = random.random(len(times)) > 0.07
    kept[0] = True
    times = times[kept]
    twice = random.random(len(times)) < 0.05
    doubles = times[twice] + random.uniform(0.06, latest_double, twice.sum())
    return np.sort(np.concatenate([times, doubles]))[:taps]


def rhythmless(random, taps):
    """Taps at random: intervals from a quarter of a second to a second and a quarter."""
    return np.cumsum(random.uniform(0.25, 1.25, taps))


def mixed(random, taps, **options):
    """A dirty stream of a random rider, and its true frequency [Hz]."""
    frequency = np.exp(random.uniform(np.log(1.2), np.log(3.5)))
    jitter, wander = random.choice(JITTERS), random.choice(WANDERS)
    return dirty(random, taps, frequency, jitter, wander, **options), frequency


def tap_until_told(times, estimate):
    """Tap as a person does: stop at the first ``done`` or ``start_again``; return the last word."""
    for count in range(3, len(times) + 1):
        result = estimate(times[:count])
        if result.state != "keep_going":
            break
    return result, count
