"""Sums over the risk sets of a proportional-hazards model, without ever forming a risk set.

With r = exp(x'b), everything the model needs is read from reversed cumulative sums of r and r x
over segments between the days with outcomes. The information needs no running sum of p x p
matrices: it is X' diag(r h) X - M'M, where h is each patient's cumulative hazard and M holds the
mean covariates of the risk set, one row for each outcome. M is never formed either: the outcomes of
one day share its sums A (at risk) and F (falling), so their rows (A - u F) / (a - u f), u = 0, 1/d,
2/d, ... by Efron's rule, add up to A and F times sums of w, w u, w u u over the day, w = 1 / (a - u f).
"""

from __future__ import annotations

from dataclasses import dataclass
from typing import Literal

import numpy as np

Ties = Literal["efron", "breslow"]


@dataclass(frozen=True)
class FollowUp:
    """Clean follow-up of n patients with p covariates and m distinct days of outcomes, prepared once.

    Patients stand in the order in which they left, so that no sum has to gather them.

    Parameters
    ----------
    x : float array, shape (1 + p, n)
        A row of ones, and a row for each covariate: sums over patients then run along memory.
    leaves : int array, shape (n,)
        How many days of outcomes the patient lived to see, the last day included.
    enters : int array, shape (n,)
        How many days of outcomes were over before the patient came under observation.
    at : int array, shape (D,)
        For each outcome, the position of its day; ascending.
    who : int array, shape (D,)
        For each outcome, the patient.
    part : float array, shape (D,)
        For each outcome, the share of its day's outcomes that Efron's rule has already taken out of
        the risk set: 0, 1/d, 2/d, ...; all 0 with Breslow's rule.
    days : int array, shape (m,)
    late : int array
        Patients who came under observation after some day of outcomes, in the order of coming.
    own : float array, shape (1 + p, m)
        The sum of the columns of x of those with the outcome on each day.
    """

    x: np.ndarray
    leaves: np.ndarray
    enters: np.ndarray
    at: np.ndarray
    who: np.ndarray
    part: np.ndarray
    days: np.ndarray
    late: np.ndarray
    own: np.ndarray

    @property
    def events(self) -> int:
        """Number of outcomes."""
        return len(self.at)

    def by_day(self, of_outcomes: np.ndarray) -> np.ndarray:
        """Sum numbers of outcomes over each day."""
        return np.bincount(self.at, weights=of_outcomes, minlength=len(self.days))


def follow_up(
    entry: np.ndarray, exit: np.ndarray, event: np.ndarray, covariates: np.ndarray, ties: Ties
) -> FollowUp:
    """Prepare follow-up in whole days, of patients in ascending order of ``exit``; covariates in rows.

    At risk on a day are those with entry < day <= exit, and on day 0 those with entry 0.
    """
    days = np.unique(exit[event])
    leaves = np.searchsorted(days, exit, side="right")
    enters = np.where(entry > 0, np.searchsorted(days, entry, side="right"), 0)
    who = np.flatnonzero(event)
    at = np.searchsorted(days, exit[who])
    counts = np.bincount(at, minlength=len(days)).astype(np.int64)
    first = np.cumsum(counts) - counts
    part = (np.arange(len(who)) - first[at]) / counts[at] if ties == "efron" else np.zeros(len(who))
    late = np.flatnonzero(enters > 0)
    x = np.ones((1 + len(covariates), len(exit)))
    x[1:] = covariates
    return FollowUp(
        x=x,
        leaves=leaves,
        enters=enters,
        at=at,
        who=who,
        part=part,
        days=days,
        late=late[np.argsort(enters[late], kind="stable")],
        own=segment_sums(at, x[:, who], len(days)),
    )


@dataclass(frozen=True)
class RiskSums:
    """What the risk sets say at some coefficients.

    ``weighted`` has r and r x of each patient; ``at_risk`` and ``falling`` sum its columns over the risk set
    of each day, and over those with the outcome on it; ``total`` is, for each outcome, the sum of r over the
    risk set less Efron's part. ``inverse`` sums w and w u of the outcomes of each day (w = 1 / total, u
    Efron's share), ``squared`` their w w, w w u and w w u u.
    """

    weighted: np.ndarray
    at_risk: np.ndarray
    falling: np.ndarray
    total: np.ndarray
    inverse: tuple[np.ndarray, np.ndarray]
    squared: tuple[np.ndarray, np.ndarray, np.ndarray]


def risk_sums(data: FollowUp, r: np.ndarray) -> RiskSums:
    """Sum r and r x over the risk set of each day."""
    weighted = data.x * r
    m = len(data.days)
    at_risk = from_day_on(data.leaves, weighted, m)
    if len(data.late):
        at_risk = at_risk - from_day_on(data.enters[data.late], weighted[:, data.late], m)
    falling = segment_sums(data.at, weighted[:, data.who], m)
    total = at_risk[0, data.at] - data.part * falling[0, data.at]
    w = 1 / total
    w_efron = w * data.part
    return RiskSums(
        weighted=weighted,
        at_risk=at_risk,
        falling=falling,
        total=total,
        inverse=(data.by_day(w), data.by_day(w_efron)),
        squared=(data.by_day(w * w), data.by_day(w * w_efron), data.by_day(w_efron * w_efron)),
    )


def from_day_on(position: np.ndarray, columns: np.ndarray, m: int) -> np.ndarray:
    """Return, for each day j of m, the sum of the columns whose (ascending) position is above j."""
    per_position = segment_sums(position, columns, m + 1)
    return np.cumsum(per_position[:, ::-1], axis=1)[:, ::-1][:, 1:]


def segment_sums(sorted_position: np.ndarray, columns: np.ndarray, length: int) -> np.ndarray:
    """Sum columns that share a position; positions ascend."""
    sums = np.zeros((len(columns), length))
    if len(sorted_position):
        starts = np.flatnonzero(np.concatenate(([True], np.diff(sorted_position) > 0)))
        sums[:, sorted_position[starts]] = np.add.reduceat(columns, starts, axis=1)
    return sums


def log_likelihood(data: FollowUp, eta: np.ndarray, sums: RiskSums, shift: float) -> float:
    """Return the partial log-likelihood; r was exp(eta - shift)."""
    return float(eta[data.who].sum() - np.log(sums.total).sum() - shift * data.events)


def score(data: FollowUp, sums: RiskSums, weight: np.ndarray | float = 1.0) -> np.ndarray:
    """Return the sum over outcomes of weight (x - mean of the risk set); one weight for each day."""
    step, efron = sums.inverse
    residual = data.own - step * sums.at_risk + efron * sums.falling
    return (residual * weight).sum(axis=1)[1:]


def information(data: FollowUp, sums: RiskSums, weight: np.ndarray | float = 1.0) -> np.ndarray:
    """Return the sum over outcomes of weight times the covariance of x in the risk set; as ``score``."""
    cumulative = np.concatenate(([0.0], np.cumsum(weight * sums.inverse[0])))
    hazard = cumulative[data.leaves] - cumulative[data.enters]
    # On its own day an outcome is only partly in the later risk sets of that day.
    hazard[data.who] -= (weight * sums.inverse[1])[data.at]
    squares = data.x @ (sums.weighted * hazard).T
    at_risk, falling = sums.at_risk, sums.falling
    once, efron, twice = (weight * each for each in sums.squared)
    across = at_risk @ (efron * falling).T
    means = at_risk @ (once * at_risk).T - across - across.T + falling @ (twice * falling).T
    return (squares - means)[1:, 1:]
