"""What may be wrong in the rows themselves: totals, repeated headings, cells that slipped sideways."""

from __future__ import annotations

import numpy as np

from vitalroll.register.dates import Fault, parse_dates, read_dates
from vitalroll.register.findings.finding import Finding, Repair, Seen, change, found
from vitalroll.register.profile import Profile
from vitalroll.register.spelling import same

_MOST_TRIED = 5_000


def totals_among_rows(seen: Seen) -> Finding | None:
    """Rows with totals stand among the patients: they are no patients and are set aside."""
    return found("totals_among_rows", "slight", _not_patients(seen, "subtotal_row"))


def headings_repeated(seen: Seen) -> Finding | None:
    """The headings stand again among the patients, as on every printed page."""
    return found("headings_repeated", "slight", _not_patients(seen, "repeated_heading"))


def more_cells_than_columns(seen: Seen) -> Finding | None:
    """A row has more cells than there are columns: a separator stands inside a cell."""
    return found("more_cells_than_columns", "grave", _not_patients(seen, "too_many_cells"))


def slipped_sideways(seen: Seen) -> Finding | None:
    """Cells stand one column too far to one side: the repair reads the row from where they stand."""
    rows = seen.rows
    broken = seen.patients & (rows.outcome < 0) & ~(rows.start.given & rows.end.given)
    at, starts, ends, outcomes = [], [], [], []
    for row in np.flatnonzero(broken)[:_MOST_TRIED].tolist():
        for step in (1, -1):
            read = _read_beside(seen, row, step)
            if read:
                at.append(row)
                starts.append(read[0])
                outcomes.append(read[1])
                ends.append(read[2])
                break
    if not at:
        return None
    place, dated = np.array(at), np.array([end is not None for end in ends])
    changes = [change("start", place, np.array(starts)), change("outcome", place, np.array(outcomes))]
    if dated.any():
        known = np.array([end for end in ends if end is not None])
        changes.append(change("end", place[dated], known))
    which = np.zeros(len(rows), dtype=bool)
    which[place] = True
    return found("slipped_sideways", "grave", which, Repair("read_beside", tuple(changes)))


def _read_beside(seen: Seen, row: int, step: int) -> tuple[int, int, int | None] | None:
    """Return start, outcome and end as they stand so many columns beside their own, or None."""
    plan = seen.plan
    start = _day(seen, row, plan.having("start")[0], "start", step)
    if start is None:
        return None
    outcome = plan.meanings().get(same(_text(seen, row, plan.having("outcome")[0], step) or ""))
    if outcome is None:
        return None
    days = [
        _day(seen, row, profile, role, step)
        for role in ("end", "death_date")
        for profile in plan.having(role)
    ]
    known = [day for day in days if day is not None]
    if not known and outcome != seen.rows.under_care:
        return None
    return start, outcome, max(known, default=None)


def _text(seen: Seen, row: int, profile: Profile, step: int) -> str | None:
    columns = seen.plan.register.source.table.columns
    place = profile.column.position + step
    return columns[place].texts[columns[place].codes[row]] if 0 <= place < len(columns) else None


def _day(seen: Seen, row: int, profile: Profile, role: str, step: int) -> int | None:
    text = _text(seen, row, profile, step)
    if text is None:
        return None
    plan = seen.plan
    epoch = plan.register.source.epoch or "serial_1900"
    read = read_dates(
        parse_dates([text]), plan.order_of(profile), last_year=plan.last_year(role), epoch=epoch
    )
    return int(read.day[0]) if read.fault[0] == Fault.NONE else None


def _not_patients(seen: Seen, code: str) -> np.ndarray:
    which = np.zeros(len(seen.rows), dtype=bool)
    table = seen.plan.register.source.table
    which[[row for row, (why, _) in table.not_patients.items() if why == code]] = True
    return which
