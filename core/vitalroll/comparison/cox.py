"""Cox's proportional-hazards regression."""

from __future__ import annotations

from collections.abc import Collection, Iterable, Sequence
from dataclasses import dataclass
from typing import get_args

import numpy as np
from scipy.special import chdtrc, ndtr

from vitalroll.comparison.concordance import concordance
from vitalroll.comparison.design import Choice, Column, LeftOutCovariate, design
from vitalroll.comparison.newton import Maximum, maximise
from vitalroll.comparison.proportional import ProportionalTest, proportional_tests
from vitalroll.comparison.risk_sums import (
    FollowUp,
    RiskSums,
    Ties,
    follow_up,
    information,
    log_likelihood,
    risk_sums,
    score,
)
from vitalroll.comparison.stratified import Chi2Test
from vitalroll.errors import Caution, Refusal
from vitalroll.numbers import Estimate, two_sided_z
from vitalroll.outcomes.limits import check_confidence
from vitalroll.outcomes.risk_table import interest_codes
from vitalroll.register.cohort import Cohort

FEW_PER_PARAMETER = 10
TOO_FEW_PER_PARAMETER = 3
NOT_PROPORTIONAL = 0.05
"""A test of proportional hazards below this says that the ratios change over time."""


@dataclass(frozen=True)
class Term:
    """One coefficient. ``hazard_ratio`` is for the level against the reference, or per ``per``."""

    id: str
    level: str | None
    reference: str | None
    per: float | None
    n: int
    coefficient: float
    standard_error: float
    z: float
    p: float
    hazard_ratio: Estimate


@dataclass(frozen=True)
class CoxFit:
    """A fitted model.

    ``log_likelihood`` is without covariates and fitted. ``tests`` has likelihood_ratio, wald and
    score. ``proportional`` has one test for each term. ``incomplete`` counts patients left out
    because a covariate is missing.
    """

    n: int
    events: int
    parameters: int
    incomplete: int
    ties: Ties
    terms: tuple[Term, ...]
    tests: dict[str, Chi2Test]
    log_likelihood: tuple[float, float]
    concordance: Estimate
    proportional: tuple[ProportionalTest, ...]
    proportional_global: Chi2Test
    iterations: int
    left_out: tuple[LeftOutCovariate, ...]
    cautions: tuple[Caution, ...]


def cox(
    cohort: Cohort,
    interest: Collection[str],
    choices: Sequence[Choice],
    *,
    ties: Ties = "efron",
    confidence: float = 0.95,
) -> CoxFit:
    """Fit hazards that differ by constant ratios between patients with different covariates.

    Parameters
    ----------
    cohort : Cohort
    interest : names from MEANINGS
        The outcomes that count; every other way of leaving censors (a cause-specific hazard).
    choices : sequence of Choice
    ties : str
        ``efron`` or ``breslow``.
    confidence : float

    Raises
    ------
    Refusal
        Those of ``design``; ``no_events_to_compare``; ``too_few_events`` (``events``, ``parameters``) under
        3 for each parameter; ``level_without_events`` (``covariate``, ``level``) and ``separation`` when
        the data hold no finite hazard ratio; ``no_convergence``.

    Cautions
    --------
    ``few_events`` (``events``, ``parameters``) under 10 for each parameter; ``not_proportional`` (``p``);
    ``covariate_missing`` (``n``).

    References
    ----------
    Cox (1972) JRSS B 34:187-220; Efron (1977) JASA 72:557-565; Breslow (1974) Biometrics 30:89-99;
    Peduzzi and others (1995) J Clin Epidemiol 48:1503-1510, relaxed by Vittinghoff & McCulloch (2007).
    """
    check_confidence(confidence)
    if ties not in get_args(Ties):
        raise Refusal("not_one_of", field="ties", given=ties, choices=list(get_args(Ties)))
    event_of_all = np.isin(cohort.outcome, interest_codes(interest))
    # Delayed entry on the day of leaving is no time at risk.
    usable = ~((cohort.entry > 0) & (cohort.entry == cohort.exit))
    plan = design(cohort, choices, usable)
    order = np.argsort(cohort.exit[plan.complete])
    entry, exit, event = (each[plan.complete][order] for each in (cohort.entry, cohort.exit, event_of_all))
    values = plan.values[order]
    events = int(event.sum())
    parameters = len(plan.columns)
    check_events(plan.columns, values, event, parameters)
    scale = values.std(axis=0)
    x = ((values - values.mean(axis=0)) / scale).T
    data = follow_up(entry, exit, event, x, ties)
    fit = _maximise(data, plan.columns)
    covariance = np.linalg.inv(fit.information)
    proportional, whole = proportional_tests(data, fit.sums, fit.information, plan.columns)
    # Equal covariates must give equal risks, whatever the rounding of the product.
    risk = np.round(fit.coefficients @ x, 12)
    incomplete = int(np.count_nonzero(usable & ~plan.complete))
    return CoxFit(
        n=len(event),
        events=events,
        parameters=parameters,
        incomplete=incomplete,
        ties=ties,
        terms=tuple(
            fitted_term(
                column,
                fit.coefficients[i] / scale[i],
                float(np.sqrt(covariance[i, i])) / scale[i],
                confidence,
            )
            for i, column in enumerate(plan.columns)
        ),
        tests=_tests(fit, parameters),
        log_likelihood=(fit.null_log_likelihood, fit.log_likelihood),
        concordance=concordance(entry, exit, event, risk, confidence=confidence),
        proportional=proportional,
        proportional_global=whole,
        iterations=fit.iterations,
        left_out=plan.left_out,
        cautions=tuple(_cautions(events, parameters, whole, incomplete)),
    )


def _cautions(events: int, parameters: int, whole: Chi2Test, incomplete: int) -> Iterable[Caution]:
    if events < FEW_PER_PARAMETER * parameters:
        yield Caution("few_events", {"events": events, "parameters": parameters})
    if whole.p < NOT_PROPORTIONAL:
        yield Caution("not_proportional", {"p": whole.p})
    if incomplete:
        yield Caution("covariate_missing", {"n": incomplete})


def check_events(columns: tuple[Column, ...], values: np.ndarray, event: np.ndarray, parameters: int) -> None:
    """Refuse what has too few outcomes, or a category without any, by the name of the column."""
    events = int(event.sum())
    if events == 0:
        raise Refusal("no_events_to_compare")
    for column, inside in zip(columns, values.T, strict=True):
        if column.level is not None and not event[inside > 0].any():
            raise Refusal("level_without_events", covariate=column.id, level=column.level)
    for name in {column.id for column in columns if column.level is not None}:
        mine = [i for i, column in enumerate(columns) if column.id == name]
        in_reference = ~values[:, mine].any(axis=1)
        if in_reference.any() and not event[in_reference].any():
            raise Refusal("level_without_events", covariate=name, level=columns[mine[0]].reference)
    if events < TOO_FEW_PER_PARAMETER * parameters:
        raise Refusal("too_few_events", events=events, parameters=parameters)


def _maximise(data: FollowUp, columns: tuple[Column, ...]) -> Maximum[RiskSums]:
    def evaluate(coefficients: np.ndarray) -> tuple[float, RiskSums]:
        eta = coefficients @ data.x[1:]
        shift = float(eta.max())
        sums = risk_sums(data, np.exp(eta - shift))
        return log_likelihood(data, eta, sums, shift), sums

    return maximise(evaluate, lambda sums: (score(data, sums), information(data, sums)), columns)


def fitted_term(column: Column, coefficient: float, error: float, confidence: float) -> Term:
    """Return a coefficient with its test and its ratio."""
    z = coefficient / error
    margin = two_sided_z(confidence) * error
    ratio = Estimate(
        float(np.exp(coefficient)),
        float(np.exp(coefficient - margin)),
        float(np.exp(coefficient + margin)),
        error,
    )
    return Term(
        id=column.id,
        level=column.level,
        reference=column.reference,
        per=column.per,
        n=column.n,
        coefficient=float(coefficient),
        standard_error=error,
        z=float(z),
        p=float(2 * ndtr(-abs(z))),
        hazard_ratio=ratio,
    )


def _tests(fit: Maximum[RiskSums], parameters: int) -> dict[str, Chi2Test]:
    statistics = {
        "likelihood_ratio": 2 * (fit.log_likelihood - fit.null_log_likelihood),
        "wald": float(fit.coefficients @ fit.information @ fit.coefficients),
        "score": float(fit.null_score @ np.linalg.solve(fit.null_information, fit.null_score)),
    }
    return {
        name: Chi2Test(statistic, parameters, float(chdtrc(parameters, statistic)))
        for name, statistic in statistics.items()
    }
