"""What the trail screen shows, against the handbook's relations for base excitation."""

from dataclasses import replace
from math import pi, sqrt

import pytest

from mobileapp.records import SagReading, from_json, new_setup, to_json
from mobileapp.release_reading import ReleaseReading
from mobileapp.results.frequency import end_frequency
from mobileapp.results.trail import CHART_POINTS, bump_numbers, bump_view
from mobileapp.texts import LANGUAGES, Texts
from mobileapp.trail_plan import FIRST_BUMP, MOST_BUMPS, Bump, TrailPlan
from mobileapp.units import SYSTEMS, Amount

ENGLISH = Texts("en")
UNITS = SYSTEMS["mixed"]
SAG = SagReading(Amount(150, "mm"), Amount(40, "mm"), wheel_travel=Amount(150, "mm"))
PLAN = TrailPlan(Amount(10, "km/h"), Amount(25, "km/h"))


def measured(*ends):
    setup = new_setup("k")
    for end in ends:
        setup = setup.with_sag(end, SAG)
    return setup


def ridden(setup, bump=FIRST_BUMP, plan=PLAN):
    return bump_view(replace(setup, trail=plan), bump, ENGLISH, UNITS)


def numbers(setup, end="front", bump=FIRST_BUMP, plan=PLAN):
    return bump_numbers(replace(setup, trail=plan), end, bump, ENGLISH, UNITS)


def row(found, name):
    return next(row for row in found.rows if row.name.startswith(name))


def test_the_numbers_are_those_of_a_sine():
    found = numbers(measured("front"))
    forcing = row(found, "Bumps a second")
    assert float(forcing.slow.split()[0]) == pytest.approx(10 / 3.6 / 1.5, abs=0.06)
    assert float(forcing.fast.split()[0]) == pytest.approx(25 / 3.6 / 1.5, abs=0.06)
    # Peak speed of a sine: 2π f A, with half the bumps' height as A.
    speed = row(found, "Wheel speed")
    assert float(speed.fast.split()[0]) == pytest.approx(2 * pi * 25 / 3.6 / 1.5 * 0.03, abs=0.06)


def test_transmissibility_is_that_of_base_excitation():
    # Thomson, Theory of Vibration: √[(1 + (2ζr)²) / ((1 − r²)² + (2ζr)²)].
    setup = measured("front")
    view = ridden(setup)
    frequency = end_frequency(setup, "front").measured.value
    zeta = (0.45 + 0.4 * 0.45) / 2
    (curve,) = view.curves
    assert len(curve.points) == CHART_POINTS
    for speed, through in curve.points[10::10]:
        r = speed / 3.6 / 1.5 / frequency
        expected = sqrt((1 + (2 * zeta * r) ** 2) / ((1 - r**2) ** 2 + (2 * zeta * r) ** 2))
        assert through == pytest.approx(min(expected, view.top + 1), rel=1e-6)


def test_both_ends_speak_when_both_are_known():
    view = ridden(measured("front", "rear"))
    assert view.sentences["front"].startswith("Front: ")
    assert view.sentences["rear"].startswith("Rear: ")
    assert view.band == (pytest.approx(10), pytest.approx(25))


def test_long_waves_are_followed_and_short_ones_smoothed():
    for spacing, words in ((20, "goes up and down"), (0.4, "at all these speeds")):
        bump = Bump(Amount(spacing, "m"), Amount(30, "mm"))
        view = ridden(measured("front"), bump)
        assert words in view.sentences["front"]


def test_what_is_assumed_is_named():
    notes = numbers(measured("front")).notes
    assert ENGLISH("trail.assumed.rebound") in notes
    assert ENGLISH("trail.assumed.compression") in notes
    rebound = ReleaseReading(overshoot=Amount(10, "mm"))
    notes = numbers(measured("front").with_release("front", rebound, new=True)).notes
    assert ENGLISH("trail.assumed.rebound") not in notes


@pytest.mark.parametrize(
    ("setup", "plan", "bump", "missing"),
    [
        (measured(), PLAN, FIRST_BUMP, "frequency"),
        (measured("front"), TrailPlan(PLAN.fastest, PLAN.slowest), FIRST_BUMP, "order"),
        (measured("front"), PLAN, Bump(Amount(0, "m"), Amount(60, "mm")), "zero"),
        (measured("front"), PLAN, Bump(Amount(1, "m"), Amount(0, "mm")), "zero"),
    ],
)
def test_what_is_missing_is_asked_for(setup, plan, bump, missing):
    view = ridden(setup, bump, plan)
    assert view.missing == ENGLISH(f"trail.missing.{missing}")


@pytest.mark.parametrize("language", LANGUAGES)
def test_every_pair_of_regimes_has_a_sentence(language):
    order = ("follows", "resonates", "filters")
    for slow in order:
        for fast in order[order.index(slow) :]:
            words = Texts(language)(
                f"trail.says.{slow}_{fast}",
                end="E",
                resonant="1",
                filtering="2",
                percent="3",
                fast="4",
            )
            assert words.startswith("E")


def test_a_plan_survives_being_kept():
    plan = PLAN.with_another().with_bump(1, Bump(Amount(3, "ft"), Amount(2, "in")))
    setup = replace(new_setup("k"), trail=plan)
    assert from_json(to_json(setup)) == setup


def test_rows_are_added_and_removed_within_reason():
    plan = PLAN
    for _ in range(MOST_BUMPS + 3):
        plan = plan.with_another()
    assert len(plan.bumps) == MOST_BUMPS
    for _ in range(MOST_BUMPS + 3):
        plan = plan.without(0)
    assert len(plan.bumps) == 1
