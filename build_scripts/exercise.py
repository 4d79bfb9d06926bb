"""Every task of the desk carried out once; a refusal is a failure.

The build traces this inside Pyodide to learn which files the engine touches, and carries it out
again with nothing but the pack. It needs only the engine, numpy and the demo register.
"""

from __future__ import annotations

import json

import vitalroll.desk


def everything() -> None:
    """Carry out every task; raise RuntimeError at the first refusal."""
    desk = vitalroll.desk.Desk()
    ask(desk, "about", {})


def ask(desk: vitalroll.desk.Desk, task: str, request: dict) -> dict:
    """Return the answer to one task."""
    said = desk.answer(task, request)
    if "refusal" in said:
        raise RuntimeError(f"{task} was refused: {json.dumps(said['refusal'])}")
    return said["answer"]
