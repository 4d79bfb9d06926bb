"""What the lost could have made of the result: bounds that assume the worst and the best of them."""

from __future__ import annotations

from collections.abc import Collection, Sequence
from dataclasses import dataclass, replace

import numpy as np

from vitalroll.numbers import DAYS_PER_YEAR
from vitalroll.outcomes.product_limit import product_limit
from vitalroll.outcomes.risk_table import RiskTable, risk_tables_by
from vitalroll.register.cohort import Cohort, meaning_code


@dataclass(frozen=True)
class Bound:
    """Survival at one time under the worst and the best that can be supposed of the lost.

    ``all_died``: all had the outcome the day they were last seen. ``none_died``: none had it up to
    the closing date. NaN where nobody would have been followed that long.
    """

    years: float
    all_died: float
    none_died: float


@dataclass(frozen=True)
class Losses:
    """How many were lost, their share of all patients, and the bounds."""

    lost: int
    share: float
    bounds: tuple[Bound, ...]


def losses_by(
    cohort: Cohort, interest: Collection[str], group: str | None, years: Sequence[float]
) -> dict[str | None, Losses]:
    """Return losses and the bounds they leave on survival, for each group that has patients.

    Parameters
    ----------
    cohort : Cohort
        Bounds need it whole: those lost are followed on to its closing date.
    interest : names from MEANINGS
        If being lost is itself an outcome of interest, nothing is unknown and the bounds meet.
    group : str or None
        A categorical covariate, or None for all together.
    years : sequence of float

    Notes
    -----
    The estimate lies between the bounds at the times it shares with them, for it is the case in
    which the lost fare like those who stayed. In comparing groups, set one's best against the
    other's worst.
    """
    tables = risk_tables_by(cohort, group)
    stayed = risk_tables_by(_lost_stay_to_closing(cohort), group)
    return {
        level: _losses(table, stayed[level], interest, years) for level, table in tables.items() if table.n
    }


def _lost_stay_to_closing(cohort: Cohort) -> Cohort:
    lost = cohort.outcome == meaning_code("lost")
    to_closing = np.maximum(cohort.exit, cohort.closing - cohort.start)
    return replace(cohort, exit=np.where(lost, to_closing, cohort.exit))


def _losses(table: RiskTable, stayed: RiskTable, interest: Collection[str], years: Sequence[float]) -> Losses:
    lost = int(table.left_by("lost").sum())
    worst = product_limit(table, {*interest, "lost"})
    best = worst if "lost" in interest else product_limit(stayed, interest)
    days = {year: year * DAYS_PER_YEAR for year in years}
    return Losses(
        lost=lost,
        share=lost / table.n,
        bounds=tuple(Bound(year, worst.at(day).value, best.at(day).value) for year, day in days.items()),
    )
