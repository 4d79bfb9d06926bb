"""Speed of the comparison room as ratios within one run: ``.venv/bin/python tests/bench/comparison.py``."""

from __future__ import annotations

import sys
import time
import warnings
from pathlib import Path

import numpy as np

sys.path.insert(0, str(Path(__file__).parents[2] / "core"))

import pandas as pd
from lifelines import CoxPHFitter

from vitalroll.comparison.cox import cox
from vitalroll.comparison.design import Choice
from vitalroll.comparison.rank_tests import rank_test
from vitalroll.outcomes.risk_table import count_risk
from vitalroll.register.cohort import Cohort, Numeric

DIED = ("died_of_disease",)
ROUNDS = 5


def fastest(work) -> float:
    """Return the least time of a few rounds: what the work costs when nothing else disturbs it."""
    times = []
    for _ in range(ROUNDS):
        begun = time.perf_counter()
        work()
        times.append(time.perf_counter() - begun)
    return min(times)


def cox_against_lifelines() -> None:
    """Cox, Efron, 100,000 x 10, tests, concordance and proportional hazards included; lifelines' fit alone."""
    random = np.random.default_rng(1)
    n, p = 100_000, 10
    x = random.normal(size=(n, p))
    exit = random.exponential(1000 * np.exp(-x @ np.full(p, 0.2))).astype(int) + 1
    closed = random.integers(1, 3000, n)
    event, exit = exit <= closed, np.minimum(exit, closed)
    names = [f"x{i}" for i in range(p)]
    cohort = Cohort(
        entry=np.zeros(n, dtype=int), exit=exit, outcome=event.astype(int), start=np.full(n, 730_000), line=np.arange(n),
        closing=740_000, covariates={name: Numeric(None, x[:, i]) for i, name in enumerate(names)},
    )  # fmt: skip
    frame = pd.DataFrame(x, columns=names).assign(exit=exit, event=event)
    ours = fastest(lambda: cox(cohort, DIED, [Choice(name) for name in names]))
    theirs = fastest(lambda: CoxPHFitter().fit(frame, "exit", "event"))
    print(
        f"Cox, Efron, {n:,} x {p}: {ours:.3f} s, {ours / theirs:.2f} of lifelines ({theirs:.3f} s); limit 0.40"
    )


def log_rank_against_one_sort() -> None:
    """Log-rank of 1,000,000 rows in two groups, from arrays, against one argsort of a million numbers."""
    random = np.random.default_rng(2)
    n = 1_000_000
    exit = random.integers(1, 4000, n)
    outcome = random.integers(0, 2, n)
    group = random.integers(0, 2, n).astype(bool)
    entry = np.zeros(n, dtype=np.int64)

    def test() -> None:
        tables = {
            str(level): count_risk(entry[inside], exit[inside], outcome[inside])
            for level, inside in (("a", group), ("b", ~group))
        }
        rank_test([tables], DIED)

    ours, sort = fastest(test), fastest(lambda: np.argsort(random.random(n)))
    print(f"log-rank, {n:,} rows: {ours:.3f} s, {ours / sort:.2f} of one argsort ({sort:.3f} s); limit 4")


if __name__ == "__main__":
    warnings.simplefilter("ignore")
    cox_against_lifelines()
    log_rank_against_one_sort()
