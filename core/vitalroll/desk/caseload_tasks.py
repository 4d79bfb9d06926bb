"""The coming years: the tasks behind the Caseload place."""

from __future__ import annotations

import datetime
from collections.abc import Iterable
from dataclasses import dataclass, field
from typing import Annotated, Any, Literal

import numpy as np

from vitalroll.caseload.inflow import FEWEST_WHOLE_YEARS, Inflow, inflow_from_history, inflow_typed
from vitalroll.caseload.outlook import Outlook, prospect
from vitalroll.caseload.projection import MONTHS_PER_YEAR, months_here_today
from vitalroll.caseload.resources import PerPatientYear
from vitalroll.caseload.retention import Retention, retention
from vitalroll.caseload.scenario import WhatIf
from vitalroll.desk.fields import Between
from vitalroll.desk.memory import Memory
from vitalroll.errors import Caution, Refusal
from vitalroll.outcomes.competing import WAYS_OF_LEAVING
from vitalroll.outcomes.risk_table import risk_table
from vitalroll.register.cohort import Cohort, meaning_code

Amount = Annotated[float, Between(0, 1e12)]
Percentage = Annotated[float, Between(0, 100)]

_LONG_UNSEEN_DAYS = 365
_LONG_UNSEEN_SHARE = 0.1
_HELD_SHARE_WORTH_SAYING = 0.25


@dataclass(frozen=True)
class HistoryRequest:
    """``caseload.history`` has no fields."""


@dataclass(frozen=True)
class Newcomers:
    """Where the yearly number of newcomers comes from; ``per_year`` when it is typed."""

    basis: Literal["history", "typed"] = "history"
    per_year: Annotated[float, Between(0, 1e6)] | None = None


@dataclass(frozen=True)
class Resources:
    """What one patient-year of care takes."""

    visits: Amount = 0.0
    medicine_units: Amount = 0.0
    cost: Amount = 0.0


@dataclass(frozen=True)
class Change:
    """A what-if; see ``caseload.scenario.WhatIf``."""

    fewer_newcomers: Percentage = 0.0
    fewer_lost: Percentage = 0.0
    fewer_deaths: Percentage = 0.0
    from_year: Annotated[int, Between(1, 30)] = 1


@dataclass(frozen=True)
class ProjectRequest:
    """Fields of ``caseload.project``."""

    years: Annotated[int, Between(1, 30)] = 5
    newcomers: Newcomers = field(default_factory=Newcomers)
    resources: Resources = field(default_factory=Resources)
    what_if: Change | None = None
    draws: Annotated[int, Between(100, 20_000)] = 1000
    seed: Annotated[int, Between(0, 2**53)] = 1


def history(memory: Memory, request: HistoryRequest, report: Any) -> dict[str, Any]:
    """Answer ``caseload.history``: who came, who stayed, who is under care.

    Returns
    -------
    dict
        ``newcomers`` [{year, count, whole}]; ``newcomers_per_year`` {mean, lower, upper,
        dispersion, model ("poisson" or "negative_binomial"), whole_years}, null where unknown;
        ``retention`` [{from_years, to_years, at_risk, person_years, exits, staying, ways}], one
        entry for each stretch of time since start with enough observed, thin years joined with
        those after; ``staying`` is the chance of staying through the whole stretch; ``ways`` has
        all seven ways of leaving in the order of MEANINGS: {meaning, events, hazard, lower, upper
        (per person-year), share (of all leaving in the stretch, null if nobody left)};
        ``beyond`` {from_years, person_years, exits}: observed after that, too thin to use;
        ``today`` {total, by_duration [{from_years, to_years, count}]} by whole years since start;
        ``supported_years``; ``history_years``; ``closing_date``; ``cautions``.

    Refusals: ``no_register``, ``no_patients``, ``no_person_time``, ``start_after_closing``.
    Cautions: those of ``inflow_from_history`` and ``retention``; ``under_care_long_unseen``
    (count, share, days): more than a tenth of those under care were last seen over so many days
    before the closing date, and some may be lost.
    """
    cohort = memory.cohort()
    inflow = inflow_from_history(cohort)
    hazards = retention(risk_table(cohort))
    today = months_here_today(cohort)
    return {
        "newcomers": inflow.years,
        "newcomers_per_year": _per_year(inflow),
        "retention": _stretches(hazards),
        "beyond": {
            "from_years": hazards.supported_years,
            "person_years": hazards.beyond_person_years,
            "exits": hazards.beyond_exits,
        },
        "today": {"total": len(today), "by_duration": _by_duration(today)},
        "supported_years": hazards.supported_years,
        "history_years": inflow.history_years,
        "closing_date": datetime.date.fromordinal(cohort.closing).isoformat(),
        "cautions": [*inflow.cautions, *hazards.cautions, *_long_unseen(cohort)],
    }


def project_caseload(memory: Memory, request: ProjectRequest, report: Any) -> dict[str, Any]:
    """Answer ``caseload.project``: how many under care in the coming years, and what it takes.

    A band is {value, p80: [lower, upper], p95: [lower, upper]}; its value is what is expected at
    the rates observed, not the middle of the draws. Lists have one band for each projected year, except
    ``under_care``, which starts with today. In the values, those under care, plus newcomers, less
    leaving make up those under care a year later.

    Returns
    -------
    dict
        ``closing_date``; ``years`` [{year, ends}]; ``newcomers_per_year`` as in the history, model
        "typed" when typed; ``baseline`` {under_care, patient_years, newcomers, deaths, lost,
        leaving [{meaning, values}] for all seven ways, resources {visits, medicine_units, cost}};
        ``what_if``: the same, or null; ``difference`` {under_care, patient_years, newcomers,
        deaths, lost, visits, medicine_units, cost, total {all of these but under_care: one band
        for all years together}}, what-if less baseline, or null; ``seed``; ``draws``; ``tail``
        {from_years, held_share [today and at the end of each year]}: beyond ``from_years`` since
        start the last hazards are held, and ``held_share`` is the share of those expected under
        care (baseline) who are beyond; ``history_years``; ``cautions``.

    Refusals: ``no_register``, ``nobody_under_care``, ``no_person_time``, ``start_after_closing``,
    ``history_too_short`` (field newcomers.basis; whole_years, needed), ``missing_field``
    (newcomers.per_year), ``out_of_range`` (percentages, years, what_if.from_year).

    Cautions: those of the history (of the newcomers' only when they are used);
    ``horizon_beyond_history`` (years, history_years); ``hazard_held`` (from_years, share) when
    more than a quarter of those under care at the end of the last year are beyond support.
    """
    cohort = memory.cohort()
    recorded = inflow_from_history(cohort)
    inflow = _newcomers(request.newcomers, recorded)
    hazards = retention(risk_table(cohort))
    found = prospect(
        months_here_today(cohort),
        hazards,
        inflow,
        PerPatientYear(**vars(request.resources)),
        years=request.years,
        what_if=WhatIf(**vars(request.what_if)) if request.what_if else None,
        draws=request.draws,
        seed=request.seed,
        report=report,
    )
    cautions = [*inflow.cautions, *hazards.cautions, *_long_unseen(cohort)]
    if request.years > recorded.history_years:
        parameters = {"years": request.years, "history_years": recorded.history_years}
        cautions.append(Caution("horizon_beyond_history", parameters))
    if found.held_share[-1] > _HELD_SHARE_WORTH_SAYING:
        parameters = {"from_years": hazards.supported_years, "share": float(found.held_share[-1])}
        cautions.append(Caution("hazard_held", parameters))
    return {
        "closing_date": datetime.date.fromordinal(cohort.closing).isoformat(),
        "years": [
            {"year": year, "ends": _years_after(cohort.closing, year)} for year in range(1, request.years + 1)
        ],
        "newcomers_per_year": _per_year(inflow),
        "baseline": _course(found.baseline),
        "what_if": _course(found.what_if) if found.what_if else None,
        "difference": _difference(found.baseline, found.what_if) if found.what_if else None,
        "seed": request.seed,
        "draws": request.draws,
        "tail": {"from_years": hazards.supported_years, "held_share": found.held_share},
        "history_years": recorded.history_years,
        "cautions": cautions,
    }


def _newcomers(asked: Newcomers, recorded: Inflow) -> Inflow:
    if asked.basis == "typed":
        if asked.per_year is None:
            raise Refusal("missing_field", field="newcomers.per_year")
        return inflow_typed(asked.per_year, days_at_arrival=recorded.days_at_arrival)
    if recorded.whole_years < FEWEST_WHOLE_YEARS:
        raise Refusal(
            "history_too_short",
            field="newcomers.basis",
            whole_years=recorded.whole_years,
            needed=FEWEST_WHOLE_YEARS,
        )
    return recorded


def _per_year(inflow: Inflow) -> dict[str, Any]:
    return {
        "mean": inflow.per_year.value,
        "lower": inflow.per_year.lower,
        "upper": inflow.per_year.upper,
        "dispersion": inflow.dispersion,
        "model": inflow.model,
        "whole_years": inflow.whole_years,
    }


def _stretches(hazards: Retention) -> list[dict[str, Any]]:
    value, (lower, upper) = hazards.hazards, hazards.limits()
    exits, staying = hazards.exits.sum(axis=1), hazards.staying()
    return [
        {
            "from_years": hazards.edges[i],
            "to_years": hazards.edges[i + 1],
            "at_risk": hazards.at_risk[i],
            "person_years": hazards.person_years[i],
            "exits": exits[i],
            "staying": staying[i],
            "ways": [
                {
                    "meaning": way,
                    "events": hazards.exits[i, k],
                    "hazard": value[i, k],
                    "lower": lower[i, k],
                    "upper": upper[i, k],
                    "share": hazards.exits[i, k] / exits[i] if exits[i] else None,
                }
                for k, way in enumerate(WAYS_OF_LEAVING)
            ],
        }
        for i in range(len(exits))
    ]


def _by_duration(months_here: np.ndarray) -> list[dict[str, int]]:
    counts = np.bincount(months_here // MONTHS_PER_YEAR)
    return [
        {"from_years": year, "to_years": year + 1, "count": count}
        for year, count in enumerate(counts.tolist())
    ]


def _long_unseen(cohort: Cohort) -> Iterable[Caution]:
    under_care = cohort.outcome == meaning_code("under_care")
    unseen = cohort.closing - (cohort.start + cohort.exit) > _LONG_UNSEEN_DAYS
    total, count = int(np.count_nonzero(under_care)), int(np.count_nonzero(under_care & unseen))
    if count > _LONG_UNSEEN_SHARE * total:
        parameters = {"count": count, "share": count / total, "days": _LONG_UNSEEN_DAYS}
        yield Caution("under_care_long_unseen", parameters)


def _course(outlook: Outlook) -> dict[str, Any]:
    return {
        "under_care": outlook.under_care.bands(),
        "patient_years": outlook.patient_years.bands(),
        "newcomers": outlook.newcomers.bands(),
        "deaths": outlook.deaths.bands(),
        "lost": outlook.lost.bands(),
        "leaving": [{"meaning": way, "values": measure.bands()} for way, measure in outlook.leaving.items()],
        "resources": {name: measure.bands() for name, measure in outlook.resources.items()},
    }


def _difference(baseline: Outlook, what_if: Outlook) -> dict[str, Any]:
    before = baseline.compared()
    changes = {name: after.less(before[name]) for name, after in what_if.compared().items()}
    return {
        **{name: change.bands() for name, change in changes.items()},
        "total": {name: change.total() for name, change in changes.items() if name != "under_care"},
    }


def _years_after(closing: int, years: int) -> str:
    """Return the ISO day so many years on; a closing date of 29 February goes on to the 28th."""
    date = datetime.date.fromordinal(closing)
    try:
        return date.replace(year=date.year + years).isoformat()
    except ValueError:
        return date.replace(year=date.year + years, day=28).isoformat()


TASKS = {
    "caseload.history": (HistoryRequest, history),
    "caseload.project": (ProjectRequest, project_caseload),
}
