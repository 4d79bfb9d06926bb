"""The register's own quality, and who is overdue: worked by hand."""

from __future__ import annotations

from datetime import date, timedelta

import numpy as np
import pytest
from register_cases import CLOSING, HEADINGS, MEANINGS, ROLES, row

from vitalroll.desk import Desk
from vitalroll.register.digit_preference import age_heaping, days_of_month


def day(before):
    return (CLOSING - timedelta(days=before)).isoformat()


def desk_with(*rows):
    desk = Desk()
    content = "\n".join(",".join(cells) for cells in (HEADINGS, *rows)).encode()
    assert "answer" in desk.answer("register.open", {"name": "x.csv", "content": content})
    return desk


REQUEST = {"roles": ROLES, "meanings": MEANINGS, "closing_date": CLOSING.isoformat()}


def asked(task, *rows, **said):
    said = desk_with(*rows).answer(task, REQUEST | said)
    return said.get("answer") or said["refusal"]


ROWS = [
    row("1", start=day(1000), last=day(0), zone="A"),  # 1000 of 1000 days
    row("2", start=day(800), last=day(400), zone="A"),  # under care, 400 of 800
    row("3", start=day(600), last=day(500), status="died", zone="B"),  # 100 of 100: a death is complete
    row("4", start=day(500), last=day(300), status="lost", zone="B"),  # 200 of 500
    row("5", start=day(400), last=day(100), status="moved", zone="B"),  # 300 of 400; of 300 as a known ending
    row("6", start=day(300), here=day(250), last=day(50), zone=""),  # seen from day 50 on: 200 of 250
]


def test_the_person_time_index_by_hand():
    answer = asked("register.profile", *ROWS, site="c8")["completeness"]
    everyone = answer["everyone"]
    assert (everyone["observed_days"], everyone["possible_days"]) == (2200, 3050)
    assert everyone["index"] == pytest.approx(2200 / 3050)
    assert everyone["with_known"] == pytest.approx(2200 / 2950)
    by_site = {
        each["group"]: (each["n"], each["observed_days"], each["possible_days"]) for each in answer["by_site"]
    }
    assert by_site == {"A": (2, 1400, 1800), "B": (3, 600, 1000)}
    years = {each["group"]: each for each in answer["by_year"]}
    assert sum(each["observed_days"] for each in years.values()) == 2200
    assert sum(each["possible_days"] for each in years.values()) == 3050
    assert sorted(years) == sorted(
        {(CLOSING - timedelta(days=d)).year for d in (1000, 800, 600, 500, 400, 300)}
    )


def test_nobody_lost_and_all_followed_to_closing_is_complete():
    answer = asked("register.profile", row(last=day(0)), row("2", last=day(900), status="died"))[
        "completeness"
    ]
    assert answer["everyone"]["index"] == 1


def test_missing_cells_by_column_and_ending():
    rows = [
        row("1", status="care", last=day(9), zone="A"),
        row("2", status="care", last=day(9), zone="N/A"),
        row("3", status="died", zone="unknown"),
        row("4", status="lost", zone="."),
        row("5", status="odd", zone=""),  # set aside: counted in all rows only
    ]
    answer = asked("register.profile", *rows)
    zone = next(each for each in answer["missing"] if each["column"] == "c8")
    assert (zone["n"], zone["missing"]) == (5, 4)
    assert [(each["ending"], each["n"], each["missing"]) for each in zone["by_ending"]] == [
        ("under_care", 2, 1), ("died", 1, 1), ("lost", 1, 1), ("known", 0, 0),
    ]  # fmt: skip


def test_newcomers_by_month_show_months_without_any():
    rows = [
        row(str(i), start=start, last=day(0))
        for i, start in enumerate(["2018-01-05", "2018-01-31", "2018-04-01"])
    ]
    assert asked("register.profile", *rows)["months"] == [
        {"month": "2018-01", "count": 2}, {"month": "2018-02", "count": 0},
        {"month": "2018-03", "count": 0}, {"month": "2018-04", "count": 1},
    ]  # fmt: skip


def test_expected_days_add_up_and_agree_with_counting_400_years():
    first, last = date(2000, 1, 1).toordinal(), date(2400, 1, 1).toordinal()
    every = days_of_month(np.arange(first, last))
    assert [each.count for each in every] == pytest.approx([each.expected for each in every])
    assert sum(each.expected for each in every) == pytest.approx(last - first)


def test_whipple_by_hand():
    # 10 ages from 23 to 62 of which 30, 35 and 60 end in 0 or 5: 500 x 3/10. 20 and 65 are outside.
    ages = np.array([20, 23, 24, 26, 30.9, 35, 36, 41, 42, 60, 62, 65, np.nan])
    found = age_heaping(ages)
    assert (found.n, found.whipple) == (10, 150)
    assert found.digits == (2, 1, 2, 1, 1, 1, 2, 0, 0, 0)
    # Wilson's limits of 3/10 are .1078 and .6032 (from memory, as most textbooks print them).
    assert (found.lower, found.upper) == pytest.approx((500 * 0.1078, 500 * 0.6032), abs=0.05)


@pytest.mark.parametrize(("ages", "index"), [(range(23, 63), 100), ((25, 30, 45, 60), 500), ((23, 31), 0)])
def test_whipple_at_its_ends(ages, index):
    assert age_heaping(np.array(list(ages), dtype=float)).whipple == index


def test_few_ages_are_said_to_be_few_and_none_give_no_index():
    answer = asked("register.profile", row(age="30"))
    assert [caution["code"] for caution in answer["cautions"]] == ["few_ages"]
    assert answer["ages"]["written"] is True
    assert asked("register.profile", row())["ages"] is None


def test_a_register_of_nobody_has_no_profile():
    assert asked("register.profile", row(status="odd"))["code"] == "nobody_to_profile"


def test_the_trace_list_has_the_longest_unseen_first_and_only_the_picked_columns():
    rows = [
        row("101", last=day(10), zone="A"),
        row("102", last=day(400), zone="B"),
        row("103", last=day(700), status="lost", zone="C"),
        row("104", last=day(400), zone="D"),
        row("105", last=day(900), status="died", zone="E"),
        row("106", last=day(900), status="moved", zone="F"),
        row("107", last=""),
    ]
    answer = asked("register.trace_list", *rows, overdue_months=6, columns=["c8"])
    assert [(each["line"], each["days"], each["cells"]) for each in answer["rows"]] == [
        (4, 700, ["C"]), (3, 400, ["B"]), (5, 400, ["D"]),
    ]  # fmt: skip
    assert (answer["n"], answer["unjudged"]) == (3, 1)
    assert answer["cautions"][0]["code"] == "trace_list_identifies"
    assert "10" not in {cell for each in answer["rows"] for cell in each["cells"]}
    without = asked("register.trace_list", *rows, with_lost=False)
    assert [each["line"] for each in without["rows"]] == [3, 5]
    assert all(each["cells"] == [] for each in without["rows"])
    # The rule for silent losses changes what they are called elsewhere, not who is looked for.
    ruled = asked("register.trace_list", *rows, columns=["c8"], repairs={"unseen_for_long": []})
    assert ruled["rows"] == answer["rows"]


def test_a_column_that_is_not_there_is_refused_by_name():
    refusal = asked("register.trace_list", row(), columns=["c99"])
    assert (refusal["code"], refusal["field"]) == ("unknown_column", "columns")
