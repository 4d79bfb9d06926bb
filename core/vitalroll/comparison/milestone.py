"""The difference in survival between two groups at chosen times."""

from __future__ import annotations

from dataclasses import dataclass

import numpy as np

from vitalroll.numbers import DAYS_PER_YEAR, NOT_GIVEN, Estimate, two_sided_z
from vitalroll.outcomes.product_limit import SurvivalCurve


@dataclass(frozen=True)
class Milestone:
    """Survival of two groups at one time, and exposed minus reference.

    ``beyond_follow_up`` holds where one of the two curves says nothing about that time; the
    difference is then NaN.
    """

    years: float
    exposed: Estimate
    reference: Estimate
    difference: Estimate
    beyond_follow_up: bool


def milestone_difference(
    exposed: SurvivalCurve, reference: SurvivalCurve, years: float, *, confidence: float = 0.95
) -> Milestone:
    """Say how far apart two independent product-limit curves are at one time, in survival itself.

    Parameters
    ----------
    exposed, reference : SurvivalCurve
        Curves of two groups that share no patient.
    years : float
        Time since start at which they are compared; to be chosen before looking.
    confidence : float

    Returns
    -------
    Milestone
        The difference has limits difference -+ z sqrt(se1^2 + se0^2), cut at -1 and 1. They are
        NaN where a curve has come down to 0 or has not moved from 1, for Greenwood's error says
        nothing there.

    Cautions
    --------
    Nothing is adjusted for.

    References
    ----------
    Greenwood (1926) Reports on Public Health and Medical Subjects 33:1-26. Klein, Logan, Harhoff
    & Andersen (2007) Statistics in Medicine 26:4505-4519, the untransformed difference.
    """
    day = years * DAYS_PER_YEAR
    given = exposed.span.speaks_of(day) and reference.span.speaks_of(day)
    at_exposed, at_reference = exposed.at(day), reference.at(day)
    return Milestone(
        years=years,
        exposed=at_exposed,
        reference=at_reference,
        difference=_difference(at_exposed, at_reference, confidence) if given else NOT_GIVEN,
        beyond_follow_up=not given,
    )


def _difference(exposed: Estimate, reference: Estimate, confidence: float) -> Estimate:
    value = exposed.value - reference.value
    if not (0 < exposed.value < 1 and 0 < reference.value < 1):
        return Estimate(value, float("nan"), float("nan"))
    error = float(np.hypot(exposed.standard_error, reference.standard_error))
    margin = two_sided_z(confidence) * error
    return Estimate(value, max(-1.0, value - margin), min(1.0, value + margin), error)
