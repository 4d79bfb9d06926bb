"""Do the bands hold what they promise? Registers simulated from known rates, then followed on."""

from __future__ import annotations

import math

import numpy as np

from vitalroll.caseload.courses import redraw
from vitalroll.caseload.inflow import inflow_from_history
from vitalroll.caseload.projection import months_here_today
from vitalroll.caseload.retention import retention
from vitalroll.numbers import DAYS_PER_YEAR
from vitalroll.outcomes.risk_table import risk_table
from vitalroll.register.cohort import Cohort, meaning_code

RATES = np.array([0.5, 0.25, 0.12])
HISTORY, HORIZON, PER_YEAR = 6, 3, 70
CLOSING = 737790  # 31 December 2020


def _staying(random: np.random.Generator, n: int) -> np.ndarray:
    """Draw years from start to leaving: hazards by year since start, the last one held."""
    due = random.exponential(1.0, n)
    spent = np.concatenate(([0.0], np.cumsum(RATES)))
    year = np.minimum(np.searchsorted(spent, due, side="right") - 1, len(RATES) - 1)
    return year + (due - spent[year]) / RATES[year]


def _lives(random: np.random.Generator) -> tuple[np.ndarray, np.ndarray]:
    """Return arrival and leaving, in years from the closing date, of everyone to the horizon's end."""
    n = random.poisson(PER_YEAR * (HISTORY + HORIZON))
    arrival = random.random(n) * (HISTORY + HORIZON) - HISTORY
    return arrival, arrival + _staying(random, n)


def _register(arrival: np.ndarray, leaving: np.ndarray) -> Cohort:
    seen = arrival < 0
    start = CLOSING + np.floor(arrival[seen] * DAYS_PER_YEAR).astype(int)
    seen_for = np.minimum(CLOSING, CLOSING + np.floor(leaving[seen] * DAYS_PER_YEAR).astype(int)) - start
    gone = leaving[seen] < 0
    return Cohort(
        entry=np.zeros(len(start), dtype=int),
        exit=np.maximum(seen_for, 0),
        outcome=np.where(gone, meaning_code("lost"), meaning_code("under_care")),
        start=start,
        line=np.arange(len(start)) + 2,
        closing=CLOSING,
    )


def test_bands_hold_the_truth_as_often_as_they_say():
    """150 registers of six years, looked at three years later.

    The number of bands that hold the truth is binomial: at 0.80 the standard error of its share is
    0.033, at 0.95 0.018; four of them are allowed, and a band may be a little too wide.
    """
    random = np.random.default_rng(77)
    trials, held80, held95 = 150, 0, 0
    for trial in range(trials):
        arrival, leaving = _lives(random)
        register = _register(arrival, leaving)
        drawn = redraw(
            months_here_today(register),
            retention(risk_table(register)),
            inflow_from_history(register),
            years=HORIZON,
            draws=200,
            seed=trial,
        )
        low95, low80, high80, high95 = np.quantile(drawn[0].under_care[:, -1], (0.025, 0.1, 0.9, 0.975))
        truth = np.count_nonzero((arrival <= HORIZON) & (leaving > HORIZON))
        held80 += low80 <= truth <= high80
        held95 += low95 <= truth <= high95
    assert abs(held80 / trials - 0.80) < 4 * math.sqrt(0.8 * 0.2 / trials)
    assert abs(held95 / trials - 0.95) < 4 * math.sqrt(0.95 * 0.05 / trials)
