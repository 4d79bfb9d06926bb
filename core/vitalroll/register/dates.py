"""A column of texts becomes dates, read in one order that the column itself settles, or that is asked.

What a text says by itself (a four-digit year in front, a month by name) needs no order. Three bare
numbers do: a part above 12 anywhere in the column settles which is the day. Nothing depends on
today's date.
"""

from __future__ import annotations

import re
from collections.abc import Sequence
from dataclasses import dataclass, replace
from enum import IntEnum
from typing import Literal, get_args

import numpy as np

from vitalroll.register.calendars import ETHIOPIAN_BEHIND, ethiopian_days
from vitalroll.register.recognition import months
from vitalroll.register.spelling import bare, same

Order = Literal["day_month_year", "month_day_year", "year_month_day", "serial_1900", "serial_1904"]
"""How a column of dates is written. Serials are a spreadsheet's count of days, from either epoch."""

ORDERS: tuple[str, ...] = get_args(Order)
EARLIEST_YEAR, LATEST_YEAR = 1850, 2200
BUDDHIST_OFFSET = 543
_BUDDHIST_FROM = 2400
_EPOCH = {"serial_1900": 693_594, "serial_1904": 695_056}
"""Proleptic ordinals of day 0 of the two epochs: 30 December 1899 and 1 January 1904."""

_UNIX_EPOCH = 719_163
_LEAST_SERIAL, _GREATEST_SERIAL = 10_000, 60_000
_CLEARLY = 20
"""An order is settled against dates that contradict it when it has so many times their evidence."""


class Form(IntEnum):
    """What a text looks like."""

    BLANK = 0
    UNREAD = 1
    PARTIAL = 2
    FIXED = 3
    PARTS = 4
    SERIAL = 5


class Fault(IntEnum):
    """Why there is no date. ``NONE`` where there is one."""

    NONE = 0
    BLANK = 1
    UNREADABLE = 2
    PARTIAL = 3
    IMPOSSIBLE = 4


@dataclass(frozen=True)
class DateTexts:
    """Distinct texts taken apart, before an order is settled.

    For ``FIXED`` the parts are year, month and day; for ``PARTS`` they stand as written; for
    ``SERIAL`` the first is the count of days. ``short_year`` marks years of two digits;
    ``order`` holds, for ``FIXED``, the position in ORDERS of the order in which they were written.
    """

    form: np.ndarray
    parts: np.ndarray
    short_year: np.ndarray
    order: np.ndarray

    @property
    def looks_like_date(self) -> np.ndarray:
        """Return for each text whether it looks like a date, not counting bare numbers."""
        return (self.form == Form.FIXED) | (self.form == Form.PARTS) | (self.form == Form.PARTIAL)


@dataclass(frozen=True)
class Settling:
    """In which order a column is read.

    ``settled`` is False when the person must say which of ``choices`` it is. ``for_order`` and
    ``against_order`` count the rows that speak for and against ``order``.
    """

    order: str
    settled: bool
    choices: tuple[str, ...]
    for_order: int
    against_order: int


@dataclass(frozen=True)
class Dates:
    """Distinct texts as days (proleptic ordinals), with the fault where there is none.

    ``buddhist`` marks years that were counted from the Buddhist era.
    """

    day: np.ndarray
    fault: np.ndarray
    buddhist: np.ndarray


_TIME = re.compile(
    r"[t\s,]+\d{1,2}[:h]\d{2}(?::\d{2}(?:[.,]\d+)?)?"
    r"\s*(?:[ap]\.?\s?m\.?)?\s*(?:z|utc|gmt|[+-]\d{2}:?\d{2})?$"
)
_YEAR_FIRST = re.compile(r"(\d{4})\s?[-/.\s]\s?(\d{1,2})\s?[-/.\s]\s?(\d{1,2})")
_COMPACT = re.compile(r"\d{8}")
_NUMERIC = re.compile(r"(\d{1,2})\s?[-/.,\s]\s?(\d{1,2})\s?[-/.,\s]\s?'?(\d{4}|\d{2})")
_DAY_NAME_YEAR = re.compile(
    r"(\d{1,2})\s?(?:st|nd|rd|th|er|º)?[\s\-/.,]*(?:of |de )?([^\W\d_]{3,})"
    r"[\s\-/.,]*(?:de |del )?'?(\d{4}|\d{2})"
)
_NAME_DAY_YEAR = re.compile(r"([^\W\d_]{3,})[\s\-/.,]*(\d{1,2})(?:st|nd|rd|th)?[\s\-/.,]+'?(\d{4}|\d{2})")
_YEAR_NAME_DAY = re.compile(r"(\d{4})[\s\-/.,]*([^\W\d_]{3,})[\s\-/.,]*(\d{1,2})")
_WEEKDAY = re.compile(r"^[^\W\d_]{2,}[.,]?\s+(?=\d)")
_SERIAL = re.compile(r"(\d{5})(?:[.,]\d+)?")
_PARTIAL = re.compile(
    r"\d{4}|\d{1,2}\s?[-/.\s]\s?\d{4}|\d{4}\s?[-/.\s]\s?\d{1,2}|[^\W\d_]{3,}[\s\-/.,]*\d{4}"
    r"|(?:\?{1,2}|x{1,2}|-{1,2}|_{1,2}|\d{1,2})[-/.](?:\?{1,2}|x{1,2}|-{1,2}|_{1,2}|\d{1,2})[-/.]\d{4}"
)
_DMY, _MDY, _YMD = 0, 1, 2


def parse_dates(texts: Sequence[str]) -> DateTexts:
    """Take distinct texts apart."""
    n = len(texts)
    found = [_take_apart(text) for text in texts]
    form = np.fromiter((item[0] for item in found), np.int8, n)
    parts = np.array([item[1] for item in found], dtype=np.int64).reshape(n, 3)
    short = np.fromiter((item[2] for item in found), bool, n)
    order = np.fromiter((item[3] for item in found), np.int8, n)
    return DateTexts(form, parts, short, order)


_Apart = tuple[int, tuple[int, int, int], bool, int]
_NOTHING = (0, 0, 0)


def _take_apart(text: str) -> _Apart:
    tidy = same(text)
    if not tidy:
        return Form.BLANK, _NOTHING, False, 0
    if not any(map(str.isdigit, tidy)) or len(tidy) > 60:
        return Form.UNREAD, _NOTHING, False, 0
    tidy = _TIME.sub("", tidy)
    return _numeric(tidy) or _named(tidy) or _other(tidy)


def _numeric(tidy: str) -> _Apart | None:
    if match := _NUMERIC.fullmatch(tidy):
        first, second, year = (int(part) for part in match.groups())
        if len(match.group(3)) == 4 and 0 in (first, second):
            return Form.PARTIAL, _NOTHING, False, 0
        return Form.PARTS, (first, second, year), len(match.group(3)) == 2, 0
    if match := _YEAR_FIRST.fullmatch(tidy):
        year, month, day = (int(part) for part in match.groups())
        if 0 in (month, day):
            return Form.PARTIAL, _NOTHING, False, 0
        return Form.FIXED, (year, month, day), False, _YMD
    if _COMPACT.fullmatch(tidy):
        year, month, day = int(tidy[:4]), int(tidy[4:6]), int(tidy[6:])
        if EARLIEST_YEAR <= year <= LATEST_YEAR and 1 <= month <= 12 and 1 <= day <= 31:
            return Form.FIXED, (year, month, day), False, _YMD
        if EARLIEST_YEAR <= int(tidy[4:]) <= LATEST_YEAR:
            return Form.PARTS, (int(tidy[:2]), int(tidy[2:4]), int(tidy[4:])), False, 0
    return None


def _named(tidy: str) -> _Apart | None:
    for candidate in (tidy, _WEEKDAY.sub("", tidy)):
        plain = candidate.replace(".", " ").strip()
        if match := _DAY_NAME_YEAR.fullmatch(plain):
            day, name, year, order = *match.groups(), _DMY
        elif match := _NAME_DAY_YEAR.fullmatch(plain):
            name, day, year, order = *match.groups(), _MDY
        elif match := _YEAR_NAME_DAY.fullmatch(plain):
            year, name, day, order = *match.groups(), _YMD
        else:
            continue
        month = months().get(bare(name))
        if month:
            return Form.FIXED, (int(year), month, int(day)), len(year) == 2, order
    return None


def _other(tidy: str) -> _Apart:
    match = _SERIAL.fullmatch(tidy)
    if match and _LEAST_SERIAL <= int(match.group(1)) <= _GREATEST_SERIAL:
        return Form.SERIAL, (int(match.group(1)), 0, 0), False, 0
    if _PARTIAL.fullmatch(tidy) and _partial_is_likely(tidy):
        return Form.PARTIAL, _NOTHING, False, 0
    return Form.UNREAD, _NOTHING, False, 0


def _partial_is_likely(tidy: str) -> bool:
    years = [int(year) for year in re.findall(r"\d{4}", tidy)]
    names = re.findall(r"[^\W\d_]{3,}", tidy)
    likely = any(EARLIEST_YEAR <= year <= LATEST_YEAR + BUDDHIST_OFFSET for year in years)
    return likely and all(bare(name) in months() for name in names)


def settle(
    texts: DateTexts, weights: np.ndarray, *, usual: str | None = None, epoch: str | None = None
) -> Settling:
    """Find the order of a column.

    Parameters
    ----------
    texts : DateTexts
    weights : int array
        How many rows have each text.
    usual : str, optional
        The order that other columns of the file are written in: proposed where nothing settles this one.
    epoch : str, optional
        The epoch of the workbook, which settles serials.

    Notes
    -----
    A part above 12 shows a day. The order is settled when all such evidence agrees, or when there is
    20 times more of it than against it: then the others are dates that cannot be, and are set aside.
    """
    in_parts = texts.form == Form.PARTS
    if not in_parts.any():
        return _without_parts(texts, weights, usual, epoch)
    first, second, third = texts.parts.T
    short = texts.short_year
    day_first = in_parts & (first > 12) & (first <= 31) & (second <= 12)
    month_first = in_parts & (second > 12) & (second <= 31) & (first <= 12)
    year_first = in_parts & short & (first > 31) & (second <= 12) & (third <= 31)
    evidence = {
        "day_month_year": int(weights[day_first].sum()),
        "month_day_year": int(weights[month_first].sum()),
        "year_month_day": int(weights[year_first].sum()),
    }
    if year_first.any():
        # With the year in front, a second part cannot be above 12: such dates speak for another order.
        evidence["day_month_year"] = int(weights[day_first & (third > 31)].sum())
    order = max(evidence, key=lambda name: evidence[name])
    most = evidence[order]
    against = sum(evidence.values()) - most
    if most and most >= _CLEARLY * against:
        return Settling(order, True, (order,), most, against)
    choices = ["day_month_year", "month_day_year"]
    if np.all(short[in_parts]) and weights[in_parts & (second > 12)].sum() == 0:
        choices.append("year_month_day")
    if most:
        return Settling(order, False, tuple(choices), most, against)
    alike = bool(np.all((first == second)[in_parts])) and len(choices) == 2
    proposed = usual if usual in choices else "day_month_year"
    return Settling(proposed, alike, (proposed,) if alike else tuple(choices), 0, 0)


def _without_parts(texts: DateTexts, weights: np.ndarray, usual: str | None, epoch: str | None) -> Settling:
    serial = int(weights[texts.form == Form.SERIAL].sum())
    fixed = texts.form == Form.FIXED
    if serial > weights[fixed].sum():
        choices = ("serial_1900", "serial_1904")
        if epoch:
            return Settling(epoch, True, (epoch,), serial, 0)
        return Settling("serial_1900", False, choices, 0, 0)
    if not fixed.any():
        order = usual or "day_month_year"
        return Settling(order, True, (order,), 0, 0)
    counts = np.bincount(texts.order[fixed], weights[fixed], minlength=3)
    order = ORDERS[int(np.argmax(counts))]
    return Settling(order, True, (order,), int(counts.sum()), 0)


def read_dates(
    texts: DateTexts,
    order: str,
    *,
    last_year: int,
    epoch: str = "serial_1900",
    calendar: str = "gregorian",
) -> Dates:
    """Read texts as days.

    Parameters
    ----------
    texts : DateTexts
    order : str
        One of ORDERS. Single serials among written dates are read with ``epoch``.
    last_year : int
        A year of two digits is the last year with those digits that is not after this one.
    calendar : str
        ``gregorian`` or ``ethiopian``. Serials are days of the spreadsheet in either.

    Returns
    -------
    Dates
        Years above 2400 are counted from the Buddhist era: 543 is taken off. Years outside
        1850 to 2200 are faults: other calendars are not converted.
    """
    behind = ETHIOPIAN_BEHIND if calendar == "ethiopian" else 0
    year, month, day = year_month_day(texts, order, last_year=last_year - behind)
    in_parts, short = texts.form == Form.PARTS, texts.short_year
    buddhist = (year > _BUDDHIST_FROM) & ~short & (year <= _BUDDHIST_FROM + 400)
    year[buddhist] -= BUDDHIST_OFFSET
    written = in_parts | (texts.form == Form.FIXED)
    if order == "year_month_day":
        # A four-digit year at the end cannot be read with the year in front.
        written &= ~(in_parts & ~short)
    within = written & (year >= EARLIEST_YEAR) & (year <= LATEST_YEAR)
    possible = within & (month >= 1) & (month <= 12)
    safe_year, safe_month = np.where(possible, year, 2000), np.where(possible, month, 1)
    start = _month_start(safe_year, safe_month)
    length = _month_start(safe_year + safe_month // 12, safe_month % 12 + 1) - start
    possible &= (day >= 1) & (day <= length)
    ordinal = np.where(possible, start + day - 1, 0)
    if calendar == "ethiopian":
        ordinal, there_is = ethiopian_days(year, month, day)
        possible = within & there_is
    serial = texts.form == Form.SERIAL
    counted_from = _EPOCH[order] if order in _EPOCH else _EPOCH[epoch]
    ordinal = np.where(serial, counted_from + texts.parts[:, 0], ordinal)
    fault = np.full(len(ordinal), int(Fault.IMPOSSIBLE), np.int8)
    fault[possible | serial] = Fault.NONE
    fault[texts.form == Form.BLANK] = Fault.BLANK
    fault[texts.form == Form.UNREAD] = Fault.UNREADABLE
    fault[texts.form == Form.PARTIAL] = Fault.PARTIAL
    return Dates(ordinal, fault, buddhist & possible)


def year_month_day(
    texts: DateTexts, order: str, *, last_year: int
) -> tuple[np.ndarray, np.ndarray, np.ndarray]:
    """Return the year, month and day that each text names in an order, whether or not there is such a day."""
    year, month, day = (part.copy() for part in texts.parts.T)
    in_parts = texts.form == Form.PARTS
    first, second, third = texts.parts[in_parts].T
    if order == "month_day_year":
        year[in_parts], month[in_parts], day[in_parts] = third, first, second
    elif order == "year_month_day":
        year[in_parts], month[in_parts], day[in_parts] = first, second, third
    else:
        year[in_parts], month[in_parts], day[in_parts] = third, second, first
    short = texts.short_year
    year[short] = last_year - (last_year - year[short]) % 100
    return year, month, day


def last_written_year(texts: DateTexts) -> int | None:
    """Return the latest year that is written with four digits, or None."""
    in_parts = (texts.form == Form.PARTS) & ~texts.short_year
    fixed = (texts.form == Form.FIXED) & ~texts.short_year
    years = np.concatenate((texts.parts[in_parts, 2], texts.parts[fixed, 0]))
    years = np.where(years > _BUDDHIST_FROM, years - BUDDHIST_OFFSET, years)
    years = years[(years >= EARLIEST_YEAR) & (years <= LATEST_YEAR)]
    return int(years.max()) if len(years) else None


def without_serials(texts: DateTexts) -> DateTexts:
    """Return the texts with bare numbers taken as no dates."""
    form = np.where(texts.form == Form.SERIAL, np.int8(Form.UNREAD), texts.form)
    return replace(texts, form=form)


def _month_start(year: np.ndarray, month: np.ndarray) -> np.ndarray:
    since_1970 = (year - 1970) * 12 + month - 1
    return since_1970.astype("datetime64[M]").astype("datetime64[D]").astype(np.int64) + _UNIX_EPOCH
