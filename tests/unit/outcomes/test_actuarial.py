"""The actuarial life table."""

import math
from itertools import pairwise

import numpy as np
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from vitalroll.errors import Refusal
from vitalroll.numbers import DAYS_PER_YEAR
from vitalroll.outcomes.actuarial import (
    grouped_counts,
    interval_edges,
    life_table,
    life_table_from_counts,
)
from vitalroll.outcomes.product_limit import product_limit
from vitalroll.outcomes.risk_table import count_risk
from vitalroll.register.cohort import MEANINGS

DIED = ("died_of_disease",)


def test_126_patients():
    """Localised cancer of the kidney (Cutler & Ederer 1958 J Chronic Dis 8:699-712, from memory).

    Entering 126; died 47 5 2 2 0, lost 4 6 0 2 0, withdrawn 15 11 15 7 6. Effective numbers and
    chances recomputed by hand: 126 - 19/2 = 116.5, 47/116.5 = 0.4034, and so on.
    """
    table = life_table_from_counts(126, [1] * 5, [4, 6, 0, 2, 0], [15, 11, 15, 7, 6], [47, 5, 2, 2, 0])
    assert [row.entering for row in table.rows] == [126, 60, 38, 21, 10]
    assert [row.effective for row in table.rows] == [116.5, 51.5, 30.5, 16.5, 7]
    assert [round(row.chance, 3) for row in table.rows] == [0.403, 0.097, 0.066, 0.121, 0]
    assert [round(row.survival.value, 2) for row in table.rows] == [0.6, 0.54, 0.5, 0.44, 0.44]
    assert round(table.rows[4].survival.standard_error, 3) == 0.060
    assert [(c.code, dict(c.parameters)) for c in table.cautions] == [
        ("few_effective", {"from_days": 4 * DAYS_PER_YEAR, "effective": 7.0})
    ]


def test_one_interval_by_hand():
    """Ten enter for two years; 1 lost, 1 withdrawn, 3 die: n' = 9, q = 1/3, h = 3 / (2 * 7.5) = 0.2."""
    row = life_table_from_counts(10, [2], [1], [1], [3]).rows[0]
    assert (row.effective, row.from_days, row.to_days) == (9, 0, 2 * DAYS_PER_YEAR)
    assert (row.chance, row.odds) == pytest.approx((1 / 3, 1 / 2))
    assert (row.interval_survival, row.interval_survival_odds) == pytest.approx((2 / 3, 2))
    assert row.survival.value == pytest.approx(2 / 3)
    assert row.survival.standard_error == pytest.approx(2 / 3 * math.sqrt(3 / (9 * 6)))
    assert row.hazard.value == pytest.approx(0.2)
    # Gehan: h sqrt{[1 - (h width / 2)^2] / (n' q)}
    error = 0.2 * math.sqrt((1 - 0.04) / 3)
    assert row.hazard.standard_error == pytest.approx(error)
    spread = math.exp(1.959963984540054 * error / 0.2)
    assert (row.hazard.lower, row.hazard.upper) == pytest.approx((0.2 / spread, 0.2 * spread))


def test_intervals_without_events_and_without_survivors():
    """S = 1 has the exact limit; no events give a hazard limit; where all die no error is given."""
    quiet, last = life_table_from_counts(12, [1, 1], [0, 0], [0, 0], [0, 12]).rows
    assert quiet.survival.value == quiet.survival.upper == 1
    assert quiet.survival.lower == pytest.approx(0.025 ** (1 / 12))
    assert (quiet.hazard.value, quiet.hazard.lower) == (0, 0)
    assert quiet.hazard.upper == pytest.approx(-math.log(0.025) / 12)
    assert (quiet.odds, quiet.interval_survival_odds) == (0, math.inf)
    assert (last.survival.value, last.survival.lower) == (0, 0)
    assert last.survival.upper == pytest.approx(1 - 0.025 ** (1 / 12), abs=1e-9)
    assert math.isnan(last.survival.standard_error)
    assert last.hazard.value == 2


def test_many_lost_is_said():
    """More than a fifth lost."""
    codes = [c.code for c in life_table_from_counts(50, [1], [11], [0], [5]).cautions]
    assert codes == ["many_lost"]


def test_day_of_the_edge_belongs_to_the_interval_it_ends(table_of):
    """Day 1461 is exactly four years: it is in the fourth year. Day 0 is in the first."""
    counts = grouped_counts(table_of([0, 365, 366, 1461, 1462], "d+ldd"), DIED, interval_edges("year", 5))
    assert counts.events.tolist() == [1, 0, 0, 1, 1]
    assert counts.withdrawn.tolist() == [1, 0, 0, 0, 0]
    assert counts.lost.tolist() == [0, 1, 0, 0, 0]
    assert counts.entering.tolist() == [5, 3, 2, 2, 1]


@st.composite
def register(draw):
    n = draw(st.integers(1, 60))
    entry = np.array(draw(st.lists(st.sampled_from([0, 0, 0, 100, 400]), min_size=n, max_size=n)))
    length = np.array(draw(st.lists(st.integers(0, 1500), min_size=n, max_size=n)))
    outcome = np.array(draw(st.lists(st.integers(0, len(MEANINGS) - 1), min_size=n, max_size=n)))
    return entry, entry + length, outcome


@given(register(), st.sampled_from(["year", "quarter", "month"]))
@settings(deadline=None)
def test_agrees_with_counting_patients(rows, step):
    """Every count again, patient by patient, and who enters the next interval is who was left."""
    entry, exit, outcome = rows
    seen = ~((entry > 0) & (entry == exit))
    entry, exit, outcome = entry[seen], exit[seen], outcome[seen]
    if not len(entry):
        return
    edges = interval_edges(step, 60)
    counts = grouped_counts(count_risk(entry, exit, outcome), DIED, edges)
    died, lost = outcome == MEANINGS.index("died_of_disease"), outcome == MEANINGS.index("lost")
    for i, (a, b) in enumerate(pairwise(edges)):
        inside = (exit > a) & (exit <= b) | (exit == 0) & (i == 0)
        assert counts.events[i] == (inside & died).sum()
        assert counts.lost[i] == (inside & lost).sum()
        assert counts.withdrawn[i] == (inside & ~died & ~lost).sum()
        assert counts.joined[i] == ((entry >= a) & (entry < b) & (entry > 0)).sum()
        under_observation = ((entry < a) & (exit > a)) if i else entry == 0
        assert counts.entering[i] == under_observation.sum()


@given(register())
@settings(deadline=None)
def test_bounds(rows):
    """Survival lies within its limits, limits within 0 and 1, p + q = 1."""
    entry, exit, outcome = rows
    table = count_risk(entry, exit, outcome)
    if not table.n:
        return
    for row in life_table(table, DIED).rows:
        assert 0 <= row.chance <= 1
        assert row.chance + row.interval_survival == pytest.approx(1)
        assert -1e-12 <= row.survival.lower <= row.survival.value + 1e-12
        assert row.survival.value <= row.survival.upper + 1e-12 <= 1 + 2e-12


@given(st.lists(st.integers(0, 2000), min_size=1, max_size=50))
@settings(deadline=None)
def test_without_censoring_it_equals_the_product_limit(exits):
    """Both are then the share still alive at the end of each interval."""
    exit = np.array(exits)
    table = count_risk(np.zeros_like(exit), exit, np.ones_like(exit))
    curve = product_limit(table, DIED)
    for row in life_table(table, DIED, step="quarter").rows:
        assert row.survival.value == pytest.approx((exit > row.to_days).mean(), abs=1e-12)
        if row.to_days <= exit.max():
            assert row.survival.value == pytest.approx(curve.at(row.to_days).value, abs=1e-12)


def test_lost_as_the_outcome_is_not_counted_twice(table_of):
    """When being lost is what is studied, nobody is lost to it."""
    row = life_table(table_of([10, 20, 30], "l+d"), ("lost",)).rows[0]
    assert (row.events, row.lost, row.withdrawn) == (1, 0, 2)


def test_an_emptied_risk_set_starts_survival_again(table_of):
    """Nobody was under observation in the second year; the third starts at 1, and that is said."""
    table = life_table(table_of([100, 900, 1000], "dd+", entries=[0, 800, 800]), DIED)
    assert [row.from_days / DAYS_PER_YEAR for row in table.rows] == [0, 2]
    assert table.rows[1].survival.value == 0.0  # two came late: half of them, 1, is the one that died
    assert [c.code for c in table.cautions] == ["few_effective", "risk_set_emptied"]


def test_nobody_effective_makes_no_rows(table_of):
    """One who came late and left in the same interval counts half in and half out."""
    table = life_table(table_of([200], "+", entries=[100]), DIED)
    assert table.rows == ()
    assert [(c.code, dict(c.parameters)) for c in table.cautions] == [
        ("few_effective", {"from_days": 0, "effective": 0})
    ]


def test_late_beginning_is_said(table_of):
    """Nobody was observed in the first year."""
    table = life_table(table_of([900, 1000], "d+", entries=[400, 500]), DIED)
    assert table.rows[0].from_days == DAYS_PER_YEAR
    assert "begins_late" in [c.code for c in table.cautions]


@pytest.mark.parametrize(
    ("counts", "code", "field"),
    [
        ((10, [], [], [], []), "no_rows", "rows"),
        ((10, [1], [1, 2], [0], [0]), "uneven_rows", "rows"),
        ((0, [1], [0], [0], [0]), "nobody_entered", "entering"),
        ((10, [1, 0], [0, 0], [0, 0], [0, 0]), "width_not_positive", "rows.1.width_years"),
        ((10, [1], [0], [-1], [0]), "negative_count", "rows.0.withdrawn"),
        ((10, [1, 1], [1, 3], [1, 3], [1, 3]), "more_left_than_entered", "rows.1"),
    ],
)
def test_typed_counts_that_cannot_be_are_refused(counts, code, field):
    """By the row and the field."""
    with pytest.raises(Refusal) as refused:
        life_table_from_counts(*counts)
    assert (refused.value.code, refused.value.field) == (code, field)


def test_an_unknown_step_is_refused(table_of):
    """Years, quarters and months only."""
    with pytest.raises(Refusal) as refused:
        life_table(table_of([1], "d"), DIED, step="week")
    assert (refused.value.code, refused.value.field) == ("not_one_of", "step")
