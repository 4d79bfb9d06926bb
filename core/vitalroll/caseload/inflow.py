"""How many newcomers a year: from the register's own history, or as somebody typed it."""

from __future__ import annotations

import datetime
import math
from collections.abc import Sequence
from dataclasses import dataclass, field
from typing import TYPE_CHECKING

import numpy as np

from vitalroll.errors import Caution, Refusal
from vitalroll.numbers import DAYS_PER_YEAR, Estimate, two_sided_z
from vitalroll.outcomes.person_time import poisson_limits
from vitalroll.register.cohort import Cohort

if TYPE_CHECKING:
    from vitalroll.caseload.trend import Trend

OVERDISPERSED_ABOVE = 1.5
"""Chi-squared per degree of freedom above which the years vary more than a Poisson count would."""

FEWEST_WHOLE_YEARS = 2
"""Whole calendar years below which the history gives no rate to project with."""

_CHANCE_OF_A_LATE_FIRST_ARRIVAL = 0.05
_CHANCE_OF_A_SILENT_END = 0.001
_DAYS_OF_OPENING = 365
_TIMES_AS_COMMON = 2


@dataclass(frozen=True)
class YearCount:
    """Newcomers of one calendar year; ``whole`` is False when only part of it was registered."""

    year: int
    count: int
    whole: bool


@dataclass(frozen=True)
class Inflow:
    """Newcomers a year, with what is needed to draw the rate and the counts again.

    Parameters
    ----------
    years : tuple of YearCount
        Every calendar year from the register's first day to its closing; empty when typed.
    per_year : Estimate
        Newcomers a year: mean over the whole years, with limits. NaN without a whole year.
        A typed figure has itself as both limits.
    dispersion : float
        Variance over mean of the yearly counts (chi-squared over its degrees of freedom);
        NaN with fewer than two whole years, 1 when typed.
    model : str
        ``poisson``, ``negative_binomial``, ``trend`` or ``typed``.
    whole_years : int
        Whole calendar years behind the mean.
    history_years : float
        From the first day anyone was seen here to the closing date.
    days_at_arrival : int array
        Days between start and arrival here, one entry for each newcomer of the history: 0 for
        those who started here, more for those who came later from elsewhere. A single 0 when
        the history has no newcomers.
    cautions : tuple of Caution
    growth_percent : float
        By how much each year after the first brings more newcomers than the year before.
    trend : Trend or None
        Carried on instead when the model is ``trend``.
    """

    years: tuple[YearCount, ...]
    per_year: Estimate
    dispersion: float
    model: str
    whole_years: int
    history_years: float
    days_at_arrival: np.ndarray = field(default_factory=lambda: np.zeros(1, dtype=np.int64))
    cautions: tuple[Caution, ...] = ()
    growth_percent: float = 0.0
    trend: Trend | None = None

    def growth(self, years: int) -> np.ndarray:
        """Return what the yearly number is multiplied by in each year ahead, shape (years,)."""
        return (1 + self.growth_percent / 100) ** np.arange(years)

    def per_year_ahead(self, years: int) -> np.ndarray:
        """Return the newcomers expected in each year ahead, shape (years,)."""
        if self.trend is not None:
            return self.trend.rates(years)
        return self.per_year.value * self.growth(years)

    @property
    def spread(self) -> float:
        """Variance over mean that the model uses: the dispersion if overdispersed, otherwise 1."""
        if self.model == "trend" and self.dispersion > OVERDISPERSED_ABOVE:
            return self.dispersion
        return self.dispersion if self.model == "negative_binomial" else 1.0


def inflow_from_history(cohort: Cohort, *, confidence: float = 0.95) -> Inflow:
    """Count newcomers by calendar year and give their mean over the whole years.

    A newcomer counts in the year in which observation began here: the start, or with delayed
    entry the day first seen. Those whose start lies before the register's first day and who
    were first seen within a year of it are taken for old cases, entered as they came by after it
    opened, if they are more than twice as common in that year as late entries are afterwards;
    otherwise they are newcomers referred late, like those afterwards.

    The last year is whole only if the closing date is its last day. The first year is whole
    unless its newcomers begin later than chance allows: if its c newcomers were spread evenly
    over its L days, all of them would fall on or after day a with probability
    ((L - a + 1)/L)^c, and below 0.05 the year is taken to have been opened part-way.

    Returns
    -------
    Inflow
        With one whole year the mean has Poisson limits and an unknown dispersion; without one
        it is NaN.

    Raises
    ------
    Refusal
        ``no_patients``; ``start_after_closing`` (with the line).

    Cautions
    --------
    ``history_too_short`` (whole_years, needed), ``newcomers_overdispersed`` (dispersion),
    ``newcomers_trend`` (percent_per_year, p), ``no_newcomers_lately`` (last, days),
    ``old_cases_not_newcomers`` (count), ``years_without_newcomers`` (count, year: the first of
    them).

    References
    ----------
    Garwood F (1936) Biometrika 28:437-442, limits of a Poisson mean. For the overdispersed
    case a negative binomial whose variance is dispersion times mean, fitted by moments; its
    limits are Garwood's with the total and the limits both scaled by the dispersion, so that
    they join Garwood's at a dispersion of 1.
    """
    if len(cohort) == 0:
        raise Refusal("no_patients")
    seen_first = cohort.start + cohort.entry
    if np.any(seen_first > cohort.closing):
        raise Refusal("start_after_closing", line=int(cohort.line[np.argmax(seen_first > cohort.closing)]))
    opening = int(seen_first.min())
    newcomer = ~_old_cases(cohort, seen_first, opening)
    arrivals = np.sort(seen_first[newcomer])
    years = _by_year(arrivals, opening, cohort.closing)
    counts = np.array([year.count for year in years if year.whole], dtype=np.int64)
    dispersion = _dispersion(counts)
    overdispersed = dispersion > OVERDISPERSED_ABOVE
    per_year = mean_of_counts(counts, spread=dispersion if overdispersed else 1.0, confidence=confidence)
    cautions = [
        *_cautions_about_counts(years, counts, dispersion),
        *_cautions_about_arrivals(arrivals, len(cohort) - len(arrivals), cohort.closing, per_year.value),
    ]
    return Inflow(
        years=years,
        per_year=per_year,
        dispersion=dispersion,
        model="negative_binomial" if overdispersed else "poisson",
        whole_years=len(counts),
        history_years=(cohort.closing - opening + 1) / DAYS_PER_YEAR,
        days_at_arrival=cohort.entry[newcomer] if newcomer.any() else np.zeros(1, dtype=np.int64),
        cautions=tuple(cautions),
    )


def inflow_typed(per_year: float, *, days_at_arrival: Sequence[int] | np.ndarray = (0,)) -> Inflow:
    """Take a yearly number of newcomers as given: the rate is certain, the counts are Poisson.

    ``days_at_arrival`` says how long after their start they come, as in ``Inflow``; by default
    all come on the day they start.

    Raises
    ------
    Refusal
        ``out_of_range`` for a negative or infinite number.
    """
    if not 0 <= per_year < math.inf:
        raise Refusal(
            "out_of_range", field="newcomers.per_year", given=per_year, least=0.0, greatest=math.inf
        )
    return Inflow(
        years=(),
        per_year=Estimate(per_year, per_year, per_year, 0.0),
        dispersion=1.0,
        model="typed",
        whole_years=0,
        history_years=math.nan,
        days_at_arrival=np.asarray(days_at_arrival, dtype=np.int64),
    )


def mean_of_counts(counts: np.ndarray, *, spread: float = 1.0, confidence: float = 0.95) -> Estimate:
    """Return the mean of yearly counts with Garwood's limits, scaled by ``spread`` (variance/mean).

    The limits of total/spread, scaled back: a spread of 1 gives Garwood's own. Counts from one
    to many years can never have a spread above their total. NaN without counts.
    """
    if len(counts) == 0:
        return Estimate(math.nan, math.nan, math.nan)
    total, years = float(np.sum(counts)), len(counts)
    lower, upper = poisson_limits(total / spread, confidence)
    return Estimate(
        value=total / years,
        lower=float(lower) * spread / years,
        upper=float(upper) * spread / years,
        standard_error=math.sqrt(total * spread) / years,
    )


def _old_cases(cohort: Cohort, seen_first: np.ndarray, opening: int) -> np.ndarray:
    """Return which patients were there before the register was, as a boolean array."""
    early = seen_first < opening + _DAYS_OF_OPENING
    before = early & (cohort.start < opening)
    afterwards = np.count_nonzero(~early)
    late_share = np.count_nonzero(~early & (cohort.entry > 0)) / afterwards if afterwards else 0.0
    common = np.count_nonzero(before) > _TIMES_AS_COMMON * late_share * np.count_nonzero(early)
    return before if common else np.zeros_like(before)


def _by_year(arrivals: np.ndarray, opening: int, closing: int) -> tuple[YearCount, ...]:
    first, last = datetime.date.fromordinal(opening).year, datetime.date.fromordinal(closing).year
    starts = np.array([datetime.date(year, 1, 1).toordinal() for year in range(first, last + 2)])
    bounds = np.searchsorted(arrivals, starts)
    found = []
    for i, year in enumerate(range(first, last + 1)):
        count = int(bounds[i + 1] - bounds[i])
        whole = closing >= starts[i + 1] - 1
        if year == first:
            length = int(starts[1] - starts[0])
            remaining = (length - (opening - int(starts[0]))) / length
            whole = whole and remaining ** max(count, 1) >= _CHANCE_OF_A_LATE_FIRST_ARRIVAL
        found.append(YearCount(year, count, bool(whole)))
    return tuple(found)


def _dispersion(counts: np.ndarray) -> float:
    """Return chi-squared for equal means over its degrees of freedom; NaN if it has none."""
    if len(counts) < 2 or counts.sum() == 0:
        return math.nan
    mean = counts.mean()
    return float(np.sum((counts - mean) ** 2) / mean / (len(counts) - 1))


def _cautions_about_counts(
    years: tuple[YearCount, ...], counts: np.ndarray, dispersion: float
) -> list[Caution]:
    cautions = []
    if len(counts) < FEWEST_WHOLE_YEARS:
        cautions.append(
            Caution("history_too_short", {"whole_years": len(counts), "needed": FEWEST_WHOLE_YEARS})
        )
    if dispersion > OVERDISPERSED_ABOVE:
        cautions.append(Caution("newcomers_overdispersed", {"dispersion": dispersion}))
    empty = [year.year for year in years if year.whole and year.count == 0]
    if empty:
        cautions.append(Caution("years_without_newcomers", {"count": len(empty), "year": empty[0]}))
    if len(counts) >= 3 and counts.sum() > 0:
        # Score test of a log-linear trend in Poisson counts, given their total.
        position = np.arange(len(counts)) - (len(counts) - 1) / 2
        mean, squares = counts.mean(), float(np.sum(position**2))
        slope = float(np.sum(position * counts)) / (mean * squares)
        z = slope * math.sqrt(mean * squares)
        if abs(z) > two_sided_z(0.95):
            p = math.erfc(abs(z) / math.sqrt(2))
            cautions.append(Caution("newcomers_trend", {"percent_per_year": 100 * slope, "p": p}))
    return cautions


def _cautions_about_arrivals(
    arrivals: np.ndarray, old_cases: int, closing: int, per_year: float
) -> list[Caution]:
    cautions = []
    if old_cases:
        cautions.append(Caution("old_cases_not_newcomers", {"count": old_cases}))
    if len(arrivals):
        silent = closing - int(arrivals[-1])
        if math.exp(-per_year * silent / DAYS_PER_YEAR) < _CHANCE_OF_A_SILENT_END:
            last = datetime.date.fromordinal(int(arrivals[-1])).isoformat()
            cautions.append(Caution("no_newcomers_lately", {"last": last, "days": silent}))
    return cautions
