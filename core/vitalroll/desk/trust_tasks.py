"""How far the projection can be trusted: against what happened, and where its bands come from."""

from __future__ import annotations

import datetime
from dataclasses import dataclass
from typing import Annotated, Any

import numpy as np

from vitalroll.caseload.hindcast import LEVELS, BackTest, back_test, back_tests, parts_of_the_band
from vitalroll.desk.coming_years import Setting, begin, months_after, years_ahead
from vitalroll.desk.fields import Between
from vitalroll.desk.memory import Memory
from vitalroll.errors import Caution

_MOST_YEARS_BACK = 10


@dataclass(frozen=True)
class BackTestRequest:
    """Fields of ``caseload.back_test``; with ``damping`` the trend of the newcomers is carried on."""

    back_years: Annotated[int, Between(1, _MOST_YEARS_BACK)] = 3
    damping: Annotated[float, Between(0, 1)] | None = None
    draws: Annotated[int, Between(100, 20_000)] = 1000
    seed: Annotated[int, Between(0, 2**53)] = 1


@dataclass(frozen=True)
class PartsRequest(Setting):
    """Fields of ``caseload.parts``: those of every projection."""


def look_back(memory: Memory, request: BackTestRequest, report: Any) -> dict[str, Any]:
    """Answer ``caseload.back_test``: what would have been projected, and what happened.

    Bands as in ``caseload.project``, with p50 too.

    Returns
    -------
    dict
        ``origin``, ``closing_date``: ISO days; ``back_years``; ``trend``: whether it was
        carried on; ``path`` [{month, ends, band, seen}]
        from the origin on; ``newcomers``, ``leaving`` {band, seen} in all; ``months_held`` {p50,
        p80, p95}: share of the months whose band held what was seen; ``tests`` [{years, origin, band,
        seen, held {p50, p80, p95}}]: the number at the closing as it would have been projected one
        year before, two years before and so on, as far as history allows; ``tests_held`` {p50, p80,
        p95}: how many of them held; ``cautions``.

    Refusals: ``no_register``; ``back_test_history_too_short`` (back_years; whole_years, needed);
    ``nobody_under_care``; ``no_person_time``.

    Cautions: ``back_test_hindsight``; ``few_back_tests`` (count): with fewer than five, how often
    bands held says little; the tests share their data in any case.
    """
    cohort = memory.cohort()
    chosen = back_test(
        cohort, request.back_years, damping=request.damping, draws=request.draws, seed=request.seed
    )
    tests = back_tests(
        cohort,
        most_years=_MOST_YEARS_BACK,
        damping=request.damping,
        draws=request.draws,
        seed=request.seed,
        report=report,
    )
    cautions = [Caution("back_test_hindsight")]
    if len(tests) < 5:
        cautions.append(Caution("few_back_tests", {"count": len(tests)}))
    return {
        "origin": _day(chosen.origin),
        "closing_date": _day(cohort.closing),
        "back_years": chosen.years,
        "trend": request.damping is not None,
        "path": [
            {"month": month, "ends": months_after(chosen.origin, month), "band": band, "seen": seen}
            for month, (band, seen) in enumerate(zip(chosen.under_care, chosen.seen.tolist(), strict=True))
        ],
        "newcomers": {"band": chosen.newcomers, "seen": chosen.seen_newcomers},
        "leaving": {"band": chosen.leaving, "seen": chosen.seen_leaving},
        "months_held": _months_held(chosen),
        "tests": [
            {
                "years": test.years,
                "origin": _day(test.origin),
                "band": test.under_care[-1],
                "seen": test.seen[-1],
                "held": {f"p{level}": held for level, held in test.held.items()},
            }
            for test in tests
        ],
        "tests_held": {f"p{level}": sum(test.held[level] for test in tests) for level in LEVELS},
        "cautions": cautions,
    }


def parts(memory: Memory, request: PartsRequest, report: Any) -> dict[str, Any]:
    """Answer ``caseload.parts``: how much of the band comes from inflow, leaving and chance.

    Returns
    -------
    dict
        ``years`` [{year, ends, inflow, leaving, chance}]: shares of the variance of the number
        under care that each source makes by itself, adding up to 1; ``cautions``.

    Refusals and cautions: those of ``coming_years.begin``.
    """
    start = begin(memory, request)
    found = parts_of_the_band(
        start.today,
        start.hazards,
        start.inflow,
        years=request.years,
        times_today=start.times_today,
        draws=request.draws,
        seed=request.seed,
        report=report,
    )
    total = np.maximum(sum(found.values()), 1e-300)
    return {
        "years": [
            year | {source: variance[i] / total[i] for source, variance in found.items()}
            for i, year in enumerate(years_ahead(start.closing, request.years))
        ],
        "cautions": list(start.cautions),
    }


def _months_held(test: BackTest) -> dict[str, float]:
    held = {}
    for level in LEVELS:
        limits = np.array([getattr(band, f"p{level}") for band in test.under_care[1:]])
        seen = test.seen[1:]
        held[f"p{level}"] = float(np.mean((limits[:, 0] <= seen) & (seen <= limits[:, 1])))
    return held


def _day(ordinal: int) -> str:
    return datetime.date.fromordinal(ordinal).isoformat()


TASKS = {
    "caseload.back_test": (BackTestRequest, look_back),
    "caseload.parts": (PartsRequest, parts),
}
