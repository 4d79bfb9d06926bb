"""2x2 tables, strata, interval tables and rank tests: by hand, by identities, by slow second counts."""

from __future__ import annotations

from itertools import permutations
from math import comb, log, sqrt

import numpy as np
import pytest
from comparison_cohorts import DIED, cohort, random_cohort
from hypothesis import given
from hypothesis import strategies as st

from vitalroll.comparison.intervals import compare_intervals
from vitalroll.comparison.milestone import milestone_difference
from vitalroll.comparison.rank_tests import rank_test
from vitalroll.comparison.stratified import stratified
from vitalroll.comparison.two_by_two import TwoByTwo, exact, measures
from vitalroll.errors import Refusal
from vitalroll.outcomes.product_limit import product_limit
from vitalroll.outcomes.risk_table import count_risk, risk_table, risk_tables_by

Z = 1.959963984540054


def test_a_table_by_hand():
    """15 of 100 against 5 of 100: risk ratio 3, odds ratio 3.353, difference 0.10, one in ten."""
    said = measures(TwoByTwo(15, 100, 5, 100))
    assert said.risk_ratio.value == pytest.approx(3)
    assert said.odds_ratio.value == pytest.approx(15 * 95 / (5 * 85))
    assert said.risk_difference.value == pytest.approx(0.1)
    assert said.number_needed == pytest.approx(10)
    assert log(said.risk_ratio.upper / 3) == pytest.approx(Z * sqrt(1 / 15 - 1 / 100 + 1 / 5 - 1 / 100))
    assert log(said.odds_ratio.upper / said.odds_ratio.value) == pytest.approx(
        Z * sqrt(1 / 15 + 1 / 85 + 1 / 5 + 1 / 95)
    )


def test_newcombe_published_example():
    """56/70 against 48/80: difference 0.2, 0.0524 to 0.3339 (Newcombe 1998, Table II, method 10)."""
    difference = measures(TwoByTwo(56, 70, 48, 80)).risk_difference
    assert (round(difference.lower, 4), round(difference.upper, 4)) == (0.0524, 0.3339)


def test_wilson_published_example():
    """81 of 263: 0.2553 to 0.3662 (Newcombe 1998 Stat Med 17:857-872, Table I)."""
    risk = measures(TwoByTwo(81, 263, 1, 2)).exposed_risk
    assert (round(risk.lower, 4), round(risk.upper, 4)) == (0.2553, 0.3662)


def test_empty_cells_give_no_limits_and_no_error():
    said = measures(TwoByTwo(0, 10, 3, 10))
    assert said.risk_ratio.value == 0
    assert np.isnan(said.risk_ratio.lower)
    assert np.isnan(said.odds_ratio.upper)
    assert said.exposed_risk.lower == 0


def test_tea_tasting_exact():
    """3 of 4 against 1 of 4 (Fisher 1935): two-sided p = 34/70."""
    said = exact(TwoByTwo(3, 4, 1, 4))
    assert said.p == pytest.approx(34 / 70)
    # Upper tail 17/70, of which the observed table is 16/70.
    assert said.mid_p == pytest.approx(2 * (1 / 70 + 8 / 70))


@given(st.integers(1, 15), st.integers(1, 15), st.data())
def test_exact_limits_give_back_their_tails(n1, n0, data):
    """At the lower limit the chance of as many or more exposed outcomes is 2.5 %."""
    a, c = data.draw(st.integers(0, n1)), data.draw(st.integers(0, n0))
    m = a + c
    said = exact(TwoByTwo(a, n1, c, n0))
    support = range(max(0, m - n0), min(n1, m) + 1)

    def tail(odds_ratio, upward):
        weights = {k: comb(n1, k) * comb(n0, m - k) * odds_ratio**k for k in support}
        return sum(w for k, w in weights.items() if (k >= a if upward else k <= a)) / sum(weights.values())

    if a > support[0]:
        assert tail(said.odds_ratio.lower, upward=True) == pytest.approx(0.025, rel=1e-9)
    else:
        assert said.odds_ratio.lower == 0
    if a < support[-1]:
        assert tail(said.odds_ratio.upper, upward=False) == pytest.approx(0.025, rel=1e-9)
    else:
        assert said.odds_ratio.upper == np.inf
    assert 0 < said.p <= 1
    assert 0 < said.mid_p <= 1


def test_fractional_totals_get_no_exact_test():
    with pytest.raises(Refusal) as caught:
        exact(TwoByTwo(3, 10.5, 1, 9))
    assert caught.value.code == "exact_needs_whole_numbers"


@pytest.mark.parametrize(
    ("numbers", "code"), [((-1, 10, 1, 10), "negative_count"), ((11, 10, 1, 10), "more_events_than_patients")]
)
def test_impossible_tables_are_refused(numbers, code):
    with pytest.raises(Refusal) as caught:
        TwoByTwo(*numbers)
    assert caught.value.code == code


def test_one_stratum_equals_crude():
    table = TwoByTwo(15, 100, 5, 100)
    pooled, crude = stratified([table]).pooled, measures(table)
    assert pooled.risk_ratio.value == pytest.approx(crude.risk_ratio.value)
    assert pooled.odds_ratio.value == pytest.approx(crude.odds_ratio.value)
    assert pooled.risk_difference.value == pytest.approx(crude.risk_difference.value)
    # With one stratum both variance formulas are the crude ones.
    assert pooled.odds_ratio.standard_error == pytest.approx(crude.odds_ratio.standard_error)
    assert pooled.risk_ratio.standard_error == pytest.approx(crude.risk_ratio.standard_error)


def test_confounding_by_severity_disappears_in_strata():
    """Crude the treated die more; within each severity they die half as often."""
    strata = [TwoByTwo(1, 20, 8, 80), TwoByTwo(20, 80, 10, 20)]
    pooled = stratified(strata).pooled
    crude = measures(TwoByTwo(21, 100, 18, 100))
    assert crude.risk_ratio.value > 1
    assert pooled.risk_ratio.value == pytest.approx(0.5)


def test_breslow_day_fitted_counts_keep_margins_and_odds_ratio():
    """The statistic with Tarone's term, computed by solving for the fitted table by bisection."""
    strata = [(10, 40, 5, 50), (20, 60, 30, 70), (3, 20, 9, 25)]
    said = stratified([TwoByTwo(*each) for each in strata])
    odds_ratio = said.pooled.odds_ratio.value
    chi = extra = spread = 0.0
    for a, n1, c, n0 in strata:
        low, high = max(0, a + c - n0), min(n1, a + c)
        for _ in range(200):
            x = (low + high) / 2
            at = x * (n0 - a - c + x) / ((a + c - x) * (n1 - x))
            low, high = (x, high) if at < odds_ratio else (low, x)
        variance = 1 / (1 / x + 1 / (a + c - x) + 1 / (n1 - x) + 1 / (n0 - a - c + x))
        chi += (a - x) ** 2 / variance
        extra += a - x
        spread += variance
    test = said.homogeneity.breslow_day_tarone
    assert test.df == 2
    assert test.chi_squared == pytest.approx(chi - extra**2 / spread, rel=1e-8)


def test_strata_that_cannot_contribute_are_named():
    strata = [TwoByTwo(1, 10, 3, 10), TwoByTwo(2, 10, 0, 0), TwoByTwo(0, 10, 0, 10), TwoByTwo(5, 5, 5, 5)]
    said = stratified(strata)
    assert [(each.stratum, each.code) for each in said.left_out] == [
        (1, "empty_group"),
        (2, "no_events"),
        (3, "all_events"),
    ]
    # Those without outcomes still count in the difference.
    assert said.pooled.risk_difference.value == pytest.approx(-2 / 10 * 5 / (5 + 5 + 2.5))


def test_differing_strata_are_cautioned_and_halves_are_said():
    codes = [
        caution.code for caution in stratified([TwoByTwo(40, 50, 10, 50), TwoByTwo(10, 50, 40, 50)]).cautions
    ]
    assert codes == ["strata_differ"]
    codes = [
        caution.code for caution in stratified([TwoByTwo(0, 50, 10, 50), TwoByTwo(10, 50, 20, 50)]).cautions
    ]
    assert "half_added" in codes


def test_no_usable_stratum_is_refused():
    for strata, code in (([], "no_strata"), ([TwoByTwo(1, 10, 0, 0)], "no_usable_strata")):
        with pytest.raises(Refusal) as caught:
            stratified(strata)
        assert caught.value.code == code


def test_intervals_without_losses_are_plain_tables():
    """Everybody followed for two years or dead: the effective numbers are those who began the year."""
    died = count_risk(np.zeros(10, int), np.array([100, 200, 500] + [731] * 7), np.array([1, 1, 1] + [0] * 7))
    other = count_risk(np.zeros(10, int), np.array([400] + [731] * 9), np.array([1] + [0] * 9))
    said = compare_intervals(died, other, DIED, intervals=2)
    assert [(row.exposed.effective, row.exposed.events) for row in said.rows] == [(10, 2), (8, 1)]
    assert [(row.reference.effective, row.reference.events) for row in said.rows] == [(10, 0), (10, 1)]
    by_hand = stratified([TwoByTwo(2, 10, 0, 10), TwoByTwo(1, 8, 1, 10)])
    assert said.pooled.pooled == by_hand.pooled


def slow_log_rank(subject, weight):
    """Patient by patient, day by day."""
    group = subject.covariates["group"].codes
    event = subject.outcome == 1
    k = group.max() + 1
    u, v, s = np.zeros(k), np.zeros((k, k)), 1.0
    for day in np.unique(subject.exit[event]):
        at_risk = ((subject.entry < day) | (subject.entry == 0)) & (subject.exit >= day)
        n = at_risk.sum()
        d = (event & (subject.exit == day)).sum()
        w = {"log_rank": 1, "gehan": n, "tarone_ware": sqrt(n), "fleming_harrington": s}[weight]
        share = np.array([(at_risk & (group == g)).sum() for g in range(k)]) / n
        u += w * (
            np.array([(event & (subject.exit == day) & (group == g)).sum() for g in range(k)]) - d * share
        )
        if n > 1:
            v += w**2 * d * (n - d) / (n - 1) * (np.diag(share) - np.outer(share, share))
        s *= 1 - d / n
    return u[:-1] @ np.linalg.solve(v[:-1, :-1], u[:-1])


@pytest.mark.parametrize("weight", ["log_rank", "gehan", "tarone_ware", "fleming_harrington"])
@pytest.mark.parametrize("late", [False, True])
def test_rank_tests_agree_with_the_slow_count(late, weight):
    subject = random_cohort(41, 80, late=late)
    subject = subject.having(~((subject.entry > 0) & (subject.entry == subject.exit)))
    said = rank_test([risk_tables_by(subject, "group")], DIED, weight=weight)
    assert said.chi_squared == pytest.approx(slow_log_rank(subject, weight), rel=1e-10)
    assert sum(group.observed for group in said.groups) == pytest.approx(
        sum(group.expected for group in said.groups)
    )


def test_the_order_of_groups_does_not_matter():
    subject = random_cohort(43, 90)
    thirds = ["abc"[i % 3] for i in range(90)]
    three = cohort(subject.exit, subject.outcome == 1, {"group": thirds})
    tables = risk_tables_by(three, "group")
    answers = {
        round(rank_test([{name: tables[name] for name in order}], DIED).chi_squared, 10)
        for order in permutations("abc")
    }
    assert len(answers) == 1


def test_one_stratum_equals_unstratified_and_doubling_strata_doubles():
    tables = risk_tables_by(random_cohort(47, 60), "group")
    one = rank_test([tables], DIED)
    two = rank_test([tables, tables], DIED)
    # Scores add and variances add: twice the score over twice the variance is twice the chi-squared.
    assert two.chi_squared == pytest.approx(2 * one.chi_squared)


@pytest.mark.parametrize(
    ("exit", "event", "group", "code"),
    [
        ([1, 2, 3, 4], [0, 0, 0, 0], "abab", "no_events_to_compare"),
        ([1, 2, 3, 4], [1, 1, 1, 1], "aaaa", "one_group"),
    ],
)
def test_rank_tests_without_anything_to_compare_are_refused(exit, event, group, code):
    subject = cohort(exit, event, {"group": list(group)})
    with pytest.raises(Refusal) as caught:
        rank_test([risk_tables_by(subject, "group")], DIED)
    assert caught.value.code == code


def test_milestone_difference_by_hand():
    """4 of 10 dead by a year against 2 of 10, nobody lost: Greenwood is the binomial variance."""
    year = 365
    first = count_risk(np.zeros(10, int), np.array([100] * 4 + [2 * year] * 6), np.array([1] * 4 + [0] * 6))
    second = count_risk(np.zeros(10, int), np.array([100] * 2 + [2 * year] * 8), np.array([1] * 2 + [0] * 8))
    said = milestone_difference(product_limit(first, DIED), product_limit(second, DIED), 1.0)
    error = sqrt(0.6 * 0.4 / 10 + 0.8 * 0.2 / 10)
    assert said.difference.value == pytest.approx(-0.2)
    assert said.difference.upper == pytest.approx(-0.2 + Z * error)
    beyond = milestone_difference(product_limit(first, DIED), product_limit(second, DIED), 3.0)
    assert beyond.beyond_follow_up
    assert np.isnan(beyond.difference.value)


def test_a_table_of_everyone_is_the_sum_of_the_groups():
    subject = random_cohort(53, 50)
    tables = risk_tables_by(subject, "group")
    assert risk_table(subject).n == sum(table.n for table in tables.values())
