"""The time by which a given share of patients has had the outcome: the median and other quantiles."""

from __future__ import annotations

from dataclasses import dataclass

import numpy as np

from vitalroll.errors import Refusal
from vitalroll.numbers import DAYS_PER_YEAR, NOT_GIVEN, Estimate
from vitalroll.outcomes.product_limit import SurvivalCurve

# Products such as 9/10 * 8/9 * ... meet 1/2 only to round-off; a step this close is taken to meet it.
_ROUND_OFF = 1e-10


@dataclass(frozen=True)
class TimeQuantile:
    """A time in years with its limits.

    ``reached`` is False when the curve never falls that far; the value is then NaN, which is an
    answer and may still carry a lower limit.
    """

    estimate: Estimate
    reached: bool


def time_quantile(curve: SurvivalCurve, share: float = 0.5) -> TimeQuantile:
    """Return the first time at which survival is at or below 1 - ``share``; the median for 0.5.

    Parameters
    ----------
    curve : SurvivalCurve
    share : float
        Share of patients that has had the outcome by then, strictly between 0 and 1.

    Returns
    -------
    TimeQuantile
        In years. The limits are the first times at which the lower and the upper limit of the
        curve, on the log-log scale whatever scale the curve was drawn with, are at or below
        1 - ``share``; NaN where they never are. With a handful of patients the exact limit of an
        untouched curve may already be that low at its start, and the lower limit is then its start.
        Nothing is given (all NaN) for a curve that started again after its risk set emptied.

    Raises
    ------
    Refusal
        ``out_of_range`` for a share that is not between 0 and 1.

    References
    ----------
    Brookmeyer & Crowley (1982) Biometrics 38:29-41.

    Notes
    -----
    Where a curve is flat at exactly 1 - ``share``, some programs give the middle of the flat part.
    """
    if not 0 < share < 1:
        raise Refusal("out_of_range", field="share", given=share, least=0, greatest=1)
    if curve.span.restarts:
        return TimeQuantile(NOT_GIVEN, reached=False)
    lower, upper = curve.log_log_limits()
    remaining = 1 - share
    value = _first_time(curve.time, curve.survival, remaining)
    return TimeQuantile(
        Estimate(value, _first_time(curve.time, lower, remaining), _first_time(curve.time, upper, remaining)),
        reached=not np.isnan(value),
    )


def _first_time(time: np.ndarray, curve: np.ndarray, level: float) -> float:
    low = curve <= level + _ROUND_OFF
    return float(time[np.argmax(low)]) / DAYS_PER_YEAR if low.any() else float("nan")
