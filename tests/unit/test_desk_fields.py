"""Requests are checked field by field, and what is wrong is refused by its name."""

from dataclasses import dataclass
from typing import Annotated, Literal

import pytest

from vitalroll.desk.fields import Between, read_request
from vitalroll.errors import Refusal


@dataclass(frozen=True)
class Stratum:
    label: str
    events: int


@dataclass(frozen=True)
class Request:
    name: str
    content: bytes = b""
    count: int = 1
    share: Annotated[float, Between(0, 100)] = 50.0
    limit: Annotated[float, Between(0)] | None = None
    whole: bool = False
    step: Literal["year", "month"] = "year"
    years: tuple[Annotated[float, Between(0, 150)], ...] = (1.0,)
    roles: dict[str, str] | None = None
    strata: tuple[Stratum, ...] = ()


def refusal_of(**given):
    with pytest.raises(Refusal) as refused:
        read_request(Request, {"name": "x", **given})
    return refused.value.code, refused.value.field


def test_defaults_and_conversions():
    """What JSON and the worker hand over becomes what the request says."""
    request = read_request(
        Request,
        {
            "name": "é",
            "content": bytearray(b"ab"),
            "count": 3.0,
            "share": 12,
            "years": [1, 2.5],
            "roles": {"c0": "start"},
            "strata": [{"label": "men", "events": 4}],
        },
    )
    assert request == Request(
        name="é",
        content=b"ab",
        count=3,
        share=12.0,
        years=(1.0, 2.5),
        roles={"c0": "start"},
        strata=(Stratum("men", 4),),
    )
    assert isinstance(request.count, int)
    assert isinstance(request.share, float)
    assert read_request(Request, {"name": "x", "content": memoryview(b"cd")}).content == b"cd"
    assert read_request(Request, {"name": "x", "limit": None, "roles": None}).roles is None


@pytest.mark.parametrize(
    ("given", "code", "field"),
    [
        ({"nmae": 1}, "unknown_field", "nmae"),
        ({"name": 3}, "wrong_type", "name"),
        ({"name": None}, "wrong_type", "name"),
        ({"content": "text"}, "wrong_type", "content"),
        ({"count": 2.5}, "wrong_type", "count"),
        ({"count": True}, "wrong_type", "count"),
        ({"count": "2"}, "wrong_type", "count"),
        ({"share": True}, "wrong_type", "share"),
        ({"share": 100.5}, "out_of_range", "share"),
        ({"share": float("nan")}, "wrong_type", "share"),
        ({"share": float("inf")}, "wrong_type", "share"),
        ({"share": 10**400}, "wrong_type", "share"),
        ({"limit": -1}, "out_of_range", "limit"),
        ({"whole": 1}, "wrong_type", "whole"),
        ({"step": "week"}, "not_one_of", "step"),
        ({"step": ["year"]}, "not_one_of", "step"),
        ({"years": 3}, "wrong_type", "years"),
        ({"years": "12"}, "wrong_type", "years"),
        ({"years": [1, "x"]}, "wrong_type", "years.1"),
        ({"years": [1, 151]}, "out_of_range", "years.1"),
        ({"roles": ["c0"]}, "wrong_type", "roles"),
        ({"roles": {"c0": 4}}, "wrong_type", "roles.c0"),
        ({"strata": [{"label": "men"}]}, "missing_field", "strata.0.events"),
        ({"strata": [{"label": "men", "events": 1, "x": 1}]}, "unknown_field", "strata.0.x"),
        ({"strata": ["men"]}, "wrong_type", "strata.0"),
    ],
)
def test_each_fault_has_its_code_and_its_field(given, code, field):
    """The dotted path says where."""
    assert refusal_of(**given) == (code, field)


def test_a_missing_field_and_a_request_that_is_none():
    """A request is an object with its required fields."""
    with pytest.raises(Refusal) as refused:
        read_request(Request, {})
    assert (refused.value.code, refused.value.field) == ("missing_field", "name")
    with pytest.raises(Refusal) as refused:
        read_request(Request, [1])
    assert (refused.value.code, refused.value.field) == ("wrong_type", "request")
