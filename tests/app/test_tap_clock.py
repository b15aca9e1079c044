"""Matching the page's touch times to taps."""

from mobileapp.browser import TapClock
from mobileapp.tapping import Tapping


def test_a_tap_takes_the_earliest_touch_near_it():
    clock = TapClock()
    clock.add(1.0, 100, 650)
    clock.add(1.4, 103, 648)
    assert clock.take(100, 647) == 1.0
    assert clock.take(103, 645) == 1.4
    assert clock.take(103, 645) is None


def test_touches_elsewhere_are_no_taps_on_the_pad():
    clock = TapClock()
    clock.add(1.0, 20, 30)
    assert clock.take(195, 650) is None


def test_a_touch_that_became_no_tap_is_forgotten():
    clock = TapClock()
    clock.add(1.0, 195, 650)
    clock.add(2.5, 195, 650)
    assert clock.take(195, 650) == 2.5


def test_one_missing_time_makes_the_apps_own_clock_count_for_all():
    tapping = Tapping().tapped(10.0, 100.0).tapped(None, 100.52).tapped(11.0, 101.03)
    assert tapping.run().taps == (0.0, 0.52, 1.03)
    assert not tapping.run().page_clock
    exact = Tapping().tapped(10.0, 100.02).tapped(10.5, 100.55)
    assert exact.run().taps == (0.0, 0.5)
    assert exact.run().page_clock
