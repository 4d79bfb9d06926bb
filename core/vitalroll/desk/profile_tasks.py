"""How good the register itself is, and whom it says to look for: profile and trace list."""

from __future__ import annotations

from collections.abc import Callable
from dataclasses import dataclass, field
from datetime import date
from typing import Annotated, Any

import numpy as np

from vitalroll.desk.fields import Between
from vitalroll.desk.meaning_tasks import before_the_rule
from vitalroll.desk.memory import Memory
from vitalroll.desk.register_tasks import BuildRequest, choices_of, opened_register
from vitalroll.errors import Caution, Refusal
from vitalroll.register.build import build
from vitalroll.register.cohort import Cohort, Numeric
from vitalroll.register.completeness import (
    ENDINGS,
    completeness,
    completeness_by_level,
    completeness_by_year,
    missingness,
)
from vitalroll.register.covariates import OLDEST
from vitalroll.register.dates import Fault
from vitalroll.register.digit_preference import FEW_AGES, AgeHeaping, age_heaping, days_of_month
from vitalroll.register.overdue import overdue
from vitalroll.register.plan import Plan
from vitalroll.register.spelling import excerpt

MOST_TRACED = 20_000
MOST_SITES = 60

Report = Callable[[str, int, int], None]


@dataclass(frozen=True)
class TraceRequest(BuildRequest):
    """Fields of ``register.trace_list``: those of ``register.build``, and whom and what to list.

    ``columns`` are the only ones whose cells leave the engine.
    """

    overdue_months: Annotated[float, Between(0, 120)] = 6
    with_lost: bool = True
    columns: tuple[str, ...] = field(default_factory=tuple)


@dataclass(frozen=True)
class ProfileRequest(BuildRequest):
    """Fields of ``register.profile``: those of ``register.build``, and a column to group sites by."""

    site: str | None = None


def trace_list(memory: Memory, request: TraceRequest, report: Report) -> dict[str, Any]:
    """Answer ``register.trace_list``: who is overdue for a visit, the longest unseen first.

    Returns
    -------
    dict
        ``n`` on the list; ``months``; ``unjudged`` (under care with no last contact); ``columns``
        {id, heading}; ``rows``: {line, days, last_contact, outcome (a name from MEANINGS), cells};
        ``cautions``: ``trace_list_identifies`` always, ``trace_list_shortened`` (``listed``, ``n``).

    Refusals: those of ``register.build``; ``unknown_column``.
    """
    register = opened_register(memory)
    plan, seen, followed = before_the_rule(memory, request)
    columns = [register.profile(identifier, "columns").column for identifier in request.columns]
    found = overdue(
        followed.rows,
        seen.rows.end.having(Fault.BLANK),
        followed.keep,
        months=request.overdue_months,
        with_lost=request.with_lost,
    )
    line = plan.register.source.table.line
    listed = [
        {
            "line": int(line[row]),
            "days": days,
            "last_contact": date.fromordinal(int(followed.rows.end.day[row])).isoformat(),
            "outcome": "under_care" if followed.rows.outcome[row] == followed.rows.under_care else "lost",
            "cells": [excerpt(column.texts[column.codes[row]]) for column in columns],
        }
        for row, days in zip(
            found.rows[:MOST_TRACED].tolist(), found.days[:MOST_TRACED].tolist(), strict=True
        )
    ]
    cautions = [Caution("trace_list_identifies")]
    if len(found.rows) > MOST_TRACED:
        cautions.append(Caution("trace_list_shortened", {"listed": MOST_TRACED, "n": len(found.rows)}))
    return {
        "n": len(found.rows),
        "months": request.overdue_months,
        "unjudged": found.unjudged,
        "columns": [{"id": column.identifier, "heading": column.heading} for column in columns],
        "rows": listed,
        "cautions": cautions,
    }


def profile(memory: Memory, request: ProfileRequest, report: Report) -> dict[str, Any]:
    """Answer ``register.profile``: how good the register is.

    Returns
    -------
    dict
        ``n``; ``months``: {month (YYYY-MM), count} from the first start to the last; ``missing``:
        {column, heading, n, missing, by_ending: [{ending, n, missing}]}; ``start_days`` and
        ``end_days``: {day, count, expected}; ``ages``: {n, digits, whipple, lower, upper, written}
        or null, where ``written`` is False for ages worked out from birth dates; ``completeness``:
        {everyone, by_year, by_site}, each {group, n, observed_days, possible_days, index,
        with_known}; ``cautions``: ``few_ages`` (``n``, ``least``), ``many_sites`` (``sites``, ``most``).

    Refusals: those of ``register.build``; ``unknown_covariate`` and ``group_is_numeric`` for the
    site; ``nobody_to_profile``.
    """
    register = opened_register(memory)
    choices = choices_of(request)
    cohort = build(register, choices).cohort
    if not len(cohort):
        raise Refusal("nobody_to_profile")
    plan = Plan(register, choices)
    cautions: list[Caution] = []
    rows = np.searchsorted(register.source.table.line, cohort.line)
    used = [each.column.identifier for each in register.profiles]
    missing = missingness(register, used, rows, cohort.outcome)
    written = bool(plan.having("age"))
    ages = plan.written_ages()[rows] if written else _ages(cohort)
    heaping = age_heaping(np.where((ages >= 0) & (ages <= OLDEST), ages, np.nan))
    if 0 < heaping.n < FEW_AGES:
        cautions.append(Caution("few_ages", {"n": heaping.n, "least": FEW_AGES}))
    sites = []
    if request.site is not None:
        site = cohort.grouping(request.site)
        if len(site.levels) > MOST_SITES:
            cautions.append(Caution("many_sites", {"sites": len(site.levels), "most": MOST_SITES}))
        else:
            sites = completeness_by_level(cohort, site)
    exits = cohort.start + cohort.exit
    return {
        "n": len(cohort),
        "months": _months(cohort.start),
        "missing": [
            {
                "column": each.column,
                "heading": register.profile(each.column, "columns").column.heading,
                "n": each.n,
                "missing": each.missing,
                "by_ending": [
                    {"ending": ending, "n": n, "missing": count}
                    for (ending, _), (n, count) in zip(ENDINGS, each.by_ending, strict=True)
                ],
            }
            for each in missing
        ],
        "start_days": days_of_month(cohort.start),
        "end_days": days_of_month(exits[exits < cohort.closing]),
        "ages": None if not heaping.n else _plain_ages(heaping, written),
        "completeness": {
            "everyone": completeness(cohort, np.ones(len(cohort), dtype=bool), None),
            "by_year": completeness_by_year(cohort),
            "by_site": sites,
        },
        "cautions": cautions,
    }


TASKS = {
    "register.trace_list": (TraceRequest, trace_list),
    "register.profile": (ProfileRequest, profile),
}


def _ages(cohort: Cohort) -> np.ndarray:
    age = cohort.covariates.get("age")
    return age.values if isinstance(age, Numeric) else np.full(len(cohort), np.nan)


def _plain_ages(heaping: AgeHeaping, written: bool) -> dict[str, Any]:
    return {
        "n": heaping.n,
        "digits": heaping.digits,
        "whipple": heaping.whipple,
        "lower": heaping.lower,
        "upper": heaping.upper,
        "written": written,
    }


def _months(start: np.ndarray) -> list[dict[str, Any]]:
    months = (start - 719_163).astype("datetime64[D]").astype("datetime64[M]").astype(np.int64)
    first = int(months.min())
    counts = np.bincount(months - first)
    return [
        {"month": str(np.datetime64(first + i, "M")), "count": count}
        for i, count in enumerate(counts.tolist())
    ]
