"""Delimited text becomes rows of cells, each with the line of the file it began on."""

from __future__ import annotations

import csv
import io
import re
from collections import Counter
from collections.abc import Iterator
from dataclasses import dataclass
from itertools import islice

from vitalroll.errors import Caution

DELIMITERS = (",", ";", "\t", "|")
ROWS_AT_ONCE = 5_000

Rows = tuple[list[int], list[list[str]]]
"""Line numbers, counted from 1, and the cells of each of those rows."""

_SAMPLE = 65_536
_SAMPLE_ROWS = 200
# No cell of a register runs over this many lines: a quotation mark was opened and never closed.
_MOST_LINES_IN_A_ROW = 100
_NAMED = re.compile(r"\A\s*sep=([,;\t|])\s*?(?:\r\n|\r|\n)", re.IGNORECASE)


@dataclass(frozen=True)
class Delimited:
    """How a text is divided, and the quotation mark in use (None: marks mean nothing)."""

    delimiter: str
    quoting: bool
    cautions: tuple[Caution, ...]


def how_divided(text: str) -> Delimited:
    """Find out how a text is divided into cells: comma, semicolon, tab or bar.

    The delimiter that gives the most rows of one width wins, wider rows before narrower. A first
    line ``sep=;``, as spreadsheets write it, decides.

    Cautions
    --------
    ``quotes_unbalanced`` (``line``): a quotation mark is opened there and never closed, so
    quotation marks are read as ordinary characters.
    """
    named = _NAMED.match(text)
    delimiter = named.group(1) if named else max(DELIMITERS, key=lambda mark: _evenness(text, mark))
    broken = _broken_quote(text, delimiter)
    if broken is None:
        return Delimited(delimiter, True, ())
    return Delimited(delimiter, False, (Caution("quotes_unbalanced", {"line": broken}),))


def read_rows(text: str, how: Delimited) -> Iterator[Rows]:
    """Give the rows of a text, some thousand at a time, cells as they were written."""
    reader = _reader(text, how)
    named = _NAMED.match(text)
    if named:
        next(reader)
    line = reader.line_num
    while True:
        lines, rows = [], []
        for row in islice(reader, ROWS_AT_ONCE):
            lines.append(line + 1)
            rows.append(row)
            line = reader.line_num
        if not rows:
            return
        if not how.quoting:
            rows = [[cell.strip().strip('"') for cell in row] for row in rows]
        yield lines, rows


def _reader(text: str, how: Delimited) -> Iterator[list[str]]:
    # A cell can be as long as the file; the limit is one for all readers of the process.
    csv.field_size_limit(max(csv.field_size_limit(), len(text) + 1))
    # newline="" leaves line ends to the reader, which knows those inside quotation marks.
    return csv.reader(
        io.StringIO(text, newline=""),
        delimiter=how.delimiter,
        skipinitialspace=how.delimiter != " ",
        quoting=csv.QUOTE_MINIMAL if how.quoting else csv.QUOTE_NONE,
    )


def _evenness(text: str, delimiter: str) -> tuple[float, int]:
    sample = text[:_SAMPLE]
    if len(text) > _SAMPLE:
        sample = sample[: max(sample.rfind("\n"), sample.rfind("\r")) + 1] or sample
    rows = islice(_reader(sample, Delimited(delimiter, True, ())), _SAMPLE_ROWS)
    widths = Counter(len(row) for row in rows if any(cell.strip() for cell in row))
    widths.pop(1, None)
    if not widths:
        return 0.0, 0
    width, agreeing = max(widths.items(), key=lambda item: (item[1], item[0]))
    # One column more is worth as much as a tenth of the rows: a decimal comma here and there must
    # not outweigh the delimiter.
    return agreeing * (1 + 0.1 * min(width, 20)), width


def _broken_quote(text: str, delimiter: str) -> int | None:
    """Return the line on which a quotation mark is opened that is never closed, or None."""
    if '"' not in text:
        return None
    reader = _reader(text, Delimited(delimiter, True, ()))
    before = begins = 0
    for _ in reader:
        begins, before = before + 1, reader.line_num
        if before - begins >= _MOST_LINES_IN_A_ROW:
            return begins
    # The last row ran on over several lines, to the end of the file, after an odd number of marks.
    runs_on = before > begins and text.count('"') % 2 == 1
    return begins if runs_on else None
