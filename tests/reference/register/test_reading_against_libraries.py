"""Reading against pandas and openpyxl, on the same files, where they agree on what a cell is."""

from __future__ import annotations

import io
from datetime import date

import numpy as np
import pandas as pd
import pytest
from openpyxl import Workbook

from demo_register import demo_register
from vitalroll.desk import Desk

FIRST_LINE = 3
"""The demo has a line of preamble and a blank one above its headings."""


def opened(name: str, content: bytes) -> tuple[Desk, dict]:
    desk = Desk()
    said = desk.answer("register.open", {"name": name, "content": content})
    assert "answer" in said, said
    return desk, said["answer"]


def as_pandas() -> pd.DataFrame:
    text = demo_register()
    frame = pd.read_csv(io.StringIO(text), skiprows=FIRST_LINE - 1, dtype=str, keep_default_na=False)
    return frame[(frame["Reg no"] != "Reg no") & (frame["Reg no"] != "Total") & (frame["Reg no"] != "")]


def test_values_of_the_demo_against_pandas():
    """Counts of every status, after the spaces that a person cannot see are taken as one."""
    frame = as_pandas()
    desk, source = opened("demo.csv", demo_register().encode())
    assert [column["heading"] for column in source["columns"]] == list(frame.columns)
    status = next(column["id"] for column in source["columns"] if column["heading"] == "Status")
    said = desk.answer("register.values", {"column": status})["answer"]
    ours = {value["value"].casefold(): value["count"] for value in said["values"]}
    plain = frame["Status"].str.split().str.join(" ").str.casefold()
    theirs = plain[plain != ""].value_counts().to_dict()
    assert ours == theirs
    assert said["blank"] == int((plain == "").sum())


@pytest.mark.parametrize("style", ["%d/%m/%Y", "%Y-%m-%d", "%d.%m.%Y", "%d %b %Y"])
def test_dates_against_pandas(style):
    """Every day of two years, written one way, gives the same person-time as pandas' own reading."""
    starts = pd.date_range("2019-01-01", "2020-12-31")
    ends = starts + pd.to_timedelta(np.arange(len(starts)) % 400, unit="D")
    lines = ["Number,Diagnosed,Last contact,Status"]
    pairs = zip(starts.strftime(style), ends.strftime(style), strict=True)
    lines += [f"{i},{start},{end},{'Died' if i % 3 else 'Lost'}" for i, (start, end) in enumerate(pairs)]
    desk, source = opened("days.csv", "\n".join(lines).encode())
    roles = {column["id"]: column["role"] for column in source["columns"]}
    request = {
        "roles": roles,
        "meanings": {"Died": "died_cause_unknown", "Lost": "lost"},
        "closing_date": "2022-12-31",
    }
    said = desk.answer("register.build", request)["answer"]
    read = pd.to_datetime(ends.strftime(style), format=style) - pd.to_datetime(
        starts.strftime(style), format=style
    )
    assert said["n"] == len(starts)
    assert said["person_years"] == pytest.approx(read.days.to_numpy().sum() / 365.25, abs=1e-9)


def test_a_workbook_by_openpyxl_reads_like_the_same_list_as_text():
    """Dates by cell type, numbers and text, written by openpyxl."""
    rows = [
        ("P1", date(2019, 3, 14), date(2021, 1, 5), "Died", 12.5),
        ("P2", date(2019, 12, 1), date(2024, 2, 29), "Lost", 40),
        ("P3", date(2020, 2, 29), date(2020, 3, 1), "Died", 7),
    ]
    headings = ("Patient number", "Diagnosed", "Last contact", "Status", "Age")
    book = Workbook()
    for row in (headings, *rows):
        book.active.append(row)
    packed = io.BytesIO()
    book.save(packed)
    text = "\n".join(",".join(str(cell) for cell in row) for row in (headings, *rows))
    built = []
    for name, content in (("list.xlsx", packed.getvalue()), ("list.csv", text.encode())):
        desk, source = opened(name, content)
        roles = {column["id"]: column["role"] for column in source["columns"]}
        assert list(roles.values()) == ["patient_number", "start", "end", "outcome", "age"]
        meanings = {"Died": "died_of_disease", "Lost": "lost"}
        request = {"roles": roles, "meanings": meanings, "closing_date": "2024-12-31"}
        built.append(desk.answer("register.build", request)["answer"])
    assert built[0] == built[1]
    assert built[0]["n"] == 3
