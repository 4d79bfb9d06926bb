"""The task about resources through the desk's door."""

from __future__ import annotations

import json

import numpy as np
import pytest
from caseload_cases import day, simulated_register

from vitalroll.desk.door import Desk

SETTING = {"years": 3, "draws": 300, "newcomers": {"basis": "typed", "per_year": 80}}
VISITS = {"name": "Visits", "at_start": 2, "first_year": 1, "later": 0.5, "unit_cost": 8, "cost_growth": 2}
WARD = {"name": "Ward", "unit": "bed-days", "at_start": 6, "later": 0.2}


@pytest.fixture(scope="module")
def desk() -> Desk:
    desk = Desk()
    desk._memory.built = simulated_register(
        np.random.default_rng(4),
        per_year=60,
        years=7,
        yearly_hazard=[0.4, 0.2, 0.1],
        closing=day(2021, 12, 31),
    )
    return desk


def _ask(desk: Desk, **request) -> dict:
    said = desk.answer("caseload.resources", json.loads(json.dumps(SETTING | request)))
    json.dumps(said, allow_nan=False)
    return said


def test_amounts_costs_and_totals_add_up(desk):
    told = _ask(desk, items=[VISITS, WARD], discount=4)["answer"]
    visits, ward = told["items"]
    assert len(visits["amount"]) == 3
    for year in range(3):
        cost = 8 * 1.02**year * visits["amount"][year]["value"]
        assert visits["cost"][year]["value"] == pytest.approx(cost)
        assert told["cost"][year]["value"] == pytest.approx(cost)
        assert ward["cost"][year]["value"] == 0
    assert [total["percent"] for total in told["totals"]] == [4, 0, 3, 5]
    yearly = [band["value"] for band in told["cost"]]
    assert told["totals"][0]["cost"]["value"] == pytest.approx(
        sum(cost / 1.04**year for year, cost in enumerate(yearly, 1))
    )
    assert told["totals"][1]["cost"]["value"] == pytest.approx(sum(yearly))
    low, high = told["totals"][1]["cost"]["p95"]
    assert low < sum(yearly) < high
    assert told["months"][0] == "2022-01-31"
    assert told["months"][1] == "2022-02-28"
    assert told["months"][-1] == told["years"][-1]["ends"] == "2024-12-31"


def test_the_month_in_which_slots_run_out(desk):
    need = _ask(desk, items=[VISITS], lines=[{"kind": "amount", "item": 0, "limit": 1e6}])["answer"]["lines"][
        0
    ]["need"]
    limit = (need[0] + need[-1]) / 2
    lines = [
        {"kind": "amount", "item": 0, "limit": limit, "name": "Slots"},
        {"kind": "amount", "item": 0, "limit": 1e6},
        {"kind": "patients", "limit": 1},
    ]
    slots, plenty, one = _ask(desk, items=[VISITS], lines=lines)["answer"]["lines"]
    month = slots["expected_month"]["month"]
    assert need[month - 1] > limit >= need[month - 2]
    assert slots["unlikely_month"]["month"] <= slots["likely_month"]["month"]
    by = slots["passed_by"]
    assert by == sorted(by)
    assert by[slots["likely_month"]["month"] - 1] >= 0.5 > by[slots["likely_month"]["month"] - 2]
    assert plenty["likely_month"] is plenty["expected_month"] is None
    assert one["expected_month"] == {"month": 1, "ends": "2022-01-31"}


def test_beds_are_judged_on_a_busy_day_and_refused_when_they_never_suffice(desk):
    ward = {"kind": "beds", "item": 1, "limit": 60, "name": "Ward"}
    beds = _ask(desk, items=[VISITS, WARD], lines=[ward])["answer"]["lines"][0]["beds"]
    assert beds["now"]["mean"] < beds["now"]["busy"]
    assert beds["now"]["utilisation"] == pytest.approx(beds["now"]["mean"] / 60)
    refused = _ask(desk, items=[VISITS, WARD], lines=[ward | {"limit": 1}])["refusal"]
    assert (refused["code"], refused["field"]) == ("utilisation_at_or_above_one", "lines.0.limit")
    between = (beds["now"]["mean"] + beds["last"]["mean"]) / 2
    told = _ask(desk, items=[VISITS, WARD], lines=[ward | {"limit": between}])["answer"]
    assert "beds_never_enough" in {caution["code"] for caution in told["cautions"]}


@pytest.mark.parametrize(
    ("request_", "refused"),
    [
        ({}, ("no_items", "items")),
        ({"items": [VISITS | {"later": -1}]}, ("out_of_range", "items.0.later")),
        ({"items": [VISITS | {"event": "birth"}]}, ("not_one_of", "items.0.event")),
        ({"lines": [{"kind": "amount", "limit": 5}]}, ("line_without_item", "lines.0.item")),
        (
            {"items": [VISITS], "lines": [{"kind": "beds", "limit": 5, "item": 1}]},
            ("line_without_item", "lines.0.item"),
        ),
        ({"lines": [{"kind": "patients", "limit": 0}]}, ("out_of_range", "lines.0.limit")),
        ({"items": [VISITS], "discount": 101}, ("out_of_range", "discount")),
    ],
)
def test_nonsense_is_refused_by_its_field(desk, request_, refused):
    refusal = _ask(desk, **request_)["refusal"]
    assert (refusal["code"], refusal["field"]) == refused
