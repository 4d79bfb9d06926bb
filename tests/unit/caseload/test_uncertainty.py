"""Drawn courses of the caseload."""

from __future__ import annotations

import math

import numpy as np
import pytest
from caseload_cases import DEATH, LOST, known_hazards
from hypothesis import given, settings
from hypothesis import strategies as st

from vitalroll.caseload.inflow import Inflow, inflow_typed
from vitalroll.caseload.projection import project, yearly_sums
from vitalroll.caseload.retention import Retention
from vitalroll.caseload.scenario import WhatIf
from vitalroll.caseload.uncertainty import bands, drawn_arrivals, drawn_hazards, redraw
from vitalroll.errors import Refusal
from vitalroll.numbers import Estimate
from vitalroll.outcomes.competing import WAYS_OF_LEAVING

HAZARDS = known_hazards(
    {"died_of_disease": 0.2, "lost": 0.4, "recovered": 0.1}, {"died_of_disease": 0.1, "lost": 0.1}
)
TODAY = np.arange(400) % 40
CHANGE = WhatIf(fewer_newcomers=30, fewer_lost=60, fewer_deaths=20, from_year=2)


def _history(mean: float, spread: float, years: int) -> Inflow:
    estimate = Estimate(mean, math.nan, math.nan)
    model = "negative_binomial" if spread > 1 else "poisson"
    return Inflow((), estimate, spread, model, years, float(years))


def _apart(drawn: np.ndarray, expected: np.ndarray) -> float:
    """Return the largest distance of the draws' means from what is expected, in standard errors."""
    error = np.maximum(drawn.std(axis=0, ddof=1), 1e-9) / math.sqrt(len(drawn))
    return float(np.max(np.abs(drawn.mean(axis=0) - expected) / error))


percentages = st.floats(0, 100)


@settings(max_examples=25, deadline=None)
@given(
    st.lists(st.lists(st.integers(0, 30), min_size=7, max_size=7).map(np.array), min_size=1, max_size=4),
    st.lists(st.integers(0, 80), min_size=1, max_size=40),
    st.floats(0, 90),
    st.builds(WhatIf, percentages, percentages, percentages, st.integers(1, 3)),
    st.integers(0, 2**32),
)
def test_every_patient_is_somewhere_in_every_draw_with_and_without_the_change(
    exits, today, newcomers, what_if, seed
):
    n = len(exits)
    hazards = Retention(np.arange(n + 1.0), np.zeros(n, int), np.full(n, 60.0), np.array(exits), 0, 0)
    drawn = redraw(
        np.array(today),
        hazards,
        inflow_typed(newcomers, days_at_arrival=(0, 0, 200)),
        years=3,
        what_if=what_if,
        draws=5,
        seed=seed,
    )
    for course in (drawn.baseline, drawn.what_if):
        flow = course.newcomers.sum(axis=1) - course.leaving.sum(axis=(1, 2))
        np.testing.assert_array_equal(course.under_care[:, 0] + flow, course.under_care[:, -1])
        assert course.under_care.min() >= 0
        assert course.leaving.min() >= 0
    before = 12 * (what_if.from_year - 1) + 1
    np.testing.assert_array_equal(drawn.what_if.under_care[:, :before], drawn.baseline.under_care[:, :before])


def test_draws_with_known_rates_are_centred_on_what_is_expected():
    late = np.array([0, 0, 100, 500])
    inflow = inflow_typed(90.0, days_at_arrival=late)
    drawn = redraw(TODAY, HAZARDS, inflow, years=3, what_if=CHANGE, draws=2000, seed=5)
    for course, what_if in ((drawn.baseline, None), (drawn.what_if, CHANGE)):
        path = project(TODAY, HAZARDS, 90.0, years=3, days_at_arrival=late, what_if=what_if)
        # Some 36 correlated months and 7 x 3 exits: 4.5 standard errors are far out for any of them.
        assert _apart(course.under_care, path.under_care) < 4.5
        assert _apart(course.newcomers, yearly_sums(path.newcomers)) < 4.5
        leaving = yearly_sums(path.leaving.T).T
        assert _apart(course.leaving.reshape(2000, -1), leaving.ravel()) < 4.5


def test_the_what_if_varies_as_a_register_with_those_hazards_would():
    """Drawn on top of the baseline or on its own: the same mean and the same spread."""
    change = WhatIf(fewer_newcomers=30, fewer_lost=60, fewer_deaths=20)
    coupled = redraw(TODAY, HAZARDS, inflow_typed(90.0), years=3, what_if=change, draws=3000, seed=6)
    kept = Retention(
        HAZARDS.edges, HAZARDS.at_risk, HAZARDS.person_years, HAZARDS.exits * change.hazards_kept, 0, 0
    )
    alone = redraw(TODAY, kept, inflow_typed(63.0), years=3, draws=3000, seed=7)
    for mine, other in (
        (coupled.what_if.under_care[:, -1], alone.baseline.under_care[:, -1]),
        (coupled.what_if.leaving[:, 2, LOST], alone.baseline.leaving[:, 2, LOST]),
        (coupled.what_if.leaving[:, 2, DEATH], alone.baseline.leaving[:, 2, DEATH]),
    ):
        pooled = math.sqrt((mine.var() + other.var()) / 3000)
        assert abs(mine.mean() - other.mean()) < 4 * pooled
        # The ratio of two sample variances of 3000 has a standard error of sqrt(4/3000) = 0.037.
        assert abs(math.log(mine.var() / other.var())) < 4 * 0.037


def test_who_is_kept_may_still_leave_in_the_same_month():
    # Half a hazard of 12 a year is kept: exp(-0.5) stay through a month, newcomers (1 - exp(-0.5))/0.5.
    drawn = redraw(
        np.full(500, 300),
        known_hazards({"lost": 12.0}),
        inflow_typed(6000.0),
        years=1,
        what_if=WhatIf(fewer_lost=50),
        draws=2000,
    )
    expected = 500 * math.exp(-0.5) + 500 * (1 - math.exp(-0.5)) / 0.5
    assert _apart(drawn.what_if.under_care[:, 1:2], np.array([expected])) < 4


def test_chance_alone_spreads_as_the_binomial_and_the_poisson():
    # Nobody new, everyone long here, hazard 0.1: Binomial(400, exp(-0.1)) after a year.
    stay = math.exp(-0.1)
    drawn = redraw(np.full(400, 300), known_hazards({"lost": 0.1}), inflow_typed(0.0), years=1, draws=4000)
    spread = drawn.baseline.under_care[:, -1].var()
    assert spread == pytest.approx(400 * stay * (1 - stay), rel=4 * math.sqrt(2 / 4000))
    # Nobody leaves, newcomers typed: Poisson.
    drawn = redraw(np.full(400, 300), known_hazards({}), inflow_typed(50.0), years=1, draws=4000)
    assert drawn.baseline.newcomers.var() == pytest.approx(50, rel=4 * math.sqrt(2 / 4000))


def test_overdispersed_newcomers_vary_by_their_dispersion():
    # Rate all but certain (a million years of history): variance of a year = dispersion x mean.
    drawn = redraw(np.array([1]), known_hazards({}), _history(100.0, 3.0, 10**6), years=2, draws=4000)
    assert drawn.baseline.newcomers.mean() == pytest.approx(100, abs=4 * math.sqrt(300 / 8000))
    # A negative binomial's variance is estimated a little less surely than a normal's.
    assert drawn.baseline.newcomers.var() == pytest.approx(300, rel=5 * math.sqrt(2 / 8000))


def test_the_rate_of_newcomers_is_as_uncertain_as_its_history():
    random = np.random.default_rng(1)
    drawn = 12 * drawn_arrivals(_history(40.0, 1.0, 4), 20_000, 3, random)
    assert np.all(drawn[:, 0] == drawn[:, 2])  # one rate for all years of a draw
    # Gamma(160, 1/4): mean 40, variance 10.
    assert drawn[:, 0].mean() == pytest.approx(40, abs=4 * math.sqrt(10 / 20_000))
    assert drawn[:, 0].var() == pytest.approx(10, rel=0.05)
    assert np.all(drawn_arrivals(inflow_typed(40.0), 5, 3, random) == 40 / 12)


def test_hazards_are_drawn_around_the_observed_rate():
    exits = np.zeros((2, len(WAYS_OF_LEAVING)), dtype=int)
    exits[0, [DEATH, LOST]] = 12, 4
    hazards = Retention(np.arange(3.0), np.zeros(2, int), np.array([80.0, 60.0]), exits, 0, 0)
    drawn = drawn_hazards(hazards, 20_000, np.random.default_rng(2))
    assert drawn[:, 0, DEATH].mean() == pytest.approx(12 / 80, abs=4 * math.sqrt(12 / 80**2 / 20_000))
    assert drawn[:, 0, LOST].var() == pytest.approx(4 / 80**2, rel=0.1)
    # Never seen in a stretch where others left: never drawn there.
    assert np.all(drawn[:, 0, WAYS_OF_LEAVING.index("stopped")] == 0)
    # Nobody left in the second stretch: half an exit in all, shared out three to one.
    assert drawn[:, 1].sum(axis=1).mean() == pytest.approx(0.5 / 60, rel=0.05)
    np.testing.assert_allclose(drawn[:, 1, DEATH], 3 * drawn[:, 1, LOST])


def test_without_any_exit_nobody_ever_leaves():
    hazards = Retention(np.arange(2.0), np.zeros(1, int), np.array([60.0]), np.zeros((1, 7), int), 0, 0)
    drawn = redraw(TODAY, hazards, inflow_typed(0.0), years=2, draws=100)
    assert np.all(drawn.baseline.under_care == 400)


def test_a_change_that_changes_nothing_makes_no_difference():
    drawn = redraw(TODAY, HAZARDS, inflow_typed(90.0), years=2, what_if=WhatIf(), draws=100)
    for name in ("under_care", "newcomers", "leaving"):
        np.testing.assert_array_equal(getattr(drawn.what_if, name), getattr(drawn.baseline, name))


def test_keeping_patients_never_lowers_the_caseload_and_never_raises_the_losses():
    change = WhatIf(fewer_lost=100)
    drawn = redraw(TODAY, HAZARDS, inflow_typed(90.0), years=3, what_if=change, draws=200)
    assert np.all(drawn.what_if.under_care >= drawn.baseline.under_care)
    assert np.all(drawn.what_if.leaving[:, :, LOST] == 0)
    # Who is kept can still die.
    assert np.all(drawn.what_if.leaving[:, :, DEATH] >= drawn.baseline.leaving[:, :, DEATH])


def test_newcomers_who_stay_away_are_missing_from_the_caseload():
    change = WhatIf(fewer_newcomers=100)
    drawn = redraw(np.array([5]), HAZARDS, inflow_typed(90.0), years=2, what_if=change, draws=200)
    assert np.all(drawn.what_if.newcomers == 0)
    assert np.all(drawn.what_if.under_care <= 1)
    assert np.all(drawn.what_if.under_care <= drawn.baseline.under_care)


def test_a_seed_gives_the_same_draws_and_the_baseline_does_not_depend_on_the_what_if():
    def run(seed, what_if=None):
        return redraw(TODAY, HAZARDS, inflow_typed(90.0), years=2, draws=150, seed=seed, what_if=what_if)

    one, same, other, beside = run(9), run(9), run(10), run(9, WhatIf(10, 10, 10))
    np.testing.assert_array_equal(one.baseline.leaving, same.baseline.leaving)
    np.testing.assert_array_equal(one.baseline.under_care, beside.baseline.under_care)
    np.testing.assert_array_equal(one.baseline.newcomers, beside.baseline.newcomers)
    assert not np.array_equal(one.baseline.under_care, other.baseline.under_care)


def test_progress_is_reported_up_to_the_end():
    said = []
    redraw(TODAY, HAZARDS, inflow_typed(1.0), years=1, draws=250, report=lambda *step: said.append(step))
    assert said == [("draws", 0, 250), ("draws", 100, 250), ("draws", 200, 250), ("draws", 250, 250)]


def test_bands_hold_their_share_of_the_draws():
    drawn = np.arange(1001)[:, np.newaxis] * np.array([1, -1])
    first, second = bands(np.array([500.0, -400.0]), drawn)
    assert (first.p80, first.p95) == ((100, 900), (25, 975))
    assert (second.value, second.p95) == (-400, (-975, -25))


def test_no_draws_are_refused():
    with pytest.raises(Refusal, match="out_of_range"):
        redraw(TODAY, HAZARDS, inflow_typed(1.0), years=1, draws=0)
