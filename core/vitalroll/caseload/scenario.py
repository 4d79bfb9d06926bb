"""A what-if beside the baseline: fewer newcomers, fewer lost, fewer deaths, from a year on."""

from __future__ import annotations

from dataclasses import dataclass

import numpy as np

from vitalroll.errors import Refusal
from vitalroll.outcomes.competing import WAYS_OF_LEAVING
from vitalroll.register.cohort import DEATHS


@dataclass(frozen=True)
class WhatIf:
    """A change against the baseline.

    Reductions of deaths and losses multiply the hazards, so that they combine properly: a
    patient who is not lost can still die, and the other way round.

    Parameters
    ----------
    fewer_newcomers, fewer_lost, fewer_deaths : float
        Percentages from 0 (no change) to 100 (none at all). Deaths are all three kinds.
    from_year : int
        The projected year, counted from 1, from whose first day the change holds.

    Raises
    ------
    Refusal
        ``out_of_range`` with the field, for a percentage below 0 or above 100 or a year below 1.
    """

    fewer_newcomers: float = 0.0
    fewer_lost: float = 0.0
    fewer_deaths: float = 0.0
    from_year: int = 1

    def __post_init__(self) -> None:
        for name in ("fewer_newcomers", "fewer_lost", "fewer_deaths"):
            given = getattr(self, name)
            if not 0 <= given <= 100:
                raise Refusal("out_of_range", field=f"what_if.{name}", given=given, least=0.0, greatest=100.0)
        if self.from_year < 1:
            raise Refusal("out_of_range", field="what_if.from_year", given=self.from_year, least=1)

    @property
    def newcomers_kept(self) -> float:
        """What the number of newcomers is multiplied by."""
        return 1 - self.fewer_newcomers / 100

    @property
    def hazards_kept(self) -> np.ndarray:
        """What the hazard of each way of leaving is multiplied by, shape (len(WAYS_OF_LEAVING),)."""
        kept = {"lost": 1 - self.fewer_lost / 100} | dict.fromkeys(DEATHS, 1 - self.fewer_deaths / 100)
        return np.array([kept.get(way, 1.0) for way in WAYS_OF_LEAVING])
