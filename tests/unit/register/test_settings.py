"""Settings hold nothing of a patient, and applied to the same list they make the same cohort."""

from __future__ import annotations

import json
import random

import pytest

from vitalroll.desk import Desk

HEADINGS = ["No", "Name", "Diagnosed", "Last", "Status", "Village", "Note"]
ROWS = [
    ["P1", "Akello Mary", "14/03/2016", "20/05/2019", "Under care", "Lakeside", "sister: 0772 123456"],
    ["P2", "Okot John", "02/07/2016", "11/12/2018", "Died - RHD", "Lakeside", ""],
    ["P3", "Auma Grace", "25/01/2017", "30/06/2019", "went with Okello to Gulu", "Laekside", ""],
    ["P4", "Opio Daniel", "08/08/2017", "19/04/2019", "Code 7", "Lakeside", ""],
    ["P5", "Adong Sarah", "08/08/2017", "19/04/2019", "Code 7", "Kijabe", ""],
    ["P6", "Ochan Peter", "08/08/2017", "19/04/2019", "Code 7", "Kjiabe", ""],
]
READING = {
    "roles": {
        "c0": "patient_number", "c1": "name", "c2": "start", "c3": "end", "c4": "outcome", "c5": "group", "c6": "none",
    },
    "meanings": {
        "Under care": "under_care", "Died - RHD": "died_of_disease", "went with Okello to Gulu": "moved_away",
        "Code 7": "lost",
    },
    "date_orders": {"c2": "day_month_year", "c3": "day_month_year"},
    "closing_date": "2019-12-31",
    "unseen_months": 7,
    "repairs": {"unseen_for_long": [2], "same_number": []},
    "spellings": {"c5": {"Laekside": "Lakeside", "Kjiabe": "Kijabe"}},
}  # fmt: skip


def desk_with(rows, headings=HEADINGS):
    desk = Desk()
    text = "\n".join(",".join(cells) for cells in (headings, *rows))
    assert "answer" in desk.answer("register.open", {"name": "x.csv", "content": text.encode()})
    return desk


def saved(desk, reading=None):
    return desk.answer("register.settings", reading or READING)["answer"]


def applied(desk, settings):
    text = settings if isinstance(settings, str) else json.dumps(settings)
    said = desk.answer("register.apply_settings", {"text": text})
    return said.get("answer") or said["refusal"]


def test_nothing_of_a_patient_is_kept():
    answer = saved(desk_with(ROWS))
    text = json.dumps(answer["settings"], ensure_ascii=False)
    for row in ROWS:
        for cell in (*row[:4], row[6]):
            assert not cell or cell not in text
    assert "Okello" not in text
    # "went with Okello to Gulu" stands in one row; so does Kijabe, with its misspelling.
    assert answer["values_left_out"] == 2
    assert answer["settings"]["meanings"] == {
        "Under care": "under_care", "Died - RHD": "died_of_disease", "Code 7": "lost",
    }  # fmt: skip
    assert answer["settings"]["columns"][5]["spellings"] == {"Laekside": "Lakeside"}
    assert answer["settings"]["repairs"] == ["unseen_for_long", "same_number"]


def test_applied_to_the_same_list_they_make_the_same_cohort_but_for_what_was_left_out():
    desk = desk_with(ROWS)
    plain = READING | {
        "meanings": {
            value: meaning for value, meaning in READING["meanings"].items() if "Okello" not in value
        },
        "spellings": {"c5": {"Laekside": "Lakeside"}},
        "repairs": {"unseen_for_long": [], "same_number": []},
    }
    found = applied(desk, saved(desk)["settings"])
    assert (found["matched"], found["absent"], found["added"]) == (7, [], [])
    assert found["new_values"] == [{"value": "went with Okello to Gulu", "count": 1}]
    assert [caution["code"] for caution in found["cautions"]] == ["closing_date_from_settings"]
    assert desk.answer("register.build", found["reading"]) == desk.answer("register.build", plain)


def test_columns_that_moved_are_found_by_heading_and_differences_are_told():
    settings = saved(desk_with(ROWS))["settings"]
    order = [3, 0, 4, 2, 1, 6]
    headings = [HEADINGS[i] for i in order] + ["Weight"]
    rows = [[row[i] for i in order] + [str(50 + i)] for i, row in enumerate(ROWS)]
    found = applied(desk_with(rows, headings), settings)
    assert found["absent"] == [{"heading": "Village", "role": "group"}]
    assert found["added"] == ["Weight"]
    assert found["reading"]["roles"] == {
        "c0": "end", "c1": "patient_number", "c2": "outcome", "c3": "start", "c4": "name", "c5": "none", "c6": "none",
    }  # fmt: skip


def test_dates_written_otherwise_are_read_as_they_show_themselves_and_it_is_said():
    settings = saved(desk_with(ROWS))["settings"]
    rows = [[*row[:2], "03/14/2020", "05/20/2021", *row[4:]] for row in ROWS]
    found = applied(desk_with(rows), settings)
    assert found["reading"]["date_orders"] == {"c2": "month_day_year", "c3": "month_day_year"}
    assert [caution["code"] for caution in found["cautions"]] == [
        "order_differs", "order_differs", "closing_date_from_settings", "dates_after_closing",
    ]  # fmt: skip
    assert found["cautions"][-1]["parameters"]["n"] == 12


def test_a_column_that_holds_no_dates_any_more_is_not_used():
    settings = saved(desk_with(ROWS))["settings"]
    rows = [[*row[:3], "soon", *row[4:]] for row in ROWS]
    found = applied(desk_with(rows), settings)
    assert found["reading"]["roles"]["c3"] == "none"
    assert found["cautions"][0] == {"code": "not_dates_any_more", "parameters": {"heading": "Last"}}


@pytest.mark.parametrize(
    "text",
    ["", "{", "[]", "null", "7", "{}", '{"kind": "other"}', '{"kind": "vitalroll-settings"}', "[" * 100_000],
)
def test_what_is_no_file_of_settings_is_refused(text):
    assert applied(desk_with(ROWS), text)["code"] == "settings_not_read"


def test_settings_of_a_later_version_are_refused_by_name():
    settings = saved(desk_with(ROWS))["settings"] | {"version": 2}
    refusal = applied(desk_with(ROWS), settings)
    assert (refusal["code"], refusal["parameters"]) == ("settings_too_new", {"version": 2, "known": 1})


@pytest.mark.parametrize("seed", range(60))
def test_settings_that_were_tampered_with_are_refused_or_make_a_request_that_is_answered(seed):
    """Any field replaced by anything: never a traceback."""
    draw = random.Random(seed)
    desk = desk_with(ROWS)
    settings = json.loads(json.dumps(saved(desk)["settings"]))
    odd = draw.choice(
        [None, 7, -1, 1e300, "x", "lost", [], {}, [{}], {"a": 1}, True, "2019-13-01", ["same_number"]]
    )
    field = draw.choice(list(settings))
    if draw.random() < 0.5:
        settings[field] = odd
    else:
        settings["columns"][draw.randrange(7)][
            draw.choice(["heading", "position", "role", "order", "spellings"])
        ] = odd
    found = applied(desk, settings)
    if "reading" in found:
        said = desk.answer("register.build", found["reading"])
        assert "answer" in said or said["refusal"]["code"] != "internal"
    else:
        assert found["code"] in ("settings_not_read", "settings_too_new")
