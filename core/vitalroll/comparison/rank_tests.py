"""Rank tests: whether groups differ over the whole of follow-up more than chance would explain."""

from __future__ import annotations

from collections.abc import Collection, Mapping, Sequence
from dataclasses import dataclass
from typing import Literal, get_args

import numpy as np
from scipy.special import chdtrc

from vitalroll.errors import Refusal
from vitalroll.outcomes.risk_table import RiskTable

Weight = Literal["log_rank", "gehan", "tarone_ware", "peto_peto", "fleming_harrington"]

_NEGLIGIBLE = 1e-12
"""Share of the largest eigenvalue below which a direction of the covariance holds nothing."""


@dataclass(frozen=True)
class GroupCounts:
    """A group: its patients, its outcomes, and those expected if all groups had the same hazards."""

    level: str
    n: int
    observed: int
    expected: float


@dataclass(frozen=True)
class WeightedSums:
    """What every rank test is made of, summed over strata.

    Parameters
    ----------
    score : array, shape (k,)
        Weighted outcomes observed less expected, in each group.
    variance : array, shape (k, k)
        Its covariance if all groups had the same hazards.
    observed, expected : arrays, shape (k,)
        Unweighted.
    """

    levels: tuple[str, ...]
    n: tuple[int, ...]
    score: np.ndarray
    variance: np.ndarray
    observed: np.ndarray
    expected: np.ndarray


@dataclass(frozen=True)
class RankTest:
    """A rank test; ``observed`` and ``expected`` are unweighted, whatever the weight."""

    weight: Weight
    groups: tuple[GroupCounts, ...]
    chi_squared: float
    df: int
    p: float


def rank_test(
    strata: Sequence[Mapping[str, RiskTable]],
    interest: Collection[str],
    *,
    weight: Weight = "log_rank",
    rho: float = 1.0,
    gamma: float = 0.0,
) -> RankTest:
    """Test whether groups have the same hazards.

    Parameters
    ----------
    strata : sequence of mappings from level to RiskTable
        One mapping for each stratum; a single one for an unstratified test. All have the same levels.
    interest : names from MEANINGS
    weight : str
        ``log_rank`` 1; ``gehan`` n; ``tarone_ware`` sqrt n; ``peto_peto`` prod [1 - d/(n+1)] up to
        and with t; ``fleming_harrington`` S(t-)^rho [1-S(t-)]^gamma;
        survival is pooled over the groups of the stratum. To be chosen before looking.
    rho, gamma : float
        Of Fleming and Harrington's weight only.

    Returns
    -------
    RankTest

    Raises
    ------
    Refusal
        ``one_group``, ``no_events_to_compare``, ``nothing_to_compare`` (no time at which an outcome
        fell while more than one group was at risk), ``not_one_of`` (weight).

    Notes
    -----
    U = sum w (d1 - n1 d/n), V = sum w^2 n1 n0 d (n-d) / [n^2 (n-1)]: the hypergeometric variance.
    The chi-squared uses a generalised inverse, so that a group that was never at risk together
    with another takes away a degree of freedom instead of breaking the test.

    References
    ----------
    Mantel (1966) Cancer Chemother Rep 50:163-170; Peto & Peto (1972) JRSS A 135:185-206; Gehan (1965)
    Biometrika 52:203-223; Tarone & Ware (1977) Biometrika 64:156-160; Fleming & Harrington (1991).
    """
    sums = weighted_sums(strata, interest, weight=weight, rho=rho, gamma=gamma)
    chi_squared, df = _quadratic_form(sums.score, sums.variance)
    if df == 0:
        raise Refusal("nothing_to_compare")
    return RankTest(
        weight=weight,
        groups=tuple(
            GroupCounts(level, sums.n[i], int(sums.observed[i]), float(sums.expected[i]))
            for i, level in enumerate(sums.levels)
        ),
        chi_squared=chi_squared,
        df=df,
        p=float(chdtrc(df, chi_squared)),
    )


def weighted_sums(
    strata: Sequence[Mapping[str, RiskTable]],
    interest: Collection[str],
    *,
    weight: Weight = "log_rank",
    rho: float = 1.0,
    gamma: float = 0.0,
) -> WeightedSums:
    """Sum up score and covariance over strata; parameters and refusals as in ``rank_test``.

    ``nothing_to_compare`` is left to the test that is made of them.
    """
    if weight not in get_args(Weight):
        raise Refusal("not_one_of", field="weight", given=weight, choices=list(get_args(Weight)))
    levels = list(strata[0]) if strata else []
    if len(levels) < 2:
        raise Refusal("one_group", field="group")
    k = len(levels)
    score, variance = np.zeros(k), np.zeros((k, k))
    observed, expected = np.zeros(k), np.zeros(k)
    for tables in strata:
        times, at_risk, events = _together([tables[level] for level in levels], interest)
        if not len(times):
            continue
        part = _one_stratum(at_risk, events, weight, rho, gamma)
        score += part[0]
        variance += part[1]
        observed += events.sum(axis=0)
        expected += part[2]
    if observed.sum() == 0:
        raise Refusal("no_events_to_compare")
    return WeightedSums(
        levels=tuple(levels),
        n=tuple(sum(tables[level].n for tables in strata) for level in levels),
        score=score,
        variance=variance,
        observed=observed,
        expected=expected,
    )


def _together(
    tables: list[RiskTable], interest: Collection[str]
) -> tuple[np.ndarray, np.ndarray, np.ndarray]:
    """Return the days with an outcome in any group; at risk and outcomes on them as (days, groups)."""
    per_table = [table.events(interest) for table in tables]
    days = [table.time[events > 0] for table, events in zip(tables, per_table, strict=True)]
    times = np.unique(np.concatenate(days)) if days else np.empty(0, dtype=np.int64)
    at_risk = np.column_stack([table.at_risk_on(times) for table in tables]).astype(float)
    events = np.zeros((len(times), len(tables)))
    for i, (table, counts) in enumerate(zip(tables, per_table, strict=True)):
        events[np.searchsorted(times, table.time[counts > 0]), i] = counts[counts > 0]
    return times, at_risk, events


def _one_stratum(
    at_risk: np.ndarray, events: np.ndarray, weight: Weight, rho: float, gamma: float
) -> tuple[np.ndarray, np.ndarray, np.ndarray]:
    """Return the weighted score, its covariance, and the unweighted expected outcomes."""
    n, d = at_risk.sum(axis=1), events.sum(axis=1)
    shares = at_risk / n[:, None]
    w = _weights(n, d, weight, rho, gamma)
    expected = shares * d[:, None]
    score = w @ (events - expected)
    # Where one patient alone is at risk there is no chance in what happens: the factor is 0, not 0/0.
    factor = w**2 * d * (n - d) / np.maximum(n - 1, 1)
    variance = np.diag(factor @ shares) - (shares * factor[:, None]).T @ shares
    return score, variance, expected.sum(axis=0)


def _weights(n: np.ndarray, d: np.ndarray, weight: Weight, rho: float, gamma: float) -> np.ndarray:
    if weight == "log_rank":
        return np.ones_like(n)
    if weight == "gehan":
        return n
    if weight == "tarone_ware":
        return np.sqrt(n)
    if weight == "peto_peto":
        return np.cumprod(1 - d / (n + 1))
    before = np.concatenate(([1.0], np.cumprod(1 - d / n)[:-1]))
    return before**rho * (1 - before) ** gamma


def _quadratic_form(score: np.ndarray, variance: np.ndarray) -> tuple[float, int]:
    """Return U' V^- U and the rank of V."""
    values, vectors = np.linalg.eigh(variance)
    kept = values > _NEGLIGIBLE * max(values.max(), 0.0)
    if not kept.any() or values.max() <= 0:
        return float("nan"), 0
    turned = vectors[:, kept].T @ score
    return float((turned**2 / values[kept]).sum()), int(kept.sum())
