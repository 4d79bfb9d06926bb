"""Hazards of leaving by year since start."""

from __future__ import annotations

import math

import numpy as np
import pytest
from caseload_cases import DEATH, LOST, cohort, day
from hypothesis import given
from hypothesis import strategies as st

from vitalroll.caseload.retention import person_years_between, retention
from vitalroll.errors import Refusal
from vitalroll.numbers import DAYS_PER_YEAR
from vitalroll.outcomes.risk_table import risk_table

START, CLOSING = day(2010), day(2024)


def _retention(rows: list[tuple[int, int, str]]):
    return retention(risk_table(cohort([(START, *row) for row in rows], CLOSING)))


def test_person_time_and_exits_worked_by_hand():
    # Patient 1 dies on day 200; 2 is under care to day 700; 3 is seen from day 100 and lost on day 500.
    rows = [(0, 200, "died_of_disease"), (0, 700, "under_care"), (100, 500, "lost")]
    table = risk_table(cohort([(START, *row) for row in rows], CLOSING))
    year_1 = 200 + DAYS_PER_YEAR + (DAYS_PER_YEAR - 100)
    year_2 = (700 - DAYS_PER_YEAR) + (500 - DAYS_PER_YEAR)
    found = person_years_between(table, np.array([0.0, 1.0, 2.0]))
    np.testing.assert_allclose(found * DAYS_PER_YEAR, [year_1, year_2], rtol=1e-14)
    # Far too few for one stretch: used as one all the same, with a caution.
    thin = retention(table)
    assert thin.edges.tolist() == [0, 2]
    assert thin.exits[0, [DEATH, LOST]].tolist() == [1, 1]
    assert thin.hazards[0, DEATH] == pytest.approx(DAYS_PER_YEAR / 1300)
    assert thin.staying()[0] == pytest.approx(math.exp(-2 * 2 * DAYS_PER_YEAR / 1300))
    assert thin.at_risk.tolist() == [2]
    assert [caution.code for caution in thin.cautions] == ["retention_thin"]


def test_leaving_on_the_last_day_of_a_year_belongs_to_that_year():
    # Four years are exactly 1461 days.
    rows = [(0, 1461, "lost")] * 10 + [(0, 1462, "died_of_disease")] * 10 + [(0, 2000, "under_care")] * 60
    found = _retention(rows)
    fourth, fifth = 3, 4
    assert found.edges[fifth] == 4
    assert found.exits[fourth, LOST] == 10
    assert found.exits[fifth, DEATH] == 10
    assert found.at_risk[fifth] == 70


def test_leaving_on_the_first_day_counts_in_the_first_year():
    found = _retention([(0, 0, "lost")] * 3 + [(0, 365, "under_care")] * 60)
    assert found.exits[0, LOST] == 3
    assert found.at_risk[0] == 63
    assert found.person_years[0] == pytest.approx(60 * 365 / DAYS_PER_YEAR)


def test_thin_years_join_those_after_and_the_rest_is_the_tail():
    # 51 patients to 1 year (51 person-years), 26 of them on to 3 (26 + 26), 5 on to 5 (5 + 5).
    year = 365.25
    rows = [(0, math.ceil(year), "under_care")] * 25 + [(0, math.ceil(3 * year), "under_care")] * 21
    rows += [(0, math.ceil(5 * year), "lost")] * 5
    found = _retention(rows)
    assert found.edges.tolist() == [0, 1, 3]
    assert found.supported_years == 3
    # Up to three quarters of a day each fall into the next year, as days are whole.
    np.testing.assert_allclose(found.person_years, [51, 52], atol=0.1)
    assert found.beyond_exits == 5
    assert found.beyond_person_years == pytest.approx(10, abs=0.2)


def test_ten_exits_support_a_year_whatever_the_time():
    found = _retention([(0, 100, "lost")] * 10 + [(0, 200, "under_care")])
    assert found.edges.tolist() == [0, 1]
    assert found.cautions == ()


def test_a_stretch_without_exits_says_how_large_the_hazard_may_be():
    found = _retention([(0, 365, "under_care")] * 60)
    (caution,) = found.cautions
    assert caution.code == "no_exits_observed"
    # Garwood's upper limit for no events, 3.689 (from memory; -ln 0.025 exactly), over the time.
    assert caution.parameters["upper"] == pytest.approx(-math.log(0.025) / found.person_years[0])
    assert found.hazards.sum() == 0
    assert found.staying().tolist() == [1]


def test_nobody_observed_for_a_day_is_refused():
    with pytest.raises(Refusal, match="no_person_time"):
        _retention([(0, 0, "lost"), (0, 0, "under_care")])


@given(
    st.lists(
        st.tuples(
            st.integers(0, 3000), st.integers(0, 3000), st.sampled_from(["lost", "under_care", "stopped"])
        ),
        min_size=1,
        max_size=40,
    )
)
def test_person_time_is_exact_and_no_exit_is_dropped(rows):
    """Against adding up each patient's overlap with each year; delayed entry included."""
    rows = [(min(a, b), max(a, b), way) for a, b, way in rows]
    table = risk_table(cohort([(START, *row) for row in rows], CLOSING))
    edges = np.arange(10.0)
    entry, leaving = np.array([row[0] for row in rows]), np.array([row[1] for row in rows])
    slow = [
        np.sum(np.clip(leaving, a, b) - np.clip(entry, a, b)) / DAYS_PER_YEAR
        for a, b in zip(edges[:-1] * DAYS_PER_YEAR, edges[1:] * DAYS_PER_YEAR, strict=True)
    ]
    np.testing.assert_allclose(person_years_between(table, edges), slow, rtol=1e-12, atol=1e-9)
    if table.person_days:
        found = retention(table)
        assert found.exits.sum() + found.beyond_exits == table.left[:, 1:].sum()
        total = found.person_years.sum() + found.beyond_person_years
        assert total == pytest.approx(table.person_days / DAYS_PER_YEAR)
        assert np.all(found.person_years > 0)
        assert np.all(np.diff(found.edges) >= 1)
