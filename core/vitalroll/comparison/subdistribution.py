"""Regression of the chance of one outcome when others come first and rule it out (Fine & Gray)."""

from __future__ import annotations

from collections.abc import Callable, Collection, Sequence
from dataclasses import dataclass

import numpy as np

from vitalroll.comparison.cox import FEW_PER_PARAMETER, Term, check_events, fitted_term
from vitalroll.comparison.design import Choice, LeftOutCovariate, design
from vitalroll.comparison.newton import maximise
from vitalroll.comparison.risk_sums import from_day_on, segment_sums
from vitalroll.errors import Caution, Refusal
from vitalroll.outcomes.limits import check_confidence
from vitalroll.outcomes.risk_table import interest_codes
from vitalroll.register.cohort import Cohort


@dataclass(frozen=True)
class SubdistributionFit:
    """A fitted model; ``hazard_ratio`` of each term is one of subdistribution hazards.

    ``events`` counts outcomes of interest, ``competing`` those that came first instead, ``incomplete``
    patients left out because a covariate is missing.
    """

    n: int
    events: int
    competing: int
    incomplete: int
    terms: tuple[Term, ...]
    log_likelihood: tuple[float, float]
    iterations: int
    left_out: tuple[LeftOutCovariate, ...]
    cautions: tuple[Caution, ...]


def fine_gray(
    cohort: Cohort,
    interest: Collection[str],
    competing: Collection[str],
    choices: Sequence[Choice],
    *,
    confidence: float = 0.95,
) -> SubdistributionFit:
    """Fit cumulative incidences that differ by constant ratios of subdistribution hazards.

    Whoever left in a competing way stays among those at risk, with the weight of not having been
    censored yet (and, with delayed entry, of having come under observation by then).

    Parameters
    ----------
    cohort : Cohort
    interest, competing : names from MEANINGS
        The outcome of interest, and what rules it out; every other way of leaving censors.
    choices : sequence of Choice
    confidence : float

    Returns
    -------
    SubdistributionFit
        Ties by Breslow's rule. Standard errors from the sandwich of Fine & Gray, which includes that the
        weights of censoring are estimated; those of delayed entry are taken as known.

    Raises
    ------
    Refusal
        Those of ``design`` and ``cox.check_events``; ``competing_is_interest`` (``meaning``) when an outcome
        is in both sets; ``weights_undefined`` when nobody from the start is left to stand for those who came
        later; ``separation``; ``no_convergence``.

    Cautions
    --------
    ``few_events`` (``events``, ``parameters``); ``covariate_missing`` (``n``); ``no_competing``.

    References
    ----------
    Fine & Gray (1999) JASA 94:496-509. Delayed entry: Geskus (2011) Biometrics 67:39-49.
    """
    check_confidence(confidence)
    both = set(interest) & set(competing)
    if both:
        raise Refusal("competing_is_interest", field="competing", meaning=min(both))
    wanted = np.isin(cohort.outcome, interest_codes(interest))
    instead = np.isin(cohort.outcome, interest_codes(competing)) if competing else np.zeros_like(wanted)
    # Delayed entry on the day of leaving is no time at risk.
    usable = ~((cohort.entry > 0) & (cohort.entry == cohort.exit))
    plan = design(cohort, choices, usable)
    order = np.argsort(cohort.exit[plan.complete])
    entry, exit, event, other = (
        each[plan.complete][order] for each in (cohort.entry, cohort.exit, wanted, instead)
    )
    values = plan.values[order]
    parameters = len(plan.columns)
    check_events(plan.columns, values, event, parameters)
    scale = values.std(axis=0)
    data = _follow_up(entry, exit, event, other, ((values - values.mean(axis=0)) / scale).T)
    fit = maximise(lambda b: _evaluate(data, b), lambda sums: _slope_and_curvature(data, sums), plan.columns)
    share = np.linalg.solve(fit.information, _influence(data, fit.sums))
    errors = np.sqrt((share**2).sum(axis=1)) / scale
    events, incomplete = int(event.sum()), int(np.count_nonzero(usable & ~plan.complete))
    cautions = []
    if events < FEW_PER_PARAMETER * parameters:
        cautions.append(Caution("few_events", {"events": events, "parameters": parameters}))
    if incomplete:
        cautions.append(Caution("covariate_missing", {"n": incomplete}))
    if not other.any():
        cautions.append(Caution("no_competing", {}))
    return SubdistributionFit(
        n=len(event),
        events=events,
        competing=int(other.sum()),
        incomplete=incomplete,
        terms=tuple(
            fitted_term(column, fit.coefficients[i] / scale[i], float(errors[i]), confidence)
            for i, column in enumerate(plan.columns)
        ),
        log_likelihood=(fit.null_log_likelihood, fit.log_likelihood),
        iterations=fit.iterations,
        left_out=plan.left_out,
        cautions=tuple(cautions),
    )


@dataclass(frozen=True)
class _FollowUp:
    """n patients in ascending order of leaving, m days of outcomes.

    ``leaves`` and ``enters`` count days of outcomes seen and missed, as in ``risk_sums.FollowUp``.
    ``weight`` is, for each day of outcomes, the chance of being under observation just before it; ``stays``
    one over that chance on the day a patient left in a competing way, and 0 for the others.
    """

    x: np.ndarray
    exit: np.ndarray
    event: np.ndarray
    censored: np.ndarray
    days: np.ndarray
    leaves: np.ndarray
    enters: np.ndarray
    events_on: np.ndarray
    weight: np.ndarray
    stays: np.ndarray
    entry: np.ndarray


def _follow_up(
    entry: np.ndarray, exit: np.ndarray, event: np.ndarray, other: np.ndarray, covariates: np.ndarray
) -> _FollowUp:
    days, events_on = np.unique(exit[event], return_counts=True)
    censored = ~(event | other)
    observed = _observed_until(entry, exit, censored)
    x = np.ones((1 + len(covariates), len(exit)))
    x[1:] = covariates
    chance = observed(exit[other])
    if (chance <= 0).any() or (observed(days) <= 0).any():
        raise Refusal("weights_undefined")
    stays = np.zeros(len(exit))
    stays[other] = 1 / chance
    return _FollowUp(
        x=x,
        exit=exit,
        event=event,
        censored=censored,
        days=days,
        leaves=np.searchsorted(days, exit, side="right"),
        enters=np.where(entry > 0, np.searchsorted(days, entry, side="right"), 0),
        events_on=events_on.astype(np.int64),
        weight=observed(days),
        stays=stays,
        entry=entry,
    )


def _observed_until(
    entry: np.ndarray, exit: np.ndarray, censored: np.ndarray
) -> Callable[[np.ndarray], np.ndarray]:
    """Return a function of days: the chance of having come, and of not being censored, before the day.

    Outcomes come before censorings on the same day: who had one was not at risk of being censored there.
    """
    ends, counts, at_risk = _censoring(entry, exit, censored)
    kept = np.concatenate(([1.0], np.cumprod(1 - counts / at_risk)))
    late = entry[entry > 0]
    begins, came = np.unique(late, return_counts=True)
    # Under observation from the day after coming: of those, who has just come.
    present = np.searchsorted(np.sort(entry), begins, side="right") - np.searchsorted(
        exit, begins, side="right"
    )
    come = np.concatenate((np.cumprod((1 - came / np.maximum(present, 1))[::-1])[::-1], [1.0]))

    def chance(day: np.ndarray) -> np.ndarray:
        return kept[np.searchsorted(ends, day, side="left")] * come[np.searchsorted(begins, day, side="left")]

    return chance


def _censoring(
    entry: np.ndarray, exit: np.ndarray, censored: np.ndarray
) -> tuple[np.ndarray, np.ndarray, np.ndarray]:
    """Return the days of censorings, how many were censored, and how many could have been."""
    ends, counts = np.unique(exit[censored], return_counts=True)
    came = np.searchsorted(np.sort(entry[entry > 0]), ends, side="left") + np.count_nonzero(entry == 0)
    at_risk = came - np.searchsorted(exit, ends, side="right") + counts
    return ends, counts, at_risk


@dataclass(frozen=True)
class _Sums:
    r: np.ndarray
    total: np.ndarray
    """Row 0 the weighted sum of r at each day of outcomes, the other rows that of r x."""


def _evaluate(data: _FollowUp, coefficients: np.ndarray) -> tuple[float, _Sums]:
    eta = coefficients @ data.x[1:]
    shift = float(eta.max())
    r = np.exp(eta - shift)
    rows = data.x * r
    m = len(data.days)
    total = from_day_on(data.leaves, rows, m)
    late = np.flatnonzero(data.enters > 0)
    if len(late):
        late = late[np.argsort(data.enters[late])]
        total = total - from_day_on(data.enters[late], rows[:, late], m)
    # Those who left in a competing way before the day, weighted down as censoring goes on.
    stayed = segment_sums(data.leaves, rows * data.stays, m + 1)
    total = total + data.weight * np.cumsum(stayed, axis=1)[:, :m]
    value = float(eta[data.event].sum() - data.events_on @ np.log(total[0]) - shift * data.event.sum())
    return value, _Sums(r, total)


def _slope_and_curvature(data: _FollowUp, sums: _Sums) -> tuple[np.ndarray, np.ndarray]:
    means = sums.total[1:] / sums.total[0]
    x = data.x[1:]
    slope = x[:, data.event].sum(axis=1) - means @ data.events_on
    curvature = (x * (sums.r * _hazard(data, sums, np.ones_like(sums.total[:1]))[0])) @ x.T
    return slope, curvature - (means * data.events_on) @ means.T


def _hazard(data: _FollowUp, sums: _Sums, of: np.ndarray) -> np.ndarray:
    """Add up the rows ``of`` each day times its hazard, over each patient's weighted time at risk."""
    step = of * data.events_on / sums.total[0]
    plain, weighted = (
        np.concatenate((np.zeros((len(of), 1)), np.cumsum(each, axis=1)), axis=1)
        for each in (step, step * data.weight)
    )
    afterwards = weighted[:, -1:] - weighted[:, data.leaves]
    return plain[:, data.leaves] - plain[:, data.enters] + data.stays * afterwards


def _influence(data: _FollowUp, sums: _Sums) -> np.ndarray:
    """Return each patient's share in the score, (p, n): by the outcome, and by the censoring weights."""
    x = data.x[1:]
    means = sums.total[1:] / sums.total[0]
    own = -sums.r * (x * _hazard(data, sums, np.ones_like(sums.total[:1])) - _hazard(data, sums, means))
    on = np.searchsorted(data.days, data.exit[data.event])
    own[:, data.event] += x[:, data.event] - means[:, on]
    return own + _share_of_censoring(data, sums, means)


def _share_of_censoring(data: _FollowUp, sums: _Sums, means: np.ndarray) -> np.ndarray:
    """Return what each patient's being censored, or not, did to the score by way of the weights.

    q(c) is what a censoring on day c takes from the score: the part, on later days, of those who had left in
    a competing way by then.
    """
    ends, counts, at_risk = _censoring(data.entry, data.exit, data.censored)
    share = np.zeros((len(means), len(data.exit)))
    if not len(ends):
        return share
    step = data.weight * data.events_on / sums.total[0]
    later = [np.cumsum(each[:, ::-1], axis=1)[:, ::-1] for each in (step[None, :], step * means)]
    next_day = np.searchsorted(data.days, ends, side="right")
    hazard, weighted_means = (
        np.concatenate((each, np.zeros((len(each), 1))), axis=1)[:, next_day] for each in later
    )
    stayed = np.cumsum(data.x * (sums.r * data.stays), axis=1)
    stayed = np.concatenate((np.zeros((len(stayed), 1)), stayed), axis=1)
    by_then = stayed[:, np.searchsorted(data.exit, ends, side="right")]
    q = by_then[1:] * hazard - by_then[:1] * weighted_means
    day = np.searchsorted(ends, data.exit[data.censored])
    share[:, data.censored] += (q / at_risk)[:, day]
    steps = np.concatenate((np.zeros((len(q), 1)), np.cumsum(q * counts / at_risk**2, axis=1)), axis=1)
    # Who had an outcome on a day was not at risk of being censored on it; who came later not before coming.
    until = np.where(
        data.censored,
        np.searchsorted(ends, data.exit, side="right"),
        np.searchsorted(ends, data.exit, side="left"),
    )
    since = np.where(data.entry > 0, np.searchsorted(ends, data.entry, side="right"), 0)
    return share - (steps[:, until] - steps[:, since])
