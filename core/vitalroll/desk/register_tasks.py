"""Opening a register and understanding it: the tasks behind the place Register."""

from __future__ import annotations

from collections import Counter
from collections.abc import Callable
from dataclasses import dataclass, field
from datetime import date
from typing import Annotated, Any

import numpy as np

from vitalroll.desk.fields import Between
from vitalroll.desk.memory import Memory
from vitalroll.errors import Caution, Refusal
from vitalroll.numbers import DAYS_PER_YEAR
from vitalroll.register.build import Built, Noted, build
from vitalroll.register.cohort import MEANINGS, Categorical, Cohort, Covariate
from vitalroll.register.dates import EARLIEST_YEAR, LATEST_YEAR, Fault, Form, read_dates
from vitalroll.register.meanings import propose_meaning, propose_sexes
from vitalroll.register.plan import Choices
from vitalroll.register.profile import Profile, Register, profile_columns
from vitalroll.register.roles import Proposal, propose_roles
from vitalroll.register.source import open_source
from vitalroll.register.spelling import excerpt
from vitalroll.register.variants import variants

Report = Callable[[str, int, int], None]

PREVIEW_ROWS = 8
SAMPLES = 5
MOST_VALUES = 500
"""Of a column with more distinct values, the most frequent are listed."""

MOST_LEVELS = 200
MOST_LISTED = 5_000
"""Rows set aside or changed for one reason are listed up to this many; all are counted."""


@dataclass(frozen=True)
class OpenRequest:
    """Fields of ``register.open``. ``header_line`` 0 means that there are no headings."""

    name: str
    content: bytes
    sheet: str | None = None
    header_line: Annotated[int, Between(0, 2_000_000)] | None = None


@dataclass(frozen=True)
class ValuesRequest:
    """Fields of ``register.values``."""

    column: str


@dataclass(frozen=True)
class BuildRequest:
    """Fields of ``register.build``, ``register.findings`` and all tasks that look at rows once more.

    ``repairs`` names the findings whose repair is accepted, each with the lines for which it is not;
    ``spellings`` holds, by column, values and the value that each is.
    """

    roles: dict[str, str]
    meanings: dict[str, str]
    closing_date: str
    blank_meaning: str | None = None
    sexes: dict[str, str] = field(default_factory=dict)
    date_orders: dict[str, str] = field(default_factory=dict)
    repairs: dict[str, tuple[int, ...]] = field(default_factory=dict)
    unseen_months: Annotated[float, Between(1, 120)] = 12
    spellings: dict[str, dict[str, str]] = field(default_factory=dict)
    calendars: dict[str, str] = field(default_factory=dict)


@dataclass(frozen=True)
class ForgetRequest:
    """No fields."""


def open_register(memory: Memory, request: OpenRequest, report: Report) -> dict[str, Any]:
    """Answer ``register.open``: read a file and say what its columns seem to be.

    Returns
    -------
    dict
        ``fingerprint``, ``name``, ``form`` (``delimited`` or ``workbook``), ``encoding``,
        ``delimiter``, ``sheets``, ``sheet``, ``header_line`` (0 for none), ``rows``; ``columns``:
        {id, position, heading, kind, filled, distinct, samples, dates, role, evidence}, where
        ``dates`` is null or {order, settled, choices, read, unread, examples: [{text, date_iso}]};
        ``preview``: the first rows as {line, cells}; ``cautions``.

    A file opened before, and its cohort, are dropped, unless this one is refused. Refusals and
    cautions: those of ``source.open_source``.
    """
    source = open_source(
        request.content, request.name, sheet=request.sheet, heading_line=request.header_line, report=report
    )
    register = profile_columns(source)
    memory.forget()
    memory.source = register
    proposals = propose_roles(register)
    return {
        "fingerprint": source.fingerprint,
        "name": source.name,
        "form": source.form,
        "encoding": source.encoding,
        "delimiter": source.delimiter,
        "sheets": source.sheets,
        "sheet": source.sheet,
        "header_line": source.table.heading_line,
        "rows": len(source.table),
        "columns": [
            _column(register, profile, proposal)
            for profile, proposal in zip(register.profiles, proposals, strict=True)
        ],
        "preview": _preview(register),
        "cautions": source.cautions,
    }


def values(memory: Memory, request: ValuesRequest, report: Report) -> dict[str, Any]:
    """Answer ``register.values``: the values of a column, the most frequent first, with proposals.

    Returns
    -------
    dict
        ``values``: {value, count, meaning, sex, like}, spellings of one value together; ``like`` is a
        more frequent value that it probably is, whose meaning is then proposed; ``blank`` rows;
        ``distinct``; ``cautions``: ``values_not_listed`` (``listed``, ``distinct``).

    Refusals: ``no_register``, ``unknown_column``.
    """
    register = opened_register(memory)
    found = register.profile(request.column, "column").values
    order = np.argsort(-found.counts, kind="stable")[:MOST_VALUES].tolist()
    sexes = propose_sexes(found.spelt[:MOST_VALUES])
    like = {variant.value: found.spelt[variant.into] for variant in variants(found)}
    listed = [
        {
            "value": found.spelt[i],
            "count": int(found.counts[i]),
            "meaning": propose_meaning(found.spelt[i]) or propose_meaning(like.get(i, "")),
            "sex": sexes.get(found.spelt[i]) or sexes.get(like.get(i, "")),
            "like": like.get(i),
        }
        for i in order
    ]
    cautions = []
    if len(found) > MOST_VALUES:
        cautions.append(Caution("values_not_listed", {"listed": MOST_VALUES, "distinct": len(found)}))
    blank = int(register.source.patients().sum() - found.counts.sum())
    return {"values": listed, "blank": blank, "distinct": len(found), "cautions": cautions}


def build_cohort(memory: Memory, request: BuildRequest, report: Report) -> dict[str, Any]:
    """Answer ``register.build``: make the cohort that all other tasks read.

    Returns
    -------
    dict
        ``n``, ``rows`` (n and those set aside), ``outcomes`` {meaning: count}, ``person_years``,
        ``first_start``, ``last_start``, ``last_exit``, ``closing_date``; ``set_aside`` and
        ``changed``: {line, code, parameters}, and their ``_counts`` by code; ``kept`` and
        ``dropped`` column ids; ``covariates``: {id, heading, kind, missing, levels: [{level, n}],
        least, median, greatest}; ``cautions``.

    Refusals and cautions: those of ``build.build``; ``no_register``, ``not_a_date``; cautions
    ``list_shortened`` (``listed``, ``n``) and ``levels_not_listed`` (``covariate``, ``listed``, ``levels``).
    """
    register = opened_register(memory)
    memory.built = None
    choices = choices_of(request)
    built = build(register, choices, report)
    memory.built = built.cohort
    return _understood(built, choices.closing_date)


def forget(memory: Memory, request: ForgetRequest, report: Report) -> dict[str, bool]:
    """Answer ``register.forget``: drop everything about patients."""
    memory.forget()
    return {"forgotten": True}


TASKS = {
    "register.open": (OpenRequest, open_register),
    "register.values": (ValuesRequest, values),
    "register.build": (BuildRequest, build_cohort),
    "register.forget": (ForgetRequest, forget),
}


def choices_of(request: BuildRequest) -> Choices:
    """Return what a request says about a register; refuse (``not_a_date``) a closing date that is none."""
    return Choices(
        roles=request.roles,
        meanings=request.meanings,
        closing_date=_day(request.closing_date, "closing_date"),
        blank_meaning=request.blank_meaning,
        sexes=request.sexes,
        date_orders=request.date_orders,
        repairs=request.repairs,
        unseen_months=request.unseen_months,
        spellings=request.spellings,
        calendars=request.calendars,
    )


def opened_register(memory: Memory) -> Register:
    """Return the opened register; refuse (``no_register``) when there is none."""
    if memory.source is None:
        raise Refusal("no_register")
    return memory.source


def _day(text: str, where: str) -> date:
    try:
        day = date.fromisoformat(text)
    except ValueError:
        raise Refusal("not_a_date", field=where, given=excerpt(text)) from None
    if not EARLIEST_YEAR <= day.year <= LATEST_YEAR:
        raise Refusal("not_a_date", field=where, given=excerpt(text))
    return day


def _column(register: Register, profile: Profile, proposal: Proposal) -> dict[str, Any]:
    return {
        "id": profile.column.identifier,
        "position": profile.column.position,
        "heading": profile.column.heading,
        "kind": profile.kind,
        "filled": profile.filled,
        "distinct": profile.distinct,
        "samples": [excerpt(value) for value in profile.values.spelt[:SAMPLES]],
        "dates": _dates(register, profile),
        "role": proposal.role,
        "evidence": proposal.evidence,
    }


def _dates(register: Register, profile: Profile) -> dict[str, Any] | None:
    """Return how a column of dates is read, with examples that would show a wrong order."""
    found = profile.dates
    if found is None:
        return None
    read = read_dates(
        found.texts,
        found.settling.order,
        last_year=register.last_year,
        epoch=register.source.epoch or "serial_1900",
    )
    usable = (read.fault == Fault.NONE) & (profile.counts > 0)
    first, second, _ = found.texts.parts.T
    telling = usable & (found.texts.form == Form.PARTS) & (first != second)
    picked = [*np.flatnonzero(telling)[:3].tolist(), *np.flatnonzero(usable & ~telling)[:3].tolist()][:3]
    return {
        "order": found.settling.order,
        "settled": found.settling.settled,
        "choices": found.settling.choices,
        "read": found.read,
        "unread": found.unread,
        "examples": [
            {
                "text": excerpt(profile.column.texts[code]),
                "date_iso": date.fromordinal(int(read.day[code])).isoformat(),
            }
            for code in picked
        ],
    }


def _preview(register: Register) -> list[dict[str, Any]]:
    table = register.source.table
    return [
        {
            "line": int(table.line[row]),
            "cells": [excerpt(column.texts[column.codes[row]]) for column in table.columns],
        }
        for row in range(min(PREVIEW_ROWS, len(table)))
    ]


def _understood(built: Built, closing: date) -> dict[str, Any]:
    cohort = built.cohort
    cautions = list(built.cautions)
    counts = np.bincount(cohort.outcome, minlength=len(MEANINGS)).tolist()
    set_aside, set_aside_counts = _listed(built.set_aside, cautions)
    changed, changed_counts = _listed(built.changed, cautions)
    return {
        "n": len(cohort),
        "rows": built.rows,
        "outcomes": dict(zip(MEANINGS, counts, strict=True)),
        "person_years": cohort.person_days() / DAYS_PER_YEAR,
        "first_start": _iso(cohort.start, np.min),
        "last_start": _iso(cohort.start, np.max),
        "last_exit": _iso(cohort.start + cohort.exit, np.max),
        "closing_date": closing.isoformat(),
        "set_aside": set_aside,
        "set_aside_counts": set_aside_counts,
        "changed": changed,
        "changed_counts": changed_counts,
        "kept": built.kept,
        "dropped": built.dropped,
        "covariates": [_covariate(name, cohort, cautions) for name in cohort.covariates],
        "cautions": cautions,
    }


def _iso(days: np.ndarray, which: Callable[[np.ndarray], Any]) -> str | None:
    return date.fromordinal(int(which(days))).isoformat() if len(days) else None


def _listed(notes: tuple[Noted, ...], cautions: list[Caution]) -> tuple[list[Noted], dict[str, int]]:
    counts: Counter[str] = Counter()
    listed = []
    for note in notes:
        counts[note.code] += 1
        if counts[note.code] <= MOST_LISTED:
            listed.append(note)
    if len(listed) < len(notes):
        cautions.append(Caution("list_shortened", {"listed": len(listed), "n": len(notes)}))
    return listed, dict(counts)


def _covariate(name: str, cohort: Cohort, cautions: list[Caution]) -> dict[str, Any]:
    covariate: Covariate = cohort.covariates[name]
    about: dict[str, Any] = {"id": name, "heading": covariate.heading}
    if isinstance(covariate, Categorical):
        recorded = covariate.codes[covariate.codes >= 0]
        counts = np.bincount(recorded, minlength=len(covariate.levels)).tolist()
        levels = [{"level": level, "n": n} for level, n in zip(covariate.levels, counts, strict=True)]
        if len(levels) > MOST_LEVELS:
            shortened = {"covariate": name, "listed": MOST_LEVELS, "levels": len(levels)}
            cautions.append(Caution("levels_not_listed", shortened))
        missing = len(cohort) - len(recorded)
        return about | {
            "kind": "categorical", "missing": missing, "levels": levels[:MOST_LEVELS],
            "least": None, "median": None, "greatest": None,
        }  # fmt: skip
    known = covariate.values[~np.isnan(covariate.values)]
    least, median, greatest = np.quantile(known, [0, 0.5, 1]).tolist() if len(known) else (None,) * 3
    return about | {
        "kind": "numeric", "missing": len(cohort) - len(known), "levels": [],
        "least": least, "median": median, "greatest": greatest,
    }  # fmt: skip
