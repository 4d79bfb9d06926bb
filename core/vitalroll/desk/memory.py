"""What the desk remembers between tasks: one opened register and the cohort built from it."""

from __future__ import annotations

from dataclasses import dataclass
from typing import Any

from vitalroll.errors import Refusal
from vitalroll.register.cohort import Cohort


@dataclass
class Memory:
    """The opened source and the cohort, or nothing yet."""

    source: Any = None
    built: Cohort | None = None

    def cohort(self) -> Cohort:
        """Return the cohort; refuse when no register has been opened and understood."""
        if self.built is None:
            raise Refusal("no_register")
        return self.built

    def forget(self) -> None:
        """Drop everything about patients."""
        self.source = None
        self.built = None
