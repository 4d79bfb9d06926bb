"""A whole district without a register: how many are ill by age, now and in the coming years."""

from __future__ import annotations

from dataclasses import dataclass
from typing import Annotated, Any

from vitalroll.caseload.illness_death import AgeGroup, district
from vitalroll.desk.fields import Between
from vitalroll.desk.memory import Memory

Share = Annotated[float, Between(0, 1)]


@dataclass(frozen=True)
class AskedAgeGroup:
    """One age group; see ``caseload.illness_death.AgeGroup``. Rates are for one person a year."""

    from_age: Annotated[float, Between(0, 130)]
    population: Annotated[float, Between(0, 1e10)]
    prevalence: Share
    incidence: Share
    mortality_well: Share
    mortality_ill: Share


@dataclass(frozen=True)
class DistrictRequest:
    """Fields of ``counts.district``."""

    groups: tuple[AskedAgeGroup, ...]
    last_age: Annotated[float, Between(1, 130)] = 100.0
    years: Annotated[int, Between(1, 50)] = 10


def district_from_counts(memory: Memory, request: DistrictRequest, report: Any) -> dict[str, Any]:
    """Answer ``counts.district``: prevalence by age from incidence and mortality.

    Returns
    -------
    dict
        ``path`` [{year, ill, prevalence}] from now on; ``groups`` [{from_age, to_age, ill_now,
        prevalence_now, ill_then, prevalence_then, steady_prevalence}], then being the last year;
        ``steady_ill``; ``distance``: of those ill now from the steady state, as a share of it, null
        when that is nobody; ``years_to_steady``: null when beyond the longest life; ``cautions``.

    Refusals and cautions: those of ``illness_death.district``.
    """
    found = district(
        [AgeGroup(**vars(group)) for group in request.groups], last_age=request.last_age, years=request.years
    )
    return {
        "path": [
            {"year": year, "ill": ill, "prevalence": share}
            for year, (ill, share) in enumerate(
                zip(found.ill.tolist(), found.prevalence.tolist(), strict=True)
            )
        ],
        "groups": [
            {
                "from_age": group.from_age,
                "to_age": group.to_age,
                "ill_now": group.ill[0],
                "prevalence_now": group.prevalence[0],
                "ill_then": group.ill[-1],
                "prevalence_then": group.prevalence[-1],
                "steady_prevalence": group.steady_prevalence,
            }
            for group in found.groups
        ],
        "steady_ill": found.steady_ill,
        "distance": found.distance,
        "years_to_steady": found.years_to_steady,
        "cautions": found.cautions,
    }


TASKS = {"counts.district": (DistrictRequest, district_from_counts)}
