"""Limits of Whipple's index, slips between names and the calendar, against general libraries."""

from __future__ import annotations

import difflib
import random

import numpy as np
import pandas as pd
import pytest
from statsmodels.stats.proportion import proportion_confint

from vitalroll.register.digit_preference import age_heaping, days_of_month
from vitalroll.register.findings.alike import slips


@pytest.mark.parametrize("seed", range(5))
def test_limits_of_whipples_index_are_wilsons(seed: int) -> None:
    ages = np.random.default_rng(seed).integers(0, 100, 200).astype(float)
    found = age_heaping(ages)
    lower, upper = proportion_confint(found.digits[0] + found.digits[5], found.n, method="wilson")
    assert (found.lower, found.upper) == pytest.approx((500 * lower, 500 * upper), rel=1e-12)


def test_days_of_the_month_are_those_of_pandas() -> None:
    dates = pd.date_range("1999-11-20", "2031-02-07", freq="5D")
    ordinals = np.array([each.toordinal() for each in dates])
    counted = dates.day.value_counts().reindex(range(1, 32), fill_value=0)
    assert [each.count for each in days_of_month(ordinals)] == counted.tolist()


@pytest.mark.parametrize("seed", range(50))
def test_slips_are_never_more_than_the_edits_difflib_needs(seed: int) -> None:
    """difflib finds a way, not always the shortest; equal names need none."""
    draw = random.Random(seed)
    one = "".join(draw.choices("abcde", k=draw.randint(0, 12)))
    other = "".join(draw.choices("abcde", k=draw.randint(0, 12)))
    steps = difflib.SequenceMatcher(None, one, other, autojunk=False).get_opcodes()
    way = sum(max(b - a, d - c) for kind, a, b, c, d in steps if kind != "equal")
    assert abs(len(one) - len(other)) <= slips(one, other, 99) <= way
    assert slips(one, other, 99) == slips(other, one, 99)
    assert slips(one, one, 99) == 0
