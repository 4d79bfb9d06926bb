"""What each column holds, as far as its content shows: dates, numbers, categories, identifiers, text."""

from __future__ import annotations

from collections.abc import Sequence
from dataclasses import dataclass

import numpy as np

from vitalroll.register.dates import (
    DateTexts,
    Fault,
    Form,
    Settling,
    last_written_year,
    parse_dates,
    read_dates,
    settle,
)
from vitalroll.register.numbers_read import NumberColumn, parse_numbers
from vitalroll.register.recognition import has_any, words
from vitalroll.register.source import Source
from vitalroll.register.spelling import bare
from vitalroll.register.table import Column
from vitalroll.register.values import Values, text_counts, values_of

YEAR_IF_NONE_WRITTEN = 2049
"""The latest year that a year of two digits can mean while no other year is known."""

_SAMPLE = 200
_MOSTLY = 0.8
_FEW_CODES = 8
"""Whole numbers with no more distinct values than this are codes for categories."""

_LONG_TEXT = 40


@dataclass(frozen=True)
class DateProfile:
    """A column of dates: its texts taken apart, the order proposed, and how many rows that reads."""

    texts: DateTexts
    settling: Settling
    read: int
    unread: int
    short_years: int
    buddhist: int


@dataclass(frozen=True)
class Profile:
    """What a column holds.

    ``kind`` is identifier, date, number, category, text or empty; ``counts`` says how many patients
    have each distinct text. ``dates`` is there for every column that could be read as dates, even if
    its kind is another; ``numbers`` likewise for most that are numbers.
    """

    column: Column
    kind: str
    filled: int
    counts: np.ndarray
    values: Values
    dates: DateProfile | None
    numbers: NumberColumn | None

    @property
    def distinct(self) -> int:
        """Return how many distinct values there are."""
        return len(self.values)


@dataclass(frozen=True)
class Register:
    """An opened file with what its columns hold, and the latest year written in full."""

    source: Source
    profiles: tuple[Profile, ...]
    last_year: int

    def profile(self, identifier: str, field: str) -> Profile:
        """Return what a column holds; refuse (``unknown_column``) one that is not there."""
        return self.profiles[self.source.column(identifier, field).position]


def profile_columns(source: Source) -> Register:
    """Find out what each column of an opened file holds.

    Notes
    -----
    A column that nothing in it settles is proposed the order of the file's other dates, and the
    person is still asked.
    """
    rows = source.patients()
    taken_apart = [_maybe_dates(column, text_counts(column, rows)) for column in source.table.columns]
    likely = [maybe.texts for maybe in taken_apart if maybe is not None and maybe.likely]
    years = [year for texts in likely if (year := last_written_year(texts)) is not None]
    last_year = max(years, default=YEAR_IF_NONE_WRITTEN)
    usual = _usual_order(source, taken_apart, rows)
    profiles = tuple(
        _profile(column, rows, maybe, usual, last_year, source)
        for column, maybe in zip(source.table.columns, taken_apart, strict=True)
    )
    return Register(source, profiles, last_year)


def dates_anyhow(profile: Profile, source: Source) -> DateProfile:
    """Return a column as dates, also when it did not look like any."""
    if profile.dates is not None:
        return profile.dates
    texts = parse_dates(profile.column.texts)
    return _date_profile(texts, profile.counts, None, YEAR_IF_NONE_WRITTEN, source.epoch)


def numbers_anyhow(profile: Profile, source: Source) -> NumberColumn:
    """Return a column as numbers, also when it did not look like any."""
    if profile.numbers is not None:
        return profile.numbers
    return parse_numbers(profile.column.texts, profile.counts, comma=source.delimiter == ";")


def _profile(
    column: Column,
    rows: np.ndarray,
    maybe: _MaybeDates | None,
    usual: str | None,
    last_year: int,
    source: Source,
) -> Profile:
    weights = text_counts(column, rows)
    values = values_of(column, rows)
    filled = int(values.counts.sum())
    if not filled:
        return Profile(column, "empty", 0, weights, values, None, None)
    dates = None
    if maybe is not None:
        dates = _date_profile(maybe.texts, weights, usual, last_year, source.epoch)
        if maybe.likely:
            return Profile(column, "date", filled, weights, values, dates, None)
    sample = _sample(column.texts, weights)
    if np.mean(parse_numbers(sample).read) >= 0.5:
        numbers = parse_numbers(column.texts, weights, comma=source.delimiter == ";")
        if weights[numbers.read].sum() >= _MOSTLY * filled:
            present = numbers.value[numbers.read & (weights > 0)]
            kind = _kind_of_numbers(present, values, filled)
            return Profile(column, kind, filled, weights, values, dates, numbers)
    return Profile(column, _kind_of_texts(values, filled), filled, weights, values, dates, None)


def _sample(texts: Sequence[str], weights: np.ndarray) -> list[str]:
    found = []
    for code in np.flatnonzero(weights).tolist():
        if texts[code].strip():
            found.append(texts[code])
            if len(found) == _SAMPLE:
                break
    return found


@dataclass(frozen=True)
class _MaybeDates:
    """A column taken apart as dates, and whether it is likely that it holds any.

    If not, the person may still say that it does, and can then be asked in which order.
    """

    texts: DateTexts
    likely: bool


def _maybe_dates(column: Column, weights: np.ndarray) -> _MaybeDates | None:
    sample = _sample(column.texts, weights)
    if not sample:
        return None
    first = parse_dates(sample)
    written = (first.form == Form.FIXED) | (first.form == Form.PARTS)
    if written.any():
        likely = np.mean(written | (first.form == Form.PARTIAL)) >= 0.5
        return _MaybeDates(parse_dates(column.texts), bool(likely))
    if np.mean(first.form == Form.SERIAL) >= _MOSTLY:
        return _MaybeDates(parse_dates(column.texts), has_any(bare(column.heading), words()["dates"]))
    return None


def _usual_order(source: Source, taken_apart: list[_MaybeDates | None], rows: np.ndarray) -> str | None:
    """Return the order that most evidence in the file speaks for."""
    evidence: dict[str, int] = {}
    for column, maybe in zip(source.table.columns, taken_apart, strict=True):
        if maybe is not None and maybe.likely:
            found = settle(maybe.texts, text_counts(column, rows))
            if found.settled:
                evidence[found.order] = evidence.get(found.order, 0) + found.for_order
    return max(evidence, key=lambda order: evidence[order]) if any(evidence.values()) else None


def _date_profile(
    texts: DateTexts, weights: np.ndarray, usual: str | None, last_year: int, epoch: str | None
) -> DateProfile:
    settling = settle(texts, weights, usual=usual, epoch=epoch)
    days = read_dates(texts, settling.order, last_year=last_year, epoch=epoch or "serial_1900")
    filled = weights[texts.form != Form.BLANK].sum()
    read = int(weights[days.fault == Fault.NONE].sum())
    return DateProfile(
        texts,
        settling,
        read,
        int(filled) - read,
        int(weights[texts.short_year].sum()),
        int(weights[days.buddhist].sum()),
    )


def _kind_of_numbers(read: np.ndarray, values: Values, filled: int) -> str:
    whole = bool(np.all(read == np.floor(read)))
    if whole and len(values) <= _FEW_CODES:
        return "category"
    if whole and filled >= 20 and len(values) >= 0.98 * filled:
        return "identifier"
    return "number"


def _kind_of_texts(values: Values, filled: int) -> str:
    lengths = np.array([len(key) for key in values.keys])
    if np.average(lengths, weights=values.counts) > _LONG_TEXT:
        return "text"
    if filled < 10 or len(values) < _MOSTLY * filled:
        return "category"
    coded = sum(1 for key in values.keys[:_SAMPLE] if any(map(str.isdigit, key)) and len(key) <= 24)
    return "identifier" if coded >= 0.5 * min(len(values), _SAMPLE) else "text"
