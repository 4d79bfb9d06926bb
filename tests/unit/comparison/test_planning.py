"""Sizes of the next audit: published and hand-worked values, R's, and identities."""

from __future__ import annotations

import math

import numpy as np
import pytest

from vitalroll.comparison.planning import accuracy_size, proportions_size, survey_size, survival_size
from vitalroll.errors import Refusal

PLAN = {"accrual_years": 3, "follow_up_years": 2}


def test_a_hazard_ratio_of_two_needs_66_outcomes() -> None:
    """Schoenfeld (1981): (1.95996 + 0.84162)^2 / [0.25 (ln 2)^2] = 65.35, worked by hand."""
    assert survival_size(2, 0.7, 5, **PLAN).events == 66
    assert survival_size(0.5, 0.7, 5, **PLAN).events == 66


def test_share_with_an_outcome_is_the_average_over_the_time_of_coming() -> None:
    size = survival_size(2, 0.7, 5, **PLAN, share_exposed=0.4)
    coming = (np.arange(100_000) + 0.5) / 100_000 * 3
    hazard = -math.log(0.7) / 5
    slow = np.mean(
        0.6 * (1 - np.exp(-hazard * (5 - coming))) + 0.4 * (1 - np.exp(-2 * hazard * (5 - coming)))
    )
    assert size.share_with_event == pytest.approx(slow, abs=1e-9)
    at_once = survival_size(2, 0.7, 5, accrual_years=0, follow_up_years=5)
    assert at_once.share_with_event == pytest.approx((0.3 + 1 - 0.49) / 2, abs=1e-12)


def test_the_patients_that_are_needed_have_the_power_that_was_asked_for() -> None:
    size = survival_size(1.7, 0.6, 4, **PLAN, lost=0.1, power=0.9)
    again = survival_size(1.7, 0.6, 4, **PLAN, lost=0.1, available=size.patients)
    assert again.power_of_available == pytest.approx(0.9, abs=0.004)
    assert again.power_of_available >= 0.9


def test_two_proportions_as_r_has_them() -> None:
    """R 4.2.2: power.prop.test(p1=.6, p2=.7, power=.8)$n = 355.94; (p1=.1, p2=.25, power=.9) 132.76.

    And its power of 150 in each group for .1 against .25: 0.931641808879.
    """
    assert proportions_size(0.6, 0.7).exposed == 356
    assert proportions_size(0.1, 0.25, power=0.9).exposed == 133
    assert proportions_size(0.1, 0.25, available=150).power_of_available == pytest.approx(
        0.931641808879, abs=1e-11
    )


def test_more_to_compare_with_needs_fewer_in_question() -> None:
    one, three = proportions_size(0.2, 0.35), proportions_size(0.2, 0.35, reference_for_each=3)
    assert three.exposed < one.exposed
    assert three.reference == 3 * three.exposed


def test_surveys_by_hand() -> None:
    """1.95996^2 0.25 / 0.05^2 = 384.15; of 2,000 people 384.15 / (1 + 383.15 / 2000) = 322.4."""
    assert survey_size(0.5, 0.05).people == 385
    assert survey_size(0.5, 0.05, population=2000).people == 323
    assert survey_size(0.5, 0.05, design_effect=2).people == 769
    assert survey_size(0.5, 0.05, population=100, response=0.5).people == 100
    assert [caution.code for caution in survey_size(0.04, 0.05).cautions] == ["margin_wider_than_proportion"]


def test_accuracy_by_hand() -> None:
    """Buderer (1996): 1.95996^2 0.9 0.1 / 0.05^2 = 138.3 with the disease, a fifth of those tested."""
    size = accuracy_size(0.9, 0.85, 0.05, 0.2)
    assert size.with_disease == 139
    assert size.for_sensitivity == 692
    assert size.without_disease == 196
    assert size.for_specificity == 245
    assert size.people == 692


@pytest.mark.parametrize(
    ("plan", "code"),
    [
        (lambda: survival_size(1, 0.7, 5, **PLAN), "nothing_to_notice"),
        (lambda: survival_size(2, 1.0, 5, **PLAN), "not_a_share"),
        (lambda: survival_size(2, 0.7, 5, accrual_years=0, follow_up_years=0), "no_follow_up_planned"),
        (lambda: proportions_size(0.3, 0.3), "nothing_to_notice"),
        (lambda: survey_size(0, 0.05), "not_a_share"),
        (lambda: accuracy_size(0.9, 1, 0.05, 0.2), "not_a_share"),
    ],
)
def test_what_makes_no_plan_is_refused(plan, code: str) -> None:
    with pytest.raises(Refusal) as refused:
        plan()
    assert refused.value.code == code
