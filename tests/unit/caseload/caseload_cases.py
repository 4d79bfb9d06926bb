"""Small registers and hazards that the caseload tests share."""

from __future__ import annotations

import datetime

import numpy as np

from vitalroll.caseload.retention import Retention
from vitalroll.numbers import DAYS_PER_YEAR
from vitalroll.outcomes.competing import WAYS_OF_LEAVING
from vitalroll.register.cohort import Cohort, meaning_code

DEATH, LOST = WAYS_OF_LEAVING.index("died_of_disease"), WAYS_OF_LEAVING.index("lost")


def day(year: int, month: int = 1, day_of_month: int = 1) -> int:
    """Return the ordinal of a calendar day."""
    return datetime.date(year, month, day_of_month).toordinal()


def cohort(rows: list[tuple[int, int, int, str]], closing: int) -> Cohort:
    """Build a cohort from (start ordinal, entry days, exit days, meaning)."""
    start, entry, leaving, meaning = zip(*rows, strict=True)
    return Cohort(
        entry=np.array(entry),
        exit=np.array(leaving),
        outcome=np.array([meaning_code(word) for word in meaning]),
        start=np.array(start),
        line=np.arange(len(rows)) + 2,
        closing=closing,
    )


def known_hazards(*yearly: dict[str, float], certain: float = 1e12) -> Retention:
    """Return a retention whose hazards are as given for each year since start, and all but certain."""
    exits = np.array([[year.get(way, 0.0) for way in WAYS_OF_LEAVING] for year in yearly]) * certain
    return Retention(
        edges=np.arange(len(yearly) + 1, dtype=float),
        at_risk=np.zeros(len(yearly), dtype=int),
        person_years=np.full(len(yearly), certain),
        exits=exits,
        beyond_person_years=0.0,
        beyond_exits=0,
    )


def simulated_register(
    random: np.random.Generator, *, per_year: float, years: int, yearly_hazard: list[float], closing: int
) -> Cohort:
    """Simulate a register: Poisson newcomers for some years, leaving by hazards by year since start.

    A third of those who leave die, two thirds are lost; the others are under care at closing.
    """
    length = int(years * DAYS_PER_YEAR)
    n = random.poisson(per_year * length / DAYS_PER_YEAR)
    ago = random.integers(1, length + 1, n)
    stays = np.floor(staying_times(random, n, yearly_hazard) * DAYS_PER_YEAR).astype(int)
    left = stays < ago
    way = np.where(random.random(n) < 1 / 3, meaning_code("died_of_disease"), meaning_code("lost"))
    return Cohort(
        entry=np.zeros(n, dtype=int),
        exit=np.where(left, stays, ago),
        outcome=np.where(left, way, meaning_code("under_care")),
        start=closing - ago,
        line=np.arange(n) + 2,
        closing=closing,
    )


def staying_times(random: np.random.Generator, n: int, yearly_hazard: list[float]) -> np.ndarray:
    """Draw years from start to leaving, hazards constant within each year, the last one held."""
    due = random.exponential(1.0, n)
    spent = np.concatenate(([0.0], np.cumsum(yearly_hazard)))
    year = np.minimum(np.searchsorted(spent, due, side="right") - 1, len(yearly_hazard) - 1)
    return year + (due - spent[year]) / np.array(yearly_hazard)[year]
