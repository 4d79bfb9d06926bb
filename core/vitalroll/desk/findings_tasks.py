"""What may be wrong in the opened register, and what each repair would change: ``register.findings``."""

from __future__ import annotations

from collections.abc import Callable, Mapping
from dataclasses import dataclass, replace
from typing import Any

import numpy as np

from vitalroll.desk.memory import Memory
from vitalroll.desk.register_tasks import MOST_LISTED, BuildRequest, choices_of, opened_register
from vitalroll.errors import Caution
from vitalroll.numbers import DAYS_PER_YEAR, NOT_GIVEN, Estimate
from vitalroll.outcomes.product_limit import product_limit
from vitalroll.outcomes.risk_table import count_risk
from vitalroll.register.build import follow
from vitalroll.register.cohort import DEATHS, meaning_code
from vitalroll.register.findings.finding import Finding, Repair, Seen
from vitalroll.register.findings.mending import CODES, before_and_after, find, look, mend
from vitalroll.register.plan import FEW_LINES, Plan

HEADLINE_YEARS = 5
MOST_UNITS = 300
"""Of one finding so many rows are listed to be accepted or declined one by one."""

Report = Callable[[str, int, int], None]


@dataclass(frozen=True)
class Headline:
    """The result that a repair may change: patients, deaths, losses, and survival after five years."""

    n: int
    events: int
    lost: int
    survival: Estimate


def findings(memory: Memory, request: BuildRequest, report: Report) -> dict[str, Any]:
    """Answer ``register.findings``: what may be wrong, and what repairing it would change.

    Returns
    -------
    dict
        ``years`` of the headline; ``untouched`` and ``now``, headlines {n, events, lost, survival
        (Estimate)} without any repair and with those accepted; ``findings``: {code, severity, count,
        lines (the first 20), parameters, repair}, where ``repair`` is null or {kind, units, accepted,
        declined (lines), overruled, without, with (headlines), alternatives: [{kind, headline}] of
        other ways to repair it, listed: [{line, declined, changes: [{line, what, before, after}]}]};
        ``corrections``: {line, code, what, before, after};
        ``cautions``.

        ``without`` and ``with`` hold every other accepted repair: their difference is what this one
        does. ``overruled`` units had been changed by a repair before it.

    Refusals: those of ``build.build``, ``no_register``. Cautions: ``corrections_shortened``
    (``listed``, ``n``).
    """
    plan = Plan(opened_register(memory), choices_of(request))
    seen = look(plan)
    accepted = request.repairs
    find(seen, [code for code in accepted if code not in CODES])
    made = find(seen)
    repairable = [finding for finding in made if finding.repair is not None]
    steps = len(repairable) + 2
    mended = mend(seen, made, accepted)
    now = _headline(plan, seen, made, accepted)
    answers = []
    for done, finding in enumerate(made):
        report("findings", min(done, steps), steps)
        answers.append(_answer(plan, seen, made, finding, accepted, now, mended.overruled))
    report("findings", steps, steps)
    cautions = []
    if len(mended.corrections) > MOST_LISTED:
        shortened = {"listed": MOST_LISTED, "n": len(mended.corrections)}
        cautions.append(Caution("corrections_shortened", shortened))
    return {
        "years": HEADLINE_YEARS,
        "untouched": _headline(plan, seen, made, {}) if accepted else now,
        "now": now,
        "findings": answers,
        "corrections": mended.corrections[:MOST_LISTED],
        "cautions": cautions,
    }


TASKS = {"register.findings": (BuildRequest, findings)}


def _headline(
    plan: Plan, seen: Seen, made: list[Finding], accepted: Mapping[str, tuple[int, ...]]
) -> Headline:
    followed = follow(plan, mend(seen, made, accepted))
    outcome = followed.outcome
    n = len(outcome)
    if not n:
        return Headline(0, 0, 0, NOT_GIVEN)
    curve = product_limit(count_risk(followed.entry, followed.exit, outcome), DEATHS)
    lost = int(np.count_nonzero(outcome == meaning_code("lost")))
    return Headline(n, curve.events, lost, curve.at(HEADLINE_YEARS * DAYS_PER_YEAR))


def _answer(
    plan: Plan,
    seen: Seen,
    made: list[Finding],
    finding: Finding,
    accepted: Mapping[str, tuple[int, ...]],
    now: Headline,
    overruled: Mapping[str, int],
) -> dict[str, Any]:
    line = plan.register.source.table.line
    answer: dict[str, Any] = {
        "code": finding.code,
        "severity": finding.severity,
        "count": finding.parameters.get("n", len(finding.rows)),
        "lines": line[finding.rows[:FEW_LINES]].tolist(),
        "parameters": finding.parameters,
        "repair": None,
    }
    if finding.repair is None:
        return answer
    others = {code: lines for code, lines in accepted.items() if code != finding.code}
    is_accepted = finding.code in accepted
    alone = others | {finding.code: accepted.get(finding.code, ())}
    declined = set(accepted.get(finding.code, ()))
    answer["repair"] = {
        "kind": finding.repair.kind,
        "units": len(finding.repair.units),
        "accepted": is_accepted,
        "declined": sorted(declined),
        "overruled": overruled.get(finding.code, 0),
        "without": _headline(plan, seen, made, others) if is_accepted else now,
        "with": now if is_accepted else _headline(plan, seen, made, others | {finding.code: ()}),
        "alternatives": [
            {"kind": other.kind, "headline": _headline(plan, seen, _instead(made, finding, other), alone)}
            for other in finding.alternatives
        ],
        "listed": _listed(seen, finding.repair, line, declined),
    }
    return answer


def _instead(made: list[Finding], finding: Finding, other: Repair) -> list[Finding]:
    """Return the findings with one repaired in another way."""
    return [replace(each, repair=other) if each is finding else each for each in made]


def _listed(seen: Seen, repair: Repair, line: np.ndarray, declined: set[int]) -> list[dict[str, Any]]:
    """Return the first units of a repair with what it would change in each."""
    units = repair.units[:MOST_UNITS]
    changes: dict[int, list[dict[str, Any]]] = {unit: [] for unit in units.tolist()}
    for change in repair.changes:
        shown = np.isin(change.unit, units)
        for row, value, unit in zip(
            change.rows[shown].tolist(),
            change.values[shown].tolist(),
            change.unit[shown].tolist(),
            strict=True,
        ):
            before, after = before_and_after(seen, change.what, row, value)
            told = {"line": int(line[row]), "what": change.what, "before": before, "after": after}
            changes[unit].append(told)
    return [
        {"line": int(line[unit]), "declined": int(line[unit]) in declined, "changes": told}
        for unit, told in changes.items()
    ]
