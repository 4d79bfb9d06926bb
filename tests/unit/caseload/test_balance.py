"""The balance of a caseload from totals."""

from __future__ import annotations

import math

import pytest
from hypothesis import given
from hypothesis import strategies as st

from vitalroll.caseload.balance import balance, occupancy, prevalence_from_odds
from vitalroll.errors import Refusal


def _codes(found) -> dict[str, dict]:
    return {caution.code: caution.parameters for caution in found.cautions}


def test_a_balance_worked_by_hand():
    # 200 under care, 50 new and 40 leaving a year: 10 more each year.
    found = balance(200, 50, 40, years=3, population=100_200)
    assert [point.under_care for point in found.path] == [200, 210, 220, 230]
    assert (found.net_per_year, found.turnover, found.mean_duration_years) == (10, 20, 5)
    assert found.steady_state == 250
    # If a fifth leaves each year: 250 - 50 exp(-0.2 t).
    assert found.path[3].under_care_at_constant_rate == pytest.approx(250 - 50 * math.exp(-0.6))
    assert found.prevalence_per_100000 == pytest.approx(1e5 * 200 / 100_200)
    assert found.incidence_per_100000 == pytest.approx(50)
    # P/(1-P) = 50/100,000 x 5 = 0.0025
    assert found.steady_prevalence_per_100000 == pytest.approx(1e5 * 0.0025 / 1.0025)
    assert _codes(found) == {"not_in_steady_state": {"new_per_year": 50, "leaving_per_year": 40}}


def test_lung_cancer_in_connecticut():
    # White men, 1973-77: incidence 45.9 and prevalence 23.0 per 100,000 give a mean duration of half
    # a year (Hennekens & Buring 1987, Epidemiology in Medicine, ch. 4; figures from memory).
    found = balance(23, 45.9, 45.9, population=100_000)
    assert found.mean_duration_years == pytest.approx(0.5, abs=0.002)
    assert found.steady_state == pytest.approx(23)
    assert found.prevalence_per_100000 == pytest.approx(23)
    # Newcomers come from those who are not ill, so the odds, not the prevalence, are the product.
    assert found.steady_prevalence_per_100000 == pytest.approx(23)
    assert _codes(found) == {}


@given(st.floats(1, 1e5), st.floats(0.1, 1e4), st.floats(0.1, 1e4), st.integers(1, 30))
def test_at_a_constant_rate_the_caseload_goes_to_its_steady_state(now, new, leaving, years):
    found = balance(now, new, leaving, years=years)
    path = [point.under_care_at_constant_rate for point in found.path]
    assert path[0] == pytest.approx(now)
    low, high = sorted((now, found.steady_state))
    assert all(low * (1 - 1e-9) <= value <= high * (1 + 1e-9) for value in path)
    # With as many leaving in proportion, the caseload never moves away faster than the balance.
    assert abs(path[1] - now) <= abs(found.net_per_year) * (1 + 1e-6) + 1e-6 * now
    # In the steady state nothing moves: newcomers = rate x caseload.
    assert found.turnover / 100 * found.steady_state == pytest.approx(new)


def test_a_caseload_never_falls_below_nobody():
    found = balance(100, 0, 40, years=4)
    assert [point.under_care for point in found.path] == [100, 60, 20, 0, 0]
    assert _codes(found)["balance_reaches_zero"] == {"year": 3}
    assert found.steady_state == 0
    # After 1 year 60 against 100 exp(-0.4) = 67: more than 5 % apart.
    assert _codes(found)["balance_paths_apart"]["year"] == 1


def test_when_nobody_leaves_there_is_no_steady_state():
    found = balance(100, 10, 0, population=1000)
    assert found.path[5].under_care_at_constant_rate == 150
    assert math.isinf(found.mean_duration_years)
    assert math.isinf(found.steady_state)
    assert found.steady_prevalence_per_100000 == 1e5
    assert "nobody_leaves" in _codes(found)


def test_a_long_horizon_is_said():
    assert _codes(balance(100, 40, 40, years=6)) == {"balance_short_horizon": {"years": 6, "limit": 5}}


@pytest.mark.parametrize(
    ("given", "code", "field"),
    [
        ((0, 1, 1), "nobody_under_care", "prevalent"),
        ((-1, 1, 1), "out_of_range", "prevalent"),
        ((1, -1, 1), "out_of_range", "new_per_year"),
        ((1, 1, math.nan), "out_of_range", "leaving"),
    ],
)
def test_impossible_totals_are_refused_by_field(given, code, field):
    with pytest.raises(Refusal) as refused:
        balance(*given)
    assert (refused.value.code, refused.value.field) == (code, field)


def test_a_population_must_be_larger_than_its_patients():
    with pytest.raises(Refusal, match="population_not_above_prevalent"):
        balance(100, 1, 1, population=100)
    with pytest.raises(Refusal, match="out_of_range"):
        balance(100, 1, 1, years=0)


def test_places_taken_follow_littles_law_and_the_poisson():
    # 730 admissions a year staying 5 days each: 10 beds; Poisson(10) is at most 15 with chance .951.
    found = occupancy(730, 5 / 365, 20)
    assert found.mean == pytest.approx(10)
    assert found.percentile_95 == 15
    assert found.utilisation == pytest.approx(0.5)
    assert occupancy(0, 5, 1).percentile_95 == 0


def test_utilisation_at_or_above_one_is_refused():
    with pytest.raises(Refusal) as refused:
        occupancy(10, 2, 20)
    assert refused.value.code == "utilisation_at_or_above_one"
    assert refused.value.parameters == {"utilisation": 1, "places": 20, "needed": 20}
    for wrong in ((-1, 1, 1), (1, -1, 1), (1, 1, 0)):
        with pytest.raises(Refusal, match="out_of_range"):
            occupancy(*wrong)


def test_prevalence_from_odds():
    assert prevalence_from_odds(0.25) == pytest.approx(0.2)
    assert prevalence_from_odds(math.inf) == 1
