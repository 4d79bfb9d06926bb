"""What lies ahead of those who have come so far."""

from __future__ import annotations

from dataclasses import dataclass

import numpy as np

from vitalroll.numbers import DAYS_PER_YEAR, NOT_GIVEN, Estimate, two_sided_z
from vitalroll.outcomes.limits import lower_limit_at_one, probability_limits
from vitalroll.outcomes.product_limit import SurvivalCurve

FEWEST_SURVIVORS = 10
"""With fewer still followed nothing is said of what lies ahead of them (common practice)."""


@dataclass(frozen=True)
class Conditional:
    """The chance of going on for ``further_years`` without the outcome, having come ``survived_years``.

    ``code`` says why there is no estimate: ``few_survivors`` or ``beyond_follow_up``; None when there is one.
    """

    survived_years: float
    further_years: float
    at_risk: int
    estimate: Estimate
    code: str | None


def conditional_survival(curve: SurvivalCurve, survived_years: float, further_years: float) -> Conditional:
    """Return S(s + u) / S(s).

    Parameters
    ----------
    curve : SurvivalCurve
    survived_years, further_years : float
        s and u.

    Returns
    -------
    Conditional
        Limits on the log-log scale with the confidence of the curve, from the variance over (s, s + u];
        where nobody had the outcome then, the beta-product limit of those still at risk at the end.

    References
    ----------
    Zabor and others (2013) Clin Cancer Res 19:3986-3992; Fay, Brittain & Proschan (2013) for no outcomes.
    """
    begin, end = (years * DAYS_PER_YEAR for years in (survived_years, survived_years + further_years))
    left_by = int(curve.events_at[curve.time <= begin].sum() + curve.censored_at[curve.time <= begin].sum())
    later = (curve.time > begin) & (curve.at_risk > 0)
    # At risk at the next time on which anything happens: all who are still followed beyond s.
    at_risk = int(curve.at_risk[later][0]) if later.any() else max(0, curve.n - left_by)
    if not curve.span.speaks_of(end) or any(begin < restart.day for restart in curve.span.restarts):
        return Conditional(survived_years, further_years, at_risk, NOT_GIVEN, "beyond_follow_up")
    if at_risk < FEWEST_SURVIVORS:
        return Conditional(survived_years, further_years, at_risk, NOT_GIVEN, "few_survivors")
    between = (curve.time > begin) & (curve.time <= end) & (curve.events_at > 0)
    d, n = curve.events_at[between].astype(float), curve.at_risk[between].astype(float)
    value = float(np.prod(1 - d / n))
    with np.errstate(divide="ignore"):
        relative = float(np.sqrt(np.sum(d / (n * (n - d))))) if value > 0 else float("nan")
    lower, upper = probability_limits(np.array([value]), np.array([relative]), two_sided_z(curve.confidence))
    if value == 1:
        still = curve.at_risk[(curve.time <= end) & (curve.time > begin)]
        fewest = int(still[-1]) if len(still) else at_risk
        lower, upper = lower_limit_at_one(np.array([fewest]), curve.confidence), np.ones(1)
    elif value == 0:
        lower, upper = np.zeros(1), np.full(1, np.nan)
    return Conditional(
        survived_years,
        further_years,
        at_risk,
        Estimate(value, float(lower[0]), float(upper[0]), relative * value),
        None,
    )
