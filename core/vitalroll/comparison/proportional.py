"""Whether hazard ratios may be taken as constant over time."""

from __future__ import annotations

from dataclasses import dataclass

import numpy as np
from scipy.special import chdtrc

from vitalroll.comparison.design import Column
from vitalroll.comparison.risk_sums import FollowUp, RiskSums, information, score
from vitalroll.comparison.stratified import Chi2Test


@dataclass(frozen=True)
class ProportionalTest:
    """The score test for one term; a small p says that its hazard ratio changes over time."""

    id: str
    level: str | None
    chi_squared: float
    df: int
    p: float


def proportional_tests(
    data: FollowUp, sums: RiskSums, fitted_information: np.ndarray, columns: tuple[Column, ...]
) -> tuple[tuple[ProportionalTest, ...], Chi2Test]:
    """Test each term, and all at once, for a hazard ratio that changes with time.

    The exact score test of adding x g(t) to the model, with g(t) one minus the product-limit
    survival just before t: U' [I_gg - I_gb I_bb^-1 I_bg]^-1 U.

    Parameters
    ----------
    data, sums
        The model's follow-up and risk sums at the fitted coefficients.
    fitted_information : array, shape (p, p)
    columns : the terms

    References
    ----------
    Grambsch & Therneau (1994) Biometrika 81:515-526, as a score test rather than their approximation.
    """
    g = _transformed_time(data)
    weight = g - g[data.at].mean()
    slope = score(data, sums, weight)
    across = information(data, sums, weight)
    own = information(data, sums, weight**2)
    left = own - across @ np.linalg.solve(fitted_information, across)
    tests = []
    for i, column in enumerate(columns):
        alone = own[i, i] - across[i] @ np.linalg.solve(fitted_information, across[i])
        statistic = float(slope[i] ** 2 / alone) if alone > 0 else float("nan")
        tests.append(ProportionalTest(column.id, column.level, statistic, 1, float(chdtrc(1, statistic))))
    df = len(columns)
    # With all outcomes on one day time does not vary, and nothing can be tested.
    whole = float(slope @ np.linalg.solve(left, slope)) if np.linalg.matrix_rank(left) == df else float("nan")
    return tuple(tests), Chi2Test(whole, df, float(chdtrc(df, whole)))


def _transformed_time(data: FollowUp) -> np.ndarray:
    """Return 1 - S(t-) for each day of outcomes."""
    m = len(data.days)
    left = np.bincount(data.leaves, minlength=m + 1).astype(np.int64)
    at_risk = left[::-1].cumsum()[::-1][1:]
    entered_later = np.bincount(data.enters, minlength=m + 1).astype(np.int64)[::-1].cumsum()[::-1][1:]
    events = np.bincount(data.at, minlength=m)
    survival = np.cumprod(1 - events / (at_risk - entered_later))
    before = np.concatenate(([1.0], survival[:-1]))
    return 1 - before
