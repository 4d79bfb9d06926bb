"""The few numerical helpers that every room shares."""

from __future__ import annotations

from dataclasses import dataclass
from statistics import NormalDist

DAYS_PER_YEAR = 365.25
"""Length of the mean Julian year; every conversion between days and years uses it."""

DAYS_PER_MONTH = DAYS_PER_YEAR / 12


@dataclass(frozen=True)
class Estimate:
    """A number with its confidence limits.

    NaN stands for a value that cannot be given (for example an upper limit that is not reached).
    """

    value: float
    lower: float
    upper: float
    standard_error: float = float("nan")


NOT_GIVEN = Estimate(float("nan"), float("nan"), float("nan"))
"""The estimate where there is nothing to estimate from."""


def two_sided_z(confidence: float) -> float:
    """Return the normal quantile z for a two-sided interval, for example 1.96 for 0.95."""
    return NormalDist().inv_cdf(0.5 + confidence / 2)
