"""What a value in the outcome or the sex column probably means: a proposal, never a decision."""

from __future__ import annotations

from collections.abc import Collection

from vitalroll.register.recognition import has_any, words
from vitalroll.register.spelling import bare, same

SEXES = ("female", "male", "other")

# A value may speak of two things ("alive, lost to follow-up"; "stopped follow-up"): the first decides.
_IN_ORDER = ("lost", "moved_away", "recovered", "stopped", "under_care")


def propose_meaning(value: str) -> str | None:
    """Return what a value of the outcome column probably means, as a name from MEANINGS, or None.

    Bare numbers are never proposed a meaning: registers disagree about which of 0 and 1 is dead.
    """
    plain = bare(value)
    listed = words()
    death = listed["death"]
    if not plain or has_any(plain, death["denied"]):
        return "under_care" if plain else None
    if plain in death["codes"] or has_any(plain, death["words"]):
        return _cause(plain, death)
    for meaning in _IN_ORDER:
        known = listed["meanings"][meaning]
        if plain in known["codes"] or has_any(plain, known["words"]):
            return meaning
    return None


def propose_sexes(values: Collection[str]) -> dict[str, str]:
    """Return the probable sex for each value that has one, as a name from SEXES.

    ``M`` beside ``H`` but without ``F`` is Spanish: hombre and mujer. ``H`` alone is homme or hombre.
    """
    listed = words()["sexes"]
    keys = {value: bare(value) or same(value) for value in values}
    found = {}
    for value, key in keys.items():
        for sex in SEXES:
            if key in listed[sex]:
                found[value] = sex
                break
    present = set(keys.values())
    if words()["french_man_code"] in present:
        spanish = words()["spanish_woman_code"] in present and "f" not in present
        for value, key in keys.items():
            if key == words()["french_man_code"]:
                found[value] = "male"
            elif key == words()["spanish_woman_code"] and spanish:
                found[value] = "female"
    return found


def _cause(plain: str, death: dict[str, list[str]]) -> str:
    if has_any(plain, death["other_cause"]):
        return "died_of_other_cause"
    if has_any(plain, death["cause_unknown"]):
        return "died_cause_unknown"
    return "died_of_disease" if has_any(plain, death["disease"]) else "died_cause_unknown"
