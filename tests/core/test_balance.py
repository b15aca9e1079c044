from dataclasses import replace

import numpy as np
import pytest
from numpy.testing import assert_allclose

from core.balance import DAMPING_BAND, FREQUENCY_BAND, EndState, compare_ends
from core.errors import InvalidInputError
from core.oscillator import frequency_from_deflection
from core.uncertainty import Measured

FRONT = EndState((0.18, 0.25), Measured(0.21, 0.01), Measured(2.7, 0.05), Measured(0.45, 0.03))
REAR = EndState((0.25, 0.30), Measured(0.28, 0.01), Measured(2.3, 0.05), Measured(0.45, 0.03))


def test_ends_that_go_together_need_nothing():
    balance = compare_ends(FRONT, REAR)
    assert (balance.front_sag, balance.rear_sag) == ("on_target", "on_target")
    assert balance.frequency.verdict == balance.damping.verdict == "balanced"
    assert_allclose(balance.frequency.ratio.value, 2.7 / 2.3)
    assert balance.first == "nothing"


@pytest.mark.parametrize(
    ("front", "rear", "first"),
    [
        # Sag comes before everything else, and the end that is further off before the other.
        ({"sag": Measured(0.36, 0.01)}, {"sag": Measured(0.40, 0.01)}, "front_sag"),
        ({"sag": Measured(0.28, 0.01)}, {"sag": Measured(0.40, 0.01)}, "rear_sag"),
        ({"sag": Measured(0.10, 0.01)}, {"frequency": Measured(4.0, 0.1)}, "front_sag"),
        ({"sag": Measured(0.35, 0.01)}, {"sag": None}, "front_sag"),
        ({"sag": Measured(0.29, 0.03)}, {"sag": Measured(0.33, 0.01)}, "rear_sag"),
        ({}, {"sag": None}, "measure_sag"),
        ({"sag": None, "frequency": Measured(4.0, 0.1)}, {}, "measure_sag"),
        # A sag that may or may not be on target is read again before it is changed.
        ({"sag": Measured(0.26, 0.02)}, {"rebound": Measured(0.9, 0.03)}, "measure_again"),
        # Then frequency, then damping.
        ({"frequency": Measured(3.5, 0.05), "rebound": Measured(0.9, 0.03)}, {}, "frequency"),
        ({"rebound": Measured(0.9, 0.03)}, {}, "damping"),
        ({}, {"rebound": Measured(0.9, 0.03)}, "damping"),
        ({"rebound": Measured(0.62, 0.03)}, {}, "measure_again"),
        ({}, {"rebound": None}, "measure_rebound"),
        ({"frequency": None}, {}, "nothing"),
    ],
)
def test_first_change(front, rear, first):
    assert compare_ends(replace(FRONT, **front), replace(REAR, **rear)).first == first


@pytest.mark.parametrize(
    ("sag", "sd", "verdict"),
    [
        (0.10, 0.01, "too_little"),
        (0.16, 0.02, "unclear"),
        (0.18, 0.02, "on_target"),
        (0.25, 0.02, "on_target"),
        (0.26, 0.02, "unclear"),
        (0.30, 0.01, "too_much"),
    ],
)
def test_sag_is_judged_only_where_its_interval_bears_it(sag, sd, verdict):
    front = replace(FRONT, sag=Measured(sag, sd))
    assert compare_ends(front, REAR).front_sag == verdict
    assert compare_ends(REAR, front).rear_sag == verdict


def test_higher_end_is_named():
    stiff = replace(FRONT, frequency=Measured(3.5, 0.05))
    assert compare_ends(stiff, REAR).frequency.verdict == "front_higher"
    soft = replace(FRONT, frequency=Measured(2.0, 0.05))
    assert compare_ends(soft, REAR).frequency.verdict == "rear_higher"


def test_what_is_not_known_is_not_compared():
    bare = EndState((0.2, 0.3))
    balance = compare_ends(bare, bare)
    assert (balance.front_sag, balance.rear_sag) == (None, None)
    assert (balance.frequency, balance.damping) == (None, None)
    assert balance.first == "measure_sag"


@pytest.mark.parametrize("band", [FREQUENCY_BAND, DAMPING_BAND])
def test_bands_hold_even_ends(band):
    assert band[0] <= 1.0 <= band[1]


def test_common_sag_targets_lie_in_the_frequency_band():
    # Equal travel; targets front and rear by use: common practice, no source.
    targets = {
        "cross-country": ((0.15, 0.20), (0.20, 0.25)),
        "trail": ((0.18, 0.25), (0.25, 0.30)),
        "enduro": ((0.20, 0.25), (0.28, 0.33)),
        "downhill": ((0.22, 0.30), (0.28, 0.38)),
    }
    for front, rear in targets.values():
        middle = np.mean([front, rear], axis=1)
        frequency = frequency_from_deflection(0.15 * middle)
        assert FREQUENCY_BAND[0] < frequency[0] / frequency[1] < FREQUENCY_BAND[1]


@pytest.mark.parametrize("target", [(0.3, 0.2), (0.0, 0.2), (0.2, 1.0), (np.nan, 0.3)])
def test_target_that_runs_backwards_is_refused(target):
    with pytest.raises(InvalidInputError) as caught:
        EndState(target)
    assert caught.value.code == "sag_band_order"


def test_sag_that_is_none_at_all_is_refused():
    with pytest.raises(InvalidInputError) as caught:
        compare_ends(replace(FRONT, sag=Measured(0.0)), REAR)
    assert (caught.value.code, caught.value.field) == ("not_positive", "sag")
