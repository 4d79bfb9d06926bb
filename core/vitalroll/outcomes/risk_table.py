"""The one table behind everything about time to an outcome.

Curves, at-risk rows, life tables, rank tests and retention hazards all read it, so they can
never disagree.
"""

from __future__ import annotations

from collections.abc import Collection
from dataclasses import dataclass

import numpy as np

from vitalroll.errors import Refusal
from vitalroll.register.cohort import MEANINGS, Cohort, meaning_code

# Counting days directly is linear, but needs a slot for every day up to the longest follow-up.
# Two hundred years of days is far beyond any register and costs 5 MB.
_LONGEST_COUNTED_DIRECTLY = 73_000


@dataclass(frozen=True)
class RiskTable:
    """Who entered, was at risk and left, at each distinct day of follow-up.

    Parameters
    ----------
    time : int array, shape (m,)
        The distinct days on which anyone left or, with delayed entry, came under observation.
    at_risk : int array, shape (m,)
        Patients under observation just before leaving on that day: entry < time <= exit.
        A patient observed from the start (entry 0) is at risk on day 0 as well, so that an
        outcome on the first day counts.
    entered : int array, shape (m,)
        Patients with delayed entry whose observation began on that day; they are at risk from
        the next day on. Those observed from the start are in ``from_start`` instead.
    left : int array, shape (m, len(MEANINGS))
        Patients who left on that day, one column for each meaning, in the order of MEANINGS.
    n : int
        Patients in the table.
    from_start : int
        Those of them observed from the start.
    person_days : int
        Total time observed.

    Notes
    -----
    Outcomes come before censorings on the same day (Kaplan & Meier 1958): those censored on a
    day are still in ``at_risk`` of that day. A patient with delayed entry whose observation
    began and ended on one day is never at risk and is in no column; ``never_at_risk`` counts them.
    """

    time: np.ndarray
    at_risk: np.ndarray
    entered: np.ndarray
    left: np.ndarray
    n: int
    from_start: int
    person_days: int
    never_at_risk: int

    def events(self, interest: Collection[str]) -> np.ndarray:
        """Return, for each row, how many left by an outcome of interest (names from MEANINGS)."""
        return self.left[:, interest_codes(interest)].sum(axis=1)

    def censored(self, interest: Collection[str]) -> np.ndarray:
        """Return, for each row, how many left by anything that is not of interest."""
        return self.left.sum(axis=1) - self.events(interest)

    def left_by(self, meaning: str) -> np.ndarray:
        """Return, for each row, how many left by one meaning."""
        return self.left[:, meaning_code(meaning)]

    def at_risk_on(self, days: np.ndarray) -> np.ndarray:
        """Return the number at risk just before leaving on each of ``days`` (any order).

        Those who came under observation before the day, less those who left before it.
        """
        before = np.searchsorted(self.time, np.asarray(days, dtype=float), side="left")
        change = np.concatenate(([0], np.cumsum(self.entered - self.left.sum(axis=1))))
        return self.from_start + change[before]


def interest_codes(interest: Collection[str]) -> list[int]:
    """Return the positions in MEANINGS of the outcomes of interest; refuse an empty or unknown set."""
    if not interest:
        raise Refusal("no_outcome_of_interest", field="interest")
    if "under_care" in interest:
        raise Refusal("under_care_is_not_an_outcome", field="interest")
    return sorted({meaning_code(meaning) for meaning in interest})


def risk_table(cohort: Cohort) -> RiskTable:
    """Count a cohort into its risk table.

    Linear in the number of patients: days are counted, never sorted, unless follow-up is longer
    than two centuries.
    """
    return count_risk(cohort.entry, cohort.exit, cohort.outcome)


def count_risk(entry: np.ndarray, exit: np.ndarray, outcome: np.ndarray) -> RiskTable:
    """Count clean parallel arrays (days, days, positions in MEANINGS) into a risk table."""
    late = entry > 0
    seen = ~(late & (entry == exit))
    never_at_risk = int(len(entry) - np.count_nonzero(seen))
    if never_at_risk:
        entry, exit, outcome, late = entry[seen], exit[seen], outcome[seen], late[seen]
    width = len(MEANINGS)
    last = int(exit.max()) if len(exit) else 0
    if last <= _LONGEST_COUNTED_DIRECTLY:
        per_day = _counted(exit * width + outcome, (last + 1) * width).reshape(-1, width)
        came = _counted(entry[late], last + 1)
        time = np.flatnonzero(per_day.any(axis=1) | (came > 0)).astype(np.int64)
        left, entered = per_day[time], came[time]
    else:
        time = np.unique(np.concatenate((exit, entry[late])))
        row = np.searchsorted(time, exit)
        left = _counted(row * width + outcome, len(time) * width).reshape(-1, width)
        entered = _counted(np.searchsorted(time, entry[late]), len(time))
    from_start = int(len(entry) - np.count_nonzero(late))
    change = np.cumsum(entered - left.sum(axis=1))
    return RiskTable(
        time=time,
        at_risk=from_start + np.concatenate(([0], change[:-1])) if len(time) else change,
        entered=entered,
        left=left,
        n=len(entry),
        from_start=from_start,
        person_days=int(np.sum(exit - entry)),
        never_at_risk=never_at_risk,
    )


def _counted(positions: np.ndarray, length: int) -> np.ndarray:
    """Count positions into an array of 64-bit integers, also where an address has only 32 bits.

    In WebAssembly bincount takes and gives 32-bit integers, in which products of counts overflow.
    """
    return np.bincount(positions.astype(np.intp, copy=False), minlength=length).astype(np.int64, copy=False)


def risk_tables_by(cohort: Cohort, group: str | None) -> dict[str | None, RiskTable]:
    """Return one risk table for each level of a categorical covariate, or one for all (key None).

    Patients with nothing recorded in the grouping column are in no table. A level without
    patients has a table without rows; who calls names it and leaves it out.
    """
    if group is None:
        return {None: risk_table(cohort)}
    covariate = cohort.grouping(group)
    tables: dict[str | None, RiskTable] = {}
    for code, level in enumerate(covariate.levels):
        inside = covariate.codes == code
        tables[level] = count_risk(cohort.entry[inside], cohort.exit[inside], cohort.outcome[inside])
    return tables
