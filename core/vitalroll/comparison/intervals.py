"""Two groups side by side in each interval of follow-up, and pooled over the intervals."""

from __future__ import annotations

from collections.abc import Collection
from dataclasses import dataclass

from vitalroll.comparison.stratified import LeftOut, Stratified, stratified
from vitalroll.comparison.two_by_two import Measures, TwoByTwo, measures
from vitalroll.errors import Caution, Refusal
from vitalroll.outcomes.actuarial import GroupedCounts, Step, grouped_counts, interval_edges
from vitalroll.outcomes.risk_table import RiskTable

COMMON = 0.1
"""Above this chance per interval a pooled odds ratio is no longer close to a hazard ratio."""

MOST_INTERVALS = 240


@dataclass(frozen=True)
class Side:
    """One group in one interval; ``effective`` counts those lost or withdrawn half."""

    entering: int
    lost: int
    withdrawn: int
    events: int
    effective: float


@dataclass(frozen=True)
class IntervalRow:
    """The two groups in one interval and what stands between them."""

    from_days: float
    to_days: float
    exposed: Side
    reference: Side
    measures: Measures


@dataclass(frozen=True)
class IntervalComparison:
    """The rows, the figures pooled over them, and which rows could not contribute to those."""

    rows: tuple[IntervalRow, ...]
    pooled: Stratified
    left_out: tuple[LeftOut, ...]
    cautions: tuple[Caution, ...]


def compare_intervals(
    exposed: RiskTable,
    reference: RiskTable,
    interest: Collection[str],
    *,
    step: Step = "year",
    intervals: int = 5,
    confidence: float = 0.95,
) -> IntervalComparison:
    """Compare two groups interval by interval with effective numbers n - w/2, and pool.

    Parameters
    ----------
    exposed, reference : RiskTable
    interest : names from MEANINGS
    step : str
        ``year``, ``quarter`` or ``month``.
    intervals : int
        How many are compared, from the start, 1 to 240.

    Raises
    ------
    Refusal
        ``out_of_range`` (intervals), ``no_usable_strata`` when no interval has both groups.

    Cautions
    --------
    ``common_in_interval`` (``share``): risks per interval are not small, so that the pooled odds
    ratio must not be read as a hazard ratio. Those of ``stratified``.

    References
    ----------
    Cutler & Ederer (1958) for effective numbers; Mantel (1966) for pooling over intervals.
    """
    if not 1 <= intervals <= MOST_INTERVALS:
        raise Refusal("out_of_range", field="intervals", given=intervals, least=1, greatest=MOST_INTERVALS)
    edges = interval_edges(step, intervals)
    counts = grouped_counts(exposed, interest, edges), grouped_counts(reference, interest, edges)
    tables = [
        TwoByTwo(
            float(counts[0].events[i]),
            float(counts[0].effective[i]),
            float(counts[1].events[i]),
            float(counts[1].effective[i]),
        )
        for i in range(intervals)
    ]
    rows = tuple(
        IntervalRow(
            from_days=float(edges[i]),
            to_days=float(edges[i + 1]),
            exposed=_side(counts[0], i),
            reference=_side(counts[1], i),
            measures=measures(table, confidence=confidence),
        )
        for i, table in enumerate(tables)
        if table.exposed_total > 0 or table.reference_total > 0
    )
    pooled = stratified(tables, confidence=confidence)
    chances = [
        risk.value
        for row in rows
        for risk in (row.measures.exposed_risk, row.measures.reference_risk)
        if risk.value > COMMON
    ]
    common = (Caution("common_in_interval", {"share": max(chances)}),) if chances else ()
    return IntervalComparison(rows, pooled, pooled.left_out, (*common, *pooled.cautions))


def _side(counts: GroupedCounts, interval: int) -> Side:
    return Side(
        entering=int(counts.entering[interval]),
        lost=int(counts.lost[interval]),
        withdrawn=int(counts.withdrawn[interval]),
        events=int(counts.events[interval]),
        effective=float(counts.effective[interval]),
    )
