"""The same methods for someone who has totals and no list: the tasks behind From counts."""

from __future__ import annotations

from dataclasses import dataclass
from typing import Annotated, Any

from vitalroll.caseload.balance import Balance, Occupancy, balance, occupancy
from vitalroll.comparison.stratified import stratified
from vitalroll.comparison.two_by_two import Exact, Measures, TwoByTwo, exact, measures
from vitalroll.desk.fields import Between
from vitalroll.desk.memory import Memory
from vitalroll.errors import Caution, Refusal
from vitalroll.outcomes.actuarial import life_table_from_counts

Count = Annotated[int, Between(0, 10**9)]
PerYear = Annotated[float, Between(0, 1e9)]
Confidence = Annotated[float, Between(0.5, 0.9999)]

_MOST_TABLES_FOR_EXACT = 20_000
"""Possible tables with the same margins above which nothing is gained by counting them all."""


@dataclass(frozen=True)
class CountedInterval:
    """One interval of a typed life table."""

    width_years: Annotated[float, Between(0, 150)]
    lost: Count
    withdrawn: Count
    events: Count


@dataclass(frozen=True)
class LifeTableRequest:
    """Fields of ``counts.life_table``."""

    entering: Count
    rows: tuple[CountedInterval, ...]
    confidence: Confidence = 0.95


@dataclass(frozen=True)
class Stratum:
    """One typed 2x2 table, named by the person."""

    label: str
    exposed_events: Count
    exposed_total: Count
    unexposed_events: Count
    unexposed_total: Count


@dataclass(frozen=True)
class StrataRequest:
    """Fields of ``counts.strata``."""

    strata: tuple[Stratum, ...]
    confidence: Confidence = 0.95


@dataclass(frozen=True)
class Leaving:
    """How many leave each year in one way, named by the person."""

    label: str
    per_year: PerYear


@dataclass(frozen=True)
class BalanceRequest:
    """Fields of ``counts.balance``."""

    prevalent: Count
    new_per_year: PerYear
    leaving: tuple[Leaving, ...]
    years: Annotated[int, Between(1, 30)] = 5
    population: Annotated[float, Between(0, 1e10)] | None = None
    places: Annotated[float, Between(0, 1e9)] | None = None


def life_table(memory: Memory, request: LifeTableRequest, report: Any) -> dict[str, Any]:
    """Answer ``counts.life_table``: the actuarial life table of typed totals.

    Returns
    -------
    dict
        ``rows`` as in ``outcomes.actuarial.LifeTableRow``; ``cautions``.

    Refusals: those of ``life_table_from_counts``.
    """
    found = life_table_from_counts(
        request.entering,
        [row.width_years for row in request.rows],
        [row.lost for row in request.rows],
        [row.withdrawn for row in request.rows],
        [row.events for row in request.rows],
        confidence=request.confidence,
    )
    return {"rows": found.rows, "cautions": found.cautions}


def strata(memory: Memory, request: StrataRequest, report: Any) -> dict[str, Any]:
    """Answer ``counts.strata``: typed 2x2 tables, one by one, lumped together, and pooled.

    Returns
    -------
    dict
        ``rows`` [{label, exposed_events, exposed_total, unexposed_events, unexposed_total, ...}]
        with exposed_risk, unexposed_risk, risk_ratio, odds_ratio, risk_difference (Estimates),
        exposed_odds, unexposed_odds, number_needed, and ``exact`` {odds_ratio, p, mid_p}, null
        where more than 20,000 tables have the same margins; ``crude``: the same (without label)
        for all strata added up; ``pooled`` {odds_ratio, risk_ratio, risk_difference, chi_squared,
        p}; ``homogeneity`` {breslow_day_tarone, woolf, each {chi_squared, df, p} or null};
        ``left_out`` [{stratum: from 0, label, code}]; ``cautions``. What cannot be given is null.

    Refusals: ``no_strata``, ``no_usable_strata`` (field strata), ``more_events_than_patients``
    (events, total; with the field, such as strata.2.unexposed_events), ``out_of_range``.
    """
    tables = [_table(i, stratum) for i, stratum in enumerate(request.strata)]
    try:
        found = stratified(tables, confidence=request.confidence)
    except Refusal as refusal:
        raise Refusal(refusal.code, field="strata", **refusal.parameters) from None
    lumped = TwoByTwo(
        *(sum(numbers) for numbers in zip(*(vars(table).values() for table in tables), strict=True))
    )
    return {
        "rows": [
            {**vars(stratum), **_figures(table, request.confidence)}
            for stratum, table in zip(request.strata, tables, strict=True)
        ],
        "crude": _figures(lumped, request.confidence),
        "pooled": found.pooled,
        "homogeneity": found.homogeneity,
        "left_out": [{**vars(left), "label": request.strata[left.stratum].label} for left in found.left_out],
        "cautions": found.cautions,
    }


def balance_from_counts(memory: Memory, request: BalanceRequest, report: Any) -> dict[str, Any]:
    """Answer ``counts.balance``: how a caseload changes, from prevalent, new and leaving.

    Returns
    -------
    dict
        ``path`` [{year, under_care, under_care_at_constant_rate}] from year 0; ``net_per_year``;
        ``leaving_per_year``; ``leaving`` [{label, per_year, share, turnover}] (share of all
        leaving, null when nobody leaves; turnover per 100 patient-years); ``turnover``;
        ``mean_duration_years`` and ``steady_state`` (null, plus_infinity, when nobody leaves);
        ``prevalence_per_100000``, ``incidence_per_100000``, ``steady_prevalence_per_100000``
        (null without a population); ``occupancy`` {mean, percentile_95, utilisation} in the steady
        state, null unless ``places`` is given and enough; ``cautions``.

    Refusals: those of ``balance``. Cautions: those of ``balance``; too few places are not a
    refusal of the whole answer but the caution ``utilisation_at_or_above_one`` (utilisation,
    places, needed), with no occupancy.
    """
    leaving_per_year = sum(way.per_year for way in request.leaving)
    found = balance(
        request.prevalent,
        request.new_per_year,
        leaving_per_year,
        years=request.years,
        population=request.population,
    )
    taken, cautions = _places(found, request)
    return {
        **vars(found),
        "leaving": [
            {
                "label": way.label,
                "per_year": way.per_year,
                "share": way.per_year / leaving_per_year if leaving_per_year else None,
                "turnover": 100 * way.per_year / request.prevalent,
            }
            for way in request.leaving
        ],
        "occupancy": taken,
        "cautions": [*found.cautions, *cautions],
    }


def _table(position: int, stratum: Stratum) -> TwoByTwo:
    try:
        return TwoByTwo(
            stratum.exposed_events, stratum.exposed_total, stratum.unexposed_events, stratum.unexposed_total
        )
    except Refusal as refusal:
        named = str(refusal.field).replace("reference", "unexposed")
        raise Refusal(refusal.code, field=f"strata.{position}.{named}", **refusal.parameters) from None


def _figures(table: TwoByTwo, confidence: float) -> dict[str, Any]:
    found: Measures = measures(table, confidence=confidence)
    named = {name.replace("reference", "unexposed"): value for name, value in vars(found).items()}
    return {**named, "exact": _exact(table, confidence)}


def _exact(table: TwoByTwo, confidence: float) -> Exact | None:
    events = table.exposed_events + table.reference_events
    fewest, most = max(0, events - table.reference_total), min(table.exposed_total, events)
    return exact(table, confidence=confidence) if most - fewest < _MOST_TABLES_FOR_EXACT else None


def _places(found: Balance, request: BalanceRequest) -> tuple[Occupancy | None, list[Caution]]:
    if request.places is None or found.leaving_per_year == 0:
        return None, []
    try:
        return occupancy(request.new_per_year, found.mean_duration_years, request.places), []
    except Refusal as refusal:
        if refusal.code != "utilisation_at_or_above_one":
            raise
        return None, [Caution("utilisation_at_or_above_one", refusal.parameters)]


TASKS = {
    "counts.life_table": (LifeTableRequest, life_table),
    "counts.strata": (StrataRequest, strata),
    "counts.balance": (BalanceRequest, balance_from_counts),
}
