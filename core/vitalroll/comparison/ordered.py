"""Whether outcomes become more or fewer along an order of the groups."""

from __future__ import annotations

import math
from collections.abc import Collection, Mapping, Sequence
from dataclasses import dataclass

import numpy as np
from scipy.special import chdtrc

from vitalroll.comparison.rank_tests import Weight, weighted_sums
from vitalroll.errors import Refusal
from vitalroll.outcomes.risk_table import RiskTable


@dataclass(frozen=True)
class Trend:
    """A test for trend: ``z`` is above 0 where outcomes come faster with a higher score of the group."""

    scores: dict[str, float]
    z: float
    chi_squared: float
    p: float


def trend_test(
    strata: Sequence[Mapping[str, RiskTable]],
    interest: Collection[str],
    scores: Mapping[str, float],
    *,
    weight: Weight = "log_rank",
    rho: float = 1.0,
    gamma: float = 0.0,
) -> Trend:
    """Test whether the hazard moves along the order of the groups.

    Parameters
    ----------
    strata, interest, weight, rho, gamma
        As in ``rank_tests.rank_test``.
    scores : mapping from each level to a finite number
        Only their distances in proportion matter: 1, 2, 3 and 10, 20, 30 give the same test.

    Returns
    -------
    Trend

    Raises
    ------
    Refusal
        Those of ``rank_tests.weighted_sums``; ``scores_alike`` when all groups have the same score or one
        is not finite; ``nothing_to_compare``.

    Cautions
    --------
    The order has to come from outside the data. A p-value above 0.05 does not show that there is no
    difference: a group in the middle may differ from both ends.

    Notes
    -----
    (c'U)^2 / c'Vc on one degree of freedom.

    References
    ----------
    Tarone (1975) Biometrika 62:679-682.
    """
    sums = weighted_sums(strata, interest, weight=weight, rho=rho, gamma=gamma)
    c = np.array([scores[level] for level in sums.levels], dtype=float)
    if not np.isfinite(c).all() or np.ptp(c) == 0:
        raise Refusal("scores_alike", field="scores")
    # Centred and scaled, so that neither a far origin nor a small unit costs digits.
    c = (c - c.mean()) / np.ptp(c)
    variance = float(c @ sums.variance @ c)
    if variance <= 1e-12 * max(float(np.trace(sums.variance)), 1e-300):
        raise Refusal("nothing_to_compare")
    z = float(c @ sums.score) / math.sqrt(variance)
    return Trend(
        scores={level: float(scores[level]) for level in sums.levels},
        z=z,
        chi_squared=z * z,
        p=float(chdtrc(1, z * z)),
    )
