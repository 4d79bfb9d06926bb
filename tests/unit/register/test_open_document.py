"""An .ods workbook reads like the .xlsx workbook with the same cells; what is wrong with it is refused."""

from __future__ import annotations

import io
import random
import zipfile

import pytest
from make import (
    HEADINGS,
    PATIENTS,
    ods,
    ods_table,
    open_document,
    open_document_marks,
    open_document_texts,
    workbook,
)

from vitalroll.desk import Desk
from vitalroll.errors import Refusal
from vitalroll.register.source import open_source


def preview(content, **how):
    said = Desk().answer("register.open", {"name": "x", "content": content, **how})
    return said.get("answer") or said["refusal"]


def test_the_same_cells_read_the_same_in_both_kinds_of_workbook():
    one, other = preview(open_document()), preview(workbook())
    assert one["preview"] == other["preview"]
    assert [column["role"] for column in one["columns"]] == [column["role"] for column in other["columns"]]
    assert (one["form"], one["sheets"], one["sheet"]) == ("workbook", ["Register"], "Register")


def test_the_visible_sheet_is_opened_and_what_is_hidden_is_told():
    answer = preview(open_document_marks())
    assert (answer["sheets"], answer["sheet"]) == (["Codes", "Register"], "Register")
    told = {caution["code"]: caution["parameters"] for caution in answer["cautions"]}
    assert told == {
        "hidden_rows": {"n": 2}, "merged_cells": {"n": 1}, "formulas_without_value": {"n": 1},
        "hidden_sheets": {"sheets": ["Codes"]},
    }  # fmt: skip
    assert answer["rows"] == len(PATIENTS)
    assert preview(open_document_marks(), sheet="Codes")["rows"] == 60
    refusal = preview(open_document_marks(), sheet="Elsewhere")
    assert (refusal["code"], refusal["parameters"]["sheets"]) == ("no_such_sheet", ["Codes", "Register"])


def test_cells_become_the_text_a_person_would_read_and_notes_are_left_out():
    answer = preview(open_document_texts())
    row = ["Under care", "0.5", "TRUE", "2025-05-20 14:30:00", "x", "x", "", "", "a b"]
    assert [each["cells"] for each in answer["preview"]] == [row, row, row]
    assert [each["line"] for each in answer["preview"]] == [2, 3, 4]


def test_lines_are_those_of_the_sheet_when_rows_between_are_blank():
    blank = '<table:table-row table:number-rows-repeated="7"><table:table-cell/></table:table-row>'
    table = ods_table([HEADINGS, *PATIENTS]).replace("</table:table-row>", "</table:table-row>" + blank, 1)
    assert [each["line"] for each in preview(ods(table))["preview"]] == [9, 10, 11, 12, 13]


@pytest.mark.parametrize("times", ["", "x", "-1", "1e9", "99999999999"])
def test_a_repetition_that_is_no_number_is_refused(times):
    table = ods_table([HEADINGS, *PATIENTS]).replace(
        "<table:table-row>", f'<table:table-row table:number-rows-repeated="{times}">', 1
    )
    with pytest.raises(Refusal) as refused:
        open_source(ods(table))
    assert refused.value.code == "workbook_damaged"


def test_a_workbook_without_sheets_and_one_without_cells_are_refused():
    assert preview(ods(""))["code"] == "workbook_without_sheets"
    assert preview(ods(ods_table([])))["code"] == "empty_file"


def test_a_sheet_wider_than_any_list_is_refused():
    wide = '<table:table-cell table:number-columns-repeated="5000"/>'
    table = ods_table([HEADINGS]).replace("<table:table-row>", "<table:table-row>" + wide, 1)
    assert preview(ods(table))["code"] == "too_many_columns"


@pytest.mark.parametrize("seed", range(150))
def test_mutated_bytes_are_read_or_refused(seed):
    """Never anything but a refusal: of the archive's own bytes and of the XML inside."""
    draw = random.Random(seed)
    content = bytearray(open_document_marks())
    if seed % 2:
        for _ in range(draw.randint(1, 12)):
            content[draw.randrange(len(content))] = draw.randrange(256)
        mutated = bytes(content)
    else:
        with zipfile.ZipFile(io.BytesIO(content)) as archive:
            parts = {name: bytearray(archive.read(name)) for name in archive.namelist()}
        for _ in range(draw.randint(1, 6)):
            at = draw.randrange(len(parts["content.xml"]))
            parts["content.xml"][at : at + draw.randint(0, 30)] = draw.randbytes(draw.randint(0, 4))
        packed = io.BytesIO()
        with zipfile.ZipFile(packed, "w") as archive:
            for name, part in parts.items():
                archive.writestr(name, bytes(part))
        mutated = packed.getvalue()
    try:
        source = open_source(mutated)
    except Refusal as refusal:
        assert refusal.code  # noqa: PT017
    else:
        assert len(source.table)
