"""What the losses could change: the task behind that part of the Outcomes place."""

from __future__ import annotations

from collections.abc import Callable
from dataclasses import dataclass
from typing import Annotated, Any

import numpy as np

from vitalroll.desk.fields import Between
from vitalroll.desk.memory import Memory
from vitalroll.desk.outcome_tasks import Confidence
from vitalroll.errors import Caution, Refusal
from vitalroll.numbers import DAYS_PER_YEAR, Estimate, two_sided_z
from vitalroll.outcomes.groups import groups_of
from vitalroll.outcomes.product_limit import product_limit
from vitalroll.outcomes.risk_table import risk_table
from vitalroll.outcomes.tipping import survival_if_the_lost_fared
from vitalroll.register.cohort import DEATHS, Cohort, meaning_code

DELTAS = (0.5, 0.7, 1.0, 1.5, 2.0, 3.0, 4.0, 5.0, 7.0, 10.0)
"""From half the hazard of those who stayed to ten times as much, which few would believe."""

AT_ONE = DELTAS.index(1.0)
RESAMPLES = 200
FEWEST_EVENTS = 5
"""With fewer outcomes by the time asked for, resampling the patients says too little of the uncertainty."""


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

    Raises
    ------
    Refusal
        ``lost_is_the_outcome``; ``too_few_to_tip`` (``years``, ``least``) when no group can be answered.

    Cautions
    --------
    ``left_out_of_tipping`` (``level``, ``least``): a group whose curve does not go from the start to the time
    asked for, or with fewer outcomes by then.
    """
    cohort = memory.cohort()
    groups = groups_of(cohort, request.group)
    day = request.years * DAYS_PER_YEAR
    whole = {level: _part(cohort, request.group, level) for level in groups.tables}
    if "lost" in request.interest:
        raise Refusal("lost_is_the_outcome", field="interest")
    parts = {level: part for level, part in whole.items() if _can_be_answered(part, request.interest, day)}
    if not parts:
        raise Refusal("too_few_to_tip", field="years", years=request.years, least=FEWEST_EVENTS)
    unsaid = [
        Caution("left_out_of_tipping", {"level": level, "least": FEWEST_EVENTS})
        for level in whole
        if level not in parts
    ]
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
        "cautions": [*groups.cautions, *unsaid],
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
    """Return the delta, going up from 1, at which what can be said of the difference changes.

    Between two deltas the limit that passes 0 is taken as straight over the logarithm of delta.
    """
    said = np.where(lower > 0, 1, np.where(upper < 0, -1, 0))
    for position in range(AT_ONE + 1, len(DELTAS)):
        before, now = said[position - 1], said[position]
        if now == said[AT_ONE]:
            continue
        limit = lower if 1 in (before, now) else upper
        share = limit[position - 1] / (limit[position - 1] - limit[position])
        begins, ends = np.log(DELTAS[position - 1]), np.log(DELTAS[position])
        return float(np.exp(begins + share * (ends - begins)))
    return None


def _can_be_answered(part: Cohort, interest: tuple[str, ...], day: float) -> bool:
    """Tell whether a group has a curve from the start to the day, and outcomes enough to resample."""
    table = risk_table(part)
    span = product_limit(table, interest).span
    events = int(table.events(interest)[table.time <= day].sum())
    return span.begins == 0 and not span.restarts and span.speaks_of(day) and events >= FEWEST_EVENTS


TASKS = {"outcomes.tipping": (TippingRequest, tipping)}
