import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st
from numpy.testing import assert_allclose
from scipy import stats

from core.checks import positive
from core.errors import InvalidInputError, NoSolutionError
from core.uncertainty import (
    COVERAGE_FACTOR,
    LEVEL,
    MAX_OUTSIDE,
    Estimate,
    Measured,
    decimals_for,
    mean_reading,
    propagate,
)

# Of a half-width: a 2.5 % quantile of 4,000 normal samples has a standard error of 2.1 % of the
# half-width, the mean of two opposite ones 1.5 %; four times that.
SCATTER = 0.06


def numbers(low, high):
    """Numbers of a size that a person could mean: no 1e-300."""
    return st.floats(low, high).map(lambda number: round(number, 6))


readings = numbers(-1e6, 1e6)
deviations = numbers(1e-6, 1e3)


def measured(low=0.5, high=2.0, share=0.05):
    return st.floats(low, high).map(lambda value: Measured(value, share * value))


def test_coverage_factor_is_the_normal_quantile():
    assert_allclose(COVERAGE_FACTOR, stats.norm.ppf((1 + LEVEL) / 2), rtol=1e-12)


@given(value=readings, sd=deviations)
def test_one_reading_keeps_its_own_normal_interval(value, sd):
    low, high = stats.norm.interval(LEVEL, value, sd)
    estimate = propagate(lambda x: x, Measured(value, sd))
    # Stratified: the quantiles of one input are exact but for half a slice.
    assert_allclose([estimate.low, estimate.high], [low, high], atol=0.01 * sd, rtol=1e-9)


@given(values=st.lists(readings, min_size=2, max_size=6), data=st.data())
def test_sum_has_the_root_sum_of_squares(values, data):
    sds = [data.draw(st.floats(0.1, 10.0)) for _ in values]
    inputs = [Measured(value, sd) for value, sd in zip(values, sds, strict=True)]
    estimate = propagate(lambda *parts: sum(parts), *inputs)
    expected = COVERAGE_FACTOR * np.sqrt(np.sum(np.square(sds)))
    assert_allclose(estimate.half_width, expected, rtol=SCATTER)
    assert_allclose(estimate.value, sum(values), rtol=1e-12)


def test_curved_function_keeps_its_lopsided_interval():
    # exp of a normal is log-normal, whose quantiles scipy knows.
    estimate = propagate(np.exp, Measured(0.0, 0.5))
    expected = stats.lognorm.ppf([0.025, 0.975], 0.5)
    assert_allclose([estimate.low, estimate.high], expected, rtol=0.01)
    assert estimate.high - estimate.value > 1.5 * (estimate.value - estimate.low)


def test_ratio_agrees_with_plain_random_sampling():
    random = np.random.default_rng(3)
    plain = random.normal(2.0, 0.2, 400_000) / random.normal(3.0, 0.3, 400_000)
    estimate = propagate(lambda a, b: a / b, Measured(2.0, 0.2), Measured(3.0, 0.3))
    low, high = np.quantile(plain, [0.025, 0.975])
    assert_allclose([estimate.low, estimate.high], [low, high], rtol=SCATTER)


@given(first=measured(), second=measured())
def test_same_inputs_give_the_same_interval(first, second):
    def function(a, b):
        return a / b + a * b

    assert propagate(function, first, second) == propagate(function, first, second)


@given(value=readings)
def test_exact_reading_costs_one_evaluation_and_has_no_width(value):
    calls = []

    def function(x):
        calls.append(x)
        return 2.0 * x

    assert propagate(function, Measured(value)) == Estimate(2.0 * value, 2.0 * value, 2.0 * value)
    assert calls == [value]


def test_exact_reading_among_others_stays_a_number():
    def function(exact, uncertain):
        assert isinstance(exact, float)
        return exact * uncertain

    assert_allclose(
        propagate(function, Measured(2.0), Measured(1.0, 0.1)).half_width,
        0.2 * COVERAGE_FACTOR,
        rtol=0.01,
    )


def test_tuple_gives_a_tuple_from_the_same_samples():
    both = propagate(lambda a, b: (a + b, a - b), Measured(1.0, 0.1), Measured(2.0, 0.1))
    assert both == (
        propagate(lambda a, b: a + b, Measured(1.0, 0.1), Measured(2.0, 0.1)),
        propagate(lambda a, b: a - b, Measured(1.0, 0.1), Measured(2.0, 0.1)),
    )


def test_constant_result_of_uncertain_readings_has_no_width():
    assert propagate(lambda _: 3.0, Measured(1.0, 0.1)) == Estimate(3.0, 3.0, 3.0)


def test_value_at_a_turning_point_stays_inside_its_interval():
    estimate = propagate(np.square, Measured(0.0, 1.0))
    assert estimate.low == estimate.value == 0.0
    assert_allclose(estimate.high, stats.chi2.ppf(0.975, 1), rtol=SCATTER)


@given(sigmas=st.floats(1.7, 5.0))
def test_few_samples_outside_the_domain_are_counted(sigmas):
    estimate = propagate(lambda x: np.sqrt(positive("x", x)), Measured(sigmas, 1.0))
    # Stratified samples: the share is that of the normal distribution to one slice.
    assert_allclose(estimate.outside, stats.norm.cdf(-sigmas), atol=1 / 4000)


@pytest.mark.parametrize("function", [lambda x: np.sqrt(positive("x", x)), np.sqrt, np.log])
def test_many_samples_outside_the_domain_are_an_error(function):
    with pytest.raises(NoSolutionError) as caught:
        propagate(function, Measured(1.0, 1.0))
    assert caught.value.code == "too_uncertain"
    assert_allclose(caught.value.data["outside_percent"], 100 * stats.norm.cdf(-1), atol=0.03)
    assert stats.norm.cdf(-1) > MAX_OUTSIDE


def test_reading_outside_the_domain_raises_the_functions_own_error():
    with pytest.raises(InvalidInputError) as caught:
        propagate(lambda x: positive("sag", x), Measured(-1.0, 0.1))
    assert (caught.value.code, caught.value.field) == ("not_positive", "sag")


@pytest.mark.parametrize("function", [np.log, lambda x: 1.0 / np.float64(x), lambda x: x * np.nan])
def test_result_that_is_no_number_is_an_error(function):
    with pytest.raises(NoSolutionError) as caught:
        propagate(function, Measured(0.0, 0.1))
    assert caught.value.code == "no_finite_result"


def test_interval_too_wide_for_a_float_is_an_error():
    with pytest.raises(NoSolutionError) as caught:
        propagate(lambda x: 1.6e308 * np.tanh(x), Measured(0.0, 10.0))
    assert caught.value.code == "no_finite_result"


def test_error_that_names_no_elements_is_passed_on():
    def function(x):
        if np.ndim(x):
            raise InvalidInputError("not_finite", "x", name="x")
        return x

    with pytest.raises(InvalidInputError):
        propagate(function, Measured(1.0, 0.1))


@pytest.mark.parametrize("samples", [0, -2, 38, 41])
def test_too_few_or_odd_samples_are_refused(samples):
    with pytest.raises(InvalidInputError) as caught:
        propagate(np.exp, Measured(0.0, 1.0), samples=samples)
    assert caught.value.code == "sample_count"


@pytest.mark.parametrize(
    ("value", "sd", "code"),
    [
        (np.nan, 0.0, "not_finite"),
        (np.inf, 0.0, "not_finite"),
        (1.0, np.nan, "not_finite"),
        (1.0, np.inf, "not_finite"),
        (1.0, -1e-9, "negative"),
    ],
)
def test_reading_that_is_no_number_is_refused(value, sd, code):
    with pytest.raises(InvalidInputError) as caught:
        Measured(value, sd)
    assert caught.value.code == code


@pytest.mark.parametrize("ends", [(1.0, 2.0, 3.0), (1.0, 0.0, 0.5)])
def test_interval_that_does_not_hold_its_value_is_refused(ends):
    with pytest.raises(InvalidInputError) as caught:
        Estimate(*ends)
    assert caught.value.code == "interval_order"


@given(value=readings, sd=deviations, unit=st.floats(1e-3, 1e5))
def test_estimate_in_another_unit_and_back(value, sd, unit):
    estimate = propagate(lambda x: x, Measured(value, sd))
    there = estimate.in_unit(unit)
    back = there.in_unit(1 / unit)
    assert_allclose([back.value, back.low, back.high], [value, estimate.low, estimate.high])
    assert_allclose(there.half_width * unit, estimate.half_width, atol=1e-9 * abs(value))


@given(reading=measured())
def test_estimate_of_a_normal_reading_goes_back_to_it(reading):
    back = propagate(lambda x: x, reading).as_measured()
    assert back.value == reading.value
    assert_allclose(back.sd, reading.sd, rtol=0.01)


@given(
    values=st.lists(numbers(-100, 100), min_size=1, max_size=9),
    sd=numbers(0.0, 10.0),
)
def test_mean_of_readings_is_at_least_as_uncertain_as_known(values, sd):
    mean = mean_reading(values, sd)
    assert_allclose(mean.value, np.mean(values), atol=1e-9)
    assert mean.sd >= sd / np.sqrt(len(values)) * (1 - 1e-12)
    if len(values) > 1:
        scatter = stats.sem(np.array(values)) if np.ptp(values) > 1e-9 else 0.0
        assert mean.sd >= scatter * (1 - 1e-9)


def test_mean_of_scattered_readings_uses_their_scatter():
    assert_allclose(mean_reading([28.0, 31.0, 31.0], 0.5).sd, 1.0)  # s = √3, over √3


@pytest.mark.parametrize(
    ("values", "sd", "code"),
    [([], 1.0, "no_readings"), ([1.0, np.nan], 1.0, "not_finite"), ([1.0], -1.0, "negative")],
)
def test_readings_without_a_mean_are_refused(values, sd, code):
    with pytest.raises(InvalidInputError) as caught:
        mean_reading(values, sd)
    assert caught.value.code == code


@given(half_width=st.floats(1e-6, 1e6), value=readings)
def test_shown_half_width_keeps_one_or_two_digits_and_its_size(half_width, value):
    decimals = decimals_for(Estimate(value, value - half_width, value + half_width))
    # The estimate's own half-width: adding and subtracting it has rounded it a little.
    shown = round(Estimate(value, value - half_width, value + half_width).half_width, decimals)
    digits = f"{shown:.15e}".partition("e")[0].rstrip("0").replace(".", "")
    assert len(digits) <= 2 or abs(value) > 1e9 * half_width
    assert abs(shown - half_width) <= 0.15 * half_width + 1e-9 * abs(value)


def test_estimate_without_width_sets_no_limit_to_its_digits():
    assert decimals_for(Estimate(1.0, 1.0, 1.0)) is None
