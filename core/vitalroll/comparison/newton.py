"""Climbing to the top of a log-likelihood by Newton's steps, or saying why there is none."""

from __future__ import annotations

from collections.abc import Callable, Sequence
from dataclasses import dataclass

import numpy as np

from vitalroll.comparison.design import Column
from vitalroll.errors import Refusal

MOST_STEPS = 50
MOST_HALVINGS = 30
CLOSE_ENOUGH = 1e-18
"""Newton's decrement at which to stop; convergence is quadratic, so the step after it is below round-off."""

RUNAWAY = 12.0
"""A coefficient this far from zero, per standard deviation, is on its way to infinity."""


@dataclass(frozen=True)
class Maximum[Sums]:
    """The top, and what was found at zero, where every climb begins."""

    coefficients: np.ndarray
    log_likelihood: float
    null_log_likelihood: float
    null_score: np.ndarray
    null_information: np.ndarray
    information: np.ndarray
    sums: Sums
    iterations: int


def maximise[Sums](
    evaluate: Callable[[np.ndarray], tuple[float, Sums]],
    slope_and_curvature: Callable[[Sums], tuple[np.ndarray, np.ndarray]],
    columns: Sequence[Column],
) -> Maximum[Sums]:
    """Climb from zero, halving a step that would go down.

    Parameters
    ----------
    evaluate : function of coefficients
        The log-likelihood, and the sums from which its derivatives are made.
    slope_and_curvature : function of those sums
        The score and the information.
    columns : sequence of Column
        What the coefficients stand for, each in units of one standard deviation.

    Raises
    ------
    Refusal
        ``separation`` (``covariate``, ``level``) when a coefficient runs away; ``no_convergence``.
    """
    coefficients = np.zeros(len(columns))
    value, sums = evaluate(coefficients)
    slope, curvature = slope_and_curvature(sums)
    start = value, slope, curvature
    for iteration in range(1, MOST_STEPS + 1):
        step = _newton_step(curvature, slope, coefficients, columns)
        decrement = float(slope @ step)
        better, coefficients, sums = _climb(evaluate, coefficients, step, value, sums)
        slope, curvature = slope_and_curvature(sums)
        if not np.isfinite(coefficients).all() or np.abs(coefficients).max() > RUNAWAY:
            raise _separation(coefficients, columns)
        # The likelihood is known to about 1e-16 of its size; below that no step can be judged.
        settled = decrement <= max(CLOSE_ENOUGH, 1e-15 * abs(better))
        value = better
        if settled:
            return Maximum(coefficients, value, *start, curvature, sums, iteration)
    raise Refusal("no_convergence", steps=MOST_STEPS)


def _newton_step(
    curvature: np.ndarray, slope: np.ndarray, coefficients: np.ndarray, columns: Sequence[Column]
) -> np.ndarray:
    try:
        return np.linalg.solve(curvature, slope)
    except np.linalg.LinAlgError:
        raise _separation(coefficients, columns) from None


def _climb[Sums](
    evaluate: Callable[[np.ndarray], tuple[float, Sums]],
    here: np.ndarray,
    step: np.ndarray,
    value: float,
    sums: Sums,
) -> tuple[float, np.ndarray, Sums]:
    for _ in range(MOST_HALVINGS):
        there = here + step
        found, found_sums = evaluate(there)
        if np.isfinite(found) and found >= value - 1e-12 * abs(value):
            return found, there, found_sums
        step = step / 2
    return value, here, sums


def _separation(coefficients: np.ndarray, columns: Sequence[Column]) -> Refusal:
    column = columns[int(np.nanargmax(np.abs(np.nan_to_num(coefficients, nan=np.inf, posinf=np.inf))))]
    return Refusal("separation", covariate=column.id, level=column.level)
