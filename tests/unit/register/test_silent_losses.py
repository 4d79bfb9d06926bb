"""Losses nobody wrote down are counted by a rule that is shown; misspelt values are proposed, not merged."""

from __future__ import annotations

from datetime import date, timedelta

import pytest
from register_cases import CLOSING, HEADINGS, MEANINGS, ROLES, built, row

from vitalroll.desk import Desk
from vitalroll.errors import Refusal
from vitalroll.register.table import table_of
from vitalroll.register.values import values_of
from vitalroll.register.variants import merged, variants


def unseen(days):
    return (CLOSING - timedelta(days=days)).isoformat()


def asked(task, *rows, **said):
    desk = Desk()
    content = "\n".join(",".join(cells) for cells in (HEADINGS, *rows)).encode()
    assert "answer" in desk.answer("register.open", {"name": "x.csv", "content": content})
    request = {"roles": ROLES, "meanings": MEANINGS, "closing_date": CLOSING.isoformat()}
    return desk.answer(task, request | said)["answer"]


ROWS = [
    row("1", last=unseen(10)),
    row("2", last=unseen(182)),  # six months are 182.625 days: 182 whole ones are not yet more
    row("3", last=unseen(183)),
    row("4", last=unseen(400)),
    row("5", last=unseen(500), status="lost"),
    row("6", last=unseen(900), status="died"),
    row("7", last=""),  # under care, never seen: followed to closing on trust
    row("8", start="", last=unseen(500)),  # set aside
]


def test_the_rule_is_counted_at_each_number_of_months():
    answer = asked("register.silent_losses", *ROWS, unseen_months=13)
    by_months = {each["months"]: (each["changed"], each["lost"]) for each in answer["rows"]}
    assert by_months == {
        3: (3, 4), 6: (2, 3), 9: (1, 2), 12: (1, 2), 13: (1, 2), 18: (0, 1), 24: (0, 1), 36: (0, 1),
    }  # fmt: skip
    assert (answer["n"], answer["under_care"], answer["unjudged"], answer["written_lost"]) == (7, 5, 1, 1)
    assert answer["rows"][0]["share"] == pytest.approx(4 / 7)
    assert [caution["code"] for caution in answer["cautions"]] == ["under_care_without_contact"]


@pytest.mark.parametrize("months", [3, 6, 12, 18])
def test_the_rule_makes_as_many_losses_as_it_says_and_moves_no_end(months):
    answer = asked("register.silent_losses", *ROWS, unseen_months=months)
    said = next(each for each in answer["rows"] if each["months"] == months)
    rule = {"unseen_months": months, "repairs": {"unseen_for_long": []}}
    cohort = asked("register.build", *ROWS, **rule)
    assert cohort["outcomes"]["lost"] == said["lost"]
    assert cohort["person_years"] == asked("register.build", *ROWS)["person_years"]
    counted = asked("register.silent_losses", *ROWS, **rule)
    assert counted["counted"]
    assert counted["rows"] == answer["rows"]


def of(*texts):
    table = table_of([(list(range(1, len(texts) + 2)), [["Ward"], *([text] for text in texts)])], 1)
    column = table.columns[0]
    return values_of(column, column.codes >= 0)


@pytest.mark.parametrize(
    ("often", "seldom", "certain"),
    [
        ("Old Market", "Old Markt", False),
        ("Old Market", "old-market", True),
        ("Old Market", "OldMarket", True),
        ("Décédé", "Decede.", True),
        ("Haemorrhage", "Hemorrhage", False),
        ("Transferred", "Transfered", False),
    ],
)
def test_a_slip_is_proposed(often, seldom, certain):
    values = of(often, often, seldom)
    (found,) = variants(values)
    assert (values.spelt[found.value], values.spelt[found.into]) == (seldom, often)
    assert found.certain is certain


@pytest.mark.parametrize(
    ("often", "seldom"),
    [
        ("Stage II", "Stage III"),
        ("Ward 1", "Ward 2"),
        ("Mild", "Wild"),
        ("symptomatic", "asymptomatic"),
        ("male", "female"),
        ("Block A12345", "Block A12346"),
        ("treated", "untreated"),
    ],
)
def test_what_may_well_be_two_values_is_not_proposed(often, seldom):
    assert variants(of(often, often, seldom)) == []


def test_merged_values_are_counted_together_and_chains_are_followed():
    values = of("north", "north", "nort", "norht", "south")
    made = merged(values, {"norht": "nort", "NORT": "north", "east": "south"}, "spellings.c0")
    assert made.counts.tolist() == [4, 0, 0, 1]
    assert made.codes.tolist() == [0, 0, 0, 0, 3]
    with pytest.raises(Refusal) as refused:
        merged(values, {"nort": "norht", "norht": "nort"}, "spellings.c0")
    assert (refused.value.code, refused.value.field) == ("merged_in_a_circle", "spellings.c0")


def test_groups_are_made_of_merged_values():
    rows = [row(str(i), zone=zone) for i, zone in enumerate(["Lakeside", "Lakeside", "Laekside", "Hill"])]
    plain = built(*rows).cohort.grouping("c8")
    assert plain.levels == ("Hill", "Laekside", "Lakeside")
    made = built(*rows, spellings={"c8": {"Laekside": "Lakeside"}}).cohort.grouping("c8")
    assert made.levels == ("Hill", "Lakeside")
    assert made.codes.tolist() == [1, 1, 1, 0]


def test_the_task_lists_misspelt_values_and_proposes_their_meaning():
    rows = [
        row(str(i), zone=zone, status=status, last=date(2019, 1, 1 + i).isoformat())
        for i, (zone, status) in enumerate(
            [("Lakeside", "Transferred"), ("Lakeside", "Transferred"), ("Laekside", "Trnasferred")]
        )
    ]
    desk = Desk()
    content = "\n".join(",".join(cells) for cells in (HEADINGS, *rows)).encode()
    assert "answer" in desk.answer("register.open", {"name": "x.csv", "content": content})
    found = desk.answer("register.spellings", {"columns": ["c8", "c6"]})["answer"]["columns"]
    assert found == [
        {
            "column": "c8",
            "variants": [
                {"value": "Laekside", "count": 1, "into": "Lakeside", "into_count": 2, "certain": False}
            ],
        }
    ]
    listed = desk.answer("register.values", {"column": "c4"})["answer"]["values"]
    assert [(each["value"], each["meaning"], each["like"]) for each in listed] == [
        ("Transferred", "moved_away", None),
        ("Trnasferred", "moved_away", "Transferred"),
    ]
