"""Dates: what a text says by itself, what a column settles, and what is asked or refused."""

from __future__ import annotations

import datetime

import numpy as np
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from vitalroll.register.dates import Fault, Form, last_written_year, parse_dates, read_dates, settle


def read(texts, order="day_month_year", last_year=2030, **how):
    """Return ISO dates, or the name of the fault."""
    found = read_dates(parse_dates(texts), order, last_year=last_year, **how)
    return [
        datetime.date.fromordinal(int(day)).isoformat() if fault == Fault.NONE else Fault(fault).name
        for day, fault in zip(found.day, found.fault, strict=True)
    ]


def settled(texts, weights=None, **how):
    weights = np.ones(len(texts), dtype=int) if weights is None else np.array(weights)
    return settle(parse_dates(texts), weights, **how)


@pytest.mark.parametrize(
    ("text", "iso"),
    [
        ("2018-03-07", "2018-03-07"),
        ("2018/3/7", "2018-03-07"),
        ("20180307", "2018-03-07"),
        ("2018-03-07T14:30:00Z", "2018-03-07"),
        ("2018-03-07 14:30:05.250", "2018-03-07"),
        ("7 Mar 2018", "2018-03-07"),
        ("7-Mar-18", "2018-03-07"),
        ("7th of March, 2018", "2018-03-07"),
        ("Wed 7 March 2018", "2018-03-07"),
        ("March 7, 2018", "2018-03-07"),
        ("7 mars 2018", "2018-03-07"),
        ("1er août 2018", "2018-08-01"),
        ("7 déc. 2018", "2018-12-07"),
        ("mercredi 7 FÉVRIER 2018", "2018-02-07"),
        ("7 de marzo de 2018", "2018-03-07"),
        ("2018 March 7", "2018-03-07"),
        ("2020-02-29", "2020-02-29"),
        ("2019-02-29", "IMPOSSIBLE"),
        ("30 Feb 2019", "IMPOSSIBLE"),
    ],
)
def test_these_texts_are_dates_whatever_the_order(text, iso):
    for order in ("day_month_year", "month_day_year"):
        assert read([text], order) == [iso]


@pytest.mark.parametrize(
    ("text", "day_first", "month_first"),
    [
        ("03/07/2018", "2018-07-03", "2018-03-07"),
        ("3.7.2018", "2018-07-03", "2018-03-07"),
        ("3-7-18", "2018-07-03", "2018-03-07"),
        (" 03 / 07 / 2018 ", "2018-07-03", "2018-03-07"),
        ("03072018", "2018-07-03", "2018-03-07"),
        ("٠٣/٠٧/٢٠١٨", "2018-07-03", "2018-03-07"),
        ("３/７/２０１８", "2018-07-03", "2018-03-07"),
        ("\u200e03/07/2018\u00a0", "2018-07-03", "2018-03-07"),
        ("03/07/2018 08:15", "2018-07-03", "2018-03-07"),
        ("25/07/2018", "2018-07-25", "IMPOSSIBLE"),
        ("07/25/2018", "IMPOSSIBLE", "2018-07-25"),
        ("31/04/2018", "IMPOSSIBLE", "IMPOSSIBLE"),
    ],
)
def test_bare_numbers_are_read_in_the_order_of_their_column(text, day_first, month_first):
    assert read([text], "day_month_year") == [day_first]
    assert read([text], "month_day_year") == [month_first]


@pytest.mark.parametrize(
    "text", ["2018", "03/2018", "2018-03", "Mar 2018", "mars 2018", "00/03/2018", "xx/03/2018", "??/??/2018"]
)
def test_a_month_or_a_year_alone_is_a_partial_date(text):
    assert read([text]) == ["PARTIAL"]


@pytest.mark.parametrize(
    "text", ["not known", "n/a", "12", "123456", "1.5", "Mild", "12/2", "7 Foo 2018", "-"]
)
def test_what_is_no_date_is_not_read_as_one(text):
    assert read([text]) == ["UNREADABLE"]


@pytest.mark.parametrize("text", ["", " ", "\u00a0", "\u200b", "\t"])
def test_a_cell_with_nothing_to_see_is_blank(text):
    assert read([text]) == ["BLANK"]


def test_a_part_above_12_settles_the_whole_column():
    assert settled(["03/07/2018", "25/07/2018"]).order == "day_month_year"
    found = settled(["03/07/2018", "07/25/2018", "01/02/2018"], weights=[1, 3, 1])
    assert (found.order, found.settled, found.for_order) == ("month_day_year", True, 3)


@pytest.mark.parametrize("day", [13, 31])
def test_every_day_above_12_is_evidence(day):
    assert settled(["03/07/2018", f"{day}/07/2018"]).settled
    assert settled(["03/07/2018", f"07/{day}/2018"]).order == "month_day_year"


def test_a_column_that_nothing_settles_is_asked_about():
    found = settled(["03/07/2018", "04/05/2019"])
    assert not found.settled
    assert found.choices == ("day_month_year", "month_day_year")


def test_the_order_of_other_columns_is_proposed_but_still_asked_about():
    found = settled(["03/07/2018"], usual="month_day_year")
    assert (found.order, found.settled) == ("month_day_year", False)


def test_dates_that_read_alike_either_way_need_no_question():
    assert settled(["05/05/2018", "07/07/2019"]).settled


def test_contradicting_evidence_is_asked_about_unless_it_is_a_twentieth():
    texts = ["25/07/2018", "07/25/2018"]
    assert not settled(texts, weights=[19, 1]).settled
    found = settled(texts, weights=[20, 1])
    assert (found.settled, found.order, found.against_order) == (True, "day_month_year", 1)


def test_a_two_digit_year_in_front_is_recognised():
    found = settled(["98-03-07", "99-12-25"])
    assert (found.order, found.settled) == ("year_month_day", True)
    assert read(["98-03-07", "99-12-25"], "year_month_day", 2020) == ["1998-03-07", "1999-12-25"]


@pytest.mark.parametrize(("last_year", "year"), [(2025, 1926), (2026, 2026), (2030, 2026), (1999, 1926)])
def test_a_two_digit_year_is_the_latest_one_not_after_the_last_year(last_year, year):
    assert read(["07/03/26"], last_year=last_year) == [f"{year}-03-07"]


def test_buddhist_years_lose_543():
    found = read_dates(parse_dates(["25/12/2562", "25/12/2019"]), "day_month_year", last_year=2025)
    assert found.buddhist.tolist() == [True, False]
    assert found.day[0] == found.day[1] == datetime.date(2019, 12, 25).toordinal()


def test_years_of_other_calendars_are_not_guessed():
    assert read(["25/12/1440", "25/12/1398"]) == ["IMPOSSIBLE", "IMPOSSIBLE"]


def test_serials_count_from_either_epoch():
    # 43831 is 1 January 2020 counted from 1900; counted from 1904 it is 1462 days later.
    assert read(["43831"], "serial_1900") == ["2020-01-01"]
    assert read(["43831"], "serial_1904") == ["2024-01-02"]
    assert read(["43831.75"], "serial_1900") == ["2020-01-01"]
    assert not settled(["43831", "43900"]).settled
    assert settled(["43831", "43900"], epoch="serial_1904").order == "serial_1904"


def test_a_written_date_among_serials_needs_no_order():
    assert read(["43831", "2020-01-01"], "serial_1900") == ["2020-01-01"] * 2


def test_a_year_at_the_end_cannot_be_read_with_the_year_in_front():
    assert read(["03/07/2018", "03/07/18"], "year_month_day") == ["IMPOSSIBLE", "2003-07-18"]


def test_the_last_year_is_taken_from_years_written_in_full():
    assert last_written_year(parse_dates(["03/07/2018", "3 May 2021", "03/07/25", "25/12/2562"])) == 2021
    assert last_written_year(parse_dates(["03/07/25", ""])) is None


def test_short_texts_of_digits_are_not_taken_for_dates():
    assert parse_dates(["123", "20191399", "99999999"]).form.tolist() == [Form.UNREAD] * 3


written = st.sampled_from(
    ["{d:02}/{m:02}/{y}", "{d}-{m}-{y}", "{d}.{m}.{y}", "{y}-{m:02}-{d:02}", "{d} {name} {y}"]
)
NAMES = ["Jan", "Feb", "Mar", "Apr", "May", "Jun", "Jul", "Aug", "Sep", "Oct", "Nov", "Dec"]


@settings(deadline=None)
@given(st.dates(datetime.date(1850, 1, 1), datetime.date(2200, 12, 31)), written)
def test_every_day_written_in_any_style_comes_back(day, style):
    text = style.format(d=day.day, m=day.month, y=day.year, name=NAMES[day.month - 1])
    assert read([text]) == [day.isoformat()]


@settings(deadline=None)
@given(st.lists(st.text(max_size=30), max_size=20), st.sampled_from(["day_month_year", "month_day_year"]))
def test_no_text_breaks_the_reading(texts, order):
    found = read_dates(parse_dates(texts), order, last_year=2025)
    assert len(found.day) == len(texts)
    given_days = found.day[found.fault == Fault.NONE]
    assert np.all(given_days >= datetime.date(1850, 1, 1).toordinal())
