"""From an opened register to a cohort: every convention by hand, every reason for setting aside alone."""

from __future__ import annotations

import itertools
from datetime import date

import numpy as np
import pytest
from register_cases import CLOSING, MEANINGS, ROLES, built, codes, opened, reasons, row

from vitalroll.errors import Refusal
from vitalroll.register.build import build
from vitalroll.register.checks import CHECKS, later_duplicates
from vitalroll.register.cohort import MEANINGS as ALL_MEANINGS
from vitalroll.register.plan import Choices

GOOD = row(no="G", born="1990-05-01", sex="F", age="20", zone="North", here="2018-06-01")
"""A row without fault, whose line is 2: it makes the columns of dates what they are."""

ALONE = {
    "no_start_date": (row(start=""), {}),
    "unreadable_start_date": (row(start="not known"), {"written": "not known"}),
    "partial_start_date": (row(start="03/2018"), {"written": "03/2018"}),
    "impossible_start_date": (row(start="2018-02-30"), {"written": "2018-02-30"}),
    "start_after_closing": (row(start="2021-01-01", last="2021-02-01"), {"start": "2021-01-01"}),
    "no_outcome": (row(status=""), {}),
    "outcome_without_meaning": (row(status="??"), {"value": "??"}),
    "unreadable_end_date": (row(last="in May"), {"written": "in May"}),
    "partial_end_date": (row(last="2019"), {"written": "2019"}),
    "impossible_end_date": (row(last="2019-06-31"), {"written": "2019-06-31"}),
    "no_end_date": (row(last="", status="died"), {}),
    "end_before_start": (row(last="2017-12-31"), {"start": "2018-01-01", "end": "2017-12-31"}),
    "birth_after_start": (row(born="2018-01-02"), {"birth": "2018-01-02", "start": "2018-01-01"}),
    "unreadable_observed_from": (row(here="??"), {"written": "??"}),
    "partial_observed_from": (row(here="05/2018"), {"written": "05/2018"}),
    "impossible_observed_from": (row(here="2018-13-01"), {"written": "2018-13-01"}),
    "before_observed_from": (row(here="2019-01-02"), {"observed_from": "2019-01-02", "end": "2019-01-01"}),
    "no_time_at_risk": (row(here="2019-01-01"), {"observed_from": "2019-01-01"}),
}


def test_every_check_has_its_case():
    assert [check.__name__ for check in CHECKS] == list(ALONE)


@pytest.mark.parametrize("code", ALONE)
def test_each_fault_alone_sets_its_row_aside_by_its_own_name(code):
    bad, parameters = ALONE[code]
    found = built(GOOD, bad)
    assert reasons(found) == [(3, code, parameters)]
    assert found.cohort.line.tolist() == [2]


def test_a_faultless_row_is_kept_as_it_is():
    found = built(GOOD)
    cohort = found.cohort
    assert reasons(found) == []
    assert found.changed == ()
    assert cohort.start.tolist() == [date(2018, 1, 1).toordinal()]
    assert cohort.entry.tolist() == [151]  # 1 January to 1 June 2018
    assert cohort.exit.tolist() == [365]
    assert [ALL_MEANINGS[code] for code in cohort.outcome] == ["under_care"]
    assert cohort.closing == CLOSING.toordinal()


def test_the_first_of_several_faults_is_named():
    assert reasons(built(GOOD, row(start="", status="", last=""))) == [(3, "no_start_date", {})]


def test_several_rows_with_one_number_leave_the_first_usable_one():
    found = built(GOOD, row(no="7", start=""), row(no=" 7 "), row(no="7"), row(no=""), row(no=""))
    assert reasons(found) == [(3, "no_start_date", {}), (5, "duplicate_number", {"first_line": 4})]
    assert found.cohort.line.tolist() == [2, 4, 6, 7]


def test_numbers_are_the_same_whatever_their_case_and_spaces_but_not_their_zeros():
    found = built(row(no="ab 1"), row(no="AB  1"), row(no="01"), row(no="1"))
    assert reasons(found) == [(3, "duplicate_number", {"first_line": 2})]


def test_without_a_patient_number_nothing_is_a_duplicate():
    roles = {**ROLES, "c0": "none"}
    assert len(built(row(no="1"), row(no="1"), roles=roles).cohort) == 2


def test_later_duplicates_name_the_first():
    numbers = np.array([5, -1, 5, 6, 5, -1])
    assert later_duplicates(numbers, np.array([True] * 6)) == {2: 0, 4: 0}
    assert later_duplicates(numbers, np.array([False, True, True, True, True, True])) == {4: 2}


def test_under_care_without_a_last_contact_runs_to_the_closing_date_and_is_noted():
    found = built(row(last=""))
    assert found.cohort.exit.tolist() == [(CLOSING - date(2018, 1, 1)).days]
    assert [(note.line, note.code) for note in found.changed] == [(2, "under_care_to_closing")]


def test_under_care_with_a_last_contact_ends_there():
    found = built(row(last="2020-03-01"))
    assert found.cohort.exit.tolist() == [(date(2020, 3, 1) - date(2018, 1, 1)).days]
    assert found.changed == ()


def test_a_death_after_the_closing_date_is_not_known_at_the_closing_date():
    found = built(row(last="2021-01-01", status="died"), row(no="2", last="2020-12-31", status="died"))
    assert [ALL_MEANINGS[code] for code in found.cohort.outcome] == ["under_care", "died_of_disease"]
    assert found.cohort.exit.tolist() == [(CLOSING - date(2018, 1, 1)).days] * 2
    assert [(n.line, n.code, n.parameters) for n in found.changed] == [
        (2, "followed_past_closing", {"end": "2021-01-01"})
    ]


def test_a_first_visit_before_the_start_means_observed_from_the_start():
    found = built(row(here="2017-05-05"))
    assert found.cohort.entry.tolist() == [0]
    assert [(n.code, n.parameters) for n in found.changed] == [
        ("observed_before_start", {"observed_from": "2017-05-05"})
    ]


def test_a_start_on_the_closing_date_is_kept():
    assert built(row(start="2020-12-31", last="2020-12-31")).cohort.exit.tolist() == [0]


def test_a_death_on_the_day_of_the_start_is_kept_and_said():
    found = built(GOOD, row(last="2018-01-01", status="died"))
    assert found.cohort.exit.tolist() == [365, 0]
    said = {caution.code: caution.parameters for caution in found.cautions}
    assert said["day_zero"] == {"n": 1, "lines": [3]}


def test_of_two_columns_for_the_end_the_later_counts_and_an_unreadable_one_is_no_end():
    text = (
        "Diagnosed,Visit,Died,Status\n2018-01-01,2019-01-01,2019-02-01,died\n2018-01-01,2019-03-01,,care\n"
        "2018-01-01,2019-03-01,in May,died\n2018-01-01,,,care\n2018-01-01,2019-03-01,2019-02-01,died\n"
        "2018-01-01,someday,2019-02-01,died\n2018-01-01,,,died\n"
    )
    roles = {"c0": "start", "c1": "end", "c2": "end", "c3": "outcome"}
    found = build(opened(text), Choices(roles, MEANINGS, CLOSING))
    last = [date.fromordinal(int(day)).isoformat() for day in found.cohort.start + found.cohort.exit]
    assert last == ["2019-02-01", "2019-03-01", "2020-12-31", "2019-03-01"]
    assert reasons(found) == [
        (4, "unreadable_end_date", {"written": "in May"}),
        (7, "unreadable_end_date", {"written": "someday"}),
        (8, "no_end_date", {}),
    ]


def test_a_blank_outcome_means_what_the_person_says():
    found = built(GOOD, row(status=""), blank_meaning="lost")
    assert [ALL_MEANINGS[code] for code in found.cohort.outcome] == ["under_care", "lost"]


def test_values_are_matched_whatever_their_case_and_spaces():
    assert len(built(row(status=" CARE\u00a0"), row(no="2", status="Ｄied")).cohort) == 2


def test_age_is_counted_from_birth_and_taken_as_written_where_there_is_no_birth():
    found = built(
        row(born="1990-01-01", age="99"),
        row(no="2", age="14"),
        row(no="3", age="old"),
        row(no="4", age="150"),
    )
    age = found.cohort.covariates["age"].values
    assert age[0] == pytest.approx(28.0, abs=0.01)
    assert age[1] == 14
    assert np.isnan(age[2:]).all()
    band = found.cohort.covariates["age_band"]
    assert [band.levels[code] if code >= 0 else None for code in band.codes] == ["25-44", "5-14", None, None]
    assert {c.code: c.parameters for c in found.cautions}["age_out_of_range"] == {"n": 1, "oldest": 120}


@pytest.mark.parametrize(
    ("age", "band"),
    [
        (0, "0-4"),
        (4, "0-4"),
        (5, "5-14"),
        (14, "5-14"),
        (15, "15-24"),
        (25, "25-44"),
        (45, "45-64"),
        (65, "65+"),
    ],
)
def test_age_bands_begin_where_they_say(age, band):
    assert built(row(age=str(age))).cohort.covariates["age_band"].levels == (band,)


def test_sex_is_what_the_person_said_and_nothing_else():
    found = built(
        row(sex="F"), row(no="2", sex="f "), row(no="3", sex="M"), row(no="4", sex="?"), row(no="5")
    )
    sex = found.cohort.covariates["sex"]
    assert sex.levels == ("female", "male")
    assert sex.codes.tolist() == [0, 0, 1, -1, -1]
    assert {c.code: c.parameters for c in found.cautions}["sex_without_meaning"] == {"n": 1, "values": ["?"]}
    assert "sex" not in built(row(sex="F"), sexes={}).cohort.covariates


def test_calendar_time_is_cut_into_at_most_four_blocks():
    rows = [row(no=str(year), start=f"{year}-06-01", last=f"{year}-07-01") for year in range(2011, 2021)]
    found = built(*rows).cohort.covariates
    assert found["start_period"].levels == ("2011-2013", "2014-2016", "2017-2019", "2020")
    assert found["start_period"].codes.tolist() == [0, 0, 0, 1, 1, 1, 2, 2, 2, 3]
    assert found["start_year"].values.tolist() == list(range(2011, 2021))
    assert built(GOOD).cohort.covariates["start_period"].levels == ("2018",)


def test_groups_bring_spellings_together_under_the_commonest():
    zones = ["North", "north ", "NORTH", "North", "South\u00a0West", "South West", ""]
    found = built(*[row(no=str(i), zone=zone) for i, zone in enumerate(zones)])
    zone = found.cohort.covariates["c8"]
    assert zone.heading == "Zone"
    assert zone.levels == ("North", "South West")
    assert zone.codes.tolist() == [0, 0, 0, 0, 1, 1, -1]


def test_levels_come_in_the_order_a_person_would_list_them():
    zones = ["Zone 10", "Zone 9", "zone 1", "alpha"]
    found = built(*[row(no=str(i), zone=zone) for i, zone in enumerate(zones)])
    assert found.cohort.covariates["c8"].levels == ("alpha", "zone 1", "Zone 9", "Zone 10")


def test_levels_that_only_rows_set_aside_have_are_not_levels():
    found = built(row(zone="North"), row(no="2", zone="Total unknown", start=""))
    assert found.cohort.covariates["c8"].levels == ("North",)


def test_numbers_stay_numbers_and_words_among_them_are_said():
    weights = [f"{50 + i / 10}" for i in range(19)] + ["<50"]
    found = built(*[row(no=str(i), zone=weight) for i, weight in enumerate(weights)])
    values = found.cohort.covariates["c8"].values
    assert values[:19].tolist() == [float(weight) for weight in weights[:19]]
    assert np.isnan(values[19])
    said = {caution.code: caution.parameters for caution in found.cautions}
    assert said["text_in_numbers"] == {"covariate": "c8", "heading": "Zone", "n": 1, "examples": ["<50"]}


def test_only_chosen_columns_reach_the_cohort_and_the_number_is_not_one():
    found = built(GOOD, roles={"c0": "patient_number", "c1": "start", "c3": "end", "c4": "outcome"})
    assert found.kept == ("c1", "c3", "c4")
    assert found.dropped == ("c0", "c2", "c5", "c6", "c7", "c8")
    assert set(found.cohort.covariates) == {"start_year", "start_period"}


def test_two_digit_years_are_tied_to_the_closing_date():
    text = "Born,Diagnosed,Last,Status\n01/02/21,15/06/20,13/01/21,died\n01/02/19,15/06/20,28/12/20,died\n"
    roles = {"c0": "birth_date", "c1": "start", "c2": "end", "c3": "outcome"}
    found = build(
        opened(text), Choices(roles, MEANINGS, CLOSING, date_orders=dict.fromkeys(roles, "day_month_year"))
    )
    # Born in 1921, since births do not come after the closing year; the death of 2021 does.
    assert found.cohort.covariates["age"].values.tolist() == pytest.approx([99.37, 1.37], abs=0.01)
    assert [note.code for note in found.changed] == ["followed_past_closing"]
    said = {caution.code: caution.parameters for caution in found.cautions}["two_digit_years"]
    assert said == {"n": 6, "headings": ["Diagnosed", "Last", "Born"], "first": 1922, "last": 2021}


def test_cautions_of_a_whole_register():
    assert "one_patient_only" in codes(built(GOOD).cautions)
    assert "all_censored" in codes(built(GOOD, row()).cautions)
    assert "all_censored" not in codes(built(GOOD, row(status="died")).cautions)
    assert codes(built(row(start="2021-05-05", last="")).cautions)[0] == "all_set_aside"
    late = [row(no=str(i), start=f"2021-0{i}-01", last="") for i in range(1, 4)]
    assert "many_after_closing" in codes(built(GOOD, *late).cautions)


def test_patients_long_unseen_and_a_late_closing_date_are_said():
    found = {c.code: c.parameters for c in built(GOOD, row(last="2019-12-30")).cautions}
    assert found["unseen_for_long"] == {"n": 2, "days": 365, "lines": [2, 3]}
    assert found["closing_long_after_last"] == {"last": "2019-12-30", "days": 367}
    recent = codes(built(GOOD, row(last="2020-12-30")).cautions)
    assert "closing_long_after_last" not in recent


@pytest.mark.parametrize(
    ("said", "code", "field"),
    [
        ({"roles": ROLES | {"c1": "none"}}, "no_start_column", "roles"),
        ({"roles": ROLES | {"c3": "none"}}, "no_end_column", "roles"),
        ({"roles": ROLES | {"c4": "none"}}, "no_outcome_column", "roles"),
        ({"roles": ROLES | {"c2": "start"}}, "role_given_twice", "roles"),
        ({"roles": ROLES | {"c9": "group"}}, "unknown_column", "roles.c9"),
        ({"roles": ROLES | {"c8": "weight"}}, "not_one_of", "roles.c8"),
        ({"meanings": {"care": "alive"}}, "unknown_meaning", "meanings.care"),
        ({"blank_meaning": "alive"}, "unknown_meaning", "blank_meaning"),
        ({"sexes": {"F": "lady"}}, "not_one_of", "sexes.F"),
        ({"date_orders": {"c1": "backwards"}}, "not_one_of", "date_orders.c1"),
        ({"roles": ROLES | {"c1": "group", "c8": "start"}}, "no_readable_dates", "roles.c8"),
    ],
)
def test_choices_that_cannot_be_followed_are_refused_by_name(said, code, field):
    with pytest.raises(Refusal) as refused:
        built(GOOD, **said)
    assert (refused.value.code, refused.value.field) == (code, field)


def test_an_order_against_the_evidence_is_followed_and_said():
    text = "Diagnosed,Last,Status\n25/06/2018,2019-01-01,care\n05/06/2018,2019-01-01,care\n"
    roles = {"c0": "start", "c1": "end", "c2": "outcome"}
    found = build(opened(text), Choices(roles, MEANINGS, CLOSING, date_orders={"c0": "month_day_year"}))
    assert reasons(found) == [(2, "impossible_start_date", {"written": "25/06/2018"})]
    assert found.cohort.start.tolist() == [date(2018, 5, 6).toordinal()]
    assert "order_against_evidence" in codes(found.cautions)


def test_rows_kept_and_rows_set_aside_are_all_rows_whatever_is_combined():
    starts, ends = ("2018-01-01", "", "x", "2021-02-02"), ("2019-01-01", "", "2017", "2022-01-01")
    heres, ways = ("", "2018-05-05", "2030-01-01"), ("care", "died", "", "?")
    rows = [
        row(no=str(i % 50), start=a, last=b, here=c, status=d)
        for i, (a, b, c, d) in enumerate(itertools.product(starts, ends, heres, ways))
    ]
    found = built(GOOD, *rows)
    lines = [*found.cohort.line.tolist(), *(note.line for note in found.set_aside)]
    assert sorted(lines) == list(range(2, len(rows) + 3))
    assert found.rows == len(rows) + 1
    assert {note.line for note in found.changed} <= set(found.cohort.line.tolist())
