"""What the coming years take: amounts, money, and when there is not enough."""

from __future__ import annotations

from collections.abc import Sequence
from dataclasses import dataclass
from typing import Annotated, Any, Literal

import numpy as np

from vitalroll.caseload.capacity import Passing, beds_in_use, busy_day, check_beds, passing
from vitalroll.caseload.outlook import Measure, Outlook, prospect
from vitalroll.caseload.projection import yearly_sums
from vitalroll.caseload.resources import DISCOUNTS, Item, cost_by_year, present_value
from vitalroll.desk.coming_years import Setting, begin, held_hazard, months_after, years_ahead
from vitalroll.desk.fields import Between
from vitalroll.desk.memory import Memory
from vitalroll.errors import Caution, Refusal

Amount = Annotated[float, Between(0, 1e12)]


@dataclass(frozen=True)
class AskedItem:
    """Something that care takes; see ``caseload.resources.Item``."""

    name: str
    unit: str = ""
    at_start: Amount = 0.0
    first_year: Amount = 0.0
    later: Amount = 0.0
    per_event: Amount = 0.0
    event: Literal["death", "lost", "completed", "stopped", "moved_away"] = "death"
    unit_cost: Amount = 0.0
    cost_growth: Annotated[float, Between(-50, 100)] = 0.0


@dataclass(frozen=True)
class Line:
    """How much there is: patients at once, an item's amount a month, or beds for an item in bed-days.

    ``item`` counts from 0 in the request's items; not needed for patients.
    """

    kind: Literal["patients", "amount", "beds"]
    limit: Annotated[float, Between(1e-9, 1e12)]
    name: str = ""
    item: Annotated[int, Between(0, 99)] | None = None


@dataclass(frozen=True)
class ResourcesRequest(Setting):
    """Fields of ``caseload.resources``."""

    items: tuple[AskedItem, ...] = ()
    lines: tuple[Line, ...] = ()
    discount: Annotated[float, Between(0, 100)] = 3.0


def resources(memory: Memory, request: ResourcesRequest, report: Any) -> dict[str, Any]:
    """Answer ``caseload.resources``: what the caseload takes and when that is more than there is.

    Bands as in ``caseload.project``.

    Returns
    -------
    dict
        ``years`` [{year, ends}]; ``months`` [ISO day each month ends]; ``items`` [{name, unit,
        amount: a band for each year, cost: likewise}]; ``cost``: a band for each year, all items,
        not discounted, or null when nothing costs; ``totals`` [{percent, cost}]: the whole horizon
        at ``discount`` and at 0, 3 and 5 per cent; ``lines`` [{kind, name, item, limit, need
        [months], passed_in, passed_by [months, shares of the draws], expected_month, likely_month
        (half of the draws), unlikely_month (a tenth), each null or {month, ends}; ``beds`` {mean,
        busy, utilisation} now and in the last month, null for other kinds}]; ``draws``, ``seed``;
        ``cautions``.

    Refusals: those of ``coming_years.begin``; ``no_items`` (items); ``line_without_item``
    (lines.N.item); ``utilisation_at_or_above_one`` (lines.N.limit) when beds are too few in the
    first month already.

    Cautions: those of ``caseload.project``; ``beds_never_enough`` (name, ends): from that day on
    the mean number of beds in use is above what there is.
    """
    if not request.items and not request.lines:
        raise Refusal("no_items", field="items")
    for position, line in enumerate(request.lines):
        if line.kind != "patients" and (line.item is None or line.item >= len(request.items)):
            raise Refusal("line_without_item", field=f"lines.{position}.item")
    start = begin(memory, request)
    items = read_items(request.items)
    found = prospect(
        start.today,
        start.hazards,
        start.inflow,
        years=request.years,
        times_today=start.times_today,
        draws=request.draws,
        seed=request.seed,
        report=report,
    )
    monthly = [found.baseline.measure(item.monthly) for item in items]
    cost = found.baseline.measure(lambda course: cost_by_year(items, course))
    cautions = [*start.cautions, *held_hazard(start.hazards, found.held_share)]
    lines = []
    for position, line in enumerate(request.lines):
        told, more = _line(position, line, found.baseline, monthly, start.closing)
        lines.append(told)
        cautions += more
    return {
        "years": years_ahead(start.closing, request.years),
        "months": [months_after(start.closing, month + 1) for month in range(12 * request.years)],
        "items": [
            {
                "name": item.name,
                "unit": item.unit,
                "amount": Measure(yearly_sums(amount.expected), yearly_sums(amount.drawn)).bands(),
                "cost": Measure(item.yearly_cost(amount.expected), item.yearly_cost(amount.drawn)).bands(),
            }
            for item, amount in zip(items, monthly, strict=True)
        ],
        "cost": cost.bands() if any(item.unit_cost for item in items) else None,
        "totals": totals(cost, request.discount),
        "lines": lines,
        "draws": request.draws,
        "seed": request.seed,
        "cautions": cautions,
    }


def read_items(asked: Sequence[AskedItem]) -> list[Item]:
    """Return the items asked for, a refusal naming items.N.field."""
    items = []
    for position, each in enumerate(asked):
        try:
            items.append(Item(**vars(each)))
        except Refusal as refusal:
            refusal.field = f"items.{position}.{refusal.field}"
            raise
    return items


def totals(cost: Measure, discount: float) -> list[dict[str, Any]]:
    """Return the cost of the whole horizon at the chosen discount and at the usual ones."""
    rates = [discount, *(rate for rate in DISCOUNTS if rate != discount)]
    return [
        {
            "percent": rate,
            "cost": Measure(
                np.atleast_1d(present_value(cost.expected, rate)),
                present_value(cost.drawn, rate)[:, np.newaxis],
            ).bands()[0],
        }
        for rate in rates
    ]


def _line(
    position: int, line: Line, baseline: Outlook, monthly: list[Measure], closing: int
) -> tuple[dict[str, Any], list[Caution]]:
    cautions, beds = [], None
    if line.kind == "patients":
        need = Measure(baseline.expected.under_care[1:], baseline.drawn.under_care[:, 1:])
    else:
        need = monthly[line.item]
    if line.kind == "beds":
        mean = beds_in_use(need.expected)
        check_beds(float(mean[0]), line.limit, f"lines.{position}.limit")
        need = Measure(busy_day(mean), busy_day(beds_in_use(need.drawn)))
        beds = {
            name: {"mean": mean[at], "busy": need.expected[at], "utilisation": mean[at] / line.limit}
            for name, at in (("now", 0), ("last", -1))
        }
        if mean[-1] >= line.limit:
            ends = months_after(closing, int(np.argmax(mean >= line.limit)) + 1)
            cautions.append(Caution("beds_never_enough", {"name": line.name, "start": ends}))
    when: Passing = passing(need.expected, need.drawn, line.limit)

    def day(month: int | None) -> dict[str, Any] | None:
        return None if month is None else {"month": month, "ends": months_after(closing, month)}

    told = {
        "kind": line.kind,
        "name": line.name,
        "item": line.item,
        "limit": line.limit,
        "need": when.need,
        "passed_in": when.passed_in,
        "passed_by": when.passed_by,
        "expected_month": day(when.expected_month),
        "likely_month": day(when.likely_month),
        "unlikely_month": day(when.unlikely_month),
        "beds": beds,
    }
    return told, cautions


TASKS = {"caseload.resources": (ResourcesRequest, resources)}
