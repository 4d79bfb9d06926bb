"""Amounts by phase of care, money, and lines that are passed."""

from __future__ import annotations

import math

import numpy as np
import pytest

from vitalroll.caseload.capacity import beds_in_use, busy_day, check_beds, passing
from vitalroll.caseload.courses import Course
from vitalroll.caseload.resources import Item, cost_by_year, present_value
from vitalroll.errors import Refusal
from vitalroll.outcomes.competing import WAYS_OF_LEAVING


def _course() -> Course:
    """One year: 100 under care rising by 2 a month, 30 to 42 in their first year; 24 lost, 6 died."""
    leaving = np.zeros((1, len(WAYS_OF_LEAVING)))
    leaving[0, WAYS_OF_LEAVING.index("lost")] = 24
    leaving[0, WAYS_OF_LEAVING.index("died_of_disease")] = 4
    leaving[0, WAYS_OF_LEAVING.index("died_cause_unknown")] = 2
    return Course(100 + 2.0 * np.arange(13), 30 + np.arange(13.0), np.full(12, 4.5), leaving)


def test_each_phase_takes_its_amount():
    course = _course()
    # First month: 30.5 patients in their first year, 101 - 30.5 beyond it, 4.5 newcomers.
    assert Item("", at_start=2).monthly(course)[0] == pytest.approx(9)
    assert Item("", first_year=3).monthly(course)[0] == pytest.approx(3 * 30.5)
    assert Item("", later=0.5).monthly(course)[0] == pytest.approx(0.5 * 70.5)
    assert Item("", per_event=10, event="lost").monthly(course).tolist() == pytest.approx([20] * 12)
    assert Item("", per_event=1).monthly(course).sum() == pytest.approx(6)
    whole = Item("", at_start=2, first_year=3, later=0.5, per_event=10, event="lost").monthly(course)
    assert whole[0] == pytest.approx(9 + 91.5 + 35.25 + 20)


def test_amounts_of_drawn_courses_are_those_of_each_draw():
    course = _course()
    pair = Course(*(np.stack((value, 2 * value)) for value in vars(course).values()))
    item = Item("", at_start=2, first_year=3, later=0.5, per_event=10, event="lost", unit_cost=7)
    one, two = item.monthly(pair)
    np.testing.assert_allclose(one, item.monthly(course))
    np.testing.assert_allclose(two, 2 * one)
    np.testing.assert_allclose(cost_by_year([item, item], pair)[:, 0], [14 * one.sum(), 28 * one.sum()])


def test_a_unit_cost_grows_from_the_second_year_on():
    item = Item("", unit_cost=10, cost_growth=5)
    assert item.yearly_cost(np.ones(36)).tolist() == pytest.approx([120, 126, 132.3])


def test_the_present_value_of_a_published_example():
    # Drummond et al. (2005), 3rd ed., ch. 4: two programmes over three years at 5 %, costs at the
    # end of each year, 26.79 and 26.81 (from memory; recomputed by hand).
    assert present_value(np.array([5.0, 10.0, 15.0]), 5) == pytest.approx(26.79, abs=0.005)
    assert present_value(np.array([15.0, 10.0, 4.0]), 5) == pytest.approx(26.81, abs=0.005)
    assert present_value(np.array([[5.0, 10.0, 15.0]] * 2), 0).tolist() == [30, 30]
    with pytest.raises(Refusal, match="out_of_range"):
        present_value(np.ones(2), -1)


def test_a_line_is_passed_once_and_stays_passed():
    drawn = np.array([[1.0, 5, 1, 1], [1, 1, 5, 5], [1, 1, 1, 5], [1, 1, 1, 1]])
    found = passing(np.array([1.0, 2, 4, 3]), drawn, 3)
    assert found.passed_in.tolist() == [0, 0.25, 0.25, 0.5]
    assert found.passed_by.tolist() == [0, 0.25, 0.5, 0.75]
    assert (found.expected_month, found.likely_month, found.unlikely_month) == (3, 3, 2)
    never = passing(np.ones(4), drawn, 9)
    assert (never.expected_month, never.likely_month, never.unlikely_month) == (None, None, None)


def test_a_need_just_at_the_line_does_not_pass_it():
    assert passing(np.full(2, 3.0), np.full((5, 2), 3.0), 3).expected_month is None


def test_beds_by_littles_law():
    # 60 admissions a month of 7 days each: 420 bed-days over 30.4375 days.
    assert beds_in_use(np.array(420.0)) == pytest.approx(420 / 30.4375)
    # Poisson 10: P(X <= 15) = 0.951, P(X <= 14) = 0.917 (any printed table).
    assert busy_day(np.array([0.0, 10.0])).tolist() == [0, 15]


def test_beds_that_can_never_keep_up_are_refused():
    assert check_beds(6, 8, "lines.0.limit") == 0.75
    for mean in (8, 9.5):
        with pytest.raises(Refusal) as refused:
            check_beds(mean, 8, "lines.0.limit")
        assert (refused.value.code, refused.value.field) == ("utilisation_at_or_above_one", "lines.0.limit")


@pytest.mark.parametrize("wrong", [-1.0, math.inf, math.nan])
@pytest.mark.parametrize(
    "field", ["at_start", "first_year", "later", "per_event", "unit_cost", "cost_growth"]
)
def test_an_impossible_amount_is_refused_by_its_field(field, wrong):
    if (field, wrong) == ("cost_growth", -1.0):
        assert Item("", cost_growth=wrong).cost_growth == -1  # costs may fall
        return
    with pytest.raises(Refusal) as refused:
        Item("", **{field: wrong})
    assert refused.value.field == field
