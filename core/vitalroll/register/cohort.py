"""The cohort: one immutable record of follow-up that every method reads."""

from __future__ import annotations

from collections.abc import Mapping
from dataclasses import dataclass, field

import numpy as np

from vitalroll.errors import Refusal

MEANINGS = (
    "under_care",
    "died_of_disease",
    "died_of_other_cause",
    "died_cause_unknown",
    "recovered",
    "moved_away",
    "lost",
    "stopped",
)
"""What an entry in the outcome column can mean. ``Cohort.outcome`` holds positions in this tuple."""

DEATHS = ("died_of_disease", "died_of_other_cause", "died_cause_unknown")


def meaning_code(meaning: str) -> int:
    """Return the position of ``meaning`` in MEANINGS; refuse a word that is not there."""
    try:
        return MEANINGS.index(meaning)
    except ValueError:
        raise Refusal("unknown_meaning", meaning=meaning) from None


@dataclass(frozen=True)
class Categorical:
    """A covariate with levels.

    ``codes`` holds, for each patient, a position in ``levels`` or -1 where nothing was recorded.
    """

    heading: str | None
    levels: tuple[str, ...]
    codes: np.ndarray


@dataclass(frozen=True)
class Numeric:
    """A covariate measured as a number; NaN where nothing was recorded."""

    heading: str | None
    values: np.ndarray


Covariate = Categorical | Numeric


@dataclass(frozen=True)
class Cohort:
    """Follow-up of n patients as parallel arrays of length n, in whole days.

    Whole days, so that ties never depend on round-off.

    Parameters
    ----------
    entry : int array
        Days from the start of the disease's follow-up to the day observation began here.
        0 for a patient observed from the start; above 0 is delayed entry (left truncation).
    exit : int array
        Days from the start to the end of observation; never before ``entry``.
    outcome : int array
        How observation ended, as a position in MEANINGS.
    start : int array
        Calendar day of the start, as a proleptic Gregorian ordinal (``datetime.date.toordinal``).
    line : int array
        Line of the source each row came from, counted from 1.
    covariates : mapping of str to Categorical or Numeric
        Known by an identifier that is the same for the whole life of the register.
    closing : int
        Ordinal of the day the register was frozen.

    Raises
    ------
    Refusal
        ``uneven_cohort`` when the arrays differ in length, ``exit_before_entry`` (with the line)
        or ``negative_time`` when a row cannot be follow-up. The register room sets such rows
        aside before it gets here.
    """

    entry: np.ndarray
    exit: np.ndarray
    outcome: np.ndarray
    start: np.ndarray
    line: np.ndarray
    closing: int
    covariates: Mapping[str, Covariate] = field(default_factory=dict)

    def __post_init__(self) -> None:
        for name in ("entry", "exit", "outcome", "start", "line"):
            frozen = np.array(getattr(self, name), dtype=np.int64)
            frozen.flags.writeable = False
            object.__setattr__(self, name, frozen)
        lengths = {len(self.entry), len(self.exit), len(self.outcome), len(self.start), len(self.line)}
        if len(lengths) != 1:
            raise Refusal("uneven_cohort")
        if np.any(self.entry < 0):
            raise Refusal("negative_time", line=int(self.line[np.argmax(self.entry < 0)]))
        backwards = self.exit < self.entry
        if np.any(backwards):
            raise Refusal("exit_before_entry", line=int(self.line[np.argmax(backwards)]))

    def __len__(self) -> int:
        return len(self.entry)

    def having(self, keep: np.ndarray) -> Cohort:
        """Return the cohort of the rows where the boolean array ``keep`` holds."""
        return Cohort(
            entry=self.entry[keep],
            exit=self.exit[keep],
            outcome=self.outcome[keep],
            start=self.start[keep],
            line=self.line[keep],
            closing=self.closing,
            covariates={name: _rows(covariate, keep) for name, covariate in self.covariates.items()},
        )

    def covariate(self, identifier: str) -> Covariate:
        """Return a covariate by its identifier; refuse one the cohort does not have."""
        try:
            return self.covariates[identifier]
        except KeyError:
            raise Refusal("unknown_covariate", covariate=identifier) from None

    def grouping(self, identifier: str) -> Categorical:
        """Return a categorical covariate to group by; refuse a number."""
        covariate = self.covariate(identifier)
        if not isinstance(covariate, Categorical):
            raise Refusal("group_is_numeric", covariate=identifier)
        return covariate

    def person_days(self) -> int:
        """Return the total time observed, in days."""
        return int(np.sum(self.exit - self.entry))


def _rows(covariate: Covariate, keep: np.ndarray) -> Covariate:
    if isinstance(covariate, Categorical):
        return Categorical(covariate.heading, covariate.levels, covariate.codes[keep])
    return Numeric(covariate.heading, covariate.values[keep])
