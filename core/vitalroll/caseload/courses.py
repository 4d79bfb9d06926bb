"""Drawn courses of a caseload: rates and counts drawn again, the baseline and every scenario beside it.

Each draw takes other hazards and another rate of newcomers, as far as the register leaves them
open, and then lets patients come and leave by chance.

Layout. A row is a group of patients who started in the same month and never moves; in month t the
group with s months since its start is row ``months + s - t``, so that growing older costs nothing.
Columns are draws, side by side in memory.
"""

from __future__ import annotations

from collections.abc import Callable, Sequence
from dataclasses import dataclass

import numpy as np

from vitalroll.caseload.inflow import Inflow
from vitalroll.caseload.projection import MONTHS_PER_YEAR, Ageing, ageing
from vitalroll.caseload.retention import Retention
from vitalroll.caseload.scenario import LONGEST_LEAD_MONTHS, Kept, Scenario, as_it_is
from vitalroll.caseload.uncertainty import drawn_arrivals, drawn_hazards
from vitalroll.errors import Refusal

Report = Callable[[str, int, int], None]
"""Called now and then with (stage, done, total)."""

SOURCES = ("inflow", "leaving", "chance")
"""What can be redrawn: the rate of newcomers, the hazards, and who comes and leaves at those rates."""

_NOBODY = 1e-9
"""Fewer expected to leave than this are rounding, not patients: chance has no hold on them."""

_SMALLEST_FACTOR = 1e-20

_DRAWS_AT_A_TIME = 500
"""Small enough that one chunk's patients stay in the processor's cache."""


def no_report(stage: str, done: int, total: int) -> None:
    """Report to nobody."""


@dataclass(frozen=True)
class Course:
    """Courses of a caseload; the leading axis is draws, or missing in what is expected.

    Parameters
    ----------
    under_care, first_year : float array, shape (..., months + 1)
        At the end of each month, the first entry today: all, and those within a year of their start.
    newcomers : float array, shape (..., months)
    leaving : float array, shape (..., years, len(WAYS_OF_LEAVING))
    """

    under_care: np.ndarray
    first_year: np.ndarray
    newcomers: np.ndarray
    leaving: np.ndarray


def redraw(
    today: np.ndarray,
    hazards: Retention,
    inflow: Inflow,
    *,
    years: int,
    scenarios: Sequence[Scenario] = (),
    vary: Sequence[str] = SOURCES,
    times_today: float = 1.0,
    draws: int = 1000,
    seed: int = 1,
    report: Report = no_report,
) -> list[Course]:
    """Draw rates and counts again and again and run the caseload forward with each.

    Hazards: for d exits in T person-years Gamma(d, 1/T); rate of newcomers likewise (see
    ``uncertainty``). Newcomers: Poisson, with a gamma year effect when overdispersed. Leaving: in
    each month and run of months since start, what is expected plus a normal error with the
    binomial's variance, shared out among the groups of the run as they are expected to leave; the
    ways share each year's leavings with the multinomial's variance. So means, variances and
    covariances are those of whole patients, but single values are not whole, and a tiny group may
    for a moment be below nobody.

    A scenario shares the draw's rates, newcomers and errors: its errors are correlated with the
    baseline's as counts are of which the smaller is a part of the larger, sqrt(min/max). So a
    difference is made by the levers, with the luck of those whom they reach, and not by other
    luck. The baseline is the same whatever scenarios stand beside it.

    Parameters
    ----------
    today, hazards, years, times_today
        As for ``projection.project``.
    inflow : Inflow
    scenarios : sequence of Scenario
    vary : sequence of str
        Those of ``SOURCES`` that are redrawn; the others are held at what is expected.
    draws, seed : int
    report : callable
        Called with ("draws", done, draws) now and then.

    Returns
    -------
    list of Course
        The baseline, then each scenario.

    Raises
    ------
    Refusal
        ``out_of_range`` for fewer than one draw or year.
    """
    for field, given in (("draws", draws), ("years", years)):
        if given < 1:
            raise Refusal("out_of_range", field=field, given=given, least=1)
    months = MONTHS_PER_YEAR * years
    axis = ageing(hazards.edges, cuts=(1, MONTHS_PER_YEAR), tail=hazards.tail)
    plans = [as_it_is(months), *(scenario.over(months) for scenario in scenarios)]
    # Whoever is found early would have come later; always drawn as far, so that the streams do
    # not depend on the scenarios.
    more_years = LONGEST_LEAD_MONTHS // MONTHS_PER_YEAR
    placed, into = times_today * axis.place(today), axis.arriving(inflow.days_at_arrival)
    # Streams of their own, so that a scenario never shifts the baseline.
    parameters, counts, *others = map(
        np.random.default_rng, np.random.SeedSequence(seed).spawn(2 + len(scenarios))
    )
    chunks: list[list[Course]] = []
    for done in range(0, draws, _DRAWS_AT_A_TIME):
        report("draws", done, draws)
        size = min(_DRAWS_AT_A_TIME, draws - done)
        yearly = drawn_hazards(hazards, size, parameters)
        arriving = drawn_arrivals(inflow, size, years + more_years, parameters)
        if "leaving" not in vary:
            yearly = np.broadcast_to(hazards.hazards, yearly.shape)
        if "inflow" not in vary:
            arriving = np.broadcast_to(
                inflow.per_year_ahead(years + more_years) / MONTHS_PER_YEAR, arriving.shape
            )
        monthly = np.ascontiguousarray(np.moveaxis(axis.hazards(yearly), 0, -1))
        due = np.repeat(arriving, MONTHS_PER_YEAR, axis=1).T
        luck = "chance" in vary
        due = counts.poisson(due).astype(float) if luck else due
        chunks.append(_Chunk(axis, placed, into, monthly, due, luck).run(plans, [counts, *others]))
    report("draws", draws, draws)
    return [_joined(courses) for courses in zip(*chunks, strict=True)]


class _Chunk:
    """One chunk of draws: monthly hazards (runs, ways, draws) and newcomers due (months, draws)."""

    def __init__(
        self,
        axis: Ageing,
        placed: np.ndarray,
        into: np.ndarray,
        monthly: np.ndarray,
        due: np.ndarray,
        luck: bool,
    ) -> None:
        self._axis, self._placed, self._into = axis, placed, into
        self._monthly, self._due, self._luck = monthly, due, luck

    def run(self, plans: list[Kept], randoms: list[np.random.Generator]) -> list[Course]:
        """Run the baseline, ``plans[0]``, and the scenarios month by month side by side."""
        months, draws = len(plans[0].newcomers), self._due.shape[1]
        baseline = _Layers(self, plans[0], months, None)
        tracks = [baseline, *(_Layers(self, plan, months, baseline) for plan in plans[1:])]
        runs = len(self._axis.begins)
        for month in range(months):
            for track, random in zip(tracks, randoms, strict=True):
                error = random.standard_normal((runs, draws), dtype=np.float32) if self._luck else None
                track.step(month, error, random)
        return [track.course(random) for track, random in zip(tracks, randoms, strict=True)]


class _Layers:
    """One scenario's patients: those found as ever, and those found early if there are any."""

    def __init__(self, chunk: _Chunk, plan: Kept, months: int, beside: _Layers | None) -> None:
        self._chunk, self._plan, self._beside, self._months = chunk, plan, beside, months
        draws = chunk._due.shape[1]
        runs, ways = chunk._monthly.shape[:2]
        ordinary = _Groups(chunk._axis, months, draws, chunk._placed, chunk._into)
        self._groups = [ordinary]
        if plan.lead_months:
            # Whoever is found early comes at the start.
            at_start = np.eye(1, chunk._axis.slots)[0]
            self._groups.append(_Groups(chunk._axis, months, draws, np.zeros(chunk._axis.slots), at_start))
            self._early = np.zeros((months + plan.lead_months, draws))
        self.error = np.zeros((runs, draws))
        self.expected_left = np.zeros((runs, draws))
        self.under_care = np.empty((months + 1, draws))
        self.first_year = np.empty((months + 1, draws))
        self.newcomers = np.empty((months, draws))
        self.under_care[0] = chunk._placed.sum()
        self.first_year[0] = chunk._placed[: MONTHS_PER_YEAR + 1].sum()
        self.by_way = np.zeros((months // MONTHS_PER_YEAR, ways, draws))
        self.way_error = np.zeros_like(self.by_way)
        self._factors: list[np.ndarray | None] = [None] * len(self._groups)
        self._staying: list[np.ndarray] = [np.empty(0)] * len(self._groups)
        self._monthly: list[np.ndarray] = [np.empty(0)] * len(self._groups)
        self._common = 1.0
        self._unshared = [np.zeros((runs, draws)) for _ in self._groups]

    def step(self, month: int, error: np.ndarray | None, random: np.random.Generator) -> None:
        """Let one month pass; ``error`` holds standard normal errors (runs, draws)."""
        arrived = self._arrive(month, random)
        self.newcomers[month] = sum(arrived)
        under_care = first_year = 0.0
        for position, (groups, come) in enumerate(zip(self._groups, arrived, strict=True)):
            groups.arrive(month, come)
            self._set_hazards(position, month)
            here, staying = groups.here, self._staying[position]
            expected = here * (1 - staying)
            left = expected
            if error is not None:
                own = error if position == 0 else random.standard_normal(error.shape, dtype=np.float32)
                shared = self._shared(own, expected) if position == 0 else own
                left = expected + shared * np.sqrt(np.where(expected > _NOBODY, expected, 0) * staying)
            stayed = here - left
            groups.leave(month, left)
            self._unshared[position] += left
            under_care = under_care + stayed.sum(axis=0)
            begins = self._chunk._axis.begins
            first_year = first_year + stayed[: int(np.searchsorted(begins, MONTHS_PER_YEAR))].sum(axis=0)
            if (month + 1) % MONTHS_PER_YEAR == 0:
                self._share_out(position, month // MONTHS_PER_YEAR)
        self.under_care[month + 1], self.first_year[month + 1] = under_care, first_year

    def course(self, random: np.random.Generator) -> Course:
        """Return the course, the leavings of each year shared out among the ways by chance too."""
        by_way = self.by_way
        if self._chunk._luck:
            error = random.standard_normal(by_way.shape)
            expected = np.maximum(by_way, 0)
            if self._beside is not None:
                part = _correlation(expected, np.maximum(self._beside.by_way, 0))
                error = part * self._beside.way_error + np.sqrt(1 - part**2) * error
            self.way_error = error
            luck = np.sqrt(expected) * error
            total = expected.sum(axis=1, keepdims=True)
            share = np.divide(expected, total, out=np.zeros_like(expected), where=total > 0)
            by_way = by_way + luck - share * luck.sum(axis=1, keepdims=True)
        return Course(self.under_care.T, self.first_year.T, self.newcomers.T, np.moveaxis(by_way, -1, 0))

    def _arrive(self, month: int, random: np.random.Generator) -> list[np.ndarray]:
        """Return who comes in the month, found as ever and found early."""
        plan, due, luck = self._plan, self._chunk._due, self._chunk._luck
        ordinary, early = due[month], []
        if plan.lead_months:
            due_later = due[month + plan.lead_months]
            share = plan.found_early[month]
            found = random.binomial(due_later.astype(np.int64), share) if luck else due_later * share
            self._early[month + plan.lead_months] = found
            ordinary = ordinary - self._early[month]
            early = [found]
        arrived = [ordinary, *early]
        kept = plan.newcomers[month]
        if kept == 1:
            return arrived
        if luck:
            return [random.binomial(each.astype(np.int64), kept).astype(float) for each in arrived]
        return [each * kept for each in arrived]

    def _set_hazards(self, position: int, month: int) -> None:
        factors = self._plan.hazards[month] * (self._plan.hazards_early if position else 1.0)
        before = self._factors[position]
        if before is not None and np.array_equal(before, factors):
            return
        if before is not None and month % MONTHS_PER_YEAR:
            self._share_out(position, month // MONTHS_PER_YEAR)
        monthly = self._chunk._monthly
        self._factors[position] = factors
        changed = monthly * factors[:, np.newaxis]
        self._monthly[position] = changed
        self._staying[position] = _staying(changed)
        if position == 0:
            both = np.minimum(monthly, changed).sum(axis=1)
            least = np.minimum(monthly.sum(axis=1), changed.sum(axis=1))
            self._common = np.divide(both, least, out=np.ones_like(both), where=least > 0)

    def _shared(self, error: np.ndarray, expected: np.ndarray) -> np.ndarray:
        """Correlate the errors of the ordinary group with the baseline's."""
        self.expected_left = expected
        if self._beside is not None:
            part = (
                _correlation(np.maximum(expected, 0), np.maximum(self._beside.expected_left, 0))
                * self._common
            )
            error = part * self._beside.error + np.sqrt(1 - part**2) * error
        self.error = error
        return error

    def _share_out(self, position: int, year: int) -> None:
        """Put what has left since the last time to the ways it is expected to have taken."""
        monthly = self._monthly[position]
        total = monthly.sum(axis=1, keepdims=True)
        shares = np.divide(monthly, total, out=np.zeros_like(monthly), where=total > 0)
        self.by_way[year] += np.einsum("rd,rwd->wd", self._unshared[position], shares)
        self._unshared[position][:] = 0


class _Groups:
    """Patients by the month of their start (rows) and draw (columns); see the module's head.

    All rows of a run are multiplied by the same chance of staying, so each run has one factor for
    all of them: a row holds its patients divided by the factor of its run, and only the row that
    passes into the next run is touched in a month.
    """

    def __init__(self, axis: Ageing, months: int, draws: int, placed: np.ndarray, into: np.ndarray) -> None:
        self._months, self._slots = months, axis.slots
        self._rows = np.zeros((months + axis.slots, draws))
        self._rows[months:] = placed[:, np.newaxis]
        self._factor = np.ones((len(axis.begins), draws))
        self._begins = axis.begins
        self._ends = np.array([*axis.begins[1:], axis.slots])
        self._single = np.flatnonzero(np.diff(axis.begins) == 1)
        self._entrances = np.flatnonzero(into)
        self._entering = into[self._entrances, np.newaxis]
        self._run_entered = axis.run_of_slot[self._entrances]
        self._entering_runs = np.add.reduceat(into, axis.begins)[:, np.newaxis]
        self.here = np.add.reduceat(self._rows[months:], axis.begins, axis=0)
        """How many are in each run, shape (runs, draws)."""

    def arrive(self, month: int, come: np.ndarray) -> None:
        """Let ``come`` (draws,) arrive."""
        rows = self._months - month + self._entrances
        self._rows[rows] += self._entering * come / self._factor[self._run_entered]
        self.here += self._entering_runs * come

    def leave(self, month: int, left: np.ndarray) -> None:
        """Take ``left`` (runs, draws) away, from each row of a run alike, and let a month pass."""
        here, factor = self.here, self._factor
        stays = 1 - np.divide(left, here, out=np.zeros_like(left), where=here != 0)
        # A run that is left by all would have the factor 0, by which nothing can be divided.
        factor *= np.where(np.abs(stays) < _SMALLEST_FACTOR, _SMALLEST_FACTOR, stays)
        here -= left
        first = self._months - month
        rows = first + self._ends[:-1] - 1
        moved = self._rows[rows] * factor[:-1]
        here[:-1] -= moved
        here[self._single] = 0
        here[1:] += moved
        self._rows[rows] = moved / factor[1:]
        if (month + 1) % MONTHS_PER_YEAR == 0:
            self._fold(first - 1)

    def _fold(self, first: int) -> None:
        """Bring the factors back to 1, long before they could become too small."""
        for run, (begin, end) in enumerate(zip(self._begins[:-1], self._ends[:-1], strict=True)):
            self._rows[first + begin : first + end] *= self._factor[run]
        self._factor[:] = 1


def _staying(monthly: np.ndarray) -> np.ndarray:
    """Return the chance of staying in each run from hazards (runs, ways, draws); run 0 is slot 0.

    As ``Ageing.staying``: exp(-H), and (1 - exp(-H))/H for those who start within the month.
    """
    total = monthly.sum(axis=1)
    chance = np.exp(-total)
    first = total[0]
    positive = np.where(first > 0, first, 1.0)
    chance[0] = np.where(first > 0, -np.expm1(-positive) / positive, 1.0)
    return chance


def _correlation(one: np.ndarray, other: np.ndarray) -> np.ndarray:
    """Return sqrt(min/max): how counts go together of which the smaller is part of the larger."""
    most = np.maximum(one, other)
    return np.sqrt(np.divide(np.minimum(one, other), most, out=np.ones_like(most), where=most > 0))


def _joined(courses: Sequence[Course]) -> Course:
    return Course(
        *(
            np.concatenate([getattr(course, name) for course in courses])
            for name in ("under_care", "first_year", "newcomers", "leaving")
        )
    )
