"""Looking back: the register as it was, what was seen after, and where the bands come from."""

from __future__ import annotations

import math

import numpy as np
import pytest
from caseload_cases import cohort, day, known_hazards, simulated_register

from vitalroll.caseload.courses import redraw
from vitalroll.caseload.hindcast import (
    LEVELS,
    as_recorded,
    back_test,
    back_tests,
    parts_of_the_band,
    under_care_on,
)
from vitalroll.caseload.inflow import Inflow, inflow_typed
from vitalroll.caseload.retention import Retention
from vitalroll.errors import Refusal
from vitalroll.numbers import Estimate
from vitalroll.register.cohort import MEANINGS

CLOSING = day(2020, 12, 31)


def test_the_register_as_it_was_on_an_earlier_day():
    cut = day(2019, 6, 1)
    rows = [
        (cut - 500, 0, 100, "lost"),  # had left
        (cut - 500, 0, 700, "died_of_disease"),  # still there
        (cut - 500, 0, 300, "under_care"),  # seen last before the day, under care all the same
        (cut - 500, 600, 900, "recovered"),  # not yet here: came 100 days later
        (cut + 5, 0, 10, "lost"),  # not yet here
        (cut, 0, 20, "stopped"),  # came that day
    ]
    known = as_recorded(cohort(rows, CLOSING), cut)
    assert known.closing == cut
    assert known.exit.tolist() == [100, 500, 300, 0]
    assert [MEANINGS[code] for code in known.outcome] == ["lost", "under_care", "under_care", "under_care"]


def test_who_is_under_care_on_a_day():
    first = day(2018)
    rows = [(first, 0, 10, "lost"), (first + 5, 0, 30, "under_care"), (first, 20, 40, "recovered")]
    days = first + np.array([-1, 0, 5, 9, 10, 20, 39, 40, 400])
    assert under_care_on(cohort(rows, CLOSING), days).tolist() == [0, 1, 2, 2, 1, 2, 2, 1, 1]


@pytest.fixture(scope="module")
def register():
    return simulated_register(
        np.random.default_rng(14), per_year=90, years=9, yearly_hazard=[0.4, 0.2, 0.1], closing=CLOSING
    )


def test_nothing_after_the_earlier_day_is_used(register):
    """Whatever happened later may change: the projection from the earlier day stays the same."""
    told = back_test(register, 3, draws=200)
    gone = register.start + register.exit > told.origin
    other = cohort(
        [
            (int(start), int(entry), int(exit_) + (200 if late else 0), MEANINGS[6 if late else code])
            for start, entry, exit_, code, late in zip(
                register.start, register.entry, register.exit, register.outcome, gone, strict=True
            )
        ],
        CLOSING + 400,
    )
    again = back_test(as_recorded(other, CLOSING), 3, draws=200)
    assert again.under_care == told.under_care
    assert (told.origin, told.seen[0]) == (CLOSING - 1096, told.under_care[0].value)


def test_what_was_seen_adds_up(register):
    told = back_test(register, 4, draws=200)
    assert told.seen[-1] == np.count_nonzero(register.outcome == 0)
    assert told.seen[0] + told.seen_newcomers - told.seen_leaving == told.seen[-1]
    band = told.under_care[-1]
    assert band.p95[0] <= band.p80[0] <= band.p50[0] <= band.p50[1] <= band.p80[1] <= band.p95[1]
    limits = dict(zip(LEVELS, (band.p50, band.p80, band.p95), strict=True))
    assert told.held == {level: low <= told.seen[-1] <= high for level, (low, high) in limits.items()}


def test_every_year_back_is_tried_as_far_as_history_allows(register):
    tests = back_tests(register, most_years=10, draws=100)
    assert [test.years for test in tests] == list(range(1, len(tests) + 1))
    # Nine years of history, two whole ones needed before.
    assert 5 <= len(tests) <= 7
    with pytest.raises(Refusal, match="back_test_history_too_short"):
        back_test(register, 9)
    short = cohort([(CLOSING - 400 + i, 0, 100, "under_care") for i in range(50)], CLOSING)
    with pytest.raises(Refusal, match="back_test_history_too_short"):
        back_tests(short, most_years=5)


def test_the_parts_are_those_that_are_uncertain():
    exits = np.full((2, 7), 5)
    hazards = Retention(np.arange(3.0), np.zeros(2, int), np.full(2, 100.0), exits, 0, 0)
    today = np.arange(200) % 30
    certain = parts_of_the_band(today, known_hazards({"lost": 0.3}), inflow_typed(50.0), years=2, draws=400)
    assert certain["inflow"] == pytest.approx(np.zeros(2), abs=1e-9)
    assert certain["leaving"] == pytest.approx(np.zeros(2), abs=1e-6)
    assert np.all(certain["chance"] > 10)
    history = Inflow((), Estimate(50.0, math.nan, math.nan), 1.0, "poisson", 4, 4.0)
    found = parts_of_the_band(today, hazards, history, years=2, draws=2000)
    whole = redraw(today, hazards, history, years=2, draws=2000)[0].under_care[:, 12::12].var(axis=0, ddof=1)
    # Independent small causes add up but for their products.
    np.testing.assert_allclose(sum(found.values()), whole, rtol=0.15)
