"""Every fault that is looked for has a file that shows it, a finding that names it, and nothing else found.

``faults.json`` holds, for each file, the lines of every finding and what its repair would change: rows,
patients, deaths and losses without and with it. Each entry was checked by reading the file.
"""

from __future__ import annotations

import json
from pathlib import Path
from typing import Any

import pytest
from hard_reading import CLOSING, request_as_proposed

from vitalroll.desk import Desk
from vitalroll.register.findings.mending import CODES

HERE = Path(__file__).parent
FILES = sorted((HERE / "faults").iterdir())
EXPECTED = json.loads((HERE / "faults.json").read_text(encoding="utf-8"))


def asked(path: Path) -> tuple[Desk, dict[str, Any]]:
    desk = Desk()
    source = desk.answer("register.open", {"name": path.name, "content": path.read_bytes()})["answer"]
    return desk, request_as_proposed(desk, source, CLOSING)


def told(repair: dict[str, Any] | None) -> dict[str, Any] | None:
    if repair is None:
        return None
    sides = {name: [repair[side][name] for side in ("without", "with")] for name in ("n", "events", "lost")}
    return {"kind": repair["kind"], "units": repair["units"], **sides}


def test_every_check_has_the_file_of_its_fault_and_every_file_its_expectation() -> None:
    assert {path.name for path in FILES} == set(EXPECTED)
    for code in CODES:
        assert code in EXPECTED[f"{code}.csv"]
    assert EXPECTED["nothing_wrong.csv"] == {}


@pytest.mark.parametrize("path", FILES, ids=lambda path: path.stem)
def test_the_fault_is_found_on_its_lines_with_its_repair(path: Path) -> None:
    desk, request = asked(path)
    answer = desk.answer("register.findings", request)["answer"]
    found = {
        each["code"]: {"lines": each["lines"], "repair": told(each["repair"])} for each in answer["findings"]
    }
    assert found == EXPECTED[path.name]


@pytest.mark.parametrize("path", FILES, ids=lambda path: path.stem)
def test_accepting_everything_gives_the_cohort_whose_numbers_were_shown(path: Path) -> None:
    desk, request = asked(path)
    before = desk.answer("register.findings", request)["answer"]
    accepted = {each["code"]: [] for each in before["findings"] if each["repair"]}
    answer = desk.answer("register.findings", request | {"repairs": accepted})["answer"]
    cohort = desk.answer("register.build", request | {"repairs": accepted})["answer"]
    assert answer["now"]["n"] == cohort["n"]
    deaths = sum(n for meaning, n in cohort["outcomes"].items() if meaning.startswith("died"))
    assert (answer["now"]["events"], answer["now"]["lost"]) == (deaths, cohort["outcomes"]["lost"])
    assert cohort["n"] + len(cohort["set_aside"]) == cohort["rows"]
    if len(accepted) == 1:
        (repair,) = (each["repair"] for each in before["findings"] if each["repair"])
        assert answer["now"] == repair["with"]
