"""What engine this is."""

from __future__ import annotations

from dataclasses import dataclass
from typing import Any

import vitalroll
from vitalroll.desk.memory import Memory


@dataclass(frozen=True)
class AboutRequest:
    """No fields."""


def about(memory: Memory, request: AboutRequest, report: Any) -> dict[str, str]:
    """Return the engine's version."""
    return {"version": vitalroll.__version__}


TASKS = {"about": (AboutRequest, about)}
