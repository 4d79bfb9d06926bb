"""How far the caseload may turn out from what is expected: rates and counts drawn again.

Each draw takes other hazards and another rate of newcomers, as far as the register leaves them
open, and then lets whole patients come and leave by chance.
"""

from __future__ import annotations

from collections.abc import Callable
from dataclasses import dataclass

import numpy as np

from vitalroll.caseload.inflow import Inflow
from vitalroll.caseload.projection import MONTHS_PER_YEAR, Ageing, ageing, moved_on, shares_by_way
from vitalroll.caseload.retention import Retention
from vitalroll.caseload.scenario import WhatIf
from vitalroll.errors import Refusal

Report = Callable[[str, int, int], None]
"""Called now and then with (stage, done, total)."""

_DRAWS_AT_A_TIME = 100
"""Small enough that one chunk's patients stay in the processor's cache."""

_SHAPE_WITHOUT_EXITS = 0.5
"""Gamma shape for the hazard of a stretch in which nobody left (Jeffreys' prior, no events)."""


def no_report(stage: str, done: int, total: int) -> None:
    """Report to nobody."""


@dataclass(frozen=True)
class Course:
    """Drawn courses of a caseload.

    Parameters
    ----------
    under_care : int array, shape (draws, months + 1)
        At the end of each month; the first entry is today.
    newcomers : int array, shape (draws, years)
    leaving : int array, shape (draws, years, len(WAYS_OF_LEAVING))
    """

    under_care: np.ndarray
    newcomers: np.ndarray
    leaving: np.ndarray


@dataclass(frozen=True)
class Draws:
    """The baseline and, draw for draw beside it, the what-if."""

    baseline: Course
    what_if: Course | None


@dataclass(frozen=True)
class Band:
    """An expected value with the ranges that hold 80 % and 95 % of the draws."""

    value: float
    p80: tuple[float, float]
    p95: tuple[float, float]


def bands(expected: np.ndarray, drawn: np.ndarray) -> list[Band]:
    """Return a band for each expected value, shape (k,), from draws of shape (draws, k)."""
    low95, low80, high80, high95 = np.quantile(drawn, (0.025, 0.1, 0.9, 0.975), axis=0)
    return [
        Band(float(value), (float(l80), float(u80)), (float(l95), float(u95)))
        for value, l80, u80, l95, u95 in zip(expected, low80, high80, low95, high95, strict=True)
    ]


def redraw(
    today: np.ndarray,
    hazards: Retention,
    inflow: Inflow,
    *,
    years: int,
    what_if: WhatIf | None = None,
    draws: int = 1000,
    seed: int = 1,
    report: Report = no_report,
) -> Draws:
    """Draw rates and counts again and again and run the caseload forward with each.

    Hazards: for d exits in T person-years Gamma(d, 1/T), the posterior under the prior 1/h,
    whose mean is the observed rate, so that the fan is centred on what ``project`` expects. A
    stretch without exits takes Gamma(1/2, 1/T) in all, shared out among the ways as in the
    whole register. Rate of newcomers: likewise from their total, its spread widened by the
    overdispersion; a typed rate is certain. Newcomers: Poisson, with a gamma year effect when
    overdispersed. Leaving: binomial in each slot, multinomial between the ways.

    The what-if is drawn on top of the baseline: every leaving of the baseline that the change
    would prevent is prevented with its probability, and whoever is thus kept goes on under the
    changed hazards; every newcomer of the baseline stays away with the given probability. So
    differences are those made by the change, not by luck. The baseline's caseload is the same
    with and without a what-if.

    Parameters
    ----------
    today, hazards, years, what_if
        As for ``projection.project``.
    inflow : Inflow
    draws, seed : int
    report : callable
        Called with ("draws", done, draws) now and then.

    Raises
    ------
    Refusal
        ``out_of_range`` for fewer than one draw or year.
    """
    for field, given in (("draws", draws), ("years", years)):
        if given < 1:
            raise Refusal("out_of_range", field=field, given=given, least=1)
    axis = ageing(hazards.edges)
    placed, into = axis.place(today), axis.arriving(inflow.days_at_arrival)
    # Streams of their own, so that what is drawn for a what-if never shifts the baseline's.
    parameters, counts, others = map(np.random.default_rng, np.random.SeedSequence(seed).spawn(3))
    chunks = []
    for done in range(0, draws, _DRAWS_AT_A_TIME):
        report("draws", done, draws)
        size = min(_DRAWS_AT_A_TIME, draws - done)
        monthly = axis.hazards(drawn_hazards(hazards, size, parameters))
        arriving = drawn_arrivals(inflow, size, years, parameters)
        chunks.append(_chunk(axis, placed, monthly, arriving, into, what_if, counts, others))
    report("draws", draws, draws)
    return Draws(
        baseline=_joined([chunk.baseline for chunk in chunks]),
        what_if=_joined([chunk.what_if for chunk in chunks]) if what_if else None,
    )


def drawn_hazards(hazards: Retention, draws: int, random: np.random.Generator) -> np.ndarray:
    """Draw yearly hazards, shape (draws, stretches, ways); see ``redraw``."""
    exits = hazards.exits
    drawn = random.standard_gamma(exits, size=(draws, *exits.shape))
    total = exits.sum()
    if total:
        unseen = np.flatnonzero(exits.sum(axis=1) == 0)
        extra = random.standard_gamma(_SHAPE_WITHOUT_EXITS, size=(draws, len(unseen)))
        drawn[:, unseen, :] = extra[:, :, np.newaxis] * (exits.sum(axis=0) / total)
    return drawn / hazards.person_years[:, np.newaxis]


def drawn_arrivals(inflow: Inflow, draws: int, years: int, random: np.random.Generator) -> np.ndarray:
    """Draw the expected newcomers of one month in each year, shape (draws, years); see ``redraw``."""
    mean, spread = inflow.per_year.value, inflow.spread
    if inflow.model == "typed":
        rate = np.full((draws, 1), mean)
    else:
        rate = random.standard_gamma(mean * inflow.whole_years / spread, size=(draws, 1))
        rate *= spread / inflow.whole_years
    if spread > 1:
        # Mean rate, variance rate (spread - 1): with the Poisson's own, spread times the rate.
        yearly = random.standard_gamma(rate / (spread - 1), size=(draws, years)) * (spread - 1)
    else:
        yearly = np.repeat(rate, years, axis=1)
    return yearly / MONTHS_PER_YEAR


def _chunk(
    axis: Ageing,
    placed: np.ndarray,
    monthly: np.ndarray,
    arriving: np.ndarray,
    into: np.ndarray,
    what_if: WhatIf | None,
    counts: np.random.Generator,
    others: np.random.Generator,
) -> Draws:
    """Run one chunk of draws: monthly hazards (draws, runs, ways), arrivals (draws, years).

    ``into`` is the share of arrivals that goes into each slot. ``counts`` draws who comes and
    leaves in the baseline; ``others`` the ways and the what-if.
    """
    draws, years = arriving.shape
    entrances = np.flatnonzero(into)
    leaving_chance = 1 - axis.staying(monthly)
    here = np.tile(placed.astype(np.int64), (draws, 1))
    under_care = np.empty((draws, MONTHS_PER_YEAR * years + 1), dtype=np.int64)
    under_care[:, 0] = here.sum(axis=1)
    newcomers = np.zeros((draws, years), dtype=np.int64)
    left = np.zeros((draws, years, len(axis.begins)), dtype=np.int64)
    change = _Change(axis, monthly, what_if, years, others) if what_if else None
    for month in range(MONTHS_PER_YEAR * years):
        year = month // MONTHS_PER_YEAR
        arrived = counts.poisson(arriving[:, year, np.newaxis] * into[entrances])
        here[:, entrances] += arrived
        newcomers[:, year] += arrived.sum(axis=1)
        leavers = counts.binomial(here, leaving_chance)
        if change and year + 1 >= what_if.from_year:
            change.arrive(year, arrived, entrances)
            change.follow(month, here, leavers)
        else:
            left[:, year] += np.add.reduceat(leavers, axis.begins, axis=1)
        here = moved_on(here - leavers)
        under_care[:, month + 1] = here.sum(axis=1)
    before = _by_way(left, monthly, others)
    if change is None:
        return Draws(Course(under_care, newcomers, before), None)
    baseline_leaving, changed_leaving = change.leaving(before)
    return Draws(
        Course(under_care, newcomers, baseline_leaving),
        Course(under_care + change.more_under_care, newcomers - change.kept_away, changed_leaving),
    )


class _Change:
    """What becomes different from the baseline, draw for draw.

    Two groups are followed by slot: ``missing``, patients of the baseline who never come, and
    ``extra``, patients who left in the baseline and are still here.
    """

    def __init__(
        self, axis: Ageing, monthly: np.ndarray, what_if: WhatIf, years: int, random: np.random.Generator
    ) -> None:
        draws, months = len(monthly), MONTHS_PER_YEAR * years
        self._axis, self._monthly, self._what_if, self._random = axis, monthly, what_if, random
        self._changed = monthly * what_if.hazards_kept
        staying, staying_changed = axis.staying(monthly), axis.staying(self._changed)
        self._leaving_chance = 1 - staying_changed
        prevented = shares_by_way(monthly) @ (1 - what_if.hazards_kept)
        self._prevented = prevented[:, axis.run_of_slot]
        # Who is kept once may still leave before the month is over. The chance of that follows
        # from asking that the what-if's staying be exactly its own: staying' =
        # staying + (1 - staying) prevented (1 - again).
        reached = self._prevented * (1 - staying)
        kept = np.divide(staying_changed - staying, reached, out=np.ones_like(reached), where=reached > 0)
        self._again = np.clip(1 - kept, 0, 1)
        self._missing = np.zeros((draws, axis.slots), dtype=np.int64)
        self._extra = np.zeros((draws, axis.slots), dtype=np.int64)
        self.more_under_care = np.zeros((draws, months + 1), dtype=np.int64)
        self.kept_away = np.zeros((draws, years), dtype=np.int64)
        runs = len(axis.begins)
        # Leavings by draw, year and run: in both courses, only in one of them and why.
        self._in_both = np.zeros((draws, years, runs), dtype=np.int64)
        self._averted = np.zeros_like(self._in_both)
        self._of_missing = np.zeros_like(self._in_both)
        self._of_extra = np.zeros_like(self._in_both)

    def arrive(self, year: int, arrived: np.ndarray, entrances: np.ndarray) -> None:
        """Let newcomers of the baseline, (draws, entrances), stay away."""
        if self._what_if.fewer_newcomers:
            away = self._random.binomial(arrived, 1 - self._what_if.newcomers_kept)
            self._missing[:, entrances] += away
            self.kept_away[:, year] += away.sum(axis=1)

    def follow(self, month: int, here: np.ndarray, leavers: np.ndarray) -> None:
        """Take one month of the baseline: those here in each slot and those of them who leave."""
        random, year = self._random, month // MONTHS_PER_YEAR
        of_missing = self._leavers_missing(here, leavers)
        averted = random.binomial(leavers - of_missing, self._prevented)
        again = random.binomial(averted, self._again)
        of_extra = random.binomial(self._extra, self._leaving_chance)
        self._count(self._in_both, year, leavers - of_missing - averted)
        self._count(self._averted, year, averted)
        self._count(self._of_missing, year, of_missing)
        self._count(self._of_extra, year, again + of_extra)
        self._missing = moved_on(self._missing - of_missing)
        self._extra = moved_on(self._extra + averted - again - of_extra)
        self.more_under_care[:, month + 1] = self._extra.sum(axis=1) - self._missing.sum(axis=1)

    def leaving(self, before: np.ndarray) -> tuple[np.ndarray, np.ndarray]:
        """Return leavings by way (draws, years, ways) of the baseline and of the what-if.

        ``before`` holds those of the years before the change, the same in both.
        """
        both = before + _by_way(self._in_both, self._changed, self._random)
        averted = _by_way(self._averted, self._monthly - self._changed, self._random)
        of_missing = _by_way(self._of_missing, self._monthly, self._random)
        of_extra = _by_way(self._of_extra, self._changed, self._random)
        return both + averted + of_missing, both + of_extra

    def _leavers_missing(self, here: np.ndarray, leavers: np.ndarray) -> np.ndarray:
        """Return how many of ``leavers`` are among the missing: as likely as anybody here."""
        found = np.zeros_like(leavers)
        where = np.flatnonzero(self._missing.any(axis=0))
        missing = self._missing[:, where]
        found[:, where] = self._random.hypergeometric(missing, here[:, where] - missing, leavers[:, where])
        return found

    def _count(self, kept: np.ndarray, year: int, by_slot: np.ndarray) -> None:
        kept[:, year] += np.add.reduceat(by_slot, self._axis.begins, axis=1)


def _by_way(left: np.ndarray, monthly: np.ndarray, random: np.random.Generator) -> np.ndarray:
    """Share leavings (draws, years, runs) out among the ways; returns (draws, years, ways)."""
    shares = shares_by_way(monthly)[:, np.newaxis]
    return random.multinomial(left, shares).sum(axis=2)


def _joined(courses: list[Course]) -> Course:
    return Course(
        *(
            np.concatenate([getattr(course, name) for course in courses])
            for name in ("under_care", "newcomers", "leaving")
        )
    )
