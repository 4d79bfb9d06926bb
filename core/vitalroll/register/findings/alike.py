"""Whether two names are one name with a slip of the pen."""

from __future__ import annotations

_LETTERS_PER_SLIP = 8


class AlikeNames:
    """Compares names that were written in one form (``spelling.bare``, sorted), quickly when they differ."""

    def __init__(self) -> None:
        self._letters: dict[str, int] = {}

    def __call__(self, one: str, other: str) -> bool:
        """Return whether one letter in eight, at most, must be changed, added, left out or exchanged."""
        if one == other:
            return True
        most = max(len(one), len(other)) // _LETTERS_PER_SLIP
        if abs(len(one) - len(other)) > most:
            return False
        # Each slip changes at most two of the letters that are used at all.
        if (self._used(one) ^ self._used(other)).bit_count() > 2 * most:
            return False
        return slips(one, other, most) <= most

    def _used(self, name: str) -> int:
        if name not in self._letters:
            self._letters[name] = sum(1 << (ord(letter) % 61) for letter in set(name) if letter != " ")
        return self._letters[name]


def slips(one: str, other: str, most: int) -> int:
    """Return how many letters must be changed, added, left out or exchanged with their neighbour.

    More than ``most`` are returned as ``most + 1``. Optimal string alignment:
    Damerau (1964), with the recurrence of Wagner & Fischer (1974).
    """
    before: list[int] = []
    row = list(range(len(other) + 1))
    for i, letter in enumerate(one, 1):
        earlier, before, row = before, row, [i]
        for j, against in enumerate(other, 1):
            cost = min(before[j] + 1, row[j - 1] + 1, before[j - 1] + (letter != against))
            if i > 1 and j > 1 and letter == other[j - 2] and one[i - 2] == against:
                cost = min(cost, earlier[j - 2] + 1)
            row.append(cost)
        if min(row) > most and min(before) > most:
            return most + 1
    return min(row[-1], most + 1)
