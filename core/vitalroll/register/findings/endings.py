"""What may be wrong in how follow-up ended: deaths that are not deaths, losses that are not said."""

from __future__ import annotations

import numpy as np

from vitalroll.register.cohort import DEATHS, meaning_code
from vitalroll.register.dates import Fault
from vitalroll.register.findings.finding import Finding, Repair, Seen, change, found
from vitalroll.register.recognition import has_any, words
from vitalroll.register.spelling import bare

_COPIED_LEAST = 5
_COPIED_SHARE = 0.05
"""A visit falls on one given day in well under 1 % of rows; so many there are copied, not visited."""


def contact_after_death(seen: Seen) -> Finding | None:
    """Somebody was seen after the date of death: the follow-up would run on beyond it."""
    which = seen.patients & seen.death.given & seen.contact.given & (seen.contact.day > seen.death.day)
    rows = np.flatnonzero(which)
    repair = Repair("end_at_death", (change("end", rows, seen.death.day[rows]),))
    return found("contact_after_death", "grave", which, repair)


def death_date_but_alive(seen: Seen) -> Finding | None:
    """A date of death stands beside an ending that is not death (alive, lost, recovered …)."""
    which = seen.patients & seen.death.given & (seen.death.day <= seen.rows.closing)
    which &= (seen.rows.outcome >= 0) & ~_died(seen)
    rows = np.flatnonzero(which)
    repair = Repair(
        "count_as_died",
        (
            change("outcome", rows, meaning_code("died_cause_unknown")),
            change("end", rows, seen.death.day[rows]),
        ),
    )
    return found("death_date_but_alive", "grave", which, repair)


def died_without_date(seen: Seen) -> Finding | None:
    """Somebody died and no date is written: the row is set aside, and a death is not counted."""
    return found(
        "died_without_date", "grave", seen.patients & _died(seen) & seen.rows.end.having(Fault.BLANK)
    )


def death_dated_by_contact(seen: Seen) -> Finding | None:
    """Somebody died, the date of death is blank, and the last contact stands for it.

    The death came after that contact. The repair places it midway to the closing date.
    """
    if not seen.plan.having("death_date") or not seen.plan.having("end"):
        return None
    which = seen.patients & _died(seen) & seen.death.having(Fault.BLANK) & seen.contact.given
    which &= seen.contact.day < seen.rows.closing
    rows = np.flatnonzero(which)
    midway = (seen.contact.day[rows] + seen.rows.closing) // 2
    return found(
        "death_dated_by_contact", "doubtful", which, Repair("midway", (change("end", rows, midway),))
    )


def closing_date_as_contact(seen: Seen) -> Finding | None:
    """Many were last seen on the very closing date: it was copied there, and nobody knows when they came."""
    given = seen.patients & seen.rows.end.given & (seen.rows.outcome >= 0) & ~_died(seen)
    which = given & (seen.rows.end.day == seen.rows.closing)
    n, of = int(which.sum()), int(given.sum())
    if n < _COPIED_LEAST or n < _COPIED_SHARE * of:
        return None
    return found("closing_date_as_contact", "doubtful", which, share=n / of)


def unseen_for_long(seen: Seen) -> Finding | None:
    """Somebody counts as under care and was not seen for long: perhaps lost, and nobody wrote it down."""
    which = seen.patients & (seen.rows.outcome == seen.rows.under_care) & seen.rows.end.given
    which &= seen.rows.closing - seen.rows.end.day > seen.unseen_days
    rows = np.flatnonzero(which)
    repair = Repair("count_as_lost", (change("outcome", rows, meaning_code("lost")),))
    return found("unseen_for_long", "doubtful", which, repair, months=seen.plan.choices.unseen_months)


def transfer_as_lost(seen: Seen) -> Finding | None:
    """A value taken for lost speaks of a transfer: those patients are known to be somewhere."""
    values = seen.plan.having("outcome")[0].values
    moved = words()["meanings"]["moved_away"]["words"]
    speaks = np.array([has_any(bare(text), moved) for text in values.spelt] + [False])
    lost = seen.rows.outcome == meaning_code("lost")
    which = seen.patients & lost & speaks[values.codes]
    rows = np.flatnonzero(which)
    repair = Repair("count_as_moved", (change("outcome", rows, meaning_code("moved_away")),))
    return found("transfer_as_lost", "doubtful", which, repair)


def died_on_first_day(seen: Seen) -> Finding | None:
    """A death on the day of diagnosis: perhaps the diagnosis was only written down at the death."""
    which = seen.patients & _died(seen) & seen.rows.start.given & seen.rows.end.given
    return found("died_on_first_day", "slight", which & (seen.rows.end.day == seen.rows.start.day))


def _died(seen: Seen) -> np.ndarray:
    return np.isin(seen.rows.outcome, [meaning_code(meaning) for meaning in DEATHS])
