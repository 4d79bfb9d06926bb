"""Reading compared with pandas and openpyxl on the same bytes, where the two mean the same.

They agree on files that are well formed: the same cells, the same dates, the same numbers. Where
pandas guesses (it would turn "NA" into a missing number, or take "03/04/2018" as month first) there
is nothing to compare.
"""

from __future__ import annotations

import datetime
import io

import numpy as np
import openpyxl
import pandas as pd
import pytest

from vitalroll.register.dates import Fault, parse_dates, read_dates
from vitalroll.register.numbers_read import parse_numbers
from vitalroll.register.source import open_source

ROWS = 3_000


@pytest.fixture(scope="module")
def frame() -> pd.DataFrame:
    random = np.random.default_rng(11)
    days = pd.Timestamp("2010-01-01") + pd.to_timedelta(random.integers(0, 5_000, ROWS), unit="D")
    text = np.array(["plain", "with, comma", 'with "marks"', "two\nlines", "é ü ß 女", "", "semi;colon"])
    return pd.DataFrame(
        {
            "No": [f"P{i:05}" for i in range(ROWS)],
            "Seen": days,
            "Weight": np.round(random.normal(60, 12, ROWS), 2),
            "Visits": random.integers(0, 5_000, ROWS),
            "Note": random.choice(text, ROWS),
        }
    )


def cells(content: bytes, **how: object) -> pd.DataFrame:
    table = open_source(content, **how).table
    return pd.DataFrame(
        {column.heading: np.array(column.texts, dtype=object)[column.codes] for column in table.columns}
    )


@pytest.mark.parametrize("delimiter", [",", ";", "\t", "|"])
@pytest.mark.parametrize("encoding", ["utf-8", "utf-8-sig", "utf-16"])
def test_the_same_cells_as_pandas_from_text(frame: pd.DataFrame, delimiter: str, encoding: str) -> None:
    content = frame.to_csv(index=False, sep=delimiter, date_format="%d/%m/%Y").encode(encoding)
    ours = cells(content)
    theirs = pd.read_csv(
        io.BytesIO(content), sep=delimiter, encoding=encoding, dtype=str, keep_default_na=False
    )
    assert ours.to_dict("list") == theirs.to_dict("list")


def test_the_same_cells_as_openpyxl_and_pandas_from_a_workbook(frame: pd.DataFrame) -> None:
    packed = io.BytesIO()
    frame.to_excel(packed, index=False)
    ours = cells(packed.getvalue())
    theirs = pd.read_excel(io.BytesIO(packed.getvalue()))
    assert ours["Seen"].tolist() == theirs["Seen"].dt.strftime("%Y-%m-%d").tolist()
    assert ours["Weight"].astype(float).tolist() == theirs["Weight"].tolist()
    assert ours["Visits"].astype(int).tolist() == theirs["Visits"].tolist()
    assert ours["Note"].tolist() == theirs["Note"].fillna("").tolist()
    sheet = openpyxl.load_workbook(io.BytesIO(packed.getvalue())).active
    assert ours["No"].tolist() == [row[0].value for row in sheet.iter_rows(min_row=2)]


@pytest.mark.parametrize(
    ("order", "style"),
    [
        ("day_month_year", "%d/%m/%Y"),
        ("day_month_year", "%d.%m.%y"),
        ("month_day_year", "%m/%d/%Y"),
        ("month_day_year", "%m-%d-%y"),
        ("year_month_day", "%Y-%m-%d"),
        ("year_month_day", "%Y/%m/%d %H:%M:%S"),
        ("day_month_year", "%d %B %Y"),
        ("day_month_year", "%a %d %b %Y"),
        ("month_day_year", "%b %d, %Y"),
    ],
)
def test_the_same_days_as_pandas_in_every_style(frame: pd.DataFrame, order: str, style: str) -> None:
    texts = frame["Seen"].dt.strftime(style).tolist()
    found = read_dates(parse_dates(texts), order, last_year=2030)
    assert set(found.fault.tolist()) == {int(Fault.NONE)}
    theirs = pd.to_datetime(pd.Series(texts), format=style)
    assert found.day.tolist() == [day.toordinal() for day in theirs]


def test_serials_are_the_days_that_openpyxl_counts() -> None:
    serials = list(range(10_000, 60_000, 7))
    for order, epoch in (
        ("serial_1900", openpyxl.utils.datetime.WINDOWS_EPOCH),
        ("serial_1904", openpyxl.utils.datetime.MAC_EPOCH),
    ):
        found = read_dates(parse_dates([str(serial) for serial in serials]), order, last_year=2030)
        theirs = [openpyxl.utils.datetime.from_excel(serial, epoch) for serial in serials]
        assert found.day.tolist() == [day.date().toordinal() for day in theirs]


def test_every_day_of_four_centuries_is_the_day_of_the_standard_library() -> None:
    first, last = datetime.date(1850, 1, 1).toordinal(), datetime.date(2200, 12, 31).toordinal()
    days = [datetime.date.fromordinal(day) for day in range(first, last + 1)]
    found = read_dates(parse_dates([day.isoformat() for day in days]), "day_month_year", last_year=2030)
    assert found.day.tolist() == list(range(first, last + 1))


@pytest.mark.parametrize(("decimal", "thousands"), [(".", ","), (",", "."), (",", " "), (".", "'")])
def test_the_same_numbers_as_pandas_with_any_marks(frame: pd.DataFrame, decimal: str, thousands: str) -> None:
    swap = str.maketrans({",": thousands, ".": decimal})
    texts = [format(weight * 1000, ",.2f").translate(swap) for weight in frame["Weight"]]
    theirs = pd.read_csv(
        io.StringIO("w\n" + "\n".join(f'"{text}"' for text in texts)), decimal=decimal, thousands=thousands
    )["w"]
    assert parse_numbers(texts).value.tolist() == theirs.tolist()
