"""How many the next audit needs: the tasks behind that part of From counts."""

from __future__ import annotations

import dataclasses
from dataclasses import dataclass
from typing import Annotated, Any

from vitalroll.comparison.planning import (
    AccuracySize,
    SurveySize,
    accuracy_size,
    proportions_size,
    survey_size,
    survival_size,
)
from vitalroll.desk.fields import Between
from vitalroll.desk.memory import Memory

Share = Annotated[float, Between(0, 1)]
Years = Annotated[float, Between(0, 50)]
People = Annotated[int, Between(1, 10**9)]
Power = Annotated[float, Between(0.5, 0.999)]
Significance = Annotated[float, Between(0.0001, 0.5)]
Confidence = Annotated[float, Between(0.5, 0.9999)]

OTHER_POWERS = (0.8, 0.9)
OTHER_RATIOS = (1.25, 1.5, 1.75, 2.0, 2.5, 3.0)
"""What stands beside the size that was asked for: a plan hangs on guesses, and these show how much."""


@dataclass(frozen=True)
class SurvivalRequest:
    """Fields of ``counts.survival_size``."""

    hazard_ratio: Annotated[float, Between(0.01, 100)]
    survival: Share
    at_years: Annotated[float, Between(0.01, 50)]
    accrual_years: Years
    follow_up_years: Years
    share_exposed: Share = 0.5
    lost: Annotated[float, Between(0, 0.95)] = 0.0
    power: Power = 0.8
    significance: Significance = 0.05
    available: People | None = None


@dataclass(frozen=True)
class ProportionsRequest:
    """Fields of ``counts.proportions_size``."""

    exposed: Share
    reference: Share
    reference_for_each: Annotated[float, Between(0.01, 100)] = 1.0
    power: Power = 0.8
    significance: Significance = 0.05
    available: People | None = None


@dataclass(frozen=True)
class SurveyRequest:
    """Fields of ``counts.survey_size``."""

    proportion: Share
    margin: Share
    design_effect: Annotated[float, Between(1, 100)] = 1.0
    population: People | None = None
    response: Annotated[float, Between(0.01, 1)] = 1.0
    confidence: Confidence = 0.95


@dataclass(frozen=True)
class AccuracyRequest:
    """Fields of ``counts.accuracy_size``."""

    sensitivity: Share
    specificity: Share
    margin: Share
    prevalence: Share
    confidence: Confidence = 0.95


def survival(memory: Memory, request: SurvivalRequest, report: Any) -> dict[str, Any]:
    """Answer ``counts.survival_size``: a ``SurvivalSize``, and ``others`` for other ratios and powers."""
    asked = dataclasses.asdict(request)
    size = survival_size(**asked)
    # Ratios on the side of the one that was asked for: protective ones below 1.
    ratios = [ratio if request.hazard_ratio > 1 else 1 / ratio for ratio in OTHER_RATIOS]
    others = [
        {"hazard_ratio": ratio, "power": power, "events": other.events, "patients": other.patients}
        for ratio in ratios
        for power in OTHER_POWERS
        for other in [survival_size(**asked | {"hazard_ratio": ratio, "power": power, "available": None})]
    ]
    return {**_fields(size), "others": others}


def proportions(memory: Memory, request: ProportionsRequest, report: Any) -> dict[str, Any]:
    """Answer ``counts.proportions_size``: a ``ProportionsSize``, and ``others`` for other powers."""
    asked = dataclasses.asdict(request)
    others = [
        {"power": power, "exposed": other.exposed, "reference": other.reference}
        for power in (*OTHER_POWERS, 0.95)
        for other in [proportions_size(**asked | {"power": power, "available": None})]
    ]
    return {**_fields(proportions_size(**asked)), "others": others}


def survey(memory: Memory, request: SurveyRequest, report: Any) -> SurveySize:
    """Answer ``counts.survey_size``: a ``SurveySize``."""
    return survey_size(**dataclasses.asdict(request))


def accuracy(memory: Memory, request: AccuracyRequest, report: Any) -> AccuracySize:
    """Answer ``counts.accuracy_size``: an ``AccuracySize``."""
    return accuracy_size(**dataclasses.asdict(request))


def _fields(result: Any) -> dict[str, Any]:
    return {field.name: getattr(result, field.name) for field in dataclasses.fields(result)}


TASKS = {
    "counts.survival_size": (SurvivalRequest, survival),
    "counts.proportions_size": (ProportionsRequest, proportions),
    "counts.survey_size": (SurveyRequest, survey),
    "counts.accuracy_size": (AccuracyRequest, accuracy),
}
