"""When what there is no longer does: lines that a monthly need may pass, and beds in use."""

from __future__ import annotations

import math
from dataclasses import dataclass

import numpy as np
from scipy.special import pdtrik

from vitalroll.errors import Refusal
from vitalroll.numbers import DAYS_PER_MONTH


@dataclass(frozen=True)
class Passing:
    """When a line is passed.

    Parameters
    ----------
    need : float array, shape (months,)
        What is expected to be needed in each month.
    passed_in : float array, shape (months,)
        Share of the draws in which the need of the month itself is above the line.
    passed_by : float array, shape (months,)
        Share of the draws in which some month up to this one was above it.
    expected_month : int or None
        First month, from 1, in which what is expected is above the line; None if it never is.
    likely_month, unlikely_month : int or None
        First months by which the line is passed in half and in a tenth of the draws.
    """

    need: np.ndarray
    passed_in: np.ndarray
    passed_by: np.ndarray
    expected_month: int | None
    likely_month: int | None
    unlikely_month: int | None


def passing(need: np.ndarray, drawn: np.ndarray, limit: float) -> Passing:
    """Say when a need, (months,) expected and (draws, months) drawn, passes a limit."""
    above = drawn > limit
    passed_by = np.logical_or.accumulate(above, axis=1).mean(axis=0)
    return Passing(
        need=need,
        passed_in=above.mean(axis=0),
        passed_by=passed_by,
        expected_month=_first(need > limit),
        likely_month=_first(passed_by >= 0.5),
        unlikely_month=_first(passed_by >= 0.1),
    )


def beds_in_use(bed_days: np.ndarray) -> np.ndarray:
    """Return the mean number of beds in use from bed-days a month: Little (1961), L = lambda W."""
    return bed_days / DAYS_PER_MONTH


def busy_day(mean: np.ndarray) -> np.ndarray:
    """Return how many beds are enough on 95 days of 100, the Poisson's 95th percentile.

    For admissions that come independently of each other the beds in use on a day are Poisson
    around their mean, whatever the lengths of stay (the M/G/infinity queue).
    """
    mean = np.asarray(mean, dtype=float)
    # pdtrik says where the distribution function, made continuous, crosses 0.95. Rounding up only
    # what is clearly above a whole number keeps its round-off from adding a bed.
    taken = np.ceil(pdtrik(0.95, np.maximum(mean, 1e-9)) - 1e-9)
    return np.where(mean > 0, np.maximum(taken, 0), 0)


def check_beds(mean_now: float, beds: float, field: str) -> float:
    """Return the share of beds in use in the first month.

    Raises
    ------
    Refusal
        ``utilisation_at_or_above_one`` (utilisation, places, needed) when the beds could never keep
        up: no queue settles then, so there is no figure to give.
    """
    if not 0 < beds < math.inf:
        raise Refusal("out_of_range", field=field, given=beds, least=0.0, greatest=math.inf)
    if mean_now >= beds:
        raise Refusal(
            "utilisation_at_or_above_one",
            field=field,
            utilisation=mean_now / beds,
            places=beds,
            needed=mean_now,
        )
    return mean_now / beds


def _first(reached: np.ndarray) -> int | None:
    return int(np.argmax(reached)) + 1 if reached.any() else None
