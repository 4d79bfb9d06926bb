"""The coming years on the built page, beside the engine outside the browser."""

from __future__ import annotations

import json
import re
from collections.abc import Callable
from pathlib import Path

import pytest
from playwright.sync_api import Page

from demo_register import demo_register
from exercise import CLOSING, proposed_reading
from site_server import SiteServer
from vitalroll.desk import Desk

ANSWER_MS = 30_000
VISITS = {"name": "Visits", "unit": "visits", "at_start": 1, "first_year": 1, "later": 0.33, "unit_cost": 8}


@pytest.fixture(scope="module")
def native() -> Callable[[str, dict], dict]:
    """The engine outside the browser, with the demo register read as the page proposes to read it."""
    desk = Desk()

    def ask(task: str, request: dict) -> dict:
        said = desk.answer(task, request)
        assert "answer" in said, said
        return said["answer"]

    source = ask("register.open", {"name": "demo-register.csv", "content": demo_register().encode()})
    ask("register.build", proposed_reading(lambda task, **request: ask(task, request), source, CLOSING))
    return ask


def numbers(text: str) -> list[float]:
    """Numbers as they are written on the English page."""
    plain = text.replace("\u2212", "-").replace(",", "")
    return [float(number) for number in re.findall(r"-?\d+(?:\.\d+)?", plain)]


def table_rows(page: Page, caption: str) -> list[list[str]]:
    table = page.locator("table:visible", has=page.locator("caption", has_text=caption)).first
    table.wait_for(timeout=ANSWER_MS)
    return [row.locator("th, td").all_inner_texts() for row in table.locator("tbody tr").all()]


@pytest.fixture
def page(site: SiteServer, opened: Callable) -> Page:
    page = opened(site.address).page
    page.locator("#open-demo").click()
    page.get_by_text("person-years.").first.wait_for(timeout=ANSWER_MS)
    page.get_by_role("navigation").get_by_role("link", name="Caseload", exact=True).click()
    return page


def put(page: Page, field: str, value: object) -> None:
    page.locator(field).fill(str(value))
    page.locator(field).press("Tab")


def test_the_month_in_which_slots_run_out_and_what_it_costs(page: Page, native: Callable) -> None:
    for name, value in VISITS.items():
        put(page, f"#items-0-{name}", value)
    page.locator("#lines-0-what").select_option("amount:0")
    put(page, "#lines-0-name", "Clinic slots")
    put(page, "#lines-0-limit", 320)
    lines = [{"kind": "amount", "name": "Clinic slots", "limit": 320, "item": 0}]
    told = native("caseload.resources", {"items": [VISITS], "lines": lines})
    page.locator("#resources .sentence", has_text="Clinic slots").wait_for(timeout=ANSWER_MS)
    rows = table_rows(page, "Visits (visits) in each year")
    for row, band in zip(rows, told["items"][0]["amount"], strict=True):
        assert numbers(row[1]) == [round(band["value"])]
        # The redrawn bands come from the same seed in both places.
        assert numbers(row[3]) == [round(limit) for limit in band["p95"]]
    [line] = told["lines"]
    [shown] = table_rows(page, "When there is no longer enough")
    assert numbers(shown[4])[0] == line["unlikely_month"]["month"]
    # Written without decimals.
    assert numbers(shown[6]) == pytest.approx([100 * line["passed_by"][-1]], abs=0.51)
    total = table_rows(page, "Cost of the whole time, discounted")[0]
    assert numbers(total[1]) == [round(told["totals"][0]["cost"]["value"])]


def test_what_is_typed_wrong_stays_and_is_said_beside_it(page: Page) -> None:
    put(page, "#caseload-years", 45)
    page.locator("#caseload-years-fault").wait_for()
    assert page.locator("#caseload-years").input_value() == "45"
    put(page, "#caseload-years", 5)
    page.locator("#caseload-years-fault").wait_for(state="detached")
    put(page, "#items-0-later", -2)
    assert "0" in page.locator("#items-0-later-fault").inner_text()
    assert page.locator("#items-0-later").input_value() == "-2"


def test_tracing_or_screening(page: Page, native: Callable) -> None:
    put(page, "#items-0-later", 1)
    put(page, "#items-0-unit_cost", 12)
    page.locator("#levers-example").click()
    tracing = {"kind": "fewer_lost", "percent": 40, "ramp_months": 6, "cost_per_year": 12000}
    screening = {
        "kind": "found_earlier", "percent": 30, "months_earlier": 6, "fewer_deaths_among": 25,
        "ramp_months": 3, "cost_at_start": 5000, "cost_per_year": 20000,
    }  # fmt: skip
    scenarios = [
        {"name": "Tracing", "levers": [tracing]},
        {"name": "Screening", "levers": [screening]},
        {"name": "Both", "levers": [tracing, screening]},
    ]
    told = native(
        "caseload.levers", {"items": [{"name": "1", "later": 1, "unit_cost": 12}], "scenarios": scenarios}
    )
    for scenario in told["scenarios"]:
        rows = table_rows(page, f"What “{scenario['name']}” changes over 5 years")
        change = scenario["difference"]
        assert numbers(rows[1][1]) == pytest.approx([change["patient_years"]["value"]], abs=0.51)
        assert numbers(rows[1][3]) == pytest.approx(change["patient_years"]["p95"], abs=0.51)
        assert numbers(rows[4][1]) == pytest.approx([change["lost"]["value"]], abs=0.51)
        assert numbers(rows[7][1]) == pytest.approx([change["cost"]["value"]], abs=0.51)
    best = max(told["scenarios"], key=lambda each: each["best_for_patient_years"])
    first = table_rows(page, "What each scenario buys")[0]
    assert first[0] == best["name"]
    assert numbers(first[1])[0] == pytest.approx(best["per_patient_year"]["value"], abs=0.51)
    swings = told["sensitivity"]["swings"]
    rows = table_rows(page, "per patient-year gained as assumed")
    assert numbers(rows[0][2]) == pytest.approx([swings[0]["at_low"]], abs=0.51)


def test_how_much_losses_must_fall(page: Page, native: Callable) -> None:
    put(page, "#break-even-target", 100)
    told = native("caseload.break_even", {"lever": {"kind": "fewer_lost"}, "goal": "lost", "target": 100})
    sentence = page.locator("#break-even .sentence")
    sentence.wait_for(timeout=ANSWER_MS)
    assert numbers(sentence.inner_text())[0] == pytest.approx(told["percent"], abs=0.051)


def test_the_coming_years_reach_the_report(page: Page) -> None:
    page.locator("#items-example").click()
    page.locator("#levers-example").click()
    page.locator("#levers .sentence").first.wait_for(timeout=ANSWER_MS)
    page.locator("#resources .sentence").first.wait_for(timeout=ANSWER_MS)
    page.get_by_role("navigation").get_by_role("link", name="Report", exact=True).click()
    report = page.locator("#report-document")
    for caption in ("When there is no longer enough", "Cost in each year", "What each scenario buys"):
        report.locator("caption", has_text=caption).first.wait_for(timeout=ANSWER_MS)


def test_what_would_have_been_projected_three_years_ago(page: Page, native: Callable) -> None:
    told = native("caseload.back_test", {"back_years": 3})
    rows = table_rows(page, "as it would have been projected from earlier days")
    assert len(rows) == len(told["tests"])
    for row, test in zip(rows, told["tests"], strict=True):
        assert numbers(row[1]) == pytest.approx([test["band"]["value"]], abs=0.51)
        assert numbers(row[3]) == pytest.approx(test["band"]["p95"], abs=0.51)
        assert numbers(row[4]) == [test["seen"]]
        assert row[7] == ("yes" if test["held"]["p95"] else "no")
    parts = native("caseload.parts", {"years": 5})["years"]
    for row, year in zip(table_rows(page, "Shares of the variance"), parts, strict=True):
        assert numbers(" ".join(row[1:])) == pytest.approx(
            [100 * year[part] for part in ("inflow", "leaving", "chance")], abs=0.51
        )


def test_a_trend_a_tail_and_an_incomplete_register(page: Page, native: Callable) -> None:
    page.locator("#caseload-basis").select_option("trend")
    page.locator("#caseload-tail").select_option("doubled")
    put(page, "#caseload-completeness", 80)
    setting = {"newcomers": {"basis": "trend", "damping": 0.8}, "completeness": 80, "tail": "doubled"}
    told = native("caseload.project", setting)
    page.get_by_text("there twice the last rates are used").wait_for(timeout=ANSWER_MS)
    page.locator("#projection", has_text="are added").wait_for(timeout=ANSWER_MS)
    rows = table_rows(page, "Patients under care at the end of each year")
    for row, band in zip(rows, told["baseline"]["under_care"], strict=True):
        assert numbers(row[1]) == pytest.approx([band["value"]], abs=0.51)
    assert numbers(rows[-1][3]) == pytest.approx(told["baseline"]["under_care"][-1]["p95"], abs=0.51)


def test_what_was_typed_is_kept_in_a_file_without_patients(page: Page, tmp_path: Path) -> None:
    page.locator("#items-example").click()
    page.locator("#levers-example").click()
    put(page, "#caseload-years", 7)
    page.locator("#caseload-basis").select_option("trend")
    page.locator("#levers .sentence").first.wait_for(timeout=ANSWER_MS)
    with page.expect_download() as saving:
        page.locator("#scenario-save").click()
    kept = tmp_path / "kept.json"
    saving.value.save_as(kept)
    text = kept.read_text(encoding="utf-8")
    saved = json.loads(text)["caseload"]
    assert saved["years"] == 7
    assert "RH-0" not in text  # no patient's number
    page.locator("#items-clear").click()
    page.locator("#levers-clear").click()
    put(page, "#caseload-years", 3)
    page.locator("#scenario-open").set_input_files(kept)
    page.get_by_text("Opened: 4 levers and 3 things that care takes.").wait_for(timeout=ANSWER_MS)
    assert page.locator("#caseload-years").input_value() == "7"
    assert page.locator("#caseload-basis").input_value() == "trend"
    assert page.locator("#levers-1-kind").input_value() == "found_earlier"
    # A strange file changes nothing and is refused.
    strange = tmp_path / "strange.json"
    for spoilt in (
        "{",
        json.dumps({"format": "vitalroll-caseload", "version": 1, "caseload": saved | {"basis": "x"}}),
    ):
        strange.write_text(spoilt, encoding="utf-8")
        page.locator("#scenario-open").set_input_files(strange)
        page.get_by_text("Nothing was changed.").wait_for(timeout=ANSWER_MS)
        assert page.locator("#caseload-years").input_value() == "7"


def test_a_district_from_counts_alone(site: SiteServer, opened: Callable, native: Callable) -> None:
    page = opened(site.address).page
    page.get_by_role("navigation").get_by_role("link", name="From counts", exact=True).click()
    ages = [
        {
            "from_age": 0,
            "population": 9000,
            "prevalence": 1,
            "incidence": 0.5,
            "mortality_well": 4,
            "mortality_ill": 20,
        },
        {
            "from_age": 50,
            "population": 4000,
            "prevalence": 8,
            "incidence": 12,
            "mortality_well": 15,
            "mortality_ill": 60,
        },
    ]
    for position, row in enumerate(ages):
        for name, value in row.items():
            put(page, f"#district-{position}-{name}", value)
    # The page takes per cent and numbers per 1,000.
    per = {"prevalence": 100, "incidence": 1000, "mortality_well": 1000, "mortality_ill": 1000}
    groups = [{name: value / per.get(name, 1) for name, value in row.items()} for row in ages]
    told = native("counts.district", {"groups": groups, "last_age": 90, "years": 10})
    rows = table_rows(page, "Ill in the whole district")
    for row, year in zip(rows, told["path"], strict=True):
        assert numbers(row[1]) == pytest.approx([year["ill"]], abs=0.51)
    shown = table_rows(page, "Ill by age")
    for row, group in zip(shown, told["groups"], strict=True):
        assert numbers(row[5]) == pytest.approx([100 * group["steady_prevalence"]], abs=0.051)
    put(page, "#district-0-incidence", 1200)
    page.locator("#district-0-incidence-fault").wait_for()
    assert page.locator("#district-0-incidence").input_value() == "1200"


def test_long_work_shows_how_far_it_is_and_can_be_stopped(page: Page) -> None:
    page.locator("#items-example").click()
    page.locator("#levers-example").click()
    page.locator("#levers .sentence").first.wait_for(timeout=ANSWER_MS)
    put(page, "#caseload-years", 30)
    stop = page.locator("#place-caseload .starting").get_by_role("button")
    stop.first.wait_for(timeout=2 * ANSWER_MS)
    assert page.locator("#place-caseload progress").count() == 1
    stop.first.click()
    page.locator("#place-caseload .refusal", has_text="Stopped before it was finished.").first.wait_for(
        timeout=ANSWER_MS
    )
    # The engine is back, with its register, and the next question is answered.
    put(page, "#caseload-years", 2)
    page.locator("#levers .sentence", has_text="after 2 years").first.wait_for(timeout=3 * ANSWER_MS)
    assert page.locator("#place-caseload .starting").count() == 0
