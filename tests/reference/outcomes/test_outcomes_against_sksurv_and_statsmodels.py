"""Curves, incidences and rates against scikit-survival, statsmodels and SciPy, on data sets they ship."""

import numpy as np
import pytest
from scipy import stats
from sksurv import datasets
from sksurv.nonparametric import cumulative_incidence_competing_risks, kaplan_meier_estimator
from statsmodels.duration.survfunc import CumIncidenceRight, SurvfuncRight

from vitalroll.numbers import DAYS_PER_YEAR
from vitalroll.outcomes.competing import leaving
from vitalroll.outcomes.limits import lower_limit_at_one, upper_limit_at_zero
from vitalroll.outcomes.person_time import poisson_limits
from vitalroll.outcomes.product_limit import product_limit
from vitalroll.outcomes.quantiles import time_quantile
from vitalroll.outcomes.risk_table import count_risk
from vitalroll.register.cohort import MEANINGS

DIED = ("died_of_disease",)

# The same sums and products in another order.
EXACT = 1e-12


def survival_data(name):
    _, outcome = getattr(datasets, f"load_{name}")()
    event, time = outcome.dtype.names
    return outcome[time].astype(int), outcome[event].astype(int)


def competing_data(name, scale):
    _, outcome = getattr(datasets, f"load_{name}")()
    return np.round(outcome["ftime"].astype(float) * scale).astype(int), outcome["status"].astype(int)


@pytest.mark.parametrize("name", ["whas500", "veterans_lung_cancer", "gbsg2"])
def test_curve_and_limits_of_scikit_survival(name):
    """Log-log limits, wherever survival is strictly between 0 and 1."""
    exit, event = survival_data(name)
    curve = product_limit(count_risk(np.zeros_like(exit), exit, event), DIED)
    time, survival, limits = kaplan_meier_estimator(event.astype(bool), exit, conf_type="log-log")
    assert curve.time[1:].tolist() == time.tolist()
    assert curve.survival[1:] == pytest.approx(survival, abs=EXACT)
    inside = (survival > 0) & (survival < 1)
    assert curve.lower[1:][inside] == pytest.approx(limits[0][inside], abs=EXACT)
    assert curve.upper[1:][inside] == pytest.approx(limits[1][inside], abs=EXACT)


@pytest.mark.parametrize("name", ["whas500", "veterans_lung_cancer"])
def test_standard_errors_and_quantiles_of_statsmodels(name):
    """Greenwood's errors; quantiles with log-log limits (its ``cloglog``).

    statsmodels takes the first time with S < 1 - p, we with S <= 1 - p: the same unless S meets it, as
    it does for ``whas500`` with p = 0.2, 100 of 500 having died before anyone was censored.
    """
    exit, event = survival_data(name)
    curve = product_limit(count_risk(np.zeros_like(exit), exit, event), DIED)
    theirs = SurvfuncRight(exit, event)
    found = [curve.at(day) for day in theirs.surv_times]
    assert [e.value for e in found] == pytest.approx(theirs.surv_prob, abs=EXACT)
    assert [e.standard_error for e in found][:-1] == pytest.approx(theirs.surv_prob_se[:-1], abs=EXACT)
    for share in (0.2113, 0.3517, 0.4999):
        quantile = time_quantile(curve, share)
        assert quantile.estimate.value * DAYS_PER_YEAR == pytest.approx(theirs.quantile(share))
        limits = [quantile.estimate.lower * DAYS_PER_YEAR, quantile.estimate.upper * DAYS_PER_YEAR]
        assert limits == pytest.approx(theirs.quantile_ci(share, method="cloglog"))


@pytest.mark.parametrize(("name", "scale"), [("bmt", 1), ("cgvhd", 1000)])
def test_incidences_of_scikit_survival(name, scale):
    """Every way at once, with log-log limits.

    Its ``Dinse_Approx`` variance (Dinse & Larson 1986 Biometrika 73:379, eq. 6) is the one that
    Marubini & Valsecchi print.
    """
    exit, status = competing_data(name, scale)
    ways = MEANINGS[1 : status.max() + 1]
    result = leaving(count_risk(np.zeros_like(exit), exit, status), ways=ways)
    time, incidence, limits = cumulative_incidence_competing_risks(
        status, exit, conf_type="log-log", var_type="Dinse_Approx"
    )
    assert result.time[1:].tolist() == time.tolist()
    assert 1 - result.under_care[1:] == pytest.approx(incidence[0], abs=EXACT)
    for k, way in enumerate(result.ways, start=1):
        assert way.incidence[1:] == pytest.approx(incidence[k], abs=EXACT)
        some = incidence[k] > 0
        assert way.lower[1:][some] == pytest.approx(limits[k][0][some], abs=EXACT)
        assert way.upper[1:][some] == pytest.approx(limits[k][1][some], abs=EXACT)


def test_incidences_and_errors_of_statsmodels():
    """Bone-marrow transplants: relapse and death in remission."""
    exit, status = competing_data("bmt", 1)
    result = leaving(count_risk(np.zeros_like(exit), exit, status), ways=MEANINGS[1:3])
    theirs = CumIncidenceRight(exit, status)
    for k, way in enumerate(result.ways):
        found = [result.at(way.meaning, day) for day in theirs.times]
        assert [e.value for e in found] == pytest.approx(theirs.cinc[k], abs=EXACT)
        assert [e.standard_error for e in found] == pytest.approx(theirs.cinc_se[k], abs=EXACT)


@pytest.mark.parametrize("confidence", [0.8, 0.95, 0.99])
def test_garwood_limits_of_scipy(confidence):
    """Half chi-squared quantiles."""
    events = np.array([0, 1, 2, 7, 10, 150, 40_000])
    lower, upper = poisson_limits(events, confidence)
    tail = (1 - confidence) / 2
    with_events = events > 0
    assert lower[with_events] == pytest.approx(stats.chi2.ppf(tail, 2 * events[with_events]) / 2, rel=1e-10)
    assert upper == pytest.approx(stats.chi2.isf(tail, 2 * events + 2) / 2, rel=1e-10)


@pytest.mark.parametrize("n", [1, 2, 10, 400])
def test_limits_at_one_and_zero_without_censoring_are_clopper_and_pearson(n):
    """As Fay, Brittain & Proschan (2013) show; SciPy's exact interval."""
    all_alive = stats.binomtest(n, n).proportion_ci(0.95, method="exact")
    assert lower_limit_at_one(np.array([n]), 0.95)[0] == pytest.approx(all_alive.low, rel=1e-8)
    none_alive = stats.binomtest(0, n).proportion_ci(0.95, method="exact")
    one_by_one = upper_limit_at_zero(np.arange(n, 0, -1), np.ones(n), 0.95)
    assert one_by_one == pytest.approx(none_alive.high, rel=1e-8)


def test_limit_at_zero_is_near_that_of_the_product_of_betas():
    """With censoring the product is only matched in mean and variance; drawn 400,000 times."""
    at_risk, events = np.array([12, 9, 6, 4, 2]), np.array([2, 1, 1, 1, 2])
    rng = np.random.default_rng(5)
    drawn = np.prod(rng.beta(at_risk - events + 1, events, (400_000, 5)), axis=1)
    limit = upper_limit_at_zero(at_risk, events, 0.95)
    # Monte-Carlo error of the tail is 0.00025; the rest is the price of matching moments.
    assert np.mean(drawn > limit) == pytest.approx(0.025, abs=0.003)
