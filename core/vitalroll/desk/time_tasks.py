"""How long on average, and what lies ahead: the task behind that part of the Outcomes place."""

from __future__ import annotations

import math
from dataclasses import dataclass
from typing import Annotated, Any

from vitalroll.desk.fields import Between
from vitalroll.desk.memory import Memory
from vitalroll.desk.outcome_tasks import Confidence, Years
from vitalroll.outcomes.conditional import conditional_survival
from vitalroll.outcomes.groups import groups_of
from vitalroll.outcomes.product_limit import product_limit
from vitalroll.outcomes.restricted_mean import last_year, mean_difference, restricted_mean
from vitalroll.register.cohort import DEATHS

USUAL_HORIZON = 5.0


@dataclass(frozen=True)
class MeanTimeRequest:
    """Fields of ``outcomes.mean_time``; ``horizon_years`` None: 5, or the whole years all groups reach."""

    interest: tuple[str, ...] = DEATHS
    group: str | None = None
    horizon_years: Annotated[float, Between(0.01, 150)] | None = None
    survived: Years = (0.0, 1.0, 2.0, 3.0)
    further_years: Annotated[float, Between(0.01, 150)] = 2.0
    confidence: Confidence = 0.95


def mean_time(memory: Memory, request: MeanTimeRequest, report: Any) -> dict[str, Any]:
    """Answer ``outcomes.mean_time``: restricted means, their differences, and conditional survival.

    Returns
    -------
    dict
        ``horizon_years``; ``longest``, the latest horizon all groups reach; ``groups`` [{level, mean (a
        ``RestrictedMean``), difference (from the first group, or null), ahead (of ``Conditional``)}];
        ``left_out``; ``cautions``.
    """
    groups = groups_of(memory.cohort(), request.group)
    curves = {
        level: product_limit(table, request.interest, confidence=request.confidence)
        for level, table in groups.tables.items()
    }
    longest = min(last_year(curve) for curve in curves.values())
    horizon = request.horizon_years
    if horizon is None:
        horizon = min(USUAL_HORIZON, math.floor(longest) or longest)
    means = {
        level: restricted_mean(curve, horizon, confidence=request.confidence)
        for level, curve in curves.items()
    }
    first = next(iter(means))
    return {
        "horizon_years": horizon,
        "longest": longest,
        "groups": [
            {
                "level": level,
                "mean": means[level],
                "difference": None
                if level == first
                else mean_difference(means[level], means[first], confidence=request.confidence),
                "ahead": [
                    conditional_survival(curve, survived, request.further_years)
                    for survived in request.survived
                ],
            }
            for level, curve in curves.items()
        ],
        "left_out": groups.left_out,
        "cautions": groups.cautions,
    }


TASKS = {"outcomes.mean_time": (MeanTimeRequest, mean_time)}
