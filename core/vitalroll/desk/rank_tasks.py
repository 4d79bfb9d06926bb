"""Whether groups differ more than by chance: the task behind the rank tests of the Compare place."""

from __future__ import annotations

import dataclasses
from dataclasses import dataclass
from typing import Annotated, Any

import numpy as np

from vitalroll.comparison.crossing import crossings
from vitalroll.comparison.ordered import trend_test
from vitalroll.comparison.pairwise import pairwise
from vitalroll.comparison.rank_tests import Weight, rank_test
from vitalroll.desk.comparison_tasks import (
    NOT_SAID,
    GroupTiming,
    compared,
    few_events,
    named_tables,
    timing_cautions,
)
from vitalroll.desk.fields import Between
from vitalroll.desk.memory import Memory
from vitalroll.errors import Caution, Refusal
from vitalroll.outcomes.groups import groups_of
from vitalroll.outcomes.risk_table import RiskTable, risk_tables_by
from vitalroll.register.cohort import DEATHS, Cohort

Power = Annotated[float, Between(0, 5)]
Score = Annotated[float, Between(-1e9, 1e9)]


@dataclass(frozen=True)
class RankTestRequest:
    """Fields of ``compare.rank_test``.

    ``rho`` and ``gamma`` are of Fleming and Harrington's weight; ``stratify``, a categorical covariate
    within whose levels groups are compared; ``scores``, for groups with an order, a number for every group
    that is compared.
    """

    group: str
    interest: tuple[str, ...] = DEATHS
    weight: Weight = "log_rank"
    rho: Power = 1.0
    gamma: Power = 0.0
    stratify: str | None = None
    scores: dict[str, Score] | None = None
    timing: GroupTiming = NOT_SAID


def rank_tests(memory: Memory, request: RankTestRequest, report: Any) -> dict[str, Any]:
    """Answer ``compare.rank_test``: a rank test over all groups of a covariate.

    Returns
    -------
    dict
        ``weight``, ``groups``, ``chi_squared``, ``df``, ``p`` as in ``rank_tests.RankTest``;
        ``unstratified``, the same test without strata
        {chi_squared, p}, or null when there are none; ``trend`` (an
        ``ordered.Trend``) or null; ``pairs`` (of ``pairwise.Pair``), empty with two groups; ``left_out``;
        ``cautions``.
    """
    cohort = compared(memory, request.timing)
    groups = groups_of(cohort, request.group)
    tables = named_tables(groups)
    options = {"weight": request.weight, "rho": request.rho, "gamma": request.gamma}
    strata, cautions = [tables], []
    if request.stratify is not None:
        strata, cautions = _strata(cohort, request, list(tables))
    result = rank_test(strata, request.interest, **options)
    unstratified = None
    if request.stratify is not None:
        crude = rank_test([tables], request.interest, **options)
        unstratified = {"chi_squared": crude.chi_squared, "p": crude.p}
    return {
        **{field.name: getattr(result, field.name) for field in dataclasses.fields(result)},
        "unstratified": unstratified,
        "trend": _trend(strata, request, options),
        "pairs": pairwise(strata, request.interest, **options) if len(tables) > 2 else (),
        "left_out": groups.left_out,
        "cautions": [
            *timing_cautions(request.timing),
            *groups.cautions,
            *cautions,
            *few_events(tables, request.interest),
            *crossings(tables, request.interest),
        ],
    }


def _strata(
    cohort: Cohort, request: RankTestRequest, levels: list[str]
) -> tuple[list[dict[str, RiskTable]], list[Caution]]:
    """Return the risk tables of the groups in each stratum, and what has to be said of the strata."""
    if request.stratify == request.group:
        raise Refusal("stratified_by_itself", field="stratify", covariate=request.group)
    covariate = cohort.grouping(request.stratify)
    strata, silent = [], []
    for code, level in enumerate(covariate.levels):
        inside = covariate.codes == code
        if not inside.any():
            continue
        by = risk_tables_by(cohort.having(inside), request.group)
        tables = {name: by[name] for name in levels}
        strata.append(tables)
        filled = sum(table.n > 0 for table in tables.values())
        if filled < 2 or not any(table.events(request.interest).any() for table in tables.values()):
            silent.append(level)
    missing = int(np.count_nonzero(covariate.codes < 0))
    cautions = []
    if missing:
        cautions.append(Caution("stratum_not_recorded", {"n": missing}))
    if silent:
        cautions.append(Caution("strata_say_nothing", {"n": len(silent), "strata": ", ".join(silent)}))
    return strata, cautions


def _trend(strata: list[dict[str, RiskTable]], request: RankTestRequest, options: dict[str, Any]) -> Any:
    if request.scores is None:
        return None
    for level in strata[0]:
        if level not in request.scores:
            raise Refusal("score_missing", field="scores", level=level)
    return trend_test(strata, request.interest, request.scores, **options)


TASKS = {"compare.rank_test": (RankTestRequest, rank_tests)}
