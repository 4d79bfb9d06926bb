"""Whether curves cross: a single test or ratio for the whole of follow-up then hides what happened."""

from __future__ import annotations

from collections.abc import Collection, Iterator, Mapping
from itertools import combinations

import numpy as np

from vitalroll.errors import Caution
from vitalroll.numbers import DAYS_PER_YEAR
from vitalroll.outcomes.product_limit import SurvivalCurve, product_limit
from vitalroll.outcomes.risk_table import RiskTable

FEWEST_AT_RISK = 10
"""Where fewer remain a curve moves by single patients, and a crossing says nothing."""

APART = 1.645
"""Curves count as apart where they differ by more than this many standard errors of the difference."""


def crossings(tables: Mapping[str, RiskTable], interest: Collection[str]) -> Iterator[Caution]:
    """Yield ``curves_cross`` (``first``, ``second``, ``above`` before, ``years``) for each pair that crosses.

    A pair crosses when one curve is above the other by more than 1.645 standard errors of their difference,
    and later below it by more than that, while at least ten of each group are at risk. This notices and tests
    nothing. Simulated with 50 to 300 patients a group it spoke up for 5 to 15 % of groups with equal hazards,
    and for 30 %, 80 % and all of those that truly cross with 50, 100 and 300. At one standard error it spoke
    up for 60 % of equal groups, and so said nothing.
    ``years`` is the last time, before the curves were apart the other way, at which they changed places.
    """
    curves = {level: product_limit(table, interest) for level, table in tables.items()}
    for first, second in combinations(curves, 2):
        found = _crossing(curves[first], curves[second])
        if found is not None:
            day, first_was_above = found
            yield Caution(
                "curves_cross",
                {
                    "first": first,
                    "second": second,
                    "above": first if first_was_above else second,
                    "years": day / DAYS_PER_YEAR,
                },
            )


def _crossing(first: SurvivalCurve, second: SurvivalCurve) -> tuple[int, bool] | None:
    """Return the day on which two curves changed places, and whether the first was above before."""
    if any(curve.span.begins > 0 or curve.span.restarts for curve in (first, second)):
        return None
    days = np.unique(np.concatenate((first.time, second.time)))
    here = [np.searchsorted(curve.time, days, side="right") - 1 for curve in (first, second)]
    enough = np.ones(len(days), dtype=bool)
    for curve, rows in zip((first, second), here, strict=True):
        enough &= (curve.at_risk[rows] >= FEWEST_AT_RISK) & (days <= curve.span.last_time)
    days, here = days[enough], [rows[enough] for rows in here]
    difference = first.survival[here[0]] - second.survival[here[1]]
    error = np.hypot(first.standard_error[here[0]], second.standard_error[here[1]])
    # Before the first outcome of either both are 1 without an error: not apart.
    apart = np.where(np.abs(difference) > APART * error, np.sign(difference), 0)
    told = np.flatnonzero((apart != 0) & (error > 0))
    changes = np.flatnonzero(np.diff(apart[told]) != 0)
    if not len(changes):
        return None
    before, after = told[changes[0]], told[changes[0] + 1]
    same_side = np.flatnonzero(np.sign(difference[before : after + 1]) == apart[before])
    return int(days[before + same_side[-1] + 1]), bool(apart[before] > 0)
