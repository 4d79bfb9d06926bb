"""Every way of leaving at once."""

import math

import numpy as np
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from vitalroll.outcomes.competing import WAYS_OF_LEAVING, as_if_others_were_censored, leaving
from vitalroll.outcomes.product_limit import product_limit
from vitalroll.outcomes.risk_table import count_risk
from vitalroll.register.cohort import MEANINGS


def test_five_patients(table_of):
    """1:A 2:B 3:censored 4:A 5:censored gives F_A = .5, F_B = .2, S = .3, and 1-KM a wrong .6 (by hand).

    F_A = 1/5 + 3/5 * 1/2; F_B = 4/5 * 1/4; 1-KM for A = 1 - 4/5 * 1/2.
    """
    table = table_of([1, 2, 3, 4, 5], ["died_of_disease", "moved_away", "+", "died_of_disease", "+"])
    result = leaving(table)
    assert result.at("died_of_disease", 5).value == pytest.approx(0.5, abs=1e-15)
    assert result.at("moved_away", 5).value == pytest.approx(0.2, abs=1e-15)
    assert result.under_care[-1] == pytest.approx(0.3, abs=1e-15)
    assert as_if_others_were_censored(table, "died_of_disease", 5) == pytest.approx(0.6)
    # Variance of F_B at day 5 by the formula: [F - F_1]^2 / (5*4) + [F - F_2]^2 / (4*3) + ..., with
    # F_1 = 0, F_2 = F_4 = 0.2: 0.04/20 + 0.8^2 * 3/4^3 - 0.
    assert result.at("moved_away", 5).standard_error == pytest.approx(math.sqrt(0.04 / 20 + 0.64 * 3 / 64))


@st.composite
def register(draw):
    n = draw(st.integers(1, 40))
    entry = np.array(draw(st.lists(st.sampled_from([0, 0, 0, 2, 6]), min_size=n, max_size=n)))
    length = np.array(draw(st.lists(st.integers(1, 12), min_size=n, max_size=n)))
    outcome = np.array(draw(st.lists(st.integers(0, len(MEANINGS) - 1), min_size=n, max_size=n)))
    return entry, entry + length, outcome


@given(register())
@settings(deadline=None)
def test_everybody_is_somewhere(rows):
    """Incidences and the share under care add up to one on every day, and stay within their limits."""
    result = leaving(count_risk(*rows))
    total = result.under_care + sum(way.incidence for way in result.ways)
    assert total == pytest.approx(np.ones(len(total)), abs=1e-12)
    for way in result.ways:
        assert np.all((way.lower >= 0) & (way.upper <= 1))
        assert np.all(way.lower <= way.incidence + 1e-12)
        assert np.all(way.incidence <= way.upper + 1e-12)
        if not result.span.restarts:
            assert np.all(np.diff(way.incidence) >= -1e-15)


@given(register())
@settings(deadline=None)
def test_one_minus_the_product_limit_is_never_smaller(rows):
    """The wrong figure is at least the right one."""
    table = count_risk(*rows)
    result = leaving(table)
    if result.span.restarts:
        return
    last = result.span.last_time
    for way in result.ways:
        wrong = as_if_others_were_censored(table, way.meaning, last)
        assert math.isnan(wrong) or wrong >= way.incidence[-1] - 1e-12


@given(register())
@settings(deadline=None)
def test_with_one_way_only_it_is_one_minus_the_product_limit(rows):
    """Estimate and error; the variance then is Greenwood's. Limits at F = 0 and F = 1 mirror survival's."""
    entry, exit, outcome = rows
    table = count_risk(entry, exit, np.minimum(outcome, 1))
    curve = product_limit(table, ("died_of_disease",))
    result = leaving(table, ways=("died_of_disease",))
    way = result.ways[0]
    assert way.incidence == pytest.approx(1 - curve.survival, abs=1e-12)
    inside = (curve.survival > 0) & (curve.survival < 1)
    # The multiplied-out variance loses some digits: its root is good to about 1e-8 near zero.
    assert way.standard_error[inside] == pytest.approx(curve.standard_error[inside], abs=1e-7)
    assert way.upper[curve.survival == 1] == pytest.approx(1 - curve.lower[curve.survival == 1], abs=1e-12)
    assert way.lower[curve.survival == 0] == pytest.approx(1 - curve.upper[curve.survival == 0], abs=1e-12)


@pytest.mark.parametrize("seed", range(4))
def test_agrees_with_a_slow_second_implementation(seed):
    """Double loops straight from the formulas of Aalen & Johansen and of Marubini & Valsecchi."""
    rng = np.random.default_rng(seed)
    n = 90
    entry = np.where(rng.random(n) < 0.3, rng.integers(1, 30, n), 0)
    exit = entry + rng.integers(1, 40, n)
    outcome = rng.integers(0, len(MEANINGS), n)
    result = leaving(count_risk(entry, exit, outcome))
    assert not result.span.restarts
    for code, way in enumerate(WAYS_OF_LEAVING, start=1):
        steps, survival, incidence = [], 1.0, 0.0
        for day in np.unique(exit):
            at_risk = int((((entry < day) | (entry == 0)) & (exit >= day)).sum())
            gone = int(((exit == day) & (outcome > 0)).sum())
            this = int(((exit == day) & (outcome == code)).sum())
            incidence += survival * this / at_risk
            steps.append((at_risk, gone, this, survival, incidence))
            survival *= 1 - gone / at_risk
            variance = 0.0
            for m, d, k, before, f in steps:
                if d < m:
                    variance += (incidence - f) ** 2 * d / (m * (m - d))
                variance += before**2 * k * (m - k) / m**3 - 2 * (incidence - f) * before * k / m**2
            found = result.at(way, int(day))
            assert found.value == pytest.approx(incidence, abs=1e-13)
            if not math.isnan(found.standard_error):
                assert found.standard_error == pytest.approx(math.sqrt(max(variance, 0)), abs=1e-9)


def test_a_way_not_taken_yet_has_an_upper_limit(table_of):
    """Ten patients, none of them lost: at most 1 - 0.025 ** (1/10) could have been (Clopper-Pearson)."""
    found = leaving(table_of([5] * 10, "+" * 10)).at("lost", 3)
    assert (found.value, found.lower) == (0, 0)
    assert found.upper == pytest.approx(1 - 0.025**0.1)


def test_nobody_left(table_of):
    """All are under care still; said."""
    result = leaving(table_of([5, 6], "++"))
    assert result.under_care.tolist() == [1, 1, 1]
    assert [c.code for c in result.cautions] == ["nobody_left"]


def test_beyond_follow_up_nothing_is_given(table_of):
    """Unless everybody has left, when it is known for ever."""
    some = leaving(table_of([5, 6], "d+"))
    assert math.isnan(some.at("died_of_disease", 7).value)
    everybody = leaving(table_of([5, 6], "dl"))
    assert everybody.at("lost", 7).value == pytest.approx(0.5)


def test_an_emptied_risk_set_starts_again(table_of):
    """Incidences start again at 0, for those who had come that far."""
    result = leaving(table_of([3, 20, 30], "dl+", entries=[0, 10, 10]))
    assert result.at("died_of_disease", 3).value == 1
    assert math.isnan(result.at("died_of_disease", 5).value)
    assert (result.at("died_of_disease", 25).value, result.at("lost", 25).value) == (0, 0.5)
    assert [c.code for c in result.cautions] == ["risk_set_emptied"]
