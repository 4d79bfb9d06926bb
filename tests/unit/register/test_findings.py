"""Each check finds its fault and nothing else; a repair changes what it says, and only when accepted."""

from __future__ import annotations

import random
from datetime import date

import pytest
from register_cases import CLOSING, MEANINGS, opened

from vitalroll.desk import Desk
from vitalroll.errors import Refusal
from vitalroll.register.build import build
from vitalroll.register.cohort import MEANINGS as ALL_MEANINGS
from vitalroll.register.findings.alike import AlikeNames, slips
from vitalroll.register.findings.mending import CODES, find, look
from vitalroll.register.plan import Choices, Plan

HEADINGS = ("No", "Name", "Born", "Sex", "Age", "Diagnosed", "Last", "Death", "Status")
ROLES = dict(
    zip(
        (f"c{i}" for i in range(9)),
        ("patient_number", "name", "birth_date", "sex", "age", "start", "end", "death_date", "outcome"),
        strict=True,
    )
)
EVIDENCE = (
    "900",
    "Zuri",
    "25/12/1980",
    "F",
    "",
    "13/01/2018",
    "31/01/2020",
    "",
    "moved",
)
"""A row that settles the order of every column of dates as day, month, year."""


def row(
    no="1", name="", born="", sex="", age="", start="14/02/2018", last="20/03/2019", death="", status="lost"
):
    return (no, name, born, sex, age, start, last, death, status)


def choices(**said):
    usual = {
        "roles": ROLES,
        "meanings": MEANINGS | {"transfer lost": "lost"},
        "closing_date": CLOSING,
        "sexes": {"F": "female", "M": "male"},
        "date_orders": dict.fromkeys(("c2", "c5", "c6", "c7"), "day_month_year"),
    }
    return Choices(**(usual | said))


def register(*rows):
    return opened("\n".join(",".join(cells) for cells in (HEADINGS, EVIDENCE, *rows)))


def findings(*rows, **said):
    found = find(look(Plan(register(*rows), choices(**said))))
    return {finding.code: finding for finding in found if finding.code not in ("sex_not_recorded",)}


def mended(*rows, accept, **said):
    return build(register(*rows), choices(repairs={accept: ()}, **said))


def patient(made, line):
    """Return start, end and outcome of the patient on a line, or None."""
    where = made.cohort.line.tolist()
    if line not in where:
        return None
    at = where.index(line)
    start = int(made.cohort.start[at])
    days = (date.fromordinal(start), date.fromordinal(start + int(made.cohort.exit[at])))
    return *map(date.isoformat, days), ALL_MEANINGS[made.cohort.outcome[at]]


def aside(made):
    return {note.line: note.code for note in made.set_aside}


def test_a_row_with_nothing_wrong_has_no_finding():
    assert findings(row()) == {}


def test_dates_that_agree_are_not_changed_over():
    fits = row(start="14/04/2018", last="02/05/2018")
    assert "day_and_month_changed_over" not in findings(fits)
    # 2 October 2017 is before the start either way: 10 February 2017 is no better.
    assert "day_and_month_changed_over" not in findings(row(start="14/05/2018", last="02/10/2017"))


REPAIRS = [
    # code, row, what the row says without the repair, and with it
    (
        "day_and_month_changed_over",
        row(start="14/05/2018", last="08/01/2018"),
        None,
        ("2018-05-14", "2018-08-01", "lost"),
    ),
    (
        "day_and_month_changed_over",
        row(start="03/12/2018", last="20/05/2018"),
        None,
        ("2018-03-12", "2018-05-20", "lost"),
    ),
    (
        "ends_before_start",
        row(start="20/12/2018", last="15/01/2018"),
        None,
        ("2018-12-20", "2019-01-15", "lost"),
    ),
    ("no_such_day", row(last="31/06/2019"), None, ("2018-02-14", "2019-06-30", "lost")),
    ("no_such_day", row(start="30/02/2018"), None, ("2018-02-28", "2019-03-20", "lost")),
    (
        "death_date_but_alive",
        row(death="25/06/2019", status="care"),
        ("2018-02-14", "2019-06-25", "under_care"),
        ("2018-02-14", "2019-06-25", "died_cause_unknown"),
    ),
    (
        "contact_after_death",
        row(last="20/08/2019", death="25/06/2019", status="died"),
        ("2018-02-14", "2019-08-20", "died_of_disease"),
        ("2018-02-14", "2019-06-25", "died_of_disease"),
    ),
    (
        # From 20 March 2019 to 31 December 2020 there are 652 days; half of them later is 9 February 2020.
        "death_dated_by_contact",
        row(status="died"),
        ("2018-02-14", "2019-03-20", "died_of_disease"),
        ("2018-02-14", "2020-02-09", "died_of_disease"),
    ),
    (
        "unseen_for_long",
        row(status="care"),
        ("2018-02-14", "2019-03-20", "under_care"),
        ("2018-02-14", "2019-03-20", "lost"),
    ),
    (
        "transfer_as_lost",
        row(status="transfer lost"),
        ("2018-02-14", "2019-03-20", "lost"),
        ("2018-02-14", "2019-03-20", "moved_away"),
    ),
    (
        "born_in_wrong_century",
        row(born="13/05/19"),
        None,
        ("2018-02-14", "2019-03-20", "lost"),
    ),
]


@pytest.mark.parametrize(("code", "bad", "before", "after"), REPAIRS)
def test_a_repair_changes_the_row_only_when_accepted(code, bad, before, after):
    assert findings(bad)[code].rows.tolist() == [1]
    untouched = build(register(bad), choices())
    assert patient(untouched, 3) == before
    assert untouched.corrections == ()
    accepted = mended(bad, accept=code)
    assert patient(accepted, 3) == after
    assert {each.line for each in accepted.corrections} == {3}
    declined = build(register(bad), choices(repairs={code: (3,)}))
    assert patient(declined, 3) == before
    assert declined.corrections == ()


def test_the_log_says_what_was_written_and_what_is_read():
    made = mended(row(last="31/06/2019"), accept="no_such_day")
    (correction,) = made.corrections
    assert (correction.line, correction.what, correction.before, correction.after) == (
        3,
        "end",
        "31/06/2019",
        "2019-06-30",
    )


def test_died_without_a_date_is_named_and_cannot_be_repaired():
    found = findings(row(last="", status="died"))
    assert found["died_without_date"].rows.tolist() == [1]
    assert found["died_without_date"].repair is None
    assert set(found) == {"died_without_date"}


def test_a_date_far_after_closing_is_named():
    assert findings(row(start="14/02/2031"))["far_after_closing"].rows.tolist() == [1]
    assert "far_after_closing" not in findings(row(last="30/12/2021"))


def test_a_closing_date_copied_for_many_is_named_and_for_few_is_not():
    some = [row(str(i), last="31/12/2020", status="care", start=f"{14 + i}/02/2018") for i in range(5)]
    assert findings(*some)["closing_date_as_contact"].rows.tolist() == [1, 2, 3, 4, 5]
    assert "closing_date_as_contact" not in findings(*some[:4])


def test_unseen_for_long_follows_the_months_that_are_said():
    # 20 March 2019 is 652 days before closing: 21.4 months.
    assert "unseen_for_long" in findings(row(status="care"), unseen_months=21)
    assert "unseen_for_long" not in findings(row(status="care"), unseen_months=22)


def test_rows_of_one_number_become_one_patient_with_first_start_and_last_end():
    rows = [row(), row(start="16/01/2019", last="21/04/2020", status="care")]
    untouched = build(register(*rows), choices())
    assert patient(untouched, 3) == ("2018-02-14", "2019-03-20", "lost")
    assert aside(untouched) == {4: "duplicate_number"}
    made = mended(*rows, accept="same_number")
    assert patient(made, 3) == ("2018-02-14", "2020-04-21", "under_care")
    assert aside(made) == {4: "same_patient"}


def test_a_death_goes_before_a_later_contact_when_rows_become_one():
    rows = [row(last="21/04/2020", status="care"), row(last="20/03/2019", status="died")]
    assert patient(mended(*rows, accept="same_number"), 3) == ("2018-02-14", "2019-03-20", "died_of_disease")


def test_one_number_with_two_sexes_is_two_people():
    rows = [row(sex="F"), row(sex="M", start="16/01/2019", last="21/04/2020")]
    found = findings(*rows)
    assert "same_number" not in found
    assert found["one_number_two_people"].rows.tolist() == [1, 2]
    made = mended(*rows, accept="one_number_two_people")
    assert patient(made, 3)
    assert patient(made, 4)
    assert aside(made) == {}


def test_alike_names_with_one_birth_date_are_probably_one_person():
    rows = [
        row("1", "Akello Mary", "13/05/1990", "F"),
        row("2", "MARY  Akelo", "13/05/1990", "F", start="16/01/2019", last="21/04/2020"),
        row("3", "Mary Akello", "14/05/1990", "F"),
        row("4", "Mary Akello", "13/05/1990", "M"),
        row("5", "Grace Okot", "13/05/1990", "F"),
    ]
    found = findings(*rows)["likely_same_person"]
    assert found.rows.tolist() == [1, 2]
    made = mended(*rows, accept="likely_same_person")
    assert patient(made, 3) == ("2018-02-14", "2020-04-21", "lost")
    assert aside(made) == {4: "same_patient"}


def test_names_alone_do_not_make_one_person():
    assert "likely_same_person" not in findings(
        row("1", "Mary Akello", "13/05/1990"), row("2", "Mary Akello", "13/06/1991")
    )


def test_without_names_birth_sex_and_start_must_all_agree():
    no_names = {"roles": ROLES | {"c1": "none"}}
    alike = [row("1", born="13/05/1990", sex="F"), row("2", born="13/05/1990", sex="F")]
    assert findings(*alike, **no_names)["likely_same_person"].rows.tolist() == [1, 2]
    other = row("2", born="13/05/1990", sex="F", start="15/02/2018")
    assert "likely_same_person" not in findings(alike[0], other, **no_names)


def test_names_and_numbers_are_not_kept():
    made = build(register(row()), choices())
    assert not {"c0", "c1"} & set(made.kept)


def test_an_age_that_the_birth_date_denies_is_named():
    # Born 13 May 1990, 27 completed years on 14 February 2018; one year apart is only another way of counting.
    for age, named in (("27", False), ("28", False), ("26", False), ("29", True), ("72", True)):
        found = findings(row(born="13/05/1990", age=age))
        assert ("age_against_birth" in found) is named
    made = mended(row(born="13/05/1990", age="72"), accept="age_against_birth")
    assert made.cohort.covariates["age"].values.tolist()[1] == 72


def test_a_row_that_slipped_is_read_from_where_it_stands():
    slipped = ("7", "Ochieng", "", "M", "", "", "14/02/2018", "20/03/2019", "")
    # One column to the right, but nobody can say how it ended: that has fallen off the page.
    assert "slipped_sideways" not in findings(slipped)
    moved_left = ("Ochieng", "", "M", "", "14/02/2018", "20/03/2019", "", "lost", "")
    found = findings(moved_left)["slipped_sideways"]
    assert found.rows.tolist() == [1]
    made = mended(moved_left, accept="slipped_sideways")
    assert patient(made, 3) == ("2018-02-14", "2019-03-20", "lost")


def test_heaped_days_are_named_only_when_there_are_many():
    heaped = [row(str(i), start=f"01/{1 + i % 12:02}/2018") for i in range(30)]
    spread = [row(str(i), start=f"{1 + i % 28:02}/{1 + i % 12:02}/2018") for i in range(30)]
    assert findings(*heaped)["heaped_starts"].parameters["share"] == pytest.approx(30 / 31)
    assert "heaped_starts" not in findings(*heaped[:20])
    assert "heaped_starts" not in findings(*spread)


def test_months_in_which_nobody_starts_are_named_where_many_usually_do():
    def in_month(month, n):
        return [row(f"{month}-{i}", start=f"{5 + i}/{month:02}/2018") for i in range(n)]

    rows = [each for month in (1, 2, 3, 5, 6) for each in in_month(month, 5)]
    assert findings(*rows)["months_without_start"].parameters == {"n": 1, "months": ["2018-04"]}
    assert "months_without_start" not in findings(
        *(each for month in (1, 3, 6) for each in in_month(month, 2))
    )


def test_totals_and_repeated_headings_are_findings():
    found = findings(row(), ("Total", "", "", "", "", "", "12", "", ""), HEADINGS)
    assert found["totals_among_rows"].rows.tolist() == [2]
    assert found["headings_repeated"].rows.tolist() == [3]


def test_a_death_on_the_first_day_is_said():
    assert "died_on_first_day" in findings(row(last="14/02/2018", death="14/02/2018", status="died"))


def test_a_repair_of_a_check_that_does_not_exist_is_refused():
    with pytest.raises(Refusal) as refused:
        build(register(row()), choices(repairs={"make_it_nicer": ()}))
    assert (refused.value.code, refused.value.field) == ("not_one_of", "repairs.make_it_nicer")


def test_slips_are_counted_by_hand():
    # kitten/sitting is the textbook pair: 3; two neighbours exchanged are one slip, not two.
    assert slips("kitten", "sitting", 9) == 3
    assert slips("akello", "akleol", 9) == 2
    assert slips("mary", "mray", 9) == 1
    assert slips("mary", "grace okot", 2) == 3
    alike = AlikeNames()
    assert alike("akello mary", "akelo mary")
    assert not alike("akello mary", "akol mary")


def random_register(seed):
    draw = random.Random(seed)

    def day(blank=0.1):
        return (
            ""
            if draw.random() < blank
            else f"{draw.randint(1, 31)}/{draw.randint(1, 12):02}/{draw.randint(2015, 2022)}"
        )

    rows = []
    for i in range(120):
        no = str(i if draw.random() < 0.8 else draw.randint(0, 30))
        name = draw.choice(["Mary Akello", "Mary Akelo", "Grace Okot", "John Ochieng", ""])
        born = f"{draw.randint(1, 28)}/05/{draw.choice(['19', '1990', '85'])}"
        status = draw.choice([*MEANINGS, "transfer lost", "odd", ""])
        rows.append(
            row(no, name, born, draw.choice("FM"), str(draw.randint(0, 90)), day(), day(), day(0.6), status)
        )
    return rows


@pytest.mark.parametrize("seed", range(8))
def test_whatever_is_accepted_no_row_is_lost_and_accepting_nothing_changes_nothing(seed):
    rows = random_register(seed)
    draw = random.Random(seed + 100)
    accepted = {code: () for code in CODES if draw.random() < 0.6}
    plain = build(register(*rows), choices())
    made = build(register(*rows), choices(repairs=accepted))
    for each in (plain, made):
        assert len(each.cohort) + len(each.set_aside) == each.rows == 121
    touched = {correction.line for correction in made.corrections}
    assert {correction.code for correction in made.corrections} <= set(accepted)
    every_line = {code: tuple(range(200)) for code in accepted}
    undone = build(register(*rows), choices(repairs=every_line))
    assert undone.corrections == ()
    assert undone.cohort.exit.tolist() == plain.cohort.exit.tolist()
    # Rows that no correction names read the same, but that a number may be free now for another row.
    for line in set(plain.cohort.line.tolist()) & set(made.cohort.line.tolist()) - touched:
        assert patient(plain, line) == patient(made, line)


def asked(*rows, **said):
    desk = Desk()
    content = "\n".join(",".join(cells) for cells in (HEADINGS, EVIDENCE, *rows)).encode()
    assert "answer" in desk.answer("register.open", {"name": "x.csv", "content": content})
    usual = choices()
    request = {
        "roles": usual.roles,
        "meanings": usual.meanings,
        "closing_date": CLOSING.isoformat(),
        "sexes": usual.sexes,
        "date_orders": usual.date_orders,
    }
    return desk, request | said


def test_the_task_shows_the_effect_before_it_is_accepted():
    # Two patients; one has a date of death and "care": survival at five years falls from 1 to a half.
    rows = [
        row("1", death="25/06/2019", status="care"),
        row("2", last="30/12/2020", status="care", start="15/02/2010"),
    ]
    desk, request = asked(*rows)
    answer = desk.answer("register.findings", request)["answer"]
    (finding,) = [each for each in answer["findings"] if each["code"] == "death_date_but_alive"]
    repair = finding["repair"]
    assert (repair["accepted"], repair["units"], repair["kind"]) == (False, 1, "count_as_died")
    assert (repair["without"]["events"], repair["with"]["events"]) == (0, 1)
    assert repair["without"]["survival"]["value"] == 1
    # At risk on the day of that death (496 days): it, the row of evidence (748 days) and the second patient.
    assert repair["with"]["survival"]["value"] == pytest.approx(2 / 3)
    assert repair["listed"][0]["changes"] == [
        {"line": 3, "what": "outcome", "before": "under_care", "after": "died_cause_unknown"},
        {"line": 3, "what": "end", "before": "2019-06-25", "after": "2019-06-25"},
    ]
    assert answer["now"] == answer["untouched"]
    accepted = desk.answer("register.findings", request | {"repairs": {"death_date_but_alive": []}})["answer"]
    assert accepted["now"] == repair["with"]
    assert accepted["untouched"] == repair["without"]
    assert [each["code"] for each in accepted["corrections"]] == ["death_date_but_alive"] * 2
    cohort = desk.answer("register.build", request | {"repairs": {"death_date_but_alive": []}})["answer"]
    assert cohort["outcomes"]["died_cause_unknown"] == accepted["now"]["events"] == 1
    declined = desk.answer("register.findings", request | {"repairs": {"death_date_but_alive": [3]}})[
        "answer"
    ]
    assert declined["now"] == answer["now"]
    assert declined["findings"][0]["repair"]["declined"] == [3]


def test_a_register_of_nobody_has_findings_but_no_survival():
    desk, request = asked(row(status="odd"))
    request["meanings"] = {"never": "lost"}
    answer = desk.answer("register.findings", request)["answer"]
    assert answer["now"]["n"] == 0
    assert answer["now"]["survival"]["value"] is None
