"""What became of the patients: the tasks behind the Outcomes place."""

from __future__ import annotations

from collections.abc import Iterable
from dataclasses import dataclass
from typing import Annotated, Any

import numpy as np

from vitalroll.desk.fields import Between
from vitalroll.desk.memory import Memory
from vitalroll.errors import Caution
from vitalroll.numbers import DAYS_PER_YEAR, NOT_GIVEN
from vitalroll.outcomes.actuarial import MANY_LOST, Step, life_table
from vitalroll.outcomes.competing import WAYS_OF_LEAVING, Leaving, as_if_others_were_censored, leaving
from vitalroll.outcomes.follow_up import follow_up_median
from vitalroll.outcomes.groups import groups_of
from vitalroll.outcomes.limits import Interval
from vitalroll.outcomes.losses import Losses, losses_by
from vitalroll.outcomes.person_time import event_rate
from vitalroll.outcomes.product_limit import SurvivalCurve, product_limit
from vitalroll.outcomes.quantiles import TimeQuantile, time_quantile
from vitalroll.outcomes.risk_table import RiskTable
from vitalroll.outcomes.stretches import Span
from vitalroll.register.cohort import DEATHS

FEW_AT_RISK = 10
"""Below this number at risk a curve is not to be leaned on."""

_MOST_ENTRIES = 400
"""Entries of an incidence curve: every way has one array for each limit, and paper shows no more."""

_TABLE_STEPS = ((0.25, 2), (1, 16), (2, 32), (5, 80), (10, float("inf")))
"""Years between the columns of the table at risk, for follow-up shorter than so many years."""

Years = tuple[Annotated[float, Between(0, 150)], ...]
Confidence = Annotated[float, Between(0.5, 0.9999)]


@dataclass(frozen=True)
class SurvivalRequest:
    """Fields of ``outcomes.survival``."""

    interest: tuple[str, ...] = DEATHS
    group: str | None = None
    years: Years = (1.0, 3.0, 5.0)
    interval: Interval = "log-log"
    confidence: Confidence = 0.95


@dataclass(frozen=True)
class LifeTableRequest:
    """Fields of ``outcomes.life_table``."""

    interest: tuple[str, ...] = DEATHS
    group: str | None = None
    step: Step = "year"
    confidence: Confidence = 0.95


@dataclass(frozen=True)
class LeavingRequest:
    """Fields of ``outcomes.leaving``."""

    group: str | None = None
    years: Years = (1.0, 3.0, 5.0)
    confidence: Confidence = 0.95


def survival(memory: Memory, request: SurvivalRequest, report: Any) -> dict[str, Any]:
    """Answer ``outcomes.survival``: product-limit curves, one for each group.

    Returns
    -------
    dict
        ``interest``; ``variant`` {interval, exact_limits, median_rule, tie_rule, at_risk_rule};
        ``curves``, each {level, n, events, censored, person_years, rate (Estimate per person-year),
        begins (day the curve starts, 0 unless all entries are delayed), time, at_risk, events_at,
        survival, standard_error, lower, upper, censor_time, censor_survival, last_time, stop_time,
        at_years, median, follow_up_median, losses}; ``table_times`` (years) and ``table`` (one
        {level, at_risk, events, censored} per curve: under observation just before, and left
        before, each time: with everybody observed from the start the three add up to n);
        ``left_out`` [{level, code}]; ``cautions``.

        Curve arrays start with survival 1 and then have an entry for each day with an outcome,
        each day anyone left as long as survival is 1 (its exact limit changes then), and the last
        day. ``stop_time`` is the last day with at least 10 at risk, 0 if there was none.
        ``at_years``: {years, at_risk, estimate, beyond_follow_up, since_days}; ``since_days`` above
        0 means the estimate holds for patients who had come that far (delayed entry).
        When all in a group were lost its curve has its first entry only and no estimate is given;
        the bounds in ``losses`` are the answer.
    """
    cohort = memory.cohort()
    groups = groups_of(cohort, request.group)
    losses = losses_by(cohort, request.interest, request.group, request.years)
    cautions = list(groups.cautions)
    curves = []
    for level, table in groups.tables.items():
        curve = product_limit(
            table, request.interest, interval=request.interval, confidence=request.confidence
        )
        curves.append(_curve_answer(level, table, curve, losses[level], request))
        cautions += _about(level, _survival_cautions(table, curve, losses[level], request))
    times = _table_times(groups.tables.values())
    return {
        "interest": request.interest,
        "variant": {
            "interval": request.interval,
            "exact_limits": "beta_product",
            "median_rule": "first_at_or_below",
            "tie_rule": "outcomes_before_censorings",
            "at_risk_rule": "entry_before_day",
        },
        "curves": curves,
        "table_times": times,
        "table": [
            {"level": level, **_at_risk_row(table, request.interest, times)}
            for level, table in groups.tables.items()
        ],
        "left_out": groups.left_out,
        "cautions": cautions,
    }


def life_tables(memory: Memory, request: LifeTableRequest, report: Any) -> dict[str, Any]:
    """Answer ``outcomes.life_table``: actuarial life tables, one for each group.

    Returns
    -------
    dict
        ``step``; ``tables`` [{level, n, rows}] with rows as in ``actuarial.LifeTableRow`` (hazards
        per person-year, ``joined`` are delayed entries); ``left_out``; ``cautions``.
    """
    groups = groups_of(memory.cohort(), request.group)
    cautions = list(groups.cautions)
    tables = []
    for level, table in groups.tables.items():
        result = life_table(table, request.interest, step=request.step, confidence=request.confidence)
        tables.append({"level": level, "n": table.n, "rows": result.rows})
        cautions += _about(level, result.cautions)
    return {"step": request.step, "tables": tables, "left_out": groups.left_out, "cautions": cautions}


def ways_of_leaving(memory: Memory, request: LeavingRequest, report: Any) -> dict[str, Any]:
    """Answer ``outcomes.leaving``: the cumulative incidence of each way of leaving, by group.

    Returns
    -------
    dict
        ``groups`` [{level, n, time, under_care, ways, table, under_care_at_years}]; ``ways`` lists
        every way that occurred in any group: {meaning, events, incidence, lower, upper, at_years
        [Estimate], one_minus_survival_at_years}; ``table`` [{years, at_risk, beyond_follow_up,
        since_days}]; ``left_out``; ``cautions``. Arrays have an entry for the start, for each day on
        which somebody left, and for the last day; of more than 400, every so many are handed over.
    """
    groups = groups_of(memory.cohort(), request.group)
    tables = groups.tables
    occurred = [way for way in WAYS_OF_LEAVING if any(table.left_by(way).any() for table in tables.values())]
    cautions = list(groups.cautions)
    answers = []
    for level, table in tables.items():
        result = leaving(table, confidence=request.confidence)
        answers.append(_leaving_answer(level, table, result, occurred, request.years))
        cautions += _about(level, (*result.cautions, *_few_at_risk(table, result.span, request.years)))
    return {"groups": answers, "left_out": groups.left_out, "cautions": cautions}


def _curve_answer(
    level: str | None, table: RiskTable, curve: SurvivalCurve, losses: Losses, request: SurvivalRequest
) -> dict[str, Any]:
    given = not _all_lost(table, request.interest)
    shown = _worth_showing(curve.events_at, curve.survival)
    marks = curve.censored_at > 0
    if not given:
        shown[1:] = False
        marks[:] = False
    well_supported = table.time[table.at_risk >= FEW_AT_RISK]
    return {
        "level": level,
        "n": curve.n,
        "events": curve.events,
        "censored": curve.censored,
        "person_years": table.person_days / DAYS_PER_YEAR,
        "rate": event_rate(table, request.interest, request.confidence),
        "begins": curve.span.begins,
        "time": curve.time[shown],
        "at_risk": curve.at_risk[shown],
        "events_at": curve.events_at[shown],
        "survival": curve.survival[shown],
        "standard_error": curve.standard_error[shown],
        "lower": curve.lower[shown],
        "upper": curve.upper[shown],
        "censor_time": curve.time[marks],
        "censor_survival": curve.survival[marks],
        "last_time": curve.span.last_time,
        "stop_time": well_supported[-1] if len(well_supported) else 0,
        "at_years": [
            {
                **_at_risk_at(table, curve.span, years),
                "estimate": curve.at(years * DAYS_PER_YEAR) if given else NOT_GIVEN,
            }
            for years in request.years
        ],
        "median": time_quantile(curve) if given else TimeQuantile(NOT_GIVEN, reached=False),
        "follow_up_median": follow_up_median(table, request.interest, confidence=request.confidence),
        "losses": losses,
    }


def _leaving_answer(
    level: str | None, table: RiskTable, result: Leaving, occurred: list[str], years: Years
) -> dict[str, Any]:
    shown = _thinned(_worth_showing(result.events_at, result.under_care))
    days = [year * DAYS_PER_YEAR for year in years]
    return {
        "level": level,
        "n": result.n,
        "time": result.time[shown],
        "under_care": result.under_care[shown],
        "ways": [
            {
                "meaning": way.meaning,
                "events": way.events,
                "incidence": way.incidence[shown],
                "lower": way.lower[shown],
                "upper": way.upper[shown],
                "at_years": [result.at(way.meaning, day) for day in days],
                "one_minus_survival_at_years": [
                    as_if_others_were_censored(table, way.meaning, day) for day in days
                ],
            }
            for way in result.ways
            if way.meaning in occurred
        ],
        "table": [_at_risk_at(table, result.span, year) for year in years],
    }


def _worth_showing(events_at: np.ndarray, remaining: np.ndarray) -> np.ndarray:
    """Return which entries of a curve to hand over: those in which it or its limits change, and the last.

    While nobody has left, the exact limit changes with the number at risk. The first entry, and
    one where the curve starts again, are at 1 as well.
    """
    shown = (events_at > 0) | (remaining == 1)
    shown[-1] = True
    return shown


def _thinned(shown: np.ndarray) -> np.ndarray:
    """Return the positions of at most so many entries, evenly chosen, with the first and the last."""
    positions = np.flatnonzero(shown)
    chosen = np.linspace(0, len(positions) - 1, min(len(positions), _MOST_ENTRIES)).round().astype(int)
    return positions[chosen]


def _at_risk_at(table: RiskTable, covered: Span, years: float) -> dict[str, Any]:
    day = years * DAYS_PER_YEAR
    return {
        "years": years,
        "at_risk": table.at_risk_on(np.array([day]))[0],
        "beyond_follow_up": covered.is_beyond(day),
        "since_days": covered.since(day),
    }


def _table_times(tables: Iterable[RiskTable]) -> list[float]:
    """Return the years to print numbers at risk for: round steps within follow-up, from 0."""
    longest = max(int(table.time[-1]) for table in tables) / DAYS_PER_YEAR
    step = next(step for step, until in _TABLE_STEPS if longest < until)
    return [step * i for i in range(int(longest / step) + 1)]


def _at_risk_row(table: RiskTable, interest: tuple[str, ...], times: list[float]) -> dict[str, np.ndarray]:
    """Count who is under observation just before each time and who left before it."""
    days = np.array(times) * DAYS_PER_YEAR
    before = np.searchsorted(table.time, days, side="left")
    return {
        "at_risk": table.at_risk_on(days),
        "events": np.concatenate(([0], np.cumsum(table.events(interest))))[before],
        "censored": np.concatenate(([0], np.cumsum(table.censored(interest))))[before],
    }


def _all_lost(table: RiskTable, interest: tuple[str, ...]) -> bool:
    """Return whether nothing is known of anybody but that all were lost."""
    return "lost" not in interest and bool(table.left_by("lost").sum() == table.n)


def _survival_cautions(
    table: RiskTable, curve: SurvivalCurve, losses: Losses, request: SurvivalRequest
) -> Iterable[Caution]:
    yield from curve.cautions
    if "lost" in request.interest:
        yield Caution("lost_is_of_interest")
    elif _all_lost(table, request.interest):
        yield Caution("all_lost", {"n": table.n})
    elif losses.share > MANY_LOST:
        yield Caution("many_lost", {"lost": losses.lost, "share": losses.share})
    yield from _few_at_risk(table, curve.span, request.years)


def _few_at_risk(table: RiskTable, covered: Span, years: Years) -> Iterable[Caution]:
    """Caution for the first time asked for that fewer than ten had come to, or for a small group."""
    if table.n < FEW_AT_RISK:
        yield Caution("few_patients", {"n": table.n})
        return
    for year in sorted(years):
        at_risk = int(table.at_risk_on(np.array([year * DAYS_PER_YEAR]))[0])
        if covered.speaks_of(year * DAYS_PER_YEAR) and at_risk < FEW_AT_RISK:
            yield Caution("few_at_risk", {"years": year, "at_risk": at_risk})
            return


def _about(level: str | None, cautions: Iterable[Caution]) -> list[Caution]:
    """Say which group each caution is about; level null is everybody."""
    return [Caution(caution.code, {"level": level, **caution.parameters}) for caution in cautions]


TASKS = {
    "outcomes.survival": (SurvivalRequest, survival),
    "outcomes.life_table": (LifeTableRequest, life_tables),
    "outcomes.leaving": (LeavingRequest, ways_of_leaving),
}
