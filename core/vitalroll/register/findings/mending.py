"""All checks in the order in which they are shown, and the repairs that were accepted, carried out."""

from __future__ import annotations

from collections.abc import Collection, Mapping
from dataclasses import dataclass, replace
from datetime import date

import numpy as np

from vitalroll.errors import Refusal
from vitalroll.numbers import DAYS_PER_MONTH
from vitalroll.register.checks import Days, Rows
from vitalroll.register.cohort import MEANINGS
from vitalroll.register.dates import Fault
from vitalroll.register.findings import days, endings, form, partial, people
from vitalroll.register.findings.finding import NOT_RECORDED, Check, Finding, Repair, Seen
from vitalroll.register.plan import Plan

CHECKS: tuple[Check, ...] = (
    form.slipped_sideways,
    days.day_and_month_changed_over,
    days.ends_before_start,
    days.far_after_closing,
    days.born_in_wrong_century,
    days.no_such_day,
    partial.partial_date,
    endings.death_date_but_alive,
    endings.contact_after_death,
    endings.died_without_date,
    endings.death_dated_by_contact,
    endings.transfer_as_lost,
    endings.unseen_for_long,
    endings.closing_date_as_contact,
    people.same_number,
    people.one_number_two_people,
    people.likely_same_person,
    form.more_cells_than_columns,
    days.age_against_birth,
    days.months_without_start,
    people.sex_not_recorded,
    endings.died_on_first_day,
    days.heaped_starts,
    days.heaped_ends,
    days.two_digit_years,
    form.totals_among_rows,
    form.headings_repeated,
)
"""Repairs are made in this order, and what one has changed no later one changes again."""

CODES: tuple[str, ...] = tuple(check.__name__ for check in CHECKS)

_DAYS = ("start", "end", "birth")


@dataclass(frozen=True)
class Correction:
    """One cell that reads differently after a repair.

    ``before`` and ``after`` are dates (YYYY-MM-DD), names from MEANINGS, lines of the file for
    ``same_as``, what was written where it is no date, or None.
    """

    line: int
    code: str
    what: str
    before: str | int | None
    after: str | int | None


@dataclass(frozen=True)
class Mended:
    """The rows after the accepted repairs.

    ``same_as`` maps rows to the row of the same patient; ``own`` marks rows whose patient number does
    not count; ``overruled`` counts the units of each finding that another repair had changed already.
    """

    rows: Rows
    same_as: Mapping[int, int]
    own: np.ndarray
    corrections: tuple[Correction, ...]
    overruled: Mapping[str, int]


def look(plan: Plan) -> Seen:
    """Return what the checks look at."""
    return Seen(
        plan=plan,
        rows=plan.rows(),
        contact=plan.days("end"),
        death=plan.days("death_date"),
        patients=plan.register.source.patients(),
        unseen_days=int(plan.choices.unseen_months * DAYS_PER_MONTH),
    )


def find(seen: Seen, only: Collection[str] = CODES) -> list[Finding]:
    """Return what the checks find, in their order.

    Raises
    ------
    Refusal
        ``not_one_of``: ``only`` names a check that does not exist.
    """
    for code in only:
        if code not in CODES:
            raise Refusal("not_one_of", field=f"repairs.{code}", given=code, choices=list(CODES))
    made = (check(seen) for check in CHECKS if check.__name__ in only)
    return [finding for finding in made if finding is not None]


def mend(seen: Seen, findings: Collection[Finding], accepted: Mapping[str, Collection[int]]) -> Mended:
    """Carry out the accepted repairs.

    Parameters
    ----------
    seen : Seen
    findings : collection of Finding
        In the order of CHECKS.
    accepted : mapping of code to lines
        Of each accepted finding, the lines for which its repair is declined.
    """
    work = _Work(seen)
    for finding in findings:
        if finding.repair is not None and finding.code in accepted:
            work.carry_out(finding.code, finding.repair, set(accepted[finding.code]))
    return work.done()


class _Work:
    """Rows while they are being repaired."""

    def __init__(self, seen: Seen) -> None:
        rows = seen.rows
        self.seen = seen
        self.line = seen.plan.register.source.table.line
        self.taken = {
            what: np.zeros(len(rows), dtype=bool) for what in (*_DAYS, "outcome", "same_as", "number")
        }
        self.day = {what: getattr(rows, what).day.copy() for what in _DAYS}
        self.fault = {what: getattr(rows, what).fault.copy() for what in _DAYS}
        self.outcome = rows.outcome.copy()
        self.blank = rows.outcome_blank.copy()
        self.same_as: dict[int, int] = {}
        self.own = np.zeros(len(rows), dtype=bool)
        self.corrections: list[Correction] = []
        self.overruled: dict[str, int] = {}

    def carry_out(self, code: str, repair: Repair, declined: set[int]) -> None:
        units = repair.units
        wanted = np.zeros(len(self.line), dtype=bool)
        wanted[units[~np.isin(self.line[units], list(declined))]] = True
        spoilt = np.zeros(len(self.line), dtype=bool)
        for change in repair.changes:
            # A row that is another's twin already is not changed any more.
            twin = np.isin(change.rows, list(self.same_as))
            spoilt[change.unit[self.taken[change.what][change.rows] | twin]] = True
        self.overruled[code] = int((spoilt & wanted).sum())
        wanted &= ~spoilt
        for change in repair.changes:
            now = wanted[change.unit]
            self._change(code, change.what, change.rows[now], change.values[now])

    def _change(self, code: str, what: str, rows: np.ndarray, values: np.ndarray) -> None:
        for row, value in zip(rows.tolist(), values.tolist(), strict=True):
            said = before_and_after(self.seen, what, row, value)
            self.corrections.append(Correction(int(self.line[row]), code, what, *said))
        self.taken[what][rows] = True
        if what == "same_as":
            self.same_as |= dict(zip(rows.tolist(), values.tolist(), strict=True))
        elif what == "number":
            self.own[rows] = True
        elif what == "outcome":
            self.outcome[rows] = values
            self.blank[rows] = False
        else:
            forgotten = values == NOT_RECORDED
            self.day[what][rows] = np.where(forgotten, 0, values)
            self.fault[what][rows] = np.where(forgotten, np.int8(Fault.BLANK), np.int8(Fault.NONE))

    def done(self) -> Mended:
        rows = self.seen.rows
        changed = {
            what: Days(self.day[what], self.fault[what], getattr(rows, what).text) for what in self.day
        }
        mended = replace(rows, outcome=self.outcome, outcome_blank=self.blank, **changed)
        corrections = tuple(sorted(self.corrections, key=lambda each: (each.line, CODES.index(each.code))))
        return Mended(mended, self.same_as, self.own, corrections, self.overruled)


Told = str | int | None


def before_and_after(seen: Seen, what: str, row: int, value: int) -> tuple[Told, Told]:
    """Return what stands in a row and what a repair would put there, as ``Correction`` gives them."""
    if what == "same_as":
        return None, int(seen.plan.register.source.table.line[value])
    if what == "number":
        return None, None
    if what == "outcome":
        before = int(seen.rows.outcome[row])
        return (MEANINGS[before] if before >= 0 else seen.rows.outcome_text(row) or None), MEANINGS[value]
    days: Days = getattr(seen.rows, what)
    fault = int(days.fault[row])
    written = None if fault == Fault.BLANK else days.text(row)
    before_day = days.iso(row) if fault == Fault.NONE else written
    return before_day, (None if value == NOT_RECORDED else date.fromordinal(value).isoformat())
