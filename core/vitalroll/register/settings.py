"""How a register was read, as a small file without patients, to be applied to the next list of its kind.

Columns are known by their headings. Of values only those are kept that say nothing of one patient:
values that stand in several rows, values that this program would have proposed by itself, and
misspellings of a value that stands in several rows.
"""

from __future__ import annotations

import json
import re
from collections.abc import Callable, Mapping
from dataclasses import dataclass
from datetime import date
from typing import Any

from vitalroll.errors import Caution, Refusal
from vitalroll.register.calendars import CALENDARS
from vitalroll.register.cohort import MEANINGS
from vitalroll.register.dates import ORDERS, Fault, read_dates
from vitalroll.register.findings.mending import CODES
from vitalroll.register.meanings import SEXES, propose_meaning, propose_sexes
from vitalroll.register.plan import Choices
from vitalroll.register.profile import Profile, Register
from vitalroll.register.roles import DATE_ROLES, ROLES
from vitalroll.register.spelling import same

KIND, VERSION = "vitalroll-settings", 1
SEVERAL_ROWS = 3
LONGEST = 1_000_000
"""A longer text is no file of settings: these take a few thousand letters."""

DEEPEST = 20
"""No file of settings is nested deeper than a handful of levels."""

_LISTED = 30


@dataclass(frozen=True)
class Saved:
    """Settings as plain data, and how many values were left out because few rows have them."""

    settings: dict[str, Any]
    values_left_out: int


@dataclass(frozen=True)
class Applied:
    """Settings as choices about an opened register, and where the two differ.

    ``reading`` has the fields of ``Choices`` as plain data. ``absent`` are headings that the settings
    know and the file does not have; ``added`` those that only the file has (not used, until said);
    ``new_values`` are values of the outcome that the settings do not know, {value, count}.
    """

    reading: dict[str, Any]
    matched: int
    absent: tuple[dict[str, str], ...]
    added: tuple[str, ...]
    new_values: tuple[dict[str, Any], ...]
    cautions: tuple[Caution, ...]


def settings_of(register: Register, choices: Choices) -> Saved:
    """Return how a register was read, without anything of a patient."""
    outcomes = [profile for profile in register.profiles if _role(choices, profile) == "outcome"]
    sexes = [profile for profile in register.profiles if _role(choices, profile) == "sex"]
    meanings, meanings_left = _common(choices.meanings, outcomes, propose_meaning)
    common_sexes, sexes_left = _common(choices.sexes, sexes, lambda value: propose_sexes([value]).get(value))
    spellings, spellings_left = _common_spellings(register, choices)
    columns = [
        {
            "heading": profile.column.heading,
            "position": profile.column.position,
            "role": _role(choices, profile),
            "order": choices.date_orders.get(profile.column.identifier),
            "calendar": choices.calendars.get(profile.column.identifier, "gregorian"),
            "spellings": spellings.get(profile.column.identifier, {}),
        }
        for profile in register.profiles
    ]
    settings = {
        "kind": KIND,
        "version": VERSION,
        "columns": columns,
        "meanings": meanings,
        "blank_meaning": choices.blank_meaning,
        "sexes": common_sexes,
        "closing_date": choices.closing_date.isoformat(),
        "unseen_months": choices.unseen_months,
        "repairs": sorted(choices.repairs, key=CODES.index),
    }
    return Saved(settings, meanings_left + sexes_left + spellings_left)


def apply_settings(register: Register, text: str) -> Applied:
    """Return what saved settings say about an opened register.

    Raises
    ------
    Refusal
        ``settings_not_read``: the text is not a file of settings; ``settings_too_new`` (``version``,
        ``known``).

    Cautions
    --------
    ``order_differs`` (``heading``, ``order``: that of the settings): the dates of the file show
    another order, which is kept. ``not_dates_any_more`` (``heading``): the column is not
    used. ``closing_date_from_settings`` (``closing``): the next list will
    have another. ``dates_after_closing`` (``n``, ``closing``): dates of the file lie after it.
    """
    settings = _checked(text)
    column_of, absent, added = _matched(register, settings["columns"])
    roles = {profile.column.identifier: "none" for profile in register.profiles}
    orders: dict[str, str] = {}
    spellings: dict[str, dict[str, str]] = {}
    calendars: dict[str, str] = {}
    cautions: list[Caution] = []
    for said, profile in column_of:
        identifier = profile.column.identifier
        role = said["role"]
        if role in DATE_ROLES and profile.dates is None and profile.kind != "empty":
            cautions.append(Caution("not_dates_any_more", {"heading": profile.column.heading}))
            role = "none"
        roles[identifier] = role
        if said["calendar"] != "gregorian":
            calendars[identifier] = said["calendar"]
        if said["spellings"]:
            spellings[identifier] = said["spellings"]
        if profile.dates is not None:
            settling = profile.dates.settling
            if said["order"] in settling.choices:
                orders[identifier] = said["order"]
            elif settling.settled:
                orders[identifier] = settling.order
                if said["order"] and role in DATE_ROLES:
                    told = {"heading": profile.column.heading, "order": said["order"]}
                    cautions.append(Caution("order_differs", told))
    for profile in register.profiles:
        settling = profile.dates.settling if profile.dates is not None else None
        if settling is not None and settling.settled:
            orders.setdefault(profile.column.identifier, settling.order)
    cautions += _closing_cautions(register, roles, orders, settings["closing_date"])
    reading = {
        "roles": roles,
        "meanings": settings["meanings"],
        "blank_meaning": settings["blank_meaning"],
        "sexes": settings["sexes"],
        "date_orders": orders,
        "closing_date": settings["closing_date"],
        "repairs": {code: [] for code in settings["repairs"]},
        "unseen_months": settings["unseen_months"],
        "spellings": spellings,
        "calendars": calendars,
    }
    new_values = _new_values(register, roles, settings["meanings"])
    return Applied(reading, len(column_of), tuple(absent), tuple(added), new_values, tuple(cautions))


def _role(choices: Choices, profile: Profile) -> str:
    return choices.roles.get(profile.column.identifier, "none")


def _common(
    said: Mapping[str, str], profiles: list[Profile], proposed: Callable[[str], str | None]
) -> tuple[dict[str, str], int]:
    """Return the values that several rows have, or that would be proposed so, and how many are left out."""
    counts: dict[str, int] = {}
    for profile in profiles:
        for key, count in zip(profile.values.keys, profile.values.counts.tolist(), strict=True):
            counts[key] = counts.get(key, 0) + count
    present = {value: meaning for value, meaning in said.items() if counts.get(same(value), 0)}
    kept = {
        value: meaning
        for value, meaning in present.items()
        if counts[same(value)] >= SEVERAL_ROWS or proposed(value) == meaning
    }
    return kept, len(present) - len(kept)


def _common_spellings(register: Register, choices: Choices) -> tuple[dict[str, dict[str, str]], int]:
    found: dict[str, dict[str, str]] = {}
    left_out = 0
    for identifier, said in choices.spellings.items():
        values = register.profile(identifier, f"spellings.{identifier}").values
        counts = dict(zip(values.keys, values.counts.tolist(), strict=True))
        kept = {one: into for one, into in said.items() if counts.get(same(into), 0) >= SEVERAL_ROWS}
        left_out += len(said) - len(kept)
        if kept:
            found[identifier] = kept
    return found, left_out


def _depth(text: str) -> int:
    """Return how deep a text of JSON is nested, without following it.

    In WebAssembly a text nested without end would exhaust the stack and take the whole engine with it.
    """
    deepest = depth = 0
    for mark in re.findall(r"[\[\]{}]", re.sub(r'"(?:\\.|[^"\\])*"', "", text)):
        depth += 1 if mark in "[{" else -1
        deepest = max(deepest, depth)
    return deepest


def _checked(text: str) -> dict[str, Any]:
    """Return settings in which every field has the kind that it must have."""
    if len(text) > LONGEST or _depth(text) > DEEPEST:
        raise Refusal("settings_not_read")
    try:
        found = json.loads(text.removeprefix("\ufeff"))
    except ValueError:
        raise Refusal("settings_not_read") from None
    if not isinstance(found, dict) or found.get("kind") != KIND:
        raise Refusal("settings_not_read")
    version = found.get("version")
    if not isinstance(version, int) or version < 1:
        raise Refusal("settings_not_read")
    if version > VERSION:
        raise Refusal("settings_too_new", version=version, known=VERSION)
    months = found.get("unseen_months")
    if not isinstance(months, (int, float)) or isinstance(months, bool) or not 1 <= months <= 120:
        raise Refusal("settings_not_read")
    columns = found.get("columns")
    if not isinstance(columns, list) or not all(map(_is_column, columns)):
        raise Refusal("settings_not_read")
    repairs = found.get("repairs")
    fits = (
        _is_mapping(found.get("meanings"), MEANINGS)
        and _is_mapping(found.get("sexes"), SEXES)
        and found.get("blank_meaning") in (None, *MEANINGS)
        and isinstance(repairs, list)
        and all(code in CODES for code in repairs)
        and _is_day(found.get("closing_date"))
    )
    if not fits:
        raise Refusal("settings_not_read")
    return found


def _is_column(said: Any) -> bool:
    return (
        isinstance(said, dict)
        and isinstance(said.get("heading"), str)
        and isinstance(said.get("position"), int)
        and said.get("role") in ROLES
        and said.get("order") in (None, *ORDERS)
        and said.get("calendar") in CALENDARS
        and _is_mapping(said.get("spellings"), None)
    )


def _is_mapping(said: Any, allowed: tuple[str, ...] | None) -> bool:
    if not isinstance(said, dict):
        return False
    return all(isinstance(value, str) and (allowed is None or value in allowed) for value in said.values())


def _is_day(said: Any) -> bool:
    try:
        date.fromisoformat(said)
    except (TypeError, ValueError):
        return False
    return True


def _matched(
    register: Register, columns: list[dict[str, Any]]
) -> tuple[list[tuple[dict[str, Any], Profile]], list[dict[str, str]], list[str]]:
    """Match columns by heading, of equal headings in their order; without a heading, by position."""
    free: dict[str, list[Profile]] = {}
    for profile in register.profiles:
        heading = same(profile.column.heading)
        free.setdefault(heading or f"\0{profile.column.position}", []).append(profile)
    found, absent = [], []
    for said in columns:
        waiting = free.get(same(said["heading"]) or f"\0{said['position']}")
        if waiting:
            found.append((said, waiting.pop(0)))
        elif said["role"] != "none":
            absent.append({"heading": said["heading"], "role": said["role"]})
    left = [profile.column for waiting in free.values() for profile in waiting]
    added = [column.heading or column.identifier for column in sorted(left, key=lambda each: each.position)]
    return found, absent, added[:_LISTED]


def _closing_cautions(
    register: Register, roles: dict[str, str], orders: dict[str, str], closing: str
) -> list[Caution]:
    last = date.fromisoformat(closing).toordinal()
    after = 0
    for profile in register.profiles:
        if roles[profile.column.identifier] in ("start", "end") and profile.dates is not None:
            found = profile.dates
            order = orders.get(profile.column.identifier, found.settling.order)
            read = read_dates(found.texts, order, last_year=register.last_year)
            after += int(profile.counts[(read.fault == Fault.NONE) & (read.day > last)].sum())
    cautions = [Caution("closing_date_from_settings", {"closing": closing})]
    if after:
        cautions.append(Caution("dates_after_closing", {"n": after, "closing": closing}))
    return cautions


def _new_values(
    register: Register, roles: dict[str, str], meanings: dict[str, str]
) -> tuple[dict[str, Any], ...]:
    known = {same(value) for value in meanings}
    found = []
    for profile in register.profiles:
        if roles[profile.column.identifier] == "outcome":
            values = profile.values
            new = [i for i, key in enumerate(values.keys) if key not in known]
            found += [{"value": values.spelt[i], "count": int(values.counts[i])} for i in new]
    return tuple(sorted(found, key=lambda each: -each["count"])[:_LISTED])
