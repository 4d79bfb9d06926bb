"""Which of several groups differ from which, with the number of comparisons taken into account."""

from __future__ import annotations

from collections.abc import Collection, Mapping, Sequence
from dataclasses import dataclass
from itertools import combinations

import numpy as np

from vitalroll.comparison.rank_tests import Weight, rank_test
from vitalroll.errors import Refusal
from vitalroll.outcomes.risk_table import RiskTable


@dataclass(frozen=True)
class Pair:
    """Two groups, their own rank test, and its p-value adjusted for all pairs; NaN where there is no test."""

    first: str
    second: str
    chi_squared: float
    p: float
    adjusted_p: float


def pairwise(
    strata: Sequence[Mapping[str, RiskTable]],
    interest: Collection[str],
    *,
    weight: Weight = "log_rank",
    rho: float = 1.0,
    gamma: float = 0.0,
) -> tuple[Pair, ...]:
    """Test each pair of groups by itself, with Holm's adjustment over the pairs that could be tested.

    Parameters as in ``rank_tests.rank_test``.

    References
    ----------
    Holm (1979) Scand J Stat 6:65-70.
    """
    tested = []
    for first, second in combinations(strata[0], 2):
        two = [{level: tables[level] for level in (first, second)} for tables in strata]
        try:
            found = rank_test(two, interest, weight=weight, rho=rho, gamma=gamma)
            tested.append((first, second, found.chi_squared, found.p))
        except Refusal:
            # Neither group had an outcome, or they were never at risk together: no test, and none counted.
            tested.append((first, second, float("nan"), float("nan")))
    adjusted = holm(np.array([p for *_, p in tested]))
    return tuple(Pair(*pair, float(p)) for pair, p in zip(tested, adjusted, strict=True))


def holm(p: np.ndarray) -> np.ndarray:
    """Return p-values adjusted for their number by Holm's method; NaN stays NaN and is not counted."""
    adjusted = np.full(len(p), np.nan)
    given = np.flatnonzero(~np.isnan(p))
    order = given[np.argsort(p[given], kind="stable")]
    steps = p[order] * (len(order) - np.arange(len(order)))
    adjusted[order] = np.minimum(np.maximum.accumulate(steps), 1.0) if len(order) else steps
    return adjusted
