"""Findings on the page: what is shown is what the engine says, and accepting, declining and undoing work by keyboard."""

from __future__ import annotations

import csv
import io
import json
import re
from collections.abc import Callable
from pathlib import Path
from typing import Any

import pytest
from hard_reading import CLOSING, request_as_proposed
from playwright.sync_api import Page, expect

from site_server import SiteServer
from vitalroll.desk import Desk

HARD_CASES = Path(__file__).parents[1] / "hard_cases"

ANSWER_MS = 30_000
EXPECTED = json.loads((HARD_CASES / "faults.json").read_text(encoding="utf-8"))
END_TO_END = (
    "slipped_sideways", "day_and_month_changed_over", "ends_before_start", "no_such_day", "partial_date", "born_in_wrong_century",
    "death_date_but_alive", "contact_after_death", "death_dated_by_contact", "transfer_as_lost", "same_number",
    "one_number_two_people", "likely_same_person",
)  # fmt: skip
"""Faults with a repair that are followed from the file to the number on the page."""


def open_fault(page: Page, name: str) -> None:
    if page.locator("#place-register #columns-heading").count():
        page.locator("#forget").click()
        page.locator("#columns-heading").wait_for(state="detached", timeout=ANSWER_MS)
    page.locator("#register-file").first.set_input_files(HARD_CASES / "faults" / f"{name}.csv")
    page.locator("#closing-date").wait_for(timeout=ANSWER_MS)
    page.locator("#closing-date").fill(CLOSING)
    page.locator("#closing-date").blur()
    page.locator("#findings .sentence").wait_for(timeout=ANSWER_MS)


def native(name: str, **more: Any) -> dict[str, Any]:
    desk = Desk()
    content = (HARD_CASES / "faults" / f"{name}.csv").read_bytes()
    source = desk.answer("register.open", {"name": f"{name}.csv", "content": content})["answer"]
    return desk.answer("register.findings", request_as_proposed(desk, source, CLOSING) | more)["answer"]


def patients(page: Page) -> int:
    return int(
        re.search(r"(\d+) patients", page.locator("#understood-heading ~ .sentence").inner_text()).group(1)
    )


def test_faults_end_to_end(site: SiteServer, opened: Callable) -> None:
    page = opened(site.address).page
    for name in END_TO_END:
        open_fault(page, name)
        answer = native(name)
        rows = page.locator("#findings table").first.locator("tbody tr")
        assert rows.count() == len(answer["findings"]) == len(EXPECTED[f"{name}.csv"])
        repair = next(each["repair"] for each in answer["findings"] if each["code"] == name)
        assert patients(page) == repair["without"]["n"]
        page.locator(f"#repair-{name}").check()
        page.locator("#findings table", has=page.locator("caption", has_text="Corrections made")).wait_for(
            timeout=ANSWER_MS
        )
        sentence = page.locator("#understood-heading ~ .sentence")
        expect(sentence).to_contain_text(re.compile(rf"^{repair['with']['n']} patient"), timeout=ANSWER_MS)
        shown = page.locator("#findings .sentence").inner_text()
        accepted = native(name, repairs={name: []})
        assert f"{accepted['now']['events']} deaths instead of {accepted['untouched']['events']}" in shown
        survival = accepted["now"]["survival"]["value"]
        if survival is not None:
            assert f"is {100 * survival:.1f}%" in shown


def test_by_keyboard_with_undo_and_the_log_to_take_away(
    site: SiteServer, opened: Callable, tmp_path: Path
) -> None:
    page = opened(site.address).page
    open_fault(page, "many_at_once")
    box = page.locator("#repair-unseen_for_long")
    box.focus()
    page.keyboard.press("Space")
    log = page.locator("#findings table", has=page.locator("caption", has_text="Corrections made"))
    log.wait_for(timeout=ANSWER_MS)
    page.locator("#repair-unseen_for_long:focus").wait_for(timeout=ANSWER_MS)
    expected = native("many_at_once", repairs={"unseen_for_long": []})
    assert log.locator("tbody tr").count() == len(expected["corrections"]) == 1
    with page.expect_download() as waiting:
        log.locator("xpath=ancestor::div[@class='table']").get_by_role("button").click()
    saved = waiting.value.path().read_text(encoding="utf-8-sig")
    lines = list(csv.reader(io.StringIO(saved)))
    assert lines[1] == ["5", "how it ended", "under care", "lost to follow-up", "Under care, but long unseen"]
    # One row declined, in the details, and then everything undone again.
    page.locator("#findings details", has_text="Row by row: Under care").locator("summary").click()
    page.locator("#repair-unseen_for_long-5").uncheck()
    page.get_by_text("No correction was made.").wait_for(timeout=ANSWER_MS)
    assert page.locator("#repair-unseen_for_long").is_checked()
    page.locator("#undo").click()
    log.wait_for(timeout=ANSWER_MS)
    page.locator("#undo").click()
    page.get_by_text("No correction was made.").wait_for(timeout=ANSWER_MS)
    assert not page.locator("#repair-unseen_for_long").is_checked()


def test_the_report_holds_findings_and_corrections_but_no_controls(
    site: SiteServer, opened: Callable
) -> None:
    page = opened(site.address).page
    open_fault(page, "death_date_but_alive")
    page.locator("#repair-death_date_but_alive").check()
    page.get_by_text("Corrections made").first.wait_for(timeout=ANSWER_MS)
    page.get_by_role("navigation").get_by_role("link", name="Report", exact=True).click()
    piece = page.locator("#report-document [data-piece=findings]")
    piece.get_by_text("Corrections made").wait_for(timeout=ANSWER_MS)
    assert piece.locator("input").count() == 0
    assert "15 August 2019" in piece.inner_text()


@pytest.mark.parametrize("language", ["en", "fr"])
def test_on_a_small_screen_nothing_runs_over(site: SiteServer, opened: Callable, language: str) -> None:
    page = opened(site.address, width=360, language=language).page
    open_fault(page, "many_at_once")
    assert page.evaluate("document.documentElement.scrollWidth") <= 360


def test_the_ethiopian_calendar_is_chosen_and_the_persian_refused_by_name(
    site: SiteServer, opened: Callable
) -> None:
    page = opened(site.address).page
    page.locator("#register-file").first.set_input_files(HARD_CASES / "files" / "ethiopian_dates.csv")
    page.locator("#closing-date").wait_for(timeout=ANSWER_MS)
    page.locator("#closing-date").fill(CLOSING)
    page.locator("#closing-date").blur()
    for column in ("c2", "c5", "c6", "c7"):
        if not page.locator(f"#calendar-{column}").is_visible():
            page.locator(f"tr:has(#role-{column}) .calendar summary").click()
        page.locator(f"#calendar-{column}").select_option("ethiopian")
    sentence = page.locator("#understood-heading ~ .sentence")
    # The same patients as in the file without faults, which is this one in Gregorian dates.
    expect(sentence).to_contain_text(
        "8 patients from 8 rows, who started between 16 March 2015", timeout=ANSWER_MS
    )
    page.locator("#calendar-c5").select_option("persian")
    refusal = page.locator("section", has=page.locator("#understood-heading")).locator(".refusal")
    expect(refusal).to_contain_text("follow another calendar (Persian)", timeout=ANSWER_MS)
