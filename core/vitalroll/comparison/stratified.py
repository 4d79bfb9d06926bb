"""Two groups compared within strata, and pooled over them."""

from __future__ import annotations

from collections.abc import Sequence
from dataclasses import dataclass

import numpy as np
from scipy.special import chdtrc

from vitalroll.comparison.two_by_two import TwoByTwo
from vitalroll.errors import Caution, Refusal
from vitalroll.numbers import Estimate, two_sided_z
from vitalroll.outcomes.limits import check_confidence

DIFFERING = 0.05
"""A homogeneity test below this calls for reading the strata one by one."""


@dataclass(frozen=True)
class Chi2Test:
    """A chi-squared test."""

    chi_squared: float
    df: int
    p: float


@dataclass(frozen=True)
class Pooled:
    """Mantel-Haenszel figures. NaN where a figure cannot be given.

    ``chi_squared`` and ``p`` test whether there is any difference within strata (1 degree of freedom).
    """

    odds_ratio: Estimate
    risk_ratio: Estimate
    risk_difference: Estimate
    chi_squared: float
    p: float


@dataclass(frozen=True)
class Homogeneity:
    """Whether the strata may share one odds ratio; None with fewer than two usable strata."""

    breslow_day_tarone: Chi2Test | None
    woolf: Chi2Test | None


@dataclass(frozen=True)
class LeftOut:
    """A stratum that cannot contribute: ``empty_group`` at all, ``no_events``, ``all_events`` to ratios."""

    stratum: int
    code: str


@dataclass(frozen=True)
class Stratified:
    """The pooled figures, whether pooling is fair, and what was left out."""

    pooled: Pooled
    homogeneity: Homogeneity
    left_out: tuple[LeftOut, ...]
    cautions: tuple[Caution, ...]


@dataclass(frozen=True)
class _Strata:
    """Strata as arrays: a events of n1 exposed, c of n0 reference, m events and N patients in all."""

    a: np.ndarray
    n1: np.ndarray
    c: np.ndarray
    n0: np.ndarray

    @property
    def b(self) -> np.ndarray:
        return self.n1 - self.a

    @property
    def d(self) -> np.ndarray:
        return self.n0 - self.c

    @property
    def m(self) -> np.ndarray:
        return self.a + self.c

    @property
    def total(self) -> np.ndarray:
        return self.n1 + self.n0

    def where(self, keep: np.ndarray) -> _Strata:
        return _Strata(self.a[keep], self.n1[keep], self.c[keep], self.n0[keep])


def stratified(tables: Sequence[TwoByTwo], *, confidence: float = 0.95) -> Stratified:
    """Pool 2x2 tables over strata.

    Parameters
    ----------
    tables : sequence of TwoByTwo
        One for each stratum; totals may be fractional.
    confidence : float

    Returns
    -------
    Stratified
        Strata without anybody in one of the groups contribute to nothing. Strata in which nobody, or
        everybody, had the outcome say nothing of ratios but count in the risk difference.

    Raises
    ------
    Refusal
        ``no_strata``; ``no_usable_strata`` when every stratum lacks one of the groups.

    Cautions
    --------
    ``strata_differ`` (``p``): show the strata before the pooled figure. ``half_added`` (``strata``): Woolf's
    test added 1/2 to the cells of strata with an empty cell.

    References
    ----------
    Mantel & Haenszel (1959) JNCI 22:719-748. Robins, Breslow & Greenland (1986) Biometrics
    42:311-323. Greenland & Robins (1985) Biometrics 41:55-68. Breslow & Day (1980) sec. 4.4; Tarone
    (1985) Biometrika 72:91-95. Woolf (1955).
    """
    check_confidence(confidence)
    if not tables:
        raise Refusal("no_strata")
    strata = _Strata(
        np.array([table.exposed_events for table in tables], dtype=float),
        np.array([table.exposed_total for table in tables], dtype=float),
        np.array([table.reference_events for table in tables], dtype=float),
        np.array([table.reference_total for table in tables], dtype=float),
    )
    both = (strata.n1 > 0) & (strata.n0 > 0)
    if not both.any():
        raise Refusal("no_usable_strata")
    none, all_ = both & (strata.m == 0), both & (strata.m == strata.total)
    informative = both & ~none & ~all_
    z = two_sided_z(confidence)
    pooled = _pooled(strata.where(both), strata.where(informative), z)
    homogeneity, halved = _homogeneity(strata.where(informative), pooled.odds_ratio.value)
    cautions = []
    test = homogeneity.breslow_day_tarone
    if test is not None and test.p < DIFFERING:
        cautions.append(Caution("strata_differ", {"p": test.p}))
    if halved:
        cautions.append(Caution("half_added", {"strata": halved}))
    left_out = [LeftOut(int(i), "empty_group") for i in np.flatnonzero(~both)]
    left_out += [LeftOut(int(i), "no_events") for i in np.flatnonzero(none)]
    left_out += [LeftOut(int(i), "all_events") for i in np.flatnonzero(all_)]
    return Stratified(pooled, homogeneity, tuple(left_out), tuple(cautions))


def _pooled(both: _Strata, informative: _Strata, z: float) -> Pooled:
    s = informative
    with np.errstate(divide="ignore", invalid="ignore"):
        excess = float(np.sum(s.a - s.n1 * s.m / s.total))
        variance = float(
            np.sum(s.n1 * s.n0 * s.m * (s.total - s.m) / (s.total**2 * np.maximum(s.total - 1, 0)))
        )
    chi_squared = excess**2 / variance if 0 < variance < np.inf else float("nan")
    return Pooled(
        odds_ratio=_odds_ratio(s, z),
        risk_ratio=_risk_ratio(s, z),
        risk_difference=_risk_difference(both, z),
        chi_squared=chi_squared,
        p=float(chdtrc(1, chi_squared)),
    )


def _odds_ratio(s: _Strata, z: float) -> Estimate:
    """Pooled odds ratio; var ln = sum PR/2R+^2 + sum(PS+QR)/2R+S+ + sum QS/2S+^2 (Robins and others 1986)."""
    r, t = s.a * s.d / s.total, s.b * s.c / s.total
    p, q = (s.a + s.d) / s.total, (s.b + s.c) / s.total
    top, bottom = r.sum(), t.sum()
    if top == 0 or bottom == 0:
        return _one_sided(top, bottom)
    variance = (
        (p * r).sum() / (2 * top**2)
        + (p * t + q * r).sum() / (2 * top * bottom)
        + (q * t).sum() / (2 * bottom**2)
    )
    return _around(top / bottom, float(np.sqrt(variance)), z)


def _risk_ratio(s: _Strata, z: float) -> Estimate:
    """Pooled risk ratio; var ln = sum[(m n1 n0 - a c N)/N^2] / (numerator denominator)."""
    top, bottom = (s.a * s.n0 / s.total).sum(), (s.c * s.n1 / s.total).sum()
    if top == 0 or bottom == 0:
        return _one_sided(top, bottom)
    variance = ((s.m * s.n1 * s.n0 - s.a * s.c * s.total) / s.total**2).sum() / (top * bottom)
    return _around(top / bottom, float(np.sqrt(variance)), z)


def _risk_difference(s: _Strata, z: float) -> Estimate:
    """Pooled risk difference; var = sum[(a b n0^3 + c d n1^3)/(n1 n0 N^2)] / (sum n1 n0/N)^2."""
    weight = (s.n1 * s.n0 / s.total).sum()
    value = float(((s.a * s.n0 - s.c * s.n1) / s.total).sum() / weight)
    spread = ((s.a * s.b * s.n0**3 + s.c * s.d * s.n1**3) / (s.n1 * s.n0 * s.total**2)).sum()
    error = float(np.sqrt(spread) / weight)
    return Estimate(value, max(-1.0, value - z * error), min(1.0, value + z * error), error)


def _around(value: float, log_error: float, z: float) -> Estimate:
    spread = np.exp(z * log_error)
    return Estimate(float(value), float(value / spread), float(value * spread), log_error)


def _one_sided(top: float, bottom: float) -> Estimate:
    """All outcomes are on one side, or there are none: a ratio of 0 or infinity, without limits."""
    value = float("nan") if top == bottom == 0 else (0.0 if top == 0 else float("inf"))
    return Estimate(value, float("nan"), float("nan"))


def _homogeneity(s: _Strata, odds_ratio: float) -> tuple[Homogeneity, int]:
    """Return both tests, and in how many strata Woolf's test added 1/2."""
    if len(s.a) < 2:
        return Homogeneity(None, None), 0
    empty = (s.a == 0) | (s.b == 0) | (s.c == 0) | (s.d == 0)
    half = np.where(empty, 0.5, 0.0)
    a, b, c, d = s.a + half, s.b + half, s.c + half, s.d + half
    log, weight = np.log(a * d / (b * c)), 1 / (1 / a + 1 / b + 1 / c + 1 / d)
    mean = (weight * log).sum() / weight.sum()
    woolf = _test(float((weight * (log - mean) ** 2).sum()), len(a) - 1)
    return Homogeneity(_breslow_day_tarone(s, odds_ratio), woolf), int(empty.sum())


def _breslow_day_tarone(s: _Strata, odds_ratio: float) -> Chi2Test | None:
    if not 0 < odds_ratio < np.inf:
        return None
    fitted = _fitted(s, odds_ratio)
    variance = 1 / (1 / fitted + 1 / (s.m - fitted) + 1 / (s.n1 - fitted) + 1 / (s.n0 - s.m + fitted))
    statistic = ((s.a - fitted) ** 2 / variance).sum() - (s.a - fitted).sum() ** 2 / variance.sum()
    return _test(max(0.0, float(statistic)), len(s.a) - 1)


def _fitted(s: _Strata, odds_ratio: float) -> np.ndarray:
    """Exposed events each stratum would have with its margins and this odds ratio.

    The root within the margins of (1-OR) x^2 + (n0 - m + OR (m + n1)) x - OR m n1 = 0, in the form
    that does not lose digits as OR nears 1.
    """
    linear = s.n0 - s.m + odds_ratio * (s.m + s.n1)
    constant = odds_ratio * s.m * s.n1
    root = np.sqrt(linear**2 + 4 * (1 - odds_ratio) * constant)
    return 2 * constant / (linear + root)


def _test(chi_squared: float, df: int) -> Chi2Test:
    return Chi2Test(chi_squared, df, float(chdtrc(df, chi_squared)))
