"""The values of a column, with spellings of one value brought together."""

from __future__ import annotations

import re
from dataclasses import dataclass

import numpy as np

from vitalroll.register.spelling import same, shown
from vitalroll.register.table import Column


@dataclass(frozen=True)
class Values:
    """Distinct values of a column in the order in which they are first met.

    Parameters
    ----------
    keys : tuple of str
        What each value is matched by (``spelling.same``).
    spelt : tuple of str
        Each value as it is shown: its most frequent spelling, the first among equals.
    counts : int array
        Rows that have it.
    codes : int array
        For each row the position of its value, -1 where the cell is blank.
    """

    keys: tuple[str, ...]
    spelt: tuple[str, ...]
    counts: np.ndarray
    codes: np.ndarray

    def __len__(self) -> int:
        return len(self.keys)


def text_counts(column: Column, rows: np.ndarray) -> np.ndarray:
    """Return how many of the chosen rows (bool array) have each distinct text."""
    return np.bincount(column.codes[rows], minlength=len(column.texts))


def values_of(column: Column, rows: np.ndarray) -> Values:
    """Bring spellings together that differ only in case, spaces, width or unseen characters.

    Parameters
    ----------
    column : Column
    rows : bool array
        The rows that count; values in no such row are not listed.
    """
    weights = text_counts(column, rows)
    position: dict[str, int] = {}
    best: list[tuple[int, str]] = []
    value_of_text = np.full(len(column.texts), -1, dtype=np.int64)
    for text_code in np.flatnonzero(weights).tolist():
        text = column.texts[text_code]
        key = same(text)
        if not key:
            continue
        value = position.setdefault(key, len(position))
        weight = int(weights[text_code])
        if value == len(best):
            best.append((weight, text))
        elif weight > best[value][0]:
            best[value] = (weight, text)
        value_of_text[text_code] = value
    codes = value_of_text[column.codes]
    counts = np.bincount(codes[rows & (codes >= 0)], minlength=len(position))
    return Values(tuple(position), tuple(shown(text) for _, text in best), counts, codes)


def natural(text: str) -> list[tuple[int, int, str]]:
    """Return what to sort texts by so that they come as a person would list them: numbers by size."""
    pieces = re.findall(r"\d+|\D+", same(text))
    return [(0, int(piece), "") if piece.isdecimal() else (1, 0, piece) for piece in pieces]
