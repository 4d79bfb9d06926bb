"""The risk table counts who entered, was at risk and left, day by day."""

import numpy as np
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from vitalroll.errors import Refusal
from vitalroll.outcomes.risk_table import count_risk, risk_table, risk_tables_by
from vitalroll.register.cohort import MEANINGS

DIED = MEANINGS.index("died_of_disease")


@st.composite
def follow_up(draw, longest=12):
    """Entries, exits and outcomes of a few patients, with many ties and some delayed entries."""
    n = draw(st.integers(1, 25))
    entry = np.array(draw(st.lists(st.sampled_from([0, 0, 0, 1, 2, 5]), min_size=n, max_size=n)))
    length = np.array(draw(st.lists(st.integers(0, longest), min_size=n, max_size=n)))
    outcome = np.array(draw(st.lists(st.integers(0, len(MEANINGS) - 1), min_size=n, max_size=n)))
    return entry, entry + length, outcome


def test_by_hand(table_of):
    """Five patients, one of whom came late: who is at risk on a day entered before it."""
    table = table_of([2, 3, 3, 5, 6], "d+d+d", entries=[0, 0, 0, 2, 0])
    assert table.time.tolist() == [2, 3, 5, 6]
    assert table.at_risk.tolist() == [4, 4, 2, 1]
    assert table.entered.tolist() == [1, 0, 0, 0]
    assert table.events({"died_of_disease"}).tolist() == [1, 1, 0, 1]
    assert table.censored({"died_of_disease"}).tolist() == [0, 1, 1, 0]
    assert (table.n, table.from_start, table.person_days, table.never_at_risk) == (5, 4, 17, 0)


def test_an_outcome_on_the_first_day_counts(table_of):
    """Those observed from the start are at risk on day 0 as well."""
    table = table_of([0, 0, 4], "d++")
    assert table.at_risk.tolist() == [3, 1]
    assert table.events({"died_of_disease"}).tolist() == [1, 0]


def test_delayed_entry_and_exit_on_one_day_are_never_at_risk(table_of):
    """Such a patient is in no column, and is counted apart."""
    table = table_of([4, 4], "dd", entries=[4, 0])
    assert (table.n, table.never_at_risk, table.at_risk.tolist()) == (1, 1, [1])


@given(follow_up())
@settings(deadline=None)
def test_agrees_with_counting_every_patient_on_every_day(rows):
    """The slow and obvious count, patient by patient."""
    entry, exit, outcome = rows
    table = count_risk(entry, exit, outcome)
    seen = ~((entry > 0) & (entry == exit))
    for i, day in enumerate(table.time):
        at_risk = seen & ((entry < day) | (entry == 0)) & (exit >= day)
        assert table.at_risk[i] == at_risk.sum()
        for code in range(len(MEANINGS)):
            assert table.left[i, code] == (seen & (exit == day) & (outcome == code)).sum()
        assert table.entered[i] == (seen & (entry == day) & (entry > 0)).sum()
    assert table.left.sum() == table.n == seen.sum()
    days = np.arange(0.5, 20, 0.75)
    expected = [(seen & (entry < day) & (exit >= day)).sum() for day in days]
    assert table.at_risk_on(days).tolist() == expected


@given(follow_up())
@settings(deadline=None)
def test_splitting_follow_up_changes_nothing(rows):
    """A patient cut in two (leaving on a day, entering again that day) is at risk on the same days."""
    entry, exit, outcome = rows
    middle = (entry + exit) // 2
    split = (middle > entry) & (middle < exit)
    whole = count_risk(entry, exit, outcome)
    parts = count_risk(
        np.concatenate((entry, middle[split])),
        np.concatenate((np.where(split, middle, exit), exit[split])),
        np.concatenate((np.where(split, 0, outcome), outcome[split])),
    )
    same = np.isin(parts.time, whole.time)
    assert parts.at_risk[same].tolist() == whole.at_risk.tolist()
    assert parts.left[same][:, 1:].tolist() == whole.left[:, 1:].tolist()
    assert parts.person_days == whole.person_days


def test_follow_up_of_centuries_is_counted_the_same():
    """Beyond two centuries days are sorted, not counted; the table is the same."""
    rng = np.random.default_rng(3)
    entry = rng.choice([0, 0, 3, 8], 200)
    exit = entry + rng.integers(0, 30, 200)
    outcome = rng.integers(0, len(MEANINGS), 200)
    short = count_risk(entry, exit, outcome)
    long = count_risk(np.append(entry, 0), np.append(exit, 100_000), np.append(outcome, 0))
    assert long.time[:-1].tolist() == short.time.tolist()
    assert long.at_risk[:-1].tolist() == (short.at_risk + 1).tolist()
    assert long.left[:-1].tolist() == short.left.tolist()
    assert long.entered[:-1].tolist() == short.entered.tolist()


def test_nobody(table_of):
    """No patients make a table without rows."""
    table = table_of([], "")
    assert (len(table.time), table.n, table.at_risk_on(np.array([3.0])).tolist()) == (0, 0, [0])


def test_groups(cohort_of):
    """Patients with nothing recorded are in no group; the groups' counts add up to theirs."""
    cohort = cohort_of([1, 2, 3, 4], "d+d+", groups=["a", "b", None, "a"])
    tables = risk_tables_by(cohort, "c0")
    assert {level: table.n for level, table in tables.items()} == {"a": 2, "b": 1}
    assert risk_tables_by(cohort, None)[None].n == risk_table(cohort).n == 4


@pytest.mark.parametrize(
    ("interest", "code"),
    [
        ((), "no_outcome_of_interest"),
        (("under_care",), "under_care_is_not_an_outcome"),
        (("vanished",), "unknown_meaning"),
    ],
)
def test_what_is_no_outcome_is_refused(table_of, interest, code):
    """An empty, impossible or unknown choice of outcome has a name."""
    with pytest.raises(Refusal) as refused:
        table_of([1], "d").events(interest)
    assert refused.value.code == code
