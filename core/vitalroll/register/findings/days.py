"""What may be wrong in dates: changed over, in the wrong year or century, heaped, after the closing date."""

from __future__ import annotations

import numpy as np

from vitalroll.register.checks import Days
from vitalroll.register.dates import Fault
from vitalroll.register.findings.finding import (
    NOT_RECORDED,
    Finding,
    Repair,
    Seen,
    change,
    found,
)
from vitalroll.register.findings.other_readings import changed_over, last_day_of_month, short_years

_A_YEAR = 366
_HEAPED_LEAST = 30
_HEAPED_TIMES = 2.0
"""Days 1 and 15 are heaped when they carry more than twice their part of the days of a month."""

_TWO_DAYS = 2 * 12 / 365.25
_QUIET_LEAST = 3.0


def day_and_month_changed_over(seen: Seen) -> Finding | None:
    """A date contradicts another as it stands, and fits when day and month are changed over."""
    rows, changes = seen.rows, []
    which = np.zeros(len(rows), dtype=bool)
    start_over = changed_over(seen.plan, rows.start, "start")
    end_over = changed_over(seen.plan, rows.end, "end", "death_date")
    wrong = seen.patients & _contradicts(seen, rows.start.day, rows.end.day)
    by_end = wrong & end_over.given & ~_contradicts(seen, rows.start.day, end_over.day)
    by_start = wrong & ~by_end & start_over.given & ~_contradicts(seen, start_over.day, rows.end.day)
    for what, can, other in (("end", by_end, end_over), ("start", by_start, start_over)):
        at = np.flatnonzero(can)
        if len(at):
            changes.append(change(what, at, other.day[at]))
        which |= can
    repair = Repair("change_over", tuple(changes)) if changes else None
    return found("day_and_month_changed_over", "grave", which, repair)


def ends_before_start(seen: Seen) -> Finding | None:
    """Follow-up ends before it starts.

    Where the end lies in the months after a New Year and one year more would set it right, the old
    year was written on: that is the repair.
    """
    rows = seen.rows
    which = seen.patients & rows.start.given & rows.end.given & (rows.end.day < rows.start.day)
    over = changed_over(seen.plan, rows.end, "end", "death_date")
    start_over = changed_over(seen.plan, rows.start, "start")
    which &= ~(over.given & ~_contradicts(seen, rows.start.day, over.day))
    which &= ~(start_over.given & ~_contradicts(seen, start_over.day, rows.end.day))
    later = _a_year_later(rows.end)
    early_in_year = rows.end.day - _new_year(rows.end.day) < 92
    can = which & early_in_year & (later >= rows.start.day) & (later <= rows.closing)
    at = np.flatnonzero(can)
    return found("ends_before_start", "grave", which, Repair("year_later", (change("end", at, later[at]),)))


def far_after_closing(seen: Seen) -> Finding | None:
    """A date lies more than a year after the closing date: a year mistyped, or another calendar."""
    rows = seen.rows
    which = rows.start.given & (rows.start.day > rows.closing + _A_YEAR)
    which |= rows.end.given & (rows.end.day > rows.closing + _A_YEAR)
    return found("far_after_closing", "grave", seen.patients & which)


def no_such_day(seen: Seen) -> Finding | None:
    """A day that its month lacks, such as 31 June: the repair takes the last day of that month."""
    changes, which = [], np.zeros(len(seen.rows), dtype=bool)
    both: tuple[tuple[str, Days, tuple[str, ...]], ...] = (
        ("start", seen.rows.start, ("start",)),
        ("end", seen.rows.end, ("end", "death_date")),
    )
    for what, days, roles in both:
        which |= seen.patients & days.having(Fault.IMPOSSIBLE)
        last = last_day_of_month(seen.plan, days, *roles)
        sensible = np.ones(len(seen.rows), dtype=bool)
        if what == "end":
            sensible = ~seen.rows.start.given | (last.day >= seen.rows.start.day)
        at = np.flatnonzero(seen.patients & last.given & sensible)
        if len(at):
            changes.append(change("start" if what == "start" else "end", at, last.day[at]))
    repair = Repair("last_of_month", tuple(changes)) if changes else None
    return found("no_such_day", "doubtful", which, repair)


def two_digit_years(seen: Seen) -> Finding | None:
    """Years with two digits: each was taken as the latest year that is not after the closing date."""
    which = seen.patients & short_years(seen.plan, "start", "end", "death_date", "observed_from")
    last = seen.plan.last_year("end")
    return found("two_digit_years", "slight", which, first=last - 99, last=last)


def born_in_wrong_century(seen: Seen) -> Finding | None:
    """Born after the start, by a birth year of two digits: the repair takes a hundred years off."""
    rows = seen.rows
    which = seen.patients & rows.birth.given & rows.start.given & (rows.birth.day > rows.start.day)
    which &= short_years(seen.plan, "birth_date")
    at = np.flatnonzero(which)
    repair = Repair("century_back", (change("birth", at, _years_later(rows.birth, -100)[at]),))
    return found("born_in_wrong_century", "grave", which, repair)


def age_against_birth(seen: Seen) -> Finding | None:
    """The age written at the start and the date of birth differ by more than a year.

    Age is worked out from the date of birth; the repair lets the written age count instead.
    """
    ages = seen.plan.having("age")
    if not ages or not seen.plan.having("birth_date"):
        return None
    written = seen.plan.written_ages()
    worked_out = (seen.rows.start.day - seen.rows.birth.day) / 365.25
    both = seen.patients & seen.rows.start.given & seen.rows.birth.given & ~np.isnan(written)
    # Completed years lie between 0 and 1 below the exact age; a year more allows for another day of counting.
    apart = np.abs(np.floor(worked_out) - np.floor(np.nan_to_num(written))) > 1
    at = np.flatnonzero(both & apart)
    repair = Repair("written_age", (change("birth", at, NOT_RECORDED),))
    return found("age_against_birth", "doubtful", both & apart, repair)


def heaped_starts(seen: Seen) -> Finding | None:
    """Far more starts on the 1st and the 15th than on other days: the day was often not known."""
    return _heaped("heaped_starts", seen, seen.rows.start)


def heaped_ends(seen: Seen) -> Finding | None:
    """Far more ends on the 1st and the 15th than on other days: the day was often not known."""
    return _heaped("heaped_ends", seen, seen.rows.end)


def months_without_start(seen: Seen) -> Finding | None:
    """Months in which nobody starts, in a register where people usually do: pages may be missing."""
    days = seen.rows.start.day[
        seen.patients & seen.rows.start.given & (seen.rows.start.day <= seen.rows.closing)
    ]
    if not len(days):
        return None
    months = (days - 719_163).astype("datetime64[D]").astype("datetime64[M]").astype(np.int64)
    # A few dates in a wrong year must not stretch the register over years in which there was none.
    first, last = np.quantile(months, [0.01, 0.99], method="nearest").tolist()
    counts = np.bincount(months[(months >= first) & (months <= last)] - first)
    if np.median(counts) < _QUIET_LEAST:
        return None
    empty = np.flatnonzero(counts == 0) + first
    if not len(empty):
        return None
    named = [str(np.datetime64(int(month), "M")) for month in empty[:12]]
    return Finding(
        "months_without_start", "doubtful", np.zeros(0, np.int64), {"n": len(empty), "months": named}
    )


def _heaped(code: str, seen: Seen, days: Days) -> Finding | None:
    given = seen.patients & days.given & (days.day != seen.rows.closing)
    n = int(given.sum())
    if n < _HEAPED_LEAST:
        return None
    dates = (days.day - 719_163).astype("datetime64[D]")
    of_month = (dates - dates.astype("datetime64[M]").astype("datetime64[D]")).astype(np.int64) + 1
    which = given & ((of_month == 1) | (of_month == 15))
    share = int(which.sum()) / n
    if share <= _HEAPED_TIMES * _TWO_DAYS:
        return None
    return found(code, "slight", which, share=share, usual=_TWO_DAYS)


def _contradicts(seen: Seen, start: np.ndarray, end: np.ndarray) -> np.ndarray:
    """Return in which rows a start and an end cannot both be: the end is earlier, or one is in the future."""
    both = seen.rows.start.given & seen.rows.end.given
    closing = seen.rows.closing
    return both & ((end < start) | (start > closing) | (end > closing + _A_YEAR))


def _new_year(day: np.ndarray) -> np.ndarray:
    years = (day - 719_163).astype("datetime64[D]").astype("datetime64[Y]")
    return years.astype("datetime64[D]").astype(np.int64) + 719_163


def _a_year_later(days: Days) -> np.ndarray:
    return _years_later(days, 1)


def _years_later(days: Days, years: int) -> np.ndarray:
    """Return the same day so many years later; 29 February becomes 28 February."""
    dates = (days.day - 719_163).astype("datetime64[D]")
    month = dates.astype("datetime64[M]")
    into = (dates - month.astype("datetime64[D]")).astype(np.int64)
    moved = month + np.timedelta64(12 * years, "M")
    length = ((moved + 1).astype("datetime64[D]") - moved.astype("datetime64[D]")).astype(np.int64)
    return moved.astype("datetime64[D]").astype(np.int64) + np.minimum(into, length - 1) + 719_163
