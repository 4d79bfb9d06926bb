"""How patients leave: yearly hazards by cause and by time since the start of follow-up."""

from __future__ import annotations

import math
from dataclasses import dataclass, replace

import numpy as np

from vitalroll.errors import Caution, Refusal
from vitalroll.numbers import DAYS_PER_YEAR
from vitalroll.outcomes.competing import WAYS_OF_LEAVING
from vitalroll.outcomes.person_time import poisson_limits
from vitalroll.outcomes.risk_table import RiskTable

ENOUGH_EXITS = 10
ENOUGH_PERSON_YEARS = 50.0


@dataclass(frozen=True)
class Retention:
    """Hazards of leaving, constant within each stretch of time since start.

    Parameters
    ----------
    edges : float array, shape (stretches + 1,)
        Bounds of the stretches in whole years since start, from 0; the last one is where
        support ends, and from there on the hazard of the last stretch is held.
    at_risk : int array, shape (stretches,)
        Patients under observation as the stretch begins.
    person_years : float array, shape (stretches,)
        Time observed within the stretch, exact to the day, delayed entry respected.
    exits : int array, shape (stretches, len(WAYS_OF_LEAVING))
        How many left in the stretch, by way of leaving.
    beyond_person_years, beyond_exits : float, int
        What was observed after the last edge: too little to be used.
    tail : float
        What the hazards of the last stretch are multiplied by beyond its end; 1 holds them.
    cautions : tuple of Caution
    """

    edges: np.ndarray
    at_risk: np.ndarray
    person_years: np.ndarray
    exits: np.ndarray
    beyond_person_years: float
    beyond_exits: int
    tail: float = 1.0
    cautions: tuple[Caution, ...] = ()

    @property
    def hazards(self) -> np.ndarray:
        """Exits per person-year, shape (stretches, len(WAYS_OF_LEAVING))."""
        return self.exits / self.person_years[:, np.newaxis]

    @property
    def supported_years(self) -> float:
        """Years since start up to which hazards were observed well enough."""
        return float(self.edges[-1])

    def limits(self, confidence: float = 0.95) -> tuple[np.ndarray, np.ndarray]:
        """Return Garwood's (1936) limits of the hazards, two arrays shaped like ``hazards``."""
        lower, upper = poisson_limits(self.exits, confidence)
        years = self.person_years[:, np.newaxis]
        return lower / years, upper / years

    def staying(self) -> np.ndarray:
        """Return the chance of staying in care through each stretch, given care as it begins."""
        return np.exp(-self.hazards.sum(axis=1) * np.diff(self.edges))


def retention(table: RiskTable) -> Retention:
    """Estimate the hazards of leaving from the risk table, by year since start.

    A year counts as supported by 10 exits, whatever the time, or by 50 person-years, whatever
    the exits. Either way the error of one year's chance of staying is held in: 10 exits give
    the hazard a relative standard error of at most 1/sqrt(10) = 32 %, and 50 person-years with
    fewer exits an absolute one of at most sqrt(9)/50 = 0.06 a year. A year with less is joined
    with the years after it until they are supported together. What remains at the end is too
    thin to use: the hazards of the last supported stretch are held beyond it.

    Parameters
    ----------
    table : RiskTable
        Of the patients whose leaving is to be described, in days since start.

    Raises
    ------
    Refusal
        ``no_person_time`` when nobody was observed for a day.

    Cautions
    --------
    ``retention_thin`` (person_years, exits): the whole register is not enough for one stretch;
    it is used as one all the same. ``no_exits_observed`` (from_years, to_years, upper: the 95 %
    upper limit of the hazard): nobody left in a stretch, so a hazard of zero is used.

    References
    ----------
    Exits over person-time is the maximum-likelihood hazard when it is constant within the
    stretch (Holford 1976, Biometrics 32:229-237).
    """
    if table.person_days == 0:
        raise Refusal("no_person_time")
    last_year = max(1, math.ceil(int(table.time[-1]) / DAYS_PER_YEAR))
    edges = np.arange(last_year + 1, dtype=float)
    years = person_years_between(table, edges)
    exits = _exits_between(table, edges)
    ends = _supported_ends(years, exits.sum(axis=1))
    cautions = []
    if not ends:
        ends = [last_year]
        cautions.append(
            Caution("retention_thin", {"person_years": float(years.sum()), "exits": int(exits.sum())})
        )
    begins = [0, *ends[:-1]]
    found = Retention(
        edges=edges[[0, *ends]],
        at_risk=_under_observation(table, edges[begins]),
        person_years=np.add.reduceat(years[: ends[-1]], begins),
        exits=np.add.reduceat(exits[: ends[-1]], begins, axis=0),
        beyond_person_years=float(years[ends[-1] :].sum()),
        beyond_exits=int(exits[ends[-1] :].sum()),
    )
    return _with_cautions(found, cautions)


def person_years_between(table: RiskTable, edges: np.ndarray) -> np.ndarray:
    """Return the person-years observed between successive edges (years since start).

    The number under observation is constant between the days of the table, so time observed up
    to any moment is a line through its values on those days: nothing is approximated.
    """
    days = np.concatenate(([0], table.time))
    observed = np.concatenate(([0], np.cumsum(table.at_risk * np.diff(days))))
    return np.diff(np.interp(edges * DAYS_PER_YEAR, days, observed)) / DAYS_PER_YEAR


def _exits_between(table: RiskTable, edges: np.ndarray) -> np.ndarray:
    """Return exits by way, shape (stretches, len(WAYS_OF_LEAVING)); who leaves on an edge leaves before it.

    Exits on day 0 carry no time but belong to the first stretch.
    """
    upto = np.searchsorted(table.time, edges * DAYS_PER_YEAR, side="right")
    upto[0] = 0
    nobody = np.zeros((1, len(WAYS_OF_LEAVING)), dtype=np.int64)
    left = np.vstack((nobody, np.cumsum(table.left[:, 1:], axis=0)))
    return np.diff(left[upto], axis=0)


def _under_observation(table: RiskTable, years: np.ndarray) -> np.ndarray:
    # Half a day after the edge: those who leave on the day of the edge have left, those who come
    # under observation on it have come. On day 0 itself everyone is still there.
    days = np.floor(years * DAYS_PER_YEAR)
    return table.at_risk_on(np.where(days > 0, days + 0.5, 0.0))


def _supported_ends(person_years: np.ndarray, exits: np.ndarray) -> list[int]:
    """Return the years at which a supported stretch ends, joining thin years with those after."""
    ends, time, left = [], 0.0, 0
    for year, (more_time, more_left) in enumerate(zip(person_years, exits, strict=True), start=1):
        time, left = time + more_time, left + more_left
        if time > 0 and (left >= ENOUGH_EXITS or time >= ENOUGH_PERSON_YEARS):
            ends.append(year)
            time, left = 0.0, 0
    return ends


def _with_cautions(found: Retention, cautions: list[Caution]) -> Retention:
    for i in np.flatnonzero(found.exits.sum(axis=1) == 0):
        upper = float(poisson_limits(0)[1]) / float(found.person_years[i])
        cautions.append(
            Caution(
                "no_exits_observed",
                {
                    "from_years": float(found.edges[i]),
                    "to_years": float(found.edges[i + 1]),
                    "upper": upper,
                },
            )
        )
    return replace(found, cautions=tuple(cautions))
