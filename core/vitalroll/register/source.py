"""A file, as it was opened: its form, its columns and its rows."""

from __future__ import annotations

import hashlib
import io
import zipfile
from collections.abc import Callable, Iterator
from dataclasses import dataclass

import numpy as np

from vitalroll.errors import Caution, Refusal
from vitalroll.register.archive_check import DAMAGED, is_archive, is_open_document, refuse_by_signature
from vitalroll.register.delimited import Rows, how_divided, read_rows
from vitalroll.register.encoding import decode
from vitalroll.register.open_document import open_document
from vitalroll.register.table import Column, Table, table_of
from vitalroll.register.workbook import open_workbook

MOST_BYTES = 200_000_000
"""A larger file is refused: it could not be held in a browser's memory together with its answers."""

Report = Callable[[str, int, int], None]


@dataclass(frozen=True)
class Source:
    """An opened file.

    Parameters
    ----------
    fingerprint : str
        SHA-256 of the bytes, in hexadecimal.
    name : str
    form : str
        ``delimited`` or ``workbook``.
    encoding, delimiter : str or None
        Of delimited text.
    sheets : tuple of str
    sheet : str or None
        Of a workbook.
    epoch : str or None
        From which day a workbook counts its days: ``serial_1900`` or ``serial_1904``.
    table : Table
    cautions : tuple of Caution
    """

    fingerprint: str
    name: str
    form: str
    encoding: str | None
    delimiter: str | None
    sheets: tuple[str, ...]
    sheet: str | None
    epoch: str | None
    table: Table
    cautions: tuple[Caution, ...]

    def column(self, identifier: str, field: str) -> Column:
        """Return a column by its identifier; refuse (``unknown_column``) one that is not there."""
        for column in self.table.columns:
            if column.identifier == identifier:
                return column
        raise Refusal("unknown_column", field=field, column=identifier)

    def patients(self) -> np.ndarray:
        """Return for each row whether it describes a patient (bool)."""
        keep = np.ones(len(self.table), dtype=bool)
        keep[list(self.table.not_patients)] = False
        return keep


def open_source(
    content: bytes,
    name: str = "",
    *,
    sheet: str | None = None,
    heading_line: int | None = None,
    report: Report | None = None,
) -> Source:
    """Open a register: delimited text in any common encoding, or an .xlsx or .ods workbook.

    Parameters
    ----------
    content : bytes
    name : str
        Of the file; only kept, what a file is shows from its content.
    sheet : str, optional
        Of a workbook.
    heading_line : int, optional
        Where the headings stand, if somebody said so; 0 for nowhere.
    report : callable, optional
        Called with ("reading", rows read, rows in all or 0 when not known).

    Raises
    ------
    Refusal
        ``empty_file``, ``file_too_large`` (``bytes``, ``most``), ``no_such_sheet`` when a sheet is
        asked for of a file without any, and those of ``archive_check``, ``decode``,
        ``open_workbook`` and ``table_of``.
    """
    if not content.strip(b"\0\t\r\n \x1a\xef\xbb\xbf\xff\xfe"):
        raise Refusal("empty_file")
    if len(content) > MOST_BYTES:
        raise Refusal("file_too_large", bytes=len(content), most=MOST_BYTES)
    fingerprint = hashlib.sha256(content).hexdigest()
    refuse_by_signature(content)
    if is_archive(content):
        book = open_document(content, sheet) if _is_ods(content) else open_workbook(content, sheet)
        table = table_of(_reporting(book.rows, 0, report), heading_line)
        return Source(
            fingerprint, name, "workbook", None, None, book.sheets, book.sheet, book.epoch, table,
            book.cautions + table.cautions,
        )  # fmt: skip
    if sheet is not None:
        raise Refusal("no_such_sheet", field="sheet", given=sheet, sheets=[])
    decoded = decode(content)
    how = how_divided(decoded.text)
    rows = _reporting(read_rows(decoded.text, how), decoded.text.count("\n"), report)
    table = table_of(rows, heading_line)
    return Source(
        fingerprint, name, "delimited", decoded.encoding, how.delimiter, (), None, None, table,
        decoded.cautions + how.cautions + table.cautions,
    )  # fmt: skip


def _is_ods(content: bytes) -> bool:
    try:
        return is_open_document(zipfile.ZipFile(io.BytesIO(content)))
    except (*DAMAGED, Refusal):
        # What is wrong with it is said by the reader of workbooks.
        return False


def _reporting(chunks: Iterator[Rows], total: int, report: Report | None) -> Iterator[Rows]:
    done = 0
    for lines, rows in chunks:
        yield lines, rows
        done += len(rows)
        if report:
            report("reading", done, max(total, done) if total else 0)
