"""How uncertain rates are: hazards and the rate of newcomers drawn again, and bands of what follows."""

from __future__ import annotations

from dataclasses import dataclass

import numpy as np

from vitalroll.caseload.inflow import Inflow
from vitalroll.caseload.projection import MONTHS_PER_YEAR
from vitalroll.caseload.retention import Retention

_SHAPE_WITHOUT_EXITS = 0.5
"""Gamma shape for the hazard of a stretch in which nobody left (Jeffreys' prior, no events)."""


@dataclass(frozen=True)
class Band:
    """An expected value with the ranges that hold 80 %, 95 % and 50 % of the draws."""

    value: float
    p80: tuple[float, float]
    p95: tuple[float, float]
    p50: tuple[float, float]


def bands(expected: np.ndarray, drawn: np.ndarray) -> list[Band]:
    """Return a band for each expected value, shape (k,), from draws of shape (draws, k)."""
    levels = np.quantile(drawn, (0.1, 0.9, 0.025, 0.975, 0.25, 0.75), axis=0).T.tolist()
    return [
        Band(float(value), (low80, high80), (low95, high95), (low50, high50))
        for value, (low80, high80, low95, high95, low50, high50) in zip(expected, levels, strict=True)
    ]


def drawn_hazards(hazards: Retention, draws: int, random: np.random.Generator) -> np.ndarray:
    """Draw yearly hazards, shape (draws, stretches, ways).

    For d exits in T person-years Gamma(d, 1/T), the posterior under the prior 1/h, whose mean is
    the observed rate, so that a fan is centred on what ``project`` expects. A stretch without
    exits takes Gamma(1/2, 1/T) in all, shared out among the ways as in the whole register.
    """
    exits = hazards.exits
    drawn = random.standard_gamma(exits, size=(draws, *exits.shape))
    total = exits.sum()
    if total:
        unseen = np.flatnonzero(exits.sum(axis=1) == 0)
        extra = random.standard_gamma(_SHAPE_WITHOUT_EXITS, size=(draws, len(unseen)))
        drawn[:, unseen, :] = extra[:, :, np.newaxis] * (exits.sum(axis=0) / total)
    return drawn / hazards.person_years[:, np.newaxis]


def drawn_arrivals(inflow: Inflow, draws: int, years: int, random: np.random.Generator) -> np.ndarray:
    """Draw the expected newcomers of one month in each year, shape (draws, years).

    The rate from its total as a hazard is, its spread widened by the overdispersion; a typed rate
    is certain. Years of an overdispersed history differ by a gamma effect of their own.
    """
    mean, spread = inflow.per_year.value, inflow.spread
    if inflow.trend is not None:
        rate = inflow.trend.drawn_rates(draws, years, random)
    elif inflow.model == "typed":
        rate = np.full((draws, 1), mean)
    else:
        rate = random.standard_gamma(mean * inflow.whole_years / spread, size=(draws, 1))
        rate *= spread / inflow.whole_years
    if inflow.trend is None:
        rate = rate * inflow.growth(years)
    if spread > 1:
        # Mean rate, variance rate (spread - 1): with the Poisson's own, spread times the rate.
        rate = random.standard_gamma(rate / (spread - 1)) * (spread - 1)
    return rate / MONTHS_PER_YEAR
