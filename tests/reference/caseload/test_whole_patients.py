"""The drawn courses against whole patients, each leaving by a binomial in each month of stay."""

from __future__ import annotations

import math

import numpy as np
import pytest

from vitalroll.caseload.courses import redraw
from vitalroll.caseload.inflow import inflow_typed
from vitalroll.caseload.projection import ageing
from vitalroll.caseload.retention import Retention
from vitalroll.caseload.uncertainty import drawn_hazards

YEARS, DRAWS = 3, 4000


def _whole_patients(
    today: np.ndarray, hazards: Retention, per_year: float, seed: int
) -> tuple[np.ndarray, np.ndarray]:
    """Return under care (draws, months + 1) and leavings by year (draws, years), in whole numbers.

    Slow and obvious: a binomial for each month of stay, newcomers Poisson.
    """
    random = np.random.default_rng(seed)
    axis = ageing(hazards.edges)
    staying = axis.staying(axis.hazards(drawn_hazards(hazards, DRAWS, random)))
    here = np.tile(axis.place(today), (DRAWS, 1))
    under_care, left = [here.sum(axis=1)], np.zeros((DRAWS, YEARS))
    for month in range(12 * YEARS):
        here[:, 0] += random.poisson(per_year / 12, DRAWS)
        stayed = random.binomial(here, staying)
        left[:, month // 12] += (here - stayed).sum(axis=1)
        here = np.zeros_like(here)
        here[:, 1:] = stayed[:, :-1]
        here[:, -1] += stayed[:, -1]
        under_care.append(here.sum(axis=1))
    return np.stack(under_care, axis=1), left


@pytest.mark.parametrize(("patients", "scale"), [(400, 5.0), (25, 0.3)])
def test_means_spreads_and_bands_are_those_of_whole_patients(patients, scale):
    exits = np.rint(scale * np.array([[8, 1, 2, 3, 4, 12, 1], [3, 0, 1, 2, 2, 6, 1], [1, 0, 0, 1, 1, 2, 0]]))
    hazards = Retention(
        np.arange(4.0), np.zeros(3, int), scale * np.array([60.0, 45.0, 30.0]), exits.astype(int), 0, 0
    )
    today = np.random.default_rng(5).integers(0, 50, patients)
    per_year = patients / 5
    course = redraw(today, hazards, inflow_typed(per_year), years=YEARS, draws=DRAWS, seed=8)[0]
    whole, left = _whole_patients(today, hazards, per_year, seed=9)
    for mine, other in (
        (course.under_care[:, 6], whole[:, 6]),
        (course.under_care[:, -1], whole[:, -1]),
        (course.leaving.sum(axis=2)[:, 0], left[:, 0]),
        (course.leaving.sum(axis=2)[:, 2], left[:, 2]),
        (np.diff(course.under_care[:, [12, 36]])[:, 0], np.diff(whole[:, [12, 36]])[:, 0]),
    ):
        error = math.sqrt((mine.var() + other.var()) / DRAWS)
        assert abs(mine.mean() - other.mean()) < 4 * error
        # Log ratio of two sample variances: sqrt(4/4000) = 0.032.
        assert abs(math.log(mine.var() / other.var())) < 4 * 0.032
        # Limits within one patient and the error of a 97.5 % quantile, about 2.7 sd/sqrt(4000) each.
        for share in (0.025, 0.1, 0.9, 0.975):
            apart = abs(np.quantile(mine, share) - np.quantile(other, share))
            assert apart < 1 + 4 * 2.7 * math.sqrt(2) * other.std() / math.sqrt(DRAWS)
