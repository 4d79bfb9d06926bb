"""Small cohorts for the comparison tests."""

from __future__ import annotations

import numpy as np

from vitalroll.register.cohort import MEANINGS, Categorical, Cohort, Numeric

DIED = ("died_of_disease",)
_CODE = {"event": MEANINGS.index("died_of_disease"), "censored": MEANINGS.index("under_care")}


def cohort(exit, event, covariates, entry=None) -> Cohort:
    """Make a cohort from days, truth values and covariates (arrays of numbers, or lists of names)."""
    exit = np.asarray(exit)
    n = len(exit)
    return Cohort(
        entry=np.zeros(n, dtype=int) if entry is None else entry,
        exit=exit,
        outcome=np.where(np.asarray(event, dtype=bool), _CODE["event"], _CODE["censored"]),
        start=np.full(n, 730_000),
        line=np.arange(n) + 2,
        closing=740_000,
        covariates={name: covariate(values) for name, values in covariates.items()},
    )


def covariate(values) -> Categorical | Numeric:
    """Numbers become numeric; names become levels in alphabetical order, None is not recorded."""
    if isinstance(values, np.ndarray):
        return Numeric(None, values.astype(float))
    levels = tuple(sorted({value for value in values if value is not None}))
    return Categorical(None, levels, np.array([levels.index(v) if v is not None else -1 for v in values]))


def random_cohort(seed: int, n: int, *, late: bool = False, days: int = 60, columns: int = 2) -> Cohort:
    """Follow-up with many ties; with ``late``, about half come under observation late."""
    random = np.random.default_rng(seed)
    x = random.normal(size=(n, columns))
    exit = np.minimum(random.exponential(days / 3 * np.exp(-0.4 * x[:, 0])).astype(int) + 1, days)
    event = random.random(n) < 0.7
    entry = np.where(random.random(n) < 0.5, random.integers(0, exit), 0) if late else None
    covariates = {f"x{i}": x[:, i] for i in range(columns)}
    covariates["group"] = list(np.where(x[:, 0] + random.normal(size=n) > 0, "b", "a"))
    return cohort(exit, event, covariates, entry)
