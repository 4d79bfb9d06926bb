"""Newcomers by calendar year and their mean."""

from __future__ import annotations

import math

import numpy as np
import pytest
from caseload_cases import cohort, day

from vitalroll.caseload.inflow import inflow_from_history, inflow_typed, mean_of_counts
from vitalroll.errors import Refusal
from vitalroll.outcomes.person_time import poisson_limits


def _register(counts: dict[int, int], closing: int, first_day: int | None = None):
    """Spread each year's newcomers evenly over it; the first may begin at ``first_day``."""
    rows = []
    for year, count in counts.items():
        begin = first_day if first_day and year == min(counts) else day(year)
        end = min(day(year + 1), closing)
        rows += [(begin + (end - begin) * i // count, 0, 0, "under_care") for i in range(count)]
    return cohort(rows, closing)


def _codes(found) -> dict[str, dict]:
    return {caution.code: caution.parameters for caution in found.cautions}


def test_partial_first_and_last_years_are_shown_but_left_out_of_the_mean():
    # 30 newcomers from 1 July on: were they spread over the year, all would come that late with
    # probability (184/365)^30, far below 0.05. The closing date cuts 2021.
    register = _register({2018: 30, 2019: 52, 2020: 48, 2021: 20}, day(2021, 6, 30), day(2018, 7, 1))
    found = inflow_from_history(register)
    assert [(year.year, year.count, year.whole) for year in found.years] == [
        (2018, 30, False),
        (2019, 52, True),
        (2020, 48, True),
        (2021, 20, False),
    ]
    assert found.per_year.value == 50
    assert found.whole_years == 2
    assert found.model == "poisson"
    # chi-squared (2^2 + 2^2)/50 on one degree of freedom
    assert found.dispersion == pytest.approx(8 / 50)


def test_a_first_year_that_begins_early_is_whole():
    # 4 newcomers from 20 January (day 19 of 365, counted from 0): (346/365)^4 = 0.81
    register = _register({2019: 4, 2020: 5}, day(2020, 12, 31), day(2019, 1, 20))
    assert [year.whole for year in inflow_from_history(register).years] == [True, True]


def test_the_last_year_is_whole_only_to_its_last_day():
    counts = {2019: 40, 2020: 40}
    assert inflow_from_history(_register(counts, day(2020, 12, 31))).whole_years == 2
    assert inflow_from_history(_register(counts, day(2020, 12, 30))).whole_years == 1


def test_ten_newcomers_in_one_year_have_garwoods_limits():
    # Garwood (1936): 4.80 to 18.39, from memory; tests/reference confirms them with SciPy.
    mean = mean_of_counts(np.array([10]))
    assert (round(mean.lower, 2), round(mean.upper, 2)) == (4.80, 18.39)


def test_overdispersed_years_widen_the_limits_by_their_dispersion():
    register = _register({2018: 10, 2019: 30, 2020: 20}, day(2020, 12, 31))
    found = inflow_from_history(register)
    # mean 20; chi-squared (100 + 100 + 0)/20 = 10 on 2 degrees of freedom
    assert found.dispersion == pytest.approx(5)
    assert found.model == "negative_binomial"
    assert found.spread == found.dispersion
    lower, upper = poisson_limits(12)  # 60 newcomers count as 60/5
    assert found.per_year.lower == pytest.approx(5 * lower / 3)
    assert found.per_year.upper == pytest.approx(5 * upper / 3)
    assert found.per_year.standard_error == pytest.approx(math.sqrt(60 * 5) / 3)
    assert _codes(found)["newcomers_overdispersed"] == {"dispersion": found.dispersion}


def test_a_steady_rise_is_said():
    found = inflow_from_history(_register({2017: 20, 2018: 30, 2019: 40, 2020: 50}, day(2020, 12, 31)))
    # slope (-1.5*20 - .5*30 + .5*40 + 1.5*50)/(35*5) = 50/175
    assert _codes(found)["newcomers_trend"]["percent_per_year"] == pytest.approx(100 * 50 / 175)


def test_a_year_that_nobody_came_and_a_silent_end_are_said():
    register = _register({2018: 40, 2020: 40}, day(2021, 12, 31))
    codes = _codes(inflow_from_history(register))
    assert codes["years_without_newcomers"] == {"count": 2, "year": 2019}
    assert codes["no_newcomers_lately"]["days"] > 365


def test_old_cases_entered_at_the_opening_are_not_newcomers():
    rows = [(day(2010) + i, day(2019) - day(2010) - i, day(2019) - day(2010), "under_care") for i in range(5)]
    rows += [(day(2019, 1, 5) + 20 * i, 0, 10, "under_care") for i in range(36)]
    found = inflow_from_history(cohort(rows, day(2020, 12, 31)))
    assert sum(year.count for year in found.years) == 36
    assert _codes(found)["old_cases_not_newcomers"] == {"count": 5}


def test_late_referrals_as_common_in_the_first_year_as_later_are_newcomers():
    # Every fifth patient comes 200 days after the start, in the first year as in the second.
    rows = [
        (day(2019, 1, 5) + 10 * i - 200 * (i % 5 == 0), 200 * (i % 5 == 0), 300, "lost") for i in range(72)
    ]
    found = inflow_from_history(cohort(rows, day(2020, 12, 31)))
    assert sum(year.count for year in found.years) == 72
    assert "old_cases_not_newcomers" not in _codes(found)


def test_who_started_before_the_opening_but_came_over_a_year_after_it_is_a_newcomer():
    rows = [(day(2019, 1, 5) + 20 * i, 0, 10, "under_care") for i in range(36)]
    rows += [(day(2018, 12, 1), day(2020, 2, 1) - day(2018, 12, 1), 500, "under_care")]
    found = inflow_from_history(cohort(rows, day(2020, 12, 31)))
    assert sum(year.count for year in found.years) == 37
    assert "old_cases_not_newcomers" not in _codes(found)


def test_newcomers_count_when_first_seen_with_the_time_they_bring_along():
    rows = [(day(2019, 1, 2) + 10 * i, 0, 500, "under_care") for i in range(36)]
    rows += [(day(2019, 3, 1), 400, 500, "under_care")] * 4  # first seen in April 2020
    found = inflow_from_history(cohort(rows, day(2020, 12, 31)))
    assert [year.count for year in found.years] == [36, 4]
    assert sorted(found.days_at_arrival) == [0] * 36 + [400] * 4


def test_one_whole_year_gives_no_dispersion_and_says_that_it_is_too_short():
    found = inflow_from_history(_register({2019: 40, 2020: 10}, day(2020, 5, 31)))
    assert found.per_year.value == 40
    assert math.isnan(found.dispersion)
    assert _codes(found)["history_too_short"] == {"whole_years": 1, "needed": 2}


def test_no_whole_year_gives_no_mean():
    found = inflow_from_history(_register({2020: 10}, day(2020, 5, 31)))
    assert math.isnan(found.per_year.value)


def test_a_start_after_the_closing_date_is_refused_with_its_line():
    with pytest.raises(Refusal) as refused:
        inflow_from_history(cohort([(day(2020), 0, 0, "lost"), (day(2021), 0, 0, "lost")], day(2020, 6)))
    assert (refused.value.code, refused.value.line) == ("start_after_closing", 3)


def test_no_patients_are_refused():
    register = cohort([(day(2020), 0, 0, "lost")], day(2021))
    with pytest.raises(Refusal, match="no_patients"):
        inflow_from_history(register.having(np.array([False])))


def test_a_typed_figure_is_certain_and_never_negative():
    assert inflow_typed(80.0).per_year.lower == inflow_typed(80.0).per_year.upper == 80
    for wrong in (-1.0, math.inf, math.nan):
        with pytest.raises(Refusal, match="out_of_range"):
            inflow_typed(wrong)
