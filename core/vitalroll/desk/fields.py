"""Requests checked field by field, so that what is wrong is refused by its name.

A request is a frozen dataclass. Its annotations are the check: ``str``, ``int``, ``float``,
``bool``, ``bytes``, ``Literal``, ``tuple[X, ...]``, ``dict[str, X]``, ``X | None`` and other
request dataclasses. Numbers may carry bounds: ``Annotated[float, Between(0, 100)]``.
"""

from __future__ import annotations

import dataclasses
import math
import sys
import types
from dataclasses import dataclass
from typing import Annotated, Any, Literal, Union, get_args, get_origin, get_type_hints

from vitalroll.errors import Refusal


@dataclass(frozen=True)
class Between:
    """The least and the greatest value that a number may take, both allowed."""

    least: float = -math.inf
    greatest: float = math.inf


def read_request[T](shape: type[T], given: dict[str, Any]) -> T:
    """Turn plain data into a request of the given dataclass.

    Raises
    ------
    Refusal
        ``unknown_field``, ``missing_field``, ``wrong_type`` (with what was expected),
        ``not_one_of`` or ``out_of_range``; always with the dotted path of the field.
    """
    return _dataclass(shape, given, "")


def _dataclass(shape: type, given: Any, path: str) -> Any:
    if not isinstance(given, dict):
        raise Refusal("wrong_type", field=path or "request", expected="object")
    hints = get_type_hints(shape, include_extras=True)
    fields = {field.name: field for field in dataclasses.fields(shape)}
    for name in given:
        if name not in fields:
            raise Refusal("unknown_field", field=_join(path, str(name)))
    values = {}
    for name, field in fields.items():
        if name in given:
            values[name] = _value(hints[name], given[name], _join(path, name))
        elif field.default is dataclasses.MISSING and field.default_factory is dataclasses.MISSING:
            raise Refusal("missing_field", field=_join(path, name))
    return shape(**values)


def _value(hint: Any, given: Any, path: str) -> Any:
    origin = get_origin(hint)
    if origin is Annotated:
        base, *limits = get_args(hint)
        value = _value(base, given, path)
        for limit in limits:
            if value is not None and not limit.least <= value <= limit.greatest:
                raise Refusal(
                    "out_of_range", field=path, given=value, least=limit.least, greatest=limit.greatest
                )
        return value
    if origin in (Union, types.UnionType):
        if given is None:
            return None
        return _value(next(arm for arm in get_args(hint) if arm is not type(None)), given, path)
    if origin is Literal:
        if given not in get_args(hint):
            raise Refusal("not_one_of", field=path, given=str(given), choices=list(get_args(hint)))
        return given
    if origin is tuple:
        if not isinstance(given, (list, tuple)):
            raise Refusal("wrong_type", field=path, expected="list")
        return tuple(_value(get_args(hint)[0], item, f"{path}.{i}") for i, item in enumerate(given))
    if origin is dict:
        if not isinstance(given, dict):
            raise Refusal("wrong_type", field=path, expected="object")
        inside = get_args(hint)[1]
        return {str(key): _value(inside, item, _join(path, str(key))) for key, item in given.items()}
    if dataclasses.is_dataclass(hint):
        return _dataclass(hint, given, path)
    return _scalar(hint, given, path)


def _scalar(hint: type, given: Any, path: str) -> Any:
    if hint is float and isinstance(given, int) and not isinstance(given, bool):
        # A whole number may be too great for a float; infinity is then refused below.
        given = float(given) if abs(given) <= sys.float_info.max else math.inf
    if hint is int and isinstance(given, float) and given.is_integer():
        given = int(given)
    if hint is bytes and isinstance(given, (bytearray, memoryview)):
        given = bytes(given)
    if not isinstance(given, hint) or (isinstance(given, bool) and hint is not bool):
        raise Refusal("wrong_type", field=path, expected=hint.__name__)
    if isinstance(given, float) and not math.isfinite(given):
        raise Refusal("wrong_type", field=path, expected=hint.__name__)
    return given


def _join(path: str, name: str) -> str:
    return f"{path}.{name}" if path else name
