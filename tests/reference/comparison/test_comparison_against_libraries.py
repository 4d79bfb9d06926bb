"""Comparison against lifelines, statsmodels, scikit-survival and SciPy, on data sets that they ship.

Tolerance 1e-8 unless a line says why it must be wider.
"""

from __future__ import annotations

import warnings

import numpy as np
import pytest
from lifelines import CoxPHFitter
from lifelines.datasets import load_leukemia, load_lung, load_rossi
from lifelines.statistics import logrank_test, multivariate_logrank_test
from scipy.stats import contingency, fisher_exact
from sksurv.compare import compare_survival
from sksurv.datasets import load_veterans_lung_cancer
from sksurv.metrics import concordance_index_censored
from sksurv.util import Surv
from statsmodels.duration.hazard_regression import PHReg
from statsmodels.stats.contingency_tables import StratifiedTable, Table2x2
from statsmodels.stats.proportion import confint_proportions_2indep, proportion_confint

from vitalroll.comparison.cox import cox
from vitalroll.comparison.design import Choice
from vitalroll.comparison.rank_tests import rank_test
from vitalroll.comparison.stratified import stratified
from vitalroll.comparison.two_by_two import TwoByTwo, exact, measures
from vitalroll.outcomes.risk_table import risk_tables_by
from vitalroll.register.cohort import MEANINGS, Categorical, Cohort, Numeric

warnings.filterwarnings("ignore", module="lifelines|statsmodels|sksurv|pandas")

DIED = ("died_of_disease",)
ROSSI = ["fin", "age", "race", "wexp", "mar", "paro", "prio"]
TABLES = [(12, 40, 5, 45), (3, 33, 9, 41), (20, 60, 14, 52), (1, 11, 2, 17)]


def cohort(exit, event, covariates, entry=None) -> Cohort:
    n = len(exit)
    made = {}
    for name, values in covariates.items():
        if isinstance(values, list):
            levels = tuple(sorted(set(values)))
            made[name] = Categorical(None, levels, np.array([levels.index(value) for value in values]))
        else:
            made[name] = Numeric(None, np.asarray(values, dtype=float))
    return Cohort(
        entry=np.zeros(n, dtype=int) if entry is None else np.asarray(entry),
        exit=np.asarray(exit, dtype=int),
        outcome=np.where(np.asarray(event, dtype=bool), MEANINGS.index(DIED[0]), 0),
        start=np.full(n, 730_000),
        line=np.arange(n),
        closing=740_000,
        covariates=made,
    )


@pytest.mark.parametrize("ties", ["efron", "breslow"])
def test_cox_on_recidivism_against_statsmodels(ties):
    """Rossi, Berk & Lenihan (1980), 432 men, shipped by lifelines."""
    data = load_rossi()
    subject = cohort(data.week, data.arrest, {name: data[name] for name in ROSSI})
    fit = cox(subject, DIED, [Choice(name) for name in ROSSI], ties=ties)
    model = PHReg(
        data.week.to_numpy(float), data[ROSSI].to_numpy(float), status=data.arrest.to_numpy(), ties=ties
    )
    other = model.fit(method="newton", tol=1e-14, disp=0)
    np.testing.assert_allclose([term.coefficient for term in fit.terms], other.params, atol=1e-8)
    np.testing.assert_allclose([term.standard_error for term in fit.terms], other.bse, atol=1e-8)
    assert fit.log_likelihood[1] == pytest.approx(other.llf, abs=1e-8)


def test_cox_on_recidivism_published():
    """Efron estimates of Allison's model as Fox & Weisberg print them, to their three decimals.

    An R Companion to Applied Regression, appendix on Cox regression (from memory; lifelines agrees).
    """
    data = load_rossi()
    subject = cohort(data.week, data.arrest, {name: data[name] for name in ROSSI})
    fit = cox(subject, DIED, [Choice(name) for name in ROSSI])
    published = {
        "fin": -0.379,
        "age": -0.057,
        "race": 0.314,
        "wexp": -0.150,
        "mar": -0.434,
        "paro": -0.085,
        "prio": 0.091,
    }
    assert {term.id: round(term.coefficient, 3) for term in fit.terms} == published
    assert round(fit.tests["likelihood_ratio"].chi_squared, 1) == 33.3
    assert round(fit.concordance.value, 2) == 0.64


def test_cox_on_lung_cancer_against_lifelines():
    """North Central Cancer Treatment Group, shipped by lifelines; complete cases."""
    names = ["age", "sex", "ph.ecog"]
    data = load_lung()[["time", "status", *names]].dropna()
    subject = cohort(data.time, data.status, {name: data[name] for name in names})
    fit = cox(subject, DIED, [Choice(name) for name in names])
    other = CoxPHFitter().fit(data, "time", "status", fit_options={"precision": 1e-14, "r_precision": 1e-14})
    np.testing.assert_allclose([term.coefficient for term in fit.terms], other.params_[names], atol=1e-8)
    np.testing.assert_allclose(
        [term.standard_error for term in fit.terms], other.standard_errors_[names], atol=1e-8
    )
    assert fit.log_likelihood[1] == pytest.approx(other.log_likelihood_, abs=1e-8)


def test_cox_with_delayed_entry_against_lifelines():
    random = np.random.default_rng(5)
    data = load_rossi()
    entry = np.where(random.random(len(data)) < 0.4, random.integers(1, 20, len(data)), 0)
    data = data.assign(entry=entry)[lambda frame: frame.entry < frame.week]
    subject = cohort(data.week, data.arrest, {name: data[name] for name in ROSSI}, data.entry)
    fit = cox(subject, DIED, [Choice(name) for name in ROSSI])
    other = CoxPHFitter().fit(
        data, "week", "arrest", entry_col="entry", fit_options={"precision": 1e-14, "r_precision": 1e-14}
    )
    np.testing.assert_allclose([term.coefficient for term in fit.terms], other.params_[ROSSI], atol=1e-8)


def test_concordance_against_scikit_survival():
    """Without tied times and ties in risk the definitions agree."""
    random = np.random.default_rng(3)
    exit = random.permutation(np.arange(1, 301))
    x = random.normal(size=300) + exit / 200
    event = random.random(300) < 0.6
    fit = cox(cohort(exit, event, {"x": x}), DIED, [Choice("x")])
    other = concordance_index_censored(event, exit.astype(float), x * fit.terms[0].coefficient)[0]
    assert fit.concordance.value == pytest.approx(other, abs=1e-12)


def test_leukaemia_trial_published():
    """6-MP against placebo (Freireich and others 1963): log-rank chi-squared 16.79 (from memory, as in
    Cox & Oakes 1984, and confirmed by lifelines' shipped data); observed 9 and 21."""
    data = load_leukemia()
    groups = ["placebo" if each else "6-MP" for each in data.Rx]
    subject = cohort(data.t, data.status, {"g": groups})
    said = rank_test([risk_tables_by(subject, "g")], DIED)
    assert round(said.chi_squared, 2) == 16.79
    assert [group.observed for group in said.groups] == [9, 21]
    assert [round(group.expected, 2) for group in said.groups] == [19.25, 10.75]
    first = np.array(groups) == "6-MP"
    other = logrank_test(data.t[first], data.t[~first], data.status[first], data.status[~first])
    assert said.chi_squared == pytest.approx(other.test_statistic, rel=1e-10)


@pytest.mark.parametrize(
    ("weight", "weighting", "extra"),
    [
        ("log_rank", None, {}),
        ("gehan", "wilcoxon", {}),
        ("tarone_ware", "tarone-ware", {}),
        ("fleming_harrington", "fleming-harrington", {"p": 1, "q": 0}),
    ],
)
def test_rank_tests_against_lifelines(weight, weighting, extra):
    data = load_lung()[["time", "status", "ph.ecog"]].dropna()
    data = data[data["ph.ecog"] < 3]
    subject = cohort(data.time, data.status, {"g": [str(value) for value in data["ph.ecog"]]})
    said = rank_test([risk_tables_by(subject, "g")], DIED, weight=weight)
    other = multivariate_logrank_test(data.time, data["ph.ecog"], data.status, weightings=weighting, **extra)
    assert said.chi_squared == pytest.approx(other.test_statistic, rel=1e-8)
    assert said.p == pytest.approx(other.p_value, rel=1e-6)


def test_k_group_log_rank_against_scikit_survival():
    """Veterans' lung cancer trial, shipped by scikit-survival, by cell type."""
    x, y = load_veterans_lung_cancer()
    cells = [str(cell) for cell in x["Celltype"]]
    subject = cohort(y["Survival_in_days"], y["Status"], {"g": cells})
    said = rank_test([risk_tables_by(subject, "g")], DIED)
    chi_squared, _ = compare_survival(Surv.from_arrays(y["Status"], y["Survival_in_days"]), np.array(cells))
    assert said.chi_squared == pytest.approx(chi_squared, rel=1e-8)
    assert said.df == 3


def as_statsmodels(table):
    a, n1, c, n0 = table
    return np.array([[a, n1 - a], [c, n0 - c]], dtype=float)


@pytest.mark.parametrize("table", TABLES)
def test_two_by_two_against_statsmodels(table):
    said, other = measures(TwoByTwo(*table)), Table2x2(as_statsmodels(table), shift_zeros=False)
    assert said.odds_ratio.value == pytest.approx(other.oddsratio, rel=1e-10)
    np.testing.assert_allclose(
        (said.odds_ratio.lower, said.odds_ratio.upper), other.oddsratio_confint(), rtol=1e-8
    )
    np.testing.assert_allclose(
        (said.risk_ratio.lower, said.risk_ratio.upper), other.riskratio_confint(), rtol=1e-8
    )
    a, n1, c, n0 = table
    np.testing.assert_allclose(
        (said.exposed_risk.lower, said.exposed_risk.upper),
        proportion_confint(a, n1, method="wilson"),
        atol=1e-10,
    )
    np.testing.assert_allclose(
        (said.risk_difference.lower, said.risk_difference.upper),
        confint_proportions_2indep(a, n1, c, n0, method="newcomb", compare="diff"),
        atol=1e-10,
    )


@pytest.mark.parametrize("table", TABLES)
def test_exact_against_scipy(table):
    """SciPy's root finder stops at about 1e-6 of the odds ratio; ours is compared by that."""
    said = exact(TwoByTwo(*table))
    whole = as_statsmodels(table).astype(int)
    assert said.p == pytest.approx(fisher_exact(whole).pvalue, rel=1e-8)
    other = contingency.odds_ratio(whole, kind="conditional")
    assert said.odds_ratio.value == pytest.approx(other.statistic, rel=1e-5)
    limits = other.confidence_interval(0.95)
    np.testing.assert_allclose(
        (said.odds_ratio.lower, said.odds_ratio.upper), (limits.low, limits.high), rtol=1e-5
    )


def test_mantel_haenszel_against_statsmodels():
    """statsmodels has the pooled odds ratio with its Robins-Breslow-Greenland variance and both tests."""
    said = stratified([TwoByTwo(*table) for table in TABLES])
    other = StratifiedTable([as_statsmodels(table) for table in TABLES])
    assert said.pooled.odds_ratio.value == pytest.approx(other.oddsratio_pooled, rel=1e-10)
    assert said.pooled.odds_ratio.standard_error == pytest.approx(other.logodds_pooled_se, rel=1e-8)
    assert said.pooled.risk_ratio.value == pytest.approx(other.riskratio_pooled, rel=1e-10)
    assert said.pooled.chi_squared == pytest.approx(
        other.test_null_odds(correction=False).statistic, rel=1e-8
    )
    assert said.homogeneity.breslow_day_tarone.chi_squared == pytest.approx(
        other.test_equal_odds(adjust=True).statistic, rel=1e-6
    )


def test_mantel_haenszel_published():
    """Oral contraceptives and myocardial infarction by age (Shapiro and others 1979, as in Rosner's and
    Schlesselman's textbooks): crude odds ratio 1.68, pooled over five age groups 3.97 (from memory;
    the pooled value is confirmed by statsmodels from the same counts)."""
    cases_and_controls = [
        (4, 2, 62, 224),
        (9, 12, 33, 390),
        (4, 33, 26, 330),
        (6, 65, 9, 362),
        (6, 93, 5, 301),
    ]
    strata = [TwoByTwo(a, a + b, c, c + d) for a, c, b, d in cases_and_controls]
    said = stratified(strata)
    crude = measures(TwoByTwo(*(sum(getattr(s, name) for s in strata) for name in s_fields())))
    assert round(crude.odds_ratio.value, 2) == 1.68
    assert round(said.pooled.odds_ratio.value, 2) == 3.97
    other = StratifiedTable([[[a, b], [c, d]] for a, c, b, d in cases_and_controls])
    assert said.pooled.odds_ratio.value == pytest.approx(other.oddsratio_pooled, rel=1e-10)


def s_fields():
    return ("exposed_events", "exposed_total", "reference_events", "reference_total")
