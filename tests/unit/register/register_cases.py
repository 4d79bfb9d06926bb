"""What the tests of the register share: small registers, opened and built in one step."""

from __future__ import annotations

from datetime import date

from vitalroll.register.build import build
from vitalroll.register.plan import Choices
from vitalroll.register.profile import profile_columns
from vitalroll.register.source import open_source

HEADINGS = ("No", "Diagnosed", "Here", "Last", "Status", "Born", "Sex", "Age", "Zone")
ROLES = dict(
    zip(
        (f"c{i}" for i in range(9)),
        (
            "patient_number",
            "start",
            "observed_from",
            "end",
            "outcome",
            "birth_date",
            "sex",
            "age",
            "group",
        ),
        strict=True,
    )
)
MEANINGS = {"care": "under_care", "died": "died_of_disease", "lost": "lost", "moved": "moved_away"}
CLOSING = date(2020, 12, 31)


def opened(text):
    """Open a register from its text."""
    return profile_columns(open_source(text.encode()))


def row(
    no="1", start="2018-01-01", here="", last="2019-01-01", status="care", born="", sex="", age="", zone=""
):
    """Return one row of a register."""
    return (no, start, here, last, status, born, sex, age, zone)


def built(*rows, **said):
    """Build the register of these rows; ``said`` replaces any of the usual choices."""
    # The numbers of a first patient who has none of the faults keep the columns what they are.
    text = "\n".join(",".join(cells) for cells in (HEADINGS, *rows))
    usual = {
        "roles": ROLES,
        "meanings": MEANINGS,
        "closing_date": CLOSING,
        "sexes": {"F": "female", "M": "male"},
    }
    return build(opened(text), Choices(**(usual | said)))


def reasons(found):
    """Return line, code and parameters of every row set aside."""
    return [(note.line, note.code, note.parameters) for note in found.set_aside]


def codes(cautions):
    """Return the codes of cautions."""
    return [caution.code for caution in cautions]
