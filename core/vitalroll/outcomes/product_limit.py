"""The product-limit survival curve."""

from __future__ import annotations

from collections.abc import Collection
from dataclasses import dataclass

import numpy as np

from vitalroll.errors import Caution
from vitalroll.numbers import NOT_GIVEN, Estimate, two_sided_z
from vitalroll.outcomes.limits import (
    Interval,
    check_confidence,
    check_interval,
    lower_limit_at_one,
    probability_limits,
    upper_limit_at_zero,
)
from vitalroll.outcomes.risk_table import RiskTable
from vitalroll.outcomes.stretches import Span, Stretch, fewest_at_risk, span, stretches


@dataclass(frozen=True)
class SurvivalCurve:
    """A survival curve: one entry per distinct day of the risk table, after a first one with survival 1.

    Parameters
    ----------
    n, events, censored : int
        Patients in the table, those with the outcome, and the others.
    interval, confidence
        The scale on which the limits were made, and how often they are to hold the truth.
    span : Span
        The days the curve can speak about. Where it starts again (see ``stretches``) there is an
        entry with survival 1 and no events.
    time : int array, shape (k,)
        Days. Outcomes on day 0 give a second entry at time 0.
    at_risk, events_at, censored_at : int arrays, shape (k,)
        In the first entry, and where the curve starts again: the number there to begin with, 0, 0.
    survival, standard_error, lower, upper : arrays, shape (k,)
        Chance of still being without the outcome after that day, until the next entry. The standard
        error (Greenwood) is NaN where survival is 0, for it cannot be given there.
    cautions : tuple of Caution
    """

    n: int
    events: int
    censored: int
    interval: Interval
    confidence: float
    span: Span
    time: np.ndarray
    at_risk: np.ndarray
    events_at: np.ndarray
    censored_at: np.ndarray
    survival: np.ndarray
    standard_error: np.ndarray
    lower: np.ndarray
    upper: np.ndarray
    cautions: tuple[Caution, ...]

    def at(self, day: float) -> Estimate:
        """Return the survival after ``day`` with its limits; NaN where the curve says nothing."""
        if not self.span.speaks_of(day):
            return NOT_GIVEN
        row = int(np.searchsorted(self.time, day, side="right")) - 1
        return Estimate(
            float(self.survival[row]),
            float(self.lower[row]),
            float(self.upper[row]),
            float(self.standard_error[row]),
        )

    def log_log_limits(self) -> tuple[np.ndarray, np.ndarray]:
        """Return the limits on the log-log scale, whatever scale the curve itself was given."""
        if self.interval == "log-log":
            return self.lower, self.upper
        inside = (self.survival > 0) & (self.survival < 1)
        relative = self.standard_error / np.where(inside, self.survival, 1)
        lower, upper = probability_limits(self.survival, relative, two_sided_z(self.confidence))
        return np.where(inside, lower, self.lower), np.where(inside, upper, self.upper)


def product_limit(
    table: RiskTable,
    interest: Collection[str],
    *,
    interval: Interval = "log-log",
    confidence: float = 0.95,
) -> SurvivalCurve:
    """Estimate the chance of still being without the outcome, day by day.

    Parameters
    ----------
    table : RiskTable
    interest : names from MEANINGS
        The outcomes that count; everything else ends observation.
    interval : str
        Scale of the limits: ``log-log``, ``log`` or ``plain``. Where survival is 1 or 0 the
        beta-product limit takes its place, on any scale.
    confidence : float

    Returns
    -------
    SurvivalCurve

    Raises
    ------
    Refusal
        ``no_patients``, ``out_of_range`` (confidence), ``not_one_of`` (interval), and those of
        ``interest_codes``.

    Cautions
    --------
    ``no_events``, ``all_events_on_day_zero``, ``last_at_risk_had_event`` (the curve falls to zero
    because of a single patient), ``never_at_risk`` (patients whose delayed entry and exit fall on
    one day), ``begins_late`` and ``risk_set_emptied`` (see ``stretches``).

    Notes
    -----
    Outcomes come before censorings on the same day; at risk are those with entry < day <= exit.

    References
    ----------
    Kaplan & Meier (1958) J Am Stat Assoc 53:457-481. Greenwood (1926) Reports on Public Health
    and Medical Subjects 33:1-26. Fay, Brittain & Proschan (2013) Biostatistics 14:723-736.
    """
    check_confidence(confidence)
    check_interval(interval)
    events = table.events(interest)
    return curve_over(table, table.at_risk, events, interval=interval, confidence=confidence)


def curve_over(
    table: RiskTable, at_risk: np.ndarray, events: np.ndarray, *, interval: Interval, confidence: float
) -> SurvivalCurve:
    """Multiply over ``events`` out of ``at_risk`` on the days of a table; see ``product_limit``."""
    parts = stretches(table, at_risk, events)
    pieces = [_piece(table, part, at_risk, events, interval, confidence) for part in parts]
    joined = {name: np.concatenate([piece[name] for piece in pieces]) for name in pieces[0]}
    covered = span(table, parts, at_risk, events)
    total = int(events.sum())
    return SurvivalCurve(
        n=table.n,
        events=total,
        censored=table.n - total,
        interval=interval,
        confidence=confidence,
        span=covered,
        cautions=covered.cautions() + _cautions(table, at_risk, events),
        **joined,
    )


def _piece(
    table: RiskTable,
    part: Stretch,
    at_risk: np.ndarray,
    events: np.ndarray,
    interval: Interval,
    confidence: float,
) -> dict[str, np.ndarray]:
    n, d = at_risk[part.rows], events[part.rows]
    survival = np.cumprod(1 - d / np.maximum(n, 1))
    # Where everyone at risk had the event, Greenwood's term is infinite and survival is 0: no error.
    ended = (d == n) & (d > 0)
    survival[ended] = 0
    variance = np.cumsum(np.where(d > 0, d / np.maximum(n * (n - d), 1), 0.0))
    relative = np.sqrt(variance)
    lower, upper = probability_limits(survival, relative, two_sided_z(confidence), interval)
    whole = survival == 1
    lower[whole] = lower_limit_at_one(fewest_at_risk(table, part), confidence)[whole]
    upper[whole] = 1
    if ended.any():
        lower[ended] = 0
        upper[ended] = upper_limit_at_zero(n[d > 0], d[d > 0], confidence)
    start_lower = lower_limit_at_one(np.array([part.at_risk]), confidence)
    return {
        "time": np.concatenate(([part.begins], table.time[part.rows])),
        "at_risk": np.concatenate(([part.at_risk], n)),
        "events_at": np.concatenate(([0], d)),
        "censored_at": np.concatenate(([0], table.left[part.rows].sum(axis=1) - d)),
        "survival": np.concatenate(([1.0], survival)),
        "standard_error": np.concatenate(([0.0], np.where(ended, np.nan, survival * relative))),
        "lower": np.concatenate((start_lower, lower)),
        "upper": np.concatenate(([1.0], upper)),
    }


def _cautions(table: RiskTable, at_risk: np.ndarray, events: np.ndarray) -> tuple[Caution, ...]:
    found = []
    total = int(events.sum())
    if total == 0:
        found.append(Caution("no_events", {"n": table.n}))
    elif table.time[0] == 0 and events[0] == total:
        found.append(Caution("all_events_on_day_zero", {"events": total}))
    if events[-1] == 1 and at_risk[-1] == 1:
        found.append(Caution("last_at_risk_had_event", {"days": int(table.time[-1])}))
    if table.never_at_risk:
        found.append(Caution("never_at_risk", {"n": table.never_at_risk}))
    return tuple(found)
