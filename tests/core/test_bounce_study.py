"""The goals of the bounce estimator, on simulated riders.

The samples are small enough for every day. Their limits leave room for chance: a figure that meets
its goal passes, one that has clearly left it fails. The whole study is
``python -m tests.bench.bounce_study``.
"""

import numpy as np
import pytest

from tests.bench.bounce_study import CASES, study

RUNS = 300


@pytest.fixture(scope="module")
def dirty():
    return study(CASES["mixed dirty"], RUNS)


def test_most_riders_get_an_answer(dirty):
    errors, _, counts, _ = dirty
    assert len(errors) > 0.9 * RUNS
    assert np.median(counts) <= 12


def test_the_error_is_small(dirty):
    errors = dirty[0]
    # The SD of an RMSE of 300 nearly normal errors is 1 / √600 = 4 % of it: 1.3 % + 3 SDs.
    assert np.sqrt((errors**2).mean()) < 0.013 * (1 + 3 / np.sqrt(2 * len(errors)))
    assert np.percentile(abs(errors), 95) < 0.030
    # At most 0.3 % may be off by more than 6 %: of 300, more than four has a chance below 0.3 %.
    assert (abs(errors) > 0.06).sum() <= 4


def test_the_interval_holds_what_it_claims(dirty):
    covered = dirty[1]
    # 95 % ± 3 SDs of a share of 300, √(0.95 · 0.05 / 300) = 1.3 %
    assert 0.91 < covered.mean() <= 0.99


def test_late_doubles_do_not_harm():
    errors, _, _, _ = study(CASES["mixed dirty, late doubles"], RUNS)
    assert len(errors) > 0.87 * RUNS
    assert np.sqrt((errors**2).mean()) < 0.013 * (1 + 3 / np.sqrt(2 * len(errors)))


def test_no_rhythm_is_no_result():
    done, _, _, _ = study(CASES["rhythmless"], RUNS)
    # At most 2 %: of 300, more than 14 has a chance below 0.3 %.
    assert len(done) <= 14
