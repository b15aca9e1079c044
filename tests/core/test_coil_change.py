"""The coil and preload to use: which of those at hand, how much, and what it gives."""

import numpy as np
import pytest
from hypothesis import assume, given
from hypothesis import strategies as st
from numpy.testing import assert_allclose
from scipy.optimize import brentq

from core.coil import Coil
from core.coil_change import (
    LARGEST_PRELOAD,
    SNUG,
    change_coil,
    preload_for_stroke,
    rate_for_stroke,
)
from core.errors import InvalidInputError, NoSolutionError, SetupError
from core.linkage import Linkage
from core.springs import loaded_frequency, stroke_under, wheel_load
from core.uncertainty import Measured
from core.units import LBF_PER_INCH, MM
from core.unknown import common_linkage
from tests.core.strategies import coils_for, linkages

REAR = Linkage.from_stroke(150 * MM, 55 * MM, 0.15)
COIL = Coil(400 * LBF_PER_INCH, 1 * MM)
RATES = [rate * LBF_PER_INCH for rate in (350, 450, 500, 550)]


def change(reading, wanted, rates=RATES, coil=COIL, sd=0.3, **more):
    return change_coil(REAR, coil, Measured(reading * MM, sd * MM), wanted * MM, rates, **more)


@given(
    path=linkages,
    data=st.data(),
    shares=st.tuples(*[st.floats(0.1, 0.5)] * 2),
    preload=st.just(0.0) | st.floats(1e-4, 5e-3),
)
def test_rate_and_preload_carry_the_same_load(path, data, shares, preload):
    coil = data.draw(coils_for(path))
    stroke, wanted = (share * path.full_stroke for share in shares)
    load = wheel_load(coil, path, stroke)
    rate = rate_for_stroke(coil, path, stroke, wanted, preload)
    assert_allclose(wheel_load(Coil(rate, preload), path, wanted), load)
    assert_allclose(stroke_under(Coil(rate, preload), path, load), wanted, rtol=1e-9)
    assert_allclose(preload_for_stroke(coil, path, stroke, wanted, rate), preload, atol=1e-12)
    by_brent = brentq(lambda k: wheel_load(Coil(k, preload), path, wanted) - load, 1e3, 1e7)
    assert_allclose(rate, by_brent, rtol=1e-9)


def test_a_turn_of_preload_is_enough():
    found = change(19, 16.5)
    assert (found.state, found.rate, found.notes) == ("preload", COIL.spring_rate, ())
    assert COIL.preload < found.preload < LARGEST_PRELOAD * 55 * MM
    assert_allclose(found.needed_preload.value, found.preload)
    assert_allclose(found.sag.value, 16.5 * MM)
    assert found.needed_rate.value > COIL.spring_rate  # it would take that without the turn
    # With the same coil its marking doesn't matter, only the reading does.
    sure = change(19, 16.5, rate_sd=0.0)
    assert_allclose(sure.sag.half_width, found.sag.half_width, rtol=1e-9)


def test_of_the_coils_at_hand_the_one_with_least_preload():
    found = change(22, 16.5)
    assert (found.state, found.notes) == ("coil", ())
    needed = {
        rate: float(preload_for_stroke(COIL, REAR, 22 * MM, 16.5 * MM, rate)) for rate in RATES
    }
    least = min((p, rate) for rate, p in needed.items() if p >= SNUG)
    assert (found.preload, found.rate) == least
    assert_allclose(found.sag.value, 16.5 * MM)
    new = Coil(found.rate, found.preload)
    assert_allclose(found.frequency.value, loaded_frequency(new, REAR, 16.5 * MM))
    # Two coils' markings are in doubt now.
    assert found.sag.half_width > change(22, 16.5, rate_sd=0.0).sag.half_width


def test_within_the_doubt_it_is_left():
    found = change(16.8, 16.5)
    assert (found.state, [note.code for note in found.notes]) == ("leave", ["within_doubt"])
    assert (found.rate, found.preload) == (COIL.spring_rate, COIL.preload)
    assert_allclose(found.sag.value, 16.8 * MM)


def test_nothing_at_hand_reaches_the_target():
    found = change(26, 16.5, rates=[350 * LBF_PER_INCH])
    assert found.state == "nearest"
    assert found.notes[0].code == "no_coil_fits"
    assert found.notes[0].data == {"rate_npm": COIL.spring_rate}
    assert_allclose(found.preload, LARGEST_PRELOAD * 55 * MM)
    assert 16.5 * MM < found.sag.value < 26 * MM
    assert found.needed_preload.low > found.preload


def test_too_stiff_for_the_target():
    found = change(10, 16.5, rates=[])
    assert (found.state, found.preload) == ("nearest", SNUG)
    assert found.needed_preload.high < 0.0
    softer = change(10, 16.5, rates=RATES)
    assert (softer.state, softer.rate) == ("nearest", 350 * LBF_PER_INCH)


def test_a_hair_beside_the_target_counts_as_reaching_it():
    # Snug preload leaves it 0.1 mm below the target, which no reading could tell.
    rate = float(rate_for_stroke(COIL, REAR, 22 * MM, 16.5 * MM, SNUG - 0.1 * MM))
    found = change(22, 16.5, rates=[rate])
    assert (found.state, found.rate, found.preload) == ("coil", rate, SNUG)
    assert_allclose(found.sag.value, 16.4 * MM, atol=0.01 * MM)


def test_where_it_is_read_does_not_matter():
    at_wheel = [float(REAR.wheel_travel(s)) for s in (22 * MM, 16.5 * MM)]
    by_wheel = change_coil(REAR, COIL, Measured(at_wheel[0]), at_wheel[1], RATES, place="wheel")
    by_shaft = change(22, 16.5, sd=0.0)
    assert (by_wheel.state, by_wheel.rate) == (by_shaft.state, by_shaft.rate)
    assert_allclose(by_wheel.preload, by_shaft.preload)
    assert_allclose(by_wheel.sag.value, REAR.wheel_travel(by_shaft.sag.value))


def test_an_unsure_linkage_adds_doubt():
    reading = Measured(22 * MM, 0.1 * MM)
    known, unsure = (
        change_coil(path, COIL, reading, 16.5 * MM, RATES)
        for path in (REAR, common_linkage(150 * MM, 55 * MM, Measured(0.15, 0.07)))
    )
    assert unsure.frequency.half_width > known.frequency.half_width
    assert unsure.needed_rate.half_width > known.needed_rate.half_width


@given(
    reading=st.floats(5.0, 40.0),
    wanted=st.floats(8.0, 25.0),
    rate=st.floats(250.0, 700.0),
    preload=st.floats(0.5, 5.0),
)
def test_advice_is_within_the_usual_preload_and_nearer_the_target(reading, wanted, rate, preload):
    coil = Coil(rate * LBF_PER_INCH, preload * MM)
    try:
        found = change(reading, wanted, coil=coil)
    except SetupError as error:
        if error.code not in {"topped_out", "bottomed"}:
            raise
        return
    assert found.rate in {coil.spring_rate, *RATES}
    if found.state == "leave":
        assert found.preload == coil.preload
        return
    assert SNUG <= found.preload <= LARGEST_PRELOAD * 55 * MM + 1e-12
    reached = abs(found.sag.value - wanted * MM) < 1.96 * 0.3 * MM + 1e-6
    assert reached == (found.state != "nearest")
    assume(found.state == "nearest")
    for other in (coil.spring_rate, *RATES):
        for p in (SNUG, LARGEST_PRELOAD * 55 * MM):
            load = wheel_load(coil, REAR, reading * MM)
            try:
                sag = stroke_under(Coil(other, p), REAR, load)
            except NoSolutionError:
                continue
            assert abs(sag - wanted * MM) >= abs(found.sag.value - wanted * MM) - 1e-9


@pytest.mark.parametrize(
    ("call", "code"),
    [
        (lambda: change(56, 16.5), "beyond_travel"),
        (lambda: change(19, 56), "beyond_travel"),
        (lambda: change(19, 0), "not_positive"),
        (lambda: change(0, 16.5), "not_positive"),
        (lambda: change(19, np.nan), "not_finite"),
        (lambda: change(22, 16.5, rates=[0.0]), "not_positive"),
        (lambda: change(19, 16.5, rate_sd=-0.1), "negative"),
        (lambda: change(45, 16.5, coil=Coil(7e4, 1 * MM, 40 * MM)), "coil_binds"),
        (lambda: rate_for_stroke(COIL, REAR, 0.02, 0.016, -0.001), "negative"),
        (lambda: preload_for_stroke(COIL, REAR, 0.02, 0.016, 0.0), "not_positive"),
        (lambda: preload_for_stroke(COIL, REAR, 0.02, 0.0, 7e4), "not_positive"),
        (lambda: preload_for_stroke(COIL, REAR, 0.0, 0.016, 7e4), "not_positive"),
    ],
)
def test_what_cannot_be_is_refused(call, code):
    with pytest.raises(InvalidInputError) as caught:
        call()
    assert caught.value.code == code


@pytest.mark.parametrize(
    ("coil", "reading", "code"),
    [
        # Even snug it carries more than the load; even at full preload it carries less.
        (Coil(400 * LBF_PER_INCH, 0.0), 0.3, "topped_out"),
        (Coil(400 * LBF_PER_INCH, 20 * MM), 50, "bottomed"),
    ],
)
def test_no_coil_at_hand_carries_the_load(coil, reading, code):
    with pytest.raises(NoSolutionError) as caught:
        change(reading, 16.5, coil=coil, rates=[], sd=0.01)
    assert caught.value.code == code
