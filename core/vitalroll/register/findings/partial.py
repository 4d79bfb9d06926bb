"""Dates of which only the month or the year is known: a stated rule, and how much it matters."""

from __future__ import annotations

import re

import numpy as np

from vitalroll.register.checks import Days
from vitalroll.register.dates import BUDDHIST_OFFSET, EARLIEST_YEAR, LATEST_YEAR, Fault
from vitalroll.register.findings.finding import Change, Finding, Repair, Seen, What, change
from vitalroll.register.profile import Profile
from vitalroll.register.recognition import months
from vitalroll.register.spelling import bare, same

_YEAR = re.compile(r"(?<!\d)\d{4}(?!\d)")
_MONTH_THEN_YEAR = re.compile(r"(?:^|[-/.\s])(\d{1,2})\s?[-/.\s]\s?\d{4}$")
_YEAR_THEN_MONTH = re.compile(r"^\d{4}\s?[-/.\s]\s?(\d{1,2})(?:$|[-/.\s])")
_DAY_AND_YEAR = re.compile(r"^\d{1,2}[-/.](?:\?{1,2}|x{1,2}|-{1,2}|_{1,2}|0{1,2})[-/.]\d{4}$")
_MONTH_FIRST = re.compile(r"^(\d{1,2})[-/.](?:\?{1,2}|x{1,2}|-{1,2}|_{1,2}|0{1,2})[-/.]\d{4}$")

_ROLES: tuple[tuple[What, tuple[str, ...]], ...] = (
    ("start", ("start",)),
    ("end", ("end", "death_date")),
    ("birth", ("birth_date",)),
)


def partial_date(seen: Seen) -> Finding | None:
    """Only the month or the year of a date is known.

    The repair takes the middle of that month (its 15th) or year (1 July), but never a day before the
    start or after the closing date where the month or year leaves one that is neither. The
    alternatives take its first and its last day.
    """
    found: dict[str, list[Change]] = {"middle": [], "first": [], "last": []}
    which = np.zeros(len(seen.rows), dtype=bool)
    for what, roles in _ROLES:
        days: Days = getattr(seen.rows, what)
        partial = seen.patients & days.having(Fault.PARTIAL)
        if not partial.any():
            continue
        first, last = _periods(seen, days, roles, partial)
        known = partial & (last > 0)
        at = np.flatnonzero(known)
        which |= partial if what != "birth" else known
        if not len(at):
            continue
        one_month = last - first < 31
        # 1 July is 183 days before the end of any year.
        middle = np.where(one_month, first + 14, last - 183)
        for name, taken in (("middle", middle), ("first", first), ("last", last)):
            found[name].append(change(what, at, _kept_to(seen, what, taken, first, last)[at]))
    rows = np.flatnonzero(which)
    if not len(rows):
        return None
    repairs = [Repair(f"{name}_of_period", tuple(changes)) for name, changes in found.items() if changes]
    repair, *others = repairs or [None]
    return Finding("partial_date", "doubtful", rows, {}, repair, tuple(other for other in others if other))


def _kept_to(seen: Seen, what: What, taken: np.ndarray, first: np.ndarray, last: np.ndarray) -> np.ndarray:
    """Return days kept between start and closing date where the period allows it."""
    closing, start = seen.rows.closing, seen.rows.start
    taken = np.where((taken > closing) & (first <= closing), closing, taken)
    if what == "end":
        taken = np.where(start.given & (taken < start.day) & (last >= start.day), start.day, taken)
    return taken


def _periods(
    seen: Seen, days: Days, roles: tuple[str, ...], partial: np.ndarray
) -> tuple[np.ndarray, np.ndarray]:
    """Return the first and last day of what is known; 0 where that is nothing."""
    first, last = np.zeros(len(days.day), np.int64), np.zeros(len(days.day), np.int64)
    for role in roles:
        for profile in seen.plan.having(role):
            if seen.plan.calendar_of(profile) != "gregorian":
                continue
            fault = seen.plan.read(profile, role).fault
            mine = partial & (fault == Fault.PARTIAL)[profile.column.codes]
            codes = np.unique(profile.column.codes[mine]).tolist()
            begins, ends = np.zeros(len(fault), np.int64), np.zeros(len(fault), np.int64)
            for code in codes:
                begins[code], ends[code] = _period(seen, profile, profile.column.texts[code])
            later = mine & (ends[profile.column.codes] > last)
            first = np.where(later, begins[profile.column.codes], first)
            last = np.where(later, ends[profile.column.codes], last)
    return first, last


def _period(seen: Seen, profile: Profile, text: str) -> tuple[int, int]:
    """Return the first and last day of a month or a year that is written, or two zeros."""
    tidy = same(text)
    match = _YEAR.search(tidy)
    if not match:
        return 0, 0
    year = int(match.group())
    if year > 2400:
        year -= BUDDHIST_OFFSET
    if not EARLIEST_YEAR <= year <= LATEST_YEAR:
        return 0, 0
    month = _month(tidy, seen.plan.order_of(profile))
    if month is None:
        begin, end = np.datetime64(f"{year:04d}-01", "M"), np.datetime64(f"{year + 1:04d}-01", "M")
    else:
        begin = np.datetime64(f"{year:04d}-{month:02d}", "M")
        end = begin + 1
    return _ordinal(begin), _ordinal(end) - 1


def _month(tidy: str, order: str) -> int | None:
    for word in bare(tidy).split():
        if word in months():
            return months()[word]
    if _DAY_AND_YEAR.match(tidy):
        # In a column with the month first, what is lacking is the day.
        match = _MONTH_FIRST.match(tidy) if order == "month_day_year" else None
    else:
        match = _YEAR_THEN_MONTH.search(tidy) or _MONTH_THEN_YEAR.search(tidy)
    month = int(match.group(1)) if match else 0
    return month if 1 <= month <= 12 else None


def _ordinal(month: np.datetime64) -> int:
    return int(month.astype("datetime64[D]").astype(np.int64)) + 719_163
