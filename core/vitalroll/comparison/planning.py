"""How many patients, outcomes or people asked the next audit needs, and what a given number can show."""

from __future__ import annotations

import math
from dataclasses import dataclass
from statistics import NormalDist

from vitalroll.errors import Caution, Refusal
from vitalroll.numbers import two_sided_z

_NORMAL = NormalDist()

FEW_EXPECTED = 5
"""Fewer outcomes, or people without, than this in a planned group: the normal approximation is poor."""


@dataclass(frozen=True)
class SurvivalSize:
    """Size of a comparison of survival. ``power_of_available`` is NaN when no number was given."""

    events: int
    patients: int
    share_with_event: float
    power_of_available: float
    cautions: tuple[Caution, ...]


def survival_size(
    hazard_ratio: float,
    survival: float,
    at_years: float,
    *,
    accrual_years: float,
    follow_up_years: float,
    share_exposed: float = 0.5,
    lost: float = 0.0,
    power: float = 0.8,
    significance: float = 0.05,
    available: int | None = None,
) -> SurvivalSize:
    """Return the outcomes and patients needed to notice a hazard ratio with a log-rank test or Cox.

    Parameters
    ----------
    hazard_ratio : float
        The ratio that must not be missed; not 1.
    survival : float
        Share of the group compared with that is without the outcome after ``at_years``.
    accrual_years, follow_up_years : float
        Patients come evenly during accrual; follow-up goes on for so long after the last has come.
    share_exposed : float
        Share of the patients in the group in question.
    lost : float
        Share expected to be lost before anything is known of them.
    power, significance : float
        ``significance`` is two-sided.
    available : int
        When given, the power of so many patients.

    Notes
    -----
    d = (za + zb)^2 / [p1 p2 (ln HR)^2]. The share with an outcome by the close is averaged over the time of
    coming, with constant hazards: 1 - [e^(-hf) - e^(-h(f+a))] / (h a).

    References
    ----------
    Schoenfeld (1981) Biometrika 68:316-319; (1983) Biometrics 39:499-503.
    """
    _check_share("survival", survival)
    _check_share("share_exposed", share_exposed)
    if hazard_ratio == 1:
        raise Refusal("nothing_to_notice", field="hazard_ratio")
    if accrual_years + follow_up_years <= 0:
        raise Refusal("no_follow_up_planned", field="follow_up_years")
    z = _z_sum(power, significance)
    information = share_exposed * (1 - share_exposed) * math.log(hazard_ratio) ** 2
    hazard = -math.log(survival) / at_years
    share = (1 - share_exposed) * _share_with_event(hazard, accrual_years, follow_up_years)
    share += share_exposed * _share_with_event(hazard * hazard_ratio, accrual_years, follow_up_years)
    events = math.ceil(z**2 / information)
    achieved = float("nan")
    if available is not None:
        expected = available * (1 - lost) * share
        achieved = _NORMAL.cdf(math.sqrt(expected * information) - two_sided_z(1 - significance))
    return SurvivalSize(
        events=events,
        patients=math.ceil(events / share / (1 - lost)),
        share_with_event=share,
        power_of_available=achieved,
        cautions=(Caution("few_planned_events", {"events": events}),) if events < 2 * FEW_EXPECTED else (),
    )


def _share_with_event(hazard: float, accrual: float, follow_up: float) -> float:
    if accrual == 0:
        return -math.expm1(-hazard * follow_up)
    between = -math.expm1(-hazard * accrual) / (hazard * accrual)
    return 1 - math.exp(-hazard * follow_up) * between


@dataclass(frozen=True)
class ProportionsSize:
    """Size of a comparison of two proportions; patients in the group in question and in the other."""

    exposed: int
    reference: int
    power_of_available: float
    cautions: tuple[Caution, ...]


def proportions_size(
    exposed: float,
    reference: float,
    *,
    reference_for_each: float = 1.0,
    power: float = 0.8,
    significance: float = 0.05,
    available: int | None = None,
) -> ProportionsSize:
    """Return the patients needed in each of two groups to notice a difference of proportions.

    Parameters
    ----------
    exposed, reference : float
        The proportions expected, between 0 and 1 and not the same.
    reference_for_each : float
        How many patients of the group compared with there are for each in question.
    available : int
        When given, the power of so many patients in question, with the others in proportion.

    References
    ----------
    Fleiss, Levin & Paik (2003) Statistical Methods for Rates and Proportions, 3rd ed, ch. 4, without the
    continuity correction.
    """
    _check_share("exposed", exposed)
    _check_share("reference", reference)
    if exposed == reference:
        raise Refusal("nothing_to_notice", field="reference")
    k = reference_for_each
    together = (exposed + k * reference) / (1 + k)
    spread_null = math.sqrt((1 + 1 / k) * together * (1 - together))
    spread = math.sqrt(exposed * (1 - exposed) + reference * (1 - reference) / k)
    za, zb = two_sided_z(1 - significance), _NORMAL.inv_cdf(power)
    apart = abs(exposed - reference)
    n = math.ceil((za * spread_null + zb * spread) ** 2 / apart**2)
    others = math.ceil(k * n)
    achieved = float("nan")
    if available is not None:
        achieved = _NORMAL.cdf((apart * math.sqrt(available) - za * spread_null) / spread)
    cells = (n * exposed, n * (1 - exposed), others * reference, others * (1 - reference))
    few = min(cells) < FEW_EXPECTED
    return ProportionsSize(
        exposed=n,
        reference=others,
        power_of_available=achieved,
        cautions=(Caution("few_planned_events", {"events": math.floor(min(cells))}),) if few else (),
    )


@dataclass(frozen=True)
class SurveySize:
    """People to ask, before and after taking into account that the population is finite."""

    infinite: int
    people: int
    cautions: tuple[Caution, ...]


def survey_size(
    proportion: float,
    margin: float,
    *,
    design_effect: float = 1.0,
    population: int | None = None,
    response: float = 1.0,
    confidence: float = 0.95,
) -> SurveySize:
    """Return how many people to ask so that a proportion is known to within a margin.

    Notes
    -----
    n = deff z^2 p (1 - p) / margin^2; of a population of N only n / (1 + (n - 1) / N) are needed; divided
    by the share that is expected to answer.

    References
    ----------
    Cochran (1977) Sampling Techniques, 3rd ed, ch. 4.
    """
    _check_share("proportion", proportion)
    _check_share("margin", margin)
    needed = design_effect * two_sided_z(confidence) ** 2 * proportion * (1 - proportion) / margin**2
    of_population = needed if population is None else needed / (1 + (needed - 1) / population)
    people = math.ceil(of_population / response)
    if population is not None:
        people = min(people, population)
    outside = margin >= min(proportion, 1 - proportion)
    return SurveySize(
        infinite=math.ceil(needed),
        people=people,
        cautions=(Caution("margin_wider_than_proportion", {}),) if outside else (),
    )


@dataclass(frozen=True)
class AccuracySize:
    """People to test so that sensitivity, and specificity, are known to within the margin."""

    with_disease: int
    without_disease: int
    for_sensitivity: int
    for_specificity: int
    people: int


def accuracy_size(
    sensitivity: float, specificity: float, margin: float, prevalence: float, *, confidence: float = 0.95
) -> AccuracySize:
    """Return how many people to test, of whom a share ``prevalence`` has the disease.

    References
    ----------
    Buderer (1996) Academic Emergency Medicine 3:895-900.
    """
    for name, value in (
        ("sensitivity", sensitivity),
        ("specificity", specificity),
        ("margin", margin),
        ("prevalence", prevalence),
    ):
        _check_share(name, value)
    z = two_sided_z(confidence)
    diseased = z**2 * sensitivity * (1 - sensitivity) / margin**2
    others = z**2 * specificity * (1 - specificity) / margin**2
    for_sensitivity = math.ceil(diseased / prevalence)
    for_specificity = math.ceil(others / (1 - prevalence))
    return AccuracySize(
        with_disease=math.ceil(diseased),
        without_disease=math.ceil(others),
        for_sensitivity=for_sensitivity,
        for_specificity=for_specificity,
        people=max(for_sensitivity, for_specificity),
    )


def _z_sum(power: float, significance: float) -> float:
    return two_sided_z(1 - significance) + _NORMAL.inv_cdf(power)


def _check_share(field: str, value: float) -> None:
    if not 0 < value < 1:
        raise Refusal("not_a_share", field=field, value=value)
