"""Answers become data that JSON can carry, with nothing lost without a word; refusals are answers."""

import json
from dataclasses import dataclass
from types import MappingProxyType

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st

import vitalroll
from vitalroll.desk import answer
from vitalroll.desk.plain import plain
from vitalroll.numbers import Estimate


@dataclass(frozen=True)
class Result:
    estimate: Estimate
    counts: np.ndarray
    notes: tuple


def test_results_of_every_kind():
    """Dataclasses, arrays, NumPy numbers, tuples and mappings."""
    nan = float("nan")
    result = Result(
        Estimate(0.5, 0.25, nan, float("inf")),
        np.array([[1, 2], [3, 4]]),
        (
            np.int64(3),
            np.bool_(True),
            np.float64(0.1),
            None,
            "é",
            MappingProxyType({"a": -np.inf}),
            np.array(2.5),
        ),
    )
    found, nulls = plain(result)
    assert found == {
        "estimate": {"value": 0.5, "lower": 0.25, "upper": None, "standard_error": None},
        "counts": [[1, 2], [3, 4]],
        "notes": [3, True, 0.1, None, "é", {"a": None}, 2.5],
    }
    assert nulls == [
        {"path": "estimate.upper", "at": None, "reason": "not_a_number"},
        {"path": "estimate.standard_error", "at": None, "reason": "plus_infinity"},
        {"path": "notes.5.a", "at": None, "reason": "minus_infinity"},
    ]
    json.dumps(found, allow_nan=False)


def test_nulls_in_an_array_are_listed_together():
    """One entry for each reason."""
    found, nulls = plain({"upper": np.array([np.nan, 1, np.inf, np.nan])})
    assert found == {"upper": [None, 1, None, None]}
    assert nulls == [
        {"path": "upper", "at": [0, 3], "reason": "not_a_number"},
        {"path": "upper", "at": [2], "reason": "plus_infinity"},
    ]


@given(st.lists(st.floats()))
def test_every_null_is_accounted_for(values):
    """Finite numbers come through exactly; every other one is listed, whether in an array or a list."""
    for form in (np.array(values, dtype=float), values):
        found, nulls = plain(form)
        count = sum(1 if null["at"] is None else len(null["at"]) for null in nulls)
        assert count == found.count(None) == sum(not np.isfinite(value) for value in values)
        kept = [value for value in values if np.isfinite(value)]
        assert [value for value in found if value is not None] == kept
        json.dumps(found, allow_nan=False)


def test_what_is_not_plain_is_a_fault_of_ours():
    """A task that returns something else fails loudly in its tests, with the place."""
    with pytest.raises(TypeError, match=r"set at a\.0"):
        plain({"a": [{1, 2}]})


def test_the_door_answers_and_refuses():
    """An answer, an unknown task and a field that does not exist."""
    assert answer("about", {}) == {"answer": {"version": vitalroll.__version__}, "nulls": []}
    assert answer("prophecy", {})["refusal"] == {
        "code": "unknown_task",
        "parameters": {"task": "prophecy"},
        "field": "task",
        "line": None,
    }
    assert answer("about", {"x": 1})["refusal"]["field"] == "x"
