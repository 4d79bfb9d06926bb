"""Which days and ages are written down more often than chance allows."""

from __future__ import annotations

from dataclasses import dataclass

import numpy as np

WHIPPLE_FROM, WHIPPLE_TO = 23, 62
FEW_AGES = 50
"""With fewer ages in the range the index is hardly more than chance."""

_DAYS_IN_400_YEARS = 146_097
_MONTHS_WITH = {29: 4800 - 303, 30: 4400, 31: 2800}
"""Months of 400 years that have such a day: all but the 303 common Februaries have a 29th."""


@dataclass(frozen=True)
class DayOfMonth:
    """How often a day of the month is written, and how often it would be by chance."""

    day: int
    count: int
    expected: float


@dataclass(frozen=True)
class AgeHeaping:
    """Ages by their last digit, and Whipple's index.

    ``digits`` counts the ages from 23 to 62 that end in 0, 1, ... 9. ``whipple`` is 100 where ages
    ending in 0 and 5 are as frequent as they should be and 500 where there are no others; NaN without
    ages. ``lower`` and ``upper`` limit it at 95 % (Wilson 1927, on the share it is made of).
    """

    n: int
    digits: tuple[int, ...]
    whipple: float
    lower: float
    upper: float


def days_of_month(days: np.ndarray) -> list[DayOfMonth]:
    """Return how often each day of the month stands in dates (ordinals), and how often it should."""
    dates = (days - 719_163).astype("datetime64[D]")
    of_month = (dates - dates.astype("datetime64[M]").astype("datetime64[D]")).astype(np.int64)
    counts = np.bincount(of_month, minlength=31)
    return [
        DayOfMonth(day, int(counts[day - 1]), len(days) * _MONTHS_WITH.get(day, 4800) / _DAYS_IN_400_YEARS)
        for day in range(1, 32)
    ]


def age_heaping(ages: np.ndarray) -> AgeHeaping:
    """Return the last digits of ages and Whipple's index.

    Parameters
    ----------
    ages : float array
        Ages in years, NaN where none is known; completed years are taken.

    References
    ----------
    Whipple's index as in United Nations (1955), Methods of appraisal of quality of basic data for
    population estimates (Manual II): 5 x 100 x (ages 25, 30, ... 60) / (all ages 23 to 62).
    """
    known = np.floor(ages[~np.isnan(ages)]).astype(np.int64)
    within = known[(known >= WHIPPLE_FROM) & (known <= WHIPPLE_TO)]
    digits = tuple(np.bincount(within % 10, minlength=10).tolist())
    n = len(within)
    if not n:
        nan = float("nan")
        return AgeHeaping(0, digits, nan, nan, nan)
    share = (digits[0] + digits[5]) / n
    lower, upper = _wilson(share, n)
    return AgeHeaping(n, digits, 500 * share, 500 * lower, 500 * upper)


def _wilson(share: float, n: int) -> tuple[float, float]:
    """Return the limits of Wilson (1927), JASA 22:209."""
    z2 = 1.959963984540054**2
    middle = (share + z2 / (2 * n)) / (1 + z2 / n)
    half = (z2 * share * (1 - share) / n + z2 * z2 / (4 * n * n)) ** 0.5 / (1 + z2 / n)
    return max(0.0, middle - half), min(1.0, middle + half)
