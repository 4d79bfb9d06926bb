"""Who is overdue for a visit, the longest first: the list from which a clinic traces its patients."""

from __future__ import annotations

from dataclasses import dataclass

import numpy as np

from vitalroll.numbers import DAYS_PER_MONTH
from vitalroll.register.checks import Rows
from vitalroll.register.cohort import meaning_code


@dataclass(frozen=True)
class Overdue:
    """Rows of those overdue, the longest unseen first (of equals the earlier row), and for how many days.

    ``unjudged`` are under care with no last contact at all: nobody can say how long they were not seen.
    """

    rows: np.ndarray
    days: np.ndarray
    unjudged: int


def overdue(
    rows: Rows, no_contact: np.ndarray, keep: np.ndarray, *, months: float, with_lost: bool
) -> Overdue:
    """Return who was not seen for longer than so many months before the closing date.

    Parameters
    ----------
    rows : Rows
        Within the closing date, with no silent loss counted as one.
    no_contact : bool array
        Rows in which no last contact was written.
    keep : bool array
        Rows of the cohort.
    months : float
        Of 365.25 / 12 days; whole days are compared.
    with_lost : bool
        Whether those written down as lost are on the list, beside those under care.
    """
    care = rows.outcome == rows.under_care
    wanted = keep & (care | (with_lost & (rows.outcome == meaning_code("lost"))))
    unseen = rows.closing - rows.end.day
    late = np.flatnonzero(wanted & ~no_contact & (unseen > int(months * DAYS_PER_MONTH)))
    order = late[np.argsort(-unseen[late], kind="stable")]
    return Overdue(order, unseen[order], int((keep & care & no_contact).sum()))
