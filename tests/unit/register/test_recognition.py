"""What headings and values are taken for: proposals, with their evidence."""

from __future__ import annotations

import pytest

from vitalroll.register.cohort import MEANINGS
from vitalroll.register.meanings import propose_meaning, propose_sexes
from vitalroll.register.profile import profile_columns
from vitalroll.register.recognition import is_total, longest_match, words
from vitalroll.register.roles import DATE_ROLES, ROLES, propose_roles
from vitalroll.register.source import open_source
from vitalroll.register.spelling import bare


def phrases(node):
    if isinstance(node, str):
        yield node
    else:
        for item in node.values() if isinstance(node, dict) else node:
            yield from phrases(item)


def test_every_word_of_the_list_is_written_as_texts_are_compared():
    listed = {key: value for key, value in words().items() if key != "about"}
    wrong = [
        phrase for phrase in phrases(listed) if bare(phrase.removesuffix("*")) != phrase.removesuffix("*")
    ]
    assert wrong == []


def test_the_list_speaks_of_known_roles_and_meanings_only():
    assert set(words()["roles"]) <= set(ROLES)
    assert set(words()["meanings"]) <= set(MEANINGS)
    assert len(words()["months"]) == 12


def test_no_word_stands_for_two_months():
    names = [name for month in words()["months"] for name in month]
    assert len(names) == len(set(names))


@pytest.mark.parametrize(
    ("value", "meaning"),
    [
        ("Under care", "under_care"),
        ("On follow-up", "under_care"),
        ("ALIVE", "under_care"),
        ("not dead", "under_care"),
        ("En suivi", "under_care"),
        ("Died", "died_cause_unknown"),
        ("Died - RHD", "died_of_disease"),
        ("Died of heart failure", "died_of_disease"),
        ("Décédé (cardiaque)", "died_of_disease"),
        ("Died - other cause", "died_of_other_cause"),
        ("Died, not related", "died_of_other_cause"),
        ("Died non-cardiac", "died_of_other_cause"),
        ("Décès, autre cause", "died_of_other_cause"),
        ("Died, cause not known", "died_cause_unknown"),
        ("Décédé de cause inconnue", "died_cause_unknown"),
        ("LTFU", "lost"),
        ("Lost to follow up", "lost"),
        ("Alive, lost to follow-up", "lost"),
        ("Perdue de vue", "lost"),
        ("Defaulted", "lost"),
        ("Transfered out", "moved_away"),
        ("Transféré", "moved_away"),
        ("moved to another district", "moved_away"),
        ("Completed prophylaxis", "recovered"),
        ("Discharged well", "recovered"),
        ("Guéri", "recovered"),
        ("Stopped by own wish", "stopped"),
        ("Declined further follow-up", "stopped"),
        ("A", "under_care"),
        ("D", "died_cause_unknown"),
        ("0", None),
        ("1", None),
        ("?", None),
        ("see other file", None),
        ("", None),
    ],
)
def test_the_proposed_meaning_of_a_value(value, meaning):
    assert propose_meaning(value) == meaning


def test_the_sexes_in_several_languages():
    assert propose_sexes(["M", "F", "female", "Homme"]) == {
        "M": "male", "F": "female", "female": "female", "Homme": "male",
    }  # fmt: skip
    assert propose_sexes(["H", "F"]) == {"H": "male", "F": "female"}
    assert propose_sexes(["ذكر", "أنثى"]) == {"ذكر": "male", "أنثى": "female"}
    assert propose_sexes(["0", "1", "2", "?"]) == {}


def test_m_beside_h_is_a_woman_in_spanish_and_beside_f_a_man():
    assert propose_sexes(["H", "M"]) == {"H": "male", "M": "female"}
    assert propose_sexes(["M", "F", "H"])["M"] == "male"


def test_whole_words_only_and_the_longest_first():
    assert longest_match("date of birth", ["birth", "date of birth"]) == "date of birth"
    assert longest_match("birthplace", ["birth"]) is None
    assert longest_match("transferred out", ["transfer*"]) == "transferred"


@pytest.mark.parametrize(
    ("text", "total"), [("Total", True), ("Sub-total:", True), ("TOTAUX", True), ("Tom", False)]
)
def test_words_for_totals(text, total):
    assert is_total(text) is total


def proposed(text):
    register = profile_columns(open_source(text.encode()))
    return {
        profile.column.heading: (profile.kind, proposal)
        for profile, proposal in zip(register.profiles, propose_roles(register), strict=True)
    }


ROWS = [
    ("P1", "Ann B", "F", "31", "14/03/2016", "20/05/2025", "Under care", "Mild", "seen in school, well"),
    ("P2", "Ben C", "M", "12", "22/07/2016", "11/12/2018", "Died", "Severe", "told by brother on the phone"),
    ("P3", "Cal D", "F", "45", "25/01/2017", "30/06/2019", "Lost", "Mild", ""),
    (
        "P4",
        "Dee E",
        "F",
        "8",
        "08/08/2017",
        "19/04/2025",
        "Under care",
        "Moderate",
        "moved house but still comes",
    ),
]


def register_with(*headings):
    return "\n".join(",".join(row) for row in [headings, *[[f'"{cell}"' for cell in row] for row in ROWS]])


@pytest.mark.parametrize(
    "headings",
    [
        ("Reg no", "Name", "Sex", "Age", "Date of diagnosis", "Last contact", "Status", "Stage", "Remarks"),
        (
            "N° dossier",
            "Nom",
            "Sexe",
            "Âge",
            "Date du diagnostic",
            "Dernières nouvelles",
            "Devenir",
            "Stade",
            "Notes",
        ),
        (
            "Expediente",
            "Nombre",
            "Sexo",
            "Edad",
            "Fecha de ingreso",
            "Última visita",
            "Estado",
            "Etapa",
            "Notas",
        ),
        (
            "ID",
            "Patient name",
            "Gender",
            "Age (years)",
            "Enrolled",
            "Last visit",
            "Outcome",
            "Class",
            "Comments",
        ),
    ],
)
def test_roles_are_recognised_in_several_languages(headings):
    found = [proposal.role for _, proposal in proposed(register_with(*headings)).values()]
    assert found[:8] == ["patient_number", "name", "sex", "age", "start", "end", "outcome", "group"]
    assert found[8] == "none"


def test_without_telling_headings_the_contents_decide():
    found = proposed(register_with("a", "b", "c", "d", "e", "f", "g", "h", "i"))
    assert found["c"][1].role == "sex"
    assert found["e"][1].role == "start"
    assert found["f"][1].role == "end"
    assert found["g"][1].role == "outcome"
    assert [item.code for item in found["e"][1].evidence][:2] == ["earliest_dates", "reads_as_dates"]


def test_evidence_says_what_was_seen():
    found = proposed(
        register_with("No", "Name", "Sex", "Age", "Diagnosed", "Last contact", "Status", "Stage", "Notes")
    )
    evidence = {item.code: item.parameters for item in found["Diagnosed"][1].evidence}
    assert evidence == {
        "heading_says": {"role": "start", "words": "diagnosed"},
        "reads_as_dates": {"read": 4, "filled": 4},
        "order_settled": {"order": "day_month_year", "n": 3},
    }
    assert (found["Name"][1].role, found["Name"][1].evidence[0].code) == ("name", "heading_says")


def test_a_heading_that_only_holds_the_word_name_is_not_the_name_of_a_patient():
    found = proposed(
        "No,Village name,Phone,Diagnosed,Last visit,Status\n" + "1,A,7,14/03/2016,20/05/2020,Alive\n" * 3
    )
    assert [found[heading][1].role for heading in ("Village name", "Phone")] == ["none", "none"]


def test_two_beginnings_are_the_start_and_the_first_visit_here():
    text = "No,First seen here,Diagnosed,Date of birth,Date of death,Last visit,Status\n" + "\n".join(
        f"{i},13/0{i}/2016,14/0{i}/2012,15/0{i}/1990,,16/0{i}/2020,Alive" for i in range(1, 8)
    )
    roles = {heading: proposal.role for heading, (_, proposal) in proposed(text).items()}
    assert roles["First seen here"] == "observed_from"
    assert roles["Diagnosed"] == "start"
    assert roles["Date of birth"] == "birth_date"
    assert roles["Last visit"] == "end"
    only = proposed(text.replace("Diagnosed", "Zone").replace("14/", "x"))
    assert only["First seen here"][1].role == "start"


def test_every_date_role_needs_a_column_of_dates():
    found = proposed("Diagnosis,Date of death,Status\nRHD,no,Alive\nTB,no,Died\n")
    assert all(proposal.role not in DATE_ROLES for _, proposal in found.values())


def test_kinds_of_columns():
    text = "id,when,weight,visits,code,zone,story,nothing\n" + "\n".join(
        f"P{i:03},2020-01-{1 + i % 28:02},{50 + i / 7:.2f},{i % 25},{i % 3},{'NS'[i % 2]},{'word ' * (5 + i)},"
        for i in range(40)
    )
    kinds = {heading: kind for heading, (kind, _) in proposed(text).items()}
    assert kinds == {
        "id": "identifier", "when": "date", "weight": "number", "visits": "number", "code": "category",
        "zone": "category", "story": "text", "nothing": "empty",
    }  # fmt: skip
