"""The product-limit curve, its limits, and the hard cases."""

import math
from fractions import Fraction

import numpy as np
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from vitalroll.errors import Refusal
from vitalroll.outcomes.product_limit import product_limit
from vitalroll.outcomes.risk_table import count_risk

DIED = ("died_of_disease",)
Z = 1.959963984540054


@st.composite
def observed_from_the_start(draw):
    """Exits with many ties, and whether each patient died."""
    n = draw(st.integers(1, 40))
    exit = draw(st.lists(st.integers(0, 15), min_size=n, max_size=n))
    died = draw(st.lists(st.integers(0, 1), min_size=n, max_size=n))
    return np.array(exit), np.array(died)


def codes_of(caution_holder):
    return [caution.code for caution in caution_holder.cautions]


def slow_curve(entry, exit, died, day):
    """Multiply over the distinct days of death, counting patients anew, in exact fractions."""
    survival, greenwood = Fraction(1), Fraction(0)
    for t in sorted({e for e, x in zip(exit.tolist(), died, strict=True) if x and e <= day}):
        n = int(np.sum(((entry < t) | (entry == 0)) & (exit >= t)))
        d = int(np.sum((exit == t) & (died == 1)))
        survival *= Fraction(n - d, n)
        greenwood += Fraction(d, n * (n - d)) if n > d else 0
    return survival, greenwood


def test_maintained_arm_of_the_aml_trial(table_of):
    """Acute myelogenous leukaemia, maintained arm (Embury et al. 1977; Miller 1981, Survival Analysis).

    Survival as R survival prints it for its data set ``aml``; standard errors and limits on the log
    scale from memory of the same print-out, ``summary(survfit(Surv(time, status) ~ x, aml))``.
    """
    curve = product_limit(
        table_of([9, 13, 13, 18, 23, 28, 31, 34, 45, 48, 161], "dd+dd+dd+d+"), DIED, interval="log"
    )
    days = [9, 13, 18, 23, 31, 34, 48]
    found = [curve.at(day) for day in days]
    assert [round(e.value, 4) for e in found] == [0.9091, 0.8182, 0.7159, 0.6136, 0.4909, 0.3682, 0.1841]
    printed = [0.0867, 0.1163, 0.1397, 0.1526, 0.1642, 0.1627, 0.1535]
    assert [round(e.standard_error, 4) for e in found] == printed
    assert [round(e.lower, 3) for e in found] == [0.754, 0.619, 0.488, 0.377, 0.255, 0.155, 0.036]
    assert [round(e.upper, 3) for e in found] == [1.0, 1.0, 1.0, 0.999, 0.946, 0.875, 0.944]


def test_6_mercaptopurine_arm_of_the_leukaemia_trial(table_of):
    """Remission in weeks (Freireich et al. 1963 Blood 21:699; Gehan 1965 Biometrika 52:203).

    Survival and standard errors from memory of the many textbooks that print them, for example
    Cox & Oakes (1984) Analysis of Survival Data, ch. 4.
    """
    times = [6, 6, 6, 7, 10, 13, 16, 22, 23, 6, 9, 10, 11, 17, 19, 20, 25, 32, 32, 34, 35]
    curve = product_limit(table_of(times, "d" * 9 + "+" * 12), DIED)
    found = [curve.at(day) for day in (6, 7, 10, 13, 16, 22, 23)]
    assert [round(e.value, 4) for e in found] == [0.8571, 0.8067, 0.7529, 0.6902, 0.6275, 0.5378, 0.4482]
    printed = [0.0764, 0.0869, 0.0963, 0.1068, 0.1141, 0.1282, 0.1346]
    assert [round(e.standard_error, 4) for e in found] == printed


def test_five_patients_by_hand(table_of):
    """S = 4/5 then 4/5 * 2/3; Greenwood 1/20 + 1/6 at the second death."""
    curve = product_limit(table_of([1, 2, 3, 4, 5], "d+d++"), DIED)
    assert curve.time.tolist() == [0, 1, 2, 3, 4, 5]
    assert curve.at_risk.tolist() == [5, 5, 4, 3, 2, 1]
    assert curve.survival == pytest.approx([1, 0.8, 0.8, 8 / 15, 8 / 15, 8 / 15], abs=1e-15)
    error = math.sqrt(1 / 20 + 1 / 6)
    at = curve.at(3)
    assert at.standard_error == pytest.approx(8 / 15 * error, rel=1e-14)
    spread = math.exp(Z * error / -math.log(8 / 15))
    assert at.lower == pytest.approx((8 / 15) ** spread, rel=1e-13)
    assert at.upper == pytest.approx((8 / 15) ** (1 / spread), rel=1e-13)
    plain = product_limit(table_of([1, 2, 3, 4, 5], "d+d++"), DIED, interval="plain").at(3)
    assert plain.lower == pytest.approx(8 / 15 * (1 - Z * error), rel=1e-13)
    assert plain.upper == 1, "8/15 (1 + z error) = 1.02 is cut at 1"


@given(observed_from_the_start(), st.sampled_from(["log-log", "log", "plain"]))
@settings(deadline=None)
def test_bounds_and_monotonicity(rows, interval):
    """0 <= lower <= survival <= upper <= 1, and survival never rises."""
    exit, died = rows
    curve = product_limit(count_risk(np.zeros_like(exit), exit, died), DIED, interval=interval)
    assert np.all(np.diff(curve.survival) <= 0)
    assert np.all((curve.lower >= 0) & (curve.upper <= 1))
    assert np.all(curve.lower <= curve.survival + 1e-12)
    assert np.all(curve.survival <= curve.upper + 1e-12)
    assert curve.events + curve.censored == curve.n


@given(observed_from_the_start())
@settings(deadline=None)
def test_without_censoring_it_is_the_share_still_alive(rows):
    """The product telescopes, and Greenwood's error becomes the binomial one."""
    exit, _ = rows
    curve = product_limit(count_risk(np.zeros_like(exit), exit, np.ones_like(exit)), DIED)
    alive = np.array([(exit > day).mean() for day in curve.time[1:]])
    assert curve.survival[1:] == pytest.approx(alive, abs=1e-12)
    some = alive > 0
    binomial = np.sqrt(alive * (1 - alive) / len(exit))
    assert curve.standard_error[1:][some] == pytest.approx(binomial[some], abs=1e-12)


@pytest.mark.parametrize("seed", range(6))
def test_agrees_with_a_slow_second_implementation(seed):
    """Ties, delayed entry and exact fractions; patients counted anew on every day."""
    rng = np.random.default_rng(seed)
    n = 120
    # Enough patients from the start that the risk set never empties.
    entry = np.where(rng.random(n) < 0.4, rng.integers(1, 60, n), 0)
    exit = entry + rng.integers(1, 80, n)
    died = (rng.random(n) < 0.5).astype(int)
    curve = product_limit(count_risk(entry, exit, died), DIED)
    assert curve.span.restarts == ()
    for day in (0, 5, 17, 40.5, 66, int(exit.max()) - 1):
        survival, greenwood = slow_curve(entry, exit, died, day)
        found = curve.at(day)
        # Round-off of a product of some 60 factors.
        assert found.value == pytest.approx(float(survival), abs=1e-13)
        if survival:
            expected = float(survival) * math.sqrt(greenwood)
            assert found.standard_error == pytest.approx(expected, abs=1e-13)


@given(observed_from_the_start())
@settings(deadline=None)
def test_splitting_follow_up_changes_nothing(rows):
    """Cutting patients in two, even a lone one, leaves estimate and error as they were."""
    exit, died = rows
    zero = np.zeros_like(exit)
    middle = exit // 2
    split = middle > 0
    whole = product_limit(count_risk(zero, exit, died), DIED)
    parts = product_limit(
        count_risk(
            np.concatenate((zero, middle[split])),
            np.concatenate((np.where(split, middle, exit), exit[split])),
            np.concatenate((np.where(split, 0, died), died[split])),
        ),
        DIED,
    )
    assert parts.span.restarts == ()
    for day in range(int(exit.max()) + 1):
        assert parts.at(day).value == pytest.approx(whole.at(day).value, abs=1e-13)
        assert parts.at(day).lower == pytest.approx(whole.at(day).lower, abs=1e-9)
        assert parts.at(day).upper == pytest.approx(whole.at(day).upper, abs=1e-9)


def test_no_events_has_the_exact_limit(table_of):
    """Ten patients and no death: 0.025 ** (1/10) = 0.6915, Clopper & Pearson's limit for 10 of 10.

    As patients are censored fewer support the same statement: (a/2)^(1/n) of those who remain.
    """
    curve = product_limit(table_of([5] * 6 + [9] * 4, "+" * 10), DIED)
    assert curve.survival.tolist() == [1, 1, 1]
    assert curve.upper.tolist() == [1, 1, 1]
    assert curve.lower == pytest.approx([0.691503, 0.025**0.25, 0.025**0.25], abs=1e-6)
    assert codes_of(curve) == ["no_events"]


def test_everybody_dead_has_the_exact_limit(table_of):
    """All ten died: the upper limit is Clopper & Pearson's for 0 of 10, 1 - 0.025 ** (1/10) = 0.3085."""
    last = product_limit(table_of(range(1, 11), "d" * 10), DIED).at(10)
    assert (last.value, last.lower) == (0, 0)
    assert last.upper == pytest.approx(1 - 0.025**0.1, abs=1e-9)
    assert math.isnan(last.standard_error)


def test_a_last_death_with_one_at_risk_is_said(table_of):
    """The curve falls to 0 because of one patient; its upper limit stays far from 0."""
    curve = product_limit(table_of([2, 3, 4, 5], "d++d"), DIED)
    assert codes_of(curve) == ["last_at_risk_had_event"]
    assert curve.at(5).value == 0
    assert curve.at(99).value == 0, "a curve that has come down to 0 stays there"
    # The product of Beta(4, 1) and Beta(1, 1) is below w with probability (4 w - w^4) / 3. The beta
    # variable with its mean and variance differs from it by half a percent in the tail.
    upper = curve.at(5).upper
    assert (4 * upper - upper**4) / 3 == pytest.approx(0.975, abs=0.005)


def test_a_last_observation_censored_does_not_drop_to_zero(table_of):
    """And beyond it nothing is given."""
    curve = product_limit(table_of([2, 4], "d+"), DIED)
    assert curve.at(4).value == 0.5
    assert not curve.span.speaks_of(5)
    assert math.isnan(curve.at(5).value)


def test_all_events_on_day_zero(table_of):
    """The curve starts at 1 and drops on the day it starts; that is said."""
    curve = product_limit(table_of([0, 0, 7, 8], "dd++"), DIED)
    assert curve.time[:2].tolist() == [0, 0]
    assert curve.survival[:2].tolist() == [1, 0.5]
    assert codes_of(curve) == ["all_events_on_day_zero"]


def test_one_patient(table_of):
    """One patient alone can be put through; that it is not shown is decided where groups are made."""
    curve = product_limit(table_of([3], "d"), DIED)
    assert curve.survival.tolist() == [1, 0]
    assert curve.at(3).upper == pytest.approx(0.975, abs=1e-9), "Clopper & Pearson, 0 of 1"


def test_an_emptied_risk_set_starts_the_curve_again(table_of):
    """One early patient died; without a new start the curve would be 0 for all who came later."""
    curve = product_limit(table_of([3, 20, 30, 40], "dd+d", entries=[0, 10, 10, 10]), DIED)
    assert [(r.emptied, r.day) for r in curve.span.restarts] == [(3, 10)]
    assert curve.time.tolist() == [0, 3, 10, 20, 30, 40]
    assert curve.survival == pytest.approx([1, 0, 1, 2 / 3, 2 / 3, 0])
    assert math.isnan(curve.at(7).value), "nobody was under observation"
    assert curve.at(25).value == pytest.approx(2 / 3)
    assert (curve.span.since(25), curve.span.since(2)) == (10, 0)
    caution = curve.cautions[0]
    assert caution.code == "risk_set_emptied"
    assert caution.parameters == {"times": 1, "emptied_days": 3, "restart_days": 10}


def test_everyone_dead_on_the_day_others_come(table_of):
    """Survival would be 0 for ever: the curve starts again with those who came that day."""
    curve = product_limit(table_of([3, 9, 9], "dd+", entries=[0, 3, 3]), DIED)
    assert curve.time.tolist() == [0, 3, 3, 9]
    assert curve.survival == pytest.approx([1, 0, 1, 0.5])


def test_nobody_from_the_start(table_of):
    """The curve begins where observation began, and says so."""
    curve = product_limit(table_of([20, 30, 40], "d+d", entries=[10, 12, 10]), DIED)
    assert (curve.time[0], curve.at_risk[0], curve.span.begins) == (10, 2, 10)
    assert math.isnan(curve.at(9).value)
    assert codes_of(curve)[0] == "begins_late"


def test_late_comers_do_not_tighten_the_exact_limit(table_of):
    """Two were at risk early on, so a death then could easily have been missed, however many came later."""
    curve = product_limit(table_of([9] * 52, "+" * 52, entries=[0, 0] + [5] * 50), DIED)
    assert curve.lower == pytest.approx([0.025**0.5] * len(curve.lower))


def test_counts_too_great_for_32_bits(table_of):
    """One death among 70,000: n (n - d) is 4.9e9, which 32 bits, as in WebAssembly, cannot hold."""
    found = product_limit(table_of([1] + [9] * 69_999, ["d"] + ["+"] * 69_999), DIED).at(1)
    assert found.value == pytest.approx(69_999 / 70_000, rel=1e-15)
    assert found.standard_error == pytest.approx(math.sqrt(69_999) / 70_000**1.5, rel=1e-12)


def test_never_at_risk_is_said(table_of):
    """Delayed entry and exit on one day: no time at risk."""
    curve = product_limit(table_of([4, 4, 6], "dd+", entries=[4, 0, 0]), DIED)
    assert "never_at_risk" in codes_of(curve)


@pytest.mark.parametrize(
    ("options", "code"),
    [
        ({"confidence": 95.0}, "out_of_range"),
        ({"confidence": 1.0}, "out_of_range"),
        ({"interval": "x"}, "not_one_of"),
    ],
)
def test_options_that_make_no_sense_are_refused(table_of, options, code):
    """With the code and the field."""
    with pytest.raises(Refusal) as refused:
        product_limit(table_of([1, 2], "d+"), DIED, **options)
    assert (refused.value.code, refused.value.field) == (code, next(iter(options)))


def test_nobody_is_refused(table_of):
    """There is no curve of no patients."""
    with pytest.raises(Refusal) as refused:
        product_limit(table_of([], ""), DIED)
    assert refused.value.code == "no_patients"
