"""The coming years: the tasks behind the Caseload place."""

from __future__ import annotations

import datetime
from dataclasses import dataclass
from typing import Any

import numpy as np

from vitalroll.caseload.inflow import inflow_from_history
from vitalroll.caseload.outlook import Outlook, prospect
from vitalroll.caseload.projection import MONTHS_PER_YEAR, months_here_today
from vitalroll.caseload.retention import Retention, retention
from vitalroll.desk.coming_years import Setting, begin, held_hazard, long_unseen, per_year, years_ahead
from vitalroll.desk.memory import Memory
from vitalroll.outcomes.competing import WAYS_OF_LEAVING
from vitalroll.outcomes.risk_table import risk_table


@dataclass(frozen=True)
class HistoryRequest:
    """``caseload.history`` has no fields."""


@dataclass(frozen=True)
class ProjectRequest(Setting):
    """Fields of ``caseload.project``: those of every projection."""


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
        "newcomers_per_year": per_year(inflow),
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
        "cautions": [*inflow.cautions, *hazards.cautions, *long_unseen(cohort)],
    }


def project_caseload(memory: Memory, request: ProjectRequest, report: Any) -> dict[str, Any]:
    """Answer ``caseload.project``: how many under care in the coming years.

    A band is {value, p80: [lower, upper], p95: [lower, upper]}; its value is what is expected at
    the rates observed, not the middle of the draws. Lists have one band for each projected year, except
    ``under_care``, which starts with today. In the values, those under care, plus newcomers, less
    leaving make up those under care a year later.

    Returns
    -------
    dict
        ``closing_date``; ``years`` [{year, ends}]; ``newcomers_per_year`` as in the history, model
        "typed" when typed; ``baseline`` {under_care, patient_years, newcomers, deaths, lost,
        leaving [{meaning, values}] for all seven ways}; ``seed``; ``draws``; ``tail``
        {rule, from_years, held_share [today and at the end of each year]}: beyond ``from_years`` since
        start the last hazards are held or changed by the rule, and ``held_share`` is the share of
        those expected under care who are beyond; ``history_years``; ``cautions``.

    Refusals and cautions: those of ``coming_years.begin``; ``hazard_held`` (from_years, share) when
    more than a quarter of those under care at the end of the last year are beyond support.
    """
    start = begin(memory, request)
    found = prospect(
        start.today,
        start.hazards,
        start.inflow,
        years=request.years,
        times_today=start.times_today,
        draws=request.draws,
        seed=request.seed,
        report=report,
    )
    return {
        "closing_date": datetime.date.fromordinal(start.closing).isoformat(),
        "years": years_ahead(start.closing, request.years),
        "newcomers_per_year": per_year(start.inflow),
        "baseline": _course(found.baseline),
        "seed": request.seed,
        "draws": request.draws,
        "tail": {
            "rule": request.tail,
            "from_years": start.hazards.supported_years,
            "held_share": found.held_share,
        },
        "history_years": start.history_years,
        "cautions": [*start.cautions, *held_hazard(start.hazards, found.held_share)],
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


def _course(outlook: Outlook) -> dict[str, Any]:
    return {
        "under_care": outlook.under_care.bands(),
        "patient_years": outlook.patient_years.bands(),
        "newcomers": outlook.newcomers.bands(),
        "deaths": outlook.deaths.bands(),
        "lost": outlook.leaving("lost").bands(),
        "leaving": [{"meaning": way, "values": outlook.leaving(way).bands()} for way in WAYS_OF_LEAVING],
    }


TASKS = {
    "caseload.history": (HistoryRequest, history),
    "caseload.project": (ProjectRequest, project_caseload),
}
