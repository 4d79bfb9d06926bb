"""What a caseload takes: things used in each phase of care or at each event, and money."""

from __future__ import annotations

import math
from collections.abc import Sequence
from dataclasses import dataclass

import numpy as np

from vitalroll.caseload.courses import Course
from vitalroll.caseload.projection import MONTHS_PER_YEAR, yearly_sums
from vitalroll.errors import Refusal
from vitalroll.outcomes.competing import WAYS_OF_LEAVING
from vitalroll.register.cohort import DEATHS

EVENTS = {
    "death": DEATHS,
    "lost": ("lost",),
    "completed": ("recovered",),
    "stopped": ("stopped",),
    "moved_away": ("moved_away",),
}
"""Events that can take something, with the ways of leaving that they stand for."""

DISCOUNTS = (0.0, 3.0, 5.0)
"""Yearly rates, in per cent, at which a total is given side by side."""


@dataclass(frozen=True)
class Item:
    """Something that care takes, in the person's own unit.

    Parameters
    ----------
    name, unit : str
    at_start : float
        Once for each newcomer, in the month of arrival.
    first_year, later : float
        In each month of care within a year of the start, and in each month after that.
    per_event : float
        For each event of the kind ``event`` (a key of ``EVENTS``), spread evenly over its year.
    event : str
    unit_cost : float
        Money for one unit in the first projected year.
    cost_growth : float
        Per cent by which the unit cost is higher in each year after the first.

    Raises
    ------
    Refusal
        ``out_of_range`` or ``not_one_of``, with the name of the field.
    """

    name: str
    unit: str = ""
    at_start: float = 0.0
    first_year: float = 0.0
    later: float = 0.0
    per_event: float = 0.0
    event: str = "death"
    unit_cost: float = 0.0
    cost_growth: float = 0.0

    def __post_init__(self) -> None:
        for name in ("at_start", "first_year", "later", "per_event", "unit_cost"):
            _check_amount(name, getattr(self, name))
        if not -50 <= self.cost_growth <= 100:
            raise Refusal(
                "out_of_range", field="cost_growth", given=self.cost_growth, least=-50.0, greatest=100.0
            )
        if self.event not in EVENTS:
            raise Refusal("not_one_of", field="event", given=self.event, choices=list(EVENTS))

    def monthly(self, course: Course) -> np.ndarray:
        """Return the amount taken in each month, shape (..., months).

        Months of care are counted as the mean of the patients at the month's two ends.
        """
        first = _patient_months(course.first_year)
        later = _patient_months(course.under_care) - first
        columns = [WAYS_OF_LEAVING.index(way) for way in EVENTS[self.event]]
        events = course.leaving[..., columns].sum(axis=-1) / MONTHS_PER_YEAR
        return (
            self.at_start * course.newcomers
            + self.first_year * first
            + self.later * later
            + self.per_event * np.repeat(events, MONTHS_PER_YEAR, axis=-1)
        )

    def yearly_cost(self, monthly: np.ndarray) -> np.ndarray:
        """Return the money for each year, shape (..., years), from ``monthly`` amounts."""
        amount = yearly_sums(monthly)
        return amount * self.unit_cost * (1 + self.cost_growth / 100) ** np.arange(amount.shape[-1])


def cost_by_year(items: Sequence[Item], course: Course) -> np.ndarray:
    """Return the money all items take in each year, shape (..., years), not discounted."""
    years = course.newcomers.shape[-1] // MONTHS_PER_YEAR
    total = np.zeros((*course.newcomers.shape[:-1], years))
    for item in items:
        total = total + item.yearly_cost(item.monthly(course))
    return total


def present_value(yearly: np.ndarray, percent: float) -> np.ndarray:
    """Return the sum over years (last axis) of what is spent, worth at the start: c_t/(1 + r)^t.

    Year t counts from 1 and is discounted from its end, as in Drummond MF et al. (2005) Methods for
    the Economic Evaluation of Health Care Programmes, 3rd ed., ch. 4.

    Raises
    ------
    Refusal
        ``out_of_range`` (discount) for a rate below 0 or above 100 per cent.
    """
    if not 0 <= percent <= 100:
        raise Refusal("out_of_range", field="discount", given=percent, least=0.0, greatest=100.0)
    return yearly @ (1 + percent / 100) ** -np.arange(1.0, yearly.shape[-1] + 1)


def _patient_months(at_ends: np.ndarray) -> np.ndarray:
    return (at_ends[..., 1:] + at_ends[..., :-1]) / 2


def _check_amount(field: str, given: float) -> None:
    if not 0 <= given < math.inf:
        raise Refusal("out_of_range", field=field, given=given, least=0.0, greatest=math.inf)
