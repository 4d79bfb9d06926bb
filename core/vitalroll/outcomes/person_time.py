"""Rates per person-year with exact limits."""

from __future__ import annotations

from collections.abc import Collection

import numpy as np
from scipy.special import gammaincinv

from vitalroll.numbers import DAYS_PER_YEAR, Estimate
from vitalroll.outcomes.limits import check_confidence
from vitalroll.outcomes.risk_table import RiskTable


def poisson_limits(events: np.ndarray | int, confidence: float = 0.95) -> tuple[np.ndarray, np.ndarray]:
    """Return exact lower and upper limits for the expected number behind counts of ``events``.

    chi2(a/2; 2d)/2 and chi2(1-a/2; 2d+2)/2; the lower limit of no events is 0.

    Raises
    ------
    Refusal
        ``out_of_range`` for the confidence.

    References
    ----------
    Garwood (1936) Biometrika 28:437-442.
    """
    check_confidence(confidence)
    d = np.asarray(events, dtype=float)
    tail = (1 - confidence) / 2
    # Half a chi-squared quantile with 2d degrees of freedom is a gamma quantile with shape d.
    lower = np.where(d > 0, gammaincinv(np.maximum(d, 1), tail), 0.0)
    return lower, gammaincinv(d + 1, 1 - tail)


def rate(events: int, person_years: float, confidence: float = 0.95) -> Estimate:
    """Return events per person-year with Garwood's limits; NaN when no time was observed.

    The standard error is that of a Poisson count: sqrt(events) / person_years.
    """
    lower, upper = poisson_limits(events, confidence)
    if person_years <= 0:
        return Estimate(float("nan"), float("nan"), float("nan"))
    return Estimate(
        events / person_years,
        float(lower) / person_years,
        float(upper) / person_years,
        events**0.5 / person_years,
    )


def event_rate(table: RiskTable, interest: Collection[str], confidence: float = 0.95) -> Estimate:
    """Return the rate of the outcomes of interest per person-year observed."""
    return rate(int(table.events(interest).sum()), table.person_days / DAYS_PER_YEAR, confidence)
