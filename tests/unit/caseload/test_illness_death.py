"""The illness-death equation by age: closed forms, identities and refusals."""

from __future__ import annotations

import math
from dataclasses import replace

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st

from vitalroll.caseload.illness_death import AgeGroup, district, step
from vitalroll.desk.door import Desk
from vitalroll.errors import Refusal

WHOLE = AgeGroup(0, 1000, 0.0, 0.01, 0.02, 0.02)


def test_without_excess_mortality_prevalence_is_one_less_survival_in_health():
    # dp/dt = (1 - p) i: 1 - p = exp(-i t).
    assert step(np.array(0.0), 0.03, 0.0, 10) == pytest.approx(1 - math.exp(-0.3))
    assert step(np.array(0.2), 0.03, 0.0, 10) == pytest.approx(1 - 0.8 * math.exp(-0.3))


def test_without_new_cases_the_ill_die_out():
    # Well and ill shrink with their own mortality: p/(1 - p) falls as exp(-e t).
    after = step(np.array(0.4), 0.0, 0.05, 7)
    assert after / (1 - after) == pytest.approx(0.4 / 0.6 * math.exp(-0.35))


def test_equal_rates_are_a_limit_not_a_division_by_zero():
    near = step(np.array(0.1), 0.04, 0.04 - 1e-9, 5)
    assert step(np.array(0.1), 0.04, 0.04, 5) == pytest.approx(float(near), rel=1e-7)


@given(st.floats(0, 1), st.floats(0, 1), st.floats(-0.5, 1), st.floats(0, 5), st.floats(0, 5))
def test_a_share_stays_a_share_and_steps_join(prevalence, incidence, excess, first, second):
    # A risk lower than nothing cannot be: excess is never below minus the mortality of the well.
    one = step(np.array(prevalence), incidence, excess, first + second)
    two = step(step(np.array(prevalence), incidence, excess, first), incidence, excess, second)
    assert -1e-9 <= one <= 1 + 1e-9
    assert float(one) == pytest.approx(float(two), rel=1e-6, abs=1e-9)


def test_a_steady_district_does_not_move():
    groups = [AgeGroup(0, 900, 0.0, 0.001, 0.005, 0.02), AgeGroup(40, 700, 0.0, 0.01, 0.01, 0.05)]
    steady = [group.steady_prevalence for group in district(groups, last_age=90, years=1).groups]
    # Starting from nobody ill: after a life's length the prevalence by age is the steady one.
    late = district(groups, last_age=90, years=50)
    assert late.ill[-1] < late.steady_ill
    assert late.distance == -1
    assert 0 < late.years_to_steady <= 90
    assert steady[0] < steady[1]
    long = district(groups, last_age=90, years=95)
    assert long.ill[-1] == pytest.approx(long.steady_ill, rel=1e-9)
    assert long.groups[1].prevalence[-1] == pytest.approx(steady[1], rel=1e-9)


def test_a_generation_born_well_by_hand():
    # No excess mortality, incidence 1 % at every age: in the middle of age a, 1 - exp(-0.01 (a + 1/2)).
    found = district([WHOLE], last_age=10, years=1)
    by_age = 1 - np.exp(-0.01 * (np.arange(10) + 0.5))
    assert found.groups[0].steady_prevalence == pytest.approx(by_age.mean())
    assert found.steady_ill == pytest.approx(1000 * by_age.mean())
    # From nobody ill: after a year those of age 0 half a year, all others a year.
    assert found.ill[1] == pytest.approx(100 * (1 - math.exp(-0.005)) + 900 * (1 - math.exp(-0.01)))


@pytest.mark.parametrize(
    ("groups", "last_age", "code", "field"),
    [
        ([], 90, "no_age_groups", "groups"),
        ([replace(WHOLE, incidence=1.2)], 90, "out_of_range", "groups.0.incidence"),
        (
            [WHOLE, replace(WHOLE, from_age=20, mortality_ill=-0.1)],
            90,
            "out_of_range",
            "groups.1.mortality_ill",
        ),
        ([WHOLE, WHOLE], 90, "ages_not_rising", "groups.1.from_age"),
        ([replace(WHOLE, from_age=0.5)], 90, "ages_not_whole", "groups"),
        ([replace(WHOLE, population=0)], 90, "nobody_in_district", "groups"),
        ([replace(WHOLE, population=-5)], 90, "out_of_range", "groups.0.population"),
    ],
)
def test_nonsense_is_refused_by_its_field(groups, last_age, code, field):
    with pytest.raises(Refusal) as refused:
        district(groups, last_age=last_age, years=2)
    assert (refused.value.code, refused.value.field) == (code, field)


def test_what_is_assumed_is_said():
    codes = [
        caution.code
        for caution in district([replace(WHOLE, mortality_ill=0.01)], last_age=90, years=1).cautions
    ]
    assert codes == ["ill_die_less", "far_from_steady_state", "migration_ignored"]


def test_the_task_through_the_desks_door():
    told = Desk().answer("counts.district", {"groups": [vars(WHOLE)], "last_age": 10, "years": 3})["answer"]
    found = district([WHOLE], last_age=10, years=3)
    assert [row["ill"] for row in told["path"]] == found.ill.tolist()
    assert told["groups"][0]["ill_then"] == pytest.approx(found.ill[-1])
    assert told["steady_ill"] == found.steady_ill
    refusal = Desk().answer("counts.district", {"groups": [vars(WHOLE) | {"prevalence": 2}]})["refusal"]
    assert (refusal["code"], refusal["field"]) == ("out_of_range", "groups.0.prevalence")
