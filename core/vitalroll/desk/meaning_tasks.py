"""What stands in a register taken for what it means: silent losses and misspelt values."""

from __future__ import annotations

from collections.abc import Callable
from dataclasses import dataclass, replace
from typing import Any

from vitalroll.desk.memory import Memory
from vitalroll.desk.register_tasks import BuildRequest, choices_of, opened_register
from vitalroll.errors import Caution
from vitalroll.register.build import Followed, follow
from vitalroll.register.dates import Fault
from vitalroll.register.findings.finding import Seen
from vitalroll.register.findings.mending import find, look, mend
from vitalroll.register.plan import Plan
from vitalroll.register.silent_losses import silent_losses
from vitalroll.register.variants import variants

Report = Callable[[str, int, int], None]

RULE = "unseen_for_long"
"""The finding whose repair counts silent losses as losses."""


@dataclass(frozen=True)
class SpellingsRequest:
    """Fields of ``register.spellings``: the columns to look at."""

    columns: tuple[str, ...]


def count_silent_losses(memory: Memory, request: BuildRequest, report: Report) -> dict[str, Any]:
    """Answer ``register.silent_losses``: how many a rule for silent losses would change.

    Returns
    -------
    dict
        ``months`` (chosen), ``counted`` (whether the rule is in force), ``n``, ``under_care``,
        ``unjudged``, ``written_lost``; ``rows``: {months, changed, lost, share}; ``cautions``:
        ``under_care_without_contact`` (``n``, ``of``).

    Other accepted repairs are made first. Refusals: those of ``register.build``.
    """
    _, seen, followed = before_the_rule(memory, request)
    no_contact = seen.rows.end.having(Fault.BLANK)
    found = silent_losses(followed.rows, no_contact, followed.keep, request.unseen_months)
    cautions = []
    if found.unjudged:
        told = {"n": found.unjudged, "of": found.under_care}
        cautions.append(Caution("under_care_without_contact", told))
    return {
        "months": request.unseen_months,
        "counted": RULE in request.repairs,
        "n": found.n,
        "under_care": found.under_care,
        "unjudged": found.unjudged,
        "written_lost": found.written_lost,
        "rows": found.rows,
        "cautions": cautions,
    }


def spellings(memory: Memory, request: SpellingsRequest, report: Report) -> dict[str, Any]:
    """Answer ``register.spellings``: values that are probably another one, misspelt.

    Returns
    -------
    dict
        ``columns``: {column, variants: [{value, count, into, into_count, certain}]}; columns
        without any are left out.

    Refusals: ``no_register``, ``unknown_column``.
    """
    register = opened_register(memory)
    found = []
    for identifier in request.columns:
        values = register.profile(identifier, "columns").values
        listed = [
            {
                "value": values.spelt[variant.value],
                "count": int(values.counts[variant.value]),
                "into": values.spelt[variant.into],
                "into_count": int(values.counts[variant.into]),
                "certain": variant.certain,
            }
            for variant in variants(values)
        ]
        if listed:
            found.append({"column": identifier, "variants": listed})
    return {"columns": found}


def before_the_rule(memory: Memory, request: BuildRequest) -> tuple[Plan, Seen, Followed]:
    """Return who is followed when silent losses are not yet counted as losses."""
    choices = choices_of(request)
    others = {code: lines for code, lines in choices.repairs.items() if code != RULE}
    plan = Plan(opened_register(memory), replace(choices, repairs=others))
    seen = look(plan)
    return plan, seen, follow(plan, mend(seen, find(seen, others) if others else [], others))


TASKS = {
    "register.silent_losses": (BuildRequest, count_silent_losses),
    "register.spellings": (SpellingsRequest, spellings),
}
