"""Hard files that are made when they are needed: workbooks, bombs and files too large to keep.

Each function returns bytes, the same at every call. The small files stand in ``files``.
"""

from __future__ import annotations

import datetime
import io
import re
import zipfile
from collections.abc import Callable

import openpyxl

HEADINGS = ["Reg no", "Sex", "Age", "Diagnosed", "Last contact", "Status", "Severity"]
_DAY = datetime.date
PATIENTS = [
    [101, "F", 23, _DAY(2016, 3, 14), _DAY(2025, 5, 20), "Under care", "Mild"],
    [102, "M", 31, _DAY(2016, 7, 2), _DAY(2018, 12, 11), "Died - RHD", "Severe"],
    [103, "F", 9, _DAY(2017, 1, 25), _DAY(2019, 6, 30), "Lost", "Mild"],
    [104, "F", 45, _DAY(2017, 8, 8), _DAY(2025, 4, 19), "Under care", "Moderate"],
    [105, "M", 17, _DAY(2018, 10, 31), _DAY(2020, 11, 5), "Transferred out", "Mild"],
]


def workbook(change: Callable[[openpyxl.Workbook], None] | None = None) -> bytes:
    """Return a small workbook, changed as asked."""
    book = openpyxl.Workbook()
    page = book.active
    page.title = "Register"
    for row in [HEADINGS, *PATIENTS]:
        page.append(row)
    if change:
        change(book)
    packed = io.BytesIO()
    book.save(packed)
    return packed.getvalue()


def from_1904() -> bytes:
    """A workbook that counts its days from 1904."""

    def change(book: openpyxl.Workbook) -> None:
        book.epoch = datetime.datetime(1904, 1, 1)

    return workbook(change)


def hidden_and_merged() -> bytes:
    """Hidden rows, columns and sheets, and merged cells; the register is not the first sheet."""

    def change(book: openpyxl.Workbook) -> None:
        page = book["Register"]
        page.row_dimensions[3].hidden = True
        page.column_dimensions["C"].hidden = True
        page["I1"] = "Printed"
        page.merge_cells("I1:J1")
        notes = book.create_sheet("Notes", 0)
        notes["A1"] = "How to fill in the register"
        codes = book.create_sheet("Codes")
        codes["A1"] = "Mild"
        codes.sheet_state = "hidden"

    return workbook(change)


def formulas_without_value() -> bytes:
    """Formulas that no spreadsheet has calculated: there is no stored value to read."""

    def change(book: openpyxl.Workbook) -> None:
        for line in (2, 3):
            book["Register"][f"E{line}"] = f"=D{line}+365"

    return workbook(change)


def cells_of_many_types() -> bytes:
    """Numbers as text, dates as text, date and time, booleans, error values, real numbers."""

    def change(book: openpyxl.Workbook) -> None:
        page = book["Register"]
        page["A2"] = "00101"
        page["D2"] = "14/03/2016"
        page["E2"] = datetime.datetime(2025, 5, 20, 14, 30)
        page["C3"] = 31.5
        page["C4"] = "#N/A"
        page["G5"] = True

    return workbook(change)


def shared_strings() -> bytes:
    """Texts kept once in a part of their own, as spreadsheets write them, and prefixed tags."""
    parts = parts_of(workbook())
    texts: list[bytes] = []

    def share(found: re.Match[bytes]) -> bytes:
        if found.group(2) not in texts:
            texts.append(found.group(2))
        return b'<c%s t="s"><v>%d</v></c>' % (found.group(1), texts.index(found.group(2)))

    sheet = "xl/worksheets/sheet1.xml"
    inline = rb'<c([^>]*) t="inlineStr"><is><t>(.*?)</t></is></c>'
    shared = re.sub(inline, share, parts[sheet])
    shared = re.sub(rb"<(/?)(?=[a-zA-Z])", rb"<\1x:", shared)
    parts[sheet] = shared.replace(b"xmlns=", b"xmlns:x=")
    main = b"http://schemas.openxmlformats.org/spreadsheetml/2006/main"
    items = b"".join(b"<si><t>%s</t></si>" % text for text in texts)
    parts["xl/sharedStrings.xml"] = b'<sst xmlns="%s">%s</sst>' % (main, items)
    types = parts["[Content_Types].xml"]
    kind = b"application/vnd.openxmlformats-officedocument.spreadsheetml.sharedStrings+xml"
    added = b'<Override PartName="/xl/sharedStrings.xml" ContentType="%s"/></Types>' % kind
    parts["[Content_Types].xml"] = types.replace(b"</Types>", added)
    return archive(parts)


def wrong_dimension() -> bytes:
    """A sheet that claims to be smaller than it is: rows beyond the claim must not be lost."""
    return edited(
        workbook(), "xl/worksheets/sheet1.xml", rb'<dimension ref="[^"]*"', b'<dimension ref="A1:B2"'
    )


def macros() -> bytes:
    """A workbook with a macro part."""
    return with_part(workbook(), "xl/vbaProject.bin", b"\0" * 100)


def binary_workbook() -> bytes:
    """The binary kind of workbook, .xlsb."""
    return archive({"[Content_Types].xml": b"<Types/>", "xl/workbook.bin": b"\0" * 64})


def open_document() -> bytes:
    """A workbook of another form, .ods."""
    kind = b"application/vnd.oasis.opendocument.spreadsheet"
    return archive({"mimetype": kind, "content.xml": b"<office/>"})


def text_document() -> bytes:
    """An archive that is no workbook: a text document."""
    return archive({"[Content_Types].xml": b"<Types/>", "word/document.xml": b"<w/>"})


def entities() -> bytes:
    """A part that declares entities which would grow without end."""
    billion = b'<?xml version="1.0"?><!DOCTYPE x [<!ENTITY a "aaaaaaaaaa"><!ENTITY b "&a;&a;&a;&a;">]>'
    return edited(workbook(), "xl/styles.xml", rb"^(<\?xml[^>]*>)?", billion)


def bomb() -> bytes:
    """Some 300 KB that would unpack to 300 MB."""
    return with_part(workbook(), "xl/worksheets/sheet2.xml", b"\0" * 300_000_000)


def many_parts() -> bytes:
    """An archive of very many parts."""
    return archive({"xl/workbook.xml": b"<workbook/>"} | {f"xl/media/{i}": b"" for i in range(5_001)})


def far_row() -> bytes:
    """A row numbered so high that reading up to it would never end."""
    return edited(workbook(), "xl/worksheets/sheet1.xml", rb'<row r="6"', b'<row r="999999999"')


def rows_out_of_order() -> bytes:
    """Rows whose numbers go back: a reader that trusts them loses some."""
    return edited(workbook(), "xl/worksheets/sheet1.xml", rb'<row r="6"', b'<row r="2"')


def locked_part() -> bytes:
    """An archive whose entries say that they are encrypted."""
    content = bytearray(workbook())
    for found in re.finditer(rb"PK\x01\x02", bytes(content)):
        content[found.start() + 8] |= 1
    return bytes(content)


def not_xml() -> bytes:
    """A sheet that stops in the middle."""
    return edited(workbook(), "xl/worksheets/sheet1.xml", rb"</sheetData>.*$", b"")


def thirty_megabytes() -> bytes:
    """A delimited register of more than 30 MB: 300,000 rows."""
    ends = ("Under care", "Died - RHD", "Lost", "Transferred out")
    rows = (
        f"{line},{'FM'[line % 2]},{5 + line % 60},{1 + line % 28:02}/{1 + line % 12:02}/{2010 + line % 8},"
        f"{1 + line % 27:02}/{1 + line % 11:02}/{2020 + line % 5},{ends[line % 4]},Mild,"
        f"{'note ' * 11}{line % 90}"
        for line in range(300_000)
    )
    return (",".join([*HEADINGS, "Remarks"]) + "\n" + "\n".join(rows)).encode()


def archive(parts: dict[str, bytes]) -> bytes:
    """Return a zip archive."""
    packed = io.BytesIO()
    with zipfile.ZipFile(packed, "w", zipfile.ZIP_DEFLATED) as whole:
        for name, content in parts.items():
            whole.writestr(name, content)
    return packed.getvalue()


def parts_of(content: bytes) -> dict[str, bytes]:
    """Return the parts of a zip archive."""
    with zipfile.ZipFile(io.BytesIO(content)) as whole:
        return {name: whole.read(name) for name in whole.namelist()}


def edited(content: bytes, part: str, pattern: bytes, replacement: bytes) -> bytes:
    """Return a workbook with one part changed; fail if there was nothing to change."""
    parts = parts_of(content)
    parts[part], changed = re.subn(pattern, lambda _: replacement, parts[part], count=1, flags=re.DOTALL)
    if not changed:
        raise ValueError(f"{part} does not have {pattern!r}")
    return archive(parts)


def with_part(content: bytes, name: str, part: bytes) -> bytes:
    """Return a workbook with one part more."""
    return archive(parts_of(content) | {name: part})


MADE: dict[str, Callable[[], bytes]] = {
    "plain workbook": workbook,
    "from 1904": from_1904,
    "hidden and merged": hidden_and_merged,
    "formulas without value": formulas_without_value,
    "cells of many types": cells_of_many_types,
    "shared strings": shared_strings,
    "wrong dimension": wrong_dimension,
    "macros": macros,
    "binary workbook": binary_workbook,
    "open document": open_document,
    "text document": text_document,
    "entities": entities,
    "bomb": bomb,
    "many parts": many_parts,
    "far row": far_row,
    "rows out of order": rows_out_of_order,
    "locked part": locked_part,
    "not XML": not_xml,
    "thirty megabytes": thirty_megabytes,
}
