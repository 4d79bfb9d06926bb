"""Order, pairs, strata, other weights and crossing curves: by hand, by identity, and through the desk."""

from __future__ import annotations

import numpy as np
import pytest
from comparison_cohorts import DIED, cohort, random_cohort

from vitalroll.comparison.crossing import crossings
from vitalroll.comparison.ordered import trend_test
from vitalroll.comparison.pairwise import holm, pairwise
from vitalroll.comparison.rank_tests import rank_test, weighted_sums
from vitalroll.desk.comparison_tasks import GroupTiming
from vitalroll.desk.memory import Memory
from vitalroll.desk.rank_tasks import RankTestRequest, rank_tests
from vitalroll.errors import Refusal
from vitalroll.numbers import DAYS_PER_YEAR
from vitalroll.outcomes.risk_table import count_risk, risk_tables_by


def three_groups(seed: int, n: int = 90):
    random = np.random.default_rng(seed)
    names = list(random.choice(["a", "b", "c"], n))
    exit = random.integers(1, 40, n)
    return risk_tables_by(cohort(exit, random.random(n) < 0.6, {"group": names}), "group")


def test_weighted_sums_by_hand() -> None:
    """Days 1 (a dies of 2 a and 2 b) and 3 (b dies of 1 a and 2 b), a leaving on 4 and b on 5.

    Equal weights: U_a = (1 - 1/2) + (0 - 1/3) = 1/6, V = 1/4 + 2/9. Peto and Peto's: w = 4/5, then 4/5 * 3/4 = 3/5;
    U_a = 0.8/2 - 0.6/3 = 0.2, V = 0.64/4 + 0.36 * 2/9 = 0.24.
    """
    tables = risk_tables_by(cohort([1, 4, 3, 5], [1, 0, 1, 0], {"group": list("aabb")}), "group")
    equal = weighted_sums([tables], DIED)
    assert equal.score == pytest.approx([1 / 6, -1 / 6])
    assert equal.variance[0, 0] == pytest.approx(1 / 4 + 2 / 9)
    assert equal.expected == pytest.approx([5 / 6, 7 / 6])
    peto = rank_test([tables], DIED, weight="peto_peto")
    assert peto.chi_squared == pytest.approx(0.2**2 / 0.24)


def test_fleming_and_harrington_without_powers_is_the_log_rank_test() -> None:
    tables = three_groups(1)
    plain = rank_test([tables], DIED)
    powers = rank_test([tables], DIED, weight="fleming_harrington", rho=0, gamma=0)
    assert powers.chi_squared == pytest.approx(plain.chi_squared, rel=1e-12)


def test_trend_of_two_groups_is_the_rank_test_and_scores_matter_in_proportion_only() -> None:
    tables = risk_tables_by(random_cohort(3, 80), "group")
    plain = rank_test([tables], DIED, weight="gehan")
    trend = trend_test([tables], DIED, {"a": 7, "b": 1907}, weight="gehan")
    assert trend.chi_squared == pytest.approx(plain.chi_squared, rel=1e-9)
    three = three_groups(2)
    one = trend_test([three], DIED, {"a": 1, "b": 2, "c": 3})
    other = trend_test([three], DIED, {"a": -300, "b": -200, "c": -100})
    turned = trend_test([three], DIED, {"a": 3, "b": 2, "c": 1})
    assert other.z == pytest.approx(one.z, rel=1e-9)
    assert turned.z == pytest.approx(-one.z, rel=1e-9)


def test_trend_is_positive_where_higher_scores_have_the_outcome_sooner() -> None:
    subject = cohort(
        [30, 40, 50, 20, 25, 35, 5, 10, 15], [1] * 9, {"group": ["low"] * 3 + ["middle"] * 3 + ["high"] * 3}
    )
    tables = risk_tables_by(subject, "group")
    trend = trend_test([tables], DIED, {"low": 0, "middle": 1, "high": 2})
    assert trend.z > 2
    # No direction of the scores can give more than the test over all groups.
    assert trend.chi_squared <= rank_test([tables], DIED).chi_squared + 1e-12
    with pytest.raises(Refusal) as refused:
        trend_test([tables], DIED, {"low": 1, "middle": 1, "high": 1})
    assert refused.value.code == "scores_alike"


def test_holm_by_hand() -> None:
    """Sorted 0.01, 0.02, 0.03, 0.5 times 4, 3, 2, 1, never below the one before: 0.04, 0.06, 0.06, 0.5."""
    assert holm(np.array([0.5, 0.01, np.nan, 0.03, 0.02])) == pytest.approx(
        [0.5, 0.04, np.nan, 0.06, 0.06], nan_ok=True
    )
    assert holm(np.array([0.7, 0.8])) == pytest.approx([1.0, 1.0])
    assert len(holm(np.array([]))) == 0


def test_each_pair_is_tested_by_itself_and_untestable_pairs_are_not_counted() -> None:
    subject = cohort(
        [5, 9, 14, 30, 40, 50, 30, 40, 50], [1, 1, 1, 0, 0, 0, 0, 0, 0], {"group": list("aaabbbccc")}
    )
    tables = risk_tables_by(subject, "group")
    pairs = {(pair.first, pair.second): pair for pair in pairwise([tables], DIED)}
    alone = rank_test([{level: tables[level] for level in "ab"}], DIED)
    assert pairs["a", "b"].chi_squared == alone.chi_squared
    assert np.isnan(pairs["b", "c"].p)
    assert pairs["a", "b"].adjusted_p == pytest.approx(min(1, 2 * alone.p))


def test_a_stratum_without_comparison_changes_nothing() -> None:
    tables = three_groups(4)
    alone = risk_tables_by(cohort([3, 8], [1, 1], {"group": list("aa")}), "group")
    empty = count_risk(*(np.empty(0, dtype=np.int64) for _ in range(3)))
    only_a = {"a": alone["a"], "b": empty, "c": empty}
    assert rank_test([tables, only_a], DIED).chi_squared == pytest.approx(
        rank_test([tables], DIED).chi_squared
    )


def test_crossing_curves_are_noticed_and_others_are_not() -> None:
    """Of 100 in a, 40 die on day 100 and none later; of b, 5 on day 50 and 70 on day 400: they change places then."""
    a = ([100] * 40 + [800] * 60, [1] * 40 + [0] * 60)
    b = ([50] * 5 + [400] * 70 + [800] * 25, [1] * 75 + [0] * 25)
    tables = risk_tables_by(cohort(a[0] + b[0], a[1] + b[1], {"group": ["a"] * 100 + ["b"] * 100}), "group")
    # b is below a from day 50 to 100 by more than its error, then above until 400, then below: first change on 100.
    (said,) = crossings(tables, DIED)
    assert said.code == "curves_cross"
    assert said.parameters == {"first": "a", "second": "b", "above": "a", "years": 100 / DAYS_PER_YEAR}
    ordered = cohort(
        [100] * 40 + [800] * 60 + [100] * 10 + [800] * 90, [1] * 40 + [0] * 60 + [1] * 10 + [0] * 90,
        {"group": ["a"] * 100 + ["b"] * 100},
    )  # fmt: skip
    assert not list(crossings(risk_tables_by(ordered, "group"), DIED))


def test_a_crossing_among_the_last_few_is_not_said() -> None:
    """b is below a all along; only among the last 9 of a do curves change places."""
    a = ([800] * 91 + [900] * 9, [0] * 91 + [1] * 9)
    b = ([100] * 30 + [1000] * 70, [1] * 30 + [0] * 70)
    tables = risk_tables_by(cohort(a[0] + b[0], a[1] + b[1], {"group": ["a"] * 100 + ["b"] * 100}), "group")
    assert not list(crossings(tables, DIED))


def asked(subject, **request) -> dict:
    return rank_tests(Memory(built=subject), RankTestRequest(group="group", **request), None)


def test_the_desk_says_who_is_outside_the_strata_and_which_strata_say_nothing() -> None:
    subject = cohort(
        [5, 9, 14, 30, 7, 8, 3, 40], [1, 1, 1, 0, 1, 0, 1, 1],
        {"group": list("abababaa"), "zone": ["n", "n", "n", "n", "n", "n", "s", None]},
    )  # fmt: skip
    said = asked(subject, stratify="zone")
    codes = {caution.code: caution.parameters for caution in said["cautions"]}
    assert codes["stratum_not_recorded"] == {"n": 1}
    assert codes["strata_say_nothing"] == {"n": 1, "strata": "s"}
    north = subject.having(np.arange(8) < 6)
    assert said["chi_squared"] == pytest.approx(asked(north)["chi_squared"])
    assert said["unstratified"]["chi_squared"] == pytest.approx(asked(subject)["chi_squared"])
    assert said["chi_squared"] != pytest.approx(said["unstratified"]["chi_squared"])
    assert said["pairs"] == ()


@pytest.mark.parametrize(
    ("request_", "code"),
    [
        ({"stratify": "group"}, "stratified_by_itself"),
        ({"stratify": "x0"}, "group_is_numeric"),
        ({"scores": {"a": 1.0}}, "score_missing"),
    ],
)
def test_the_desk_refuses_what_cannot_be_meant(request_: dict, code: str) -> None:
    with pytest.raises(Refusal) as refused:
        asked(random_cohort(5, 40), **request_)
    assert refused.value.code == code


def test_groups_found_in_different_ways_are_cautioned_against_only_when_said() -> None:
    subject = random_cohort(6, 60)
    for alike, said in ((None, False), (True, False), (False, True)):
        cautions = asked(subject, timing=GroupTiming(known="start", found_alike=alike))["cautions"]
        assert ("found_differently" in [caution.code for caution in cautions]) is said
