"""The trend of newcomers against a generalised linear model of statsmodels."""

from __future__ import annotations

import math

import numpy as np
import statsmodels.api as sm

from vitalroll.caseload.inflow import Inflow, YearCount
from vitalroll.caseload.trend import inflow_with_trend
from vitalroll.numbers import NOT_GIVEN


def test_level_slope_errors_and_dispersion_are_those_of_a_poisson_regression():
    counts = np.array([61, 90, 74, 120, 88, 141, 133, 160])
    years = tuple(YearCount(2013 + i, int(count), True) for i, count in enumerate(counts))
    inflow = Inflow(years, NOT_GIVEN, math.nan, "poisson", len(counts), 8.0)
    found = inflow_with_trend(inflow, 737790, damping=1)
    design = sm.add_constant(np.arange(len(counts)) - (len(counts) - 1.0))
    fitted = sm.GLM(counts, design, family=sm.families.Poisson()).fit(scale="X2", tol=1e-12)
    # Both solve the same equations by Newton's method; only rounding is left.
    np.testing.assert_allclose([found.trend.level, found.trend.slope], fitted.params, rtol=1e-8)
    np.testing.assert_allclose(found.dispersion, fitted.scale, rtol=1e-8)
    assert fitted.scale > 1.5
    np.testing.assert_allclose(np.sqrt(np.diag(found.trend.covariance)), fitted.bse, rtol=1e-8)
    ahead = fitted.predict(np.column_stack((np.ones(3), np.arange(1.0, 4))))
    # The closing date is the last day of the last whole year.
    np.testing.assert_allclose(found.per_year_ahead(3), ahead, rtol=1e-8)
