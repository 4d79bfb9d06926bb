"""How long patients stay without the outcome on average, within a horizon."""

from __future__ import annotations

import math
from dataclasses import dataclass

import numpy as np

from vitalroll.errors import Refusal
from vitalroll.numbers import DAYS_PER_YEAR, Estimate, two_sided_z
from vitalroll.outcomes.limits import check_confidence
from vitalroll.outcomes.product_limit import SurvivalCurve


@dataclass(frozen=True)
class RestrictedMean:
    """Mean years without the outcome up to the horizon, and years lost to it."""

    horizon_years: float
    mean: Estimate
    lost: Estimate


def restricted_mean(
    curve: SurvivalCurve, horizon_years: float, *, confidence: float = 0.95
) -> RestrictedMean:
    """Return the area under a survival curve up to a horizon.

    Parameters
    ----------
    curve : SurvivalCurve
    horizon_years : float
        To be chosen before looking, and no later than the last time of the smallest group.
    confidence : float

    Returns
    -------
    RestrictedMean
        In years; the limits are plain normal ones, kept between 0 and the horizon.

    Raises
    ------
    Refusal
        ``horizon_beyond_follow_up`` (``years``: as far as the curve goes); ``curve_restarts`` when the
        curve does not speak of the whole time from the start.

    Notes
    -----
    var = sum A_j^2 d_j / [n_j (n_j - d_j)], A_j the area from t_j to the horizon. Where all at risk have the
    outcome A_j is 0 and so is the term.

    References
    ----------
    Irwin (1949) J Hyg 47:188-189; Royston & Parmar (2013) BMC Med Res Methodol 13:152.
    """
    check_confidence(confidence)
    horizon = horizon_years * DAYS_PER_YEAR
    if curve.span.begins > 0 or curve.span.restarts:
        raise Refusal("curve_restarts", field="horizon_years")
    if not curve.span.speaks_of(horizon):
        raise Refusal("horizon_beyond_follow_up", field="horizon_years", years=last_year(curve))
    inside = curve.time <= horizon
    time, survival = curve.time[inside].astype(float), curve.survival[inside]
    pieces = survival * np.diff(np.append(time, horizon))
    area_after = np.cumsum(pieces[::-1])[::-1]
    d, n = curve.events_at[inside].astype(float), curve.at_risk[inside].astype(float)
    jumps = (d > 0) & (n > d)
    variance = float(np.sum(area_after[jumps] ** 2 * d[jumps] / (n[jumps] * (n[jumps] - d[jumps]))))
    mean, error = float(area_after[0]) / DAYS_PER_YEAR, math.sqrt(variance) / DAYS_PER_YEAR
    margin = two_sided_z(confidence) * error
    lower, upper = max(0.0, mean - margin), min(horizon_years, mean + margin)
    return RestrictedMean(
        horizon_years=horizon_years,
        mean=Estimate(mean, lower, upper, error),
        lost=Estimate(horizon_years - mean, horizon_years - upper, horizon_years - lower, error),
    )


def last_year(curve: SurvivalCurve) -> float:
    """Return how many years after the start a curve can speak of."""
    return curve.span.last_time / DAYS_PER_YEAR


def mean_difference(one: RestrictedMean, other: RestrictedMean, *, confidence: float = 0.95) -> Estimate:
    """Return by how many years two restricted means to one horizon differ."""
    error = math.hypot(one.mean.standard_error, other.mean.standard_error)
    margin = two_sided_z(confidence) * error
    value = one.mean.value - other.mean.value
    return Estimate(value, value - margin, value + margin, error)
