"""Scenarios beside the baseline: what they change, what they cost, which buys most."""

from __future__ import annotations

from collections.abc import Sequence
from dataclasses import dataclass, field
from typing import Annotated, Any, Literal

import numpy as np

from vitalroll.caseload.appraisal import Appraisal, appraise, best_share, break_even, price
from vitalroll.caseload.courses import redraw
from vitalroll.caseload.outlook import Measure, expected_course, prospect
from vitalroll.caseload.resources import cost_by_year, present_value
from vitalroll.caseload.scenario import Lever, Scenario
from vitalroll.caseload.sensitivity import one_way
from vitalroll.desk.coming_years import Setting, begin, years_ahead
from vitalroll.desk.fields import Between
from vitalroll.desk.memory import Memory
from vitalroll.desk.resource_tasks import Amount, AskedItem, read_items
from vitalroll.errors import Caution, Refusal
from vitalroll.outcomes.competing import WAYS_OF_LEAVING
from vitalroll.register.cohort import DEATHS

Kind = Literal[
    "fewer_newcomers",
    "risk_factor",
    "found_earlier",
    "fewer_lost",
    "fewer_deaths",
    "fewer_stopped",
    "more_completed",
]


@dataclass(frozen=True)
class AskedLever:
    """One lever; see ``caseload.scenario.Lever``."""

    kind: Kind
    percent: Annotated[float, Between(0, 1000)] = 0.0
    from_month: Annotated[int, Between(1, 360)] = 1
    ramp_months: Annotated[int, Between(0, 360)] = 0
    prevalence: Annotated[float, Between(0, 100)] = 0.0
    relative_risk: Annotated[float, Between(1, 1000)] = 1.0
    among_patients: bool = False
    months_earlier: Annotated[int, Between(0, 60)] = 0
    fewer_deaths_among: Annotated[float, Between(0, 100)] = 0.0
    cost_at_start: Amount = 0.0
    cost_per_year: Amount = 0.0


@dataclass(frozen=True)
class AskedScenario:
    """Several levers under one name."""

    name: str
    levers: tuple[AskedLever, ...]


@dataclass(frozen=True)
class LeversRequest(Setting):
    """Fields of ``caseload.levers``; ``sensitivity_of`` is the scenario looked at more closely, from 0."""

    scenarios: tuple[AskedScenario, ...] = ()
    items: tuple[AskedItem, ...] = ()
    discount: Annotated[float, Between(0, 100)] = 3.0
    budget: Annotated[float, Between(1e-9, 1e15)] = 100_000.0
    sensitivity_of: Annotated[int, Between(0, 99)] = 0


@dataclass(frozen=True)
class BreakEvenRequest(Setting):
    """Fields of ``caseload.break_even``: how strong a lever must be so that ``goal`` is ``target``."""

    lever: AskedLever = field(default_factory=lambda: AskedLever("fewer_lost"))
    goal: Literal["under_care", "lost", "deaths", "cost"] = "under_care"
    target: Annotated[float, Between(0, 1e15)] = 0.0
    items: tuple[AskedItem, ...] = ()
    discount: Annotated[float, Between(0, 100)] = 3.0


def levers(memory: Memory, request: LeversRequest, report: Any) -> dict[str, Any]:
    """Answer ``caseload.levers``: every scenario less the baseline, and which buys most.

    Bands as in ``caseload.project``, over the whole horizon; money is discounted to the closing date.

    Returns
    -------
    dict
        ``years`` [{year, ends}]; ``baseline`` {under_care [bands from today on], deaths, lost,
        patient_years, cost: one band each}; ``scenarios`` [{name, under_care [bands from today
        on], attributable_fractions [of each lever, null unless a risk factor], difference
        {under_care, patient_years, newcomers, deaths, lost, programme, care, cost: a band each},
        per_patient_year, per_death {value, band, gained}: null value when nothing is gained in
        expectation, null band when fewer than 95 % of the draws gain; best_for_patient_years,
        best_for_deaths: share of the draws in which the scenario gains most for ``budget``}];
        ``budget``; ``sensitivity`` {scenario, value, swings [{what, low, high, at_low, at_high}]}
        of the cost per patient-year gained; ``draws``, ``seed``; ``cautions``.

    Refusals: those of ``coming_years.begin``; ``no_scenarios`` (scenarios); those of ``Scenario``
    (scenarios.N.levers.M.field).

    Cautions: those of ``coming_years.begin``; ``lead_time_counts`` (name): patients found earlier are
    under care for longer without living longer; ``deaths_outside_unseen`` (name): whoever is kept in
    care dies in care, and deaths after leaving are in no count; ``scenario_free`` (name): no cost of
    its own.
    """
    if not request.scenarios:
        raise Refusal("no_scenarios", field="scenarios")
    scenarios = [
        read_scenario(each, f"scenarios.{position}") for position, each in enumerate(request.scenarios)
    ]
    start = begin(memory, request)
    items = read_items(request.items)
    found = prospect(
        start.today,
        start.hazards,
        start.inflow,
        years=request.years,
        times_today=start.times_today,
        scenarios=scenarios,
        draws=request.draws,
        seed=request.seed,
        report=report,
    )
    appraisals = [
        appraise(found.baseline, other, scenario, items, discount=request.discount)
        for other, scenario in zip(found.scenarios, scenarios, strict=True)
    ]
    best_years = _best(appraisals, lambda each: each.patient_years.drawn, request.budget)
    best_deaths = _best(appraisals, lambda each: -each.deaths.drawn, request.budget)
    looked_at = min(request.sensitivity_of, len(scenarios) - 1)
    value, swings = one_way(
        start.today,
        start.hazards,
        start.inflow,
        scenarios[looked_at],
        items,
        years=request.years,
        times_today=start.times_today,
        discount=request.discount,
    )
    cost = found.baseline.measure(lambda course: cost_by_year(items, course))
    return {
        "years": years_ahead(start.closing, request.years),
        "baseline": {
            "under_care": found.baseline.under_care.bands(),
            "deaths": found.baseline.deaths.total().bands()[0],
            "lost": found.baseline.leaving("lost").total().bands()[0],
            "patient_years": found.baseline.patient_years.total().bands()[0],
            "cost": Measure(
                np.atleast_1d(present_value(cost.expected, request.discount)),
                present_value(cost.drawn, request.discount)[:, np.newaxis],
            ).bands()[0],
        },
        "scenarios": [
            {
                "name": scenario.name,
                "under_care": other.under_care.bands(),
                "attributable_fractions": [
                    lever.attributable_fraction if lever.kind == "risk_factor" else None
                    for lever in scenario.levers
                ],
                "difference": {name: measure.bands(least=None)[0] for name, measure in vars(found_).items()},
                "per_patient_year": price(found_.cost, found_.patient_years),
                "per_death": price(found_.cost, _minus(found_.deaths)),
                "best_for_patient_years": best_years[position],
                "best_for_deaths": best_deaths[position],
            }
            for position, (scenario, other, found_) in enumerate(
                zip(scenarios, found.scenarios, appraisals, strict=True)
            )
        ],
        "budget": request.budget,
        "sensitivity": {"scenario": looked_at, "value": value, "swings": swings},
        "draws": request.draws,
        "seed": request.seed,
        "cautions": [*start.cautions, *_cautions(scenarios)],
    }


def find_break_even(memory: Memory, request: BreakEvenRequest, report: Any) -> dict[str, Any]:
    """Answer ``caseload.break_even``: how strong a lever must be so that a target is reached.

    Returns
    -------
    dict
        ``percent`` (null when no percentage reaches the target); ``target``; ``goal``; ``at_none``,
        ``at_most``: what 0 and the greatest percentage give; ``most``; ``reached_in``: share of the
        draws that reach the target or do better (less is better) at ``percent``, null without one;
        ``ends``: the day the horizon ends.

    ``goal``: patients under care at the end, losses, deaths or discounted cost over the whole time.
    Refusals: those of ``coming_years.begin`` and ``Scenario``; ``lever_makes_no_difference`` (lever.kind).
    """
    start = begin(memory, request)
    items = read_items(request.items)
    lever = Lever(**vars(request.lever))
    Scenario("", (_refused_as(lever, "lever"),))
    most = 300.0 if lever.kind == "more_completed" else 100.0

    def measured(course: Any) -> np.ndarray:
        if request.goal == "under_care":
            return course.under_care[..., -1]
        if request.goal == "cost":
            return present_value(cost_by_year(items, course), request.discount)
        ways = ("lost",) if request.goal == "lost" else DEATHS
        return course.leaving[..., [WAYS_OF_LEAVING.index(way) for way in ways]].sum(axis=(-1, -2))

    def reached(tried: Lever) -> float:
        scenario = Scenario("", (tried,))
        return float(
            measured(
                expected_course(
                    start.today,
                    start.hazards,
                    start.inflow,
                    years=request.years,
                    scenario=scenario,
                    times_today=start.times_today,
                )
            )
        )

    try:
        percent, at_none, at_most = break_even(lever, request.target, reached, most=most)
    except Refusal as refusal:
        refusal.field = f"lever.{refusal.field}"
        raise
    share = None
    if percent is not None:
        tried = Lever(**(vars(lever) | {"percent": percent}))
        drawn = redraw(
            start.today,
            start.hazards,
            start.inflow,
            years=request.years,
            times_today=start.times_today,
            scenarios=[Scenario("", (tried,))],
            draws=request.draws,
            seed=request.seed,
            report=report,
        )[1]
        share = float(np.mean(measured(drawn) <= request.target))
    return {
        "percent": percent,
        "goal": request.goal,
        "target": request.target,
        "at_none": at_none,
        "at_most": at_most,
        "most": most,
        "reached_in": share,
        "ends": years_ahead(start.closing, request.years)[-1]["ends"],
        "cautions": list(start.cautions),
    }


def read_scenario(asked: AskedScenario, field: str) -> Scenario:
    """Return the scenario asked for, a refusal naming its field."""
    try:
        return Scenario(asked.name, tuple(Lever(**vars(lever)) for lever in asked.levers))
    except Refusal as refusal:
        refusal.field = f"{field}.{refusal.field}"
        raise


def _refused_as(lever: Lever, field: str) -> Lever:
    lever.check(field)
    return lever


def _minus(measure: Measure) -> Measure:
    return Measure(-measure.expected, -measure.drawn)


def _best(appraisals: Sequence[Appraisal], gain: Any, budget: float) -> np.ndarray:
    gains = np.stack([gain(each)[:, 0] for each in appraisals])
    return best_share(gains, np.stack([each.cost.drawn[:, 0] for each in appraisals]), budget)


def _cautions(scenarios: Sequence[Scenario]) -> list[Caution]:
    cautions = []
    for scenario in scenarios:
        if any(lever.kind == "found_earlier" for lever in scenario.levers):
            cautions.append(Caution("lead_time_counts", {"name": scenario.name}))
        if any(lever.kind in ("fewer_lost", "fewer_stopped") for lever in scenario.levers):
            cautions.append(Caution("deaths_outside_unseen", {"name": scenario.name}))
        if not any(lever.cost_at_start or lever.cost_per_year for lever in scenario.levers):
            cautions.append(Caution("scenario_free", {"name": scenario.name}))
    return cautions


TASKS = {
    "caseload.levers": (LeversRequest, levers),
    "caseload.break_even": (BreakEvenRequest, find_break_even),
}
