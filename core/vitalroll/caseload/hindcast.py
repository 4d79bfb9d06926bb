"""Would the projection have been right? Fit up to an earlier day, project to the closing, compare."""

from __future__ import annotations

from dataclasses import dataclass, replace

import numpy as np

from vitalroll.caseload.courses import SOURCES, Report, no_report, redraw
from vitalroll.caseload.inflow import FEWEST_WHOLE_YEARS, Inflow, inflow_from_history
from vitalroll.caseload.outlook import Measure, Outlook, prospect
from vitalroll.caseload.projection import MONTHS_PER_YEAR, months_here_today
from vitalroll.caseload.retention import Retention, retention
from vitalroll.caseload.trend import inflow_with_trend
from vitalroll.caseload.uncertainty import Band
from vitalroll.errors import Refusal
from vitalroll.numbers import DAYS_PER_MONTH
from vitalroll.outcomes.risk_table import risk_table
from vitalroll.register.cohort import Cohort, meaning_code

LEVELS = (50, 80, 95)
"""Per cent of the draws that a band holds."""


@dataclass(frozen=True)
class BackTest:
    """A projection from an earlier day to the closing, and what happened.

    Parameters
    ----------
    origin : int
        Ordinal of the day up to which the register was read.
    years : int
    under_care : list of Band
        At the origin and at the end of each month after it.
    seen : int array, shape (months + 1,)
        Patients really under care on those days.
    newcomers, leaving : Band
        In all.
    seen_newcomers, seen_leaving : int
    """

    origin: int
    years: int
    under_care: list[Band]
    seen: np.ndarray
    newcomers: Band
    leaving: Band
    seen_newcomers: int
    seen_leaving: int

    @property
    def held(self) -> dict[int, bool]:
        """Say for each of ``LEVELS`` whether its band held the number under care at the closing."""
        band, seen = self.under_care[-1], self.seen[-1]
        limits = dict(zip(LEVELS, (band.p50, band.p80, band.p95), strict=True))
        return {level: bool(low <= seen <= high) for level, (low, high) in limits.items()}


def as_recorded(cohort: Cohort, day: int) -> Cohort:
    """Return the register as it would have been frozen on ``day``.

    Who came later is left out; who left later, or was seen later, is under care until ``day``.
    Hindsight stays in one thing: who is lost by now is lost since the last visit, but on ``day``
    that may not have been known yet.
    """
    come = cohort.having(cohort.start + cohort.entry <= day)
    later = come.start + come.exit > day
    return replace(
        come,
        exit=np.where(later, np.maximum(day - come.start, come.entry), come.exit),
        outcome=np.where(later, meaning_code("under_care"), come.outcome),
        closing=day,
    )


def under_care_on(cohort: Cohort, days: np.ndarray) -> np.ndarray:
    """Count the patients under care at the end of each day (ordinals)."""
    first = np.sort(cohort.start + cohort.entry)
    left = np.sort((cohort.start + cohort.exit)[cohort.outcome != meaning_code("under_care")])
    return np.searchsorted(first, days, side="right") - np.searchsorted(left, days, side="right")


def back_test(
    cohort: Cohort, years: int, *, damping: float | None = None, draws: int = 1000, seed: int = 1
) -> BackTest:
    """Project the last ``years`` years from what was known before them.

    With ``damping`` the trend of the newcomers is carried on (``trend.inflow_with_trend``); without,
    their mean.

    Raises
    ------
    Refusal
        ``back_test_history_too_short`` (back_years; whole_years, needed) when fewer than two whole years
        of newcomers lie before; ``trend_history_too_short`` when fewer than three do and a trend is
        asked for; ``nobody_under_care``; ``no_person_time``.
    """
    origin = cohort.closing - round(years * MONTHS_PER_YEAR * DAYS_PER_MONTH)
    known = as_recorded(cohort, origin)
    inflow = inflow_from_history(known) if len(known) else None
    if inflow is None or inflow.whole_years < FEWEST_WHOLE_YEARS:
        raise Refusal(
            "back_test_history_too_short",
            field="back_years",
            whole_years=inflow.whole_years if inflow else 0,
            needed=FEWEST_WHOLE_YEARS,
        )
    if damping is not None:
        inflow = inflow_with_trend(inflow, origin, damping=damping)
    found = prospect(
        months_here_today(known), retention(risk_table(known)), inflow, years=years, draws=draws, seed=seed
    ).baseline
    months = np.arange(MONTHS_PER_YEAR * years + 1)
    days = origin + np.round(months * DAYS_PER_MONTH).astype(np.int64)
    first = cohort.start + cohort.entry
    gone = (cohort.start + cohort.exit)[cohort.outcome != meaning_code("under_care")]
    return BackTest(
        origin=origin,
        years=years,
        under_care=found.measure(lambda course: course.under_care).bands(),
        seen=under_care_on(cohort, days),
        newcomers=found.newcomers.total().bands()[0],
        leaving=_leaving(found).bands()[0],
        seen_newcomers=int(np.count_nonzero((first > origin) & (first <= cohort.closing))),
        seen_leaving=int(np.count_nonzero((gone > origin) & (gone <= cohort.closing))),
    )


def back_tests(
    cohort: Cohort,
    *,
    most_years: int,
    damping: float | None = None,
    draws: int = 1000,
    seed: int = 1,
    report: Report = no_report,
) -> list[BackTest]:
    """Back-test over one year, two years and so on, as far as the history allows.

    Raises
    ------
    Refusal
        That of ``back_test`` when not even one year can be tested.
    """
    found = []
    for years in range(1, most_years + 1):
        report("back_tests", years - 1, most_years)
        try:
            found.append(back_test(cohort, years, damping=damping, draws=draws, seed=seed))
        except Refusal:
            if years == 1:
                raise
            break
    report("back_tests", most_years, most_years)
    return found


def parts_of_the_band(
    today: np.ndarray,
    hazards: Retention,
    inflow: Inflow,
    *,
    years: int,
    times_today: float = 1.0,
    draws: int = 1000,
    seed: int = 1,
    report: Report = no_report,
) -> dict[str, np.ndarray]:
    """Return the variance of the caseload at the end of each year that comes from each source alone.

    Keys are ``courses.SOURCES``, arrays have shape (years,). Each source is redrawn with the other two
    held at what is expected; products of two of them, which are small, are in none.
    """
    found = {}
    for position, source in enumerate(SOURCES):
        report("parts", position, len(SOURCES))
        course = redraw(
            today,
            hazards,
            inflow,
            years=years,
            vary=(source,),
            times_today=times_today,
            draws=draws,
            seed=seed,
        )[0]
        found[source] = course.under_care[:, MONTHS_PER_YEAR::MONTHS_PER_YEAR].var(axis=0, ddof=1)
    report("parts", len(SOURCES), len(SOURCES))
    return found


def _leaving(outlook: Outlook) -> Measure:
    return outlook.measure(lambda course: course.leaving.sum(axis=-1)).total()
