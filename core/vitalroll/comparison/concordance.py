"""Concordance: how often a model puts two patients in the order in which their outcomes came."""

from __future__ import annotations

import numpy as np

from vitalroll.numbers import NOT_GIVEN, Estimate, two_sided_z


def concordance(
    entry: np.ndarray, exit: np.ndarray, event: np.ndarray, risk: np.ndarray, *, confidence: float = 0.95
) -> Estimate:
    """Return Harrell's concordance of a risk with the order of outcomes.

    A pair counts when one patient had the outcome while the other was at risk and went on without it
    that day. It agrees when the first had the higher risk; equal risks count half.

    Parameters
    ----------
    entry, exit : int arrays, shape (n,)
        Days; entry 0 for a patient observed from the start.
    event : bool array
    risk : float array
        Higher means sooner.
    confidence : float

    Returns
    -------
    Estimate
        Standard error by the infinitesimal jackknife. NaN when no pair counts.

    References
    ----------
    Harrell, Califf, Pryor, Lee & Rosati (1982) JAMA 247:2543-2546.
    """
    by_risk = np.argsort(risk)
    entry, exit, event, risk = (each[by_risk] for each in (entry, exit, event, risk))
    # Twice the day, outcomes before censorings: whoever left under a higher key went on without the outcome.
    left = 2 * exit.astype(np.int64) + ~event
    ties = _ties(risk)
    everyone, late = np.ones(len(risk), dtype=bool), entry > 0
    first, second = _pairs(ties, event, left, everyone, left)
    if late.any():
        # Not at risk before coming; someone who left on the day of coming had no time at risk at all.
        came = np.minimum(2 * entry.astype(np.int64) + 1, left)
        absent_first, absent_second = _pairs(ties, event, left, late, came)
        first, second = first - absent_first, second - absent_second
    total = int(first[1].sum())
    if total == 0:
        return NOT_GIVEN
    value = float(first[0].sum() / total)
    agree, counted = first + second
    influence = (agree - value * counted) / total
    error = float(np.sqrt((influence**2).sum()))
    z = two_sided_z(confidence)
    return Estimate(value, max(0.0, value - z * error), min(1.0, value + z * error), error)


def _ties(ascending: np.ndarray) -> tuple[np.ndarray, np.ndarray]:
    """Return, for each of the ascending risks, how many are lower, and how many are not higher."""
    new = np.flatnonzero(np.concatenate(([True], ascending[1:] > ascending[:-1])))
    group = np.repeat(np.arange(len(new)), np.diff(np.append(new, len(ascending))))
    return new[group], np.append(new[1:], len(ascending))[group]


def _pairs(
    ties: tuple[np.ndarray, np.ndarray],
    event: np.ndarray,
    left: np.ndarray,
    other: np.ndarray,
    key: np.ndarray,
) -> tuple[np.ndarray, np.ndarray]:
    """Count pairs of an outcome and one of the others whose key is above the key of the outcome.

    Returns
    -------
    Two arrays of shape (2, n), for each patient as the one with the outcome and as the other: the pairs in
    which the outcome has the higher risk (equal risks count half), and all pairs.
    """
    first, second = np.zeros((2, len(left))), np.zeros((2, len(left)))
    lower, equal = _keys_below(ties, other, key, event, left[event] + 1)
    all_lower, all_equal = _members_below(ties, other, event)
    first[0, event] = all_lower - lower + (all_equal - equal) / 2
    first[1, event] = other.sum() - _below(key[other], left[event] + 1)
    lower, equal = _keys_below(ties, event, left, other, key[other])
    second[1, other] = _below(left[event], key[other])
    second[0, other] = second[1, other] - lower - equal / 2
    return first, second


def _members_below(
    ties: tuple[np.ndarray, np.ndarray], member: np.ndarray, who: np.ndarray
) -> tuple[np.ndarray, np.ndarray]:
    """Return, for each of ``who``, how many members have a lower risk, and how many an equal one.

    Nobody is counted as equal for a patient who shares the risk with no one else.
    """
    before = np.concatenate(([0], np.cumsum(member, dtype=np.int64)))
    lower, through = (each[who] for each in ties)
    equal = np.where(through - lower > 1, before[through] - before[lower], 0)
    return before[lower], equal


def _below(keys: np.ndarray, bound: np.ndarray) -> np.ndarray:
    """Return, for each bound, how many keys are below it."""
    counts = np.bincount(keys, minlength=int(bound.max(initial=0)))
    return np.concatenate(([0], np.cumsum(counts, dtype=np.int64)))[bound]


def _keys_below(
    ties: tuple[np.ndarray, np.ndarray],
    member: np.ndarray,
    key: np.ndarray,
    who: np.ndarray,
    bound: np.ndarray,
) -> tuple[np.ndarray, np.ndarray]:
    """Return, for each of ``who``, the members with a key below its bound: of lower risk, of equal risk."""
    lower, equal = _members_below(ties, member, who)
    below = _smaller_before(key[member], lower, bound)
    level = np.zeros_like(below)
    shared = equal > 0
    level[shared] = _smaller_before(key[member], (lower + equal)[shared], bound[shared]) - below[shared]
    return below, level


def _smaller_before(values: np.ndarray, prefix: np.ndarray, bound: np.ndarray) -> np.ndarray:
    """Return, for each query, how many of the first ``prefix`` values are smaller than ``bound``.

    Bit by bit of the value, from the highest: the values still in play are put apart, zeros before ones and
    otherwise in order, and each query follows its own bit. A running count of zeros says where its prefix
    went. No loop over patients, no sort: n times the number of bits of a day (a wavelet matrix; Claude,
    Navarro & Ordóñez 2015, Information Systems 47:15-32). Where a bound's stretch begins does not depend on
    the prefix, so it is followed once for each bound.
    """
    smaller = np.zeros(len(prefix), dtype=np.int64)
    if not len(values) or not len(prefix):
        return smaller
    # Counts of patients fit into 32 bits, and half the memory is twice the speed.
    here, end, wanted = values.astype(np.int32), prefix.astype(np.int32), bound.astype(np.int32)
    most = max(int(here.max()), int(wanted.max()))
    bounds = np.arange(most + 1, dtype=np.int32)
    begin, before_begin, counted = np.zeros_like(bounds), np.zeros_like(bounds), np.zeros_like(end)
    for bit in reversed(range(max(1, most.bit_length()))):
        zero = (~here >> bit) & 1
        zeros = np.zeros(len(here) + 1, dtype=np.int32)
        np.cumsum(zero, out=zeros[1:])
        end, passed = _follow(zeros, end, (wanted & (1 << bit)) > 0)
        counted += passed
        begin, passed = _follow(zeros, begin, (bounds & (1 << bit)) > 0)
        before_begin += passed
        put_first = zero.astype(bool)
        here = np.concatenate((here[put_first], here[~put_first]))
    return (counted - before_begin[wanted]).astype(np.int64)


def _follow(zeros: np.ndarray, position: np.ndarray, up: np.ndarray) -> tuple[np.ndarray, np.ndarray]:
    """Return where a position goes when its bit is set or not, and the zeros it passes by when set."""
    zero = zeros[position]
    passed = zero * up
    return np.where(up, zeros[-1] + position - zero, zero), passed
