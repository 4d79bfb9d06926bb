"""The tasks of the place Register, through the desk and in plain data."""

from __future__ import annotations

import json

import pytest

from vitalroll.desk import Desk

TEXT = (
    "Reg no,Sex,Diagnosed,Last contact,Status,Zone\n"
    "1,F,14/03/2016,20/05/2020,Under care,North\n"
    "2,M,02/07/2016,11/12/2018,Died RHD,South\n"
    "3,F,25/01/2017,30/06/2019,lost,North\n"
    "4,M,,30/06/2019,LOST,North\n"
    "5,F,25/01/2018,,Under care,\n"
    "Total,5,,,,\n"
)
ROLES = {"c0": "patient_number", "c1": "sex", "c2": "start", "c3": "end", "c4": "outcome", "c5": "group"}
BUILD = {
    "roles": ROLES,
    "meanings": {"Under care": "under_care", "Died RHD": "died_of_disease", "lost": "lost"},
    "sexes": {"F": "female", "M": "male"},
    "closing_date": "2020-12-31",
}


@pytest.fixture
def desk():
    return Desk()


def ask(desk, task, **request):
    said = desk.answer(task, request)
    assert json.loads(json.dumps(said)) == said, "an answer is plain data"
    return said.get("answer") or said["refusal"]


def opened(desk, text=TEXT, **how):
    return ask(desk, "register.open", name="list.csv", content=text.encode(), **how)


def test_open_says_what_the_file_is_and_what_its_columns_seem_to_be(desk):
    found = opened(desk)
    assert (found["name"], found["form"], found["encoding"], found["delimiter"]) == (
        "list.csv", "delimited", "UTF-8", ",",
    )  # fmt: skip
    assert (found["header_line"], found["rows"], found["sheets"], found["sheet"]) == (1, 6, [], None)
    assert {column["id"]: column["role"] for column in found["columns"]} == ROLES
    start = found["columns"][2]
    assert (start["heading"], start["kind"], start["filled"], start["distinct"]) == (
        "Diagnosed",
        "date",
        4,
        4,
    )
    assert start["samples"] == ["14/03/2016", "02/07/2016", "25/01/2017", "25/01/2018"]
    assert start["dates"] == {
        "order": "day_month_year", "settled": True, "choices": ["day_month_year"], "read": 4, "unread": 0,
        "examples": [
            {"text": "14/03/2016", "date_iso": "2016-03-14"},
            {"text": "02/07/2016", "date_iso": "2016-07-02"},
            {"text": "25/01/2017", "date_iso": "2017-01-25"},
        ],
    }  # fmt: skip
    assert found["preview"][0] == {
        "line": 2, "cells": ["1", "F", "14/03/2016", "20/05/2020", "Under care", "North"],
    }  # fmt: skip
    assert [caution["code"] for caution in found["cautions"]] == ["subtotal_rows"]


def test_values_are_listed_with_proposals_the_most_frequent_first(desk):
    opened(desk)
    assert ask(desk, "register.values", column="c4") == {
        "values": [
            {"value": "Under care", "count": 2, "meaning": "under_care", "sex": None, "like": None},
            {"value": "lost", "count": 2, "meaning": "lost", "sex": None, "like": None},
            {"value": "Died RHD", "count": 1, "meaning": "died_of_disease", "sex": None, "like": None},
        ],
        "blank": 0,
        "distinct": 3,
        "cautions": [],
    }
    assert ask(desk, "register.values", column="c5")["blank"] == 1
    assert ask(desk, "register.values", column="c1")["values"][0]["sex"] == "female"


def test_of_very_many_values_the_most_frequent_are_listed(desk):
    opened(desk, "No,Zone\n" + "".join(f"{i},z{i}\n" for i in range(700)) + "x,z5\n")
    found = ask(desk, "register.values", column="c1")
    assert len(found["values"]) == 500
    assert found["values"][0] == {"value": "z5", "count": 2, "meaning": None, "sex": None, "like": None}
    assert found["cautions"] == [
        {"code": "values_not_listed", "parameters": {"listed": 500, "distinct": 700}}
    ]


def test_build_says_what_was_understood(desk):
    opened(desk)
    found = ask(desk, "register.build", **BUILD)
    assert (found["n"], found["rows"]) == (4, 6)
    assert found["outcomes"] == {
        "under_care": 2, "died_of_disease": 1, "died_of_other_cause": 0, "died_cause_unknown": 0,
        "recovered": 0, "moved_away": 0, "lost": 1, "stopped": 0,
    }  # fmt: skip
    days = 1528 + 892 + 886 + 1071
    assert found["person_years"] == pytest.approx(days / 365.25)
    assert (found["first_start"], found["last_start"], found["last_exit"]) == (
        "2016-03-14", "2018-01-25", "2020-12-31",
    )  # fmt: skip
    assert found["set_aside"] == [
        {"line": 5, "code": "no_start_date", "parameters": {}},
        {"line": 7, "code": "subtotal_row", "parameters": {}},
    ]
    assert found["set_aside_counts"] == {"no_start_date": 1, "subtotal_row": 1}
    assert found["changed"] == [{"line": 6, "code": "under_care_to_closing", "parameters": {}}]
    assert (found["kept"], found["dropped"]) == (["c1", "c2", "c3", "c4", "c5"], ["c0"])
    assert found["covariates"][0] == {
        "id": "sex", "heading": None, "kind": "categorical", "missing": 0,
        "levels": [{"level": "female", "n": 3}, {"level": "male", "n": 1}],
        "least": None, "median": None, "greatest": None,
    }  # fmt: skip
    year = next(item for item in found["covariates"] if item["id"] == "start_year")
    assert (year["least"], year["median"], year["greatest"]) == (2016, 2016.5, 2018)
    zone = found["covariates"][-1]
    assert (zone["id"], zone["heading"], zone["missing"]) == ("c5", "Zone", 1)
    assert zone["levels"] == [{"level": "North", "n": 2}, {"level": "South", "n": 1}]


def test_what_was_built_is_what_the_other_tasks_read(desk):
    opened(desk)
    ask(desk, "register.build", **BUILD)
    survival = ask(desk, "outcomes.survival", interest=["died_of_disease"])
    assert survival["curves"][0]["n"] == 4


def test_nothing_is_known_before_opening_and_after_forgetting(desk):
    assert ask(desk, "register.values", column="c0")["code"] == "no_register"
    assert ask(desk, "register.build", **BUILD)["code"] == "no_register"
    opened(desk)
    ask(desk, "register.build", **BUILD)
    assert ask(desk, "register.forget") == {"forgotten": True}
    assert ask(desk, "register.build", **BUILD)["code"] == "no_register"
    assert ask(desk, "outcomes.survival")["code"] == "no_register"


def test_choices_that_are_refused_leave_no_cohort_behind(desk):
    opened(desk)
    ask(desk, "register.build", **BUILD)
    ask(desk, "register.build", **BUILD | {"roles": {}})
    assert ask(desk, "outcomes.survival")["code"] == "no_register"


def test_a_file_that_is_refused_leaves_the_one_before_as_it_was(desk):
    opened(desk)
    ask(desk, "register.build", **BUILD)
    assert opened(desk, "")["code"] == "empty_file"
    assert ask(desk, "outcomes.survival", interest=["died_of_disease"])["curves"][0]["n"] == 4


def test_opening_another_file_drops_the_cohort_of_the_one_before(desk):
    opened(desk)
    ask(desk, "register.build", **BUILD)
    opened(desk, TEXT.replace("North", "East"))
    assert ask(desk, "outcomes.survival")["code"] == "no_register"


def test_a_column_that_only_might_hold_dates_can_be_asked_about(desk):
    days = "".join(f"{i},{42_000 + 31 * i},{44_000 + i},care\n" for i in range(9))
    found = opened(desk, "No,Began,Ended,Status\n" + days)
    began = found["columns"][1]
    assert (began["kind"], began["role"]) == ("number", "group")
    assert began["dates"]["choices"] == ["serial_1900", "serial_1904"]
    assert found["columns"][0]["dates"] is None
    roles = {"c1": "start", "c2": "end", "c3": "outcome"}
    request = {"roles": roles, "meanings": {"care": "under_care"}, "closing_date": "2024-01-01"}
    assert ask(desk, "register.build", **request)["code"] == "date_order_unsettled"
    orders = {"c1": "serial_1900", "c2": "serial_1900"}
    assert ask(desk, "register.build", **request, date_orders=orders)["first_start"] == "2014-12-27"


@pytest.mark.parametrize("given", ["", "31/12/2020", "2020-02-30", "1700-01-01", "tomorrow"])
def test_a_closing_date_that_is_none_is_refused(desk, given):
    opened(desk)
    refusal = ask(desk, "register.build", **BUILD | {"closing_date": given})
    assert (refusal["code"], refusal["field"]) == ("not_a_date", "closing_date")


def test_an_unknown_column_is_refused_by_name(desk):
    opened(desk)
    refusal = ask(desk, "register.values", column="c77")
    assert (refusal["code"], refusal["parameters"]) == ("unknown_column", {"column": "c77"})


def test_long_lists_are_cut_and_counted(desk):
    rows = "".join(f"{i},,2019-01-01,died\n" for i in range(6_000))
    opened(desk, "No,Diagnosed,Last contact,Status\n1,2018-01-01,2019-01-01,died\n" + rows)
    roles = {"c1": "start", "c2": "end", "c3": "outcome"}
    found = ask(
        desk, "register.build", roles=roles, meanings={"died": "died_of_disease"}, closing_date="2020-01-01"
    )
    assert len(found["set_aside"]) == 5_000
    assert found["set_aside_counts"] == {"no_start_date": 6_000}
    assert {"code": "list_shortened", "parameters": {"listed": 5_000, "n": 6_000}} in found["cautions"]


def test_work_reports_how_far_it_is(desk):
    said = []
    request = {"name": "x", "content": TEXT.encode()}
    desk.answer("register.open", request, lambda *parts: said.append(parts))
    desk.answer("register.build", BUILD, lambda *parts: said.append(parts))
    assert said[0] == ("reading", 7, 7)
    assert said[-1] == ("covariates", 3, 3)
