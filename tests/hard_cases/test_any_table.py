"""Whatever the table or the bytes: an answer that accounts for every row, or a refusal with a code."""

from __future__ import annotations

import csv
import io
import string
from typing import Any

from hard_reading import read_as_proposed
from hypothesis import HealthCheck, given, settings
from hypothesis import strategies as st
from make import archive, parts_of, workbook

dates = st.one_of(
    st.dates().map(lambda day: day.isoformat()),
    st.dates().map(lambda day: f"{day.day:02}/{day.month:02}/{day.year}"),
    st.dates().map(lambda day: f"{day.month}/{day.day}/{day.year % 100:02}"),
    st.sampled_from(["", "31/02/2019", "2019", "05/2019", "n/a", "00/00/0000", "43831", "9999-99-99"]),
)
outcomes = st.sampled_from(["Under care", "Died RHD", "lost", "Moved", "", "?", "1", "Décédé"])
anything = st.text(max_size=12)
cells = st.one_of(dates, outcomes, anything, st.integers().map(str), st.floats().map(str))
headings = st.one_of(
    st.sampled_from(["Reg no", "Diagnosed", "First seen here", "Last contact", "Date of death", "Status"]),
    st.sampled_from(["Sex", "Age", "Date of birth", "Zone", "Total", ""]),
    anything,
)
tables = st.integers(1, 7).flatmap(
    lambda width: st.tuples(
        st.lists(headings, min_size=width, max_size=width),
        st.lists(st.lists(cells, min_size=0, max_size=width + 1), max_size=12),
    )
)
registers = st.lists(st.tuples(anything, dates, dates, dates, outcomes, cells), min_size=1, max_size=25)
slowly = settings(deadline=None, max_examples=150, suppress_health_check=[HealthCheck.too_slow])


def accounts_for_all(found: dict[str, Any]) -> None:
    refusal = found.get("refusal") or found.get("build_refusal")
    if refusal:
        assert set(refusal) <= set(string.ascii_lowercase + string.digits + "_")
        return
    assert found["n"] + sum(found["set_aside"].values()) == found["rows"]


@slowly
@given(tables, st.sampled_from(",;\t|"), st.sampled_from(["utf-8", "utf-8-sig", "utf-16", "cp1252"]))
def test_any_table_is_read_or_refused(
    table: tuple[list[str], list[list[str]]], delimiter: str, encoding: str
) -> None:
    text = io.StringIO()
    csv.writer(text, delimiter=delimiter).writerows([table[0], *table[1]])
    content = text.getvalue().encode(encoding, errors="replace")
    accounts_for_all(read_as_proposed("any", content))


@slowly
@given(registers)
def test_any_register_keeps_or_sets_aside_every_row(rows: list[tuple[str, ...]]) -> None:
    text = io.StringIO()
    writer = csv.writer(text)
    writer.writerow(["Reg no", "Diagnosed", "First seen here", "Last contact", "Status", "Zone"])
    writer.writerows(rows)
    accounts_for_all(read_as_proposed("any", text.getvalue().encode("utf-8", errors="replace")))


@slowly
@given(st.binary(max_size=400))
def test_any_bytes_are_read_or_refused(content: bytes) -> None:
    accounts_for_all(read_as_proposed("any", content))


WORKBOOK = workbook()
PARTS = parts_of(WORKBOOK)


@slowly
@given(st.lists(st.tuples(st.integers(0, len(WORKBOOK) - 1), st.integers(0, 255)), min_size=1, max_size=8))
def test_a_workbook_with_damaged_bytes_is_read_or_refused(damage: list[tuple[int, int]]) -> None:
    content = bytearray(WORKBOOK)
    for place, byte in damage:
        content[place] = byte
    accounts_for_all(read_as_proposed("any", bytes(content)))


@slowly
@given(st.integers(0, len(WORKBOOK)))
def test_a_workbook_cut_off_anywhere_is_read_or_refused(length: int) -> None:
    accounts_for_all(read_as_proposed("any", WORKBOOK[:length]))


@slowly
@given(
    st.sampled_from(sorted(PARTS)),
    st.floats(0, 1, exclude_max=True),
    st.integers(0, 40),
    st.sampled_from([b"", b"<", b">", b'"', b"9" * 12, b"<c>", b"</row>", b"-", b"\xff", b"&#x0;"]),
)
def test_a_workbook_with_a_damaged_part_is_read_or_refused(
    part: str, where: float, cut: int, put: bytes
) -> None:
    content = PARTS[part]
    place = int(where * len(content))
    damaged = content[:place] + put + content[place + cut :]
    accounts_for_all(read_as_proposed("any", archive(PARTS | {part: damaged})))
