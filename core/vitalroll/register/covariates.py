"""What else is known of each patient at the start: sex, age, calendar time and the chosen columns.

``kept`` is, throughout, a bool array over the rows of the file: the rows that are in the cohort. What
comes back has one entry for each of those.
"""

from __future__ import annotations

from collections.abc import Mapping
from dataclasses import dataclass

import numpy as np

from vitalroll.errors import Caution
from vitalroll.numbers import DAYS_PER_YEAR
from vitalroll.register.checks import Days
from vitalroll.register.cohort import Categorical, Covariate, Numeric
from vitalroll.register.meanings import SEXES
from vitalroll.register.numbers_read import NumberColumn
from vitalroll.register.profile import Profile
from vitalroll.register.spelling import excerpt, same
from vitalroll.register.values import Values, natural

AGE_BANDS = ("0-4", "5-14", "15-24", "25-44", "45-64", "65+")
_BAND_STARTS = (5, 15, 25, 45, 65)
OLDEST = 120
MANY_LEVELS = 20
"""More levels than this cannot be compared as groups; they are kept, and it is said."""

_MOST_PERIODS = 4


@dataclass(frozen=True)
class Derived:
    """Covariates and what to say about them."""

    covariates: dict[str, Covariate]
    cautions: tuple[Caution, ...]


def sex_of(values: Values, said: Mapping[str, str], kept: np.ndarray) -> Derived:
    """Return the sex of each patient from the values of its column.

    Parameters
    ----------
    values : Values
    said : mapping of value to female, male or other
    kept : bool array

    Cautions
    --------
    ``sex_without_meaning`` (``n`` rows, ``values``): taken as not recorded.
    """
    meant = {same(value): sex for value, sex in said.items()}
    level = np.array([SEXES.index(meant[key]) if key in meant else -1 for key in values.keys] + [-1])
    present = values.codes[kept]
    codes = level[present]
    unknown = np.unique(present[(codes < 0) & (present >= 0)]).tolist()
    cautions = ()
    if unknown:
        n = int(np.count_nonzero((codes < 0) & (present >= 0)))
        examples = [excerpt(values.spelt[value]) for value in unknown[:10]]
        cautions = (Caution("sex_without_meaning", {"n": n, "values": examples}),)
    return Derived({"sex": _having_patients(SEXES, codes)} if (codes >= 0).any() else {}, cautions)


def age_of(start: Days, birth: Days | None, written: np.ndarray | None, kept: np.ndarray) -> Derived:
    """Return age at the start, in years, and its bands.

    Parameters
    ----------
    start, birth : Days
        Rows with a fault in either have no age from these.
    written : float array, optional
        Ages as written, used where the date of birth gives none.
    kept : bool array

    Cautions
    --------
    ``age_out_of_range`` (``n``, ``oldest``): below 0 or above 120, taken as not recorded.
    """
    age = np.full(len(start.day), np.nan)
    if birth is not None:
        known = start.given & birth.given
        age[known] = (start.day[known] - birth.day[known]) / DAYS_PER_YEAR
    if written is not None:
        age = np.where(np.isnan(age), written, age)
    age = age[kept]
    with np.errstate(invalid="ignore"):
        impossible = (age < 0) | (age > OLDEST)
    cautions = ()
    if impossible.any():
        cautions = (Caution("age_out_of_range", {"n": int(impossible.sum()), "oldest": OLDEST}),)
    age[impossible] = np.nan
    if np.isnan(age).all():
        return Derived({}, cautions)
    band = np.where(np.isnan(age), -1, np.digitize(np.nan_to_num(age), _BAND_STARTS))
    return Derived({"age": Numeric(None, age), "age_band": _having_patients(AGE_BANDS, band)}, cautions)


def calendar_of(start: np.ndarray) -> dict[str, Covariate]:
    """Return the year of each start (ordinals), and at most four blocks of years."""
    days = start.astype("int64") - 719_163
    year = days.astype("datetime64[D]").astype("datetime64[Y]").astype(np.int64) + 1970
    first, last = int(year.min()), int(year.max())
    width = -(-(last - first + 1) // _MOST_PERIODS)
    begins = range(first, last + 1, width)
    names = tuple(_period(begin, min(begin + width - 1, last)) for begin in begins)
    return {
        "start_year": Numeric(None, year.astype(float)),
        "start_period": Categorical(None, names, (year - first) // width),
    }


def group_of(profile: Profile, kept: np.ndarray) -> Derived:
    """Return a chosen column as a covariate: a number if it is one, otherwise with levels.

    Cautions
    --------
    ``many_levels`` (``covariate``, ``heading``, ``levels``, ``most``): too many to compare.
    ``text_in_numbers`` (``covariate``, ``heading``, ``n``, ``examples``): taken as not recorded.
    ``number_style_unsettled`` (``covariate``, ``heading``, ``decimal``): point or comma could be meant.
    """
    column = profile.column
    about = {"covariate": column.identifier, "heading": excerpt(column.heading)}
    if profile.kind == "number" and profile.numbers is not None:
        return _numeric(profile, profile.numbers, about, kept)
    values = profile.values
    present = values.codes[kept]
    used = np.unique(present[present >= 0]).tolist()
    levels = sorted(used, key=lambda value: natural(values.spelt[value]))
    place = np.full(len(values) + 1, -1)
    place[levels] = np.arange(len(levels))
    cautions = ()
    if len(levels) > MANY_LEVELS:
        cautions = (Caution("many_levels", about | {"levels": len(levels), "most": MANY_LEVELS}),)
    names = tuple(values.spelt[value] for value in levels)
    return Derived({column.identifier: Categorical(column.heading, names, place[present])}, cautions)


def _numeric(profile: Profile, numbers: NumberColumn, about: dict[str, object], kept: np.ndarray) -> Derived:
    column = profile.column
    codes = column.codes[kept]
    cautions = []
    unread = ~numbers.read & np.array([bool(same(text)) for text in column.texts])
    texts = np.unique(codes[unread[codes]]).tolist()
    if texts:
        n = int(np.count_nonzero(unread[codes]))
        examples = [excerpt(column.texts[code]) for code in texts[:5]]
        cautions.append(Caution("text_in_numbers", about | {"n": n, "examples": examples}))
    if not numbers.settled:
        cautions.append(Caution("number_style_unsettled", about | {"decimal": numbers.decimal}))
    return Derived({column.identifier: Numeric(column.heading, numbers.value[codes])}, tuple(cautions))


def _having_patients(levels: tuple[str, ...], codes: np.ndarray) -> Categorical:
    """Return a derived covariate with only the levels that somebody has."""
    used = np.unique(codes[codes >= 0])
    place = np.full(len(levels) + 1, -1)
    place[used] = np.arange(len(used))
    return Categorical(None, tuple(levels[level] for level in used.tolist()), place[codes])


def _period(first: int, last: int) -> str:
    return str(first) if first == last else f"{first}-{last}"
