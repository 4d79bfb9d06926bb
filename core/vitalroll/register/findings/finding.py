"""What a finding and its repair are, and what the checks look at.

A check is a function of ``Seen`` named by the code that the person is shown. It repairs nothing: it
returns what it found, and at most one way to repair it, which is carried out only when accepted.
"""

from __future__ import annotations

from collections.abc import Callable
from dataclasses import dataclass, field
from typing import Any, Literal

import numpy as np

from vitalroll.register.checks import Days, Rows
from vitalroll.register.plan import Plan

Severity = Literal["grave", "doubtful", "slight"]
"""``grave``: the result is wrong unless this is settled; ``doubtful``: perhaps; ``slight``: good to know."""

What = Literal["start", "end", "outcome", "birth", "same_as", "number"]
"""What a repair changes in a row: a date, the meaning, or who the patient is.

``same_as`` sets the row aside as another row of the same patient; ``number`` lets the patient number be
ignored, so that the row counts as a patient of its own.
"""

NOT_RECORDED = -1


@dataclass(frozen=True)
class Change:
    """One thing that a repair changes in some rows.

    Parameters
    ----------
    what : What
    rows : int array
        Positions of rows.
    values : int array
        Ordinals of days, positions in MEANINGS, or the row of the same patient; NOT_RECORDED for none.
    unit : int array
        For each the row by which the person accepts or declines it; changes of one unit are made
        together or not at all.
    """

    what: What
    rows: np.ndarray
    values: np.ndarray
    unit: np.ndarray


@dataclass(frozen=True)
class Repair:
    """A way to repair a finding, by its name, and what it changes."""

    kind: str
    changes: tuple[Change, ...]

    @property
    def units(self) -> np.ndarray:
        """Return the rows by which it is accepted or declined, in the order of the file."""
        units = [change.unit for change in self.changes]
        return np.unique(np.concatenate(units)) if units else np.zeros(0, np.int64)


@dataclass(frozen=True)
class Finding:
    """What a check found.

    ``rows`` are positions of the rows concerned; ``parameters`` are those of its sentence.
    ``alternatives`` are other ways to repair it, whose effect is shown to see how much the way matters.
    """

    code: str
    severity: Severity
    rows: np.ndarray
    parameters: dict[str, Any] = field(default_factory=dict)
    repair: Repair | None = None
    alternatives: tuple[Repair, ...] = ()


@dataclass(frozen=True)
class Seen:
    """What the checks look at: the register as it is read before anything is repaired.

    Parameters
    ----------
    plan : Plan
    rows : Rows
        ``end`` is the latest of the last contacts and the date of death.
    contact, death : Days
        The last contact and the date of death apart.
    patients : bool array
        Rows that describe a patient.
    unseen_days : int
        Somebody under care who was not seen for longer than this is perhaps lost.
    """

    plan: Plan
    rows: Rows
    contact: Days
    death: Days
    patients: np.ndarray
    unseen_days: int

    @property
    def n(self) -> int:
        """Return how many rows describe a patient."""
        return int(self.patients.sum())


Check = Callable[[Seen], Finding | None]


def change(what: What, rows: np.ndarray, values: np.ndarray | int, unit: np.ndarray | None = None) -> Change:
    """Return one change; ``values`` may be one value for all rows; each row is its own unit by default."""
    rows = np.asarray(rows, dtype=np.int64)
    filled = np.broadcast_to(np.asarray(values, dtype=np.int64), rows.shape)
    return Change(what, rows, np.array(filled), rows if unit is None else np.asarray(unit, dtype=np.int64))


def found(
    code: str,
    severity: Severity,
    which: np.ndarray,
    repair: Repair | None = None,
    **parameters: Any,
) -> Finding | None:
    """Return a finding about the rows of a bool array, or None where there are none."""
    rows = np.flatnonzero(which)
    if not len(rows):
        return None
    if repair is not None and not len(repair.units):
        repair = None
    return Finding(code, severity, rows, parameters, repair)
