"""The actuarial life table: follow-up grouped into years, quarters or months, or typed as totals."""

from __future__ import annotations

from collections.abc import Collection, Sequence
from dataclasses import dataclass
from typing import Literal, get_args

import numpy as np

from vitalroll.errors import Caution, Refusal
from vitalroll.numbers import DAYS_PER_YEAR, Estimate, two_sided_z
from vitalroll.outcomes.limits import (
    check_confidence,
    lower_limit_at_one,
    probability_limits,
    upper_limit_at_zero,
)
from vitalroll.outcomes.person_time import poisson_limits
from vitalroll.outcomes.risk_table import RiskTable

Step = Literal["year", "quarter", "month"]
_STEPS_PER_YEAR = {"year": 1, "quarter": 4, "month": 12}

FEW_EFFECTIVE = 10
"""An effective number below this makes an interval's figures too uncertain to lean on."""

MANY_LOST = 0.2
"""A share lost above this leaves the result open to whatever became of them."""


@dataclass(frozen=True)
class GroupedCounts:
    """Follow-up counted into intervals; arrays of length k, edges of length k + 1 (days).

    Interval i holds those who left after edge i and up to, on, edge i + 1; day 0 belongs to the
    first. So survival at the end of an interval is survival after that day, as in a product-limit
    curve. ``entering`` are under observation when it begins, ``joined`` came under observation
    during it (delayed entry), ``lost`` and ``withdrawn`` left without the outcome.
    """

    edges: np.ndarray
    entering: np.ndarray
    joined: np.ndarray
    lost: np.ndarray
    withdrawn: np.ndarray
    events: np.ndarray

    @property
    def effective(self) -> np.ndarray:
        """Effective number at risk: who came or left without the outcome counts half.

        Comings and goings are taken to be spread evenly over the interval. Never below the number
        of events, which late comers could otherwise bring about.
        """
        number = self.entering + (self.joined - self.lost - self.withdrawn) / 2
        return np.maximum(number, self.events)


@dataclass(frozen=True)
class LifeTableRow:
    """One interval.

    ``chance`` is the chance q of the outcome within the interval and ``odds`` q / (1 - q);
    ``interval_survival`` is p = 1 - q and ``interval_survival_odds`` p / q. ``survival`` is the
    chance of having come through all intervals so far. ``hazard`` is per person-year.
    """

    from_days: float
    to_days: float
    entering: int
    joined: int
    lost: int
    withdrawn: int
    events: int
    effective: float
    chance: float
    odds: float
    interval_survival: float
    interval_survival_odds: float
    survival: Estimate
    hazard: Estimate


@dataclass(frozen=True)
class LifeTable:
    """A life table and what must be said beside it."""

    rows: tuple[LifeTableRow, ...]
    cautions: tuple[Caution, ...]


def interval_edges(step: Step, intervals: int) -> np.ndarray:
    """Return the edges, in days, of the first ``intervals`` years, quarters or months.

    Raises
    ------
    Refusal
        ``not_one_of`` for another step.
    """
    if step not in get_args(Step):
        raise Refusal("not_one_of", field="step", given=step, choices=list(get_args(Step)))
    return np.arange(intervals + 1) * (DAYS_PER_YEAR / _STEPS_PER_YEAR[step])


def grouped_counts(table: RiskTable, interest: Collection[str], edges: np.ndarray) -> GroupedCounts:
    """Count a risk table into the intervals between ``edges`` (days, ascending from 0).

    What happens after the last edge is left out.
    """
    intervals = len(edges) - 1
    events = table.events(interest)
    lost = np.zeros_like(events) if "lost" in interest else table.left_by("lost")
    inner = edges[1:]
    leaving_in = np.searchsorted(inner, table.time, side="left")
    coming_in = np.searchsorted(inner, table.time, side="right")

    def total(interval: np.ndarray, counts: np.ndarray) -> np.ndarray:
        return np.bincount(interval, weights=counts, minlength=intervals + 1)[:intervals].astype(np.int64)

    joined = total(coming_in, table.entered)
    left = total(leaving_in, table.left.sum(axis=1))
    change = np.concatenate(([0], np.cumsum(joined - left)[:-1]))
    return GroupedCounts(
        edges=np.asarray(edges, dtype=float),
        entering=table.from_start + change,
        joined=joined,
        lost=total(leaving_in, lost),
        withdrawn=total(leaving_in, table.censored(interest) - lost),
        events=total(leaving_in, events),
    )


def life_table(
    table: RiskTable, interest: Collection[str], *, step: Step = "year", confidence: float = 0.95
) -> LifeTable:
    """Estimate survival from follow-up grouped into equal intervals.

    Parameters
    ----------
    table : RiskTable
    interest : names from MEANINGS
    step : str
        ``year``, ``quarter`` or ``month`` (a twelfth of 365.25 days).
    confidence : float

    Returns
    -------
    LifeTable
        One row per interval up to the last day anyone was seen; intervals with an effective number
        of 0 have none. See ``tabulate`` for formulas and cautions.

    Raises
    ------
    Refusal
        ``no_patients``, ``not_one_of`` (step), ``out_of_range`` (confidence).
    """
    if not table.n:
        raise Refusal("no_patients")
    width = interval_edges(step, 1)[1]
    last = int(table.time[-1])
    edges = interval_edges(step, max(1, int(np.ceil(last / width))))
    return tabulate(grouped_counts(table, interest, edges), confidence)


def life_table_from_counts(
    entering: int,
    widths_years: Sequence[float],
    lost: Sequence[int],
    withdrawn: Sequence[int],
    events: Sequence[int],
    *,
    confidence: float = 0.95,
) -> LifeTable:
    """Estimate survival from totals that somebody counted already.

    Parameters
    ----------
    entering : int
        Patients at the beginning of the first interval.
    widths_years : sequence of float
        Length of each interval.
    lost, withdrawn, events : sequences of int
        Lost to follow-up, still under care at the closing date (or gone for another reason), and
        with the outcome, in each interval.

    Raises
    ------
    Refusal
        ``no_rows``, ``uneven_rows``, ``nobody_entered``, ``width_not_positive``, ``negative_count`` and
        ``more_left_than_entered`` (parameters ``row`` counted from 1, ``entering``, ``left``), each
        with the field, such as ``rows.2.lost``.
    """
    if not len(widths_years):
        raise Refusal("no_rows", field="rows")
    if not len(widths_years) == len(lost) == len(withdrawn) == len(events):
        raise Refusal("uneven_rows", field="rows")
    if entering < 1:
        raise Refusal("nobody_entered", field="entering")
    left = 0
    at_start = []
    for i, width in enumerate(widths_years):
        if not width > 0:
            raise Refusal("width_not_positive", field=f"rows.{i}.width_years", row=i + 1)
        for name, counts in (("lost", lost), ("withdrawn", withdrawn), ("events", events)):
            if counts[i] < 0:
                raise Refusal("negative_count", field=f"rows.{i}.{name}", row=i + 1)
        at_start.append(entering - left)
        leaving = lost[i] + withdrawn[i] + events[i]
        if leaving > at_start[i]:
            raise Refusal(
                "more_left_than_entered", field=f"rows.{i}", row=i + 1, entering=at_start[i], left=leaving
            )
        left += leaving
    counts = GroupedCounts(
        edges=np.concatenate(([0.0], np.cumsum(widths_years))) * DAYS_PER_YEAR,
        entering=np.array(at_start),
        joined=np.zeros(len(at_start), dtype=np.int64),
        lost=np.array(lost),
        withdrawn=np.array(withdrawn),
        events=np.array(events),
    )
    return tabulate(counts, confidence)


def tabulate(counts: GroupedCounts, confidence: float = 0.95) -> LifeTable:
    """Turn grouped counts into a life table.

    n' = entering - (lost + withdrawn) / 2, q = d / n', S = prod(1 - q) with Greenwood's standard
    error and log-log limits; where S is 1 or 0, the beta-product limit on effective numbers. Hazard
    at midpoint h = d / [width (n' - d/2)] with SE = h sqrt{[1 - (h width/2)^2] / (n' q)}, limits on
    the log scale, and for no events Garwood's upper limit over n' times width.

    Cautions
    --------
    ``few_effective`` (parameters ``from_days`` of the first such interval, ``effective``),
    ``many_lost`` (``share``), ``risk_set_emptied`` and ``begins_late`` with delayed entry: survival
    then starts again at 1.

    References
    ----------
    Berkson & Gage (1950) Proc Staff Meet Mayo Clin 25:270-286; Cutler & Ederer (1958) J Chronic Dis
    8:699-712; Greenwood (1926); Gehan (1969) J Chronic Dis 21:629-644.
    """
    check_confidence(confidence)
    effective = counts.effective
    kept = np.flatnonzero(effective > 0)
    rows: list[LifeTableRow] = []
    restarts = []
    run: list[int] = []
    for place, i in enumerate(kept.tolist()):
        gap = place > 0 and kept[place - 1] != i - 1
        if run and (gap or counts.events[run[-1]] == effective[run[-1]]):
            rows += _run(counts, run, confidence)
            restarts.append((float(counts.edges[run[-1] + 1]), float(counts.edges[i])))
            run = []
        run.append(i)
    rows += _run(counts, run, confidence)
    return LifeTable(tuple(rows), _cautions(counts, rows, restarts))


def _run(counts: GroupedCounts, run: list[int], confidence: float) -> list[LifeTableRow]:
    """Tabulate consecutive intervals over which survival can be multiplied on."""
    if not run:
        return []
    n, d = counts.effective[run], counts.events[run]
    z = two_sided_z(confidence)
    chance = d / n
    ended = d == n
    survival = np.cumprod(1 - chance)
    relative = np.sqrt(np.cumsum(np.where(ended, 0.0, d / (n * np.where(ended, 1, n - d)))))
    lower, upper = probability_limits(survival, relative, z)
    whole = survival == 1
    lower[whole], upper[whole] = lower_limit_at_one(np.minimum.accumulate(n), confidence)[whole], 1
    if ended[-1]:
        lower[-1], upper[-1] = 0, upper_limit_at_zero(n[d > 0], d[d > 0], confidence)
    error = np.where(ended, np.nan, survival * relative)
    widths = np.diff(counts.edges)[run] / DAYS_PER_YEAR
    with np.errstate(divide="ignore"):
        odds, survival_odds = chance / (1 - chance), (1 - chance) / chance
    return [
        LifeTableRow(
            from_days=float(counts.edges[i]),
            to_days=float(counts.edges[i + 1]),
            entering=int(counts.entering[i]),
            joined=int(counts.joined[i]),
            lost=int(counts.lost[i]),
            withdrawn=int(counts.withdrawn[i]),
            events=int(counts.events[i]),
            effective=float(n[k]),
            chance=float(chance[k]),
            odds=float(odds[k]),
            interval_survival=float(1 - chance[k]),
            interval_survival_odds=float(survival_odds[k]),
            survival=Estimate(float(survival[k]), float(lower[k]), float(upper[k]), float(error[k])),
            hazard=_hazard(float(n[k]), int(d[k]), float(widths[k]), confidence),
        )
        for k, i in enumerate(run)
    ]


def _hazard(effective: float, events: int, width: float, confidence: float) -> Estimate:
    """Return the hazard at the middle of an interval, per person-year (Gehan 1969)."""
    hazard = events / (width * (effective - events / 2))
    if events == 0:
        upper = float(poisson_limits(0, confidence)[1])
        return Estimate(0.0, 0.0, upper / (width * effective))
    if events == effective:
        # Everyone had the outcome: the midpoint formula gives 2 / width and an error of zero.
        return Estimate(hazard, float("nan"), float("nan"))
    error = hazard * np.sqrt((1 - (hazard * width / 2) ** 2) / events)
    spread = np.exp(two_sided_z(confidence) * error / hazard)
    return Estimate(hazard, float(hazard / spread), float(hazard * spread), float(error))


def _cautions(
    counts: GroupedCounts, rows: Sequence[LifeTableRow], restarts: list[tuple[float, float]]
) -> tuple[Caution, ...]:
    if not rows:
        # All came late and left in the interval they came in: halves in, halves out, nothing remains.
        return (Caution("few_effective", {"from_days": float(counts.edges[0]), "effective": 0.0}),)
    found = []
    few = next((row for row in rows if row.effective < FEW_EFFECTIVE), None)
    if few is not None:
        found.append(Caution("few_effective", {"from_days": few.from_days, "effective": few.effective}))
    ever = int(counts.entering[0] + counts.joined.sum())
    share = float(counts.lost.sum()) / ever
    if share > MANY_LOST:
        found.append(Caution("many_lost", {"lost": int(counts.lost.sum()), "share": share}))
    if rows[0].from_days > 0:
        found.append(Caution("begins_late", {"days": rows[0].from_days}))
    if restarts:
        emptied, day = restarts[-1]
        parameters = {"times": len(restarts), "emptied_days": emptied, "restart_days": day}
        found.append(Caution("risk_set_emptied", parameters))
    return tuple(found)
