"""The expected caseload, month by month: today's patients run forward, newcomers added.

A discrete cohort-component model. Patients stand in slots by time since their start: slot 0
holds those who start within the month, slot 1 those up to one month from their start, and so on.
Each month everyone moves on by one slot or leaves in one of the ways in ``competing.WAYS_OF_LEAVING``. The
last slot gathers all who have been here longer than the register supports.
"""

from __future__ import annotations

from dataclasses import dataclass

import numpy as np

from vitalroll.caseload.retention import Retention
from vitalroll.caseload.scenario import Scenario, as_it_is
from vitalroll.errors import Refusal
from vitalroll.numbers import DAYS_PER_MONTH
from vitalroll.outcomes.competing import WAYS_OF_LEAVING
from vitalroll.register.cohort import Cohort, meaning_code

MONTHS_PER_YEAR = 12


@dataclass(frozen=True)
class Ageing:
    """The slots of time since start, cut into runs of slots that share one hazard.

    Parameters
    ----------
    slots : int
    begins : int array, shape (runs,)
        First slot of each run. Runs alternate: the slots wholly inside a stretch of the
        retention, then the one slot whose step crosses into the next stretch.
    mixing : float array, shape (runs, stretches)
        Share of the step's time that falls in each stretch: a patient in the m-th month is on
        average m - 1/2 months from the start, so the step out of the last month of a stretch
        lies half in it and half in the next one.
    tail : float
        What the hazard beyond the last stretch, in the last slot, is multiplied by.
    """

    slots: int
    begins: np.ndarray
    mixing: np.ndarray
    tail: float = 1.0

    @property
    def run_of_slot(self) -> np.ndarray:
        """Which run each slot belongs to, shape (slots,)."""
        return np.repeat(np.arange(len(self.begins)), np.diff([*self.begins, self.slots]))

    def hazards(self, yearly: np.ndarray) -> np.ndarray:
        """Turn yearly hazards (..., stretches, ways) into monthly ones of each run (..., runs, ways)."""
        monthly = np.einsum("rs,...sw->...rw", self.mixing, yearly) / MONTHS_PER_YEAR
        if self.tail != 1:
            monthly[..., -1, :] *= self.tail
        return monthly

    def place(self, months_since_start: np.ndarray) -> np.ndarray:
        """Count patients into the slots, given whole months since start."""
        return np.bincount(np.minimum(months_since_start + 1, self.slots - 1), minlength=self.slots)

    def arriving(self, days_since_start: np.ndarray) -> np.ndarray:
        """Return the shares of newcomers that go into each slot, shape (slots,), adding up to 1.

        Who arrives with half a month or more since the start goes where he or she will be found,
        on average, at the end of the month: into the slot before that. Such a newcomer goes through
        the hazard of a whole month in the month of arrival, instead of half a one.
        """
        slots = np.rint(np.asarray(days_since_start) / DAYS_PER_MONTH).astype(np.int64)
        counts = np.bincount(np.minimum(slots, self.slots - 1), minlength=self.slots)
        return counts / counts.sum()

    def staying(self, monthly: np.ndarray) -> np.ndarray:
        """Return each slot's chance of staying through a month (..., slots), from ``hazards``.

        exp(-H), except for those who start within the month: they arrive evenly spread over it, so
        survival is averaged over the month, (1 - exp(-H))/H (Capocaccia & De Angelis 1997, Stat
        Med 16:425-440, average in the same way over the year of diagnosis).
        """
        total = monthly.sum(axis=-1)
        chance = np.exp(-total)[..., self.run_of_slot]
        first = total[..., 0]
        positive = np.where(first > 0, first, 1.0)
        chance[..., 0] = np.where(first > 0, -np.expm1(-positive) / positive, 1.0)
        return chance


@dataclass(frozen=True)
class Path:
    """The expected course of a caseload.

    Parameters
    ----------
    under_care : float array, shape (months + 1,)
        Patients under care at the end of each month; the first entry is today.
    first_year : float array, shape (months + 1,)
        Those of ``under_care`` whose start lies less than a year back.
    newcomers : float array, shape (months,)
    leaving : float array, shape (months, len(WAYS_OF_LEAVING))
    beyond_support : float array, shape (months + 1,)
        Those of ``under_care`` who have been here longer than hazards were observed.
    """

    under_care: np.ndarray
    first_year: np.ndarray
    newcomers: np.ndarray
    leaving: np.ndarray
    beyond_support: np.ndarray


def ageing(edges: np.ndarray, *, cuts: tuple[int, ...] = (), tail: float = 1.0) -> Ageing:
    """Lay out the slots for stretches with the given edges (whole years, from 0).

    ``cuts`` are slots at which a run begins besides, without changing any hazard; ``tail``
    multiplies the hazard of the last slot, which is then a run of its own.
    """
    stretch = np.eye(len(edges) - 1)
    ends = np.asarray(edges[1:] * MONTHS_PER_YEAR, dtype=np.int64)
    begins, mixing = [0], [stretch[0]]
    for this, end in enumerate(ends[:-1]):
        begins += [int(end), int(end) + 1]
        mixing += [(stretch[this] + stretch[this + 1]) / 2, stretch[this + 1]]
    # The hazard of the last stretch is held beyond its end: nothing to cross there.
    slots = int(ends[-1]) + 2
    for cut in (*cuts, slots - 1) if tail != 1 else cuts:
        if cut not in begins and cut < slots:
            position = int(np.searchsorted(begins, cut))
            begins.insert(position, cut)
            mixing.insert(position, mixing[position - 1])
    return Ageing(slots=slots, begins=np.array(begins), mixing=np.array(mixing), tail=tail)


def months_here_today(cohort: Cohort) -> np.ndarray:
    """Return whole months since start at the closing date, for each patient under care.

    Time counts up to the closing date, not to the last contact: somebody under care who was
    last seen a year ago has been under care for that year too.

    Raises
    ------
    Refusal
        ``start_after_closing`` (with the line).
    """
    days = cohort.closing - cohort.start
    if np.any(days < 0):
        raise Refusal("start_after_closing", line=int(cohort.line[np.argmax(days < 0)]))
    under_care = cohort.outcome == meaning_code("under_care")
    return np.floor(days[under_care] / DAYS_PER_MONTH).astype(np.int64)


def shares_by_way(monthly: np.ndarray) -> np.ndarray:
    """Return h_k/H, the chance that who leaves does so by each way; zeros when nobody leaves."""
    total = monthly.sum(axis=-1, keepdims=True)
    return np.divide(monthly, total, out=np.zeros_like(monthly), where=total > 0)


def project(
    today: np.ndarray,
    hazards: Retention,
    newcomers_per_year: float | np.ndarray,
    *,
    years: int,
    days_at_arrival: np.ndarray | None = None,
    scenario: Scenario | None = None,
    times_today: float = 1.0,
) -> Path:
    """Run the caseload forward and return what is expected.

    Parameters
    ----------
    today : int array, shape (n,)
        Whole months since start of each patient under care today.
    hazards : Retention
    newcomers_per_year : float or float array, shape (at least ``years``,)
        Arriving evenly through each year; the last one holds for later years.
    years : int
    days_at_arrival : int array, optional
        Days since start of newcomers as they arrive, a sample; by default all start here.
    scenario : Scenario, optional
    times_today : float
        What the patients of ``today`` are multiplied by, when the register does not hold all.

    Returns
    -------
    Path
        In every month: under care before + newcomers = under care after + leaving.

    Raises
    ------
    Refusal
        ``out_of_range`` for fewer than one year or a negative number of newcomers.

    References
    ----------
    Exits by way in a month, (h_k/H)(1 - exp(-H)): competing hazards constant within the step.
    Today's patients by survival conditional on time already spent here, newcomers by survival
    since arrival: Verdecchia et al. (2002) Stat Med 21:3511-3526.
    """
    if years < 1:
        raise Refusal("out_of_range", field="years", given=years, least=1)
    rate = np.atleast_1d(np.asarray(newcomers_per_year, dtype=float))
    if np.any(rate < 0):
        raise Refusal("out_of_range", field="newcomers.per_year", given=float(rate.min()), least=0.0)
    steps = MONTHS_PER_YEAR * years
    axis = ageing(hazards.edges, tail=hazards.tail)
    monthly = axis.hazards(hazards.hazards)
    kept = scenario.over(steps) if scenario else as_it_is(steps)
    lead = kept.lead_months
    due = rate[np.minimum(np.arange(steps + lead) // MONTHS_PER_YEAR, len(rate) - 1)] / MONTHS_PER_YEAR
    early = kept.found_early * due[lead : steps + lead]
    arriving = (due[:steps] - np.concatenate((np.zeros(lead), early))[:steps]) * kept.newcomers
    early = early * kept.newcomers
    into = axis.arriving(np.zeros(1) if days_at_arrival is None else days_at_arrival)
    here, found = times_today * axis.place(today), np.zeros(axis.slots)
    under_care, first_year, beyond = ([of(here)] for of in (np.sum, _within_a_year, _last))
    leaving = np.empty((steps, len(WAYS_OF_LEAVING)))
    for month in range(steps):
        here, left = _month(axis, here + arriving[month] * into, monthly * kept.hazards[month])
        found[0] += early[month]
        found, left_of_found = _month(axis, found, monthly * kept.hazards[month] * kept.hazards_early)
        leaving[month] = left + left_of_found
        under_care.append(here.sum() + found.sum())
        first_year.append(_within_a_year(here) + _within_a_year(found))
        beyond.append(here[-1] + found[-1])
    return Path(np.array(under_care), np.array(first_year), arriving + early, leaving, np.array(beyond))


def _month(axis: Ageing, here: np.ndarray, monthly: np.ndarray) -> tuple[np.ndarray, np.ndarray]:
    """Return those here a month later and those who have left by way."""
    leavers = here * (1 - axis.staying(monthly))
    return moved_on(here - leavers), np.add.reduceat(leavers, axis.begins) @ shares_by_way(monthly)


def _within_a_year(here: np.ndarray) -> float:
    return float(here[: MONTHS_PER_YEAR + 1].sum())


def _last(here: np.ndarray) -> float:
    return float(here[-1])


def moved_on(staying: np.ndarray) -> np.ndarray:
    """Return patients one slot further from their start (last axis), slot 0 left empty."""
    later = np.empty_like(staying)
    later[..., 0] = 0
    later[..., 1:] = staying[..., :-1]
    later[..., -1] += staying[..., -1]
    return later


def patient_years_by_year(under_care: np.ndarray) -> np.ndarray:
    """Return patient-years of care in each year from month-end counts (..., months + 1).

    Who comes or leaves within a month counts half of it on average (trapezoid rule).
    """
    return yearly_sums((under_care[..., 1:] + under_care[..., :-1]) / (2 * MONTHS_PER_YEAR))


def yearly_sums(monthly: np.ndarray) -> np.ndarray:
    """Sum the last axis, months, into years."""
    return monthly.reshape(*monthly.shape[:-1], -1, MONTHS_PER_YEAR).sum(axis=-1)
