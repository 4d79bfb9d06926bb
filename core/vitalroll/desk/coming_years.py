"""What every question about the coming years starts from: who is here, who leaves, who comes."""

from __future__ import annotations

import calendar
import datetime
from collections.abc import Iterable
from dataclasses import dataclass, field, replace
from typing import Annotated, Any, Literal

import numpy as np

from vitalroll.caseload.inflow import FEWEST_WHOLE_YEARS, Inflow, inflow_from_history, inflow_typed
from vitalroll.caseload.projection import months_here_today
from vitalroll.caseload.retention import Retention, retention
from vitalroll.caseload.trend import inflow_with_trend
from vitalroll.desk.fields import Between
from vitalroll.desk.memory import Memory
from vitalroll.errors import Caution, Refusal
from vitalroll.outcomes.risk_table import risk_table
from vitalroll.register.cohort import Cohort, meaning_code

_LONG_UNSEEN_DAYS = 365
_LONG_UNSEEN_SHARE = 0.1
_HELD_SHARE_WORTH_SAYING = 0.25


TAILS = {"held": 1.0, "halved": 0.5, "doubled": 2.0, "nobody": 0.0}
"""Rules beyond the supported time since start: what the last hazards are multiplied by there."""


@dataclass(frozen=True)
class Newcomers:
    """Where the yearly number of newcomers comes from.

    ``history``: its mean; ``trend``: its trend carried on with ``damping``; ``typed``: ``per_year``;
    ``incidence``: new cases per 100,000 a year times ``population``. The last two grow by
    ``growth_percent`` a year (that of the population, when incidence stays).
    """

    basis: Literal["history", "trend", "typed", "incidence"] = "history"
    per_year: Annotated[float, Between(0, 1e6)] | None = None
    incidence: Annotated[float, Between(0, 1e5)] | None = None
    population: Annotated[float, Between(0, 1e10)] | None = None
    growth_percent: Annotated[float, Between(-50, 50)] = 0.0
    damping: Annotated[float, Between(0, 1)] = 0.8


@dataclass(frozen=True)
class Setting:
    """What every projection is asked with.

    ``completeness``: per cent of those under care today whom the register holds; ``tail``: the rule
    beyond the supported time since start, a key of ``TAILS``.
    """

    years: Annotated[int, Between(1, 30)] = 5
    newcomers: Newcomers = field(default_factory=Newcomers)
    completeness: Annotated[float, Between(1, 100)] = 100.0
    tail: Literal["held", "halved", "doubled", "nobody"] = "held"
    draws: Annotated[int, Between(100, 20_000)] = 2000
    seed: Annotated[int, Between(0, 2**53)] = 1


@dataclass(frozen=True)
class Beginning:
    """The register read for a projection.

    ``today`` holds whole months since start of those under care; ``cautions`` are those of the
    newcomers (when the history is used), of the leaving and of patients long unseen.
    """

    closing: int
    today: np.ndarray
    hazards: Retention
    inflow: Inflow
    history_years: float
    cautions: tuple[Caution, ...]
    times_today: float


def begin(memory: Memory, setting: Setting) -> Beginning:
    """Read the register in memory for a projection.

    Refusals: ``no_register``, ``no_patients``, ``no_person_time``, ``start_after_closing``,
    ``nobody_under_care``, ``history_too_short`` and ``trend_history_too_short`` (newcomers.basis),
    ``missing_field`` (newcomers.per_year, incidence or population).

    Cautions: those of ``inflow_from_history`` and ``retention``; ``under_care_long_unseen`` (count,
    share, days); ``horizon_beyond_history`` (years, history_years); ``register_incomplete``
    (completeness, count: those added).
    """
    cohort = memory.cohort()
    recorded = inflow_from_history(cohort)
    inflow = _newcomers(setting.newcomers, recorded, cohort.closing)
    hazards = replace(retention(risk_table(cohort)), tail=TAILS[setting.tail])
    today = months_here_today(cohort)
    if len(today) == 0:
        raise Refusal("nobody_under_care")
    cautions = [*inflow.cautions, *hazards.cautions, *long_unseen(cohort)]
    if setting.years > recorded.history_years:
        parameters = {"years": setting.years, "history_years": recorded.history_years}
        cautions.append(Caution("horizon_beyond_history", parameters))
    times_today = 100 / setting.completeness
    if times_today > 1:
        parameters = {"completeness": setting.completeness, "count": len(today) * (times_today - 1)}
        cautions.append(Caution("register_incomplete", parameters))
    return Beginning(
        cohort.closing, today, hazards, inflow, recorded.history_years, tuple(cautions), times_today
    )


def held_hazard(hazards: Retention, held_share: np.ndarray) -> Iterable[Caution]:
    """Yield ``hazard_held`` (from_years, share) when much of the last year rests on held hazards."""
    if held_share[-1] > _HELD_SHARE_WORTH_SAYING:
        parameters = {"from_years": hazards.supported_years, "share": float(held_share[-1])}
        yield Caution("hazard_held", parameters)


def long_unseen(cohort: Cohort) -> Iterable[Caution]:
    """Yield ``under_care_long_unseen`` when many under care were last seen over a year ago."""
    under_care = cohort.outcome == meaning_code("under_care")
    unseen = cohort.closing - (cohort.start + cohort.exit) > _LONG_UNSEEN_DAYS
    total, count = int(np.count_nonzero(under_care)), int(np.count_nonzero(under_care & unseen))
    if count > _LONG_UNSEEN_SHARE * total:
        parameters = {"count": count, "share": count / total, "days": _LONG_UNSEEN_DAYS}
        yield Caution("under_care_long_unseen", parameters)


def per_year(inflow: Inflow) -> dict[str, Any]:
    """Return the newcomers a year as plain data."""
    return {
        "mean": inflow.per_year.value,
        "lower": inflow.per_year.lower,
        "upper": inflow.per_year.upper,
        "dispersion": inflow.dispersion,
        "model": inflow.model,
        "whole_years": inflow.whole_years,
    }


def years_ahead(closing: int, years: int) -> list[dict[str, Any]]:
    """Return [{year, ends}] for each projected year."""
    return [{"year": year, "ends": months_after(closing, 12 * year)} for year in range(1, years + 1)]


def months_after(closing: int, months: int) -> str:
    """Return the ISO day so many months on, or the last day of that month if it is shorter."""
    date = datetime.date.fromordinal(closing)
    year, month = divmod(date.year * 12 + date.month - 1 + months, 12)
    return date.replace(
        year=year, month=month + 1, day=min(date.day, calendar.monthrange(year, month + 1)[1])
    ).isoformat()


def _newcomers(asked: Newcomers, recorded: Inflow, closing: int) -> Inflow:
    if asked.basis in ("typed", "incidence"):
        needed = ("per_year",) if asked.basis == "typed" else ("incidence", "population")
        for name in needed:
            if getattr(asked, name) is None:
                raise Refusal("missing_field", field=f"newcomers.{name}")
        rate = asked.per_year if asked.basis == "typed" else asked.incidence * asked.population / 1e5
        typed = inflow_typed(rate, days_at_arrival=recorded.days_at_arrival)
        return replace(typed, growth_percent=asked.growth_percent)
    if recorded.whole_years < FEWEST_WHOLE_YEARS:
        raise Refusal(
            "history_too_short",
            field="newcomers.basis",
            whole_years=recorded.whole_years,
            needed=FEWEST_WHOLE_YEARS,
        )
    if asked.basis == "trend":
        return inflow_with_trend(recorded, closing, damping=asked.damping)
    return recorded
