"""The caseload tasks through the desk's door."""

from __future__ import annotations

import json

import numpy as np
import pytest
from caseload_cases import cohort, day, simulated_register

from vitalroll.desk.door import Desk
from vitalroll.register.cohort import MEANINGS

CLOSING = day(2021, 12, 31)


def _desk(register) -> Desk:
    desk = Desk()
    desk._memory.built = register
    return desk


@pytest.fixture(scope="module")
def register():
    return simulated_register(
        np.random.default_rng(4), per_year=60, years=7, yearly_hazard=[0.4, 0.2, 0.1], closing=CLOSING
    )


@pytest.fixture(scope="module")
def desk(register) -> Desk:
    return _desk(register)


def _answer(desk: Desk, task: str, **request) -> dict:
    answered = desk.answer(task, json.loads(json.dumps(request)))
    assert "refusal" not in answered, answered
    json.dumps(answered, allow_nan=False)
    return answered["answer"]


def _refusal(desk: Desk, task: str, **request) -> tuple[str, str | None]:
    refusal = desk.answer(task, request)["refusal"]
    return refusal["code"], refusal["field"]


def test_the_history_accounts_for_everybody(desk, register):
    told = _answer(desk, "caseload.history")
    assert sum(year["count"] for year in told["newcomers"]) == len(register)
    assert told["today"]["total"] == np.count_nonzero(register.outcome == 0)
    assert sum(row["count"] for row in told["today"]["by_duration"]) == told["today"]["total"]
    left = sum(row["exits"] for row in told["retention"]) + told["beyond"]["exits"]
    assert left + told["today"]["total"] == len(register)
    time = sum(row["person_years"] for row in told["retention"]) + told["beyond"]["person_years"]
    assert time == pytest.approx(register.person_days() / 365.25)
    for row in told["retention"]:
        assert [way["meaning"] for way in row["ways"]] == list(MEANINGS[1:])
        assert sum(way["share"] for way in row["ways"]) == pytest.approx(1)
        assert all(way["lower"] <= way["hazard"] <= way["upper"] for way in row["ways"])
    assert told["supported_years"] == told["retention"][-1]["to_years"]
    assert told["closing_date"] == "2021-12-31"


def test_the_projection_has_its_shape_and_adds_up(desk):
    told = _answer(
        desk,
        "caseload.project",
        years=4,
        newcomers={"basis": "history"},
        draws=300,
    )
    assert [year["ends"] for year in told["years"]] == [f"{year}-12-31" for year in range(2022, 2026)]
    course = told["baseline"]
    assert len(course["under_care"]) == 5
    assert all(len(course[name]) == 4 for name in ("patient_years", "newcomers", "deaths", "lost"))
    for year in range(4):
        left = sum(way["values"][year]["value"] for way in course["leaving"])
        after = course["under_care"][year]["value"] + course["newcomers"][year]["value"] - left
        assert after == pytest.approx(course["under_care"][year + 1]["value"])
        for name in ("under_care", "patient_years", "newcomers", "deaths"):
            band = course[name][year]
            assert 0 <= band["p95"][0] <= band["p80"][0] <= band["p80"][1] <= band["p95"][1]
            assert band["p95"][0] <= band["value"] <= band["p95"][1]
    assert len(told["tail"]["held_share"]) == 5
    assert (told["seed"], told["draws"]) == (1, 300)


def test_the_bare_request_is_enough(desk):
    told = _answer(desk, "caseload.project")
    assert len(told["years"]) == 5
    assert told["newcomers_per_year"]["model"] == "poisson"


def test_typed_newcomers_are_used_and_need_their_number(desk):
    told = _answer(desk, "caseload.project", newcomers={"basis": "typed", "per_year": 33}, draws=100)
    assert told["baseline"]["newcomers"][0]["value"] == pytest.approx(33)
    assert told["newcomers_per_year"]["model"] == "typed"
    assert _refusal(desk, "caseload.project", newcomers={"basis": "typed"}) == (
        "missing_field",
        "newcomers.per_year",
    )


def test_a_horizon_longer_than_the_history_is_said(desk):
    cautions = _answer(desk, "caseload.project", years=12, draws=100)["cautions"]
    codes = {caution["code"]: caution["parameters"] for caution in cautions}
    assert codes["horizon_beyond_history"]["years"] == 12
    assert codes["horizon_beyond_history"]["history_years"] == pytest.approx(7, abs=0.2)
    assert codes["hazard_held"]["share"] > 0.25


@pytest.mark.parametrize(
    ("request_", "refused"),
    [
        ({"years": 31}, ("out_of_range", "years")),
        ({"newcomers": {"basis": "guess"}}, ("not_one_of", "newcomers.basis")),
    ],
)
def test_nonsense_is_refused_by_its_field(desk, request_, refused):
    assert _refusal(desk, "caseload.project", **request_) == refused


def test_less_than_two_whole_years_cannot_be_projected_but_typed_newcomers_can():
    rows = [(day(2020, 7, 1) + 10 * i, 0, 100, "under_care") for i in range(50)]
    desk = _desk(cohort(rows, CLOSING))
    assert _refusal(desk, "caseload.project") == ("history_too_short", "newcomers.basis")
    told = _answer(desk, "caseload.project", newcomers={"basis": "typed", "per_year": 40}, draws=100)
    # Nobody ever left: everybody stays, and it is said.
    assert told["baseline"]["under_care"][-1]["value"] == pytest.approx(50 + 5 * 40)
    assert "no_exits_observed" in {caution["code"] for caution in told["cautions"]}
    history = _answer(desk, "caseload.history")
    assert history["newcomers_per_year"]["dispersion"] is None
    assert "history_too_short" in {caution["code"] for caution in history["cautions"]}


def test_a_register_of_old_cases_only_can_still_be_projected_with_typed_newcomers():
    opening = day(2020)
    rows = [(opening - 400 - i, 400 + i, 1000 + i, "under_care") for i in range(60)]
    desk = _desk(cohort(rows, CLOSING))
    told = _answer(desk, "caseload.project", newcomers={"basis": "typed", "per_year": 12}, draws=100)
    assert told["baseline"]["newcomers"][0]["value"] == pytest.approx(12)
    assert "old_cases_not_newcomers" in {
        caution["code"] for caution in _answer(desk, "caseload.history")["cautions"]
    }


def test_nobody_under_care_is_refused_for_the_future_but_not_for_the_past():
    desk = _desk(cohort([(day(2015) + 7 * i, 0, 200, "lost") for i in range(300)], CLOSING))
    assert _refusal(desk, "caseload.project") == ("nobody_under_care", None)
    assert _answer(desk, "caseload.history")["today"] == {"total": 0, "by_duration": []}


def test_no_register_is_refused():
    assert _refusal(Desk(), "caseload.history") == ("no_register", None)
    assert _refusal(Desk(), "caseload.project") == ("no_register", None)


def test_patients_under_care_but_long_unseen_are_said():
    rows = [(day(2015) + 20 * i, 0, CLOSING - day(2015) - 20 * i, "under_care") for i in range(90)]
    rows += [(day(2016) + 20 * i, 0, 60, "under_care") for i in range(30)]
    cautions = _answer(_desk(cohort(rows, CLOSING)), "caseload.history")["cautions"]
    said = {caution["code"]: caution["parameters"] for caution in cautions}
    assert said["under_care_long_unseen"] == {"count": 30, "share": 0.25, "days": 365}


def test_a_closing_date_on_29_february_goes_on_to_the_28th():
    rows = [(day(2015) + 20 * i, 0, 100, "under_care") for i in range(90)]
    told = _answer(_desk(cohort(rows, day(2020, 2, 29))), "caseload.project", years=4, draws=100)
    ends = [year["ends"] for year in told["years"]]
    assert ends == ["2021-02-28", "2022-02-28", "2023-02-28", "2024-02-29"]


def test_every_way_to_newcomers(desk):
    def newcomers(**asked):
        told = _answer(desk, "caseload.project", years=3, newcomers=asked, draws=100)
        return [band["value"] for band in told["baseline"]["newcomers"]], told

    typed, _ = newcomers(basis="typed", per_year=50, growth_percent=10)
    assert typed == pytest.approx([50, 55, 60.5])
    by_incidence, _ = newcomers(basis="incidence", incidence=25, population=200_000, growth_percent=10)
    assert by_incidence == pytest.approx(typed)
    trend, told = newcomers(basis="trend", damping=0.5)
    assert told["newcomers_per_year"]["model"] == "trend"
    assert trend[0] == pytest.approx(told["newcomers_per_year"]["mean"])
    assert "trend_damped" in {caution["code"] for caution in told["cautions"]}
    assert _refusal(desk, "caseload.project", newcomers={"basis": "incidence", "incidence": 3}) == (
        "missing_field",
        "newcomers.population",
    )


def test_an_incomplete_register_and_a_rule_for_the_tail(desk):
    whole = _answer(desk, "caseload.project", draws=100)
    part = _answer(desk, "caseload.project", draws=100, completeness=50)
    today = whole["baseline"]["under_care"][0]["value"]
    assert part["baseline"]["under_care"][0]["value"] == pytest.approx(2 * today)
    said = {caution["code"]: caution["parameters"] for caution in part["cautions"]}
    assert said["register_incomplete"] == {"completeness": 50, "count": pytest.approx(today)}
    ends = {
        rule: _answer(desk, "caseload.project", draws=100, tail=rule)["baseline"]["under_care"][-1]["value"]
        for rule in ("nobody", "halved", "held", "doubled")
    }
    assert list(ends) == sorted(ends, key=ends.get, reverse=True)
    assert _refusal(desk, "caseload.project", completeness=0) == ("out_of_range", "completeness")
    assert _refusal(desk, "caseload.project", tail="guess") == ("not_one_of", "tail")
