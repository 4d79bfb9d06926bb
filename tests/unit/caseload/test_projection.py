"""The expected caseload, month by month."""

from __future__ import annotations

import math

import numpy as np
import pytest
from caseload_cases import DEATH, LOST, cohort, day, known_hazards, staying_times
from hypothesis import given
from hypothesis import strategies as st

from vitalroll.caseload.projection import (
    ageing,
    months_here_today,
    patient_years_by_year,
    project,
    yearly_sums,
)
from vitalroll.caseload.scenario import Lever, Scenario
from vitalroll.errors import Refusal
from vitalroll.outcomes.competing import WAYS_OF_LEAVING


def test_one_year_worked_by_hand():
    # 100 patients, no newcomers, deaths 0.1 and losses 0.2 per person-year: exp(-0.3) stay, and
    # of those who leave a third die.
    path = project(np.full(100, 5), known_hazards({"died_of_disease": 0.1, "lost": 0.2}), 0.0, years=1)
    assert path.under_care[-1] == pytest.approx(74.0818, abs=5e-5)
    leaving = path.leaving.sum(axis=0)
    assert leaving[DEATH] == pytest.approx(25.9182 / 3, abs=5e-5)
    assert leaving[LOST] == pytest.approx(25.9182 * 2 / 3, abs=5e-5)


def test_constant_hazard_and_inflow_approach_the_steady_state_exponentially():
    # dN/dt = I - aN: N = I/a + (N0 - I/a) exp(-at), exactly, at the end of every month.
    rate, newcomers, n = 0.23, 40.0, 500
    hazards = known_hazards({"lost": 0.1, "recovered": 0.13}, {"lost": 0.23})
    path = project(np.arange(n) % 60, hazards, newcomers, years=7)
    t = np.arange(7 * 12 + 1) / 12
    steady = newcomers / rate
    np.testing.assert_allclose(path.under_care, steady + (n - steady) * np.exp(-rate * t), rtol=1e-12)


def test_nobody_leaving_gives_the_balance():
    path = project(np.zeros(30, dtype=int), known_hazards({}), 24.0, years=3)
    np.testing.assert_allclose(path.under_care, 30 + 2 * np.arange(37), rtol=1e-13)
    assert path.leaving.sum() == 0
    # 30 rising by 24 a year, evenly: the mean caseload of each year.
    np.testing.assert_allclose(patient_years_by_year(path.under_care), [42, 66, 90], rtol=1e-13)


def test_littles_law_holds_in_the_steady_state():
    """Caseload = newcomers a year x mean stay, with hazards that change with time since start."""
    hazards = [0.9, 0.5, 0.7]
    path = project(np.zeros(1, dtype=int), known_hazards(*({"lost": h} for h in hazards)), 100.0, years=40)
    reached = np.exp(-np.concatenate(([0], np.cumsum(hazards))))
    mean_stay = sum((reached[i] - reached[i + 1]) / h for i, h in enumerate(hazards))
    mean_stay += reached[3] / hazards[-1]
    # The step from one year of stay into the next takes the mean of both hazards for a whole
    # month: of second order in the monthly hazard (below 0.08), 1e-4 here.
    assert path.under_care[-1] == pytest.approx(100 * mean_stay, rel=2e-4)
    # In the steady state as many leave as come, and the caseload is the patient-years of a year.
    assert path.leaving[-12:].sum() == pytest.approx(100, rel=1e-9)
    assert patient_years_by_year(path.under_care)[-1] == pytest.approx(path.under_care[-1], rel=1e-9)


def test_time_already_spent_here_decides_who_leaves():
    # Hazard 1.2 in the first year, none later: those here for over a year all stay.
    hazards = known_hazards({"lost": 1.2}, {})
    assert project(np.full(50, 13), hazards, 0.0, years=2).under_care[-1] == 50
    # In month 6 there are 5 whole months and half a month of crossing ahead at 0.1 a month.
    early = project(np.full(50, 6), hazards, 0.0, years=2)
    assert early.under_care[-1] == pytest.approx(50 * math.exp(-0.55))


def test_beyond_support_the_last_hazard_is_held_and_those_concerned_are_counted():
    hazards = known_hazards({"lost": 0.5}, {"lost": 0.1})
    today = np.array([3, 30, 400])  # months; support ends at 24
    path = project(today, hazards, 0.0, years=3)
    assert path.beyond_support[0] == 2
    assert path.beyond_support[12] == pytest.approx(2 * math.exp(-0.1))
    assert path.beyond_support[-1] == path.under_care[-1]


def test_newcomers_from_elsewhere_bring_their_time_along():
    # Hazard 1.2 in the first year, none later: who comes after 400 days never leaves.
    hazards, nobody = known_hazards({"lost": 1.2}, {}), np.zeros(0, dtype=int)
    late = project(nobody, hazards, 120.0, years=2, days_at_arrival=np.array([400]))
    assert late.under_care[-1] == pytest.approx(240)
    mixed = project(nobody, hazards, 120.0, years=2, days_at_arrival=np.array([0, 400]))
    early = project(nobody, hazards, 120.0, years=2)
    assert mixed.under_care[-1] == pytest.approx((240 + early.under_care[-1]) / 2)
    # 10 days are nearer to the start than to a month; 20 days are not.
    into = ageing(hazards.edges).arriving(np.array([0, 10, 20, 9999]))
    assert np.flatnonzero(into).tolist() == [0, 1, 25]
    assert into[0] == 0.5


@pytest.mark.parametrize("months", [0, 11, 12, 13, 23, 24, 240])
def test_every_month_since_start_has_its_place(months):
    axis = ageing(np.array([0.0, 1.0, 2.0]))
    placed = axis.place(np.array([months]))
    assert placed.sum() == 1
    assert np.flatnonzero(placed)[0] == min(months + 1, 25)
    np.testing.assert_allclose(axis.mixing.sum(axis=1), 1)


yearly_hazards = st.lists(
    st.dictionaries(st.sampled_from(WAYS_OF_LEAVING), st.floats(0, 3), max_size=7), min_size=1, max_size=5
)
levers = st.builds(
    Lever,
    st.sampled_from(("fewer_newcomers", "fewer_lost", "fewer_deaths", "fewer_stopped", "more_completed")),
    st.floats(0, 100),
    from_month=st.integers(1, 48),
    ramp_months=st.integers(0, 24),
)
found_earlier = st.builds(
    Lever,
    st.just("found_earlier"),
    st.floats(0, 100),
    months_earlier=st.integers(1, 24),
    ramp_months=st.integers(0, 9),
)


@given(
    yearly_hazards,
    st.lists(st.integers(0, 300), min_size=1, max_size=30),
    st.floats(0, 500),
    st.integers(1, 4),
    st.none() | st.builds(Scenario, st.just(""), st.tuples(levers, levers, found_earlier)),
)
def test_every_patient_is_somewhere_in_every_month(hazards, today, newcomers, years, scenario):
    path = project(np.array(today), known_hazards(*hazards), newcomers, years=years, scenario=scenario)
    flow = path.newcomers - path.leaving.sum(axis=1)
    np.testing.assert_allclose(np.diff(path.under_care), flow, rtol=1e-9, atol=1e-9)
    assert np.all(path.leaving >= 0)
    assert np.all(path.under_care >= 0)
    assert np.all(path.first_year <= path.under_care * (1 + 1e-12))
    assert np.all(path.beyond_support <= path.under_care * (1 + 1e-12))


def test_a_scenario_holds_from_its_month_on_and_multiplies_the_hazards():
    hazards = known_hazards({"died_of_disease": 0.1, "lost": 0.3})
    today = np.full(1000, 4)
    levers = (Lever("fewer_lost", 50, from_month=13), Lever("fewer_newcomers", 25, from_month=13))
    change = Scenario("", levers)
    baseline = project(today, hazards, 120.0, years=3)
    changed = project(today, hazards, 120.0, years=3, scenario=change)
    np.testing.assert_array_equal(changed.under_care[:13], baseline.under_care[:13])
    assert yearly_sums(changed.newcomers).tolist() == pytest.approx([120, 90, 90])
    # From then on 90 newcomers a year, deaths 0.1 and losses 0.15 per person-year.
    steady = 90 / 0.25
    expected = steady + (changed.under_care[12] - steady) * np.exp(-0.25 * np.arange(25) / 12)
    np.testing.assert_allclose(changed.under_care[12:], expected, rtol=1e-12)
    np.testing.assert_allclose(changed.leaving[12:, LOST], 1.5 * changed.leaving[12:, DEATH], rtol=1e-12)


def test_patients_found_early_bring_their_arrival_forward_and_come_once():
    # Nobody leaves. From month 3 on half of those due 4 months later come at once; from month 7 on
    # half of those due have been there: 10 a month, then 15, then 10 again.
    early = Scenario("", (Lever("found_earlier", 50, from_month=3, months_earlier=4),))
    path = project(np.zeros(0, dtype=int), known_hazards({}), 120.0, years=1, scenario=early)
    assert path.newcomers.tolist() == pytest.approx([10, 10, 15, 15, 15, 15, 10, 10, 10, 10, 10, 10])
    assert path.first_year.tolist() == pytest.approx(path.under_care.tolist())


def test_those_in_their_first_year_are_told_apart():
    # 12 newcomers a year, nobody leaves: after 18 months one from each of the last 12 months.
    path = project(np.array([3, 11, 12]), known_hazards({}), 12.0, years=2)
    assert path.first_year[0] == 2
    assert path.first_year[1] == 2  # the one of 11 months has passed the year, one has come
    assert path.first_year[18] == 12
    assert path.under_care[18] == 3 + 18


def test_against_following_each_patient_on_his_own():
    """A slow simulation that knows nothing of months or slots, within its own error."""
    random = np.random.default_rng(20)
    yearly = [0.8, 0.3, 0.15]
    today = random.integers(0, 48, 300)
    path = project(today, known_hazards(*({"lost": h} for h in yearly)), 60.0, years=3)
    runs, ends = 400, (1.0, 2.0, 3.0)
    here = np.zeros((runs, len(ends)))
    for run in range(runs):
        been = (today + random.random(len(today))) / 12
        spent = _spent(been, yearly)
        left = _reached(spent + random.exponential(1.0, len(today)), yearly) - been
        arrivals = random.random(random.poisson(180.0)) * 3
        gone = arrivals + staying_times(random, len(arrivals), yearly)
        here[run] = [np.sum(left > end) + np.sum((arrivals <= end) & (gone > end)) for end in ends]
    error = here.std(axis=0, ddof=1) / math.sqrt(runs)
    assert np.all(np.abs(here.mean(axis=0) - path.under_care[12::12]) < 4 * error)


def _spent(years: np.ndarray, yearly: list[float]) -> np.ndarray:
    """Return the hazard gone through by so many years since start."""
    past = np.minimum(years[:, np.newaxis], np.arange(1, len(yearly)))
    bounds = np.diff(np.column_stack((np.zeros(len(years)), past, years)), axis=1)
    return np.clip(bounds, 0, None) @ np.array(yearly)


def _reached(spent: np.ndarray, yearly: list[float]) -> np.ndarray:
    """Return the years since start at which so much hazard has been gone through."""
    edges = np.concatenate(([0.0], np.cumsum(yearly)))
    year = np.minimum(np.searchsorted(edges, spent, side="right") - 1, len(yearly) - 1)
    return year + (spent - edges[year]) / np.array(yearly)[year]


def test_patients_under_care_are_timed_to_the_closing_date_not_to_their_last_contact():
    rows = [(day(2019, 1, 1), 0, 30, "under_care"), (day(2020, 12, 20), 0, 5, "under_care")]
    rows += [(day(2015), 0, 100, "lost")]
    assert months_here_today(cohort(rows, day(2021, 1, 1))).tolist() == [24, 0]


def test_nonsense_is_refused():
    hazards, today = known_hazards({"lost": 0.1}), np.array([1])
    for newcomers, years in ((-1.0, 1), (1.0, 0)):
        with pytest.raises(Refusal, match="out_of_range"):
            project(today, hazards, newcomers, years=years)
    with pytest.raises(Refusal, match="start_after_closing"):
        months_here_today(cohort([(day(2022), 0, 5, "under_care")], day(2021)))
