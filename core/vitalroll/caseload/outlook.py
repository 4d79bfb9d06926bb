"""Yearly answers about the coming years: what is expected, with bands, and what a change makes."""

from __future__ import annotations

from dataclasses import dataclass

import numpy as np

from vitalroll.caseload.inflow import Inflow
from vitalroll.caseload.projection import (
    MONTHS_PER_YEAR,
    Path,
    patient_years_by_year,
    project,
    yearly_sums,
)
from vitalroll.caseload.resources import PerPatientYear
from vitalroll.caseload.retention import Retention
from vitalroll.caseload.scenario import WhatIf
from vitalroll.caseload.uncertainty import Band, Course, Report, bands, no_report, redraw
from vitalroll.errors import Refusal
from vitalroll.outcomes.competing import WAYS_OF_LEAVING
from vitalroll.register.cohort import DEATHS


@dataclass(frozen=True)
class Measure:
    """One yearly quantity: ``expected``, shape (k,), and ``drawn``, shape (draws, k)."""

    expected: np.ndarray
    drawn: np.ndarray

    def bands(self) -> list[Band]:
        """Return a band for each year."""
        return bands(self.expected, self.drawn)

    def less(self, other: Measure) -> Measure:
        """Return this less the other, draw for draw."""
        return Measure(self.expected - other.expected, self.drawn - other.drawn)

    def total(self) -> Band:
        """Return the band of all years together."""
        return bands(self.expected.sum(keepdims=True), self.drawn.sum(axis=1, keepdims=True))[0]


@dataclass(frozen=True)
class Outlook:
    """One course of the caseload, year by year.

    ``under_care`` is at the end of each year and begins with today; everything else is within
    each year. ``leaving`` holds every way of leaving, ``resources`` the amounts by name.
    """

    under_care: Measure
    patient_years: Measure
    newcomers: Measure
    deaths: Measure
    lost: Measure
    leaving: dict[str, Measure]
    resources: dict[str, Measure]

    def compared(self) -> dict[str, Measure]:
        """Return the measures in which two courses are compared, by name."""
        names = ("under_care", "patient_years", "newcomers", "deaths", "lost")
        return {name: getattr(self, name) for name in names} | self.resources


@dataclass(frozen=True)
class Prospect:
    """The baseline, the what-if beside it if there is one, and how much rests on held hazards.

    ``held_share``, shape (years + 1,), is the share of those expected under care (baseline) who
    have been here longer than the register supports, today and at the end of each year.
    """

    baseline: Outlook
    what_if: Outlook | None
    held_share: np.ndarray


def prospect(
    today: np.ndarray,
    hazards: Retention,
    inflow: Inflow,
    resources: PerPatientYear,
    *,
    years: int,
    what_if: WhatIf | None = None,
    draws: int = 1000,
    seed: int = 1,
    report: Report = no_report,
) -> Prospect:
    """Project the caseload with its uncertainty; parameters as for ``uncertainty.redraw``.

    Raises
    ------
    Refusal
        ``nobody_under_care`` when ``today`` is empty; ``out_of_range`` (what_if.from_year) when
        the change would begin after the last projected year.
    """
    if len(today) == 0:
        raise Refusal("nobody_under_care")
    if what_if and what_if.from_year > years:
        raise Refusal(
            "out_of_range", field="what_if.from_year", given=what_if.from_year, least=1, greatest=years
        )
    drawn = redraw(
        today, hazards, inflow, years=years, what_if=what_if, draws=draws, seed=seed, report=report
    )
    rate = inflow.per_year.value
    late = inflow.days_at_arrival
    expected = project(today, hazards, rate, years=years, days_at_arrival=late)
    changed = None
    if what_if:
        altered = project(today, hazards, rate, years=years, days_at_arrival=late, what_if=what_if)
        changed = _outlook(altered, drawn.what_if, resources)
    return Prospect(
        baseline=_outlook(expected, drawn.baseline, resources),
        what_if=changed,
        held_share=(expected.beyond_support / expected.under_care)[::MONTHS_PER_YEAR],
    )


def _outlook(path: Path, course: Course, resources: PerPatientYear) -> Outlook:
    leaving = Measure(yearly_sums(path.leaving.T).T, course.leaving)
    patient_years = Measure(patient_years_by_year(path.under_care), patient_years_by_year(course.under_care))
    needed = resources.needed(patient_years.expected), resources.needed(patient_years.drawn)

    def leaving_by(ways: tuple[str, ...]) -> Measure:
        columns = [WAYS_OF_LEAVING.index(way) for way in ways]
        return Measure(leaving.expected[:, columns].sum(axis=1), leaving.drawn[:, :, columns].sum(axis=2))

    return Outlook(
        under_care=Measure(path.under_care[::MONTHS_PER_YEAR], course.under_care[:, ::MONTHS_PER_YEAR]),
        patient_years=patient_years,
        newcomers=Measure(yearly_sums(path.newcomers), course.newcomers),
        deaths=leaving_by(DEATHS),
        lost=leaving_by(("lost",)),
        leaving={way: leaving_by((way,)) for way in WAYS_OF_LEAVING},
        resources={name: Measure(needed[0][name], needed[1][name]) for name in needed[0]},
    )
