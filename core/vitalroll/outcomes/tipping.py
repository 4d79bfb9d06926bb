"""How much worse the lost would have to fare than those who stayed before the result changes."""

from __future__ import annotations

from collections.abc import Collection, Sequence

import numpy as np

from vitalroll.errors import Refusal
from vitalroll.outcomes.risk_table import count_risk
from vitalroll.register.cohort import Cohort, meaning_code


def survival_if_the_lost_fared(
    cohort: Cohort, interest: Collection[str], day: float, deltas: Sequence[float]
) -> np.ndarray:
    """Return survival at a day if the lost had ``delta`` times the hazard of those who stayed.

    Parameters
    ----------
    cohort : Cohort
    interest : names from MEANINGS
        Being lost must not be among them.
    day : float
    deltas : sequence of float, shape (k,)
        0: none of the lost had the outcome before the closing date; 1: the product limit; very large: all had
        it as soon as anybody had it after they were lost.

    Returns
    -------
    float array, shape (k,)
        NaN where nobody was followed so far, or nobody from the start.

    Raises
    ------
    Refusal
        ``lost_is_the_outcome``.

    Notes
    -----
    Of a patient lost on day c a share [S(t)/S(c)]^delta is still without the outcome on day t. The lost stay
    in the risk set with that weight until the closing date, L(t) in all, and leave it at the rate
    1 - (1 - d/n)^delta, so that S is multiplied on each day by 1 - [d + L {1 - (1 - d/n)^delta}] / (n + L).

    References
    ----------
    Zhao, Herring, Zhou, Ali & Koch (2014) J Biopharm Stat 24:229-253; Lipkovich, Ratitch & O'Kelly (2016)
    Pharm Stat 15:216-229. Both impute; the expectation is worked out here instead.
    """
    if "lost" in interest:
        raise Refusal("lost_is_the_outcome", field="interest")
    table = count_risk(cohort.entry, cohort.exit, cohort.outcome)
    d = table.events(interest)
    rows = (d > 0) & (table.time <= day)
    time, d, n = table.time[rows], d[rows].astype(float), table.at_risk[rows].astype(float)
    last = int(cohort.exit.max()) if len(cohort) else 0
    if day > last or not len(cohort):
        return np.full(len(deltas), np.nan)
    stay = 1 - d / n
    log_survival = np.concatenate(([0.0], np.cumsum(np.log(np.maximum(stay, 1e-300)))))
    lost = cohort.outcome == meaning_code("lost")
    seen = cohort.exit[lost]
    until = np.maximum(seen, cohort.closing - cohort.start[lost])
    # In play on the days of outcomes after the last contact, up to the closing date.
    first = np.searchsorted(time, seen, side="right")
    beyond = np.searchsorted(time, until, side="right")
    found = []
    for delta in deltas:
        weight = np.exp(-delta * log_survival[first])
        change = np.bincount(first, weights=weight, minlength=len(time) + 1)
        change -= np.bincount(np.maximum(beyond, first), weights=weight, minlength=len(time) + 1)
        away = np.exp(delta * log_survival[:-1]) * np.cumsum(change)[: len(time)]
        away = np.maximum(away, 0)
        found.append(float(np.prod(1 - (d + away * (1 - stay**delta)) / (n + away))))
    return np.array(found)
