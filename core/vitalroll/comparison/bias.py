"""How strong a hidden common cause would have to be to explain a ratio away."""

from __future__ import annotations

import math
from dataclasses import dataclass

from vitalroll.numbers import Estimate

COMMON_OUTCOME = 0.15
"""With a greater share of outcomes a hazard ratio is first brought to the scale of risks."""


@dataclass(frozen=True)
class EValue:
    """The E-value of an estimate and of its limit nearer to 1; 1 when the interval holds 1.

    ``common`` says that a hazard ratio of a common outcome was approximated as a risk ratio.
    """

    estimate: float
    limit: float
    common: bool


def e_value(ratio: Estimate, share_with_outcome: float) -> EValue:
    """Return the least risk ratio that a hidden factor must have with both group and outcome.

    Parameters
    ----------
    ratio : Estimate
        A hazard ratio or risk ratio with its limits.
    share_with_outcome : float
        Share of the patients with the outcome by the end of follow-up; above 0.15 the outcome counts as
        common and a hazard ratio as (1 - 0.5^sqrt HR) / (1 - 0.5^sqrt(1/HR)).

    References
    ----------
    VanderWeele & Ding (2017) Ann Intern Med 167:268-274.
    """
    common = share_with_outcome > COMMON_OUTCOME
    value, lower, upper = (
        _as_risk_ratio(each) if common else each for each in (ratio.value, ratio.lower, ratio.upper)
    )
    # A non-finite limit bounds nothing.
    crosses = not (lower > 1 or upper < 1)
    limit = 1.0 if crosses else _e(lower if lower > 1 else upper)
    return EValue(estimate=_e(value), limit=limit, common=common)


def _as_risk_ratio(hazard_ratio: float) -> float:
    if not (math.isfinite(hazard_ratio) and hazard_ratio > 0):
        return hazard_ratio
    return (1 - 0.5 ** math.sqrt(hazard_ratio)) / (1 - 0.5 ** math.sqrt(1 / hazard_ratio))


def _e(ratio: float) -> float:
    if not (math.isfinite(ratio) and ratio > 0):
        return float("nan")
    away = max(ratio, 1 / ratio)
    return away + math.sqrt(away * (away - 1))
