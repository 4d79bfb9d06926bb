"""What became of those who left: every way of leaving at once, so that the shares add up."""

from __future__ import annotations

from collections.abc import Sequence
from dataclasses import dataclass

import numpy as np

from vitalroll.errors import Caution
from vitalroll.numbers import NOT_GIVEN, Estimate, two_sided_z
from vitalroll.outcomes.limits import (
    check_confidence,
    lower_limit_at_one,
    probability_limits,
    upper_limit_at_zero,
)
from vitalroll.outcomes.product_limit import product_limit
from vitalroll.outcomes.risk_table import RiskTable
from vitalroll.outcomes.stretches import Span, Stretch, fewest_at_risk, span, stretches
from vitalroll.register.cohort import MEANINGS

WAYS_OF_LEAVING = MEANINGS[1:]
"""Every meaning but being under care still, which alone is censoring here."""


@dataclass(frozen=True)
class Incidence:
    """Cumulative incidence of one way of leaving; arrays as long as ``Leaving.time``."""

    meaning: str
    events: int
    incidence: np.ndarray
    standard_error: np.ndarray
    lower: np.ndarray
    upper: np.ndarray


@dataclass(frozen=True)
class Leaving:
    """The chance of having left in each way by each day, and of being under care still.

    One entry per distinct day of the risk table, after a first one where everybody is under care.
    ``events_at`` counts all who left on the day. ``under_care`` and the incidences of all ways
    add up to 1 in every entry.
    """

    n: int
    span: Span
    time: np.ndarray
    at_risk: np.ndarray
    events_at: np.ndarray
    under_care: np.ndarray
    ways: tuple[Incidence, ...]
    cautions: tuple[Caution, ...]

    def at(self, meaning: str, day: float) -> Estimate:
        """Return the incidence of one way of leaving by ``day``; NaN where nobody can say."""
        way = next(way for way in self.ways if way.meaning == meaning)
        if not self.span.speaks_of(day):
            return NOT_GIVEN
        row = int(np.searchsorted(self.time, day, side="right")) - 1
        return Estimate(
            float(way.incidence[row]),
            float(way.lower[row]),
            float(way.upper[row]),
            float(way.standard_error[row]),
        )


def leaving(table: RiskTable, *, ways: Sequence[str] = WAYS_OF_LEAVING, confidence: float = 0.95) -> Leaving:
    """Estimate the cumulative incidence of every way of leaving (Aalen & Johansen).

    Parameters
    ----------
    table : RiskTable
    ways : names from MEANINGS
        What counts as leaving; the rest, by default only being under care, ends observation
        without saying how it would have ended.
    confidence : float

    Returns
    -------
    Leaving
        Limits on the log-log scale. Where a way has not occurred yet its upper limit is the most
        that could have been missed: the greatest S(t-) [1 - (a/2)^(1/n)] so far. Where all have
        left in one way, its lower limit is the beta-product one.

    Raises
    ------
    Refusal
        ``no_patients``, ``out_of_range`` (confidence), and those of ``RiskTable.events``.

    Cautions
    --------
    ``nobody_left``, ``never_at_risk``, ``begins_late`` and ``risk_set_emptied`` (see ``stretches``).

    References
    ----------
    Aalen & Johansen (1978) Scand J Stat 5:141-150. Variance: Marubini & Valsecchi (1995)
    Analysing Survival Data from Clinical Trials and Observational Studies, ch. 10.
    """
    check_confidence(confidence)
    everything = table.events(ways)
    by_way = np.column_stack([table.left_by(way) for way in ways])
    parts = stretches(table, table.at_risk, everything)
    pieces = [_piece(table, part, everything, by_way, confidence) for part in parts]
    joined = {name: np.concatenate([piece[name] for piece in pieces]) for name in pieces[0]}
    covered = span(table, parts, table.at_risk, everything)
    cautions = covered.cautions()
    if not everything.any():
        cautions += (Caution("nobody_left", {"n": table.n}),)
    if table.never_at_risk:
        cautions += (Caution("never_at_risk", {"n": table.never_at_risk}),)
    return Leaving(
        n=table.n,
        span=covered,
        time=joined["time"],
        at_risk=joined["at_risk"],
        events_at=joined["events_at"],
        under_care=joined["under_care"],
        ways=tuple(
            Incidence(
                meaning=way,
                events=int(by_way[:, k].sum()),
                incidence=joined["incidence"][:, k],
                standard_error=joined["standard_error"][:, k],
                lower=joined["lower"][:, k],
                upper=joined["upper"][:, k],
            )
            for k, way in enumerate(ways)
        ),
        cautions=cautions,
    )


def as_if_others_were_censored(table: RiskTable, meaning: str, day: float) -> float:
    """Return one minus the product limit of one way of leaving, the others taken as censored.

    A figure often quoted for the incidence and always too high where others left: it supposes that
    those who left otherwise could still leave this way. Given only to show the difference.
    """
    return 1 - product_limit(table, (meaning,)).at(day).value


def _piece(
    table: RiskTable, part: Stretch, everything: np.ndarray, by_way: np.ndarray, confidence: float
) -> dict[str, np.ndarray]:
    n, d, k = table.at_risk[part.rows], everything[part.rows], by_way[part.rows]
    under_care = np.cumprod(1 - d / n)
    ended = d == n
    under_care[ended] = 0
    before = np.concatenate(([1.0], under_care[:-1]))
    incidence = np.cumsum(before[:, None] * k / n[:, None], axis=0)
    error = np.sqrt(_variance(n, d, k, before, incidence))
    z = two_sided_z(confidence)
    lower, upper = probability_limits(incidence, error / np.where(incidence > 0, incidence, 1), z)
    none = incidence == 0
    fewest = fewest_at_risk(table, part)
    start_missed = 1 - lower_limit_at_one(np.array([part.at_risk]), confidence)
    missed = np.concatenate((start_missed, before * (1 - lower_limit_at_one(fewest, confidence))))
    most_missed = np.maximum.accumulate(missed)
    lower[none] = 0
    upper[none] = np.broadcast_to(most_missed[1:, None], upper.shape)[none]
    if ended[-1]:
        # Everybody has left; if all in one way, no scale gives limits to its incidence of 1.
        for way in np.flatnonzero(k.sum(axis=0) == d.sum()):
            lower[-1, way] = 1 - upper_limit_at_zero(n[d > 0], d[d > 0], confidence)
            upper[-1, way], incidence[-1, way], error[-1, way] = 1, 1, np.nan
    start = np.zeros((1, k.shape[1]))
    return {
        "time": np.concatenate(([part.begins], table.time[part.rows])),
        "at_risk": np.concatenate(([part.at_risk], n)),
        "events_at": np.concatenate(([0], d)),
        "under_care": np.concatenate(([1.0], under_care)),
        "incidence": np.concatenate((start, incidence)),
        "standard_error": np.concatenate((start, error)),
        "lower": np.concatenate((start, lower)),
        "upper": np.concatenate((np.full_like(start, most_missed[0]), upper)),
    }


def _variance(
    n: np.ndarray, d: np.ndarray, k: np.ndarray, before: np.ndarray, incidence: np.ndarray
) -> np.ndarray:
    """Return sum [F(t)-F_j]^2 d/[n(n-d)] + sum S(j-)^2 d_k(n-d_k)/n^3 - 2 sum [F(t)-F_j] S(j-) d_k/n^2.

    The squares are multiplied out, so that every sum is a running one. Where everyone at risk left,
    d/[n(n-d)] is infinite but F(t) - F_j is zero there and nothing follows: the term is zero.
    """
    n, d, before = n[:, None].astype(float), d[:, None], before[:, None]
    a = np.where(d < n, d / (n * np.maximum(n - d, 1)), 0.0)
    c = before * k / n**2
    own = before**2 * k * (n - k) / n**3
    variance = (
        incidence**2 * np.cumsum(a, axis=0)
        - 2 * incidence * np.cumsum(a * incidence + c, axis=0)
        + np.cumsum(a * incidence**2 + own + 2 * c * incidence, axis=0)
    )
    return np.maximum(variance, 0)
