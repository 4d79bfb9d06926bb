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


OPEN_DOCUMENT = b"application/vnd.oasis.opendocument.spreadsheet"
_SPACES = " ".join(
    f'xmlns:{name}="urn:oasis:names:tc:opendocument:xmlns:{name}:1.0"'
    for name in ("office", "table", "text", "style")
)


def ods(tables: str, styles: str = "", **parts: bytes) -> bytes:
    """Return an .ods workbook of the given tables (XML), with any other parts."""
    content = (
        f'<?xml version="1.0" encoding="UTF-8"?><office:document-content {_SPACES}>'
        f"<office:automatic-styles>{styles}</office:automatic-styles>"
        f"<office:body><office:spreadsheet>{tables}</office:spreadsheet></office:body></office:document-content>"
    )
    named = {name.replace("__", "/"): part for name, part in parts.items()}
    return archive({"mimetype": OPEN_DOCUMENT, "content.xml": content.encode(), **named})


def ods_cell(value: object) -> str:
    """Return a cell as a spreadsheet writes it."""
    if value is None:
        return "<table:table-cell/>"
    if isinstance(value, _DAY):
        return (
            f'<table:table-cell office:value-type="date" office:date-value="{value.isoformat()}">'
            f"<text:p>{value:%d/%m/%y}</text:p></table:table-cell>"
        )
    if isinstance(value, int):
        return f'<table:table-cell office:value-type="float" office:value="{value}"><text:p>{value}</text:p></table:table-cell>'
    return f'<table:table-cell office:value-type="string"><text:p>{value}</text:p></table:table-cell>'


def ods_table(rows: list[list[object]], name: str = "Register", attributes: str = "") -> str:
    """Return a table with the rows, then the blank cells and rows that programs write to the sheet's end."""
    body = "".join(
        "<table:table-row>" + "".join(map(ods_cell, row))
        + '<table:table-cell table:number-columns-repeated="16000"/></table:table-row>'
        for row in rows
    )  # fmt: skip
    blank = (
        '<table:table-row table:number-rows-repeated="1048000">'
        '<table:table-cell table:number-columns-repeated="16384"/></table:table-row>'
    )
    return f'<table:table table:name="{name}" {attributes}>{body}{blank}</table:table>'


def open_document() -> bytes:
    """A workbook of the other common form, .ods."""
    return ods(ods_table([HEADINGS, *PATIENTS]))


def open_document_marks() -> bytes:
    """An .ods workbook with a hidden sheet that holds more, hidden rows, merged cells and an uncalculated formula."""
    rows = ods_table([HEADINGS, *PATIENTS])
    rows = rows.replace("<table:table-row>", '<table:table-row table:visibility="filter">', 2)
    rows = rows.replace(
        "</table:table-row>",
        '<table:table-cell table:formula="of:=1+1"/>'
        '<table:table-cell table:number-columns-spanned="2"/><table:covered-table-cell/></table:table-row>',
        1,
    )
    styles = '<style:style style:name="ta2"><style:table-properties table:display="false"/></style:style>'
    codes = ods_table([["Mild", i] for i in range(60)], "Codes", 'table:style-name="ta2"')
    return ods(codes + rows, styles)


def open_document_texts() -> bytes:
    """Texts in spans, over lines, with repeated spaces and a note; percentages, truths and times of day."""
    texts = [
        '<table:table-cell office:value-type="string"><text:p>Under<text:s/><text:span>ca<text:span>re</text:span>'
        "</text:span></text:p><office:annotation><text:p>seen by nurse</text:p></office:annotation></table:table-cell>",
        '<table:table-cell office:value-type="percentage" office:value="0.5"><text:p>50 %</text:p></table:table-cell>',
        '<table:table-cell office:value-type="boolean" office:boolean-value="true"/>',
        '<table:table-cell office:value-type="date" office:date-value="2025-05-20T14:30:00"/>',
        '<table:table-cell office:value-type="string" table:number-columns-repeated="2"><text:p>x</text:p></table:table-cell>',
        '<table:table-cell table:number-columns-repeated="2"/>',
        '<table:table-cell office:value-type="string"><text:p>a</text:p><text:p>b</text:p></table:table-cell>',
    ]
    row = f'<table:table-row table:number-rows-repeated="3">{"".join(texts)}</table:table-row>'
    headings = "".join(map(ods_cell, ["Status", "Share", "Seen", "When", "P", "Q", "R", "S", "T"]))
    return ods(
        f'<table:table table:name="Register"><table:table-row>{headings}</table:table-row>{row}</table:table>'
    )


def open_document_bomb() -> bytes:
    """A few bytes that stand for a thousand million cells: a row said to be repeated, of cells said so too."""
    cell = '<table:table-cell office:value-type="string" table:number-columns-repeated="1900"><text:p>x</text:p></table:table-cell>'
    row = f'<table:table-row table:number-rows-repeated="999999">{cell}</table:table-row>'
    return ods(f'<table:table table:name="Register">{row}</table:table>')


def open_document_entities() -> bytes:
    """An .ods workbook that declares entities which would grow without end."""
    content = b'<?xml version="1.0"?><!DOCTYPE x [<!ENTITY a "aaaaaaaaaa"><!ENTITY b "&a;&a;&a;">]><x>&b;</x>'
    return archive({"mimetype": OPEN_DOCUMENT, "content.xml": content})


def open_document_deep() -> bytes:
    """Spans within spans within spans, far deeper than anybody writes."""
    text = "<text:span>" * 5000 + "x" + "</text:span>" * 5000
    cell = f'<table:table-cell office:value-type="string"><text:p>{text}</text:p></table:table-cell>'
    return ods(f'<table:table table:name="Register"><table:table-row>{cell}</table:table-row></table:table>')


def open_document_locked() -> bytes:
    """An .ods workbook with a password: its manifest says how each part is encrypted."""
    manifest = b"<manifest:manifest><manifest:file-entry><manifest:encryption-data/></manifest:file-entry></manifest:manifest>"
    return ods(ods_table([HEADINGS]), **{"META-INF__manifest.xml": manifest})


def open_document_macros() -> bytes:
    """An .ods workbook with macros."""
    return ods(ods_table([HEADINGS, *PATIENTS]), **{"Basic__Standard__Module1.xml": b"<m/>"})


def open_document_text() -> bytes:
    """A text document of the same family."""
    return archive({"mimetype": b"application/vnd.oasis.opendocument.text", "content.xml": b"<office/>"})


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
    "open document marks": open_document_marks,
    "open document texts": open_document_texts,
    "open document bomb": open_document_bomb,
    "open document entities": open_document_entities,
    "open document deep": open_document_deep,
    "open document locked": open_document_locked,
    "open document macros": open_document_macros,
    "open document text": open_document_text,
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
