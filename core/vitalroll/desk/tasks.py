"""Every task by name, with the class that checks its request.

A task is a function of (memory, request, report) and returns dataclasses, dicts, lists,
arrays, strings and numbers. One module for each room; this table only gathers them.
"""

from __future__ import annotations

from vitalroll.desk import (
    about,
    caseload_tasks,
    comparison_tasks,
    competing_tasks,
    counts_tasks,
    district_tasks,
    findings_tasks,
    lever_tasks,
    loss_tasks,
    meaning_tasks,
    outcome_tasks,
    planning_tasks,
    profile_tasks,
    rank_tasks,
    rate_tasks,
    register_tasks,
    resource_tasks,
    settings_tasks,
    time_tasks,
    trust_tasks,
)

TASKS = {
    **about.TASKS,
    **caseload_tasks.TASKS,
    **comparison_tasks.TASKS,
    **competing_tasks.TASKS,
    **counts_tasks.TASKS,
    **district_tasks.TASKS,
    **findings_tasks.TASKS,
    **loss_tasks.TASKS,
    **meaning_tasks.TASKS,
    **lever_tasks.TASKS,
    **outcome_tasks.TASKS,
    **planning_tasks.TASKS,
    **profile_tasks.TASKS,
    **rank_tasks.TASKS,
    **rate_tasks.TASKS,
    **register_tasks.TASKS,
    **resource_tasks.TASKS,
    **settings_tasks.TASKS,
    **time_tasks.TASKS,
    **trust_tasks.TASKS,
}
