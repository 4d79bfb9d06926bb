"""Differences from the baseline, prices, ranking, break-even and one-way sensitivity."""

from __future__ import annotations

import math

import numpy as np
import pytest
from caseload_cases import LOST, known_hazards

from vitalroll.caseload.appraisal import appraise, best_share, break_even, price
from vitalroll.caseload.inflow import inflow_typed
from vitalroll.caseload.outlook import Measure, expected_course, prospect
from vitalroll.caseload.resources import Item
from vitalroll.caseload.scenario import Lever, Scenario
from vitalroll.caseload.sensitivity import cost_per_patient_year, one_way
from vitalroll.errors import Refusal

HAZARDS = known_hazards({"died_of_disease": 0.1, "lost": 0.3}, {"died_of_disease": 0.1, "lost": 0.1})
TODAY = np.arange(300) % 40
CARE = Item("care", first_year=1, later=1, unit_cost=10)
TRACING = Scenario("tracing", (Lever("fewer_lost", 50, cost_per_year=1000),))


def _appraised(scenario: Scenario, discount: float = 0.0, items=(CARE,)):
    found = prospect(TODAY, HAZARDS, inflow_typed(60.0), years=2, scenarios=[scenario], draws=400)
    return found, appraise(found.baseline, found.scenarios[0], scenario, items, discount=discount)


def test_differences_are_the_scenario_less_the_baseline():
    found, told = _appraised(TRACING)
    before, after = found.baseline, found.scenarios[0]
    assert told.under_care.expected[0] == pytest.approx(
        after.expected.under_care[-1] - before.expected.under_care[-1]
    )
    assert told.lost.expected[0] == pytest.approx(
        after.expected.leaving[:, LOST].sum() - before.expected.leaving[:, LOST].sum()
    )
    # All stay under care or die who are no longer lost; nobody else comes.
    gone = -told.lost.expected[0] - told.deaths.expected[0]
    assert told.under_care.expected[0] == pytest.approx(gone)
    assert told.newcomers.expected[0] == 0
    # A month of care costs 10.
    assert told.care.expected[0] == pytest.approx(120 * told.patient_years.expected[0])
    assert told.programme.expected[0] == pytest.approx(2000)
    np.testing.assert_allclose(told.cost.drawn, told.care.drawn + 2000)


def test_money_is_discounted_from_the_end_of_each_year():
    told = _appraised(TRACING, discount=10, items=())[1]
    assert told.cost.expected[0] == pytest.approx(1000 / 1.1 + 1000 / 1.21)


def test_a_price_is_money_over_gain():
    told = _appraised(TRACING)[1]
    found = price(told.cost, told.patient_years)
    assert found.value == pytest.approx(told.cost.expected[0] / told.patient_years.expected[0])
    assert found.gained == 1
    low, high = found.band.p95
    assert low < found.value < high


def test_where_nothing_is_gained_there_is_no_price():
    cost = Measure(np.array([10.0]), np.full((100, 1), 10.0))
    worse = price(cost, Measure(np.array([-1.0]), np.full((100, 1), -1.0)))
    assert (worse.value, worse.band, worse.gained) == (None, None, 0)
    # Gained in 90 draws of 100 only: a price, but no interval.
    gains = np.r_[np.full(90, 2.0), np.full(10, -1.0)][:, np.newaxis]
    unsure = price(cost, Measure(np.array([1.7]), gains))
    assert unsure.value == pytest.approx(10 / 1.7)
    assert (unsure.band, unsure.gained) == (None, 0.9)


def test_the_best_for_the_same_money():
    # Draw 1: 1 for 10 against 3 for 20; draw 2: 2 for 10 against 3 for 20; draw 3: the second loses.
    gains = np.array([[1.0, 2.0, 1.0], [3.0, 3.0, -1.0]])
    costs = np.array([[10.0, 10.0, 10.0], [20.0, 20.0, 20.0]])
    assert best_share(gains, costs, 100).tolist() == pytest.approx([2 / 3, 1 / 3])
    # Who gains and saves money is best at any budget; equals share.
    assert best_share(np.ones((2, 1)), np.array([[-5.0], [1.0]]), 1).tolist() == [1, 0]
    assert best_share(np.ones((2, 1)), np.ones((2, 1)), 1).tolist() == [0.5, 0.5]


def test_break_even_is_where_the_target_is_met():
    def lost(lever: Lever) -> float:
        course = expected_course(TODAY, HAZARDS, inflow_typed(60.0), years=2, scenario=Scenario("", (lever,)))
        return float(course.leaving[:, LOST].sum())

    percent, at_none, at_most = break_even(Lever("fewer_lost", 0), 40.0, lost, most=100)
    assert at_most == pytest.approx(0, abs=1e-9)
    assert at_none > 40
    # Halving ends within 0.001 per cent: losses move by less than 0.001 patients.
    assert lost(Lever("fewer_lost", percent)) == pytest.approx(40, abs=2e-3)
    assert break_even(Lever("fewer_lost", 0), at_none + 1, lost, most=100)[0] is None


def test_break_even_by_hand_when_the_caseload_rises_with_the_percentage():
    assert break_even(Lever("fewer_lost", 0), 25.0, lambda lever: lever.percent**2, most=100)[
        0
    ] == pytest.approx(5, abs=1e-3)
    with pytest.raises(Refusal, match="lever_makes_no_difference"):
        break_even(Lever("fewer_lost", 0), 1.0, lambda _: 7.0, most=100)


def test_one_assumption_at_a_time():
    asked = {"years": 2, "discount": 3.0}
    value, swings = one_way(TODAY, HAZARDS, inflow_typed(60.0), TRACING, [CARE], **asked)
    found = {swing.what: swing for swing in swings}
    # A typed inflow is certain; nobody ever completes here.
    assert set(found) == {"deaths", "lost", "effect", "unit_costs", "programme", "discount"}
    # Cost per patient-year = programme/gain + care: 20 % of each part.
    gain_only = cost_per_patient_year(TODAY, HAZARDS, inflow_typed(60.0), TRACING, [], **asked)
    assert found["programme"].at_high - value == pytest.approx(0.2 * gain_only)
    assert value - found["unit_costs"].at_low == pytest.approx(0.2 * (value - gain_only))
    assert found["effect"].at_low > value > found["effect"].at_high
    widths = [abs(swing.at_high - swing.at_low) for swing in swings]
    assert widths == sorted(widths, reverse=True)
    # Hazards all but certain: no swing to speak of.
    assert found["deaths"].at_low == pytest.approx(value, rel=1e-3)


def test_without_a_gain_there_is_no_cost_for_it():
    fewer = Scenario("", (Lever("fewer_newcomers", 50),))
    value, _ = one_way(TODAY, HAZARDS, inflow_typed(60.0), fewer, [CARE], years=2, discount=3.0)
    assert math.isnan(value)
