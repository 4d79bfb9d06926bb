"""The checks that set rows aside: each a small function, named by the code that the person is shown.

A row is set aside by the first check that it fails, in the order of CHECKS. None repairs anything.
"""

from __future__ import annotations

from collections.abc import Callable
from dataclasses import dataclass
from datetime import date
from typing import Any

import numpy as np

from vitalroll.register.dates import Fault


@dataclass(frozen=True)
class Days:
    """One date for each row: ``day`` (ordinal) where ``fault`` is ``Fault.NONE``.

    ``text`` gives what was written in a row.
    """

    day: np.ndarray
    fault: np.ndarray
    text: Callable[[int], str]

    @property
    def given(self) -> np.ndarray:
        """Return in which rows there is a date."""
        return self.fault == Fault.NONE

    def having(self, fault: Fault) -> np.ndarray:
        """Return in which rows that is what is wrong."""
        return self.fault == fault

    def iso(self, row: int) -> str:
        """Return the date of a row, YYYY-MM-DD."""
        return date.fromordinal(int(self.day[row])).isoformat()


@dataclass(frozen=True)
class Rows:
    """The rows of a register as dates and meanings, before any is set aside.

    Parameters
    ----------
    start, observed_from, end, birth : Days
    outcome : int array
        Positions in MEANINGS; -1 where the value has no meaning or the cell is blank.
    outcome_blank : bool array
        Where the cell is blank and blank was given no meaning.
    outcome_text : callable
        What was written in a row.
    under_care : int
        The position of that meaning.
    closing : int
        Ordinal of the closing date.
    """

    start: Days
    observed_from: Days
    end: Days
    birth: Days
    outcome: np.ndarray
    outcome_blank: np.ndarray
    outcome_text: Callable[[int], str]
    under_care: int
    closing: int

    def __len__(self) -> int:
        return len(self.outcome)


@dataclass(frozen=True)
class Found:
    """The rows that fail a check (bool array), and the parameters of its sentence for one of them."""

    rows: np.ndarray
    parameters: Callable[[int], dict[str, Any]]


def no_start_date(rows: Rows) -> Found:
    """The cell for the start of follow-up is blank."""
    return Found(rows.start.having(Fault.BLANK), _nothing)


def unreadable_start_date(rows: Rows) -> Found:
    """What stands there is not a date."""
    return _written(rows.start, Fault.UNREADABLE)


def partial_start_date(rows: Rows) -> Found:
    """Only a month or a year is given."""
    return _written(rows.start, Fault.PARTIAL)


def impossible_start_date(rows: Rows) -> Found:
    """There is no such day, such as 30 February; or it belongs to another calendar."""
    return _written(rows.start, Fault.IMPOSSIBLE)


def start_after_closing(rows: Rows) -> Found:
    """Follow-up starts after the register was frozen."""
    return Found(
        rows.start.given & (rows.start.day > rows.closing),
        lambda row: {"start": rows.start.iso(row)},
    )


def no_outcome(rows: Rows) -> Found:
    """How follow-up ended is blank, and blank was given no meaning."""
    return Found(rows.outcome_blank, _nothing)


def outcome_without_meaning(rows: Rows) -> Found:
    """How follow-up ended is a value that was given no meaning."""
    return Found(
        (rows.outcome < 0) & ~rows.outcome_blank,
        lambda row: {"value": rows.outcome_text(row)},
    )


def unreadable_end_date(rows: Rows) -> Found:
    """The date of the end, or of the last contact, is not a date."""
    return _written(rows.end, Fault.UNREADABLE)


def partial_end_date(rows: Rows) -> Found:
    """Only a month or a year is given for the end."""
    return _written(rows.end, Fault.PARTIAL)


def impossible_end_date(rows: Rows) -> Found:
    """There is no such day as the one given for the end."""
    return _written(rows.end, Fault.IMPOSSIBLE)


def no_end_date(rows: Rows) -> Found:
    """Follow-up ended, but it is not said when."""
    return Found(rows.end.having(Fault.BLANK) & (rows.outcome != rows.under_care), _nothing)


def end_before_start(rows: Rows) -> Found:
    """Follow-up ends before it starts."""
    return Found(
        rows.start.given & rows.end.given & (rows.end.day < rows.start.day),
        lambda row: {"start": rows.start.iso(row), "end": rows.end.iso(row)},
    )


def birth_after_start(rows: Rows) -> Found:
    """The patient was born after follow-up started: one of the two dates is wrong."""
    return Found(
        rows.start.given & rows.birth.given & (rows.birth.day > rows.start.day),
        lambda row: {"birth": rows.birth.iso(row), "start": rows.start.iso(row)},
    )


def unreadable_observed_from(rows: Rows) -> Found:
    """The day observation began here is not a date, so it is not known how long it was delayed."""
    return _written(rows.observed_from, Fault.UNREADABLE)


def partial_observed_from(rows: Rows) -> Found:
    """Only a month or a year is given for the day observation began here."""
    return _written(rows.observed_from, Fault.PARTIAL)


def impossible_observed_from(rows: Rows) -> Found:
    """There is no such day as the one given for the beginning of observation here."""
    return _written(rows.observed_from, Fault.IMPOSSIBLE)


def before_observed_from(rows: Rows) -> Found:
    """Follow-up ended, or the register was frozen, before observation began here."""
    last = np.where(rows.end.given, rows.end.day, rows.closing)
    return Found(
        rows.observed_from.given & (last < rows.observed_from.day),
        lambda row: {
            "observed_from": rows.observed_from.iso(row),
            "end": date.fromordinal(int(last[row])).isoformat(),
        },
    )


def no_time_at_risk(rows: Rows) -> Found:
    """Observation began late and ended the same day, so the row can count nowhere.

    Those observed from the start who end on its day are kept: a death on the day of diagnosis is one.
    """
    last = np.where(rows.end.given, rows.end.day, rows.closing)
    late = rows.observed_from.given & (rows.observed_from.day > rows.start.day)
    return Found(
        late & (last == rows.observed_from.day), lambda row: {"observed_from": rows.observed_from.iso(row)}
    )


CHECKS: tuple[Callable[[Rows], Found], ...] = (
    no_start_date,
    unreadable_start_date,
    partial_start_date,
    impossible_start_date,
    start_after_closing,
    no_outcome,
    outcome_without_meaning,
    unreadable_end_date,
    partial_end_date,
    impossible_end_date,
    no_end_date,
    end_before_start,
    birth_after_start,
    unreadable_observed_from,
    partial_observed_from,
    impossible_observed_from,
    before_observed_from,
    no_time_at_risk,
)


def later_duplicates(numbers: np.ndarray, kept: np.ndarray) -> dict[int, int]:
    """Return the rows whose patient number an earlier kept row has already, with that row.

    Parameters
    ----------
    numbers : int array
        A code for each row's number, -1 where it is blank; blanks are never duplicates.
    kept : bool array
        The rows that no check has set aside. Only these can be duplicates or have any.
    """
    rows = np.flatnonzero(kept & (numbers >= 0))
    _, first, inverse = np.unique(numbers[rows], return_index=True, return_inverse=True)
    original = rows[first[inverse]]
    later = original != rows
    return dict(zip(rows[later].tolist(), original[later].tolist(), strict=True))


def _written(days: Days, fault: Fault) -> Found:
    return Found(days.having(fault), lambda row: {"written": days.text(row)})


def _nothing(row: int) -> dict[str, Any]:
    return {}
