"""What the person said about a register, checked against the file, and the rows it makes."""

from __future__ import annotations

from collections.abc import Callable, Mapping
from dataclasses import dataclass, field
from datetime import date

import numpy as np

from vitalroll.errors import Caution, Refusal
from vitalroll.register.checks import Days, Rows
from vitalroll.register.cohort import Covariate, meaning_code
from vitalroll.register.covariates import Derived, age_of, calendar_of, group_of, sex_of
from vitalroll.register.dates import ORDERS, Dates, Fault, read_dates
from vitalroll.register.meanings import SEXES
from vitalroll.register.profile import DateProfile, Profile, Register, dates_anyhow, numbers_anyhow
from vitalroll.register.roles import MANY_ROLES, ROLES
from vitalroll.register.spelling import excerpt, same

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
    """

    roles: Mapping[str, str]
    meanings: Mapping[str, str]
    closing_date: date
    blank_meaning: str | None = None
    sexes: Mapping[str, str] = field(default_factory=dict)
    date_orders: Mapping[str, str] = field(default_factory=dict)


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
        for identifier, role in choices.roles.items():
            where = f"roles.{identifier}"
            if role not in ROLES:
                raise Refusal("not_one_of", field=where, given=role, choices=list(ROLES))
            self._by_role[role].append(register.profile(identifier, where))
        self._check_roles()
        for field_name, said, allowed in (
            ("sexes", choices.sexes, SEXES),
            ("date_orders", choices.date_orders, ORDERS),
        ):
            for key, value in said.items():
                if value not in allowed:
                    raise Refusal(
                        "not_one_of", field=f"{field_name}.{key}", given=value, choices=list(allowed)
                    )

    def one(self, role: str) -> Profile | None:
        """Return the column with a role, or None."""
        return next(iter(self._by_role[role]), None)

    def kept(self) -> tuple[str, ...]:
        """Return the columns that the cohort is made from, in their order; the number is not one."""
        using = [role for role in ROLES if role not in ("patient_number", "none")]
        kept = [profile.column for role in using for profile in self._by_role[role]]
        return tuple(column.identifier for column in sorted(kept, key=lambda column: column.position))

    def cautions(self) -> list[Caution]:
        """Return what is to be said of how the columns were read."""
        if not self._short_years:
            return self._cautions
        last = self._last_year("end")
        headings, counts = zip(*self._short_years, strict=True)
        found = {"n": sum(counts), "headings": list(headings), "first": last - 99, "last": last}
        return [*self._cautions, Caution("two_digit_years", found)]

    def rows(self) -> Rows:
        """Return the rows as dates and meanings."""
        start = self._days("start")
        outcome, blank = self._outcomes()
        rows = Rows(
            start=start,
            observed_from=self._days("observed_from"),
            end=self._days("end"),
            birth=self._days("birth_date"),
            outcome=outcome,
            outcome_blank=blank,
            outcome_text=_writer(self._by_role["outcome"][0]),
            under_care=meaning_code("under_care"),
            closing=self.choices.closing_date.toordinal(),
        )
        self._refuse_without_dates(start)
        return rows

    def covariates(self, rows: Rows, kept: np.ndarray) -> tuple[dict[str, Covariate], list[Caution]]:
        """Return sex, age and the chosen columns for the kept rows, and what to say of them."""
        parts = []
        sex, age, birth = self.one("sex"), self.one("age"), self.one("birth_date")
        if sex is not None:
            parts.append(sex_of(sex.values, self.choices.sexes, kept))
        if age is not None or birth is not None:
            written = None
            if age is not None:
                written = numbers_anyhow(age, self.register.source).value[age.column.codes]
            parts.append(age_of(rows.start, rows.birth if birth is not None else None, written, kept))
        if kept.any():
            parts.append(Derived(calendar_of(rows.start.day[kept]), ()))
        for profile in sorted(self._by_role["group"], key=lambda profile: profile.column.position):
            parts.append(group_of(profile, kept))
        found: dict[str, Covariate] = {}
        cautions: list[Caution] = []
        for part in parts:
            found |= part.covariates
            cautions += part.cautions
        return found, cautions

    def _check_roles(self) -> None:
        for role, profiles in self._by_role.items():
            if len(profiles) > 1 and role not in MANY_ROLES:
                columns = [profile.column.identifier for profile in profiles]
                raise Refusal("role_given_twice", field="roles", role=role, columns=columns)
        if not self._by_role["start"]:
            raise Refusal("no_start_column", field="roles")
        if not self._by_role["end"]:
            raise Refusal("no_end_column", field="roles")
        if not self._by_role["outcome"]:
            raise Refusal("no_outcome_column", field="roles")

    def _days(self, role: str) -> Days:
        """Return the dates of a role; the latest of several columns, if all that is filled can be read."""
        n = len(self.register.source.table)
        profiles = self._by_role[role]
        day, fault = np.zeros(n, np.int64), np.full(n, np.int8(Fault.BLANK))
        worst = np.zeros(n, np.int64)
        for place, profile in enumerate(profiles):
            read = self._read(profile, role)
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
        return Days(day, fault, _writer_of_many(profiles, worst))

    def _read(self, profile: Profile, role: str) -> Dates:
        source = self.register.source
        column = profile.column
        dates = dates_anyhow(profile, source)
        order = self.choices.date_orders.get(column.identifier)
        about = {"column": column.identifier, "heading": excerpt(column.heading)}
        if order is None:
            if not dates.settling.settled:
                where = f"date_orders.{column.identifier}"
                choices = list(dates.settling.choices)
                raise Refusal("date_order_unsettled", field=where, choices=choices, **about)
            order = dates.settling.order
        elif order not in dates.settling.choices and dates.settling.settled:
            self._cautions.append(Caution("order_against_evidence", about | {"order": order}))
        last_year = self._last_year(role)
        read = read_dates(dates.texts, order, last_year=last_year, epoch=source.epoch or "serial_1900")
        self._note_dates(dates, read.fault, profile.counts, about, role)
        return read

    def _last_year(self, role: str) -> int:
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

    def _outcomes(self) -> tuple[np.ndarray, np.ndarray]:
        """Return the meaning of each row's outcome, -1 for none, and where it is blank without one."""
        profile = self._by_role["outcome"][0]
        values = profile.values
        meant = {}
        for value, meaning in self.choices.meanings.items():
            meant[same(value)] = _meaning(meaning, f"meanings.{value}")
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
