"""The demo register: invented patients of an invented rheumatic heart disease clinic.

Nobody in it exists, nor do the hospital, the district and its zones. It is made from a seed, so
that it is the same for everybody, and it has the faults that real registers have: several ways to
write a date and a status, patients first seen elsewhere, losses, transfers, lines that cannot be
true, a heading repeated half way, and a total at the end.
"""

from __future__ import annotations

import csv
import io
from dataclasses import dataclass
from datetime import date, timedelta

import numpy as np

SEED = 20250630
FIRST_DAY = date(2016, 1, 4)
CLOSING = date(2025, 6, 30)
PREAMBLE = (
    "Invented data: Maruvi District Hospital (invented), rheumatic heart disease clinic, follow-up register"
)
HEADINGS = [
    "Reg no", "Initials", "Sex", "Date of birth", "Diagnosed", "First seen here", "Severity at entry",
    "Zone", "Found by", "Prophylaxis", "Last contact or end", "Status",
]  # fmt: skip
NEWCOMERS_PER_YEAR = (104, 112, 118, 121, 96, 117, 131, 139, 146, 74)
"""From 2016 on; fewer in 2020, and half a year of 2025."""

ZONES = ("Upper Maruvi", "Lakeside", "Tenga Hill", "Old Market")
ZONE_SHARES = (0.2, 0.3, 0.15, 0.35)
FOUND_BY = ("Clinic visit", "School screening", "After admission")
SEVERITIES = ("Mild", "Moderate", "Severe")
SEVERITY_BY_FOUND = {
    "Clinic visit": (0.35, 0.42, 0.23),
    "School screening": (0.72, 0.23, 0.05),
    "After admission": (0.08, 0.37, 0.55),
}
PLANS = ("Monthly injection", "Daily tablets")

DEATHS_PER_YEAR = {"Mild": 0.008, "Moderate": 0.028, "Severe": 0.095}
LOSSES_PER_YEAR = 0.052
TRANSFERS_PER_YEAR = 0.018
STOPPING_PER_YEAR = 0.009
COMPLETION_PER_YEAR = {"Mild": 0.07, "Moderate": 0.02, "Severe": 0.0}
COMPLETION_AFTER_DAYS = 5 * 365
FIRST_YEAR_FACTOR = 1.9
"""Dying and being lost are this much commoner in the first year."""

WRITTEN_STATUS = {
    "under_care": (("Under care", 0.86), ("under care", 0.09), ("Under  care\u00a0", 0.05)),
    "died_of_disease": (("Died - RHD", 0.8), ("Died (RHD)", 0.2)),
    "died_of_other_cause": (("Died - other cause", 1.0),),
    "died_cause_unknown": (("Died, cause not known", 1.0),),
    "lost": (("Lost to follow-up", 0.75), ("Lost", 0.2), ("lost to follow up", 0.05)),
    "moved_away": (("Transferred out", 0.85), ("Transfered out", 0.15)),
    "recovered": (("Completed prophylaxis", 1.0),),
    "stopped": (("Stopped by own wish", 1.0),),
}


@dataclass
class _Patient:
    number: int
    sex: str
    born: date
    diagnosed: date
    first_seen: date
    severity: str
    zone: str
    found_by: str
    plan: str
    ended: date
    meaning: str


def demo_register(seed: int = SEED) -> str:
    """Return the register as CSV text with a line of preamble, about 1,160 patients and some faults."""
    random = np.random.default_rng(seed)
    patients = _patients(random)
    rows = [_written(random, patient) for patient in patients]
    _spoil(random, rows)
    text = io.StringIO()
    writer = csv.writer(text, lineterminator="\r\n")
    writer.writerow([PREAMBLE])
    writer.writerow([])
    writer.writerow(HEADINGS)
    half = len(rows) // 2
    writer.writerows(rows[:half])
    writer.writerow(HEADINGS)
    writer.writerows(rows[half:])
    writer.writerow(["Total", "", str(len(rows))])
    writer.writerows([[], []])
    return text.getvalue()


def _patients(random: np.random.Generator) -> list[_Patient]:
    starts = []
    for year, count in enumerate(NEWCOMERS_PER_YEAR, FIRST_DAY.year):
        first = max(FIRST_DAY, date(year, 1, 1))
        last = min(CLOSING - timedelta(days=10), date(year, 12, 31))
        days = random.integers(0, (last - first).days + 1, count)
        starts += [first + timedelta(days=int(day)) for day in np.sort(days)]
    return [_patient(random, number, first_seen) for number, first_seen in enumerate(starts, 1)]


def _patient(random: np.random.Generator, number: int, first_seen: date) -> _Patient:
    found_by = str(random.choice(FOUND_BY, p=(0.55, 0.25, 0.2)))
    severity = str(random.choice(SEVERITIES, p=SEVERITY_BY_FOUND[found_by]))
    age = 5 + float(random.gamma(2.6, 5.2)) + (4.0 if severity == "Severe" else 0.0)
    # Some were diagnosed elsewhere before they came here: delayed entry.
    before = int(random.gamma(1.5, 260)) if random.random() < 0.09 else 0
    zone = str(random.choice(ZONES, p=ZONE_SHARES))
    plan = str(random.choice(PLANS, p=(0.7, 0.3) if zone != "Tenga Hill" else (0.45, 0.55)))
    ended, meaning = _course(random, first_seen, severity, zone, plan)
    return _Patient(
        number=number,
        sex=str(random.choice(("F", "M"), p=(0.61, 0.39))),
        born=first_seen - timedelta(days=int(age * 365.25)),
        diagnosed=first_seen - timedelta(days=before),
        first_seen=first_seen,
        severity=severity,
        zone=zone,
        found_by=found_by,
        plan=plan,
        ended=ended,
        meaning=meaning,
    )


def _course(
    random: np.random.Generator, first_seen: date, severity: str, zone: str, plan: str
) -> tuple[date, str]:
    """Follow one patient month by month until something happens or the register closes."""
    injected = plan == "Monthly injection"
    dying = DEATHS_PER_YEAR[severity] * (0.8 if injected else 1.25)
    losing = LOSSES_PER_YEAR * (0.85 if injected else 1.3) * (1.7 if zone == "Tenga Hill" else 1.0)
    day = first_seen
    while True:
        here = (day - first_seen).days
        early = FIRST_YEAR_FACTOR if here < 365 else 1.0
        hazards = {
            "died_of_disease": 0.8 * dying * early,
            "died_of_other_cause": 0.12 * dying,
            "died_cause_unknown": 0.08 * dying * early,
            "lost": losing * early,
            "moved_away": TRANSFERS_PER_YEAR,
            "stopped": STOPPING_PER_YEAR,
            "recovered": COMPLETION_PER_YEAR[severity] if here > COMPLETION_AFTER_DAYS else 0.0,
        }
        step = int(random.integers(20, 41))
        total = sum(hazards.values())
        if random.random() < total * step / 365.25:
            ways, weights = zip(*hazards.items(), strict=True)
            meaning = str(random.choice(ways, p=np.array(weights) / total))
            ended = day + timedelta(days=int(random.integers(0, step)))
            if ended < CLOSING:
                return ended, meaning
        day += timedelta(days=step)
        if day >= CLOSING:
            # Still under care: last seen at the latest monthly or quarterly visit.
            since = int(random.integers(0, 32 if injected else 95))
            return max(first_seen, CLOSING - timedelta(days=since)), "under_care"


def _written(random: np.random.Generator, patient: _Patient) -> list[str]:
    ways, weights = zip(*WRITTEN_STATUS[patient.meaning], strict=True)
    initials = "".join(random.choice(list("ABDEFGIKLMNOPRSTUVWZ"), 2))
    seen_here = "" if patient.first_seen == patient.diagnosed else _day(random, patient.first_seen)
    return [
        f"RH-{patient.number:04d}",
        initials,
        patient.sex if random.random() < 0.97 else {"F": "Female", "M": "male"}[patient.sex],
        _day(random, patient.born) if random.random() < 0.96 else "",
        _day(random, patient.diagnosed),
        seen_here,
        patient.severity if random.random() < 0.98 else "",
        patient.zone if random.random() < 0.97 else patient.zone.upper(),
        patient.found_by,
        patient.plan,
        _day(random, patient.ended),
        str(random.choice(ways, p=weights)),
    ]


def _day(random: np.random.Generator, day: date) -> str:
    """Write a date the way different clerks do; day always before month."""
    way = random.random()
    if way < 0.86:
        return f"{day.day:02d}/{day.month:02d}/{day.year}"
    if way < 0.93:
        return f"{day.day}-{day.month}-{day.year}"
    if way < 0.97:
        return f"{day.day:02d}.{day.month:02d}.{day.year % 100:02d}"
    months = ("Jan", "Feb", "Mar", "Apr", "May", "Jun", "Jul", "Aug", "Sep", "Oct", "Nov", "Dec")
    return f"{day.day} {months[day.month - 1]} {day.year}"


def _spoil(random: np.random.Generator, rows: list[list[str]]) -> None:
    """Put in the faults that a record room would have to mend, each on lines of its own."""
    born, diagnosed, last, status = 3, 4, 10, 11
    lines = iter(random.choice(np.arange(20, len(rows) - 20), 24, replace=False).tolist())
    for _ in range(4):
        row = rows[next(lines)]
        row[diagnosed], row[last] = row[last], row[diagnosed]
        row[5] = ""
    for _ in range(3):
        rows[next(lines)][diagnosed] = ""
    for _ in range(3):
        rows[next(lines)][status] = ""
    for _ in range(2):
        rows[next(lines)][last] = "31/02/2021"
    for _ in range(2):
        rows[next(lines)][status] = "Died - RHD"
        rows[next(lines)][last] = ""
    rows[next(lines)][diagnosed] = "14/03/2031"
    rows[next(lines)][born] = "02/02/2028"
    for _ in range(3):
        line = next(lines)
        rows[line + 1] = [*rows[line]]
    rows[next(lines)][status] = "see other file"


if __name__ == "__main__":
    print(demo_register(), end="")
