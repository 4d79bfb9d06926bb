"""The tasks about trust through the desk's door."""

from __future__ import annotations

import json

import numpy as np
import pytest
from caseload_cases import cohort, day, simulated_register

from vitalroll.desk.door import Desk

CLOSING = day(2020, 12, 31)


def _desk(register) -> Desk:
    desk = Desk()
    desk._memory.built = register
    return desk


@pytest.fixture(scope="module")
def desk() -> Desk:
    return _desk(
        simulated_register(
            np.random.default_rng(14), per_year=90, years=9, yearly_hazard=[0.4, 0.2, 0.1], closing=CLOSING
        )
    )


def _ask(desk: Desk, task: str, **request) -> dict:
    said = desk.answer(task, request)
    json.dumps(said, allow_nan=False)
    return said


def test_the_back_test_has_its_shape_and_counts_what_held(desk):
    told = _ask(desk, "caseload.back_test", back_years=2, draws=200)["answer"]
    assert (told["origin"], told["closing_date"]) == ("2019-01-01", "2020-12-31")
    assert len(told["path"]) == 25
    assert told["path"][0]["seen"] == told["path"][0]["band"]["value"]
    for level in ("p50", "p80", "p95"):
        inside = [
            low <= step["seen"] <= high for step in told["path"][1:] for low, high in [step["band"][level]]
        ]
        assert told["months_held"][level] == pytest.approx(np.mean(inside))
        assert told["tests_held"][level] == sum(test["held"][level] for test in told["tests"])
    two = told["tests"][1]
    assert (two["years"], two["band"], two["seen"]) == (2, told["path"][-1]["band"], told["path"][-1]["seen"])
    assert "back_test_hindsight" in {caution["code"] for caution in told["cautions"]}


def test_the_parts_add_up(desk):
    years = _ask(desk, "caseload.parts", years=4, draws=200)["answer"]["years"]
    assert [year["ends"] for year in years] == [f"{year}-12-31" for year in range(2021, 2025)]
    for year in years:
        assert year["inflow"] + year["leaving"] + year["chance"] == pytest.approx(1)


def test_too_short_a_history_is_refused(desk):
    refusal = _ask(desk, "caseload.back_test", back_years=9)["refusal"]
    assert (refusal["code"], refusal["field"]) == ("back_test_history_too_short", "back_years")
    young = _desk(cohort([(CLOSING - 400 + i, 0, 100, "under_care") for i in range(50)], CLOSING))
    assert _ask(young, "caseload.back_test", back_years=1)["refusal"]["code"] == "back_test_history_too_short"
