"""Every file that broke something, or could, is read or refused: never a traceback, never a lost row.

``expected.json`` says of each file what becomes of it when every proposal is accepted; each entry was
checked by reading the file.
"""

from __future__ import annotations

import json
from pathlib import Path
from typing import Any

import pytest
from hard_reading import read_as_proposed, request_as_proposed
from make import MADE, parts_of, workbook

from vitalroll.desk import Desk

HERE = Path(__file__).parent
FILES = sorted((HERE / "files").iterdir())
EXPECTED = json.loads((HERE / "expected.json").read_text(encoding="utf-8"))


def check(found: dict[str, Any], expected: dict[str, Any]) -> None:
    assert found == expected
    if "n" in found:
        assert found["n"] + sum(found["set_aside"].values()) == found["rows"]
        assert sum(found["outcomes"].values()) == found["n"]


def test_every_hard_file_is_expected_and_every_expectation_has_its_file() -> None:
    assert {path.name for path in FILES} == set(EXPECTED["files"])
    assert set(MADE) == set(EXPECTED["made"])
    assert len(FILES) >= 25


@pytest.mark.parametrize("path", FILES, ids=lambda path: path.name)
def test_small_hard_files(path: Path) -> None:
    check(read_as_proposed(path.name, path.read_bytes()), EXPECTED["files"][path.name])


@pytest.mark.parametrize("name", MADE)
def test_made_hard_files(name: str) -> None:
    check(read_as_proposed(name, MADE[name]()), EXPECTED["made"][name])


def test_the_large_file_is_as_large_as_it_says() -> None:
    assert len(MADE["thirty megabytes"]()) > 30_000_000


def test_the_bomb_is_small_and_would_unpack_to_a_thousand_times_its_size() -> None:
    bomb = MADE["bomb"]()
    assert len(bomb) < 1_000_000
    assert sum(map(len, parts_of(bomb).values())) > 500 * len(bomb)


def opened(content: bytes, **how: Any) -> dict[str, Any]:
    said = Desk().answer("register.open", {"name": "x", "content": content, **how})
    return said.get("answer") or said["refusal"]


def file(name: str) -> bytes:
    return (HERE / "files" / name).read_bytes()


def test_markup_is_kept_as_the_text_it_is() -> None:
    source = opened(file("markup_in_heading.csv"))
    assert source["columns"][6]["heading"] == "<img src=x onerror=alert(1)>"
    assert source["columns"][6]["samples"][:2] == ["<b>Mild</b>", '<script>alert("x")</script>']


def test_cells_like_formulas_are_kept_as_the_text_they_are() -> None:
    assert "=HYPERLINK(" in opened(file("cells_like_formulas.csv"))["columns"][6]["samples"][0]


def test_a_column_of_500_groups_is_a_category_and_said_to_be_too_many_when_grouped_by() -> None:
    desk = Desk()
    source = desk.answer("register.open", {"name": "x", "content": file("many_groups.csv")})["answer"]
    village = source["columns"][4]
    assert (village["kind"], village["distinct"], village["role"]) == ("category", 500, "none")
    asked = request_as_proposed(desk, source)
    asked["roles"]["c4"] = "group"
    built = desk.answer("register.build", asked)["answer"]
    found = [caution for caution in built["cautions"] if caution["code"] == "many_levels"]
    assert found[0]["parameters"]["levels"] == 500
    refused = desk.answer("outcomes.survival", {"group": "c4"})
    assert refused["refusal"]["code"] == "too_many_groups"


def test_no_readable_date_in_the_start_column_is_refused_by_its_name() -> None:
    desk = Desk()
    source = desk.answer("register.open", {"name": "x", "content": file("start_never_readable.csv")})[
        "answer"
    ]
    asked = request_as_proposed(desk, source)
    asked["roles"]["c3"] = "start"
    refusal = desk.answer("register.build", asked)["refusal"]
    assert refusal["code"] == "no_readable_dates"
    assert refusal["parameters"] == {"column": "c3", "heading": "Diagnosed", "examples": ["not known"]}
    assert refusal["field"] == "roles.c3"


def test_dates_whose_order_nothing_settles_are_asked_for() -> None:
    desk = Desk()
    source = desk.answer("register.open", {"name": "x", "content": file("order_unsettled.csv")})["answer"]
    dates = source["columns"][3]["dates"]
    assert not dates["settled"]
    assert dates["choices"] == ["day_month_year", "month_day_year"]
    asked = request_as_proposed(desk, source) | {"date_orders": {}}
    refusal = desk.answer("register.build", asked)["refusal"]
    assert (refusal["code"], refusal["field"]) == ("date_order_unsettled", "date_orders.c3")


def test_a_workbook_counting_from_1904_gives_the_same_dates_as_one_counting_from_1900() -> None:
    assert opened(MADE["from 1904"]())["preview"] == opened(workbook())["preview"]


def test_the_sheet_that_holds_most_is_opened_and_another_on_request() -> None:
    content = MADE["hidden and merged"]()
    source = opened(content)
    assert (source["sheets"], source["sheet"]) == (["Notes", "Register", "Codes"], "Register")
    assert opened(content, sheet="Notes")["code"] == "no_rows"
    refusal = opened(content, sheet="Elsewhere")
    assert refusal["code"] == "no_such_sheet"
    assert refusal["parameters"]["sheets"] == source["sheets"]


def test_cells_of_a_workbook_become_the_text_a_person_would_read() -> None:
    cells = {row["line"]: row["cells"] for row in opened(MADE["cells of many types"]())["preview"]}
    assert cells[2][:5] == ["00101", "F", "23", "14/03/2016", "2025-05-20 14:30:00"]
    assert cells[3][2] == "31.5"
    assert cells[4][2] == "#N/A"
    assert cells[5][6] == "TRUE"
