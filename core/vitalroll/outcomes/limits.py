"""Confidence limits for probabilities that several outcome methods share."""

from __future__ import annotations

from typing import Literal, get_args

import numpy as np
from scipy.special import betaincinv

from vitalroll.errors import Refusal

Interval = Literal["log-log", "log", "plain"]
"""The scale on which limits of a survival probability are made symmetric."""


def check_confidence(confidence: float) -> None:
    """Refuse (``out_of_range``) a confidence that is not between 0.5 and 0.9999."""
    if not 0.5 <= confidence <= 0.9999:
        raise Refusal("out_of_range", field="confidence", given=confidence, least=0.5, greatest=0.9999)


def check_interval(interval: str) -> None:
    """Refuse (``not_one_of``) a scale that is not offered."""
    if interval not in get_args(Interval):
        raise Refusal("not_one_of", field="interval", given=interval, choices=list(get_args(Interval)))


def probability_limits(
    value: np.ndarray, relative_error: np.ndarray, z: float, interval: Interval = "log-log"
) -> tuple[np.ndarray, np.ndarray]:
    """Return lower and upper limits of probabilities strictly between 0 and 1.

    Parameters
    ----------
    value : array
        Probabilities. At 0 and 1 no scale gives limits: what comes back there is meaningless
        and the caller puts the exact limit in its place.
    relative_error : array
        Standard error of log(value), that is the standard error divided by the value.
    z : float
        Normal quantile.
    interval : str
        ``log-log``, ``log`` or ``plain`` (the last two cut at 0 and 1).

    References
    ----------
    Kalbfleisch & Prentice (1980) The Statistical Analysis of Failure Time Data, sec. 1.3.
    """
    with np.errstate(divide="ignore", invalid="ignore", over="ignore"):
        if interval == "plain":
            margin = z * value * relative_error
            return np.clip(value - margin, 0, 1), np.clip(value + margin, 0, 1)
        if interval == "log":
            spread = np.exp(z * relative_error)
            return value / spread, np.minimum(value * spread, 1)
        spread = np.exp(z * relative_error / np.abs(np.log(value)))
        return value**spread, value ** (1 / spread)


def lower_limit_at_one(fewest_at_risk: np.ndarray, confidence: float) -> np.ndarray:
    """Return the exact lower limit of a survival of 1.

    Nobody had the event while at least ``fewest_at_risk`` were at risk at every moment so far.
    The survival that makes this as improbable as half the error allowed is (a/2)^(1/n): the
    beta-product limit, and with nobody censored that of Clopper & Pearson (1934). The fewest are
    the last ones unless entry is delayed; then the least risk set bounds what may have been missed.

    References
    ----------
    Fay, Brittain & Proschan (2013) Biostatistics 14:723-736.
    """
    return ((1 - confidence) / 2) ** (1 / np.asarray(fewest_at_risk, dtype=float))


def upper_limit_at_zero(at_risk: np.ndarray, events: np.ndarray, confidence: float) -> float:
    """Return the upper limit of a survival that reached 0.

    The beta-product limit: survival is below a product of independent Beta(n - d + 1, d), one for
    each day with events. The product is taken as the beta variable with its mean and variance,
    which is exact (Clopper & Pearson 1934) when nobody was censored.

    Parameters
    ----------
    at_risk, events : arrays of equal length
        The days with events; a life table's effective numbers may be fractional.

    References
    ----------
    Fay, Brittain & Proschan (2013) Biostatistics 14:723-736, the method-of-moments version.
    """
    n, d = np.asarray(at_risk, dtype=float), np.asarray(events, dtype=float)
    mean = np.prod((n - d + 1) / (n + 1))
    square = np.prod((n - d + 1) * (n - d + 2) / ((n + 1) * (n + 2)))
    size = mean * (1 - mean) / (square - mean**2) - 1
    return float(betaincinv(mean * size, (1 - mean) * size, (1 + confidence) / 2))
