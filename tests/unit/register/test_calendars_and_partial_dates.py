"""Other calendars are converted exactly or refused by name; partial dates follow a stated rule."""

from __future__ import annotations

from datetime import date
from pathlib import Path

import numpy as np
import pytest
from register_cases import CLOSING, MEANINGS, ROLES, built, opened, row

from vitalroll.desk import Desk
from vitalroll.errors import Refusal
from vitalroll.register.calendars import ethiopian_days
from vitalroll.register.dates import Fault, parse_dates, read_dates
from vitalroll.register.findings.mending import find, look
from vitalroll.register.plan import Choices, Plan

PAIRS = [
    # Ethiopian date, Gregorian date: New Year's days and feasts as calendars print them (from memory).
    ((2000, 1, 1), date(2007, 9, 12)),  # the Ethiopian millennium
    ((2012, 1, 1), date(2019, 9, 12)),  # the year after a leap day
    ((2015, 1, 1), date(2022, 9, 11)),
    ((2016, 1, 1), date(2023, 9, 12)),
    ((2015, 4, 29), date(2023, 1, 7)),  # Genna, Christmas
    ((2016, 5, 11), date(2024, 1, 20)),  # Timkat after a leap year
    ((2011, 13, 6), date(2019, 9, 11)),  # the sixth day of Pagume
]


@pytest.mark.parametrize(("ethiopian", "gregorian"), PAIRS)
def test_ethiopian_dates_of_printed_calendars(ethiopian, gregorian):
    ordinal, there_is = ethiopian_days(*(np.array([part]) for part in ethiopian))
    assert there_is.all()
    assert date.fromordinal(int(ordinal[0])) == gregorian


def test_every_ethiopian_day_of_two_centuries_follows_the_one_before():
    """The slow way: count days one by one through months of 30 and a thirteenth of 5 or 6."""
    ordinal = date(1907, 9, 12).toordinal()  # 1 Meskerem 1900
    for year in range(1900, 2100):
        for month in range(1, 14):
            length = 30 if month < 13 else (6 if year % 4 == 3 else 5)
            days = np.arange(1, length + 1)
            found, there_is = ethiopian_days(np.full(length, year), np.full(length, month), days)
            assert there_is.all()
            assert found.tolist() == list(range(ordinal, ordinal + length))
            ordinal += length
            beyond = ethiopian_days(np.array([year]), np.array([month]), np.array([length + 1]))[1]
            assert not beyond.any()


def test_two_digit_ethiopian_years_are_not_after_the_ethiopian_year_of_closing():
    texts = parse_dates(["01/01/12", "01/01/13", "29/12/99"])
    read = read_dates(texts, "day_month_year", last_year=2019, calendar="ethiopian")
    # 2019 less 7 is 2012, so that 13 is 1913 and 99 is 1999.
    assert [date.fromordinal(day).isoformat() for day in read.day.tolist()] == [
        "2019-09-12", "1920-09-11", "2007-09-04",
    ]  # fmt: skip


def test_an_ethiopian_column_is_read_beside_a_gregorian_one():
    text = row("1", start="05/13/2008", last="2019-01-01")
    found = built(text, calendars={"c1": "ethiopian"})
    # 5 Pagume 2008 is 10 September 2016.
    assert date.fromordinal(int(found.cohort.start[0])) == date(2016, 9, 10)


@pytest.mark.parametrize("calendar", ["persian", "hijri", "bikram_sambat"])
def test_calendars_that_need_tables_are_refused_by_name(calendar):
    with pytest.raises(Refusal) as refused:
        built(row(), calendars={"c1": calendar})
    assert (refused.value.code, refused.value.field) == ("calendar_not_converted", "calendars.c1")
    assert refused.value.parameters["calendar"] == calendar
    assert refused.value.parameters["heading"] == "Diagnosed"


def test_a_calendar_that_does_not_exist_is_refused():
    with pytest.raises(Refusal) as refused:
        built(row(), calendars={"c1": "lunar"})
    assert (refused.value.code, refused.value.field) == ("not_one_of", "calendars.c1")


@pytest.mark.parametrize("zero", "٠۰०০๐០၀０")
def test_digits_of_other_scripts_are_digits(zero):
    """Arabic, Persian, Devanagari, Bengali, Thai, Khmer, Burmese and full-width."""
    digits = str.maketrans({str(i): chr(ord(zero) + i) for i in range(10)})
    texts = parse_dates(["31/12/2019".translate(digits), "2019-12-31".translate(digits)])
    read = read_dates(texts, "day_month_year", last_year=2020)
    assert read.fault.tolist() == [Fault.NONE, Fault.NONE]
    assert {date.fromordinal(day).isoformat() for day in read.day.tolist()} == {"2019-12-31"}
    ages = built(row("1", age="47".translate(digits)), row("2", age="8".translate(digits)))
    assert ages.cohort.covariates["age"].values.tolist() == [47, 8]


PARTIAL = [
    # what is written for the last contact, the day the rule takes, its first and its last day
    ("06/2019", "2019-06-15", "2019-06-01", "2019-06-30"),
    ("2019-06", "2019-06-15", "2019-06-01", "2019-06-30"),
    ("June 2019", "2019-06-15", "2019-06-01", "2019-06-30"),
    ("juin 2019", "2019-06-15", "2019-06-01", "2019-06-30"),
    ("??/06/2019", "2019-06-15", "2019-06-01", "2019-06-30"),
    ("00/06/2019", "2019-06-15", "2019-06-01", "2019-06-30"),
    ("2019-06-00", "2019-06-15", "2019-06-01", "2019-06-30"),
    ("13/??/2019", "2019-07-01", "2019-01-01", "2019-12-31"),
    ("2019", "2019-07-01", "2019-01-01", "2019-12-31"),
    ("2562", "2019-07-01", "2019-01-01", "2019-12-31"),
    # not before the start (1 January 2018 is the start; here 10 March 2019) nor after closing
    ("03/2019", "2019-03-20", "2019-03-20", "2019-03-31"),
    ("2020", "2020-07-01", "2020-01-01", "2020-12-31"),
    ("2021", None, None, None),
]


@pytest.mark.parametrize(("written", "middle", "first", "last"), PARTIAL)
def test_the_rule_for_partial_dates(written, middle, first, last):
    start = "2019-03-20" if written == "03/2019" else "2018-01-01"
    rows = [row("1", start=start, last=written, status="lost"), row("2"), row("3", last="2019-02-14")]
    desk = Desk()
    headings = "No,Diagnosed,Here,Last,Status,Born,Sex,Age,Zone"
    content = "\n".join([headings, *(",".join(cells) for cells in rows)]).encode()
    assert "answer" in desk.answer("register.open", {"name": "x.csv", "content": content})
    request = {"roles": ROLES, "meanings": MEANINGS, "closing_date": CLOSING.isoformat()}
    answer = desk.answer("register.findings", request)["answer"]
    (found,) = [each for each in answer["findings"] if each["code"] == "partial_date"]
    assert found["lines"] == [2]
    kinds = [each["kind"] for each in found["repair"]["alternatives"]]
    assert kinds == ["first_of_period", "last_of_period"]
    (change,) = found["repair"]["listed"][0]["changes"]
    if middle is None:
        # The whole year is after closing: the date is what it is, and the row ends under care on closing.
        assert change["after"] == "2021-07-01"
        return
    assert change["after"] == middle
    made = built(*rows, repairs={"partial_date": ()})
    assert made.cohort.line.tolist() == [2, 3, 4]
    seen = look(Plan(opened(content.decode()), Choices(roles=ROLES, meanings=MEANINGS, closing_date=CLOSING)))
    (finding,) = find(seen, ["partial_date"])
    days = [int(other.changes[0].values[0]) for other in finding.alternatives]
    assert [date.fromordinal(day).isoformat() for day in days] == [first, last]


def test_how_much_the_rule_matters_is_shown_by_its_alternatives():
    """A death in "2019" of two patients: late enough in the year it comes after the other has left."""
    rows = [
        row("1", start="2018-01-01", last="2019", status="died"),
        row("2", start="2018-01-01", last="2019-03-01", status="lost"),
    ]
    desk = Desk()
    headings = "No,Diagnosed,Here,Last,Status,Born,Sex,Age,Zone"
    content = "\n".join([headings, *(",".join(cells) for cells in rows)]).encode()
    assert "answer" in desk.answer("register.open", {"name": "x.csv", "content": content})
    request = {"roles": ROLES, "meanings": MEANINGS, "closing_date": CLOSING.isoformat()}
    answer = desk.answer("register.findings", request)["answer"]
    repair = next(each["repair"] for each in answer["findings"] if each["code"] == "partial_date")
    assert (repair["without"]["n"], repair["with"]["n"]) == (1, 2)
    first, last = (each["headline"] for each in repair["alternatives"])
    assert (first["n"], first["events"], last["n"], last["events"]) == (2, 1, 2, 1)


def test_the_ethiopian_hard_file_tells_the_same_as_its_gregorian_twin():
    """Its dates were converted by the slow calendar's inverse; the twin is the file without any fault."""
    hard = Path(__file__).parents[2] / "hard_cases"
    made = []
    for name, calendars in (
        ("files/ethiopian_dates.csv", dict.fromkeys(("c2", "c5", "c6", "c7"), "ethiopian")),
        ("faults/nothing_wrong.csv", {}),
    ):
        desk = Desk()
        opened_file = desk.answer("register.open", {"name": name, "content": (hard / name).read_bytes()})
        source = opened_file["answer"]
        request = {
            "roles": {column["id"]: column["role"] for column in source["columns"]},
            "meanings": {
                "Under care": "under_care", "Died - RHD": "died_of_disease", "Lost": "lost",
                "Transferred out": "moved_away", "Recovered": "recovered",
            },
            "sexes": {"F": "female", "M": "male"},
            "closing_date": "2025-06-30",
            "calendars": calendars,
        }  # fmt: skip
        made.append((request, desk.answer("register.build", request)["answer"]))
    ethiopian, gregorian = (answer for _, answer in made)
    # Line 9 ends on 3 Pagume 2016 there (8 September 2024) and on 20 June 2025 in its twin: 285 days.
    assert gregorian["person_years"] - ethiopian["person_years"] == pytest.approx(285 / 365.25)
    for name in ("n", "outcomes", "first_start", "last_start", "set_aside_counts"):
        assert ethiopian[name] == gregorian[name]
    assert ethiopian["last_exit"] == gregorian["last_exit"] == "2025-06-26"
