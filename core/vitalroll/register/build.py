"""An opened register, told what its columns and values mean, becomes a cohort.

Conventions, each recorded row by row where it changes something:

- Follow-up runs from the start to the end. With several columns for the end, the latest of their
  dates is the end.
- A patient under care is observed to the last contact if one is given, otherwise to the closing date
  (``under_care_to_closing``).
- What happened after the closing date is not known at the closing date: an end after it, of any
  kind, becomes under care on the closing date (``followed_past_closing``).
- A first visit here before the start, or none, means observation from the start
  (``observed_before_start``).
- Of several rows with one patient number, the first that can be used is kept.
- Only the repairs that were accepted are made (``findings.mending``), before anything else is done.
- A year of two digits is the latest such year that is not after the year of the closing date.
"""

from __future__ import annotations

from collections.abc import Callable
from dataclasses import dataclass, replace
from datetime import date
from typing import Any

import numpy as np

from vitalroll.errors import Caution
from vitalroll.register.checks import CHECKS, Days, Rows, later_duplicates
from vitalroll.register.cohort import DEATHS, Cohort, meaning_code
from vitalroll.register.dates import Fault
from vitalroll.register.findings.finding import Seen
from vitalroll.register.findings.mending import Correction, Mended, find, look, mend
from vitalroll.register.plan import FEW_LINES, Choices, Plan
from vitalroll.register.profile import Register

CLOSING_LONG_AFTER_DAYS = 365
"""A closing date so much later than anything in the file is perhaps wrong."""


Notes = dict[int, tuple[str, dict[str, Any]]]
"""A code and its parameters for some rows."""


@dataclass(frozen=True)
class Noted:
    """One row of the file about which something must be said: its line, a code and parameters."""

    line: int
    code: str
    parameters: dict[str, Any]


@dataclass(frozen=True)
class Built:
    """The cohort, and what was done to get there.

    ``rows`` in the file are those of the cohort and those set aside, no more and no fewer.
    ``kept`` are the columns that the cohort was made from, ``dropped`` all others.
    """

    cohort: Cohort
    rows: int
    set_aside: tuple[Noted, ...]
    changed: tuple[Noted, ...]
    kept: tuple[str, ...]
    dropped: tuple[str, ...]
    cautions: tuple[Caution, ...]
    corrections: tuple[Correction, ...] = ()


@dataclass(frozen=True)
class Followed:
    """Who is followed for how long: rows within the closing date, which are kept, why the others are not.

    ``entry``, ``exit`` and ``outcome`` are those of the kept rows.
    """

    rows: Rows
    keep: np.ndarray
    aside: Notes
    changes: Notes
    entry: np.ndarray
    exit: np.ndarray

    @property
    def outcome(self) -> np.ndarray:
        """Return how follow-up ended in each kept row."""
        return self.rows.outcome[self.keep]


def build(
    register: Register, choices: Choices, report: Callable[[str, int, int], None] = lambda *_: None
) -> Built:
    """Make the cohort of an opened register.

    Raises
    ------
    Refusal
        ``unknown_column``, ``not_one_of`` (a role, a sex or an order that does not exist),
        ``unknown_meaning``, ``role_given_twice`` (``role``, ``columns``), ``no_start_column``,
        ``no_outcome_column``, ``no_end_column``, ``date_order_unsettled`` (``column``, ``heading``,
        ``choices``), ``no_readable_dates`` (``column``, ``heading``, ``examples``).

    Cautions
    --------
    ``all_set_aside`` (``rows``), ``one_patient_only``, ``all_censored`` (``n``: nobody died),
    ``day_zero`` (``n``, ``lines``: follow-up ends on the day it starts), ``unseen_for_long`` (``n``,
    ``days``, ``lines``), ``closing_long_after_last`` (``last``, ``days``), ``many_after_closing``
    (``n``), ``two_digit_years`` (``n``, ``headings``, ``first``, ``last``: the years they can mean),
    ``dates_against_order``, ``buddhist_years`` and ``birth_dates_unreadable`` (``column``,
    ``heading``, ``n``), ``order_against_evidence`` (``column``, ``heading``, ``order``), and those
    of ``covariates``.
    """
    plan = Plan(register, choices)
    report("dates", 0, 3)
    seen = look(plan)
    mended = mend(seen, find(seen, choices.repairs) if choices.repairs else [], choices.repairs)
    report("checks", 1, 3)
    followed = follow(plan, mended)
    report("covariates", 2, 3)
    cohort, cautions = _cohort(plan, followed)
    report("covariates", 3, 3)
    line = register.source.table.line
    kept, keep = plan.kept(), followed.keep
    return Built(
        cohort=cohort,
        rows=len(line),
        set_aside=tuple(Noted(int(line[row]), *followed.aside[row]) for row in sorted(followed.aside)),
        changed=tuple(
            Noted(int(line[row]), *followed.changes[row]) for row in sorted(followed.changes) if keep[row]
        ),
        kept=kept,
        dropped=tuple(c.identifier for c in register.source.table.columns if c.identifier not in kept),
        cautions=(*plan.cautions(), *_cautions(followed.rows, keep, line, seen), *cautions),
        corrections=mended.corrections,
    )


def follow(plan: Plan, mended: Mended) -> Followed:
    """Return who is followed, and for how long, once repairs are made and the closing date is kept to."""
    rows, changes = _within_closing(mended.rows)
    keep, aside = _checked(plan, rows, mended)
    start, end = rows.start.day[keep], rows.end.day[keep]
    late = rows.observed_from.given & (rows.observed_from.day > rows.start.day)
    entry = np.where(late, rows.observed_from.day - rows.start.day, 0)[keep]
    return Followed(rows, keep, aside, changes, entry, end - start)


def _within_closing(rows: Rows) -> tuple[Rows, Notes]:
    """Let nothing be known beyond the closing date, and note every row that this or a default changes."""
    n = len(rows)
    late = rows.end.given & (rows.end.day > rows.closing) & (rows.start.day <= rows.closing)
    no_end = rows.end.having(Fault.BLANK) & (rows.outcome == rows.under_care)
    late_outcome = late & (rows.outcome >= 0)
    changes: Notes = {}
    for row in np.flatnonzero(no_end).tolist():
        changes[row] = ("under_care_to_closing", {})
    early = rows.observed_from.given & rows.start.given & (rows.observed_from.day < rows.start.day)
    for row in np.flatnonzero(early).tolist():
        changes[row] = ("observed_before_start", {"observed_from": rows.observed_from.iso(row)})
    for row in np.flatnonzero(late_outcome).tolist():
        changes[row] = ("followed_past_closing", {"end": rows.end.iso(row)})
    closing = np.full(n, rows.closing)
    end = Days(
        np.where(late | no_end, closing, rows.end.day),
        np.where(no_end, np.int8(Fault.NONE), rows.end.fault),
        rows.end.text,
    )
    outcome = np.where(late_outcome, rows.under_care, rows.outcome)
    return replace(rows, end=end, outcome=outcome), changes


def _checked(plan: Plan, rows: Rows, mended: Mended) -> tuple[np.ndarray, Notes]:
    """Return which rows are kept (bool), and why the others are not."""
    aside: Notes = dict(plan.register.source.table.not_patients)
    keep = plan.register.source.patients()
    line = plan.register.source.table.line
    for row, first in mended.same_as.items():
        aside[row] = ("same_patient", {"first_line": int(line[first])})
        keep[row] = False
    for check in CHECKS:
        found = check(rows)
        for row in np.flatnonzero(found.rows & keep).tolist():
            aside[row] = (check.__name__, found.parameters(row))
        keep &= ~found.rows
    numbers = plan.one("patient_number")
    if numbers is not None:
        for row, first in later_duplicates(np.where(mended.own, -1, numbers.values.codes), keep).items():
            aside[row] = ("duplicate_number", {"first_line": int(line[first])})
            keep[row] = False
    return keep, aside


def _cohort(plan: Plan, followed: Followed) -> tuple[Cohort, list[Caution]]:
    """Return the cohort of the kept rows with all its covariates."""
    rows, keep = followed.rows, followed.keep
    found, cautions = plan.covariates(rows, keep)
    cohort = Cohort(
        entry=followed.entry,
        exit=followed.exit,
        outcome=followed.outcome,
        start=rows.start.day[keep],
        line=plan.register.source.table.line[keep],
        closing=rows.closing,
        covariates=found,
    )
    return cohort, cautions


def _cautions(rows: Rows, keep: np.ndarray, line: np.ndarray, seen: Seen) -> list[Caution]:
    n = int(keep.sum())
    if not n:
        return [Caution("all_set_aside", {"rows": len(line)})]
    found = []
    if n == 1:
        found.append(Caution("one_patient_only"))
    deaths = np.isin(rows.outcome, [meaning_code(meaning) for meaning in DEATHS])
    if not (deaths & keep).any():
        found.append(Caution("all_censored", {"n": n}))
    day_zero = keep & (rows.end.day == rows.start.day)
    if day_zero.any():
        found.append(Caution("day_zero", _lines(day_zero, line)))
    unseen = keep & (rows.outcome == rows.under_care) & (rows.closing - rows.end.day > seen.unseen_days)
    if unseen.any():
        found.append(Caution("unseen_for_long", _lines(unseen, line) | {"days": seen.unseen_days}))
    to_closing = keep & (rows.end.day == rows.closing) & (rows.outcome == rows.under_care)
    dated = keep & ~to_closing
    last = int(max(rows.start.day[keep].max(), rows.end.day[dated].max(initial=0)))
    if rows.closing - last > CLOSING_LONG_AFTER_DAYS:
        days = rows.closing - last
        found.append(
            Caution("closing_long_after_last", {"last": date.fromordinal(last).isoformat(), "days": days})
        )
    after = int(np.count_nonzero(rows.start.given & (rows.start.day > rows.closing)))
    if after > 0.1 * len(line):
        found.append(Caution("many_after_closing", {"n": after}))
    return found


def _lines(which: np.ndarray, line: np.ndarray) -> dict[str, Any]:
    return {"n": int(which.sum()), "lines": line[which][:FEW_LINES].tolist()}
