"""Cox regression against cases solved by hand, a slow direct likelihood, and its identities."""

from __future__ import annotations

import dataclasses
from itertools import pairwise

import numpy as np
import pytest
from comparison_cohorts import DIED, cohort, random_cohort

from vitalroll.comparison.concordance import concordance
from vitalroll.comparison.cox import cox
from vitalroll.comparison.design import Choice
from vitalroll.comparison.rank_tests import rank_test
from vitalroll.errors import Refusal
from vitalroll.outcomes.risk_table import risk_tables_by

SIX = cohort([1, 1, 6, 6, 8, 9], [1, 0, 1, 1, 0, 1], {"x": np.array([1.0, 1, 1, 0, 0, 0])})


def slow_log_likelihood(subject, names, b, ties):
    """Efron's or Breslow's partial likelihood, patient by patient."""
    x = np.column_stack([subject.covariates[name].values for name in names])
    eta, r = x @ b, np.exp(x @ b)
    event = subject.outcome == 1
    total = 0.0
    for day in np.unique(subject.exit[event]):
        at_risk = ((subject.entry < day) | (subject.entry == 0)) & (subject.exit >= day)
        falling = event & (subject.exit == day)
        d = falling.sum()
        for i in range(d):
            part = i / d if ties == "efron" else 0.0
            total -= np.log(r[at_risk].sum() - part * r[falling].sum())
        total += eta[falling].sum()
    return total


def gradient(function, b, step=1e-5):
    return np.array([
        (function(b + step * e) - function(b - step * e)) / (2 * step) for e in np.eye(len(b))
    ])  # fmt: skip


def test_six_rows_breslow_by_hand():
    """exp(b) solves r^2 - 3r - 6 = 0, so b = ln[(3 + sqrt 33) / 2] (the example of R's survival package)."""
    fit = cox(SIX, DIED, [Choice("x")], ties="breslow")
    assert fit.terms[0].coefficient == pytest.approx(np.log((3 + np.sqrt(33)) / 2), abs=1e-13)


def test_six_rows_efron_by_hand():
    """exp(b) solves 30 + 23 r - r^3 = 0 (the example of R's survival package)."""
    fit = cox(SIX, DIED, [Choice("x")], ties="efron")
    r = np.exp(fit.terms[0].coefficient)
    assert 30 + 23 * r - r**3 == pytest.approx(0, abs=1e-10)


@pytest.mark.parametrize("ties", ["efron", "breslow"])
@pytest.mark.parametrize("late", [False, True])
@pytest.mark.parametrize("seed", range(4))
def test_agrees_with_the_direct_likelihood(seed, late, ties):
    """At the answer the slow likelihood is flat, has the same value, and the same curvature."""
    subject = random_cohort(seed, 80, late=late)
    names = ["x0", "x1"]
    fit = cox(subject, DIED, [Choice(name) for name in names], ties=ties)
    b = np.array([term.coefficient for term in fit.terms])
    keep = ~((subject.entry > 0) & (subject.entry == subject.exit))
    seen = subject.having(keep)

    def value(b):
        return slow_log_likelihood(seen, names, b, ties)

    assert fit.log_likelihood[1] == pytest.approx(value(b), abs=1e-9)
    assert fit.log_likelihood[0] == pytest.approx(value(np.zeros(2)), abs=1e-9)
    # Central differences of the likelihood are good to about 1e-6 here.
    np.testing.assert_allclose(gradient(value, b), 0, atol=1e-6)
    curvature = np.array([gradient(lambda b, i=i: gradient(value, b, 1e-4)[i], b, 1e-4) for i in range(2)])
    errors = np.sqrt(np.diag(np.linalg.inv(-curvature)))
    np.testing.assert_allclose([term.standard_error for term in fit.terms], errors, rtol=1e-4)


def test_score_test_is_the_log_rank_test_without_ties():
    random = np.random.default_rng(7)
    exit = random.permutation(np.arange(1, 61))
    subject = cohort(exit, random.random(60) < 0.6, {"group": list(random.choice(["a", "b"], 60))})
    score = cox(subject, DIED, [Choice("group")]).tests["score"]
    log_rank = rank_test([risk_tables_by(subject, "group")], DIED)
    assert score.chi_squared == pytest.approx(log_rank.chi_squared, rel=1e-10)


def test_scaling_and_shifting_a_number_changes_only_its_unit():
    subject = random_cohort(3, 100)
    moved = dataclasses.replace(
        subject,
        covariates={
            **subject.covariates,
            "x0": dataclasses.replace(
                subject.covariates["x0"], values=1e6 + 10 * subject.covariates["x0"].values
            ),
        },
    )
    plain = cox(subject, DIED, [Choice("x0"), Choice("x1")])
    scaled = cox(moved, DIED, [Choice("x0", per=10.0), Choice("x1")])
    for one, other in zip(plain.terms, scaled.terms, strict=True):
        assert other.coefficient == pytest.approx(one.coefficient, abs=1e-8)
        assert other.standard_error == pytest.approx(one.standard_error, abs=1e-8)


def test_splitting_follow_up_changes_nothing():
    """A patient followed to day t is the same as one followed to c and again, late, from c to t."""
    whole = random_cohort(5, 70)
    cut = 7
    long = whole.exit > cut
    first = (np.zeros(len(whole), int), np.minimum(whole.exit, cut), np.where(long, 0, whole.outcome))
    second = (np.full(long.sum(), cut), whole.exit[long], whole.outcome[long])
    entry, exit, outcome = (np.concatenate(pair) for pair in zip(first, second, strict=True))
    x = np.concatenate((whole.covariates["x0"].values, whole.covariates["x0"].values[long]))
    split = cohort(exit, outcome == 1, {"x0": x}, entry)
    one, two = cox(whole, DIED, [Choice("x0")]), cox(split, DIED, [Choice("x0")])
    assert two.terms[0].coefficient == pytest.approx(one.terms[0].coefficient, abs=1e-10)
    assert two.log_likelihood[1] == pytest.approx(one.log_likelihood[1], abs=1e-9)
    assert two.concordance.value == pytest.approx(one.concordance.value, abs=1e-12)


@pytest.mark.parametrize("late", [False, True])
@pytest.mark.parametrize("decimals", [0, 1, 9])
def test_concordance_and_its_error_agree_with_counting_pairs(late, decimals):
    """With many equal risks, with some and with none; the error from each patient's share in the pairs."""
    subject = random_cohort(11, 90, late=late)
    subject = subject.having(~((subject.entry > 0) & (subject.entry == subject.exit)))
    risk = np.round(subject.covariates["x0"].values, decimals)
    event = subject.outcome == 1
    agree, pairs = np.zeros(len(subject)), np.zeros(len(subject))
    for i in np.flatnonzero(event):
        for j in range(len(subject)):
            later = subject.exit[j] > subject.exit[i] or (subject.exit[j] == subject.exit[i] and not event[j])
            if i != j and later and (subject.entry[j] < subject.exit[i] or subject.entry[j] == 0):
                pairs[[i, j]] += 1
                agree[[i, j]] += 1.0 if risk[i] > risk[j] else 0.5 if risk[i] == risk[j] else 0.0
    found = concordance(subject.entry, subject.exit, event, risk)
    assert found.value == pytest.approx(agree.sum() / pairs.sum(), abs=1e-12)
    influence = (agree - found.value * pairs) / (pairs.sum() / 2)
    assert found.standard_error == pytest.approx(np.sqrt((influence**2).sum()), abs=1e-12)


def test_error_of_concordance_is_that_of_leaving_each_patient_out():
    """The infinitesimal jackknife is close to the jackknife for a few hundred patients."""
    subject = random_cohort(13, 150)
    choices = [Choice("x0")]
    full = cox(subject, DIED, choices).concordance
    left_out = [cox(subject.having(np.arange(150) != i), DIED, choices).concordance.value for i in range(150)]
    jackknife = np.sqrt(149 / 150 * ((left_out - np.mean(left_out)) ** 2).sum())
    assert full.standard_error == pytest.approx(jackknife, rel=0.05)


@pytest.mark.parametrize("late", [False, True])
def test_proportional_hazards_test_is_a_score_test(late):
    """It equals the score test of x g(t) computed risk set by risk set."""
    subject = random_cohort(17, 90, late=late)
    subject = subject.having(~((subject.entry > 0) & (subject.entry == subject.exit)))
    fit = cox(subject, DIED, [Choice("x0"), Choice("x1")], ties="breslow")
    x = np.column_stack([subject.covariates[name].values for name in ("x0", "x1")])
    r = np.exp(x @ [term.coefficient for term in fit.terms])
    event = subject.outcome == 1
    survival, slopes, blocks, times = 1.0, [], [], []
    for day in np.unique(subject.exit[event]):
        at_risk = ((subject.entry < day) | (subject.entry == 0)) & (subject.exit >= day)
        mean = r[at_risk] @ x[at_risk] / r[at_risk].sum()
        spread = (x[at_risk] - mean).T @ ((x[at_risk] - mean) * r[at_risk, None]) / r[at_risk].sum()
        falling = event & (subject.exit == day)
        for i in np.flatnonzero(falling):
            times.append(1 - survival)
            slopes.append(x[i] - mean)
            blocks.append(spread)
        survival *= 1 - falling.sum() / at_risk.sum()
    g = np.array(times) - np.mean(times)
    u = g @ np.array(slopes)
    own, across, base = (np.einsum("i,ijk->jk", g**power, np.array(blocks)) for power in (2, 1, 0))
    expected = u @ np.linalg.solve(own - across @ np.linalg.solve(base, across), u)
    assert fit.proportional_global.chi_squared == pytest.approx(expected, rel=1e-6)
    alone = own[0, 0] - across[0] @ np.linalg.solve(base, across[0])
    assert fit.proportional[0].chi_squared == pytest.approx(u[0] ** 2 / alone, rel=1e-6)


def test_constant_and_repeating_covariates_are_named_and_left_out():
    subject = random_cohort(19, 60)
    x = subject.covariates["x0"].values
    extra = cohort(
        subject.exit, subject.outcome == 1, {"x0": x, "flat": np.full(60, 3.0), "twice": 2 * x + 1}
    )
    fit = cox(extra, DIED, [Choice("flat"), Choice("x0"), Choice("twice")])
    assert [(each.id, each.code) for each in fit.left_out] == [
        ("flat", "constant"),
        ("twice", "repeats_others"),
    ]
    assert [term.id for term in fit.terms] == ["x0"]


def test_patients_with_a_missing_covariate_are_counted():
    subject = random_cohort(23, 60)
    x = subject.covariates["x0"].values.copy()
    x[:5] = np.nan
    fit = cox(cohort(subject.exit, subject.outcome == 1, {"x": x}), DIED, [Choice("x")])
    assert (fit.n, fit.incomplete) == (55, 5)
    assert "covariate_missing" in [caution.code for caution in fit.cautions]


def refusal(call):
    with pytest.raises(Refusal) as caught:
        call()
    return caught.value


def test_a_level_without_outcomes_is_refused_by_name():
    group = ["a"] * 30 + ["b"] * 10
    subject = cohort(np.arange(1, 41), np.arange(40) < 30, {"g": group})
    said = refusal(lambda: cox(subject, DIED, [Choice("g", reference="a")]))
    assert (said.code, said.parameters) == ("level_without_events", {"covariate": "g", "level": "b"})
    said = refusal(lambda: cox(subject, DIED, [Choice("g", reference="b")]))
    assert said.parameters["level"] == "b"


def test_a_number_that_orders_all_outcomes_is_refused_as_separation():
    exit = np.arange(1, 41)
    said = refusal(lambda: cox(cohort(exit, np.ones(40), {"x": -exit.astype(float)}), DIED, [Choice("x")]))
    assert (said.code, said.parameters["covariate"]) == ("separation", "x")


def test_too_few_outcomes_are_refused_and_few_are_cautioned():
    subject = random_cohort(29, 40, columns=5)
    few = dataclasses.replace(subject, outcome=np.where(np.arange(40) < 12, 1, 0))
    choices = [Choice(f"x{i}") for i in range(5)]
    assert refusal(lambda: cox(few, DIED, choices)).code == "too_few_events"
    assert "few_events" in [caution.code for caution in cox(few, DIED, choices[:2]).cautions]


@pytest.mark.parametrize(
    ("choices", "code"),
    [
        ([], "no_covariates"),
        ([Choice("x0"), Choice("x0")], "covariate_twice"),
        ([Choice("nothing")], "unknown_covariate"),
        ([Choice("group", reference="z")], "unknown_level"),
        ([Choice("x0", per=0.0)], "per_not_positive"),
    ],
)
def test_bad_choices_are_refused_by_code(choices, code):
    subject = random_cohort(31, 50)
    assert refusal(lambda: cox(subject, DIED, choices)).code == code


def test_many_levels_are_refused():
    names = [f"{i:03d}" for i in range(100)]
    subject = cohort(np.arange(1, 101), np.ones(100), {"g": names})
    assert refusal(lambda: cox(subject, DIED, [Choice("g")])).code == "too_many_groups"


def test_hazard_ratio_limits_follow_the_confidence():
    subject = random_cohort(37, 100)
    widths = [
        (lambda ratio: np.log(ratio.upper / ratio.lower))(
            cox(subject, DIED, [Choice("x0")], confidence=c).terms[0].hazard_ratio
        )
        for c in (0.8, 0.95, 0.99)
    ]
    assert all(narrow < wide for narrow, wide in pairwise(widths))
