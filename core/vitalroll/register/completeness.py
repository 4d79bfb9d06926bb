"""How complete follow-up is, and what is missing where."""

from __future__ import annotations

from collections.abc import Sequence
from dataclasses import dataclass

import numpy as np

from vitalroll.register.cohort import DEATHS, Categorical, Cohort, meaning_code
from vitalroll.register.profile import Register
from vitalroll.register.recognition import words
from vitalroll.register.spelling import bare

KNOWN_ENDINGS = ("recovered", "moved_away", "stopped")
ENDINGS: tuple[tuple[str, tuple[str, ...]], ...] = (
    ("under_care", ("under_care",)),
    ("died", DEATHS),
    ("lost", ("lost",)),
    ("known", KNOWN_ENDINGS),
)
"""Endings that missing cells are counted by."""


@dataclass(frozen=True)
class Completeness:
    """The person-time index of some patients.

    ``index`` is observed time over the time that could have been observed, a death being a complete
    observation; ``with_known`` takes recovery, moving away and stopping for complete observations too.
    NaN where no time could have been observed. ``group`` is a year, a level, or None for everybody.
    """

    group: int | str | None
    n: int
    observed_days: int
    possible_days: int
    index: float
    with_known: float


def completeness(cohort: Cohort, chosen: np.ndarray, group: int | str | None) -> Completeness:
    """Return the person-time index (Clark, Altman & De Stavola 2002, Lancet 359:1309).

    Parameters
    ----------
    cohort : Cohort
    chosen : bool array
        The patients to look at.
    group : what they are called

    Notes
    -----
    The time that could have been observed runs from entry to the closing date, or to death.
    """
    entry, exit_, outcome = cohort.entry[chosen], cohort.exit[chosen], cohort.outcome[chosen]
    died = np.isin(outcome, [meaning_code(meaning) for meaning in DEATHS])
    known = died | np.isin(outcome, [meaning_code(meaning) for meaning in KNOWN_ENDINGS])
    observed = exit_ - entry
    to_closing = np.maximum(cohort.closing - cohort.start[chosen] - entry, observed)
    possible = int(np.where(died, observed, to_closing).sum())
    possible_known = int(np.where(known, observed, to_closing).sum())
    seen = int(observed.sum())
    return Completeness(
        group,
        int(chosen.sum()),
        seen,
        possible,
        seen / possible if possible else float("nan"),
        seen / possible_known if possible_known else float("nan"),
    )


def completeness_by_year(cohort: Cohort) -> list[Completeness]:
    """Return the index for the patients who started in each calendar year."""
    years = (cohort.start - 719_163).astype("datetime64[D]").astype("datetime64[Y]").astype(np.int64) + 1970
    return [completeness(cohort, years == year, year) for year in np.unique(years).tolist()]


def completeness_by_level(cohort: Cohort, site: Categorical) -> list[Completeness]:
    """Return the index for the patients of each level of a grouping; nobody's level is left out."""
    return [completeness(cohort, site.codes == code, level) for code, level in enumerate(site.levels)]


@dataclass(frozen=True)
class Missing:
    """How many cells of a column are blank or say that nothing is known.

    ``by_ending`` gives, in the order of ENDINGS, patients and missing cells of those with that ending;
    ``n`` and ``missing`` are of all rows that describe a patient.
    """

    column: str
    n: int
    missing: int
    by_ending: tuple[tuple[int, int], ...]


def missingness(
    register: Register, columns: Sequence[str], rows: np.ndarray, outcome: np.ndarray
) -> list[Missing]:
    """Return what is missing in columns, in all rows and by how follow-up ended.

    Parameters
    ----------
    register : Register
    columns : identifiers
    rows : int array
        Positions of the rows of the cohort.
    outcome : int array
        How each of those ended.
    """
    patients = register.source.patients()
    nothing = set(words()["placeholders"])
    found = []
    for identifier in columns:
        column = register.profile(identifier, "columns").column
        blank = np.array([bare(text) == "" or bare(text) in nothing for text in column.texts])
        missing = blank[column.codes]
        by_ending = []
        for _, meanings in ENDINGS:
            these = rows[np.isin(outcome, [meaning_code(meaning) for meaning in meanings])]
            by_ending.append((len(these), int(missing[these].sum())))
        found.append(
            Missing(identifier, int(patients.sum()), int((missing & patients).sum()), tuple(by_ending))
        )
    return found
