"""Where the risk set is never empty: the stretches over which a curve may be multiplied on.

With everybody observed from the start there is one stretch. With delayed entry the risk set can
empty and fill again; what happened in between is unknown, and a curve that once reached zero
could never say anything about those who came later. The curve then starts again at one and
speaks only of patients who had come that far.
"""

from __future__ import annotations

from dataclasses import dataclass
from itertools import pairwise

import numpy as np

from vitalroll.errors import Caution, Refusal
from vitalroll.outcomes.risk_table import RiskTable


@dataclass(frozen=True)
class Stretch:
    """Rows ``first`` up to, not including, ``stop`` of a risk table.

    ``begins`` is the day before which nothing in the stretch can be known, ``at_risk`` the
    number under observation from then on.
    """

    begins: int
    at_risk: int
    first: int
    stop: int

    @property
    def rows(self) -> slice:
        """The rows of the table that belong to the stretch."""
        return slice(self.first, self.stop)


@dataclass(frozen=True)
class Restart:
    """The risk set was empty after day ``emptied``; the curve starts again at 1 on day ``day``."""

    emptied: int
    day: int


@dataclass(frozen=True)
class Span:
    """The days about which a curve made of stretches can speak.

    ``ended`` says that all who were at risk on the last day had an event: what the curve has come
    to then it stays at for ever.
    """

    begins: int
    last_time: int
    restarts: tuple[Restart, ...]
    ended: bool

    def speaks_of(self, day: float) -> bool:
        """Return whether there is an estimate at ``day``.

        There is none before the curve begins, while the risk set was empty, and beyond follow-up.
        """
        in_a_gap = any(restart.emptied < day < restart.day for restart in self.restarts)
        return day >= self.begins and not in_a_gap and not self.is_beyond(day)

    def is_beyond(self, day: float) -> bool:
        """Return whether ``day`` is after the last one anyone was seen and nothing is known of it."""
        return day > self.last_time and not self.ended

    def since(self, day: float) -> int:
        """Return the day that a patient must have reached for the curve at ``day`` to concern him or her."""
        return max((restart.day for restart in self.restarts if restart.day <= day), default=self.begins)

    def cautions(self) -> tuple[Caution, ...]:
        """Return ``begins_late`` and ``risk_set_emptied`` where they apply."""
        found = []
        if self.begins > 0:
            found.append(Caution("begins_late", {"days": self.begins}))
        if self.restarts:
            parameters = {
                "times": len(self.restarts),
                "emptied_days": self.restarts[-1].emptied,
                "restart_days": self.restarts[-1].day,
            }
            found.append(Caution("risk_set_emptied", parameters))
        return tuple(found)


def stretches(table: RiskTable, at_risk: np.ndarray, events: np.ndarray) -> list[Stretch]:
    """Return the stretches of a table for the events that a curve multiplies over.

    A stretch ends where nobody remains, and where everyone at risk had an event (the product is
    zero). Somebody who enters on the very day the last one is censored closes the gap.

    Raises
    ------
    Refusal
        ``no_patients`` when the table has no rows.
    """
    if not len(table.time):
        raise Refusal("no_patients")
    remaining = remaining_at_risk(table)
    # The last row is always an end: everybody has left by then.
    ends = np.flatnonzero((remaining == 0) | ((events == at_risk) & (events > 0)))
    entries = np.flatnonzero(table.entered)
    if table.from_start:
        first, begins, count = 0, 0, table.from_start
    else:
        # The first row is then an entry, and nobody can leave before the day after.
        first, begins, count = 1, int(table.time[0]), int(remaining[0])
    found = []
    for end in ends.tolist():
        if end < first:
            continue
        found.append(Stretch(begins, count, first, end + 1))
        position = int(np.searchsorted(entries, end))
        if position == len(entries):
            break
        entry = int(entries[position])
        first, begins, count = entry + 1, int(table.time[entry]), int(remaining[entry])
    return found


def span(table: RiskTable, parts: list[Stretch], at_risk: np.ndarray, events: np.ndarray) -> Span:
    """Return the days covered by the stretches made of a table."""
    restarts = tuple(
        Restart(int(table.time[before.stop - 1]), after.begins) for before, after in pairwise(parts)
    )
    ended = bool(events[-1] == at_risk[-1] > 0)
    return Span(parts[0].begins, int(table.time[-1]), restarts, ended)


def remaining_at_risk(table: RiskTable) -> np.ndarray:
    """Return, for each row, how many are under observation just after that day."""
    return table.at_risk - table.left.sum(axis=1) + table.entered


def fewest_at_risk(table: RiskTable, stretch: Stretch) -> np.ndarray:
    """Return the least risk set from the start of a stretch to just after each of its rows.

    A last row after which nobody is left speaks of its own day alone, on which its risk set was
    still whole: outcomes come before censorings.
    """
    remaining = remaining_at_risk(table)[stretch.rows]
    known = np.where(remaining > 0, remaining, table.at_risk[stretch.rows])
    return np.minimum.accumulate(np.minimum(known, stretch.at_risk))
