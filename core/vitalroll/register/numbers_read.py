"""A column of texts becomes numbers: decimal point or comma, thousands marks, all settled as one."""

from __future__ import annotations

import re
from collections.abc import Sequence
from dataclasses import dataclass

import numpy as np

from vitalroll.register.spelling import same

_POINT = re.compile(r"[+-]?(?:\d{1,3}(?:[,' ]\d{3})+(?:\.\d+)?|\d+(?:\.\d*)?(?:e[+-]?\d{1,3})?|\.\d+)")
_COMMA = re.compile(r"[+-]?(?:\d{1,3}(?:[.' ]\d{3})+(?:,\d+)?|\d+(?:,\d*)?(?:e[+-]?\d{1,3})?|,\d+)")
_MARKS = str.maketrans({"−": "-", "’": "'", "٫": ".", "٬": ","})


@dataclass(frozen=True)
class NumberColumn:
    """Distinct texts read as numbers.

    ``value`` has one number for each text, NaN where it is blank or no number. ``decimal`` is
    ``point`` or ``comma``. ``settled`` is False when both would read the texts, to other values.
    """

    value: np.ndarray
    decimal: str
    settled: bool

    @property
    def read(self) -> np.ndarray:
        """Return for each text whether it is a number."""
        return ~np.isnan(self.value)


def looks_like_number(text: str) -> bool:
    """Return whether a text is a number in either way of writing."""
    tidy = same(text).translate(_MARKS)
    return bool(_POINT.fullmatch(tidy) or _COMMA.fullmatch(tidy))


def parse_numbers(
    texts: Sequence[str], weights: np.ndarray | None = None, *, comma: bool = False
) -> NumberColumn:
    """Read distinct texts as numbers, all with a decimal point or all with a decimal comma.

    Parameters
    ----------
    texts : sequence of str
    weights : int array, optional
        How many rows have each text.
    comma : bool
        Take the comma where nothing settles it, as in files divided by semicolons.
    """
    tidy = [same(text).translate(_MARKS) for text in texts]
    weights = np.ones(len(texts)) if weights is None else weights
    point = np.array([_value(text, _POINT, ",", ".") for text in tidy], dtype=float)
    if not any("," in text or text.count(".") > 1 for text in tidy):
        return NumberColumn(point, "point", True)
    with_comma = np.array([_value(text, _COMMA, ".", ",") for text in tidy], dtype=float)
    read_point, read_comma = (float(weights[~np.isnan(found)].sum()) for found in (point, with_comma))
    if read_point == read_comma:
        both = ~np.isnan(point) & ~np.isnan(with_comma)
        settled = bool(np.all(point[both] == with_comma[both]))
        return NumberColumn(with_comma if comma else point, "comma" if comma else "point", settled)
    if read_comma > read_point:
        return NumberColumn(with_comma, "comma", True)
    return NumberColumn(point, "point", True)


def _value(text: str, pattern: re.Pattern[str], thousands: str, decimal: str) -> float:
    if not pattern.fullmatch(text):
        return float("nan")
    plain = text.replace(thousands, "").replace("'", "").replace(" ", "").replace(decimal, ".")
    number = float(plain)
    return number if np.isfinite(number) else float("nan")
