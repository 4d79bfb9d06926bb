"""How often outcomes come: the task behind the rates of the Outcomes place."""

from __future__ import annotations

from dataclasses import dataclass
from typing import Any, Literal

import numpy as np

from vitalroll.desk.memory import Memory
from vitalroll.desk.outcome_tasks import Confidence
from vitalroll.errors import Caution
from vitalroll.outcomes.groups import groups_of
from vitalroll.outcomes.lexis import Scale, ages, calendar_years, split, years_since_start
from vitalroll.outcomes.person_time import rate
from vitalroll.outcomes.rates import (
    STANDARD_AGES,
    STANDARDS,
    BandRate,
    rate_ratio,
    rates_by_band,
    standardise,
)
from vitalroll.register.cohort import DEATHS, Cohort, Numeric

SINCE_START = (0, 1, 2, 3, 5, 10, 20)
AGE_STARTS = (0, 5, 15, 25, 45, 65)

THIN_SHARE = 0.05
"""More of a standard's weight than this on bands that hardly anybody lived in makes its limits useless."""

FEW_EVENTS = 10
"""Fewer outcomes than this make a rate that one patient moves by a tenth or more."""


@dataclass(frozen=True)
class RatesRequest:
    """Fields of ``outcomes.rates``."""

    interest: tuple[str, ...] = DEATHS
    group: str | None = None
    by: Literal["year", "since_start", "age"] = "year"
    confidence: Confidence = 0.95


def rates(memory: Memory, request: RatesRequest, report: Any) -> dict[str, Any]:
    """Answer ``outcomes.rates``: outcomes for the time observed, in bands of one time scale.

    Returns
    -------
    dict
        ``bands`` [{from, to (years or ages; to is null for the last)}]; ``groups`` [{level, all (a
        ``BandRate``), bands (of ``BandRate``), ratio (to the first group, or null), standards {name:
        ``Standardised``}, or null where age is not known}]; ``unknown_age``; ``left_out``; ``cautions``.
    """
    cohort = memory.cohort()
    groups = groups_of(cohort, request.group)
    scale, bands = _scale(cohort, request.by)
    pieces = split(cohort, [scale])
    has_age = isinstance(cohort.covariates.get("age"), Numeric)
    standard_scale = ages(cohort, STANDARD_AGES) if has_age else None
    standard_pieces = split(cohort, [standard_scale]) if standard_scale else None
    found = []
    cautions = list(groups.cautions)
    for level in groups.tables:
        inside = None
        if level is not None:
            covariate = cohort.grouping(request.group or "")
            inside = covariate.codes == covariate.levels.index(level)
        by_band = rates_by_band(
            cohort, pieces, 0, scale.bands, request.interest, inside=inside, confidence=request.confidence
        )
        standards = None
        if standard_scale and standard_pieces:
            by_age = rates_by_band(
                cohort, standard_pieces, 0, standard_scale.bands, request.interest, inside=inside
            )
            standards = {
                name: standardise(by_age, weights, confidence=request.confidence)
                for name, weights in STANDARDS.items()
                if any(band.person_years for band in by_age)
            }
        whole = _together(by_band, request.confidence)
        if whole.events < FEW_EVENTS:
            cautions.append(Caution("few_events_in_rate", {"level": level, "events": whole.events}))
        found.append({"level": level, "all": whole, "bands": by_band, "standards": standards})
    for each in found:
        first = found[0]["all"]
        own = each["all"]
        each["ratio"] = (
            None
            if each is found[0]
            else rate_ratio(
                own.events, own.person_years, first.events, first.person_years, request.confidence
            )
        )
    standards = [standard for each in found for standard in (each["standards"] or {}).values()]
    used, thin = ([getattr(each, name) for each in standards] for name in ("weight_used", "weight_thin"))
    if used and min(used) < 0.95:
        cautions.append(Caution("standard_cut_short", {"share": min(used)}))
    if thin and max(thin) > THIN_SHARE:
        cautions.append(Caution("standard_thin", {"share": max(thin)}))
    return {
        "bands": bands,
        "groups": found,
        "unknown_age": int(np.isnan(scale.offset).sum()),
        "left_out": groups.left_out,
        "cautions": cautions,
    }


def _scale(cohort: Cohort, by: str) -> tuple[Scale, list[dict[str, float | None]]]:
    if by == "year":
        scale, years = calendar_years(cohort)
        return scale, [{"from": year, "to": year + 1} for year in years]
    starts = SINCE_START if by == "since_start" else AGE_STARTS
    scale = years_since_start(cohort, starts) if by == "since_start" else ages(cohort, starts)
    ends = (*starts[1:], None)
    return scale, [{"from": start, "to": end} for start, end in zip(starts, ends, strict=True)]


def _together(bands: tuple[BandRate, ...], confidence: float) -> BandRate:
    """Return all bands as one."""
    events, years = sum(band.events for band in bands), sum(band.person_years for band in bands)
    return BandRate(events, years, rate(events, years, confidence))


TASKS = {"outcomes.rates": (RatesRequest, rates)}
