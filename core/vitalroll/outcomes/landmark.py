"""Follow-up counted from a landmark: a fair start for groups that became known only after entry."""

from __future__ import annotations

import numpy as np

from vitalroll.errors import Refusal
from vitalroll.register.cohort import Cohort


def from_landmark(cohort: Cohort, days: int) -> Cohort:
    """Return those still followed after a landmark, with time counted from it.

    Who is grouped by something that happened after entry had to live until it happened; counted from
    entry, that time without an outcome is given to the group ("immortal time"). Counted from a landmark,
    among those still followed on it, nobody gets such time; the group must be what was known by then.

    Parameters
    ----------
    cohort : Cohort
    days : int
        The landmark, in days after the start; above 0.

    Raises
    ------
    Refusal
        ``nobody_at_landmark`` (``days``).

    References
    ----------
    Anderson, Cain & Gelber (1983) J Clin Oncol 1:710-719; Suissa (2008) Am J Epidemiol 167:492-499.
    """
    keep = cohort.exit > days
    if not keep.any():
        raise Refusal("nobody_at_landmark", days=days)
    rest = cohort.having(keep)
    return Cohort(
        entry=np.maximum(rest.entry - days, 0),
        exit=rest.exit - days,
        outcome=rest.outcome,
        start=rest.start + days,
        line=rest.line,
        closing=rest.closing,
        covariates=rest.covariates,
    )
