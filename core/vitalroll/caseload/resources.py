"""What a caseload takes: visits, medicine and money for each patient-year of care."""

from __future__ import annotations

import math
from dataclasses import dataclass, fields

import numpy as np

from vitalroll.errors import Refusal


@dataclass(frozen=True)
class PerPatientYear:
    """What one patient under care for one year takes, in the person's own units.

    Raises
    ------
    Refusal
        ``out_of_range`` with the field, for a negative or infinite amount.
    """

    visits: float = 0.0
    medicine_units: float = 0.0
    cost: float = 0.0

    def __post_init__(self) -> None:
        for name, given in self.amounts().items():
            if not 0 <= given < math.inf:
                raise Refusal(
                    "out_of_range", field=f"resources.{name}", given=given, least=0.0, greatest=math.inf
                )

    def amounts(self) -> dict[str, float]:
        """Return the amounts by name."""
        return {field.name: getattr(self, field.name) for field in fields(self)}

    def needed(self, patient_years: np.ndarray) -> dict[str, np.ndarray]:
        """Return what ``patient_years`` (any shape) of care take, by name, in the same shape."""
        return {name: amount * patient_years for name, amount in self.amounts().items()}
