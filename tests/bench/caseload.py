"""How long the projection takes, beside one matrix product of as many multiplications.

Run as ``python tests/bench/caseload.py``. Prints; asserts nothing about time.
"""

from __future__ import annotations

import time
from collections.abc import Callable

import numpy as np

from vitalroll.caseload.courses import redraw
from vitalroll.caseload.inflow import Inflow
from vitalroll.caseload.projection import MONTHS_PER_YEAR, ageing, project
from vitalroll.caseload.retention import Retention
from vitalroll.caseload.scenario import Lever, Scenario
from vitalroll.numbers import Estimate
from vitalroll.outcomes.competing import WAYS_OF_LEAVING

STRETCHES, PATIENTS, CAUSES = 8, 700, 5
LIMIT = 15


def best_of(run: Callable[[], object], times: int = 5) -> float:
    """Return the shortest of a few runs, in seconds."""
    found = []
    for _ in range(times):
        begun = time.perf_counter()
        run()
        found.append(time.perf_counter() - begun)
    return min(found)


def main() -> None:
    """Print seconds and ratios for 5 and 10 years, with and without a scenario."""
    random = np.random.default_rng(1)
    exits = np.zeros((STRETCHES, len(WAYS_OF_LEAVING)), dtype=np.int64)
    exits[:, :CAUSES] = random.integers(1, 15, (STRETCHES, CAUSES))
    hazards = Retention(
        edges=np.arange(STRETCHES + 1.0),
        at_risk=np.zeros(STRETCHES, dtype=np.int64),
        person_years=np.linspace(800, 100, STRETCHES),
        exits=exits,
        beyond_person_years=0.0,
        beyond_exits=0,
    )
    inflow = Inflow((), Estimate(120.0, 100.0, 140.0), 1.0, "poisson", 8, 8.0)
    today = random.integers(0, MONTHS_PER_YEAR * STRETCHES, PATIENTS)
    change = Scenario(
        "", (Lever("fewer_lost", 30, from_month=13, ramp_months=6), Lever("fewer_newcomers", 10))
    )
    slots = ageing(hazards.edges).slots
    print(
        f"{PATIENTS} patients today, {slots} months of stay, {CAUSES} ways of leaving; the limit is {LIMIT}"
    )
    for years, draws in ((5, 1000), (10, 2000)):
        expected = best_of(lambda years=years: project(today, hazards, 120.0, years=years))
        # Every draw, month and month of stay: who stays and who leaves by each way.
        columns = MONTHS_PER_YEAR * years * (1 + CAUSES)
        left, right = random.random((draws, slots)), random.random((slots, columns))
        product = best_of(lambda left=left, right=right: left @ right)
        print(f"{years:2d} years, expected only: {expected:.4f} s")
        for name, scenarios in (("baseline", ()), ("with one scenario", (change,))):
            took = best_of(
                lambda years=years, draws=draws, scenarios=scenarios: redraw(
                    today, hazards, inflow, years=years, scenarios=scenarios, draws=draws
                )
            )
            print(
                f"{years:2d} years, {draws} draws, {name}: {took:.3f} s, "
                f"{took / product:.0f} times one matrix product ({product:.4f} s)"
            )


if __name__ == "__main__":
    main()
