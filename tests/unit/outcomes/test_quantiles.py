"""Medians and other quantiles, and the median of follow-up."""

import math

import numpy as np
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from vitalroll.errors import Refusal
from vitalroll.numbers import DAYS_PER_YEAR
from vitalroll.outcomes.follow_up import follow_up_curve, follow_up_median
from vitalroll.outcomes.product_limit import product_limit
from vitalroll.outcomes.quantiles import time_quantile
from vitalroll.outcomes.risk_table import count_risk
from vitalroll.register.cohort import MEANINGS

DIED = ("died_of_disease",)


def in_days(quantile):
    found = quantile.estimate
    return [
        None if math.isnan(x) else round(x * DAYS_PER_YEAR, 6)
        for x in (found.value, found.lower, found.upper)
    ]


def test_aml_medians(table_of):
    """Maintained arm 31 weeks, the other 23 (Miller 1981; from memory, R prints the same for ``aml``)."""
    maintained = table_of([9, 13, 13, 18, 23, 28, 31, 34, 45, 48, 161], "dd+dd+dd+d+")
    other = table_of([5, 5, 8, 8, 12, 16, 23, 27, 30, 33, 43, 45], "ddddd+dddddd")
    assert in_days(time_quantile(product_limit(maintained, DIED)))[0] == 31
    assert in_days(time_quantile(product_limit(other, DIED)))[0] == 23


def test_leukaemia_trial_median(table_of):
    """6-MP: 23 weeks (Gehan 1965); the upper limit is not reached."""
    times = [6, 6, 6, 7, 10, 13, 16, 22, 23, 6, 9, 10, 11, 17, 19, 20, 25, 32, 32, 34, 35]
    median = time_quantile(product_limit(table_of(times, "d" * 9 + "+" * 12), DIED))
    assert median.reached
    assert in_days(median)[0] == 23
    assert in_days(median)[2] is None


def test_a_flat_stretch_at_one_half_gives_its_first_time(table_of):
    """Four of four, two dead by day 2: S = 3/4 * 2/3, which only round-off keeps from 1/2."""
    for n in (4, 6, 10, 14, 22, 46):
        curve = product_limit(table_of(range(1, n + 1), "d" * n), DIED)
        assert in_days(time_quantile(curve))[0] == n / 2


def test_not_reached_carries_its_lower_limit(table_of):
    """Thirteen of thirty died: the median is not reached, but it is not below the limit given."""
    median = time_quantile(product_limit(table_of(range(1, 31), "d" * 13 + "+" * 17), DIED))
    assert not median.reached
    value, lower, upper = in_days(median)
    assert value is None
    assert upper is None
    # The first day on which the lower log-log limit is at or below one half.
    curve = product_limit(table_of(range(1, 31), "d" * 13 + "+" * 17), DIED)
    assert lower == curve.time[np.argmax(curve.lower <= 0.5)] == 10


def test_limits_do_not_depend_on_the_scale_of_the_curve(table_of):
    """Brookmeyer-Crowley limits are on the log-log scale even when the curve is not."""
    table = table_of(range(1, 31), "d" * 20 + "+" * 10)
    limits = {
        str(in_days(time_quantile(product_limit(table, DIED, interval=i))))
        for i in ("log-log", "log", "plain")
    }
    assert len(limits) == 1


@given(st.lists(st.integers(0, 30), min_size=1, max_size=40), st.floats(0.01, 0.99))
@settings(deadline=None)
def test_order(exits, share):
    """Lower limit <= quantile <= upper limit, where given."""
    exit = np.array(exits)
    curve = product_limit(count_risk(np.zeros_like(exit), exit, exit % 2), DIED)
    found = time_quantile(curve, share)
    assert not found.estimate.lower > found.estimate.value
    assert not found.estimate.value > found.estimate.upper
    assert found.reached == (not math.isnan(found.estimate.value))


def test_no_median_for_a_curve_that_started_again(table_of):
    """Its stretches speak of different patients."""
    curve = product_limit(table_of([3, 20, 30], "ddd", entries=[0, 10, 10]), DIED)
    assert not time_quantile(curve).reached


@pytest.mark.parametrize("share", [0, 1, 50])
def test_shares_that_make_no_sense_are_refused(table_of, share):
    """A share is between 0 and 1."""
    with pytest.raises(Refusal) as refused:
        time_quantile(product_limit(table_of([1, 2], "d+"), DIED), share)
    assert refused.value.code == "out_of_range"


def test_follow_up_by_hand(table_of):
    """Censored on days 2 and 4 of 1d 2+ 3d 4+: 2/3 remain after day 2, none after day 4."""
    curve = follow_up_curve(table_of([1, 2, 3, 4], "d+d+"), DIED)
    assert curve.survival == pytest.approx([1, 1, 2 / 3, 2 / 3, 0])
    assert in_days(follow_up_median(table_of([1, 2, 3, 4], "d+d+"), DIED))[0] == 4


def test_follow_up_is_not_reached_when_all_died(table_of):
    """Nobody shows how long they would have been followed."""
    assert not follow_up_median(table_of([1, 2, 3], "ddd"), DIED).reached


@given(st.lists(st.tuples(st.integers(0, 12), st.integers(0, len(MEANINGS) - 1)), min_size=1, max_size=40))
@settings(deadline=None)
def test_survival_times_follow_up_is_the_share_under_observation(rows):
    """S(t) G(t) = share whose observation goes on after t, ties included."""
    exit, outcome = (np.array(column) for column in zip(*rows, strict=True))
    table = count_risk(np.zeros_like(exit), exit, outcome)
    interest = ("died_of_disease", "recovered")
    product = product_limit(table, interest).survival * follow_up_curve(table, interest).survival
    share = [1.0] + [(exit > day).mean() for day in table.time]
    assert product == pytest.approx(share, abs=1e-12)
