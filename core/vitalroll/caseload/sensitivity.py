"""Which of the things assumed moves the answer most: one changed at a time, the others held."""

from __future__ import annotations

from collections.abc import Callable, Sequence
from dataclasses import dataclass, replace

import numpy as np

from vitalroll.caseload.courses import Course
from vitalroll.caseload.inflow import Inflow
from vitalroll.caseload.outlook import expected_course
from vitalroll.caseload.projection import patient_years_by_year
from vitalroll.caseload.resources import Item, cost_by_year, present_value
from vitalroll.caseload.retention import Retention
from vitalroll.caseload.scenario import Scenario
from vitalroll.outcomes.competing import WAYS_OF_LEAVING
from vitalroll.outcomes.person_time import poisson_limits
from vitalroll.register.cohort import DEATHS

COST_LOW, COST_HIGH = 0.8, 1.2
EFFECT_LOW, EFFECT_HIGH = 0.5, 1.5
DISCOUNT_LOW, DISCOUNT_HIGH = 0.0, 5.0


@dataclass(frozen=True)
class Swing:
    """What the answer becomes at the two ends of one assumption.

    ``low`` and ``high`` are the assumption's ends, in its own unit; ``at_low`` and ``at_high`` the
    answer there, NaN when nothing is gained.
    """

    what: str
    low: float
    high: float
    at_low: float
    at_high: float


def cost_per_patient_year(
    today: np.ndarray,
    hazards: Retention,
    inflow: Inflow,
    scenario: Scenario,
    items: Sequence[Item],
    *,
    years: int,
    discount: float,
    times_today: float = 1.0,
) -> float:
    """Return the expected money for each patient-year gained; NaN when none is gained."""
    before, after = (
        expected_course(today, hazards, inflow, years=years, scenario=each, times_today=times_today)
        for each in (None, scenario)
    )

    def money(course: Course) -> float:
        return float(present_value(cost_by_year(items, course), discount))

    gained = float(np.sum(patient_years_by_year(after.under_care) - patient_years_by_year(before.under_care)))
    spent = money(after) - money(before) + float(present_value(scenario.money(years), discount))
    return spent / gained if gained > 1e-9 else float("nan")


def one_way(
    today: np.ndarray,
    hazards: Retention,
    inflow: Inflow,
    scenario: Scenario,
    items: Sequence[Item],
    *,
    years: int,
    discount: float,
    times_today: float = 1.0,
) -> tuple[float, list[Swing]]:
    """Change one assumption at a time and return the cost per patient-year as it is and each swing.

    Newcomers and the hazards of dying, loss and completion go to their 95 % limits (Garwood 1936);
    the effect of the levers to half and to one and a half times what was assumed; costs of care and
    of the programme by 20 % down and up; the discount to 0 and 5 %. The widest swing comes first;
    swings that are not defined come last.
    """
    asked = {"years": years, "discount": discount, "times_today": times_today}
    base = cost_per_patient_year(today, hazards, inflow, scenario, items, **asked)

    def swing(what: str, ends: tuple[float, float], at: Callable[[float], float]) -> Swing:
        return Swing(what, *ends, *(at(end) for end in ends))

    swings = []
    rate = inflow.per_year
    if inflow.trend is None and rate.value > 0 and rate.lower < rate.upper:
        swings.append(
            swing(
                "newcomers",
                (rate.lower, rate.upper),
                lambda mean: cost_per_patient_year(
                    today,
                    hazards,
                    replace(inflow, per_year=replace(rate, value=mean)),
                    scenario,
                    items,
                    **asked,
                ),
            )
        )
    for what, ways in (("deaths", DEATHS), ("lost", ("lost",)), ("completed", ("recovered",))):
        columns = [WAYS_OF_LEAVING.index(way) for way in ways]
        seen = float(hazards.exits[:, columns].sum())
        if seen == 0:
            continue
        ends = tuple(float(limit) / seen for limit in poisson_limits(seen))
        swings.append(
            swing(
                what,
                ends,
                lambda ratio, columns=columns: cost_per_patient_year(
                    today, _scaled(hazards, columns, ratio), inflow, scenario, items, **asked
                ),
            )
        )
    swings.append(
        swing(
            "effect",
            (EFFECT_LOW, EFFECT_HIGH),
            lambda ratio: cost_per_patient_year(
                today, hazards, inflow, _stronger(scenario, ratio), items, **asked
            ),
        )
    )
    if any(item.unit_cost for item in items):
        swings.append(
            swing(
                "unit_costs",
                (COST_LOW, COST_HIGH),
                lambda ratio: cost_per_patient_year(
                    today,
                    hazards,
                    inflow,
                    scenario,
                    [replace(item, unit_cost=ratio * item.unit_cost) for item in items],
                    **asked,
                ),
            )
        )
    if scenario.money(years).any():
        swings.append(
            swing(
                "programme",
                (COST_LOW, COST_HIGH),
                lambda ratio: cost_per_patient_year(
                    today, hazards, inflow, _dearer(scenario, ratio), items, **asked
                ),
            )
        )
    swings.append(
        swing(
            "discount",
            (DISCOUNT_LOW, DISCOUNT_HIGH),
            lambda percent: cost_per_patient_year(
                today, hazards, inflow, scenario, items, **(asked | {"discount": percent})
            ),
        )
    )
    return base, sorted(swings, key=_width, reverse=True)


def _width(swing: Swing) -> float:
    width = abs(swing.at_high - swing.at_low)
    return width if np.isfinite(width) else -1.0


def _scaled(hazards: Retention, columns: list[int], ratio: float) -> Retention:
    exits = hazards.exits.astype(float)
    exits[:, columns] *= ratio
    return replace(hazards, exits=exits)


def _stronger(scenario: Scenario, ratio: float) -> Scenario:
    levers = tuple(
        replace(
            lever,
            percent=ratio * lever.percent
            if lever.kind == "more_completed"
            else min(100.0, ratio * lever.percent),
        )
        for lever in scenario.levers
    )
    return replace(scenario, levers=levers)


def _dearer(scenario: Scenario, ratio: float) -> Scenario:
    levers = tuple(
        replace(lever, cost_at_start=ratio * lever.cost_at_start, cost_per_year=ratio * lever.cost_per_year)
        for lever in scenario.levers
    )
    return replace(scenario, levers=levers)
