"""How often an outcome comes for the time people are observed, and rates made comparable."""

from __future__ import annotations

from collections.abc import Collection, Sequence
from dataclasses import dataclass

import numpy as np
from scipy.special import betaincinv, gammaincinv

from vitalroll.errors import Refusal
from vitalroll.numbers import DAYS_PER_YEAR, NOT_GIVEN, Estimate
from vitalroll.outcomes.lexis import Pieces
from vitalroll.outcomes.limits import check_confidence
from vitalroll.outcomes.person_time import rate
from vitalroll.outcomes.risk_table import interest_codes
from vitalroll.register.cohort import Cohort

STANDARD_AGES = tuple(range(0, 90, 5))
"""Beginnings of the five-year bands in which standards are given; the last one is open."""

STANDARDS = {
    # Ahmad and others (2001) Age standardization of rates: a new WHO standard, GPE discussion paper 31,
    # table 4; 85 and over put together. They sum to 100.035; only their proportions matter here.
    "who_world": (
        8.86, 8.69, 8.60, 8.47, 8.22, 7.93, 7.61, 7.15, 6.59,
        6.04, 5.37, 4.55, 3.72, 2.96, 2.21, 1.52, 0.91, 0.635,
    ),
    # Segi (1960), as modified by Doll, Payne & Waterhouse (1966).
    "segi": (12, 10, 9, 9, 8, 8, 6, 6, 6, 6, 5, 4, 4, 3, 2, 1, 0.5, 0.5),
}  # fmt: skip


THIN = 10
"""Person-years below which the rate of a band says next to nothing (common practice)."""


@dataclass(frozen=True)
class BandRate:
    """One band: outcomes, person-years and the rate per person-year with Garwood's limits."""

    events: int
    person_years: float
    rate: Estimate


def rates_by_band(
    cohort: Cohort,
    pieces: Pieces,
    scale: int,
    bands: int,
    interest: Collection[str],
    *,
    inside: np.ndarray | None = None,
    confidence: float = 0.95,
) -> tuple[BandRate, ...]:
    """Return the rate in each band of one scale.

    Parameters
    ----------
    pieces : Pieces
    scale : int
        Which of the scales that the pieces were cut by.
    bands : int
        How many bands it has.
    inside : bool array, shape (n,)
        Patients that count; None for all.
    """
    take = slice(None) if inside is None else inside[pieces.patient]
    patient, days = pieces.patient[take], pieces.days[take]
    band, last = pieces.band[scale][take], pieces.last[take]
    hit = last & np.isin(cohort.outcome[patient], interest_codes(interest))
    events = np.bincount(band[hit], minlength=bands)
    years = np.bincount(band, weights=days, minlength=bands) / DAYS_PER_YEAR
    return tuple(
        BandRate(int(d), float(y), rate(int(d), float(y), confidence))
        for d, y in zip(events, years, strict=True)
    )


def rate_ratio(
    events: int, person_years: float, other_events: int, other_person_years: float, confidence: float = 0.95
) -> Estimate:
    """Return the ratio of two rates with exact limits, conditional on all outcomes.

    Given all outcomes, those of the first group are binomial with p = R y1 / (R y1 + y0); Clopper and
    Pearson's limits of p give those of R.

    References
    ----------
    Rothman, Greenland & Lash (2008) Modern Epidemiology, 3rd ed, ch. 14.
    """
    check_confidence(confidence)
    total = events + other_events
    if total == 0 or person_years <= 0 or other_person_years <= 0:
        return NOT_GIVEN
    tail = (1 - confidence) / 2
    lower = betaincinv(events, other_events + 1, tail) if events else 0.0
    upper = betaincinv(events + 1, other_events, 1 - tail) if other_events else 1.0
    scale = other_person_years / person_years
    return Estimate(
        events / other_events * scale if other_events else float("inf"),
        float(lower / (1 - lower) * scale),
        float(upper / (1 - upper) * scale) if upper < 1 else float("inf"),
    )


@dataclass(frozen=True)
class Standardised:
    """A directly standardised rate per person-year.

    ``weight_used`` is the share of the standard's weight in bands that have person-years, ``weight_thin`` of
    that the share in bands with fewer than 10.
    """

    events: int
    person_years: float
    crude: Estimate
    standardised: Estimate
    weight_used: float
    weight_thin: float


def standardise(
    bands: Sequence[BandRate], weights: Sequence[float], *, confidence: float = 0.95
) -> Standardised:
    """Weight the rates of bands by a standard population.

    Bands without person-years are left out and the other weights raised in proportion.

    Raises
    ------
    Refusal
        ``no_person_time`` when no band has any; ``uneven_weights`` without one weight for each band.

    Notes
    -----
    y = sum w d, v = sum w^2 d with w the weight over the person-years. Limits: (v/2y) chi2(a/2; 2y^2/v) and
    [(v + wM^2) / 2(y + wM)] chi2(1-a/2; 2(y + wM)^2/(v + wM^2)), wM the largest w.

    References
    ----------
    Fay & Feuer (1997) Stat Med 16:791-801.
    """
    check_confidence(confidence)
    if len(weights) != len(bands):
        raise Refusal("uneven_weights", field="weights")
    years = np.array([band.person_years for band in bands])
    events = np.array([band.events for band in bands])
    share = np.asarray(weights, dtype=float) / np.sum(weights)
    seen = years > 0
    if not seen.any() or share[seen].sum() == 0:
        raise Refusal("no_person_time")
    w = share[seen] / share[seen].sum() / years[seen]
    d = events[seen]
    value, variance, most = float(w @ d), float(w**2 @ d), float(w.max())
    tail = (1 - confidence) / 2
    lower = variance / value * float(gammaincinv(value**2 / variance, tail)) if value > 0 else 0.0
    v, y = variance + most**2, value + most
    upper = v / y * float(gammaincinv(y**2 / v, 1 - tail))
    return Standardised(
        events=int(events.sum()),
        person_years=float(years.sum()),
        crude=rate(int(events.sum()), float(years.sum()), confidence),
        standardised=Estimate(value, lower, upper, variance**0.5),
        weight_used=float(share[seen].sum()),
        weight_thin=float(share[seen & (years < THIN)].sum() / share[seen].sum()),
    )
