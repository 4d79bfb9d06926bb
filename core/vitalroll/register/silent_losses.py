"""Losses that nobody wrote down: under care on paper, and not seen for long before the closing date."""

from __future__ import annotations

from dataclasses import dataclass

import numpy as np

from vitalroll.numbers import DAYS_PER_MONTH
from vitalroll.register.checks import Rows
from vitalroll.register.cohort import meaning_code

MONTHS = (3.0, 6.0, 9.0, 12.0, 18.0, 24.0, 36.0)


@dataclass(frozen=True)
class SilentLoss:
    """How many would count as lost if not being seen for longer than ``months`` were a loss.

    ``changed`` were under care; ``lost`` are these and those written down as lost; ``share`` is of all
    patients.
    """

    months: float
    changed: int
    lost: int
    share: float


@dataclass(frozen=True)
class SilentLosses:
    """The rule at several numbers of months.

    ``under_care`` are those it can change; of them ``unjudged`` have no last contact at all and are
    followed to the closing date on trust.
    """

    n: int
    under_care: int
    unjudged: int
    written_lost: int
    rows: tuple[SilentLoss, ...]


def silent_losses(rows: Rows, no_contact: np.ndarray, keep: np.ndarray, months: float) -> SilentLosses:
    """Return what the rule changes at usual numbers of months and at the one that is chosen.

    Parameters
    ----------
    rows : Rows
        Within the closing date, with no silent loss counted as one.
    no_contact : bool array
        Rows in which no last contact was written.
    keep : bool array
        Rows of the cohort.
    months : float
        The number that is chosen; it is added to the usual ones.

    Notes
    -----
    A patient last seen exactly so many months ago is not yet lost; a month is 365.25 / 12 days and
    days are whole, as in the finding ``unseen_for_long``.
    """
    n = int(keep.sum())
    care = keep & (rows.outcome == rows.under_care)
    lost = int((keep & (rows.outcome == meaning_code("lost"))).sum())
    unseen = (rows.closing - rows.end.day)[care & ~no_contact]
    found = []
    for each in sorted({*MONTHS, float(months)}):
        changed = int(np.count_nonzero(unseen > int(each * DAYS_PER_MONTH)))
        share = (lost + changed) / n if n else float("nan")
        found.append(SilentLoss(each, changed, lost + changed, share))
    return SilentLosses(n, int(care.sum()), int((care & no_contact).sum()), lost, tuple(found))
