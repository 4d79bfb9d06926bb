"""What the person said about a register, checked against the file, and the rows it makes."""

from __future__ import annotations

from collections.abc import Callable, Collection, Mapping
from dataclasses import dataclass, field, replace
from datetime import date

import numpy as np

from vitalroll.errors import Caution, Refusal
from vitalroll.register.calendars import CALENDARS, CONVERTED
from vitalroll.register.checks import Days, Rows
from vitalroll.register.cohort import Covariate, meaning_code
from vitalroll.register.covariates import Derived, age_of, calendar_of, group_of, sex_of
from vitalroll.register.dates import ORDERS, Dates, Fault, read_dates
from vitalroll.register.meanings import SEXES
from vitalroll.register.profile import DateProfile, Profile, Register, dates_anyhow, numbers_anyhow
from vitalroll.register.roles import MANY_ROLES, ONLY_TO_COMPARE, ROLES
from vitalroll.register.spelling import excerpt, same
from vitalroll.register.variants import merged

FEW_LINES = 20
"""So many lines are named in a caution."""


@dataclass(frozen=True)
class Choices:
    """What the person said about an opened register.

    Parameters
    ----------
    roles : mapping of column identifier to a name from ROLES
    meanings : mapping of outcome value to a name from MEANINGS
        Values are matched without regard to case, spaces and unseen characters.
    closing_date : datetime.date
    blank_meaning : str, optional
        What a blank outcome means.
    sexes : mapping of value to female, male or other
    date_orders : mapping of column identifier to a name from dates.ORDERS
    repairs : mapping of the code of a finding to lines
        The findings whose repair is accepted, each with the lines for which it is declined.
    unseen_months : float
        Somebody under care who was not seen for longer than this before the closing date is perhaps lost.
    spellings : mapping of column identifier to a mapping of value to the value that it is
        Misspelt values of columns to group by.
    calendars : mapping of column identifier to a name from calendars.CALENDARS
        Columns of dates that are not Gregorian.
    """

    roles: Mapping[str, str]
    meanings: Mapping[str, str]
    closing_date: date
    blank_meaning: str | None = None
    sexes: Mapping[str, str] = field(default_factory=dict)
    date_orders: Mapping[str, str] = field(default_factory=dict)
    repairs: Mapping[str, Collection[int]] = field(default_factory=dict)
    unseen_months: float = 12
    spellings: Mapping[str, Mapping[str, str]] = field(default_factory=dict)
    calendars: Mapping[str, str] = field(default_factory=dict)


class Plan:
    """The choices, checked: which column has which role, and how each is to be read.

    Raises
    ------
    Refusal
        See ``build.build``.
    """

    def __init__(self, register: Register, choices: Choices) -> None:
        self.register = register
        self.choices = choices
        self._by_role: dict[str, list[Profile]] = {role: [] for role in ROLES}
        self._cautions: list[Caution] = []
        self._short_years: list[tuple[str, int]] = []
        self._dates_read: dict[str, Dates] = {}
        for identifier, role in choices.roles.items():
            where = f"roles.{identifier}"
            if role not in ROLES:
                raise Refusal("not_one_of", field=where, given=role, choices=list(ROLES))
            self._by_role[role].append(register.profile(identifier, where))
        self._check_roles()
        for field_name, said, allowed in (
            ("sexes", choices.sexes, SEXES),
            ("date_orders", choices.date_orders, ORDERS),
            ("calendars", choices.calendars, CALENDARS),
        ):
            for key, value in said.items():
                if value not in allowed:
                    raise Refusal(
                        "not_one_of", field=f"{field_name}.{key}", given=value, choices=list(allowed)
                    )

    def one(self, role: str) -> Profile | None:
        """Return the column with a role, or None."""
        return next(iter(self._by_role[role]), None)

    def having(self, role: str) -> tuple[Profile, ...]:
        """Return the columns with a role."""
        return tuple(self._by_role[role])

    def kept(self) -> tuple[str, ...]:
        """Return the columns that the cohort is made from, in their order; numbers and names are none."""
        using = [role for role in ROLES if role not in (*ONLY_TO_COMPARE, "none")]
        kept = [profile.column for role in using for profile in self._by_role[role]]
        return tuple(column.identifier for column in sorted(kept, key=lambda column: column.position))

    def cautions(self) -> list[Caution]:
        """Return what is to be said of how the columns were read."""
        if not self._short_years:
            return self._cautions
        last = self.last_year("end")
        headings, counts = zip(*self._short_years, strict=True)
        found = {"n": sum(counts), "headings": list(headings), "first": last - 99, "last": last}
        return [*self._cautions, Caution("two_digit_years", found)]

    def rows(self) -> Rows:
        """Return the rows as dates and meanings."""
        start = self.days("start")
        outcome, blank = self._outcomes()
        rows = Rows(
            start=start,
            observed_from=self.days("observed_from"),
            end=self.days("end", "death_date"),
            birth=self.days("birth_date"),
            outcome=outcome,
            outcome_blank=blank,
            outcome_text=_writer(self._by_role["outcome"][0]),
            under_care=meaning_code("under_care"),
            closing=self.choices.closing_date.toordinal(),
        )
        self._refuse_without_dates(start)
        return rows

    def written_ages(self) -> np.ndarray:
        """Return the age written in each row, in years; NaN where none is."""
        age = self.one("age")
        if age is None:
            return np.full(len(self.register.source.table), np.nan)
        return numbers_anyhow(age, self.register.source).value[age.column.codes]

    def sex_codes(self) -> np.ndarray:
        """Return the position in SEXES of each row's sex, -1 where it is not recorded."""
        sex = self.one("sex")
        if sex is None:
            return np.full(len(self.register.source.table), -1)
        said = {same(value): SEXES.index(meaning) for value, meaning in self.choices.sexes.items()}
        return np.array([said.get(key, -1) for key in sex.values.keys] + [-1])[sex.values.codes]

    def covariates(self, rows: Rows, kept: np.ndarray) -> tuple[dict[str, Covariate], list[Caution]]:
        """Return sex, age and the chosen columns for the kept rows, and what to say of them."""
        parts = []
        sex, age, birth = self.one("sex"), self.one("age"), self.one("birth_date")
        if sex is not None:
            parts.append(sex_of(sex.values, self.choices.sexes, kept))
        if age is not None or birth is not None:
            written = self.written_ages() if age is not None else None
            parts.append(age_of(rows.start, rows.birth if birth is not None else None, written, kept))
        if kept.any():
            parts.append(Derived(calendar_of(rows.start.day[kept]), ()))
        for profile in sorted(self._by_role["group"], key=lambda profile: profile.column.position):
            parts.append(group_of(self._well_spelt(profile), kept))
        found: dict[str, Covariate] = {}
        cautions: list[Caution] = []
        for part in parts:
            found |= part.covariates
            cautions += part.cautions
        return found, cautions

    def _well_spelt(self, profile: Profile) -> Profile:
        """Return a column with the values that are another one taken for it."""
        identifier = profile.column.identifier
        said = self.choices.spellings.get(identifier)
        if not said:
            return profile
        return replace(profile, values=merged(profile.values, said, f"spellings.{identifier}"))

    def _check_roles(self) -> None:
        for role, profiles in self._by_role.items():
            if len(profiles) > 1 and role not in MANY_ROLES:
                columns = [profile.column.identifier for profile in profiles]
                raise Refusal("role_given_twice", field="roles", role=role, columns=columns)
        if not self._by_role["start"]:
            raise Refusal("no_start_column", field="roles")
        if not self._by_role["end"] and not self._by_role["death_date"]:
            raise Refusal("no_end_column", field="roles")
        if not self._by_role["outcome"]:
            raise Refusal("no_outcome_column", field="roles")

    def days(self, *roles: str) -> Days:
        """Return the dates of roles; the latest of several columns, if all that is filled can be read."""
        n = len(self.register.source.table)
        columns = [(role, profile) for role in roles for profile in self._by_role[role]]
        day, fault = np.zeros(n, np.int64), np.full(n, np.int8(Fault.BLANK))
        worst = np.zeros(n, np.int64)
        for place, (role, profile) in enumerate(columns):
            read = self.read(profile, role)
            codes = profile.column.codes
            new_day, new_fault = read.day[codes], read.fault[codes]
            given = new_fault == Fault.NONE
            later = given & ((fault != Fault.NONE) | (new_day > day))
            day = np.where(later, new_day, day)
            unreadable = ~given & (new_fault != Fault.BLANK)
            worst = np.where(unreadable, place, worst)
            # What is written and cannot be read may be the true end: no other column stands in for it.
            spoilt = (fault != Fault.NONE) & (fault != Fault.BLANK)
            fault = np.where(spoilt, fault, np.where(given | unreadable, new_fault, fault)).astype(np.int8)
        return Days(day, fault, _writer_of_many([profile for _, profile in columns], worst))

    def read(self, profile: Profile, role: str) -> Dates:
        """Return the distinct texts of a column as dates, in the order that is chosen for it."""
        identifier = profile.column.identifier
        if identifier not in self._dates_read:
            self._dates_read[identifier] = self._read(profile, role)
        return self._dates_read[identifier]

    def calendar_of(self, profile: Profile) -> str:
        """Return the calendar that the dates of a column follow."""
        return self.choices.calendars.get(profile.column.identifier, "gregorian")

    def order_of(self, profile: Profile) -> str:
        """Return the order in which a column of dates is read."""
        chosen = self.choices.date_orders.get(profile.column.identifier)
        if self.calendar_of(profile) == "ethiopian":
            # A month 13 would be taken for a day; these dates are written with the day first.
            return "day_month_year"
        return chosen or dates_anyhow(profile, self.register.source).settling.order

    def _read(self, profile: Profile, role: str) -> Dates:
        source = self.register.source
        column = profile.column
        dates = dates_anyhow(profile, source)
        order = self.choices.date_orders.get(column.identifier)
        calendar = self.calendar_of(profile)
        about = {"column": column.identifier, "heading": excerpt(column.heading)}
        if calendar not in CONVERTED:
            where = f"calendars.{column.identifier}"
            raise Refusal("calendar_not_converted", field=where, calendar=calendar, **about)
        if calendar == "ethiopian":
            order = self.order_of(profile)
        elif order is None:
            if not dates.settling.settled:
                where = f"date_orders.{column.identifier}"
                choices = list(dates.settling.choices)
                raise Refusal("date_order_unsettled", field=where, choices=choices, **about)
            order = dates.settling.order
        elif order not in dates.settling.choices and dates.settling.settled:
            self._cautions.append(Caution("order_against_evidence", about | {"order": order}))
        last_year = self.last_year(role)
        epoch = source.epoch or "serial_1900"
        read = read_dates(dates.texts, order, last_year=last_year, epoch=epoch, calendar=calendar)
        self._note_dates(dates, read.fault, profile.counts, about, role)
        return read

    def last_year(self, role: str) -> int:
        """Return the latest year that two digits can mean; contacts go on after closing, births not."""
        return self.choices.closing_date.year + (0 if role == "birth_date" else 1)

    def _note_dates(
        self,
        dates: DateProfile,
        fault: np.ndarray,
        weights: np.ndarray,
        about: dict[str, str],
        role: str,
    ) -> None:
        if dates.settling.against_order:
            found = about | {"n": dates.settling.against_order}
            self._cautions.append(Caution("dates_against_order", found))
        if dates.short_years:
            self._short_years.append((about["heading"], dates.short_years))
        if dates.buddhist:
            self._cautions.append(Caution("buddhist_years", about | {"n": dates.buddhist}))
        if role == "birth_date":
            unread = int(weights[(fault != Fault.NONE) & (fault != Fault.BLANK)].sum())
            if unread:
                self._cautions.append(Caution("birth_dates_unreadable", about | {"n": unread}))

    def meanings(self) -> dict[str, int]:
        """Return the position of the meaning of each value of the outcome, by what it is matched by."""
        said = self.choices.meanings.items()
        return {same(value): _meaning(meaning, f"meanings.{value}") for value, meaning in said}

    def _outcomes(self) -> tuple[np.ndarray, np.ndarray]:
        """Return the meaning of each row's outcome, -1 for none, and where it is blank without one."""
        values = self._by_role["outcome"][0].values
        meant = self.meanings()
        codes = np.array([meant.get(key, -1) for key in values.keys] + [-1])
        outcome = codes[values.codes]
        blank = values.codes < 0
        if self.choices.blank_meaning is not None:
            outcome = np.where(blank, _meaning(self.choices.blank_meaning, "blank_meaning"), outcome)
            blank = np.zeros(len(blank), dtype=bool)
        return outcome, blank

    def _refuse_without_dates(self, start: Days) -> None:
        if (start.given & self.register.source.patients()).any():
            return
        profile = self._by_role["start"][0]
        raise Refusal(
            "no_readable_dates",
            field=f"roles.{profile.column.identifier}",
            column=profile.column.identifier,
            heading=excerpt(profile.column.heading),
            examples=[excerpt(value) for value in profile.values.spelt[:3]],
        )


def _meaning(meaning: str, where: str) -> int:
    try:
        return meaning_code(meaning)
    except Refusal as refusal:
        raise Refusal(refusal.code, field=where, **refusal.parameters) from None


def _writer(profile: Profile) -> Callable[[int], str]:
    """Return a function that gives what is written in a row of a column."""
    column = profile.column
    return lambda row: excerpt(column.texts[column.codes[row]])


def _writer_of_many(profiles: list[Profile], place: np.ndarray) -> Callable[[int], str]:
    writers = [_writer(profile) for profile in profiles]
    return lambda row: writers[int(place[row])](row)
