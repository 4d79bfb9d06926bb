"""What the losses could change: the task behind that part of the Outcomes place."""

from __future__ import annotations

from collections.abc import Callable
from dataclasses import dataclass
from typing import Annotated, Any

import numpy as np

from vitalroll.desk.fields import Between
from vitalroll.desk.memory import Memory
from vitalroll.desk.outcome_tasks import Confidence
from vitalroll.errors import Caution
from vitalroll.numbers import DAYS_PER_YEAR, Estimate, two_sided_z
from vitalroll.outcomes.groups import groups_of
from vitalroll.outcomes.tipping import survival_if_the_lost_fared
from vitalroll.register.cohort import DEATHS, Cohort, meaning_code

DELTAS = (0.5, 0.7, 1.0, 1.5, 2.0, 3.0, 4.0, 5.0, 7.0, 10.0)
"""From half the hazard of those who stayed to ten times as much, which few would believe."""

AT_ONE = DELTAS.index(1.0)
RESAMPLES = 200
FEW_LOST = 5


@dataclass(frozen=True)
class TippingRequest:
    """Fields of ``outcomes.tipping``."""

    interest: tuple[str, ...] = DEATHS
    group: str | None = None
    years: Annotated[float, Between(0.01, 150)] = 3.0
    confidence: Confidence = 0.95
    seed: Annotated[int, Between(0, 2**31 - 1)] = 1


def tipping(
    memory: Memory, request: TippingRequest, report: Callable[[str, int, int], None]
) -> dict[str, Any]:
    """Answer ``outcomes.tipping``: survival over how the lost may have fared.

    Returns
    -------
    dict
        ``deltas``; ``groups`` [{level, n, lost, survival (of Estimate, one for each delta)}]; ``against``
        [{level, better, differences (of Estimate, from the first group, for each delta among the lost of the
        better group alone), tips_at (the delta at which what can be said of the difference first changes;
        null when none does it)}]; ``years``; ``resamples``; ``seed``; ``cautions``.
    """
    cohort = memory.cohort()
    groups = groups_of(cohort, request.group)
    day = request.years * DAYS_PER_YEAR
    parts = {level: _part(cohort, request.group, level) for level in groups.tables}
    z = two_sided_z(request.confidence)
    found = {
        level: survival_if_the_lost_fared(part, request.interest, day, DELTAS)
        for level, part in parts.items()
    }
    again = {level: np.empty((RESAMPLES, len(DELTAS))) for level in parts}
    random = np.random.default_rng(request.seed)
    for turn in range(RESAMPLES):
        if turn % 20 == 0:
            report("resampling", turn, RESAMPLES)
        for level, part in parts.items():
            drawn = part.having(random.integers(0, len(part), len(part)))
            again[level][turn] = survival_if_the_lost_fared(drawn, request.interest, day, DELTAS)
    errors = {level: np.nanstd(each, axis=0, ddof=1) for level, each in again.items()}
    first = next(iter(parts))
    against = [_against(level, first, found, errors, z) for level in list(parts)[1:]]
    return {
        "deltas": list(DELTAS),
        "groups": [
            {
                "level": level,
                "n": len(part),
                "lost": int(np.count_nonzero(part.outcome == meaning_code("lost"))),
                "survival": _estimates(
                    found[level],
                    np.clip(found[level] - z * errors[level], 0, 1),
                    np.clip(found[level] + z * errors[level], 0, 1),
                    errors[level],
                ),
            }
            for level, part in parts.items()
        ],
        "against": against,
        "years": request.years,
        "resamples": RESAMPLES,
        "seed": request.seed,
        "cautions": [*groups.cautions, *_cautions(parts)],
    }


def _against(
    level: str | None,
    first: str | None,
    found: dict[str | None, np.ndarray],
    errors: dict[str | None, np.ndarray],
    z: float,
) -> dict[str, Any]:
    """Return how the difference between two groups changes when the lost of the better one fared worse."""
    better = level if found[level][AT_ONE] >= found[first][AT_ONE] else first
    survival, error = (
        [each[name] if name == better else each[name][AT_ONE] for name in (level, first)]
        for each in (found, errors)
    )
    value, spread = survival[0] - survival[1], np.hypot(*error)
    lower, upper = value - z * spread, value + z * spread
    return {
        "level": level,
        "better": better,
        "differences": _estimates(value, lower, upper, spread),
        "tips_at": _tips_at(lower, upper),
    }


def _part(cohort: Cohort, group: str | None, level: str | None) -> Cohort:
    if group is None or level is None:
        return cohort
    covariate = cohort.grouping(group)
    return cohort.having(covariate.codes == covariate.levels.index(level))


def _estimates(value: np.ndarray, lower: np.ndarray, upper: np.ndarray, error: np.ndarray) -> list[Estimate]:
    return [Estimate(*map(float, each)) for each in zip(value, lower, upper, error, strict=True)]


def _tips_at(lower: np.ndarray, upper: np.ndarray) -> float | None:
    """Return the delta, going up from 1, at which what can be said of the difference changes."""
    said = np.where(lower > 0, 1, np.where(upper < 0, -1, 0))
    for position in range(AT_ONE + 1, len(DELTAS)):
        if said[position] != said[AT_ONE]:
            return DELTAS[position]
    return None


def _cautions(parts: dict[str | None, Cohort]) -> list[Caution]:
    lost = sum(int(np.count_nonzero(part.outcome == meaning_code("lost"))) for part in parts.values())
    return [Caution("few_lost", {"lost": lost})] if lost < FEW_LOST else []


TASKS = {"outcomes.tipping": (TippingRequest, tipping)}
