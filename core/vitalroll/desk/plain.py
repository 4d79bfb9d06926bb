"""Results turned into plain data that JSON can carry, with nothing lost without a word."""

from __future__ import annotations

import dataclasses
import datetime
import math
from collections.abc import Mapping
from typing import Any

import numpy as np


def plain(result: Any) -> tuple[Any, list[dict[str, Any]]]:
    """Return ``result`` as dicts, lists, strings and finite numbers, and what became null.

    Dataclasses become objects, arrays become lists. Each NaN or infinity becomes null and is
    listed once for its array: ``{"path": "curves.0.upper", "at": [3, 4], "reason": "not_a_number"}``;
    ``at`` is null for a single number. Reasons: ``not_a_number``, ``plus_infinity``, ``minus_infinity``.
    """
    nulls: list[dict[str, Any]] = []
    return _plain(result, "", nulls), nulls


def _plain(value: Any, path: str, nulls: list[dict[str, Any]]) -> Any:
    if value is None or isinstance(value, (str, bool, int)):
        return value
    if isinstance(value, (np.integer, np.bool_)):
        return value.item()
    if isinstance(value, (float, np.floating)):
        number = float(value)
        if math.isfinite(number):
            return number
        nulls.append({"path": path, "at": None, "reason": _reason(number)})
        return None
    if isinstance(value, datetime.date):
        return value.isoformat()
    if isinstance(value, np.ndarray):
        if value.ndim == 0:
            return _plain(value.item(), path, nulls)
        return _array(value, path, nulls)
    if dataclasses.is_dataclass(value):
        return {
            field.name: _plain(getattr(value, field.name), _under(path, field.name), nulls)
            for field in dataclasses.fields(value)
        }
    if isinstance(value, Mapping):
        return {str(key): _plain(item, _under(path, str(key)), nulls) for key, item in value.items()}
    if isinstance(value, (list, tuple)):
        return [_plain(item, _under(path, str(i)), nulls) for i, item in enumerate(value)]
    raise TypeError(f"{type(value).__name__} at {path} is not plain data")


def _array(values: np.ndarray, path: str, nulls: list[dict[str, Any]]) -> list[Any]:
    if values.ndim > 1:
        return [_array(row, _under(path, str(i)), nulls) for i, row in enumerate(values)]
    items = values.tolist()
    if values.dtype.kind != "f" or np.isfinite(values).all():
        return items
    for reason in ("not_a_number", "plus_infinity", "minus_infinity"):
        at = [i for i, x in enumerate(items) if not math.isfinite(x) and _reason(x) == reason]
        if at:
            nulls.append({"path": path, "at": at, "reason": reason})
    return [x if math.isfinite(x) else None for x in items]


def _reason(number: float) -> str:
    if math.isnan(number):
        return "not_a_number"
    return "plus_infinity" if number > 0 else "minus_infinity"


def _under(path: str, name: str) -> str:
    return f"{path}.{name}" if path else name
