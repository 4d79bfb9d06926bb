"""An .xlsx workbook becomes rows of text cells: dates by the type of their cell, formulas by stored value."""

from __future__ import annotations

import datetime
import io
import warnings
import zipfile
from collections.abc import Callable, Iterator
from dataclasses import dataclass
from functools import partial
from itertools import islice
from typing import Any

from vitalroll.errors import Caution, Refusal
from vitalroll.register.archive_check import checked_archive, marks_of
from vitalroll.register.delimited import ROWS_AT_ONCE, Rows
from vitalroll.register.table import MOST_CELLS, MOST_ROWS

_EPOCH_1904 = datetime.datetime(1904, 1, 1)


@dataclass(frozen=True)
class Workbook:
    """One sheet of a workbook, and what else there is.

    ``epoch`` is ``serial_1900`` or ``serial_1904``, from which the workbook counts its days.
    """

    sheets: tuple[str, ...]
    sheet: str
    epoch: str
    rows: Iterator[Rows]
    cautions: tuple[Caution, ...]


def open_workbook(content: bytes, sheet: str | None = None) -> Workbook:
    """Open a workbook, and one of its sheets.

    Parameters
    ----------
    content : bytes
    sheet : str, optional
        Its name; without one, the visible sheet that holds most.

    Raises
    ------
    Refusal
        Those of ``archive_check.checked_archive``; ``workbook_damaged`` for what cannot be parsed;
        ``workbook_without_sheets``; ``no_such_sheet`` (``sheets``).

    Cautions
    --------
    ``hidden_rows``, ``hidden_columns``, ``merged_cells``, ``formulas_without_value`` (each ``n``)
    and ``hidden_sheets`` (``sheets``). Hidden rows are read like others.
    """
    archive = checked_archive(content)
    # Imported here: opening a plain file must not wait for it.
    import openpyxl

    book = _parsed(lambda: openpyxl.load_workbook(io.BytesIO(content), read_only=True, data_only=True))
    pages = {page.title: page for page in book.worksheets}
    if not pages:
        raise Refusal("workbook_without_sheets")
    if sheet is None:
        sheet = _fullest(archive, pages)
    if sheet not in pages:
        raise Refusal("no_such_sheet", field="sheet", given=sheet, sheets=list(pages))
    page = pages[sheet]
    hidden = [title for title, other in pages.items() if other.sheet_state != "visible"]
    return Workbook(
        sheets=tuple(pages),
        sheet=sheet,
        epoch="serial_1904" if book.epoch == _EPOCH_1904 else "serial_1900",
        rows=_rows(page),
        cautions=_cautions(archive, page, hidden),
    )


def _parsed(parse: Callable[[], Any]) -> Any:
    """Carry out a step of parsing; whatever goes wrong in it means that the workbook is damaged."""
    try:
        with warnings.catch_warnings():
            warnings.simplefilter("ignore")
            return parse()
    except (MemoryError, Refusal):
        raise
    # Damaged parts make the parser raise almost anything: KeyError, TypeError, ParseError and more.
    except Exception:
        raise Refusal("workbook_damaged") from None


def _part(page: Any) -> str:
    # The path of the sheet inside the archive; the library has no public name for it.
    return page._worksheet_path.lstrip("/")


def _fullest(archive: zipfile.ZipFile, pages: dict[str, Any]) -> str:
    def size(title: str) -> tuple[bool, int]:
        page = pages[title]
        try:
            bytes_unpacked = archive.getinfo(_part(page)).file_size
        except KeyError:
            bytes_unpacked = 0
        return page.sheet_state == "visible", bytes_unpacked

    return max(pages, key=size)


def _cautions(archive: zipfile.ZipFile, page: Any, hidden: list[str]) -> tuple[Caution, ...]:
    marks = marks_of(archive, _part(page))
    found = []
    if marks.hidden_rows:
        found.append(Caution("hidden_rows", {"n": marks.hidden_rows}))
    if marks.hidden_columns:
        found.append(Caution("hidden_columns", {"n": marks.hidden_columns}))
    if marks.merged:
        found.append(Caution("merged_cells", {"n": marks.merged}))
    if marks.formulas_without_value:
        found.append(Caution("formulas_without_value", {"n": marks.formulas_without_value}))
    if hidden:
        found.append(Caution("hidden_sheets", {"sheets": hidden}))
    return tuple(found)


def _rows(page: Any) -> Iterator[Rows]:
    # The size that a sheet claims to have may be wrong, and rows beyond it would be lost.
    page.reset_dimensions()
    rows = page.iter_rows(values_only=True)
    line, cells, width = 0, 0, 0
    while True:
        got = _parsed(partial(_some, rows, cells))
        if not got:
            return
        cells += sum(map(len, got))
        width = max(width, max(map(len, got)))
        if line + len(got) > MOST_ROWS:
            raise Refusal("too_many_rows", most=MOST_ROWS)
        texts = [[_text(value) for value in row] + [""] * (width - len(row)) if row else [] for row in got]
        yield list(range(line + 1, line + len(got) + 1)), texts
        line += len(got)


def _some(rows: Iterator[tuple[Any, ...]], cells: int) -> list[tuple[Any, ...]]:
    """Return some thousand rows; stop at a sheet whose rows are padded without end."""
    got = []
    for row in islice(rows, ROWS_AT_ONCE):
        cells += len(row)
        if cells > MOST_CELLS:
            raise Refusal("too_many_cells_in_file", most=MOST_CELLS)
        got.append(row)
    return got


def number_as_shown(value: float) -> str:
    """Return a number with fifteen digits, as a spreadsheet shows it; the rest is round-off."""
    return format(value, ".15g")


def _text(value: Any) -> str:
    if value is None:
        return ""
    if isinstance(value, str):
        return value
    if isinstance(value, bool):
        return "TRUE" if value else "FALSE"
    if isinstance(value, float):
        return number_as_shown(value)
    if isinstance(value, datetime.datetime):
        midnight = value.time() == datetime.time()
        return value.date().isoformat() if midnight else value.isoformat(sep=" ", timespec="seconds")
    return str(value)
