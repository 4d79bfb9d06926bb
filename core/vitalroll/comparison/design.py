"""From chosen covariates to the columns of a regression, with what could not be used named."""

from __future__ import annotations

from collections.abc import Sequence
from dataclasses import dataclass

import numpy as np

from vitalroll.errors import Refusal
from vitalroll.register.cohort import Categorical, Cohort

MOST_LEVELS = 20

_SAME = 1e-10
"""A column whose variation is below this share of its size is constant; one that others explain but
for this share of its squared length repeats them."""


@dataclass(frozen=True)
class Choice:
    """A covariate to take into account.

    ``reference`` is the level that the others are compared with (None: the one with most patients);
    ``per`` is how much of a number one coefficient stands for.
    """

    id: str
    reference: str | None = None
    per: float = 1.0


@dataclass(frozen=True)
class Column:
    """One column of the design: a level against the reference, or a number per so much.

    ``n`` counts the patients of the level, or all for a number.
    """

    id: str
    level: str | None
    reference: str | None
    per: float | None
    n: int


@dataclass(frozen=True)
class LeftOutCovariate:
    """A covariate or a level of it, left out because ``constant``, ``repeats_others`` or ``empty_level``."""

    id: str
    level: str | None
    code: str


@dataclass(frozen=True)
class Design:
    """The columns, their values (patients, columns), which patients are complete, and what was left out."""

    columns: tuple[Column, ...]
    values: np.ndarray
    complete: np.ndarray
    left_out: tuple[LeftOutCovariate, ...]


def design(cohort: Cohort, choices: Sequence[Choice], usable: np.ndarray) -> Design:
    """Make the columns of a regression from a cohort's covariates.

    Parameters
    ----------
    cohort : Cohort of n patients
    choices : sequence of Choice
    usable : bool array, shape (n,)
        Patients who can take part; of these, those with every covariate recorded are kept.

    Raises
    ------
    Refusal
        ``no_covariates``, ``covariate_twice``, ``too_many_groups``, ``unknown_level`` (a reference
        that the covariate does not have), ``per_not_positive``, ``nobody_complete``,
        ``nothing_varies`` when no column is left.
    """
    if not choices:
        raise Refusal("no_covariates", field="covariates")
    seen = [choice.id for choice in choices]
    for position, name in enumerate(seen):
        if name in seen[:position]:
            raise Refusal("covariate_twice", field=f"covariates.{position}.id", covariate=name)
    complete = usable.copy()
    for choice in choices:
        covariate = cohort.covariate(choice.id)
        recorded = covariate.codes >= 0 if isinstance(covariate, Categorical) else ~np.isnan(covariate.values)
        complete &= recorded
    if not complete.any():
        raise Refusal("nobody_complete", field="covariates")
    made = [
        each
        for position, choice in enumerate(choices)
        for each in _columns(cohort, choice, complete, position)
    ]
    columns, values, left_out = _useful(made)
    if not columns:
        raise Refusal("nothing_varies", field="covariates", covariate=choices[0].id)
    return Design(columns, values, complete, left_out)


def _columns(
    cohort: Cohort, choice: Choice, complete: np.ndarray, position: int
) -> list[tuple[Column, np.ndarray]]:
    covariate = cohort.covariate(choice.id)
    if not isinstance(covariate, Categorical):
        if not choice.per > 0:
            raise Refusal("per_not_positive", field=f"covariates.{position}.per", covariate=choice.id)
        data = covariate.values[complete] / choice.per
        return [(Column(choice.id, None, None, choice.per, len(data)), data)]
    if len(covariate.levels) > MOST_LEVELS:
        raise Refusal(
            "too_many_groups",
            field=f"covariates.{position}.id",
            covariate=choice.id,
            groups=len(covariate.levels),
            most=MOST_LEVELS,
        )
    codes = covariate.codes[complete]
    counts = np.bincount(codes, minlength=len(covariate.levels))
    reference = choice.reference if choice.reference is not None else covariate.levels[int(counts.argmax())]
    if reference not in covariate.levels:
        raise Refusal(
            "unknown_level", field=f"covariates.{position}.reference", covariate=choice.id, level=reference
        )
    if counts[covariate.levels.index(reference)] == 0:
        raise Refusal(
            "reference_is_empty",
            field=f"covariates.{position}.reference",
            covariate=choice.id,
            level=reference,
        )
    return [
        (Column(choice.id, level, reference, None, int(counts[code])), (codes == code).astype(float))
        for code, level in enumerate(covariate.levels)
        if level != reference
    ]


def _useful(
    made: list[tuple[Column, np.ndarray]],
) -> tuple[tuple[Column, ...], np.ndarray, tuple[LeftOutCovariate, ...]]:
    """Keep the columns that vary and are not explained by the kept ones before them.

    All inner products are taken at once; each column then loses what the kept ones explain of it,
    as in a Cholesky factorisation that skips what has nothing left.
    """
    values = np.column_stack([data for _, data in made])
    centred = values - values.mean(axis=0)
    product = centred.T @ centred
    length = np.sqrt(np.diag(product))
    size = np.maximum(values.max(axis=0), -values.min(axis=0)) * np.sqrt(len(values))
    varies = length > _SAME * size
    unit = np.where(varies, length, 1)
    product = product / np.outer(unit, unit)
    kept: list[int] = []
    left_out = []
    for i, (column, _) in enumerate(made):
        reason = None
        if column.level is not None and column.n == 0:
            reason = "empty_level"
        elif not varies[i]:
            reason = "constant"
        elif kept and _left_over(product, kept, i) <= _SAME:
            reason = "repeats_others"
        if reason:
            left_out.append(LeftOutCovariate(column.id, column.level, reason))
        else:
            kept.append(i)
    return tuple(made[i][0] for i in kept), values[:, kept], tuple(left_out)


def _left_over(product: np.ndarray, kept: list[int], i: int) -> float:
    """Return the share of a unit column's squared length that the kept ones do not explain."""
    across = product[i, kept]
    return float(product[i, i] - across @ np.linalg.solve(product[np.ix_(kept, kept)], across))
