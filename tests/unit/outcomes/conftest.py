"""Small registers for the tests of outcomes."""

import numpy as np
import pytest

from vitalroll.outcomes.risk_table import count_risk
from vitalroll.register.cohort import MEANINGS, Categorical, Cohort

_SHORT = {"d": "died_of_disease", "+": "under_care", "l": "lost"}


def _code(word):
    return MEANINGS.index(_SHORT.get(word, word))


def _rows(exits, outcomes, entries):
    entry = np.zeros(len(exits), int) if entries is None else np.array(entries, int)
    return entry, np.array(exits, int), np.array([_code(word) for word in outcomes], int)


@pytest.fixture(scope="session")
def table_of():
    """Make a risk table from exits, outcomes (d died, + under care, l lost, or a meaning) and entries."""

    def make(exits, outcomes, entries=None):
        return count_risk(*_rows(exits, outcomes, entries))

    return make


@pytest.fixture(scope="session")
def cohort_of():
    """Make a cohort likewise; everybody starts on day 730000, the register closes ``closing`` days later."""

    def make(exits, outcomes, entries=None, closing=4000, groups=None):
        entry, exit, outcome = _rows(exits, outcomes, entries)
        covariates = {}
        if groups is not None:
            levels = tuple(dict.fromkeys(level for level in groups if level is not None))
            codes = np.array([-1 if level is None else levels.index(level) for level in groups])
            covariates["c0"] = Categorical("Group", levels, codes)
        return Cohort(
            entry=entry,
            exit=exit,
            outcome=outcome,
            start=np.full(len(exit), 730_000),
            line=np.arange(len(exit)) + 2,
            closing=730_000 + closing,
            covariates=covariates,
        )

    return make
