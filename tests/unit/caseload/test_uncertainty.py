"""Rates drawn again, and bands of what follows."""

from __future__ import annotations

import math
from dataclasses import replace

import numpy as np
import pytest
from caseload_cases import DEATH, LOST

from vitalroll.caseload.inflow import Inflow, inflow_typed
from vitalroll.caseload.retention import Retention
from vitalroll.caseload.uncertainty import bands, drawn_arrivals, drawn_hazards
from vitalroll.numbers import Estimate
from vitalroll.outcomes.competing import WAYS_OF_LEAVING


def _history(mean: float, spread: float, years: int) -> Inflow:
    estimate = Estimate(mean, math.nan, math.nan)
    model = "negative_binomial" if spread > 1 else "poisson"
    return Inflow((), estimate, spread, model, years, float(years))


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


def test_growth_multiplies_every_year_after_the_first():
    inflow = replace(inflow_typed(100.0), growth_percent=10.0)
    assert inflow.per_year_ahead(3).tolist() == pytest.approx([100, 110, 121])
    drawn = 12 * drawn_arrivals(inflow, 2, 3, np.random.default_rng(1))
    np.testing.assert_allclose(drawn, [[100, 110, 121]] * 2)


def test_bands_hold_their_share_of_the_draws():
    drawn = np.arange(1001)[:, np.newaxis] * np.array([1, -1])
    first, second = bands(np.array([500.0, -400.0]), drawn)
    assert (first.p80, first.p95) == ((100, 900), (25, 975))
    assert (second.value, second.p95) == (-400, (-975, -25))
