"""Which groups are shown, which are not and why."""

import pytest

from vitalroll.errors import Refusal
from vitalroll.outcomes.groups import groups_of
from vitalroll.register.cohort import Categorical


def refusal_of(cohort, group):
    with pytest.raises(Refusal) as refused:
        groups_of(cohort, group)
    return refused.value


def test_all_together(cohort_of):
    """Without a group there is one table, of everybody."""
    groups = groups_of(cohort_of([1, 2], "d+"), None)
    assert list(groups.tables) == [None]
    assert groups.tables[None].n == 2


def test_groups_that_cannot_be_shown_are_named(cohort_of):
    """Nobody, a single patient, and patients who were never at risk."""
    cohort = cohort_of(
        [1, 2, 3, 5, 5, 9], "d+dd++", entries=[0, 0, 0, 5, 5, 0], groups=["a", "a", "b", "c", "c", None]
    )
    covariate = cohort.covariates["c0"]
    cohort.covariates["c0"] = Categorical("Group", (*covariate.levels, "empty"), covariate.codes)
    groups = groups_of(cohort, "c0")
    assert list(groups.tables) == ["a"]
    assert [(left.level, left.code) for left in groups.left_out] == [
        ("b", "one_patient"),
        ("c", "never_at_risk"),
        ("empty", "no_patients"),
    ]
    assert [(c.code, dict(c.parameters)) for c in groups.cautions] == [("group_not_recorded", {"n": 1})]


@pytest.mark.parametrize("levels", [21, 500])
def test_too_many_groups_are_refused(cohort_of, levels):
    """More than twenty: to be merged first."""
    names = [f"village {i}" for i in range(levels)]
    refusal = refusal_of(cohort_of(range(1, levels + 1), "d" * levels, groups=names), "c0")
    assert (refusal.code, refusal.field) == ("too_many_groups", "group")
    assert refusal.parameters == {"covariate": "c0", "groups": levels, "most": 20}


def test_levels_without_patients_do_not_count_as_groups(cohort_of):
    """Thirty levels of which two have patients can be shown."""
    cohort = cohort_of([1, 2, 3, 4], "dd++", groups=["a", "b", "a", "b"])
    covariate = cohort.covariates["c0"]
    more = (*covariate.levels, *(f"unused {i}" for i in range(28)))
    cohort.covariates["c0"] = Categorical("Group", more, covariate.codes)
    groups = groups_of(cohort, "c0")
    assert list(groups.tables) == ["a", "b"]
    assert len(groups.left_out) == 28


def test_nobody_and_one_patient_are_refused(cohort_of):
    """Results describe groups."""
    assert refusal_of(cohort_of([], ""), None).code == "no_patients"
    assert refusal_of(cohort_of([4], "d"), None).code == "one_patient"
    assert refusal_of(cohort_of([4, 6], "dd", entries=[4, 6]), None).code == "nobody_at_risk"
    assert refusal_of(cohort_of([4, 6], "dd", groups=["a", "b"]), "c0").code == "groups_too_small"
    assert refusal_of(cohort_of([4, 6], "dd"), "c7").code == "unknown_covariate"
