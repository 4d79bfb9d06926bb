"""The caseload against SciPy: distributions, differential equations and integrals."""

from __future__ import annotations

import numpy as np
import pytest
from scipy import integrate, linalg, stats

from vitalroll.caseload.balance import balance, occupancy
from vitalroll.caseload.inflow import mean_of_counts
from vitalroll.caseload.projection import project
from vitalroll.caseload.retention import Retention


def _hazards(yearly: np.ndarray) -> Retention:
    """Return a retention with the given hazards, shape (years, ways)."""
    n = len(yearly)
    return Retention(np.arange(n + 1.0), np.zeros(n, int), np.full(n, 1.0), yearly, 0.0, 0)


# Limits of a Poisson mean as printed in tables after Garwood (1936), from memory; the chi-squared
# form is the second, independent check.
GARWOOD = {0: (0, 3.69), 1: (0.03, 5.57), 5: (1.62, 11.67), 10: (4.80, 18.39), 20: (12.22, 30.89)}


@pytest.mark.parametrize("count", [*GARWOOD, 100, 1234])
def test_limits_of_newcomers_are_garwoods(count):
    found = mean_of_counts(np.array([count]))
    lower = stats.chi2.ppf(0.025, 2 * count) / 2 if count else 0.0
    upper = stats.chi2.ppf(0.975, 2 * count + 2) / 2
    assert (found.lower, found.upper) == (pytest.approx(lower, rel=1e-10), pytest.approx(upper, rel=1e-10))
    if count in GARWOOD:
        assert (round(found.lower, 2), round(found.upper, 2)) == GARWOOD[count]


def test_limits_of_overdispersed_newcomers_hold_the_mean_of_a_negative_binomial():
    """Coverage of 95 % limits when variance = 3 x mean, known; 20,000 sets of five years."""
    random = np.random.default_rng(11)
    mean, spread = 60.0, 3.0
    # numpy's second parameter p: variance / mean = 1/p.
    counts = random.negative_binomial(mean / (spread - 1), 1 / spread, size=(20_000, 5))
    held = 0
    for total, many in zip(*np.unique(counts.sum(axis=1), return_counts=True), strict=True):
        limits = mean_of_counts(np.array([total, 0, 0, 0, 0]), spread=spread)
        held += many * (limits.lower <= mean <= limits.upper)
    # Exact for a Poisson (at least 0.95), approximate here.
    assert 0.94 < held / 20_000 < 0.97


def test_constant_rates_solve_the_balance_equation():
    """dN/dt = I - HN and dX_k/dt = h_k N by SciPy's solver: caseload and exits of each month's end."""
    yearly = np.array([[0.02, 0.01, 0.005, 0.1, 0.04, 0.12, 0.03]])
    newcomers, n = 130.0, 410

    def flows(t: float, state: np.ndarray) -> np.ndarray:
        leaving = yearly[0] * state[0]
        return np.concatenate(([newcomers - leaving.sum()], leaving))

    months = np.arange(61) / 12
    solved = integrate.solve_ivp(
        flows, (0, 5), [n, *np.zeros(7)], t_eval=months, rtol=1e-11, atol=1e-9, method="DOP853"
    )
    path = project(np.arange(n) % 200, _hazards(yearly), newcomers, years=5)
    np.testing.assert_allclose(path.under_care, solved.y[0], rtol=1e-9)
    np.testing.assert_allclose(np.cumsum(path.leaving, axis=0), solved.y[1:, 1:].T, rtol=1e-8)


def test_constant_rates_agree_with_the_matrix_exponential():
    """States: under care and the seven ways out; no newcomers."""
    yearly = np.array([[0.3, 0.01, 0.2, 0.1, 0.5, 0.12, 0.03]])
    generator = np.zeros((8, 8))
    generator[0, 1:], generator[0, 0] = yearly[0], -yearly.sum()
    path = project(np.zeros(100, dtype=int), _hazards(yearly), 0.0, years=3)
    there = 100 * linalg.expm(3 * generator)[0]
    np.testing.assert_allclose([path.under_care[-1], *path.leaving.sum(axis=0)], there, rtol=1e-11)


def test_hazards_by_time_since_start_agree_with_the_survival_integral():
    """Newcomers: integral of I S(u); today's patients: S(d + t)/S(d), averaged over their month.

    The projection crosses from one year of stay to the next within one month with the mean of both
    hazards, and starts today's patients in the middle of their month: both of second order in the
    monthly hazard, together below 5 in 10,000 here.
    """
    rates = np.array([1.0, 0.4, 0.2, 0.1])
    yearly = np.outer(rates, [0.3, 0.1, 0.1, 0.1, 0.1, 0.2, 0.1])
    today = np.random.default_rng(3).integers(0, 70, 500)

    def survival(years: np.ndarray) -> np.ndarray:
        past = np.maximum(np.asarray(years)[..., np.newaxis] - np.arange(4), 0)
        spent = np.minimum(past, [1, 1, 1, np.inf])
        return np.exp(-(spent @ rates))

    path = project(today, _hazards(yearly), 90.0, years=6)
    within = (np.arange(200) + 0.5) / 200
    for year in range(1, 7):
        arrived, _ = integrate.quad(lambda u: 90 * survival(u), 0, year, points=[1, 2, 3], epsabs=1e-10)
        since = (today[:, np.newaxis] + within) / 12
        stayed = np.sum(survival(since + year).mean(axis=1) / survival(since).mean(axis=1))
        assert path.under_care[12 * year] == pytest.approx(arrived + stayed, rel=5e-4)


def test_the_caseload_at_constant_rate_solves_its_equation():
    found = balance(320, 75, 48, years=10)
    solved = integrate.solve_ivp(
        lambda _, p: 75 - 0.15 * p, (0, 10), [320.0], t_eval=range(11), rtol=1e-10, atol=1e-9
    )
    path = [point.under_care_at_constant_rate for point in found.path]
    np.testing.assert_allclose(path, solved.y[0], rtol=1e-8)


@pytest.mark.parametrize("mean", [0.01, 0.05, 0.5, 1, 7.3, 10, 45, 400])
def test_places_taken_on_95_days_of_100_are_the_poissons(mean):
    assert occupancy(mean, 1, 1000).percentile_95 == stats.poisson.ppf(0.95, mean)
