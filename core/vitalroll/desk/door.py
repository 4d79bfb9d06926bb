"""Where a request comes in and an answer or a refusal goes out."""

from __future__ import annotations

from collections.abc import Callable
from typing import Any

from vitalroll.desk.fields import read_request
from vitalroll.desk.memory import Memory
from vitalroll.desk.plain import plain
from vitalroll.desk.tasks import TASKS
from vitalroll.errors import Refusal

Report = Callable[[str, int, int], None]
"""Called now and then by long work with (stage, done, total)."""


def _silent(stage: str, done: int, total: int) -> None:
    """Report to nobody."""


class Desk:
    """Answers tasks about one opened register at a time.

    The register that was opened and the cohort built from it are the only things a desk
    remembers; ``register.forget`` drops both.
    """

    def __init__(self) -> None:
        self._memory = Memory()

    @staticmethod
    def tasks() -> tuple[str, ...]:
        """Return the names of all tasks."""
        return tuple(TASKS)

    def answer(self, task: str, request: dict[str, Any], report: Report = _silent) -> dict[str, Any]:
        """Carry out a task.

        Parameters
        ----------
        task : str
            A name from ``vitalroll.desk.tasks.TASKS``.
        request : dict
            JSON-safe data, except that the content of a file is bytes. The fields of each task
            are those of its request class.
        report : callable, optional
            Called with (stage, done, total) during long work.

        Returns
        -------
        dict
            Either ``{"answer": ..., "nulls": [...]}`` or
            ``{"refusal": {"code", "parameters", "field", "line"}}``. Always JSON-safe.
        """
        try:
            if task not in TASKS:
                raise Refusal("unknown_task", field="task", task=task)
            shape, carry_out = TASKS[task]
            result = carry_out(self._memory, read_request(shape, request), report)
        except Refusal as refusal:
            parameters, _ = plain(dict(refusal.parameters))
            return {
                "refusal": {
                    "code": refusal.code,
                    "parameters": parameters,
                    "field": refusal.field,
                    "line": refusal.line,
                }
            }
        answer, nulls = plain(result)
        return {"answer": answer, "nulls": nulls}


answer = Desk().answer
"""The door of the desk that the page uses: ``answer(task, request) -> dict``."""
