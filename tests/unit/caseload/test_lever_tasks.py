"""The tasks about levers through the desk's door."""

from __future__ import annotations

import json

import numpy as np
import pytest
from caseload_cases import day, simulated_register

from vitalroll.desk.door import Desk

SETTING = {"years": 3, "draws": 300, "newcomers": {"basis": "typed", "per_year": 80}}
CARE = {"name": "Care", "first_year": 1, "later": 1, "unit_cost": 10}
TRACING = {"name": "Tracing", "levers": [{"kind": "fewer_lost", "percent": 40, "cost_per_year": 900}]}
EARLIER = {
    "name": "Earlier",
    "levers": [{"kind": "found_earlier", "percent": 30, "months_earlier": 6, "cost_at_start": 5000}],
}
FACTOR = {
    "name": "Factor",
    "levers": [{"kind": "risk_factor", "percent": 50, "prevalence": 40, "relative_risk": 3}],
}


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


def _ask(desk: Desk, task: str, **request) -> dict:
    said = desk.answer(task, json.loads(json.dumps(SETTING | request)))
    json.dumps(said, allow_nan=False)
    return said


def test_scenarios_stand_beside_the_baseline(desk):
    told = _ask(desk, "caseload.levers", scenarios=[TRACING, EARLIER, FACTOR], items=[CARE])["answer"]
    tracing, earlier, factor = told["scenarios"]
    assert [each["name"] for each in told["scenarios"]] == ["Tracing", "Earlier", "Factor"]
    for each in told["scenarios"]:
        end = each["under_care"][-1]["value"] - told["baseline"]["under_care"][-1]["value"]
        assert each["difference"]["under_care"]["value"] == pytest.approx(end)
        money = each["difference"]
        assert money["cost"]["value"] == pytest.approx(money["care"]["value"] + money["programme"]["value"])
    assert tracing["difference"]["lost"]["p95"][1] < 0 < tracing["difference"]["patient_years"]["p95"][0]
    # A difference from shared draws is far surer than its two courses.
    width = np.ptp(tracing["difference"]["under_care"]["p95"])
    assert width < np.ptp(told["baseline"]["under_care"][-1]["p95"])
    assert factor["attributable_fractions"] == [pytest.approx(0.8 / 1.8)]
    # 80 a year, half of 0.444 kept away: three years.
    assert factor["difference"]["newcomers"]["value"] == pytest.approx(-3 * 80 * 0.5 * 0.8 / 1.8)
    # 30 % of half a year's newcomers come within the horizon who would have come after it.
    assert earlier["difference"]["newcomers"]["value"] == pytest.approx(0.3 * 40)
    assert factor["per_patient_year"]["value"] is None
    for name in ("best_for_patient_years", "best_for_deaths"):
        assert sum(each[name] for each in told["scenarios"]) == pytest.approx(1)
    said = {(each["code"], each["parameters"].get("name")) for each in told["cautions"]}
    assert {
        ("lead_time_counts", "Earlier"),
        ("deaths_outside_unseen", "Tracing"),
        ("scenario_free", "Factor"),
    } <= said


def test_one_scenario_is_looked_at_more_closely(desk):
    told = _ask(desk, "caseload.levers", scenarios=[FACTOR, TRACING], items=[CARE], sensitivity_of=1)[
        "answer"
    ]
    close = told["sensitivity"]
    assert close["scenario"] == 1
    assert close["value"] == pytest.approx(told["scenarios"][1]["per_patient_year"]["value"])
    assert {swing["what"] for swing in close["swings"]} >= {"lost", "effect", "programme", "discount"}
    told = _ask(desk, "caseload.levers", scenarios=[FACTOR], items=[CARE])["answer"]
    assert told["sensitivity"]["value"] is None


def test_the_baseline_is_that_of_the_projection(desk):
    alone = _ask(desk, "caseload.project")["answer"]["baseline"]["under_care"]
    beside = _ask(desk, "caseload.levers", scenarios=[TRACING, EARLIER])["answer"]["baseline"]["under_care"]
    assert alone == beside


def test_break_even_meets_its_target(desk):
    asked = {"lever": {"kind": "fewer_lost"}, "goal": "under_care"}
    none = _ask(desk, "caseload.break_even", **asked, target=0)["answer"]
    assert none["percent"] is None
    assert none["reached_in"] is None
    target = (none["at_none"] + none["at_most"]) / 2
    found = _ask(desk, "caseload.break_even", **asked, target=target)["answer"]
    levers = [{"kind": "fewer_lost", "percent": found["percent"]}]
    told = _ask(desk, "caseload.levers", scenarios=[{"name": "", "levers": levers}])["answer"]
    # Found to 0.001 per cent.
    assert told["scenarios"][0]["under_care"][-1]["value"] == pytest.approx(target, abs=0.01)
    assert 0.3 < found["reached_in"] < 0.7


@pytest.mark.parametrize("goal", ["lost", "deaths", "cost"])
def test_every_goal_can_be_searched(desk, goal):
    asked = {"lever": {"kind": "fewer_newcomers"}, "goal": goal, "items": [CARE]}
    ends = _ask(desk, "caseload.break_even", **asked, target=0)["answer"]
    assert ends["at_most"] < ends["at_none"]
    found = _ask(desk, "caseload.break_even", **asked, target=(ends["at_none"] + ends["at_most"]) / 2)
    if goal == "deaths" and ends["at_none"] == 0:
        return
    assert 0 < found["answer"]["percent"] < 100


@pytest.mark.parametrize(
    ("task", "request_", "refused"),
    [
        ("caseload.levers", {}, ("no_scenarios", "scenarios")),
        (
            "caseload.levers",
            {"scenarios": [TRACING, {"name": "", "levers": [{"kind": "fewer_lost", "percent": 101}]}]},
            ("out_of_range", "scenarios.1.levers.0.percent"),
        ),
        (
            "caseload.levers",
            {"scenarios": [{"name": "", "levers": EARLIER["levers"] * 2}]},
            ("found_earlier_twice", "scenarios.0.levers"),
        ),
        ("caseload.levers", {"scenarios": [TRACING], "budget": 0}, ("out_of_range", "budget")),
        (
            "caseload.break_even",
            {"lever": {"kind": "fewer_stopped"}, "goal": "lost", "target": 3},
            ("lever_makes_no_difference", "lever.kind"),
        ),
    ],
)
def test_nonsense_is_refused_by_its_field(desk, task, request_, refused):
    refusal = _ask(desk, task, **request_)["refusal"]
    assert (refusal["code"], refusal["field"]) == refused
