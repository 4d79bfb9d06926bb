"""The rows of a file become columns: where the headings stand, and which rows are not patients."""

from __future__ import annotations

from collections import Counter
from collections.abc import Iterable, Sequence
from dataclasses import dataclass
from itertools import chain

import numpy as np

from vitalroll.errors import Caution, Refusal
from vitalroll.register.dates import parse_dates
from vitalroll.register.delimited import Rows
from vitalroll.register.numbers_read import looks_like_number
from vitalroll.register.recognition import is_total
from vitalroll.register.spelling import same, shown

MOST_ROWS = 1_048_576
MOST_COLUMNS = 2_000
MOST_CELLS = 40_000_000

_SEARCHED = 200
"""Headings are looked for in the first so many rows that have anything in them."""

_SHARE_OF_ROWS = 0.25
"""A column without a heading is one if at least this share of the rows has something in it."""


@dataclass(frozen=True)
class Column:
    """One column: its distinct texts, as written, and for each row the position of its text.

    Reading each distinct text once is what makes a large register quick to understand.
    """

    position: int
    heading: str
    texts: tuple[str, ...]
    codes: np.ndarray

    @property
    def identifier(self) -> str:
        """Return the name of the column: ``c0`` for the first."""
        return f"c{self.position}"


@dataclass(frozen=True)
class Table:
    """The rows of a file below its headings.

    ``line`` holds the line of the file on which each row begins. ``not_patients`` maps the positions
    of rows that do not describe a patient to a code (``repeated_heading``, ``subtotal_row``,
    ``too_many_cells``) and its parameters.
    """

    heading_line: int
    columns: tuple[Column, ...]
    line: np.ndarray
    not_patients: dict[int, tuple[str, dict[str, object]]]
    cautions: tuple[Caution, ...]

    def __len__(self) -> int:
        return len(self.line)


class _Codes(dict[str, int]):
    """Numbers texts in the order in which they are first met."""

    def __missing__(self, text: str) -> int:
        self[text] = code = len(self)
        return code


class _Gatherer:
    """Takes rows in and keeps them as coded columns."""

    def __init__(self) -> None:
        self.lines: list[int] = []
        self.widths: list[np.ndarray] = []
        self.lengths: list[np.ndarray] = []
        self._codes: list[_Codes] = []
        self._parts: list[list[np.ndarray]] = []
        self._cells = 0

    def add(self, lines: list[int], rows: list[list[str]]) -> None:
        """Take in more rows with their lines; rows with nothing in them are passed over."""
        filled = [(line, row) for line, row in zip(lines, rows, strict=True) if _has_something(row)]
        if not filled:
            return
        width = max(len(row) for _, row in filled)
        self._check_size(len(filled), width)
        while len(self._codes) < width:
            self._codes.append(_Codes({"": 0}))
            done = len(self.lines)
            self._parts.append([np.zeros(done, np.int32)] if done else [])
        self.lines += [line for line, _ in filled]
        self.widths.append(np.array([_filled_width(row) for _, row in filled]))
        self.lengths.append(np.array([len(row) for _, row in filled]))
        if any(len(row) < width for _, row in filled):
            padding = [""] * width
            filled = [(line, row + padding[len(row) :]) for line, row in filled]
        columns = list(zip(*(row for _, row in filled), strict=True))
        nothing = np.zeros(len(filled), np.int32)
        for position, (codes, parts) in enumerate(zip(self._codes, self._parts, strict=True)):
            if position < width:
                parts.append(np.fromiter(map(codes.__getitem__, columns[position]), np.int32, len(filled)))
            else:
                parts.append(nothing)

    def _check_size(self, rows: int, width: int) -> None:
        self._cells += rows * max(width, len(self._codes))
        if len(self.lines) + rows > MOST_ROWS:
            raise Refusal("too_many_rows", most=MOST_ROWS)
        if width > MOST_COLUMNS:
            raise Refusal("too_many_columns", columns=width, most=MOST_COLUMNS)
        if self._cells > MOST_CELLS:
            raise Refusal("too_many_cells_in_file", most=MOST_CELLS)

    def columns(self, headings: Sequence[str], width: int) -> tuple[Column, ...]:
        """Return the first ``width`` columns of all rows taken in, under their headings."""
        return tuple(
            Column(
                position,
                headings[position] if position < len(headings) else "",
                tuple(self._codes[position]),
                _joined(self._parts[position]),
            )
            for position in range(min(width, len(self._codes)))
        )

    def coded(self, rows: Iterable[int], width: int) -> dict[int, list[str]]:
        """Return the cells of the given rows."""
        texts = [list(codes) for codes in self._codes[:width]]
        codes = [_joined(parts) for parts in self._parts[:width]]
        return {row: [texts[i][codes[i][row]] for i in range(len(texts))] for row in rows}


def table_of(chunks: Iterable[Rows], heading_line: int | None = None) -> Table:
    """Find the headings and gather what stands below them.

    Parameters
    ----------
    chunks : iterable of (line numbers, rows of cells)
    heading_line : int, optional
        The line of the file with the headings, if somebody said so; 0 if there are none.

    Raises
    ------
    Refusal
        ``empty_file``, ``no_rows`` (headings and nothing below), ``no_such_line`` (the headings are
        said to stand on a line that has nothing in it), ``too_many_rows``, ``too_many_columns`` and
        ``too_many_cells_in_file`` (each with ``most``).

    Cautions
    --------
    ``no_headings``; ``preamble`` (``n`` rows above the headings); ``doubled_headings``
    (``headings``); ``unnamed_columns`` (``columns``); ``repeated_headings``, ``subtotal_rows`` and
    ``long_rows`` (``n``, and the first 20 ``lines``), whose rows are not patients; ``short_rows``
    (``n``, ``lines``), taken as blank where they end.
    """
    top, rest = _top(chunks)
    headings, at, first = _headings(top, heading_line)
    gatherer = _Gatherer()
    below = [(line, row) for line, row in top if line > at]
    gatherer.add([line for line, _ in below], [row for _, row in below])
    for lines, rows in rest:
        gatherer.add(lines, rows)
    if not gatherer.lines:
        raise Refusal("no_rows")
    line = np.array(gatherer.lines, dtype=np.int64)
    widths = np.concatenate(gatherer.widths)
    width = _width(headings, widths)
    columns = gatherer.columns(headings, width)
    aside = _not_patients(gatherer, columns, widths, headings, width)
    cautions = [
        *_heading_cautions(headings, at, first, columns),
        *_row_cautions(line, aside),
        *_short_rows(line, np.concatenate(gatherer.lengths), len(headings), aside),
    ]
    return Table(at, columns, line, aside, tuple(cautions))


def _has_something(row: list[str]) -> bool:
    return any(row) and any(same(cell) for cell in row if cell)


def _filled_width(row: list[str]) -> int:
    width = len(row)
    while width and not (row[width - 1] and row[width - 1].strip()):
        width -= 1
    return width


def _joined(parts: list[np.ndarray]) -> np.ndarray:
    return np.concatenate(parts) if parts else np.zeros(0, np.int32)


def _top(chunks: Iterable[Rows]) -> tuple[list[tuple[int, list[str]]], Iterable[Rows]]:
    """Return the first rows that have anything in them, at least as many as are searched, and the rest."""
    top: list[tuple[int, list[str]]] = []
    chunks = iter(chunks)
    for lines, rows in chunks:
        top += [(line, row) for line, row in zip(lines, rows, strict=True) if _has_something(row)]
        if len(top) >= _SEARCHED:
            break
    if not top:
        raise Refusal("empty_file")
    return top, chain(chunks)


def _headings(top: list[tuple[int, list[str]]], said: int | None) -> tuple[list[str], int, int]:
    """Return the headings, their line (0 for none) and how many rows stand above them."""
    if said == 0:
        return [], 0, 0
    for above, (line, row) in enumerate(top):
        if said is not None and line == said:
            return [shown(cell) for cell in row], line, above
    if said is not None:
        raise Refusal("no_such_line", field="header_line", given=said)
    searched = top[:_SEARCHED]
    filled = [sum(1 for cell in row if same(cell)) for _, row in searched]
    usual = float(np.percentile(filled, 75))
    for above, (line, row) in enumerate(searched):
        if filled[above] < 0.6 * usual:
            continue
        if _names_columns([shown(cell) for cell in row if same(cell)]):
            return [shown(cell) for cell in row], line, above
        # The first full row is a patient already: there are no headings, or none that can be told.
        return [], 0, 0
    return [], 0, 0


def _names_columns(cells: list[str]) -> bool:
    """Return whether cells read like headings: words, hardly any of them a number or a date."""
    dates = parse_dates(cells).looks_like_date
    values = sum(1 for cell, is_date in zip(cells, dates, strict=True) if is_date or looks_like_number(cell))
    return values <= 0.2 * len(cells)


def _width(headings: list[str], widths: np.ndarray) -> int:
    """Return how many columns there are: those with a heading, and those that many rows fill."""
    if not headings:
        return int(widths.max())
    common = max(
        (width for width in set(widths.tolist()) if np.mean(widths >= width) >= _SHARE_OF_ROWS), default=0
    )
    named = max((i + 1 for i, heading in enumerate(headings) if same(heading)), default=0)
    return max(named, common)


def _not_patients(
    gatherer: _Gatherer, columns: tuple[Column, ...], widths: np.ndarray, headings: list[str], width: int
) -> dict[int, tuple[str, dict[str, object]]]:
    aside: dict[int, tuple[str, dict[str, object]]] = {}
    for row in np.flatnonzero(_like_headings(columns, headings)).tolist():
        aside[row] = ("repeated_heading", {})
    candidates = set(np.flatnonzero(_starts_with_total(columns)).tolist()) - aside.keys()
    for row, cells in gatherer.coded(candidates, width).items():
        if _only_numbers_after_first(cells):
            aside[row] = ("subtotal_row", {})
    for row in np.flatnonzero(widths > width).tolist():
        aside.setdefault(row, ("too_many_cells", {"cells": int(widths[row]), "columns": width}))
    return aside


def _like_headings(columns: tuple[Column, ...], headings: list[str]) -> np.ndarray:
    """Return which rows repeat the headings in every cell."""
    rows = len(columns[0].codes) if columns else 0
    alike = np.full(rows, bool(headings))
    for column in columns:
        wanted = same(column.heading)
        matching = np.array([same(text) == wanted for text in column.texts])
        alike &= matching[column.codes]
        if not alike.any():
            break
    return alike


def _starts_with_total(columns: tuple[Column, ...]) -> np.ndarray:
    """Return which rows have a word for a total in the first cell that is not blank."""
    rows = len(columns[0].codes) if columns else 0
    found, waiting = np.zeros(rows, bool), np.ones(rows, bool)
    for column in columns[:3]:
        blank = np.array([not same(text) for text in column.texts])[column.codes]
        total = np.array([is_total(text) for text in column.texts])[column.codes]
        found |= waiting & total
        waiting &= blank
    return found


def _only_numbers_after_first(cells: list[str]) -> bool:
    filled = [cell for cell in cells if same(cell)]
    return all(looks_like_number(cell) for cell in filled[1:])


def _heading_cautions(headings: list[str], at: int, above: int, columns: tuple[Column, ...]) -> list[Caution]:
    cautions = []
    if not at:
        cautions.append(Caution("no_headings"))
    if above:
        cautions.append(Caution("preamble", {"n": above}))
    names = Counter(same(heading) for heading in headings if same(heading))
    doubled = list(dict.fromkeys(heading for heading in headings if names[same(heading)] > 1))
    if doubled:
        cautions.append(Caution("doubled_headings", {"headings": doubled}))
    unnamed = [column.identifier for column in columns if not same(column.heading)]
    if at and unnamed:
        cautions.append(Caution("unnamed_columns", {"columns": unnamed}))
    return cautions


def _row_cautions(line: np.ndarray, aside: dict[int, tuple[str, dict[str, object]]]) -> list[Caution]:
    by_code: dict[str, list[int]] = {}
    for row, (code, _) in sorted(aside.items()):
        by_code.setdefault(code, []).append(int(line[row]))
    return [_ROW_CAUTIONS[code]({"n": len(lines), "lines": lines[:20]}) for code, lines in by_code.items()]


def _short_rows(
    line: np.ndarray, lengths: np.ndarray, wanted: int, aside: dict[int, tuple[str, dict[str, object]]]
) -> list[Caution]:
    short = [row for row in np.flatnonzero(lengths < wanted).tolist() if row not in aside]
    if not short:
        return []
    return [Caution("short_rows", {"n": len(short), "lines": [int(line[row]) for row in short[:20]]})]


_ROW_CAUTIONS = {
    "repeated_heading": lambda found: Caution("repeated_headings", found),
    "subtotal_row": lambda found: Caution("subtotal_rows", found),
    "too_many_cells": lambda found: Caution("long_rows", found),
}
