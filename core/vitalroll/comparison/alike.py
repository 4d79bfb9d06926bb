"""Whether two groups are alike before they are compared: who is in them, when and how they were followed."""

from __future__ import annotations

import datetime
from collections.abc import Collection, Iterable
from dataclasses import dataclass

import numpy as np

from vitalroll.errors import Caution, Refusal
from vitalroll.numbers import DAYS_PER_YEAR
from vitalroll.outcomes.follow_up import follow_up_median
from vitalroll.outcomes.risk_table import risk_table
from vitalroll.register.cohort import Categorical, Cohort, Numeric, meaning_code

UNLIKE = 0.1
"""A standardised difference above this is worth taking into account (common practice; Austin 2009)."""

YEARS_APART = 1.0
FOLLOWED_LONGER = 1.5
LOST_MORE = 0.05
"""Median starts so many years apart, follow-up so many times as long, so much more lost: common practice."""


@dataclass(frozen=True)
class Characteristic:
    """One line of the table: a number's mean and standard deviation, or a level's count and share.

    ``level`` is None for a number. ``exposed`` and ``reference`` are mean or share; ``spread`` has the
    standard deviations of a number (NaN for a level); ``n`` the patients with it recorded, or of the level.
    ``standardised`` is the difference over the pooled standard deviation; for a level, that of its own share.
    """

    id: str
    level: str | None
    n: tuple[int, int]
    exposed: float
    reference: float
    spread: tuple[float, float]
    standardised: float


@dataclass(frozen=True)
class Side:
    """One group: patients, median day of the start, median follow-up in years, share lost."""

    level: str
    n: int
    median_start: datetime.date
    median_follow_up: float
    lost: float


@dataclass(frozen=True)
class Alike:
    """The two groups side by side."""

    exposed: Side
    reference: Side
    characteristics: tuple[Characteristic, ...]
    missing: dict[str, tuple[int, int]]
    cautions: tuple[Caution, ...]


def alike(cohort: Cohort, group: str, exposed: str, reference: str, interest: Collection[str]) -> Alike:
    """Describe two groups by every other covariate, and by when and how long they were followed.

    Parameters
    ----------
    cohort : Cohort
    group : identifier of a categorical covariate
    exposed, reference : two of its levels
    interest : names from MEANINGS
        For the median follow-up by the reversed product limit.

    Raises
    ------
    Refusal
        ``same_group``, ``unknown_level``, those of ``Cohort.grouping``.

    Cautions
    --------
    ``groups_unlike`` (``covariates``, ``most``: the greatest standardised difference); ``periods_differ``
    (``level`` of the earlier, ``years``); ``follow_up_differs`` (``level`` followed longer, ``times``);
    ``losses_differ`` (``level`` that lost more, ``share``, ``other_share``).

    References
    ----------
    Austin (2009) Stat Med 28:3083-3107; a level is taken as a yes or no of its own.
    """
    if exposed == reference:
        raise Refusal("same_group", field="reference", level=reference)
    covariate = cohort.grouping(group)
    for field, level in (("exposed", exposed), ("reference", reference)):
        if level not in covariate.levels:
            raise Refusal("unknown_level", field=field, covariate=group, level=level)
    parts = [
        cohort.having(covariate.codes == covariate.levels.index(level)) for level in (exposed, reference)
    ]
    for part, level in zip(parts, (exposed, reference), strict=True):
        if len(part) == 0:
            raise Refusal("empty_group", field="group", level=level)
    sides = [_side(part, level, interest) for part, level in zip(parts, (exposed, reference), strict=True)]
    characteristics = tuple(
        line
        for identifier in cohort.covariates
        if identifier != group
        for line in _lines(identifier, *(part.covariate(identifier) for part in parts))
    )
    missing = {
        identifier: counts
        for identifier in cohort.covariates
        if identifier != group
        for counts in [tuple(_missing(part.covariate(identifier)) for part in parts)]
        if any(counts)
    }
    return Alike(*sides, characteristics, missing, tuple(_cautions(*sides, characteristics)))


def _side(part: Cohort, level: str, interest: Collection[str]) -> Side:
    return Side(
        level=level,
        n=len(part),
        median_start=datetime.date.fromordinal(int(np.median(part.start))),
        median_follow_up=follow_up_median(risk_table(part), interest).estimate.value,
        lost=float(np.mean(part.outcome == meaning_code("lost"))),
    )


def _missing(covariate: Categorical | Numeric) -> int:
    absent = covariate.codes < 0 if isinstance(covariate, Categorical) else np.isnan(covariate.values)
    return int(np.count_nonzero(absent))


def _lines(
    identifier: str, exposed: Categorical | Numeric, reference: Categorical | Numeric
) -> Iterable[Characteristic]:
    if isinstance(exposed, Numeric):
        ours, theirs = (each.values[~np.isnan(each.values)] for each in (exposed, reference))
        yield _number(identifier, ours, theirs)
        return
    ours, theirs = (each.codes[each.codes >= 0] for each in (exposed, reference))
    for code, level in enumerate(exposed.levels):
        counts = (int(np.count_nonzero(ours == code)), int(np.count_nonzero(theirs == code)))
        if not any(counts):
            continue
        shares = [
            count / len(codes) if len(codes) else float("nan")
            for count, codes in zip(counts, (ours, theirs), strict=True)
        ]
        spread = np.sqrt(sum(share * (1 - share) for share in shares) / 2)
        yield Characteristic(
            id=identifier,
            level=level,
            n=counts,
            exposed=shares[0],
            reference=shares[1],
            spread=(float("nan"), float("nan")),
            standardised=_over(shares[0] - shares[1], spread),
        )


def _number(identifier: str, ours: np.ndarray, theirs: np.ndarray) -> Characteristic:
    means = [float(each.mean()) if len(each) else float("nan") for each in (ours, theirs)]
    spreads = [float(each.std(ddof=1)) if len(each) > 1 else float("nan") for each in (ours, theirs)]
    return Characteristic(
        id=identifier,
        level=None,
        n=(len(ours), len(theirs)),
        exposed=means[0],
        reference=means[1],
        spread=(spreads[0], spreads[1]),
        standardised=_over(means[0] - means[1], np.sqrt((spreads[0] ** 2 + spreads[1] ** 2) / 2)),
    )


def _over(difference: float, spread: float) -> float:
    """Return a difference in standard deviations; groups that do not vary and are the same do not differ."""
    if spread > 0:
        return float(difference / spread)
    return 0.0 if difference == 0 else float("nan")


def _cautions(
    exposed: Side, reference: Side, characteristics: tuple[Characteristic, ...]
) -> Iterable[Caution]:
    unlike = [line for line in characteristics if abs(line.standardised) > UNLIKE]
    if unlike:
        most = max(abs(line.standardised) for line in unlike)
        yield Caution(
            "groups_unlike", {"covariates": list(dict.fromkeys(line.id for line in unlike)), "most": most}
        )
    years = (exposed.median_start - reference.median_start).days / DAYS_PER_YEAR
    if abs(years) > YEARS_APART:
        earlier = exposed if years < 0 else reference
        yield Caution("periods_differ", {"level": earlier.level, "years": abs(years)})
    times = exposed.median_follow_up / reference.median_follow_up if reference.median_follow_up > 0 else 1.0
    if times > FOLLOWED_LONGER or 0 < times < 1 / FOLLOWED_LONGER:
        longer = exposed if times > 1 else reference
        yield Caution("follow_up_differs", {"level": longer.level, "times": max(times, 1 / times)})
    if abs(exposed.lost - reference.lost) > LOST_MORE:
        more, fewer = sorted((exposed, reference), key=lambda side: -side.lost)
        yield Caution("losses_differ", {"level": more.level, "share": more.lost, "other_share": fewer.lost})
