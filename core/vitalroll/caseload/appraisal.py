"""Which scenario buys most: differences from the baseline, money for each gain, and break-even."""

from __future__ import annotations

import math
from collections.abc import Callable, Sequence
from dataclasses import dataclass, replace

import numpy as np

from vitalroll.caseload.outlook import Measure, Outlook
from vitalroll.caseload.resources import Item, cost_by_year, present_value
from vitalroll.caseload.scenario import Lever, Scenario
from vitalroll.caseload.uncertainty import Band, bands
from vitalroll.errors import Refusal

_CLOSE_ENOUGH = 1e-3
_SURE_OF_A_GAIN = 0.95


@dataclass(frozen=True)
class Appraisal:
    """One scenario less the baseline, over the whole horizon, each a ``Measure`` of one entry.

    Parameters
    ----------
    under_care : Measure
        At the end.
    patient_years, newcomers, deaths, lost : Measure
    programme, care, cost : Measure
        Money, discounted: of the programme itself, of care, and both together.
    """

    under_care: Measure
    patient_years: Measure
    newcomers: Measure
    deaths: Measure
    lost: Measure
    programme: Measure
    care: Measure
    cost: Measure


@dataclass(frozen=True)
class Price:
    """Money for each unit gained.

    ``value`` is expected cost over expected gain; ``band`` holds the ranges of the draws' ratios
    and is None, like ``value``, when nothing is gained in expectation; ``gained`` is the share of
    draws in which something is gained. With a share below 0.95 the ratio has no finite interval
    worth giving, and ``band`` is None too. A negative value with a gain saves money.
    """

    value: float | None
    band: Band | None
    gained: float


def appraise(
    baseline: Outlook, other: Outlook, scenario: Scenario, items: Sequence[Item], *, discount: float
) -> Appraisal:
    """Compare a scenario with the baseline, draw for draw."""
    years = baseline.newcomers.expected.shape[0]
    programme = present_value(scenario.money(years), discount)

    def care(course: Outlook) -> Measure:
        yearly = course.measure(lambda drawn: cost_by_year(items, drawn))
        return Measure(
            np.atleast_1d(present_value(yearly.expected, discount)),
            present_value(yearly.drawn, discount)[:, np.newaxis],
        )

    more_care = care(other).less(care(baseline))
    return Appraisal(
        under_care=_last(other.under_care.less(baseline.under_care)),
        patient_years=other.patient_years.less(baseline.patient_years).total(),
        newcomers=other.newcomers.less(baseline.newcomers).total(),
        deaths=other.deaths.less(baseline.deaths).total(),
        lost=other.leaving("lost").less(baseline.leaving("lost")).total(),
        programme=Measure(np.full(1, programme), np.full_like(more_care.drawn, programme)),
        care=more_care,
        cost=Measure(more_care.expected + programme, more_care.drawn + programme),
    )


def price(cost: Measure, gain: Measure) -> Price:
    """Divide money by what is gained (``gain`` positive when good), draw for draw.

    References
    ----------
    Ratios of draws as percentile limits of a cost-effectiveness ratio: Briggs AH, Wonderling DE,
    Mooney CZ (1997) Health Econ 6:327-340; they make no sense when the gain may be none.
    """
    gained = float(np.mean(gain.drawn > 0))
    expected = float(gain.expected[0])
    if expected <= 0:
        return Price(None, None, gained)
    value = float(cost.expected[0]) / expected
    if gained < _SURE_OF_A_GAIN:
        return Price(value, None, gained)
    ratios = np.divide(cost.drawn, gain.drawn, out=np.full_like(cost.drawn, math.inf), where=gain.drawn > 0)
    finite = np.where(np.isfinite(ratios), ratios, np.nanmax(np.where(np.isfinite(ratios), ratios, np.nan)))
    return Price(value, bands(np.array([value]), finite)[0], gained)


def best_share(gains: np.ndarray, costs: np.ndarray, budget: float) -> np.ndarray:
    """Return in what share of draws each scenario gains most for the same money, shape (scenarios,).

    Parameters
    ----------
    gains, costs : float arrays, shape (scenarios, draws)
        A scenario is scaled so that its programme and the care that follows cost ``budget``. One that
        costs nothing or saves money counts as buying without limit when it gains.
    budget : float
    """
    bought = np.where(
        costs > 0,
        gains * budget / np.where(costs > 0, costs, 1.0),
        np.where(gains > 0, math.inf, np.where(gains < 0, -math.inf, 0.0)),
    )
    best = bought == bought.max(axis=0)
    return (best / best.sum(axis=0)).mean(axis=1)


def break_even(
    lever: Lever, target: float, reached: Callable[[Lever], float], *, most: float
) -> tuple[float | None, float, float]:
    """Search the percentage at which a lever makes a quantity reach its target.

    Parameters
    ----------
    lever : Lever
        Its percentage is what is searched.
    target : float
    reached : callable
        What is expected with the lever; monotone in its percentage.
    most : float
        The greatest percentage tried.

    Returns
    -------
    tuple
        The percentage (None when the target lies outside what 0 and ``most`` give), and what
        those two give.

    Raises
    ------
    Refusal
        ``lever_makes_no_difference`` when both ends give the same.
    """
    low, high = 0.0, most
    at_low, at_high = (reached(replace(lever, percent=percent)) for percent in (low, high))
    if at_low == at_high:
        raise Refusal("lever_makes_no_difference", field="kind")
    if not min(at_low, at_high) <= target <= max(at_low, at_high):
        return None, at_low, at_high
    rising = at_high > at_low
    while high - low > _CLOSE_ENOUGH:
        middle = (low + high) / 2
        if (reached(replace(lever, percent=middle)) < target) == rising:
            low = middle
        else:
            high = middle
    return (low + high) / 2, at_low, at_high


def _last(measure: Measure) -> Measure:
    return Measure(measure.expected[-1:], measure.drawn[:, -1:])
