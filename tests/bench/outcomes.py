"""How long outcomes take, beside one argsort of as many numbers.

Run as ``python tests/bench/outcomes.py``. Prints; asserts nothing about time. The argsort is what
any method must pay that first puts the patients in order of time.
"""

from __future__ import annotations

import dataclasses
import json
import sys
import time
from collections.abc import Callable
from pathlib import Path

import numpy as np

sys.path.insert(0, str(Path(__file__).parents[2] / "core"))

from vitalroll.desk.door import Desk
from vitalroll.outcomes.competing import leaving
from vitalroll.outcomes.lexis import ages, calendar_years, split, years_since_start
from vitalroll.outcomes.product_limit import product_limit
from vitalroll.outcomes.risk_table import count_risk
from vitalroll.register.cohort import DEATHS, MEANINGS, Categorical, Cohort, Numeric


def best_of(run: Callable[[], object], times: int = 5) -> float:
    """Return the shortest of a few runs, in seconds."""
    found = []
    for _ in range(times):
        begun = time.perf_counter()
        run()
        found.append(time.perf_counter() - begun)
    return min(found)


def cohort_of(n: int) -> Cohort:
    """Return n invented patients over ten years, a tenth of them with delayed entry, in 20 groups."""
    random = np.random.default_rng(1)
    start = 730_000 + random.integers(0, 3650, n)
    to_closing = 730_000 + 3700 - start
    exit = np.minimum(random.exponential(3000, n).astype(int) + 1, to_closing)
    return Cohort(
        entry=np.where(random.random(n) < 0.1, exit // 2, 0),
        exit=exit,
        outcome=np.where(exit == to_closing, 0, random.integers(1, len(MEANINGS), n)),
        start=start,
        line=np.arange(n) + 2,
        closing=730_000 + 3700,
        covariates={
            "c0": Categorical("Group", tuple(f"group {i}" for i in range(20)), random.integers(0, 20, n))
        },
    )


def print_splitting() -> None:
    """Print what cutting 200,000 patients by calendar year, age and duration costs, beside repeat and bincount."""
    cohort = cohort_of(200_000)
    age = np.random.default_rng(3).uniform(5, 60, len(cohort))
    cohort = dataclasses.replace(cohort, covariates={"age": Numeric(None, age)})
    scales = [
        calendar_years(cohort)[0],
        ages(cohort, range(0, 90, 5)),
        years_since_start(cohort, np.arange(0, 15, 0.5)),
    ]
    pieces = split(cohort, scales)
    many = np.bincount(pieces.patient, minlength=len(cohort))
    took = best_of(lambda: split(cohort, scales), times=3)
    bare = best_of(lambda: np.bincount(np.repeat(np.arange(len(cohort)), many), weights=pieces.days), times=3)
    per = 5e6 / len(pieces.days)
    print(
        f"splitting into {len(pieces.days):,} pieces: {took:.3f} s ({took * per:.2f} s for 5 million; limit 2), "
        f"{took / bare:.1f} of numpy's repeat and bincount of that size"
    )


def main() -> None:
    """Print seconds and ratios for a million rows, and the desk's answers for 50,000."""
    n = 1_000_000
    cohort = cohort_of(n)
    numbers = np.random.default_rng(2).permutation(n)
    argsort = best_of(lambda: np.argsort(numbers))
    print(f"np.argsort of {n:,} integers: {argsort:.4f} s")

    def count():
        return count_risk(cohort.entry, cohort.exit, cohort.outcome)

    for name, run in (
        ("risk table", count),
        ("product limit with limits, from arrays", lambda: product_limit(count(), DEATHS)),
        ("every way of leaving with limits, from arrays", lambda: leaving(count())),
    ):
        took = best_of(run)
        print(f"{name}: {took:.4f} s, {took / argsort:.2f} of the argsort")

    print_splitting()
    desk = Desk()
    desk._memory.built = cohort_of(50_000)
    print("50,000 rows through the desk:")
    for task in ("survival", "life_table", "leaving"):
        for group in (None, "c0"):

            def ask(task: str = task, group: str | None = group) -> dict:
                return desk.answer(f"outcomes.{task}", {"group": group})

            took = best_of(ask, times=3)
            size = len(json.dumps(ask())) / 1e6
            print(f"  outcomes.{task}, {20 if group else 1:2d} curves: {took:.3f} s, {size:.2f} MB as JSON")


if __name__ == "__main__":
    main()
