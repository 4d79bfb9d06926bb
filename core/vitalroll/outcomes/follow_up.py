"""How long patients were followed, or would have been had they not had the outcome."""

from __future__ import annotations

from collections.abc import Collection

from vitalroll.outcomes.limits import Interval, check_confidence
from vitalroll.outcomes.product_limit import SurvivalCurve, curve_over
from vitalroll.outcomes.quantiles import TimeQuantile, time_quantile
from vitalroll.outcomes.risk_table import RiskTable


def follow_up_curve(
    table: RiskTable, interest: Collection[str], *, interval: Interval = "log-log", confidence: float = 0.95
) -> SurvivalCurve:
    """Return the reversed product limit: the chance that follow-up would still be going on.

    Ending observation is the event and the outcome of interest censors it. On a day with both,
    outcomes come first, so those who had one are no longer at risk of being censored. That makes
    survival times this curve equal the share still under observation, when all were observed from
    the start. (Programs that only swap the indicator keep them at risk; it differs on such days.)

    References
    ----------
    Schemper & Smith (1996) Controlled Clinical Trials 17:343-346.
    """
    check_confidence(confidence)
    events = table.events(interest)
    return curve_over(
        table, table.at_risk - events, table.censored(interest), interval=interval, confidence=confidence
    )


def follow_up_median(
    table: RiskTable, interest: Collection[str], *, confidence: float = 0.95
) -> TimeQuantile:
    """Return the median follow-up in years by the reversed product limit, with its limits."""
    return time_quantile(follow_up_curve(table, interest, confidence=confidence))
