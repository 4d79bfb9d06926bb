"""Drawn courses of the caseload, the baseline and scenarios beside it."""

from __future__ import annotations

import math

import numpy as np
import pytest
from caseload_cases import DEATH, LOST, known_hazards
from hypothesis import given, settings
from hypothesis import strategies as st

from vitalroll.caseload.courses import Course, redraw
from vitalroll.caseload.inflow import Inflow, inflow_typed
from vitalroll.caseload.projection import project, yearly_sums
from vitalroll.caseload.retention import Retention
from vitalroll.caseload.scenario import LEVERS, Lever, Scenario
from vitalroll.errors import Refusal
from vitalroll.numbers import Estimate

HAZARDS = known_hazards(
    {"died_of_disease": 0.2, "lost": 0.4, "recovered": 0.1}, {"died_of_disease": 0.1, "lost": 0.1}
)
TODAY = np.arange(400) % 40
CHANGE = Scenario(
    "fewer of everything",
    (
        Lever("fewer_newcomers", 30, from_month=13),
        Lever("fewer_lost", 60, from_month=13, ramp_months=5),
        Lever("fewer_deaths", 20, from_month=13),
    ),
)
EARLIER = Scenario(
    "found earlier",
    (
        Lever("found_earlier", 40, months_earlier=7, fewer_deaths_among=30, ramp_months=3),
        Lever("more_completed", 150, from_month=6),
    ),
)


def _apart(drawn: np.ndarray, expected: np.ndarray) -> float:
    """Return the largest distance of the draws' means from what is expected, in standard errors."""
    error = np.maximum(drawn.std(axis=0, ddof=1), 1e-9) / math.sqrt(len(drawn))
    return float(np.max(np.abs(drawn.mean(axis=0) - expected) / error))


@st.composite
def _scenarios(draw: st.DrawFn) -> Scenario:
    kinds = draw(st.lists(st.sampled_from(LEVERS), max_size=4, unique=True))
    return Scenario(
        "",
        tuple(
            Lever(
                kind,
                draw(st.floats(0, 100)),
                from_month=draw(st.integers(1, 40)),
                ramp_months=draw(st.integers(0, 30)),
                prevalence=draw(st.floats(0, 100)),
                relative_risk=draw(st.floats(1, 20)),
                months_earlier=draw(st.integers(1, 20)),
                fewer_deaths_among=draw(st.floats(0, 100)),
            )
            for kind in kinds
        ),
    )


@settings(max_examples=25, deadline=None)
@given(
    st.lists(st.lists(st.integers(0, 30), min_size=7, max_size=7).map(np.array), min_size=1, max_size=4),
    st.lists(st.integers(0, 80), min_size=1, max_size=40),
    st.floats(0, 90),
    _scenarios(),
    st.integers(0, 2**32),
)
def test_every_patient_is_somewhere_in_every_draw_with_and_without_the_levers(
    exits, today, newcomers, scenario, seed
):
    n = len(exits)
    hazards = Retention(np.arange(n + 1.0), np.zeros(n, int), np.full(n, 60.0), np.array(exits), 0, 0)
    inflow = inflow_typed(newcomers, days_at_arrival=(0, 0, 200))
    courses = redraw(np.array(today), hazards, inflow, years=3, scenarios=[scenario], draws=5, seed=seed)
    for course in courses:
        flow = course.newcomers.sum(axis=1) - course.leaving.sum(axis=(1, 2))
        # Sums of some hundred numbers of the size of the caseload.
        np.testing.assert_allclose(course.under_care[:, 0] + flow, course.under_care[:, -1], atol=1e-6)
        assert np.all(course.newcomers >= 0)
    before = min((lever.from_month for lever in scenario.levers), default=37)
    np.testing.assert_array_equal(courses[1].under_care[:, :before], courses[0].under_care[:, :before])


@pytest.mark.parametrize("scenario", [None, CHANGE, EARLIER])
def test_draws_with_known_rates_are_centred_on_what_is_expected(scenario):
    late = np.array([0, 0, 100, 500])
    inflow = inflow_typed(90.0, days_at_arrival=late)
    beside = [scenario] if scenario else []
    course = redraw(TODAY, HAZARDS, inflow, years=3, scenarios=beside, draws=3000, seed=5)[-1]
    path = project(TODAY, HAZARDS, 90.0, years=3, days_at_arrival=late, scenario=scenario)
    # Some 36 correlated months and 7 x 3 exits: 4.5 standard errors are far out for any of them.
    assert _apart(course.under_care, path.under_care) < 4.5
    assert _apart(course.first_year, path.first_year) < 4.5
    assert _apart(course.newcomers, path.newcomers) < 4.5
    assert _apart(course.leaving.reshape(3000, -1), yearly_sums(path.leaving.T).T.ravel()) < 4.5


def test_with_nothing_redrawn_the_courses_are_the_path_itself():
    """Two implementations, one by slots and one by groups that never move, agree to rounding."""
    late = np.array([0, 0, 100, 500])
    inflow = inflow_typed(90.0, days_at_arrival=late)
    courses = redraw(TODAY, HAZARDS, inflow, years=4, scenarios=[CHANGE, EARLIER], vary=(), draws=2)
    for course, scenario in zip(courses, (None, CHANGE, EARLIER), strict=True):
        path = project(TODAY, HAZARDS, 90.0, years=4, days_at_arrival=late, scenario=scenario)
        np.testing.assert_allclose(course.under_care[1], path.under_care)
        np.testing.assert_allclose(course.first_year[1], path.first_year)
        np.testing.assert_allclose(course.newcomers[1], path.newcomers)
        np.testing.assert_allclose(course.leaving[1], yearly_sums(path.leaving.T).T, atol=1e-9)


def test_a_scenario_varies_as_a_register_with_those_hazards_would():
    """Drawn beside the baseline or on its own: the same mean and the same spread."""
    levers = (Lever("fewer_newcomers", 30), Lever("fewer_lost", 60), Lever("fewer_deaths", 20))
    change = Scenario("", levers)
    beside = redraw(TODAY, HAZARDS, inflow_typed(90.0), years=3, scenarios=[change], draws=3000, seed=6)[1]
    kept = Retention(
        HAZARDS.edges, HAZARDS.at_risk, HAZARDS.person_years, HAZARDS.exits * change.over(1).hazards[0], 0, 0
    )
    alone = redraw(TODAY, kept, inflow_typed(63.0), years=3, draws=3000, seed=7)[0]
    for mine, other in (
        (beside.under_care[:, -1], alone.under_care[:, -1]),
        (beside.leaving[:, 2, LOST], alone.leaving[:, 2, LOST]),
        (beside.leaving[:, 2, DEATH], alone.leaving[:, 2, DEATH]),
    ):
        pooled = math.sqrt((mine.var() + other.var()) / 3000)
        assert abs(mine.mean() - other.mean()) < 4 * pooled
        # The ratio of two sample variances of 3000 has a standard error of sqrt(4/3000) = 0.037.
        assert abs(math.log(mine.var() / other.var())) < 4 * 0.037


def test_chance_alone_spreads_as_the_binomial_and_the_poisson():
    # Nobody new, everyone long here, hazard 0.1: Binomial(400, exp(-0.1)) after a year.
    stay = math.exp(-0.1)
    course = redraw(np.full(400, 300), known_hazards({"lost": 0.1}), inflow_typed(0.0), years=1, draws=4000)[
        0
    ]
    spread = course.under_care[:, -1].var()
    assert spread == pytest.approx(400 * stay * (1 - stay), rel=4 * math.sqrt(2 / 4000))
    # Nobody leaves, newcomers typed: Poisson.
    course = redraw(np.full(400, 300), known_hazards({}), inflow_typed(50.0), years=1, draws=4000)[0]
    assert course.newcomers.sum(axis=1).var() == pytest.approx(50, rel=4 * math.sqrt(2 / 4000))


def test_overdispersed_newcomers_vary_by_their_dispersion():
    # Rate all but certain (a million years of history): variance of a year = dispersion x mean.
    history = Inflow((), Estimate(100.0, math.nan, math.nan), 3.0, "negative_binomial", 10**6, 1e6)
    course = redraw(np.array([1]), known_hazards({}), history, years=2, draws=4000)[0]
    yearly = yearly_sums(course.newcomers)
    assert yearly.mean() == pytest.approx(100, abs=4 * math.sqrt(300 / 8000))
    # A negative binomial's variance is estimated a little less surely than a normal's.
    assert yearly.var() == pytest.approx(300, rel=5 * math.sqrt(2 / 8000))


def test_without_any_exit_nobody_ever_leaves():
    hazards = Retention(np.arange(2.0), np.zeros(1, int), np.array([60.0]), np.zeros((1, 7), int), 0, 0)
    course = redraw(TODAY, hazards, inflow_typed(0.0), years=2, draws=100)[0]
    assert np.all(course.under_care == 400)


def test_levers_that_change_nothing_make_no_difference():
    nothing = Scenario(
        "", tuple(Lever(kind, 0, months_earlier=3) for kind in LEVERS if kind != "found_earlier")
    )
    one, other = redraw(TODAY, HAZARDS, inflow_typed(90.0), years=2, scenarios=[nothing], draws=100)
    for name in Course.__dataclass_fields__:
        np.testing.assert_array_equal(getattr(one, name), getattr(other, name))


def test_keeping_patients_raises_the_caseload_and_ends_the_losses():
    tracing = Scenario("", (Lever("fewer_lost", 100),))
    before, after = redraw(TODAY, HAZARDS, inflow_typed(90.0), years=3, scenarios=[tracing], draws=400)
    assert np.all(after.under_care[:, -1] > before.under_care[:, -1])
    np.testing.assert_allclose(after.leaving[:, :, LOST], 0, atol=1e-9)
    # Who is kept can still die.
    assert after.leaving[:, :, DEATH].mean() > before.leaving[:, :, DEATH].mean()


def test_newcomers_who_stay_away_are_missing_from_the_caseload():
    nobody = Scenario("", (Lever("fewer_newcomers", 100),))
    _, after = redraw(np.array([5]), HAZARDS, inflow_typed(90.0), years=2, scenarios=[nobody], draws=200)
    assert np.all(after.newcomers == 0)
    assert after.under_care.mean(axis=0).max() <= 1


def test_patients_found_early_come_once():
    """Nobody leaves: finding half of them 6 months earlier adds, once and for all, half of 6 months' newcomers."""
    early = Scenario("", (Lever("found_earlier", 50, months_earlier=6),))
    stay = known_hazards({})
    before, after = redraw(TODAY, stay, inflow_typed(120.0), years=3, scenarios=[early], draws=2000, seed=3)
    more = after.newcomers.sum(axis=1) - before.newcomers.sum(axis=1)
    # Binomial thinning of Poisson(60): Poisson(30).
    assert more.mean() == pytest.approx(30, abs=4 * math.sqrt(30 / 2000))
    assert more.var() == pytest.approx(30, rel=5 * math.sqrt(2 / 2000))


def test_a_seed_gives_the_same_draws_and_the_baseline_does_not_depend_on_the_scenarios():
    def run(seed, *scenarios):
        return redraw(TODAY, HAZARDS, inflow_typed(90.0), years=2, draws=150, seed=seed, scenarios=scenarios)[
            0
        ]

    one, same, other, beside = run(9), run(9), run(10), run(9, CHANGE, EARLIER)
    for name in Course.__dataclass_fields__:
        np.testing.assert_array_equal(getattr(one, name), getattr(same, name))
        np.testing.assert_array_equal(getattr(one, name), getattr(beside, name))
    assert not np.array_equal(one.under_care, other.under_care)


def test_the_more_is_redrawn_the_wider_the_courses():
    history = Inflow((), Estimate(90.0, math.nan, math.nan), 1.0, "poisson", 6, 6.0)
    exits = (HAZARDS.hazards * 60).round().astype(int)
    hazards = Retention(HAZARDS.edges, HAZARDS.at_risk, np.full(2, 60.0), exits, 0, 0)

    def spread(*vary):
        return redraw(TODAY, hazards, history, years=3, draws=3000, vary=vary)[0].under_care[:, -1].var()

    parts = [spread("inflow"), spread("leaving"), spread("chance")]
    assert min(parts) > 0
    assert spread() == pytest.approx(0, abs=1e-9)
    # Small independent causes add up, but for products of two of them.
    assert spread("inflow", "leaving", "chance") == pytest.approx(sum(parts), rel=0.15)


def test_progress_is_reported_up_to_the_end():
    said = []
    redraw(TODAY, HAZARDS, inflow_typed(1.0), years=1, draws=1200, report=lambda *step: said.append(step))
    assert said == [("draws", 0, 1200), ("draws", 500, 1200), ("draws", 1000, 1200), ("draws", 1200, 1200)]


def test_hazards_so_high_that_nobody_stays_leave_nobody():
    """A month's chance of staying of exp(-100) is nothing to divide by, and does not have to be."""
    hazards = known_hazards({"lost": 1200.0}, {"lost": 1200.0})
    course = redraw(TODAY, hazards, inflow_typed(60.0), years=3, draws=50)[0]
    assert np.all(np.isfinite(course.under_care))
    # Who comes within the month stays 1/100 of it on average.
    assert np.abs(course.under_care[:, 1:]).max() < 5
    flow = course.newcomers.sum(axis=1) - course.leaving.sum(axis=(1, 2))
    np.testing.assert_allclose(course.under_care[:, 0] + flow, course.under_care[:, -1], atol=1e-6)


def test_no_draws_are_refused():
    with pytest.raises(Refusal, match="out_of_range"):
        redraw(TODAY, HAZARDS, inflow_typed(1.0), years=1, draws=0)
