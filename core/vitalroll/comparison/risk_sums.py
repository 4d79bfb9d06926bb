"""Sums over the risk sets of a proportional-hazards model, without ever forming a risk set.

With r = exp(x'b), everything the model needs is read from reversed cumulative sums of r and r x
over segments between the days with outcomes; the information needs no running sum of p x p
matrices: it is X' diag(r h) X - M'M, where h is each patient's cumulative hazard and M holds the
mean covariates of the risk set, one row for each outcome.
"""

from __future__ import annotations

from dataclasses import dataclass
from typing import Literal

import numpy as np

Ties = Literal["efron", "breslow"]


@dataclass(frozen=True)
class FollowUp:
    """Clean follow-up of n patients with m distinct days of outcomes, prepared once for every step.

    Patients stand in the order in which they left, so that no sum has to gather them.

    Parameters
    ----------
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
    """

    leaves: np.ndarray
    enters: np.ndarray
    at: np.ndarray
    who: np.ndarray
    part: np.ndarray
    days: np.ndarray
    late: np.ndarray

    @property
    def events(self) -> int:
        """Number of outcomes."""
        return len(self.at)


def follow_up(entry: np.ndarray, exit: np.ndarray, event: np.ndarray, ties: Ties) -> FollowUp:
    """Prepare follow-up in whole days, of patients in ascending order of ``exit``.

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
    return FollowUp(
        leaves=leaves,
        enters=enters,
        at=at,
        who=who,
        part=part,
        days=days,
        late=late[np.argsort(enters[late], kind="stable")],
    )


@dataclass(frozen=True)
class RiskSums:
    """What the risk sets say at some coefficients: one row for each outcome.

    ``total`` is the sum of r over the risk set less Efron's part, ``means`` the mean covariates there.
    """

    r: np.ndarray
    total: np.ndarray
    means: np.ndarray


def risk_sums(data: FollowUp, x: np.ndarray, r: np.ndarray) -> RiskSums:
    """Sum r and r x over the risk set of each outcome."""
    weighted = np.empty((len(r), x.shape[1] + 1))
    weighted[:, 0] = r
    np.multiply(x, r[:, None], out=weighted[:, 1:])
    m = len(data.days)
    at_risk = _from_day_on(data.leaves, weighted, m)
    if len(data.late):
        at_risk = at_risk - _from_day_on(data.enters[data.late], weighted[data.late], m)
    sums = at_risk[data.at]
    if data.part.any():
        falling = _segment_sums(data.at, weighted[data.who], m)
        sums = sums - data.part[:, None] * falling[data.at]
    return RiskSums(r=r, total=sums[:, 0], means=sums[:, 1:] / sums[:, :1])


def _from_day_on(position: np.ndarray, rows: np.ndarray, m: int) -> np.ndarray:
    """Return, for each day j of m, the sum of the rows whose (ascending) position is above j."""
    per_position = _segment_sums(position, rows, m + 1)
    return np.cumsum(per_position[::-1], axis=0)[::-1][1:]


def _segment_sums(sorted_position: np.ndarray, rows: np.ndarray, length: int) -> np.ndarray:
    """Sum rows that share a position; positions ascend."""
    sums = np.zeros((length, rows.shape[1]))
    if len(rows):
        starts = np.flatnonzero(np.concatenate(([True], np.diff(sorted_position) > 0)))
        sums[sorted_position[starts]] = np.add.reduceat(rows, starts, axis=0)
    return sums


def log_likelihood(data: FollowUp, eta: np.ndarray, sums: RiskSums, shift: float) -> float:
    """Return the partial log-likelihood; r was exp(eta - shift)."""
    return float(eta[data.who].sum() - np.log(sums.total).sum() - shift * data.events)


def score(data: FollowUp, x: np.ndarray, sums: RiskSums, weight: np.ndarray | None = None) -> np.ndarray:
    """Return the sum over outcomes of weight (x - mean of the risk set)."""
    residual = x[data.who] - sums.means
    return residual.sum(axis=0) if weight is None else weight @ residual


def information(
    data: FollowUp, x: np.ndarray, sums: RiskSums, weight: np.ndarray | None = None
) -> np.ndarray:
    """Return the sum over outcomes of weight times the covariance of x in the risk set."""
    w = np.ones(data.events) if weight is None else weight
    step = w / sums.total
    cumulative = np.concatenate(
        ([0.0], np.cumsum(np.bincount(data.at, weights=step, minlength=len(data.days))))
    )
    hazard = cumulative[data.leaves] - cumulative[data.enters]
    if data.part.any():
        # On its own day an outcome is only partly in the later risk sets of that day.
        missed = np.bincount(data.at, weights=step * data.part, minlength=len(data.days))
        hazard[data.who] -= missed[data.at]
    weighted_means = sums.means * w[:, None]
    return x.T @ (x * (sums.r * hazard)[:, None]) - weighted_means.T @ sums.means
