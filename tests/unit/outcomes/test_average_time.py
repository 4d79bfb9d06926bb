"""Restricted mean and conditional survival: by hand, identities, and R's published output."""

from __future__ import annotations

import numpy as np
import pytest

from vitalroll.errors import Refusal
from vitalroll.numbers import DAYS_PER_YEAR
from vitalroll.outcomes.conditional import conditional_survival
from vitalroll.outcomes.product_limit import SurvivalCurve, product_limit
from vitalroll.outcomes.restricted_mean import mean_difference, restricted_mean
from vitalroll.outcomes.risk_table import count_risk

DIED = ("died_of_disease",)
# The AML data of Miller (1981), weeks; R's survival package ships them as `aml`.
MAINTAINED = [
    (9, 1),
    (13, 1),
    (13, 0),
    (18, 1),
    (23, 1),
    (28, 0),
    (31, 1),
    (34, 1),
    (45, 0),
    (48, 1),
    (161, 0),
]
NOT_MAINTAINED = [
    (5, 1), (5, 1), (8, 1), (8, 1), (12, 1), (16, 0), (23, 1), (27, 1), (30, 1), (33, 1), (43, 1), (45, 1),
]  # fmt: skip


def curve(pairs, entry=None) -> SurvivalCurve:
    exit, event = (np.array(each) for each in zip(*pairs, strict=True))
    entry = np.zeros(len(exit), dtype=np.int64) if entry is None else np.array(entry)
    return product_limit(count_risk(entry, exit, event), DIED)


def test_restricted_mean_as_r_prints_it() -> None:
    """R 4.2.2, survival 3.5-3: summary(survfit(Surv(time, status) ~ x, data = aml), rmean = 40)$table."""
    for pairs, mean, error in (
        (MAINTAINED, 28.8977272727273, 3.46757767889160), (NOT_MAINTAINED, 21.9305555555556, 3.83564116318459),
    ):  # fmt: skip
        found = restricted_mean(curve(pairs), 40 / DAYS_PER_YEAR)
        assert found.mean.value * DAYS_PER_YEAR == pytest.approx(mean, abs=1e-11)
        assert found.mean.standard_error * DAYS_PER_YEAR == pytest.approx(error, abs=1e-11)


def test_without_censoring_it_is_the_mean_of_the_shorter_of_time_and_horizon() -> None:
    days = np.array([3, 8, 8, 15, 40, 60])
    found = restricted_mean(curve([(day, 1) for day in days]), 30 / DAYS_PER_YEAR)
    shorter = np.minimum(days, 30)
    assert found.mean.value * DAYS_PER_YEAR == pytest.approx(shorter.mean())
    # Greenwood's sum is then the binomial variance: the spread over n, not over n - 1.
    assert found.mean.standard_error * DAYS_PER_YEAR == pytest.approx(shorter.std() / np.sqrt(6))
    assert found.lost.value == pytest.approx(found.horizon_years - found.mean.value)


def test_differences_turn_their_sign_with_the_groups() -> None:
    one, other = (restricted_mean(curve(pairs), 40 / DAYS_PER_YEAR) for pairs in (MAINTAINED, NOT_MAINTAINED))
    difference, turned = mean_difference(one, other), mean_difference(other, one)
    assert difference.value == pytest.approx(-turned.value)
    assert difference.lower == pytest.approx(-turned.upper)


def test_a_horizon_beyond_the_curve_is_refused() -> None:
    with pytest.raises(Refusal) as refused:
        restricted_mean(curve([(10, 1), (20, 0)]), 21 / DAYS_PER_YEAR)
    assert refused.value.code == "horizon_beyond_follow_up"
    with pytest.raises(Refusal) as refused:
        restricted_mean(curve([(10, 1), (20, 0)], entry=[5, 5]), 8 / DAYS_PER_YEAR)
    assert refused.value.code == "curve_restarts"


def test_conditional_survival_multiplies_to_survival() -> None:
    whole = curve(MAINTAINED * 3)
    for s, u in ((10, 10), (15, 20), (0, 30)):
        found = conditional_survival(whole, s / DAYS_PER_YEAR, u / DAYS_PER_YEAR)
        before, after = whole.at(s).value, whole.at(s + u).value
        assert found.estimate.value == pytest.approx(after / before)
        assert found.estimate.lower < found.estimate.value < found.estimate.upper
    everyone = conditional_survival(whole, 0, 30 / DAYS_PER_YEAR)
    assert everyone.at_risk == 33
    assert (everyone.estimate.lower, everyone.estimate.upper) == pytest.approx(
        (whole.at(30).lower, whole.at(30).upper)
    )


def test_conditional_survival_is_survival_of_those_still_followed() -> None:
    """The same as starting again with those still followed, who enter late."""
    pairs = [pair for pair in MAINTAINED * 3 if pair[0] > 15]
    again = curve([(day - 15, event) for day, event in pairs])
    found = conditional_survival(curve(MAINTAINED * 3), 15 / DAYS_PER_YEAR, 15 / DAYS_PER_YEAR)
    assert found.at_risk == len(pairs)
    assert found.estimate.value == pytest.approx(again.at(15).value)
    assert found.estimate.standard_error == pytest.approx(again.at(15).standard_error)


def test_few_survivors_and_no_follow_up_give_a_reason() -> None:
    assert (
        conditional_survival(curve(MAINTAINED), 20 / DAYS_PER_YEAR, 5 / DAYS_PER_YEAR).code == "few_survivors"
    )
    assert conditional_survival(curve(MAINTAINED * 3), 20 / DAYS_PER_YEAR, 1).code == "beyond_follow_up"


def test_nobody_with_the_outcome_has_an_exact_lower_limit() -> None:
    found = conditional_survival(curve([(100, 0)] * 30), 10 / DAYS_PER_YEAR, 50 / DAYS_PER_YEAR)
    assert found.estimate.value == 1
    assert found.estimate.upper == 1
    assert found.estimate.lower == pytest.approx(0.025 ** (1 / 30))
