"""Named scenarios: one or several levers, from a month on, that change who comes and who leaves."""

from __future__ import annotations

from dataclasses import dataclass

import numpy as np

from vitalroll.errors import Refusal
from vitalroll.outcomes.competing import WAYS_OF_LEAVING
from vitalroll.register.cohort import DEATHS

LEVERS = (
    "fewer_newcomers",
    "risk_factor",
    "found_earlier",
    "fewer_lost",
    "fewer_deaths",
    "fewer_stopped",
    "more_completed",
)

LONGEST_LEAD_MONTHS = 60

_LESS_OF = {"fewer_lost": ("lost",), "fewer_deaths": DEATHS, "fewer_stopped": ("stopped",)}
_MOST_PER_CENT_MORE = 1000.0
_MOST_MONEY = 1e12


@dataclass(frozen=True)
class Kept:
    """What a scenario multiplies, month by month; ones leave the baseline as it is.

    Parameters
    ----------
    newcomers : float array, shape (months,)
        Share of the baseline's newcomers who come.
    hazards : float array, shape (months, len(WAYS_OF_LEAVING))
    found_early : float array, shape (months,)
        Share of the newcomers due ``lead_months`` later who come in this month already.
    lead_months : int
    hazards_early : float array, shape (len(WAYS_OF_LEAVING),)
        Multiplies ``hazards`` for those found early.
    """

    newcomers: np.ndarray
    hazards: np.ndarray
    found_early: np.ndarray
    lead_months: int
    hazards_early: np.ndarray


@dataclass(frozen=True)
class Lever:
    """One change against the baseline.

    Parameters
    ----------
    kind : str
        One of ``LEVERS``.
    percent : float
        By how much: fewer newcomers, lost, deaths or stopped (0 to 100), more completed (0 to
        1000: 100 doubles the hazard); for a risk factor how much of the exposure is removed; for
        those found earlier the share of newcomers it reaches.
    from_month, ramp_months : int
        The projected month, counted from 1, in which the lever begins, and over how many months
        it grows evenly to its full effect; 0 or 1 is at once.
    prevalence, relative_risk, among_patients : float, float, bool
        Risk factor only: prevalence in per cent in the whole population (Levin), or among
        patients with an adjusted relative risk (Miettinen) when ``among_patients``.
    months_earlier, fewer_deaths_among : int, float
        Found earlier only: the lead time, and by how many per cent the hazard of dying of those
        found early is lower at the same time since start.
    """

    kind: str
    percent: float
    from_month: int = 1
    ramp_months: int = 0
    prevalence: float = 0.0
    relative_risk: float = 1.0
    among_patients: bool = False
    months_earlier: int = 0
    fewer_deaths_among: float = 0.0
    cost_at_start: float = 0.0
    cost_per_year: float = 0.0

    def check(self, field: str) -> None:
        """Refuse by the dotted name of the field: ``not_one_of`` or ``out_of_range``."""
        if self.kind not in LEVERS:
            raise Refusal("not_one_of", field=f"{field}.kind", given=self.kind, choices=list(LEVERS))
        most = _MOST_PER_CENT_MORE if self.kind == "more_completed" else 100.0
        limits = {
            "percent": (0.0, most),
            "from_month": (1, 360),
            "ramp_months": (0, 360),
            "prevalence": (0.0, 100.0),
            "relative_risk": (1.0, 1000.0),
            "months_earlier": (1 if self.kind == "found_earlier" else 0, LONGEST_LEAD_MONTHS),
            "fewer_deaths_among": (0.0, 100.0),
            "cost_at_start": (0.0, _MOST_MONEY),
            "cost_per_year": (0.0, _MOST_MONEY),
        }
        for name, (least, greatest) in limits.items():
            given = getattr(self, name)
            if not least <= given <= greatest:
                raise Refusal(
                    "out_of_range", field=f"{field}.{name}", given=given, least=least, greatest=greatest
                )

    @property
    def attributable_fraction(self) -> float:
        """Share of newcomers who would not come without the exposure; 1 for other levers.

        Levin ML (1953) Acta Unio Int Contra Cancrum 9:531-541, p(RR - 1)/(1 + p(RR - 1)) with the
        prevalence p in the population; Miettinen OS (1974) Am J Epidemiol 99:325-332,
        p (RR - 1)/RR with the prevalence p among patients, which stays right when the relative
        risk was adjusted for confounders.
        """
        if self.kind != "risk_factor":
            return 1.0
        share, excess = self.prevalence / 100, self.relative_risk - 1
        if self.among_patients:
            return share * excess / self.relative_risk
        return share * excess / (1 + share * excess)

    def strength(self, months: int) -> np.ndarray:
        """Return how much of the full effect holds in each month, shape (months,), from 0 to 1."""
        into = np.arange(months) - (self.from_month - 1) + 1
        return np.clip(into / max(self.ramp_months, 1), 0.0, 1.0)


@dataclass(frozen=True)
class Scenario:
    """Several levers under one name.

    Parameters
    ----------
    name : str
    levers : tuple of Lever
        At most one of them finds patients earlier.

    Raises
    ------
    Refusal
        ``not_one_of`` or ``out_of_range`` (levers.N.field); ``found_earlier_twice``; all with the
        dotted field, counted from 0.
    """

    name: str
    levers: tuple[Lever, ...] = ()

    def __post_init__(self) -> None:
        for position, lever in enumerate(self.levers):
            lever.check(f"levers.{position}")
        if sum(lever.kind == "found_earlier" for lever in self.levers) > 1:
            raise Refusal("found_earlier_twice", field="levers")

    def over(self, months: int) -> Kept:
        """Return what the levers leave of the baseline in each month.

        Levers multiply each other: two that each lower losses by half leave a quarter, and who is
        not lost can still die (hazards of competing ways of leaving act side by side).
        """
        newcomers, hazards = np.ones(months), np.ones((months, len(WAYS_OF_LEAVING)))
        found_early, lead = np.zeros(months), 0
        hazards_early = np.ones(len(WAYS_OF_LEAVING))
        for lever in self.levers:
            effect = lever.strength(months) * lever.percent / 100
            if lever.kind in ("fewer_newcomers", "risk_factor"):
                newcomers *= 1 - effect * lever.attributable_fraction
            elif lever.kind == "found_earlier":
                found_early, lead = effect, lever.months_earlier
                hazards_early[_columns(DEATHS)] = 1 - lever.fewer_deaths_among / 100
            elif lever.kind == "more_completed":
                hazards[:, WAYS_OF_LEAVING.index("recovered")] *= 1 + effect
            else:
                hazards[:, _columns(_LESS_OF[lever.kind])] *= (1 - effect)[:, np.newaxis]
        return Kept(newcomers, hazards, found_early, lead, hazards_early)

    def money(self, years: int) -> np.ndarray:
        """Return what the programmes cost in each year, shape (years,), at today's prices."""
        month = np.arange(12 * years)
        spent = np.zeros(12 * years)
        for lever in self.levers:
            spent += np.where(month >= lever.from_month - 1, lever.cost_per_year / 12, 0.0)
            spent += np.where(month == lever.from_month - 1, lever.cost_at_start, 0.0)
        return spent.reshape(years, 12).sum(axis=1)


def as_it_is(months: int) -> Kept:
    """Return what changes nothing."""
    return Scenario("").over(months)


def _columns(ways: tuple[str, ...]) -> list[int]:
    return [WAYS_OF_LEAVING.index(way) for way in ways]
