"""Whether one group did better: the tasks behind the Compare place."""

from __future__ import annotations

import dataclasses
from dataclasses import dataclass
from typing import Annotated, Any, Literal

from vitalroll.comparison.alike import alike
from vitalroll.comparison.bias import e_value
from vitalroll.comparison.cox import cox
from vitalroll.comparison.design import Choice
from vitalroll.comparison.intervals import compare_intervals
from vitalroll.comparison.milestone import milestone_difference
from vitalroll.comparison.risk_sums import Ties
from vitalroll.desk.fields import Between
from vitalroll.desk.memory import Memory
from vitalroll.errors import Caution, Refusal
from vitalroll.outcomes.actuarial import Step, interval_edges
from vitalroll.outcomes.groups import Groups, groups_of
from vitalroll.outcomes.landmark import from_landmark
from vitalroll.outcomes.product_limit import product_limit
from vitalroll.outcomes.risk_table import RiskTable
from vitalroll.register.cohort import DEATHS, Cohort

FEW_EVENTS_IN_GROUP = 5
"""With fewer outcomes in a group a comparison hangs on one or two patients."""

Confidence = Annotated[float, Between(0.5, 0.9999)]


@dataclass(frozen=True)
class GroupTiming:
    """When it was known who belongs to which group: at the ``start``, only ``later``, or not said (None).

    ``landmark_days``, for groups known later: the day after the start from which time is counted.
    ``found_alike``: whether the patients of all groups were found in the same way, or not said (None). Who is
    found by looking for the illness is found earlier, and lives longer from then on without living longer
    (lead time; Feinleib & Zelen 1969 Arch Environ Health 19:412-415).
    """

    known: Literal["start", "later"] | None = None
    landmark_days: Annotated[int, Between(1, 20_000)] | None = None
    found_alike: bool | None = None


NOT_SAID = GroupTiming()


@dataclass(frozen=True)
class AlikeRequest:
    """Fields of ``compare.alike``."""

    group: str
    exposed: str
    reference: str
    interest: tuple[str, ...] = DEATHS
    timing: GroupTiming = NOT_SAID


@dataclass(frozen=True)
class DifferenceRequest:
    """Fields of ``compare.difference``."""

    group: str
    exposed: str
    reference: str
    interest: tuple[str, ...] = DEATHS
    years: tuple[Annotated[float, Between(0, 150)], ...] = (1.0, 3.0, 5.0)
    confidence: Confidence = 0.95
    timing: GroupTiming = NOT_SAID


@dataclass(frozen=True)
class IntervalsRequest:
    """Fields of ``compare.intervals``."""

    group: str
    exposed: str
    reference: str
    interest: tuple[str, ...] = DEATHS
    step: Step = "year"
    intervals: Annotated[int, Between(1, 240)] = 5
    confidence: Confidence = 0.95
    timing: GroupTiming = NOT_SAID


@dataclass(frozen=True)
class CovariateChoice:
    """One covariate of ``compare.cox``; see ``comparison.design.Choice``."""

    id: str
    reference: str | None = None
    per: float = 1.0


@dataclass(frozen=True)
class CoxRequest:
    """Fields of ``compare.cox``."""

    covariates: tuple[CovariateChoice, ...]
    interest: tuple[str, ...] = DEATHS
    ties: Ties = "efron"
    confidence: Confidence = 0.95
    timing: GroupTiming = NOT_SAID


def compared(memory: Memory, timing: GroupTiming) -> Cohort:
    """Return the cohort to compare groups in, counted from a landmark when the group was known only later.

    Raises
    ------
    Refusal
        ``group_known_later`` without a landmark; those of ``landmark.from_landmark``.
    """
    if timing.known != "later":
        return memory.cohort()
    if timing.landmark_days is None:
        raise Refusal("group_known_later", field="timing.landmark_days")
    return from_landmark(memory.cohort(), timing.landmark_days)


def timing_cautions(timing: GroupTiming) -> list[Caution]:
    """Return what has to be said of a comparison because of when its groups became known, and how found."""
    cautions = []
    if timing.known is None:
        cautions.append(Caution("group_timing_not_said"))
    elif timing.known == "later":
        cautions.append(Caution("counted_from_landmark", {"days": timing.landmark_days}))
    if timing.found_alike is False:
        cautions.append(Caution("found_differently"))
    return cautions


def alike_groups(memory: Memory, request: AlikeRequest, report: Any) -> dict[str, Any]:
    """Answer ``compare.alike``: an ``alike.Alike``."""
    cohort = compared(memory, request.timing)
    found = alike(cohort, request.group, request.exposed, request.reference, request.interest)
    return {
        **{field.name: getattr(found, field.name) for field in dataclasses.fields(found)},
        "cautions": [*timing_cautions(request.timing), *found.cautions],
    }


def difference(memory: Memory, request: DifferenceRequest, report: Any) -> dict[str, Any]:
    """Answer ``compare.difference``: survival of two groups at chosen times and how far apart it is.

    Returns
    -------
    dict
        ``rows``, each a ``milestone.Milestone``; ``cautions``.
    """
    exposed, reference = _pair(
        compared(memory, request.timing), request.group, request.exposed, request.reference
    )
    curves = [
        product_limit(table, request.interest, confidence=request.confidence)
        for table in (exposed, reference)
    ]
    return {
        "rows": [
            milestone_difference(*curves, years, confidence=request.confidence) for years in request.years
        ],
        "cautions": [
            *timing_cautions(request.timing),
            *few_events({request.exposed: exposed, request.reference: reference}, request.interest),
        ],
    }


def intervals(memory: Memory, request: IntervalsRequest, report: Any) -> dict[str, Any]:
    """Answer ``compare.intervals``: two groups in each interval of follow-up, and pooled.

    Returns
    -------
    dict
        ``rows`` {from_days, to_days, exposed, reference (each {entering, lost, withdrawn, events,
        effective, risk, odds}), risk_ratio, odds_ratio, risk_difference, number_needed}; ``pooled``
        and ``homogeneity`` as in ``stratified``; ``left_out`` [{from_days, to_days, code}]; ``cautions``.
    """
    exposed, reference = _pair(
        compared(memory, request.timing), request.group, request.exposed, request.reference
    )
    found = compare_intervals(
        exposed,
        reference,
        request.interest,
        step=request.step,
        intervals=request.intervals,
        confidence=request.confidence,
    )
    width = float(interval_edges(request.step, 1)[1])
    return {
        "rows": [
            {
                "from_days": row.from_days,
                "to_days": row.to_days,
                "exposed": dataclasses.asdict(row.exposed)
                | {"risk": row.measures.exposed_risk, "odds": row.measures.exposed_odds},
                "reference": dataclasses.asdict(row.reference)
                | {"risk": row.measures.reference_risk, "odds": row.measures.reference_odds},
                "risk_ratio": row.measures.risk_ratio,
                "odds_ratio": row.measures.odds_ratio,
                "risk_difference": row.measures.risk_difference,
                "number_needed": row.measures.number_needed,
            }
            for row in found.rows
        ],
        "pooled": found.pooled.pooled,
        "homogeneity": found.pooled.homogeneity,
        "left_out": [
            {"from_days": left.stratum * width, "to_days": (left.stratum + 1) * width, "code": left.code}
            for left in found.left_out
        ],
        "cautions": [
            *timing_cautions(request.timing),
            *few_events({request.exposed: exposed, request.reference: reference}, request.interest),
            *found.cautions,
        ],
    }


def regression(memory: Memory, request: CoxRequest, report: Any) -> dict[str, Any]:
    """Answer ``compare.cox``: the fields of a ``cox.CoxFit``, and ``e_value`` of its first term."""
    choices = [Choice(choice.id, choice.reference, choice.per) for choice in request.covariates]
    cohort = compared(memory, request.timing)
    fit = cox(cohort, request.interest, choices, ties=request.ties, confidence=request.confidence)
    return {
        **{field.name: getattr(fit, field.name) for field in dataclasses.fields(fit)},
        "e_value": e_value(fit.terms[0].hazard_ratio, fit.events / fit.n),
        "cautions": [*timing_cautions(request.timing), *fit.cautions],
    }


def _pair(cohort: Cohort, group: str, exposed: str, reference: str) -> tuple[RiskTable, RiskTable]:
    """Return the risk tables of two different groups; refuse any other pair by its field."""
    if exposed == reference:
        raise Refusal("same_group", field="reference", level=reference)
    tables = named_tables(groups_of(cohort, group))
    for field, level in (("exposed", exposed), ("reference", reference)):
        if level not in tables:
            raise Refusal("unknown_level", field=field, covariate=group, level=level)
    return tables[exposed], tables[reference]


def named_tables(groups: Groups) -> dict[str, RiskTable]:
    """Return the risk tables of groups by their names."""
    return {str(level): table for level, table in groups.tables.items()}


def few_events(tables: dict[str, RiskTable], interest: tuple[str, ...]) -> list[Caution]:
    """Return a caution for each group with hardly any outcomes."""
    found = []
    for level, table in tables.items():
        events = int(table.events(interest).sum())
        if events < FEW_EVENTS_IN_GROUP:
            found.append(Caution("few_events_in_group", {"level": level, "events": events}))
    return found


TASKS = {
    "compare.alike": (AlikeRequest, alike_groups),
    "compare.difference": (DifferenceRequest, difference),
    "compare.intervals": (IntervalsRequest, intervals),
    "compare.cox": (CoxRequest, regression),
}
