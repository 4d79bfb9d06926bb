"""How a caseload changes, from totals alone: prevalent now, new each year, leaving each year."""

from __future__ import annotations

import math
from dataclasses import dataclass

from scipy.special import pdtrik

from vitalroll.errors import Caution, Refusal

SHORT_HORIZON_YEARS = 5
"""Years beyond which a balance that holds today's flows still is not to be leaned on."""

_APART_WORTH_SAYING = 0.05
_EVEN_WITHIN = 0.05


@dataclass(frozen=True)
class BalanceYear:
    """The caseload after ``year`` years.

    ``under_care`` adds and takes away the same numbers every year, P0 + t(I - A), and never goes
    below 0. ``under_care_at_constant_rate`` lets the same share leave instead, so that a larger
    caseload loses more: P* + (P0 - P*) exp(-a t), with a = A/P0 and P* = I/a.
    """

    year: int
    under_care: float
    under_care_at_constant_rate: float


@dataclass(frozen=True)
class Balance:
    """A caseload's balance.

    Parameters
    ----------
    path : tuple of BalanceYear
        From year 0.
    net_per_year, leaving_per_year : float
        Patients.
    turnover : float
        Leaving per 100 patient-years of care.
    mean_duration_years : float
        Patients under care over those leaving each year; infinite when nobody leaves.
    steady_state : float
        The caseload at which newcomers and leavers are even: newcomers a year times mean
        duration (Little 1961). Infinite when somebody comes and nobody leaves.
    prevalence_per_100000, incidence_per_100000 : float or None
        Of the whole population; newcomers per 100,000 person-years of those not under care.
    steady_prevalence_per_100000 : float or None
        From P/(1 - P) = incidence x duration.
    cautions : tuple of Caution
    """

    path: tuple[BalanceYear, ...]
    net_per_year: float
    leaving_per_year: float
    turnover: float
    mean_duration_years: float
    steady_state: float
    prevalence_per_100000: float | None
    incidence_per_100000: float | None
    steady_prevalence_per_100000: float | None
    cautions: tuple[Caution, ...]


@dataclass(frozen=True)
class Occupancy:
    """Places taken in a steady state.

    ``mean`` is arrivals times stay; on 95 days of 100 no more than ``percentile_95`` are taken
    (Poisson); ``utilisation`` is the mean over the places there are.
    """

    mean: float
    percentile_95: int
    utilisation: float


def balance(
    prevalent: float,
    new_per_year: float,
    leaving_per_year: float,
    *,
    years: int = 5,
    population: float | None = None,
) -> Balance:
    """Balance a caseload from totals.

    Parameters
    ----------
    prevalent : float
        Patients under care now.
    new_per_year, leaving_per_year : float
        Patients; leaving in all ways together.
    years : int
        How far to look ahead.
    population : float, optional
        People among whom the patients live, patients included.

    Raises
    ------
    Refusal
        ``nobody_under_care`` (field prevalent) for 0; ``out_of_range`` for a negative number or
        less than one year; ``population_not_above_prevalent``.

    Cautions
    --------
    ``balance_short_horizon`` (years, limit); ``balance_paths_apart`` (year, under_care,
    at_constant_rate): from that year on the two paths differ by more than 5 %;
    ``balance_reaches_zero`` (year); ``nobody_leaves``: there is no steady state;
    ``not_in_steady_state`` (new_per_year, leaving_per_year): flows more than 5 % apart, so mean
    duration is only what it would be if they stayed as they are.

    References
    ----------
    Prevalence odds = incidence x duration in a steady state: Rothman, Greenland & Lash (2008)
    Modern Epidemiology, 3rd ed., ch. 3. Little JDC (1961) Oper Res 9:383-387.
    """
    _check(prevalent, new_per_year, leaving_per_year, years, population)
    rate = leaving_per_year / prevalent
    duration = 1 / rate if rate > 0 else math.inf
    steady = new_per_year * duration if new_per_year > 0 else 0.0
    path = tuple(
        BalanceYear(
            year,
            max(0.0, prevalent + year * (new_per_year - leaving_per_year)),
            steady + (prevalent - steady) * math.exp(-rate * year)
            if rate > 0
            else prevalent + year * new_per_year,
        )
        for year in range(years + 1)
    )
    incidence = odds = None
    if population is not None:
        incidence = new_per_year / (population - prevalent)
        odds = incidence * duration if new_per_year > 0 else 0.0
    return Balance(
        path=path,
        net_per_year=new_per_year - leaving_per_year,
        leaving_per_year=leaving_per_year,
        turnover=100 * rate,
        mean_duration_years=duration,
        steady_state=steady,
        prevalence_per_100000=None if population is None else 1e5 * prevalent / population,
        incidence_per_100000=None if incidence is None else 1e5 * incidence,
        steady_prevalence_per_100000=None if odds is None else 1e5 * prevalence_from_odds(odds),
        cautions=tuple(_cautions(path, new_per_year, leaving_per_year)),
    )


def prevalence_from_odds(odds: float) -> float:
    """Return the prevalence P with P/(1 - P) = ``odds``, for example incidence times duration."""
    return 1.0 if math.isinf(odds) else odds / (1 + odds)


def occupancy(arrivals_per_year: float, stay_years: float, places: float) -> Occupancy:
    """Say how many places are taken in a steady state (Little 1961: L = lambda W).

    Raises
    ------
    Refusal
        ``out_of_range`` for a negative number or no places;
        ``utilisation_at_or_above_one`` (utilisation, places, needed) when the places there are
        could never keep up: no queue settles then, so there is no figure to give.
    """
    for field, given in (("arrivals_per_year", arrivals_per_year), ("stay_years", stay_years)):
        if not given >= 0:
            raise Refusal("out_of_range", field=field, given=given, least=0.0, greatest=math.inf)
    if not 0 < places < math.inf:
        raise Refusal("out_of_range", field="places", given=places, least=0.0, greatest=math.inf)
    mean = arrivals_per_year * stay_years if arrivals_per_year > 0 else 0.0
    if mean >= places:
        raise Refusal(
            "utilisation_at_or_above_one",
            field="places",
            utilisation=mean / places,
            places=places,
            needed=mean,
        )
    # pdtrik returns where the distribution function, made continuous, crosses 0.95.
    taken = math.ceil(float(pdtrik(0.95, mean))) if mean > 0 else 0
    return Occupancy(mean=mean, percentile_95=taken, utilisation=mean / places)


def _check(
    prevalent: float, new_per_year: float, leaving_per_year: float, years: int, population: float | None
) -> None:
    amounts = {"prevalent": prevalent, "new_per_year": new_per_year, "leaving": leaving_per_year}
    for field, given in amounts.items():
        if not 0 <= given < math.inf:
            raise Refusal("out_of_range", field=field, given=given, least=0.0, greatest=math.inf)
    if prevalent == 0:
        raise Refusal("nobody_under_care", field="prevalent")
    if years < 1:
        raise Refusal("out_of_range", field="years", given=years, least=1)
    if population is not None and not prevalent < population < math.inf:
        raise Refusal(
            "population_not_above_prevalent", field="population", population=population, prevalent=prevalent
        )


def _cautions(path: tuple[BalanceYear, ...], new_per_year: float, leaving_per_year: float) -> list[Caution]:
    cautions = []
    if path[-1].year > SHORT_HORIZON_YEARS:
        cautions.append(
            Caution("balance_short_horizon", {"years": path[-1].year, "limit": SHORT_HORIZON_YEARS})
        )
    for point in path:
        steady = point.under_care_at_constant_rate
        if abs(point.under_care - steady) > _APART_WORTH_SAYING * steady:
            parameters = {"year": point.year, "under_care": point.under_care, "at_constant_rate": steady}
            cautions.append(Caution("balance_paths_apart", parameters))
            break
    empty = next((point.year for point in path if point.under_care == 0), None)
    if empty is not None:
        cautions.append(Caution("balance_reaches_zero", {"year": empty}))
    flows = {"new_per_year": new_per_year, "leaving_per_year": leaving_per_year}
    if leaving_per_year == 0:
        cautions.append(Caution("nobody_leaves"))
    elif abs(new_per_year - leaving_per_year) > _EVEN_WITHIN * leaving_per_year:
        cautions.append(Caution("not_in_steady_state", flows))
    return cautions
