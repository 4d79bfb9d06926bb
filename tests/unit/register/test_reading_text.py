"""Bytes become text, text becomes rows, rows become columns."""

from __future__ import annotations

import csv
import io

import numpy as np
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from vitalroll.errors import Refusal
from vitalroll.register.delimited import how_divided, read_rows
from vitalroll.register.encoding import decode
from vitalroll.register.source import MOST_BYTES, open_source
from vitalroll.register.spelling import bare, excerpt, same, shown

WORDS = "Nom;Âge\r\nÉlodie;9\r\n"


def codes(cautions):
    return [caution.code for caution in cautions]


@pytest.mark.parametrize(
    ("content", "encoding", "said"),
    [
        (WORDS.encode(), "UTF-8", []),
        (WORDS.encode("utf-8-sig"), "UTF-8", []),
        (b"\xff\xfe" + WORDS.encode("utf-16-le"), "UTF-16", []),
        (b"\xfe\xff" + WORDS.encode("utf-16-be"), "UTF-16", []),
        (WORDS.encode("utf-16-le"), "UTF-16", ["encoding_assumed"]),
        (WORDS.encode("utf-16-be"), "UTF-16", ["encoding_assumed"]),
        (WORDS.encode("windows-1252"), "Windows-1252", ["encoding_assumed"]),
    ],
)
def test_the_encoding_is_found(content, encoding, said):
    found = decode(content)
    assert (found.text, found.encoding, codes(found.cautions)) == (WORDS, encoding, said)


def test_a_long_utf_8_text_with_one_broken_letter_stays_utf_8():
    found = decode(WORDS.encode() * 20 + b"\xc3")
    assert found.encoding == "UTF-8"
    assert codes(found.cautions) == ["unreadable_characters"]
    assert "Élodie" in found.text


def test_nul_bytes_are_taken_out_and_counted():
    found = decode(b"a,b\n1\0,2\0\n")
    assert found.text == "a,b\n1,2\n"
    assert found.cautions[0].parameters == {"n": 2}


def test_what_is_not_text_is_refused():
    with pytest.raises(Refusal) as refused:
        decode(bytes(range(1, 32)) * 20)
    assert refused.value.code == "not_text"


@pytest.mark.parametrize("delimiter", [",", ";", "\t", "|"])
def test_the_delimiter_is_found_though_cells_hold_the_others(delimiter):
    others = [mark for mark in ",;|" if mark != delimiter]
    rows = [["Name", "Weight", "Notes"]] + [
        [f"P{i}", "52,5", f"a{others[0]}b {others[1]} c"] for i in range(9)
    ]
    text = io.StringIO()
    csv.writer(text, delimiter=delimiter).writerows(rows)
    how = how_divided(text.getvalue())
    assert how.delimiter == delimiter
    assert [row for _, chunk in read_rows(text.getvalue(), how) for row in chunk] == rows


def test_lines_are_those_of_the_file_though_cells_run_over_several():
    text = 'a,b\r\n1,"two\r\nlines"\r\n2,x\r\n\r\n3,y\r\n'
    lines = [line for chunk, _ in read_rows(text, how_divided(text)) for line in chunk]
    assert lines == [1, 2, 4, 5, 6]


def test_a_quotation_mark_never_closed_swallows_no_rows():
    text = 'a,b\n1,"x\n' + "".join(f"{i},y\n" for i in range(300))
    how = how_divided(text)
    assert how.cautions[0].parameters == {"line": 2}
    assert sum(len(rows) for _, rows in read_rows(text, how)) == 302


@settings(deadline=None)
@given(
    st.lists(
        st.lists(
            st.text(st.characters(exclude_characters="\0\x85", exclude_categories=["Cs", "Cc"])),
            min_size=3,
            max_size=3,
        ),
        min_size=1,
        max_size=8,
    )
)
def test_whatever_is_written_with_commas_is_read_back(cells):
    rows = [["first", "second", "third"], *[[f"x{cell}".strip() for cell in row] for row in cells]] * 3
    text = io.StringIO()
    csv.writer(text, quoting=csv.QUOTE_ALL).writerows(rows)
    assert [
        row for _, chunk in read_rows(text.getvalue(), how_divided(text.getvalue())) for row in chunk
    ] == rows


def columns(text, **how):
    table = open_source(text.encode(), **how).table
    return {column.heading: [column.texts[code] for code in column.codes] for column in table.columns}


def test_headings_are_found_below_a_preamble():
    text = (
        "Clinic of nowhere\nPrinted for a meeting\n\nNo,Zone,Seen\n1,North,2020-01-01\n2,South,2020-01-02\n"
    )
    source = open_source(text.encode())
    assert source.table.heading_line == 4
    assert source.table.line.tolist() == [5, 6]
    assert columns(text)["Zone"] == ["North", "South"]


def test_headings_stand_where_the_person_says():
    text = "No,Zone\n1,North\nNr,Place\n2,South\n"
    assert columns(text, heading_line=3) == {"Nr": ["2"], "Place": ["South"]}
    unnamed = open_source(text.encode(), heading_line=0).table
    assert [column.heading for column in unnamed.columns] == ["", ""]
    assert len(unnamed) == 4
    with pytest.raises(Refusal) as refused:
        open_source(text.encode(), heading_line=9)
    assert (refused.value.code, refused.value.field) == ("no_such_line", "header_line")


def test_a_column_that_begins_late_has_blank_cells_before():
    text = (
        "a,b\n" + "".join(f"{i},x\n" for i in range(6_000)) + "".join(f"{i},x,late\n" for i in range(9_000))
    )
    table = open_source(text.encode()).table
    assert len(table.columns) == 3
    last = table.columns[2]
    assert np.count_nonzero(last.codes == 0) == 6_000
    assert {len(column.codes) for column in table.columns} == {15_000}


def test_rows_that_are_no_patients_are_noted_and_counted():
    text = "No,Zone,Age\n1,North,4\nNo,Zone,Age\nTotal,,4\n2,South,5\nTotal loss,North,6\n"
    table = open_source(text.encode()).table
    assert table.not_patients == {1: ("repeated_heading", {}), 2: ("subtotal_row", {})}
    assert len(table) == 5


def test_progress_is_reported_to_the_end():
    said = []
    text = "a,b\n" + "1,2\n" * 12_000
    open_source(text.encode(), report=lambda *parts: said.append(parts))
    assert said[-1] == ("reading", 12_001, 12_001)
    assert len(said) == 3


@pytest.mark.parametrize("content", [b"", b"\xef\xbb\xbf", b"\r\n\r\n", b",,,\n,,,\n", b"\xff\xfe"])
def test_a_file_with_nothing_in_it_is_refused_as_empty(content):
    with pytest.raises(Refusal) as refused:
        open_source(content)
    assert refused.value.code == "empty_file"


def test_a_file_beyond_the_cap_is_refused_before_it_is_read():
    with pytest.raises(Refusal) as refused:
        open_source(b"x" * (MOST_BYTES + 1))
    assert refused.value.code == "file_too_large"
    assert refused.value.parameters == {"bytes": MOST_BYTES + 1, "most": MOST_BYTES}


def test_too_many_columns_are_refused():
    with pytest.raises(Refusal) as refused:
        open_source((",".join("abc" for _ in range(2_001)) + "\n").encode() * 2)
    assert refused.value.code == "too_many_columns"


def test_the_fingerprint_is_the_sha_256_of_the_bytes():
    # Of "a,b\n1,2\n", by the sha256sum of GNU coreutils.
    assert open_source(b"a,b\n1,2\n").fingerprint == (
        "492d5ea496056f1a6a6592241032fab764c321596317930b4fa0e1e8bc3b7470"
    )


def test_spellings_that_look_alike_are_the_same():
    assert same(" Under\u00a0 CARE\u200b") == same("under care") == "under care"
    assert same("Ｄｉｅｄ") == "died"
    assert same("É") == same("E\u0301") == "é"
    assert same("\u200b \u00a0") == ""
    assert bare("Décédé (RHD).") == "decede rhd"


def test_what_is_shown_keeps_letters_and_loses_controls():
    assert shown("  Under \t care\x07 ") == "Under care"
    assert shown("\ufeffÉ\u200b") == "É"
    assert len(excerpt("x" * 500)) == 80
