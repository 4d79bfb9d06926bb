"""How a register was read, kept in a file without patients and applied to another list."""

from __future__ import annotations

from collections.abc import Callable
from dataclasses import dataclass
from typing import Any

from vitalroll.desk.memory import Memory
from vitalroll.desk.register_tasks import BuildRequest, choices_of, opened_register
from vitalroll.register.plan import Plan
from vitalroll.register.settings import apply_settings, settings_of

Report = Callable[[str, int, int], None]


@dataclass(frozen=True)
class ApplyRequest:
    """Fields of ``register.apply_settings``: the text of a file of settings."""

    text: str


def settings(memory: Memory, request: BuildRequest, report: Report) -> dict[str, Any]:
    """Answer ``register.settings``: the settings as plain data, with nothing of a patient.

    Returns
    -------
    dict
        ``settings`` {kind, version, columns, meanings, blank_meaning, sexes, closing_date,
        unseen_months, repairs}, and ``values_left_out``: values that few rows have are not kept.

    Refusals: those of ``register.build``.
    """
    register, choices = opened_register(memory), choices_of(request)
    Plan(register, choices)
    saved = settings_of(register, choices)
    return {"settings": saved.settings, "values_left_out": saved.values_left_out}


def apply(memory: Memory, request: ApplyRequest, report: Report) -> dict[str, Any]:
    """Answer ``register.apply_settings``: the request of ``register.build`` that the settings make.

    Returns
    -------
    dict
        ``reading`` (the fields of ``register.build``), ``matched`` (columns), ``absent``: {heading,
        role}; ``added`` headings; ``new_values``: {value, count}; ``cautions``.

    Refusals and cautions: those of ``settings.apply_settings``; ``no_register``.
    """
    found = apply_settings(opened_register(memory), request.text)
    return {
        "reading": found.reading,
        "matched": found.matched,
        "absent": found.absent,
        "added": found.added,
        "new_values": found.new_values,
        "cautions": found.cautions,
    }


TASKS = {
    "register.settings": (BuildRequest, settings),
    "register.apply_settings": (ApplyRequest, apply),
}
