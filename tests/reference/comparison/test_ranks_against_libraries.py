"""Rank tests by other weights, in strata and in pairs, against lifelines and statsmodels."""

from __future__ import annotations

import warnings

import numpy as np
import pytest
from lifelines.datasets import load_larynx, load_lung
from lifelines.statistics import logrank_test, pairwise_logrank_test
from scipy.stats import norm
from statsmodels.duration.hazard_regression import PHReg
from statsmodels.duration.survfunc import survdiff
from statsmodels.stats.multitest import multipletests

from vitalroll.comparison.ordered import trend_test
from vitalroll.comparison.pairwise import holm, pairwise
from vitalroll.comparison.rank_tests import rank_test
from vitalroll.outcomes.risk_table import count_risk
from vitalroll.register.cohort import MEANINGS

warnings.filterwarnings("ignore", module="lifelines|statsmodels|pandas")

DIED = ("died_of_disease",)
CODE = MEANINGS.index(DIED[0])


def tables(time, event, group) -> dict:
    time, event, group = np.asarray(time).astype(np.int64), np.asarray(event), np.asarray(group)
    return {
        str(level): count_risk(
            np.zeros(int((group == level).sum()), dtype=np.int64),
            time[group == level],
            np.where(event[group == level] > 0, CODE, 0),
        )
        for level in np.unique(group)
    }


def lung():
    data = load_lung().dropna(subset=["ph.ecog"])
    # In lifelines' copy status is 1 for a death; sex 1 for men.
    return (
        data["time"].to_numpy(),
        data["status"].to_numpy(),
        data["sex"].to_numpy(),
        data["ph.ecog"].to_numpy(),
    )


@pytest.mark.parametrize("powers", [(0.0, 0.0), (1.0, 0.0), (0.0, 1.0), (0.5, 2.0)])
def test_fleming_and_harrington_against_lifelines(powers) -> None:
    """lifelines estimates the pooled survival in logarithms: 1e-6."""
    time, event, sex, _ = lung()
    men = sex == 1
    said = rank_test(
        [tables(time, event, sex)], DIED, weight="fleming_harrington", rho=powers[0], gamma=powers[1]
    )
    found = logrank_test(
        time[men], time[~men], event[men], event[~men],
        weightings="fleming-harrington", p=powers[0], q=powers[1],
    )  # fmt: skip
    assert said.chi_squared == pytest.approx(found.test_statistic, rel=1e-6)


def test_peto_against_lifelines() -> None:
    time, event, sex, _ = lung()
    men = sex == 1
    said = rank_test([tables(time, event, sex)], DIED, weight="peto_peto")
    found = logrank_test(time[men], time[~men], event[men], event[~men], weightings="peto")
    assert said.chi_squared == pytest.approx(found.test_statistic, rel=1e-6)


@pytest.mark.parametrize(("weight", "theirs"), [("log_rank", None), ("gehan", "gb"), ("tarone_ware", "tw")])
def test_stratified_against_statsmodels(weight, theirs) -> None:
    time, event, sex, ecog = lung()
    strata = [tables(time[ecog == level], event[ecog == level], sex[ecog == level]) for level in (0, 1, 2)]
    # ECOG 3 is a single man: nobody to compare him with.
    keep = ecog < 3
    found, p = survdiff(time[keep], event[keep], sex[keep], strata=ecog[keep], weight_type=theirs)
    said = rank_test(strata, DIED, weight=weight)
    assert said.chi_squared == pytest.approx(found, rel=1e-9)
    assert said.p == pytest.approx(p, rel=1e-8)


def test_pairs_against_lifelines_and_holm_against_statsmodels() -> None:
    data = load_larynx()
    days = np.round(data["time"] * 100)
    stage = 1 + data["Stage_II"] + data["Stage_III"] * 2 + data["Stage_IV"] * 3
    said = pairwise([tables(days, data["death"], stage)], DIED)
    found = pairwise_logrank_test(days, stage, data["death"]).summary
    assert [pair.p for pair in said] == pytest.approx(list(found["p"]), rel=1e-8)
    adjusted = multipletests([pair.p for pair in said], method="holm")[1]
    assert [pair.adjusted_p for pair in said] == pytest.approx(list(adjusted), rel=1e-10)
    random = np.random.default_rng(7).random(50) ** 3
    assert holm(random) == pytest.approx(multipletests(random, method="holm")[1])


def test_trend_is_the_score_test_of_a_number_without_ties() -> None:
    """statsmodels' Cox, one number, at 0: z = score / sqrt(information). No two days are alike: no tie rule enters."""
    random = np.random.default_rng(11)
    time = random.permutation(200) + 1
    group = random.integers(1, 5, 200)
    event = (random.random(200) < 0.7).astype(int)
    trend = trend_test([tables(time, event, group)], DIED, {str(level): level for level in range(1, 5)})
    model = PHReg(time.astype(float), group[:, None].astype(float), status=event)
    score, information = model.score(np.zeros(1))[0], -model.hessian(np.zeros(1))[0, 0]
    assert trend.z == pytest.approx(score / np.sqrt(information), rel=1e-9)
    assert trend.p == pytest.approx(2 * norm.sf(abs(trend.z)), rel=1e-9)
