"""Values of a column that are probably one value with a slip of the pen: proposed, never merged unasked."""

from __future__ import annotations

from collections.abc import Mapping
from dataclasses import dataclass

import numpy as np

from vitalroll.errors import Refusal
from vitalroll.register.findings.alike import slips
from vitalroll.register.spelling import bare, same
from vitalroll.register.values import Values

MOST_COMPARED = 400
"""Of a column with more values the most frequent are compared."""

_SHORT, _LONG = 5, 10
"""Words of fewer than 5 letters must be the same; from 10 letters on, two slips are let pass."""


@dataclass(frozen=True)
class Variant:
    """A value (its position) and the more frequent one that it probably is.

    ``certain`` where they differ only in accents, punctuation or spaces.
    """

    value: int
    into: int
    certain: bool


def variants(values: Values) -> list[Variant]:
    """Return the values that are probably another one, misspelt.

    Each is compared with those that stand in more rows, the most frequent first. Numbers, short
    words and first letters must be the same, so that ``Stage II`` is never ``Stage III`` and
    ``asymptomatic`` never ``symptomatic``.
    """
    order = np.argsort(-values.counts, kind="stable")[:MOST_COMPARED].tolist()
    words = {i: bare(values.spelt[i]).split() for i in order}
    mains: list[int] = []
    found = []
    for i in order:
        match = next(
            (main for main in mains if words[i] and _one_word_for_another(words[i], words[main])), None
        )
        if match is None:
            mains.append(i)
        else:
            found.append(Variant(i, match, "".join(words[i]) == "".join(words[match])))
    return found


def merged(values: Values, said: Mapping[str, str], where: str) -> Values:
    """Return the values with some taken for others.

    Parameters
    ----------
    values : Values
    said : mapping of value to the value that it is
        Both are matched without regard to case and spaces; what is not in the column is passed over.
    where : str
        The field of the request, for a refusal.

    Raises
    ------
    Refusal
        ``merged_in_a_circle`` (``value``).
    """
    place = {key: i for i, key in enumerate(values.keys)}
    into = list(range(len(values)))
    for value, other in said.items():
        one, another = place.get(same(value)), place.get(same(other))
        if one is not None and another is not None:
            into[one] = another
    final = []
    for i in range(len(into)):
        at, steps = i, 0
        while into[at] != at:
            at, steps = into[at], steps + 1
            if steps > len(into):
                raise Refusal("merged_in_a_circle", field=where, value=values.spelt[i])
        final.append(at)
    to = np.array([*final, -1], dtype=np.int64)
    counts = np.bincount(to[:-1], weights=values.counts, minlength=len(values)).astype(np.int64)
    return Values(values.keys, values.spelt, counts, to[values.codes])


def _one_word_for_another(one: list[str], other: list[str]) -> bool:
    if "".join(one) == "".join(other):
        return True
    return len(one) == len(other) and all(
        _alike(word, against) for word, against in zip(one, other, strict=True)
    )


def _alike(word: str, against: str) -> bool:
    if word == against:
        return True
    shorter = min(len(word), len(against))
    longer = max(len(word), len(against))
    if (
        longer < _SHORT
        or shorter < _SHORT - 1
        or word[0] != against[0]
        or any(map(str.isdigit, word + against))
    ):
        return False
    most = 2 if shorter >= _LONG else 1
    return abs(len(word) - len(against)) <= most and slips(word, against, most) <= most
