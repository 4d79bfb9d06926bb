"""How many have a chronic disease, by age, in a district without a register: the illness-death equation.

People are well, ill or dead. With incidence i of those well, mortality m0 of those well and m1 of those
ill, the share p of the living who are ill follows, along one generation's life,

    dp/dt = (1 - p)(i - p (m1 - m0))

(Brinks R, Landwehr S (2014) Math Med Biol 31:1-17; without recovery and migration). In a steady
state p depends on age alone, and the same equation holds with age in place of time.
"""

from __future__ import annotations

import math
from collections.abc import Sequence
from dataclasses import dataclass

import numpy as np

from vitalroll.errors import Caution, Refusal

_CLOSE = 0.01
_SMALL = 1e-9


@dataclass(frozen=True)
class AgeGroup:
    """Rates and numbers of one age group, ages ``from_age`` up to the next group's.

    Parameters
    ----------
    from_age : float
        Whole years.
    population : float
        People now.
    prevalence : float
        Share of them ill now, from 0 to 1.
    incidence, mortality_well, mortality_ill : float
        A year, for each person well, well and ill; never below 0 and never above 1.
    """

    from_age: float
    population: float
    prevalence: float
    incidence: float
    mortality_well: float
    mortality_ill: float


@dataclass(frozen=True)
class GroupPath:
    """One age group's course.

    Parameters
    ----------
    from_age, to_age : float
    prevalence, ill : float arrays, shape (years + 1,)
        Share and number ill now and after each year; numbers keep the population as it is now.
    steady_prevalence : float
        Share if these rates had always been and stayed.
    """

    from_age: float
    to_age: float
    prevalence: np.ndarray
    ill: np.ndarray
    steady_prevalence: float


@dataclass(frozen=True)
class District:
    """The whole district's course.

    Parameters
    ----------
    groups : tuple of GroupPath
    ill : float array, shape (years + 1,)
    prevalence : float array, shape (years + 1,)
    steady_ill : float
        Ill in the steady state of these rates, in a population of today's ages.
    distance : float
        Of those ill now from the steady state, as a share of it: negative when fewer are ill now.
    years_to_steady : int or None
        After how many years fewer than 1 % of the steady number are missing or too many; None when
        that is not within the longest life of the table.
    cautions : tuple of Caution
    """

    groups: tuple[GroupPath, ...]
    ill: np.ndarray
    prevalence: np.ndarray
    steady_ill: float
    distance: float
    years_to_steady: int | None
    cautions: tuple[Caution, ...]


def district(groups: Sequence[AgeGroup], *, last_age: float, years: int) -> District:
    """Run the prevalence by age forward and to its steady state.

    Every generation is followed by single years of age: it grows a year older each year, with the
    rates of its age; those who enter the first age bring the first group's steady prevalence at birth,
    none when it begins at 0. The population of each age stays as it is: only who is ill among them
    changes.

    Parameters
    ----------
    groups : sequence of AgeGroup
        In order of age, without gaps.
    last_age : float
        Where the last group ends.
    years : int

    Raises
    ------
    Refusal
        ``no_age_groups``; ``ages_not_rising`` (groups.N.from_age); ``out_of_range`` (groups.N.field)
        for a rate or share below 0 or above 1 or a negative population; ``nobody_in_district``.

    Cautions
    --------
    ``ill_die_less`` (from_age): mortality of those ill below that of those well, which is usually a
    mistake; ``migration_ignored``; ``far_from_steady_state`` (share) when more than a tenth away:
    incidence times duration does not give the prevalence then.
    """
    edges = _check(groups, last_age, years)
    ages = np.arange(int(edges[0]), int(edges[-1]))
    of_age = np.searchsorted(edges, ages, side="right") - 1
    widths = np.diff(edges)
    people = np.array([group.population for group in groups])[of_age] / widths[of_age]
    rates = np.array([(g.incidence, g.mortality_ill - g.mortality_well) for g in groups])[of_age]
    now = np.array([group.prevalence for group in groups])[of_age]
    # At the first age nobody has been ill for long: none when the table begins at birth, otherwise
    # as many as now.
    entering = 0.0 if edges[0] == 0 else float(now[0])
    steady = _steady(rates, entering)
    course = [now]
    longest = len(ages)
    for _ in range(max(years, longest)):
        course.append(_a_year_later(course[-1], rates, entering))
    path = np.stack(course)
    by_group = np.stack([(path * people)[:, of_age == i].sum(axis=1) for i in range(len(groups))], axis=1)
    total = by_group.sum(axis=1)
    steady_ill = float(np.sum(steady * people))
    reached = np.abs(total - steady_ill) < _CLOSE * max(steady_ill, _SMALL)
    everyone = people.sum()
    distance = (total[0] - steady_ill) / steady_ill if steady_ill > 0 else math.nan
    populations = np.array([group.population for group in groups])
    shares = np.divide(by_group, populations, out=np.zeros_like(by_group), where=populations > 0)
    steady_share = [
        float(np.sum((steady * people)[of_age == i]) / populations[i]) if populations[i] > 0 else math.nan
        for i in range(len(groups))
    ]
    return District(
        groups=tuple(
            GroupPath(
                group.from_age,
                float(edges[i + 1]),
                shares[: years + 1, i],
                by_group[: years + 1, i],
                steady_share[i],
            )
            for i, group in enumerate(groups)
        ),
        ill=total[: years + 1],
        prevalence=total[: years + 1] / everyone,
        steady_ill=steady_ill,
        distance=float(distance),
        years_to_steady=_settled(reached),
        cautions=tuple(_cautions(groups, float(distance))),
    )


def step(prevalence: np.ndarray, incidence: np.ndarray, excess: np.ndarray, years: float) -> np.ndarray:
    """Solve dp/dt = (1 - p)(i - p e) exactly for constant rates over so many years.

    With u = 1/(1 - p), du/dt = u (i - e) + e: linear, so u(t) = u(0) exp((i - e) t) + e (exp((i - e) t)
    - 1)/(i - e). A prevalence of 1 stays 1.
    """
    difference = incidence - excess
    growth = np.exp(difference * years)
    # (exp(x) - 1)/x is 1 for x = 0.
    small = np.abs(difference) < 1e-12
    gained = np.where(small, years, np.expm1(difference * years) / np.where(small, 1.0, difference))
    well = 1 - prevalence
    odds = growth + excess * gained * well
    return np.where(well <= 0, 1.0, 1 - well / np.where(odds > 0, odds, 1.0))


def _a_year_later(now: np.ndarray, rates: np.ndarray, entering: float) -> np.ndarray:
    """Return the prevalence at each age after a year: everyone in mid-year ages into the next age."""
    half = step(now, rates[:, 0], rates[:, 1], 0.5)
    later = np.empty_like(now)
    later[1:] = step(half[:-1], rates[1:, 0], rates[1:, 1], 0.5)
    later[0] = step(np.array(entering), rates[0, 0], rates[0, 1], 0.5)
    return later


def _steady(rates: np.ndarray, entering: float) -> np.ndarray:
    """Return the prevalence in the middle of each age when the rates have always been these."""
    found = np.empty(len(rates))
    found[0] = step(np.array(entering), rates[0, 0], rates[0, 1], 0.5)
    for age in range(1, len(rates)):
        edge = step(found[age - 1], rates[age - 1, 0], rates[age - 1, 1], 0.5)
        found[age] = step(edge, rates[age, 0], rates[age, 1], 0.5)
    return found


def _settled(reached: np.ndarray) -> int | None:
    """Return the first year from which on every year is close."""
    away = np.flatnonzero(~reached)
    first = int(away[-1]) + 1 if len(away) else 0
    return first if first < len(reached) else None


def _check(groups: Sequence[AgeGroup], last_age: float, years: int) -> np.ndarray:
    if not groups:
        raise Refusal("no_age_groups", field="groups")
    if years < 1:
        raise Refusal("out_of_range", field="years", given=years, least=1)
    for i, group in enumerate(groups):
        for name in ("prevalence", "incidence", "mortality_well", "mortality_ill"):
            given = getattr(group, name)
            if not 0 <= given <= 1:
                raise Refusal(
                    "out_of_range", field=f"groups.{i}.{name}", given=given, least=0.0, greatest=1.0
                )
        if not 0 <= group.population < math.inf:
            raise Refusal(
                "out_of_range",
                field=f"groups.{i}.population",
                given=group.population,
                least=0.0,
                greatest=math.inf,
            )
    edges = np.array([*(group.from_age for group in groups), last_age], dtype=float)
    if np.any(edges < 0) or np.any(edges != np.floor(edges)):
        raise Refusal("ages_not_whole", field="groups")
    falling = np.flatnonzero(np.diff(edges) <= 0)
    if len(falling):
        raise Refusal("ages_not_rising", field=f"groups.{int(falling[0]) + 1}.from_age")
    if sum(group.population for group in groups) == 0:
        raise Refusal("nobody_in_district", field="groups")
    return edges


def _cautions(groups: Sequence[AgeGroup], distance: float) -> list[Caution]:
    cautions = [
        Caution("ill_die_less", {"from_age": group.from_age})
        for group in groups
        if group.mortality_ill < group.mortality_well
    ]
    if abs(distance) > 0.1:
        cautions.append(Caution("far_from_steady_state", {"share": abs(distance)}))
    cautions.append(Caution("migration_ignored"))
    return cautions
