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


def _stratum(label, exposed_events, exposed_total, unexposed_events, unexposed_total):
    return {
        "label": label,
        "exposed_events": exposed_events,
        "exposed_total": exposed_total,
        "unexposed_events": unexposed_events,
        "unexposed_total": unexposed_total,
    }


def test_strata_worked_by_hand():
    # Within each stratum no difference (risks 0.4 and 0.1); lumped, (40+1)/110 against (4+10)/110.
    told = _answer(
        "counts.strata", strata=[_stratum("old", 40, 100, 4, 10), _stratum("young", 1, 10, 10, 100)]
    )
    old, young = told["rows"]
    assert (old["label"], old["unexposed_events"], old["unexposed_risk"]["value"]) == ("old", 4, 0.4)
    assert young["risk_ratio"]["value"] == pytest.approx(1)
    assert young["exposed_odds"] == pytest.approx(1 / 9)
    assert old["exact"]["p"] == pytest.approx(1)
    assert told["crude"]["risk_ratio"]["value"] == pytest.approx(41 / 14)
    assert told["pooled"]["risk_ratio"]["value"] == pytest.approx(1)
    assert told["pooled"]["odds_ratio"]["value"] == pytest.approx(1)
    assert told["pooled"]["risk_difference"]["value"] == pytest.approx(0)
    assert told["homogeneity"]["breslow_day_tarone"]["chi_squared"] == pytest.approx(0)
    assert told["left_out"] == []


def test_one_stratum_pooled_is_the_crude_one():
    told = _answer("counts.strata", strata=[_stratum("all", 12, 40, 5, 50)])
    for name in ("risk_ratio", "odds_ratio", "risk_difference"):
        assert told["pooled"][name]["value"] == pytest.approx(told["crude"][name]["value"])
    assert told["homogeneity"] == {"breslow_day_tarone": None, "woolf": None}


def test_a_stratum_that_says_nothing_is_left_out_by_name():
    told = _answer("counts.strata", strata=[_stratum("a", 3, 10, 2, 12), _stratum("b", 0, 0, 2, 9)])
    assert told["left_out"] == [{"stratum": 1, "label": "b", "code": "empty_group"}]
    assert told["rows"][1]["exposed_risk"]["value"] is None


def test_very_large_tables_need_no_exact_figures():
    told = _answer("counts.strata", strata=[_stratum("all", 10**6, 10**8, 10**6, 10**8)])
    assert told["rows"][0]["exact"] is None
    assert told["rows"][0]["risk_ratio"]["value"] == 1


@pytest.mark.parametrize(
    ("strata", "refused"),
    [
        ([], ("no_strata", "strata")),
        ([_stratum("a", 0, 0, 1, 5)], ("no_usable_strata", "strata")),
        (
            [_stratum("a", 1, 5, 1, 5), _stratum("b", 1, 5, 9, 5)],
            ("more_events_than_patients", "strata.1.unexposed_events"),
        ),
        ([_stratum("a", -1, 5, 1, 5)], ("out_of_range", "strata.0.exposed_events")),
    ],
)
def test_strata_that_cannot_be_are_refused_by_field(strata, refused):
    assert _refusal("counts.strata", strata=strata) == refused


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
