"""The tasks behind From counts, through the desk's door."""

from __future__ import annotations

import json

import pytest

from vitalroll.desk.door import Desk


def _answer(task: str, **request) -> dict:
    answered = Desk().answer(task, json.loads(json.dumps(request)))
    assert "refusal" not in answered, answered
    json.dumps(answered, allow_nan=False)
    return answered["answer"]


def _refusal(task: str, **request) -> tuple[str, str | None]:
    refusal = Desk().answer(task, request)["refusal"]
    return refusal["code"], refusal["field"]


def test_a_typed_life_table():
    # Cutler & Ederer (1958), 126 patients: S(5) = 0.44 (from memory; recomputed by hand).
    rows = [
        {"width_years": 1, "lost": lost, "withdrawn": withdrawn, "events": events}
        for lost, withdrawn, events in zip((4, 6, 0, 2, 0), (15, 11, 15, 7, 6), (47, 5, 2, 2, 0), strict=True)
    ]
    told = _answer("counts.life_table", entering=126, rows=rows)
    assert [row["entering"] for row in told["rows"]] == [126, 60, 38, 21, 10]
    assert told["rows"][0]["effective"] == 116.5
    assert told["rows"][-1]["survival"]["value"] == pytest.approx(0.44, abs=0.005)
    assert told["rows"][-1]["survival"]["standard_error"] == pytest.approx(0.060, abs=0.0005)


def test_a_typed_life_table_is_refused_by_row():
    row = {"width_years": 1, "lost": 0, "withdrawn": 0, "events": 12}
    assert _refusal("counts.life_table", entering=10, rows=[row])[0] == "more_left_than_entered"
    assert _refusal("counts.life_table", entering=10, rows=[]) == ("no_rows", "rows")


LEAVING = [{"label": "died", "per_year": 10}, {"label": "lost <b>", "per_year": 30}]


def test_a_balance_from_counts():
    counts = {"prevalent": 200, "new_per_year": 50, "leaving": LEAVING, "population": 100_200}
    told = _answer("counts.balance", **counts, years=2, places=300)
    assert [point["under_care"] for point in told["path"]] == [200, 210, 220]
    assert told["leaving_per_year"] == 40
    assert told["leaving"][1] == {"label": "lost <b>", "per_year": 30, "share": 0.75, "turnover": 15}
    assert told["steady_state"] == 250
    assert told["occupancy"]["mean"] == 250
    assert told["occupancy"]["utilisation"] == pytest.approx(250 / 300)
    assert told["incidence_per_100000"] == pytest.approx(50)


def test_too_few_places_are_a_caution_beside_the_balance():
    told = _answer("counts.balance", prevalent=200, new_per_year=50, leaving=LEAVING, places=240)
    assert told["occupancy"] is None
    said = {caution["code"]: caution["parameters"] for caution in told["cautions"]}
    assert said["utilisation_at_or_above_one"]["needed"] == 250


def test_a_balance_without_leaving_has_no_steady_state():
    counts = {"prevalent": 20, "new_per_year": 5, "leaving": [], "places": 9}
    answered = Desk().answer("counts.balance", counts)
    assert answered["answer"]["steady_state"] is None
    assert {"path": "steady_state", "at": None, "reason": "plus_infinity"} in answered["nulls"]
    assert answered["answer"]["occupancy"] is None


def test_balances_that_cannot_be_are_refused():
    assert _refusal("counts.balance", prevalent=0, new_per_year=5, leaving=[]) == (
        "nobody_under_care",
        "prevalent",
    )
    fewer = [{"label": "x", "per_year": -1}]
    assert _refusal("counts.balance", prevalent=5, new_per_year=5, leaving=fewer) == (
        "out_of_range",
        "leaving.0.per_year",
    )
    assert _refusal("counts.balance", prevalent=5, new_per_year=5, leaving=LEAVING, places=0) == (
        "out_of_range",
        "places",
    )
