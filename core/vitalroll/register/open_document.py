"""An .ods workbook becomes rows of text cells: dates by the type of their cell, formulas by stored value."""

from __future__ import annotations

import zipfile
from collections.abc import Iterator
from dataclasses import dataclass
from typing import Any
from xml.etree import ElementTree

from vitalroll.errors import Caution, Refusal
from vitalroll.register.archive_check import DAMAGED, checked_archive
from vitalroll.register.delimited import ROWS_AT_ONCE, Rows
from vitalroll.register.table import MOST_CELLS, MOST_COLUMNS, MOST_ROWS
from vitalroll.register.workbook import Workbook, number_as_shown

_OFFICE = "{urn:oasis:names:tc:opendocument:xmlns:office:1.0}"
_TABLE = "{urn:oasis:names:tc:opendocument:xmlns:table:1.0}"
_TEXT = "{urn:oasis:names:tc:opendocument:xmlns:text:1.0}"
_STYLE = "{urn:oasis:names:tc:opendocument:xmlns:style:1.0}"

_CELLS = (_TABLE + "table-cell", _TABLE + "covered-table-cell")
_NUMBERS = ("float", "percentage", "currency")
_CONTENT = "content.xml"
_DEEPEST = 60
"""Elements within elements: what a person wrote has a dozen at most."""

_PIECE = 4_096
"""So few bytes at once that no depth is reached that a browser's stack cannot bear."""


@dataclass
class _Sheet:
    """What the first look finds in a sheet."""

    name: str
    hidden: bool
    filled: int = 0
    hidden_rows: int = 0
    hidden_columns: int = 0
    merged: int = 0
    no_value: int = 0


def open_document(content: bytes, sheet: str | None = None) -> Workbook:
    """Open an OpenDocument workbook, and one of its sheets.

    Parameters
    ----------
    content : bytes
    sheet : str, optional
        Its name; without one, the visible sheet that holds most.

    Raises
    ------
    Refusal
        Those of ``archive_check.checked_archive``; ``workbook_damaged``, ``workbook_without_sheets``,
        ``no_such_sheet`` (``sheets``), ``too_many_rows``, ``too_many_columns``, ``too_many_cells_in_file``.

    Cautions
    --------
    Those of ``workbook.open_workbook``. Hidden and filtered rows are read like others.
    """
    archive = checked_archive(content)
    sheets = _look(archive)
    if not sheets:
        raise Refusal("workbook_without_sheets")
    by_name = {each.name: each for each in sheets}
    if sheet is None:
        sheet = max(sheets, key=lambda each: (not each.hidden, each.filled)).name
    if sheet not in by_name:
        raise Refusal("no_such_sheet", field="sheet", given=sheet, sheets=list(by_name))
    return Workbook(
        sheets=tuple(by_name),
        sheet=sheet,
        epoch="serial_1900",
        rows=_rows(archive, sheet),
        cautions=_cautions(by_name[sheet], [each.name for each in sheets if each.hidden]),
    )


def _events(archive: zipfile.ZipFile) -> Iterator[tuple[str, Any]]:
    """Give the beginnings and ends of elements; whatever goes wrong means that the workbook is damaged."""
    parser = ElementTree.XMLPullParser(events=("start", "end"))
    depth = 0
    try:
        with archive.open(_CONTENT) as part:
            while piece := part.read(_PIECE):
                parser.feed(piece)
                for event, element in parser.read_events():
                    depth += 1 if event == "start" else -1
                    if depth > _DEEPEST:
                        raise Refusal("workbook_damaged")
                    yield event, element
        parser.close()
        yield from parser.read_events()
    except (*DAMAGED, ElementTree.ParseError):
        raise Refusal("workbook_damaged") from None


def _look(archive: zipfile.ZipFile) -> list[_Sheet]:
    sheets: list[_Sheet] = []
    hidden_styles: set[str] = set()
    style = ""
    depth = 0
    for event, element in _events(archive):
        tag = element.tag
        if event == "start":
            if tag == _STYLE + "style":
                style = element.get(_STYLE + "name", "")
            elif tag == _STYLE + "table-properties" and element.get(_TABLE + "display") == "false":
                hidden_styles.add(style)
            elif tag == _TABLE + "table":
                depth += 1
                if depth == 1:
                    hidden = element.get(_TABLE + "style-name") in hidden_styles
                    sheets.append(_Sheet(element.get(_TABLE + "name", ""), hidden))
            continue
        if tag == _TABLE + "table":
            depth -= 1
            element.clear()
        elif depth == 1 and tag == _TABLE + "table-column" and _is_hidden(element):
            sheets[-1].hidden_columns += min(_times(element, "columns"), MOST_COLUMNS)
        elif depth == 1 and tag == _TABLE + "table-row":
            _look_at_row(sheets[-1], element)
            element.clear()
    return sheets


def _look_at_row(sheet: _Sheet, row: Any) -> None:
    filled = False
    for cell in row:
        if cell.tag not in _CELLS:
            continue
        if cell.tag == _CELLS[0]:
            spans = (cell.get(_TABLE + f"number-{way}-spanned", "1") for way in ("columns", "rows"))
            sheet.merged += any(span != "1" for span in spans)
            kind = cell.get(_OFFICE + "value-type")
            sheet.no_value += cell.get(_TABLE + "formula") is not None and kind is None
        if _text(cell):
            sheet.filled += 1
            filled = True
    sheet.hidden_rows += filled and _is_hidden(row)


def _is_hidden(element: Any) -> bool:
    return element.get(_TABLE + "visibility", "visible") != "visible"


def _cautions(sheet: _Sheet, hidden: list[str]) -> tuple[Caution, ...]:
    found = []
    if sheet.hidden_rows:
        found.append(Caution("hidden_rows", {"n": sheet.hidden_rows}))
    if sheet.hidden_columns:
        found.append(Caution("hidden_columns", {"n": sheet.hidden_columns}))
    if sheet.merged:
        found.append(Caution("merged_cells", {"n": sheet.merged}))
    if sheet.no_value:
        found.append(Caution("formulas_without_value", {"n": sheet.no_value}))
    if hidden:
        found.append(Caution("hidden_sheets", {"sheets": hidden}))
    return tuple(found)


def _rows(archive: zipfile.ZipFile, sheet: str) -> Iterator[Rows]:
    """Give the rows of a sheet that have something in them, with their numbers, some thousand at once."""
    lines: list[int] = []
    rows: list[list[str]] = []
    line, cells, depth, mine = 0, 0, 0, False
    for event, element in _events(archive):
        tag = element.tag
        if tag == _TABLE + "table":
            depth += 1 if event == "start" else -1
            if event == "start" and depth == 1:
                mine = not line and element.get(_TABLE + "name", "") == sheet
            elif event == "end":
                element.clear()
                if mine and depth == 0:
                    break
        elif event == "end" and tag == _TABLE + "table-row" and depth == 1:
            if mine:
                times = _times(element, "rows")
                texts = _cells_of(element)
                if texts:
                    cells += times * len(texts)
                    if line + times > MOST_ROWS:
                        raise Refusal("too_many_rows", most=MOST_ROWS)
                    if cells > MOST_CELLS:
                        raise Refusal("too_many_cells_in_file", most=MOST_CELLS)
                    lines += range(line + 1, line + times + 1)
                    rows += [texts] * times
                line += times
                if len(rows) >= ROWS_AT_ONCE:
                    yield lines, rows
                    lines, rows = [], []
            element.clear()
    if rows:
        yield lines, rows


def _cells_of(row: Any) -> list[str]:
    """Return the texts of a row up to its last cell that has any."""
    texts: list[str] = []
    blank = 0
    for cell in row:
        if cell.tag not in _CELLS:
            continue
        times, text = _times(cell, "columns"), _text(cell)
        if not text:
            blank += times
            continue
        # Blank cells to the end of the sheet are written as one; only those before a text count.
        if len(texts) + blank + times > MOST_COLUMNS:
            raise Refusal("too_many_columns", columns=len(texts) + blank + times, most=MOST_COLUMNS)
        texts += [""] * blank + [text] * times
        blank = 0
    return texts


def _times(element: Any, what: str) -> int:
    written = element.get(_TABLE + f"number-{what}-repeated", "1")
    if not (written.isascii() and written.isdigit() and 0 < len(written) <= 9):
        raise Refusal("workbook_damaged")
    return max(1, int(written))


def _text(cell: Any) -> str:
    """Return a cell as the text that a person would read; notes pinned to it are not part of it."""
    if cell.tag != _CELLS[0]:
        # What is covered by a merged cell is not seen.
        return ""
    kind = cell.get(_OFFICE + "value-type")
    if kind in _NUMBERS:
        return _number(cell.get(_OFFICE + "value", ""))
    if kind == "date":
        day, _, time = cell.get(_OFFICE + "date-value", "").partition("T")
        return day if not time.strip("0:.,") else f"{day} {time[:8]}"
    if kind == "boolean":
        return cell.get(_OFFICE + "boolean-value", "").upper()
    stored = cell.get(_OFFICE + "string-value")
    if stored is not None:
        return stored
    return "\n".join(_inside(part) for part in cell if part.tag == _TEXT + "p")


def _number(written: str) -> str:
    try:
        return number_as_shown(float(written))
    except ValueError:
        return written


def _inside(element: Any, depth: int = 0) -> str:
    if depth > _DEEPEST:
        raise Refusal("workbook_damaged")
    pieces = [element.text or ""]
    for part in element:
        if part.tag == _TEXT + "s":
            count = part.get(_TEXT + "c", "1")
            pieces.append(" " * min(int(count), 1000) if count.isascii() and count.isdigit() else " ")
        elif part.tag in (_TEXT + "tab", _TEXT + "line-break"):
            pieces.append(" ")
        elif part.tag != _OFFICE + "annotation":
            pieces.append(_inside(part, depth + 1))
        pieces.append(part.tail or "")
    return "".join(pieces)
