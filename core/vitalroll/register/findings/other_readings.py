"""How else a written date could be read: day and month changed over, or a day that the month lacks."""

from __future__ import annotations

import numpy as np

from vitalroll.register.checks import Days
from vitalroll.register.dates import EARLIEST_YEAR, LATEST_YEAR, Fault, Form, read_dates, year_month_day
from vitalroll.register.plan import Plan
from vitalroll.register.profile import Profile, dates_anyhow

_OTHER_ORDER = {"day_month_year": "month_day_year", "month_day_year": "day_month_year"}


def changed_over(plan: Plan, read: Days, *roles: str) -> Days:
    """Return each date with day and month changed over; a fault where that cannot be.

    Parameters
    ----------
    plan : Plan
    read : Days
        The dates of these roles as they are read.
    """
    day, fault = np.zeros(len(read.day), np.int64), np.full(len(read.day), np.int8(Fault.UNREADABLE))
    for role, profile in _columns(plan, roles):
        other = _OTHER_ORDER.get(plan.order_of(profile))
        if other is None:
            continue
        texts = dates_anyhow(profile, plan.register.source).texts
        first, second, _ = texts.parts.T
        could = (texts.form == Form.PARTS) & (first <= 12) & (second <= 12) & (first != second)
        swapped = read_dates(texts, other, last_year=plan.last_year(role))
        codes = profile.column.codes
        mine = could[codes] & read.given & (plan.read(profile, role).day[codes] == read.day)
        day = np.where(mine, swapped.day[codes], day)
        fault = np.where(mine, swapped.fault[codes], fault)
    return Days(day, fault, read.text)


def last_day_of_month(plan: Plan, read: Days, *roles: str) -> Days:
    """Return the last day of the month for dates such as 31 June; a fault for all others."""
    day, fault = np.zeros(len(read.day), np.int64), np.full(len(read.day), np.int8(Fault.UNREADABLE))
    for role, profile in _columns(plan, roles):
        texts = dates_anyhow(profile, plan.register.source).texts
        year, month, of_month = year_month_day(texts, plan.order_of(profile), last_year=plan.last_year(role))
        written = (texts.form == Form.PARTS) | (texts.form == Form.FIXED)
        could = written & (plan.read(profile, role).fault == Fault.IMPOSSIBLE)
        could &= (year >= EARLIEST_YEAR) & (year <= LATEST_YEAR) & (month >= 1) & (month <= 12)
        could &= (of_month >= 29) & (of_month <= 31)
        last = np.array(
            [_last_of(int(y), int(m)) if ok else 0 for y, m, ok in zip(year, month, could, strict=True)],
            dtype=np.int64,
        )
        codes = profile.column.codes
        mine = could[codes] & read.having(Fault.IMPOSSIBLE)
        day = np.where(mine, last[codes], day)
        fault = np.where(mine, np.int8(Fault.NONE), fault)
    return Days(day, fault, read.text)


def short_years(plan: Plan, *roles: str) -> np.ndarray:
    """Return in which rows a date of these roles was written with a year of two digits."""
    short = np.zeros(len(plan.register.source.table), dtype=bool)
    for _, profile in _columns(plan, roles):
        texts = dates_anyhow(profile, plan.register.source).texts
        short |= texts.short_year[profile.column.codes]
    return short


def _columns(plan: Plan, roles: tuple[str, ...]) -> list[tuple[str, Profile]]:
    return [(role, profile) for role in roles for profile in plan.having(role)]


def _last_of(year: int, month: int) -> int:
    first = np.datetime64(f"{year:04d}-{month:02d}", "M") + 1
    return int(first.astype("datetime64[D]").astype(np.int64)) - 1 + 719_163
