"""Landmarks, whether groups are alike, and E-values: by hand, and against the trap each is there for."""

from __future__ import annotations

import numpy as np
import pytest
from comparison_cohorts import DIED, cohort

from vitalroll.comparison.alike import alike
from vitalroll.comparison.bias import e_value
from vitalroll.comparison.rank_tests import rank_test
from vitalroll.errors import Refusal
from vitalroll.numbers import Estimate
from vitalroll.outcomes.landmark import from_landmark
from vitalroll.outcomes.risk_table import risk_tables_by


def test_a_landmark_keeps_those_still_followed_and_counts_from_it() -> None:
    subject = cohort([3, 10, 10, 20], [1, 1, 0, 1], {"x": np.arange(4.0)}, np.array([0, 0, 4, 15]))
    rest = from_landmark(subject, 10)
    assert list(rest.exit) == [10]
    assert list(rest.entry) == [5]
    rest = from_landmark(subject, 5)
    assert list(rest.exit) == [5, 5, 15]
    assert list(rest.entry) == [0, 0, 10]
    assert list(rest.start - subject.start[1:]) == [5, 5, 5]
    with pytest.raises(Refusal) as refused:
        from_landmark(subject, 20)
    assert refused.value.code == "nobody_at_landmark"


def test_a_landmark_takes_immortal_time_away() -> None:
    """A treatment without any effect, begun at some later day by those still alive then.

    Counted from entry the treated seem to do better beyond doubt; counted from a landmark, in the groups known by
    then, they do not: the fixed seed gives a chi-squared far above 20 and one below 4.
    """
    random = np.random.default_rng(4)
    n = 1500
    died = random.exponential(900, n).astype(int) + 1
    begins = random.exponential(500, n).astype(int) + 1
    event, exit = died < 1500, np.minimum(died, 1500)
    ever = list(np.where(begins < exit, "treated", "untreated"))
    naive = rank_test([risk_tables_by(cohort(exit, event, {"group": ever}), "group")], DIED)
    by_then = list(np.where(begins <= 180, "treated", "untreated"))
    fair = rank_test(
        [risk_tables_by(from_landmark(cohort(exit, event, {"group": by_then}), 180), "group")], DIED
    )
    assert naive.chi_squared > 20
    assert fair.chi_squared < 4


def groups() -> tuple:
    subject = cohort(
        [10, 20, 30, 40, 50, 60], [1, 0, 1, 0, 1, 0],
        {"age": np.array([20.0, 30, 40, 30, 40, np.nan]), "zone": list("aabbbb"), "group": list("xxxyyy")},
    )  # fmt: skip
    return alike(subject, "group", "x", "y", DIED), subject


def test_characteristics_by_hand() -> None:
    found, _ = groups()
    age, zone_a, zone_b = found.characteristics
    assert age.n == (3, 2)
    assert (age.exposed, age.reference) == (30, 35)
    # Standard deviations 10 and 7.07, so the pooled one is the root of 75.
    assert age.standardised == pytest.approx(-5 / np.sqrt(75))
    assert zone_a.n == (2, 0)
    assert zone_a.exposed == pytest.approx(2 / 3)
    assert zone_a.standardised == pytest.approx((2 / 3) / np.sqrt((2 / 9) / 2))
    assert zone_b.standardised == pytest.approx(-zone_a.standardised)
    assert found.missing == {"age": (0, 1)}


def test_unlike_groups_are_named() -> None:
    found, subject = groups()
    codes = {caution.code: caution.parameters for caution in found.cautions}
    assert codes["groups_unlike"]["covariates"] == ["age", "zone"]
    with pytest.raises(Refusal) as refused:
        alike(subject, "group", "x", "x", DIED)
    assert refused.value.code == "same_group"
    with pytest.raises(Refusal) as refused:
        alike(subject, "group", "x", "z", DIED)
    assert refused.value.code == "unknown_level"


def test_swapping_the_groups_turns_the_signs() -> None:
    found, subject = groups()
    other = alike(subject, "group", "y", "x", DIED)
    assert [line.standardised for line in other.characteristics] == [
        -line.standardised for line in found.characteristics
    ]


def test_e_value_as_published() -> None:
    """VanderWeele & Ding (2017): a risk ratio of 3.9 (95 % limits 1.8 to 8.7) gives 7.26, and 3.0 for the limit."""
    found = e_value(Estimate(3.9, 1.8, 8.7), share_with_outcome=0.05)
    assert found.estimate == pytest.approx(7.263, abs=5e-4)
    assert found.limit == pytest.approx(3.0, abs=5e-4)
    assert not found.common


def test_e_value_is_the_same_for_a_ratio_turned_over_and_1_when_unclear() -> None:
    one, other = e_value(Estimate(2, 1.5, 2.7), 0.1), e_value(Estimate(1 / 2, 1 / 2.7, 1 / 1.5), 0.1)
    assert one.estimate == pytest.approx(other.estimate)
    assert one.limit == pytest.approx(other.limit)
    assert e_value(Estimate(2, 0.9, 4.4), 0.1).limit == 1


def test_a_hazard_ratio_of_a_common_outcome_is_brought_to_risks_first() -> None:
    """HR 2: (1 - 0.5^1.41421) / (1 - 0.5^0.70711) = 0.624786 / 0.387453 = 1.61255, worked by hand."""
    found = e_value(Estimate(2, 1.5, 2.7), 0.4)
    ratio = 0.624786 / 0.387453
    assert found.common
    assert found.estimate == pytest.approx(ratio + np.sqrt(ratio * (ratio - 1)), abs=1e-4)
