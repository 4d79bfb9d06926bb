"""Yearly answers about the coming years: what is expected, with bands, for one or several courses."""

from __future__ import annotations

from collections.abc import Sequence
from dataclasses import dataclass

import numpy as np

from vitalroll.caseload.courses import SOURCES, Course, Report, no_report, redraw
from vitalroll.caseload.inflow import Inflow
from vitalroll.caseload.projection import (
    MONTHS_PER_YEAR,
    Path,
    patient_years_by_year,
    project,
    yearly_sums,
)
from vitalroll.caseload.retention import Retention
from vitalroll.caseload.scenario import LONGEST_LEAD_MONTHS, Scenario
from vitalroll.caseload.uncertainty import Band, bands
from vitalroll.errors import Refusal
from vitalroll.outcomes.competing import WAYS_OF_LEAVING
from vitalroll.register.cohort import DEATHS


@dataclass(frozen=True)
class Measure:
    """One yearly quantity: ``expected``, shape (k,), and ``drawn``, shape (draws, k)."""

    expected: np.ndarray
    drawn: np.ndarray

    def bands(self, *, least: float | None = 0.0) -> list[Band]:
        """Return a band for each year; no limit lies below ``least``, where counts cannot."""
        drawn = self.drawn if least is None else np.maximum(self.drawn, least)
        return bands(self.expected, drawn)

    def less(self, other: Measure) -> Measure:
        """Return this less the other, draw for draw."""
        return Measure(self.expected - other.expected, self.drawn - other.drawn)

    def total(self) -> Measure:
        """Return all years together."""
        return Measure(self.expected.sum(keepdims=True), self.drawn.sum(axis=1, keepdims=True))


@dataclass(frozen=True)
class Outlook:
    """One course of the caseload: ``expected`` without a leading axis, ``drawn`` with draws first."""

    expected: Course
    drawn: Course

    def measure(self, of: object) -> Measure:
        """Return what a function of a ``Course`` gives for both."""
        return Measure(of(self.expected), of(self.drawn))

    @property
    def under_care(self) -> Measure:
        """At the end of each year, beginning with today."""
        return self.measure(lambda course: course.under_care[..., ::MONTHS_PER_YEAR])

    @property
    def patient_years(self) -> Measure:
        """Of care, in each year."""
        return self.measure(lambda course: patient_years_by_year(course.under_care))

    @property
    def newcomers(self) -> Measure:
        """In each year."""
        return self.measure(lambda course: yearly_sums(course.newcomers))

    def leaving(self, *ways: str) -> Measure:
        """Return those who leave in each year in any of the ways."""
        columns = [WAYS_OF_LEAVING.index(way) for way in ways]
        return self.measure(lambda course: course.leaving[..., columns].sum(axis=-1))

    @property
    def deaths(self) -> Measure:
        """Of all three kinds, in each year."""
        return self.leaving(*DEATHS)


@dataclass(frozen=True)
class Prospect:
    """The baseline, the scenarios beside it, and how much rests on held hazards.

    ``held_share``, shape (years + 1,), is the share of those expected under care (baseline) who
    have been here longer than the register supports, today and at the end of each year.
    """

    baseline: Outlook
    scenarios: list[Outlook]
    held_share: np.ndarray


def prospect(
    today: np.ndarray,
    hazards: Retention,
    inflow: Inflow,
    *,
    years: int,
    scenarios: Sequence[Scenario] = (),
    vary: Sequence[str] = SOURCES,
    times_today: float = 1.0,
    draws: int = 1000,
    seed: int = 1,
    report: Report = no_report,
) -> Prospect:
    """Project the caseload with its uncertainty; parameters as for ``courses.redraw``.

    Raises
    ------
    Refusal
        ``nobody_under_care`` when ``today`` is empty.
    """
    if len(today) == 0:
        raise Refusal("nobody_under_care")
    drawn = redraw(
        today,
        hazards,
        inflow,
        years=years,
        scenarios=scenarios,
        vary=vary,
        times_today=times_today,
        draws=draws,
        seed=seed,
        report=report,
    )
    paths = [
        _path(today, hazards, inflow, years=years, scenario=scenario, times_today=times_today)
        for scenario in (None, *scenarios)
    ]
    outlooks = [Outlook(_course(path), course) for path, course in zip(paths, drawn, strict=True)]
    return Prospect(
        baseline=outlooks[0],
        scenarios=outlooks[1:],
        held_share=(paths[0].beyond_support / np.maximum(paths[0].under_care, 1e-12))[::MONTHS_PER_YEAR],
    )


def expected_course(
    today: np.ndarray,
    hazards: Retention,
    inflow: Inflow,
    *,
    years: int,
    scenario: Scenario | None = None,
    times_today: float = 1.0,
) -> Course:
    """Return what is expected, without a leading axis."""
    return _course(_path(today, hazards, inflow, years=years, scenario=scenario, times_today=times_today))


def _path(
    today: np.ndarray,
    hazards: Retention,
    inflow: Inflow,
    *,
    years: int,
    scenario: Scenario | None,
    times_today: float,
) -> Path:
    return project(
        today,
        hazards,
        # Whoever is found early would have come after the horizon.
        inflow.per_year_ahead(years + LONGEST_LEAD_MONTHS // MONTHS_PER_YEAR),
        years=years,
        days_at_arrival=inflow.days_at_arrival,
        scenario=scenario,
        times_today=times_today,
    )


def _course(path: Path) -> Course:
    return Course(path.under_care, path.first_year, path.newcomers, yearly_sums(path.leaving.T).T)
