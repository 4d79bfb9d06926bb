"""Fine & Gray's model: identities, and a slow direct version with its weights written out."""

from __future__ import annotations

import numpy as np
import pytest
from comparison_cohorts import DIED, random_cohort

from vitalroll.comparison.cox import cox
from vitalroll.comparison.design import Choice
from vitalroll.comparison.subdistribution import fine_gray
from vitalroll.errors import Refusal
from vitalroll.register.cohort import Cohort, meaning_code

OTHER = ("died_of_other_cause",)
CHOICES = [Choice("x0"), Choice("x1")]


def with_competing(seed: int, n: int, *, late: bool = False) -> Cohort:
    """Of those who did not have the outcome, about half left in another way instead."""
    subject = random_cohort(seed, n, late=late)
    subject = subject.having(~((subject.entry > 0) & (subject.entry == subject.exit)))
    instead = (subject.outcome == 0) & (np.random.default_rng(seed).random(len(subject)) < 0.5)
    outcome = np.where(instead, meaning_code("died_of_other_cause"), subject.outcome)
    return Cohort(
        entry=subject.entry, exit=subject.exit, outcome=outcome, start=subject.start, line=subject.line,
        closing=subject.closing, covariates=subject.covariates,
    )  # fmt: skip


@pytest.mark.parametrize("late", [False, True])
def test_without_competing_outcomes_it_is_cox(late: bool) -> None:
    """Coefficients equal Cox's with Breslow's rule when nothing rules the outcome out."""
    subject = random_cohort(5, 200, late=late)
    ours, theirs = fine_gray(subject, DIED, OTHER, CHOICES), cox(subject, DIED, CHOICES, ties="breslow")
    for one, other in zip(ours.terms, theirs.terms, strict=True):
        assert one.coefficient == pytest.approx(other.coefficient, abs=1e-12)
        # A sandwich and an inverse information estimate the same error.
        assert one.standard_error == pytest.approx(other.standard_error, rel=0.25)
    assert [caution.code for caution in ours.cautions] == ["no_competing"]


def slow_score(subject: Cohort, b: np.ndarray) -> np.ndarray:
    """The weighted score, patient by patient and day by day, for follow-up observed from the start."""
    x = np.column_stack([subject.covariates[name].values for name in ("x0", "x1")])
    event, other = subject.outcome == 1, subject.outcome == meaning_code("died_of_other_cause")
    censored = subject.outcome == 0

    def uncensored(day: int) -> float:
        """The chance of not being censored before a day; outcomes come before censorings."""
        kept = 1.0
        for end in np.unique(subject.exit[censored]):
            if end < day:
                here = censored & (subject.exit == end)
                kept *= 1 - here.sum() / ((subject.exit > end) | here).sum()
        return kept

    total = np.zeros(2)
    for day in np.unique(subject.exit[event]):
        weight = np.where(subject.exit >= day, 1.0, 0.0)
        for i in np.flatnonzero(other & (subject.exit < day)):
            weight[i] = uncensored(day) / uncensored(subject.exit[i])
        r = weight * np.exp(x @ b)
        falling = event & (subject.exit == day)
        total += x[falling].sum(axis=0) - falling.sum() * (r @ x) / r.sum()
    return total


def test_the_weighted_score_is_zero_at_the_fit() -> None:
    subject = with_competing(8, 90)
    fit = fine_gray(subject, DIED, OTHER, CHOICES)
    b = np.array([term.coefficient for term in fit.terms])
    assert slow_score(subject, b) == pytest.approx([0, 0], abs=1e-9)
    assert np.abs(slow_score(subject, b + 0.1)).max() > 0.1


def test_standard_errors_are_close_to_the_jackknife() -> None:
    subject = with_competing(13, 160)
    fit = fine_gray(subject, DIED, OTHER, CHOICES)
    left_out = np.array([
        [term.coefficient for term in fine_gray(subject.having(np.arange(len(subject)) != i), DIED, OTHER, CHOICES).terms]
        for i in range(len(subject))
    ])  # fmt: skip
    n = len(subject)
    jackknife = np.sqrt((n - 1) / n * ((left_out - left_out.mean(axis=0)) ** 2).sum(axis=0))
    assert [term.standard_error for term in fit.terms] == pytest.approx(jackknife, rel=0.08)


def test_splitting_nothing_changes_with_the_order_of_rows() -> None:
    subject = with_competing(3, 120, late=True)
    shuffled = subject.having(np.random.default_rng(0).permutation(len(subject)))
    one, two = fine_gray(subject, DIED, OTHER, CHOICES), fine_gray(shuffled, DIED, OTHER, CHOICES)
    assert [term.coefficient for term in one.terms] == pytest.approx(
        [term.coefficient for term in two.terms], abs=1e-10
    )
    assert [term.standard_error for term in one.terms] == pytest.approx(
        [term.standard_error for term in two.terms], abs=1e-10
    )


def test_an_outcome_cannot_rule_itself_out() -> None:
    with pytest.raises(Refusal) as refused:
        fine_gray(with_competing(1, 50), DIED, DIED, CHOICES)
    assert refused.value.code == "competing_is_interest"
