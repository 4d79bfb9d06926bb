"""From the demo register to a saved report, in the site and in the one-file copy, with the engine's numbers."""

from __future__ import annotations

import re
from collections.abc import Callable
from pathlib import Path

import pytest
from page_reading import ANSWER_MS, DEATHS, GROUP, go, numbers, table_rows
from playwright.sync_api import Download, Page, expect

from make_dist import DIST
from site_server import SiteServer


@pytest.fixture(params=["site", "one-file copy"])
def page(request: pytest.FixtureRequest, site: SiteServer, opened: Callable) -> Page:
    address = site.address if request.param == "site" else (DIST / "vitalroll.html").as_uri()
    page = opened(address).page
    page.locator("#open-demo").click()
    page.get_by_text("person-years.").first.wait_for(timeout=ANSWER_MS)
    return page


def test_from_the_demo_to_a_saved_report(page: Page, native: Callable, tmp_path: Path) -> None:
    _register(page, native)
    _outcomes(page, native)
    _compare(page, native)
    _caseload(page, native)
    _report(page, tmp_path)


def _register(page: Page, native: Callable) -> None:
    sentence = page.locator("#understood-heading ~ .sentence").inner_text()
    assert numbers(sentence)[0] == native.cohort["n"]
    rows = table_rows(page, "How follow-up ended")
    counts = {label: numbers(n)[0] for label, n, _ in rows}
    assert counts["under care"] == native.cohort["outcomes"]["under_care"]
    assert sum(counts.values()) == native.cohort["n"]
    reasons = table_rows(page, "Set aside, by reason")
    assert sum(numbers(n)[0] for _, n in reasons) == len(native.cohort["set_aside"])


def _outcomes(page: Page, native: Callable) -> None:
    go(page, "Outcomes")
    page.locator("#outcomes-group").select_option(label=GROUP)
    expected = native("outcomes.survival", {"interest": DEATHS, "group": native.group, "years": [1, 3, 5]})
    page.locator("#survival svg").wait_for(timeout=ANSWER_MS)
    page.get_by_text(f"judging from {expected['curves'][1]['n']} patients").wait_for(timeout=ANSWER_MS)
    rows = table_rows(page, "Survival at chosen times")
    at = [(curve["level"], each) for curve in expected["curves"] for each in curve["at_years"]]
    assert len(rows) == len(at)
    for (group, years, at_risk, alive, _), (level, each) in zip(rows, at, strict=True):
        assert group == level
        assert numbers(years) == [each["years"]]
        assert numbers(at_risk) == [each["at_risk"]]
        estimate = each["estimate"]
        wanted = [100 * estimate[name] for name in ("value", "lower", "upper")]
        assert numbers(alive) == pytest.approx(wanted, abs=0.051)
    life = native("outcomes.life_table", {"interest": DEATHS, "group": native.group})
    first = table_rows(page, "Actuarial life table")[0]
    assert numbers(first[1]) == [life["tables"][0]["rows"][0]["entering"]]
    leaving = native("outcomes.leaving", {"group": native.group})
    ways = [way for way in leaving["groups"][0]["ways"] if way["events"]]
    shown = table_rows(page, "Cumulative incidence")
    assert [numbers(row[1])[0] for row in shown] == [way["events"] for way in ways]


def _compare(page: Page, native: Callable) -> None:
    go(page, "Compare")
    test = native("compare.rank_test", {"interest": DEATHS, "group": native.group})
    page.locator("#rank-test .sentence").wait_for(timeout=ANSWER_MS)
    assert numbers(page.locator("#rank-test .sentence").inner_text())[0] == pytest.approx(
        test["chi_squared"], abs=0.006
    )
    page.locator("#compare-exposed").select_option(label="Severe")
    page.locator("#compare-reference").select_option(label="Mild")
    page.locator("#cox-covariates-0").wait_for()
    page.get_by_label("Age at start", exact=True).check()
    covariates = [{"id": native.group, "reference": "Mild"}, {"id": "age", "per": 10}]
    expected = native("compare.cox", {"interest": DEATHS, "covariates": covariates})
    page.locator("#cox").get_by_text("Age at start, per 10").first.wait_for(timeout=ANSWER_MS)
    rows = table_rows(page, "Cox regression")
    for row, term in zip(rows, expected["terms"], strict=True):
        assert numbers(row[2])[0] == pytest.approx(term["coefficient"], abs=0.00051)
        assert numbers(row[4])[0] == pytest.approx(term["hazard_ratio"]["value"], rel=0.006)
    competing = native("compare.subdistribution", {"interest": DEATHS, "covariates": covariates})
    rows = table_rows(page, "Ratios with 95% limits")
    for row, term in zip(rows, competing["fit"]["terms"], strict=True):
        assert numbers(row[1])[0] == pytest.approx(term["hazard_ratio"]["value"], rel=0.006)
    pooled = native(
        "compare.intervals",
        {"interest": DEATHS, "group": native.group, "exposed": "Severe", "reference": "Mild"},
    )
    ratio = table_rows(page, "Pooled over the strata")[0][1]
    assert numbers(ratio)[0] == pytest.approx(pooled["pooled"]["risk_ratio"]["value"], rel=0.006)


def _caseload(page: Page, native: Callable) -> None:
    go(page, "Caseload")
    page.locator("#items-0-name").fill("Visits")
    page.locator("#items-0-first_year").fill("1")
    page.locator("#items-0-later").fill("1")
    page.locator("#items-0-later").press("Tab")
    items = [{"name": "Visits", "first_year": 1, "later": 1}]
    expected = native("caseload.project", {"years": 5})
    page.locator("#resources table").first.wait_for(timeout=ANSWER_MS)
    rows = table_rows(page, "Patients under care at the end of each year")
    assert len(rows) == 6
    for row, band in zip(rows, expected["baseline"]["under_care"], strict=True):
        assert numbers(row[1])[0] == round(band["value"])
    # The redrawn bands come from the same seed in both places.
    assert numbers(rows[-1][3]) == [round(limit) for limit in expected["baseline"]["under_care"][-1]["p95"]]
    visits = table_rows(page, "Visits in each year")
    taken = native("caseload.resources", {"years": 5, "items": items})["items"][0]["amount"][-1]
    assert numbers(visits[-1][1])[0] == round(taken["value"])


def _report(page: Page, folder: Path) -> None:
    go(page, "Report")
    page.get_by_label("Title").fill("Round of June")
    page.get_by_label("Date", exact=True).fill("1 July 2025")
    page.get_by_label("Date", exact=True).press("Tab")
    page.locator("#report-document").get_by_text("1 July 2025").wait_for()
    with page.expect_download() as saving:
        page.locator("#report-save").click()
    text = _saved(saving.value, folder).read_text(encoding="utf-8")
    for wanted in (
        "Round of June", "1 July 2025", "Kaplan", "Figure 1.", "Table 1.", "Association is not cause", "Set aside",
        "What those lost to follow-up could change", "SHA-256",
    ):  # fmt: skip
        assert wanted in text
    assert "<script" not in text
    assert "RH-0" not in text
    assert text.count("<svg") >= 5


def _saved(download: Download, folder: Path) -> Path:
    path = folder / download.suggested_filename
    download.save_as(path)
    return path


def test_figures_and_tables_are_saved(page: Page, tmp_path: Path) -> None:
    go(page, "Outcomes")
    page.locator("#survival svg").wait_for(timeout=ANSWER_MS)
    with page.expect_download() as saving:
        page.locator("#survival").get_by_role("button", name="Save this figure").click()
    svg = _saved(saving.value, tmp_path).read_text(encoding="utf-8")
    assert svg.startswith("<?xml")
    assert "</svg>" in svg
    with page.expect_download() as saving:
        page.locator("#life-table").get_by_role("button", name="Save this table").click()
    lines = _saved(saving.value, tmp_path).read_text(encoding="utf-8").splitlines()
    assert len(lines) >= 9
    assert lines[0].startswith("\ufeffYears,Entering")


def test_the_report_prints_on_paper(page: Page, tmp_path: Path) -> None:
    go(page, "Outcomes")
    page.locator("#leaving svg").wait_for(timeout=ANSWER_MS)
    go(page, "Report")
    page.locator("#report-document h1").wait_for()
    content = page.pdf(path=tmp_path / "report.pdf", prefer_css_page_size=True)
    assert content.startswith(b"%PDF")
    assert (
        page.evaluate(
            "() => { matchMedia('print'); return document.querySelectorAll('#report-document table').length }"
        )
        >= 4
    )


def test_language_changes_everything_and_keeps_choices(page: Page) -> None:
    go(page, "Outcomes")
    page.locator("#outcomes-group").select_option(label=GROUP)
    page.locator("#survival svg").wait_for(timeout=ANSWER_MS)
    page.locator("#language").select_option("fr")
    page.get_by_role("heading", name="Survie au cours du temps").wait_for()
    assert page.locator("#outcomes-group option:checked").inner_text() == GROUP
    assert page.locator("html").get_attribute("lang") == "fr"
    assert not re.search(r"\b(Survival|Years since|Outcomes)\b", page.locator("#place-outcomes").inner_text())


def test_undo_takes_back_the_last_choice(page: Page) -> None:
    go(page, "Outcomes")
    page.locator("#outcomes-step").select_option("quarter")
    page.locator("#undo").click()
    expect(page.locator("#outcomes-step")).to_have_value("year")
