"""Numbers: decimal point or comma, thousands marks, and what is no number."""

from __future__ import annotations

import numpy as np
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from vitalroll.register.numbers_read import looks_like_number, parse_numbers


@pytest.mark.parametrize(
    ("texts", "values", "decimal"),
    [
        (["1", "2.5", "-3"], [1, 2.5, -3], "point"),
        (["1,5", "2,25", "3"], [1.5, 2.25, 3], "comma"),
        (["1,234.5", "10"], [1234.5, 10], "point"),
        (["1.234,5", "10"], [1234.5, 10], "comma"),
        (["1 080,5", "1\u202f080,5"], [1080.5, 1080.5], "comma"),
        (["1'234.5"], [1234.5], "point"),
        (["1,234", "2.5"], [1234, 2.5], "point"),
        (["٣٫٥", "−2"], [3.5, -2], "point"),
        (["1e3"], [1000], "point"),
    ],
)
def test_these_columns_of_numbers_are_read(texts, values, decimal):
    found = parse_numbers(texts)
    assert found.value.tolist() == values
    assert found.decimal == decimal


@pytest.mark.parametrize(
    "text", ["", "<5", "n/a", "12a", "1,2,3", "nan", "inf", "1_000", "--1", "1e999", "12/3"]
)
def test_what_is_no_number_is_not_read_as_one(text):
    assert np.isnan(parse_numbers([text]).value).all()


def test_one_thousand_or_one_and_a_bit_is_said_to_be_unsettled():
    found = parse_numbers(["1,234", "2,500"])
    assert not found.settled
    assert found.value.tolist() == [1234, 2500]
    assert parse_numbers(["1,234", "2,500"], comma=True).value.tolist() == [1.234, 2.5]


def test_the_way_that_reads_more_rows_wins():
    found = parse_numbers(["1,5", "2.5"], np.array([1, 9]))
    assert found.decimal == "point"
    assert np.isnan(found.value[0])


@settings(deadline=None)
@given(st.lists(st.floats(-1e9, 1e9).map(lambda number: round(number, 3)), min_size=1, max_size=20))
def test_numbers_written_with_a_point_come_back(numbers):
    texts = [format(number, ".3f") for number in numbers]
    assert parse_numbers(texts).value.tolist() == numbers
    assert all(looks_like_number(text) for text in texts)
