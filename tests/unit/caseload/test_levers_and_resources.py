"""What-if percentages and amounts per patient-year."""

from __future__ import annotations

import math

import numpy as np
import pytest

from vitalroll.caseload.resources import PerPatientYear
from vitalroll.caseload.scenario import WhatIf
from vitalroll.errors import Refusal
from vitalroll.outcomes.competing import WAYS_OF_LEAVING
from vitalroll.register.cohort import DEATHS


def test_only_the_hazards_named_are_multiplied():
    kept = dict(zip(WAYS_OF_LEAVING, WhatIf(fewer_lost=30, fewer_deaths=100).hazards_kept, strict=True))
    assert kept.pop("lost") == pytest.approx(0.7)
    assert [kept.pop(death) for death in DEATHS] == [0, 0, 0]
    assert set(kept.values()) == {1.0}
    assert WhatIf(fewer_newcomers=25).newcomers_kept == 0.75


@pytest.mark.parametrize("name", ["fewer_newcomers", "fewer_lost", "fewer_deaths"])
@pytest.mark.parametrize("given", [-1, 100.5, math.nan])
def test_a_percentage_below_0_or_above_100_is_refused_by_its_field(name, given):
    with pytest.raises(Refusal) as refused:
        WhatIf(**{name: given})
    assert (refused.value.code, refused.value.field) == ("out_of_range", f"what_if.{name}")


def test_a_change_cannot_begin_before_the_first_year():
    with pytest.raises(Refusal, match="out_of_range"):
        WhatIf(from_year=0)


def test_resources_are_amounts_times_patient_years():
    needed = PerPatientYear(visits=4, cost=12.5).needed(np.array([[10.0, 20.0]]))
    assert needed["visits"].tolist() == [[40, 80]]
    assert needed["cost"].tolist() == [[125, 250]]
    assert needed["medicine_units"].tolist() == [[0, 0]]


@pytest.mark.parametrize("wrong", [-1.0, math.inf, math.nan])
def test_a_negative_or_endless_amount_is_refused(wrong):
    with pytest.raises(Refusal) as refused:
        PerPatientYear(medicine_units=wrong)
    assert refused.value.field == "resources.medicine_units"
