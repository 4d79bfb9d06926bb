"""Bounds for the lost; rates per person-year."""

import math

import numpy as np
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from vitalroll.errors import Refusal
from vitalroll.numbers import DAYS_PER_YEAR
from vitalroll.outcomes.losses import losses_by
from vitalroll.outcomes.person_time import event_rate, poisson_limits, rate
from vitalroll.outcomes.product_limit import product_limit
from vitalroll.outcomes.risk_table import risk_table

DIED = ("died_of_disease",)


def test_bounds_by_hand(cohort_of):
    """Four patients, one lost on day 100, one dead on day 300, the register closed on day 800.

    If the lost died: 3/4 * 2/3 = 1/2 at one year. If not, all four were there on day 300: 3/4. The
    estimate lies between: 2/3.
    """
    cohort = cohort_of([100, 300, 800, 800], "ld++", closing=800)
    losses = losses_by(cohort, DIED, None, [1, 2, 3])[None]
    assert (losses.lost, losses.share) == (1, 0.25)
    assert (losses.bounds[0].all_died, losses.bounds[0].none_died) == pytest.approx((0.5, 0.75))
    assert product_limit(risk_table(cohort), DIED).at(DAYS_PER_YEAR).value == pytest.approx(2 / 3)
    assert math.isnan(losses.bounds[2].none_died), "three years is after the closing date"


@st.composite
def register(draw):
    n = draw(st.integers(2, 40))
    exits = draw(st.lists(st.integers(1, 1500), min_size=n, max_size=n))
    words = draw(st.lists(st.sampled_from(["d", "+", "l", "recovered"]), min_size=n, max_size=n))
    return exits, words


@given(register())
@settings(deadline=None)
def test_the_estimate_lies_between_the_bounds(cohort_of, rows):
    """Wherever all three are given."""
    cohort = cohort_of(*rows, closing=1500)
    years = [0.5, 1, 2, 3, 4]
    curve = product_limit(risk_table(cohort), DIED)
    for bound in losses_by(cohort, DIED, None, years)[None].bounds:
        value = curve.at(bound.years * DAYS_PER_YEAR).value
        assert not bound.all_died > value + 1e-12
        assert not value > bound.none_died + 1e-12


@given(register())
@settings(deadline=None)
def test_no_losses_means_the_bounds_meet(cohort_of, rows):
    """And equal the estimate."""
    exits, words = rows
    cohort = cohort_of(exits, ["+" if word == "l" else word for word in words], closing=1500)
    curve = product_limit(risk_table(cohort), DIED)
    losses = losses_by(cohort, DIED, None, [1, 2])[None]
    assert losses.lost == 0
    for bound in losses.bounds:
        expected = curve.at(bound.years * DAYS_PER_YEAR).value
        assert (bound.all_died, bound.none_died) == pytest.approx((expected, expected), nan_ok=True)


def test_by_group(cohort_of):
    """Each group has its own bounds; an empty group has none."""
    cohort = cohort_of([100, 900, 400, 900], "l+d+", closing=900, groups=["a", "a", "b", "b"])
    losses = losses_by(cohort, DIED, "c0", [2])
    assert (losses["a"].lost, losses["b"].lost) == (1, 0)
    assert (losses["a"].bounds[0].all_died, losses["a"].bounds[0].none_died) == (0.5, 1)
    assert (losses["b"].bounds[0].all_died, losses["b"].bounds[0].none_died) == (0.5, 0.5)


def test_being_lost_as_the_outcome_leaves_nothing_unknown(cohort_of):
    """The bounds meet."""
    bound = losses_by(cohort_of([100, 900], "l+"), ("lost",), None, [1])[None].bounds[0]
    assert bound.all_died == bound.none_died == 0.5


def test_garwood_limits():
    """10 events: 4.80 to 18.39 (Garwood 1936, from memory); none: 0 to 3.69 = -ln 0.025."""
    lower, upper = poisson_limits(np.array([0, 1, 10]))
    assert lower == pytest.approx([0, -math.log(0.975), 4.795], abs=5e-4)
    assert upper == pytest.approx([-math.log(0.025), 5.572, 18.390], abs=5e-4)


@pytest.mark.parametrize("events", [1, 4, 37])
def test_garwood_limits_are_where_the_tails_are_half_the_error(events):
    """P(at least d | lower) = P(at most d | upper) = 0.025, by summing the Poisson probabilities."""
    lower, upper = (float(limit) for limit in poisson_limits(events))

    def at_most(d, mean):
        return sum(math.exp(-mean + i * math.log(mean) - math.lgamma(i + 1)) for i in range(d + 1))

    assert 1 - at_most(events - 1, lower) == pytest.approx(0.025, abs=1e-12)
    assert at_most(events, upper) == pytest.approx(0.025, abs=1e-12)


def test_rate_of_a_table(table_of):
    """Two deaths in 4 + 4 + 8 years."""
    found = event_rate(table_of([1461, 1461, 2922], "d+d"), DIED)
    assert found.value == pytest.approx(2 / 16)
    assert found.standard_error == pytest.approx(math.sqrt(2) / 16)
    assert found.lower < found.value < found.upper


def test_no_time_no_rate():
    """Nothing can be said of no time observed."""
    assert math.isnan(rate(1, 0.0).value)


def test_a_confidence_that_makes_no_sense_is_refused():
    """It is a share, not a percentage."""
    with pytest.raises(Refusal) as refused:
        poisson_limits(3, 95)
    assert refused.value.code == "out_of_range"
