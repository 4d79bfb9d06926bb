"""Workbooks: refused before they are parsed when they could do harm; otherwise read by the type of each cell."""

from __future__ import annotations

import datetime
import io
import zipfile

import numpy as np
import openpyxl
import pytest

from vitalroll.errors import Refusal
from vitalroll.register.archive_check import MOST_RATIO, MOST_UNPACKED, checked_archive, marks_of
from vitalroll.register.source import open_source
from vitalroll.register.workbook import open_workbook


def archive(parts):
    packed = io.BytesIO()
    with zipfile.ZipFile(packed, "w", zipfile.ZIP_DEFLATED) as whole:
        for name, content in parts.items():
            whole.writestr(name, content)
    return packed.getvalue()


def workbook(rows, epoch=None):
    book = openpyxl.Workbook()
    if epoch:
        book.epoch = epoch
    for row in rows:
        book.active.append(row)
    packed = io.BytesIO()
    book.save(packed)
    return packed.getvalue()


def refusal(content):
    with pytest.raises(Refusal) as refused:
        open_source(content)
    return refused.value.code


MAIN = {"xl/workbook.xml": b"<workbook/>"}


@pytest.mark.parametrize(
    ("parts", "code"),
    [
        ({"xl/workbook.bin": b""}, "workbook_binary"),
        ({"mimetype": b"", "content.xml": b""}, "not_a_table"),
        ({"word/document.xml": b""}, "not_a_table"),
        (MAIN | {"xl/vbaProject.bin": b""}, "workbook_macros"),
        (MAIN | {"a.xml": b"<!DOCTYPE x>"}, "workbook_entities"),
        (MAIN | {"a.xml": b"<a>" + b" " * 2_000_000 + b"<!ENTITY x 'y'>"}, "workbook_bomb"),
        (MAIN | {"a.rels": b"\xff\xfe<\0a\0"}, "workbook_damaged"),
        (MAIN | {"a.bin": b"\0" * 2_000_000}, "workbook_bomb"),
        (MAIN, "workbook_damaged"),
    ],
)
def test_archives_that_are_no_readable_workbook_are_refused_by_name(parts, code):
    assert refusal(archive(parts)) == code


def test_an_entity_declared_across_two_pieces_is_found():
    # Text that packs badly, so that the ratio is no reason to refuse; the declaration lies across 1 MiB.
    padding = np.random.default_rng(1).integers(97, 123, (1 << 20) - 5).astype(np.uint8).tobytes()
    assert refusal(archive(MAIN | {"a.xml": padding + b"<!DOCTYPE x>"})) == "workbook_entities"
    assert refusal(archive(MAIN | {"a.xml": padding + b"<!DECLARE x>"})) == "workbook_damaged"


def test_the_ratio_allowed_is_beyond_what_real_sheets_reach():
    rows = [["No", "Status"], *[["1", "Under care"]] * 20_000]
    content = workbook(rows)
    sheet = zipfile.ZipFile(io.BytesIO(content)).getinfo("xl/worksheets/sheet1.xml")
    assert sheet.file_size / sheet.compress_size < MOST_RATIO
    checked_archive(content)


def test_a_directory_that_promises_too_much_is_refused_without_unpacking():
    content = bytearray(archive(MAIN | {f"xl/media/{i}": b"x" for i in range(3)}))
    place = content.rfind(b"PK\x01\x02")
    content[place + 24 : place + 28] = (MOST_UNPACKED + 1).to_bytes(4, "little")
    assert refusal(bytes(content)) == "workbook_bomb"


@pytest.mark.parametrize(
    ("content", "code"),
    [
        (b"\xd0\xcf\x11\xe0\xa1\xb1\x1a\xe1" + b"\0" * 600, "not_a_table"),
        (b"%PDF-1.4 ...", "not_a_table"),
        (b"\x1f\x8b\x08\x00rest", "compressed_file"),
        (b"PK\x03\x04" + b"\0" * 40, "workbook_damaged"),
    ],
)
def test_files_known_by_their_first_bytes_are_refused_by_name(content, code):
    assert refusal(content) == code


@pytest.mark.parametrize("epoch", [None, datetime.datetime(1904, 1, 1)])
def test_dates_are_read_by_the_type_of_their_cell_in_both_epochs(epoch):
    day = datetime.date(2016, 3, 14)
    table = open_source(workbook([["No", "Diagnosed"], ["1", day], ["2", "14/03/2016"]], epoch)).table
    assert table.columns[1].texts == ("", "2016-03-14", "14/03/2016")


def test_serials_in_a_workbook_are_settled_by_its_epoch():
    book = open_workbook(workbook([["a"], [1]], datetime.datetime(1904, 1, 1)))
    assert book.epoch == "serial_1904"
    assert open_workbook(workbook([["a"], [1]])).epoch == "serial_1900"


def test_numbers_are_written_as_a_spreadsheet_shows_them():
    table = open_source(workbook([["No", "Weight"], ["x", 0.1 + 0.2], ["y", 31.0], ["z", 1e21]])).table
    assert table.columns[1].texts == ("", "0.3", "31", "1e+21")


def test_lines_are_the_rows_of_the_sheet():
    book = openpyxl.Workbook()
    for line, row in ((3, ["No", "Zone"]), (4, ["1", "N"]), (9, ["2", "S"])):
        for column, value in enumerate(row, 1):
            book.active.cell(line, column, value)
    packed = io.BytesIO()
    book.save(packed)
    table = open_source(packed.getvalue()).table
    assert table.heading_line == 3
    assert table.line.tolist() == [4, 9]


SHEET = """<worksheet><cols><col min="1" max="1" hidden="1"/></cols><sheetData>
<row r="1"><c r="A1" t="str"><f>"a"</f><v></v></c><c r="B1"><f>1+1</f><v>2</v></c></row>
<row r="2" hidden="1"><c r="A2"><f>1+1</f></c><c r="B2"><f>1+1</f><v/></c></row>
<row r="4" hidden="true"><c r="A4"><f t="shared" si="0"/></c></row>
</sheetData><mergeCells count="2"><mergeCell ref="A1:B1"/><mergeCell ref="A2:B2"/></mergeCells></worksheet>"""


@pytest.mark.parametrize("prefix", ["", "x:"])
def test_what_stands_in_a_sheet_beside_values_is_counted(prefix):
    sheet = SHEET.replace("</", "\x01").replace("<", "<" + prefix).replace("\x01", "</" + prefix)
    found = marks_of(zipfile.ZipFile(io.BytesIO(archive({"s.xml": sheet.encode()}))), "s.xml")
    assert (found.hidden_rows, found.hidden_columns, found.merged) == (2, 1, 2)
    assert found.formulas_without_value == 3


def test_rows_that_go_back_are_damage():
    content = archive({"s.xml": b'<row r="2"></row><row r="1"></row>'})
    with pytest.raises(Refusal) as refused:
        marks_of(zipfile.ZipFile(io.BytesIO(content)), "s.xml")
    assert refused.value.code == "workbook_damaged"
