"""Which column is what: proposed from headings and contents, with the evidence for each proposal."""

from __future__ import annotations

from collections.abc import Iterable
from dataclasses import dataclass
from typing import Any, Literal, get_args

import numpy as np

from vitalroll.register.covariates import OLDEST
from vitalroll.register.dates import Fault, read_dates
from vitalroll.register.meanings import propose_meaning, propose_sexes
from vitalroll.register.profile import Profile, Register
from vitalroll.register.recognition import longest_match, words
from vitalroll.register.spelling import bare

Role = Literal[
    "patient_number", "name", "start", "observed_from", "end", "death_date", "outcome",
    "sex", "age", "birth_date", "group", "none",
]  # fmt: skip
ROLES: tuple[str, ...] = get_args(Role)
DATE_ROLES = ("start", "observed_from", "end", "death_date", "birth_date")
MANY_ROLES = ("end", "name", "group", "none")
"""Roles that any number of columns may have."""

ONLY_TO_COMPARE = ("patient_number", "name")
"""Roles of columns that find the same patient twice and are dropped right after."""

MOST_LEVELS_PROPOSED = 20
_RECOGNISED = 0.5


@dataclass(frozen=True)
class Evidence:
    """Why a role is proposed.

    ``heading_says`` (``role``, ``words``), ``reads_as_dates`` (``read``, ``filled``),
    ``order_settled`` (``order``, ``n``), ``order_not_settled``, ``reads_as_numbers`` (``filled``),
    ``values_recognised`` (``recognised``, ``filled``), ``all_different`` (``distinct``),
    ``few_values`` and ``many_values`` (``distinct``), ``heading_identifies`` and
    ``heading_of_notes`` (``words``), ``earliest_dates``, ``latest_dates``, ``free_text``,
    ``nothing_in_it``.
    """

    code: str
    parameters: dict[str, Any]


@dataclass(frozen=True)
class Proposal:
    """The role proposed for a column, and why."""

    role: str
    evidence: tuple[Evidence, ...]


def propose_roles(register: Register) -> list[Proposal]:
    """Return a proposal for each column, in their order."""
    profiles = register.profiles
    chosen: dict[int, tuple[str, list[Evidence]]] = {}
    _take_dates(register, chosen)
    for role, score in (("sex", _sex), ("outcome", _outcome), ("age", _age), ("patient_number", _number)):
        free = [profile for profile in profiles if profile.column.position not in chosen]
        scored = [(score(profile), profile) for profile in free]
        (best, evidence), profile = max(scored, key=lambda item: item[0][0], default=((0.0, []), None))
        if profile is not None and best > 0:
            chosen[profile.column.position] = (role, evidence)
    for profile in profiles:
        if profile.column.position not in chosen and (evidence := _name(profile)):
            chosen[profile.column.position] = ("name", evidence)
    return [_proposal(profile, chosen.get(profile.column.position)) for profile in profiles]


def _proposal(profile: Profile, chosen: tuple[str, list[Evidence]] | None) -> Proposal:
    role, evidence = chosen or _rest(profile)
    return Proposal(role, (*evidence, *_content(profile)))


def _content(profile: Profile) -> Iterable[Evidence]:
    if profile.kind == "empty":
        yield Evidence("nothing_in_it", {})
    if profile.kind == "date" and profile.dates is not None:
        yield Evidence("reads_as_dates", {"read": profile.dates.read, "filled": profile.filled})
        settling = profile.dates.settling
        if not settling.settled:
            yield Evidence("order_not_settled", {})
        elif settling.for_order:
            yield Evidence("order_settled", {"order": settling.order, "n": settling.for_order})
    if profile.kind == "number":
        yield Evidence("reads_as_numbers", {"filled": profile.filled})


def _said(profile: Profile, role: str) -> tuple[float, list[Evidence]]:
    """Return how clearly the heading names a role (0 to 2), and the evidence."""
    plain = bare(profile.column.heading)
    phrase = longest_match(plain, words()["roles"][role])
    if phrase is None:
        return 0.0, []
    # The whole heading counts most; of several phrases the longest says most.
    clear = len(phrase) / len(plain) + min(len(phrase), 25) / 25
    return clear, [Evidence("heading_says", {"role": role, "words": phrase})]


def _sex(profile: Profile) -> tuple[float, list[Evidence]]:
    if profile.kind not in ("category", "text"):
        return 0.0, []
    clear, evidence = _said(profile, "sex")
    known = propose_sexes(profile.values.spelt[:50])
    recognised = _rows_with(profile, known)
    share = recognised / profile.filled
    if share >= 0.9 and len(profile.values) <= 12:
        evidence = [
            *evidence,
            Evidence("values_recognised", {"recognised": recognised, "filled": profile.filled}),
        ]
        clear += 1.0
    return (clear if clear >= 0.9 else 0.0), evidence


def _outcome(profile: Profile) -> tuple[float, list[Evidence]]:
    if profile.kind in ("date", "number", "empty", "identifier") or len(profile.values) > 500:
        return 0.0, []
    clear, evidence = _said(profile, "outcome")
    known = [value for value in profile.values.spelt if propose_meaning(value)]
    recognised = _rows_with(profile, known)
    if recognised >= _RECOGNISED * profile.filled and len(known) > 1:
        clear += 2.0 * recognised / profile.filled
        evidence = [
            *evidence,
            Evidence("values_recognised", {"recognised": recognised, "filled": profile.filled}),
        ]
    return (clear if clear >= 0.7 else 0.0), evidence


def _age(profile: Profile) -> tuple[float, list[Evidence]]:
    if profile.numbers is None or profile.kind == "identifier":
        return 0.0, []
    clear, evidence = _said(profile, "age")
    if longest_match(bare(profile.column.heading), words()["not_at_start"]):
        return 0.0, []
    value, counts = profile.numbers.value, profile.counts
    likely = (value >= 0) & (value <= OLDEST)
    return (clear if counts[likely].sum() >= _RECOGNISED * profile.filled else 0.0), evidence


def _number(profile: Profile) -> tuple[float, list[Evidence]]:
    clear, evidence = _said(profile, "patient_number")
    if profile.kind in ("date", "empty") or _heading_hides(profile):
        return 0.0, []
    different = Evidence("all_different", {"distinct": profile.distinct})
    if clear:
        return clear + (1.0 if profile.kind == "identifier" else 0.0), [*evidence, different]
    if profile.kind == "identifier" and profile.column.position == 0:
        return 0.1, [different]
    return 0.0, []


def _name(profile: Profile) -> list[Evidence]:
    """Return the evidence that a column holds names of patients: nothing but its heading can say so."""
    if profile.kind not in ("text", "category", "identifier"):
        return []
    clear, evidence = _said(profile, "name")
    return evidence if clear >= 1.0 else []


def _take_dates(register: Register, chosen: dict[int, tuple[str, list[Evidence]]]) -> None:
    """Give the columns of dates their roles: each by its heading first, then by which come first and last."""
    dated = [profile for profile in register.profiles if profile.kind == "date"]
    said: dict[str, list[tuple[float, Profile, list[Evidence]]]] = {role: [] for role in DATE_ROLES}
    unsaid = []
    for profile in dated:
        by_role = [(*_said(profile, role), role) for role in DATE_ROLES]
        clear, evidence, role = max(by_role, key=lambda item: item[0])
        if clear:
            said[role].append((clear, profile, evidence))
        else:
            unsaid.append(profile)
    if not said["start"] and said["observed_from"]:
        # The only beginning that is written down is the first visit here.
        said["start"], said["observed_from"] = said["observed_from"], []
    for role in ("birth_date", "start", "observed_from", "death_date"):
        if said[role]:
            _, profile, evidence = max(said[role], key=lambda item: item[0])
            chosen[profile.column.position] = (role, evidence)
    for _, profile, evidence in said["end"]:
        chosen[profile.column.position] = ("end", evidence)
    unsaid.sort(key=lambda profile: _middle(register, profile))
    if not said["start"] and unsaid:
        chosen[unsaid.pop(0).column.position] = ("start", [Evidence("earliest_dates", {})])
    if not said["end"] and unsaid:
        chosen[unsaid.pop().column.position] = ("end", [Evidence("latest_dates", {})])


def _middle(register: Register, profile: Profile) -> float:
    """Return the median day of a column."""
    found = profile.dates
    if found is None:
        return 0.0
    days = read_dates(found.texts, found.settling.order, last_year=register.last_year)
    read = (days.fault == Fault.NONE) & (profile.counts > 0)
    return float(np.median(np.repeat(days.day[read], profile.counts[read]))) if read.any() else 0.0


def _rest(profile: Profile) -> tuple[str, list[Evidence]]:
    """Return the role of a column that is nothing else: a group, or none."""
    hidden = _heading_hides(profile)
    if hidden:
        return "none", [hidden]
    if profile.kind == "text":
        return "none", [Evidence("free_text", {})]
    if profile.kind == "identifier":
        return "none", [Evidence("all_different", {"distinct": profile.distinct})]
    if profile.kind == "number":
        return "group", []
    if profile.kind == "category":
        if 2 <= profile.distinct <= MOST_LEVELS_PROPOSED:
            return "group", [Evidence("few_values", {"distinct": profile.distinct})]
        code = "many_values" if profile.distinct > MOST_LEVELS_PROPOSED else "few_values"
        return "none", [Evidence(code, {"distinct": profile.distinct})]
    return "none", []


def _heading_hides(profile: Profile) -> Evidence | None:
    plain = bare(profile.column.heading)
    for kind, code in (("identifying", "heading_identifies"), ("notes", "heading_of_notes")):
        phrase = longest_match(plain, words()[kind])
        if phrase:
            return Evidence(code, {"words": phrase})
    return None


def _rows_with(profile: Profile, values: Iterable[str]) -> int:
    wanted = set(values)
    counts = zip(profile.values.spelt, profile.values.counts.tolist(), strict=True)
    return sum(count for value, count in counts if value in wanted)
