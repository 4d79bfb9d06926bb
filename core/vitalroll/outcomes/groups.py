"""The groups that outcomes are shown for: which can be, which cannot and why."""

from __future__ import annotations

from dataclasses import dataclass

import numpy as np

from vitalroll.errors import Caution, Refusal
from vitalroll.outcomes.risk_table import RiskTable, risk_table, risk_tables_by
from vitalroll.register.cohort import Cohort

MOST_GROUPS = 20
"""More curves than this cannot be told apart; the levels are to be merged first."""


@dataclass(frozen=True)
class LeftOut:
    """A level that is not shown: ``no_patients``, ``one_patient`` or ``never_at_risk``."""

    level: str
    code: str


@dataclass(frozen=True)
class Groups:
    """A risk table for each group shown (key None when ungrouped), and what was left out."""

    tables: dict[str | None, RiskTable]
    left_out: tuple[LeftOut, ...]
    cautions: tuple[Caution, ...]


def groups_of(cohort: Cohort, group: str | None) -> Groups:
    """Return the risk tables to describe a cohort by, as a whole or by a categorical covariate.

    Results describe groups and never one person, so one patient alone is not shown.

    Raises
    ------
    Refusal
        ``no_patients`` or ``one_patient`` for the cohort, ``nobody_at_risk`` when all had delayed
        entry and exit on the same day, ``too_many_groups`` (``covariate``, ``groups``, ``most``),
        ``groups_too_small`` when no group can be shown, ``unknown_covariate`` and
        ``group_is_numeric``.

    Cautions
    --------
    ``group_not_recorded`` (``n``): patients with nothing in the grouping column are in no group.
    """
    if len(cohort) == 0:
        raise Refusal("no_patients")
    if len(cohort) == 1:
        raise Refusal("one_patient")
    if group is None:
        table = risk_table(cohort)
        if table.n == 0:
            raise Refusal("nobody_at_risk")
        return Groups({None: table}, (), ())
    covariate = cohort.grouping(group)
    recorded = covariate.codes >= 0
    filled = len(np.unique(covariate.codes[recorded]))
    if filled > MOST_GROUPS:
        raise Refusal("too_many_groups", field="group", covariate=group, groups=filled, most=MOST_GROUPS)
    tables: dict[str | None, RiskTable] = {}
    left_out = []
    for level, table in risk_tables_by(cohort, group).items():
        patients = table.n + table.never_at_risk
        if patients > 1 and table.n:
            tables[level] = table
        elif patients <= 1:
            left_out.append(LeftOut(str(level), "one_patient" if patients else "no_patients"))
        else:
            left_out.append(LeftOut(str(level), "never_at_risk"))
    if not tables:
        raise Refusal("groups_too_small", field="group", covariate=group)
    missing = int(np.count_nonzero(~recorded))
    cautions = (Caution("group_not_recorded", {"n": missing}),) if missing else ()
    return Groups(tables, tuple(left_out), cautions)
