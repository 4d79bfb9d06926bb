"""Words by which headings and values are recognised; the list itself is ``recognition.json``.

Recognition only ever proposes. What a column or a value means is said by the person.
"""

from __future__ import annotations

import json
import pkgutil
import re
from collections.abc import Iterable, Sequence
from functools import cache
from typing import Any

from vitalroll.register.spelling import bare


@cache
def words() -> dict[str, Any]:
    """Return the word list."""
    content = pkgutil.get_data("vitalroll.register", "recognition.json")
    return json.loads(content or b"{}")


@cache
def months() -> dict[str, int]:
    """Return the number of the month for each name and abbreviation, without accents, in lower case."""
    return {name: number for number, names in enumerate(words()["months"], 1) for name in names}


def longest_match(plain: str, phrases: Sequence[str]) -> str | None:
    """Return the longest of ``phrases`` that stands in ``plain`` as whole words.

    Parameters
    ----------
    plain : str
        Text as ``spelling.bare`` gives it.
    phrases : sequence of str
        A phrase ending in a star matches words that begin with it.
    """
    found = [match.group().strip() for match in _pattern(tuple(phrases)).finditer(f" {plain} ")]
    return max(found, key=len, default=None)


def has_any(plain: str, phrases: Sequence[str]) -> bool:
    """Return whether any of ``phrases`` stands in ``plain`` as whole words."""
    return _pattern(tuple(phrases)).search(f" {plain} ") is not None


def is_total(text: str) -> bool:
    """Return whether a cell begins with a word for a total."""
    # Asked of every patient number: most are ruled out by their first letter.
    if text.strip()[:1].lower() not in _first_letters():
        return False
    match = _pattern(tuple(words()["totals"])).match(f" {bare(text)} ")
    return match is not None


@cache
def _first_letters() -> frozenset[str]:
    return frozenset(phrase[0] for phrase in words()["totals"])


@cache
def _pattern(phrases: tuple[str, ...]) -> re.Pattern[str]:
    ordered: Iterable[str] = sorted(phrases, key=len, reverse=True)
    inner = "|".join(re.escape(phrase).replace(r"\*", r"\w*") for phrase in ordered)
    return re.compile(rf" (?:{inner})(?= )")
