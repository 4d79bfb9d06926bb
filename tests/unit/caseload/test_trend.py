"""Newcomers that grow, damped; registers that miss some; rules beyond what was seen."""

from __future__ import annotations

import math
from dataclasses import replace

import numpy as np
import pytest
from caseload_cases import day, known_hazards

from vitalroll.caseload.courses import redraw
from vitalroll.caseload.inflow import Inflow, YearCount, inflow_typed
from vitalroll.caseload.projection import project
from vitalroll.caseload.trend import Trend, inflow_with_trend
from vitalroll.caseload.uncertainty import drawn_arrivals
from vitalroll.errors import Refusal
from vitalroll.numbers import NOT_GIVEN

CLOSING = day(2020, 12, 31)


def _history(*counts: int) -> Inflow:
    years = tuple(YearCount(2021 - len(counts) + i, count, True) for i, count in enumerate(counts))
    return Inflow(years, NOT_GIVEN, math.nan, "poisson", len(counts), float(len(counts)))


def test_exact_growth_is_carried_on():
    doubling = _history(25, 50, 100, 200)
    found = inflow_with_trend(doubling, CLOSING, damping=1)
    assert found.per_year_ahead(3).tolist() == pytest.approx([400, 800, 1600])
    # Damped by half: 200 x 2^(1/2), 2^(1/2 + 1/4), ...
    damped = inflow_with_trend(doubling, CLOSING, damping=0.5)
    assert damped.per_year_ahead(3).tolist() == pytest.approx([200 * 2**0.5, 200 * 2**0.75, 200 * 2**0.875])
    # Stopped at once: the level of the last year.
    assert inflow_with_trend(doubling, CLOSING, damping=0).per_year_ahead(2).tolist() == pytest.approx(
        [200, 200]
    )
    assert damped.cautions[-1].parameters == {"percent_per_year": pytest.approx(100), "damping": 0.5}


def test_a_closing_within_the_year_is_that_much_farther_from_the_last_whole_year():
    found = inflow_with_trend(_history(25, 50, 100, 200), CLOSING + 182, damping=1)
    assert found.per_year_ahead(1)[0] == pytest.approx(200 * 2 ** (1 + 182 / 365.25))


def test_drawn_trends_are_centred_on_what_is_expected_and_as_uncertain_as_the_fit():
    found = inflow_with_trend(_history(80, 95, 90, 110, 105, 125), CLOSING)
    assert found.per_year.lower < found.per_year.value < found.per_year.upper
    drawn = 12 * drawn_arrivals(replace(found, dispersion=1.0), 20_000, 4, np.random.default_rng(3))
    spread = drawn.std(axis=0)
    np.testing.assert_allclose(
        drawn.mean(axis=0), found.per_year_ahead(4), atol=4 * spread.max() / math.sqrt(20_000)
    )
    np.testing.assert_allclose(np.log(drawn).var(axis=0), found.trend.variances(4), rtol=0.05)
    assert np.all(np.diff(spread / drawn.mean(axis=0)) > 0)  # the farther, the less sure


def test_without_damping_the_distance_is_the_years():
    trend = Trend(0.0, 0.1, np.eye(2), 1.0, 0.5)
    assert trend.distance(3).tolist() == [1.5, 2.5, 3.5]
    # The damped sum goes to d/(1 - d).
    assert replace(trend, damping=0.8).distance(200)[-1] == pytest.approx(4)


@pytest.mark.parametrize(
    ("counts", "damping", "code"),
    [
        ((10, 20), 0.8, "trend_history_too_short"),
        ((0, 0, 0), 0.8, "trend_history_too_short"),
        ((10, 20, 30), 1.2, "out_of_range"),
        ((0, 0, 50), 0.8, "trend_not_found"),
    ],
)
def test_what_has_no_trend_is_refused(counts, damping, code):
    with pytest.raises(Refusal, match=code):
        inflow_with_trend(_history(*counts), CLOSING, damping=damping)


def test_patients_whom_the_register_misses_are_as_many_more_of_the_same():
    hazards, today = known_hazards({"lost": 0.4}, {"lost": 0.1}), np.arange(100) % 30
    whole = project(today, hazards, 0.0, years=2)
    more = project(today, hazards, 0.0, years=2, times_today=1.25)
    np.testing.assert_allclose(more.under_care, 1.25 * whole.under_care)
    drawn = redraw(today, hazards, inflow_typed(0.0), years=2, times_today=1.25, draws=2000)[0].under_care
    error = drawn[:, -1].std() / math.sqrt(2000)
    assert drawn[:, -1].mean() == pytest.approx(more.under_care[-1], abs=4 * error)


@pytest.mark.parametrize("tail", [0.0, 0.5, 1.0, 2.0])
def test_the_rule_beyond_what_was_seen_changes_only_those_beyond(tail):
    hazards = replace(known_hazards({"lost": 0.5}, {"lost": 0.2}), tail=tail)
    path = project(np.full(80, 30), hazards, 0.0, years=3)
    assert path.under_care[-1] == pytest.approx(80 * math.exp(-0.2 * tail * 3))
    np.testing.assert_allclose(path.beyond_support, path.under_care)
    # Nobody reaches it within the year.
    young = project(np.full(80, 3), hazards, 0.0, years=1)
    assert (
        young.under_care[-1]
        == project(np.full(80, 3), replace(hazards, tail=1.0), 0.0, years=1).under_care[-1]
    )
    course = redraw(np.full(80, 30), hazards, inflow_typed(5.0), years=3, vary=(), draws=2)[0]
    np.testing.assert_allclose(
        course.under_care[0], project(np.full(80, 30), hazards, 5.0, years=3).under_care
    )
