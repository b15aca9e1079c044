"""The bounce estimator on simulated riders: ``python -m tests.bench.bounce_study [RUNS]``.

Prints, for each kind of stream, how many runs ended in ``done`` and, of those: the number of taps,
the errors, and how often the 95 % interval held the truth. The goals are those for the dirty mixed
stream: RMSE at most 1.3 %, 95 % of errors within 2.7 %, coverage 93 to 98 %, at most 0.3 % of
results off by more than 6 %, at most 12 taps in the median; and at most 2 % of rhythmless series
called done.
"""

import sys

import numpy as np

from core import estimate_bounce
from tests.core import tap_streams as streams

TAPS = 30


def fixed(kind, frequency, jitter, wander, **options):
    """A stream of one kind of rider."""
    return lambda random: (kind(random, TAPS, frequency, jitter, wander, **options), frequency)


def mixed_clean(random):
    frequency = np.exp(random.uniform(np.log(1.2), np.log(3.5)))
    jitter, wander = random.choice(streams.JITTERS), random.choice(streams.WANDERS)
    return streams.steady(random, TAPS, frequency, jitter, wander), frequency


CASES = {
    "mixed dirty": lambda random: streams.mixed(random, TAPS),
    "mixed dirty, late doubles": lambda random: streams.mixed(random, TAPS, latest_double=0.25),
    "mixed clean": mixed_clean,
    "mixed dirty, walking period": lambda random: streams.mixed(random, TAPS, walk=True),
    "2 Hz, 30 ms, 2 %, dirty": fixed(streams.dirty, 2.0, 0.030, 0.02),
    "2 Hz, 30 ms, 4 %, dirty": fixed(streams.dirty, 2.0, 0.030, 0.04),
    "3.5 Hz, 30 ms, 2 %, dirty": fixed(streams.dirty, 3.5, 0.030, 0.02),
    "3.5 Hz, 45 ms, 2 %, dirty": fixed(streams.dirty, 3.5, 0.045, 0.02),
    "rhythmless": lambda random: (streams.rhythmless(random, TAPS), np.nan),
}


def study(make, runs, seed=20):
    """Return the figures of one kind of stream."""
    random = np.random.default_rng(seed)
    errors, covered, counts, again = [], [], [], 0
    for _ in range(runs):
        times, truth = make(random)
        result, count = streams.tap_until_told(times, estimate_bounce)
        again += result.state == "start_again"
        if result.state == "done":
            errors.append(result.frequency_hz / truth - 1)
            covered.append(result.low_hz <= truth <= result.high_hz)
            counts.append(count)
    return np.array(errors), np.array(covered), np.array(counts), again


def main():
    runs = int(sys.argv[1]) if len(sys.argv) > 1 else 1000
    print(f"{runs} runs a row; errors in per cent of the true frequency")
    print(f"{'stream':30} done again  taps 10/50/90  bias  RMSE  95 % of  cover  > 6 %")
    for name, make in CASES.items():
        errors, covered, counts, again = study(make, runs)
        line = f"{name:30} {100 * len(errors) / runs:4.1f} {100 * again / runs:5.1f}  "
        if len(errors) and not np.isnan(errors[0]):
            low, middle, high = np.percentile(counts, [10, 50, 90])
            line += (
                f"{low:4.0f} {middle:3.0f} {high:3.0f}   {100 * errors.mean():5.2f} "
                f"{100 * np.sqrt((errors**2).mean()):5.2f}  "
                f"{100 * np.percentile(abs(errors), 95):6.2f}  {100 * covered.mean():5.1f} "
                f"{100 * (abs(errors) > 0.06).mean():6.2f}"
            )
        print(line, flush=True)


if __name__ == "__main__":
    main()
