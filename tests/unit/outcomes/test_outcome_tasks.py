"""The tasks behind the Outcomes place, through the desk's door."""

import json
from itertools import pairwise

import numpy as np
import pytest

from vitalroll.desk.door import Desk
from vitalroll.numbers import DAYS_PER_YEAR
from vitalroll.outcomes.product_limit import product_limit
from vitalroll.outcomes.risk_table import risk_table
from vitalroll.register.cohort import DEATHS, MEANINGS, Categorical, Cohort


@pytest.fixture
def ask():
    """Ask a desk about a cohort; the answer has been through JSON."""

    def asking(cohort, task, **request):
        desk = Desk()
        desk._memory.built = cohort
        return json.loads(json.dumps(desk.answer(f"outcomes.{task}", request), allow_nan=False))

    return asking


@pytest.fixture(scope="module")
def clinic():
    """600 patients over eight years, some lost, a few entering late, in two groups."""
    rng = np.random.default_rng(11)
    n, closing = 600, 730_000 + 2900
    start = 730_000 + rng.integers(0, 2500, n)
    exit = np.minimum(rng.exponential(2500, n).astype(int) + 1, closing - start)
    under_care = exit == closing - start
    return Cohort(
        entry=np.where(rng.random(n) < 0.1, exit // 3, 0),
        exit=exit,
        outcome=np.where(under_care, 0, rng.integers(1, len(MEANINGS), n)),
        start=start,
        line=np.arange(n) + 2,
        closing=closing,
        covariates={"c3": Categorical("Arm", ("old", "new"), rng.integers(0, 2, n))},
    )


def codes(reply):
    return [(caution["code"], caution["parameters"].get("level")) for caution in reply["answer"]["cautions"]]


def test_survival_answers_what_the_room_computes(ask, clinic):
    """Every array is the curve's own, and every entry where it changes is there."""
    reply = ask(clinic, "survival", years=[1, 5])["answer"]
    table = risk_table(clinic)
    curve = product_limit(table, DEATHS)
    shown = reply["curves"][0]
    assert shown["level"] is None
    assert (shown["n"], shown["events"], shown["censored"]) == (600, curve.events, curve.censored)
    assert shown["time"][0] == 0
    assert shown["survival"][0] == 1
    changing = np.append(np.diff(curve.survival) != 0, True)
    position = np.searchsorted(curve.time, shown["time"][1:], side="right") - 1
    assert set(curve.time[1:][changing[:-1]]) <= set(shown["time"])
    for name in ("at_risk", "events_at", "survival", "standard_error", "lower", "upper"):
        assert shown[name][1:] == getattr(curve, name)[position].tolist()
    assert shown["last_time"] == shown["time"][-1] == clinic.exit.max()
    assert shown["person_years"] == clinic.person_days() / DAYS_PER_YEAR
    assert shown["rate"]["value"] == pytest.approx(shown["events"] / shown["person_years"])
    at = curve.at(5 * DAYS_PER_YEAR)
    assert shown["at_years"][1] == {
        "years": 5,
        "at_risk": int(((clinic.entry < 1826.25) & (clinic.exit >= 1826.25)).sum()),
        "beyond_follow_up": False,
        "since_days": 0,
        "estimate": {
            "value": at.value,
            "lower": at.lower,
            "upper": at.upper,
            "standard_error": at.standard_error,
        },
    }
    bound = shown["losses"]["bounds"][1]
    assert bound["all_died"] < at.value < bound["none_died"]
    well_supported = [t for t in range(shown["last_time"] + 1) if table.at_risk_on(np.array([t]))[0] >= 10]
    assert shown["stop_time"] == max(t for t in well_supported if t in table.time)


def test_censor_marks_stand_where_somebody_was_censored(ask, cohort_of):
    """On the curve, once per day."""
    curve = ask(cohort_of([2, 3, 3, 5, 7], "d++d+"), "survival")["answer"]["curves"][0]
    assert curve["censor_time"] == [3, 7]
    assert curve["censor_survival"] == pytest.approx([0.8, 0.4])


def test_the_table_at_risk_accounts_for_everybody(ask, clinic):
    """At risk, events and censored before each time add up to those who had entered."""
    reply = ask(clinic, "survival", group="c3")["answer"]
    assert reply["table_times"] == list(range(8))
    for row, level in zip(reply["table"], (0, 1), strict=True):
        inside = clinic.covariates["c3"].codes == level
        entered = [
            int((inside & ((clinic.entry < year * DAYS_PER_YEAR) | (clinic.entry == 0))).sum())
            for year in reply["table_times"]
        ]
        total = np.array(row["at_risk"]) + row["events"] + row["censored"]
        assert total.tolist() == entered


@pytest.mark.parametrize(("last", "times"), [(300, 4), (800, 3), (6000, 9), (20000, 11)])
def test_the_table_at_risk_has_round_times_within_follow_up(ask, cohort_of, last, times):
    """A handful of columns, whatever the length of follow-up."""
    found = ask(cohort_of([10, last], "d+"), "survival")["answer"]["table_times"]
    assert len(found) == times
    assert found[0] == 0
    assert found[-1] * DAYS_PER_YEAR <= last


def test_groups_add_up(ask, clinic):
    """Two curves with their levels; together they hold everybody."""
    curves = ask(clinic, "survival", group="c3")["answer"]["curves"]
    assert [curve["level"] for curve in curves] == ["old", "new"]
    assert sum(curve["n"] for curve in curves) == 600


def test_times_beyond_follow_up_are_said_to_be(ask, cohort_of):
    """Null, with the reason beside it."""
    reply = ask(cohort_of([100, 400], "d+"), "survival", years=[1, 30])
    early, late = reply["answer"]["curves"][0]["at_years"]
    assert (early["beyond_follow_up"], late["beyond_follow_up"]) == (False, True)
    assert late["estimate"]["value"] is None
    path = "curves.0.at_years.1.estimate.value"
    assert {"path": path, "at": None, "reason": "not_a_number"} in reply["nulls"]


def test_a_curve_that_came_down_to_zero_stays_there(ask, cohort_of):
    """All had died by then: that is known, not beyond follow-up."""
    late = ask(cohort_of([100, 400], "dd"), "survival", years=[30])["answer"]["curves"][0]["at_years"][0]
    assert (late["beyond_follow_up"], late["estimate"]["value"]) == (False, 0)


def test_a_group_that_was_lost_entirely_has_bounds_only(ask, cohort_of):
    """No estimate is given; the bounds are from nothing to everything."""
    cohort = cohort_of([100] * 12 + [2000] * 12, "l" * 12 + "+" * 12, groups=["a"] * 12 + ["b"] * 12)
    reply = ask(cohort, "survival", group="c0", years=[1])
    lost = reply["answer"]["curves"][0]
    assert lost["survival"] == [1]
    assert lost["censor_time"] == []
    assert lost["at_years"][0]["estimate"]["value"] is None
    assert lost["losses"]["share"] == 1
    assert (lost["losses"]["bounds"][0]["all_died"], lost["losses"]["bounds"][0]["none_died"]) == (0, 1)
    assert ("all_lost", "a") in codes(reply)
    assert ("no_events", "b") in codes(reply)


def test_all_rows_censored(ask, cohort_of):
    """Survival is 1 with a lower limit, and it is said that nothing happened."""
    reply = ask(cohort_of([500] * 30, "+" * 30), "survival", years=[1])
    estimate = reply["answer"]["curves"][0]["at_years"][0]["estimate"]
    assert (estimate["value"], estimate["upper"]) == (1, 1)
    assert estimate["lower"] == pytest.approx(0.025 ** (1 / 30))
    assert codes(reply) == [("no_events", None)]


def test_few_patients_and_few_at_risk_are_said(ask, cohort_of):
    """Below ten."""
    assert ("few_patients", None) in codes(ask(cohort_of([500] * 9, "d" + "+" * 8), "survival"))
    reply = ask(cohort_of([500] * 9 + [300] * 5, "d" + "+" * 13), "survival", years=[1])
    assert reply["answer"]["cautions"] == [
        {"code": "few_at_risk", "parameters": {"level": None, "years": 1, "at_risk": 9}}
    ]


def test_many_lost_is_said(ask, cohort_of):
    """More than a fifth; and when being lost is the outcome, that instead."""
    cohort = cohort_of([500] * 20, "l" * 5 + "d" + "+" * 14)
    assert codes(ask(cohort, "survival", years=[1])) == [("many_lost", None)]
    assert codes(ask(cohort, "survival", years=[1], interest=["lost"])) == [("lost_is_of_interest", None)]


def test_a_last_death_alone_is_said(ask, cohort_of):
    """The curve goes to zero because of one patient."""
    assert ("last_at_risk_had_event", None) in codes(ask(cohort_of(range(1, 14), "d" * 13), "survival"))


def test_life_table_accounts_for_everybody(ask, clinic):
    """Who enters an interval is who was left by the one before."""
    reply = ask(clinic, "life_table", step="quarter")["answer"]
    rows = reply["tables"][0]["rows"]
    assert reply["step"] == "quarter"
    for before, after in pairwise(rows):
        left = before["lost"] + before["withdrawn"] + before["events"]
        assert after["entering"] == before["entering"] + before["joined"] - left
    assert sum(row["events"] for row in rows) == np.isin(clinic.outcome, [1, 2, 3]).sum()


def test_leaving_adds_up_to_one(ask, clinic):
    """For each entry handed over, thinned or not; and the wrong figure is never smaller."""
    for group in ask(clinic, "leaving", group="c3")["answer"]["groups"]:
        total = np.array(group["under_care"])
        for way in group["ways"]:
            total = total + way["incidence"]
            for right, wrong in zip(way["at_years"], way["one_minus_survival_at_years"], strict=True):
                assert wrong >= right["value"] - 1e-12
        assert total == pytest.approx(1, abs=1e-12)
        assert len(group["ways"]) == 7
        assert len(group["time"]) <= 400
        assert group["time"][0] == 0
        assert [row["years"] for row in group["table"]] == [1, 3, 5]


def test_leaving_names_only_ways_that_occurred_in_some_group(ask, cohort_of):
    """The same ways in every group, so that they can be set side by side."""
    cohort = cohort_of([1, 2, 3, 4], "d++l", groups=["a", "a", "b", "b"])
    groups = ask(cohort, "leaving", group="c0")["answer"]["groups"]
    for group in groups:
        assert [way["meaning"] for way in group["ways"]] == ["died_of_disease", "lost"]


@pytest.mark.parametrize(
    ("request_", "code", "field"),
    [
        ({"interest": []}, "no_outcome_of_interest", "interest"),
        ({"interest": ["under_care"]}, "under_care_is_not_an_outcome", "interest"),
        ({"confidence": 95}, "out_of_range", "confidence"),
        ({"interval": "arcsine"}, "not_one_of", "interval"),
        ({"years": [1, -2]}, "out_of_range", "years.1"),
        ({"yeers": [1]}, "unknown_field", "yeers"),
    ],
)
def test_requests_that_make_no_sense_are_refused_by_field(ask, clinic, request_, code, field):
    """By name, never by a traceback."""
    refusal = ask(clinic, "survival", **request_)["refusal"]
    assert (refusal["code"], refusal["field"]) == (code, field)


@pytest.mark.parametrize("task", ["survival", "life_table", "leaving"])
def test_every_task_refuses_what_cannot_be_described(ask, cohort_of, task):
    """No register, one patient, five hundred groups."""
    assert ask(None, task)["refusal"]["code"] == "no_register"
    assert ask(cohort_of([5], "d"), task)["refusal"]["code"] == "one_patient"
    many = cohort_of([5] * 1000, "d" * 1000, groups=[str(i // 2) for i in range(1000)])
    assert ask(many, task, group="c0")["refusal"]["code"] == "too_many_groups"
