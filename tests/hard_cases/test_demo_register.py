"""The demo register is invented, says so, is the same every time, and shows what a register can hide."""

from __future__ import annotations

from hard_reading import read_as_proposed, request_as_proposed

from demo_register import CLOSING, demo_register
from vitalroll.desk import Desk

TEXT = demo_register()


def test_it_is_the_same_every_time_and_another_for_another_seed() -> None:
    assert demo_register() == TEXT
    assert demo_register(7) != TEXT


def test_it_says_first_that_it_is_invented() -> None:
    assert "invented" in TEXT.splitlines()[0].lower()


def test_it_is_understood_as_it_stands() -> None:
    found = read_as_proposed("demo-register.csv", TEXT.encode(), CLOSING.isoformat())
    assert found["roles"].count("group") >= 4
    assert {"patient_number", "start", "observed_from", "end", "outcome", "sex", "birth_date"} <= set(
        found["roles"]
    )
    assert found["n"] + sum(found["set_aside"].values()) == found["rows"]
    assert 1_100 <= found["n"] <= 1_250
    assert len(found["outcomes"]) == 8
    assert found["outcomes"]["lost"] < 0.25 * found["n"]


def test_it_holds_the_faults_that_a_person_is_to_meet() -> None:
    found = read_as_proposed("demo-register.csv", TEXT.encode(), CLOSING.isoformat())
    assert {
        "repeated_heading", "subtotal_row", "no_start_date", "impossible_end_date", "end_before_start", "no_outcome",
        "outcome_without_meaning", "no_end_date", "duplicate_number", "start_after_closing",
    } <= set(found["set_aside"])  # fmt: skip
    assert "preamble" in found["open_cautions"]
    assert "two_digit_years" in found["cautions"]


def test_severity_changes_who_dies_and_the_curves_can_tell() -> None:
    desk = Desk()
    source = desk.answer("register.open", {"name": "demo", "content": TEXT.encode()})["answer"]
    asked = request_as_proposed(desk, source, CLOSING.isoformat())
    desk.answer("register.build", asked)
    severity = next(column["id"] for column in source["columns"] if column["heading"].startswith("Severity"))
    test = desk.answer("compare.rank_test", {"group": severity})["answer"]
    assert test["p"] < 1e-6
    ratio = {group["level"]: group["observed"] / group["expected"] for group in test["groups"]}
    assert ratio["Mild"] < ratio["Moderate"] < ratio["Severe"]
