"""Time at risk cut along several time scales at once: calendar year, age, time since the start."""

from __future__ import annotations

import datetime
from collections.abc import Sequence
from dataclasses import dataclass

import numpy as np

from vitalroll.errors import Refusal
from vitalroll.numbers import DAYS_PER_YEAR
from vitalroll.register.cohort import Cohort, Numeric


@dataclass(frozen=True)
class Scale:
    """A time scale with its bands.

    Parameters
    ----------
    offset : float array, shape (n,)
        Where each patient stands on the scale, in days, when follow-up starts; NaN where nobody knows.
    edges : float array, shape (b + 1,)
        Where the bands begin, and where the last one ends; ascending, in days.
    """

    offset: np.ndarray
    edges: np.ndarray

    @property
    def bands(self) -> int:
        """Number of bands."""
        return len(self.edges) - 1


@dataclass(frozen=True)
class Pieces:
    """Follow-up cut at every edge of every scale.

    ``patient`` is the row of the cohort, ``days`` the length, ``band`` the position on each scale (scales,
    pieces) and ``last`` whether the patient left at the end of the piece: an outcome belongs there.
    """

    patient: np.ndarray
    days: np.ndarray
    band: np.ndarray
    last: np.ndarray


def calendar_years(cohort: Cohort) -> tuple[Scale, tuple[int, ...]]:
    """Return the calendar as a scale of whole years, and those years."""
    first = datetime.date.fromordinal(int((cohort.start + cohort.entry).min())).year
    last = datetime.date.fromordinal(int((cohort.start + cohort.exit).max())).year
    years = tuple(range(first, last + 1))
    begins = [datetime.date(year, 1, 1).toordinal() for year in (*years, last + 1)]
    return Scale(cohort.start.astype(float), np.array(begins, dtype=float)), years


def years_since_start(cohort: Cohort, edges: Sequence[float]) -> Scale:
    """Return time since the start as a scale; edges in years, the last one open to the end."""
    return Scale(np.zeros(len(cohort)), _open_ended(edges))


def ages(cohort: Cohort, edges: Sequence[float]) -> Scale:
    """Return age as a scale; edges in years, the last one open to the end.

    Raises
    ------
    Refusal
        ``age_not_known`` when the cohort has no age.
    """
    age = cohort.covariates.get("age")
    if not isinstance(age, Numeric):
        raise Refusal("age_not_known")
    return Scale(age.values * DAYS_PER_YEAR, _open_ended(edges))


def _open_ended(edges: Sequence[float]) -> np.ndarray:
    return np.append(np.asarray(edges, dtype=float) * DAYS_PER_YEAR, np.inf)


def split(cohort: Cohort, scales: Sequence[Scale]) -> Pieces:
    """Cut every patient's follow-up at every edge of every scale.

    A piece runs from one cut to the next and lies in one band of each scale; an outcome on the very day
    of a cut ends the piece before it. Time outside the bands of a scale, and patients whose place on a scale
    is not known, are left out. Splitting changes no total.

    References
    ----------
    Lexis diagram: Clayton & Hills (1993) Statistical Models in Epidemiology, ch. 6.
    """
    known = np.ones(len(cohort), dtype=bool)
    for scale in scales:
        known &= ~np.isnan(scale.offset)
    who = np.flatnonzero(known)
    entry, exit = cohort.entry[who].astype(float), cohort.exit[who].astype(float)
    patient, time = [who], [entry]
    for scale in scales:
        # The edges strictly within each patient's follow-up are neighbours: a first one and how many.
        first = np.searchsorted(scale.edges, scale.offset[who] + entry, side="right")
        beyond = np.searchsorted(scale.edges, scale.offset[who] + exit, side="left")
        many = np.maximum(beyond - first, 0)
        position = np.arange(many.sum()) - np.repeat(np.cumsum(many) - many, many) + np.repeat(first, many)
        patient.append(np.repeat(who, many))
        time.append(scale.edges[position] - np.repeat(scale.offset[who], many))
    patients, times = np.concatenate(patient), np.concatenate(time)
    order = np.lexsort((times, patients))
    patients, times = patients[order], times[order]
    last = np.append(patients[1:] != patients[:-1], True) if len(patients) else np.zeros(0, dtype=bool)
    ends = np.where(last, cohort.exit[patients], np.append(times[1:], 0.0))
    days = ends - times
    # The middle of a piece is inside its bands whatever the rounding of its ends.
    middle = times + days / 2
    band = np.stack([
        np.searchsorted(scale.edges, scale.offset[patients] + middle, side="right") - 1 for scale in scales
    ])  # fmt: skip
    inside = np.ones(len(patients), dtype=bool)
    for row, scale in zip(band, scales, strict=True):
        inside &= (row >= 0) & (row < scale.bands)
    # Two scales may have an edge at one moment; a piece without time counts only when somebody left there.
    inside &= (days > 0) | last
    return Pieces(patients[inside], days[inside], band[:, inside], last[inside])
