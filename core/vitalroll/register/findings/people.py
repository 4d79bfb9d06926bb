"""One patient in several rows, or two patients under one number.

Numbers and names are compared here and nowhere else; nothing of them is kept but which rows are alike.
"""

from __future__ import annotations

from collections.abc import Callable, Iterable, Iterator

import numpy as np

from vitalroll.register.cohort import DEATHS, meaning_code
from vitalroll.register.dates import Fault
from vitalroll.register.findings.alike import AlikeNames
from vitalroll.register.findings.finding import (
    NOT_RECORDED,
    Finding,
    Repair,
    Seen,
    Severity,
    What,
    change,
    found,
)
from vitalroll.register.spelling import bare

_NEIGHBOURS = 12
"""Within one birth date, names are sorted and each is compared with so many that follow.

The sorted neighbourhood of Hernandez & Stolfo (1995) keeps the work in proportion to the rows.
"""


def same_number(seen: Seen) -> Finding | None:
    """Several rows have one patient number and nothing speaks against one patient.

    The repair makes one of them: the earliest start, and the latest end with its outcome; a death
    goes before anything else.
    """
    sexes = seen.plan.sex_codes()
    groups = [group for group in _by_number(seen) if not _are_different(seen, group, sexes)]
    return _merging("same_number", "grave", seen, groups)


def one_number_two_people(seen: Seen) -> Finding | None:
    """Rows with one number differ in sex or birth date: perhaps the number was given twice.

    The repair counts each row as a patient of its own.
    """
    sexes = seen.plan.sex_codes()
    groups = [group for group in _by_number(seen) if _are_different(seen, group, sexes)]
    which = np.zeros(len(seen.rows), dtype=bool)
    rows = [row for group in groups for row in group]
    which[rows] = True
    units = [group[0] for group in groups for _ in group]
    repair = Repair("count_each", (change("number", np.array(rows), NOT_RECORDED, np.array(units)),))
    return found("one_number_two_people", "grave", which, repair, numbers=len(groups))


def likely_same_person(seen: Seen) -> Finding | None:
    """Rows with different numbers agree in name, birth date, sex or start, as far as these are known.

    Names must be alike within one letter in eight (accents, case and the order of names do not
    count), with the same birth date, or the same start where no birth date is known; sex may not
    differ. Without a column for names, birth date, sex and start must all be the same. The repair is
    that of ``same_number``.
    """
    pairs = _alike_with_names(seen) if seen.plan.having("name") else _alike_without_names(seen)
    return _merging("likely_same_person", "doubtful", seen, _joined(pairs))


def sex_not_recorded(seen: Seen) -> Finding | None:
    """The sex is blank, or a value that was given no meaning."""
    if not seen.plan.having("sex"):
        return None
    return found("sex_not_recorded", "slight", seen.patients & (seen.plan.sex_codes() < 0))


def _merging(code: str, severity: Severity, seen: Seen, groups: list[list[int]]) -> Finding | None:
    which = np.zeros(len(seen.rows), dtype=bool)
    which[[row for group in groups for row in group]] = True
    starts, ends, outcomes, twins = [], [], [], []
    for group in groups:
        usable = [row for row in group if _usable(seen, row)]
        if len(usable) < 2:
            continue
        first, last = usable[0], max(usable, key=lambda row: _lateness(seen, row))
        earliest = min(int(seen.rows.start.day[row]) for row in usable)
        if earliest != seen.rows.start.day[first]:
            starts.append((first, earliest, first))
        if last != first:
            if seen.rows.end.given[last] and seen.rows.end.day[last] != seen.rows.end.day[first]:
                ends.append((first, int(seen.rows.end.day[last]), first))
            if seen.rows.outcome[last] != seen.rows.outcome[first]:
                outcomes.append((first, int(seen.rows.outcome[last]), first))
        twins += [(row, first, first) for row in group if row != first]
    changes = []
    by_what: dict[What, list[tuple[int, int, int]]]
    by_what = {"start": starts, "end": ends, "outcome": outcomes, "same_as": twins}
    for what, made in by_what.items():
        if made:
            rows, values, units = (np.array(part) for part in zip(*made, strict=True))
            changes.append(change(what, rows, values, units))
    repair = Repair("make_one", tuple(changes)) if changes else None
    return found(code, severity, which, repair, patients=len(groups))


def _usable(seen: Seen, row: int) -> bool:
    rows = seen.rows
    in_care = rows.end.fault[row] == Fault.BLANK and rows.outcome[row] == rows.under_care
    ended = rows.end.given[row] or in_care
    return bool(rows.start.given[row] and rows.outcome[row] >= 0 and ended)


def _lateness(seen: Seen, row: int) -> tuple[bool, int, int]:
    """Return what to choose the last of a patient's rows by: a death, then the latest end, then the file."""
    died = int(seen.rows.outcome[row]) in [meaning_code(meaning) for meaning in DEATHS]
    end = int(seen.rows.end.day[row]) if seen.rows.end.given[row] else seen.rows.closing
    return died, end, row


def _by_number(seen: Seen) -> list[list[int]]:
    """Return the rows of each patient number that several rows have, in the order of the file."""
    number = seen.plan.one("patient_number")
    if number is None:
        return []
    codes = number.values.codes
    counts = np.bincount(codes[seen.patients & (codes >= 0)], minlength=1)
    rows = np.flatnonzero(seen.patients & (codes >= 0) & (counts[np.maximum(codes, 0)] > 1))
    return _grouped(codes[rows].tolist(), rows.tolist())


def _are_different(seen: Seen, group: list[int], sexes: np.ndarray) -> bool:
    """Return whether rows of one number cannot be one patient: two sexes, or two birth dates."""
    births = {int(seen.rows.birth.day[row]) for row in group if seen.rows.birth.given[row]}
    return len(births) > 1 or len({int(sexes[row]) for row in group if sexes[row] >= 0}) > 1


def _alike_without_names(seen: Seen) -> Iterator[tuple[int, int]]:
    sexes = seen.plan.sex_codes()
    known = seen.patients & seen.rows.birth.given & seen.rows.start.given & (sexes >= 0)
    rows = np.flatnonzero(known).tolist()
    birth, start = seen.rows.birth.day, seen.rows.start.day
    for group in _grouped([(int(birth[row]), int(start[row]), int(sexes[row])) for row in rows], rows):
        yield from ((group[0], row) for row in group[1:] if not _same_number(seen, group[0], row))


def _alike_with_names(seen: Seen) -> Iterator[tuple[int, int]]:
    names, sexes = _names(seen), seen.plan.sex_codes()
    birth, start = seen.rows.birth, seen.rows.start
    born = seen.patients & birth.given
    unborn = seen.patients & ~birth.given & start.given
    rows = np.flatnonzero(born).tolist()
    blocks = _grouped(birth.day[rows].tolist(), rows)
    rows = np.flatnonzero(unborn).tolist()
    blocks += _grouped(start.day[rows].tolist(), rows)
    alike = AlikeNames()
    for block in blocks:
        named = sorted((names(row), row) for row in block if names(row))
        for i, (name, row) in enumerate(named):
            for other, later in named[i + 1 : i + 1 + _NEIGHBOURS]:
                differ = sexes[row] >= 0 and sexes[later] >= 0 and sexes[row] != sexes[later]
                if not differ and alike(name, other) and not _same_number(seen, row, later):
                    yield row, later


def _names(seen: Seen) -> Callable[[int], str]:
    """Return a function that gives the names in a row: no accents, in alphabetical order."""
    columns = [profile.column for profile in seen.plan.having("name")]
    plain = [[bare(text) for text in column.texts] for column in columns]

    def name(row: int) -> str:
        parts = [texts[column.codes[row]] for texts, column in zip(plain, columns, strict=True)]
        return " ".join(sorted(" ".join(parts).split()))

    return name


def _same_number(seen: Seen, row: int, other: int) -> bool:
    number = seen.plan.one("patient_number")
    if number is None:
        return False
    codes = number.values.codes
    return bool(codes[row] == codes[other] and codes[row] >= 0)


def _grouped(keys: list, rows: list[int]) -> list[list[int]]:
    """Return the rows of each key that more than one row has."""
    groups: dict[object, list[int]] = {}
    for key, row in zip(keys, rows, strict=True):
        groups.setdefault(key, []).append(row)
    return [group for group in groups.values() if len(group) > 1]


def _joined(pairs: Iterable[tuple[int, int]]) -> list[list[int]]:
    """Return the groups that pairs make: who is alike to one of a group belongs to it."""
    leader: dict[int, int] = {}

    def lead(row: int) -> int:
        while leader.setdefault(row, row) != row:
            row = leader[row]
        return row

    for one, other in pairs:
        first, second = sorted((lead(one), lead(other)))
        leader[second] = first
    groups: dict[int, list[int]] = {}
    for row in sorted(leader):
        groups.setdefault(lead(row), []).append(row)
    return list(groups.values())
