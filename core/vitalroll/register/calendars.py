"""Dates of other calendars become days, by arithmetic that is exact; calendars that need tables are refused.

The Persian, Hijri and Bikram Sambat calendars follow the sky or decrees: no subtraction converts them,
and no maintained table is at hand. A register in one of these is refused by the name of its calendar.
"""

from __future__ import annotations

from typing import Literal, get_args

import numpy as np

Calendar = Literal["gregorian", "ethiopian", "persian", "hijri", "bikram_sambat"]
"""The calendar of a column. Buddhist years are the Gregorian calendar with 543 added: no choice is needed."""

CALENDARS: tuple[str, ...] = get_args(Calendar)
CONVERTED = ("gregorian", "ethiopian")

ETHIOPIAN_BEHIND = 7
"""An Ethiopian year begins in September of the Gregorian year that is 7 more."""

_ETHIOPIAN_EPOCH = 2_796
"""Ordinal of 1 Meskerem of the year 1: 27 August 8, proleptic Gregorian (29 August, Julian)."""


def ethiopian_days(year: np.ndarray, month: np.ndarray, day: np.ndarray) -> tuple[np.ndarray, np.ndarray]:
    """Return Ethiopian dates as ordinals, and where there is such a date (bool).

    Twelve months have 30 days; the thirteenth has 5, and 6 in each year before one that four divides.

    References
    ----------
    Reingold & Dershowitz, Calendrical Calculations (4th edition 2018), chapter 4: fixed-from-ethiopic.
    """
    length = np.where(month == 13, np.where(year % 4 == 3, 6, 5), 30)
    there_is = (year >= 1) & (month >= 1) & (month <= 13) & (day >= 1) & (day <= length)
    ordinal = _ETHIOPIAN_EPOCH - 1 + 365 * (year - 1) + year // 4 + 30 * (month - 1) + day
    return np.where(there_is, ordinal, 0), there_is
