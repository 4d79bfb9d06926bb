"""Levers: what they multiply, from when, and what is refused."""

from __future__ import annotations

import math

import numpy as np
import pytest

from vitalroll.caseload.scenario import Lever, Scenario
from vitalroll.errors import Refusal
from vitalroll.outcomes.competing import WAYS_OF_LEAVING
from vitalroll.register.cohort import DEATHS


def _kept(*levers: Lever, months: int = 1) -> dict[str, float]:
    return dict(zip(WAYS_OF_LEAVING, Scenario("", levers).over(months).hazards[-1], strict=True))


def test_only_the_hazards_named_are_multiplied():
    kept = _kept(Lever("fewer_lost", 30), Lever("fewer_deaths", 100), Lever("more_completed", 50))
    assert kept.pop("lost") == pytest.approx(0.7)
    assert [kept.pop(death) for death in DEATHS] == [0, 0, 0]
    assert kept.pop("recovered") == 1.5
    assert set(kept.values()) == {1.0}
    assert _kept(Lever("fewer_stopped", 10))["stopped"] == pytest.approx(0.9)


def test_levers_of_one_kind_multiply():
    # Tracing halves losses, reminders halve what remains.
    assert _kept(Lever("fewer_lost", 50), Lever("fewer_lost", 50))["lost"] == pytest.approx(0.25)


def test_a_ramp_grows_evenly_to_its_full_effect():
    lever = Lever("fewer_newcomers", 40, from_month=3, ramp_months=4)
    kept = Scenario("", (lever,)).over(8).newcomers
    assert kept.tolist() == pytest.approx([1, 1, 0.9, 0.8, 0.7, 0.6, 0.6, 0.6])


def test_a_risk_factor_acts_through_its_attributable_fraction():
    # Levin: p 0.4, RR 3: 0.8/1.8 = 0.444; Miettinen with p 0.6 among patients: 0.6 x 2/3 = 0.4.
    levin = Lever("risk_factor", 50, prevalence=40, relative_risk=3)
    assert levin.attributable_fraction == pytest.approx(0.8 / 1.8)
    assert Scenario("", (levin,)).over(1).newcomers[0] == pytest.approx(1 - 0.5 * 0.8 / 1.8)
    miettinen = Lever("risk_factor", 50, prevalence=60, relative_risk=3, among_patients=True)
    assert miettinen.attributable_fraction == pytest.approx(0.4)


def test_both_attributable_fractions_agree_when_nothing_confounds():
    # With prevalence p in the population, p RR/(1 + p(RR - 1)) of the patients are exposed.
    p, ratio = 0.22, 2.6
    among = p * ratio / (1 + p * (ratio - 1))
    levin = Lever("risk_factor", 100, prevalence=100 * p, relative_risk=ratio)
    miettinen = Lever("risk_factor", 100, prevalence=100 * among, relative_risk=ratio, among_patients=True)
    assert levin.attributable_fraction == pytest.approx(miettinen.attributable_fraction)


def test_the_programme_costs_from_its_first_month_on():
    tracing = Lever("fewer_lost", 10, from_month=7, cost_at_start=500, cost_per_year=1200)
    training = Lever("fewer_deaths", 10, from_month=25, cost_at_start=90)
    assert Scenario("", (tracing, training)).money(3).tolist() == pytest.approx([500 + 600, 1200, 1290])


@pytest.mark.parametrize("kind", ["fewer_newcomers", "fewer_lost", "fewer_deaths", "more_completed"])
@pytest.mark.parametrize("given", [-1, 1000.5, math.nan])
def test_an_impossible_percentage_is_refused_by_its_field(kind, given):
    with pytest.raises(Refusal) as refused:
        Scenario("", (Lever("fewer_lost", 5), Lever(kind, given)))
    assert (refused.value.code, refused.value.field) == ("out_of_range", "levers.1.percent")


@pytest.mark.parametrize(
    ("lever", "field"),
    [
        (Lever("fewer_lost", 5, from_month=0), "from_month"),
        (Lever("risk_factor", 5, relative_risk=0.5), "relative_risk"),
        (Lever("risk_factor", 5, prevalence=101), "prevalence"),
        (Lever("found_earlier", 5), "months_earlier"),
    ],
)
def test_an_impossible_lever_is_refused_by_its_field(lever, field):
    with pytest.raises(Refusal) as refused:
        Scenario("", (lever,))
    assert refused.value.field == f"levers.0.{field}"


def test_patients_are_found_earlier_once():
    with pytest.raises(Refusal, match="found_earlier_twice"):
        Scenario("", (Lever("found_earlier", 5, months_earlier=3),) * 2)
    with pytest.raises(Refusal, match="not_one_of"):
        Scenario("", (Lever("magic", 5),))
    with pytest.raises(Refusal, match="out_of_range"):
        Scenario("", (Lever("fewer_lost", 5, cost_per_year=-1),))


def test_without_levers_nothing_changes():
    kept = Scenario("").over(6)
    assert np.all(kept.newcomers == 1)
    assert np.all(kept.hazards == 1)
    assert not kept.found_early.any()
